"""Limit states of the member's cross-section: gross yielding, net rupture over every chain, shear lag.  [AISC360] B4.3, D2, D3."""

from collections import Counter
from dataclasses import replace
from itertools import product

import numpy as np

from ..check import governing
from ..geometry import chain_through, critical_chains, lines_of
from ..geometry.pattern import first
from ..provisions import connecting, shear_lag, tension
from .outcome import Outcome, worked


def gross_yielding(joint):
    """Return the member's yielding on its gross section."""
    return worked(lambda do: do(tension.gross_yielding, joint.member.F_y, joint.element.A_g))


def net_rupture(joint):
    """Return rupture on the member's most critical chain, with shear lag and the share of load left at the chain."""
    element = joint.element
    holes = joint.member.holes
    found = chains(holes, element.A_g / element.pieces, joint.member.constants.damage)

    def strength(chain, do):
        A_n = net_area(do, chain, element.A_g, element.pieces, holes, joint.member.constants.damage)
        U = shear_lag_factor(joint, do)
        A_e = do(tension.effective_net_area, A_n, U)
        if np.all(chain.n_ahead == 0):
            return do(tension.net_rupture, joint.member.F_u, A_e)
        do.say(f"The chain lies behind {chain.n_ahead * element.joints} bolts that have passed on their share of the load.")
        xi = do(tension.load_share, chain.n_total * element.joints, chain.n_ahead * element.joints)
        return do(tension.net_rupture_behind_lead_row, joint.member.F_u, A_e, xi)

    nominal, chain, steps = governing(found, strength)
    notes = () if chain is None or np.ndim(chain.net_area(0.0)) else _chain_notes(found, chain, element, holes)
    return Outcome(nominal, steps, chain, notes)


def plate_rupture(ply):
    """Return rupture of the connection plates over their physical width; every element is connected, so U = 1.0."""
    A_g = ply.pieces * ply.width * ply.t
    nominal, chain, steps = governing(chains(ply.holes, ply.width * ply.t, ply.constants.damage),
                                      lambda chain, do: plate_chain(do, chain, A_g, ply, ply.holes))
    return Outcome(nominal, steps, chain)


def plate_chain(do, chain, A_g, ply, holes):
    """Work out the rupture strength of plates on one chain of holes out of a gross area."""
    A_e = do(tension.effective_net_area, net_area(do, chain, A_g, ply.pieces, holes, ply.constants.damage), do(shear_lag.shear_lag_case_1))
    if np.all(chain.n_ahead == 0):
        return do(connecting.plate_rupture, ply.F_u, A_e)
    do.say(f"The chain lies behind {chain.n_ahead} of the {chain.n_total} bolts.")
    return do(connecting.plate_rupture_behind_lead_row, ply.F_u, A_e, do(tension.load_share, chain.n_total, chain.n_ahead))


def chains(holes, A_g, delta_h):
    """Return the chains to evaluate: the critical ones of a single layout, or of a sweep all that can become critical.

    In a sweep these are the critical ones of layouts sampled over it, and every chain through the two foremost holes of each
    line: with equal pitches along the lines a chain that runs farther back loses more area than its share of load gives back.
    """
    size = max(np.size(value) for hole in holes for value in (hole.x, hole.y, hole.t))
    if size == 1 and not any(isinstance(value, np.ndarray) for hole in holes for value in (hole.x, hole.y, hole.t)):
        return critical_chains(holes, A_g, delta_h)
    lead = _lead_row(holes)
    if lead:
        return [chain_through(holes, lead, delta_h)]
    picks = set()
    for sample in sorted({round(i * (size - 1) / 8) for i in range(9)}):
        picks |= {chain.holes for chain in critical_chains([_at(hole, sample) for hole in holes], _entry(A_g, sample), delta_h, most=8)}
    lines = lines_of(holes)
    if len(lines) <= 4 and len({first(holes[line[0]].x) for line in lines}) > 1:
        picks |= {chain for choice in product(*((None, *line[:2]) for line in lines)) if (chain := tuple(i for i in choice if i is not None))}
    return [chain_through(holes, pick, delta_h) for pick in sorted(picks)]


def _lead_row(holes):
    """Return the lead row of a pattern without stagger, or None.

    There every chain loses at least one hole for each line it crosses level, and one that dodges a hole on a diagonal, or lies behind
    the lead row, gains area or sheds load by it: the straight chain through the lead row is the critical one at any spacing.
    """
    lines = lines_of(holes)
    same = all(hole.bolted for hole in holes) and all(len(line) == len(lines[0]) for line in lines) and len({hole.across for hole in holes}) == 1
    if not same or any(not np.array_equal(holes[i].x, holes[j].x) for line in lines[1:] for i, j in zip(lines[0], line)):
        return None
    return tuple(line[0] for line in lines)


def _at(hole, sample):
    return replace(hole, x=_entry(hole.x, sample), y=_entry(hole.y, sample), t=_entry(hole.t, sample))


def _entry(value, sample):
    """Return one layout's number of a sweep."""
    return float(np.ravel(value)[min(sample, np.size(value) - 1)])


