"""Bolts to the beam and the two flanges they flex: tension with shear, prying, shear in the bolts, slip, shear of the flanges.

[AISC360] J3, J4.2; prying by the AISC Manual, Part 9.
"""

import numpy as np

from ...check import FACTORS, Working, silent
from ...provisions import block_shear, bolt_tension, prying, prying_strength, tension, welds
from ...provisions import bolts as bolt_rules
from .. import bolt_group
from ..outcome import Outcome, worked

NAMES = {"fitting": "the fitting's flange", "beam": "the beam's flange"}


def tension_of_bolt(h, do):
    """Work out nominal and available tension of one bolt, shear regarded. [kip]"""
    phi, omega = FACTORS["bolts"]
    A_b = do(bolt_rules.bolt_area, h.bolts.d)
    # The slip-critical joint is reduced in its slip resistance instead (J3.9 of 2016, J3.10 of 2022); J3.8 is for bearing joints,
    # but applies at the strength level all the same, since the joint must also be good in bearing.
    if not h.psi:
        F_ntr = do(bolt_tension.tensile_stress, h.F_nt)
    else:
        f_rv = do(bolt_tension.required_shear_stress, h.P, h.psi, h.n, A_b)
        if h.method == "LRFD":
            F_ntr = do(bolt_tension.tensile_stress_with_shear, h.F_nt, phi, h.bolts.F_nv, f_rv)
        else:
            F_ntr = do(bolt_tension.allowable_tensile_stress_with_shear, h.F_nt, omega, h.bolts.F_nv, f_rv)
    B_n = do(bolt_tension.bolt_tension, F_ntr, A_b)
    if h.method == "LRFD":
        return B_n, do(bolt_tension.available_bolt_tension, phi, B_n)
    return B_n, do(bolt_tension.allowable_bolt_tension, B_n, omega)


def bolts_alone(h):
    """Return the strength of the bolts in tension, with shear where the pull is inclined, no prying force."""

    def compute(do):
        B_n, _ = tension_of_bolt(h, do)
        if np.all(B_n <= 0):
            do.say("The shear alone uses up the bolts: nothing is left for tension.")
            return 0.0 * B_n
        if h.psi:
            return do(bolt_tension.bolts_in_tension_inclined, h.n, B_n, h.psi)
        return do(bolt_tension.bolts_in_tension, h.n, B_n)

    return worked(compute)


def lever_arms(h, side, do):
    """Work out b and a of one flange. [in]"""
    fit, beam = h.fitting, h.beam.section
    if side == "beam":
        b_q = do(prying.lever_arm_of_tee, h.g, beam.t_w)
    elif fit.tee:
        b_q = do(prying.lever_arm_of_tee, h.g, fit.t_s)
    else:
        do.say("In an angle b is taken to the centre line of the other leg, which is safe.")
        b_q = do(prying.lever_arm_of_angle, h.g, fit.gap, fit.t_s)
    narrow = min(fit.width, beam.b_f)
    return b_q, do(prying.edge_beyond_bolt, narrow, h.g)


def tributary(h, side, b_q, do):
    """Work out the length of flange tributary to one bolt: the least over the rows. [in]"""
    if h.p_by_hand.get(side) is not None:
        p_q, basis = h.p_by_hand[side]
        do.say(f"The tributary length is set by the engineer to {p_q:g} in. Basis: {basis}")
        return p_q
    new = h.edition == "360-22"
    if h.rows == 1:
        return do(prying.tributary_of_single_row if new else prying.earlier_tributary_of_single_row, h.e, b_q)
    ends = prying.tributary_of_end_row if new else prying.earlier_tributary_of_end_row
    inner = prying.tributary_of_inner_row if new else prying.earlier_tributary_of_inner_row
    at_end = ends.bare(h.e, h.s, b_q)
    if h.rows > 2:
        between = inner.bare(h.s, b_q)
        if np.ndim(at_end) or np.ndim(between):
            return np.minimum(at_end, between)
        if between < at_end:
            do.say("The rows between the ends have the least tributary length.")
            return do(inner, h.s, b_q)
        do.say("The end rows have the least tributary length.")
    return do(ends, h.e, h.s, b_q)


