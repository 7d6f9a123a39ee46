"""What a bolted connection may not be: each refusal one sentence that names the clause and its limit."""

from ... import units
from ...editions import CLAUSES
from ...errors import InputError, ScopeError
from ...facts import bolts as facts
from ...geometry import closest_pair, outside, tightest_pair
from .. import details


def installation(c):
    """Refuse bolts, holes, plates and fillers that no provision covers together."""
    given, group = c.inputs, c.bolt_group
    facts.size_notes(c.size, group)
    if given.installation not in group.installation:
        raise ScopeError(f"installation = {given.installation!r}: {group.product or group.name} may be {', '.join(group.installation)} only (J3.2)")
    if (given.installation == "slip-critical") != (given.slip_class is not None):
        raise InputError("slip_class is needed for a slip-critical joint: A or B" if given.slip_class is None else
                         "slip_class is given but the joint is not slip-critical; remove it, or set installation = \"slip-critical\"")
    clause = CLAUSES["holes"][c.basis.edition]
    for name in ("member_holes", "plate_holes"):
        kind = getattr(given, name)
        if given.installation == "slip-critical":
            continue
        if kind == "OVS":
            raise ScopeError(f"{name} = 'OVS': oversized holes are permitted in slip-critical joints only ({clause})")
        if kind.endswith("along"):
            raise ScopeError(f"{name} = {kind!r}: in a bearing joint a slot must lie across the load ({clause}); turn it or make the joint slip-critical")
    if given.member_holes.startswith("LSL") and given.plate_holes.startswith("LSL"):
        raise ScopeError(f"member_holes and plate_holes are both long slots; they are permitted in one part at a faying surface only ({clause})")
    if c.element.name == "flange" and given.plates == 2:
        raise ScopeError("plates = 2: a second plate inside a flange is split by the web or stem and is not covered; use plates = 1")
    if given.gap is not None and c.element.plies != 2:
        raise InputError(f"gap is for double angles; {c.element.member} is none")
    if c.element.plies == 2 and given.plates == 2:
        raise InputError("plates = 2: a double angle is bolted to one plate between its angles")
    if c.element.plies == 2 and c.element.gap < given.plate_thickness - 1e-9:
        raise InputError(f"gap = {units.length(c.element.gap)} is less than the plate's thickness of {units.length(given.plate_thickness)}")
    if given.U_by_hand is not None and len(given.U_basis.strip()) < 10:
        raise InputError("U_by_hand needs a written basis in U_basis")
    if (given.fillers == 0) != (given.filler_thickness == 0):
        raise InputError("fillers and filler_thickness go together: give both or neither")


def layout(c):
    """Refuse holes that do not fit the parts, each other, or the wrench, and groups off the member's centroid."""
    joint, d = c.joint, c.size.d
    named = {"member": f"{c.element.member} {c.element.name}", "plate": "connection plate"}
    for ply in (joint.member, joint.plate):
        strip = [hole for hole in ply.holes if hole.y >= 0] if ply.name == "member" else list(ply.holes)
        if out := outside(strip, ply.width, ply.end):
            hole = strip[out[0]]
            x = hole.x if ply.name == "member" else -hole.x
            raise InputError(f"hole at x = {units.length(x)}, y = {units.length(hole.y)} is cut by an edge of the {named[ply.name]}, "
                             f"{units.length(ply.width)} wide; move it or change the part")
    _other_leg(c)
    _room_for_plates(c)
    pair = closest_pair(joint.pattern)
    if pair and pair.spacing < 8 / 3 * d - 1e-9:
        raise ScopeError(f"holes {units.printed(pair.spacing)} in apart: the minimum spacing is 2-2/3 d = {units.printed(8 / 3 * d)} in "
                         f"({CLAUSES['minimum spacing'][c.basis.edition]})")
    for ply in (joint.member, joint.plate):
        tight = tightest_pair(ply.bolted)
        if tight and tight.clear < d - 1e-9:
            what = "overlap" if tight.clear <= 0 else f"are {units.printed(tight.clear)} in clear of each other"
            raise ScopeError(f"holes of the {named[ply.name]} {what}: the clear distance may not be less than d = {units.length(d)} "
                             f"({CLAUSES['minimum spacing'][c.basis.edition]})")
    room = details.wrench_room(joint)
    if room is not None:
        try:
            needed = facts.clearances(c.size).C_2
        except LookupError:
            needed = d
        if room < needed - 1e-9:
            raise InputError(f"bolt {c.size.name} is too big for the gage: {units.printed(room)} in to the face beside it, "
                             f"{units.printed(needed)} in are needed to enter it")
    if joint.rows < 2 and c.element.eccentricity is not None and c.inputs.U_by_hand is None:
        raise ScopeError("one bolt per line: Table D3.1 case 2 needs a connection length, so no U applies; use at least 2 rows, "
                         "or set U_by_hand with its basis")
    if len(joint.pattern) == 1 and c.demand.required_compression > 0:
        raise ScopeError("one bolt has no Whitmore width, so the plate's strength in compression cannot be found (J4.4); use at least 2 rows")
    _eccentricity(c)


def _other_leg(c):
    """Open holes must lie in the outstanding leg, clear of its edges, of the corner and of each other."""
    part, open_holes = c.element, c.joint.member.holes[len(c.joint.plate.holes):]
    for hole in open_holes:
        gage, radius = part.t - hole.y, hole.across / 2
        if not part.t + radius <= gage <= part.other_leg - radius or hole.x + radius > c.joint.member.end.x0:
            raise InputError(f"other_leg_holes: a hole at x = {units.length(hole.x)}, y = {units.length(gage)} is not within the outstanding "
                             f"leg of {units.length(part.other_leg)}")
    tight = tightest_pair(open_holes)
    if tight and tight.clear < c.size.d - 1e-9:
        raise InputError(f"other_leg_holes: two holes are {units.printed(max(tight.clear, 0))} in clear of each other; "
                         f"at least {units.length(c.size.d)} are needed")


def _room_for_plates(c):
    """A plate beside a web or stem must fit between, or stay clear of, the flanges; on a channel's back it need not."""
    part = c.element
    if part.name not in ("web", "stem") or (part.series in ("C", "MC") and c.inputs.plates == 1):
        return
    lo = c.joint.pattern[0].y - c.joint.plate_pattern[0].y
    hi = lo + c.joint.plate.width
    if lo < -1e-9 or (part.name == "web" and hi > part.width + 1e-9):
        raise InputError(f"plate_width = {units.length(c.joint.plate.width)}: the plate overlaps a flange of {part.member}; beside the "
                         f"{part.name} there is room for {units.length(part.width)}, and plate_offset shifts the plate")


def _eccentricity(c):
    joint = c.joint
    if c.element.offset is None:
        return
    centre = sum(hole.y for hole in joint.pattern) / len(joint.pattern)
    off = abs(centre - c.element.offset)
    if off > 1 / 2 or (off > 1 / 32 and len(c.inputs.eccentricity_basis.strip()) < 10):
        raise ScopeError(f"the bolt group's centroid is {units.printed(abs(centre - c.element.offset))} in off the member's centroid; "
                         "J1.7 asks for them to coincide, as built, up to 1/2 in may be accepted with a written eccentricity_basis")
