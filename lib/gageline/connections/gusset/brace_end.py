"""The gusset where the brace is connected to it, by bolts or by welds: Whitmore width, block shear, base metal, compression."""

from dataclasses import dataclass

from ...facts.grades import E
from ...geometry import Block, ShearPlane, TensionPlane, Whitmore, spread_width
from ...provisions import block_shear, gusset_plates, welds
from .. import plate
from ..outcome import Outcome, worked
from ..tear_out import U_BS


@dataclass(frozen=True)
class BraceWelds:
    """Longitudinal fillets of the brace: lines, length of each, distance between those of one face, leg, filler metal. [in, ksi]"""

    lines: int
    l: float
    g: float
    w_f: float
    F_EXX: float


def welded_spread(brace_welds, axis, y_lo, y_hi):
    """Return the Whitmore width of a welded brace, cut at the edges; ``axis``, ``y_lo``, ``y_hi`` are y of the plate. [in]"""
    uncut = spread_width(brace_welds.l, brace_welds.g)
    low, high = axis - uncut / 2, axis + uncut / 2
    lo, hi = max(low, y_lo), min(high, y_hi)
    lines = tuple(((0.0, axis + s * brace_welds.g / 2), (brace_welds.l, axis + s * uncut / 2)) for s in (-1, 1))
    return Whitmore(hi - lo, brace_welds.l, brace_welds.g, lo, hi, lo - low, high - hi, brace_welds.l, (), lines)


def brace_weld(brace_welds):
    """Return the strength of the brace's longitudinal welds, all lines alike."""
    l, w_f = brace_welds.l, brace_welds.w_f

    def compute(do):
        t_e = do(welds.throat, w_f)
        do.say("Longitudinal welds: no directional increase, $k_{ds}$ = 1.0.")
        l_we = l
        if l / w_f > 300:
            l_we = do(welds.effective_length_of_long_weld, w_f)
        elif l / w_f > 100:
            l_we = do(welds.effective_length, do(welds.end_loaded_factor, l, w_f), l)
        return do(welds.fillet_strength, brace_welds.F_EXX, do(welds.weld_area, brace_welds.lines, t_e, l_we), 1.0)

    return worked(compute)


def base_yielding(ply, brace_welds):
    """Return yielding of the gusset in shear along the brace's welds."""
    return worked(lambda do: do(welds.shear_yielding, ply.F_y, do(gusset_plates.area_along_brace_welds, brace_welds.l, ply.t)))


def base_rupture(ply, brace_welds):
    """Return rupture of the gusset in shear along the brace's welds."""

    def compute(do):
        A_gv = do(gusset_plates.area_along_brace_welds, brace_welds.l, ply.t)
        return do(welds.shear_rupture, ply.F_u, do(welds.net_area_without_holes, A_gv))

    return worked(compute)


def welded_block(ply, brace_welds, axis, free):
    """Return block shear of the gusset along the brace's welds and across their end.

    Parameters
    ----------
    axis : y of the brace's axis in the plate. free : outer end of the welds to the gusset's free end, not counted. [in]
    """

    def compute(do):
        A_gv = do(gusset_plates.area_along_brace_welds, brace_welds.l, ply.t)
        A_nt = do(gusset_plates.area_between_brace_welds, brace_welds.g, ply.t)
        A_nv = do(welds.net_area_without_holes, A_gv)
        return do(block_shear.block_shear, ply.F_u, A_nv, U_BS, A_nt, ply.F_y, A_gv)

    y0, y1 = axis - brace_welds.g / 2, axis + brace_welds.g / 2
    # Seen mirrored, as every plate: its free edge at larger x.
    shear = tuple(ShearPlane(y, -brace_welds.l, 0.0, ply.t, 0.0, 0.0) for y in (y0, y1))
    torn = TensionPlane(y0, y1, -brace_welds.l, -brace_welds.l, ply.t, brace_welds.g * ply.t)
    outline = ((-brace_welds.l, y0), (-brace_welds.l, y1), (0.0, y1), (0.0, y0))
    found = worked(compute)
    return Outcome(found.nominal, found.steps, Block("along the welds and across their end", shear, (torn,), (outline,)))


def lengths(layout, found, axis):
    """Return L1, L2, L3: from the middle and both ends of the Whitmore width along the brace to the support. [in]"""
    return tuple(layout.to_support(y - axis) for y in (axis, found.y_lo, found.y_hi))


def compression(design):
    """Return the strength of the Whitmore strip in compression."""
    gusset, ply = design.gusset, design.plate

    def compute(do):
        do.say(f"Support of the gusset: {gusset.basis}.")
        A_g = plate.whitmore_area(do, ply, design.found)
        if gusset.K is None:
            do.say("Compact corner gusset: its thickness is at least")
            do(gusset_plates.compact_thickness, ply.F_y, design.corner, E, design.lengths[0])
            return plate.column(do, ply, None, None, A_g)
        L = design.lengths[0]
        do.say("Lengths along the brace to the support: {:.4g} in on its axis, {:.4g} in and {:.4g} in at the ends of the Whitmore width."
               .format(*design.lengths))
        if design.by_mean:
            L_mean = do(gusset_plates.mean_length, *design.lengths)
            L = max(L_mean, L) if design.by_mean == "greater" else L_mean
            if design.by_mean == "greater":
                do.say(f"The greater of mean length and length on the axis is taken: {L:.4g} in.")
        return plate.column(do, ply, gusset.K, L, A_g)

    return worked(compute)
