"""Holes, gage lines and part ends: the pattern every other module of this package reads.

x runs along the force towards the end of the part, y across it within the connected element, 0 at the lower edge.
Coordinates and dimensions are floats in inches; where a docstring says so they may be arrays of shape (N,), one entry
per layout of a sweep. The order of holes and lines is then read from the first layout and must be that of all.
"""

from dataclasses import dataclass, replace
from functools import reduce
from math import hypot, sqrt
from typing import NamedTuple

import numpy as np

from ..errors import InputError

TOL = 1e-6  # [in.] far below what a shop can lay out, far above the rounding of converted millimetres


@dataclass(frozen=True)
class Hole:
    """One hole in one element of a part.

    Parameters
    ----------
    x, y : centre. [in]
    across : nominal dimension transverse to the force, no damage allowance. [in]
    along : nominal dimension along the force, no damage allowance. [in]
    t : thickness of the element the hole is in. [in]
    bolted : False for an open hole, which weakens the part and brings no load.
    """

    x: float
    y: float
    across: float
    along: float
    t: float
    bolted: bool = True


class End(NamedTuple):
    """End edge of a part, the line x = x0 + slope * y; slope 0 is a square end, x0 in inches (an array in a sweep)."""

    x0: float
    slope: float = 0.0

    def at(self, y):
        """Return x of the edge at the height y. [in]"""
        return self.x0 + self.slope * y

    def distance(self, x, y):
        """Return the distance of a point from the edge, at right angles to it, negative beyond it. [in]"""
        return (self.at(y) - x) / sqrt(1.0 + self.slope**2)

    def mirrored(self):
        """Return the same edge seen with x turned round."""
        return End(-self.x0, -self.slope)


class Pair(NamedTuple):
    """Two holes by index, their spacing centre to centre and the clear distance between their edges. [in]"""

    i: int
    j: int
    spacing: float
    clear: float


def grid(lines, rows, pitch, gages=(), stagger=0.0, edge=0.0):
    """Return the hole centres of a pattern of gage lines by rows, line by line from the lowest.

    Parameters
    ----------
    lines, rows : number of gage lines, number of holes in each.
    pitch : spacing along a line; may be (N,). [in]
    gages : spacing between the lines: one number for all, or a list of lines - 1 of them. [in]
    stagger : shift of the 2nd, 4th … line along +x; negative shifts them back. [in]
    edge : y of the lowest line. [in]

    Returns
    -------
    centres : list of (x, y), the smallest x being 0. [in]

    Raises
    ------
    InputError : a count below 1, a spacing that is not positive, or the wrong number of gages.
    """
    if lines < 1 or rows < 1:
        raise InputError(f"A pattern of {lines} gage lines by {rows} rows holds no bolt; give at least 1 by 1.")
    spaces = list(gages) if isinstance(gages, (list, tuple)) else [gages] * (lines - 1)
    if len(spaces) != lines - 1:
        raise InputError(f"{lines} gage lines need {lines - 1} gages between them, got {len(spaces)}.")
    if rows > 1 and not np.all(np.greater(pitch, 0.0)):
        raise InputError(f"The pitch must be greater than 0, got {pitch} in.")
    if not all(np.all(np.greater(space, 0.0)) for space in spaces):
        raise InputError(f"Every gage must be greater than 0, got {spaces} in.")
    back = least([0.0, stagger if lines > 1 else 0.0])
    centres, y = [], edge
    for line in range(lines):
        shift = (stagger if line % 2 else 0.0) - back
        centres += [(shift + row * pitch, y) for row in range(rows)]
        if line < lines - 1:
            y = y + spaces[line]
    return centres


def centred_edge(width, lines, gages=()):
    """Return y of the lowest of the gage lines when they stand centred on a width. [in]

    Parameters
    ----------
    width : width of the element. [in]
    lines, gages : as for grid. [in]
    """
    spread = sum(gages) if isinstance(gages, (list, tuple)) else gages * (lines - 1)
    return (width - spread) / 2.0


def punched(centres, across, along, t, bolted=True):
    """Return like holes at the centres, a list of (x, y). [in]"""
    return [Hole(x, y, across, along, t, bolted) for x, y in centres]


def mirrored(holes):
    """Return the holes with x turned round, so that a plate is read as a part that ends at larger x."""
    return [replace(hole, x=-hole.x) for hole in holes]


