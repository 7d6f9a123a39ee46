"""From the inputs of a welded connection to its ``WeldedEnd``, and what it may not be: each refusal one sentence with its clause."""

import math

from ... import units
from ...check import Working
from ...errors import InputError, NotInTable, ScopeError
from ...facts import welds as facts
from ...facts.grades import matching_filler
from ...provisions import welded_ends
from .. import plate as plates
from ..joint import Gusset
from .end import TOL, Part, WeldedEnd

BALANCE = 1 / 4
"""Weld lengths are rounded up to this when they are balanced, and so far may the centroids then be apart. [in]  Common practice."""

ANGLES = ("L", "2L")


def filler(c):
    """Return the electrode, refusing one that is more than a class stronger than what matches either part.

    Raises
    ------
    NotInTable, ScopeError
    """
    electrode = facts.electrode(c.inputs.electrode)
    for name, grade, t in _steels(c):
        if (_found(facts.classes_above_matching, electrode.F_EXX, grade, t) or 0) > 1:
            raise ScopeError(f"electrode = {electrode.name!r} is more than one class above what matches the {name}'s {grade}: one is allowed "
                             "(J2.6, Table J2.5)")
    return electrode


def unmatched(c):
    """Return the parts for whose steel the table of Section J2.6 names no matching filler metal."""
    return [f"{name} ({grade})" for name, grade, t in _steels(c) if _found(matching_filler, grade, t) is None]


def low_hydrogen(c):
    """Return the parts whose steel asks for low-hydrogen electrodes."""
    return [f"{name} ({grade})" for name, grade, t in _steels(c) if (_found(matching_filler, grade, t) or (0, False))[1]]


def _steels(c):
    return (("member", c.inputs.member_grade, c.element.t), ("plate", c.inputs.plate_grade, c.inputs.plate_thickness))


def _found(look, *what):
    """Return what a table holds, None where it does not."""
    try:
        return look(*what)
    except NotInTable:
        return None


def options(c):
    """Refuse what the inputs ask for together and no provision here covers."""
    given, part = c.inputs, c.element
    if part.name == "stem":
        raise ScopeError(f"connected_by = 'stem': {part.member} is covered welded by its flange only; a stem has no second edge to weld along")
    if given.plates == 2 and part.name not in ("plate", "web"):
        has = "one plate at each flange" if part.joints == 2 else "one plate"
        raise InputError(f"plates = 2 is for a flat bar or a web; {part.member} has {has}")
    if given.plates == 2 and part.series in ("C", "MC"):
        raise InputError("plates = 2: a channel is welded by the back of its web to one plate")
    if given.welds == "transverse, both ends" and part.pieces == 2 and part.series == "2L":
        raise ScopeError("welds = 'transverse, both ends': the plate's edge between two angles cannot be welded; use longitudinal welds (J2.2b)")
    if given.U_by_hand is not None and len(given.U_basis.strip()) < 10:
        raise InputError("U_by_hand needs a written basis in U_basis")


def lengths(c, l_t):
    """Return (l_1, l_2, lengths before rounding or None): the longitudinal welds of one group as given or as balanced. [in]"""
    given, part = c.inputs, c.element
    named = {"weld_length": given.weld_length, "weld_heel and weld_toe": given.weld_heel or given.weld_toe, "weld_balanced": given.weld_balanced}
    used = [name for name, value in named.items() if value is not None]
    if given.welds == "transverse, both ends":
        if used:
            raise InputError(f"{used[0]} is given, but welds = 'transverse, both ends' has no longitudinal welds")
        return 0.0, 0.0, None
    if len(used) != 1:
        raise InputError("give the longitudinal welds by exactly one of weld_length, weld_heel with weld_toe, or weld_balanced; "
                         f"got {', '.join(used) or 'none'}")
    if given.weld_length is not None:
        return given.weld_length, given.weld_length, None
    if part.series not in ANGLES:
        raise ScopeError(f"{used[0]}: the centroid of {part.member} lies midway between its welds, and J1.7 asks for welds that share it; "
                         "give weld_length")
    if given.weld_balanced is None:
        if given.weld_heel is None or given.weld_toe is None:
            raise InputError("weld_heel and weld_toe go together: give both")
        return (given.weld_heel,) * 2 + (None,) if given.weld_heel == given.weld_toe else (given.weld_heel, given.weld_toe, None)
    l_2 = welded_ends.balanced_toe_length.bare(given.weld_balanced, centroid(part), part.width, l_t)
    l_1 = welded_ends.balanced_heel_length.bare(given.weld_balanced, l_2, l_t)
    if l_2 < 4 * given.weld_size:
        raise InputError(f"weld_balanced = {units.length(given.weld_balanced)} leaves {units.printed(l_2)} in along the toe, less than four "
                         "times the leg size (J2.2b(c)); lengthen it" + (" or leave out the weld across the end" if l_t else ""))
    return _up(l_1), _up(l_2), (l_1, l_2)


def _up(value):
    return math.ceil(value / BALANCE - 1e-6) * BALANCE


def centroid(part):
    """Return the centroid of an angle from its heel, along the connected leg; of any other member from its lower weld line. [in]"""
    if part.series not in ANGLES:
        return part.width / 2
    single = part.section.single or part.section
    return single.y_bar if abs(part.width - single.b_long) < TOL and part.name != "short leg" else single.x_bar


