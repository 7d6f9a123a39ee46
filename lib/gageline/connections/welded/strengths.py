"""Limit states of a welded end: net rupture with shear lag, base metal along the welds, block shear.  [AISC360] D2, D3, J4.2, J4.3."""

from dataclasses import dataclass

import numpy as np

from ...check import governing
from ...provisions import block_shear as blocks
from ...provisions import connecting, shear_lag, tension, welded_ends, welds
from .. import weld_group
from ..outcome import Outcome, worked


@dataclass(frozen=True)
class Tear:
    """One way in which a part tears round the welds.

    Parameters
    ----------
    label : in words. lines : which weld lines it shears along, 1 (lower or heel) and 2. [subset of (1, 2)]
    spans : (y_0, y_1) of what it tears across the load, at the end of the welds that is loaded. [in]
    planes : (thickness, length) of the planes sheared, one for each of ``lines`` and of what else is cut. [in]
    attached : area of what hangs on the torn strip and tears with it. [in²]
    part : "member" or "plate".
    """

    label: str
    lines: tuple
    spans: tuple
    planes: tuple
    attached: float
    part: str


def gross_yielding(end):
    """Return the member's yielding on its gross section."""
    return worked(lambda do: do(tension.gross_yielding, end.member.F_y, end.element.A_g))


def net_rupture(end):
    """Return the member's rupture, with the case of Table D3.1 that its welds belong to."""

    def compute(do):
        A_n, U = net_area_and_shear_lag(end, do)
        return do(tension.net_rupture, end.member.F_u, do(tension.effective_net_area, A_n, U))

    return worked(compute)


def net_area_and_shear_lag(end, do):
    """Work out A_n and U of the member: cases 1 to 4 of Table D3.1, the area ratio, or what the engineer has set."""
    element = end.element
    if end.U_by_hand is not None:
        do.say(f"U is set by the engineer to {end.U_by_hand:g}. Basis: {end.U_basis}")
        return do(welded_ends.net_area_of_unholed_member, element.A_g), end.U_by_hand
    if not end.sided and element.eccentricity is not None:
        do.say("Table D3.1 case 3: transverse welds only, to some of the elements.")
        return do(welded_ends.net_area_case_3, element.A_c), do(welded_ends.shear_lag_case_3)
    A_n = do(welded_ends.net_area_of_unholed_member, element.A_g)
    if element.eccentricity is None:
        if end.across:
            do.say("Table D3.1 case 1: the load goes directly into the whole cross-section.")
            return A_n, do(shear_lag.shear_lag_case_1)
        do.say("Table D3.1 case 4: a plate with longitudinal welds only.")
        return A_n, do(welded_ends.shear_lag_case_4_plate, length(end, do), end.member.width)
    if end.across:
        do.say(f"Table D3.1 case 2: longitudinal and transverse welds, through the {element.name} only.")
    else:
        do.say(f"Table D3.1 case 4: longitudinal welds only, through the {element.name} only; $w$ is the width of the {element.name}.")
    x_bar, l = element.eccentricity(do), length(end, do)
    U = do(shear_lag.shear_lag_case_2, x_bar, l) if end.across else do(welded_ends.shear_lag_case_4, l, connected_width(end), x_bar)
    U_A = do(shear_lag.connected_area_ratio, element.A_c, element.A_g)
    return A_n, do(shear_lag.largest_of_case_2 if end.across else welded_ends.largest_of_case_4, U, U_A)


def connected_width(end):
    """Return the width of the connected element for case 4: never less than the distance between the welds. [in]"""
    return max(end.member.width, end.g)


def length(end, do):
    """Work out the length of the connection. [in]"""
    return end.l_1 if end.equal else do(welded_ends.mean_weld_length, end.l_1, end.l_2)


def weld_strength(end):
    """Return the strength of all fillet welds of the connection."""
    out = worked(lambda do: weld_group.strength(do, end.longitudinal, end.transverse, end.w_f, end.F_EXX, end.concentric))
    return out._replace(path=Tear("the welds", (1, 2) if end.sided else (), (), (), 0.0, "weld"))


def _shear_area(end, part, do):
    if end.equal:
        return do(blocks.first_shear_planes, 2 * part.pieces, end.l_1, part.t)
    return do(blocks.more_shear_planes, do(blocks.first_shear_planes, part.pieces, end.l_1, part.t), part.pieces, end.l_2, part.t)


def yielding_along_welds(end, part):
    """Return shear yielding of a part's base metal along the longitudinal welds, one plane for each line of one piece."""
    return _along(end, part, lambda do: do(welds.shear_yielding, part.F_y, _shear_area(end, part, do)))


def rupture_along_welds(end, part):
    """Return shear rupture of a part's base metal along the longitudinal welds, one plane for each line of one piece."""
    return _along(end, part, lambda do: do(welds.shear_rupture, part.F_u, do(welds.net_area_without_holes, _shear_area(end, part, do))))


def _along(end, part, compute):
    out = worked(compute)
    if isinstance(out.nominal, np.ndarray):
        return Outcome(out.nominal)
    planes = ((part.t, end.l_1), (part.t, end.l_2))
    return out._replace(path=Tear("shear along the welds", (1, 2), (), planes, 0.0, part.name))


