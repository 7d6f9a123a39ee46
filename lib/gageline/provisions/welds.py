"""Fillet welds and the base metal beside them: strength, effective length, limits of size and length.  [AISC360] J2.2, J2.4, J4.2."""

from ..formula import formula


@formula("J2.2a")
def throat(w_f):
    """Effective throat of a fillet weld with equal legs.

    Parameters
    ----------
    w_f : leg size of the fillet weld. [in]

    Returns
    -------
    t_e : effective throat. [in]

    >>> round(throat.bare(0.25), 4)
    0.1768
    """
    t_e = w_f / sqrt(2)
    return t_e


@formula("J2.2a")
def throat_of_effective_size(w_e):
    """Effective throat of a fillet weld with equal legs, of the leg size that counts.

    Parameters
    ----------
    w_e : effective leg size. [in]

    Returns
    -------
    t_e : effective throat. [in]

    >>> round(throat_of_effective_size.bare(0.25), 4)
    0.1768
    """
    t_e = w_e / sqrt(2)
    return t_e


@formula({"360-16": "J2.2b, Eq. J2-1", "360-22": "J2.2b(d), Eq. J2-1"})
def end_loaded_factor(l_w, w_f):
    """Factor on the length of an end-loaded longitudinal weld, of a length of 100 to 300 times its leg.

    Parameters
    ----------
    l_w : length of one weld line. [in]
    w_f : leg size of the fillet weld. [in]

    Returns
    -------
    beta_w : factor on the length of an end-loaded weld. []

    >>> round(end_loaded_factor.bare(27.0, 0.1875), 3), end_loaded_factor.bare(10.0, 0.25)
    (0.912, 1.0)
    """
    beta_w = min(1.0, 1.2 - 0.002 * (l_w / w_f))
    return beta_w


@formula({"360-16": "J2.2b", "360-22": "J2.2b(d)"})
def effective_length(beta_w, l_w):
    """Effective length of an end-loaded longitudinal weld.

    Parameters
    ----------
    beta_w : factor on the length of an end-loaded weld. []
    l_w : length of one weld line. [in]

    Returns
    -------
    l_we : effective length. [in]

    >>> effective_length.bare(0.9, 30.0)
    27.0
    """
    l_we = beta_w * l_w
    return l_we


@formula({"360-16": "J2.2b", "360-22": "J2.2b(d)"})
def effective_length_of_long_weld(w_f):
    """Effective length of an end-loaded longitudinal weld longer than 300 times its leg.

    Parameters
    ----------
    w_f : leg size of the fillet weld. [in]

    Returns
    -------
    l_we : effective length. [in]

    >>> effective_length_of_long_weld.bare(0.25)
    45.0
    """
    l_we = 180 * w_f
    return l_we


@formula("J2.2a")
def weld_area(n_w, t_e, l_we):
    """Effective area of like weld lines.

    Parameters
    ----------
    n_w : number of like weld lines. []
    t_e : effective throat. [in]
    l_we : effective length of one. [in]

    Returns
    -------
    A_we : effective area of the welds. [in²]

    >>> weld_area.bare(2, 0.25, 8.0)
    4.0
    """
    A_we = n_w * t_e * l_we
    return A_we


@formula("J2.2a")
def more_weld_area(A_we0, n_w, t_e, l_we):
    """Effective area of like weld lines, added to that of the lines before.

    Parameters
    ----------
    A_we0 : effective area of the weld lines before. [in²]
    n_w : number of like weld lines. []
    t_e : effective throat. [in]
    l_we : effective length of one. [in]

    Returns
    -------
    A_we : effective area of the welds so far. [in²]

    >>> more_weld_area.bare(4.0, 1, 0.25, 4.0)
    5.0
    """
    A_we = A_we0 + n_w * t_e * l_we
    return A_we


@formula("J2.4, Table J2.5")
def directional_factor(theta_ds):
    """Directional strength increase of a fillet weld loaded at an angle to its axis.

    Parameters
    ----------
    theta_ds : angle between the force and the axis of the weld. [rad]

    Returns
    -------
    k_ds : directional strength increase factor. []

    >>> round(directional_factor.bare(1.0471975511965976), 3), directional_factor.bare(0.0)
    (1.403, 1.0)
    """
    k_ds = 1.0 + 0.50 * sin(theta_ds)**1.5
    return k_ds


@formula("J2.4, Table J2.5")
def fillet_strength(F_EXX, A_we, k_ds):
    """Nominal strength of a fillet weld or of a linear weld group, the directional increase taken.

    Parameters
    ----------
    F_EXX : filler metal strength. [ksi]
    A_we : effective area of the welds. [in²]
    k_ds : directional strength increase factor, 1.0 where none is allowed. []

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> fillet_strength.bare(70.0, 2.0, 1.5)
    126.0
    """
    R_n = 0.60 * F_EXX * A_we * k_ds
    return R_n


