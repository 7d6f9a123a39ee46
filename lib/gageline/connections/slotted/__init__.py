"""A hollow section on a gusset: HSS or pipe slotted over a concentric gusset, or rectangular HSS between two side gussets."""

import math
from dataclasses import replace
from functools import cached_property

import numpy as np

from ... import units
from ...check import not_applicable, silent, strength_check
from ...errors import InputError, ScopeError
from ...facts import grades, hollow
from ...facts import welds as filler
from ...facts.shapes import shape as find_shape
from .. import fatigue, seismic
from .. import plate as plates
from ..base import Connection, Sweep
from ..joint import Gusset
from . import advice, detailing, member, refusals, welding
from .inputs import SlottedInputs
from .joint import Plate, Reinforcement, SlottedJoint, Tube

ORDER = ("member yielding", "member rupture", "slot yielding", "rupture beyond plates", "plates weld", "wall shear yielding", "wall shear rupture",
         "member block", "weld", "plate shear yielding", "plate shear rupture", "plate block", "plate yielding", "Whitmore yielding",
         "Whitmore rupture", "slot compression", "gusset compression")
"""The limit states in the order of the report."""

BOTH_SENSES = {"weld", "wall shear yielding", "wall shear rupture", "plate shear yielding", "plate shear rupture"}
"""Limit states that carry the larger of tension and compression."""

APART = {
    "slot yielding": ("Member, yielding of the slotted length without welds", "member", "D2(a)"),
    "rupture beyond plates": ("Member, rupture where the reinforcing plates end", "member", "D2(b), D3"),
    "plates weld": ("Member, welds of the reinforcing plates", "member", "J2.4"),
    "member block": ("Member, block shear", "member", "J4.3"),
    "plate block": ("Gusset, block shear", "plate", "J4.3"),
}
"""Limit states that do not always apply -> (title, part, clause)."""


