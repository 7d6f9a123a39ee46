"""Elevation of a welded end on the connected element, with its welds and the path that governs."""

import math

from ...check import worst_first
from ...figures import style
from ...figures.drafting import Drawing, broken
from ...figures.scene import outline
from ...geometry import Whitmore
from ...units import ceil_figures, force, fraction, ratio_text

TALLEST, LARGEST = 3.0, 0.42  # [in] of an elevation on paper; scale beyond which a small joint looks coarse
INDENT = 40  # [pt] of the first weld symbol
BACK_OFF = 1.4  # plate drawn beside the member, as a part of its depth, before it is broken off


class _View:
    """What the elevation shows, in the element's y and x from the member's end. [in]"""

    def __init__(self, end, whole=False):
        self.end = end
        self.lo, self.hi = outline(end.element)
        self.plate_lo, self.plate_hi = end.plate_lo, end.plate_lo + end.plate.width
        room = BACK_OFF * (self.hi - self.lo)
        self.shown_lo = self.plate_lo if whole else max(self.plate_lo, self.lo - room)
        self.shown_hi = self.plate_hi if whole else min(self.plate_hi, self.hi + room)
        tail = max(0.3 * end.lap, 0.22 * (self.hi - self.lo), 1.2)
        self.left, self.right, self.free = -end.lap - tail, tail, -end.lap
        self.support = end.gusset.length
        if self.support is not None and self.support <= end.lap + 3:
            self.right = self.support
        else:
            self.support = None
        self.bottom, self.top = min(self.lo, self.shown_lo), max(self.hi, self.shown_hi)


def shown_check(connection):
    """Return the check whose path the elevation marks: the governing one if it has a path, else the weakest that has one."""
    drawn = [each for each in connection.checks if each.path is not None and each.kind == "strength" and each.applies]
    if connection.governing in drawn:
        return connection.governing
    return next(iter(worst_first(drawn)), None)


def elevation_canvas(connection, check=None):
    """Return the matplotlib Figure of the elevation; its axes are in inches of the parts."""
    end = connection.end
    seen = _View(end, whole=check is not None and isinstance(check.path, Whitmore))
    force = _force(connection)
    left = max(style.text_width(line, style.TYPE) for line in force) + 14
    right, above, below = 46 + (8 if seen.support is not None else 0), 44, 74
    scale = min((style.TEXT_WIDTH - (left + right) / 72) / (seen.right - seen.left), (TALLEST - (above + below) / 72) / (seen.top - seen.bottom),
                LARGEST)
    row = INDENT + 4 + sum(wide for _, _, wide in _symbols(seen))
    right = max(right, row - (seen.right - seen.left) * scale * 72)
    width = (seen.right - seen.left) * scale + (left + right) / 72
    height = (seen.top - seen.bottom) * scale + (above + below) / 72
    figure, pt = style.canvas(width, height), 1 / 72 / scale
    paper = Drawing(figure, (0, 0, width, height), (seen.left - left * pt, seen.bottom - below * pt), scale)
    _bodies(paper, seen)
    if check is not None:
        _path(paper, seen, check)
    _welds(paper, seen)
    _dimensions(paper, seen)
    _annotate(paper, seen, connection, force)
    return figure


