"""Figures of a gusset: elevation in its plane with the governing path at the brace, and sections through its welded edges."""

import math
from itertools import pairwise

from ...check import worst_first
from ...facts import shapes
from ...figures import style
from ...figures.drafting import Drawing, broken
from ...figures.elevation import bolt_size, described, ratio
from ...geometry import Block
from ...units import ceil_figures, force, fraction

TALLEST, LARGEST = 4.3, 0.3  # [in] of the elevation on paper; scale beyond which a small gusset looks coarse
SECTION_SCALE, FLANGE_SHOWN = 0.62, 3.4  # scale of the sections; [in] of the support shown beside the gusset


def _shown(connection):
    drawn = [check for check in connection.checks if check.path is not None and check.kind == "strength"]
    return next(iter(worst_first(drawn)), None)


def _bounds(design, beam_depth, column):
    """Return (x0, x1, y0, y1) of what is drawn. [in]"""
    place, e = design.layout, design.edges
    xs, ys = [x for x, _ in place.corners], [y for _, y in place.corners]
    size = max(max(xs) - min(xs), max(ys) - min(ys))
    tip = place.at(place.free_end + 0.34 * size)
    if e.column is None:
        return min(xs) - 0.2 * size, max(*xs, tip[0]) + 0.06 * size, -beam_depth, max(*ys, tip[1]) + 0.03 * size
    left = -e.e_c if e.e_c else -column.b_f / 2
    return left - 0.02 * size, max(*xs, tip[0]) + 0.06 * size, -e.e_b - 0.1 * size, max(*ys, tip[1]) + 0.03 * size


def elevation_canvas(connection, check):
    """Return the matplotlib Figure of the elevation; its axes are in inches from the work point."""
    design = connection.design
    beam = shapes.shape(connection.inputs.beam)
    column = shapes.shape(connection.inputs.column) if design.edges.column else None
    x0, x1, y0, y1 = _bounds(design, beam.d, column)
    left, right, below, above = 12, 96, 30, 14
    scale = min((style.TEXT_WIDTH - (left + right) / 72) / (x1 - x0), (TALLEST - (below + above) / 72) / (y1 - y0), LARGEST)
    width, height = (x1 - x0) * scale + (left + right) / 72, (y1 - y0) * scale + (below + above) / 72
    figure = style.canvas(width, height)
    pt = 1 / 72 / scale
    paper = Drawing(figure, (0, 0, width, height), (x0 - left * pt, y0 - below * pt), scale)
    _beam(paper, design, beam, x0, x1)
    if column is not None:
        _column(paper, design, column, y0, y1)
    cover = paper.fill(design.layout.corners, style.LIGHT, 3.0, gid="gusset", line=style.INK)
    _brace(paper, connection)
    if check is not None:
        _path(paper, design, check, cover)
    _welds(paper, design)
    _dimension(paper, design)
    _annotate(paper, connection, x1, (y0, y1))
    return figure


def _beam(paper, design, beam, x0, x1):
    e = design.edges
    start, top = (e.e_c + design.edges.beam.start, e.e_b) if e.column is not None else (x0, 0.0)
    cuts = [broken((x1, top), (x1, top - beam.d), paper.pt(3.5))]
    if e.column is None:
        cuts.append(broken((x0, top), (x0, top - beam.d), paper.pt(3.5)))
    body = [(start, top), *cuts[0], (start, top - beam.d)]
    paper.fill(body, style.PAPER, 1.0)
    for y in (top, top - beam.d, top - beam.t_f, top - beam.d + beam.t_f):
        paper.line([(start, y), (x1, y)], style.OUTLINE if y in (top, top - beam.d) else style.THIN, z=2.0)
    for cut in cuts:
        paper.line(cut, style.THIN, z=2.0)
    if e.column is not None:
        paper.line([(start, top), (start, top - beam.d)], z=2.0)


def _column(paper, design, column, y0, y1):
    e = design.edges
    half = e.e_c or column.t_w / 2
    cuts = [broken((-half, y), (half, y), paper.pt(3.5), upright=False) for y in (y0, y1)]
    paper.fill([*cuts[0], *reversed(cuts[1])], style.PAPER, 1.0)
    for x in (-half, half):
        paper.line([(x, y0), (x, y1)], z=2.0)
    inner = [half - column.t_f] if e.e_c else [column.b_f / 2]
    for x in inner:
        for sense in (-1, 1):
            paper.line([(sense * x, y0), (sense * x, y1)], style.THIN, "-" if e.e_c else style.HIDDEN, z=2.0)
    for cut in cuts:
        paper.line(cut, style.THIN, z=2.0)