class SlottedConnection(Connection):
    """A hollow section welded to a gusset by four lines of weld, from its gross section to the gusset.

    The checks, in order: yielding, net rupture at the slot, slotted length without welds, reinforcement, walls in shear along the
    welds; the welds; gusset in shear along the welds, block shear, yielding and rupture on the physical and on the Whitmore width;
    slotted section and gusset in compression where the load reverses; sizes and lengths of the welds, gap, slenderness.
    """

    family = "slotted"
    title = "Hollow section on a gusset"
    Model = SlottedInputs
    parts = {"member": "Member", "weld": "Welds", "plate": "Gusset", "detailing": "Sizes, lengths, gap, slenderness"}

    def __init__(self, inputs, basis=None):
        super().__init__(inputs, basis)
        self.shape = find_shape(inputs.member)
        if self.shape.t_nom is None:
            raise InputError(f"member {self.shape.name} is no hollow section; this calculation is for HSS and pipe")
        refusals.inputs(inputs, self.shape)
        self.member_material = grades.material(inputs.member_grade, form=self.shape.form, series=self.shape.series, thickness=self.shape.t_nom,
                                               edition=self.basis.edition)
        self.plate_material = grades.material(inputs.plate_grade, form="plate", thickness=inputs.plate_thickness, edition=self.basis.edition)
        self.electrode = filler.electrode(inputs.electrode)
        self.demand = seismic.demand(self)
        self.joint = self._joint()
        refusals.geometry(self.joint, inputs)
        self.unjudged = refusals.filler(self.electrode, (("member", self.member_material, self.shape.t_nom),
                                                         ("gusset", self.plate_material, inputs.plate_thickness)))

    # The joint that the inputs describe

    def _tube(self):
        full = self.member_material.t_factor == 1.0
        found = hollow.of_full_wall(self.shape) if full else self.shape
        sides = (found.H, found.B) if found.D is None else (None, None)
        if self.inputs.side_along_gusset is not None:
            sides = tuple(sorted(sides, reverse=self.inputs.side_along_gusset == "long"))
        radii = [(found.r_x, "r_x"), (found.r_y, "r_y")]
        r, r_name = min(radii)
        return Tube(found.name, found.series, *sides, found.D, found.t_des, found.t_nom, full, found.A, r, "r" if found.r_x == found.r_y else r_name,
                    self.member_material.F_y, self.member_material.F_u)

    def _joint(self):
        given = self.inputs
        tube = self._tube()
        plate = Plate(given.plate_thickness, given.plate_width, given.gussets, self.plate_material.F_y, self.plate_material.F_u)
        concentric = given.gussets == 1
        clearance, gap, unwelded = 0.0, 0.0, 0.0
        if concentric:
            clearance = max(given.slot_clearance, (given.slot_end_width or 0.0) - given.plate_thickness)
            gap = given.slot_clearance if given.weld_gap is None else given.weld_gap
            unwelded = given.weld_held_back + given.slot_overrun
        return SlottedJoint(tube, plate, self._gusset(), given.weld_length, given.weld_leg, gap, self.electrode.F_EXX, clearance, unwelded,
                            self.basis.edition, self._reinforcement(tube), given.U_by_hand, given.U_basis)

    def _reinforcement(self, tube):
        given = self.inputs
        if given.reinforcing_thickness is None:
            return None
        material = grades.material(given.reinforcing_grade, form="plate", thickness=given.reinforcing_thickness, edition=self.basis.edition)
        return Reinforcement(given.reinforcing_thickness, given.reinforcing_width, given.reinforcing_length, given.reinforcing_leg,
                             detailing.gap_at_bar(tube, given.reinforcing_width), material.F_y, material.F_u)

    def _gusset(self):
        given, C = self.inputs, self.demand.required_compression
        support, K, basis, allowed = given.gusset_support, given.gusset_K, "", ", ".join((*plates.K_CHOICES, "by hand"))
        if support == "by hand":
            if K is None or len(given.gusset_K_basis.strip()) < 10:
                raise InputError("gusset_support = 'by hand' needs gusset_K and a written basis in gusset_K_basis")
            basis = f"K by hand. Basis: {given.gusset_K_basis}"
        elif support is not None:
            if support not in plates.K_CHOICES:
                raise InputError(f"gusset_support = {support!r} is not known; allowed: {allowed}")
            K, basis = plates.K_CHOICES[support]
        if C > 0 and support is None:
            raise InputError(f"the member goes into compression ({units.printed(C)} kip): give gusset_support ({allowed}) and gusset_length")
        if C > 0 and given.gusset_length is None and K is not None:
            raise InputError("input gusset_length is missing: end of the tube to the support, along the load")
        return Gusset(given.plate_width, 0.0, given.plate_width, K, given.gusset_length, basis)

    # The checks

    def limit_states(self, joint):
        """Return (id, title, part, clause, limit state, axial, evaluate) of every strength in tension; ``joint`` may hold arrays."""
        slot = " at the slot" if joint.concentric else ""
        rows = [("member yielding", "Member, yielding of the gross section", "member", "D2(a), B4.2", "yielding", True, member.gross_yielding),
                ("member rupture", f"Member, rupture of the net section{slot}", "member", "D2(b), D3", "rupture", True, member.net_rupture)]
        if self._long_slot(joint):
            rows.append(("slot yielding", *APART["slot yielding"], "yielding", True, member.slotted_yielding))
        if joint.reinforcement is not None:
            rows += [("rupture beyond plates", *APART["rupture beyond plates"], "rupture", True, member.rupture_beyond_plates),
                     ("plates weld", *APART["plates weld"], "weld", False, member.reinforcement_welds)]
        rows += [("wall shear yielding", "Member, shear yielding of the walls along the welds", "member", "J4.2(a)", "shear yielding", False,
                  member.wall_yielding),
                 ("wall shear rupture", "Member, shear rupture of the walls along the welds", "member", "J4.2(b)", "shear rupture", False,
                  member.wall_rupture),
                 ("weld", "Welds, strength of the four lines", "weld", "J2.2, J2.4", "weld", False, welding.strength),
                 ("plate shear yielding", "Gusset, shear yielding along the welds", "plate", "J4.2(a)", "shear yielding", False,
                  welding.plate_shear_yielding),
                 ("plate shear rupture", "Gusset, shear rupture along the welds", "plate", "J4.2(b)", "shear rupture", False,
                  welding.plate_shear_rupture)]
        if joint.concentric:
            rows.append(("plate block", *APART["plate block"], "block shear", False, member.plate_block))
        return [*rows,
                ("plate yielding", "Gusset, yielding of the gross section", "plate", "J4.1(a)", "yielding", False, plates.gross_yielding),
                ("Whitmore yielding", "Gusset, yielding on the Whitmore width", "plate", "J4.1(a)", "yielding", False, plates.whitmore_yielding),
                ("Whitmore rupture", "Gusset, rupture on the Whitmore width", "plate", "J4.1(b)", "rupture", False, plates.whitmore_rupture)]

    @staticmethod
    def _long_slot(joint):
        return joint.concentric and joint.unwelded > joint.tube.depth

    def _checks(self):
        joint, T, C, method = self.joint, self.demand.required_tension, self.demand.required_compression, self.basis.method
        found = {each.id: each for each in (*self._apart(), *self._compression_checks(C))}
        for id, title, part, clause, state, axial, evaluate in self.limit_states(joint):
            out = evaluate(joint)
            notes = (*out.notes, *(self._net_section_notes(T, out.nominal, state) if id == "member rupture" else ()))
            found[id] = strength_check(id, title, part, clause, state, method, out.nominal, max(T, C) if id in BOTH_SENSES else T, out.steps, axial,
                                       path=out.path, notes=notes)
        yield from (found[id] for id in ORDER)
        yield from detailing.checks(joint, self.inputs)

    def _apart(self):
        """Yield the limit states that do not apply, each with its reason."""
        joint = self.joint
        reasons = {"member block": "every wall is sheared along its weld line; the small part torn across a wall is not counted: J4.2 is checked"}
        if not self._long_slot(joint):
            reasons["slot yielding"] = "the tube is not slotted" if not joint.concentric else \
                f"the slotted length without welds of {units.length(joint.unwelded)} is not more than the tube's depth: its yielding would " \
                "not lengthen the member by much, so rupture governs it"
        if joint.reinforcement is None:
            reasons |= dict.fromkeys(("rupture beyond plates", "plates weld"), "no reinforcing plates")
        if not joint.concentric:
            reasons["plate block"] = "the welds lie along the edges of the side gussets, so that no block can tear out beside them"
        for id, reason in reasons.items():
            yield not_applicable(id, *APART[id], reason)

    def _net_section_notes(self, T, nominal, state):
        joint = self.joint
        if not joint.concentric:
            return ()
        notes = [f"The slot is deducted whether or not the weld closes its end; slotted length without welds "
                 f"{units.length(joint.unwelded)}." if not self.inputs.end_return else
                 "The slot is deducted although the welds return round the gusset's edge and close it: the return is not counted."]
        if joint.reinforcement is None:
            notes += advice.reinforcement(joint, T, nominal, state, self.basis.method)
        return notes

    def _compression_checks(self, C):
        joint, method = self.joint, self.basis.method
        rows = [("slot compression", "Member, yielding of the slotted section in compression", "member", "J4.4(a)", member.slotted_yielding),
                ("gusset compression", "Gusset, compression on the Whitmore width", "plate", "J4.4", plates.compression)]
        for id, title, part, clause, evaluate in rows:
            if C <= 0:
                yield not_applicable(id, title, part, clause, "no combination gives compression")
            elif id == "slot compression" and not joint.concentric:
                yield not_applicable(id, title, part, clause, "the tube is not slotted")
            else:
                found = evaluate(joint)
                yield strength_check(id, title, part, clause, "compression", method, found.nominal, C, found.steps, True, tension=False)

    def brace(self):
        """Return the member as a brace of a seismic system."""
        tube = self._tube()
        return seismic.Brace(tube.A_g, tube.F_y, self.member_material.name, "hollow", tube.r, self.inputs.member_length, self.inputs.plate_thickness)

    def fatigue_details(self, by_id):
        """Return the details that live load may crack: tube and gusset at the ends of the welds, and their throats."""
        joint, given = self.joint, self.inputs
        if joint.reinforcement is not None:
            raise ScopeError("fatigue of a net section reinforced by plates: Table A-3.1 has no case of it; lengthen the welds or thicken the tube")
        note = "Category of longitudinal fillets (4.1) by analogy: the table has no slotted tube; to be confirmed against the standard."
        return (fatigue.weld_ends("member", "Tube", joint.tube.t, ("member rupture", "A_e"), joint.tube.F_y, note),
                fatigue.weld_ends("plate", "Gusset", given.plate_thickness, ("Whitmore yielding", "A_g"), self.plate_material.F_y),
                fatigue.throats("weld", "Welds", "weld"))

    # What the report says beside the checks

    def assumptions(self):
        """Return (text, basis) of what the calculation takes for granted."""
        return [*super().assumptions(), *advice.assumptions(self)]

    def materials_text(self):
        """Return the steels and the filler metal with their strengths, in a sentence; symbols between dollar signs."""
        parts = [(f"member {self.shape.name}", self.member_material), ("gusset", self.plate_material)]
        said = [f"{part}: {m.name}, $F_y$ {m.F_y:g} ksi, $F_u$ {m.F_u:g} ksi" for part, m in parts]
        if self.joint.reinforcement is not None:
            said.append(f"reinforcing plates: {self.inputs.reinforcing_grade}, $F_u$ {self.joint.reinforcement.F_u:g} ksi")
        return "; ".join([*said, f"filler metal {self.electrode.name}, $F_{{EXX}}$ {self.electrode.F_EXX:g} ksi"])

    def by_others(self):
        """Return what the scope leaves to others."""
        out = ["the edge of the gusset at its support: weld or bolts, and the support itself",
               "bending from eccentricity of the connection in and out of its plane",
               "sealing of the slotted tube, galvanizing vents, fatigue, seismic detailing, corrosion and fire"]
        return ("the member in compression between its ends", *out) if self.demand.required_compression > 0 else tuple(out)

    def designed(self):
        """Return (item, what is to be built) rows for comparison with the drawings."""
        return advice.designed(self)

    @property
    def design(self):
        """The joint as designed."""
        return self.joint

    @cached_property
    def subject(self):
        """What the calculation is about."""
        return self.shape.name

    def drawings(self):
        """Return the elevation in the plane of the gusset and the section across it."""
        from .drawing import elevation, section

        return elevation(self), section(self)

    def sweep(self):
        """Return the sweep over the length of the welds, in steps of 1/8 in."""
        joint = self.joint
        tube, l = joint.tube, joint.l
        low = max(4 * joint.leg, 0.5 * tube.depth)
        if joint.U_by_hand is None and joint.edition == "360-16":
            low = max(low, tube.depth)
        if joint.reinforcement is not None:
            low = max(low, joint.reinforcement.length)
        grid = np.arange(math.ceil(low * 8 - 1e-9), math.floor(max(1.5 * l, 2.2 * tube.depth) * 8) + 1) / 8
        grid = grid[np.broadcast_to(member.shear_lag_of_net_section(silent, self.at(grid)), grid.shape) > 0.05]
        lengths = np.unique(np.append(grid, l))
        return Sweep(lengths, self.at(lengths), int(np.searchsorted(lengths, l)), lambda i: f"four welds of {units.length(lengths[i])}",
                     label="length l of each weld line, in")

    def at(self, l):
        """Return the joint with another length of the welds (which may be an array), unvalidated, for a sweep."""
        return replace(self.joint, l=l)


CONNECTION = SlottedConnection
