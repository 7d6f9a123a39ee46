"""Figures of a splice: the whole of it seen from the side, its section, and each group of one half with its governing path."""

from dataclasses import replace
from types import SimpleNamespace

from ...check import worst_first
from ...figures import style
from ...figures.drafting import Drawing, broken, grouped
from ...figures.elevation import bolt_text
from ...figures.elevation import elevation as joint_elevation
from ...geometry import lines_of
from ...units import ceil_figures, force, fraction

TALLEST, LARGEST = 3.0, 0.3  # [in] of the whole splice on paper; scale beyond which a small one looks coarse
WIDEST, SECTION_TALLEST, SECTION_LARGEST = 3.6, 2.7, 0.4  # [in], [in], scale of the section
HEAD, NUT = 0.625, 1.3  # height of a bolt's head, and of nut with thread end, in diameters, about; for drawing only


def _reach(group):
    """Return (half gap, row distances from the joint's middle nearest first, half length of the plates). [in]"""
    end, gap = group.free_length
    rows = sorted({round(gap / 2 + end + group.joint.length - hole.x, 6) for hole in group.joint.pattern})
    return gap / 2, rows, rows[-1] + group.joint.plate.end.x0


def _depth(connection):
    splice = connection.design
    return splice.section.d if splice.section else connection.element.width


def whole_canvas(connection):
    """Return the matplotlib Figure of the whole splice; its axes are in inches from the middle of the joint and the member's lower edge."""
    splice, depth = connection.design, _depth(connection)
    flange, web = splice.group("flange"), splice.group("web")
    half = max(_reach(group)[2] for group in splice.groups)
    t = flange.joint.plate.t + flange.joint.t_filler if flange else 0.0
    plate_lo = (depth - web.joint.plate.width) / 2 if web else 0.0
    low, high = min(-t, plate_lo), max(depth + t, depth - plate_lo)
    x1 = half + max(0.16 * half, 1.5)
    left, right = 62, 88 if web else 62
    above, below = 44 + (16 if flange and web else 0), 40
    scale = min((style.TEXT_WIDTH - (left + right) / 72) / (2 * x1), (TALLEST - (above + below) / 72) / (high - low), LARGEST)
    width, height = 2 * x1 * scale + (left + right) / 72, (high - low) * scale + (above + below) / 72
    figure, pt = style.canvas(width, height), 1 / 72 / scale
    paper = Drawing(figure, (0, 0, width, height), (-x1 - left * pt, low - below * pt), scale)
    gap = splice.groups[0].free_length[1] / 2
    for side in (-1, 1):
        _member(paper, splice.section, depth, side, gap, x1)
    if flange:
        _flange_plates(paper, flange, depth, connection.size.d)
    if web:
        _web_plates(paper, web, depth, behind=splice.section is None)
    _dimension(paper, splice, depth, high)
    if web:
        lo, offset = (depth - web.joint.plate.width) / 2, (depth - web.joint.element.width) / 2
        ys = [offset + web.joint.pattern[line[0]].y for line in lines_of(web.joint.pattern)]
        paper.up([lo, *ys, lo + web.joint.plate.width], x1 + paper.pt(66), [_reach(web)[2], *[None] * len(ys), _reach(web)[2]])
    _annotate(paper, connection, x1, (low, high), depth)
    return figure


def _member(paper, shape, depth, side, gap, x1):
    cut = broken((side * x1, 0.0), (side * x1, depth), paper.pt(3.5))
    paper.fill([(side * gap, 0.0), *cut, (side * gap, depth)], style.PAPER, 1.0)
    for y in (0.0, depth):
        paper.line([(side * gap, y), (side * x1, y)], z=2.0)
    if shape is not None:
        for y in (shape.t_f, depth - shape.t_f):
            paper.line([(side * gap, y), (side * x1, y)], style.THIN, z=2.0)
    paper.line([(side * gap, 0.0), (side * gap, depth)], z=2.0)
    paper.line(cut, style.THIN, z=2.0)


