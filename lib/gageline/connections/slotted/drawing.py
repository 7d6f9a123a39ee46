"""Elevation and section of a hollow section on its gusset, to scale, with the governing path.

The elevation looks at right angles to the gusset: x = 0 where the welds begin in the tube, x = l at the tube's end, y from the axis.
"""

from itertools import pairwise
from math import cos, pi, sin

from ...figures import style
from ...figures.drafting import Drawing, broken
from ...units import ceil_figures, drawn_in_si, force, fraction, ratio_text

TALLEST, LARGEST = 3.1, 0.5
"""Height of a drawing on paper and largest scale. [in]"""

ALONG_WELDS = ("weld", "wall shear yielding", "wall shear rupture", "plate shear yielding", "plate shear rupture")


def _box(x0, x1, y0, y1):
    return [(x0, y0), (x1, y0), (x1, y1), (x0, y1)]


class _View:
    """Where everything of an elevation lies. [in]"""

    def __init__(self, c):
        given, joint = c.inputs, c.joint
        self.half, self.l, self.concentric = joint.tube.depth / 2, joint.l, joint.concentric
        self.edge = -given.weld_held_back if self.concentric else -0.75
        self.slot = self.edge - given.slot_overrun
        plates = joint.reinforcement
        self.plates = None if plates is None else (self.slot - plates.length, min(self.slot + plates.length, self.l), plates.width / 2)
        start = self.slot if plates is None else self.plates[0]
        self.left = start - max(0.35 * joint.tube.depth, 0.12 * self.l, 1.5)
        length = joint.gusset.length
        self.support = self.l + length if length is not None and length <= 0.8 * self.l + 2 else None
        self.right = self.support or self.l + max(0.35 * joint.tube.depth, 2.0)
        self.wide = joint.plate.width / 2
        room = self.half + max(0.9 * self.half, 0.62 * self.l)
        self.shown = min(self.wide, room) if self.concentric else self.wide
        self.top = max(self.half, self.shown)


def _elevation(c):
    joint, seen = c.joint, _View(c)
    force = _force(c)
    left = max(style.text_width(line, style.TYPE) for line in force) + 54
    right, above, below = 52, 54 if seen.plates else 36, 30
    width_in, height_in = seen.right - seen.left, 2 * seen.top
    scale = min((style.TEXT_WIDTH - (left + right) / 72) / width_in, (TALLEST - (above + below) / 72) / height_in, LARGEST)
    width, height = width_in * scale + (left + right) / 72, height_in * scale + (above + below) / 72
    figure = style.canvas(width, height)
    pt = 1 / 72 / scale
    paper = Drawing(figure, (0, 0, width, height), (seen.left - left * pt, -seen.top - below * pt), scale)
    _gusset(paper, seen)
    _tube(paper, seen, joint)
    _welds(paper, seen, joint)
    _path(paper, seen, joint, c.governing.id)
    _dimensions(paper, seen, c)
    _labels(paper, seen, c, force)
    return figure


def _gusset(paper, seen):
    whole = seen.shown >= seen.wide - 1e-9
    lo, hi = -seen.shown, seen.shown
    right = [(seen.right, lo), (seen.right, hi)] if seen.support else broken((seen.right, lo), (seen.right, hi), paper.pt(3.5), at=0.7)
    paper.fill([(seen.edge, lo), *right, (seen.edge, hi)], style.LIGHT, 1.0)
    paper.line([(seen.edge, lo), (seen.edge, hi)], style.OUTLINE, z=1.4)
    for y in (lo, hi):
        if whole:
            paper.line([(seen.edge, y), (seen.right, y)], style.OUTLINE, z=1.4)
        else:
            paper.line(broken((seen.edge, y), (seen.right, y), paper.pt(3), upright=False, at=0.85), style.THIN, z=1.4)
    if not seen.support:
        paper.line(right, style.THIN, z=1.4)
        return
    paper.line([(seen.support, lo), (seen.support, hi)], 1.6, z=4.5)
    step, at = paper.pt(6), lo
    while at < hi - paper.pt(1):
        rise = min(0.8 * step, hi - at)
        paper.line([(seen.support, at), (seen.support + rise, at + rise)], style.HAIR, z=4.5)
        at += step


