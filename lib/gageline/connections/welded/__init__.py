"""A welded end of a tension member and its connection plates: inputs, the welds they describe, the checks that apply."""

from dataclasses import replace

import numpy as np

from ... import units
from ...check import not_applicable, strength_check
from ...errors import ScopeError
from ...facts import grades
from .. import fatigue, plate, seismic, weld_group
from ..base import Connection, Sweep, Table
from ..element import element
from . import layout, limits, strengths
from .inputs import WeldedInputs

BLOCK_SHEARS = "the end weld joins the longitudinal ones: the base metal is checked round all of them, as block shear"
ACROSS = "transverse welds only: no plane is sheared along the load"


class WeldedConnection(Connection):
    """A welded tension connection, from the member's gross section to its connection plates.

    The checks, in order: member yielding, net rupture with shear lag, shear of its base metal along the welds, block shear; the
    welds; plate base metal along the welds, block shear, yielding and rupture on the Whitmore and on the physical width;
    compression where the load reverses; size, length, lap and place of the welds, slenderness.
    """

    family = "welded"
    title = "Welded tension connection"
    Model = WeldedInputs
    parts = {"member": "Member", "weld": "Welds", "plate": "Connection plate", "detailing": "Size, length and place of the welds"}

    def __init__(self, inputs, basis=None):
        super().__init__(inputs, basis)
        self.element = element(inputs.member, inputs.connected_by, inputs.plate_thickness)
        self.member_material = self._material(inputs.member_grade, inputs.member)
        self.plate_material = grades.material(inputs.plate_grade, form="plate", thickness=inputs.plate_thickness, edition=self.basis.edition)
        self.electrode = layout.filler(self)
        self.demand = seismic.demand(self)
        self.end, self.exact = layout.build(self)

    def _material(self, grade, designation):
        if self.element.series != "PL":
            return grades.material(grade, form="shape", series=self.element.series, edition=self.basis.edition)
        form = "bar" if designation.strip().lower().startswith("bar") else "plate"
        return grades.material(grade, form=form, thickness=self.element.t, edition=self.basis.edition)

    # The checks

    def limit_states(self, end):
        """Return (id, title, part, clause, limit state, axial, evaluate) of every strength in tension; ``end`` may hold arrays."""
        tears, plate_tears = (strengths.member_tears(end), strengths.plate_tears(end)) if end.sided else ([], [])
        rows = [
            ("member yielding", "Member, yielding of the gross section", "member", "D2(a)", "yielding", True, strengths.gross_yielding),
            ("member rupture", "Member, rupture of the net section", "member", "D2(b), D3", "rupture", True, strengths.net_rupture),
        ]
        if not end.across:
            rows += self._along("member", "Member", lambda e: e.member)
        if tears:
            rows.append(("member block", "Member, block shear", "member", "J4.3", "block shear", False,
                         lambda e: strengths.block_shear(e, e.member, strengths.member_tears(e))))
        rows.append(("weld", "Welds, strength", "weld", "J2.4, Table J2.5", "weld", False, strengths.weld_strength))
        if not end.across:
            rows += self._along("plate", "Plate", lambda e: e.plate)
        if plate_tears:
            rows.append(("plate block", "Plate, block shear", "plate", "J4.3", "block shear", False,
                         lambda e: strengths.block_shear(e, e.plate, strengths.plate_tears(e))))
        return [
            *rows,
            ("Whitmore yielding", "Plate, yielding on the Whitmore width", "plate", "J4.1(a)", "yielding", False, plate.whitmore_yielding),
            ("Whitmore rupture", "Plate, rupture on the Whitmore width", "plate", "J4.1(b)", "rupture", False, plate.whitmore_rupture),
            ("plate yielding", "Plate, yielding of the gross section", "plate", "J4.1(a)", "yielding", False, plate.gross_yielding),
            ("plate rupture", "Plate, rupture of the net section", "plate", "J4.1(b)", "rupture", False, strengths.plate_rupture),
        ]

    def _along(self, id, title, part):
        return [(f"{id} shear yielding", f"{title}, shear yielding along the welds", id, "J4.2(a)", "shear yielding", False,
                 lambda e: strengths.yielding_along_welds(e, part(e))),
                (f"{id} shear rupture", f"{title}, shear rupture along the welds", id, "J4.2(b)", "shear rupture", False,
                 lambda e: strengths.rupture_along_welds(e, part(e)))]

    def _checks(self):
        end, T, C, method = self.end, self.demand.required_tension, self.demand.required_compression, self.basis.method
        for id, title, part, clause, state, axial, evaluate in self.limit_states(end):
            if id in ("weld", "Whitmore yielding"):
                yield from self._apart("member" if id == "weld" else "plate")
            found = evaluate(end)
            reverses = id == "weld" or state.startswith("shear") or (state == "block shear" and end.across)
            steps = (*layout.balanced_steps(self), *found.steps) if id == "weld" else found.steps
            yield strength_check(id, title, part, clause, state, method, found.nominal, max(T, C) if reverses else T, steps, axial,
                                 path=found.path, notes=found.notes)
        yield self._compression(C)
        yield from limits.detailing(self)

    def _apart(self, id):
        """Yield the checks of a part that do not apply, with their reasons."""
        title, tears = {"member": ("Member", strengths.member_tears), "plate": ("Plate", strengths.plate_tears)}[id]
        if self.end.across:
            why = BLOCK_SHEARS if self.end.sided else ACROSS
            yield not_applicable(f"{id} shear yielding", f"{title}, shear yielding along the welds", id, "J4.2(a)", why)
            yield not_applicable(f"{id} shear rupture", f"{title}, shear rupture along the welds", id, "J4.2(b)", why)
        if not self.end.sided:
            yield not_applicable(f"{id} block", f"{title}, block shear", id, "J4.3", ACROSS)
        elif not tears(self.end):
            yield not_applicable(f"{id} block", f"{title}, block shear", id, "J4.3",
                                 "welds along both edges of a flat bar, nothing hangs on it: its whole section is in net rupture")

    def _compression(self, C):
        id, title, clause = "gusset compression", "Plate, compression on the Whitmore width", "J4.4"
        if C <= 0:
            return not_applicable(id, title, "plate", clause, "no combination gives compression")
        found = plate.compression(self.end)
        return strength_check(id, title, "plate", clause, "compression", self.basis.method, found.nominal, C, found.steps, True, tension=False)

    def brace(self):
        """Return the member as a brace of a seismic system."""
        part = self.element
        return seismic.Brace(part.A_g, self.member_material.F_y, self.member_material.name, "plate" if part.series == "PL" else "rolled", part.r,
                             self.inputs.member_length, self.inputs.plate_thickness)

    def fatigue_details(self, by_id):
        """Return the details that live load may crack: member and plate at the ends of the welds, and their throats."""
        end = self.end
        if end.across or not end.sided:
            raise ScopeError(f"welds = {self.inputs.welds!r}: Table A-3.1 has no case of a lap joint with transverse fillets; use "
                             "longitudinal ones only")
        if self.element.series in layout.ANGLES and not end.concentric:
            raise ScopeError("the welds of the angle do not balance on its centroid, as case 4.1 of Table A-3.1 and J1.7 ask under cyclic load; "
                             "give weld_balanced")
        note = "" if self.element.eccentricity is None else \
            "Shear lag lowers the area; bending from the eccentricity across the plate is in it only so far."
        return (fatigue.weld_ends("member", "Member", self.element.t, ("member rupture", "A_e"), end.member.F_y, note),
                fatigue.weld_ends("plate", "Plate", self.inputs.plate_thickness, ("Whitmore yielding", "A_g"), end.plate.F_y),
                fatigue.throats("weld", "Welds", "weld"))

    # What the report says beside the checks

    def assumptions(self):
        """Return (text, basis) of what the calculation takes for granted."""
        end, given = self.end, self.inputs
        notes = [(f"Fillet welds with equal legs, all of one size, filler metal {self.electrode.name}.", "input")]
        if not end.across:
            notes.append(("Each weld line shears the base metal along one plane in each part; the plane on its other side is not counted.",
                          "conservative"))
        if self.demand.required_compression > 0:
            notes.append(("Under compression welds and base metal have the strength that they have under tension.", "conservative"))
        if wet := layout.low_hydrogen(self):
            notes.append((f"Shielded metal arc welding of {' and '.join(wet)} is with low-hydrogen electrodes.", "User Note J2.6"))
        notes += [("Tension over a torn block is uniform, $U_{bs}$ = 1.0; a plane of shear is as long as its weld.", "Commentary J4.3"),
                  ("The load spreads from the start of each weld at 30° (Whitmore).", "Commentary J4.1")]
        if self.element.series in layout.ANGLES:
            notes.append(self._angle_note())
        if self.element.eccentricity is not None:
            notes.append(("Eccentricity across the connection plane is in U; bending from it in member and plate is not regarded.", "Table D3.1"))
        for material, part in ((self.member_material, "Member"), (self.plate_material, "Plate")):
            if material.note:
                notes.append((f"{part} steel {material.name}: {material.note}", "availability, from memory"))
        if missing := layout.unmatched(self):
            notes.append((f"No matching filler metal is tabulated for {' and '.join(missing)}; {self.electrode.name} is taken to be at most one "
                          "class above matching.", "J2.6, to be confirmed"))
        notes += [(text, "loads") for text in getattr(self.demand, "notes", ())]
        if given.U_by_hand is not None:
            notes.append((f"U = {given.U_by_hand:g} set by the engineer: {given.U_basis}", "engineer"))
        return [*super().assumptions(), *notes]

    def _angle_note(self):
        off = self._off_centroid()
        if self.end.concentric:
            return (f"The welds balance on the centroid of the angle within {units.printed(max(off, 0.01), 2)} in.", "J1.7")
        return (f"The centroid of the welds lies {units.printed(off)} in from that of the {self.element.member}: J1.7 lets end connections of angles "
                "do without balance under static load; the bending is not regarded. Balance them where the load is cyclic.", "J1.7")

    def _off_centroid(self):
        end = self.end
        y_w = end.g / 2 if not end.sided else (end.l_2 * end.g + end.l_t * end.g / 2) / (end.l_1 + end.l_2 + end.l_t)
        return abs(y_w - layout.centroid(self.element)) if self.element.series in layout.ANGLES else 0.0

    def materials_text(self):
        """Return the steels with their strengths, in a sentence; symbols between dollar signs."""
        parts = ((f"member {self.element.member}", self.member_material), ("plate", self.plate_material))
        steels = "; ".join(f"{part}: {m.name}, $F_y$ {m.F_y:g} ksi, $F_u$ {m.F_u:g} ksi" for part, m in parts)
        return f"{steels}; filler metal: {self.electrode.name}, $F_{{EXX}}$ {self.electrode.F_EXX:g} ksi"

    def by_others(self):
        """Return what the scope leaves to others."""
        out = ["the edge of the connection plate at its support: weld or bolts, and the support itself",
               "bending from eccentricity of the connection in and out of its plane", "welding procedure, preheat, inspection",
               "fatigue, seismic detailing, corrosion and fire"]
        if self.demand.required_compression > 0:
            out.insert(0, "the member in compression between its ends")
        return tuple(out)

    def designed(self):
        """Return (item, what is to be built) rows for comparison with the drawings."""
        given, end, part = self.inputs, self.end, self.element
        leg = units.length(end.w_f)
        if not end.sided:
            welds = f"{leg} fillet across the end of the member and across the end of the plate, {units.length(end.g)} each"
        elif end.equal:
            welds = f"{leg} fillet along both edges, {units.length(end.l_1)} each"
        else:
            welds = f"{leg} fillet, {units.length(end.l_1)} along the {end.edges[0]}, {units.length(end.l_2)} along the {end.edges[1]}"
        if end.across == 1:
            welds += f", and {units.length(end.g)} across the end of the {'plate' if end.on_plate else 'member'}"
        if end.groups > 1:
            welds += f"; {end.groups} groups alike"
        member = f"{part.member}, {self.member_material.name}"
        if part.name != "plate":
            member += f", welded by {'both' if part.joints == 2 else 'its'} {part.name}{'s' if part.pieces == 2 else ''}"
        plates = f"{end.plate.pieces} PL {units.fraction(given.plate_thickness)} x {units.fraction(given.plate_width)}, {self.plate_material.name}"
        return [("Member", member), ("Plates", plates),
                ("Welds", welds), ("Filler metal", f"{self.electrode.name}, equal legs"),
                ("Lap", f"{units.length(end.lap)} along the load")]

    @property
    def design(self):
        """The welded end as designed."""
        return self.end

    @property
    def subject(self):
        """What the calculation is about."""
        return self.element.member

    def tables(self, part):
        """Return the table of every weld, beside the check of the welds."""
        if part != "weld":
            return ()
        from ...check import silent

        end, rows = self.end, []
        throat = end.w_f / 2**0.5
        for line in (*end.longitudinal, *end.transverse):
            counted = weld_group.counted_length(silent, line.length, end.w_f) if line in end.longitudinal else line.length
            name = line.name.partition(",")[0]
            rows.append((name, str(line.n), units.fraction(line.length), units.printed(line.length / end.w_f, 3), units.printed(counted, 3),
                         units.floor_figures(0.6 * end.F_EXX * line.n * throat * counted)))
        heads = ("Weld", "lines", "length, in", "$l_w/w_f$", "$l_{we}$, in", "nominal, kip")
        remark = ""
        if self.element.series in layout.ANGLES:
            remark = (f"Centroid of the welds against that of the angle, along the leg: {units.printed(self._off_centroid(), 3)} in apart"
                      f"{' (lengths rounded up from the balanced ones)' if self.exact else ''}.")
        return (Table("Every weld", heads, tuple(rows), "Nominal strengths of all like lines together, no directional increase.", remark),)

    def drawings(self):
        """Return the elevation with the governing path and the cross-section."""
        from .drawing import elevation
        from .section import cross_section

        return elevation(self), cross_section(self)

    def sweep(self):
        """Return the sweep over the length of the longitudinal welds, both in the proportion of the design."""
        end = self.end
        if not end.sided:
            return "Not drawn: transverse welds only, whose length is the width of the parts; there is no length along the load to vary."
        mean = (end.l_1 + end.l_2) / 2
        shortest = 4 * end.w_f * mean / min(end.l_1, end.l_2)
        lengths = np.unique(np.append(np.linspace(shortest, max(2 * mean, 1.5 * end.g, 2 * shortest), 240), mean))

        def describe(i):
            at = "mean " if not end.equal else ""
            return f"longitudinal welds of {at}l = {units.printed(lengths[i], 3)} in"

        return Sweep(lengths, self.at(lengths), int(np.searchsorted(lengths, mean)), describe, label="mean length of the longitudinal welds l, in"
                     if not end.equal else "length of the longitudinal welds l, in")

    def at(self, lengths):
        """Return the end with longitudinal welds of other (mean) lengths, an array, unvalidated, for a sweep. [in]"""
        end = self.end
        mean = (end.l_1 + end.l_2) / 2
        l_1 = lengths * (end.l_1 / mean)
        return replace(end, l_1=l_1, l_2=l_1 if end.equal else lengths * (end.l_2 / mean))


CONNECTION = WeldedConnection