def _bodies(paper, seen):
    end = seen.end
    cut = broken((seen.left, seen.lo), (seen.left, seen.hi), paper.pt(3.5))
    member = [*cut, (0.0, seen.hi), (0.0, seen.lo)]
    right = [(seen.right, seen.shown_lo), (seen.right, seen.shown_hi)]
    if seen.support is None:
        right = broken(*right, paper.pt(3.5), at=0.73)
    plate = [(seen.free, seen.shown_lo), *right, (seen.free, seen.shown_hi)]
    stubs = [[(seen.left, y), (0.0, y)] for y in end.element.faces if seen.lo < y < seen.hi]
    member_edges = [[(seen.left, seen.lo), (0.0, seen.lo), (0.0, seen.hi), (seen.left, seen.hi)]]
    plate_edges = [[(seen.free, seen.shown_lo), (seen.free, seen.shown_hi)]]
    plate_cuts = [right] if seen.support is None else []
    for y, edge in ((seen.shown_lo, seen.plate_lo), (seen.shown_hi, seen.plate_hi)):
        (plate_edges if abs(y - edge) < 1e-9 else plate_cuts).append([(seen.free, y), (seen.right, y)])
    front, back = ((plate, plate_edges, plate_cuts), (member, member_edges + stubs, [cut])) if end.on_plate else \
        ((member, member_edges + stubs, [cut]), (plate, plate_edges, plate_cuts))
    paper.fill(back[0], style.PAPER, 1.0)
    for corners in back[1]:
        paper.line(corners, z=1.2)
    for corners in back[2]:
        paper.line(corners, style.THIN, z=1.2)
    cover = paper.fill(front[0], style.LIGHT, 2.0, gid=f"{'plate' if end.on_plate else 'member'}-body")
    for corners in back[1]:
        paper.line(corners, style.THIN, style.HIDDEN, z=2.2, within=cover)
    for corners in front[1]:
        paper.line(corners, z=4.0)
    for corners in front[2]:
        paper.line(corners, style.THIN, z=4.0)
    if seen.support is not None:
        paper.line([(seen.support, seen.shown_lo), (seen.support, seen.shown_hi)], 1.6, z=4.5)
        step, at = paper.pt(6), seen.shown_lo
        while at < seen.shown_hi - paper.pt(1):
            rise = min(step * 0.8, seen.shown_hi - at)
            paper.line([(seen.support, at), (seen.support + rise, at + rise)], style.HAIR, z=4.5)
            at += step


def _bands(seen):
    """Return (x_0, x_1, y_0, y_1) of every fillet as it is seen, a leg size wide outside the edge it runs along. [in]"""
    end, w = seen.end, seen.end.w_f
    start = (lambda length: (-end.lap, -end.lap + length)) if end.on_plate else (lambda length: (-length, 0.0))
    out = []
    if end.sided:
        out += [(*start(end.l_1), end.y_1 - w, end.y_1), (*start(end.l_2), end.y_2, end.y_2 + w)]
    if end.across == 1:
        out.append((-end.lap - w, -end.lap, end.y_1, end.y_2) if end.on_plate else (0.0, w, end.y_1, end.y_2))
    if end.across == 2:
        out += [(0.0, w, end.y_1, end.y_2), (-end.lap - w, -end.lap, end.y_1, end.y_2)]
    return out


def _welds(paper, seen):
    for k, (x0, x1, y0, y1) in enumerate(_bands(seen), start=1):
        hidden = seen.end.across == 2 and x1 < -0.5 * seen.end.lap and not seen.end.on_plate
        paper.fill([(x0, y0), (x1, y0), (x1, y1), (x0, y1)], style.FAINT, 5.0, gid=f"weld-{k}", line=style.INK, weight=style.THIN)
        if hidden:
            continue
        step, along = paper.pt(3.2), x1 - x0 > y1 - y0
        at, stop = (x0, x1) if along else (y0, y1)
        while at + step < stop:
            at += step
            paper.line([(at, y0), (at, y1)] if along else [(x0, at), (x1, at)], style.HAIR, z=5.1)