def _tube(paper, seen, joint):
    h = seen.half
    cut = broken((seen.left, -h), (seen.left, h), paper.pt(3.5))
    over = seen.concentric
    paper.fill([*cut, (seen.l, h), (seen.l, -h)], style.PAPER, 2.0 if over else 0.5)
    z = 3.0 if over else 0.8
    paper.line([(seen.left, -h), (seen.l, -h), (seen.l, h), (seen.left, h)], style.OUTLINE, z=z)
    paper.line(cut, style.THIN, z=z)
    if over:
        t = joint.tube.t
        for y in (-h + t, h - t):
            paper.line([(seen.left, y), (seen.l, y)], style.THIN, style.HIDDEN, z=2.4)
        paper.line([(seen.edge, -h), (seen.edge, h)], style.THIN, style.HIDDEN, z=2.5)
        for y0, y1 in ((-h, -h + t), (h - t, h)):
            paper.line([(seen.slot, y0), (seen.slot, y1)], style.THIN, z=3.0)
    else:
        paper.line([(seen.l, -seen.shown), (seen.l, seen.shown)], style.THIN, style.HIDDEN, z=1.6)
    paper.line([(seen.left - paper.pt(4), 0), (seen.right + paper.pt(3), 0)], style.HAIR, style.CENTRE, z=2.6)
    if seen.plates:
        x0, x1, w = seen.plates
        paper.fill(_box(x0, x1, -w, w), style.FAINT, 3.2, line=style.INK, weight=style.THIN)


def _welds(paper, seen, joint):
    """The legs of the welds on the face of the gusset, with strokes across."""
    lines = (seen.half,) if seen.concentric else (seen.shown,)
    for y in lines:
        for sense in (-1, 1):
            a, b = sense * y, sense * (y + joint.leg)
            paper.fill(_box(0, seen.l, a, b), style.SHADE, 3.4, line=style.INK, weight=style.HAIR)
            step, x = paper.pt(4.5), paper.pt(2)
            while x < seen.l:
                paper.line([(x, a), (x, b)], style.HAIR, z=3.5)
                x += step


def _path(paper, seen, joint, id):
    h, l, heavy = seen.half, seen.l, {"weight": style.HEAVY, "colour": style.ACCENT, "z": 6.9}
    line = joint.spacing / 2
    if id in ("member rupture", "slot yielding", "slot compression"):
        x = seen.slot if seen.concentric else 0.0
        paper.line([(x, -h), (x, h)], **heavy)
    elif id == "member yielding":
        x = (seen.left + (seen.plates[0] if seen.plates else seen.slot)) / 2
        paper.line([(x, -h), (x, h)], **heavy)
    elif id == "rupture beyond plates":
        paper.line([(seen.plates[1], -h), (seen.plates[1], h)], **heavy)
    elif id == "plates weld":
        x0, x1, w = seen.plates
        for y in (-w, w):
            paper.line([(x0, y), (x1, y)], **heavy)
    elif id in ALONG_WELDS:
        for y in (-line, line):
            paper.line([(0, y), (l, y)], **heavy)
    elif id == "plate block":
        paper.fill(_box(seen.edge, l, -line, line), style.SHADE, 2.2)
        for y in (-line, line):
            paper.line([(0, y), (l, y)], **heavy)
        paper.line([(l, -line), (l, line)], dash=style.TORN, **heavy)
    elif id == "plate yielding":
        x = (seen.l + seen.right) / 2
        paper.line([(x, -seen.shown), (x, seen.shown)], **heavy)
    else:
        from ..plate import spread

        found, middle = spread(joint), joint.plate.width / 2
        for start, stop in found.lines:
            ends = [(start[0], start[1] - middle), (stop[0], stop[1] - middle)]
            paper.line(ends, 0.9, style.PHANTOM, style.ACCENT, z=6.8)
        paper.line([(l, max(found.y_lo - middle, -seen.shown)), (l, min(found.y_hi - middle, seen.shown))], **heavy)


