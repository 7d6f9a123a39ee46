"""Block shear of member and plate: every tear-out block of the pattern, the weakest taken.  [AISC360] J4.3."""

from collections import Counter
from dataclasses import replace

import numpy as np

from ..check import governing, silent
from ..geometry import Part, tear_out_blocks
from ..provisions import block_shear as rules
from ..provisions import tension
from .outcome import Outcome

U_BS = 1.0
"""Tension over the block is uniform in axially pulled members and gussets.  [AISC360] Commentary J4.3."""


def block_shear(ply, part):
    """Return the weakest tear-out block of a ply, counted over all its like pieces."""
    blocks = tear_out_blocks(ply.strip, part, ply.constants.damage)

    def strength(block, do):
        scalar = not isinstance(block.A_gv, np.ndarray)
        if not scalar:
            n = ply.pieces
            return do(rules.block_shear, ply.F_u, n * block.A_nv, U_BS, n * block.A_nt, ply.F_y, n * block.A_gv)
        return _written_out(do, block, ply)

    nominal, block, steps = governing(blocks, strength)
    if block is None:
        return Outcome(nominal)
    others = sorted((strength(other, silent), other.label) for other in blocks if other is not block)[:4]
    listed = "; ".join(f"{label}: {value:.4g} kip" for value, label in others)
    count = f"{len(blocks)} tear-out block{'s' if len(blocks) > 1 else ''} compared; governing: {block.label}."
    return Outcome(nominal, (f"Governing block: {block.label}.", *steps), block, (count + (f" Next, nominal: {listed}." if listed else ""),))


def _written_out(do, block, ply):
    planes = Counter((round(plane.x1 - plane.x0, 9), plane.t, plane.n_holes) for plane in block.shear)
    A_gv = A_hv = None
    d_along = do(tension.hole_width, ply.hole.along, ply.constants.damage)
    for (length, t, n_holes), number in sorted(planes.items()):
        n_v = ply.pieces * number
        A_gv = do(rules.first_shear_planes, n_v, length, t) if A_gv is None else do(rules.more_shear_planes, A_gv, n_v, length, t)
        if not n_holes:
            continue
        lost = n_v * n_holes
        A_hv = do(rules.first_shear_plane_holes, lost, d_along, t) if A_hv is None else \
            do(rules.more_shear_plane_holes, A_hv, lost, d_along, t)
    A_nv = do(rules.net_shear_area, A_gv, A_hv or 0.0)
    across = sum(plane.n_holes for plane in block.tension)
    width = sum(plane.y1 - plane.y0 for plane in block.tension)
    attached = block.A_gt - width * ply.t
    if attached > 1e-9:
        A_gt = do(rules.gross_tension_area_with_attached, ply.pieces, width, ply.t, attached)
    else:
        A_gt = do(rules.gross_tension_area, ply.pieces, width, ply.t)
    if across:
        d_across = do(tension.hole_width, ply.hole.across, ply.constants.damage) if ply.hole.across != ply.hole.along else d_along
        A_ht = do(rules.tension_plane_holes, ply.pieces * across, d_across, ply.t)
    else:
        A_ht = 0.0
    A_nt = do(rules.net_tension_area, A_gt, A_ht)
    return do(rules.block_shear, ply.F_u, A_nv, U_BS, A_nt, ply.F_y, A_gv)


def member_part(joint):
    """Return the member's connected element as the strip that tears; holes in an outstanding leg are taken off its area."""
    element, ply = joint.element, joint.member
    other = [hole for hole in ply.holes if not hole.bolted and hole.y < 0]
    lost = max(((hole.across + ply.constants.damage) * hole.t for hole in other), default=0.0)
    hung = element.attachments
    if lost:
        hung = tuple(replace(a, area=max(a.area - lost, 0.0)) for a in hung)
    return Part(element.width, element.t, hung, ply.end, element.name, element.edge_names)


def plate_part(joint):
    """Return the connection plate as the strip that tears."""
    return Part(joint.plate.width, joint.plate.t, (), joint.plate.end, "plate", ("lower edge", "upper edge"))
