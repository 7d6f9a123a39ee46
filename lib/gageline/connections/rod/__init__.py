"""A threaded hanger rod and its two attachments: inputs, the parts they describe, the checks that apply."""

from dataclasses import dataclass

from ... import units
from ...check import Working, not_applicable, strength_check
from ...editions import CLAUSES
from ...errors import InputError, NotInTable, ScopeError
from ...facts import grades
from ...facts import rods as facts
from ...facts import welds as weld_facts
from ...provisions import rods, tension
from .. import fatigue, pin, pin_plate
from ..base import Connection
from ..joint import constants
from ..outcome import worked
from .attachments import BESIDE_NUT, Lug, Nut, lug_rules, lug_states, nut_reasons, nut_states
from .inputs import ENDS, RodInputs, checked, given_washer

LEAST_ROD = 5 / 8
"""Least diameter of a hanger rod in practice. [in]  Common practice."""

WASHER_HOLE = 1 / 16
"""By how much the hole of a plate washer is larger than the rod. [in]  Common practice."""


@dataclass(frozen=True)
class RodDesign:
    """A rod and its attachments: what limit states evaluate. Diameters of thread and body d, d_y [in], strengths [ksi]."""

    d: float
    d_y: float
    tpi: float
    metric: bool
    F_y: float
    F_u: float
    upper: Nut | Lug
    lower: Nut | Lug


