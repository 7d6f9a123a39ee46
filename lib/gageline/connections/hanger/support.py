"""The supporting beam under the hanger: web local yielding, flange holes, and what a flange welded across would be checked for.

[AISC360] F13.1, J10.
"""

from ...check import Check, Working
from ...provisions import beam as rules
from ...provisions import tension
from ..outcome import worked


def near_end(h):
    """Return whether the pull acts within the beam's depth from its end."""
    return h.beam.end <= h.beam.section.d


def web_local_yielding(h):
    """Return the strength of the beam's web against local yielding; the load enters over the length between the end bolts."""
    beam, shape = h.beam, h.beam.section

    def compute(do):
        do.say("The load enters over the distance between the end bolts along the beam; the length of the fitting would be larger.")
        near = near_end(h)
        if near:
            do.say("The pull acts within the beam's depth from its end.")
        l_b = (h.rows - 1) * h.s
        if h.psi:
            made = rules.component_of_web_near_end if near else rules.component_of_web
            return do(rules.web_local_yielding_inclined, do(made, beam.F_y, shape.t_w, shape.k_des, l_b), h.psi)
        return do(rules.web_local_yielding_near_end if near else rules.web_local_yielding, beam.F_y, shape.t_w, shape.k_des, l_b)

    return worked(compute)


def flange_holes(h):
    """Return the advice on the holes in the beam's tension flange, and its numbers: areas, forces, moment, and Eq. J10-1 beside it."""
    beam, shape, do = h.beam, h.beam.section, Working()
    A_fg = do(rules.gross_flange_area, shape.b_f, shape.t_f)
    d_n = do(tension.hole_width, h.upper.plate.hole.across, h.upper.plate.constants.damage)
    A_fn = do(rules.net_flange_area, A_fg, 2, d_n, shape.t_f)
    Y_t = 1.0 if beam.F_y / beam.F_u <= 0.8 else 1.1
    P_fu = do(rules.flange_rupture_force, beam.F_u, A_fn)
    P_fy = do(rules.flange_yield_force, Y_t, beam.F_y, A_fg)
    M_nh = rules.moment_at_flange_holes.bare(P_fu, A_fg, shape.S_x)
    said = (f"Beam, holes in the tension flange: F_u A_fn = {P_fu:.4g} kip is less than Y_t F_y A_fg = {P_fy:.4g} kip, so the beam's flexural "
            f"strength at the holes is at most M_n = {M_nh:.4g} kip·in (F13.1)." if P_fu < P_fy else
            "Beam, holes in the tension flange: they do not reduce its flexural strength (F13.1).")
    check = Check("flange holes", "Beam, holes in its tension flange, for the beam's design", "beam", "F13.1", kind="advice", nominal=P_fy,
                  available=P_fu, demand=P_fy, unit="kip", steps=tuple(do.steps), notes=(said,))
    return check, {"A_fg": A_fg, "A_fn": A_fn, "P_fu": P_fu, "P_fy": P_fy, "M_nh": M_nh,
                   "flange bending": rules.flange_local_bending.bare(beam.F_y, shape.t_f)}