def balanced_steps(c):
    """Return the worked steps of the balanced lengths, () where the lengths are given."""
    if c.inputs.weld_balanced is None:
        return ()
    do, l_t = Working(), c.end.l_t
    l_2 = do(welded_ends.balanced_toe_length, c.inputs.weld_balanced, centroid(c.element), c.element.width, l_t)
    do(welded_ends.balanced_heel_length, c.inputs.weld_balanced, l_2, l_t)
    do.say(f"Rounded up: {units.length(c.end.l_1)} along the heel, {units.length(c.end.l_2)} along the toe.")
    return tuple(do.steps)


def lines(c):
    """Return (y_1, y_2, plate_lo, on_plate): where the longitudinal welds lie and where the plate does, in the element's coordinates. [in]"""
    given, part = c.inputs, c.element
    y_1, y_2 = (-part.section.t_f, part.width + part.section.t_f) if part.name == "web" else (0.0, part.width)
    room = given.weld_size - TOL
    wide = given.plate_width / 2 - abs(given.plate_offset) - (y_2 - y_1) / 2
    if part.name == "web" and part.series not in ("C", "MC"):
        wide = -1.0  # the flanges are in the way: a plate beside the web is always the narrower part
    if wide >= room:
        return y_1, y_2, (y_1 + y_2) / 2 - given.plate_width / 2 - given.plate_offset, False
    narrow = (part.width - given.plate_width) / 2
    if part.name == "web" and part.series not in ("C", "MC"):
        room += part.section.k_des - part.section.t_f  # no weld on the fillet of the section
    if part.name in ("flange", "web") and narrow >= room:
        if given.plate_offset:
            raise InputError("plate_offset: a plate narrower than the member is centred on it (J1.7); leave it out")
        return narrow, part.width - narrow, narrow, True
    what = f"plate_width = {units.length(given.plate_width)}: beside the {part.name} of {part.member}, {units.length(part.width)} wide, "
    if part.name in ("flange", "web"):
        raise InputError(f"{what}the welds need a ledge of {units.printed(room + TOL)} in on both sides; make the plate wider or narrower")
    raise InputError(f"{what}the fillets need a ledge of {units.length(given.weld_size)} on both sides; widen the plate, or shift it "
                     "with plate_offset; a plate narrower than the member is covered on flanges and webs only")


def build(c):
    """Return the WeldedEnd that the inputs describe, with lengths before rounding where they are balanced."""
    given, part = c.inputs, c.element
    options(c)
    y_1, y_2, plate_lo, on_plate = lines(c)
    across = {"longitudinal": 0, "longitudinal and end": 1, "transverse, both ends": 2}[given.welds]
    l_t = y_2 - y_1 if across == 1 else 0.0
    l_1, l_2, exact = lengths(c, l_t)
    if max(l_1, l_2) > given.lap + TOL:
        raise InputError(f"lap = {units.length(given.lap)} is shorter than the longer weld of {units.length(max(l_1, l_2))}; "
                         "lengthen the lap")
    y_w = (y_2 - y_1) / 2 if across == 2 else welded_ends.centroid_of_welds.bare(l_1, l_2, l_t, y_2 - y_1)
    target = centroid(part) if part.series in ANGLES else (y_2 - y_1) / 2
    pieces = part.pieces if part.name == "flange" else given.plates
    member = Part("member", c.member_material.F_y, c.member_material.F_u, part.t, part.pieces, part.width)
    plate = Part("plate", c.plate_material.F_y, c.plate_material.F_u, given.plate_thickness, pieces, given.plate_width)
    end = WeldedEnd(part, member, plate, gusset(c), given.weld_size, c.electrode.F_EXX, l_1, l_1 if l_1 == l_2 else l_2, y_1, y_2, plate_lo, across,
                    on_plate, max(part.pieces, pieces), given.lap, abs(y_w - target) <= BALANCE + TOL, given.U_by_hand, given.U_basis)
    return end, exact


def gusset(c):
    """Return the plate's width and its support for compression."""
    given = c.inputs
    support, K, length, basis = given.gusset_support, given.gusset_K, given.gusset_length, ""
    if support == "by hand":
        if K is None or len(given.gusset_K_basis.strip()) < 10:
            raise InputError("gusset_support = 'by hand' needs gusset_K and a written basis in gusset_K_basis")
        basis = f"K by hand. Basis: {given.gusset_K_basis}"
    elif support is not None:
        if support not in plates.K_CHOICES:
            raise InputError(f"gusset_support = {support!r} is not known; allowed: {', '.join((*plates.K_CHOICES, 'by hand'))}")
        K, basis = plates.K_CHOICES[support]
    if c.demand.required_compression > 0:
        if support is None:
            raise InputError(f"the member goes into compression ({units.printed(c.demand.required_compression)} kip): give gusset_support "
                             f"({', '.join((*plates.K_CHOICES, 'by hand'))}) and gusset_length")
        if length is None and K is not None:
            raise InputError("input gusset_length is missing: end of the welds to the support, along the load")
    return Gusset(given.plate_width, 0.0, given.plate_width, K, length, basis)
