"""A pin-connected plate or eyebar, its pin and the plates that hold the pin: inputs, the joint they describe, the checks that apply."""

from dataclasses import dataclass, replace

import numpy as np

from ... import units
from ...check import not_applicable, strength_check
from ...errors import InputError, ScopeError
from ...facts import grades
from .. import fatigue, pin, pin_plate
from ..base import Connection, Sweep
from ..joint import constants
from .inputs import PinnedInputs


@dataclass(frozen=True)
class PinnedJoint:
    """A member and its support plates on a pin: what limit states evaluate."""

    member: object
    support: pin_plate.PinPlate
    pin: pin.Pin


class PinnedConnection(Connection):
    """A pin-connected end, from the member's body to the plates that hold the pin.

    The checks, in order: member in tensile and shear rupture at the hole, bearing, yielding (an eyebar: yielding and rupture of its
    body, bearing); pin in shear and bending; support plates as pin-connected plates; the dimensional rules of D5.2 and D6.2.
    """

    family = "pinned"
    title = "Pin connection"
    Model = PinnedInputs
    parts = {"member": "Member", "pin": "Pin", "support": "Support plates", "detailing": "Dimensional rules"}

    def __init__(self, inputs, basis=None):
        super().__init__(inputs, basis)
        given = inputs
        self.member_material = self._material(given.member_grade, ("plate", "bar"), given.member_thickness)
        self.support_material = self._material(given.support_grade, ("plate", "bar"), given.support_thickness)
        self.pin_material = self._material(given.pin_grade, ("rod", "bar"), given.pin_diameter)
        self._refuse()
        self.joint = self._joint()

    def _material(self, grade, forms, thickness):
        form = next((form for form in forms if form in grades.grade(grade).forms), forms[0])
        return grades.material(grade, form=form, thickness=thickness, edition=self.basis.edition)

    @property
    def eyebar(self):
        """Whether the member is an eyebar."""
        return self.inputs.member_kind == "eyebar"

    @property
    def d_h(self):
        """Diameter of the pin holes. [in]"""
        return self.inputs.pin_diameter + self.inputs.hole_clearance

    def _refuse(self):
        given = self.inputs
        if given.hole_clearance > pin_plate.LOOSE + 1e-9:
            raise ScopeError(f"hole_clearance = {units.printed(given.hole_clearance)} in: D5 covers pin holes up to 1/16 in larger than the pin")
        if self.basis.edition == "360-16" and given.hole_clearance > pin_plate.CLOSE + 1e-9:
            raise ScopeError(f"hole_clearance = {units.printed(given.hole_clearance)} in: D5 of 360-16 covers pin holes up to 1/32 in larger "
                             "than the pin")
        for name in ("head_diameter", "head_radius"):
            if self.eyebar and getattr(given, name) is None:
                raise InputError(f"input {name} is missing: an eyebar has a circular head and a transition to its body")
            if not self.eyebar and getattr(given, name) is not None:
                raise InputError(f"{name} is for eyebars; set member_kind = \"eyebar\" or remove it")
        if self.eyebar and (given.member_edge is not None or given.member_corner_cut):
            raise InputError("member_edge and member_corner_cut are for pin plates; an eyebar has a circular head")
        if not self.eyebar and given.member_edge is None:
            raise InputError("input member_edge is missing: edge of the hole to the end of the pin plate, along the force")
        if self.eyebar and given.head_diameter <= given.member_width:
            raise InputError(f"head_diameter = {units.length(given.head_diameter)} is not more than the width of the body, "
                             f"{units.length(given.member_width)}")
        parts = [("support", given.support_width, given.support_corner_cut, given.support_edge)]
        parts.append(("head", given.head_diameter, 0.0, 0.0) if self.eyebar else
                     ("member", given.member_width, given.member_corner_cut, given.member_edge))
        for name, width, cut, edge in parts:
            if width <= self.d_h + 0.25:
                raise InputError(f"the {name} is {units.length(width)} wide: less than 1/8 in would be left on each side of a hole of "
                                 f"{units.printed(self.d_h)} in")
            most = min((width - given.pin_diameter) / 2, edge + self.d_h / 2)
            if cut > most + 1e-9:
                raise InputError(f"{name}_corner_cut = {units.length(cut)} cuts into the shear planes beyond the pin or the width beside it; "
                                 f"at most {units.printed(most)} in")
        if given.pin_shear != "both" and len(given.pin_shear_basis.strip()) < 10:
            raise InputError("pin_shear other than both needs a written basis in pin_shear_basis")

    def _joint(self, edge=None):
        given, member, support = self.inputs, self.member_material, self.support_material
        d_h, inside = self.d_h, given.member_plates == 1
        title = "Eyebar" if self.eyebar else "Member"
        if self.eyebar:
            of_member = pin_plate.Eyebar("member", title, given.member_plates, member.F_y, member.F_u, given.member_thickness, given.member_width,
                                         given.head_diameter, given.head_radius, d_h, given.eyebar_clamped)
        else:
            of_member = pin_plate.PinPlate("member", title, given.member_plates, member.F_y, member.F_u, given.member_thickness,
                                           given.member_width, given.member_edge if edge is None else edge, d_h, given.member_corner_cut,
                                           constants(self.basis).beside_pin)
        of_support = pin_plate.PinPlate("support", "Support", 3 - given.member_plates, support.F_y, support.F_u, given.support_thickness,
                                        given.support_width, given.support_edge, d_h, given.support_corner_cut, constants(self.basis).beside_pin)
        outer, inner = (of_support, of_member) if inside else (of_member, of_support)
        made = pin.Pin(given.pin_diameter, self.pin_material.F_y, self.pin_material.F_u, outer.t, inner.t, given.gap)
        return PinnedJoint(of_member, of_support, made)

    def limit_states(self, joint):
        """Return (id, title, part, clause, limit state, axial, evaluate) of every strength in tension; ``joint`` may hold arrays."""
        edition = self.basis.edition
        rows = self._eyebar_states() if self.eyebar else pin_plate.limit_states(joint.member, lambda j: j.member, lambda j: j.pin, edition)
        rows += pin.limit_states("pin", "Pin", lambda j: j.pin, self.inputs.pin_shear, "pin")
        return [*rows, *pin_plate.limit_states(joint.support, lambda j: j.support, lambda j: j.pin, edition)]

    def _eyebar_states(self):
        one = self.inputs.member_plates == 1
        return [("member bearing", "Eyebar, bearing on the pin", "member", "J7", "contact bearing", False,
                 lambda j: pin_plate.bearing(j.member, j.pin)),
                ("member yielding", "Eyebar, yielding of the body", "member", "D6.1, D2(a)", "yielding", one,
                 lambda j: pin_plate.eyebar_yielding(j.member)),
                ("member rupture", "Eyebar, rupture of the body", "member", "D6.1, D2(b)", "rupture", one,
                 lambda j: pin_plate.eyebar_rupture(j.member))]

    def _checks(self):
        joint, T, C = self.joint, self.demand.required_tension, self.demand.required_compression
        for id, title, part, clause, state, axial, evaluate in self.limit_states(joint):
            found = evaluate(joint)
            demand = max(T, C) if part == "pin" or id.endswith("bearing") else T
            yield strength_check(id, title, part, clause, state, self.basis.method, found.nominal, demand, found.steps, axial, path=found.path,
                                 notes=found.notes)
            if self.eyebar and id == "member rupture":
                reason = "D6.2 proportions the head of an eyebar so that its body governs"
                yield not_applicable("member tension rupture", "Eyebar, tensile rupture beside the hole", "member", "D6", reason)
                yield not_applicable("member shear rupture", "Eyebar, shear rupture beyond the hole", "member", "D6", reason)
        given, d = self.inputs, self.inputs.pin_diameter
        if given.pin_shear != "both":
            id = "pin shear rupture" if given.pin_shear == "yielding" else "pin shear yielding"
            yield not_applicable(id, f"Pin, {id[4:]}", "pin", "J4.2, Table J3.2", f"set aside by the engineer: {given.pin_shear_basis}")
        if C <= 0:
            yield not_applicable("compression", "Member, compression", "member", "Chapter E", "no combination gives compression")
        else:
            yield not_applicable("compression", "Member, compression", "member", "Chapter E",
                                 f"by others: {units.force(C, units.ceil_figures)}; pin and bearing are checked for it here")
        if self.eyebar:
            yield from pin_plate.eyebar_rules(joint.member, d)
        else:
            yield from pin_plate.rules(joint.member, d, self.basis.edition, given.moves_under_load)
        yield from pin_plate.rules(joint.support, d, self.basis.edition, given.moves_under_load)

    def fatigue_details(self, by_id):
        """Return the details that live load may crack: member and support plates at the pin hole."""
        member, support = self.joint.member, self.joint.support
        return (fatigue.at_pin("member", "Eyebar" if self.eyebar else "Member", member, member.head if self.eyebar else member.w),
                fatigue.at_pin("support", "Support", support, support.w))

    # What the report says beside the checks

    def assumptions(self):
        """Return (text, basis) of what the calculation takes for granted."""
        given = self.inputs
        notes = [("The pin holes lie midway between the sides of their plates, the plates are parallel and the load lies in their plane.", "D5.2"),
                 ("The inner ply is held central on the pin by spacers or washers, so that both shear planes carry half of the load.", "detailing"),
                 ("The pin is bent by outer plies that load it at their middle and an inner ply that loads it evenly over its thickness.",
                  "statics, common practice"),
                 ("Where pin and ply have different yield stresses, the smaller one counts in bearing.", "conservative reading of J7")]
        if given.pin_shear == "both":
            notes.append(("The Specification has no clause for a pin in shear: yielding by analogy with J4.2(a) and the strength of a threaded part "
                          "with its threads outside the shear planes are both checked, the lesser governs.", "analogy"))
        else:
            notes.append((f"Pin in shear: {given.pin_shear} only. {given.pin_shear_basis}", "engineer"))
        if self.eyebar:
            notes.append(("The eyebar has uniform thickness, no reinforcement at the hole, and a circular head concentric with it.", "D6.2"))
        if not given.moves_under_load:
            notes.append(("The parts do not turn on the pin while under full load.", "input"))
        for material, part in ((self.member_material, "Member"), (self.support_material, "Support"), (self.pin_material, "Pin")):
            if material.note:
                notes.append((f"{part} steel {material.name}: {material.note}.".replace("..", "."), "availability, from memory"))
        notes += [(text, "loads") for text in getattr(self.demand, "notes", ())]
        return [*super().assumptions(), *notes]

    def materials_text(self):
        """Return the steels with their strengths, in a sentence; symbols between dollar signs."""
        parts = (("member", self.member_material), ("pin", self.pin_material), ("support plates", self.support_material))
        return "; ".join(f"{part}: {m.name}, $F_y$ {m.F_y:g} ksi, $F_u$ {m.F_u:g} ksi" for part, m in parts)

    def by_others(self):
        """Return what the scope leaves to others."""
        out = ["the attachment of the support plates and the support itself", "the member's other end, and its strength between its ends",
               "retention of the pin: cotters, nuts or keeper plates, and the spacers that keep the inner ply central",
               "dishing of thin plates beyond the pin, and loads out of the plane of the plates",
               "wear where the load varies often (Commentary D5), fatigue, seismic detailing, corrosion and fire"]
        if self.demand.required_compression > 0:
            out.insert(0, "the member and the support plates in compression")
        return tuple(out)

    def designed(self):
        """Return (item, what is to be built) rows for comparison with the drawings."""
        given, joint = self.inputs, self.joint
        f = units.fraction
        n, m = given.member_plates, 3 - given.member_plates
        if self.eyebar:
            member = (f"{n} eyebar{'s' if n > 1 else ''} {f(given.member_thickness)} x {f(given.member_width)}, {self.member_material.name}, head "
                      f"{f(given.head_diameter, unit=' in')} diameter, transition radius {f(given.head_radius, unit=' in')}")
        else:
            member = _plate(n, given.member_thickness, given.member_width, self.member_material, given.member_edge, given.member_corner_cut)
        support = _plate(m, given.support_thickness, given.support_width, self.support_material, given.support_edge, given.support_corner_cut)
        fit = "the parts turn under full load" if given.moves_under_load else "no turning under full load"
        return [("Member", member), ("Support", support),
                ("Pin", f"{f(given.pin_diameter, unit=' in')} diameter, {self.pin_material.name}; length between its retainers at least "
                        f"{f(joint.pin.grip, unit=' in')}"),
                ("Holes", f"{units.printed(self.d_h)} in diameter, {units.printed(given.hole_clearance)} in larger than the pin; {fit}"),
                ("Gap", f"{f(given.gap, unit=' in')} on each side of the inner ply")]

    @property
    def design(self):
        """The joint as designed."""
        return self.joint

    @property
    def subject(self):
        """What the calculation is about."""
        return "the eyebar" if self.eyebar else "the pin plate"

    def drawings(self):
        """Return the elevation with the governing path and the section along the pin with its bending moment."""
        from .drawing import elevation, section

        return elevation(self), section(self)

    def sweep(self):
        """Return the sweep over the member's edge distance, from the least that D5.2 permits."""
        if self.eyebar:
            return "Not drawn: D6.2 fixes the head of an eyebar by its body, so there is no edge distance that could be varied."
        own, least = self.inputs.member_edge, pin_plate.least_edge(self.joint.member)
        edges = np.linspace(least, max(2.5 * least, 1.3 * own), 200)
        design = None
        if own >= least - 1e-9:
            edges = np.unique(np.append(edges, own))
            design = int(np.argmin(np.abs(edges - own)))

        def describe(i):
            return f"an edge distance of {units.printed(float(edges[i]), 3)} in" + \
                (", the least that D5.2 permits" if i == 0 else "")

        return Sweep(edges, self.at(edge=edges), design, describe, label="edge of the hole to the end of the member, in")

    def at(self, edge):
        """Return the joint with another edge distance of the member (which may be an array), for a sweep."""
        return replace(self.joint, member=replace(self.joint.member, a=edge))


def _plate(n, t, w, material, edge, cut):
    f = units.fraction
    return (f"{n} PL {f(t)} x {f(w)}, {material.name}, {f(edge, unit=' in')} from the hole's edge to the end"
            + (f", corners cut {f(cut, unit=' in')} at 45 degrees" if cut else ", square corners"))


CONNECTION = PinnedConnection
