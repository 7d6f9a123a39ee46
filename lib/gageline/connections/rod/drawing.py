"""Figures of a hanger rod: its two ends seen from the side with the governing path, and plan or section of each."""

import math
from itertools import pairwise

from ...figures import style
from ...figures.drafting import Drawing, broken
from ...units import ceil_figures, drawn_in_si, force, fraction, printed, ratio_text
from .attachments import Nut
from .inputs import ENDS

TALLEST, LARGEST, GAP = 3.4, 0.6, 0.25  # [in] of the elevation on paper; scale; space between the two ends
NUT, PAST = 0.98, 0.3  # height of a nut, end of the rod beyond it: parts of the diameter, about, for drawing only
SIGN = {"LRFD": "Pᵤ", "ASD": "Pₐ"}
EDGE = {"left": 46, "right": 50, "above": 34, "below": 46}  # [pt] round each end


def _length(value):
    text = fraction(value)
    return text if "." not in text or drawn_in_si() else printed(value, 4)


class _End:
    """One end on paper: u to the right, v towards the structure, whichever way that is on paper."""

    def __init__(self, connection, end):
        self.connection, self.end, self.rod = connection, end, connection.rod
        self.part = getattr(connection.rod, end)
        self.sense = 1 if end == "upper" else -1
        self.nut = isinstance(self.part, Nut)
        d = self.rod.d
        if self.nut:
            self.half = max(self.part.w / 2, (self.part.span or 0) / 2 + 0.8 * d)
            t_w = self.part.washer[1] if self.part.washer else 0.0
            self.top, self.foot = t_w + (NUT + PAST) * d, -self.part.t - 3.6 * d
        else:
            plate = self.part.plate
            self.half = max(plate.w / 2, 1.2 * self.part.pin.d)
            self.tip = plate.d_h / 2 + plate.a
            self.top, self.foot = max(self.tip, 0.75 * plate.w), -self.tip - 5.2 * d

    @property
    def height(self):
        return self.top - self.foot

    def at(self, *points):
        return [(u, self.sense * v) for u, v in points]

    def box(self, u, v0, v1):
        return self.at((-u, v0), (u, v0), (u, v1), (-u, v1))


def _paper(figure, place, end, scale):
    low = min(end.sense * end.top, end.sense * end.foot)
    pt = 1 / 72 / scale
    left = place[2] / 2 / scale
    return Drawing(figure, place, (-left, low - EDGE["below"] * pt), scale)


def _draw(paper, end, check):
    rod, part, d = end.rod, end.part, end.rod.d
    pt = paper.pt
    threaded_to = -part.t - 0.9 * d if end.nut else -end.tip - 2.6 * d
    if end.nut:
        _draw_nut(paper, end)
    else:
        _draw_lug(paper, end, check)
    cut = end.foot
    body = rod.d_y / 2
    paper.fill(end.box(body, cut, threaded_to), style.FAINT, 4.0, line=style.INK)
    thread_from = -part.t if end.nut else -end.tip - 1.2 * d
    paper.fill(end.box(d / 2, threaded_to, thread_from), style.FAINT, 4.1, line=style.INK, gid=f"{end.end}-thread")
    paper.line(end.at((-body, cut), (body, cut)), 1.8, colour=style.PAPER, z=4.3)
    paper.line(broken(*end.at((-body, cut), (body, cut)), pt(2.5), upright=False), style.THIN, z=4.4)
    paper.line(end.at((0, cut - pt(5)), (0, end.top + pt(6))), style.HAIR, style.CENTRE, z=6.4)
    if check.id in ("rod thread", "rod yielding", "rod rupture"):
        level = threaded_to + 0.35 * d if check.id == "rod thread" else (cut + threaded_to) / 2
        half = d / 2 if check.id == "rod thread" else body
        paper.line(end.at((-half - pt(5), level), (half + pt(5), level)), style.HEAVY, style.TORN, style.ACCENT, z=7, gid="torn")


