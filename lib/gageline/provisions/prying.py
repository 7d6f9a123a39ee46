"""Geometry of prying action: lever arms and the length of fitting tributary to a bolt.  Strength: prying_strength.py.

The model is that of the AISC Manual, Part 9. Its limit on the tributary length differs by edition: the 16th takes at most 1.75 b on
each side of the bolt (as its design example II.D-1 does), for the 15th 2 b in total is used, from memory.
"""

from ..formula import formula

_PART9 = "Manual Part 9"
_TRIBUTARY = {"360-16": "Manual, 15th ed.", "360-22": "Manual, 16th ed."}


@formula(_PART9)
def lever_arm_of_tee(g, t):
    """Distance from a bolt to the face of the stem or web beside it.

    Parameters
    ----------
    g : gage of the two bolt lines. [in]
    t : thickness of the stem or web between them. [in]

    Returns
    -------
    b_q : bolt centre to the face. [in]

    >>> lever_arm_of_tee.bare(3.5, 0.3)
    1.6
    """
    b_q = (g - t) / 2
    return b_q


@formula(_PART9)
def lever_arm_of_angle(g, g_a, t):
    """Distance from a bolt in the leg of a double angle to the centre line of the other leg.

    Parameters
    ----------
    g : gage of the two bolt lines. [in]
    g_a : clear distance between the two angles. [in]
    t : thickness of an angle. [in]

    Returns
    -------
    b_q : bolt centre to the centre line of the leg. [in]

    >>> lever_arm_of_angle.bare(5.5, 0.5, 0.5)
    2.25
    """
    b_q = (g - g_a - t) / 2
    return b_q


@formula(_PART9)
def edge_beyond_bolt(w, g):
    """Distance from a bolt to the edge of the flange, where the narrower flange ends.

    Parameters
    ----------
    w : width of the narrower flange. [in]
    g : gage of the two bolt lines. [in]

    Returns
    -------
    a_q : bolt centre to the edge. [in]

    >>> edge_beyond_bolt.bare(6.5, 3.5)
    1.5
    """
    a_q = (w - g) / 2
    return a_q


@formula(_PART9)
def reduced_lever_arm(b_q, d_b):
    """Lever arm of the bolt, from its near side.

    Parameters
    ----------
    b_q : bolt centre to the face of the stem. [in]
    d_b : nominal bolt diameter. [in]

    Returns
    -------
    b_qr : lever arm used. [in]

    >>> reduced_lever_arm.bare(1.6, 0.75)
    1.225
    """
    b_qr = b_q - d_b / 2
    return b_qr


@formula(_PART9)
def reduced_edge(a_q, b_q, d_b):
    """Lever arm of the prying force; the edge distance counts up to 1.25 times the bolt's distance from the stem.

    Parameters
    ----------
    a_q : bolt centre to the edge. [in]
    b_q : bolt centre to the face of the stem. [in]
    d_b : nominal bolt diameter. [in]

    Returns
    -------
    a_qr : lever arm of the prying force. [in]

    >>> reduced_edge.bare(1.53, 1.6, 0.75), reduced_edge.bare(3.0, 1.6, 0.75)
    (1.905, 2.375)
    """
    a_qr = min(a_q + d_b / 2, 1.25 * b_q + d_b / 2)
    return a_qr


@formula(_PART9)
def lever_ratio(b_qr, a_qr):
    """Ratio of the two lever arms.

    Parameters
    ----------
    b_qr : lever arm of the bolt. [in]
    a_qr : lever arm of the prying force. [in]

    Returns
    -------
    rho_q : ratio. []

    >>> round(lever_ratio.bare(1.225, 1.905), 4)
    0.643
    """
    rho_q = b_qr / a_qr
    return rho_q


@formula(_TRIBUTARY)
def tributary_of_single_row(l_q, b_q):
    """Length of fitting tributary to each bolt of a single row: on each side the distance to the end, at most 1.75 b.

    Parameters
    ----------
    l_q : bolt to the end of the fitting. [in]
    b_q : bolt centre to the face of the stem. [in]

    Returns
    -------
    p_q : tributary length. [in]

    >>> tributary_of_single_row.bare(2.0, 1.6)
    4.0
    """
    p_q = 2 * min(l_q, 1.75 * b_q)
    return p_q


