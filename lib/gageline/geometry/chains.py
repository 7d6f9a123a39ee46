"""Chains of holes across a part, along which its net section may rupture, and the most critical of them all.

A chain runs from edge to edge through one hole or more at strictly growing y, straight between them and straight
across before its first and after its last. The bolts on its load side (smaller x) have already passed on their load,
so it is asked to carry only the share of the others.
"""

from dataclasses import dataclass
from itertools import pairwise

import numpy as np

from .pattern import TOL, first, least

ZIGZAG = 1e-9  # [in.²] added per diagonal, so that of equal chains the straighter comes first


@dataclass(frozen=True)
class Chain:
    """One chain of holes across a part.

    Parameters
    ----------
    holes : indices of its holes, lowest y first.
    spaces : per space between two of its holes (s, g, t): pitch, gage, and the lesser of the two thicknesses. [in]
    removed : area of its holes, damage allowance included. [in²]
    added : sum of s²/(4g) t over its spaces. [in²]
    n_ahead : bolts on its load side.
    n_total : bolts of the whole pattern.
    """

    holes: tuple
    spaces: tuple
    removed: float
    added: float
    n_ahead: int
    n_total: int

    def net_area(self, A_g):
        """Return the net area left of a gross area. [in²]"""
        return A_g - self.removed + self.added

    @property
    def share(self):
        """Part of the joint's load that still crosses the chain."""
        return (self.n_total - self.n_ahead) / self.n_total if self.n_total else 1.0

    @property
    def zigzags(self):
        """Number of spaces that run on the diagonal."""
        return sum(bool(np.any(s > TOL)) for s, _, _ in self.spaces)


def unfolded_gage(g_a, g_b, t):
    """Return the gage across the heel of an angle with holes in both legs.

    Parameters
    ----------
    g_a, g_b : gages of the two legs, from the back of the angle. [in]
    t : thickness. [in]

    Returns
    -------
    g : spacing of the two lines in the unfolded angle (AISC 360-22, B4.3b). [in]

    >>> unfolded_gage(3.0, 2.25, 0.5)
    4.75
    """
    return g_a + g_b - t


def chain_through(holes, picks, allowance):
    """Return the Chain through chosen holes.

    Parameters
    ----------
    holes : the holes; their x, y and t may be (N,).
    picks : indices of the holes it runs through, no two at one y.
    allowance : what is added to the hole dimension across the force for damage. [in]

    Notes
    -----
    Between holes in elements of different thickness s²/(4g) counts with the lesser thickness, which is safe; how
    much of the diagonal lies in which element is not known here.
    """
    picks = tuple(sorted(picks, key=lambda i: first(holes[i].y)))
    spaces = []
    for a, b in pairwise(picks):
        s, g = abs(holes[b].x - holes[a].x), holes[b].y - holes[a].y
        spaces.append((s, g, least([holes[a].t, holes[b].t])))
    removed = sum((holes[i].across + allowance) * holes[i].t for i in picks)
    added = sum((s**2 / (4.0 * g) * t for s, g, t in spaces), 0.0)
    ahead = sum((hole.x < _x_at(holes, picks, hole.y) - TOL) * 1 for hole in holes if hole.bolted)
    return Chain(picks, tuple(spaces), removed, added, ahead, sum(hole.bolted for hole in holes))


def critical_chains(holes, A_g, allowance, most=5):
    """Return the chains with the least net area for the load they carry, the most critical first.

    Parameters
    ----------
    holes : the holes, in any order.
    A_g : gross area of the part. [in²]
    allowance : what is added to the hole dimension across the force for damage. [in]
    most : how many chains to return at most.

    Returns
    -------
    chains : tuple of Chain, sorted by net area over share of load; of equal ones the straighter first.

    Notes
    -----
    Exact: a chain grows hole by hole in order of y, and the `most` least net areas are kept for every hole reached
    with every number of bolts ahead, so none of the first `most` of all chains can be lost. A chain that runs over
    the centre of a hole without counting it is none, nor is one behind all bolts.
    """
    if not holes:
        return ()
    order = sorted(range(len(holes)), key=lambda i: (holes[i].y, holes[i].x))
    ends = _grown(_Field([holes[i] for i in order], allowance), A_g, most)
    return tuple(chain_through(holes, [order[i] for i in picks], allowance) for picks in ends)