def _draw_nut(paper, end):
    nut, d, pt = end.part, end.rod.d, paper.pt
    check = end.connection.governing
    half = end.half if nut.span else nut.w / 2
    for side in (-1, 1):
        corners = end.at((side * nut.d_h / 2, -nut.t), (side * half, -nut.t), (side * half, 0), (side * nut.d_h / 2, 0))
        paper.fill(corners, style.LIGHT, 2.0, line=style.INK, gid=f"{end.end}-plate")
        if nut.span:
            foot = side * nut.span / 2
            corners = end.at((foot, -nut.t), (foot - 0.22 * d, -nut.t - 0.45 * d), (foot + 0.22 * d, -nut.t - 0.45 * d))
            paper.fill(corners, style.PAPER, 2.0, line=style.INK)
    level = 0.0
    paper.fill(end.box(d / 2, -nut.t, 0), style.FAINT, 4.1, line=style.INK, weight=style.THIN)
    if nut.washer:
        level = nut.washer[1]
        paper.fill(end.box(nut.washer[0] / 2, 0, level), style.SHADE, 3.0, line=style.INK, gid=f"{end.end}-washer")
    paper.fill(end.box(nut.w_n / 2, level, level + NUT * d), style.PAPER, 4.2, line=style.INK, gid=f"{end.end}-nut")
    for u in (-0.27 * nut.w_n, 0.27 * nut.w_n):
        paper.line(end.at((u, level), (u, level + NUT * d)), style.THIN, z=4.3)
    paper.fill(end.box(d / 2, level + NUT * d, level + (NUT + PAST) * d), style.FAINT, 4.1, line=style.INK)
    marks = {f"{end.end} nut bearing": (-nut.w_n / 2, nut.w_n / 2, level), f"{end.end} plate bending": None}
    if check.id in marks or check.id.startswith(f"{end.end} washer"):
        mark = marks.get(check.id)
        if check.id.endswith("plate bending"):
            for side in (-1, 1):
                paper.line(end.at((side * nut.d_h / 2, -nut.t - pt(3)), (side * nut.d_h / 2, pt(3))), style.HEAVY, "-", style.ACCENT, z=7, gid="bent")
        elif check.id.endswith("washer bending"):
            for side in (-1, 1):
                paper.line(end.at((side * nut.w_n / 2, -pt(3)), (side * nut.w_n / 2, level + pt(3))), style.HEAVY, "-", style.ACCENT, z=7, gid="bent")
        else:
            u0, u1, v = mark or (-nut.washer[0] / 2, nut.washer[0] / 2, 0.0)
            paper.line(end.at((u0, v), (u1, v)), style.HEAVY, "-", style.ACCENT, z=7, gid="borne")
    chain = [-nut.t, 0.0, level] if level else [-nut.t, 0.0]
    ys = sorted(end.sense * v for v in chain)
    paper.up(ys, end.half + pt(14), [half] * len(ys), [_length(b - a) for a, b in pairwise(ys)])
    stops = [-nut.span / 2, nut.span / 2] if nut.span else [-nut.w / 2, nut.w / 2]
    text = f"span {_length(nut.span)}" if nut.span else f"w = {_length(nut.w)}"
    y = end.sense * (end.top + pt(14))
    paper.across(stops, y, [0.0] * 2, [text])


