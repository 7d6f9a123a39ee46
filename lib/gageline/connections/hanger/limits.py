"""Limits of spacing, edges, welds and wrench room of a hanger; slenderness of the hung member as advice.  [AISC360] D1, J2.2, J3."""

from dataclasses import replace
from math import cos, sin

from ...check import Check, Working, not_applicable
from ...editions import CLAUSES
from ...errors import NotInTable
from ...facts import bolts as facts
from ...facts import welds as weld_facts
from ...geometry import edge_distances
from ...provisions import detailing
from ...provisions import welds as weld_rules
from .. import details
from .support import flange_holes


def of(c):
    """Yield every limit of a hanger in the order of the report."""
    h, edition = c.hanger, c.basis.edition
    above = h.upper
    for each in (details.minimum_spacing(above, edition), details.maximum_spacing(above, edition, False)):
        yield _named(each, each.id, each.title.replace("Spacing of holes", "Bolts to the beam, spacing of holes").replace(
            "Spacing along the member", "Bolts to the beam, spacing along it"), "bolts")
    for each in details.edges(above, above.member, c.sizes[0], edition, (True, True)):
        yield _named(each, each.id.replace("member", "fitting"), each.title.replace("Member", "Fitting"), "bolts")
    yield _beam_edge(c)
    yield _room("wrench", "Bolts to the beam, clearance for tightening", "bolts", c.wrench_room, c.sizes[0])
    yield _nuts(c)
    if h.lower:
        yield from _bolted(c)
    else:
        yield from _welded(c)
    slender = details.slenderness(c.hung.element, c.inputs.member_length)
    yield _named(slender, slender.id, f"Hung m{slender.title[1:]}", "member")
    yield flange_holes(h)[0]


def _named(check, id, title, part):
    return replace(check, id=id, title=title, part=part)


def _limit(id, title, part, clause, required, provided, steps=(), at_most=False, kind="detailing", notes=()):
    demand, available = (provided, required) if at_most else (required, provided)
    return Check(id, title, part, clause, kind=kind, nominal=required, available=available, demand=demand, unit="in", steps=tuple(steps),
                 notes=tuple(notes), at_most=at_most)


def _beam_edge(c):
    do, ply = Working(), c.hanger.upper.plate
    kind, _, direction = ply.kind.partition(" ")
    provided = min(min(edge.lower, edge.upper) for edge in edge_distances(ply.bolted, ply.width, ply.end))
    required = do(detailing.required_edge_distance, facts.minimum_edge(c.sizes[0]), facts.edge_increment(c.sizes[0], kind, direction == "across"))
    return _limit("beam side edge", "Beam flange, side distance, minimum", "beam", CLAUSES["minimum edge distance"][c.basis.edition], required,
                  provided, do.steps)


def _room(id, title, part, room, size):
    try:
        needed = facts.clearances(size).C_1
    except NotInTable as miss:
        return not_applicable(id, title, part, "common practice", str(miss), kind="advice")
    return _limit(id, title, part, "common practice", needed, room, kind="advice",
                  notes=("C1 for a heavy hex bolt and a socket; staggered bolts or a smaller tool may do with less.",))


def _nuts(c):
    """Room between the fitting's flange and the end of the outstanding legs that lie under the bolts."""
    id, title, h, part = "nuts", "Hung member, clearance to the bolts above", c.hanger, c.hung.element
    if part.series != "2L":
        return not_applicable(id, title, "bolts", "common practice", "a hung plate stands clear of the bolts", kind="advice")
    single = part.section.single
    if c.fitting.t_s / 2 + single.b_long + single.b_short - part.width < h.g / 2 - h.bolts.d:
        return not_applicable(id, title, "bolts", "common practice", "the outstanding legs end before the bolts", kind="advice")
    try:
        needed = facts.clearances(c.sizes[0]).H_2
    except NotInTable as miss:
        return not_applicable(id, title, "bolts", "common practice", str(miss), kind="advice")
    room = (h.depth_of_last / cos(h.psi) - (c.inputs.member_end or 0.0)) * cos(h.psi) - part.width * sin(h.psi) - c.fitting.t_f
    return _limit(id, title, "bolts", "common practice", needed, max(room, 0.0), kind="advice", notes=(
        "H2: shank, nut and wrench below the flange; the outstanding legs of the hung angles reach under the bolts. Tighten before the angles are "
        "set, or leave the room.",))


def _bolted(c):
    h, edition = c.hanger, c.basis.edition
    for each in (details.minimum_spacing(h.lower, edition), details.maximum_spacing(h.lower, edition, False)):
        yield _named(each, f"stem {each.id}", each.title.replace("Spacing of holes", "Bolts at the stem, spacing of holes").replace(
            "Spacing along the member", "Bolts at the stem, spacing along the pull"), "stem")
    held = {attachment.y for attachment in c.hung.element.attachments}
    free = (0.0 not in held, c.hung.element.width not in held)
    for ply, sides in ((h.lower.member, free), (h.lower.plate, (True, True))):
        for each in details.edges(h.lower, ply, c.sizes[1], edition, sides):
            title = each.title.replace("Plate", "Stem").replace("Member", "Hung member")
            notes = tuple(note for note in each.notes if "gusset" not in note)
            yield replace(_named(each, each.id.replace("plate", "stem").replace("member", "hung"), title, "stem"), notes=notes)
    yield _room("stem wrench", "Bolts at the stem, clearance to the fillet", "stem", h.depth_of_last - c.fitting.k, c.sizes[1])


def _welded(c):
    h, t_m, t_s = c.hanger, c.hung.element.t, c.fitting.t_s
    made = h.welds
    yield _limit("weld min", "Weld at the stem, size, minimum", "stem", "Table J2.4", weld_facts.minimum_fillet(min(t_m, t_s)), made.w_f)
    do = Working()
    w_max = do(weld_rules.largest_fillet, t_m, weld_facts.EDGE_MARGIN) if t_m >= weld_facts.EDGE_THICKNESS else \
        do(weld_rules.largest_fillet_of_thin_edge, t_m)
    yield _limit("weld max", "Weld at the stem, size at the edge of the hung member, maximum", "stem", "J2.2b(b)", w_max, made.w_f, do.steps,
                 at_most=True)
    do = Working()
    least = do(weld_rules.shortest_weld, made.w_f)
    yield _limit("weld length", "Weld at the stem, length of a line, minimum", "stem", "J2.2b(c)", least, made.length, do.steps)
    do = Working()
    lap = do(weld_rules.least_lap, min(t_m, t_s), weld_facts.LEAST_LAP)
    yield _limit("lap", "Hung member, lap on the stem, minimum", "stem", "J2.2b", lap, made.length, do.steps)
    yield _limit("weld apart", "Weld at the stem, length against distance of the lines", "stem", "D3, Commentary", made.apart, made.length,
                 kind="advice",
                 notes=("Longitudinal welds shorter than their distance are covered by the shear lag factor; the Commentary calls the older "
                        "rule that they be no shorter still reasonable.",))
