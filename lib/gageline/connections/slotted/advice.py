"""What the report of a hollow section's end says beside its checks: assumptions, what is built, reinforcement that would do."""

import math
from dataclasses import replace

from ... import units
from ...check import FACTORS
from ...facts import welds as facts
from . import detailing, member
from .detailing import fraction
from .joint import Reinforcement

THICKNESSES = (1 / 4, 5 / 16, 3 / 8, 1 / 2, 5 / 8, 3 / 4, 1.0)
"""Thicknesses of plate tried as reinforcement. [in]"""


def reinforcement(joint, T, nominal, state, method):
    """Return a sentence on the plates that would reinforce a net section that falls short, or nothing."""
    available = _available(nominal, state, method)
    if available >= T * (1 - 1e-12):
        return []
    said = f"The net section falls short by {units.force(T - available, units.ceil_figures)}. "
    found = lightest_reinforcement(joint, T, method)
    if found is None:
        return [said + "No two flat plates that fit on the tube would do; lengthen the welds or take a heavier tube."]
    area = 2 * found.t * found.width
    return [said + f"Reinforcement needed, of the gusset's steel: two plates {fraction(found.t)} x {fraction(found.width)}, together "
                   f"{units.printed(area)} in², each with two fillets of {fraction(found.leg)} over {fraction(found.length)} on each side of "
                   "the net section."]


def _available(nominal, state, method):
    phi, omega = FACTORS[state]
    return phi * nominal if method == "LRFD" else nominal / omega


def lightest_reinforcement(joint, T, method):
    """Return the pair of flat plates of least area with which the net section carries T, or None.

    Parameters
    ----------
    joint : the joint without reinforcement. T : required tension. [kip]
    method : LRFD or ASD.
    """
    best = None
    tube = joint.tube
    for t in THICKNESSES:
        leg = facts.minimum_fillet(min(t, tube.t_nom))
        room = tube.D if tube.round else tube.flat - 2 * leg
        for quarters in range(4, int(room * 4) + 1):
            width = quarters / 4
            if best is not None and t * width >= best.t * best.width:
                break
            tried = _plates(joint, t, width, leg, T, method)
            if tried is not None:
                best = tried
                break
    return best


def _plates(joint, t, width, leg, T, method):
    gap = detailing.gap_at_bar(joint.tube, width)
    if gap > detailing.MOST_GAP or leg - gap < 1 / 16:
        return None
    for halves in range(math.ceil(2 * max(width, 4 * leg)), math.floor(2 * joint.l) + 1):
        plates = Reinforcement(t, width, halves / 2, leg, gap, joint.plate.F_y, joint.plate.F_u)
        made = replace(joint, reinforcement=plates)
        enough = [_available(evaluate(made).nominal, state, method) >= T
                  for evaluate, state in ((member.net_rupture, "rupture"), (member.rupture_beyond_plates, "rupture"),
                                          (member.reinforcement_welds, "weld"))]
        if all(enough):
            return plates
    return None


def assumptions(c):
    """Return (text, basis) of what the calculation of a connection takes for granted."""
    given, joint = c.inputs, c.joint
    tube, new = joint.tube, joint.edition == "360-22"
    notes = [("The four weld lines share the load equally, evenly along their length.", "common practice"),
             ("No directional increase of the fillet welds is taken.", "J2.4")]
    if tube.full_wall:
        notes.append((f"Design wall equal to the nominal wall of {tube.t:g} in; area and radii recomputed with corner radii of 2t outside, t inside.",
                      "B4.2, corner radii as in the tables"))
    else:
        notes.append((f"Design wall of {tube.t:g} in, 0.93 times the nominal wall.", "B4.2"))
    if joint.concentric:
        said, whole = {"slot_clearance", "slot_end_width"} & given.model_fields_set, given.weld_gap is None
        notes += [(f"Slot {fraction(joint.plate.t + joint.clearance)} wide at its end, {fraction(joint.clearance)} more than the gusset, "
                   "in both walls.", "input" if said else "1/16 in commonly assumed"),
                  (f"Gap of {fraction(joint.gap)} at the welds{', the whole clearance on one side' if whole else ', to be held by the shop'}.",
                   "conservative" if whole else "input")]
        if tube.round and new:
            notes.append(("R of Table D3.1 is the outside radius, which gives the larger eccentricity.", "the table's figure; its words do not say"))
        notes.append(("Only the shear of the tube's walls along the welds is counted, not the tension across them.", "conservative"))
    if joint.unwelded > 0 and c.demand.required_compression > 0:
        notes.append((f"The halves of the tube do not buckle over the slotted length of {fraction(joint.unwelded)} without welds.",
                      "engineer to confirm"))
    if joint.reinforcement is not None:
        plates = joint.reinforcement
        notes += [("The reinforcing plates share the load of the net section by area and are connected by longitudinal welds only.", "statics"),
                  (f"One plate on each side of the tube, centred on the end of the slot, {fraction(2 * plates.length)} long at least.", "input")]
        if tube.round:
            notes.append(("Shear lag of the reinforced round tube: the lesser of 1 minus eccentricity over length and the curve of case 5.",
                          "conservative, no case of Table D3.1"))
    if joint.U_by_hand is not None:
        notes.append((f"U = {joint.U_by_hand:g} set by the engineer: {joint.U_basis}", "engineer"))
    for material, part in ((c.member_material, "Member"), (c.plate_material, "Gusset")):
        if material.note:
            notes.append((f"{part} steel {material.name}: {material.note}.", "tables of grades"))
    notes += [(text, "J2.6") for text in c.unjudged]
    notes += [(text, "loads") for text in getattr(c.demand, "notes", ())]
    return notes


def designed(c):
    """Return (item, what is to be built) rows of a connection."""
    given, joint = c.inputs, c.joint
    tube = joint.tube
    rows = [("Member", f"{tube.name}, {c.member_material.name}"
             + (f", {fraction(tube.H)} side along the gusset" if not tube.round and tube.H != tube.B else "")),
            ("Gusset" if joint.concentric else "Gussets",
             f"{'' if joint.concentric else '2 '}PL {units.fraction(joint.plate.t)} x {units.fraction(joint.plate.width)}, {c.plate_material.name}"
             + ("" if joint.concentric else ", one on each side of the tube"))]
    if joint.concentric:
        inserted = joint.l + given.weld_held_back
        end = f", {fraction(given.slot_end_width)} wide at its end" if given.slot_end_width else ""
        rows.append(("Slot", f"{fraction(joint.plate.t + given.slot_clearance)} wide, {fraction(inserted + given.slot_overrun)} long{end}; "
                             f"gusset inserted {fraction(inserted)}"))
    ends = "returned round the gusset's edge" if given.end_return else \
        f"held back {fraction(given.weld_held_back)} from the gusset's edge" if given.weld_held_back else "no returns"
    rows.append(("Welds", f"4 fillets {fraction(joint.leg)} x {fraction(joint.l)}, {c.electrode.name}" + (f", {ends}" if joint.concentric else "")))
    if joint.reinforcement is not None:
        r = joint.reinforcement
        rows.append(("Reinforcement", f"2 PL {units.fraction(r.t)} x {units.fraction(r.width)} x {fraction(2 * r.length)}, "
                                      f"{given.reinforcing_grade}, fillets {fraction(c.inputs.reinforcing_leg)} along both edges"))
    return rows