def _dimensions(paper, seen, c):
    pt = paper.pt
    stops, starts = [], []
    for x, y in ((seen.slot, seen.half), (seen.edge, seen.shown), (0.0, seen.half + c.joint.leg), (seen.l, seen.half + c.joint.leg)):
        if seen.concentric or x in (0.0, seen.l):
            if stops and x - stops[-1] < 1e-9:
                continue
            stops.append(x)
            starts.append(y)
    level = seen.top + pt(14)
    texts = [fraction(b - a) for a, b in pairwise(stops)]
    texts[-1] = f"l = {texts[-1]}"
    if seen.support:
        stops, starts = [*stops, seen.support], [*starts, seen.shown]
        texts.append(f"{fraction(seen.support - seen.l)} to support")
    paper.across(stops, level, starts, texts)
    if seen.plates:
        paper.across(list(seen.plates[:2]), level + pt(20), [seen.plates[2]] * 2)
    at = seen.right + pt(16)
    paper.up([-seen.half, seen.half], at, [seen.l + pt(3)] * 2)
    if seen.shown >= seen.wide - 1e-9:
        paper.up([-seen.wide, seen.wide], at + pt(17), [seen.right + pt(2)] * 2)


def _labels(paper, seen, c, force):
    pt, joint = paper.pt, c.joint
    x = seen.left - pt(7)
    paper.arrow((x, 0.0), (x - pt(40), 0.0))
    for k, line in enumerate(force):
        paper.text(x - pt(22), pt(5) if k == 0 else -pt(12), line, ha="center")
    base = -seen.top - pt(22)
    plate = f"{'' if joint.concentric else '2 '}PL {fraction(joint.plate.t)} x {fraction(joint.plate.width)}"
    if seen.shown < seen.wide - 1e-9:
        plate += ", broken off"
    weld = f"4 fillets {fraction(joint.leg)} x {fraction(joint.l)}"
    start, stop = seen.left - pt(46), seen.right + pt(30)
    paper.text(start, base, joint.tube.name)
    paper.line([(max(start + pt(16), seen.left + pt(8)), base + pt(8)), (seen.left + pt(12), -seen.half)], style.HAIR, z=4.6)
    paper.text(stop, base, plate, ha="right")
    wide = [pt(style.text_width(text, style.TYPE)) for text in (joint.tube.name, weld, plate)]
    x = min(stop - wide[2] / 2, seen.right - pt(6))
    paper.line([(x, base + pt(8)), (x, -seen.shown)], style.HAIR, z=4.6)
    middle = min(max(0.45 * seen.l, start + wide[0] + pt(12) + wide[1] / 2), stop - wide[2] - pt(12) - wide[1] / 2)
    paper.text(middle, base, weld, ha="center")
    edge = seen.half if seen.concentric else seen.shown
    paper.line([(middle, base + pt(8)), (min(max(middle, 0.1 * seen.l), 0.9 * seen.l), -edge - joint.leg)], style.HAIR, z=4.6)


def _force(c):
    sign, demand = "Pᵤ" if c.basis.method == "LRFD" else "Pₐ", c.demand
    lines = [f"{sign} = {force(demand.required_tension, ceil_figures)}"]
    return [*lines, f"(−{force(demand.required_compression, ceil_figures)})"] if demand.required_compression > 0 else lines


WHERE = {
    "member yielding": "gross section of the tube", "member rupture": "net section", "slot yielding": "slotted section",
    "rupture beyond plates": "section at the end of the reinforcing plates", "plates weld": "welds of the reinforcing plates",
    **dict.fromkeys(ALONG_WELDS, "the weld lines"), "plate block": "block of the gusset, sheared along solid and torn along dashed lines",
    "plate yielding": "width of the gusset", "slot compression": "slotted section",
}