def polyline(chain, holes, width):
    """Return the corners (x, y) of a chain from the lower edge to the upper edge, for drawing. [in]"""
    corners = [(holes[i].x, holes[i].y) for i in chain.holes]
    return ((corners[0][0], 0.0), *corners, (corners[-1][0], width))


def _x_at(holes, picks, y):
    """x of the chain at a height; which of its spaces the height falls into is read from the first layout of a sweep."""
    if first(y) <= first(holes[picks[0]].y):
        return holes[picks[0]].x
    for a, b in pairwise(picks):
        if first(y) <= first(holes[b].y):
            part = (y - holes[a].y) / (holes[b].y - holes[a].y)
            return holes[a].x + part * (holes[b].x - holes[a].x)
    return holes[picks[-1]].x


class _Field:
    """The holes in order of y as arrays, and what a step of a chain from one to the next costs."""

    def __init__(self, holes, allowance):
        self.x = np.array([hole.x for hole in holes], dtype=float)
        self.y = np.array([hole.y for hole in holes], dtype=float)
        self.t = np.array([hole.t for hole in holes], dtype=float)
        self.removed = np.array([(hole.across + allowance) * hole.t for hole in holes])
        self.bolted = np.array([hole.bolted for hole in holes], dtype=bool)

    def straight(self, j):
        """Bolts ahead of hole j on its own line, below it and above it, and whether a hole lies level there."""
        ahead = self.bolted & (self.x < self.x[j] - TOL)
        level = abs(self.x - self.x[j]) <= TOL
        below, above = self.y < self.y[j] - TOL, self.y > self.y[j] + TOL
        return (int((ahead & ~below & ~above).sum()), int((ahead & below).sum()), int((ahead & above).sum()),
                bool((level & below).any()), bool((level & above).any()))

    def steps(self, j):
        """Holes a chain may come from to hole j, the bolts ahead of each step, and its cost in net area."""
        source = np.flatnonzero(self.y < self.y[j] - TOL)
        x, y = self.x[source, None], self.y[source, None]
        run = x + (self.x[j] - x) * (self.y - y) / (self.y[j] - y)
        inside = (self.y > y + TOL) & (self.y < self.y[j] - TOL)
        ahead = (inside & self.bolted & (self.x < run - TOL)).sum(axis=1)
        free = ~(inside & (abs(self.x - run) <= TOL)).any(axis=1)
        s, g = self.x[j] - self.x[source], self.y[j] - self.y[source]
        cost = s**2 / (4.0 * g) * np.minimum(self.t[source], self.t[j]) + ZIGZAG * (abs(s) > TOL)
        return source[free], ahead[free], cost[free] - self.removed[j]


def _grown(field, A_g, keep):
    """Paths (tuples of indices into the field) of the `keep` most critical chains."""
    n, bolts = len(field.x), int(field.bolted.sum())
    ahead_of = np.arange(bolts + 1)
    least = np.full((n, bolts + 1, keep), np.inf)
    came = np.full((n, bolts + 1, keep, 3), -1)
    ends = []
    for j in range(n):
        own, below, above, shut_below, shut_above = field.straight(j)
        source, ahead, cost = field.steps(j)
        before = ahead_of[:, None] - (ahead + own)
        grown = least[source, np.maximum(before, 0)] + cost[:, None]
        grown[before < 0] = np.inf
        grown = grown.reshape(bolts + 1, -1)
        begun = np.full((bolts + 1, keep), np.inf)
        if not shut_below:
            begun[below + own, 0] = -field.removed[j]
        grown = np.concatenate([begun, grown], axis=1)
        best = np.argpartition(grown, keep - 1, axis=1)[:, :keep]
        least[j] = np.take_along_axis(grown, best, axis=1)
        step = best // keep - 1
        if len(source):
            past = np.maximum(step, 0)
            came[j] = np.stack([source[past], np.take_along_axis(before, past, axis=1), best % keep], axis=2)
        came[j][step < 0] = -1
        if not shut_above:
            share = (bolts - ahead_of - above) / bolts if bolts else np.ones(1)
            for k, rank in zip(*np.nonzero(np.isfinite(least[j]) & (share > 0.0)[:, None])):
                ends.append(((A_g + least[j, k, rank]) / share[k], j, k, rank))
    return [_traced(came, end[1:]) for end in sorted(ends)[:keep]]


def _traced(came, state):
    path = []
    while state[0] >= 0:
        path.append(int(state[0]))
        state = came[tuple(state)]
    return tuple(reversed(path))