def net_area(do, chain, A_g, pieces, holes, delta_h):
    """Work out the net area on a chain, like holes and like diagonals together, over all like pieces."""
    A_h = None
    for across, t, number in _like_holes(holes[i] for i in chain.holes):
        d_n = do(tension.hole_width, across, delta_h)
        if A_h is None:
            A_h = do(tension.first_hole_loss, pieces * number, d_n, t)
        else:
            A_h = do(tension.hole_loss, A_h, pieces * number, d_n, t)
    A_s = None
    for s, g, t, number in _like_spaces(chain.spaces):
        if A_s is None:
            A_s = do(tension.diagonal_credit, pieces * number, s, g, t)
        else:
            A_s = do(tension.more_diagonal_credit, A_s, pieces * number, s, g, t)
    return do(tension.net_area_straight, A_g, A_h) if A_s is None else do(tension.net_area_zigzag, A_g, A_h, A_s)


def _like_holes(holes):
    """Return (across, t, number) of like holes; in a sweep those of one element hold the very same array of thicknesses."""
    groups = {}
    for hole in holes:
        key = (hole.across, id(hole.t) if isinstance(hole.t, np.ndarray) else hole.t)
        _, _, number = groups.get(key, (0, 0, 0))
        groups[key] = (hole.across, hole.t, number + 1)
    return [groups[key] for key in sorted(groups)]


def _like_spaces(spaces):
    if any(isinstance(s, np.ndarray) for s, _, _ in spaces):
        return [(s, g, t, 1) for s, g, t in spaces]
    like = Counter((round(s, 9), round(g, 9), t) for s, g, t in spaces if s > 1e-9)
    return [(s, g, t, number) for (s, g, t), number in sorted(like.items())]


def shear_lag_factor(joint, do):
    """Work out U: every case of Table D3.1 that is permitted, the area ratio, the largest of them taken."""
    element, rows = joint.element, joint.rows
    if joint.U_by_hand is not None:
        do.say(f"U is set by the engineer to {joint.U_by_hand:g}. Basis: {joint.U_basis}")
        return joint.U_by_hand
    if element.eccentricity is None:
        do.say("Table D3.1 case 1: the load goes directly into the whole cross-section.")
        return do(shear_lag.shear_lag_case_1)
    x_bar = element.eccentricity(do)
    do.say(f"Table D3.1 case 2: the load enters through the {element.name} only.")
    U_2 = do(shear_lag.shear_lag_case_2, x_bar, joint.length)
    U_A = do(shear_lag.connected_area_ratio, element.A_c, element.A_g)
    if element.case == "7 flange" and rows >= 3:
        do.say(f"Case 7 is permitted too: {rows} bolts in line, $b_f$ {'at least' if element.wide_flange else 'less than'} two thirds of $d$; "
               "the largest value is taken.")
        U_7 = do(shear_lag.shear_lag_case_7_wide_flange if element.wide_flange else shear_lag.shear_lag_case_7_narrow_flange)
        return do(shear_lag.largest_of_cases_2_and_7, U_2, U_7, U_A)
    if element.case == "7 web" and rows >= 4:
        do.say(f"Case 7 is permitted too: {rows} bolts in line in the {element.name}; the largest value is taken.")
        return do(shear_lag.largest_of_cases_2_and_7, U_2, do(shear_lag.shear_lag_case_7_web), U_A)
    if element.case == "8" and rows >= 3:
        do.say(f"Case 8 is permitted too: {rows} bolts in line; the largest value is taken.")
        U_8 = do(shear_lag.shear_lag_case_8_four_bolts if rows >= 4 else shear_lag.shear_lag_case_8_three_bolts)
        return do(shear_lag.largest_of_cases_2_and_8, U_2, U_8, U_A)
    why = {"7 flange": "case 7 needs at least 3 bolts in line", "7 web": "case 7 needs at least 4 bolts in line",
           "8": "case 8 needs at least 3 bolts in line"}.get(element.case)
    if why:
        do.say(f"{why[0].upper()}{why[1:]}; there are {rows}.")
    return do(shear_lag.largest_of_case_2, U_2, U_A)


def chain_name(chain):
    """Return a chain in words: its holes counted, straight or in zigzag, and the row it passes."""
    number = len(chain.holes)
    shape = "zigzag" if chain.zigzags else "straight"
    return f"{shape} chain of {number} hole{'s' if number > 1 else ''}"


def _chain_notes(found, chosen, element, holes):
    others = [chain for chain in found if chain is not chosen][:3]
    A_g = element.A_g / element.pieces
    lines = len(lines_of([hole for hole in holes if hole.bolted]))
    listed = "; ".join(f"{chain_name(chain)}, {chain.n_ahead} of {chain.n_total} bolts ahead: "
                       f"net area over share {element.pieces * chain.net_area(A_g) / chain.share:.4g} in²" for chain in others)
    return (f"All chains over {lines} gage line{'s' if lines > 1 else ''} were compared by net area over share of load; "
            f"governing {element.pieces * chosen.net_area(A_g) / chosen.share:.4g} in², a {chain_name(chosen)}."
            + (f" Next: {listed}." if listed else ""),)
