"""Strength of bolts and of their holes: shear, bearing, tearout, slip, fillers, long joints.  [AISC360] J3, J5.2."""

from ..formula import formula

_SHEAR = {"360-16": "J3.6, Eq. J3-1", "360-22": "J3.7, Eq. J3-1"}
_BEARING = {"360-16": "J3.10(a)", "360-22": "J3.11a"}
_SLIP = {"360-16": "J3.8, Eq. J3-4", "360-22": "J3.9, Eq. J3-4"}
_TABLE = "Table J3.2"


@formula(_TABLE)
def bolt_area(d_b):
    """Nominal unthreaded body area of a bolt.

    Parameters
    ----------
    d_b : nominal bolt diameter. [in]

    Returns
    -------
    A_b : area. [in²]

    >>> round(bolt_area.bare(0.75), 4)
    0.4418
    """
    A_b = pi / 4 * d_b**2
    return A_b


@formula(_TABLE)
def long_joint(F_nv):
    """Nominal shear stress where the fastener pattern of an end-loaded joint is longer than 38 in.

    Parameters
    ----------
    F_nv : nominal shear stress of the bolt. [ksi]

    Returns
    -------
    F_nvr : nominal shear stress, reduced. [ksi]

    >>> round(long_joint.bare(54.0), 3)
    44.982
    """
    F_nvr = 0.833 * F_nv
    return F_nvr


@formula(_TABLE)
def short_joint(F_nv):
    """Nominal shear stress where the fastener pattern is not longer than 38 in.: the table's.

    Parameters
    ----------
    F_nv : nominal shear stress of the bolt. [ksi]

    Returns
    -------
    F_nvr : nominal shear stress used. [ksi]

    >>> short_joint.bare(54.0)
    54.0
    """
    F_nvr = F_nv
    return F_nvr


@formula("J5.2(a)")
def filler_factor(t_fi, t_f0, k_0):
    """Factor on bolt shear for fillers that are not developed outside the joint.

    Parameters
    ----------
    t_fi : total thickness of fillers. [in]
    t_f0 : thickness that needs no reduction, 1/4 in. [in]
    k_0 : loss per thickness, 0.4 per inch. [1/in]

    Returns
    -------
    k_f : factor, not below 0.85. []

    >>> filler_factor.bare(0.5, 0.25, 0.4)
    0.9
    """
    k_f = max(0.85, 1 - k_0 * (t_fi - t_f0))
    return k_f


@formula(_SHEAR)
def bolt_shear(F_nvr, A_b, n_s):
    """Nominal shear strength of one bolt.

    Parameters
    ----------
    F_nvr : nominal shear stress used. [ksi]
    A_b : nominal body area. [in²]
    n_s : number of shear planes. []

    Returns
    -------
    r_nv : nominal shear strength of one bolt. [kip]

    >>> bolt_shear.bare(54.0, 0.5, 2)
    54.0
    """
    r_nv = F_nvr * A_b * n_s
    return r_nv


@formula(_SHEAR)
def bolt_shear_through_fillers(F_nvr, A_b, n_s, k_f):
    """Nominal shear strength of one bolt that passes through fillers.

    Parameters
    ----------
    F_nvr : nominal shear stress used. [ksi]
    A_b : nominal body area. [in²]
    n_s : number of shear planes. []
    k_f : factor for fillers. []

    Returns
    -------
    r_nv : nominal shear strength of one bolt. [kip]

    >>> bolt_shear_through_fillers.bare(54.0, 0.5, 2, 0.9)
    48.6
    """
    r_nv = F_nvr * A_b * n_s * k_f
    return r_nv


@formula(_BEARING)
def clear_to_edge(L_e, d_h):
    """Clear distance along the force from a hole to the edge of the part.

    Parameters
    ----------
    L_e : hole centre to edge. [in]
    d_h : nominal hole dimension along the force. [in]

    Returns
    -------
    l_c : clear distance. [in]

    >>> clear_to_edge.bare(1.5, 0.8125)
    1.09375
    """
    l_c = L_e - d_h / 2
    return l_c


@formula(_BEARING)
def clear_to_hole(s, d_h):
    """Clear distance along the force from a hole to the next one.

    Parameters
    ----------
    s : spacing of hole centres along the force. [in]
    d_h : nominal hole dimension along the force. [in]

    Returns
    -------
    l_c : clear distance. [in]

    >>> clear_to_hole.bare(3.0, 0.8125)
    2.1875
    """
    l_c = s - d_h
    return l_c


@formula({"360-16": "Eq. J3-6a", "360-22": "Eq. J3-6a"})
def bearing(d_b, t, F_u):
    """Nominal bearing strength at a bolt hole where deformation at service load is considered.

    Parameters
    ----------
    d_b : nominal bolt diameter. [in]
    t : thickness of the part. [in]
    F_u : specified minimum tensile strength of the part. [ksi]

    Returns
    -------
    r_nb : nominal bearing strength. [kip]

    >>> round(bearing.bare(0.75, 1.0, 65.0), 6)
    117.0
    """
    r_nb = 2.4 * d_b * t * F_u
    return r_nb


@formula({"360-16": "Eq. J3-6b", "360-22": "Eq. J3-6b"})
def bearing_deformation_not_considered(d_b, t, F_u):
    """Nominal bearing strength at a bolt hole where deformation at service load is not considered.

    Parameters
    ----------
    d_b : nominal bolt diameter. [in]
    t : thickness of the part. [in]
    F_u : specified minimum tensile strength of the part. [ksi]

    Returns
    -------
    r_nb : nominal bearing strength. [kip]

    >>> bearing_deformation_not_considered.bare(0.75, 1.0, 65.0)
    146.25
    """
    r_nb = 3.0 * d_b * t * F_u
    return r_nb


