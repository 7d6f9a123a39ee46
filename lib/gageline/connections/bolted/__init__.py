"""A bolted end of a tension member and its connection plates: inputs, the joint they describe, the checks that apply."""

import math

import numpy as np

from ... import units
from ...check import not_applicable, strength_check
from ...editions import CLAUSES
from ...errors import InputError
from ...facts import bolts as facts
from ...facts import grades
from ...geometry import End, Hole, centred_edge, grid, mirrored
from ...geometry.pattern import least, most
from .. import bolt_group, details, fatigue, net_section, plate, seismic, tear_out
from ..base import Connection, Sweep, Table
from ..element import element
from ..fields import naming
from ..joint import Bolts, Gusset, Joint, Ply, constants
from . import refusals
from .inputs import BoltedInputs


class BoltedConnection(Connection):
    """A bolted tension connection, from the member's gross section to its connection plates.

    The checks, in order: member yielding, net rupture, block shear; bolts in shear, with the member's holes, with the plate's
    holes, slip; plate yielding and rupture on the physical and on the Whitmore width, block shear; compression where the load
    reverses; spacing, edges, wrench clearance, slenderness.
    """

    family = "bolted"
    title = "Bolted tension connection"
    Model = BoltedInputs
    parts = {"member": "Member", "bolts": "Bolts", "plate": "Connection plate", "detailing": "Spacing, edges, clearance"}

    def __init__(self, inputs, basis=None, refuse_layout=True):
        super().__init__(inputs, basis)
        with naming("bolt"):
            self.size = facts.bolt_size(inputs.bolt)
        with naming("bolt_grade"):
            self.bolt_group = facts.bolt_group(inputs.bolt_grade, self.basis.edition)
        with naming("member"):
            self.element = element(inputs.member, inputs.connected_by, inputs.gap, inputs.plate_thickness)
        with naming("member_grade"):
            self.member_material = self._material(inputs.member_grade, inputs.member)
        with naming("plate_grade"):
            self.plate_material = grades.material(inputs.plate_grade, form="plate", thickness=inputs.plate_thickness, edition=self.basis.edition)
        refusals.installation(self)
        self.demand = seismic.demand(self)
        self.joint = self._joint()
        if refuse_layout:
            refusals.layout(self)

    def _material(self, grade, designation):
        if self.element.series != "PL":
            return grades.material(grade, form="shape", series=self.element.series, edition=self.basis.edition)
        form = "bar" if designation.strip().lower().startswith("bar") else "plate"
        return grades.material(grade, form=form, thickness=self.element.t, edition=self.basis.edition)

    # The joint that the inputs describe

    def centres(self, given):
        """Return the hole centres on the connected element, x from the first row and y from the lower edge of the strip.

        ``given`` is the inputs, or the inputs with changes (numbers or arrays) of a sweep.
        """
        part = self.element
        back = part.back or 0.0
        if given.holes:
            if given.lines or given.rows or given.pitch or given.gage or given.stagger:
                raise InputError("holes is given together with lines, rows, pitch, gage or stagger; give one or the other")
            least = min(x for x, _ in given.holes)
            return [(x - least, y - back) for x, y in given.holes]
        if missing := [name for name in ("lines", "rows") if getattr(given, name) is None]:
            raise InputError(f"input {missing[0]} is missing: give lines, rows, pitch and gage, or holes")
        if given.pitch is None and given.rows > 1:
            raise InputError("input pitch is missing: spacing along the line, for example 3 in")
        if given.pitch is not None and np.any(np.less_equal(given.pitch, 0)):
            raise InputError(f"pitch = {units.printed(np.min(given.pitch))} in is not allowed; give a length greater than 0")
        gages = list(given.gage) * (given.lines - 1) if len(given.gage) == 1 else list(given.gage)
        if len(gages) != given.lines - 1:
            raise InputError(f"gage: {given.lines} lines have {given.lines - 1} spaces between them, got {len(given.gage)}")
        if part.back is None:
            if given.gage_from_back is not None:
                raise InputError(f"gage_from_back is for legs and stems; on the {part.name} of {part.member} the pattern is centred")
            edge = centred_edge(part.width, given.lines, gages)
        elif given.gage_from_back is None:
            raise InputError(f"input gage_from_back is missing: back of the {part.name} to the first gage line")
        else:
            edge = given.gage_from_back - back
        return grid(given.lines, given.rows, 0.0 if given.pitch is None else given.pitch, gages, given.stagger, edge)

    def _joint(self, **changes):
        given, part = _Changed(self.inputs, changes), self.element
        centres = self.centres(given)
        member_hole, plate_hole = self._hole(given.member_holes), self._hole(given.plate_holes)
        missing = self._missing(centres)
        holes = [Hole(x, y, *member_hole, part.t, i not in missing) for i, (x, y) in enumerate(centres, start=1)]
        if given.other_leg_holes:
            if part.name not in ("leg", "long leg", "short leg"):
                raise InputError(f"other_leg_holes is for angles; {part.member} is none")
            standard = self._hole("STD")
            holes += [Hole(x, -(y - part.t), *standard, part.t, bolted=False) for x, y in given.other_leg_holes]
        last = most([x for x, _ in centres])
        member = Ply("member", self.member_material.F_y, self.member_material.F_u, part.t, part.plies, part.pieces, tuple(holes),
                     End(last + given.member_end), part.width, given.member_holes, constants(self.basis))
        axis = (least([y for _, y in centres]) + most([y for _, y in centres])) / 2
        y_lo = axis - given.plate_width / 2 - given.plate_offset
        shifted = [Hole(x, y - y_lo, *plate_hole, given.plate_thickness, i not in missing) for i, (x, y) in enumerate(centres, start=1)]
        slope = 1 / math.tan(given.plate_edge_angle)
        slope = 0.0 if abs(slope) < 1e-9 else slope
        edge = End(given.plate_end - slope * (axis - y_lo), slope)
        plate = Ply("plate", self.plate_material.F_y, self.plate_material.F_u, given.plate_thickness, given.plates,
                    given.plates * part.joints, tuple(mirrored(shifted)), edge, given.plate_width, given.plate_holes,
                    constants(self.basis))
        n_s = part.plies + given.plates - 1
        group = self.bolt_group
        slip_critical = given.installation == "slip-critical"
        bolts = Bolts(self.size.name, group.name, self.size.d, group.F_nv_X if given.threads == "X" else group.F_nv_N, given.threads, n_s,
                      facts.pretension(self.size, group) if slip_critical else 0.0, given.installation,
                      {"A": 0.30, "B": 0.50}.get(given.slip_class, 0.0))
        gap = (part.gap - self.inputs.plate_thickness) / 2 if part.plies == 2 else 0.0
        t_filler, n_fillers = given.filler_thickness + gap, given.fillers + (1 if gap > 1e-9 else 0)
        return Joint(part, member, plate, bolts, self._gusset(given.plate_width), t_filler, n_fillers, given.deformation_considered, given.U_by_hand, given.U_basis)

    def _missing(self, centres):
        """Return the numbers of missing bolts."""
        missing = self.inputs.missing_bolts
        if unknown := [number for number in missing if not 1 <= number <= len(centres)]:
            raise InputError(f"missing_bolts: there is no bolt {unknown[0]}; the bolts of a group are numbered 1 to {len(centres)}")
        if len(set(missing)) >= len(centres):
            raise InputError("missing_bolts: no bolt is left")
        return set(missing)

    def _hole(self, kind):
        """Return (across, along) of a hole as written in the inputs. [in]"""
        name, _, direction = kind.partition(" ")
        hole = facts.hole(self.size, name)
        return (hole.length, hole.width) if direction == "across" else (hole.width, hole.length)

    def _gusset(self, width):
        given = self.inputs
        support, K, length = given.gusset_support, given.gusset_K, given.gusset_length
        basis = ""
        if support == "by hand":
            if K is None or len(given.gusset_K_basis.strip()) < 10:
                raise InputError("gusset_support = 'by hand' needs gusset_K and a written basis in gusset_K_basis")
            basis = f"K by hand. Basis: {given.gusset_K_basis}"
        elif support is not None:
            if support not in plate.K_CHOICES:
                raise InputError(f"gusset_support = {support!r} is not known; allowed: {', '.join((*plate.K_CHOICES, 'by hand'))}")
            K, basis = plate.K_CHOICES[support]
        if self.demand.required_compression > 0:
            if support is None:
                raise InputError(f"the member goes into compression ({units.printed(self.demand.required_compression)} kip): give gusset_support "
                                 f"({', '.join((*plate.K_CHOICES, 'by hand'))}) and gusset_length")
            if length is None and K is not None:
                raise InputError("input gusset_length is missing: last row to the support, along the load")
        return Gusset(width, 0.0, width, K, length, basis)

    # The checks

    def limit_states(self, joint):
        """Return (id, title, part, clause, limit state, axial, evaluate) of every strength in tension; ``joint`` may hold arrays."""
        edition = self.basis.edition
        shear, bearing, slip = CLAUSES["bolt shear"][edition], CLAUSES["bearing and tearout"][edition], CLAUSES["slip"][edition]
        rows = [
            ("member yielding", "Member, yielding of the gross section", "member", "D2(a)", "yielding", True, net_section.gross_yielding),
            ("member rupture", "Member, rupture of the net section", "member", "D2(b), D3", "rupture", True, net_section.net_rupture),
            ("member block", "Member, block shear", "member", "J4.3", "block shear", False,
             lambda j: tear_out.block_shear(j.member, tear_out.member_part(j))),
            ("bolt shear", "Bolts, shear", "bolts", shear, "bolts", False, bolt_group.shear_alone),
            ("bolts member", "Bolts with member holes: shear, bearing, tearout", "bolts", f"{shear}, {bearing}", "bolts", False,
             lambda j: bolt_group.at_holes(j, j.member)),
            ("bolts plate", "Bolts with plate holes: shear, bearing, tearout", "bolts", f"{shear}, {bearing}", "bolts", False,
             lambda j: bolt_group.at_holes(j, j.plate)),
        ]
        if joint.bolts.T_b:
            rows.append(("slip", "Slip", "bolts", slip, bolt_group.slip_factor(joint), False, bolt_group.slip))
        # A single bolt spreads its load from a point: it has no Whitmore width.
        whitmore = [] if len(joint.pattern) == 1 else [
            ("Whitmore yielding", "Plate, yielding on the Whitmore width", "plate", "J4.1(a)", "yielding", False, plate.whitmore_yielding),
            ("Whitmore rupture", "Plate, rupture on the Whitmore width", "plate", "J4.1(b)", "rupture", False, plate.whitmore_rupture),
        ]
        return [
            *rows,
            ("plate yielding", "Plate, yielding of the gross section", "plate", "J4.1(a)", "yielding", False, plate.gross_yielding),
            ("plate rupture", "Plate, rupture of the net section", "plate", "J4.1(b)", "rupture", False,
             lambda j: net_section.plate_rupture(j.plate)),
            *whitmore,
            ("plate block", "Plate, block shear", "plate", "J4.3", "block shear", False,
             lambda j: tear_out.block_shear(j.plate, tear_out.plate_part(j))),
        ]

    def _checks(self):
        joint, T, C = self.joint, self.demand.required_tension, self.demand.required_compression
        method, edition = self.basis.method, self.basis.edition
        for id, title, part, clause, state, axial, evaluate in self.limit_states(joint):
            if id == "plate yielding" and not joint.bolts.T_b:
                yield not_applicable("slip", "Slip", "bolts", CLAUSES["slip"][edition], f"joint designed in bearing ({self.inputs.installation})")
            if id == "plate block" and len(joint.pattern) == 1:
                yield not_applicable("Whitmore yielding", "Plate, yielding on the Whitmore width", "plate", "J4.1(a)", "one bolt has no Whitmore width")
                yield not_applicable("Whitmore rupture", "Plate, rupture on the Whitmore width", "plate", "J4.1(b)", "one bolt has no Whitmore width")
            found = evaluate(joint)
            demand = max(T, C) if id in ("bolt shear", "slip") else T
            yield strength_check(id, title, part, clause, state, method, found.nominal, demand, found.steps, axial, path=found.path, notes=found.notes)
        yield from self._compression_checks(C)
        yield details.minimum_spacing(joint, edition)
        yield details.maximum_spacing(joint, edition, self.inputs.bare_weathering)
        held = {attachment.y for attachment in self.element.attachments}
        yield from details.edges(joint, joint.member, self.size, edition, (0.0 not in held, self.element.width not in held))
        yield from details.edges(joint, joint.plate, self.size, edition, (True, True))
        yield details.tightening(joint, self.size)
        yield details.slenderness(self.element, self.inputs.member_length)

    def _compression_checks(self, C):
        joint, method = self.joint, self.basis.method
        clause = f"{CLAUSES['bolt shear'][self.basis.edition]}, {CLAUSES['bearing and tearout'][self.basis.edition]}"
        rows = [("bolts member reversed", "Bolts with member holes, compression", clause, "bolts", False,
                 lambda: bolt_group.at_holes(joint, joint.member, reversed_load=True)),
                ("bolts plate reversed", "Bolts with plate holes, compression", clause, "bolts", False,
                 lambda: bolt_group.at_holes(joint, joint.plate, reversed_load=True)),
                ("gusset compression", "Plate, compression on the Whitmore width", "J4.4", "compression", True, lambda: plate.compression(joint))]
        for id, title, clause, state, axial, evaluate in rows:
            part = "plate" if id == "gusset compression" else "bolts"
            if C <= 0:
                yield not_applicable(id, title, part, clause, "no combination gives compression")
                continue
            found = evaluate()
            yield strength_check(id, title, part, clause, state, method, found.nominal, C, found.steps, axial, tension=False)

    def brace(self):
        """Return the member as a brace of a seismic system."""
        part = self.element
        return seismic.Brace(part.A_g, self.member_material.F_y, self.member_material.name, "plate" if part.series == "PL" else "rolled", part.r,
                             self.inputs.member_length, self.inputs.plate_thickness)

    def fatigue_details(self, by_id):
        """Return the details that live load may crack: member and plate at their bolts."""
        given, joint = self.inputs, self.joint
        fatigue.refuse_snug(given.installation)
        lapped = given.plates == 1 and joint.bolts.n_s == 1
        note = "The stress range is axial; bending from the eccentricity of a lap is to be added by hand." if lapped else ""
        yielding, rupture = ("plate yielding", "plate rupture") if len(joint.pattern) == 1 else ("Whitmore yielding", "Whitmore rupture")
        return (fatigue.at_bolts("member", "Member", "member yielding", "member rupture", given.installation, joint.member.F_y, note=note),
                fatigue.at_bolts("plate", "Plate", yielding, rupture, given.installation, joint.plate.F_y, note=note))

    # What the report says beside the checks

    def assumptions(self):
        """Return (text, basis) of what the calculation takes for granted."""
        given, joint = self.inputs, self.joint
        notes = [(f"Threads {'excluded from' if given.threads == 'X' else 'in'} the shear plane ({given.threads}).", "input"),
                 (f"Bolts installed {given.installation}; {joint.bolts.n_s} shear plane{'s' if joint.bolts.n_s > 1 else ''}.", "input"),
                 ("The bolts of a group share the load equally; strengths of bolts with their holes are summed.",
                  f"{CLAUSES['bolt shear'][self.basis.edition]}, User Note"),
                 ("No credit is taken for diagonals in the tension plane of a tear-out block.", "conservative"),
                 ("Tension over a tear-out block is uniform, $U_{bs}$ = 1.0.", "Commentary J4.3")]
        for material, part in ((self.member_material, "Member"), (self.plate_material, "Plate")):
            if material.note:
                notes.append((f"{part} steel {material.name}: {material.note}", "availability, from memory"))
        notes += [(text, "bolt tables") for text in (*facts.size_notes(self.size, self.bolt_group), *self.bolt_group.notes)]
        notes += [(text, "loads") for text in getattr(self.demand, "notes", ())]
        if self.element.series in ("L", "2L") or self.element.name == "stem":
            notes.append((f"Eccentricity between the gage line and the centroid of the {self.element.member} is not regarded.", "J1.7"))
        if given.U_by_hand is not None:
            notes.append((f"U = {given.U_by_hand:g} set by the engineer: {given.U_basis}", "engineer"))
        if given.missing_bolts:
            numbers = ", ".join(str(number) for number in given.missing_bolts)
            notes.append((f"As built: bolts missing at {numbers}; their holes are open and still weaken the parts.", "input"))
        if given.eccentricity_basis:
            notes.append((f"Eccentricity of the bolt group accepted by the engineer: {given.eccentricity_basis}", "engineer"))
        if joint.t_filler:
            notes.append((f"Fillers of {units.length(joint.t_filler)} at a shear plane, not developed outside the joint.", "input"))
        return [*super().assumptions(), *notes]

    def materials_text(self):
        """Return the steels with their strengths, in a sentence; symbols between dollar signs."""
        parts = ((f"member {self.element.member}", self.member_material), ("plate", self.plate_material))
        return "; ".join(f"{part}: {m.name}, $F_y$ {m.F_y:g} ksi, $F_u$ {m.F_u:g} ksi" for part, m in parts)

    def by_others(self):
        """Return what the scope leaves to others."""
        out = ["the edge of the connection plate at its support: weld or bolts, and the support itself",
               "bending from eccentricity of the connection in and out of its plane", "fatigue, seismic detailing, corrosion and fire"]
        if self.demand.required_compression > 0:
            out.insert(0, "the member in compression between its ends")
        return tuple(out)

    def designed(self):
        """Return (item, what is to be built) rows for comparison with the drawings."""
        given, joint = self.inputs, self.joint
        n = joint.n_bolts
        return [("Member", f"{self.element.member}, {self.member_material.name}, bolted through {'the ' if self.element.joints == 1 else 'both '}"
                           f"{self.element.name}{'s' if self.element.joints == 2 else ''}"),
                ("Plates", f"{joint.plate.pieces} PL {units.fraction(given.plate_thickness)} x {units.fraction(given.plate_width)}, {self.plate_material.name}"),
                ("Bolts", f"{n} bolts {self.size.name}{'' if self.size.metric else ' in'}, {self.bolt_group.product or self.bolt_group.name}"
                          f"-{given.threads}, {given.installation}"
                          + (f", faying surface class {given.slip_class}" if given.slip_class else "")),
                ("Holes", f"member {given.member_holes}, plate {given.plate_holes}"),
                ("Bolt length", self._bolt_length())]

    def _bolt_length(self):
        part, given = self.element, self.inputs
        grip = part.plies * part.t + given.plates * given.plate_thickness + (self.joint.n_fillers and self.joint.t_filler * self.joint.bolts.n_s)
        try:
            least = grip + facts.bolt_length_addition(self.size) + facts.WASHER
        except LookupError:
            return f"grip {units.printed(grip)} in; length by the supplier"
        return f"grip {units.printed(grip)} in; {units.length(math.ceil(least * 4 - 1e-9) / 4)} with one washer (common practice)"

    @property
    def design(self):
        """The joint as designed."""
        return self.joint

    @property
    def subject(self):
        """What the calculation is about."""
        return self.element.member

    def tables(self, part):
        """Return the table of every bolt, beside the checks of the bolts."""
        if part != "bolts":
            return ()
        found, joints = bolt_group.bolt_table(self.joint), self.element.joints
        heads = ("Bolt", "x, in", "y, in", "member $l_c$, in", "bearing", "tearout", "plate $l_c$, in", "bearing", "tearout", "shear", "least")
        rows = []
        for row in found["rows"]:
            sides = [(f"{_three(l_c)} {kind[0]}", _three(r_nb), _three(r_nt)) for l_c, kind, r_nb, r_nt in (row["member"], row["plate"])]
            rows.append((str(row["bolt"]), units.fraction(row["x"]), units.fraction(row["y"]), *sides[0], *sides[1], _three(row["shear"]),
                         units.floor_figures(row["least"])))
        caption = (f"Nominal strengths in kip for one bolt group{f' of {joints}' if joints > 1 else ''}; "
                   "e: towards the edge of the part, h: towards the next hole.")
        sums = {side: units.floor_figures(value, 4) for side, value in found["sums"].items()}
        remark = (f"Sums over {'all groups' if joints > 1 else 'the group'}, nominal: with the member's holes {sums['member']} kip, with the plate's "
                  f"holes {sums['plate']} kip; each bolt limited by the weaker ply {sums['stricter']} kip (a stricter reading, for information).")
        return (Table("Every bolt", heads, tuple(rows), caption, remark),)

    def drawings(self):
        """Return the elevation with the governing path, the cross-section, and the paths of the other limit states."""
        from ...figures import cross_section, elevation, paths

        return tuple(figure for figure in (elevation(self), cross_section(self), paths(self)) if figure is not None)

    def sweep(self):
        """Return the sweep over rows of bolts at the chosen pitch, with the design's rows at other pitches beside it."""
        given = self.inputs
        if given.missing_bolts:
            return "Not drawn: bolts are missing, so this is one joint as built and no pattern to lengthen."
        if given.holes:
            return "Not drawn: the holes are given one by one, so there is no pitch at which rows could be added."
        pitch, stagger = given.pitch or 3.0, abs(given.stagger) * (given.lines > 1)
        first = 1 if given.lines > 1 and (self.element.eccentricity is None or given.U_by_hand is not None) else 2
        rows = list(range(first, max(given.rows + 4, 8) + 1))
        stretched = None
        if given.rows > 1:
            thinner = min(self.joint.member.t, self.joint.plate.t)
            pitches = np.linspace(8 / 3 * self.size.d, max(pitch, min(24 * thinner, self.joint.member.constants.spacing, 2 * pitch)), 200)
            stretched = ((given.rows - 1) * pitches + stagger, self.at(pitch=pitches))
        lengths = np.array([(n - 1) * pitch + stagger for n in rows])

        def describe(i):
            at = f" at {units.length(pitch)}" if rows[i] > 1 else ""
            return f"{rows[i]} row{'s' if rows[i] > 1 else ''}{at}, l = {units.length(lengths[i])}"

        return Sweep(lengths, [self.at(rows=n, pitch=pitch) for n in rows], rows.index(given.rows) if given.rows in rows else None, describe, stretched,
                     f"{given.rows} rows at other pitches", marks=tuple(f"{n} rows" for n in rows))

    def at(self, **changes):
        """Return the joint with changed inputs, unvalidated, for a sweep.

        ``rows`` takes a number; ``pitch``, ``gage`` (a tuple), ``gage_from_back``, ``stagger``, ``member_end``, ``plate_end``,
        ``plate_thickness``, ``plate_width`` and ``plate_offset`` take numbers or arrays (n,) in inches.
        """
        return self._joint(**changes)


class _Changed:
    """Inputs with some of them replaced."""

    def __init__(self, inputs, changes):
        self._inputs, self._changes = inputs, changes

    def __getattr__(self, name):
        return self._changes[name] if name in self._changes else getattr(self._inputs, name)


def _three(value):
    return units.printed(value, 3)


CONNECTION = BoltedConnection