def elevation(c):
    """Draw the connection in the plane of the gusset, to scale, with what governs.

    Returns
    -------
    figure : style.Figure.
    """
    with style.house():
        drawn = _elevation(c)
        svg, width = style.svg_text(drawn), style.fraction_of_text(drawn)
    governs, joint = c.governing, c.joint
    marked = f"{governs.title[0].lower()}{governs.title[1:]}, {WHERE.get(governs.id, 'the Whitmore width, spread at 30°')}"
    ratio = ratio_text(governs.ratio)
    caption = f"Elevation in the plane of the gusset, to scale; dimensions in inches. Heavy: {marked} (D/C {ratio}, which governs)."
    how = "slotted over one gusset" if joint.concentric else "between two gussets"
    alt = (f"Elevation of {joint.tube.name} {how} {fraction(joint.plate.t, unit=' in')} thick and "
           f"{fraction(joint.plate.width, unit=' in')} wide, with four "
           f"fillet welds of {fraction(joint.leg, unit=' in')}, {fraction(joint.l, unit=' in')} long. Marked: {marked}, D/C {ratio}.")
    return style.Figure(svg, caption, alt, width)


def _rounded(half_x, half_y, r):
    if r <= 0:
        return [(-half_x, -half_y), (half_x, -half_y), (half_x, half_y), (-half_x, half_y)]
    out = []
    for k, (sx, sy) in enumerate(((1, -1), (1, 1), (-1, 1), (-1, -1))):
        cx, cy = sx * (half_x - r), sy * (half_y - r)
        out += [(cx + r * cos(a), cy + r * sin(a)) for a in (-pi / 2 + k * pi / 2 + pi / 2 * i / 8 for i in range(9))]
    return out


def _circle(R):
    return [(R * cos(2 * pi * i / 96), R * sin(2 * pi * i / 96)) for i in range(96)]


def _section(c):
    joint = c.joint
    tube, plate = joint.tube, joint.plate
    X, Y, t_p = tube.across / 2, tube.depth / 2, plate.t
    plates = joint.reinforcement
    side = 0.0 if joint.concentric else t_p
    out_x = X + max(side, plates.t if plates else 0.0)
    reach = min(plate.width / 2, Y + max(0.35 * Y, 1.0)) if joint.concentric else Y
    left, right, above, below = 44, 150, 26, 34
    scale = min(2.6 / (2 * out_x), (2.9 - (above + below) / 72) / (2 * reach), LARGEST)
    width, height = 2 * out_x * scale + (left + right) / 72, 2 * reach * scale + (above + below) / 72
    figure = style.canvas(width, height)
    pt = 1 / 72 / scale
    paper = Drawing(figure, (0, 0, width, height), (-out_x - left * pt, -reach - below * pt), scale)
    outer, inner = (_circle(X), _circle(X - tube.t)) if tube.round else \
        (_rounded(X, Y, 2 * tube.t), _rounded(X - tube.t, Y - tube.t, tube.t))
    paper.fill(outer, style.SHADE, 2.0, line=style.INK)
    paper.fill(inner, style.PAPER, 2.1, line=style.INK)
    if joint.concentric:
        slot = (t_p + c.inputs.slot_clearance) / 2
        for s in (-1, 1):
            paper.fill(_box(-slot, slot, s * (Y - 1.6 * tube.t), s * (Y + paper.pt(1))), style.PAPER, 2.2)
            low = (Y if not tube.round else (X**2 - slot**2) ** 0.5)
            deep = (Y - tube.t if not tube.round else ((X - tube.t) ** 2 - slot**2) ** 0.5)
            for x in (-slot, slot):
                paper.line([(x, s * low), (x, s * deep)], style.OUTLINE, z=2.3)
        _plate_in_section(paper, t_p / 2, reach, plate.width / 2)
        leg = joint.leg
        for sx in (-1, 1):
            for sy in (-1, 1):
                corner, far = (sx * t_p / 2, sy * low), (sx * (t_p / 2 + leg), sy * (low if not tube.round else (X**2 - (t_p / 2 + leg) ** 2) ** 0.5))
                paper.fill([corner, far, (sx * t_p / 2, sy * (low + leg))], style.INK, 4.0)
    else:
        W, leg = plate.width / 2, joint.leg
        for sx in (-1, 1):
            paper.fill(_box(sx * X, sx * (X + t_p), -W, W), style.LIGHT, 3.0, line=style.INK)
            for sy in (-1, 1):
                paper.fill([(sx * X, sy * W), (sx * (X + leg), sy * W), (sx * X, sy * (W + leg))], style.INK, 4.0)
    if plates:
        w = plates.width / 2
        for sx in (-1, 1):
            paper.fill(_box(sx * X, sx * (X + plates.t), -w, w), style.FAINT, 3.0, line=style.INK, weight=style.THIN)
            for sy in (-1, 1):
                foot = X - plates.gap
                paper.fill([(sx * foot, sy * w), (sx * (X + plates.leg), sy * w), (sx * foot, sy * (w + plates.leg))], style.INK, 4.0)
    paper.up([-Y, Y], -out_x - pt * 18, [-X if not tube.round else 0.0] * 2)
    paper.across([-X, X], -reach - pt * 16, [0.0 if tube.round else -Y] * 2)
    _section_labels(paper, c, out_x, reach, X, Y)
    return figure