def member_tears(end):
    """Return the Tears of the member.

    Welds along the member's own edges leave one block: the connected element parts from what hangs on it. Welds along a narrower
    plate can also tear out the strip between them, the strips outside them, or all on one side of one of them.
    """
    element, t = end.element, end.member.t
    out = []
    shortest = end.l_1 if end.equal else _least(end.l_1, end.l_2)
    if end.across == 1 and not end.on_plate:
        out.append(Tear("round the welds: shear along both edges, tension across the end", (1, 2), ((end.y_1, end.y_2),),
                        ((t, end.l_1), (t, end.l_2)), 0.0, "member"))
    hanging = [each for each in element.attachments if not end.on_plate]
    if hanging:
        names = " and ".join(dict.fromkeys(each.name for each in hanging))
        out.append(Tear(f"the {element.name} parts from the {names}", (), ((0.0, element.width),),
                        tuple((each.t_junction, shortest) for each in hanging), 0.0, "member"))
    if end.on_plate:
        out += _tears_inside(end, 0.0, element.width, t, element.attachments, "member")
    return out


def _least(a, b):
    return np.minimum(a, b) if isinstance(a, np.ndarray) or isinstance(b, np.ndarray) else min(a, b)


def plate_tears(end):
    """Return the Tears of one plate: between the welds, outside them, and to one edge from the weld at the other side."""
    if end.on_plate:
        return [Tear("round the welds: shear along both edges, tension across the end", (1, 2), ((end.y_1, end.y_2),),
                     ((end.plate.t, end.l_1), (end.plate.t, end.l_2)), 0.0, "plate")]
    return _tears_inside(end, end.plate_lo, end.plate_lo + end.plate.width, end.plate.t, (), "plate")


def _tears_inside(end, lo, hi, t, attachments, part):
    lower, upper = (t, end.l_1), (t, end.l_2)
    shortest = end.l_1 if end.equal else _least(end.l_1, end.l_2)
    ways = [("between the welds", (1, 2), ((end.y_1, end.y_2),), (lower, upper)),
            ("outside the welds, to both edges", (1, 2), ((lo, end.y_1), (end.y_2, hi)), (lower, upper)),
            ("from the lower weld to the upper edge", (1,), ((end.y_1, hi),), (lower,)),
            ("from the upper weld to the lower edge", (2,), ((lo, end.y_2),), (upper,))]
    if end.across:
        del ways[1]  # what lies between the welds is held by the weld across the end
    out = []
    for label, lines, spans, planes in ways:
        hung = [each for each in attachments for a, b in spans if a - 1e-9 <= each.y <= b + 1e-9]
        out.append(Tear(label, lines, spans, planes, sum(each.area for each in hung), part))
        if hung:
            names = " and ".join(dict.fromkeys(each.name for each in hung))
            cut = tuple((each.t_junction, shortest) for each in hung)
            out.append(Tear(f"{label}, the {names} sheared off", lines, spans, planes + cut, 0.0, part))
    return out


def block_shear(end, part, tears):
    """Return block shear of a part round its welds: the weakest of its Tears, all like pieces taken."""

    def strength(tear, do):
        A_gv = None
        for t, long in _like(tear.planes):
            n = part.pieces * sum(1 for plane in tear.planes if plane[0] is t and plane[1] is long)
            A_gv = do(blocks.first_shear_planes, n, long, t) if A_gv is None else do(blocks.more_shear_planes, A_gv, n, long, t)
        w = sum(b - a for a, b in tear.spans)
        if tear.attached:
            A_gt = do(blocks.gross_tension_area_with_attached, part.pieces, w, part.t, tear.attached)
        else:
            A_gt = do(blocks.gross_tension_area, part.pieces, w, part.t)
        A_nv = do(welds.net_area_without_holes, A_gv)
        A_nt = do(welds.net_tension_area_without_holes, A_gt)
        return do(blocks.block_shear, part.F_u, A_nv, 1.0, A_nt, part.F_y, A_gv)

    nominal, tear, steps = governing(tears, strength)
    notes = () if tear is None else (f"Block that governs: {tear.label}; no holes, so net areas are gross areas.",)
    return Outcome(nominal, steps, tear, notes)


def _like(planes):
    """Return the planes with unlike ones once, by identity, so that arrays of a sweep are never compared."""
    out = []
    for plane in planes:
        if not any(plane[0] is t and plane[1] is long for t, long in out):
            out.append(plane)
    return out


def plate_rupture(end):
    """Return rupture of the plates over their physical width.

    A plate narrower than the member with longitudinal welds along its edges only has the shear lag of a plate of case 4.
    """
    part = end.plate

    def compute(do):
        A_g = do(connecting.like_plates_area, part.pieces, part.width, part.t) if part.pieces > 1 else \
            do(connecting.plate_area, part.width, part.t)
        A_n = do(welded_ends.net_area_of_unholed_member, A_g)
        if end.on_plate and not end.across:
            do.say("The plate is welded along its edges only: Table D3.1 case 4, plate.")
            U = do(welded_ends.shear_lag_case_4_plate, length(end, do), part.width)
        else:
            U = do(shear_lag.shear_lag_case_1)
        return do(connecting.plate_rupture, part.F_u, do(tension.effective_net_area, A_n, U))

    return worked(compute)
