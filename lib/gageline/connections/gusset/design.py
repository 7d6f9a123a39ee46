"""From inputs to a gusset that the limit states evaluate: bolts or welds of the brace, layout in the plane, edges with their supports."""

import math
from dataclasses import dataclass, replace

from ... import units
from ...check import silent
from ...editions import CLAUSES
from ...errors import InputError, ScopeError
from ...facts import bolts as facts
from ...facts import grades, shapes
from ...facts import welds as weld_facts
from ...facts.grades import E
from ...geometry import End, Hole, centred_edge, grid, mirrored, outside
from ...geometry.whitmore import whitmore
from ...provisions import gusset_plates
from .. import plate
from ..joint import Bolts, Gusset, Joint, Ply, constants
from . import brace_end, edges, layout

BY_MEAN = {"compact corner": "", "noncompact corner": "mean", "extended corner": "", "single brace": "", "chevron": "",
           "two edges, older practice": "greater", "one edge free to sway, older practice": "mean", "by hand": "greater"}
"""Support of the gusset -> the length that goes with its K: on the axis (""), the mean of three, or where sources differ the greater."""


@dataclass(frozen=True)
class Lap:
    """The brace's end as the bolts see it: one bolt group, one ply; its own strength is another calculation."""

    joints: int = 1
    plies: int = 1


@dataclass(frozen=True)
class GussetDesign:
    """A gusset ready to be evaluated.

    Parameters
    ----------
    plate : the gusset as a strip of the width of its free end. joint : the bolts, or None. welds : the brace's welds, or None.
    layout : its place. axis : y of the brace's axis in the strip. found : Whitmore width, within the outline. [in]
    gusset : support in compression. lengths : L1, L2, L3. corner : connection's corner to the adjacent edge. [in]
    by_mean : length that goes with K, see BY_MEAN. edges : the supported edges.
    strip : the bolted gusset as it tears out, no wider on either side of the axis than at the narrowest place of the connection.
    strip_lo : y of that strip's lower edge. [in]
    """

    plate: Ply
    joint: Joint | None
    welds: object
    layout: object
    axis: float
    found: object
    gusset: Gusset
    lengths: tuple
    corner: float
    by_mean: str
    edges: object
    strip: Ply | None
    strip_lo: float

    @property
    def length(self):
        """Length of the brace's connection. [in]"""
        return self.joint.length if self.joint else self.welds.l


def build(c):
    """Return the design that a connection's inputs describe; sets the connection's bolt size and group."""
    given = c.inputs
    axis = given.gusset_end_width / 2
    steel = c.gusset_material
    joint = welds = None
    if given.connected == "bolts":
        joint = _joint(c, axis)
        ply, l, reach = joint.plate, joint.length, (min(h.y for h in joint.plate.holes) - axis, max(h.y for h in joint.plate.holes) - axis)
    else:
        welds = _welds(given)
        ply = Ply("plate", steel.F_y, steel.F_u, given.gusset_thickness, 1, 1, (), End(given.gusset_end), given.gusset_end_width, "STD",
                  constants(c.basis))
        l, reach = welds.l, (-welds.g / 2, welds.g / 2)
        if welds.g > given.gusset_end_width:
            raise InputError(f"brace_weld_apart = {units.length(welds.g)} is more than the gusset's free end of "
                             f"{units.length(given.gusset_end_width)}")
    supported = _edges(c)
    place = _layout(given, supported, l)
    for off in reach:
        if place.clear_of_support(off) <= 0:
            raise InputError("the brace's connection reaches into the support; enlarge work_point_distance")
    last = given.work_point_distance
    sides = axis - _inside(place, last, -1), axis + _inside(place, last, 1)
    if axis + reach[0] < sides[0] or axis + reach[1] > sides[1]:
        raise InputError("the brace's connection is wider than the gusset at its last row; lengthen the supported edges or widen the free end")
    found = whitmore(joint.plate_pattern, sides) if joint else brace_end.welded_spread(welds, axis, *sides)
    corner = min(_inside(place, last, -1) + reach[0], _inside(place, last, 1) - reach[1])
    lengths = brace_end.lengths(place, found, axis)
    gusset = _gusset(c, corner, lengths)
    strip_lo, strip = max(sides[0], 0.0), None
    if joint:
        holes = tuple(replace(hole, y=hole.y - strip_lo) for hole in ply.holes)
        strip = replace(ply, holes=holes, width=min(sides[1], ply.width) - strip_lo)
    by_mean = BY_MEAN.get(given.gusset_support or "", "")
    return GussetDesign(ply, joint, welds, place, axis, found, gusset, lengths, corner, by_mean, supported, strip, strip_lo)


def _inside(place, along, sense):
    """Distance from the axis to the outline or to a supporting line, whichever is nearer: what reaches into a support is not counted."""
    own = place.side(along, sense)
    for (px, py), (nx, ny) in place.lines:
        x, y = place.at(along)
        pace = -sense * (place.across[0] * nx + place.across[1] * ny)
        if pace > 1e-9:
            own = min(own, ((x - px) * nx + (y - py) * ny) / pace)
    return own