def _brace(paper, connection):
    design, place = connection.design, connection.design.layout
    paper.line([(0.0, 0.0), place.at(place.free_end + 0.36 * (place.free_end - place.last) + paper.pt(30))], style.HAIR, style.CENTRE, z=4.0)
    r = paper.pt(2.2)
    paper.hole(0.0, 0.0, 2 * r, 2 * r, weight=style.THIN, z=8.0)
    if design.joint:
        offs = [hole.y - design.axis for hole in design.plate.holes]
        half, inner = max(abs(off) for off in offs) + 1.5, place.last - 1.5
    else:
        half, inner = design.welds.g / 2, place.last
    outer = place.free_end + 0.25 * (place.free_end - place.last) + paper.pt(18)
    corners = [place.at(inner, -half), place.at(outer, -half), place.at(outer, half), place.at(inner, half), place.at(inner, -half)]
    paper.line(corners[3:] + corners[1:2], style.THIN, style.PHANTOM, z=4.0)
    paper.line(corners[2:4], style.THIN, style.PHANTOM, z=4.0)
    if design.joint:
        last = place.last + design.length
        for number, hole in enumerate(design.plate.holes, start=1):
            x, y = place.at(last + hole.x, hole.y - design.axis)
            paper.hole(x, y, hole.across, hole.across, z=6.0, gid=f"hole-{number}")
    else:
        for off in (-half, half):
            _fillet_line(paper, place.at(place.last, off), place.at(place.last + design.length, off))


def _fillet_line(paper, a, b):
    paper.line([a, b], 2.4, colour=style.INK, z=6.0)


def _welds(paper, design):
    e = design.edges
    if e.column is None:
        x = e.offset - e.beam.L / 2
        _fillet_line(paper, (x, 0.0), (x + e.beam.L, 0.0))
        return
    x, y = e.e_c + e.beam.start, e.e_b + e.column.start
    _fillet_line(paper, (x, e.e_b), (x + e.beam.L, e.e_b))
    _fillet_line(paper, (e.e_c, y), (e.e_c, y + e.column.L))


def _path(paper, design, check, cover):
    place, far = design.layout, design.layout.last + design.length

    def spot(x, y):
        return place.at(far - x, y - design.axis)

    path, lo = check.path, design.strip_lo if design.joint else 0.0
    if isinstance(path, Block):
        for line in design.found.lines:
            paper.line([spot(x, y) for x, y in line], style.THIN, style.PHANTOM, style.SOFT, z=3.6, gid="spread", within=cover)
        paper.line([spot(design.found.x_row, y) for y in (design.found.y_lo, design.found.y_hi)], style.THIN, "-", style.SOFT, z=3.6, gid="Whitmore")
        for piece in path.outline:
            paper.fill([spot(-x, y + lo) for x, y in piece], style.SHADE, 3.4).set_clip_path(cover)
        for plane in path.shear:
            paper.line([spot(-plane.x0, plane.y + lo), spot(-plane.x1, plane.y + lo)], style.HEAVY, "-", style.ACCENT, z=6.9,
                       gid="sheared", within=cover)
        for plane in path.tension:
            paper.line([spot(-plane.x0, plane.y0 + lo), spot(-plane.x1, plane.y1 + lo)], style.HEAVY, style.TORN, style.ACCENT, z=6.9,
                       gid="torn", within=cover)
        return
    for line in path.lines:
        paper.line([spot(x, y) for x, y in line], 0.9, style.PHANTOM, style.ACCENT, z=6.8, gid="spread", within=cover)
    paper.line([spot(path.x_row, path.y_lo), spot(path.x_row, path.y_hi)], style.HEAVY, "-", style.ACCENT, z=6.9, gid="torn")


def _dimension(paper, design):
    e, pt = design.edges, paper.pt
    if e.column is None:
        x = e.offset - e.beam.L / 2
        paper.across([x, x + e.beam.L], -pt(26), [-pt(2)] * 2)
        return
    x, y = e.e_c + e.beam.start, e.e_b + e.column.start
    beam, column = [x, x + e.beam.L], [y, y + e.column.L]
    if e.beam.start:
        beam.insert(0, e.e_c)
    if e.column.start:
        column.insert(0, e.e_b)
    paper.across(beam, e.e_b - pt(30), [e.e_b - pt(2)] * len(beam))
    paper.up(column, e.e_c - pt(26), [e.e_c - pt(2)] * len(column))
    if e.e_b * paper.scale * 72 > 40:
        paper.up([0.0, e.e_b], x + e.beam.L + pt(20), [None, None])


