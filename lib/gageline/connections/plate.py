"""The connection plate: yielding and rupture on its width and on the Whitmore width, buckling under reversal.  [AISC360] J4.1, J4.4."""

import math

import numpy as np

from ..check import governing
from ..facts.grades import E
from ..geometry.pattern import first
from ..geometry.whitmore import whitmore
from ..provisions import connecting, shear_lag, tension
from . import net_section
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


def whitmore_area(do, ply, found):
    """Work out the gross area of the Whitmore width, cut at the plate's edges, over all plates.

    Parameters
    ----------
    do : what remembers the formulas. ply : the plates. found : geometry.Whitmore of one plate.
    """
    L_w = do(connecting.whitmore_width, found.l, SPREAD, found.g)
    w = L_w
    if np.any(found.cut_lo > 1e-9) or np.any(found.cut_hi > 1e-9):
        do.say("The spread is cut off at the plate's edges.")
        w = do(connecting.width_within_edges, L_w, found.cut_lo, found.cut_hi)
    return _area(do, ply, w)


def whitmore_yielding(joint):
    """Return yielding of the plates over the Whitmore width."""
    return width_yielding(joint.plate, spread(joint))


def width_yielding(ply, found):
    """Return yielding of plates over a Whitmore width."""
    return _with_path(worked(lambda do: do(connecting.plate_yielding, ply.F_y, whitmore_area(do, ply, found))), found)


def whitmore_rupture(joint):
    """Return rupture of the plates over the net Whitmore width at their lead row."""
    return width_rupture(joint.plate, spread(joint))


def width_rupture(ply, found):
    """Return rupture of plates within a Whitmore width, over every chain of the holes it takes in."""
    inside = [hole for hole in ply.strip if first(found.y_lo) - hole.across / 2 < first(hole.y) < first(found.y_hi) + hole.across / 2]
    if not inside:
        whole = worked(lambda do: do(connecting.plate_rupture, ply.F_u,
                                     do(tension.effective_net_area, whitmore_area(do, ply, found), do(shear_lag.shear_lag_case_1))))
        return _with_path(whole, found)

    def strength(chain, do):
        return net_section.plate_chain(do, chain, whitmore_area(do, ply, found), ply, inside)

    nominal, _, steps = governing(net_section.chains(inside, first(found.L_w) * ply.t, ply.constants.damage), strength)
    return _with_path(Outcome(nominal, steps), found)


def _with_path(out, found):
    return out._replace(path=found) if not isinstance(out.nominal, np.ndarray) else Outcome(out.nominal)


def compression(joint):
    """Return the strength of the Whitmore strip in compression, as a column of the length given."""

    def compute(do):
        do.say(f"Support of the gusset: {joint.gusset.basis}.")
        return column(do, joint.plate, joint.gusset.K, joint.gusset.length, whitmore_area(do, joint.plate, spread(joint)))

    return worked(compute)


def column(do, ply, K, length, A_g):
    """Work out the strength of a strip of plate in compression; K is None where it yields before it buckles.

    Parameters
    ----------
    do : what remembers the formulas. ply : the plates. K, length : effective length factor, length considered. [in]
    A_g : gross area of the strip. [in²]
    """
    if K is None:
        return do(connecting.gusset_yielding_in_compression, ply.F_y, A_g)
    r = do(connecting.plate_radius, ply.t)
    lam = do(connecting.effective_slenderness, K, length, r)
    if lam <= 25:
        do.say("Effective slenderness not above 25: the strip yields (J4.4(a)).")
        return do(connecting.gusset_yielding_in_compression, ply.F_y, A_g)
    F_e = do(connecting.elastic_buckling_stress, E, lam)
    F_cr = do(connecting.inelastic_buckling, ply.F_y, F_e) if ply.F_y / F_e <= 2.25 else do(connecting.elastic_buckling, F_e)
    return do(connecting.gusset_buckling, F_cr, A_g)
