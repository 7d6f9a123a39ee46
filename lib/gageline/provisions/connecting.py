"""Connecting elements: block shear, Whitmore width, gusset buckling.  [AISC360] J4.1, J4.3, J4.4, E3."""

from ..formula import formula


@formula("Eq. J4-1")
def plate_yielding(F_y, A_g):
    """Nominal strength of a connecting element in tension when its gross section yields.

    Parameters
    ----------
    F_y : specified minimum yield stress. [ksi]
    A_g : gross area. [in²]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> plate_yielding.bare(36.0, 2.0)
    72.0
    """
    R_n = F_y * A_g
    return R_n


@formula("Eq. J4-2")
def plate_rupture(F_u, A_e):
    """Nominal strength of a connecting element in tension when its net section ruptures.

    Parameters
    ----------
    F_u : specified minimum tensile strength. [ksi]
    A_e : effective net area. [in²]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> plate_rupture.bare(58.0, 2.0)
    116.0
    """
    R_n = F_u * A_e
    return R_n


@formula("Eq. J4-2, share of load")
def plate_rupture_behind_lead_row(F_u, A_e, xi):
    """Nominal strength, referred to the whole load, when a connecting element ruptures behind its lead row.

    Parameters
    ----------
    F_u : specified minimum tensile strength. [ksi]
    A_e : effective net area on the chain. [in²]
    xi : share of the load left at the chain. []

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> plate_rupture_behind_lead_row.bare(60.0, 2.0, 0.75)
    160.0
    """
    R_n = F_u * A_e / xi
    return R_n


@formula("common practice, Whitmore")
def whitmore_width(l, theta, g):
    """Width over which a plate is stressed at its last row of fasteners.

    Parameters
    ----------
    l : first to last row. [in]
    theta : angle of spread each side, 30 degrees. [rad]
    g : outer gage lines apart. [in]

    Returns
    -------
    L_w : Whitmore width, edges not regarded. [in]

    >>> round(whitmore_width.bare(9.0, 0.5235987755982988, 3.0), 2)
    13.39
    """
    L_w = 2 * l * tan(theta) + g
    return L_w


@formula("common practice, Whitmore")
def width_within_edges(L_w, c_1, c_2):
    """Width of the plate that counts: the Whitmore width cut off at the plate's edges.

    Parameters
    ----------
    L_w : Whitmore width, edges not regarded. [in]
    c_1 : cut off at one edge. [in]
    c_2 : cut off at the other edge. [in]

    Returns
    -------
    w : width that counts. [in]

    >>> width_within_edges.bare(13.0, 0.5, 0.5)
    12.0
    """
    w = L_w - c_1 - c_2
    return w


@formula("geometry")
def plate_area(w, t):
    """Gross area of a plate's width.

    Parameters
    ----------
    w : width. [in]
    t : thickness. [in]

    Returns
    -------
    A_g : gross area. [in²]

    >>> plate_area.bare(12.0, 0.5)
    6.0
    """
    A_g = w * t
    return A_g


@formula("geometry")
def like_plates_area(n_j, w, t):
    """Gross area of a width of like plates.

    Parameters
    ----------
    n_j : number of plates. []
    w : width. [in]
    t : thickness of one. [in]

    Returns
    -------
    A_g : gross area. [in²]

    >>> like_plates_area.bare(2, 12.0, 0.5)
    12.0
    """
    A_g = n_j * w * t
    return A_g


@formula("geometry")
def plate_radius(t):
    """Radius of gyration of a plate bending about its own plane.

    Parameters
    ----------
    t : thickness. [in]

    Returns
    -------
    r : radius of gyration. [in]

    >>> round(plate_radius.bare(0.5), 4)
    0.1443
    """
    r = t / sqrt(12)
    return r


@formula("E2")
def effective_slenderness(K, L_b, r):
    """Effective slenderness ratio of a gusset's strip.

    Parameters
    ----------
    K : effective length factor. []
    L_b : length considered. [in]
    r : radius of gyration. [in]

    Returns
    -------
    lam : effective slenderness ratio. []

    >>> effective_slenderness.bare(0.5, 10.0, 0.2)
    25.0
    """
    lam = K * L_b / r
    return lam


@formula("Eq. E3-4")
def elastic_buckling_stress(E, lam):
    """Elastic buckling stress.

    Parameters
    ----------
    E : modulus of elasticity. [ksi]
    lam : effective slenderness ratio. []

    Returns
    -------
    F_e : elastic buckling stress. [ksi]

    >>> round(elastic_buckling_stress.bare(29000.0, 100.0), 2)
    28.62
    """
    F_e = pi**2 * E / lam**2
    return F_e


@formula("Eq. E3-2")
def inelastic_buckling(F_y, F_e):
    """Critical stress where yielding takes part in buckling.

    Parameters
    ----------
    F_y : specified minimum yield stress. [ksi]
    F_e : elastic buckling stress. [ksi]

    Returns
    -------
    F_cr : critical stress. [ksi]

    >>> round(inelastic_buckling.bare(50.0, 50.0), 1)
    32.9
    """
    F_cr = 0.658**(F_y / F_e) * F_y
    return F_cr


@formula("Eq. E3-3")
def elastic_buckling(F_e):
    """Critical stress where buckling is elastic.

    Parameters
    ----------
    F_e : elastic buckling stress. [ksi]

    Returns
    -------
    F_cr : critical stress. [ksi]

    >>> elastic_buckling.bare(10.0)
    8.77
    """
    F_cr = 0.877 * F_e
    return F_cr


@formula("Eq. J4-6")
def gusset_yielding_in_compression(F_y, A_g):
    """Nominal compressive strength of a gusset's strip with effective slenderness not above 25.

    Parameters
    ----------
    F_y : specified minimum yield stress. [ksi]
    A_g : gross area of the strip. [in²]

    Returns
    -------
    P_n : nominal strength. [kip]

    >>> gusset_yielding_in_compression.bare(50.0, 6.0)
    300.0
    """
    P_n = F_y * A_g
    return P_n


@formula("Eq. E3-1")
def gusset_buckling(F_cr, A_g):
    """Nominal compressive strength of a gusset's strip that buckles.

    Parameters
    ----------
    F_cr : critical stress. [ksi]
    A_g : gross area of the strip. [in²]

    Returns
    -------
    P_n : nominal strength. [kip]

    >>> gusset_buckling.bare(40.0, 6.0)
    240.0
    """
    P_n = F_cr * A_g
    return P_n
