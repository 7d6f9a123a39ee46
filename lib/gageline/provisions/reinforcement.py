"""Plates that reinforce the net section of a slotted tube, and their welds.  [AISC360] D3, Table D3.1, J2.4."""

from ..formula import formula


@formula("geometry")
def round_wall_distance(R_o, t_p):
    """Distance from the outside of a round tube, at right angles to the gusset, to the near face of the gusset.

    Parameters
    ----------
    R_o : outside radius. [in]
    t_p : thickness of the gusset. [in]

    Returns
    -------
    b_w : distance. [in]

    >>> round_wall_distance.bare(3.0, 0.5)
    2.75
    """
    b_w = R_o - t_p / 2
    return b_w


@formula("geometry")
def half_width(B):
    """Distance from the outside of a rectangular tube's wall to the middle plane of the gusset.

    Parameters
    ----------
    B : overall width. [in]

    Returns
    -------
    b_w : distance. [in]

    >>> half_width.bare(4.0)
    2.0
    """
    b_w = B / 2
    return b_w


@formula("geometry")
def half_diameter(D):
    """Distance from the outside of a round tube, at right angles to the gusset, to the middle plane of the gusset.

    Parameters
    ----------
    D : outside diameter. [in]

    Returns
    -------
    b_w : distance. [in]

    >>> half_diameter.bare(6.0)
    3.0
    """
    b_w = D / 2
    return b_w


@formula("geometry")
def reinforcement_area(n_j, w_r, t_r):
    """Gross area of like reinforcing plates.

    Parameters
    ----------
    n_j : number of plates. []
    w_r : width of one. [in]
    t_r : thickness of one. [in]

    Returns
    -------
    A_r : area of the reinforcing plates. [in²]

    >>> reinforcement_area.bare(2, 3.0, 0.5)
    3.0
    """
    A_r = n_j * w_r * t_r
    return A_r


@formula("Table D3.1, case 4")
def effective_reinforcement(l_r, w_r, A_r):
    """Effective area of reinforcing plates that longitudinal welds connect on each side of the net section.

    Parameters
    ----------
    l_r : length of the welds on one side of the net section. [in]
    w_r : width of one plate. [in]
    A_r : area of the plates. [in²]

    Returns
    -------
    A_re : effective area of the reinforcing plates. [in²]

    >>> effective_reinforcement.bare(4.0, 4.0, 2.0)
    1.5
    """
    U_r = 3 * l_r**2 / (3 * l_r**2 + w_r**2)
    A_re = U_r * A_r
    return A_re


@formula("geometry")
def reinforced_net_area(A_ns, A_re):
    """Net area of a tube with reinforcing plates.

    Parameters
    ----------
    A_ns : net area of the tube alone. [in²]
    A_re : effective area of the reinforcing plates. [in²]

    Returns
    -------
    A_n : net area. [in²]

    >>> reinforced_net_area.bare(7.0, 1.5)
    8.5
    """
    A_n = A_ns + A_re
    return A_n


@formula("geometry")
def distance_of_reinforcement(b_w, t_r):
    """Distance from the plane that eccentricities are measured from to the middle of a reinforcing plate.

    Parameters
    ----------
    b_w : distance to the outside of the wall. [in]
    t_r : thickness of the plate. [in]

    Returns
    -------
    x_r : distance. [in]

    >>> distance_of_reinforcement.bare(1.75, 0.5)
    2.0
    """
    x_r = b_w + t_r / 2
    return x_r


@formula("geometry, Commentary D3")
def reinforced_eccentricity(A_ns, x_t, A_r, x_r):
    """Eccentricity of half a tube together with its reinforcing plate.

    Parameters
    ----------
    A_ns : net area of the tube alone. [in²]
    x_t : eccentricity of half the tube alone. [in]
    A_r : area of the reinforcing plates. [in²]
    x_r : distance to the middle of a plate. [in]

    Returns
    -------
    x_bar : eccentricity. [in]

    >>> reinforced_eccentricity.bare(6.0, 1.0, 2.0, 2.0)
    1.25
    """
    x_bar = (A_ns * x_t + A_r * x_r) / (A_ns + A_r)
    return x_bar


@formula("Table D3.1, case 2 by analogy")
def reinforced_round_shear_lag(x_bar, l):
    """Shear lag factor of a reinforced round tube: the lesser of the straight rule and the curve for the bare tube.

    Parameters
    ----------
    x_bar : eccentricity of half the tube with its plate. [in]
    l : length of the welds. [in]

    Returns
    -------
    U : shear lag factor. []

    >>> reinforced_round_shear_lag.bare(2.0, 16.0)
    0.875
    """
    U = min(1 - x_bar / l, (1 + (x_bar / l)**3.2)**(-10))
    return U


@formula("statics")
def load_left_beyond_reinforcement(l_r, l):
    """Share of the load still in the tube where the reinforcing plates end, the welds to the gusset loaded evenly; a tenth at least.

    Parameters
    ----------
    l_r : length of the plates' welds on one side of the net section. [in]
    l : length of the welds to the gusset. [in]

    Returns
    -------
    xi : share of the load left. []

    >>> load_left_beyond_reinforcement.bare(4.0, 16.0), load_left_beyond_reinforcement.bare(8.0, 8.0)
    (0.75, 0.1)
    """
    xi = max(1 - l_r / l, 0.1)
    return xi


@formula("statics")
def share_of_reinforcement(A_r, A_ns):
    """Share of the member's load that the reinforcing plates carry at the net section.

    Parameters
    ----------
    A_r : area of the reinforcing plates. [in²]
    A_ns : net area of the tube alone. [in²]

    Returns
    -------
    xi_r : share of the load. []

    >>> share_of_reinforcement.bare(2.0, 6.0)
    0.25
    """
    xi_r = A_r / (A_ns + A_r)
    return xi_r


@formula("statics")
def referred_to_member(R_r, xi_r):
    """Strength, referred to the member's whole load, of what carries the reinforcing plates' share.

    Parameters
    ----------
    R_r : nominal strength of the plates' connection on one side of the net section. [kip]
    xi_r : share of the load in the plates. []

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> referred_to_member.bare(60.0, 0.25)
    240.0
    """
    R_n = R_r / xi_r
    return R_n


@formula("J2.4, Table J2.5")
def reinforcement_weld(F_EXX, A_we):
    """Nominal strength of the fillet welds of the reinforcing plates on one side of the net section.

    Parameters
    ----------
    F_EXX : filler metal strength. [ksi]
    A_we : effective area of the welds. [in²]

    Returns
    -------
    R_r : nominal strength. [kip]

    >>> reinforcement_weld.bare(70.0, 2.0)
    84.0
    """
    R_r = 0.60 * F_EXX * A_we
    return R_r
