"""Limit states of the hollow section: gross section, net section at the slot with shear lag, reinforcement, walls along the welds."""

import numpy as np

from ...provisions import block_shear, hollow, reinforcement, slots, tension, welds
from ..outcome import worked
from .joint import FREE_GAP


def gross_area(do, joint):
    """Work out the gross area: the tables' with their design wall, or recomputed where the full nominal wall may be used."""
    tube = joint.tube
    if not tube.full_wall:
        do.say(f"Design wall $t$ = {tube.t:g} in, 0.93 times the nominal wall (B4.2); area from the tables.")
        return tube.A_g
    do.say(f"The full nominal wall of {tube.t:g} in may be used with this steel (B4.2); the area is recomputed, the tables rest on 0.93 of it.")
    if tube.round:
        return do(slots.round_area, tube.D, tube.t)
    return do(slots.rectangular_area, tube.H, tube.B, tube.t)


def gross_yielding(joint):
    """Return yielding of the gross section."""
    return worked(lambda do: do(tension.gross_yielding, joint.tube.F_y, gross_area(do, joint)))


def net_area(do, joint):
    """Work out the net area of the tube alone."""
    tube = joint.tube
    if not joint.concentric:
        do.say("The tube is not slotted and has no holes.")
        return do(slots.unslotted_net_area, tube.A_g)
    w_s = do(slots.slot_width, joint.plate.t, joint.clearance)
    return do(slots.slotted_net_area, tube.A_g, tube.t, w_s)


def eccentricity(do, joint):
    """Work out (x̄ of the bare tube, distance from the same plane to the outside of the wall along the gusset)."""
    tube, t_p = joint.tube, joint.plate.t
    if joint.edition == "360-22":
        if tube.round:
            R_o = do(hollow.outside_radius, tube.D)
            theta_g = do(hollow.half_arc, t_p, R_o)
            return do(hollow.round_eccentricity, R_o, theta_g, t_p), lambda: do(reinforcement.round_wall_distance, R_o, t_p)
        b_w = do(hollow.wall_distance, tube.B, t_p)
        return do(hollow.rectangular_eccentricity, b_w, tube.t, tube.H), lambda: b_w
    if tube.round:
        return do(hollow.round_eccentricity_of_360_16, tube.D), lambda: do(reinforcement.half_diameter, tube.D)
    return do(hollow.rectangular_eccentricity_of_360_16, tube.B, tube.H), lambda: do(reinforcement.half_width, tube.B)


def shear_lag(do, joint):
    """Work out U of the bare tube by Table D3.1 of the edition."""
    tube, new = joint.tube, joint.edition == "360-22"
    if joint.U_by_hand is not None:
        do.say(f"U is set by the engineer to {joint.U_by_hand:g}. Basis: {joint.U_basis}")
        return joint.U_by_hand
    if not joint.concentric:
        do.say("Table D3.1 case 6: two side gussets.")
        if new:
            return do(hollow.side_gusset_shear_lag, joint.l, tube.B, tube.H)
        return do(hollow.side_gusset_shear_lag_of_360_16, do(hollow.side_gusset_eccentricity_of_360_16, tube.B, tube.H), joint.l)
    if tube.round and not new:
        return _round_of_360_16(do, joint)
    do.say(f"Table D3.1 case {5 if tube.round or new else 6}: one concentric gusset.")
    x_bar, _ = eccentricity(do, joint)
    return do(hollow.round_shear_lag if tube.round else hollow.rectangular_shear_lag, x_bar, joint.l)


def _round_of_360_16(do, joint):
    D, l = joint.tube.D, joint.l
    if isinstance(l, np.ndarray):
        x_bar = do(hollow.round_eccentricity_of_360_16, D)
        return np.where(l >= 1.3 * D - 1e-9, do(hollow.round_shear_lag_long), do(hollow.round_shear_lag_short, x_bar, l))
    if l >= 1.3 * D - 1e-9:
        do.say(f"Table D3.1 case 5: welds of {l:.4g} in, not less than 1.3 $D$ = {1.3 * D:.4g} in.")
        return do(hollow.round_shear_lag_long)
    do.say(f"Table D3.1 case 5: welds of {l:.4g} in, from $D$ to less than 1.3 $D$ = {1.3 * D:.4g} in.")
    return do(hollow.round_shear_lag_short, do(hollow.round_eccentricity_of_360_16, D), l)


