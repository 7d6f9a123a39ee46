"""Figures of a pin connection: elevation with the governing path, section along the pin with its bending moment."""

import math
from itertools import pairwise

from ...check import worst_first
from ...figures import style
from ...figures.drafting import Drawing, broken
from ...provisions import pin_plates, pins
from ...units import ceil_figures, drawn_in_si, force, fraction, printed, ratio_text
from .. import pin_plate

TALLEST, LARGEST = 3.0, 0.5  # [in] of an elevation on paper; scale
SIGN = {"LRFD": "Pᵤ", "ASD": "Pₐ"}
WORDS = {"tension": "tensile rupture beside the hole, torn along the dashed lines",
         "shear": "shear rupture beyond the hole, sheared along the heavy lines",
         "bearing": "bearing of the pin, on the heavy arc"}


def shown_check(connection):
    """Return the check an elevation shows: the governing one if a plate has it, else the plates' weakest that has a path."""
    drawn = [each for each in connection.checks if each.kind == "strength" and each.applies and each.path in WORDS]
    return worst_first(drawn)[0]


def circle(radius, a0=0.0, a1=2 * math.pi, n=48):
    """Return points of an arc about the origin. [in]"""
    return [(radius * math.cos(a0 + (a1 - a0) * k / n), radius * math.sin(a0 + (a1 - a0) * k / n)) for k in range(n + 1)]


def plate_outline(plate, body):
    """Return the corners of a plate whose end lies at positive x and whose body is broken off at x = -body. [in]"""
    half = plate.w / 2
    if isinstance(plate, pin_plate.Eyebar):
        return _eyebar_outline(plate, body)
    end, c = plate.d_h / 2 + plate.a, plate.cut
    corner = [(end - c, -half), (end, -half + c), (end, half - c), (end - c, half)] if c else [(end, -half), (end, half)]
    return [(-body, -half), *corner, (-body, half)]


def _eyebar_outline(bar, body):
    """Head, and two arcs of the transition radius that touch the head's circle and the body's sides."""
    head, half, r = bar.head / 2, bar.w / 2, bar.radius
    x = -math.sqrt((head + r) ** 2 - (half + r) ** 2)  # centre of the transition's arc
    touch = math.atan2(half + r, x)
    upper = circle(head, 0.0, touch)
    arc = [(x + r * math.cos(a), half + r + r * math.sin(a)) for a in
           (touch - math.pi + (-math.pi / 2 - touch + math.pi) * k / 16 for k in range(17))]
    edge = [*upper, *arc, (min(-body, x - 0.5), half)]
    return [(px, -py) for px, py in reversed(edge)] + edge[1:]


def _path(paper, plate, d, path, sense):
    """Draw the path of a limit state of a plate; ``sense`` is 1 where its end lies at positive x."""
    r = plate.d_h / 2
    if path == "tension":
        b_e = pin_plates.effective_edge_width.bare(plate.t, plate.b_0, pin_plates.edge_width.bare(plate.w, plate.d_h))
        for side in (-1, 1):
            paper.line([(0, side * r), (0, side * (r + b_e))], style.HEAVY, style.TORN, style.ACCENT, z=6.9, gid="torn")
    elif path == "shear":
        end = sense * (r + plate.a)
        paper.fill([(0, -d / 2), (end, -d / 2), (end, d / 2), (0, d / 2)], style.SHADE, 4.5, gid="block")
        for side in (-1, 1):
            paper.line([(0, side * d / 2), (end, side * d / 2)], style.HEAVY, "-", style.ACCENT, z=6.9, gid="sheared")
    else:
        paper.line([(sense * x, y) for x, y in circle(r, -math.pi / 2.4, math.pi / 2.4)], 2.6, "-", style.ACCENT, z=7.2, gid="borne")