def _path(paper, seen, check):
    """Draw the path of a check: what tears shaded, sheared lines heavy, torn lines dashed; a Whitmore width with its spread."""
    end, path = seen.end, check.path
    if isinstance(path, Whitmore):
        for line in path.lines:
            paper.line([(x, y + end.plate_lo) for x, y in line], 0.9, style.PHANTOM, style.ACCENT, z=6.8, gid="spread")
        at = [(path.x_row, path.y_lo + end.plate_lo), (path.x_row, path.y_hi + end.plate_lo)]
        paper.line(at, style.HEAVY, "-", style.ACCENT, z=6.9, gid="torn")
        return
    lead = -max(end.l_1, end.l_2) if not end.on_plate else -end.lap
    torn_at = {"member": lead, "plate": 0.0 if not end.on_plate else lead}[path.part] if path.part != "weld" else 0.0
    for y, length, number in ((end.y_1, end.l_1, 1), (end.y_2, end.l_2, 2)):
        if number in path.lines:
            x0, x1 = (-end.lap, -end.lap + length) if end.on_plate else (-length, 0.0)
            paper.line([(x0, y), (x1, y)], style.HEAVY, "-", style.ACCENT, z=6.9, gid="sheared")
    for k, (a, b) in enumerate(path.spans, start=1):
        a, b = max(a, seen.shown_lo if path.part == "plate" else seen.lo), min(b, seen.shown_hi if path.part == "plate" else seen.hi)
        other = seen.free if path.part == "plate" and not end.on_plate else 0.0
        paper.fill([(torn_at, a), (other, a), (other, b), (torn_at, b)], style.SHADE, 2.6, gid=f"block-{k}")
        paper.line([(torn_at, a), (torn_at, b)], style.HEAVY, style.TORN, style.ACCENT, z=6.9, gid="torn")
    if path.part == "weld" and end.across:
        for x in ([-end.lap] if end.on_plate else [0.0]) + ([-end.lap] if end.across == 2 else []):
            paper.line([(x, end.y_1), (x, end.y_2)], style.HEAVY, "-", style.ACCENT, z=6.9, gid="sheared")


def _dimensions(paper, seen):
    end, pt = seen.end, paper.pt
    level = seen.top + pt(15)
    paper.across([-end.lap, 0.0], level + pt(15), [level + pt(3)] * 2, [f"lap {fraction(end.lap)}"])
    if end.sided:
        x0, x1 = (-end.lap, -end.lap + end.l_2) if end.on_plate else (-end.l_2, 0.0)
        paper.across([x0, x1], level, [end.y_2 + end.w_f] * 2)
        level = seen.bottom - pt(16)
        x0, x1 = (-end.lap, -end.lap + end.l_1) if end.on_plate else (-end.l_1, 0.0)
        paper.across([x0, x1], level, [end.y_1 - end.w_f] * 2)
    x = seen.right + pt(13 if seen.support is None else 21)
    whole = seen.shown_lo == seen.plate_lo and seen.shown_hi == seen.plate_hi
    marks = {end.y_1, end.y_2} | ({seen.plate_lo, seen.plate_hi} if whole else set())
    stops = sorted(marks)
    stops = [y for i, y in enumerate(stops) if not i or y - stops[i - 1] > 1e-6]
    paper.up(stops, x, [seen.right if y in (seen.plate_lo, seen.plate_hi) else end.w_f for y in stops])
    if whole and len(stops) > 2:
        paper.up([stops[0], stops[-1]], x + pt(17), [x + pt(5)] * 2)
    if seen.support is not None:
        paper.across([0.0, seen.support], seen.bottom - pt(16), [end.y_1, seen.shown_lo], [f"{fraction(seen.support)} to the support"]
                     if seen.support * paper.scale * 72 > 90 else None)


def _symbols(seen):
    """Return (length as written, aim on the weld, width in points) of every weld symbol, from left to right."""
    end, size = seen.end, style.text_width(fraction(seen.end.w_f), style.SMALL)
    bands = _bands(seen)
    if end.sided and end.equal:
        del bands[1]
    out = []
    for k, (x0, x1, y0, y1) in enumerate(bands):
        text = fraction(max(x1 - x0, y1 - y0)) + (" both edges" if end.sided and end.equal and not k else "")
        along = x1 - x0 > y1 - y0
        aim = (x0 + 0.12 * (x1 - x0), (y0 + y1) / 2) if along else ((x0 + x1) / 2, y0 + 0.12 * (y1 - y0))
        out.append((text, aim, 44 + size + style.text_width(text, style.SMALL)))
    return sorted(out, key=lambda row: row[1][0])


