"""Tensile strength of a member: net area, shear lag, yielding and rupture.  [AISC360] B4.3, D2, D3, Table D3.1."""

from ..formula import formula


@formula("B4.3b")
def hole_width(d_h, delta_h):
    """Width deducted for one hole: its nominal dimension and the allowance for damage round it.

    Parameters
    ----------
    d_h : nominal dimension of the hole in the direction considered. [in]
    delta_h : allowance, 1/16 in. [in]

    Returns
    -------
    d_n : width deducted. [in]

    >>> hole_width.bare(0.8125, 0.0625)
    0.875
    """
    d_n = d_h + delta_h
    return d_n


@formula("B4.3b")
def hole_loss(A_h0, n_h, d_n, t):
    """Area lost to like holes of a chain, added to what other holes of the chain take.

    Parameters
    ----------
    A_h0 : area lost to the holes before. [in²]
    n_h : number of like holes. []
    d_n : width deducted for one. [in]
    t : thickness of the element they are in. [in]

    Returns
    -------
    A_h : area lost so far. [in²]

    >>> hole_loss.bare(0.0, 2, 0.875, 0.5)
    0.875
    """
    A_h = A_h0 + n_h * d_n * t
    return A_h


@formula("B4.3b")
def first_hole_loss(n_h, d_n, t):
    """Area lost to the like holes of a chain.

    Parameters
    ----------
    n_h : number of holes. []
    d_n : width deducted for one. [in]
    t : thickness of the element they are in. [in]

    Returns
    -------
    A_h : area lost. [in²]

    >>> first_hole_loss.bare(4, 0.875, 0.5)
    1.75
    """
    A_h = n_h * d_n * t
    return A_h


@formula("B4.3b")
def diagonal_credit(n_z, s, g, t):
    """Area credited for like diagonals of a chain, s²/4g each.

    Parameters
    ----------
    n_z : number of like diagonals. []
    s : pitch between the two holes. [in]
    g : gage between the two holes. [in]
    t : thickness of the element. [in]

    Returns
    -------
    A_s : area credited. [in²]

    >>> round(diagonal_credit.bare(2, 3.0, 5.0, 1.0), 3)
    0.9
    """
    A_s = n_z * s**2 / (4 * g) * t
    return A_s


@formula("B4.3b")
def more_diagonal_credit(A_s0, n_z, s, g, t):
    """Area credited for like diagonals of a chain, added to that of other diagonals of the chain.

    Parameters
    ----------
    A_s0 : area credited for the diagonals before. [in²]
    n_z : number of like diagonals. []
    s : pitch between the two holes. [in]
    g : gage between the two holes. [in]
    t : thickness of the element. [in]

    Returns
    -------
    A_s : area credited so far. [in²]

    >>> more_diagonal_credit.bare(1.0, 1, 2.0, 4.0, 0.5)
    1.125
    """
    A_s = A_s0 + n_z * s**2 / (4 * g) * t
    return A_s


@formula("B4.3b")
def net_area_straight(A_g, A_h):
    """Net area on a chain straight across.

    Parameters
    ----------
    A_g : gross area. [in²]
    A_h : area lost to holes. [in²]

    Returns
    -------
    A_n : net area. [in²]

    >>> net_area_straight.bare(6.0, 1.0)
    5.0
    """
    A_n = A_g - A_h
    return A_n


@formula("B4.3b")
def net_area_zigzag(A_g, A_h, A_s):
    """Net area on a chain with diagonals.

    Parameters
    ----------
    A_g : gross area. [in²]
    A_h : area lost to holes. [in²]
    A_s : area credited for the diagonals. [in²]

    Returns
    -------
    A_n : net area. [in²]

    >>> net_area_zigzag.bare(7.0, 1.75, 0.5)
    5.75
    """
    A_n = A_g - A_h + A_s
    return A_n


@formula("Eq. D3-1")
def effective_net_area(A_n, U):
    """Effective net area.

    Parameters
    ----------
    A_n : net area. [in²]
    U : shear lag factor. []

    Returns
    -------
    A_e : effective net area. [in²]

    >>> effective_net_area.bare(5.0, 0.9)
    4.5
    """
    A_e = A_n * U
    return A_e


@formula("Eq. D2-1")
def gross_yielding(F_y, A_g):
    """Nominal strength in tension when the gross section yields.

    Parameters
    ----------
    F_y : specified minimum yield stress. [ksi]
    A_g : gross area, holes not deducted. [in²]

    Returns
    -------
    P_n : nominal axial strength. [kip]

    >>> gross_yielding.bare(50.0, 10.0)
    500.0
    """
    P_n = F_y * A_g
    return P_n


@formula("Eq. D2-2")
def net_rupture(F_u, A_e):
    """Nominal strength in tension when the net section ruptures.

    Parameters
    ----------
    F_u : specified minimum tensile strength. [ksi]
    A_e : effective net area. [in²]

    Returns
    -------
    P_n : nominal axial strength. [kip]

    >>> net_rupture.bare(65.0, 8.0)
    520.0
    """
    P_n = F_u * A_e
    return P_n


@formula("common practice")
def load_share(n, n_a):
    """Share of the load that a chain behind the lead row still carries, every bolt taking an equal part.

    Parameters
    ----------
    n : number of bolts of the joint. []
    n_a : number of bolts ahead of the chain. []

    Returns
    -------
    xi : share of the load left. []

    >>> load_share.bare(8, 2)
    0.75
    """
    xi = (n - n_a) / n
    return xi


@formula("Eq. D2-2, share of load")
def net_rupture_behind_lead_row(F_u, A_e, xi):
    """Nominal strength, referred to the whole load, when a chain behind the lead row ruptures.

    Parameters
    ----------
    F_u : specified minimum tensile strength. [ksi]
    A_e : effective net area on the chain. [in²]
    xi : share of the load left at the chain. []

    Returns
    -------
    P_n : nominal axial strength. [kip]

    >>> net_rupture_behind_lead_row.bare(65.0, 6.0, 0.75)
    520.0
    """
    P_n = F_u * A_e / xi
    return P_n


@formula("User Note D1")
def slenderness(L_b, r):
    """Slenderness ratio of the member.

    Parameters
    ----------
    L_b : length considered. [in]
    r : least radius of gyration. [in]

    Returns
    -------
    lam : slenderness ratio. []

    >>> slenderness.bare(240.0, 1.0)
    240.0
    """
    lam = L_b / r
    return lam