def _elevation_canvas(connection, check):
    joint, given = connection.joint, connection.inputs
    member, support, d, r = joint.member, joint.support, joint.pin.d, joint.member.d_h / 2
    eyebar = connection.eyebar
    end = given.head_diameter / 2 if eyebar else r + member.a
    tall = max(given.head_diameter if eyebar else member.w, support.w)
    back = r + support.a
    reach = 0.75 * tall
    left, right = -max(back + 0.45 * tall, reach), max(end + 0.3 * tall, reach)
    pull = f"{SIGN[connection.basis.method]} = {force(connection.demand.required_tension, ceil_figures)}"
    margin = {"left": style.text_width(pull, style.TYPE) + 16, "right": 66, "above": 34, "below": 52}
    wide, high = (margin["left"] + margin["right"]) / 72, (margin["above"] + margin["below"]) / 72
    scale = min((style.TEXT_WIDTH - wide) / (right - left), (TALLEST - high) / tall, LARGEST)
    width, height = (right - left) * scale + wide, tall * scale + high
    pt = 1 / 72 / scale
    figure = style.canvas(width, height)
    paper = Drawing(figure, (0, 0, width, height), (left - margin["left"] * pt, -tall / 2 - margin["below"] * pt), scale)
    front_is_member = check.part != "support"
    bodies = {"member": plate_outline(member, -left), "support": [(-x, y) for x, y in plate_outline(support, right)]}
    front, back_part = ("member", "support") if front_is_member else ("support", "member")
    paper.fill(bodies[back_part], style.PAPER, 1.0, line=style.INK, gid=f"{back_part}-body")
    cover = paper.fill(bodies[front], style.LIGHT, 2.0, line=style.INK, gid=f"{front}-body")
    hidden = [*bodies[back_part], bodies[back_part][0]]
    paper.line(hidden, style.THIN, style.HIDDEN, z=3.2, within=cover)
    for x, half, sense in ((left, member.w / 2, 1), (right, support.w / 2, -1)):
        paper.line([(x, -half), (x, half)], 1.8, colour=style.PAPER, z=3.4)
        paper.line(broken((x, -half), (x, half), pt * 3.5, at=0.27 if sense > 0 else 0.73), style.THIN, z=3.5)
    _path(paper, member if front_is_member else support, d, check.path, 1 if front_is_member else -1)
    paper.hole(0, 0, 2 * r, 2 * r, gid="hole")
    paper.hole(0, 0, d, d, fill=style.FAINT, weight=style.THIN, z=6.2, gid="pin")
    for a, b in (((-r - 8 * pt, 0), (r + 8 * pt, 0)), ((0, -r - 8 * pt), (0, r + 8 * pt))):
        paper.line([a, b], style.HAIR, style.CENTRE, z=6.5)
    _dimensions(paper, connection, end, back, right, tall)
    tail = left - 7 * pt
    paper.arrow((tail, 0), (tail - 40 * pt, 0))
    paper.text(tail - 22 * pt, 5 * pt, pull, ha="center")
    _labels(paper, connection, front_is_member, left, right, tall)
    return figure


def _dimensions(paper, connection, end, back, right, tall):
    joint, pt = connection.joint, paper.pt
    member, support, r = joint.member, joint.support, joint.member.d_h / 2
    level = tall / 2 + pt(13)
    if not connection.eyebar:
        paper.across([r, end], level, [pt(3), member.w / 2 - member.cut], [fraction(member.a)])
    paper.across([-back, -r], -tall / 2 - pt(15), [-support.w / 2 + support.cut, -pt(3)], [fraction(support.a)])
    outer = member.head if connection.eyebar else member.w
    x = right + pt(15)
    sides = (outer - member.d_h) / 2
    stops = [-outer / 2, -r, r, outer / 2]
    start = 0.0 if connection.eyebar else end
    paper.up(stops, x, [start, r * 0.3, r * 0.3, start], [_length(sides), _length(member.d_h), _length(sides)])
    x += pt(16)
    paper.up([-outer / 2, outer / 2], x, [x - pt(11)] * 2, [fraction(outer)])
    if abs(support.w - outer) > 1e-9:
        x += pt(16)
        paper.up([-support.w / 2, support.w / 2], x, [right] * 2, [fraction(support.w)])
    if connection.eyebar:
        at = -0.72 * (back + 0.45 * tall)
        paper.up([-member.w / 2, member.w / 2], at, [None, None], [fraction(member.w)])


def _between(stops):
    return [_length(b - a) for a, b in pairwise(stops)]


def _length(value):
    text = fraction(value)
    return text if "." not in text or drawn_in_si() else printed(value, 4)


