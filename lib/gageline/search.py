"""Search for a better bolted layout: every combination of what may vary, evaluated on arrays, detailing rules as constraints.

What changes the topology of the joint (rows, lines, bolt, group, shape, steel) is looped over; what is a length (pitch, gage, plate,
distances) is an array. Both go through the very limit states that the checks use, so a layout found here is the layout checked there.
"""

import itertools
from dataclasses import dataclass, field

import numpy as np

from . import families, study, units
from .editions import Basis
from .errors import GagelineError, InputError, ScopeError, nearest
from .facts import bolts as facts
from .geometry.pattern import clear_between, least, most

LENGTHS = ("pitch", "gage", "gage_from_back", "member_end", "plate_end", "plate_thickness", "plate_width")
"""Inputs that vary as arrays; every other input that varies is looped over."""

OBJECTIVES = {
    "fewest bolts": lambda layout: layout["bolts"],
    "shortest connection": lambda layout: layout["length"],
    "least plate weight": lambda layout: layout["plate weight"],
    "least member weight": lambda layout: layout["member weight"],
}
"""Objective -> what is made small; a mapping of objectives to weights makes a weighted sum."""

STEEL = 0.000283565
"""Weight of steel per volume. [kip/in³]  490 lb/ft³, common practice."""


@dataclass(frozen=True)
class Found:
    """What a search found.

    Parameters
    ----------
    evaluated : layouts evaluated. feasible : how many satisfy every strength and every detailing rule.
    layouts : name -> (feasible,) values, best first: the inputs that varied, and ratio, bolts, length, plate weight, member weight.
    refused : sentence -> number of topologies that no provision covers, for that reason.
    base : the inputs that did not vary.
    """

    evaluated: int
    feasible: int
    layouts: dict
    refused: dict
    base: dict = field(repr=False)
    basis: Basis = field(repr=False, default_factory=Basis)
    family: str = "bolted"

    def inputs(self, i=0):
        """Return the inputs of the i-th best layout, lengths as texts with units."""
        varied = {name: self.layouts[name][i] for name in self.layouts if name not in RESULTS}
        return self.base | {name: f"{value:.10g} in" if name in LENGTHS else value.item() if hasattr(value, "item") else value
                            for name, value in varied.items()}

    def inputs_cell(self, i=0):
        """Return the source of an inputs cell for the i-th best layout."""
        return "".join(f"{name} = {value!r}  # {'chosen by the search' if name in self.layouts else 'as given to the search'}\n"
                       for name, value in self.inputs(i).items())

    def connection(self, i=0):
        """Return the i-th best layout as an ordinary, validated connection."""
        made = families.family(self.family)
        return made(made.Model.of(**self.inputs(i)), self.basis)

    def pareto(self, x="bolts", y="plate weight"):
        """Return the indices of the layouts that no other beats in both x and y, by growing x."""
        xs, ys = self.layouts[x], self.layouts[y]
        order = np.lexsort((ys, xs))
        kept, lowest = [], np.inf
        for i in order:
            if ys[i] < lowest - 1e-12:
                kept.append(int(i))
                lowest = ys[i]
        return kept


RESULTS = ("ratio", "bolts", "length", "plate weight", "member weight")


