"""Prying action: strength of bolts and flange together, thickness that needs no prying force, the prying force.

The model is that of the AISC Manual, Part 9, with the tensile strength of the flange and the resistance factor of flexure.
"""

from ..formula import formula

_PART9 = "Manual Part 9"


@formula(_PART9)
def thickness_for_bolt(B_q, b_qr, phi, p_q, F_u):
    """Thickness at which the bolt's available tension is reached without prying, LRFD.

    Parameters
    ----------
    B_q : available tension of one bolt. [kip]
    b_qr : lever arm of the bolt. [in]
    phi : resistance factor of flexure. []
    p_q : tributary length. [in]
    F_u : specified minimum tensile strength of the flange. [ksi]

    Returns
    -------
    t_qc : thickness. [in]

    >>> round(thickness_for_bolt.bare(9.0, 1.0, 0.9, 4.0, 40.0), 4)
    0.5
    """
    t_qc = sqrt(4 * B_q * b_qr / (phi * p_q * F_u))
    return t_qc


@formula(_PART9)
def allowable_thickness_for_bolt(Omega, B_q, b_qr, p_q, F_u):
    """Thickness at which the bolt's available tension is reached without prying, ASD.

    Parameters
    ----------
    Omega : safety factor of flexure. []
    B_q : available tension of one bolt. [kip]
    b_qr : lever arm of the bolt. [in]
    p_q : tributary length. [in]
    F_u : specified minimum tensile strength of the flange. [ksi]

    Returns
    -------
    t_qc : thickness. [in]

    >>> round(allowable_thickness_for_bolt.bare(1.6, 6.25, 1.0, 4.0, 40.0), 4)
    0.5
    """
    t_qc = sqrt(4 * Omega * B_q * b_qr / (p_q * F_u))
    return t_qc


@formula(_PART9)
def moment_ratio_at_strength(t_qc, t, delta_q, rho_q):
    """Ratio of the moment at the bolt line to that at the stem when bolt and flange reach their strength together.

    Parameters
    ----------
    t_qc : thickness at which no prying arises. [in]
    t : thickness of the flange. [in]
    delta_q : net over gross section along the bolt line. []
    rho_q : ratio of the lever arms. []

    Returns
    -------
    alpha_qr : ratio; below 0 the bolt governs without prying, above 1 the flange governs. []

    >>> moment_ratio_at_strength.bare(1.0, 0.5, 0.75, 1.0)
    2.0
    """
    alpha_qr = ((t_qc / t)**2 - 1) / (delta_q * (1 + rho_q))
    return alpha_qr


@formula(_PART9)
def share_of_bolt(t, t_qc, delta_q, alpha_qr):
    """Share of the bolt's tension that is left for the load, prying taken off.

    Parameters
    ----------
    t : thickness of the flange. [in]
    t_qc : thickness at which no prying arises. [in]
    delta_q : net over gross section along the bolt line. []
    alpha_qr : ratio of the moments at strength. []

    Returns
    -------
    Q_q : share, at most 1. []

    >>> share_of_bolt.bare(0.5, 1.0, 0.8, 2.0), share_of_bolt.bare(1.0, 0.8, 0.8, -0.3)
    (0.45, 1.0)
    """
    Q_q = min(1.0, (t / t_qc)**2 * (1 + delta_q * min(1.0, max(0.0, alpha_qr))))
    return Q_q


@formula(_PART9)
def bolts_with_prying(n_b, Q_q, B_n):
    """Nominal strength of the bolts in tension with the prying of one flange.

    Parameters
    ----------
    n_b : number of bolts. []
    Q_q : share of the bolt's tension left for the load. []
    B_n : nominal tensile strength of one bolt. [kip]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> bolts_with_prying.bare(4, 0.5, 40.0)
    80.0
    """
    R_n = n_b * Q_q * B_n
    return R_n


@formula(_PART9)
def bolts_with_prying_inclined(n_b, Q_q, B_n, psi):
    """Nominal strength along an inclined pull of the bolts in tension with the prying of one flange.

    Parameters
    ----------
    n_b : number of bolts. []
    Q_q : share of the bolt's tension left for the load. []
    B_n : nominal tensile strength of one bolt. [kip]
    psi : angle between the pull and the axes of the bolts. [rad]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> round(bolts_with_prying_inclined.bare(4, 0.5, 40.0, 1.0471975511965976), 6)
    160.0
    """
    R_n = n_b * Q_q * B_n / cos(psi)
    return R_n


@formula(_PART9)
def thickness_without_prying(T_q, b_qr, phi, p_q, F_u):
    """Least thickness at which the required tension causes no prying, LRFD.

    Parameters
    ----------
    T_q : required tension of one bolt. [kip]
    b_qr : lever arm of the bolt. [in]
    phi : resistance factor of flexure. []
    p_q : tributary length. [in]
    F_u : specified minimum tensile strength of the flange. [ksi]

    Returns
    -------
    t_np : thickness that needs no prying force. [in]

    >>> round(thickness_without_prying.bare(9.0, 1.0, 0.9, 4.0, 40.0), 4)
    0.5
    """
    t_np = sqrt(4 * T_q * b_qr / (phi * p_q * F_u))
    return t_np