def _labels(paper, connection, front_is_member, left, right, tall):
    given, pt = connection.inputs, paper.pt
    base = -tall / 2 - pt(42)
    count = {1: "", 2: "2 "}
    kind = "eyebar" if connection.eyebar else "PL"
    one = f"member: {count[given.member_plates]}{kind} {fraction(given.member_thickness)} x {fraction(given.member_width)}"
    two = f"support: {count[3 - given.member_plates]}PL {fraction(given.support_thickness)} x {fraction(given.support_width)}"
    if given.member_plates == 1 and front_is_member:
        two += ", near one not shown"
    paper.text(left, base, one)
    paper.line([(left + pt(14), base + pt(8)), (left + pt(14), -given.member_width / 2)], style.HAIR, z=4.6)
    paper.text(right + pt(30), base, two, ha="right")
    paper.line([(right - pt(14), base + pt(8)), (right - pt(14), -given.support_width / 2)], style.HAIR, z=4.6)
    middle = f"pin {fraction(given.pin_diameter)}"
    if pt(style.text_width(one + two + middle, style.TYPE) + 40) < right + pt(30) - left:
        x = left + pt(style.text_width(one, style.TYPE) + 16)
        x = max(x, min(0.0, right + pt(30) - pt(style.text_width(two + middle, style.TYPE) + 16)))
        paper.text(x, base, middle)
        paper.line([(x + pt(8), base + pt(8)), (0, -0.35 * given.pin_diameter)], style.HAIR, z=8)


def elevation(connection):
    """Draw the plates on their pin, to scale, with the path of the weakest limit state of a plate.

    Returns
    -------
    figure : style.Figure.
    """
    check = shown_check(connection)
    with style.house():
        drawn = _elevation_canvas(connection, check)
        svg, width = style.svg_text(drawn), style.fraction_of_text(drawn)
    governs = ", which governs" if check.id == connection.governing.id else f"; {connection.governing.title.lower()} governs"
    said = f"{check.title.partition(',')[0].lower()}, {WORDS[check.path]} (D/C {ratio_text(check.ratio)}{governs})"
    caption = f"Elevation, to scale; dimensions in inches, along the load from the edge of the hole. Marked: {said}."
    given = connection.inputs
    alt = (f"Elevation of {connection.subject} {fraction(given.member_width, unit=' in')} wide and its support plates on a pin of "
           f"{fraction(given.pin_diameter, unit=' in')}. Marked: {said}.")
    return style.Figure(svg, caption, alt, width)


def plies(pin):
    """Return (kind, z_0, z_1) of the plies along the pin's axis, from its lower end, kind "outer" or "inner". [in]"""
    low = -pin.grip / 2
    inner = low + pin.t_outer + pin.gap
    return (("outer", low, low + pin.t_outer), ("inner", inner, inner + pin.t_inner), ("outer", -low - pin.t_outer, -low))


def moment(pin, P, z):
    """Return the bending moment of the pin at z from its middle, under a load P. [kip·in]"""
    arm = pin.t_outer / 2 + pin.gap + pin.t_inner / 2
    away = arm - abs(z)
    if away <= 0:
        return 0.0
    into = max(0.0, pin.t_inner / 2 - abs(z))
    return P / 2 * away - P / pin.t_inner * into**2 / 2


