"""Bolts in tension, alone and with shear: reduced tensile stress in bearing joints, reduced slip resistance.  [AISC360] J3."""

from ..formula import formula

_TENSION = {"360-16": "J3.6, Eq. J3-1", "360-22": "J3.7, Eq. J3-1"}
_COMBINED = {"360-16": "J3.7, Eq. J3-2, J3-3a", "360-22": "J3.8, Eq. J3-2, J3-3a"}
_COMBINED_ASD = {"360-16": "J3.7, Eq. J3-2, J3-3b", "360-22": "J3.8, Eq. J3-2, J3-3b"}
_SLIP_AND_TENSION = {"360-16": "J3.9, Eq. J3-5a", "360-22": "J3.10, Eq. J3-5a"}
_SLIP_AND_TENSION_ASD = {"360-16": "J3.9, Eq. J3-5b", "360-22": "J3.10, Eq. J3-5b"}


@formula("statics")
def tension_per_bolt(P_r, n_b):
    """Required tension of one bolt, the pull along the bolts.

    Parameters
    ----------
    P_r : required pull. [kip]
    n_b : number of bolts. []

    Returns
    -------
    T_q : required tension of one bolt. [kip]

    >>> tension_per_bolt.bare(60.0, 4)
    15.0
    """
    T_q = P_r / n_b
    return T_q


@formula("statics")
def tension_per_bolt_inclined(P_r, psi, n_b):
    """Required tension of one bolt, the pull at an angle to the bolts.

    Parameters
    ----------
    P_r : required pull. [kip]
    psi : angle between the pull and the axes of the bolts. [rad]
    n_b : number of bolts. []

    Returns
    -------
    T_q : required tension of one bolt. [kip]

    >>> round(tension_per_bolt_inclined.bare(80.0, 1.0471975511965976, 4), 6)
    10.0
    """
    T_q = P_r * cos(psi) / n_b
    return T_q


@formula(_COMBINED)
def required_shear_stress(P_r, psi, n_b, A_b):
    """Required shear stress in the bolts, the pull at an angle to them.

    Parameters
    ----------
    P_r : required pull. [kip]
    psi : angle between the pull and the axes of the bolts. [rad]
    n_b : number of bolts. []
    A_b : nominal body area. [in²]

    Returns
    -------
    f_rv : required shear stress. [ksi]

    >>> round(required_shear_stress.bare(80.0, 0.5235987755982988, 4, 0.5), 6)
    20.0
    """
    f_rv = P_r * sin(psi) / (n_b * A_b)
    return f_rv


@formula("Table J3.2")
def tensile_stress(F_nt):
    """Nominal tensile stress of a bolt without shear: the table's.

    Parameters
    ----------
    F_nt : nominal tensile stress of the bolt. [ksi]

    Returns
    -------
    F_ntr : nominal tensile stress used. [ksi]

    >>> tensile_stress.bare(90.0)
    90.0
    """
    F_ntr = F_nt
    return F_ntr


@formula(_COMBINED)
def tensile_stress_with_shear(F_nt, phi, F_nv, f_rv):
    """Nominal tensile stress of a bolt that carries shear too, bearing joint, LRFD.

    Parameters
    ----------
    F_nt : nominal tensile stress of the bolt. [ksi]
    phi : resistance factor. []
    F_nv : nominal shear stress of the bolt. [ksi]
    f_rv : required shear stress. [ksi]

    Returns
    -------
    F_ntr : nominal tensile stress used. [ksi]

    >>> round(tensile_stress_with_shear.bare(90.0, 0.75, 54.0, 18.0), 6)
    77.0
    """
    F_ntr = min(F_nt, 1.3 * F_nt - F_nt / (phi * F_nv) * f_rv)
    return F_ntr


@formula(_COMBINED_ASD)
def allowable_tensile_stress_with_shear(F_nt, Omega, F_nv, f_rv):
    """Nominal tensile stress of a bolt that carries shear too, bearing joint, ASD.

    Parameters
    ----------
    F_nt : nominal tensile stress of the bolt. [ksi]
    Omega : safety factor. []
    F_nv : nominal shear stress of the bolt. [ksi]
    f_rv : required shear stress. [ksi]

    Returns
    -------
    F_ntr : nominal tensile stress used. [ksi]

    >>> round(allowable_tensile_stress_with_shear.bare(90.0, 2.0, 54.0, 12.0), 6)
    77.0
    """
    F_ntr = min(F_nt, 1.3 * F_nt - Omega * F_nt / F_nv * f_rv)
    return F_ntr


@formula(_TENSION)
def bolt_tension(F_ntr, A_b):
    """Nominal tensile strength of one bolt.

    Parameters
    ----------
    F_ntr : nominal tensile stress used. [ksi]
    A_b : nominal body area. [in²]

    Returns
    -------
    B_n : nominal tensile strength of one bolt. [kip]

    >>> bolt_tension.bare(90.0, 0.5)
    45.0
    """
    B_n = F_ntr * A_b
    return B_n


@formula(_TENSION)
def available_bolt_tension(phi, B_n):
    """Available tension of one bolt, LRFD.

    Parameters
    ----------
    phi : resistance factor. []
    B_n : nominal tensile strength of one bolt. [kip]

    Returns
    -------
    B_q : available tension of one bolt. [kip]

    >>> available_bolt_tension.bare(0.75, 40.0)
    30.0
    """
    B_q = phi * B_n
    return B_q


