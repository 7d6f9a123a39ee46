"""What a hanger may not be: each refusal one sentence that names the clause and its limit."""

from math import cos, sin, tan

from ... import units
from ...editions import CLAUSES
from ...errors import InputError, NotInTable, ScopeError
from ...facts import bolts as facts

BOLTED = ("lower_bolt", "lower_lines", "lower_rows", "member_end")
WELDED = ("weld", "weld_length")


def inputs(given):
    """Refuse inputs that are missing for the way the hung member is joined, or given for the other way."""
    if given.rows > 1 and given.pitch is None:
        raise InputError("input pitch is missing: spacing of the rows along the beam, for example 3 in")
    needed, other = (WELDED, BOLTED) if given.joined == "welded" else (BOLTED, WELDED)
    extra = ("lower_pitch", "lower_gage", "lower_gage_from_back") if given.joined == "welded" else ()
    if missing := [name for name in needed if getattr(given, name) is None]:
        raise InputError(f"input {missing[0]} is missing: {type(given).model_fields[missing[0]].description}")
    if wrong := [name for name in (*other, *extra) if getattr(given, name) is not None]:
        raise InputError(f"{wrong[0]} is given, but the hung member is {given.joined} to the stem; remove it")
    if given.joined == "bolted":
        for count, name in ((given.lower_rows, "lower_pitch"), (given.lower_lines, "lower_gage")):
            if count > 1 and getattr(given, name) is None:
                raise InputError(f"input {name} is missing: {type(given).model_fields[name].description}")
        angle = given.member.strip().upper().replace(" ", "").startswith("2L")
        if angle and given.lower_gage_from_back is None:
            raise InputError("input lower_gage_from_back is missing: back of the hung leg to the first gage line")
        if not angle and given.lower_gage_from_back is not None:
            raise InputError("lower_gage_from_back is for double angles; on a plate the pattern is centred")
        if given.lower_rows * given.lower_lines < 2:
            raise ScopeError("one bolt at the stem: the load has no width to spread from (Whitmore); use two at least")
        if given.stem_end <= 0:
            raise InputError("input stem_end is missing: lead bolt row to the free edge of the stem")
    for name, basis in (("U_by_hand", "U_basis"), ("p_by_hand", "p_basis"), ("p_beam_by_hand", "p_beam_basis")):
        if getattr(given, name) is not None and len(getattr(given, basis).strip()) < 10:
            raise InputError(f"{name} needs a written basis in {basis}")


def installation(c):
    """Refuse bolts and holes that no provision covers in tension, or together."""
    given, group, edition = c.inputs, c.bolt_group, c.basis.edition
    for size in c.sizes:
        facts.size_notes(size, group)
    if given.installation not in group.installation:
        raise ScopeError(f"installation = {given.installation!r}: {group.product or group.name} may be {', '.join(group.installation)} only (J3.2)")
    if given.installation == "snug" and group.key not in ("120", "A307"):
        raise ScopeError(f"installation = 'snug': bolts of {group.name} in tension must be pretensioned; snug-tight is for Group 120 (A) only (J3)")
    if (given.installation == "slip-critical") != (given.slip_class is not None):
        raise InputError("slip_class is needed for a slip-critical joint: A or B" if given.slip_class is None else
                         "slip_class is given but the joint is not slip-critical; remove it, or set installation = \"slip-critical\"")
    clause = CLAUSES["holes"][edition]
    for name in ("fitting_holes", "beam_holes"):
        kind = getattr(given, name)
        if given.installation != "slip-critical" and (kind == "OVS" or kind.endswith("along")):
            raise ScopeError(f"{name} = {kind!r}: oversized holes and slots along the beam are permitted in slip-critical joints only ({clause})")
    if given.fitting_holes.startswith("LSL") and given.beam_holes.startswith("LSL"):
        raise ScopeError(f"long slots are permitted in one ply at a faying surface only ({clause})")
    if given.joined == "bolted" and given.lower_holes.startswith("LSL"):
        raise ScopeError(f"lower_holes = {given.lower_holes!r}: long slots are permitted in one ply at a faying surface only ({clause})")


def parts(c):
    """Refuse a hung member that does not go with the fitting, and compression."""
    fit, part = c.fitting, c.hung.element
    if part.series not in ("PL", "2L"):
        raise ScopeError(f"member {part.member}: hung from a stem are a plate (PL) or a double angle (2L) here")
    if not fit.tee:
        if part.series != "PL":
            raise ScopeError(f"member {part.member}: between the angles of {fit.name} hangs a plate; use a tee for a double angle")
        if c.inputs.joined == "welded":
            raise ScopeError(f"joined = 'welded': a plate between the angles of {fit.name} is bolted here; use a tee for a welded end")
        if fit.gap < part.t - 1e-9 or fit.gap > part.t + 1 / 4:
            raise InputError(f"gap = {units.length(fit.gap)} does not go with a plate of {units.length(part.t)}; "
                             "it is the plate's thickness, at most 1/4 in more")
    if c.demand.required_compression > 0:
        raise ScopeError(f"the hung member goes into compression ({units.printed(c.demand.required_compression)} kip): a hanger pulls only, "
                         "buckling of member and stem (J4.4, E) is outside this calculation")