@formula({"360-16": "Eq. J3-6e", "360-22": "Eq. J3-6e"})
def bearing_at_cross_slot(d_b, t, F_u):
    """Nominal bearing strength at a long slot perpendicular to the force.

    Parameters
    ----------
    d_b : nominal bolt diameter. [in]
    t : thickness of the part. [in]
    F_u : specified minimum tensile strength of the part. [ksi]

    Returns
    -------
    r_nb : nominal bearing strength. [kip]

    >>> bearing_at_cross_slot.bare(0.75, 1.0, 65.0)
    97.5
    """
    r_nb = 2.0 * d_b * t * F_u
    return r_nb


@formula({"360-16": "Eq. J3-6c", "360-22": "Eq. J3-6c"})
def tearout(l_c, t, F_u):
    """Nominal tearout strength at a bolt hole where deformation at service load is considered.

    Parameters
    ----------
    l_c : clear distance. [in]
    t : thickness of the part. [in]
    F_u : specified minimum tensile strength of the part. [ksi]

    Returns
    -------
    r_nt : nominal tearout strength. [kip]

    >>> tearout.bare(1.0, 1.0, 65.0)
    78.0
    """
    r_nt = 1.2 * l_c * t * F_u
    return r_nt


@formula({"360-16": "Eq. J3-6d", "360-22": "Eq. J3-6d"})
def tearout_deformation_not_considered(l_c, t, F_u):
    """Nominal tearout strength at a bolt hole where deformation at service load is not considered.

    Parameters
    ----------
    l_c : clear distance. [in]
    t : thickness of the part. [in]
    F_u : specified minimum tensile strength of the part. [ksi]

    Returns
    -------
    r_nt : nominal tearout strength. [kip]

    >>> tearout_deformation_not_considered.bare(1.0, 1.0, 65.0)
    97.5
    """
    r_nt = 1.5 * l_c * t * F_u
    return r_nt


@formula({"360-16": "Eq. J3-6f", "360-22": "Eq. J3-6f"})
def tearout_at_cross_slot(l_c, t, F_u):
    """Nominal tearout strength at a long slot perpendicular to the force.

    Parameters
    ----------
    l_c : clear distance. [in]
    t : thickness of the part. [in]
    F_u : specified minimum tensile strength of the part. [ksi]

    Returns
    -------
    r_nt : nominal tearout strength. [kip]

    >>> tearout_at_cross_slot.bare(1.0, 1.0, 65.0)
    65.0
    """
    r_nt = 1.0 * l_c * t * F_u
    return r_nt


@formula({"360-16": "J3.6, User Note", "360-22": "J3.7, User Note"})
def weakest_at_bolt(r_nv, r_nb, r_nt):
    """Nominal strength of one bolt with its hole: the least of shear, bearing and tearout.

    Parameters
    ----------
    r_nv : nominal shear strength of one bolt. [kip]
    r_nb : nominal bearing strength at the hole. [kip]
    r_nt : nominal tearout strength at the hole. [kip]

    Returns
    -------
    r_n : nominal strength of one bolt with its hole. [kip]

    >>> weakest_at_bolt.bare(23.9, 117.0, 78.0)
    23.9
    """
    r_n = min(r_nv, r_nb, r_nt)
    return r_n


@formula({"360-16": "J3.6, User Note", "360-22": "J3.7, User Note"})
def weaker_without_tearout(r_nv, r_nb):
    """Nominal strength of one bolt with its hole where the part runs on and no edge or hole lies ahead.

    Parameters
    ----------
    r_nv : nominal shear strength of one bolt. [kip]
    r_nb : nominal bearing strength at the hole. [kip]

    Returns
    -------
    r_n : nominal strength of one bolt with its hole. [kip]

    >>> weaker_without_tearout.bare(23.9, 117.0)
    23.9
    """
    r_n = min(r_nv, r_nb)
    return r_n


@formula({"360-16": "J3.6, User Note", "360-22": "J3.7, User Note"})
def first_like_bolts(n_b, r_n):
    """Strength of like bolts of a group.

    Parameters
    ----------
    n_b : number of like bolts. []
    r_n : nominal strength of one with its hole. [kip]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> first_like_bolts.bare(2, 20.0)
    40.0
    """
    R_n = n_b * r_n
    return R_n


@formula({"360-16": "J3.6, User Note", "360-22": "J3.7, User Note"})
def more_like_bolts(R_n0, n_b, r_n):
    """Strength of like bolts, added to that of the bolts before.

    Parameters
    ----------
    R_n0 : nominal strength of the bolts before. [kip]
    n_b : number of like bolts. []
    r_n : nominal strength of one with its hole. [kip]

    Returns
    -------
    R_n : nominal strength so far. [kip]

    >>> more_like_bolts.bare(40.0, 4, 25.0)
    140.0
    """
    R_n = R_n0 + n_b * r_n
    return R_n


@formula(_SLIP)
def slip(mu, D_u, h_f, T_b, n_p, n_b):
    """Nominal slip resistance of a group of bolts.

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
    R_n : nominal slip resistance. [kip]

    >>> round(slip.bare(0.30, 1.13, 1.0, 28.0, 1, 1), 3)
    9.492
    """
    R_n = mu * D_u * h_f * T_b * n_p * n_b
    return R_n