def _annotate(paper, connection, x1, heights):
    design, place, pt = connection.design, connection.design.layout, paper.pt
    given, e = connection.inputs, connection.design.edges
    reach = place.free_end + 0.36 * (place.free_end - place.last) + pt(24)
    paper.arrow(place.at(reach), place.at(reach + pt(30)))
    sign = "Pᵤ" if connection.basis.method == "LRFD" else "Pₐ"
    text = f"{sign} = {force(connection.demand.required_tension, ceil_figures)}"
    if connection.demand.required_compression > 0:
        text += f" (−{ceil_figures(connection.demand.required_compression)})"
    (x, y), wide = place.at(reach + pt(10)), pt(style.text_width(text, style.TYPE) + 3)
    x, y = x - pt(12), y + pt(2)
    paper.fill([(x - wide, y - pt(3)), (x + pt(2), y - pt(3)), (x + pt(2), y + pt(8)), (x - wide, y + pt(8))], style.PAPER, 8.5)
    paper.text(x, y, text, ha="right")
    _angle(paper, design, given.brace_angle)
    rows = [(place.at(place.last + 0.15 * design.length, place.half_end * 0.86), f"PL {fraction(given.gusset_thickness)}")]
    if design.joint:
        hole = max(design.plate.holes, key=lambda hole: (hole.y, hole.x))
        size = bolt_size(connection)
        group = connection.bolt_group
        rows.append((place.at(place.last + design.length + hole.x, hole.y - design.axis),
                     f"{design.joint.n_bolts} {size} {group.product or group.name}-{given.threads}"))
    else:
        rows.append((place.at(place.last + 0.7 * design.length, design.welds.g / 2),
                     f"{fraction(design.welds.w_f)} fillet, {design.welds.lines} x {fraction(design.welds.l)}"))
    foot = (e.e_c + e.beam.start + 0.8 * e.beam.L, e.e_b) if e.column else (e.offset + 0.3 * e.beam.L, 0.0)
    rows.append((foot, f"{fraction(e.beam.w_f)} both sides"))
    rows.append(((x1 - pt(10), (e.e_b if e.column else 0.0) - 0.4 * e.beam.support.d), e.beam.support.name))
    rows.sort(key=lambda row: row[0][1])
    places = style.spread([row[0][1] for row in rows], pt(15), heights[0] + pt(8), heights[1] - pt(4))
    for (point, label), y in zip(rows, places):
        paper.line([(x1 + pt(8), y), (x1 + pt(14), y)], style.HAIR, z=8)
        paper.leader(point, (x1 + pt(8), y))
        paper.text(x1 + pt(17), y, label, middle=True)
    if e.column:
        paper.text(0.0, heights[0] - pt(18), e.column.support.name, ha="center")
        y = e.e_b + e.column.start + 0.8 * e.column.L
        paper.text(e.e_c + pt(5) if e.e_c else pt(8), heights[1] - pt(8), f"{fraction(e.column.w_f)} both sides")
        paper.line([(e.e_c + pt(8), heights[1] - pt(10)), (e.e_c, y)], style.HAIR, z=8)


def _angle(paper, design, angle):
    """The angle of the brace at the work point, from the column's axis, or from the edge."""
    first = 0.0 if design.edges.column is None else math.pi / 2 - angle
    radius = paper.pt(30)
    paper.line([(radius * math.cos(first + angle * k / 24), radius * math.sin(first + angle * k / 24)) for k in range(25)], style.THIN, z=7.5)
    if design.edges.column is not None:
        paper.line([(0.0, 0.0), (0.0, radius + paper.pt(6))], style.HAIR, style.CENTRE, z=4.0)
    middle, reach = first + angle / 2, radius + paper.pt(10)
    paper.text(reach * math.cos(middle), reach * math.sin(middle), f"{math.degrees(angle):.4g}°", style.SMALL, "center", middle=True)