def with_prying(h, side):
    """Return the strength of the bolts with the prying of one flange; its table holds what arises at the required load."""
    do, found = Working(), {}
    part = h.fitting if side == "fitting" else h.beam
    t = h.fitting.t_f if side == "fitting" else h.beam.section.t_f
    phi, omega = FACTORS["bending"]
    lrfd = h.method == "LRFD"
    do.say("Tension of one bolt as in the check of the bolts alone.")
    B_n, B_q = tension_of_bolt(h, silent)
    if np.all(B_n <= 0):
        return Outcome(0.0 * B_n, ("The shear alone uses up the bolts: nothing is left for tension.",))
    do(bolt_tension.available_bolt_tension, FACTORS["bolts"][0], B_n) if lrfd else do(bolt_tension.allowable_bolt_tension, B_n, FACTORS["bolts"][1])
    b_q, a_q = lever_arms(h, side, do)
    b_qr = do(prying.reduced_lever_arm, b_q, h.bolts.d)
    a_qr = do(prying.reduced_edge, a_q, b_q, h.bolts.d)
    rho_q = do(prying.lever_ratio, b_qr, a_qr)
    p_q = tributary(h, side, b_q, do)
    ply = h.upper.member if side == "fitting" else h.upper.plate
    delta_q = do(prying.share_between_holes, ply.hole.along, p_q)
    if lrfd:
        t_qc = do(prying_strength.thickness_for_bolt, B_q, b_qr, phi, p_q, part.F_u)
    else:
        t_qc = do(prying_strength.allowable_thickness_for_bolt, omega, B_q, b_qr, p_q, part.F_u)
    alpha_qr = do(prying_strength.moment_ratio_at_strength, t_qc, t, delta_q, rho_q)
    Q_q = do(prying_strength.share_of_bolt, t, t_qc, delta_q, alpha_qr)
    found |= {"p": p_q, "b": b_q, "a": a_q, "t": t, "t_qc": t_qc, "Q": Q_q, "B": B_q}
    straight, inclined = prying_strength.bolts_with_prying, prying_strength.bolts_with_prying_inclined
    R_n = do(inclined, h.n, Q_q, B_n, h.psi) if h.psi else do(straight, h.n, Q_q, B_n)
    return Outcome(R_n, tuple(do.steps), None, (), found | {"rho": rho_q, "delta": delta_q, "b_r": b_qr, "F_u": part.F_u})


def at_load(h, side):
    """Return (steps, values) of the prying of one flange at the required load: thickness without and with it, force, bolt tension."""
    do, made = Working(), with_prying(h, side).table
    if made is None:
        return (), {}
    phi, omega = FACTORS["bending"]
    do.say(f"At the required load, {NAMES[side]}:")
    straight, inclined = bolt_tension.tension_per_bolt, bolt_tension.tension_per_bolt_inclined
    T_q = do(inclined, h.P, h.psi, h.n) if h.psi else do(straight, h.P, h.n)
    if h.method == "LRFD":
        t_np = do(prying_strength.thickness_without_prying, T_q, made["b_r"], phi, made["p"], made["F_u"])
    else:
        t_np = do(prying_strength.allowable_thickness_without_prying, omega, T_q, made["b_r"], made["p"], made["F_u"])
    values = {"T": T_q, "t_np": t_np, "t_min": None, "q": None}
    beta_q = do(prying_strength.reserve_of_bolt, made["rho"], made["B"], T_q)
    if beta_q < 0:
        do.say("The required tension exceeds the bolt's: no thickness of the flange is enough.")
        return tuple(do.steps), values
    alpha_qb = do(prying_strength.full_moment_ratio) if beta_q >= 1 else do(prying_strength.moment_ratio_by_reserve, beta_q, made["delta"])
    values["t_min"] = do(prying_strength.thickness_with_prying, t_np, made["delta"], alpha_qb)
    alpha_q = do(prying_strength.moment_ratio_at_load, made["delta"], T_q, made["B"], made["t_qc"], made["t"])
    values["q"] = do(prying_strength.prying_force, made["B"], made["delta"], alpha_q, made["rho"], made["t"], made["t_qc"])
    do(prying_strength.bolt_force, T_q, values["q"])
    if made["t"] < values["t_min"]:
        do.say("The flange is thinner than that: the prying force stands for a flange at its strength.")
    return tuple(do.steps), values


def shear_with_holes(h, side):
    """Return the strength of the bolts in shear with the holes of one flange, referred to the inclined pull."""
    found = bolt_group.at_holes(h.upper, h.upper.member if side == "fitting" else h.upper.plate)
    # The sum of the group is against the shear alone, the component of the pull across the bolts.
    do = Working()
    return Outcome(do(bolt_tension.shear_of_inclined_pull, found.nominal, h.psi), (*found.steps, *do.steps))


def slip(h):
    """Return the slip resistance, reduced for the tension in the bolts, referred to the inclined pull."""
    bolts = h.bolts

    def compute(do):
        do.say(f"Faying surface class {'A' if bolts.mu == 0.30 else 'B'}; no filler.")
        R_s = do(bolt_tension.slip_without_tension, bolts.mu, bolt_group.D_U, 1.0, bolts.T_b, 1, h.n)
        T_t = do(bolt_tension.total_tension, h.P, h.psi)
        reduce = bolt_tension.slip_reduction if h.method == "LRFD" else bolt_tension.allowable_slip_reduction
        return do(bolt_tension.slip_under_inclined_pull, do(reduce, T_t, bolt_group.D_U, bolts.T_b, h.n), R_s, h.psi)

    return worked(compute)


def flange_shear(h, side, rupture):
    """Return the shear strength of a flange on its two planes beside the stem or web, or along the bolts for rupture."""
    part = h.fitting if side == "fitting" else h.beam
    t = h.fitting.t_f if side == "fitting" else h.beam.section.t_f
    ply = h.upper.member if side == "fitting" else h.upper.plate

    def compute(do):
        if side == "beam":
            do.say("Of the beam's flange only the length of the fitting is counted, which is safe.")
        A_gv = do(block_shear.first_shear_planes, 2, h.length, t)
        if not rupture:
            return do(welds.shear_yielding, part.F_y, A_gv)
        d_n = do(tension.hole_width, ply.hole.along, ply.constants.damage)
        A_hv = do(block_shear.first_shear_plane_holes, h.n, d_n, t)
        return do(welds.shear_rupture, part.F_u, do(block_shear.net_shear_area, A_gv, A_hv))

    return worked(compute)