@formula(_TRIBUTARY)
def tributary_of_end_row(l_q, s, b_q):
    """Length of fitting tributary to a bolt of an end row: end and half the spacing, at most 1.75 b each, and the spacing.

    Parameters
    ----------
    l_q : bolt to the end of the fitting. [in]
    s : spacing of the rows. [in]
    b_q : bolt centre to the face of the stem. [in]

    Returns
    -------
    p_q : tributary length. [in]

    >>> tributary_of_end_row.bare(2.0, 5.0, 1.6)
    4.5
    """
    p_q = min(min(l_q, 1.75 * b_q) + min(s / 2, 1.75 * b_q), s)
    return p_q


@formula(_TRIBUTARY)
def tributary_of_inner_row(s, b_q):
    """Length of fitting tributary to a bolt between two others: half the spacing on each side, at most 1.75 b.

    Parameters
    ----------
    s : spacing of the rows. [in]
    b_q : bolt centre to the face of the stem. [in]

    Returns
    -------
    p_q : tributary length. [in]

    >>> tributary_of_inner_row.bare(3.0, 1.6), round(tributary_of_inner_row.bare(6.0, 1.6), 6)
    (3.0, 5.6)
    """
    p_q = 2 * min(s / 2, 1.75 * b_q)
    return p_q


@formula(_TRIBUTARY)
def earlier_tributary_of_single_row(l_q, b_q):
    """Length of fitting tributary to each bolt of a single row by the earlier rule: at most 2 b in total.

    Parameters
    ----------
    l_q : bolt to the end of the fitting. [in]
    b_q : bolt centre to the face of the stem. [in]

    Returns
    -------
    p_q : tributary length. [in]

    >>> earlier_tributary_of_single_row.bare(2.0, 1.6)
    3.2
    """
    p_q = min(2 * l_q, 2 * b_q)
    return p_q


@formula(_TRIBUTARY)
def earlier_tributary_of_end_row(l_q, s, b_q):
    """Length of fitting tributary to a bolt of an end row by the earlier rule: at most 2 b in total, and the spacing.

    Parameters
    ----------
    l_q : bolt to the end of the fitting. [in]
    s : spacing of the rows. [in]
    b_q : bolt centre to the face of the stem. [in]

    Returns
    -------
    p_q : tributary length. [in]

    >>> earlier_tributary_of_end_row.bare(2.0, 5.0, 1.6), earlier_tributary_of_end_row.bare(1.5, 3.0, 1.6)
    (3.2, 3.0)
    """
    p_q = min(l_q + s / 2, s, 2 * b_q)
    return p_q


@formula(_TRIBUTARY)
def earlier_tributary_of_inner_row(s, b_q):
    """Length of fitting tributary to a bolt between two others by the earlier rule: the spacing, at most 2 b.

    Parameters
    ----------
    s : spacing of the rows. [in]
    b_q : bolt centre to the face of the stem. [in]

    Returns
    -------
    p_q : tributary length. [in]

    >>> earlier_tributary_of_inner_row.bare(3.0, 1.6)
    3.0
    """
    p_q = min(s, 2 * b_q)
    return p_q


@formula(_PART9)
def share_between_holes(d_q, p_q):
    """Net over gross section along the bolt line.

    Parameters
    ----------
    d_q : width of the hole along the fitting. [in]
    p_q : tributary length. [in]

    Returns
    -------
    delta_q : ratio. []

    >>> round(share_between_holes.bare(0.8125, 4.5), 4)
    0.8194
    """
    delta_q = 1 - d_q / p_q
    return delta_q


@formula("published yield line")
def yield_line_length(s, n, b_q, a_q):
    """Length of a continuous flange tributary to one bolt of a line, by yield lines.

    Parameters
    ----------
    s : spacing of the rows. [in]
    n : number of bolts in the line. []
    b_q : bolt centre to the face of the web. [in]
    a_q : bolt centre to the edge. [in]

    Returns
    -------
    p_q : tributary length. [in]

    >>> round(yield_line_length.bare(3.0, 7, 2.5, 4.5), 3)
    4.979
    """
    p_q = (s * (n - 1) + pi * b_q + 2 * a_q) / n
    return p_q