@formula("J2.4, Table J2.5")
def longitudinal_strength(F_EXX, A_we):
    """Nominal strength of the longitudinal fillet welds of a group, without directional increase.

    Parameters
    ----------
    F_EXX : filler metal strength. [ksi]
    A_we : effective area of the welds. [in²]

    Returns
    -------
    R_wl : nominal strength of the longitudinal welds. [kip]

    >>> longitudinal_strength.bare(70.0, 2.0)
    84.0
    """
    R_wl = 0.60 * F_EXX * A_we
    return R_wl


@formula("J2.4, Table J2.5")
def transverse_strength(F_EXX, A_we):
    """Nominal strength of the transverse fillet welds of a group, without directional increase.

    Parameters
    ----------
    F_EXX : filler metal strength. [ksi]
    A_we : effective area of the welds. [in²]

    Returns
    -------
    R_wt : nominal strength of the transverse welds, no directional increase. [kip]

    >>> transverse_strength.bare(70.0, 1.0)
    42.0
    """
    R_wt = 0.60 * F_EXX * A_we
    return R_wt


@formula("J2.4(b)")
def group_strength(R_wl, R_wt):
    """Nominal strength of a concentrically loaded group of longitudinal and transverse fillet welds of one size.

    Parameters
    ----------
    R_wl : nominal strength of the longitudinal welds. [kip]
    R_wt : nominal strength of the transverse welds, no directional increase. [kip]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> group_strength.bare(100.0, 20.0), group_strength.bare(100.0, 50.0)
    (120.0, 160.0)
    """
    R_n = max(R_wl + R_wt, 0.85 * R_wl + 1.5 * R_wt)
    return R_n


@formula("Eq. J4-3")
def shear_yielding(F_y, A_gv):
    """Nominal strength of an element in shear when its gross section yields, as the base metal along a weld.

    Parameters
    ----------
    F_y : specified minimum yield stress. [ksi]
    A_gv : gross area subject to shear. [in²]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> shear_yielding.bare(50.0, 2.0)
    60.0
    """
    R_n = 0.60 * F_y * A_gv
    return R_n


@formula("Eq. J4-4")
def shear_rupture(F_u, A_nv):
    """Nominal strength of an element in shear when its net section ruptures, as the base metal along a weld.

    Parameters
    ----------
    F_u : specified minimum tensile strength. [ksi]
    A_nv : net area subject to shear. [in²]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> shear_rupture.bare(65.0, 5.0)
    195.0
    """
    R_n = 0.60 * F_u * A_nv
    return R_n


@formula("J4.2")
def net_area_without_holes(A_gv):
    """Net area subject to shear of an element without holes.

    Parameters
    ----------
    A_gv : gross area subject to shear. [in²]

    Returns
    -------
    A_nv : net area subject to shear. [in²]

    >>> net_area_without_holes.bare(2.5)
    2.5
    """
    A_nv = A_gv
    return A_nv


@formula({"360-16": "J2.2b", "360-22": "J2.2b(b)"})
def largest_fillet(t, delta_f):
    """Largest fillet along an edge of material 1/4 in. thick or more, the edge not built out.

    Parameters
    ----------
    t : thickness of the part at its edge. [in]
    delta_f : margin kept below the edge, 1/16 in. [in]

    Returns
    -------
    w_max : largest leg size. [in]

    >>> largest_fillet.bare(0.375, 0.0625)
    0.3125
    """
    w_max = t - delta_f
    return w_max


@formula({"360-16": "J2.2b", "360-22": "J2.2b(b)"})
def largest_fillet_of_thin_edge(t):
    """Largest fillet along an edge of material less than 1/4 in. thick.

    Parameters
    ----------
    t : thickness of the part at its edge. [in]

    Returns
    -------
    w_max : largest leg size. [in]

    >>> largest_fillet_of_thin_edge.bare(0.1875)
    0.1875
    """
    w_max = t
    return w_max


@formula({"360-16": "J2.2b", "360-22": "J2.2b(c)"})
def shortest_weld(w_f):
    """Least length of a fillet weld of which the full leg size counts in strength.

    Parameters
    ----------
    w_f : leg size of the fillet weld. [in]

    Returns
    -------
    l_min : least length. [in]

    >>> shortest_weld.bare(0.25)
    1.0
    """
    l_min = 4 * w_f
    return l_min


@formula({"360-16": "J2.2b", "360-22": "J2.2b(f)"})
def least_lap(t, l_0):
    """Least lap of a lap joint, by the thinner part.

    Parameters
    ----------
    t : thickness of the thinner part. [in]
    l_0 : lower limit, 1 in. [in]

    Returns
    -------
    l_lap : least lap. [in]

    >>> least_lap.bare(0.375, 1.0)
    1.875
    """
    l_lap = max(5 * t, l_0)
    return l_lap


@formula("J4.3")
def net_tension_area_without_holes(A_gt):
    """Net area subject to tension of a block without holes.

    Parameters
    ----------
    A_gt : gross area subject to tension. [in²]

    Returns
    -------
    A_nt : net area subject to tension. [in²]

    >>> net_tension_area_without_holes.bare(1.5)
    1.5
    """
    A_nt = A_gt
    return A_nt