def _joint(c, axis):
    given, steel = c.inputs, c.gusset_material
    if missing := [name for name in ("lines", "rows", "bolt", "bolt_grade") if getattr(given, name) is None]:
        raise InputError(f"input {missing[0]} is missing: the brace is connected by bolts")
    if given.rows > 1 and given.pitch is None:
        raise InputError("input pitch is missing: spacing along the line, for example 3 in")
    gages = list(given.gage) * (given.lines - 1) if len(given.gage) == 1 else list(given.gage)
    if len(gages) != given.lines - 1:
        raise InputError(f"gage: {given.lines} lines have {given.lines - 1} spaces between them, got {len(given.gage)}")
    if given.lines == 1 and given.rows == 1:
        raise ScopeError("one bolt has no Whitmore width and holds no direction; use at least two bolts")
    c.size = facts.bolt_size(given.bolt)
    c.bolt_group = group = facts.bolt_group(given.bolt_grade, c.basis.edition)
    _installation(c)
    name, _, direction = given.gusset_holes.partition(" ")
    hole = facts.hole(c.size, name)
    across, along = (hole.length, hole.width) if direction == "across" else (hole.width, hole.length)
    t = given.gusset_thickness
    low = centred_edge(given.gusset_end_width, given.lines, gages)
    holes = [Hole(x, y, across, along, t) for x, y in grid(given.lines, given.rows, given.pitch or 0.0, gages, 0.0, low)]
    end = End(given.gusset_end)
    ply = Ply("plate", steel.F_y, steel.F_u, t, 1, 1, tuple(mirrored(holes)), end, given.gusset_end_width, given.gusset_holes,
              constants(c.basis))
    if outside(list(ply.holes), ply.width, end):
        raise InputError(f"a bolt hole is cut by an edge of the gusset's free end, {units.length(ply.width)} wide; move it or widen the gusset")
    member = Ply("brace", steel.F_y, steel.F_u, t, 1, 1, tuple(holes), End(1e3), ply.width, "STD", constants(c.basis))
    slip = given.installation == "slip-critical"
    bolts = Bolts(c.size.name, group.name, c.size.d, group.F_nv_X if given.threads == "X" else group.F_nv_N, given.threads, given.shear_planes,
                  facts.pretension(c.size, group) if slip else 0.0, given.installation, {"A": 0.30, "B": 0.50}.get(given.slip_class, 0.0))
    return Joint(Lap(), member, ply, bolts, Gusset(ply.width, 0.0, ply.width, None, None, ""), 0.0, 0, given.deformation_considered)


def _installation(c):
    given, group = c.inputs, c.bolt_group
    facts.size_notes(c.size, group)
    if given.installation not in group.installation:
        raise ScopeError(f"installation = {given.installation!r}: {group.product or group.name} may be {', '.join(group.installation)} only (J3.2)")
    if (given.installation == "slip-critical") != (given.slip_class is not None):
        raise InputError("slip_class and installation = \"slip-critical\" go together: give both or neither")
    kind, clause = given.gusset_holes, CLAUSES["holes"][c.basis.edition]
    if given.installation != "slip-critical" and (kind == "OVS" or kind.endswith("along")):
        raise ScopeError(f"gusset_holes = {kind!r}: in a bearing joint holes must be standard, or slots across the load ({clause})")
    if given.shear_planes == 2 and kind.startswith("LSL"):
        raise ScopeError(f"long slots are permitted in one ply at a faying surface only ({clause})")


def _welds(given):
    names = ("brace_weld_lines", "brace_weld_length", "brace_weld_apart", "brace_weld")
    if missing := [name for name in names if getattr(given, name) is None]:
        raise InputError(f"input {missing[0]} is missing: the brace is connected by welds")
    if given.brace_weld_length < 4 * given.brace_weld:
        raise ScopeError(f"brace_weld_length = {units.length(given.brace_weld_length)} is less than 4 times the leg of the weld (J2.2b)")
    return brace_end.BraceWelds(given.brace_weld_lines, given.brace_weld_length, given.brace_weld_apart, given.brace_weld,
                                weld_facts.electrode(given.electrode).F_EXX)


def _support(name, grade, part, near_end, c):
    shape = shapes.shape(name)
    if shape.series not in ("W", "M", "S", "HP"):
        raise InputError(f"{shape.name} as support of a gusset: give a W, M, S or HP shape")
    steel = grades.material(grade, form="shape", series=shape.series, edition=c.basis.edition)
    t = shape.t_f if part == "flange" else shape.t_w
    return shape, edges.Support(shape.name, part, steel.F_y, steel.F_u, t, shape.t_w, shape.t_f, shape.k_des, shape.d, near_end), steel


