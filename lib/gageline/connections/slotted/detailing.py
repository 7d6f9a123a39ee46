"""Limits of size and length of the welds, the slot and the reinforcement of a hollow section's end; advice.  [AISC360] D1, J2.2."""

from ... import units
from ...check import Check, Working, not_applicable
from ...facts import welds as facts
from ...provisions import welds
from .. import details
from .joint import MOST_GAP

_PART = "weld"


def _limit(id, title, clause, required, provided, steps=(), kind="detailing", at_most=False, unit="in", notes=()):
    demand, available = (provided, required) if at_most else (required, provided)
    return Check(id, title, _PART, clause, kind=kind, nominal=required, available=available, demand=demand, unit=unit, steps=tuple(steps),
                 notes=tuple(notes), at_most=at_most)


def checks(joint, given):
    """Yield every limit and advice in order."""
    tube, plate = joint.tube, joint.plate
    thinner = min(tube.t_nom, plate.t)
    yield _limit("weld leg min", "Welds, least leg", "Table J2.4", facts.minimum_fillet(thinner), joint.leg,
                 notes=(f"Least leg by the thinner part joined, {thinner:.4g} in.",))
    yield _leg_at_edge(joint)
    do = Working()
    yield _limit("weld length min", "Welds, least length", "J2.2b(c)", do(welds.shortest_weld, joint.leg), joint.l, do.steps)
    yield from _slot(joint, given)
    yield from _spacing(joint)
    yield from _reinforcement(joint)
    yield details.slenderness(tube, given.member_length)


def _leg_at_edge(joint):
    id, title, clause = "weld leg max", "Welds, largest leg along an edge", "J2.2b(b)"
    if joint.concentric:
        return not_applicable(id, title, _PART, clause, "the welds lie in the corners between tube and gusset, not along an edge", kind="detailing")
    do = Working()
    return _limit(id, title, clause, _largest(do, joint.plate.t), joint.leg, do.steps, at_most=True)


def _largest(do, t):
    if t < facts.EDGE_THICKNESS:
        return do(welds.largest_fillet_of_thin_edge, t)
    return do(welds.largest_fillet, t, facts.EDGE_MARGIN)


def _slot(joint, given):
    gap = ("weld gap", "Gap between tube and gusset, most", "AWS D1.1")
    held = ("weld end", "Welds, distance from the gusset's edge in the tube", "Commentary J2.2b")
    if not joint.concentric:
        for id, title, clause in (gap, held):
            yield not_applicable(id, title, _PART, clause, "the tube is not slotted", kind="detailing")
        return
    yield _limit(*gap, MOST_GAP, joint.gap, at_most=True,
                 notes=("A gap of more than 1/16 in is taken off the leg; gaps beyond 3/16 in are not accepted.",))
    if given.end_return:
        yield not_applicable(*held[:2], _PART, held[2], "the welds return round the gusset's edge", kind="advice")
        return
    yield _limit(*held, joint.leg, given.weld_held_back, kind="advice",
                 notes=("A weld that ends at the gusset's edge can notch it; it should stop about one leg short, or return round the edge.",))


def _spacing(joint):
    tube = joint.tube
    id, title = "weld spacing", "Welds, length against distance between them"
    if joint.edition == "360-16" and joint.U_by_hand is None:
        yield _limit(id, title, f"Table D3.1, case {5 if tube.round else 6}", tube.depth, joint.l,
                     notes=("360-16 gives a shear lag factor only where the welds are at least as long as the tube is wide along the gusset.",))
        return
    yield _limit(id, title, "Commentary D3", tube.depth, joint.l, kind="advice",
                 notes=("No minimum in 360-22; shorter welds are covered by the shear lag factor, which falls quickly.",))


def _reinforcement(joint):
    plates = joint.reinforcement
    rows = (("plates leg min", "Reinforcing plates, least leg", "Table J2.4"),
            ("plates leg max", "Reinforcing plates, largest leg along an edge", "J2.2b(b)"),
            ("plates length min", "Reinforcing plates, least length of welds", "J2.2b(c)"))
    if plates is None:
        for id, title, clause in rows:
            yield not_applicable(id, title, _PART, clause, "no reinforcing plates", kind="detailing")
        return
    leg, t = plates.leg, plates.t
    yield _limit(*rows[0], facts.minimum_fillet(min(t, joint.tube.t_nom)), leg)
    do = Working()
    yield _limit(*rows[1], _largest(do, t), leg, do.steps, at_most=True)
    do = Working()
    yield _limit(*rows[2], do(welds.shortest_weld, leg), plates.length, do.steps)


def gap_at_bar(tube, width):
    """Return the gap under the edges of a flat bar of a width laid on the tube; 0 on the flat of a rectangular one. [in]"""
    if not tube.round:
        return 0.0
    R = tube.D / 2
    return R - (R**2 - (width / 2) ** 2) ** 0.5 if width < tube.D else R


def fraction(value):
    """Return a length as printed in sentences."""
    return f"{units.length(value)}"
