"""What the end of a hollow section may not be: each refusal one sentence that names the clause or the limit."""

from ... import units
from ...check import silent
from ...errors import InputError, NotInTable, ScopeError
from ...facts import welds as facts
from .detailing import fraction, gap_at_bar
from .joint import MOST_GAP
from .member import eccentricity, shear_lag_of_net_section


def inputs(given, shape):
    """Refuse inputs that do not go together."""
    if given.U_by_hand is not None and len(given.U_basis.strip()) < 10:
        raise InputError("U_by_hand needs a written basis in U_basis")
    if given.gussets == 2 and shape.D is not None:
        raise ScopeError(f"gussets = 2: Table D3.1 case 6 is for rectangular tubes between two gussets; {shape.name} is round")
    unequal = shape.D is None and shape.H != shape.B
    if unequal and given.side_along_gusset is None:
        raise InputError(f"input side_along_gusset is missing: which side of {shape.name} lies along the gusset, long or short")
    if given.side_along_gusset is not None and not unequal:
        raise InputError(f"side_along_gusset is for tubes with unequal sides; {shape.name} has none")
    slots = {"slot_clearance": 1 / 16, "weld_gap": None, "weld_held_back": 0.0, "slot_overrun": 0.0, "slot_end_width": None, "end_return": False}
    if given.gussets == 2:
        if said := [name for name, default in slots.items() if getattr(given, name) != default]:
            raise InputError(f"{said[0]} is for a slotted tube; with two side gussets there is no slot")
        if given.reinforcing_thickness is not None:
            raise InputError("reinforcing_thickness is for a slotted tube; with two side gussets no net section is lost")
    if given.end_return and given.weld_held_back > 0:
        raise InputError("end_return = True: a weld that returns round the gusset's edge is not held back from it; leave out weld_held_back")
    if given.end_return and given.slot_overrun > MOST_GAP + 1e-9:
        raise ScopeError(f"end_return = True: a return cannot close a slot that overruns the gusset by {fraction(given.slot_overrun)}; "
                         "3/16 in is the most (AWS D1.1)")
    if given.weld_gap is not None and given.weld_gap < given.slot_clearance / 2 - 1e-9:
        raise InputError(f"weld_gap = {fraction(given.weld_gap)} is less than half the slot_clearance of {fraction(given.slot_clearance)}, "
                         "which is the gap of a gusset in the middle of its slot")
    if given.slot_end_width is not None and given.slot_end_width < given.plate_thickness + given.slot_clearance - 1e-9:
        raise InputError(f"slot_end_width = {fraction(given.slot_end_width)} is less than the slot itself, "
                         f"{fraction(given.plate_thickness + given.slot_clearance)}")
    plates = ("reinforcing_thickness", "reinforcing_width", "reinforcing_length", "reinforcing_leg", "reinforcing_grade")
    some = [name for name in plates if getattr(given, name) is not None]
    if some and len(some) < len(plates):
        missing = next(name for name in plates if name not in some)
        raise InputError(f"input {missing} is missing: reinforcing plates need {', '.join(plates)}")


def geometry(joint, given):
    """Refuse parts that do not fit each other, and lengths for which the edition's table gives no shear lag factor."""
    tube, plate = joint.tube, joint.plate
    if joint.concentric:
        if plate.t + joint.clearance >= tube.across - 2 * tube.t:
            raise InputError(f"plate_thickness = {fraction(plate.t)}: its slot would cut away the whole wall of {tube.name}")
        if plate.width < tube.depth + 2 * joint.leg - 1e-9:
            raise InputError(f"plate_width = {fraction(plate.width)}: the gusset must stand out of {tube.name} by the welds, "
                             f"{fraction(tube.depth + 2 * joint.leg)} at least")
        if joint.gap > MOST_GAP + 1e-9:
            raise ScopeError(f"gap of {units.printed(joint.gap)} in at the welds: 3/16 in is the most (AWS D1.1); "
                             "make the slot narrower, or give weld_gap where the fit-up is controlled")
        if joint.gap > 1 / 16 + 1e-9 and joint.leg - joint.gap < 1 / 16:
            raise InputError(f"weld_leg = {fraction(joint.leg)} leaves nothing that counts over a gap of {fraction(joint.gap)}")
    elif plate.width > tube.flat - 2 * joint.leg + 1e-9:
        raise ScopeError(f"plate_width = {fraction(plate.width)}: side gussets must leave room for their fillets on the flat of {tube.name}, "
                         f"{units.printed(tube.flat - 2 * joint.leg)} in at most; flare groove welds at its rounded corners (J2.1) are outside "
                         "this calculation")
    if joint.l < 4 * joint.leg - 1e-9:
        raise ScopeError(f"weld_length = {fraction(joint.l)} is less than four times the leg (J2.2b); lengthen the weld or make it smaller")
    _reinforcement(joint)
    _shear_lag(joint)


def _reinforcement(joint):
    plates, tube = joint.reinforcement, joint.tube
    if plates is None:
        return
    room = tube.D if tube.round else tube.flat - 2 * plates.leg
    if plates.width > room + 1e-9:
        raise InputError(f"reinforcing_width = {fraction(plates.width)} is more than there is room for with its welds, {units.printed(room)} in")
    if gap_at_bar(tube, plates.width) > MOST_GAP + 1e-9:
        raise ScopeError(f"reinforcing_width = {fraction(plates.width)}: a flat bar of this width stands "
                         f"{units.printed(gap_at_bar(tube, plates.width))} in off the round tube at its edges; 3/16 in is the most (AWS D1.1)")
    if plates.leg - plates.gap < 1 / 16:
        raise InputError("reinforcing_leg leaves nothing that counts over the gap under the bar")
    if plates.length > joint.l + 1e-9:
        raise InputError(f"reinforcing_length = {fraction(plates.length)}: the plates may not reach beyond the welds of the tube, "
                         f"{fraction(joint.l)} long")


def _shear_lag(joint):
    tube, l = joint.tube, joint.l
    if joint.U_by_hand is not None:
        return
    if joint.edition == "360-16" and l < tube.depth - 1e-9:
        sign, case = ("D", 5) if tube.round else ("H", 6)
        raise ScopeError(f"weld_length = {fraction(l)}: Table D3.1 case {case} of 360-16 needs l at least {sign} = {fraction(tube.depth)}; "
                         "lengthen the welds, or set U_by_hand with its basis")
    if joint.concentric and not tube.round and l <= (x_bar := eccentricity(silent, joint)[0]):
        raise ScopeError(f"weld_length = {fraction(l)} is not more than the eccentricity of {units.printed(x_bar)} in: Table D3.1 gives no "
                         "shear lag factor; lengthen the welds")
    if joint.reinforcement is not None and shear_lag_of_net_section(silent, joint) <= 0:
        raise ScopeError(f"weld_length = {fraction(l)} is not more than the eccentricity of the tube with its reinforcing plates: "
                         "Table D3.1 gives no shear lag factor; lengthen the welds")


def filler(electrode, materials):
    """Refuse a filler metal more than one class above matching; return what cannot be judged, in sentences."""
    said = []
    for what, material, t in materials:
        try:
            above = facts.classes_above_matching(electrode.F_EXX, material.name, t)
        except NotInTable:
            said.append(f"The standard names no matching filler metal for {material.name} ({what}): {electrode.name} to be confirmed by the "
                        "welding procedure.")
            continue
        if above > 1:
            raise ScopeError(f"electrode {electrode.name} is {above} classes above matching for {material.name}: one class is the most "
                             "(J2.6, Table J2.5)")
    return said
