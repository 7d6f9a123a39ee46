"""A gusset from the brace's bolts or welds to its supported edges: Whitmore width, block shear, buckling, edges, webs of the supports."""

from dataclasses import replace

import numpy as np

from ... import units
from ...check import Check, Working, not_applicable, silent, strength_check
from ...editions import CLAUSES
from ...facts import bolts as facts
from ...facts import grades
from ...facts import welds as weld_facts
from ...facts.grades import E
from ...geometry import Part
from ...provisions import gusset_plates
from .. import bolt_group, details, plate, tear_out
from ..base import Connection, Sweep, Table
from . import brace_end, edges
from .design import build
from .inputs import GussetInputs

SWEPT = 10_000
"""Edge lengths of the sweep."""


class GussetConnection(Connection):
    """A gusset between a brace and its supports, from the brace's fasteners to the webs of beam and column.

    The checks, in order: bolts with the gusset's holes or the brace's welds with the base metal, block shear, Whitmore width,
    compression where the load reverses; each supported edge: gusset in shear, under the normal force, combined, at the weld, the weld
    itself, the support at the weld, its web; spacing, edges, least sizes of welds, free edges as advice.
    """

    family = "gusset"
    title = "Gusset"
    Model = GussetInputs
    parts = {"brace": "Gusset at the brace", "beam": "Edge on the beam", "column": "Edge on the column",
             "detailing": "Spacing, edges, sizes of welds"}

    def __init__(self, inputs, basis=None):
        super().__init__(inputs, basis)
        self.gusset_material = grades.material(inputs.gusset_grade, form="plate", thickness=inputs.gusset_thickness, edition=self.basis.edition)
        self.size = self.bolt_group = self.column_material = None
        self.design = build(self)
        if inputs.supports == "one edge":
            self.parts = {**self.parts, "beam": "Edge on the support"}

    @property
    def subject(self):
        """What the calculation is about."""
        return f"gusset of {self.inputs.brace}"

    # The checks

    def limit_states(self, design):
        """Return (id, title, part, clause, limit state, axial, evaluate) of every strength in tension; ``design`` may hold arrays."""
        rows = [*(self._bolted(design) if design.joint else self._welded()),
                ("Whitmore yielding", "Gusset, yielding on the Whitmore width", "brace", "J4.1(a)", "yielding", False,
                 lambda g: plate.width_yielding(g.plate, g.found)),
                ("Whitmore rupture", "Gusset, rupture on the Whitmore width", "brace", "J4.1(b)", "rupture", False,
                 lambda g: plate.width_rupture(g.plate, g.found))]
        for edge in (design.edges.beam, design.edges.column):
            rows += self._edge(design.edges, edge) if edge is not None else []
        return rows

    def _bolted(self, design):
        edition = self.basis.edition
        shear, bearing = CLAUSES["bolt shear"][edition], CLAUSES["bearing and tearout"][edition]
        rows = [("bolt shear", "Brace, bolts in shear", "brace", shear, "bolts", False, lambda g: bolt_group.shear_alone(g.joint)),
                ("bolts gusset", "Brace, bolts with gusset holes: shear, bearing, tearout", "brace", f"{shear}, {bearing}", "bolts", False,
                 lambda g: bolt_group.at_holes(g.joint, g.joint.plate))]
        if design.joint.bolts.T_b:
            rows.append(("slip", "Brace, slip of the bolts", "brace", CLAUSES["slip"][edition], bolt_group.slip_factor(design.joint), False,
                         lambda g: bolt_group.slip(g.joint)))
        return [*rows, ("gusset block", "Gusset, block shear", "brace", "J4.3", "block shear", False,
                        lambda g: tear_out.block_shear(g.strip, Part(g.strip.width, g.strip.t, (), g.strip.end, "gusset")))]

    def _welded(self):
        return [("brace weld", "Brace, weld to the gusset", "brace", "J2.4", "weld", False, lambda g: brace_end.brace_weld(g.welds)),
                ("base yielding", "Gusset, shear yielding along the brace's welds", "brace", "J4.2(a)", "shear yielding", False,
                 lambda g: brace_end.base_yielding(g.plate, g.welds)),
                ("base rupture", "Gusset, shear rupture along the brace's welds", "brace", "J4.2(b)", "shear rupture", False,
                 lambda g: brace_end.base_rupture(g.plate, g.welds)),
                ("gusset block", "Gusset, block shear along the brace's welds", "brace", "J4.3", "block shear", False,
                 lambda g: brace_end.welded_block(g.plate, g.welds, g.axis, self.inputs.gusset_end))]

    def _edge(self, joined, edge):
        name, method = edge.name, self.basis.method
        on = _on(joined, edge)
        shear, normal = self._acting(joined, edge)

        def row(id, title, clause, state, evaluate):
            return (f"{name} {id}", f"{on}, {title}", name, clause, state, False, lambda g: evaluate(g.edges, getattr(g.edges, name)))

        rows = [row("shear", "shear yielding of the gusset", "J4.2(a)", "shear yielding", edges.shear_yielding)] if shear else []
        if normal:
            rows.append(row("normal", "yielding of the gusset under the normal force", "J4.1(a)", "yielding",
                            lambda joint, at: edges.normal_yielding(joint, at, not shear)))
        if shear and normal:
            rows.append(row("combined", "normal force with shear in the gusset", "J4.1, J4.2", "interaction, factors within",
                            lambda joint, at: edges.combined(joint, at, method)))
        rows += [row("weld", "weld of the gusset", "J2.4", "weld", edges.weld),
                 row("gusset", "rupture of the gusset at the weld", "J4.2(b)", "shear rupture", edges.gusset_rupture),
                 row("support", f"rupture of the {edge.support.part} of {edge.support.name} at the weld", "J4.2(b)", "shear rupture",
                     edges.support_rupture)]
        if normal and edge.support.part == "flange":
            rows.append(row("web", f"local yielding of the web of {edge.support.name}", "J10.2", "web local yielding", edges.web_yielding))
        return rows

    def _acting(self, joined, edge):
        """Return whether shear, and whether a normal force or a moment, acts on an edge."""
        V, N, M = (float(np.max(value)) for value in edges.forces(silent, joined, edge))
        return V > 1e-9 * joined.P, max(N, M) > 1e-9 * joined.P

    def _checks(self):
        design, method = self.design, self.basis.method
        T, C = self.demand.required_tension, self.demand.required_compression
        rows = {row[0]: row for row in self.limit_states(design)}
        for id, row in rows.items():
            _, title, part, clause, state, axial, evaluate = row
            found = evaluate(design)
            # Welds, bolts in shear and the edges do not know the sense of the load; tear-out and the Whitmore width in tension do.
            demand = T if id in ("bolts gusset", "gusset block", "Whitmore yielding", "Whitmore rupture") else max(T, C)
            yield strength_check(id, title, part, clause, state, method, found.nominal, demand, found.steps, axial, path=found.path,
                                 notes=found.notes)
            if id == "Whitmore rupture":
                yield from self._compression(C)
        yield from self._crippling(C)
        yield from self._absent(rows)
        yield from self._limits()

    def _compression(self, C):
        design, method = self.design, self.basis.method
        clause = f"{CLAUSES['bolt shear'][self.basis.edition]}, {CLAUSES['bearing and tearout'][self.basis.edition]}"
        reversed_row = ("bolts reversed", "Brace, bolts with gusset holes, compression", clause, "bolts", False,
                        lambda: bolt_group.at_holes(design.joint, design.joint.plate, reversed_load=True))
        strip = ("gusset compression", "Gusset, compression on the Whitmore width", "J4.4", "compression", True,
                 lambda: brace_end.compression(design))
        for id, title, clause, state, axial, evaluate in (reversed_row, strip):
            if C <= 0 or (id == "bolts reversed" and design.joint is None):
                why = "the brace is welded" if design.joint is None and id == "bolts reversed" else "no combination gives compression"
                yield not_applicable(id, title, "brace", clause, why)
                continue
            found = evaluate()
            yield strength_check(id, title, "brace", clause, state, method, found.nominal, C, found.steps, axial, tension=False)

    def _crippling(self, C):
        joined = self.design.edges
        for edge in (joined.beam, joined.column):
            if edge is None:
                continue
            on = _on(joined, edge)
            id, title = f"{edge.name} crippling", f"{on}, crippling of the web of {edge.support.name}"
            if C <= 0 or edge.support.part == "web" or not self._acting(joined, edge)[1]:
                why = "no combination gives compression" if C <= 0 else "no normal force acts on a flange here"
                yield not_applicable(id, title, edge.name, "J10.3", why)
                continue
            found = edges.web_crippling(joined, edge)
            yield strength_check(id, title, edge.name, "J10.3", "web crippling", self.basis.method, found.nominal, C, found.steps, tension=False)

    def _absent(self, rows):
        """Yield what does not apply, each with its reason."""
        design, edition = self.design, self.basis.edition
        if design.joint is None:
            yield not_applicable("bolt shear", "Brace, bolts in shear", "brace", CLAUSES["bolt shear"][edition], "the brace is welded")
        else:
            yield not_applicable("brace weld", "Brace, weld to the gusset", "brace", "J2.4", "the brace is bolted")
        if "slip" not in rows:
            why = "the brace is welded" if design.joint is None else f"joint designed in bearing ({self.inputs.installation})"
            yield not_applicable("slip", "Brace, slip of the bolts", "brace", CLAUSES["slip"][edition], why)
        for edge in (design.edges.beam, design.edges.column):
            if edge is None:
                yield not_applicable("column edge", "Edge on the column, all checks", "column", "J2.4, J4, J10",
                                     "the gusset has one supported edge only")
                continue
            on = _on(design.edges, edge)
            if f"{edge.name} shear" not in rows:
                yield not_applicable(f"{edge.name} shear", f"{on}, shear yielding of the gusset", edge.name, "J4.2(a)",
                                     "no shear acts along this edge")
            if f"{edge.name} normal" not in rows:
                yield not_applicable(f"{edge.name} normal", f"{on}, yielding of the gusset under the normal force", edge.name, "J4.1(a)",
                                     "no normal force acts on this edge")
            if f"{edge.name} web" not in rows:
                why = "the gusset is welded to the web itself" if edge.support.part == "web" else "no normal force acts on this edge"
                yield not_applicable(f"{edge.name} web", f"{on}, local yielding of the web", edge.name, "J10.2", why)
            yield not_applicable(f"{edge.name} bending", f"{on}, local bending of the flange", edge.name, "J10.1",
                                 "the gusset stands along the web, not across the flange")

    def _limits(self):
        design, given, edition = self.design, self.inputs, self.basis.edition
        if design.joint:
            yield details.minimum_spacing(design.joint, edition)
            yield from details.edges(design.joint, design.strip, self.size, edition, (True, True))
        for edge in (design.edges.beam, design.edges.column):
            if edge is not None:
                thinner = min(edge.support.t, design.plate.t)
                yield self._weld_size(f"{edge.name} weld size", f"{_on(design.edges, edge)}, weld, least size", thinner, edge.w_f)
        if design.welds and given.brace_thickness is not None:
            yield self._weld_size("brace weld size", "Brace, weld, least size", min(given.brace_thickness, design.plate.t), design.welds.w_f)
        do = Working()
        most = do(gusset_plates.free_edge_limit, design.plate.t, E, design.plate.F_y)
        longest = max(((b[0] - a[0])**2 + (b[1] - a[1])**2)**0.5 for a, b in design.layout.free_edges())
        yield Check("free edge", "Free edge of the gusset, length, advisory", "brace", "practice", kind="advice", nominal=most,
                    available=most, demand=longest,
                    unit="in", steps=tuple(do.steps), at_most=True,
                    notes=("Length of a free edge: a recommendation of seismic and bridge guides (from memory), not of AISC 360.",))

    def _weld_size(self, id, title, thinner, provided):
        least = weld_facts.minimum_fillet(thinner)
        return Check(id, title, "brace", "J2.2b, Table J2.4", kind="detailing", nominal=least, available=provided, demand=least, unit="in",
                     notes=(f"{title}: by the thinner part joined, {units.length(thinner)}.",))

    # What the report says beside the checks

    def assumptions(self):
        """Return (text, basis) of what the calculation takes for granted."""
        given, design = self.inputs, self.design
        notes = [(f"The brace's own end ({given.brace}) is strong enough for the load; its holes or walls are checked in its own calculation.",
                  "scope"),
                 ("Whitmore width at 30°; parts of it beyond a supporting face are not counted.", "Commentary J4.1, safe"),
                 ("Block shear is taken on a strip not wider than the gusset at the narrowest place of the brace's connection.",
                  "safe"),
                 ("Tension over a tear-out block is uniform, $U_{bs}$ = 1.0.", "Commentary J4.3"),
                 ("Forces on a weld by the elastic method; normal stress of a moment is elastic too.", "safe")]
        if design.edges.column is not None:
            notes.append(("Forces on the edges by the Uniform Force Method; the axes of brace, beam and column meet in one point; "
                          f"what moment is left acts on the {given.moment_on} edge.", "input"))
        notes.append(("The weld of an edge is made for 1.25 times the average force where that exceeds the peak." if given.redistribution else
                      "The weld of an edge is made for its peak force, without allowance for redistribution.", "practice, option"))
        notes.append(("Normal force and shear in the gusset's edge: square of the first ratio plus fourth power of the second at most 1.",
                      "published example; no clause"))
        if design.joint:
            notes += [(f"Threads {'excluded from' if given.threads == 'X' else 'in'} the shear plane ({given.threads}); bolts installed "
                       f"{given.installation}; {given.shear_planes} shear plane{'s' if given.shear_planes > 1 else ''}.", "input")]
            notes += [(text, "bolt tables") for text in (*facts.size_notes(self.size, self.bolt_group), *self.bolt_group.notes)]
        if design.gusset.basis and self.demand.required_compression > 0:
            notes.append((f"Gusset in compression: {design.gusset.basis}.", "about 80 to 85 % sure, engineer to confirm"))
            if given.gusset_support == "compact corner":
                notes.append(("For the test of a compact corner, the distance from the connection to the edge is measured across the brace.",
                              "safe reading"))
        for material, part in ((self.gusset_material, "Gusset"), (self.beam_material, "Beam"), (self.column_material, "Column")):
            if material is not None and material.note:
                notes.append((f"{part} steel {material.name}: {material.note}", "availability, from memory"))
        notes += [(text, "loads") for text in getattr(self.demand, "notes", ())]
        return [*super().assumptions(), *notes]

    def materials_text(self):
        """Return the steels with their strengths, in a sentence; symbols between dollar signs."""
        parts = [("gusset", self.gusset_material), (f"beam {self.design.edges.beam.support.name}", self.beam_material)]
        if self.column_material is not None:
            parts.append((f"column {self.design.edges.column.support.name}", self.column_material))
        said = "; ".join(f"{part}: {m.name}, $F_y$ {m.F_y:g} ksi, $F_u$ {m.F_u:g} ksi" for part, m in parts)
        return f"{said}; filler metal {self.inputs.electrode}, $F_{{EXX}}$ {self.design.edges.F_EXX:g} ksi"

    def by_others(self):
        """Return what the scope leaves to others."""
        out = ["the brace and its own end", "bending of the gusset out of its plane", "fatigue, seismic detailing, corrosion and fire"]
        if self.design.edges.column is not None:
            out.insert(1, "beam and column for the forces that the gusset brings, and the joint of beam and column that passes them on")
            if self.design.edges.column.support.part == "web":
                out.insert(2, "bending of the column's web under the normal force of the edge")
        if self.demand.required_compression > 0:
            out.insert(1, "buckling of the web of a support pressed from both flanges (J10.5)")
        return tuple(out)

    def designed(self):
        """Return (item, what is to be built) rows for comparison with the drawings."""
        given, design = self.inputs, self.design
        rows = [("Gusset", f"PL {units.fraction(given.gusset_thickness)}, {self.gusset_material.name}, "
                           f"{units.length(given.gusset_end_width)} wide at its free end")]
        if design.joint:
            group = self.bolt_group
            rows += [("Brace", f"{given.brace}, {design.joint.n_bolts} bolts {self.size.name}{'' if self.size.metric else ' in'}, "
                               f"{group.product or group.name}-{given.threads}, {given.installation}"
                               + (f", faying surface class {given.slip_class}" if given.slip_class else "")),
                     ("Holes", f"gusset {given.gusset_holes}")]
        else:
            welds = design.welds
            rows.append(("Brace", f"{given.brace}, {welds.lines} fillets {units.length(welds.w_f)}, each {units.length(welds.l)} long"))
        for edge in (design.edges.beam, design.edges.column):
            if edge is not None:
                rows.append((_on(design.edges, edge), f"{units.length(edge.L)} on the {edge.support.part} of {edge.support.name}, fillets "
                                                         f"{units.length(edge.w_f)} on both sides, {given.electrode}"))
        return rows

    def tables(self, part):
        """Return the table of the forces on the edges, beside the checks of the first edge."""
        if part != "beam":
            return ()
        joined, rows = self.design.edges, []
        for edge in (joined.beam, joined.column):
            if edge is None:
                continue
            V, N, M = edges.forces(silent, joined, edge)
            place = "–" if joined.column is None else f"{edge.centroid:.4g}"
            ideal = "–" if joined.column is None else f"{edges.ideal(silent, joined)[edge.name == 'column']:.4g}"
            rows.append((edge.name if joined.column else "support", units.fraction(edge.L), place, ideal,
                         *(units.ceil_figures(value) for value in (V, N, M))))
        heads = ("Edge", "length, in", "centroid, in", "without moment, in", "shear, kip", "normal, kip", "moment, kip·in")
        caption = (f"Forces that the gusset brings at a load of the brace of "
                   f"{units.amount(joined.P, 'kip', self.basis.units_system, units.ceil_figures)}; centroids from the corner.")
        remark = "Beam, column and the joint between them are designed for these forces by others." if joined.column else ""
        return (Table("Forces on the edges", heads, tuple(rows), caption, remark),)

    def drawings(self):
        """Return the elevation with the Whitmore width, and the section through an edge."""
        from .drawing import edge_section, elevation

        return elevation(self), edge_section(self)

    def sweep(self):
        """Return the sweep over the length of the edge on the beam, all else as designed."""
        design = self.design
        beam = design.edges.beam
        lengths = np.union1d(np.linspace(max(4 * beam.w_f, 0.4 * beam.L), 1.6 * beam.L, SWEPT), [beam.L])
        support = beam.support
        if design.edges.column is not None:
            support = replace(support, near_end=beam.start + lengths / 2 <= support.d)
        swept = replace(design, edges=replace(design.edges, beam=replace(beam, L=lengths, support=support)))
        return Sweep(lengths, swept, int(np.searchsorted(lengths, beam.L)), lambda i: f"an edge of {units.printed(float(lengths[i]), 3)} in on the "
                     f"{'beam' if design.edges.column else 'support'}",
                     label=f"length of the edge on the {'beam' if design.edges.column else 'support'}, in")


def _on(joined, edge):
    """Return what an edge is called at the head of its checks."""
    return "Edge on the support" if joined.column is None else f"Edge on the {edge.name}"


CONNECTION = GussetConnection