@formula(_TENSION)
def allowable_bolt_tension(B_n, Omega):
    """Available tension of one bolt, ASD.

    Parameters
    ----------
    B_n : nominal tensile strength of one bolt. [kip]
    Omega : safety factor. []

    Returns
    -------
    B_q : available tension of one bolt. [kip]

    >>> allowable_bolt_tension.bare(40.0, 2.0)
    20.0
    """
    B_q = B_n / Omega
    return B_q


@formula(_TENSION)
def bolts_in_tension(n_b, B_n):
    """Nominal strength of bolts in tension, no prying force.

    Parameters
    ----------
    n_b : number of bolts. []
    B_n : nominal tensile strength of one bolt. [kip]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> bolts_in_tension.bare(4, 40.0)
    160.0
    """
    R_n = n_b * B_n
    return R_n


@formula(_TENSION)
def bolts_in_tension_inclined(n_b, B_n, psi):
    """Nominal strength along an inclined pull of bolts in tension, no prying force.

    Parameters
    ----------
    n_b : number of bolts. []
    B_n : nominal tensile strength of one bolt. [kip]
    psi : angle between the pull and the axes of the bolts. [rad]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> round(bolts_in_tension_inclined.bare(4, 40.0, 1.0471975511965976), 6)
    320.0
    """
    R_n = n_b * B_n / cos(psi)
    return R_n


@formula("statics")
def total_tension(P_r, psi):
    """Required tension of all bolts, the pull at an angle to them.

    Parameters
    ----------
    P_r : required pull. [kip]
    psi : angle between the pull and the axes of the bolts. [rad]

    Returns
    -------
    T_t : required tension of all bolts. [kip]

    >>> round(total_tension.bare(80.0, 1.0471975511965976), 6)
    40.0
    """
    T_t = P_r * cos(psi)
    return T_t


@formula(_SLIP_AND_TENSION)
def slip_reduction(T_t, D_u, T_b, n_b):
    """Factor on slip resistance for the tension that loosens the faying surface, LRFD.

    Parameters
    ----------
    T_t : required tension of all bolts. [kip]
    D_u : ratio of mean installed to specified minimum pretension, 1.13. []
    T_b : minimum bolt pretension. [kip]
    n_b : number of bolts. []

    Returns
    -------
    k_sc : factor, not below 0. []

    >>> slip_reduction.bare(50.0, 1.25, 20.0, 4)
    0.5
    """
    k_sc = max(0.0, 1 - T_t / (D_u * T_b * n_b))
    return k_sc


@formula(_SLIP_AND_TENSION_ASD)
def allowable_slip_reduction(T_t, D_u, T_b, n_b):
    """Factor on slip resistance for the tension that loosens the faying surface, ASD.

    Parameters
    ----------
    T_t : required tension of all bolts. [kip]
    D_u : ratio of mean installed to specified minimum pretension, 1.13. []
    T_b : minimum bolt pretension. [kip]
    n_b : number of bolts. []

    Returns
    -------
    k_sc : factor, not below 0. []

    >>> allowable_slip_reduction.bare(30.0, 1.25, 20.0, 4)
    0.55
    """
    k_sc = max(0.0, 1 - 1.5 * T_t / (D_u * T_b * n_b))
    return k_sc


@formula(_SLIP_AND_TENSION)
def slip_under_inclined_pull(k_sc, R_s, psi):
    """Nominal strength along an inclined pull when the joint slips, its tension regarded.

    Parameters
    ----------
    k_sc : factor for the tension. []
    R_s : nominal slip resistance without tension. [kip]
    psi : angle between the pull and the axes of the bolts. [rad]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> round(slip_under_inclined_pull.bare(0.5, 40.0, 0.5235987755982988), 6)
    40.0
    """
    R_n = k_sc * R_s / sin(psi)
    return R_n


@formula({"360-16": "J3.8, Eq. J3-4", "360-22": "J3.9, Eq. J3-4"})
def slip_without_tension(mu, D_u, h_f, T_b, n_p, n_b):
    """Nominal slip resistance of a group of bolts before its tension is regarded.

    Parameters
    ----------
    mu : mean slip coefficient. []
    D_u : ratio of mean installed to specified minimum pretension, 1.13. []
    h_f : factor for fillers. []
    T_b : minimum bolt pretension. [kip]
    n_p : number of slip planes. []
    n_b : number of bolts. []

    Returns
    -------
    R_s : nominal slip resistance without tension. [kip]

    >>> round(slip_without_tension.bare(0.30, 1.13, 1.0, 28.0, 1, 8), 3)
    75.936
    """
    R_s = mu * D_u * h_f * T_b * n_p * n_b
    return R_s


@formula("statics")
def shear_of_inclined_pull(R_v, psi):
    """Nominal strength along an inclined pull of what carries its shear across the bolts.

    Parameters
    ----------
    R_v : nominal strength against the shear. [kip]
    psi : angle between the pull and the axes of the bolts. [rad]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> round(shear_of_inclined_pull.bare(40.0, 0.5235987755982988), 6)
    80.0
    """
    R_n = R_v / sin(psi)
    return R_n
