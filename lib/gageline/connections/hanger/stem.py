"""The hung member's welded end, the welds, and the stem: yielding, rupture, Whitmore width, block shear.  [AISC360] D2, D3, J2.4, J4."""

from ...check import governing
from ...geometry import Part
from ...provisions import block_shear, connecting, hanger, shear_lag, tension, welded_ends, welds
from .. import net_section, tear_out
from ..outcome import Outcome, worked
from ..plate import SPREAD


def member_yielding(h):
    """Return the hung member's yielding on its gross section."""
    return worked(lambda do: do(tension.gross_yielding, h.hung.F_y, h.hung.element.A_g))


def member_rupture(h):
    """Return rupture of the hung member at the stem: at its holes, or at its longitudinal welds by case 4 of Table D3.1."""
    if h.lower:
        return net_section.net_rupture(h.lower)
    part, l_w = h.hung.element, h.welds.length

    def compute(do):
        A_n = do(welded_ends.net_area_of_unholed_member, part.A_g)
        if h.hung.U_by_hand is not None:
            do.say(f"U is set by the engineer to {h.hung.U_by_hand:g}. Basis: {h.hung.U_basis}")
            U = h.hung.U_by_hand
        elif part.eccentricity is None:
            do.say("Table D3.1 case 4: longitudinal welds only; a plate has no eccentricity in its own plane.")
            U = do(welded_ends.shear_lag_case_4_plate, l_w, part.width)
        else:
            do.say("Table D3.1 case 4: longitudinal welds only.")
            U_4 = do(welded_ends.shear_lag_case_4, l_w, part.width, part.eccentricity(do))
            U = do(welded_ends.largest_of_case_4, U_4, do(shear_lag.connected_area_ratio, part.A_c, part.A_g))
        return do(tension.net_rupture, h.hung.F_u, do(tension.effective_net_area, A_n, U))

    return worked(compute)


def member_block(h):
    """Return block shear of the bolted hung member."""
    return tear_out.block_shear(h.lower.member, tear_out.member_part(h.lower))


def weld_strength(h):
    """Return the strength of the fillets, all longitudinal, their end-loaded length regarded."""
    made = h.welds

    def compute(do):
        do.say("All lines run along the pull, so no directional increase is taken.")
        t_e = do(welds.throat, made.w_f)
        l_w = made.length
        beta_w = do(welds.end_loaded_factor, l_w, made.w_f)
        l_we = do(welds.effective_length, beta_w, l_w)
        return do(welds.fillet_strength, made.F_EXX, do(welds.weld_area, 2 * made.pieces, t_e, l_we), 1.0)

    return worked(compute)


def along_welds(h, part, rupture):
    """Return the shear strength of the base metal along the welds: of all hung pieces, or of the stem."""
    if part == "member":
        n_v, t, F_y, F_u = 2 * h.welds.pieces, h.hung.element.t, h.hung.F_y, h.hung.F_u
    else:
        n_v, t, F_y, F_u = 2, h.fitting.t_s, h.fitting.F_y, h.fitting.F_u

    def compute(do):
        if part == "stem" and h.welds.pieces == 2:
            do.say("The welds on both faces of the stem share its two planes.")
        A_gv = do(block_shear.first_shear_planes, n_v, h.welds.length, t)
        if rupture:
            return do(welds.shear_rupture, F_u, do(welds.net_area_without_holes, A_gv))
        return do(welds.shear_yielding, F_y, A_gv)

    return worked(compute)


def _area(do, h, width):
    if h.fitting.plies == 1:
        return do(connecting.plate_area, width, h.fitting.t_s)
    return do(connecting.like_plates_area, h.fitting.plies, width, h.fitting.t_s)


def stem_yielding(h):
    """Return yielding of the stem over its whole length along the beam; with an inclined pull in tension, bending and shear."""
    fit = h.fitting

    def compute(do):
        A_g = _area(do, h, h.length)
        if not h.psi:
            return do(connecting.plate_yielding, fit.F_y, A_g)
        return do(hanger.stem_yielding_inclined, fit.F_y, A_g, h.psi, fit.k, h.length)

    return worked(compute)


def stem_rupture(h):
    """Return rupture of the stem over its whole length: at the last row of holes, or at its flange where it has none there."""
    fit = h.fitting

    def compute(do):
        A_g = _area(do, h, h.length)
        if h.psi:
            do.say("At the flange the stem has no holes; the section through the last row is checked on the Whitmore width.")
            return do(hanger.stem_rupture_inclined, fit.F_u, do(welded_ends.net_area_of_unholed_member, A_g), h.psi, fit.k, h.length)
        A_n = _holes(do, h, A_g) if h.lower else do(welded_ends.net_area_of_unholed_member, A_g)
        return do(connecting.plate_rupture, fit.F_u, do(tension.effective_net_area, A_n, do(shear_lag.shear_lag_case_1)))

    return worked(compute)


def _holes(do, h, A_g):
    d_n = do(tension.hole_width, h.lower.plate.hole.across, h.lower.plate.constants.damage)
    A_h = do(tension.first_hole_loss, h.fitting.plies * h.lower.n_lines, d_n, h.fitting.t_s)
    return do(tension.net_area_straight, A_g, A_h)


def whitmore_yielding(h):
    """Return yielding of the stem on the width over which the load has spread at its last row, or at the end of the welds."""

    def compute(do):
        return do(connecting.plate_yielding, h.fitting.F_y, _spread(do, h))

    return worked(compute)


def whitmore_rupture(h):
    """Return rupture of the stem on the Whitmore width, holes of the last row taken off."""

    def compute(do):
        A_g = _spread(do, h)
        A_n = _holes(do, h, A_g) if h.lower else do(welded_ends.net_area_of_unholed_member, A_g)
        return do(connecting.plate_rupture, h.fitting.F_u, do(tension.effective_net_area, A_n, do(shear_lag.shear_lag_case_1)))

    return worked(compute)


def _spread(do, h):
    L_w = do(connecting.whitmore_width, h.spread[0], SPREAD, h.spread[1])
    if h.psi:
        return _area(do, h, do(hanger.width_between_edges, L_w, *h.edges_worked(do)))
    return _area(do, h, do(hanger.width_on_stem, L_w, h.length))


def stem_block(h):
    """Return block shear of the stem: every block of its holes, or the two blocks along the welds."""
    if h.lower:
        part = Part(h.lower.plate.width, h.lower.plate.t, (), h.lower.plate.end, "stem", ("lower edge", "upper edge"))
        return tear_out.block_shear(h.lower.plate, part)
    fit, l_w, apart = h.fitting, h.welds.length, h.welds.apart
    edge = _least(*h.edges)
    blocks = {"between the two weld lines": (2, lambda: apart), "from one weld line to the edge of the stem": (1, lambda: edge + apart / 2)}

    def strength(name, do):
        n_v, width = blocks[name]
        do.say(f"Block {name}.")
        A_gv = do(block_shear.first_shear_planes, n_v, l_w, fit.t_s)
        A_nt = do(block_shear.net_tension_area, do(block_shear.gross_tension_area, 1, width(), fit.t_s), 0.0)
        return do(block_shear.block_shear, fit.F_u, do(welds.net_area_without_holes, A_gv), tear_out.U_BS, A_nt, fit.F_y, A_gv)

    nominal, name, steps = governing(list(blocks), strength)
    return Outcome(nominal, steps, name)


def _least(low, high):
    import numpy

    return numpy.minimum(low, high) if numpy.ndim(low) or numpy.ndim(high) else min(low, high)
