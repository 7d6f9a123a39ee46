"""The connection plate: yielding and rupture on its width and on the Whitmore width, buckling under reversal.  [AISC360] J4.1, J4.4."""

import math

import numpy as np

from ..facts.grades import E
from ..geometry.whitmore import whitmore
from ..provisions import connecting, tension
from .joint import DAMAGE
from .outcome import Outcome, worked

SPREAD = math.radians(30.0)
"""Angle of spread of the Whitmore width.  [AISC360] Commentary J4.1."""

K_CHOICES = {
    "compact corner": (None, "compact corner gusset: yielding only, published study of 2006"),
    "noncompact corner": (1.0, "noncompact corner gusset, with the mean of three lengths, published study of 2006"),
    "extended corner": (0.6, "extended corner gusset, with the length on the axis, published study of 2006"),
    "single brace": (0.7, "single brace, one edge supported, with the length on the axis, published study of 2006"),
    "chevron": (0.75, "chevron brace, with the length on the axis, published study of 2006"),
    "two edges, older practice": (0.65, "two supported edges, older practice, from memory"),
    "one edge free to sway, older practice": (1.2, "one edge free to sway, older practice, from memory"),
}
"""Support of the gusset -> (K, where it comes from); None: the gusset yields before it buckles."""


def gross_yielding(joint):
    """Return yielding of the plates over their physical width."""
    ply = joint.plate

    def compute(do):
        return do(connecting.plate_yielding, ply.F_y, _area(do, ply, ply.width))

    return worked(compute)


def _area(do, ply, width):
    if ply.pieces == 1:
        return do(connecting.plate_area, width, ply.t)
    return do(connecting.like_plates_area, ply.pieces, width, ply.t)


def spread(joint):
    """Return the Whitmore width of one plate, in the joint's own coordinates."""
    return whitmore(joint.plate_pattern, (joint.gusset.y_lo, joint.gusset.y_hi), 30.0)


def whitmore_area(do, joint):
    """Work out the gross area of the Whitmore width, cut at the plate's edges, over all plates."""
    ply, found = joint.plate, spread(joint)
    L_w = do(connecting.whitmore_width, found.l, SPREAD, found.g)
    w = L_w
    if np.any(found.cut_lo > 1e-9) or np.any(found.cut_hi > 1e-9):
        do.say("The spread is cut off at the plate's edges.")
        w = do(connecting.width_within_edges, L_w, found.cut_lo, found.cut_hi)
    return _area(do, ply, w), found


def whitmore_yielding(joint):
    """Return yielding of the plates over the Whitmore width."""

    def compute(do):
        A_g, _ = whitmore_area(do, joint)
        return do(connecting.plate_yielding, joint.plate.F_y, A_g)

    out = worked(compute)
    return out._replace(path=spread(joint)) if not isinstance(out.nominal, np.ndarray) else Outcome(out.nominal)


def whitmore_rupture(joint):
    """Return rupture of the plates over the net Whitmore width at their lead row."""
    ply = joint.plate

    def compute(do):
        A_g, found = whitmore_area(do, joint)
        d_n = do(tension.hole_width, ply.hole.across, DAMAGE)
        A_h = do(tension.first_hole_loss, ply.pieces * len(found.holes_in_row), d_n, ply.t)
        A_n = do(tension.net_area_straight, A_g, A_h)
        return do(connecting.plate_rupture, ply.F_u, do(tension.effective_net_area, A_n, do(tension.shear_lag_case_1)))

    out = worked(compute)
    return out._replace(path=spread(joint)) if not isinstance(out.nominal, np.ndarray) else Outcome(out.nominal)


def compression(joint):
    """Return the strength of the Whitmore strip in compression, as a column of the length given."""
    ply, gusset = joint.plate, joint.gusset

    def compute(do):
        do.say(f"Support of the gusset: {gusset.basis}.")
        A_g, _ = whitmore_area(do, joint)
        if gusset.K is None:
            return do(connecting.gusset_yielding_in_compression, ply.F_y, A_g)
        r = do(connecting.plate_radius, ply.t)
        lam = do(connecting.effective_slenderness, gusset.K, gusset.length, r)
        if lam <= 25:
            do.say("Effective slenderness not above 25: the strip yields (J4.4(a)).")
            return do(connecting.gusset_yielding_in_compression, ply.F_y, A_g)
        F_e = do(connecting.elastic_buckling_stress, E, lam)
        if ply.F_y / F_e <= 2.25:
            F_cr = do(connecting.inelastic_buckling, ply.F_y, F_e)
        else:
            F_cr = do(connecting.elastic_buckling, F_e)
        return do(connecting.gusset_buckling, F_cr, A_g)

    return worked(compute)

