"""Clear distances ahead of each hole and distances to the edges.

Everything is written for the material at larger x; of a plate whose free edge lies at smaller x pass
pattern.mirrored(holes) and End.mirrored().
"""

from typing import NamedTuple

import numpy as np

from .pattern import TOL, End, first, least


class ClearDistance(NamedTuple):
    """Clear distance l_c from a hole's edge along the force [in], and what it ends at: 'edge' or 'hole'."""

    l_c: float
    kind: str


class EdgeDistance(NamedTuple):
    """Distances of a hole's centre from the end edge (at right angles to it) and from both side edges. [in]"""

    end: float
    lower: float
    upper: float


def clear_distances(holes, end):
    """Return for each hole the clear distance towards larger x.

    Parameters
    ----------
    holes : the holes; x may be (N,).
    end : End or (x0, slope); x0 may be (N,). [in]

    Returns
    -------
    distances : list of ClearDistance, one per hole; arrays (N,) of l_c and of kind where a coordinate is one.

    Notes
    -----
    Between nominal hole dimensions, no damage allowance (AISC 360-22, J3.11a). A hole stands in the way when its
    centre is less than half its dimension across from the line of the force; its whole length is then taken, which
    is safe for a round hole met off its centre. A skewed end is met on the line of the force.
    """
    end = End(*end)
    return [_ahead(hole, holes, end) for hole in holes]


def edge_distances(holes, width, end):
    """Return for each hole its distances from the end edge and from the side edges.

    Parameters
    ----------
    holes : the holes; x may be (N,).
    width : width of the element. [in]
    end : End or (x0, slope). [in]

    Returns
    -------
    distances : list of EdgeDistance, one per hole. [in]
    """
    end = End(*end)
    return [EdgeDistance(end.distance(hole.x, hole.y), hole.y, width - hole.y) for hole in holes]


def _ahead(hole, holes, end):
    to_edge = end.at(hole.y) - hole.x - hole.along / 2.0
    to_holes = []
    for other in holes:
        if other is hole or abs(first(other.y) - first(hole.y)) >= other.across / 2.0:
            continue
        clear = other.x - hole.x - (hole.along + other.along) / 2.0
        if isinstance(clear, np.ndarray):
            to_holes.append(np.where(other.x > hole.x + TOL, clear, np.inf))
        elif other.x > hole.x + TOL:
            to_holes.append(clear)
    nearest = least([to_edge, *to_holes])
    if isinstance(nearest, np.ndarray):
        return ClearDistance(nearest, np.where(nearest < to_edge, "hole", "edge"))
    return ClearDistance(nearest, "hole" if nearest < to_edge else "edge")
