"""Limit states of the four weld lines and of the gusset beside them.  [AISC360] J2.2, J2.4, J4.1, J4.2."""

from ...provisions import slots, welds
from ..outcome import worked
from ..weld_group import counted_length
from .joint import FREE_GAP

LINES = 4


def leg(do, joint):
    """Work out (leg that counts, effective throat)."""
    if joint.gap > FREE_GAP + 1e-9:
        do.say(f"Gap of {joint.gap:.4g} in between tube and gusset, more than 1/16 in: the leg as welded is larger than the leg that counts.")
        w_e = do(slots.leg_less_gap, joint.leg, joint.gap)
        return w_e, do(welds.throat_of_effective_size, w_e)
    return joint.leg, do(welds.throat, joint.leg)


def strength(joint):
    """Return the strength of the four longitudinal fillet welds."""

    def compute(do):
        w, t_e = leg(do, joint)
        A_we = do(welds.weld_area, LINES, t_e, counted_length(do, joint.l, w))
        do.say("Longitudinal welds only: no directional increase, $k_{ds}$ = 1.0.")
        return do(welds.fillet_strength, joint.F_EXX, A_we, 1.0)

    return worked(compute)


def _plate_shear_area(do, joint):
    return do(slots.shear_area_along_welds, 2 * joint.plate.pieces, joint.l, joint.plate.t)


def plate_shear_yielding(joint):
    """Return shear yielding of the gusset along the weld lines."""
    return worked(lambda do: do(welds.shear_yielding, joint.plate.F_y, _plate_shear_area(do, joint)))


def plate_shear_rupture(joint):
    """Return shear rupture of the gusset along the weld lines."""

    def compute(do):
        return do(welds.shear_rupture, joint.plate.F_u, do(welds.net_area_without_holes, _plate_shear_area(do, joint)))

    return worked(compute)