def layout(c):
    """Refuse bolts, welds and edges that do not fit the parts, each other or the wrench."""
    given, fit, beam, size = c.inputs, c.fitting, c.beam, c.sizes[0]
    d, narrow = size.d, min(fit.width, beam.section.b_f)
    half = c.hanger.upper.member.hole.across / 2
    if (narrow - given.gage) / 2 <= half:
        raise InputError(f"gage = {units.length(given.gage)} is too wide: the holes leave the narrower flange, "
                         f"{units.length(narrow)} wide")
    if given.fitting_end <= c.hanger.upper.member.hole.along / 2:
        raise InputError(f"fitting_end = {units.length(given.fitting_end)}: the hole is cut by the end of the fitting")
    least = min(given.gage, given.pitch if given.rows > 1 else given.gage)
    if least < 8 / 3 * d - 1e-9:
        raise ScopeError(f"holes {units.printed(least)} in apart: the minimum spacing is 2-2/3 d = {units.printed(8 / 3 * d)} in "
                         f"({CLAUSES['minimum spacing'][c.basis.edition]})")
    if c.wrench_room < c.enter(size) - 1e-9:
        raise InputError(f"bolt {size.name} is too big for the gage: {units.printed(c.wrench_room)} in to the face beside it, "
                         f"{units.printed(c.enter(size))} in are needed to enter it")
    if given.beam_end < c.hanger.length / 2:
        raise InputError(f"beam_end = {units.length(given.beam_end)}: half the fitting, {units.printed(c.hanger.length / 2)} in, "
                         "does not fit on the beam")
    _stem(c)


def _stem(c):
    given, fit, h = c.inputs, c.fitting, c.hanger
    last, (length, apart) = h.depth_of_last, h.spread
    room = last - fit.k
    needed = c.enter(c.sizes[1]) if h.lower else 0.0
    if room < needed - 1e-9:
        what = "last bolt row" if h.lower else "end of the welds"
        raise InputError(f"the {what} is {units.printed(max(room, 0.0))} in below the fillet of {fit.name}, {units.printed(needed)} in are needed; "
                         "shorten the joint at the stem or take a deeper fitting")
    outer = apart / 2 + (h.lower.plate.hole.across / 2 if h.lower else 0.0)
    reach = fit.depth * tan(h.psi) + outer / cos(h.psi)
    if reach >= h.length / 2 + 1e-9:
        raise InputError(f"the fitting, {units.printed(h.length)} in long, is too short: the hung member needs "
                         f"{units.printed(2 * reach)} in to leave the stem through its lower edge")
    if h.lower:
        # The hung member's end stays clear of the tee's fillet; between two angles it may come up to the beam.
        above = last - given.member_end * cos(h.psi) - h.lower.member.width / 2 * sin(h.psi)
        if above < (fit.k if fit.tee else 0.0) - 1e-9:
            raise InputError(f"the end of {c.hung.element.member} reaches to {units.printed(above)} in below the beam, into the "
                             f"{'fillet of the tee' if fit.tee else 'beam'}; shorten member_end or the joint, or take a deeper fitting")
        edge = min(h.lower.member.width - max(hole.y for hole in h.lower.pattern), min(hole.y for hole in h.lower.pattern))
        if edge <= h.lower.member.hole.across / 2:
            raise InputError(f"holes at the stem are cut by an edge of {c.hung.element.member}; move them or change the member")
        pitch = [value for value in (given.lower_pitch, given.lower_gage) if value is not None]
        if pitch and min(pitch) < 8 / 3 * c.sizes[1].d - 1e-9:
            raise ScopeError(f"holes at the stem {units.printed(min(pitch))} in apart: the minimum spacing is 2-2/3 d = "
                             f"{units.printed(8 / 3 * c.sizes[1].d)} in ({CLAUSES['minimum spacing'][c.basis.edition]})")
        if c.hung.element.eccentricity is not None and given.lower_rows < 2 and given.U_by_hand is None:
            raise ScopeError("one bolt per line: Table D3.1 case 2 needs a connection length, so no U applies; use at least 2 rows, "
                             "or set U_by_hand with its basis")
        return
    if length < 4 * given.weld - 1e-9:
        raise ScopeError(f"weld_length = {units.length(length)} is less than four times the leg (J2.2b)")
    if length > 300 * given.weld:
        raise ScopeError(f"weld_length = {units.length(length)} is more than 300 times the leg (J2.2b); use a larger weld or bolts")


def enter(size):
    """Return the room that entering a bolt needs: clearance C2, or the diameter where the table has none. [in]"""
    try:
        return facts.clearances(size).C_2
    except NotInTable:
        return size.d