def _plate_in_section(paper, half, reach, whole):
    if reach < whole - 1e-9:
        top = broken((-half, reach), (half, reach), paper.pt(2), upright=False, at=0.5)
        low = broken((half, -reach), (-half, -reach), paper.pt(2), upright=False, at=0.5)
        body = [*top, *low]
        paper.fill(body, style.LIGHT, 3.0)
        for x in (-half, half):
            paper.line([(x, -reach), (x, reach)], style.OUTLINE, z=3.1)
        for cut in (top, low):
            paper.line(cut, style.THIN, z=3.1)
        return
    paper.fill(_box(-half, half, -reach, reach), style.LIGHT, 3.0, line=style.INK)


def _section_labels(paper, c, out_x, reach, X, Y):
    joint = c.joint
    tube, pt, given = joint.tube, paper.pt, c.inputs
    texts = [((X - tube.t / 2, -0.45 * Y) if not tube.round else ((X - tube.t / 2) * cos(-0.45), (X - tube.t / 2) * sin(-0.45)),
              f"{tube.name}, t = {fraction(tube.t) if drawn_in_si() else f'{tube.t:.3g}'}")]
    if joint.concentric:
        texts.append(((joint.plate.t / 2 + joint.leg * 0.4, Y + joint.leg * 0.3), f"4 fillets {fraction(joint.leg)}"))
        texts.append(((0.0, 0.5 * Y), f"PL {fraction(joint.plate.t, unit=' in')} a slot of {fraction(joint.plate.t + given.slot_clearance)}"))
    else:
        texts.append(((X + joint.leg * 0.4, joint.plate.width / 2 + joint.leg * 0.3), f"4 fillets {fraction(joint.leg)}"))
        texts.append(((X + joint.plate.t / 2, 0.3 * Y), f"2 PL {fraction(joint.plate.t)} x {fraction(joint.plate.width)}"))
    if joint.reinforcement:
        r = joint.reinforcement
        texts.append(((X + r.t / 2, -0.2 * r.width), f"2 PL {fraction(r.t)} x {fraction(r.width)}"))
    order = sorted(range(len(texts)), key=lambda k: texts[k][0][1])
    places = style.spread([texts[k][0][1] for k in order], pt(14), -reach, reach)
    for k, y in zip(order, places):
        point, text = texts[k]
        paper.leader(point, (out_x + pt(10), y))
        paper.line([(out_x + pt(10), y), (out_x + pt(20), y)], style.HAIR, z=8)
        paper.text(out_x + pt(22.5), y, text, middle=True)


def section(c):
    """Draw the section through the welds, to scale.

    Returns
    -------
    figure : style.Figure.
    """
    with style.house():
        drawn = _section(c)
        svg, width = style.svg_text(drawn), style.fraction_of_text(drawn)
    joint = c.joint
    caption = "Section through the welds, to scale; dimensions in inches. Welds black."
    how = "a slot in each of two walls, the gusset through both" if joint.concentric else "a gusset on each side"
    alt = f"Section of {joint.tube.name}, wall {joint.tube.t:.3g} in, with {how}, {fraction(joint.plate.t, unit=' in')} thick, and four fillet welds."
    return style.Figure(svg, caption, alt, width)