def search(inputs, vary, objective="fewest bolts", *, edition="360-22", method="LRFD", loads="7-22", keep=1000):
    """Find every layout that satisfies all checks, best first.

    Parameters
    ----------
    inputs : name -> value of a bolted connection, as in an inputs cell.
    vary : name -> list of values tried, quantities as texts with units; all combinations are evaluated.
    objective : one of ``OBJECTIVES``, or a mapping from them to weights; equal layouts are ranked by the lower D/C.
    keep : how many of the best are returned.

    Raises
    ------
    InputError
        An unknown input or objective, an empty list, or inputs that no value tried can complete.
    """
    made = families.family("bolted")
    for name in vary:
        if name not in made.Model.model_fields:
            raise InputError(f"vary: unknown input {name!r}; nearest known inputs: {nearest(name, made.Model.model_fields)}")
        if not len(vary[name]):
            raise InputError(f"vary: {name} has no values to try")
    if inputs.get("holes") or "holes" in vary:
        raise InputError("a search varies lines, rows, pitch and gage; leave holes out")
    weights = {objective: 1.0} if isinstance(objective, str) else dict(objective)
    if unknown := [name for name in weights if name not in OBJECTIVES]:
        raise InputError(f"objective {unknown[0]!r} is not known; known: {', '.join(OBJECTIVES)}")
    basis = Basis(edition, method, loads)
    lengths = {name: np.array([units.read(value, "in", name) for value in vary[name]]) for name in LENGTHS if name in vary}
    looped = {name: list(vary[name]) for name in vary if name not in lengths}
    # The product of all lengths, one flat array each.
    grids = dict(zip(lengths, (axis.ravel() for axis in np.meshgrid(*lengths.values(), indexing="ij")))) if lengths else {}
    size = max((grid.size for grid in grids.values()), default=1)
    collected, refused, evaluated, template = [], {}, 0, None
    for name in ("fatigue_range", "fatigue_cycles", "seismic_system"):
        if name in inputs or name in vary:
            raise InputError(f"{name}: a search covers strength in tension only; leave it out, and check the layouts it finds with it")
    for values in itertools.product(*looped.values()):
        changed = dict(zip(looped, values))
        evaluated += size
        try:
            template = _topology(made, inputs | changed, lengths, basis)
            if template.demand.required_compression > 0:
                break
            collected.append(_evaluate(template, grids, size, changed))
        except GagelineError as error:
            refused[str(error)] = refused.get(str(error), 0) + 1
    if template is None:
        raise InputError(next(iter(refused)))
    if template.demand.required_compression > 0:
        raise InputError("the member goes into compression: a search covers strength in tension only; search with the tension alone, and check "
                         "the layouts it finds with all loads")
    return _ranked(collected, weights, evaluated, refused, inputs, basis, keep)


def _topology(made, inputs, lengths, basis):
    """Return an unvalidated connection whose topology is that of the inputs; lengths that vary stand at their middle value."""
    middle = {name: f"{float(np.median(axis)):.10g} in" for name, axis in lengths.items()}
    return made(made.Model.of(**(inputs | middle)), basis, refuse_layout=False)


def _evaluate(connection, grids, size, changed):
    given = connection.inputs
    changes = {name: grid for name, grid in grids.items() if name != "gage"}
    if "gage" in grids and given.lines > 1:
        changes["gage"] = (grids["gage"],)
    joint = connection.at(**changes)
    if joint.rows < 2 and connection.element.eccentricity is not None and given.U_by_hand is None:
        raise ScopeError("one bolt per line: Table D3.1 case 2 needs a connection length, so no U applies")
    strengths = study.over(connection, joint, (size,))
    T = connection.demand.required_tension
    with np.errstate(divide="ignore", invalid="ignore"):
        weakest = np.minimum.reduce(list(strengths.values()))
        ratio = np.where(weakest > 0, T / weakest, np.inf)
    good = (ratio <= 1 + 1e-12) & _detailed(connection, joint, size)
    at = np.flatnonzero(good)
    length = np.broadcast_to(np.asarray(joint.length, dtype=float), (size,))
    plate = joint.plate
    volume = plate.pieces * plate.width * plate.t * (np.asarray(plate.end.at(plate.width / 2)) + length + given.member_end)
    results = {"ratio": ratio, "bolts": np.full(size, joint.n_bolts), "length": length,
               "plate weight": np.broadcast_to(volume * STEEL, (size,)), "member weight": np.full(size, connection.element.A_g * 12 * STEEL)}
    out = {name: np.array([value] * len(at), dtype=object) for name, value in changed.items()}
    out |= {name: np.broadcast_to(grid, (size,))[at] for name, grid in grids.items()}
    return out | {name: value[at] for name, value in results.items()}