def lines_of(holes, tol=TOL):
    """Return the gage lines, lowest y first, each a tuple of hole indices, smallest x first.

    Parameters
    ----------
    holes : the holes.
    tol : two holes this near in y stand on one line. [in]
    """
    lines = []
    for i in sorted(range(len(holes)), key=lambda i: (first(holes[i].y), first(holes[i].x))):
        if lines and first(holes[i].y) - first(holes[lines[-1][0]].y) <= tol:
            lines[-1].append(i)
        else:
            lines.append([i])
    return tuple(tuple(sorted(line, key=lambda i: first(holes[i].x))) for line in lines)


def rows_per_line(holes):
    """Return the number of bolts in each gage line, lowest line first, lines of open holes only left out."""
    counts = (sum(holes[i].bolted for i in line) for line in lines_of(holes))
    return tuple(count for count in counts if count)


def connection_length(holes):
    """Return the length between the first and the last bolt along the force, out to out where staggered. [in]"""
    at = [hole.x for hole in holes if hole.bolted]
    return most(at) - least(at) if at else 0.0


def clear_between(a, b):
    """Return the shortest clear distance between the edges of two holes, negative where they overlap; centres may be (N,). [in]

    A slot is a straight part with round ends, so a hole is all points within a radius of its core: a point for a
    round hole, an axis-parallel line for a slot.
    """
    gap_x = most([abs(a.x - b.x) - _half_core(a.along, a.across) - _half_core(b.along, b.across), 0.0])
    gap_y = most([abs(a.y - b.y) - _half_core(a.across, a.along) - _half_core(b.across, b.along), 0.0])
    apart = np.hypot if any(isinstance(gap, np.ndarray) for gap in (gap_x, gap_y)) else hypot
    return apart(gap_x, gap_y) - (min(a.across, a.along) + min(b.across, b.along)) / 2.0


def closest_pair(holes):
    """Return the Pair with the least spacing centre to centre, or None below two holes."""
    return min(_pairs(holes), key=lambda pair: pair.spacing, default=None)


def tightest_pair(holes):
    """Return the Pair with the least clear distance between its edges, or None below two holes."""
    return min(_pairs(holes), key=lambda pair: pair.clear, default=None)


def overlapping(holes):
    """Return the Pair that touches or overlaps most, or None where every two holes are clear of each other."""
    pair = tightest_pair(holes)
    return pair if pair and pair.clear <= TOL else None


def outside(holes, width, end=None, start=None):
    """Return the indices of the holes that are cut by, or lie beyond, an edge of the part.

    Parameters
    ----------
    holes : the holes.
    width : width of the element, its edges at y = 0 and y = width. [in]
    end, start : End (or (x0, slope)) at larger and at smaller x, None where the part runs on.
    """
    found = []
    for i, hole in enumerate(holes):
        side = hole.across / 2.0
        kept = np.all((hole.y - side >= -TOL) & (hole.y + side <= width + TOL))
        if end is not None:
            kept = kept and np.all(_reach(hole, End(*end)) >= -TOL)
        if start is not None:
            kept = kept and np.all(_reach(mirrored([hole])[0], End(*start).mirrored()) >= -TOL)
        if not kept:
            found.append(i)
    return tuple(found)


def least(values):
    """Return the smallest of the values, layout by layout where one of them is an array."""
    return reduce(np.minimum, values) if any(isinstance(value, np.ndarray) for value in values) else min(values)


def most(values):
    """Return the largest of the values, layout by layout where one of them is an array."""
    return reduce(np.maximum, values) if any(isinstance(value, np.ndarray) for value in values) else max(values)


def first(value):
    """Return a number as it is and of an array its first entry, by which a sweep is put in order."""
    return float(value.flat[0]) if isinstance(value, np.ndarray) else value


def _half_core(this_way, other_way):
    return max(this_way - other_way, 0.0) / 2.0


def _pairs(holes):
    for i, a in enumerate(holes):
        for j in range(i + 1, len(holes)):
            b = holes[j]
            yield Pair(i, j, hypot(a.x - b.x, a.y - b.y), clear_between(a, b))


def _reach(hole, end):
    """Distance from the end edge to the nearest point of the hole's outline, negative where the edge cuts it."""
    core_x, core_y = _half_core(hole.along, hole.across), _half_core(hole.across, hole.along)
    to_core = least([end.distance(hole.x + core_x, hole.y + core_y), end.distance(hole.x + core_x, hole.y - core_y)])
    return to_core - min(hole.across, hole.along) / 2.0