def _draw_lug(paper, end, check):
    lug, d, pt = end.part, end.rod.d, paper.pt
    plate, pin_d, r = lug.plate, lug.pin.d, lug.plate.d_h / 2
    paper.fill(end.box(plate.w / 2, -end.tip, end.top), style.LIGHT, 2.0, line=style.INK, gid=f"{end.end}-lug")
    wall = plate.w / 2 + pt(12)
    paper.line(end.at((-wall, end.top), (wall, end.top)), 1.6, z=4.5)
    step = pt(6)
    for k in range(int(2 * wall / step)):
        u = -wall + k * step
        paper.line(end.at((u, end.top), (u + 0.8 * step, end.top + 0.8 * step)), style.HAIR, z=4.5)
    if check.part == end.end and check.path in ("tension", "shear"):
        if check.path == "shear":
            paper.fill(end.at((-pin_d / 2, 0), (pin_d / 2, 0), (pin_d / 2, -end.tip), (-pin_d / 2, -end.tip)), style.SHADE, 2.5)
        b_e = min(2 * plate.t + plate.b_0, plate.w / 2 - r)
        for side in (-1, 1):
            torn = [(side * r, 0), (side * (r + b_e), 0)]
            line = torn if check.path == "tension" else [(side * pin_d / 2, 0), (side * pin_d / 2, -end.tip)]
            paper.line(end.at(*line), style.HEAVY, style.TORN if check.path == "tension" else "-", style.ACCENT, z=7, gid="torn")
    paper.hole(0, 0, 2 * r, 2 * r, z=5.0)
    paper.hole(0, 0, pin_d, pin_d, fill=style.FAINT, weight=style.THIN, z=5.2, gid=f"{end.end}-pin")
    if check.id.startswith(f"{end.end} pin"):
        paper.hole(0, 0, pin_d, pin_d, fill=None, weight=2.4, z=7, gid="pin-governs").set_edgecolor(style.ACCENT)
    if check.id == f"{end.end} bearing":
        arc = [(r * math.sin(a), -r * math.cos(a)) for a in (-1.3 + 2.6 * k / 24 for k in range(25))]
        paper.line(end.at(*arc), 2.6, "-", style.ACCENT, z=7, gid="borne")
    if check.id == f"{end.end} weld":
        paper.line(end.at((-plate.w / 2, end.top), (plate.w / 2, end.top)), 2.6, "-", style.ACCENT, z=7, gid="weld")
    eye, socket = 1.15 * pin_d, 0.85 * d
    arc = [(eye * math.cos(a), eye * math.sin(a)) for a in (math.pi * k / 24 for k in range(25))]
    fork = [*arc, (-eye, -0.2 * end.tip), (-socket, -end.tip - 0.9 * d), (-socket, -end.tip - 2.2 * d), (socket, -end.tip - 2.2 * d),
            (socket, -end.tip - 0.9 * d), (eye, -0.2 * end.tip), arc[0]]
    paper.line(end.at(*fork), style.THIN, style.PHANTOM, z=5.5, gid=f"{end.end}-clevis")
    ys = sorted(end.sense * v for v in (-end.tip, -r))
    paper.up(ys, end.half + pt(14), [plate.w / 2 if abs(abs(y) - end.tip) < 1e-9 else pt(3) for y in ys], [_length(plate.a)])
    paper.across([-plate.w / 2, plate.w / 2], end.sense * (end.top + pt(18)), [end.sense * (end.top + pt(5))] * 2, [_length(plate.w)])


def _legend(end):
    part, given = end.part, end.connection.inputs
    if end.nut:
        washer = f", washer {fraction(part.washer[0])} sq." if part.washer else ""
        return f"nut on PL {fraction(part.t)} x {fraction(part.w)}, hole {_length(part.d_h)}{washer}"
    return (f"lug PL {fraction(part.plate.t)} x {fraction(part.plate.w)}, pin {fraction(part.pin.d)}, {fraction(part.w_f)} fillets, "
            f"{given.lug_electrode}")


