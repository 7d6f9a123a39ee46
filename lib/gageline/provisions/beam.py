"""The supporting beam: local strength of web and flange under a concentrated pull, flange holes.  [AISC360] F13.1, J10."""

from ..formula import formula


@formula("Eq. J10-2")
def web_local_yielding(F_y, t, k_d, l_b):
    """Nominal strength of a web against local yielding, the load farther than the depth from the member's end.

    Parameters
    ----------
    F_y : specified minimum yield stress of the web. [ksi]
    t : thickness of the web. [in]
    k_d : outer face of the flange to the web toe of the fillet, as designed. [in]
    l_b : length over which the load enters. [in]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> web_local_yielding.bare(50.0, 0.5, 1.0, 5.0)
    250.0
    """
    R_n = F_y * t * (5 * k_d + l_b)
    return R_n


@formula("Eq. J10-3")
def web_local_yielding_near_end(F_y, t, k_d, l_b):
    """Nominal strength of a web against local yielding, the load within the depth from the member's end.

    Parameters
    ----------
    F_y : specified minimum yield stress of the web. [ksi]
    t : thickness of the web. [in]
    k_d : outer face of the flange to the web toe of the fillet, as designed. [in]
    l_b : length over which the load enters. [in]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> web_local_yielding_near_end.bare(50.0, 0.5, 1.0, 5.0)
    187.5
    """
    R_n = F_y * t * (2.5 * k_d + l_b)
    return R_n


@formula("statics")
def web_local_yielding_inclined(R_t, psi):
    """Nominal strength along an inclined pull of a web against local yielding.

    Parameters
    ----------
    R_t : nominal strength against the component along the bolts. [kip]
    psi : angle between the pull and the axes of the bolts. [rad]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> round(web_local_yielding_inclined.bare(50.0, 1.0471975511965976), 6)
    100.0
    """
    R_n = R_t / cos(psi)
    return R_n


@formula("Eq. J10-2")
def component_of_web(F_y, t, k_d, l_b):
    """Nominal strength of a web against local yielding under the component of the pull along the bolts.

    Parameters
    ----------
    F_y : specified minimum yield stress of the web. [ksi]
    t : thickness of the web. [in]
    k_d : outer face of the flange to the web toe of the fillet, as designed. [in]
    l_b : length over which the load enters. [in]

    Returns
    -------
    R_t : nominal strength against the component along the bolts. [kip]

    >>> component_of_web.bare(50.0, 0.5, 1.0, 5.0)
    250.0
    """
    R_t = F_y * t * (5 * k_d + l_b)
    return R_t


@formula("Eq. J10-3")
def component_of_web_near_end(F_y, t, k_d, l_b):
    """Nominal strength of a web near the member's end under the component of the pull along the bolts.

    Parameters
    ----------
    F_y : specified minimum yield stress of the web. [ksi]
    t : thickness of the web. [in]
    k_d : outer face of the flange to the web toe of the fillet, as designed. [in]
    l_b : length over which the load enters. [in]

    Returns
    -------
    R_t : nominal strength against the component along the bolts. [kip]

    >>> component_of_web_near_end.bare(50.0, 0.5, 1.0, 5.0)
    187.5
    """
    R_t = F_y * t * (2.5 * k_d + l_b)
    return R_t


@formula("Eq. J10-1")
def flange_local_bending(F_y, t):
    """Nominal strength of a flange against local bending by a plate welded across it.

    Parameters
    ----------
    F_y : specified minimum yield stress of the flange. [ksi]
    t : thickness of the flange. [in]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> flange_local_bending.bare(40.0, 0.5)
    62.5
    """
    R_n = 6.25 * F_y * t**2
    return R_n


@formula("F13.1")
def gross_flange_area(w, t):
    """Gross area of the tension flange.

    Parameters
    ----------
    w : width of the flange. [in]
    t : thickness of the flange. [in]

    Returns
    -------
    A_fg : gross area of the tension flange. [in²]

    >>> gross_flange_area.bare(8.0, 0.5)
    4.0
    """
    A_fg = w * t
    return A_fg


@formula("F13.1, B4.3b")
def net_flange_area(A_fg, n_h, d_n, t):
    """Net area of the tension flange at a row of holes.

    Parameters
    ----------
    A_fg : gross area of the tension flange. [in²]
    n_h : number of holes in the row. []
    d_n : hole width deducted. [in]
    t : thickness of the flange. [in]

    Returns
    -------
    A_fn : net area of the tension flange. [in²]

    >>> net_flange_area.bare(4.0, 2, 0.875, 0.5)
    3.125
    """
    A_fn = A_fg - n_h * d_n * t
    return A_fn


@formula("F13.1")
def flange_yield_force(Y_t, F_y, A_fg):
    """Force at which the tension flange yields, with the factor for the steel's yield ratio.

    Parameters
    ----------
    Y_t : 1.0 where F_y / F_u is at most 0.8, else 1.1. []
    F_y : specified minimum yield stress. [ksi]
    A_fg : gross area of the tension flange. [in²]

    Returns
    -------
    P_fy : yield force of the gross flange, factored. [kip]

    >>> flange_yield_force.bare(1.0, 50.0, 4.0)
    200.0
    """
    P_fy = Y_t * F_y * A_fg
    return P_fy


@formula("F13.1")
def flange_rupture_force(F_u, A_fn):
    """Force at which the tension flange ruptures at its holes.

    Parameters
    ----------
    F_u : specified minimum tensile strength. [ksi]
    A_fn : net area of the tension flange. [in²]

    Returns
    -------
    P_fu : rupture force of the net flange. [kip]

    >>> flange_rupture_force.bare(65.0, 3.0)
    195.0
    """
    P_fu = F_u * A_fn
    return P_fu


@formula("Eq. F13-1")
def moment_at_flange_holes(P_fu, A_fg, S_x):
    """Nominal flexural strength of a beam that ruptures at the holes of its tension flange.

    Parameters
    ----------
    P_fu : rupture force of the net flange. [kip]
    A_fg : gross area of the tension flange. [in²]
    S_x : elastic section modulus about the strong axis. [in³]

    Returns
    -------
    M_nh : nominal flexural strength at the holes. [kip·in]

    >>> moment_at_flange_holes.bare(200.0, 4.0, 100.0)
    5000.0
    """
    M_nh = P_fu / A_fg * S_x
    return M_nh