def _flange_plates(paper, group, depth, d):
    _, rows, half = _reach(group)
    t, f, t_f = group.joint.plate.t, group.joint.t_filler, group.joint.element.t
    for face, sense in ((0.0, -1), (depth, 1)):
        for a, b, tint in ((f, f + t, style.LIGHT), (0.0, f, style.FAINT)):
            if b > a:
                paper.fill([(-half, face + sense * a), (half, face + sense * a), (half, face + sense * b), (-half, face + sense * b)],
                           tint, 2.0, line=style.INK)
        for x in (s * row for s in (-1, 1) for row in rows):
            for a, b in ((f + t, f + t + HEAD * d), (-t_f - NUT * d, -t_f)):
                paper.fill([(x - 0.8 * d, face + sense * a), (x + 0.8 * d, face + sense * a), (x + 0.8 * d, face + sense * b),
                            (x - 0.8 * d, face + sense * b)],
                           style.FAINT, 3.0, line=style.INK, weight=style.THIN)
            paper.line([(x, face + sense * (f + t + HEAD * d + paper.pt(3))), (x, face - sense * (t_f + NUT * d + paper.pt(3)))],
                       style.HAIR, style.CENTRE, z=4.0)


def _web_plates(paper, group, depth, behind):
    _, rows, half = _reach(group)
    width, middle = group.joint.plate.width, depth / 2
    corners = [(-half, middle - width / 2), (half, middle - width / 2), (half, middle + width / 2), (-half, middle + width / 2)]
    paper.fill(corners, style.LIGHT, 2.5, gid="plate-body", line=style.INK)
    gap = group.free_length[1] / 2
    lo, hi = (0.0, depth) if behind else (middle - width / 2, middle + width / 2)
    for x in (-gap, gap):
        paper.line([(x, max(lo, middle - width / 2)), (x, min(hi, middle + width / 2))], style.THIN, style.HIDDEN, z=2.6)
    if behind:
        for y in (0.0, depth):
            if abs(y - middle) < width / 2 - 1e-9:
                paper.line([(-half, y), (half, y)], style.THIN, style.HIDDEN, z=2.6)
    for line in lines_of(group.joint.pattern):
        hole = group.joint.pattern[line[0]]
        y = hole.y - group.joint.element.width / 2 + middle
        for side in (-1, 1):
            paper.line([(side * (rows[0] - paper.pt(8)), y), (side * (rows[-1] + paper.pt(8)), y)], style.HAIR, style.CENTRE, z=4.0)
            for row in rows:
                paper.hole(side * row, y, hole.across, hole.across, z=5.0)


def _dimension(paper, splice, depth, high):
    pt, level = paper.pt, high + paper.pt(16 if splice.group("flange") is None else 26)
    for group in splice.groups:
        gap, rows, half = _reach(group)
        stops, texts = grouped([-half, *(-row for row in reversed(rows)), -gap], 2)
        if gap:
            stops, texts = [*stops, gap], [*texts, fraction(2 * gap)]
        y = depth / 2 + (group.joint.plate.width / 2 if group.name == "web" else depth / 2)
        starts = [y + pt(2)] + [None] * (len(stops) - 2) + [depth]
        paper.across(stops, level, starts, texts)
        paper.text(stops[-1] + pt(26), level, {"flange": "flanges", "web": "web" if splice.section else "plates"}[group.name],
                   style.SMALL, middle=True)
        level += pt(16)


def _annotate(paper, connection, x1, heights, depth):
    pt, splice = paper.pt, connection.design
    sign = "Pᵤ" if connection.basis.method == "LRFD" else "Pₐ"
    for side in (-1, 1):
        paper.arrow((side * (x1 + pt(6)), depth / 2), (side * (x1 + pt(40)), depth / 2))
    paper.text(-x1 - pt(24), depth / 2 + pt(6), f"{sign} =", ha="center")
    paper.text(-x1 - pt(24), depth / 2 - pt(13), f"{force(connection.demand.required_tension, ceil_figures)}", ha="center")
    base = heights[0] - pt(26)
    texts = [(-x1, "left", connection.element.member, (-x1 + pt(14), 0.0))]
    for group, place in zip(splice.groups, ((0.0, "center"), (x1, "right")) if len(splice.groups) == 2 else ((x1, "right"),)):
        ply = group.joint.plate
        words = f"{ply.pieces} PL {fraction(ply.t)} x {fraction(ply.width)}"
        half = _reach(group)[2]
        point = (pt(10), -group.joint.t_filler - ply.t / 2) if group.name == "flange" else (half * 0.9, depth / 2 - ply.width / 2 + pt(6))
        texts.append((*place, words, point))
    for x, ha, words, point in texts:
        paper.text(x, base, words, ha=ha)
        wide = pt(style.text_width(words, style.TYPE))
        start = {"left": x, "center": x - wide / 2, "right": x - wide}[ha]
        foot = min(max(point[0], start + pt(6)), start + wide - pt(6))
        paper.leader(point, (foot, base + pt(9)))