def _elevation_canvas(connection, check):
    ends = [_End(connection, end) for end in ENDS]
    margins = EDGE["left"] + EDGE["right"], EDGE["above"] + EDGE["below"]
    cell = (style.TEXT_WIDTH - GAP) / 2
    scale = min(*((cell - margins[0] / 72) / (2 * end.half) for end in ends), *((TALLEST - margins[1] / 72) / end.height for end in ends), LARGEST)
    height = max(end.height for end in ends) * scale + margins[1] / 72
    figure = style.canvas(style.TEXT_WIDTH, height)
    sign = f"{SIGN[connection.basis.method]} = {force(connection.demand.required_tension, ceil_figures)}"
    for k, end in enumerate(ends):
        paper = _paper(figure, (k * (cell + GAP), 0, cell, height), end, scale)
        pt = paper.pt
        _draw(paper, end, check)
        foot = end.sense * end.foot
        tail = foot - end.sense * pt(7)
        paper.arrow((0, tail), (0, tail - end.sense * pt(20)))
        paper.text(pt(8), tail - end.sense * pt(14) - pt(3), sign)
        base = min(end.sense * end.top, foot) - pt(EDGE["below"] - 4)
        paper.text(0, base, f"{end.end} end: {_legend(end)}", style.SMALL, "center")
    return figure


def elevation(connection):
    """Draw the two ends of the rod from the side, to scale, with the path of the governing limit state.

    Returns
    -------
    figure : style.Figure.
    """
    check = connection.governing
    with style.house():
        drawn = _elevation_canvas(connection, check)
        svg, width = style.svg_text(drawn), style.fraction_of_text(drawn)
    rod = f"{connection.thread.name}{'' if connection.thread.metric else ' in'}"
    clevis = " Clevises (chain lines) by their maker; heights of lugs not to scale." if any(connection.lug(end) for end in ENDS) else ""
    caption = (f"The ends of the rod {rod}, to scale; dimensions in inches.{clevis} Marked: {check.title[0].lower()}{check.title[1:]}, which governs "
               f"(D/C {ratio_text(check.ratio)}).")
    alt = (f"Upper and lower end of a rod of {rod}: {'; '.join(f'{end}, {_legend(_End(connection, end))}' for end in ENDS)}. "
           f"Marked: {check.title}, D/C {ratio_text(check.ratio)}.")
    return style.Figure(svg, caption, alt, width)


def _plan(paper, end):
    """Plan of a nut on its plate: plate broken off along its span, washer, nut, rod."""
    nut, d, pt = end.part, end.rod.d, paper.pt
    reach, half = 0.62 * nut.w + 0.2, nut.w / 2
    paper.fill([(-reach, -half), (reach, -half), (reach, half), (-reach, half)], style.LIGHT, 1.0, line=style.INK)
    for u in (-reach, reach):
        paper.line([(u, -half), (u, half)], 1.8, colour=style.PAPER, z=1.5)
        paper.line(broken((u, -half), (u, half), pt(3)), style.THIN, z=1.6)
    if nut.washer:
        q = nut.washer[0] / 2
        paper.fill([(-q, -q), (q, -q), (q, q), (-q, q)], style.SHADE, 2.0, line=style.INK)
        paper.across([-q, q], half + pt(14), [q] * 2, [_length(2 * q)])
    flat = nut.w_n / math.sqrt(3)
    paper.fill([(flat * math.cos(math.pi / 3 * k), flat * math.sin(math.pi / 3 * k)) for k in range(6)], style.PAPER, 3.0, line=style.INK)
    paper.hole(0, 0, nut.d_h, nut.d_h, fill=None, dash=style.HIDDEN, weight=style.THIN, z=3.5)
    paper.hole(0, 0, d, d, fill=style.FAINT, weight=style.OUTLINE, z=4.0)
    for a, b in (((-half - pt(4), 0), (half + pt(4), 0)), ((0, -half - pt(4)), (0, half + pt(4)))):
        paper.line([a, b], style.HAIR, style.CENTRE, z=6)
    paper.up([-half, half], reach + pt(14), [reach] * 2, [_length(nut.w)])


def _faces(pin):
    """Faces of lug and arms across the lug. [in]"""
    inner, out = pin.t_inner / 2, pin.t_inner / 2 + pin.gap
    return sorted({side * face for side in (-1, 1) for face in (inner, out, out + pin.t_outer)})


