"""From inputs to a splice that the limit states evaluate: one bolted joint for the flanges, one for the web or the flat member."""

from dataclasses import dataclass

from ... import units
from ...editions import CLAUSES
from ...errors import InputError, ScopeError
from ...facts import bolts as facts
from ...geometry import End, Hole, centred_edge, closest_pair, grid, mirrored, outside
from ..element import element
from ..joint import Bolts, Gusset, Joint, Ply, constants

NAMES = ("flange", "web")


@dataclass(frozen=True)
class Group:
    """One group of plates and bolts: "flange" or "web", its joint seen from one half, whether it carries all, its plate's free length. [in]"""

    name: str
    joint: Joint
    alone: bool
    free_length: tuple

    @property
    def rows(self):
        """Bolts in each line."""
        return self.joint.rows


@dataclass(frozen=True)
class Splice:
    """The groups of a splice and the member they join; ``section`` is the W shape, None for a flat member."""

    groups: tuple
    section: object
    A_g: float
    F_y: float
    F_u: float

    def group(self, name):
        """Return a group by name, or None."""
        return next((group for group in self.groups if group.name == name), None)


def build(c, more_rows=0):
    """Return the Splice that a connection's inputs describe, with so many rows more in every group, as for a sweep."""
    given, flat = c.inputs, c.element.series == "PL"
    names = [name for name in NAMES if getattr(given, f"{name}_plate_thickness") is not None]
    for name in NAMES:
        if name not in names and (strange := [key for key in _keys(name) if getattr(given, key) not in (None, ())]):
            raise InputError(f"{strange[0]} is given, but {name}_plate_thickness is not")
    if not names:
        raise InputError("no splice plate: give flange_plate_thickness, web_plate_thickness or both")
    if flat and "flange" in names:
        raise InputError(f"flange_plate_thickness: {c.element.member} has no flanges; the plates of a flat member are given as "
                         "web_plate_thickness and so on")
    groups = tuple(_group(c, name, len(names) == 1, more_rows) for name in names)
    return Splice(groups, c.element.section, c.element.A_g, c.member_material.F_y, c.member_material.F_u)


def _keys(name):
    return [f"{name}_{key}" for key in ("plate_width", "plate_end", "lines", "rows", "pitch", "gage", "member_end")]


def _group(c, name, alone, more_rows):
    given = c.inputs
    keys = ("plate_thickness", "plate_width", "plate_end", "lines", "rows", "pitch", "gage", "member_end", "filler")
    value = {key: getattr(given, f"{name}_{key}") for key in keys}
    if missing := [key for key in ("plate_width", "plate_end", "lines", "rows", "member_end") if value[key] is None]:
        raise InputError(f"input {name}_{missing[0]} is missing")
    if value["rows"] > 1 and value["pitch"] is None:
        raise InputError(f"input {name}_pitch is missing: spacing along the line, for example 3 in")
    rows, plates = value["rows"] + more_rows, given.web_plates if name == "web" else 1
    part = c.element if c.element.series == "PL" else element(given.member, {"flange": "both flanges", "web": "web"}[name])
    gages = list(value["gage"]) * (value["lines"] - 1) if len(value["gage"]) == 1 else list(value["gage"])
    if len(gages) != value["lines"] - 1:
        raise InputError(f"{name}_gage: {value['lines']} lines have {value['lines'] - 1} spaces between them, got {len(value['gage'])}")
    pitch = value["pitch"] or 3.0
    centres = grid(value["lines"], rows, pitch, gages, 0.0, centred_edge(part.width, value["lines"], gages))
    across, along = _hole(c, given.member_holes)
    plate_across, plate_along = _hole(c, given.plate_holes)
    member = Ply("member", c.member_material.F_y, c.member_material.F_u, part.t, 1, part.pieces,
                 tuple(Hole(x, y, across, along, part.t) for x, y in centres),
                 End((rows - 1) * pitch + value["member_end"]), part.width, given.member_holes, constants(c.basis))
    t, width = value["plate_thickness"], value["plate_width"]
    steel = c.plate_material(t)
    low = part.width / 2 - width / 2
    shifted = [Hole(x, y - low, plate_across, plate_along, t) for x, y in centres]
    plate = Ply("plate", steel.F_y, steel.F_u, t, plates, plates * part.joints, tuple(mirrored(shifted)), End(value["plate_end"]), width,
                given.plate_holes, constants(c.basis))
    slip = given.installation == "slip-critical"
    group = c.bolt_group
    bolts = Bolts(c.size.name, group.name, c.size.d, group.F_nv_X if given.threads == "X" else group.F_nv_N, given.threads, plates,
                  facts.pretension(c.size, group) if slip else 0.0, given.installation, {"A": 0.30, "B": 0.50}.get(given.slip_class, 0.0))
    joint = Joint(part, member, plate, bolts, Gusset(width, 0.0, width, None, None, ""), value["filler"], 1 if value["filler"] else 0,
                  given.deformation_considered)
    made = Group(name, joint, alone, (value["member_end"], given.joint_gap))
    if not more_rows:
        _layout(c, made)
    return made


