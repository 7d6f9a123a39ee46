"""Splices: the share of the member's load that a group of plates and bolts carries."""

from ..formula import formula


@formula("statics, load shared by areas")
def share_by_area(A_c, A_g):
    """Share of the member's load that enters through a part of its section.

    Parameters
    ----------
    A_c : gross area of the directly connected elements. [in²]
    A_g : gross area of the member. [in²]

    Returns
    -------
    xi_g : share of the member's load carried by the group. []

    >>> share_by_area.bare(3.0, 4.0)
    0.75
    """
    xi_g = A_c / A_g
    return xi_g


@formula("statics, load shared by areas")
def referred_to_member(Q_n, xi_g):
    """Strength of a group, referred to the whole load of the member.

    Parameters
    ----------
    Q_n : nominal strength of the group. [kip]
    xi_g : share of the member's load carried by the group. []

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> referred_to_member.bare(90.0, 0.75)
    120.0
    """
    R_n = Q_n / xi_g
    return R_n


@formula("geometry")
def flanges_area(b_f, t_f):
    """Area of both flanges of a W shape.

    Parameters
    ----------
    b_f : width of the flange. [in]
    t_f : thickness of the flange. [in]

    Returns
    -------
    A_c : gross area of the directly connected elements. [in²]

    >>> flanges_area.bare(8.0, 0.5)
    8.0
    """
    A_c = 2 * b_f * t_f
    return A_c


@formula("geometry")
def rest_of_section(A_g, b_f, t_f):
    """Area of a W shape beside its flanges, counted to the web.

    Parameters
    ----------
    A_g : gross area of the member. [in²]
    b_f : width of the flange. [in]
    t_f : thickness of the flange. [in]

    Returns
    -------
    A_c : gross area of the directly connected elements. [in²]

    >>> rest_of_section.bare(11.0, 8.0, 0.5)
    3.0
    """
    A_c = A_g - 2 * b_f * t_f
    return A_c


@formula("geometry")
def free_length_at_joint(e_m, g_j):
    """Length of a splice plate between the last rows of bolts on either side of the joint.

    Parameters
    ----------
    e_m : last row of bolts to the end of the member. [in]
    g_j : gap between the ends of the members. [in]

    Returns
    -------
    L_b : length considered for buckling. [in]

    >>> free_length_at_joint.bare(1.5, 0.5)
    3.5
    """
    L_b = 2 * e_m + g_j
    return L_b