def _along_pin(paper, end):
    """Section of a lug along its pin: the lug, the arms of the clevis, the pin."""
    lug, pt = end.part, paper.pt
    pin, r, plate = lug.pin, lug.plate.d_h / 2, lug.plate
    inner, out = pin.t_inner / 2, pin.t_inner / 2 + pin.gap
    top, low = 1.9 * pin.d, min(r + plate.a, 1.7 * pin.d)
    plies = ((-inner, inner, -low, top, style.LIGHT, "lug"), (out, out + pin.t_outer, -top, 1.15 * pin.d, style.PAPER, "arm"),
             (-out - pin.t_outer, -out, -top, 1.15 * pin.d, style.PAPER, "arm"))
    for a, b, v0, v1, tint, gid in plies:
        paper.fill(end.at((a, v0), (b, v0), (b, v1), (a, v1)), tint, 2.0, line=style.INK, gid=gid)
        cut = v1 if gid == "lug" else v0
        paper.line(end.at((a, cut), (b, cut)), 1.8, colour=style.PAPER, z=2.3)
        paper.line(broken(*end.at((a, cut), (b, cut)), pt(1.8), upright=False), style.THIN, z=2.4)
        paper.fill(end.at((a, -r), (b, -r), (b, r), (a, r)), style.PAPER, 2.6, line=style.INK, weight=style.THIN)
    half = pin.grip / 2 + 0.3 * pin.d
    paper.fill(end.at((-half, -pin.d / 2), (half, -pin.d / 2), (half, pin.d / 2), (-half, pin.d / 2)), style.FAINT, 4.0, line=style.INK,
               weight=style.THIN)
    paper.line([(-half - pt(4), 0), (half + pt(4), 0)], style.HAIR, style.CENTRE, z=6)
    stops = _faces(pin)
    y = 1.9 * pin.d + pt(14)
    starts = [1.15 * pin.d if end.sense > 0 else top] * len(stops)
    paper.across(stops, y, starts, [_length(b - a) for a, b in pairwise(stops)])
    paper.up([-pin.d / 2, pin.d / 2], half + pt(14), [half] * 2, [_length(pin.d)])


def _sections_canvas(connection):
    ends = [_End(connection, end) for end in ENDS]
    cell, margin = (style.TEXT_WIDTH - GAP) / 2, 96
    sizes = [(1.24 * e.part.w + 0.4, e.part.w) if e.nut else (e.part.pin.grip + 0.6 * e.part.pin.d, 3.8 * e.part.pin.d) for e in ends]
    above = 34
    for _ in range(2):  # texts that do not fit their space, and so the margin, depend on the scale
        up = (24 + above) / 72
        scale = min(*((cell - margin / 72) / w for w, _ in sizes), *((2.4 - up) / h for _, h in sizes), 0.8)
        measure = Drawing.measure(scale)
        above = 34 + 9 * max((measure.rows(_faces(e.part.pin)) - 1 for e in ends if not e.nut), default=0)
    height = max(h for _, h in sizes) * scale + (24 + above) / 72
    figure = style.canvas(style.TEXT_WIDTH, height)
    for k, end in enumerate(ends):
        low = -max(h for _, h in sizes) / 2
        paper = Drawing(figure, (k * (cell + GAP), 0, cell, height), (-cell / 2 / scale, low - 24 / 72 / scale), scale)
        (_plan if end.nut else _along_pin)(paper, end)
        paper.text(0, low - paper.pt(20), f"{end.end} end, {'plan of plate and nut' if end.nut else 'section along the pin'}", style.SMALL, "center")
    return figure


def sections(connection):
    """Draw the plan of each nut on its plate, and the section of each lug along its pin, to scale.

    Returns
    -------
    figure : style.Figure.
    """
    with style.house():
        drawn = _sections_canvas(connection)
        svg, width = style.svg_text(drawn), style.fraction_of_text(drawn)
    names = [f"{end} end, {'section along the pin' if connection.lug(end) else 'plan of plate and nut'}" for end in ENDS]
    said = "; ".join(names)
    return style.Figure(svg, f"{said[0].upper()}{said[1:]}, to scale; dimensions in inches.", f"{said}.", width)