def whole(connection):
    """Draw the whole splice from the side, on its web or on the flat member, to scale.

    Parameters
    ----------
    connection : a SpliceConnection.

    Returns
    -------
    figure : style.Figure.
    """
    with style.house():
        drawn = whole_canvas(connection)
        svg, width = style.svg_text(drawn), style.fraction_of_text(drawn)
    said = "; ".join(f"{item.lower()}: {text}" for item, text in connection.designed() if "PL" in text)
    seen = "web" if connection.design.section else "flat"
    caption = (f"The splice seen on the {seen}, to scale; dimensions in inches, rows from the end of the plates to the middle of the joint. "
               f"Bolts {bolt_text(_adapter(connection, connection.design.groups[0]))}, drawn simplified.")
    return style.Figure(svg, caption, f"Both halves of the splice of {connection.element.member}: {said}.", width)


def _box(u0, u1, v0, v1):
    return [(u0, v0), (u1, v0), (u1, v1), (u0, v1)]


def section_canvas(connection):
    """Return the matplotlib Figure of the section at rows of bolts; its axes are in inches of the member."""
    splice, d = connection.design, connection.size.d
    flange, web = splice.group("flange"), splice.group("web")
    parts, bolts = _parts(connection), []
    if flange:
        f, t, t_f = flange.joint.t_filler, flange.joint.plate.t, flange.joint.element.t
        ys = {hole.y for hole in flange.joint.pattern}
        bolts += [(y, face + sense * (f + t), face - sense * t_f, False) for y in ys for face, sense in ((0.0, -1), (splice.section.d, 1))]
    if web:
        t, w, f, two = web.joint.element.t, web.joint.plate.t, web.joint.t_filler, web.joint.plate.n_plies == 2
        low = splice.section.t_f if splice.section else 0.0
        middle = splice.section.b_f / 2 if splice.section else 0.0
        for y in {hole.y for hole in web.joint.pattern}:
            bolts.append((low + y, middle + t / 2 + f + w, middle - t / 2 - (f + w if two else 0.0), True))
    us = [u for _, corners in parts for u, _ in corners]
    vs = [v for _, corners in parts for _, v in corners]
    pad = (HEAD + NUT) * d
    u0, u1, v0, v1 = min(us) - pad, max(us) + pad, min(vs) - pad, max(vs) + pad
    scale = min(WIDEST / (u1 - u0), SECTION_TALLEST / (v1 - v0), SECTION_LARGEST)
    below = 36 if flange else 10
    width, height = (u1 - u0) * scale + 140 / 72, (v1 - v0) * scale + (below + 10) / 72
    figure, pt = style.canvas(width, height), 1 / 72 / scale
    paper = Drawing(figure, (0, 0, width, height), (u0 - 10 * pt, v0 - below * pt), scale)
    if flange:
        ys = [flange.joint.pattern[line[0]].y for line in lines_of(flange.joint.pattern)]
        paper.across([0.0, *ys, splice.section.b_f], v0 - paper.pt(14), [v0 + pad - paper.pt(2)] * (len(ys) + 2))
    tints = {"member": style.SHADE, "filler": style.FAINT}
    for name, corners in parts:
        paper.fill(corners, tints.get(name, style.LIGHT), 2.0, gid=name, line=style.INK)
    for at, first, second, level in bolts:
        _bolt(paper, at, first, second, level, d)
    _label(paper, connection, parts, u1, (v0, v1))
    return figure


def _parts(connection):
    splice = connection.design
    flange, web, shape = splice.group("flange"), splice.group("web"), splice.section
    if shape is None:
        t, width, ply, f = connection.element.t, connection.element.width, web.joint.plate, web.joint.t_filler
        out, lo = [("member", _box(-t / 2, t / 2, 0.0, width))], (width - ply.width) / 2
        sides, centre = ((1, -1) if ply.n_plies == 2 else (1,)), 0.0
    else:
        b, d = shape.b_f, shape.d
        half = shape.t_w / 2
        out = [("member", [(0, 0), (b, 0), (b, shape.t_f), (b / 2 + half, shape.t_f), (b / 2 + half, d - shape.t_f), (b, d - shape.t_f),
                           (b, d), (0, d),
                           (0, d - shape.t_f), (b / 2 - half, d - shape.t_f), (b / 2 - half, shape.t_f), (0, shape.t_f)])]
        if flange:
            ply, f = flange.joint.plate, flange.joint.t_filler
            for face, sense in ((0.0, -1), (d, 1)):
                if f:
                    out.append(("filler", _box((b - ply.width) / 2, (b + ply.width) / 2, face, face + sense * f)))
                out.append(("flange plate", _box((b - ply.width) / 2, (b + ply.width) / 2, face + sense * f, face + sense * (f + ply.t))))
        if web is None:
            return out
        ply, f, t, centre = web.joint.plate, web.joint.t_filler, shape.t_w, b / 2
        lo, sides = (d - ply.width) / 2, ((1, -1) if ply.n_plies == 2 else (1,))
    for sense in sides:
        face = centre + sense * t / 2
        if f:
            out.append(("filler", _box(face, face + sense * f, lo, lo + ply.width)))
        out.append(("web plate", _box(face + sense * f, face + sense * (f + ply.t), lo, lo + ply.width)))
    return out