@formula(_PART9)
def allowable_thickness_without_prying(Omega, T_q, b_qr, p_q, F_u):
    """Least thickness at which the required tension causes no prying, ASD.

    Parameters
    ----------
    Omega : safety factor of flexure. []
    T_q : required tension of one bolt. [kip]
    b_qr : lever arm of the bolt. [in]
    p_q : tributary length. [in]
    F_u : specified minimum tensile strength of the flange. [ksi]

    Returns
    -------
    t_np : thickness that needs no prying force. [in]

    >>> round(allowable_thickness_without_prying.bare(1.6, 6.25, 1.0, 4.0, 40.0), 4)
    0.5
    """
    t_np = sqrt(4 * Omega * T_q * b_qr / (p_q * F_u))
    return t_np


@formula(_PART9)
def reserve_of_bolt(rho_q, B_q, T_q):
    """Reserve of the bolt for a prying force, referred to the lever arms.

    Parameters
    ----------
    rho_q : ratio of the lever arms. []
    B_q : available tension of one bolt. [kip]
    T_q : required tension of one bolt. [kip]

    Returns
    -------
    beta_q : reserve. []

    >>> round(reserve_of_bolt.bare(0.5, 30.0, 20.0), 6)
    1.0
    """
    beta_q = 1 / rho_q * (B_q / T_q - 1)
    return beta_q


@formula(_PART9)
def moment_ratio_by_reserve(beta_q, delta_q):
    """Ratio of the moments that the bolt's reserve allows, where that is less than 1.

    Parameters
    ----------
    beta_q : reserve of the bolt, less than 1. []
    delta_q : net over gross section along the bolt line. []

    Returns
    -------
    alpha_qb : ratio, at most 1. []

    >>> round(moment_ratio_by_reserve.bare(0.25, 0.8), 4)
    0.4167
    """
    alpha_qb = min(1.0, beta_q / (delta_q * (1 - beta_q)))
    return alpha_qb


@formula(_PART9)
def full_moment_ratio():
    """Ratio of the moments where the bolt's reserve is 1 or more.

    Returns
    -------
    alpha_qb : ratio. []

    >>> full_moment_ratio.bare()
    1.0
    """
    alpha_qb = 1.0
    return alpha_qb


@formula(_PART9)
def thickness_with_prying(t_np, delta_q, alpha_qb):
    """Least thickness for the required tension when the bolt's reserve takes up prying.

    Parameters
    ----------
    t_np : thickness that needs no prying force. [in]
    delta_q : net over gross section along the bolt line. []
    alpha_qb : ratio of the moments that the bolt allows. []

    Returns
    -------
    t_min : least thickness. [in]

    >>> round(thickness_with_prying.bare(0.6, 0.44, 1.0), 4)
    0.5
    """
    t_min = t_np / sqrt(1 + delta_q * alpha_qb)
    return t_min


@formula(_PART9)
def moment_ratio_at_load(delta_q, T_q, B_q, t_qc, t):
    """Ratio of the moment at the bolt line to that at the stem under the required load.

    Parameters
    ----------
    delta_q : net over gross section along the bolt line. []
    T_q : required tension of one bolt. [kip]
    B_q : available tension of one bolt. [kip]
    t_qc : thickness at which no prying arises at the bolt's strength. [in]
    t : thickness of the flange. [in]

    Returns
    -------
    alpha_q : ratio, from 0 to 1. []

    >>> round(moment_ratio_at_load.bare(0.8, 15.0, 30.0, 0.9, 0.5), 6)
    0.775
    """
    alpha_q = min(1.0, max(0.0, (T_q / B_q * (t_qc / t)**2 - 1) / delta_q))
    return alpha_q


@formula(_PART9)
def prying_force(B_q, delta_q, alpha_q, rho_q, t, t_qc):
    """Prying force that comes to one bolt under the required load.

    Parameters
    ----------
    B_q : available tension of one bolt. [kip]
    delta_q : net over gross section along the bolt line. []
    alpha_q : ratio of the moments under the load. []
    rho_q : ratio of the lever arms. []
    t : thickness of the flange. [in]
    t_qc : thickness at which no prying arises at the bolt's strength. [in]

    Returns
    -------
    q_q : prying force. [kip]

    >>> round(prying_force.bare(30.0, 0.8, 0.5, 0.5, 0.5, 1.0), 6)
    1.5
    """
    q_q = B_q * delta_q * alpha_q * rho_q * (t / t_qc)**2
    return q_q


@formula(_PART9)
def bolt_force(T_q, q_q):
    """Tension of one bolt under the required load, prying included.

    Parameters
    ----------
    T_q : required tension of one bolt. [kip]
    q_q : prying force. [kip]

    Returns
    -------
    T_qt : tension with prying. [kip]

    >>> bolt_force.bare(15.0, 1.5)
    16.5
    """
    T_qt = T_q + q_q
    return T_qt
