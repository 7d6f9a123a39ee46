"""Shear lag of bolted members: the cases of Table D3.1, the area ratio, eccentricities.  [AISC360] D3, Table D3.1."""

from ..formula import formula


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