def _detailed(connection, joint, size):
    """Return (size,) whether every rule of spacing, edges and room for the wrench is met: the rules of ``details`` and ``refusals``."""
    d, given, ok = connection.size.d, connection.inputs, np.ones(size, dtype=bool)
    pattern, plate = joint.pattern, joint.plate.bolted
    for i, j in _neighbours(given):
        ok &= np.hypot(pattern[i].x - pattern[j].x, pattern[i].y - pattern[j].y) >= 8 / 3 * d - 1e-9
        for ply in (pattern, plate):
            ok &= clear_between(ply[i], ply[j]) >= d - 1e-9
    t = np.minimum(joint.member.t, joint.plate.t)
    cap, times = (joint.member.constants.spacing_weathering, 14) if given.bare_weathering else (joint.member.constants.spacing, 24)
    if given.rows > 1:
        gaps = [pattern[i + 1].x - pattern[i].x for i in range(given.rows - 1)]
        for gap in gaps:
            ok &= gap <= np.minimum(times * t, cap) + 1e-9
    held = {attachment.y for attachment in connection.element.attachments}
    for ply, free in ((joint.member, (0.0 not in held, connection.element.width not in held)), (joint.plate, (True, True))):
        kind, _, direction = ply.kind.partition(" ")
        required = {toward: facts.minimum_edge(connection.size) + facts.edge_increment(connection.size, kind, toward) for toward in (True, False)}
        ends = [ply.end.distance(hole.x, hole.y) for hole in ply.bolted]
        sides = [side for hole in ply.bolted for side, is_free in zip((hole.y, ply.width - hole.y), free) if is_free]
        for end in ends:
            ok &= end >= required[direction == "along"] - 1e-9
        for side in sides:
            ok &= side >= required[direction == "across"] - 1e-9
        nearest_end = least(ends)
        farthest = nearest_end if ply.name == "plate" else most([nearest_end, *(least(column) for column in _sides(ply, free))])
        ok &= farthest <= np.minimum(12 * ply.t, ply.constants.edge) + 1e-9
    # Holes must lie on the part, held sides included.
    for ply in (joint.member, joint.plate):
        for hole in ply.bolted:
            ok &= (hole.y - hole.across / 2 >= -1e-6) & (hole.y + hole.across / 2 <= ply.width + 1e-6)
    if connection.element.faces:
        try:
            room = facts.clearances(connection.size).C_2
        except LookupError:
            room = d
        for hole in pattern:
            for face in connection.element.faces:
                ok &= np.abs(hole.y - face) >= room - 1e-9
    return ok & _fits_beside_flanges(connection, joint)


def _neighbours(given):
    """Return the pairs of holes that can be closest; holes are counted line by line."""
    rows, lines = given.rows, given.lines
    if given.stagger:
        return list(itertools.combinations(range(rows * lines), 2))
    along = [(line * rows + row, line * rows + row + 1) for line in range(lines) for row in range(rows - 1)]
    return along + [(line * rows, (line + 1) * rows) for line in range(lines - 1)]


def _sides(ply, free):
    lower = [hole.y for hole in ply.bolted]
    return [column for column, is_free in zip((lower, [ply.width - y for y in lower]), free) if is_free]


def _fits_beside_flanges(connection, joint):
    part = connection.element
    if part.name not in ("web", "stem") or (part.series in ("C", "MC") and connection.inputs.plates == 1):
        return True
    lo = joint.pattern[0].y - joint.plate_pattern[0].y
    fits = lo >= -1e-9
    return fits & (lo + joint.plate.width <= part.width + 1e-9) if part.name == "web" else fits


def _ranked(collected, weights, evaluated, refused, base, basis, keep):
    names = list(collected[0]) if collected else []
    joined = {name: np.concatenate([each[name] for each in collected]) for name in names}
    feasible = len(joined["ratio"]) if joined else 0
    if not feasible:
        return Found(evaluated, 0, {name: np.array([]) for name in names}, refused, base, basis)
    score = sum(weight * np.asarray(OBJECTIVES[name](joined), dtype=float) for name, weight in weights.items())
    order = np.lexsort((joined["ratio"], np.round(score, 12)))[:keep]
    return Found(evaluated, feasible, {name: values[order] for name, values in joined.items()}, refused, base, basis)
