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


@formula("Table D3.1, case 2")
def shear_lag_case_2(x_bar, l):
    """Shear lag factor of a member connected through some of its elements.

    Parameters
    ----------
    x_bar : connection plane to the centroid of the part it serves. [in]
    l : length of the connection. [in]

    Returns
    -------
    U_2 : shear lag factor, case 2. []

    >>> shear_lag_case_2.bare(1.2, 12.0)
    0.9
    """
    U_2 = 1 - x_bar / l
    return U_2


@formula("Table D3.1, case 7")
def shear_lag_case_7_wide_flange():
    """Shear lag factor of a flange with three or more bolts in line and b_f at least two thirds of d.

    Returns
    -------
    U_7 : shear lag factor, case 7. []

    >>> shear_lag_case_7_wide_flange.bare()
    0.9
    """
    U_7 = 0.90
    return U_7


@formula("Table D3.1, case 7")
def shear_lag_case_7_narrow_flange():
    """Shear lag factor of a flange with three or more bolts in line and b_f less than two thirds of d.

    Returns
    -------
    U_7 : shear lag factor, case 7. []

    >>> shear_lag_case_7_narrow_flange.bare()
    0.85
    """
    U_7 = 0.85
    return U_7


@formula("Table D3.1, case 7")
def shear_lag_case_7_web():
    """Shear lag factor of a web with four or more bolts in line.

    Returns
    -------
    U_7 : shear lag factor, case 7. []

    >>> shear_lag_case_7_web.bare()
    0.7
    """
    U_7 = 0.70
    return U_7


@formula("Table D3.1, case 8")
def shear_lag_case_8_four_bolts():
    """Shear lag factor of an angle with four or more bolts in line.

    Returns
    -------
    U_8 : shear lag factor, case 8. []

    >>> shear_lag_case_8_four_bolts.bare()
    0.8
    """
    U_8 = 0.80
    return U_8


@formula("Table D3.1, case 8")
def shear_lag_case_8_three_bolts():
    """Shear lag factor of an angle with three bolts in line.

    Returns
    -------
    U_8 : shear lag factor, case 8. []

    >>> shear_lag_case_8_three_bolts.bare()
    0.6
    """
    U_8 = 0.60
    return U_8


@formula("Table D3.1, case 1")
def shear_lag_case_1():
    """Shear lag factor where the load goes directly into every element.

    Returns
    -------
    U : shear lag factor. []

    >>> shear_lag_case_1.bare()
    1.0
    """
    U = 1.0
    return U


@formula("D3")
def connected_area_ratio(A_c, A_g):
    """Value below which the shear lag factor of an open section need not be taken.

    Parameters
    ----------
    A_c : gross area of the directly connected elements. [in²]
    A_g : gross area of the member. [in²]

    Returns
    -------
    U_A : area ratio. []

    >>> connected_area_ratio.bare(3.0, 6.0)
    0.5
    """
    U_A = A_c / A_g
    return U_A


@formula("D3")
def largest_of_ratio_only(U_A):
    """Shear lag factor where no case of the table applies and the area ratio stands alone.

    Parameters
    ----------
    U_A : ratio of connected to gross area. []

    Returns
    -------
    U : shear lag factor. []

    >>> largest_of_ratio_only.bare(0.5)
    0.5
    """
    U = min(1, U_A)
    return U


@formula("D3")
def largest_of_case_2(U_2, U_A):
    """Shear lag factor: the larger of case 2 and the area ratio.

    Parameters
    ----------
    U_2 : shear lag factor, case 2. []
    U_A : ratio of connected to gross area. []

    Returns
    -------
    U : shear lag factor. []

    >>> largest_of_case_2.bare(0.7, 0.5)
    0.7
    """
    U = max(U_2, U_A)
    return U


@formula("D3")
def largest_of_cases_2_and_7(U_2, U_7, U_A):
    """Shear lag factor: the larger of cases 2 and 7 is permitted, and the area ratio.

    Parameters
    ----------
    U_2 : shear lag factor, case 2. []
    U_7 : shear lag factor, case 7. []
    U_A : ratio of connected to gross area. []

    Returns
    -------
    U : shear lag factor. []

    >>> largest_of_cases_2_and_7.bare(0.84, 0.9, 0.46)
    0.9
    """
    U = max(U_2, U_7, U_A)
    return U


@formula("D3")
def largest_of_cases_2_and_8(U_2, U_8, U_A):
    """Shear lag factor: the larger of cases 2 and 8 is permitted, and the area ratio.

    Parameters
    ----------
    U_2 : shear lag factor, case 2. []
    U_8 : shear lag factor, case 8. []
    U_A : ratio of connected to gross area. []

    Returns
    -------
    U : shear lag factor. []

    >>> largest_of_cases_2_and_8.bare(0.87, 0.8, 0.5)
    0.87
    """
    U = max(U_2, U_8, U_A)
    return U


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


@formula("Commentary D3")
def eccentricity_of_half_section(d, Z_x, A_g):
    """Distance from a flange's outer face to the centroid of half the section, for a W connected by both flanges.

    Parameters
    ----------
    d : depth of the section. [in]
    Z_x : plastic section modulus about the strong axis. [in³]
    A_g : gross area. [in²]

    Returns
    -------
    x_bar : eccentricity. [in]

    >>> eccentricity_of_half_section.bare(10.0, 30.0, 10.0)
    2.0
    """
    x_bar = d / 2 - Z_x / A_g
    return x_bar


@formula("Commentary D3")
def eccentricity_of_split_web(Z_y, A_g):
    """Distance from mid-web to the centroid of half the section, for a W connected by its web.

    Parameters
    ----------
    Z_y : plastic section modulus about the weak axis. [in³]
    A_g : gross area. [in²]

    Returns
    -------
    x_bar : eccentricity. [in]

    >>> eccentricity_of_split_web.bare(15.0, 10.0)
    1.5
    """
    x_bar = Z_y / A_g
    return x_bar


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
