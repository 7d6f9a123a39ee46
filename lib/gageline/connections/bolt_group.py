"""The bolts: shear, bearing and tearout bolt by bolt in each ply, slip.  [AISC360] J3, J5.2."""

from collections import defaultdict

import numpy as np

from ..check import silent
from ..geometry import clear_distances, mirrored
from ..geometry.pattern import first
from ..provisions import bolts as rules
from .outcome import worked

D_U = 1.13
"""Mean installed over specified minimum pretension.  [AISC360] J3.8 (2016), J3.9 (2022)."""


def bolt_shear(joint, do):
    """Work out the nominal shear strength of one bolt, with long-joint and filler reductions."""
    bolts, fixed = joint.bolts, joint.member.constants
    A_b = do(rules.bolt_area, bolts.d)
    long = joint.length > fixed.long_joint
    if isinstance(long, np.ndarray):
        F_nvr = np.where(long, rules.long_joint.bare(bolts.F_nv), bolts.F_nv)
    elif long:
        do.say(f"The pattern is longer than {fixed.long_joint_text}.")
        F_nvr = do(rules.long_joint, bolts.F_nv)
    else:
        F_nvr = do(rules.short_joint, bolts.F_nv)
    if joint.t_filler > fixed.filler_free:
        k_f = do(rules.filler_factor, joint.t_filler, fixed.filler_free, fixed.filler_slope)
        return do(rules.bolt_shear_through_fillers, F_nvr, A_b, bolts.n_s, k_f)
    if joint.t_filler:
        do.say(f"Fillers of {fixed.filler_text} or less need no reduction (J5.2).")
    return do(rules.bolt_shear, F_nvr, A_b, bolts.n_s)


def shear_alone(joint):
    """Return the strength of all bolts in shear, holes not regarded."""

    def compute(do):
        return do(rules.first_like_bolts, joint.n_bolts, bolt_shear(joint, do))

    return worked(compute)


def at_holes(joint, ply, reversed_load=False):
    """Return the strength of the bolts with the holes of one ply: for each bolt the least of shear, bearing and tearout, summed.

    Under reversed load the bolts bear on the other side of their holes, away from the ply's end.
    """
    classes = _classes(ply, reversed_load)

    def compute(do):
        do.say("Shear of one bolt as in the check of the bolts alone.")
        r_nv = bolt_shear(joint, silent)
        R_n = None
        t = ply.n_plies * ply.t
        if ply.n_plies > 1:
            do.say(f"Each bolt bears on {ply.n_plies} {ply.name} plies; t is their total.")
        r_nb = do(_bearing(joint, ply), joint.bolts.d, t, ply.F_u)
        for (kind, _), (l_c, number) in classes.items():
            count = number * joint.element.joints
            ahead = {"edge": "towards the edge of the part", "hole": "towards the next hole", "none": "with the part running on ahead"}[kind]
            do.say(f"{count} bolt{'s' if count > 1 else ''} {ahead}:")
            if kind == "none":
                r_n = do(rules.weaker_without_tearout, r_nv, r_nb)
            else:
                along = ply.hole.along
                l_c = do(rules.clear_to_edge, l_c + along / 2, along) if kind == "edge" else do(rules.clear_to_hole, l_c + along, along)
                r_n = do(rules.weakest_at_bolt, r_nv, r_nb, do(_tearout(joint, ply), l_c, t, ply.F_u))
            R_n = do(rules.first_like_bolts, count, r_n) if R_n is None else do(rules.more_like_bolts, R_n, count, r_n)
        return R_n

    return worked(compute)


def _classes(ply, reversed_load=False):
    """Group the bolts by what lies ahead of them: {(kind, clear distance): [clear distance, number]}, weakest first."""
    holes, end = ply.strip, ply.end
    if reversed_load:
        holes, end = mirrored(holes), (np.inf, 0.0)
    groups = defaultdict(int)
    values = {}
    for clear in _at_bolts(holes, end):
        kind = str(np.ravel(clear.kind)[0]) if np.all(np.isfinite(clear.l_c)) else "none"
        key = (kind, round(float(first(clear.l_c)), 6))
        values[key] = clear.l_c
        groups[key] += 1
    return {key: (values[key], groups[key]) for key in sorted(groups, key=lambda key: key[1])}


def _at_bolts(holes, end):
    """Return the clear distances ahead of the bolts; an open hole may stand in the way of one but bears none."""
    return [clear for hole, clear in zip(holes, clear_distances(holes, end)) if hole.bolted]


def _bearing(joint, ply):
    if ply.kind == "LSL across":
        return rules.bearing_at_cross_slot
    return rules.bearing if joint.deformation else rules.bearing_deformation_not_considered


def _tearout(joint, ply):
    if ply.kind == "LSL across":
        return rules.tearout_at_cross_slot
    return rules.tearout if joint.deformation else rules.tearout_deformation_not_considered


def bolt_table(joint):
    """Return what each bolt of one group can carry: rows of plain data, with the per-bolt least over both plies and the sums.

    Returns
    -------
    dict
        ``rows``: bolt number, x, y, clear distance, bearing and tearout for member and plate, shear, least (nominal, kip);
        ``sums``: by member, by plate, and by the stricter per-bolt minimum.
    """
    r_nv = bolt_shear(joint, silent)
    sides = []
    for ply in (joint.member, joint.plate):
        t = ply.n_plies * ply.t
        r_nb = _bearing(joint, ply).bare(joint.bolts.d, t, ply.F_u)
        sides.append([(c.l_c, c.kind, r_nb, _tearout(joint, ply).bare(c.l_c, t, ply.F_u)) for c in _at_bolts(ply.strip, ply.end)])
    rows = []
    for i, hole, at_member, at_plate in zip(joint.numbers, joint.pattern, *sides):
        rows.append({"bolt": i, "x": hole.x, "y": hole.y, "member": at_member, "plate": at_plate, "shear": r_nv,
                     "least": min(r_nv, *at_member[2:], *at_plate[2:])})
    sums = {side: sum(min(r_nv, *row[side][2:]) for row in rows) * joint.element.joints for side in ("member", "plate")}
    return {"rows": rows, "sums": sums | {"stricter": sum(row["least"] for row in rows) * joint.element.joints}}


def slip(joint):
    """Return the slip resistance of the group."""
    bolts = joint.bolts
    h_f = 1.0 if joint.n_fillers < 2 else 0.85

    def compute(do):
        do.say(f"Faying surface class {'A' if bolts.mu == 0.30 else 'B'}; "
               + ("no filler or one." if h_f == 1.0 else "two or more fillers, h_f = 0.85."))
        return do(rules.slip, bolts.mu, D_U, h_f, bolts.T_b, bolts.n_s, joint.n_bolts)

    return worked(compute)


def slip_factor(joint):
    """Return the row of ``check.FACTORS`` for the worst hole of the joint."""
    kinds = {joint.member.kind, joint.plate.kind}
    if any(kind.startswith("LSL") for kind in kinds):
        return "slip, long slots"
    if kinds & {"OVS", "SSL along"}:
        return "slip, oversized holes or short slots along"
    return "slip, standard holes or short slots across"