class RodConnection(Connection):
    """A threaded hanger rod, from one attachment to the other.

    The checks, in order: thread, yielding and rupture of the body; at each end either bearing under the nut, bending of its washer
    and plate, or the lug as a pin-connected plate with its pin and weld; elongation, upset ends and least diameter as advice.
    """

    family = "rod"
    title = "Threaded hanger rod"
    Model = RodInputs
    parts = {"rod": "Rod", "upper": "Upper attachment", "lower": "Lower attachment", "detailing": "Dimensional rules and service"}

    def __init__(self, inputs, basis=None):
        super().__init__(inputs, basis)
        if self.demand.required_compression > 0:
            push = units.ceil_figures(self.demand.required_compression)
            raise ScopeError(f"a rod carries tension only: the loads give a compression of {push} kip; D2 covers members in tension, so hold the "
                             "hanger down by dead load or use a stiff member")
        self.thread = facts.thread(inputs.rod)
        if inputs.thread_strength == "tensile stress area" and self.basis.edition == "360-16":
            raise ScopeError("thread_strength = 'tensile stress area': 360-16 gives threads 0.75 F_u on the body area only (Table J3.2)")
        if inputs.body_diameter is not None and inputs.body_diameter > self.thread.d + 1e-9:
            raise InputError(f"body_diameter = {units.length(inputs.body_diameter)} is more than the thread's "
                             f"{units.length(self.thread.d)}; give the diameter of the thread as rod")
        self.material = self._material(inputs.rod_grade, ("rod",), self.thread.d)
        self.materials = {}
        self.rod = RodDesign(self.thread.d, inputs.body_diameter or self.thread.d, self.thread.tpi, self.thread.metric, self.material.F_y,
                             self.material.F_u, *(self._attachment(end) for end in ENDS))

    def _material(self, grade, forms, thickness):
        form = next((form for form in forms if form in grades.grade(grade).forms), forms[0])
        return grades.material(grade, form=form, thickness=thickness, edition=self.basis.edition)

    def _of(self, end, name):
        return getattr(self.inputs, f"{end}_{name}")

    def _attachment(self, end):
        checked(self.inputs, end)
        t, w = self._of(end, "thickness"), self._of(end, "width")
        plate = self.materials[f"{end} {'lug' if self.lug(end) else 'plate'}"] = self._material(self._of(end, "grade"), ("plate", "bar"), t)
        return self._lug(end, plate, t, w) if self.lug(end) else self._nut(end, plate, t, w)

    def lug(self, end):
        """Return whether an end is a welded lug."""
        return getattr(self.inputs, end) == "welded lug"

    def _nut(self, end, plate, t, w):
        d, hole = self.thread.d, self._of(end, "hole") or facts.standard_hole(self.thread.d)
        w_n, washer = facts.nut_width(d, self.inputs.nut), None
        if hole < d - 1e-9:
            raise InputError(f"{end}_hole = {units.length(hole)} is smaller than the rod, {units.length(d)}")
        if given_washer(self.inputs, end):
            w_w, t_w = self._of(end, "washer"), self._of(end, "washer_thickness")
            steel = self.materials[f"{end} plate washer"] = self._material(self._of(end, "washer_grade"), ("plate", "bar"), t_w)
            washer = (w_w, t_w, steel.F_y, d + WASHER_HOLE)
            if not max(w_n, hole + BESIDE_NUT) < w_w <= w:
                raise InputError(f"{end}_washer = {units.length(w_w)} must be wider than the nut, {units.printed(w_n)} in, and than the hole by "
                                 f"1/8 in, and not wider than the plate, {units.length(w)}")
        elif hole > w_n - BESIDE_NUT + 1e-9:
            raise InputError(f"{end}_hole = {units.length(hole)} leaves the nut, {units.printed(w_n)} in wide, less than 1/16 in all round; "
                             f"give a plate washer ({end}_washer)")
        if w <= max(w_n, hole):
            raise InputError(f"{end}_width = {units.length(w)}: the plate is narrower than the nut, {units.printed(w_n)} in")
        return Nut(end, w_n, hole, plate.F_y, t, w, self._of(end, "span"), washer)

    def _lug(self, end, plate, t, w):
        d, clearance = self._of(end, "pin"), self._of(end, "hole_clearance")
        clearance = pin_plate.CLOSE if clearance is None else clearance
        if clearance > (pin_plate.CLOSE if self.basis.edition == "360-16" else pin_plate.LOOSE) + 1e-9:
            raise ScopeError(f"{end}_hole_clearance = {units.printed(clearance)} in: D5 covers pin holes up to "
                             f"{'1/32' if self.basis.edition == '360-16' else '1/16'} in larger than the pin")
        if w <= d + clearance + 0.25:
            raise InputError(f"{end}_width = {units.length(w)} leaves less than 1/8 in on each side of the pin hole")
        steel = self.materials[f"{end} pin"] = self._material(self._of(end, "pin_grade"), ("rod", "bar"), d)
        made = pin_plate.PinPlate(end, f"{end.capitalize()} lug", 1, plate.F_y, plate.F_u, t, w, self._of(end, "edge"), d + clearance,
                                  b_0=constants(self.basis).beside_pin)
        F_EXX = weld_facts.electrode(self.inputs.lug_electrode).F_EXX
        try:
            above = weld_facts.classes_above_matching(F_EXX, self._of(end, "grade"), t)
        except NotInTable:
            above = 0
        if above > 1:
            raise ScopeError(f"lug_electrode = {self.inputs.lug_electrode!r}: filler metal may be at most one class above matching (Table J2.5)")
        return Lug(end, made, pin.Pin(d, steel.F_y, steel.F_u, self._of(end, "arm"), t, self._of(end, "gap")), self._of(end, "weld"), F_EXX)

    # The checks

    def limit_states(self, design):
        """Return (id, title, part, clause, limit state, axial, evaluate) of every strength in tension."""
        clause = f"{CLAUSES['bolt shear'][self.basis.edition]}, Table J3.2"
        rows = [("rod thread", "Rod, rupture of the thread", "rod", clause, "bolts", True, self._thread),
                ("rod yielding", "Rod, yielding of the body", "rod", "D2(a)", "yielding", True,
                 lambda r: worked(lambda do: do(tension.gross_yielding, r.F_y, do(rods.body_area, r.d_y)))),
                ("rod rupture", "Rod, rupture of the body", "rod", "D2(b)", "rupture", True,
                 lambda r: worked(lambda do: do(tension.net_rupture, r.F_u, do(rods.body_area, r.d_y))))]
        for end in ENDS:
            rows += lug_states(getattr(design, end), self.basis.edition) if self.lug(end) else nut_states(getattr(design, end))
        return rows

    def _thread(self, rod):
        on_stress_area = self.inputs.thread_strength == "tensile stress area"

        def by_body(do):
            return do(rods.thread_rupture, rod.F_u, do(rods.thread_area, rod.d))

        def by_stress_area(do):
            A_ts = do(rods.tensile_stress_area_metric if rod.metric else rods.tensile_stress_area, rod.d, rod.tpi)
            return do(rods.thread_rupture_on_stress_area, rod.F_u, A_ts)

        found = worked(by_stress_area if on_stress_area else by_body)
        if self.basis.edition == "360-16":
            return found
        other = worked(by_body if on_stress_area else by_stress_area).nominal
        said = "0.75 Fu on the body area, the customary value, is" if on_stress_area else "360-22 permits Fu on the tensile stress area instead:"
        return found._replace(notes=(f"{said} {units.force(other, units.floor_figures)}, nominal.",))

    def _checks(self):
        T, method = self.demand.required_tension, self.basis.method
        for id, title, part, clause, state, axial, evaluate in self.limit_states(self.rod):
            found = evaluate(self.rod)
            yield strength_check(id, title, part, clause, state, method, found.nominal, T, found.steps, axial, path=found.path, notes=found.notes)
        for end in ENDS:
            if not self.lug(end):
                yield from nut_reasons(getattr(self.rod, end))
        yield not_applicable("compression", "Rod, compression", "rod", "Chapter E", "no combination gives compression")
        for end in ENDS:
            if self.lug(end):
                yield from lug_rules(getattr(self.rod, end), self.basis.edition)
        yield pin_plate.limit("rod least", "Rod, least diameter in practice", "rod", "common practice", LEAST_ROD, self.rod.d, kind="advice")
        yield self._upset()
        yield self._elongation()
        yield not_applicable("slenderness", "Rod, slenderness", "rod", "D1", "D1 sets no limit for rods", kind="advice")

    def _upset(self):
        id, title, clause, rod = "rod upset", "Rod, thread against yielding of the body", "Table J3.2, 2005", self.rod
        if rod.d_y >= rod.d - 1e-9:
            return not_applicable(id, title, "rod", clause, "the ends are not upset", kind="advice")
        do = Working()
        thread = rods.thread_rupture.bare(rod.F_u, rods.thread_area.bare(rod.d))
        needed = do(tension.gross_yielding, rod.F_y, do(rods.body_area, rod.d_y))
        return pin_plate.limit(id, title, "rod", clause, needed, thread, do.steps, kind="advice", unit="kip",
                               notes=("Upset ends: by older editions 0.75 Fu on the thread's body area was to exceed Fy on the area of the body; "
                                      "good practice still.",))

    def _elongation(self):
        id, title, clause, length = "rod elongation", "Rod, elongation at service load", "statics", self.inputs.rod_length
        if length is None:
            return not_applicable(id, title, "rod", clause, "the length of the rod is not given", kind="advice")
        P_s, where = self.service_tension()
        do = Working()
        Delta = do(rods.elongation, P_s, length, grades.E, rods.body_area.bare(self.rod.d_y))
        if self.inputs.elongation_limit is None:
            return not_applicable(id, title, "rod", clause, f"no limit is given; under {where} the rod stretches by {Delta:.3f} in", kind="advice")
        limit = self.inputs.elongation_limit
        return pin_plate.limit(id, title, "rod", clause, limit, Delta, do.steps, at_most=True, kind="advice",
                               notes=(f"Elongation of the rod's body under {where}, {units.force(P_s, units.ceil_figures)}; attachments not counted.",))

    def fatigue_details(self, by_id):
        """Return the details that live load may crack: the thread, and lugs at their pin and at their welds."""
        rod, thread = self.rod, self.thread
        out = [fatigue.Detail("thread", "thread of the rod", "rod", "G", "Table A-3.1, 8.5",
                              lambda do: fatigue.thread(do, thread.d, thread.tpi, thread.metric, 1), F_y=rod.F_y)]
        for end in ENDS:
            if self.lug(end):
                lug = getattr(rod, end)
                out += [fatigue.at_pin(end, f"{end} lug", lug.plate, lug.plate.w),
                        fatigue.Detail(f"{end} weld", f"{end} lug, root of its welds", end, "C", "Table A-3.1, 5.7, by its equation for fillets",
                                       (f"{end} yielding", "A_g"), root=(lug.w_f, lug.plate.t)),
                        fatigue.throats(end, f"welds of the {end} lug", f"{end} weld")]
        return out

    # What the report says beside the checks

    def assumptions(self):
        """Return (text, basis) of what the calculation takes for granted."""
        notes = [("The rod hangs straight in the axis of both attachments and is free of bending.", "detailing"),
                 ("Nuts have full height, engage the whole thread and match the rod's steel, so that the rod's thread governs.",
                  "ASTM A563, common practice")]
        if self.rod.d_y >= self.rod.d - 1e-9:
            notes.append(("Threads are cut in a rod of the full diameter; for rolled threads give the smaller body_diameter.", "input"))
        if any(not self.lug(end) for end in ENDS):
            extra = " and 1/8 in" if self.inputs.nut == "heavy hex" else ""
            notes.append((f"A {self.inputs.nut} nut bears on a ring of the width across its flats, 1.5 diameters{extra}.",
                          "ASME B18.2.2, from memory"))
            notes.append(("Bearing under nuts and plate washers is taken by J7.", "analogy"))
        if any(given_washer(self.inputs, end) for end in ENDS):
            notes.append(("The hole of a plate washer is 1/16 in larger than the rod.", "common practice"))
        if any(self.lug(end) for end in ENDS):
            notes += [("The lug stands in the plane of the load; the clevis keeps it central on the pin and turns on it under load.", "D5.2"),
                      ("The Specification has no clause for a pin in shear: yielding by analogy with J4.2(a) and the strength of a threaded part "
                       "with its threads outside the shear planes are both checked.", "analogy"),
                      ("Where pin and lug have different yield stresses, the smaller one counts in bearing.", "conservative reading of J7"),
                      (f"Lugs are welded with {self.inputs.lug_electrode} over their width at the pin, on both faces.", "input")]
        for what, material in (("Rod", self.material), *((name.capitalize(), m) for name, m in self.materials.items())):
            if material.note:
                notes.append((f"{what} steel {material.name}: {material.note}.".replace("..", "."), "availability, from memory"))
        notes += [(text, "loads") for text in getattr(self.demand, "notes", ())]
        return [*super().assumptions(), *notes]

    def open_items(self):
        """Return what has to be confirmed before the calculation may be relied on."""
        needed = units.ceil_figures(self.demand.required_tension)
        clevis = [f"Clevis at the {end} end to be chosen by its maker's rating for {needed} kip ({self.basis.method})."
                  for end in ENDS if self.lug(end)]
        return [*super().open_items(), *clevis]

    def materials_text(self):
        """Return the steels with their strengths, in a sentence; symbols between dollar signs."""
        parts = (("rod", self.material), *self.materials.items())
        return "; ".join(f"{part}: {m.name}, $F_y$ {m.F_y:g} ksi, $F_u$ {m.F_u:g} ksi" for part, m in parts)

    def by_others(self):
        """Return what the scope leaves to others."""
        out = ["the parts of the structure that carry the attachments"]
        if any(self.lug(end) for end in ENDS):
            out.append("clevises, by their maker's rating, and what keeps the pins in place; base metal of the part a lug is welded to")
        if any(not self.lug(end) for end in ENDS):
            out.append("shear and deflection of the plates under nuts, and locking of the nuts")
        return (*out, "turnbuckles and couplers, sway, vibration, fatigue, seismic detailing, corrosion and fire")

    def designed(self):
        """Return (item, what is to be built) rows for comparison with the drawings."""
        given, f = self.inputs, units.fraction
        thread = self.thread.name + ("" if self.thread.metric else f" in, {self.thread.tpi:g} threads per inch (UNC)")
        body = "" if self.rod.d_y >= self.rod.d - 1e-9 else f", body {f(self.rod.d_y, unit=' in')}"
        long = "" if given.rod_length is None else f", {units.feet(given.rod_length)} long"
        return [("Rod", f"{thread}, {self.material.name}{body}{long}"), *((f"{end.capitalize()} end", self._built(end)) for end in ENDS)]

    def _built(self, end):
        f, part = units.fraction, getattr(self.rod, end)
        steel = self.materials[f"{end} {'lug' if self.lug(end) else 'plate'}"].name
        if self.lug(end):
            return (f"lug PL {f(part.plate.t)} x {f(part.plate.w)}, {steel}, {f(part.plate.a, unit=' in')} from the hole's edge to the end; "
                    f"pin {f(part.pin.d, unit=' in')}, {self.materials[f'{end} pin'].name}, in a hole of {units.printed(part.plate.d_h)} in; "
                    f"fillet welds {f(part.w_f, unit=' in')} on both faces; clevis by its maker")
        washer = ""
        if part.washer:
            washer = f", plate washer {f(part.washer[1])} x {f(part.washer[0])} square, {self.materials[f'{end} plate washer'].name}"
        span = "" if part.span is None else f", span {f(part.span, unit=' in')}"
        return f"{self.inputs.nut} nut on PL {f(part.t)} x {f(part.w)}, {steel}, hole {f(part.d_h, unit=' in')}{span}{washer}"

    @property
    def design(self):
        """The rod as designed."""
        return self.rod

    @property
    def subject(self):
        """What the calculation is about."""
        return f"{self.thread.name}{'' if self.thread.metric else ' in'}, {self.material.name}"

    def drawings(self):
        """Return the elevation of both attachments and their sections."""
        from .drawing import elevation, sections

        return elevation(self), sections(self)

    def sweep(self):
        """Return why there is no sweep."""
        return "Not drawn: a rod has no connection length that could be varied; its strength follows from its diameter and its steel."


CONNECTION = RodConnection
