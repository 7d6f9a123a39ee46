"""Impact of moving loads.  [ASCE7] 4.6."""

from ..formula import formula


@formula("ASCE 7 4.6")
def with_impact(P_L, i_L, P_m):
    """Live load with impact on its moving part.

    Parameters
    ----------
    P_L : live load as given. [kip]
    i_L : impact on the moving part of the live load. []
    P_m : moving part of the live load. [kip]

    Returns
    -------
    P_Li : live load with impact. [kip]

    >>> with_impact.bare(60.0, 0.2, 40.0)
    68.0
    """
    P_Li = P_L + i_L * P_m
    return P_Li