def elevation(connection):
    """Draw the gusset in its plane, to scale, with the path of the weakest check at the brace that has one.

    Parameters
    ----------
    connection : a GussetConnection.

    Returns
    -------
    figure : style.Figure.
    """
    check, design, given = _shown(connection), connection.design, connection.inputs
    with style.house():
        drawn = elevation_canvas(connection, check)
        svg, width = style.svg_text(drawn), style.fraction_of_text(drawn)
    held = f"{design.edges.beam.support.name} and {design.edges.column.support.name}" if design.edges.column else design.edges.beam.support.name
    caption = "Elevation in the plane of the gusset, to scale; dimensions in inches; heavy edges are welded. The brace's outline is indicated only; "
    if design.joint:
        gages = sorted({round(hole.y, 6) for hole in design.plate.holes})
        caption += (f"bolts in {len(gages)} line{'s' if len(gages) > 1 else ''}"
                    + (f" {' and '.join(dict.fromkeys(fraction(b - a) for a, b in pairwise(gages)))} apart" if len(gages) > 1 else "")
                    + f", {given.rows} rows" + (f" at {fraction(given.pitch)}" if given.rows > 1 else "")
                    + f", the last row {fraction(given.work_point_distance)} from the work point.")
    else:
        caption += f"welds {fraction(design.welds.g)} apart, their end {fraction(given.work_point_distance)} from the work point."
    caption += f" Thin: Whitmore width of {design.found.L_w:.4g} in." if check is not None and isinstance(check.path, Block) else ""
    alt = (f"Elevation of a gusset {fraction(given.gusset_thickness, unit=' in')} thick between brace {given.brace} and {held}; the brace at "
           f"{math.degrees(given.brace_angle):.4g} degrees.")
    if check is not None:
        what, styles = described(check)
        caption += f" Marked: {check.title[0].lower()}{check.title[1:]}, {what} (D/C {ratio(check)})." + (f" {styles}" if styles else "")
        alt += f" Marked: {check.title}, {what}, D/C {ratio(check)}."
    return style.Figure(svg, caption, alt, width)


def section_canvas(connection):
    """Return the matplotlib Figure of the sections through the edges, beside each other."""
    design = connection.design
    held = [edge for edge in (design.edges.beam, design.edges.column) if edge is not None]
    scale, t = SECTION_SCALE, design.plate.t
    wide, tall = FLANGE_SHOWN * scale + 1.3, (2.2 + max(edge.support.t for edge in held)) * scale + 0.75
    figure = style.canvas(wide * len(held), tall)
    for number, edge in enumerate(held):
        pt, s = 1 / 72 / scale, edge.support
        paper = Drawing(figure, (number * wide, 0, wide, tall), (-FLANGE_SHOWN / 2 - 0.12 / scale, -s.t - 0.42 / scale), scale)
        half = FLANGE_SHOWN / 2
        flange = [*broken((-half, 0.0), (-half, -s.t), paper.pt(3)), *broken((half, -s.t), (half, 0.0), paper.pt(3))]
        paper.fill(flange, style.PAPER, 1.0, line=style.INK, weight=style.THIN)
        paper.line([(-half, 0.0), (half, 0.0)], z=2.0)
        paper.line([(-half, -s.t), (half, -s.t)], z=2.0)
        paper.fill([(-t / 2, 0.0), (t / 2, 0.0), (t / 2, 2.0), (-t / 2, 2.0)], style.SHADE, 2.0, line=style.INK)
        for sense in (-1, 1):
            paper.fill([(sense * t / 2, 0.0), (sense * (t / 2 + edge.w_f), 0.0), (sense * t / 2, edge.w_f)], style.INK, 2.2,
                       gid=f"fillet-{edge.name}-{sense}")
        paper.across([-t / 2, t / 2], 2.0 + pt * 8, [2.0, 2.0], [f"PL {fraction(t)}"])
        paper.up([-s.t, 0.0], half + pt * 16, [half] * 2)
        paper.leader((t / 2 + edge.w_f * 0.35, edge.w_f * 0.35), (t / 2 + 0.75, 1.0))
        paper.text(t / 2 + 0.75 + pt * 3, 1.0, f"{fraction(edge.w_f)} both sides", middle=True)
        paper.text(0.0, -s.t - pt * 20, f"{s.part} of {s.name}", style.TYPE, "center")
    return figure


def edge_section(connection):
    """Draw the sections through the gusset's welded edges, to scale."""
    design = connection.design
    with style.house():
        drawn = section_canvas(connection)
        svg, width = style.svg_text(drawn), style.fraction_of_text(drawn)
    held = [edge for edge in (design.edges.beam, design.edges.column) if edge is not None]
    said = "; ".join(f"fillets of {fraction(edge.w_f, unit=' in')} on both sides to the {edge.support.part} of {edge.support.name}" for edge in held)
    return style.Figure(svg, "Sections through the welded edges, to scale; dimensions in inches.",
                        f"Sections through the edges of the gusset: {said}.", width)