def _section_canvas(connection):
    joint, pin = connection.joint, connection.joint.pin
    member, support, r, d = joint.member, joint.support, joint.member.d_h / 2, joint.pin.d
    end = joint.member.head / 2 if connection.eyebar else r + member.a
    reach = min(max(end, r + support.a) + 0.6 * d, max(1.6 * pin.grip, 1.3 * d))
    tall = pin.grip + 0.7 * d
    stops = sorted({round(z, 9) for _, z0, z1 in plies(pin) for z in (z0, z1)})
    margin = {"left": 60, "right": 10, "above": 12, "below": 34}
    P, governs = connection.demand.required_tension, connection.governing.id == "pin bending"
    diagram = 1.5
    across, up = (margin["left"] + margin["right"]) / 72, (margin["above"] + margin["below"]) / 72
    for _ in range(2):  # texts that do not fit their space, and so the margin, depend on the scale
        scale = min((style.TEXT_WIDTH - diagram - across) / (2 * reach), (2.7 - up) / tall, 0.75)
        rows = Drawing.measure(scale).rows(stops, _between(stops))
        margin["left"] = 52 + 8 * (rows - 1)
        across = (margin["left"] + margin["right"]) / 72
    width, height = 2 * reach * scale + across + diagram, tall * scale + up
    pt = 1 / 72 / scale
    figure = style.canvas(width, height)
    paper = Drawing(figure, (0, 0, width, height), (-reach - margin["left"] * pt, -tall / 2 - margin["below"] * pt), scale)
    inner_is_member = connection.inputs.member_plates == 1
    for kind, z0, z1 in plies(pin):
        is_member = (kind == "inner") == inner_is_member
        own = end if is_member else r + support.a
        ends = min(own, reach)
        x0, x1 = (-reach, ends) if is_member else (-ends, reach)
        tint = style.SHADE if is_member else style.LIGHT
        paper.fill([(x0, z0), (x1, z0), (x1, z1), (x0, z1)], tint, 2.0, line=style.INK, gid=f"{kind}-ply")
        for cut in ((x0, x1) if own > reach else (x0 if is_member else x1,)):
            paper.line([(cut, z0), (cut, z1)], 1.8, colour=style.PAPER, z=2.5)
            paper.line(broken((cut, z0), (cut, z1), 2.5 * pt), style.THIN, z=2.6)
        paper.fill([(-r, z0), (r, z0), (r, z1), (-r, z1)], style.PAPER, 2.7, line=style.INK, weight=style.THIN)
    half = pin.grip / 2 + 0.3 * d
    paper.fill([(-d / 2, -half), (d / 2, -half), (d / 2, half), (-d / 2, half)], style.FAINT, 4.0, line=style.INK, weight=style.THIN, gid="pin")
    paper.line([(0, -half - 4 * pt), (0, half + 4 * pt)], style.HAIR, style.CENTRE, z=6)
    x = -reach - 14 * pt - 8 * (rows - 1) * pt
    paper.up(stops, x, [-reach] * len(stops), _between(stops))
    paper.up([stops[0], stops[-1]], x - (18 + 8 * (rows - 1)) * pt, [x - 9 * pt] * 2, [_length(pin.grip)])
    _moment_diagram(paper, connection, reach, P, governs)
    paper.across([-d / 2, d / 2], -tall / 2 - 17 * pt, [-half] * 2, [f"pin {fraction(d)}"])
    return figure


def _moment_diagram(paper, connection, reach, P, governs):
    pin, pt = connection.joint.pin, paper.pt
    base, most = reach + pt(22), moment(pin, P, 0.0)
    size = pt(46)
    zs = [-pin.grip / 2 + pin.grip * k / 120 for k in range(121)]
    curve = [(base + size * moment(pin, P, z) / most, z) for z in zs]
    colour = style.ACCENT if governs else style.INK
    paper.fill([(base, zs[0]), *curve, (base, zs[-1])], style.LIGHT, 2.0, gid="moment")
    paper.line(curve, 1.4 if governs else style.OUTLINE, colour=colour, z=4)
    paper.line([(base, zs[0]), (base, zs[-1])], style.THIN, z=4)
    paper.text(base + size + pt(4), pt(2), "M =", style.SMALL, colour=colour)
    paper.text(base + size + pt(4), -pt(8), f"{ceil_figures(most)} kip·in", style.SMALL, colour=colour)


def section(connection):
    """Draw the section along the pin's axis, to scale, with the moment that bends the pin.

    Returns
    -------
    figure : style.Figure.
    """
    with style.house():
        drawn = _section_canvas(connection)
        svg, width = style.svg_text(drawn), style.fraction_of_text(drawn)
    pin, P = connection.joint.pin, connection.demand.required_tension
    arm = pins.pin_arm.bare(pin.t_outer, pin.gap, pin.t_inner)
    most = ceil_figures(moment(pin, P, 0.0))
    load = f"{SIGN[connection.basis.method]} = {force(P, ceil_figures)}"
    caption = (f"Section along the pin, to scale; right, its bending moment under {load}: half of the load on an arm of {arm:.4g} in, "
               f"{most} kip·in. The darker ply is the member.")
    alt = (f"Section along a pin of {fraction(pin.d, unit=' in')} through two outer plies of {fraction(pin.t_outer, unit=' in')} and an inner ply of "
           f"{fraction(pin.t_inner, unit=' in')}, gaps {fraction(pin.gap, unit=' in')}; its moment is {most} kip inches.")
    return style.Figure(svg, caption, alt, width)
