"""Effective width of a connection plate: the spread of the load at a fixed angle through its fastener pattern.

Read in the joint's own coordinates, not mirrored: the plate's free edge lies at smaller x, its support at larger x.
The two lines start at the outermost bolts next to the free edge and open towards the support; the width is measured
across the row with the largest x, where the plate carries all of the load.
"""

from dataclasses import dataclass
from math import radians, tan

from .pattern import TOL, first, least, lines_of, most

ANGLE = 30.0  # [degrees] AISC 360-22 commentary to J4: the angle used in practice


@dataclass(frozen=True)
class Whitmore:
    """Effective width of a plate.

    Parameters
    ----------
    L_w : width left between the plate's edges. [in]
    l : length of the spread; where the outer lines start staggered, the mean of the two. [in]
    g : spacing of the outer lines; 0 for a single line. [in]
    y_lo, y_hi : ends of the width, cut at the plate's edges. [in]
    cut_lo, cut_hi : what the edges cut off the spread on either side. [in]
    x_row : the row it is measured across. [in]
    holes_in_row : indices of the holes cut by that section within the width.
    lines : the two lines of spread, uncut, each ((x, y), (x, y)). [in]
    """

    L_w: float
    l: float
    g: float
    y_lo: float
    y_hi: float
    cut_lo: float
    cut_hi: float
    x_row: float
    holes_in_row: tuple
    lines: tuple


def spread_width(l, g, angle=ANGLE):
    """Return the uncut width of the spread over a length.

    Parameters
    ----------
    l : first to last row of bolts, or length of the welds. [in]
    g : spacing of the outer bolt lines, or of the weld lines. [in]
    angle : angle of the spread. [degrees]

    >>> round(spread_width(9.0, 3.0), 2)
    13.39
    """
    return 2.0 * l * tan(radians(angle)) + g


def whitmore(holes, edges, angle=ANGLE):
    """Return the effective width of a plate at its row with the largest x.

    Parameters
    ----------
    holes : the plate's holes, one of them bolted at least; x and y may be (N,).
    edges : (y_lo, y_hi) of the plate at that row, or its width from y = 0. [in]
    angle : angle of the spread. [degrees]

    Returns
    -------
    width : Whitmore, with arrays (N,) where a coordinate is one.
    """
    edge_lo, edge_hi = edges if isinstance(edges, (tuple, list)) else (0.0, edges)
    bolted = [i for i, hole in enumerate(holes) if hole.bolted]
    bolts = [holes[i] for i in bolted]
    lines = lines_of(bolts)
    low, high = [bolts[i] for i in lines[0]], [bolts[i] for i in lines[-1]]
    x_row = most([hole.x for hole in bolts])
    x_low, x_high = least([hole.x for hole in low]), least([hole.x for hole in high])
    rise = tan(radians(angle))
    spread_lo, spread_hi = low[0].y - (x_row - x_low) * rise, high[0].y + (x_row - x_high) * rise
    y_lo, y_hi = most([spread_lo, edge_lo]), least([spread_hi, edge_hi])
    cut = [i for i, hole in enumerate(holes) if abs(first(hole.x) - first(x_row)) < hole.along / 2.0 - TOL
           and first(y_lo) - hole.across / 2.0 < first(hole.y) < first(y_hi) + hole.across / 2.0]
    return Whitmore(
        L_w=y_hi - y_lo, l=((x_row - x_low) + (x_row - x_high)) / 2.0, g=high[0].y - low[0].y, y_lo=y_lo, y_hi=y_hi,
        cut_lo=y_lo - spread_lo, cut_hi=spread_hi - y_hi, x_row=x_row, holes_in_row=tuple(cut),
        lines=(((x_low, low[0].y), (x_row, spread_lo)), ((x_high, high[0].y), (x_row, spread_hi))),
    )