def _edges(c):
    given, steel = c.inputs, c.gusset_material
    P = max(c.demand.required_tension, c.demand.required_compression)
    F_EXX = weld_facts.electrode(given.electrode).F_EXX
    common = {"t": given.gusset_thickness, "F_y": steel.F_y, "F_u": steel.F_u, "F_EXX": F_EXX, "P": P, "angle": given.brace_angle,
              "moment_on": given.moment_on, "offset": given.edge_offset, "redistribution": given.redistribution, "directional": given.directional}
    columns = ("column", "column_grade", "column_edge", "column_weld")
    if given.supports == "one edge":
        if strange := [name for name in columns if getattr(given, name) is not None]:
            raise InputError(f"{strange[0]} is given, but supports = \"one edge\"")
        _, support, c.beam_material = _support(given.beam, given.beam_grade, "flange", given.beam_near_end, c)
        beam = edges.Edge("beam", 0.0, given.beam_edge, given.beam_weld, support)
        return edges.Edges(beam=beam, column=None, e_b=0.0, e_c=0.0, **common)
    if missing := [name for name in columns if getattr(given, name) is None]:
        raise InputError(f"input {missing[0]} is missing: a corner gusset is supported by a column too")
    if given.edge_offset or given.beam_near_end:
        raise InputError("edge_offset and beam_near_end are for supports = \"one edge\"; at a corner they follow from the layout")
    if given.brace_angle > 1.4:
        raise InputError(f"brace_angle = {math.degrees(given.brace_angle):.4g} deg from the column's axis is nearly level; a corner gusset needs "
                         "at most 80 deg")
    shape, support, c.beam_material = _support(given.beam, given.beam_grade, "flange", False, c)
    beam = edges.Edge("beam", given.beam_edge_start, given.beam_edge, given.beam_weld, support)
    near = bool(beam.centroid <= shape.d)
    beam = edges.Edge(beam.name, beam.start, beam.L, beam.w_f, edges.Support(**{**vars(support), "near_end": near}))
    post, support, c.column_material = _support(given.column, given.column_grade, given.column_connected, given.column_near_end, c)
    column = edges.Edge("column", given.column_edge_start, given.column_edge, given.column_weld, support)
    made = edges.Edges(beam=beam, column=column, e_b=shape.d / 2, e_c=post.d / 2 if given.column_connected == "flange" else 0.0, **common)
    alpha, beta = edges.ideal(silent, made)
    if min(alpha, beta) <= 0:
        raise ScopeError(f"the Uniform Force Method gives {'α' if alpha <= 0 else 'β'} = {min(alpha, beta):.4g} in with moment_on = "
                         f"\"{given.moment_on}\": "
                         "it must be greater than 0; change an edge, or moment_on")
    return made


def _layout(given, supported, l):
    last, free = given.work_point_distance, given.work_point_distance + l + given.gusset_end
    if supported.column is None:
        return layout.single(given.brace_angle, given.beam_edge, given.edge_offset, last, free, given.gusset_end_width)
    return layout.corner(given.brace_angle, supported.e_b, supported.e_c, (given.beam_edge_start, given.beam_edge),
                         (given.column_edge_start, given.column_edge), last, free, given.gusset_end_width)


def _gusset(c, corner, lengths):
    """Return the gusset's support in compression, refused where it is missing or where the gusset is not as compact as it says."""
    given, support = c.inputs, c.inputs.gusset_support
    K, basis = given.gusset_K, ""
    if support == "by hand":
        if K is None or len(given.gusset_K_basis.strip()) < 10:
            raise InputError("gusset_support = 'by hand' needs gusset_K and a written basis in gusset_K_basis")
        basis = f"K by hand. Basis: {given.gusset_K_basis}"
    elif K is not None:
        raise InputError("gusset_K goes with gusset_support = 'by hand'")
    elif support is not None:
        if support not in plate.K_CHOICES:
            raise InputError(f"gusset_support = {support!r} is not known; allowed: {', '.join((*plate.K_CHOICES, 'by hand'))}")
        K, basis = plate.K_CHOICES[support]
        if support.endswith("corner") and given.supports != "corner":
            raise InputError(f"gusset_support = {support!r} needs two supported edges; allowed on one edge: single brace, chevron, by hand")
    elif c.demand.required_compression > 0:
        raise InputError(f"the brace goes into compression ({units.printed(c.demand.required_compression)} kip): give gusset_support "
                         f"({', '.join((*plate.K_CHOICES, 'by hand'))})")
    if support == "compact corner":
        needed = gusset_plates.compact_thickness.bare(c.gusset_material.F_y, max(corner, 0.0), E, max(lengths[0], 1e-6))
        if given.gusset_thickness < needed:
            raise ScopeError(f"gusset_support = 'compact corner': {units.printed(needed)} in of thickness are needed for that, the gusset has "
                             f"{units.length(given.gusset_thickness)}; use noncompact corner")
    return Gusset(given.gusset_end_width, 0.0, given.gusset_end_width, K, None, basis)
