"""A tee or double-angle hanger bolted to the bottom flange of a beam: inputs, the hanger they describe, the checks that apply."""

from dataclasses import replace

import numpy as np

from ... import units
from ...check import FACTORS, not_applicable, strength_check
from ...editions import CLAUSES
from ...errors import ScopeError
from ...facts import bolts as facts
from ...provisions import prying
from ...provisions.fatigue import share_of_pretensioned_bolts
from .. import bolt_group, fatigue
from ..base import Connection, Sweep, Table
from . import building, flanges, limits, refusals, stem, support
from .inputs import HangerInputs


class HangerConnection(Connection):
    """A hanger below a beam, from the hung member to the beam's web.

    The checks, in order: the hung member; its welds or bolts to the stem; the stem; the bolts to the beam in tension, with the
    prying of each flange, in shear, slip; shear of both flanges; the beam's web; limits of spacing, edges and welds.
    """

    family = "hanger"
    title = "Hanger below a beam"
    Model = HangerInputs
    parts = {"member": "Hung member", "stem": "Stem, and the hung member's joint to it", "bolts": "Bolts to the beam and the flanges they flex",
             "beam": "Supporting beam", "detailing": "Spacing, edges, clearance, welds"}

    def __init__(self, inputs, basis=None):
        super().__init__(inputs, basis)
        edition = self.basis.edition
        refusals.inputs(inputs)
        self.sizes = tuple(facts.bolt_size(size) for size in (inputs.bolt, inputs.lower_bolt) if size is not None)
        self.bolt_group = facts.bolt_group(inputs.bolt_grade, edition)
        refusals.installation(self)
        self.fitting, self.beam = building.fitting(inputs, edition), building.beam(inputs, edition)
        self.hung, self.member_material = building.hung(inputs, self.fitting, edition)
        refusals.parts(self)
        self.hanger = self._made()
        refusals.layout(self)

    def _made(self, rows=None, s=None, P=None):
        P = self.demand.required_tension if P is None else P
        return building.made(self.inputs, self.basis, self.fitting, self.beam, self.hung, self.sizes, self.bolt_group, P, rows, s)

    enter = staticmethod(refusals.enter)

    @property
    def wrench_room(self):
        """Distance from a bolt to the nearest face beside it: stem or leg below, web above. [in]"""
        fit = self.fitting
        return (self.inputs.gage - max(fit.gap + fit.plies * fit.t_s, self.beam.section.t_w)) / 2

    # The checks

    def limit_states(self, h):
        """Return (id, title, part, clause, limit state, axial, evaluate) of every strength; ``h`` may hold arrays."""
        edition = self.basis.edition
        shear, bearing, slip = CLAUSES["bolt shear"][edition], CLAUSES["bearing and tearout"][edition], CLAUSES["slip with tension"][edition]
        tension = CLAUSES["combined tension and shear"][edition] if h.psi else shear
        rows = [("member yielding", "Hung member, yielding of the gross section", "member", "D2(a)", "yielding", True, stem.member_yielding),
                ("member rupture", "Hung member, rupture of the net section", "member", "D2(b), D3", "rupture", True, stem.member_rupture)]
        rows += self._bolted(shear, bearing) if h.lower else self._welded()
        rows += [
            ("stem yielding", "Stem, yielding over its length", "stem", "J4.1(a)", "yielding", False, stem.stem_yielding),
            ("stem rupture", "Stem, rupture over its length", "stem", "J4.1(b)", "rupture", False, stem.stem_rupture),
            ("Whitmore yielding", "Stem, yielding on the Whitmore width", "stem", "J4.1(a)", "yielding", False, stem.whitmore_yielding),
            ("Whitmore rupture", "Stem, rupture on the Whitmore width", "stem", "J4.1(b)", "rupture", False, stem.whitmore_rupture),
            ("stem block", "Stem, block shear", "stem", "J4.3", "block shear", False, stem.stem_block),
            ("bolt tension", f"Bolts in tension{' with shear' if h.psi else ''}, no prying", "bolts", tension, "bolts", False, flanges.bolts_alone),
            ("fitting prying", "Bolts with prying of the fitting's flange", "bolts", f"{tension}, Manual Part 9", "bolts", False,
             lambda h: flanges.with_prying(h, "fitting")),
            ("beam prying", "Bolts with prying of the beam's flange", "bolts", f"{tension}, Manual Part 9", "bolts", False,
             lambda h: flanges.with_prying(h, "beam")),
        ]
        if h.psi:
            both = f"{shear}, {bearing}"
            rows += [("fitting holes", "Bolts in shear with the fitting's holes", "bolts", both, "bolts", False,
                      lambda h: flanges.shear_with_holes(h, "fitting")),
                     ("beam holes", "Bolts in shear with the beam's holes", "bolts", both, "bolts", False,
                      lambda h: flanges.shear_with_holes(h, "beam"))]
            if h.bolts.T_b:
                rows.append(("slip", "Slip with tension", "bolts", slip, bolt_group.slip_factor(h.upper), False, flanges.slip))
        return [
            *rows,
            ("fitting shear yielding", "Fitting's flange, shear yielding beside the stem", "bolts", "J4.2(a)", "shear yielding", False,
             lambda h: flanges.flange_shear(h, "fitting", False)),
            ("fitting shear rupture", "Fitting's flange, shear rupture along the bolts", "bolts", "J4.2(b)", "shear rupture", False,
             lambda h: flanges.flange_shear(h, "fitting", True)),
            ("beam shear yielding", "Beam flange, shear yielding beside the web", "beam", "J4.2(a)", "shear yielding", False,
             lambda h: flanges.flange_shear(h, "beam", False)),
            ("beam shear rupture", "Beam flange, shear rupture along the bolts", "beam", "J4.2(b)", "shear rupture", False,
             lambda h: flanges.flange_shear(h, "beam", True)),
            ("web yielding", "Beam, web local yielding", "beam", "J10.2", "web local yielding", False, support.web_local_yielding),
        ]

    def _bolted(self, shear, bearing):
        both = f"{shear}, {bearing}"
        return [
            ("member block", "Hung member, block shear", "member", "J4.3", "block shear", False, stem.member_block),
            ("stem bolts", "Bolts at the stem, shear", "stem", shear, "bolts", False, lambda h: bolt_group.shear_alone(h.lower)),
            ("stem bolts member", "Bolts at the stem, with the hung member's holes", "stem", both, "bolts", False,
             lambda h: bolt_group.at_holes(h.lower, h.lower.member)),
            ("stem bolts stem", "Bolts at the stem, with the stem's holes", "stem", both, "bolts", False,
             lambda h: bolt_group.at_holes(h.lower, h.lower.plate)),
        ]

    def _welded(self):
        return [
            ("member weld yielding", "Hung member, shear yielding along the welds", "member", "J4.2(a)", "shear yielding", False,
             lambda h: stem.along_welds(h, "member", False)),
            ("member weld rupture", "Hung member, shear rupture along the welds", "member", "J4.2(b)", "shear rupture", False,
             lambda h: stem.along_welds(h, "member", True)),
            ("welds", "Welds at the stem, shear", "stem", "J2.4", "weld", False, stem.weld_strength),
            ("stem weld yielding", "Stem, shear yielding along the welds", "stem", "J4.2(a)", "shear yielding", False,
             lambda h: stem.along_welds(h, "stem", False)),
            ("stem weld rupture", "Stem, shear rupture along the welds", "stem", "J4.2(b)", "shear rupture", False,
             lambda h: stem.along_welds(h, "stem", True)),
        ]

    def _checks(self):
        h, T, method = self.hanger, self.demand.required_tension, self.basis.method
        for id, title, part, clause, state, axial, evaluate in self.limit_states(h):
            if id == "welds":
                yield not_applicable("member block", "Hung member, block shear", "member", "J4.3",
                                     "the welds run along both edges of the connected element: no block lies between them but the whole element")
            if id == "fitting shear yielding":
                yield from self._without_shear()
            found = evaluate(h)
            before = flanges.at_load(h, id.split()[0])[0] if id in ("fitting prying", "beam prying") else ()
            yield strength_check(id, title, part, clause, state, method, found.nominal, T, (*found.steps[:-1], *before, *found.steps[-1:]), axial,
                                 path=found.path, notes=found.notes)
        yield not_applicable("flange bending", "Beam, flange local bending", "beam", "J10.1",
                             "the pull comes through bolts, not through a plate welded across the flange: the flange's prying is checked instead "
                             "(Commentary)")
        yield not_applicable("web compression", "Beam, web crippling, sidesway buckling, compression buckling", "beam", "J10.3 to J10.5",
                             "the force pulls on the flange; these limit states are of compression")
        yield from limits.of(self)

    def _without_shear(self):
        edition = self.basis.edition
        why = "the pull runs along the bolts: no shear" if not self.hanger.psi else f"joint designed in bearing ({self.inputs.installation})"
        both = f"{CLAUSES['bolt shear'][edition]}, {CLAUSES['bearing and tearout'][edition]}"
        if not self.hanger.psi:
            yield not_applicable("fitting holes", "Bolts in shear with the fitting's holes", "bolts", both, why)
            yield not_applicable("beam holes", "Bolts in shear with the beam's holes", "bolts", both, why)
        if not self.hanger.psi or not self.hanger.bolts.T_b:
            yield not_applicable("slip", "Slip with tension", "bolts", CLAUSES["slip with tension"][edition], why)

    @property
    def capacity(self):
        """The largest pull that every strength check permits, at the method's level. [kip]

        With an inclined pull the bolts' strength in tension falls as their shear grows, so the pull is sought at which demand and
        strength are equal, by halving.
        """
        if not self.hanger.psi:
            return super().capacity
        low, high = 0.0, super().capacity + self.demand.required_tension
        for _ in range(60):
            middle = (low + high) / 2
            low, high = (middle, high) if self._least(replace(self.hanger, P=middle)) >= middle else (low, middle)
        return low

    def _least(self, h):
        out = []
        for _, _, _, _, state, _, evaluate in self.limit_states(h):
            phi, omega = FACTORS[state]
            nominal = evaluate(h).nominal
            out.append(phi * nominal if self.basis.method == "LRFD" else nominal / omega)
        return min(out)

    def fatigue_details(self, by_id):
        """Return the details that live load may crack: bolts in tension with prying, hung member and stem at the ends of the welds."""
        h, given, size = self.hanger, self.inputs, self.sizes[0]
        fatigue.refuse_snug(given.installation)
        if h.psi or h.lower:
            why = "inclination other than 0" if h.psi else "joined = 'bolted', in bearing with snug-tight bolts"
            raise ScopeError(f"fatigue with {why} is not covered: Appendix 3 wants pretensioned joints, and bolts in tension alone; use "
                             "vertical pull and welds to the stem")
        prying = [by_id[f"{side} prying"] for side in ("fitting", "beam")]
        forces = [(fatigue.value_in(each, "T_q"), fatigue.value_in(each, "T_qt")) for each in prying if fatigue.holds(each, "T_qt")]
        if len(forces) < 2:
            raise ScopeError("fatigue: the bolts do not carry the required pull with its prying, so the range of their force is "
                             "unknown; strengthen them")
        T_q, T_qt = max(forces, key=lambda pair: pair[1])
        return (fatigue.Detail("bolts", "bolts to the beam in tension", "bolts", "G", "Table A-3.1, 8.5",
                               lambda do: fatigue.thread(do, size.d, size.tpi, size.metric, h.n),
                               lambda do, P: do(share_of_pretensioned_bolts, P, T_q, T_qt),
                               note="One fifth of the range, with the prying of the required load, for pretensioned bolts in a grip of steel only."),
                fatigue.weld_ends("member", "Hung member", self.hung.element.t, ("member rupture", "A_e"), h.hung.F_y),
                fatigue.weld_ends("stem", "Stem", h.fitting.t_s, ("Whitmore yielding", "A_g"), h.fitting.F_y),
                fatigue.throats("stem", "Welds at the stem", "welds"))

    # What the report says beside the checks

    def assumptions(self):
        """Return (text, basis) of what the calculation takes for granted."""
        given, h, edition = self.inputs, self.hanger, self.basis.edition
        rule = ("at most 1.75 b on each side of the bolt, and the spacing of the rows", "Manual Part 9, 16th ed., as its design example II.D-1") \
            if edition == "360-22" else ("at most 2 b in total, and the spacing of the rows", "Manual Part 9, 15th ed., from memory")
        notes = [("The hanger is centred under the beam's web; the pull passes through the centre of its bolts at the face of the flange.", "input"),
                 ("All bolts to the beam share the pull equally.", "stated"),
                 (f"Tributary length of prying: {rule[0]}.", rule[1]),
                 ("The beam's flange is given no longer tributary length than the fitting; it runs on, so this is safe.", "conservative"),
                 ("Edge distance of prying: that of the narrower of the two flanges.", "conservative"),
                 ("Prying uses the tensile strength of the flange with the factor of flexure.", "Manual Part 9"),
                 (f"Bolts to the beam installed {given.installation}.", "input"),
                 ("Web local yielding: the load enters over the distance between the end bolts.", "conservative; the fitting's length is often used"),
                 ("Tension over a tear-out block is uniform, $U_{bs}$ = 1.0.", "Commentary J4.3")]
        if given.installation == "snug":
            notes.append(("No vibration and no fatigue: bolts in tension may be snug-tight.", "J3"))
        if h.psi:
            notes += [("The strength of the bolts in tension is that at the required shear; the permissible load lets both grow together.", "stated"),
                      ("The stem at its flange is checked for tension, bending and shear together on an ellipse, all with the factor of tension.",
                       "conservative")]
            if given.installation == "slip-critical":
                notes.append(("The reduction of tension for shear in bearing is applied to the slip-critical joint too.", "conservative"))
        if h.lower:
            notes.append(("The joint at the stem is designed in bearing; its bolts share the load equally.", "stated"))
        if self.hung.element.series == "PL" and self.fitting.tee:
            notes.append(("The hung plate laps on one face of the stem: bending from half the two thicknesses is not regarded.", "J1.7"))
        if self.hung.element.series == "2L":
            notes.append(("Eccentricity between the joint at the stem and the centroid of the angles is not regarded.", "J1.7"))
        if not self.fitting.tee:
            notes.append(("In the angles b is taken to the centre line of the other leg.", "conservative, Manual Part 9 from memory"))
        for value, basis, name in ((given.p_by_hand, given.p_basis, "the fitting"),
                                   (given.p_beam_by_hand, given.p_beam_basis, "the beam's flange")):
            if value is not None:
                notes.append((f"Tributary length of {name} set by the engineer to {units.printed(value)} in: {basis}", "engineer"))
        if given.U_by_hand is not None:
            notes.append((f"U = {given.U_by_hand:g} set by the engineer: {given.U_basis}", "engineer"))
        if self.member_material.note:
            notes.append((f"Hung member's steel {self.member_material.name}: {self.member_material.note}", "availability, from memory"))
        notes += [(text, "bolt tables") for text in dict.fromkeys((*facts.size_notes(self.sizes[0], self.bolt_group), *self.bolt_group.notes))]
        notes += [(text, "loads") for text in getattr(self.demand, "notes", ())]
        return [*super().assumptions(), *notes]

    def materials_text(self):
        """Return the steels with their strengths, in a sentence; symbols between dollar signs."""
        parts = ((f"hung {self.hung.element.member}: {self.inputs.member_grade}", self.hung),
                 (f"{self.fitting.name}: {self.inputs.fitting_grade}", self.fitting),
                 (f"beam {self.beam.section.name}: {self.inputs.beam_grade}", self.beam))
        return "; ".join(f"{part}, $F_y$ {m.F_y:g} ksi, $F_u$ {m.F_u:g} ksi" for part, m in parts)

    def by_others(self):
        """Return what the scope leaves to others."""
        return ("the supporting beam in bending, shear and deflection, its flange holes included",
                "torsion of the beam and the bracing of its bottom flange, to which the load is hung",
                "the hung member beyond its end, and its lower end", "out-of-plane bending of the stem",
                "fatigue and impact (prying forces are no basis for fatigue), seismic detailing, corrosion and fire")

    def designed(self):
        """Return (item, what is to be built) rows for comparison with the drawings."""
        given, h, fit = self.inputs, self.hanger, self.fitting
        n, size = h.n, self.sizes[0]
        spacing = f"{given.rows} rows at {units.length(given.pitch)}" if given.rows > 1 else "1 row"
        if h.welds:
            joint = f"{2 * h.welds.pieces} fillets {units.length(given.weld)}, {units.length(given.weld_length)} long, {given.electrode}"
        else:
            joint = (f"{h.lower.n_bolts} bolts {self.sizes[1].name} in, {self.bolt_group.product or self.bolt_group.name}-{given.lower_threads}, "
                     f"holes {given.lower_holes}")
        return [("Fitting", f"{fit.name} x {units.length(h.length)} long, {given.fitting_grade}"),
                ("Beam", f"{self.beam.section.name}, {given.beam_grade}"),
                ("Bolts to the beam", f"{n} bolts {size.name}{'' if size.metric else ' in'}, "
                                      f"{self.bolt_group.product or self.bolt_group.name}-{given.threads}, {given.installation}, {spacing}, "
                                      f"gage {units.length(given.gage)}"),
                ("Holes", f"fitting {given.fitting_holes}, beam {given.beam_holes}"),
                ("Hung member", f"{self.hung.element.member}, {self.member_material.name}"), ("Joint at the stem", joint)]

    @property
    def design(self):
        """The hanger as designed."""
        return self.hanger

    @property
    def subject(self):
        """What the calculation is about."""
        return f"{self.hung.element.member} hung from {self.beam.section.name} by {self.fitting.name}"

    def tables(self, part):
        """Return the table of prying beside the bolts, and of the flange holes beside the beam."""
        if part == "bolts":
            return (self._prying(),)
        if part != "beam":
            return ()
        found = support.flange_holes(self.hanger)[1]
        rows = tuple((text, f"{units.printed(found[key])} {unit}") for text, key, unit in (
            ("gross area of the tension flange $A_{fg}$", "A_fg", "in²"), ("net area at two holes $A_{fn}$", "A_fn", "in²"),
            ("rupture of the net flange $F_u A_{fn}$", "P_fu", "kip"), ("yielding of the gross flange $Y_t F_y A_{fg}$", "P_fy", "kip"),
            ("$M_n$ at the holes, where rupture is the smaller (Eq. F13-1)", "M_nh", "kip·in"),
            ("flange local bending $R_n$, were a plate welded across the flange (Eq. J10-1)", "flange bending", "kip")))
        return (Table("For information: the beam's flange", ("Quantity", "Value"), rows, "Nominal values; the beam itself is designed by others."),)

    def _prying(self):
        heads = ("Flange", "$t$, in", "$b_q$, in", "$a_q$, in", "$p_q$, in", "$Q_q$", "$t_{np}$, in", "$t_{min}$, in", "$T_q$", "$q_q$", "$B_q$")
        rows = []
        for side, name in (("fitting", self.fitting.name), ("beam", self.beam.section.name)):
            made, at = flanges.with_prying(self.hanger, side).table, flanges.at_load(self.hanger, side)[1]
            if made is None:
                continue
            shown = (made["t"], made["b"], made["a"], made["p"], made["Q"], at["t_np"], at["t_min"], at["T"], at["q"], made["B"])
            rows.append((name, *("none" if value is None else units.printed(value, 3) for value in shown)))
        return Table("Prying of both flanges", heads, tuple(rows),
                     "Thickness that needs no prying force and least thickness with it, at the required load; forces of one bolt in kip: required "
                     "without prying, prying force, available.", f"By published yield lines the beam's flange, which runs on, would have "
                     f"{units.printed(self._yield_lines(), 3)} in of length per bolt; that is not used unless set by hand with its basis.")

    def _yield_lines(self):
        h, shape = self.hanger, self.beam.section
        return prying.yield_line_length.bare(h.s, h.rows, prying.lever_arm_of_tee.bare(h.g, shape.t_w), prying.edge_beyond_bolt.bare(shape.b_f, h.g))

    def drawings(self):
        """Return the elevation and the section of the hanger."""
        from .drawing import elevation, section

        return elevation(self), section(self)

    def sweep(self):
        """Return the sweep over bolt rows at the chosen pitch, with the design's rows at other pitches beside it."""
        given = self.inputs
        pitch = given.pitch or 3.0
        rows = [n for n in range(1, max(given.rows + 3, 6) + 1) if self._fits((n - 1) * pitch + 2 * given.fitting_end) or n == given.rows]
        stretched = None
        if given.rows > 1:
            t = min(self.fitting.t_f, self.beam.section.t_f)
            pitches = np.linspace(8 / 3 * self.sizes[0].d, max(pitch, min(24 * t, self.hanger.upper.member.constants.spacing, 2 * pitch)), 200)
            pitches = pitches[[self._fits((given.rows - 1) * s + 2 * given.fitting_end) for s in pitches]]
            stretched = ((given.rows - 1) * pitches + 2 * given.fitting_end, self.at(s=pitches))
        lengths = np.array([(n - 1) * pitch + 2 * given.fitting_end for n in rows])

        def describe(i):
            at = f" at {units.length(pitch)}" if rows[i] > 1 else ""
            return f"{rows[i]} row{'s' if rows[i] > 1 else ''}{at}, fitting {units.length(lengths[i])} long"

        return Sweep(lengths, [self.at(rows=n, s=pitch) for n in rows], rows.index(given.rows), describe, stretched,
                     f"{given.rows} rows at other pitches", "length of the fitting along the beam, in", tuple(f"{n} rows" for n in rows))

    def _fits(self, length):
        h = self.hanger
        return length / 2 > self.fitting.depth * np.tan(h.psi) + h.spread[1] / 2 / np.cos(h.psi) and length / 2 <= self.inputs.beam_end

    def at(self, rows=None, s=None):
        """Return the hanger with another number of rows or another pitch (which may be an array), unvalidated, for a sweep."""
        return self._made(rows, s)


CONNECTION = HangerConnection
