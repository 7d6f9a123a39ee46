"""Impact on the moving part of the live load, applied before the loads are combined.  [ASCE7] 4.6."""

import re

from ..check import silent
from ..errors import InputError
from ..provisions import impact

KNOWN = {0.20: "light machinery, shaft- or motor-driven (ASCE 7 4.6)", 0.50: "reciprocating machinery or power-driven units (ASCE 7 4.6)"}
"""Impact -> what ASCE 7 gives it for."""

LEGACY = 0.33
"""Impact on hangers of floors and balconies in older codes; not in ASCE 7 4.6."""

_TEXT = re.compile(r"\s*(\d+(?:\.\d+)?)\s*%\s*(legacy)?\s*")


def fraction(given):
    """Return (impact as a fraction, its basis in words) of the inputs; (0, "") where none is given.

    Raises
    ------
    InputError
        A text that is no percentage, an impact without a live load, or one of no standard without a written basis.
    """
    if not given.impact:
        if given.P_L_moving is not None or given.impact_basis:
            raise InputError("P_L_moving and impact_basis go with impact; give impact, for example \"20 %\"")
        return 0.0, ""
    match = _TEXT.fullmatch(given.impact)
    if not match or not 0 < (i := float(match[1]) / 100) <= 2:
        raise InputError(f"impact = {given.impact!r} cannot be read; write a percentage up to 200 %, for example \"20 %\", or \"33 % legacy\"")
    if given.P_L is None:
        raise InputError("impact raises the moving part of the live load, but P_L is not given")
    if given.P_L_moving is not None and not 0 < given.P_L_moving <= given.P_L:
        raise InputError(f"P_L_moving = {given.P_L_moving:g} kip: give the part of P_L = {given.P_L:g} kip that moves")
    if match[2]:
        if abs(i - LEGACY) > 1e-9:
            raise InputError(f"impact = {given.impact!r}: legacy stands for the 33 % of older codes for hangers; write \"33 % legacy\"")
        return i, "legacy: older codes for hangers of floors and balconies, not in ASCE 7 4.6"
    if i in KNOWN and not given.impact_basis:
        return i, KNOWN[i]
    if len(given.impact_basis.strip()) < 10:
        raise InputError(f"impact = {given.impact!r} is none of ASCE 7 4.6 (20 %, 50 %) nor \"33 % legacy\"; "
                         "it needs a written basis in impact_basis")
    return i, given.impact_basis


def live_load(given, do=silent):
    """Return the live load with impact on its moving part. [kip]"""
    i, _ = fraction(given)
    return do(impact.with_impact, given.P_L, i, given.P_L if given.P_L_moving is None else given.P_L_moving) if i else given.P_L
