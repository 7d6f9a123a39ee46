"""Stem of a hanger under a pull that may be inclined: combined stresses, and where its edges cut the width of spread."""

from ..formula import formula


@formula("J4.1, J4.2, ellipse")
def stem_yielding_inclined(F_y, A_g, psi, k_d, L_f):
    """Nominal strength along an inclined pull of a stem that yields at its flange in tension, bending and shear.

    Parameters
    ----------
    F_y : specified minimum yield stress. [ksi]
    A_g : gross area of the stem along the flange. [in²]
    psi : angle between the pull and the axes of the bolts. [rad]
    k_d : outer face of the flange to the web toe of the fillet, as designed. [in]
    L_f : length of the fitting along the beam. [in]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> round(stem_yielding_inclined.bare(50.0, 3.0, 0.5235987755982988, 1.0, 10.0), 2)
    110.86
    """
    k_n = cos(psi) + 4 * sin(psi) * k_d / L_f
    k_v = sin(psi) / 0.60
    R_n = F_y * A_g / sqrt(k_n**2 + k_v**2)
    return R_n


@formula("J4.1, J4.2, ellipse")
def stem_rupture_inclined(F_u, A_n, psi, k_d, L_f):
    """Nominal strength along an inclined pull of a stem that ruptures at its flange in tension, bending and shear.

    Parameters
    ----------
    F_u : specified minimum tensile strength. [ksi]
    A_n : net area of the stem along the flange. [in²]
    psi : angle between the pull and the axes of the bolts. [rad]
    k_d : outer face of the flange to the web toe of the fillet, as designed. [in]
    L_f : length of the fitting along the beam. [in]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> round(stem_rupture_inclined.bare(65.0, 3.0, 0.5235987755982988, 1.0, 10.0), 2)
    144.11
    """
    k_n = cos(psi) + 4 * sin(psi) * k_d / L_f
    k_v = sin(psi) / 0.60
    R_n = F_u * A_n / sqrt(k_n**2 + k_v**2)
    return R_n


@formula("geometry")
def depth_of_last_row(d, l_e, l, psi):
    """Face of the fitting on the beam to the last row at the stem, or to the end of the welds, on the axis of the pull.

    Parameters
    ----------
    d : depth of the fitting. [in]
    l_e : lead row, or start of the welds, to the free edge of the stem, along the pull. [in]
    l : length of the joint at the stem. [in]
    psi : angle between the pull and the axes of the bolts. [rad]

    Returns
    -------
    h_s : face on the beam to the last row. [in]

    >>> round(depth_of_last_row.bare(8.0, 1.0, 3.0, 1.0471975511965976), 6)
    6.0
    """
    h_s = d - (l_e + l) * cos(psi)
    return h_s


@formula("geometry")
def edge_beside_pull(L_f, h_s, psi, d):
    """Axis of an inclined pull to the side of the stem from which it leans away, or to the stem's free edge, across the pull.

    Parameters
    ----------
    L_f : length of the fitting along the beam. [in]
    h_s : face on the beam to the last row. [in]
    psi : angle between the pull and the axes of the bolts. [rad]
    d : depth of the fitting. [in]

    Returns
    -------
    c_e1 : distance. [in]

    >>> round(edge_beside_pull.bare(10.0, 3.0, 0.5235987755982988, 8.0), 4)
    7.7735
    """
    c_e1 = min((L_f / 2 + h_s * tan(psi)) / cos(psi), (d - h_s) / sin(psi))
    return c_e1


@formula("geometry")
def edge_towards_pull(L_f, h_s, psi, k_d):
    """Axis of an inclined pull to the side of the stem towards which it leans, or to the fitting's flange, across the pull.

    Parameters
    ----------
    L_f : length of the fitting along the beam. [in]
    h_s : face on the beam to the last row. [in]
    psi : angle between the pull and the axes of the bolts. [rad]
    k_d : outer face of the flange to the web toe of the fillet, as designed. [in]

    Returns
    -------
    c_e2 : distance. [in]

    >>> round(edge_towards_pull.bare(10.0, 3.0, 0.5235987755982988, 1.0), 4)
    3.7735
    """
    c_e2 = min((L_f / 2 - h_s * tan(psi)) / cos(psi), (h_s - k_d) / sin(psi))
    return c_e2


@formula("Whitmore")
def width_on_stem(L_w, L_f):
    """Width of the stem that counts: the spread, at most the length of the fitting.

    Parameters
    ----------
    L_w : Whitmore width, edges not regarded. [in]
    L_f : length of the fitting along the beam. [in]

    Returns
    -------
    w : width that counts. [in]

    >>> width_on_stem.bare(7.5, 9.0)
    7.5
    """
    w = min(L_w, L_f)
    return w


@formula("Whitmore")
def width_between_edges(L_w, c_e1, c_e2):
    """Width of the stem across the pull that counts: half the spread on each side, at most up to the stem's edge.

    Parameters
    ----------
    L_w : Whitmore width, edges not regarded. [in]
    c_e1 : axis of the pull to one edge of the stem, across the pull. [in]
    c_e2 : axis of the pull to the other edge of the stem, across the pull. [in]

    Returns
    -------
    w : width that counts. [in]

    >>> width_between_edges.bare(8.0, 4.5, 3.0)
    7.0
    """
    w = min(L_w / 2, c_e1) + min(L_w / 2, c_e2)
    return w