def _symbol(paper, at, point, size, text, both):
    """Draw a fillet weld's symbol: an arrow to the weld, a reference line, the triangle on it, size before and length behind.

    Parameters
    ----------
    at : left end of the reference line. point : on the weld. [in]
    size, text : of the leg, and of the length. both : whether the far side is welded alike.
    """
    pt = paper.pt
    x, y = at
    wide = 26 + style.text_width(text, style.SMALL) + style.text_width(size, style.SMALL)
    paper.line([(x, y), (x + pt(wide), y)], style.THIN, z=8)
    paper.arrow((x, y), point, weight=style.THIN, size=4.5)
    tip = x + pt(9 + style.text_width(size, style.SMALL))
    for sense in (-1, 1) if both else (-1,):
        paper.line([(tip, y), (tip, y + sense * pt(8)), (tip + pt(8), y)], style.THIN, z=8)
        base = y - pt(8) if sense < 0 else y + pt(2.4)
        paper.text(tip - pt(3), base, size, style.SMALL, "right")
        paper.text(tip + pt(11), base, text, style.SMALL)


def _annotate(paper, seen, connection, force):
    end, pt = seen.end, paper.pt
    y, x = (end.y_1 + end.y_2) / 2, seen.left - pt(7)
    paper.arrow((x, y), (x - pt(40), y))
    paper.text(x - pt(22), y + pt(5), force[0], ha="center")
    if len(force) > 1:
        paper.text(x - pt(22), y - pt(12), force[1], ha="center")
    base = seen.bottom - pt(66)
    plates = f"{end.plate.pieces} " if end.plate.pieces > 1 else ""
    plate = f"{plates}PL {fraction(end.plate.t)} x {fraction(end.plate.width)}"
    plate += ", broken off" if seen.shown_lo > seen.plate_lo or seen.shown_hi < seen.plate_hi else ""
    paper.text(seen.left - pt(6), base, end.element.member)
    paper.line([(seen.left + pt(12), base + pt(8)), (seen.left + pt(12), seen.lo)], style.HAIR, z=4.6)
    paper.text(seen.right + pt(4), base, plate, ha="right")
    paper.line([(seen.right - pt(12), base + pt(8)), (seen.right - pt(12), seen.shown_lo)], style.HAIR, z=4.6)
    x, level, both = seen.left + pt(INDENT), seen.bottom - pt(42), end.element.series == "2L"
    for text, aim, wide in _symbols(seen):
        _symbol(paper, (x, level), aim, fraction(end.w_f), text, both)
        x += pt(wide)


def _force(connection):
    sign = "Pᵤ" if connection.basis.method == "LRFD" else "Pₐ"
    lines = [f"{sign} = {force(connection.demand.required_tension, ceil_figures)}"]
    if connection.demand.required_compression > 0:
        lines.append(f"(−{force(connection.demand.required_compression, ceil_figures)})")
    return lines


def elevation(connection):
    """Draw the connection on its connected element, to scale, with the path of the governing check."""
    check, end = shown_check(connection), connection.end
    with style.house():
        drawn = elevation_canvas(connection, check)
        svg, width = style.svg_text(drawn), style.fraction_of_text(drawn)
    side = {"flange": " seen from the plate's side" if end.on_plate else " seen from the side of the stem or web"}.get(end.element.name, "")
    caption = f"Elevation on the {end.element.name}{side}, to scale; dimensions in inches, fillets grey."
    said = "; ".join(text for item, text in connection.designed() if item in ("Member", "Plates", "Welds"))
    alt = f"Elevation of the welded end: {said}."
    if check is not None:
        governs = ", which governs" if check.id == connection.governing.id else ""
        what = f"Whitmore width of {check.path.L_w:.4g} in" if isinstance(check.path, Whitmore) else check.path.label
        ratio = ratio_text(check.ratio) if math.isfinite(check.ratio) else "unlimited"
        caption += f" Heavy lines: {check.title[0].lower()}{check.title[1:]}, {what} (D/C {ratio}{governs})."
        alt += f" Marked: {check.title}, {what}, D/C {ratio}."
    return style.Figure(svg, caption, alt, width)