def _bolt(paper, at, first, second, level, d):
    """A bolt: its shank, its head outside ``first``, its nut outside ``second``."""
    sense = 1 if first > second else -1
    for half, a, b in ((d / 2, second, first), (0.8 * d, first, first + sense * HEAD * d), (0.8 * d, second - sense * NUT * d, second)):
        corners = _box(a, b, at - half, at + half) if level else _box(at - half, at + half, a, b)
        paper.fill(corners, style.FAINT, 4.0, line=style.INK, weight=style.THIN)


def _label(paper, connection, parts, u1, heights):
    pt, splice = paper.pt, connection.design
    words = {"member": connection.element.member}
    for group in splice.groups:
        ply = group.joint.plate
        words["flange plate" if group.name == "flange" else "web plate"] = f"{ply.pieces} PL {fraction(ply.t)} x {fraction(ply.width)}"
        if group.joint.t_filler:
            words["filler"] = f"filler {fraction(group.joint.t_filler)}"
    points = {}
    for name, corners in parts:
        if name in words and name not in points:
            us, vs = [u for u, _ in corners], [v for _, v in corners]
            points[name] = (max(us) - (max(us) - min(us)) * (0.06 if name != "web plate" else 0.5),
                            min(vs) + (max(vs) - min(vs)) * (0.5 if name != "member" else 0.985))
            if name == "web plate":
                points[name] = (points[name][0], min(vs) + 0.08 * (max(vs) - min(vs)))
    order = sorted(points, key=lambda name: points[name][1])
    places = style.spread([points[name][1] for name in order], pt(15), heights[0] + pt(8), heights[1] - pt(8))
    for name, y in zip(order, places):
        paper.leader(points[name], (u1 + pt(8), y))
        paper.line([(u1 + pt(8), y), (u1 + pt(16), y)], style.HAIR, z=8)
        paper.text(u1 + pt(19), y, words[name], middle=True)


def section(connection):
    """Draw the section of the splice at rows of bolts, to scale.

    Returns
    -------
    figure : style.Figure.
    """
    with style.house():
        drawn = section_canvas(connection)
        svg, width = style.svg_text(drawn), style.fraction_of_text(drawn)
    said = "; ".join(f"{group.joint.plate.pieces} plates {fraction(group.joint.plate.t)} by {fraction(group.joint.plate.width, unit=' in')}"
                     for group in connection.design.groups)
    return style.Figure(svg, "Section of the splice at rows of bolts, to scale; fillets of the shape not shown, bolts drawn simplified.",
                        f"Section of {connection.element.member} with {said}.", width)


def _adapter(connection, group):
    """What the elevation of a joint reads, for one group of the splice; its checks as those of member and plate."""
    own = [replace(each, part="member" if "member" in each.id else "plate") for each in connection.checks if each.part == group.name
           and each.kind == "strength"]
    if group.alone:
        own += [each for each in connection.checks if each.id == "member rupture"]
    given = SimpleNamespace(plate_thickness=group.joint.plate.t, plate_width=group.joint.plate.width, plates=group.joint.plate.n_plies,
                            fillers=group.joint.n_fillers)
    governing = next((each for each in own if each.id == connection.governing.id), SimpleNamespace(path=None, id=connection.governing.id))
    return SimpleNamespace(joint=group.joint, inputs=given, basis=connection.basis, demand=connection.demand, size=connection.size,
                           bolt_group=connection.bolt_group, checks=own, governing=governing)


def group_elevations(connection):
    """Draw each group of one half on its connected element, with its weakest path."""
    out = []
    for group in connection.design.groups:
        seen = _adapter(connection, group)
        paths = worst_first([each for each in seen.checks if each.path is not None])
        drawn = joint_elevation(seen, paths[0] if paths else None)
        what = connection.named(group.name).lower()
        out.append(replace(drawn, caption=f"One half of the {what}, the joint towards the right. {drawn.caption}"))
    return tuple(out)
