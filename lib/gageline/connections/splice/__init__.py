"""A bolted tension splice with plates on flanges, web, or a flat member; both halves alike, the load shared by areas."""

from dataclasses import replace
from functools import partial

from ... import units
from ...check import not_applicable, silent, strength_check
from ...editions import CLAUSES
from ...errors import InputError
from ...facts import bolts as facts
from ...facts import grades, shapes
from ...provisions.fatigue import share_of_range
from .. import bolt_group, details, fatigue
from ..base import Connection, Sweep, Table
from ..element import element
from . import design as layout
from . import limit_states as states
from .inputs import SpliceInputs


class SpliceConnection(Connection):
    """A tension splice, from the member's gross section through bolts and plates to the other half, which is alike.

    The checks, in order: member yielding and net rupture; for flanges and web: bolts in shear, with the member's holes, with the
    plates' holes, slip, block shear of member and plates, yielding and rupture of the plates on their width and on the Whitmore width,
    reversal; spacing, edges, slenderness. A group's strength is referred to the member's whole load by the group's share of the area.
    """

    family = "splice"
    title = "Tension splice"
    Model = SpliceInputs
    parts = {"member": "Member", "flange": "Flange splices", "web": "Web splice", "detailing": "Spacing and edges"}

    def __init__(self, inputs, basis=None):
        super().__init__(inputs, basis)
        self.size = facts.bolt_size(inputs.bolt)
        self.bolt_group = facts.bolt_group(inputs.bolt_grade, self.basis.edition)
        series = self._series(inputs.member)
        self.element = element(inputs.member, None if series == "PL" else "both flanges")
        if series == "PL":
            self.member_material = grades.material(inputs.member_grade, form="plate", thickness=self.element.t, edition=self.basis.edition)
            self.parts = {**self.parts, "web": "Splice plates"}
        else:
            self.member_material = grades.material(inputs.member_grade, form="shape", series=series, edition=self.basis.edition)
        layout.refuse_installation(self)
        self.design = layout.build(self)

    @staticmethod
    def _series(designation):
        if designation.strip().lower().startswith(("pl", "bar", "flat")):
            return "PL"
        series = shapes.shape(designation).series
        if series not in ("W", "M", "S", "HP"):
            raise InputError(f"member {designation}: a splice joins W, M, S and HP shapes, or flat plates (PL thickness x width)")
        return series

    def plate_material(self, thickness):
        """Return the steel of a splice plate of a thickness."""
        return grades.material(self.inputs.plate_grade, form="plate", thickness=thickness, edition=self.basis.edition)

    @property
    def subject(self):
        """What the calculation is about."""
        return f"splice of {self.element.member}"

    def named(self, name):
        """Return how the checks of a group begin."""
        return "Splice plates" if self.design.section is None else {"flange": "Flange splices", "web": "Web splice"}[name]

    # The checks

    def limit_states(self, splice):
        """Return (id, title, part, clause, limit state, axial, evaluate) of every strength in tension; ``splice`` may be one of a sweep."""
        edition = self.basis.edition
        clauses = tuple(CLAUSES[topic][edition] for topic in ("bolt shear", "bearing and tearout", "slip"))
        rows = [("member yielding", "Member, yielding of the gross section", "member", "D2(a)", "yielding", True, states.member_yielding),
                ("member rupture", "Member, rupture of the net section", "member", "D2(b), D3", "rupture", True, states.member_rupture)]
        for group in splice.groups:
            for id, title, clause, state, evaluate in states.of_group(group, clauses):
                rows.append((f"{group.name} {id}", f"{self.named(group.name)}, {title}", group.name, clause, state, False,
                             states.referred(group.name, evaluate, id == "bolt shear")))
        return rows

    def _checks(self):
        T, C = self.demand.required_tension, self.demand.required_compression
        method = self.basis.method
        for id, title, part, clause, state, axial, evaluate in self.limit_states(self.design):
            found = evaluate(self.design)
            demand = max(T, C) if id.endswith(("bolt shear", "slip")) else T
            yield strength_check(id, title, part, clause, state, method, found.nominal, demand, found.steps, axial, path=found.path,
                                 notes=found.notes)
        for group in self.design.groups:
            yield from self._compression(group, C)
        yield from self._absent()
        for group in self.design.groups:
            yield from self._limits(group)
        yield details.slenderness(self.element, self.inputs.member_length)

    def _compression(self, group, C):
        name, edition = group.name, self.basis.edition
        clause = f"{CLAUSES['bolt shear'][edition]}, {CLAUSES['bearing and tearout'][edition]}"
        rows = [("bolts member reversed", "bolts with member holes, compression", clause, "bolts", False,
                 lambda j: bolt_group.at_holes(j, j.member, reversed_load=True)),
                ("bolts plate reversed", "bolts with plate holes, compression", clause, "bolts", False,
                 lambda j: bolt_group.at_holes(j, j.plate, reversed_load=True)),
                ("plate compression", "plates in compression across the joint", "J4.4", "compression", True,
                 states.plate_compression(group.free_length))]
        for id, title, clause, state, axial, evaluate in rows:
            id, title = f"{name} {id}", f"{self.named(name)}, {title}"
            if C <= 0:
                yield not_applicable(id, title, name, clause, "no combination gives compression")
                continue
            found = states.referred(name, evaluate)(self.design)
            # Referred to the member's load the strength is called R_n, as every group's is.
            yield strength_check(id, title, name, clause, state, self.basis.method, found.nominal, C, found.steps, axial and group.alone,
                                 tension=False)

    def _absent(self):
        """Yield what does not apply, each with its reason."""
        clause = CLAUSES["slip"][self.basis.edition]
        for name in layout.NAMES:
            if self.design.group(name) is None:
                flat = self.design.section is None
                why = "the member is a flat plate" if flat else f"the {name} is not spliced; the whole load passes the other group"
                title = {"flange": "Flange splices", "web": "Web splice"}[name]
                yield not_applicable(f"{name} splice", f"{title}, all checks", name, "J3, J4", why)
            elif self.inputs.installation != "slip-critical":
                yield not_applicable(f"{name} slip", f"{self.named(name)}, slip", name, clause,
                                     f"joint designed in bearing ({self.inputs.installation})")

    def _limits(self, group):
        joint, edition = group.joint, self.basis.edition
        held = {attachment.y for attachment in joint.element.attachments}
        free = (0.0 not in held, joint.element.width not in held)
        found = [details.minimum_spacing(joint, edition), details.maximum_spacing(joint, edition, self.inputs.bare_weathering),
                 *details.edges(joint, joint.member, self.size, edition, free), *details.edges(joint, joint.plate, self.size, edition, (True, True)),
                 details.tightening(joint, self.size)]
        for each in found:
            notes = tuple("Of the edges of the splice plates the one farthest from the joint is regarded." if "gusset" in text else text
                          for text in each.notes)
            yield replace(each, id=f"{group.name} {each.id}", title=f"{self.named(group.name)}: {each.title[0].lower()}{each.title[1:]}",
                          part=group.name,
                          notes=notes)

    def fatigue_details(self, by_id):
        """Return the details that live load may crack: member and splice plates at their bolts."""
        how, splice = self.inputs.installation, self.design
        fatigue.refuse_snug(how)
        out = [fatigue.at_bolts("member", "Member", "member yielding", "member rupture", how, splice.F_y)]
        for group in splice.groups:
            force = None if group.alone else partial(_shared_range, states.share(silent, splice, group))
            out.append(fatigue.at_bolts(group.name, f"{self.named(group.name)}, plates", f"{group.name} Whitmore yielding",
                                        f"{group.name} Whitmore rupture", how, group.joint.plate.F_y, force))
        return out

    # What the report says beside the checks

    def assumptions(self):
        """Return (text, basis) of what the calculation takes for granted."""
        given, splice = self.inputs, self.design
        notes = [("Both halves of the splice are alike; one is calculated.", "input"),
                 (f"Threads {'excluded from' if given.threads == 'X' else 'in'} the shear plane ({given.threads}), bolts {given.installation}.",
                  "input"),
                 ("The bolts of a group share the load equally; strengths of bolts with their holes are summed.",
                  f"{CLAUSES['bolt shear'][self.basis.edition]}, User Note"),
                 ("Tension over a tear-out block is uniform, $U_{bs}$ = 1.0.", "Commentary J4.3")]
        if len(splice.groups) == 2:
            notes += [("Flanges and web carry shares of the load in proportion to their areas; fillets are counted to the web.", "statics"),
                      ("Block shear of flange and of web is taken for each by itself, with nothing of the other part hanging on it.", "safe")]
        notes.append(("The net area of splice plates is not limited to 0.85 of their gross area; that limit of older specifications is not in "
                      f"AISC {self.basis.edition}" + (" as far as known." if self.basis.edition == "360-16" else "."), "J4.1"))
        if self.demand.required_compression > 0:
            notes.append((f"Splice plates in compression: K = {states.K_PLATE} between the rows beside the joint.", "published design example"))
        for group in splice.groups:
            if group.joint.t_filler:
                notes.append((f"Fillers of {units.length(group.joint.t_filler)} at a shear plane of the {group.name}, not developed "
                              "outside the joint.", "input"))
        if self.member_material.note:
            notes.append((f"Member steel {self.member_material.name}: {self.member_material.note}", "availability, from memory"))
        notes += [(text, "bolt tables") for text in (*facts.size_notes(self.size, self.bolt_group), *self.bolt_group.notes)]
        notes += [(text, "loads") for text in getattr(self.demand, "notes", ())]
        return [*super().assumptions(), *notes]

    def materials_text(self):
        """Return the steels with their strengths, in a sentence; symbols between dollar signs."""
        parts = [(f"member {self.element.member}", self.member_material)]
        parts += [(f"{group.name if self.design.section else 'splice'} plates", self.plate_material(group.joint.plate.t))
                  for group in self.design.groups]
        return "; ".join(f"{part}: {m.name}, $F_y$ {m.F_y:g} ksi, $F_u$ {m.F_u:g} ksi" for part, m in parts)

    def by_others(self):
        """Return what the scope leaves to others."""
        out = ["bending and shear of the member at the splice", "fatigue, seismic detailing, corrosion and fire"]
        if self.demand.required_compression > 0:
            out.insert(0, "the member in compression between its ends")
        return tuple(out)

    def designed(self):
        """Return (item, what is to be built) rows for comparison with the drawings."""
        given, splice = self.inputs, self.design
        rows = [("Member", f"{self.element.member}, {self.member_material.name}; gap between the halves {units.length(given.joint_gap)}")]
        product = self.bolt_group.product or self.bolt_group.name
        for group in splice.groups:
            ply, joint = group.joint.plate, group.joint
            length = 2 * (joint.length + getattr(given, f"{group.name}_plate_end") + group.free_length[0]) + group.free_length[1]
            rows.append((self.named(group.name),
                         f"{ply.pieces} PL {units.fraction(ply.t)} x {units.fraction(ply.width)} x {units.fraction(length)} long; "
                                                 f"{joint.n_bolts} bolts on each side of the joint"))
        rows += [("Bolts", f"{self.size.name}{'' if self.size.metric else ' in'}, {product}-{given.threads}, {given.installation}"
                           + (f", faying surface class {given.slip_class}" if given.slip_class else "")),
                 ("Holes", f"member {given.member_holes}, plates {given.plate_holes}")]
        return rows

    def tables(self, part):
        """Return the table of the shares of the load, beside the checks of the member."""
        if part != "member" or len(self.design.groups) < 2:
            return ()
        rows = []
        for group in self.design.groups:
            xi = states.share(silent, self.design, group)
            rows.append((self.named(group.name), f"{xi * self.design.A_g:.4g}", f"{xi:.4f}", units.ceil_figures(xi * self.demand.required_tension)))
        heads = ("Group", "area, in²", "share", "of the required tension, kip")
        return (Table("Shares of the load", heads, tuple(rows), "Shares in proportion to the areas joined."),)

    def drawings(self):
        """Return the whole splice, its section, and an elevation of each group with its governing path."""
        from .drawing import group_elevations, section, whole

        return whole(self), section(self), *group_elevations(self)

    def sweep(self):
        """Return the sweep over bolts in each line, all groups growing together at their pitches."""
        groups = self.design.groups
        fewest = min(group.rows for group in groups)
        first = 2 if any(group.alone and group.joint.element.eccentricity is not None for group in groups) or any(
            group.joint.n_lines == 1 for group in groups) else 1
        more = list(range(min(first - fewest, 0), max(5, 8 - fewest)))
        designs = [layout.build(self, k) for k in more]
        joints = [splice.groups[0].joint for splice in designs]
        lengths = [joint.length for joint in joints]

        def describe(i):
            rows = " and ".join(f"{group.rows} rows in the {group.name if self.design.section else 'plates'}" for group in designs[i].groups)
            return f"{rows}, l = {units.length(lengths[i])}"

        return Sweep(lengths, designs, more.index(0), describe,
                     label=f"length of the {'flange' if groups[0].name == 'flange' else 'bolt'} group on one side, in",
                     marks=tuple(f"{joint.rows} rows" for joint in joints))


def _shared_range(xi, do, P):
    """Work out the share of a range of force that a group carries. [kip]"""
    return do(share_of_range, xi, P)


CONNECTION = SpliceConnection
