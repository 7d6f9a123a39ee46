"""Braces of seismic systems: strength expected of the brace.  [AISC341] A3, F1, F2, from memory; to be confirmed by the user."""

from ..formula import formula


@formula("341 F2.6c, from memory")
def expected_yield(R_y, F_y, A_g, alpha_s):
    """Required strength of a brace's connection: yielding of the brace at its expected yield stress.

    Parameters
    ----------
    R_y : expected over specified minimum yield stress. []
    F_y : specified minimum yield stress. [ksi]
    A_g : gross area of the brace. [in²]
    alpha_s : level of force: 1.0 by LRFD, 1.5 by ASD. []

    Returns
    -------
    P_exp : strength expected of the brace. [kip]

    >>> round(expected_yield.bare(1.1, 50.0, 4.0, 1.0), 9)
    220.0
    """
    P_exp = R_y * F_y * A_g / alpha_s
    return P_exp


@formula("341 F2.6c, from memory")
def capped(P_exp, P_cap):
    """Required strength of a brace's connection, not more than the system can deliver.

    Parameters
    ----------
    P_exp : strength expected of the brace. [kip]
    P_cap : largest force that the system can deliver to the brace. [kip]

    Returns
    -------
    P_req : required strength of the brace's connection. [kip]

    >>> capped.bare(220.0, 180.0)
    180.0
    """
    P_req = min(P_exp, P_cap)
    return P_req


@formula("341 A3.2, from memory")
def expected_rupture(R_te, P_n0):
    """Strength of the brace in rupture by its expected tensile strength.

    Parameters
    ----------
    R_te : expected over specified minimum tensile strength. []
    P_n0 : nominal axial strength by the specified minimum tensile strength. [kip]

    Returns
    -------
    P_n : nominal axial strength. [kip]

    >>> expected_rupture.bare(1.2, 100.0)
    120.0
    """
    P_n = R_te * P_n0
    return P_n
