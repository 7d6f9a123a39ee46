"""Fillet weld groups: effective length of end-loaded lines, throat, strength with the directional factor or the group rule.  [AISC360] J2."""

import math
from dataclasses import dataclass

import numpy as np

from ..provisions import welded_ends, welds

WHOLE, LONGEST = 100.0, 300.0
"""Length over leg size up to which an end-loaded weld counts whole, and beyond which it counts no further.  [AISC360] J2.2b."""


@dataclass(frozen=True)
class WeldLines:
    """Like weld lines of a connection, parallel to each other.

    Parameters
    ----------
    n : number of them. length : of one, may be an array in a sweep. [in]
    name : where they are, for the report.
    """

    n: int
    length: float
    name: str


def counted_length(do, length, w_f):
    """Work out the effective length of an end-loaded longitudinal weld; an array is taken element by element. [in]

    Parameters
    ----------
    do : what remembers the formulas. length : of the weld line. [in]
    w_f : leg size. [in]
    """
    if isinstance(length, np.ndarray):
        reduced = welds.effective_length.bare(welds.end_loaded_factor.bare(length, w_f), length)
        return np.where(length <= LONGEST * w_f, reduced, welds.effective_length_of_long_weld.bare(w_f))
    if length <= WHOLE * w_f:
        do.say("The length is at most 100 times the leg size, so all of it counts.")
        return length
    if length <= LONGEST * w_f:
        do.say("The weld is end-loaded and longer than 100 times its leg size: its length is reduced.")
        return do(welds.effective_length, do(welds.end_loaded_factor, length, w_f), length)
    do.say("The weld is end-loaded and longer than 300 times its leg size: no more than 180 times the leg counts.")
    return do(welds.effective_length_of_long_weld, w_f)


def area(do, lines, w_f, t_e, end_loaded):
    """Work out the effective area of weld lines. [in²]

    Parameters
    ----------
    do : what remembers the formulas. lines : sequence of WeldLines, not empty.
    w_f, t_e : leg size and throat. [in]
    end_loaded : whether the lines are longitudinal and loaded at their end.
    """
    A_we = None
    for line in lines:
        do.say(f"{line.name[0].upper()}{line.name[1:]}:")
        l_we = counted_length(do, line.length, w_f) if end_loaded else line.length
        A_we = do(welds.weld_area, line.n, t_e, l_we) if A_we is None else do(welds.more_weld_area, A_we, line.n, t_e, l_we)
    return A_we


def strength(do, longitudinal, transverse, w_f, F_EXX, concentric=True):
    """Work out the nominal strength of a group of fillet welds of one leg size under a pull along its longitudinal lines. [kip]

    Parameters
    ----------
    do : what remembers the formulas.
    longitudinal, transverse : sequences of WeldLines, either may be empty.
    w_f : leg size. [in]
    F_EXX : filler metal strength. [ksi]
    concentric : whether the pull passes through the centroid of the group; if not, no strength increase is taken.
    """
    t_e = do(welds.throat, w_f)
    if not transverse:
        do.say("All welds are parallel to the load: a linear group, no directional increase.")
        A_we = area(do, longitudinal, w_f, t_e, True)
        return do(welds.fillet_strength, F_EXX, A_we, do(welds.directional_factor, 0.0))
    if not longitudinal:
        A_we = area(do, transverse, w_f, t_e, False)
        if not concentric:
            do.say("The load does not pass through the centroid of the welds: no directional increase is taken.")
            return do(welds.fillet_strength, F_EXX, A_we, 1.0)
        do.say("All welds lie across the load: a linear group loaded through its centroid, for which the increase is allowed.")
        return do(welds.fillet_strength, F_EXX, A_we, do(welds.directional_factor, math.pi / 2))
    R_wl = do(welds.longitudinal_strength, F_EXX, area(do, longitudinal, w_f, t_e, True))
    R_wt = do(welds.transverse_strength, F_EXX, area(do, transverse, w_f, t_e, False))
    if not concentric:
        do.say("The load does not pass through the centroid of the welds, so the group rule of J2.4(b) is not used; the safe plain sum is.")
        return do(welded_ends.sum_of_strengths, R_wl, R_wt)
    do.say("One leg size, loaded through the centroid of the group: the larger of the plain sum and the group rule is permitted.")
    return do(welds.group_strength, R_wl, R_wt)
