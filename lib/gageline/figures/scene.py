"""What an elevation shows of a joint: outlines, where parts are broken off, and the path of a check, all in the joint's own inches."""

from dataclasses import dataclass

from ..geometry import Block, Chain, polyline

BACK_OFF = 1.7  # plate drawn beside the member, as a part of the member's depth, before it is broken off


@dataclass(frozen=True)
class View:
    """What an elevation shows, in the joint's own coordinates. [in]

    Parameters
    ----------
    lo, hi : lower and upper outline of the member. features : y of its inner edges (a stem, a heel, flanges).
    unfolded : y to which an outstanding leg with open holes is unfolded, or None.
    left, end : where the member is broken off, where it ends.
    plate_lo, plate_hi : the plate's edges. shown_lo, shown_hi : how far it is drawn. right : where it is broken off or supported.
    support : x of the support, or None where it is not drawn.
    """

    joint: object
    lo: float
    hi: float
    features: tuple
    unfolded: float | None
    left: float
    end: float
    plate_lo: float
    plate_hi: float
    shown_lo: float
    shown_hi: float
    right: float
    support: float | None

    @property
    def bottom(self):
        """Lowest y drawn."""
        return min(self.lo, self.shown_lo, self.lo if self.unfolded is None else self.unfolded)

    @property
    def top(self):
        """Highest y drawn."""
        return max(self.hi, self.shown_hi)

    @property
    def axis(self):
        """y halfway between the outer gage lines."""
        ys = [hole.y for hole in self.joint.pattern]
        return (min(ys) + max(ys)) / 2

    def free_edge(self, y):
        """x of the plate's free edge at the height y."""
        return -self.joint.plate.end.at(y - self.plate_lo)

    @property
    def wide(self):
        """(least x, greatest x) drawn."""
        edges = [self.free_edge(y) for y in (self.shown_lo, self.shown_hi)]
        return min(self.left, *edges), max(self.right, self.end)


@dataclass(frozen=True)
class Trace:
    """The path of a check in the joint's own coordinates: filled polygons, lines sheared and lines torn, thin lines. [in]"""

    part: str
    pieces: tuple = ()
    shear: tuple = ()
    torn: tuple = ()
    spread: tuple = ()

    @property
    def ys(self):
        """y of the ends of a Whitmore width, which has to be drawn whole."""
        return [y for line in self.torn for _, y in line] if self.spread else []


def trace(joint, check):
    """Return the Trace of a check's path.

    Parameters
    ----------
    joint : the joint. check : a Check whose path is a Chain, a Block or a Whitmore width.
    """
    path, part = check.path, check.part
    y0 = plate_lo(joint)

    def placed(points):
        return tuple((-x, y + y0) for x, y in points) if part == "plate" else tuple(points)

    if isinstance(path, Block):
        shear = tuple(placed([(plane.x0, plane.y), (plane.x1, plane.y)]) for plane in path.shear)
        torn = tuple(placed([(plane.x0, plane.y0), (plane.x1, plane.y1)]) for plane in path.tension if plane.y0 != plane.y1)
        return Trace(part, tuple(placed(piece) for piece in path.outline), shear, torn)
    if isinstance(path, Chain):
        ply = joint.plate if part == "plate" else joint.member
        corners = list(polyline(path, ply.holes, ply.width))
        if part == "member":
            low, high = outline(joint.element)
            unfolded = _unfolded(joint)
            bottom = low if unfolded is None or min(ply.holes[i].y for i in path.holes) >= 0 else unfolded
            corners[0], corners[-1] = (corners[0][0], bottom), (corners[-1][0], high)
        return Trace(part, torn=(placed(corners),))
    lines = tuple(tuple((x, y + y0) for x, y in line) for line in path.lines)
    width = ((path.x_row, path.y_lo + y0), (path.x_row, path.y_hi + y0))
    return Trace(part, torn=(width,), spread=lines)


def plate_lo(joint):
    """Return y of the plate's lower edge in the joint's own coordinates. [in]"""
    return joint.pattern[0].y - joint.plate.holes[0].y


def outline(element):
    """Return the lower and the upper outline of the member: the strip, and a flange in whose thickness the strip ends. [in]"""
    shape = element.section
    if element.name == "web":
        return -shape.t_f, element.width + shape.t_f
    if element.name == "stem":
        return -shape.t_f, element.width
    return 0.0, element.width


def _unfolded(joint):
    element = joint.element
    if all(hole.y >= 0 for hole in joint.member.holes):
        return None
    single = element.section.single or element.section
    return single.t - (single.b_long + single.b_short - element.width)


def view(joint, path=None, supported=True):
    """Return the View of a joint, which breaks off what is far from the member; ``supported`` shows the support where it is near."""
    element, xs = joint.element, [hole.x for hole in joint.pattern]
    lo, hi = outline(element)
    y0 = plate_lo(joint)
    y1 = y0 + joint.plate.width
    depth = hi - lo
    must = path.ys if path else []
    room = max(BACK_OFF * depth, 0.45 * (max(xs) - min(xs)))
    shown_lo = y0 if lo - y0 <= room else min(lo - 0.6 * room, *(y - 0.08 * depth for y in must), lo)
    shown_hi = y1 if y1 - hi <= room else max(hi + 0.6 * room, *(y + 0.08 * depth for y in must), hi)
    shown_lo, shown_hi = max(shown_lo, y0), min(shown_hi, y1)
    end = joint.member.end.at(0.0)

    def edge(y):
        return -joint.plate.end.at(y - y0)

    over = [edge(y) for y in (max(lo, shown_lo), min(hi, shown_hi))]
    core = end - min(min(xs), *over)
    left = min(min(xs), *over) - max(0.2 * core, 0.16 * depth, 1.2)
    right = max(end, *(edge(y) for y in (shown_lo, shown_hi))) + max(0.13 * core, 0.1 * depth, 1.0)
    support = max(xs) + joint.gusset.length if joint.gusset.length is not None else None
    if support is not None and not (supported and end < support <= end + 0.8 * core + 2):
        support = None
    features = tuple(y for y in element.faces if lo < y < hi)
    return View(joint, lo, hi, features, _unfolded(joint), left, end, y0, y1, shown_lo, shown_hi, support or right, support)
