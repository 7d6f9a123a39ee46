"""Limits of spacing and edge distance, and the strength that is available from a nominal one.  [AISC360] B3, J3.3 to J3.6."""

from ..formula import formula


@formula({"360-16": "J3.3", "360-22": "J3.4"})
def minimum_spacing(d_b):
    """Least distance between hole centres.

    Parameters
    ----------
    d_b : nominal bolt diameter. [in]

    Returns
    -------
    s_min : minimum spacing. [in]

    >>> minimum_spacing.bare(0.75)
    2.0
    """
    s_min = 8 / 3 * d_b
    return s_min


@formula({"360-16": "J3.5", "360-22": "J3.6"})
def maximum_spacing(t, s_0):
    """Greatest spacing along the member of plates in contact, painted or not exposed.

    Parameters
    ----------
    t : thickness of the thinner part. [in]
    s_0 : upper limit, 12 in. [in]

    Returns
    -------
    s_max : maximum spacing. [in]

    >>> maximum_spacing.bare(0.375, 12.0)
    9.0
    """
    s_max = min(24 * t, s_0)
    return s_max


@formula({"360-16": "J3.5", "360-22": "J3.6"})
def maximum_spacing_weathering(t, s_0):
    """Greatest spacing along the member of plates in contact, bare weathering steel outdoors.

    Parameters
    ----------
    t : thickness of the thinner part. [in]
    s_0 : upper limit, 7 in. [in]

    Returns
    -------
    s_max : maximum spacing. [in]

    >>> maximum_spacing_weathering.bare(0.375, 7.0)
    5.25
    """
    s_max = min(14 * t, s_0)
    return s_max


@formula({"360-16": "J3.5", "360-22": "J3.6"})
def maximum_edge_distance(t, e_0):
    """Greatest distance from a bolt to the nearest edge.

    Parameters
    ----------
    t : thickness of the part. [in]
    e_0 : upper limit, 6 in. [in]

    Returns
    -------
    e_max : maximum edge distance. [in]

    >>> maximum_edge_distance.bare(0.375, 6.0)
    4.5
    """
    e_max = min(12 * t, e_0)
    return e_max


@formula({"360-16": "J3.4, Table J3.5", "360-22": "J3.5, Table J3.5"})
def required_edge_distance(L_emin, C_2):
    """Edge distance that the hole used requires.

    Parameters
    ----------
    L_emin : minimum for a standard hole, Table J3.4. [in]
    C_2 : increment for an oversized hole or slot, Table J3.5. [in]

    Returns
    -------
    L_er : edge distance required. [in]

    >>> required_edge_distance.bare(1.0, 0.0625)
    1.0625
    """
    L_er = L_emin + C_2
    return L_er


@formula("statics")
def like_pieces(n_j, Q_n):
    """Strength of like joints or pieces that share the load.

    Parameters
    ----------
    n_j : number of joints or pieces. []
    Q_n : nominal strength of one. [kip]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> like_pieces.bare(2, 90.0)
    180.0
    """
    R_n = n_j * Q_n
    return R_n


@formula("B3.1")
def design_strength(phi, R_n):
    """Design strength, LRFD.

    Parameters
    ----------
    phi : resistance factor. []
    R_n : nominal strength. [kip]

    Returns
    -------
    R_d : design strength. [kip]

    >>> design_strength.bare(0.75, 100.0)
    75.0
    """
    R_d = phi * R_n
    return R_d


@formula("B3.2")
def allowable_strength(R_n, Omega):
    """Allowable strength, ASD.

    Parameters
    ----------
    R_n : nominal strength. [kip]
    Omega : safety factor. []

    Returns
    -------
    R_a : allowable strength. [kip]

    >>> allowable_strength.bare(100.0, 2.0)
    50.0
    """
    R_a = R_n / Omega
    return R_a


@formula("B3.1")
def design_axial_strength(phi, P_n):
    """Design axial strength, LRFD.

    Parameters
    ----------
    phi : resistance factor. []
    P_n : nominal axial strength. [kip]

    Returns
    -------
    P_d : design axial strength. [kip]

    >>> design_axial_strength.bare(0.75, 100.0)
    75.0
    """
    P_d = phi * P_n
    return P_d


@formula("B3.2")
def allowable_axial_strength(P_n, Omega):
    """Allowable axial strength, ASD.

    Parameters
    ----------
    P_n : nominal axial strength. [kip]
    Omega : safety factor. []

    Returns
    -------
    P_a : allowable axial strength. [kip]

    >>> allowable_axial_strength.bare(100.0, 2.0)
    50.0
    """
    P_a = P_n / Omega
    return P_a
