"""Where a gusset lies: supporting edges, free edges, the axis of the brace, and what of its Whitmore width the plate and its supports leave."""

import math
from dataclasses import dataclass

from ...errors import InputError
from ...units import fraction


@dataclass(frozen=True)
class Layout:
    """A gusset in its plane, the origin at the work point, x along the beam, y along the column. [in]

    Parameters
    ----------
    brace : unit vector of the brace's axis, away from the work point. across : unit vector at right angles, towards the beam's side.
    last : work point to the last row of bolts, or to the end of the brace's welds next to the support. free_end : to the gusset's free end.
    half_end : half width of the free end. lines : (point, inward normal) of each supporting line.
    corners : of the outline, from the column edge's far end round by the corner and the beam edge to the free end.
    """

    brace: tuple
    across: tuple
    last: float
    free_end: float
    half_end: float
    lines: tuple
    corners: tuple

    def at(self, along, off=0.0):
        """Return the point so far along the brace's axis and so far off it towards the beam's side."""
        return (along * self.brace[0] + off * self.across[0], along * self.brace[1] + off * self.across[1])

    def side(self, along, sense):
        """Return the distance from the axis to the outline, across the brace at a place along it; sense +1 is the beam's side."""
        origin, ray = self.at(along), (sense * self.across[0], sense * self.across[1])
        hits = [t for a, b in zip(self.corners, (*self.corners[1:], self.corners[0])) if (t := _meet(origin, ray, a, b)) is not None]
        return min(hits, default=0.0)

    def to_support(self, off):
        """Return the distance from the last row, so far off the axis, along the brace to the nearest supporting line; 0 beyond it."""
        x, y = self.at(self.last, off)
        found = []
        for (px, py), (nx, ny) in self.lines:
            pace = self.brace[0] * nx + self.brace[1] * ny
            if pace > 1e-9:
                found.append(((x - px) * nx + (y - py) * ny) / pace)
        return max(min(found), 0.0)

    def free_edges(self):
        """Return the free edges beside the brace as (start, end), the beam's side first."""
        beam_end, right, left, column_end = self.corners[-4], self.corners[-3], self.corners[-2], self.corners[-1]
        return ((beam_end, right), (left, column_end))

    def clear_of_support(self, off):
        """Return the least distance of a point of the last row from a supporting line, negative beyond one."""
        x, y = self.at(self.last, off)
        return min((x - px) * nx + (y - py) * ny for (px, py), (nx, ny) in self.lines)


def _meet(origin, ray, a, b):
    """Return how far along a ray it meets the segment a-b, or None."""
    ex, ey = b[0] - a[0], b[1] - a[1]
    cross = ray[0] * ey - ray[1] * ex
    if abs(cross) < 1e-12:
        return None
    dx, dy = a[0] - origin[0], a[1] - origin[1]
    t, s = (dx * ey - dy * ex) / cross, (dx * ray[1] - dy * ray[0]) / cross
    return t if t > 1e-9 and -1e-9 <= s <= 1 + 1e-9 else None


def corner(angle, e_b, e_c, beam_edge, column_edge, last, free_end, end_width):
    """Return the Layout of a gusset between beam and column.

    Parameters
    ----------
    angle : between the brace and the column's axis. [rad]
    e_b, e_c : work point to the face of the beam and of the column. [in]
    beam_edge, column_edge : (start, length) of each edge from the corner. [in]
    last, free_end, end_width : see Layout; end_width is the whole width. [in]
    """
    brace, across = (math.sin(angle), math.cos(angle)), (math.cos(angle), -math.sin(angle))
    lines = (((e_c, e_b), (0.0, 1.0)), ((e_c, e_b), (1.0, 0.0)))
    foot = [(e_c, e_b), (e_c + sum(beam_edge), e_b)]
    return _checked(brace, across, last, free_end, end_width, lines, foot, (e_c, e_b + sum(column_edge)))


def single(angle, edge, offset, last, free_end, end_width):
    """Return the Layout of a gusset on one edge, the brace leaning to +x; ``offset`` is the edge's centroid from the work point. [in]"""
    brace, across = (math.cos(angle), math.sin(angle)), (math.sin(angle), -math.cos(angle))
    lines = (((0.0, 0.0), (0.0, 1.0)),)
    return _checked(brace, across, last, free_end, end_width, lines, [(offset + edge / 2, 0.0)], (offset - edge / 2, 0.0))


def _checked(brace, across, last, free_end, end_width, lines, foot, far):
    bare = Layout(brace, across, last, free_end, end_width / 2, lines, ())
    right, left = bare.at(free_end, end_width / 2), bare.at(free_end, -end_width / 2)
    made = Layout(brace, across, last, free_end, end_width / 2, lines, (*foot, right, left, far))
    for x, y in (right, left):
        if min((x - px) * nx + (y - py) * ny for (px, py), (nx, ny) in lines) <= 0:
            raise InputError("the gusset's free end reaches into its support; enlarge work_point_distance or make gusset_end_width smaller")
    _simple(made)
    return made


def _simple(layout):
    """Refuse an outline that crosses itself or leaves the axis of the brace outside."""
    points = layout.corners
    edges = list(zip(points, (*points[1:], points[0])))
    for i, (a, b) in enumerate(edges):
        for j, (c, d) in enumerate(edges):
            if abs(i - j) in (0, 1, len(edges) - 1):
                continue
            t = _meet(a, (b[0] - a[0], b[1] - a[1]), c, d)
            if t is not None and t < 1 - 1e-9:
                raise InputError("the edges of the gusset cross each other: check edge lengths, brace_angle, work_point_distance, "
                                 "gusset_end_width")
    if min(layout.side(layout.last, 1), layout.side(layout.last, -1)) <= 0:
        raise InputError(f"the brace's axis leaves the gusset {fraction(layout.last, unit=' in')} from the work point; check the lengths of the "
                         "supported edges")