def _hole(c, kind):
    name, _, direction = kind.partition(" ")
    hole = facts.hole(c.size, name)
    return (hole.length, hole.width) if direction == "across" else (hole.width, hole.length)


def refuse_installation(c):
    """Refuse bolts and holes that no provision covers together."""
    given, group = c.inputs, c.bolt_group
    facts.size_notes(c.size, group)
    if given.installation not in group.installation:
        raise ScopeError(f"installation = {given.installation!r}: {group.product or group.name} may be {', '.join(group.installation)} only (J3.2)")
    if (given.installation == "slip-critical") != (given.slip_class is not None):
        raise InputError("slip_class and installation = \"slip-critical\" go together: give both or neither")
    clause = CLAUSES["holes"][c.basis.edition]
    for name in ("member_holes", "plate_holes"):
        kind = getattr(given, name)
        if given.installation != "slip-critical" and (kind == "OVS" or kind.endswith("along")):
            raise ScopeError(f"{name} = {kind!r}: in a bearing joint holes must be standard, or slots across the load ({clause})")
    long = [given.member_holes.startswith("LSL"), given.plate_holes.startswith("LSL")]
    if all(long) or (long[1] and given.web_plate_thickness is not None and given.web_plates == 2):
        raise ScopeError(f"long slots are permitted in one ply at a faying surface only ({clause})")


def _layout(c, group):
    """Refuse holes outside the parts or too near each other, and web plates that do not fit between the fillets."""
    joint, name = group.joint, group.name
    for ply in (joint.member, joint.plate):
        if outside(list(ply.holes), ply.width, ply.end):
            raise InputError(f"{name} splice: a hole is cut by an edge of the {ply.name}, {units.length(ply.width)} wide; "
                             f"change {name}_gage or the part")
    pair = closest_pair(joint.pattern)
    if pair and pair.spacing < 8 / 3 * c.size.d - 1e-9:
        raise ScopeError(f"{name} splice: holes {units.printed(pair.spacing)} in apart: the minimum spacing is 2-2/3 d = "
                         f"{units.printed(8 / 3 * c.size.d)} in ({CLAUSES['minimum spacing'][c.basis.edition]})")
    shape = c.element.section
    if name == "web" and shape is not None and joint.plate.width > shape.d - 2 * shape.k_des + 1e-9:
        raise InputError(f"web_plate_width = {units.length(joint.plate.width)}: between the fillets of {shape.name} there is room for "
                         f"{units.printed(shape.d - 2 * shape.k_des)} in")
    if name == "flange":
        faces = [hole.y for hole in joint.pattern if shape.t_w / 2 >= abs(hole.y - shape.b_f / 2) - 1e-9]
        if faces:
            raise InputError("flange_gage: a gage line lies over the web; use an even number of lines")
    if joint.rows < 2 and group.alone and joint.element.eccentricity is not None:
        raise ScopeError(f"{name}_rows = 1: Table D3.1 case 2 needs a connection length; use at least 2 rows")