def net_rupture(joint):
    """Return rupture of the net section at the slot, with reinforcing plates where there are any."""
    plates, tube = joint.reinforcement, joint.tube

    def compute(do):
        A_n = net_area(do, joint)
        if plates is None:
            return do(tension.net_rupture, tube.F_u, do(tension.effective_net_area, A_n, shear_lag(do, joint)))
        A_r = do(reinforcement.reinforcement_area, 2, plates.width, plates.t)
        A_re = do(reinforcement.effective_reinforcement, plates.length, plates.width, A_r)
        U = _reinforced_shear_lag(do, joint, A_n, A_r)
        A_e = do(tension.effective_net_area, do(reinforcement.reinforced_net_area, A_n, A_re), U)
        if plates.F_u != tube.F_u:
            do.say(f"The lesser $F_u$ of tube and plates is taken for both, {min(plates.F_u, tube.F_u):g} ksi.")
        return do(tension.net_rupture, min(plates.F_u, tube.F_u), A_e)

    return worked(compute)


def _reinforced_shear_lag(do, joint, A_ns, A_r):
    if joint.U_by_hand is not None:
        return shear_lag(do, joint)
    do.say("Shear lag of half the tube with its plate, by the common centroid; the plate lies farther from the gusset than the tube does.")
    x_t, to_wall = eccentricity(do, joint)
    x_r = do(reinforcement.distance_of_reinforcement, to_wall(), joint.reinforcement.t)
    x_bar = do(reinforcement.reinforced_eccentricity, A_ns, x_t, A_r, x_r)
    return do(reinforcement.reinforced_round_shear_lag if joint.tube.round else hollow.rectangular_shear_lag, x_bar, joint.l)


def shear_lag_of_net_section(do, joint):
    """Work out U of the net section, of the tube with its reinforcing plates where there are any."""
    plates = joint.reinforcement
    if plates is None:
        return shear_lag(do, joint)
    A_r = do(reinforcement.reinforcement_area, 2, plates.width, plates.t)
    return _reinforced_shear_lag(do, joint, net_area(do, joint), A_r)


def rupture_beyond_plates(joint):
    """Return rupture of the bare slotted tube where the reinforcing plates end, under the load that the welds have left in it."""

    def compute(do):
        xi = do(reinforcement.load_left_beyond_reinforcement, joint.reinforcement.length, joint.l)
        A_e = do(tension.effective_net_area, net_area(do, joint), shear_lag(do, joint))
        return do(tension.net_rupture_behind_lead_row, joint.tube.F_u, A_e, xi)

    return worked(compute)


def reinforcement_welds(joint):
    """Return the strength of the reinforcing plates' welds on one side of the net section, referred to the member's load."""
    plates = joint.reinforcement

    def compute(do):
        A_ns = net_area(do, joint)
        A_r = do(reinforcement.reinforcement_area, 2, plates.width, plates.t)
        xi_r = do(reinforcement.share_of_reinforcement, A_r, A_ns)
        do.say("Two lines of weld on each plate; the same again on the other side of the net section.")
        if plates.gap > FREE_GAP + 1e-9:
            t_e = do(welds.throat_of_effective_size, do(slots.leg_less_gap, plates.leg, plates.gap))
        else:
            t_e = do(welds.throat, plates.leg)
        R_r = do(reinforcement.reinforcement_weld, joint.F_EXX, do(welds.weld_area, 4, t_e, plates.length))
        return do(reinforcement.referred_to_member, R_r, xi_r)

    return worked(compute)


def slotted_yielding(joint):
    """Return yielding of the slotted section without welds."""
    return worked(lambda do: do(slots.slotted_section_yielding, joint.tube.F_y, net_area(do, joint)))


def wall_yielding(joint):
    """Return shear yielding of the walls along the four weld lines."""
    tube = joint.tube
    return worked(lambda do: do(welds.shear_yielding, tube.F_y, do(slots.shear_area_along_welds, 4, joint.l, tube.t)))


def wall_rupture(joint):
    """Return shear rupture of the walls along the four weld lines."""
    tube = joint.tube

    def compute(do):
        A_nv = do(welds.net_area_without_holes, do(slots.shear_area_along_welds, 4, joint.l, tube.t))
        return do(welds.shear_rupture, tube.F_u, A_nv)

    return worked(compute)


def plate_block(joint):
    """Return block shear of the gusset: sheared along the weld lines, torn across where the tube ends."""
    plate = joint.plate

    def compute(do):
        do.say("Sheared along both weld lines, torn across between them at the end of the tube; no holes, so net areas equal gross areas.")
        A_gv = do(block_shear.first_shear_planes, 2, joint.l, plate.t)
        A_nt = do(block_shear.gross_tension_area, 1, joint.spacing, plate.t)
        return do(block_shear.block_shear, plate.F_u, A_gv, 1.0, A_nt, plate.F_y, A_gv)

    return worked(compute)
