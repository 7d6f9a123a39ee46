"""Limits of spacing, edge distance and wrench clearance; slenderness as advice.  [AISC360] D1, J3.3 to J3.6."""

from itertools import pairwise

from ..check import Check, Working, not_applicable
from ..editions import CLAUSES
from ..errors import NotInTable
from ..facts import bolts as facts
from ..geometry import closest_pair, edge_distances, lines_of
from ..provisions import detailing, tension

SLENDER = 300.0
"""Advisory limit of slenderness in tension.  [AISC360] D1, User Note."""


def _limit(id, title, part, clause, required, provided, steps, kind="detailing", at_most=False, unit="in", notes=()):
    """Return a detailing check; ``at_most`` where the provided value may not exceed the limit."""
    demand, available = (provided, required) if at_most else (required, provided)
    return Check(id, title, part, clause, kind=kind, nominal=required, available=available, demand=demand, unit=unit, steps=tuple(steps),
                 notes=tuple(notes), at_most=at_most)


def minimum_spacing(joint, edition):
    """Return the check of the least distance between hole centres."""
    do, pair = Working(), closest_pair(joint.pattern)
    clause = CLAUSES["minimum spacing"][edition]
    if pair is None:
        return not_applicable("spacing min", "Spacing of holes, minimum", "joint", clause, "one bolt only", kind="detailing")
    s_min = do(detailing.minimum_spacing, joint.bolts.d)
    return _limit("spacing min", "Spacing of holes, minimum", "joint", clause, s_min, pair.spacing, do.steps)


def maximum_spacing(joint, edition, weathering):
    """Return the check of the greatest spacing along the member."""
    clause = CLAUSES["maximum spacing and edge distance"][edition]
    gaps = [joint.pattern[b].x - joint.pattern[a].x for line in lines_of(joint.pattern) for a, b in pairwise(line)]
    if not gaps:
        return not_applicable("spacing max", "Spacing along the member, maximum", "joint", clause, "one bolt per line", kind="detailing")
    do = Working()
    t = min(joint.member.t, joint.plate.t)
    if weathering:
        s_max = do(detailing.maximum_spacing_weathering, t, joint.member.constants.spacing_weathering)
    else:
        s_max = do(detailing.maximum_spacing, t, joint.member.constants.spacing)
    return _limit("spacing max", "Spacing along the member, maximum", "joint", clause, s_max, max(gaps), do.steps, at_most=True)


def edges(joint, ply, size, edition, free_sides):
    """Return the checks of end, side and greatest edge distance of one ply.

    Parameters
    ----------
    free_sides : which of the lower and upper side of the strip is a free edge, as a pair of booleans.
    """
    found = edge_distances(ply.bolted, ply.width, ply.end)
    kind, _, direction = ply.kind.partition(" ")
    clause = CLAUSES["minimum edge distance"][edition]
    title = {"member": "Member", "plate": "Plate"}[ply.name]
    checks = []
    sides = [distance for edge in found for distance, free in zip((edge.lower, edge.upper), free_sides) if free]
    for name, provided, toward in (("end", min(edge.end for edge in found), direction == "along"),
                                   ("side", min(sides, default=None), direction == "across")):
        id = f"{ply.name} {name} edge"
        if provided is None:
            checks.append(not_applicable(id, f"{title}, {name} distance, minimum", ply.name, clause,
                                         "both sides of the element are held by the section", kind="detailing"))
            continue
        do = Working()
        required = do(detailing.required_edge_distance, facts.minimum_edge(size), facts.edge_increment(size, kind, toward))
        checks.append(_limit(id, f"{title}, {name} distance, minimum", ply.name, clause, required, provided, do.steps))
    do = Working()
    e_max = do(detailing.maximum_edge_distance, ply.t, ply.constants.edge)
    # Only the bolts next to an edge keep its plies together: of all bolts, the distance of the nearest one to each edge counts.
    nearest = [min(edge.end for edge in found)]
    nearest += [min(getattr(edge, side) for edge in found) for side, free in zip(("lower", "upper"), free_sides) if free]
    note = ("The plate is a gusset: only its free edge at the first row is regarded.",) if ply.name == "plate" else ()
    provided = nearest[0] if ply.name == "plate" else max(nearest)
    checks.append(_limit(f"{ply.name} max edge", f"{title}, edge distance, maximum", ply.name,
                         CLAUSES["maximum spacing and edge distance"][edition], e_max, provided, do.steps, at_most=True, notes=note))
    return checks


def wrench_room(joint):
    """Return the distance from a bolt to the nearest face that a wrench meets, or None where there is no such face. [in]"""
    return min((abs(hole.y - face) for hole in joint.pattern for face in joint.element.faces), default=None)


def tightening(joint, size):
    """Return the advice on room for the wrench (common practice, handbook table)."""
    room = wrench_room(joint)
    id, title, clause = "wrench", "Clearance for tightening", "common practice"
    if room is None:
        return not_applicable(id, title, "joint", clause, "no element beside the bolts", kind="advice")
    try:
        needed = facts.clearances(size).C_1
    except NotInTable as miss:
        return not_applicable(id, title, "joint", clause, str(miss), kind="advice")
    return _limit(id, title, "joint", clause, needed, room, (), kind="advice",
                  notes=("C1 for a heavy hex bolt and a socket; staggered bolts or a smaller tool may do with less.",))


def slenderness(element, length):
    """Return the advice on slenderness in tension."""
    id, title, clause = "slenderness", "Member, slenderness L/r, advisory 300", "D1"
    if length is None:
        return not_applicable(id, title, "member", clause, "member length not given", kind="advice")
    do = Working()
    do.say(f"Least radius of gyration: {element.r_name}.")
    lam = do(tension.slenderness, length, element.r)
    return _limit(id, title, "member", clause, SLENDER, lam, do.steps, kind="advice", at_most=True, unit="",
                  notes=("A recommendation, not a limit: D1 sets none for members in tension.",))
