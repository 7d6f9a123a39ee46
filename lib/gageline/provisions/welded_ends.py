"""Welded ends of tension members: net area and shear lag with welds, lengths that balance, centroid of the welds.  [AISC360] D3, J1.7."""

from ..formula import formula


@formula("D3, Commentary")
def mean_weld_length(l_1, l_2):
    """Length of the connection with longitudinal welds of two lengths: their mean.

    Parameters
    ----------
    l_1 : length of the weld along the heel or the lower edge. [in]
    l_2 : length of the weld along the toe or the upper edge. [in]

    Returns
    -------
    l : length of the connection. [in]

    >>> mean_weld_length.bare(8.0, 4.0)
    6.0
    """
    l = (l_1 + l_2) / 2
    return l


@formula("B4.3b")
def net_area_of_unholed_member(A_g):
    """Net area of a member that has no holes.

    Parameters
    ----------
    A_g : gross area. [in²]

    Returns
    -------
    A_n : net area. [in²]

    >>> net_area_of_unholed_member.bare(3.0)
    3.0
    """
    A_n = A_g
    return A_n


@formula("Table D3.1, case 3")
def net_area_case_3(A_c):
    """Net area of a member with transverse welds only: the area of the directly connected elements.

    Parameters
    ----------
    A_c : gross area of the directly connected elements. [in²]

    Returns
    -------
    A_n : net area. [in²]

    >>> net_area_case_3.bare(4.216)
    4.216
    """
    A_n = A_c
    return A_n


@formula("Table D3.1, case 3")
def shear_lag_case_3():
    """Shear lag factor with transverse welds only.

    Returns
    -------
    U : shear lag factor. []

    >>> shear_lag_case_3.bare()
    1.0
    """
    U = 1.0
    return U


@formula("Table D3.1, case 4")
def shear_lag_case_4(l, w, x_bar):
    """Shear lag factor of a section with longitudinal welds only.

    Parameters
    ----------
    l : length of the connection, the mean of the two welds. [in]
    w : width of the connected element. [in]
    x_bar : connection plane to the centroid of the part it serves. [in]

    Returns
    -------
    U_4 : shear lag factor, case 4. []

    >>> round(shear_lag_case_4.bare(16.0, 8.01, 1.09), 3)
    0.86
    """
    U_4 = 3 * l**2 / (3 * l**2 + w**2) * (1 - x_bar / l)
    return U_4


@formula("Table D3.1, case 4")
def shear_lag_case_4_plate(l, w):
    """Shear lag factor of a plate with longitudinal welds only.

    Parameters
    ----------
    l : length of the connection, the mean of the two welds. [in]
    w : width of the plate. [in]

    Returns
    -------
    U : shear lag factor. []

    >>> shear_lag_case_4_plate.bare(6.0, 6.0)
    0.75
    """
    U = 3 * l**2 / (3 * l**2 + w**2)
    return U


@formula("D3")
def largest_of_case_4(U_4, U_A):
    """Shear lag factor: the larger of case 4 and the area ratio.

    Parameters
    ----------
    U_4 : shear lag factor, case 4. []
    U_A : ratio of connected to gross area. []

    Returns
    -------
    U : shear lag factor. []

    >>> largest_of_case_4.bare(0.7, 0.5)
    0.7
    """
    U = max(U_4, U_A)
    return U


@formula("statics, J1.7")
def balanced_toe_length(l_T, y_c, g_w, l_t):
    """Length of the weld along the toe that puts the centroid of all welds on the centroid of the member, every inch loaded alike.

    Parameters
    ----------
    l_T : total length of the welds of one piece. [in]
    y_c : centroid of the member from the weld along its heel. [in]
    g_w : distance between the longitudinal welds. [in]
    l_t : length of one transverse weld. [in]

    Returns
    -------
    l_2 : length of the weld along the toe or the upper edge. [in]

    >>> balanced_toe_length.bare(12.0, 1.0, 4.0, 0.0), balanced_toe_length.bare(16.0, 1.0, 4.0, 4.0)
    (3.0, 2.0)
    """
    l_2 = l_T * y_c / g_w - l_t / 2
    return l_2


@formula("statics, J1.7")
def balanced_heel_length(l_T, l_2, l_t):
    """Length of the weld along the heel: what the toe and the end leave of the total.

    Parameters
    ----------
    l_T : total length of the welds of one piece. [in]
    l_2 : length of the weld along the toe or the upper edge. [in]
    l_t : length of one transverse weld. [in]

    Returns
    -------
    l_1 : length of the weld along the heel or the lower edge. [in]

    >>> balanced_heel_length.bare(12.0, 3.0, 0.0)
    9.0
    """
    l_1 = l_T - l_2 - l_t
    return l_1


@formula("statics")
def centroid_of_welds(l_1, l_2, l_t, g_w):
    """Centroid of longitudinal welds and one across the end, every inch counted alike, from the weld along the heel.

    Parameters
    ----------
    l_1 : length of the weld along the heel or the lower edge. [in]
    l_2 : length of the weld along the toe or the upper edge. [in]
    l_t : length of one transverse weld. [in]
    g_w : distance between the longitudinal welds. [in]

    Returns
    -------
    y_w : centroid of the welds from the weld along the heel. [in]

    >>> centroid_of_welds.bare(9.0, 3.0, 0.0, 4.0), centroid_of_welds.bare(10.0, 2.0, 4.0, 4.0)
    (1.0, 1.0)
    """
    y_w = (l_2 * g_w + l_t * g_w / 2) / (l_1 + l_2 + l_t)
    return y_w


@formula("statics, J2.4")
def sum_of_strengths(R_wl, R_wt):
    """Nominal strength of longitudinal and transverse welds of a group that is not loaded through its centroid: their plain sum.

    Parameters
    ----------
    R_wl : nominal strength of the longitudinal welds. [kip]
    R_wt : nominal strength of the transverse welds, no directional increase. [kip]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> sum_of_strengths.bare(100.0, 50.0)
    150.0
    """
    R_n = R_wl + R_wt
    return R_n
