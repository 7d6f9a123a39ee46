"""Elevation of a hanger along the beam and section across it, drawn to scale from the hanger that is computed."""

from math import cos, sin, tan

from ...figures import style
from ...figures.drafting import Drawing, broken, grouped
from ...figures.section import HEAD
from ...units import ceil_figures, force, fraction, ratio_text

TALLEST, WIDEST, LARGEST = 3.5, 4.4, 0.42
"""Height and width of the drawn part on paper [in], and the scale beyond which a small hanger looks coarse."""

_BELOW, _ABOVE = 3.2, 1.1
"""Hung member shown below the stem [in], and beam's web shown above its fillet, in parts of the depth of the fillet."""


def _axis(h):
    """Return functions from (along the pull from the beam's face, across it) to (x, z) of the drawing."""
    return lambda u, v: (u * sin(h.psi) + v * cos(h.psi), -u * cos(h.psi) + v * sin(h.psi))


def _member(h):
    """Return (u of its end, u where it is broken off, v of its lower and upper edge) of the hung member."""
    part, (length, _) = h.hung.element, h.spread
    last = h.depth_of_last / cos(h.psi)
    foot = h.fitting.depth / cos(h.psi) + _BELOW
    if h.welds:
        return last, foot, -part.width / 2, part.width / 2
    ys = [hole.y for hole in h.lower.pattern]
    middle = (min(ys) + max(ys)) / 2
    end = h.lower.member.end.x0 - length
    return last - end, foot, -middle, part.width - middle


def _size(size):
    return size.name if size.metric else f"{size.name} in"


def _rows(h):
    return [-h.length / 2 + h.e + i * h.s for i in range(h.rows)]


def _canvas(box, margins, largest=LARGEST):
    """Return (figure, Drawing) for a box (x0, z0, x1, z1) of the part with margins (left, below, right, above) in points."""
    x0, z0, x1, z1 = box
    left, below, right, above = margins
    scale = min((WIDEST - left / 72) / (x1 - x0), (TALLEST - (below + above) / 72) / (z1 - z0), largest)
    width, height = (x1 - x0) * scale + (left + right) / 72, (z1 - z0) * scale + (below + above) / 72
    figure = style.canvas(width, height)
    pt = 1 / 72 / scale
    return figure, Drawing(figure, (0, 0, width, height), (x0 - left * pt, z0 - below * pt), scale)


def _labels(paper, items, x, low, high):
    """Set texts in a column at x with leaders to their points; items are (text, point)."""
    pt = paper.pt
    items = sorted(items, key=lambda item: item[1][1])
    places = style.spread([point[1] for _, point in items], pt(14), low, high)
    for (text, point), z in zip(items, places):
        paper.line([(x, z), (x + pt(9), z)], style.HAIR, z=8)
        paper.leader(point, (x, z))
        paper.text(x + pt(11.5), z, text, middle=True)


def _bolt_side(paper, x, h, gid):
    """One bolt to the beam seen from the side: head above the beam's flange, nut below the fitting's."""
    d, top, low = h.bolts.d, h.beam.section.t_f, -h.fitting.t_f
    flats, head, nut, end = HEAD[0] * d + HEAD[1], HEAD[2] * d, HEAD[3] * d, HEAD[4] * d
    for wide, z0, z1 in ((d, low - nut - end, top), (flats, top, top + head), (flats, low - nut, low)):
        paper.fill([(x - wide / 2, z0), (x + wide / 2, z0), (x + wide / 2, z1), (x - wide / 2, z1)], style.FAINT, 6.0, gid=gid, line=style.INK,
                   weight=style.THIN)


def elevation(c):
    """Draw the hanger seen along the beam's web, with where the governing limit state takes place.

    Parameters
    ----------
    c : a hanger connection.
    """
    with style.house():
        drawn = _elevation(c)
        svg, width = style.svg_text(drawn), style.fraction_of_text(drawn)
    h, governs = c.hanger, c.governing
    caption = f"Elevation along the beam, to scale; dimensions in inches. Marked: {governs.title}, governs, D/C = {ratio_text(governs.ratio)}."
    alt = (f"{c.subject}: fitting {fraction(h.length, unit=' in')} long with {h.rows} rows of two bolts; "
           f"the hung member is {c.inputs.joined} to the stem; "
           f"pull {force(h.P, ceil_figures)}. Marked: {governs.title}.")
    return style.Figure(svg, caption, alt, width)


def _elevation(c):
    h, fit, shape = c.hanger, c.fitting, c.beam.section
    at, (end, foot, v0, v1) = _axis(h), _member(h)
    top = min(shape.d / 2, shape.k_des * (1 + _ABOVE) + 1.0)
    corners = [at(foot, v) for v in (v0, v1)]
    x1 = max(h.length / 2 + 1.4, *(x for x, _ in corners))
    x0 = min(-h.length / 2 - 1.4, *(x for x, _ in corners))
    z0 = min(z for _, z in corners)
    figure, paper = _canvas((x0, z0 - 0.5, x1, top), (40, 26, 138, 48))
    pt = paper.pt
    beam = [*broken((x0, 0), (x0, top), pt(3.5), at=0.62), *reversed(broken((x1, 0), (x1, top), pt(3.5), at=0.62))]
    paper.fill(beam, style.PAPER, 1.0)
    for z in (0, shape.t_f):
        paper.line([(x0, z), (x1, z)], style.OUTLINE, z=3)
    for x in (x0, x1):
        paper.line(broken((x, 0), (x, top), pt(3.5), at=0.62), style.THIN, z=3)
    half = h.length / 2
    for z1, z in ((0, -fit.t_f), (-fit.t_f, -fit.depth)):
        paper.fill([(-half, z), (half, z), (half, z1), (-half, z1)], style.LIGHT, 2.0, line=style.INK, gid="fitting")
    last = [at(foot, v) for v in (v0, v1)]
    cut = broken(last[0], last[1], pt(3.5), upright=False, at=0.4) if not h.psi else last
    outline = [at(foot, v0), at(end, v0), at(end, v1), at(foot, v1)]
    # A plate between two angles lies behind the one in front.
    paper.fill([at(end, v0), *cut, at(end, v1)], style.SHADE, 4.0 if fit.tee else 1.5, gid="member")
    paper.line(outline, style.OUTLINE, z=5 if fit.tee else 1.6)
    if not fit.tee:
        paper.line(outline, style.THIN, style.HIDDEN, z=5)
    paper.line(cut, style.THIN, z=5)
    if h.hung.element.series == "2L":
        t = h.hung.element.t
        paper.line([at(end, v0 + t), at(foot, v0 + t)], style.THIN, z=5)
    for x in _rows(h):
        _bolt_side(paper, x, h, "bolt")
        paper.line([(x, shape.t_f + 1.1 * h.bolts.d), (x, -fit.t_f - 1.8 * h.bolts.d)], style.HAIR, style.CENTRE, z=7)
    _stem_joint(paper, c, at)
    paper.line([at(0, 0), at(foot + pt(4), 0)], style.HAIR, style.CENTRE, z=7)
    paper.arrow(at(foot + pt(3), 0), at(foot + pt(24), 0))
    px, pz = at(foot + pt(17), 0)
    off = f", {h.psi * 57.29577951308232:.3g}° off the bolts" if h.psi else ""
    paper.text(px + pt(8), pz, f"P = {force(h.P, ceil_figures)}{off}", style.TYPE, middle=True)
    _mark(paper, c, at)
    _elevation_dimensions(paper, c, at, (x0, top))
    items = [(shape.name, (half + 0.9, shape.t_f / 2)), (fit.name, (half - 0.25, -fit.t_f * 0.5)),
             (c.hung.element.member, at((fit.depth / cos(h.psi) + foot) / 2, v1 * 0.55))]
    product = c.bolt_group.product or c.bolt_group.name
    if h.welds:
        items.append((f"{fraction(h.welds.w_f)} fillets, {fraction(h.welds.length)} long", at(end + 0.45 * h.welds.length, v1)))
    else:
        count, size = h.lower.n_bolts, c.sizes[1]
        corner = at(end + c.inputs.member_end, max(hole.y for hole in h.lower.pattern) + v0)
        items.append((f"{count} bolts {_size(size)} {product}-{c.inputs.lower_threads}", corner))
    items.append((f"{h.n} bolts {_size(c.sizes[0])} {product}-{c.inputs.threads}", (_rows(h)[-1], shape.t_f + 0.4 * h.bolts.d)))
    _labels(paper, items, x1 + pt(12), z0, top - pt(6))
    return figure


def _stem_joint(paper, c, at):
    h, (end, _, v0, v1) = c.hanger, _member(c.hanger)
    if h.welds:
        for v in (v0, v1):
            paper.line([at(end, v), at(end + h.welds.length, v)], style.HEAVY + 0.8, z=6.5, gid="weld")
        return
    first = end + c.inputs.member_end
    for hole in h.lower.pattern:
        x, z = at(first + h.lower.length - hole.x, hole.y + v0)
        paper.hole(x, z, h.lower.member.hole.across, h.lower.member.hole.across)


def _mark(paper, c, at):
    """Draw where the governing limit state takes place."""
    h, fit, shape, id = c.hanger, c.fitting, c.beam.section, c.governing.id
    _, _, v0, v1 = _member(h)
    (length, apart), half = h.spread, h.length / 2
    last = h.depth_of_last / cos(h.psi)
    red = {"weight": style.HEAVY, "colour": style.ACCENT, "z": 8.5, "gid": "path"}

    def lines(*paths, dash="-"):
        for path in paths:
            paper.line(path, dash=dash, **red)

    if id in ("Whitmore yielding", "Whitmore rupture"):
        reach = apart / 2 + length * tan(0.5235987755982988)
        low, high = (min(reach, edge) for edge in h.edges)
        lines([at(last + length, -apart / 2), at(last, -low), at(last, high), at(last + length, apart / 2)], dash=style.TORN)
    elif id in ("member rupture", "member yielding"):
        lines([at(last + length, v0), at(last + length, v1)], dash=style.TORN)
    elif id in ("welds", "member weld yielding", "member weld rupture", "stem weld yielding", "stem weld rupture"):
        lines(*([at(last, v), at(last + length, v)] for v in (-apart / 2, apart / 2)))
    elif id in ("stem block", "member block"):
        lines([at(last + length, -apart / 2), at(last, -apart / 2)], [at(last, apart / 2), at(last + length, apart / 2)])
        lines([at(last, -apart / 2), at(last, apart / 2)], dash=style.TORN)
    elif id.startswith("stem bolts"):
        for hole in h.lower.pattern:
            x, z = at(last + length - hole.x, hole.y + v0)
            lines([(x - 0.3, z), (x + 0.3, z)])
    elif id in ("stem yielding", "stem rupture"):
        z = -fit.k if h.psi or h.welds or id == "stem yielding" else -h.depth_of_last
        lines([(-half, z), (half, z)], dash=style.TORN)
    elif id == "web yielding":
        reach = (h.rows - 1) * h.s / 2 + 2.5 * shape.k_des
        lines([(-reach, shape.k_des), (reach, shape.k_des)], dash=style.TORN)
    elif id.startswith(("beam", "fitting")) and "shear" in id:
        lines([(-half, 0), (half, 0)])
    else:
        for x in _rows(h):
            lines([(x, shape.t_f), (x, -fit.t_f)])


def _elevation_dimensions(paper, c, at, corner):
    h, fit, pt = c.hanger, c.fitting, paper.pt
    x0, top = corner
    half = h.length / 2
    stops, texts = grouped([-half, *_rows(h), half], 3)
    level = top + pt(12)
    starts = [0.0 if x in (stops[0], stops[-1]) else c.beam.section.t_f + HEAD[2] * h.bolts.d for x in stops]
    paper.across(stops, level, starts, texts)
    paper.across([-half, half], level + pt(18), [0.0, 0.0])
    if h.psi:
        paper.up([-fit.depth, 0.0], x0 - pt(14), [-half, -half])
        return
    last = -h.depth_of_last
    low = last - h.spread[0]
    chain = [low, last, 0.0] if h.welds else [-fit.depth, low, last, 0.0]
    if h.welds and low > -fit.depth + 1e-9:
        chain.insert(0, -fit.depth)
    v = _member(h)[2]
    chain = [value for i, value in enumerate(chain) if not i or value > chain[i - 1] + 1e-9]
    paper.up(chain, x0 - pt(2), [-half if value in (0.0, -fit.depth) else v for value in chain])
    paper.up([-fit.depth, 0.0], x0 - pt(20), [-half, -half])


def section(c):
    """Draw the hanger cut across the beam at a row of bolts.

    Parameters
    ----------
    c : a hanger connection.
    """
    with style.house():
        drawn = _section(c)
        svg, width = style.svg_text(drawn), style.fraction_of_text(drawn)
    h = c.hanger
    caption = (f"Section across the beam at a row of bolts, to scale; dimensions in inches. {c.fitting.name} below {c.beam.section.name}; "
               "bolts drawn simplified.")
    alt = (f"Section: the bottom flange of {c.beam.section.name}, {fraction(c.beam.section.b_f, unit=' in')} wide, above {c.fitting.name}, "
           f"{fraction(c.fitting.width, unit=' in')} wide; gage {fraction(h.g, unit=' in')}; {c.hung.element.member} at the stem.")
    return style.Figure(svg, caption, alt, width)


def _box(x0, x1, z0, z1):
    return [(x0, z0), (x1, z0), (x1, z1), (x0, z1)]


def _section(c):
    h, fit, shape, part = c.hanger, c.fitting, c.beam.section, c.hung.element
    top = min(shape.d / 2, shape.k_des * (1 + _ABOVE) + 1.0)
    wide = max(fit.width, shape.b_f) / 2
    low = -fit.depth - 1.6
    figure, paper = _canvas((-wide, low, wide, top), (30, 12, 128, 42))
    pt = paper.pt
    paper.fill(_box(-shape.b_f / 2, shape.b_f / 2, 0, shape.t_f), style.PAPER, 2.0, line=style.INK, gid="beam")
    web = broken((-shape.t_w / 2, top), (shape.t_w / 2, top), pt(2), upright=False, at=0.5)
    paper.fill([(-shape.t_w / 2, shape.t_f), *web, (shape.t_w / 2, shape.t_f)], style.PAPER, 2.0)
    for x in (-shape.t_w / 2, shape.t_w / 2):
        paper.line([(x, shape.t_f), (x, top)], style.OUTLINE, z=3)
    if fit.tee:
        paper.fill(_box(-fit.width / 2, fit.width / 2, -fit.t_f, 0), style.LIGHT, 2.0, line=style.INK, gid="fitting")
        paper.fill(_box(-fit.t_s / 2, fit.t_s / 2, -fit.depth, -fit.t_f), style.LIGHT, 2.1, line=style.INK, gid="stem")
    else:
        for sense in (-1, 1):
            inner, leg, out = sense * fit.gap / 2, sense * (fit.gap / 2 + fit.t_s), sense * fit.width / 2
            paper.fill([(inner, 0), (out, 0), (out, -fit.t_f), (leg, -fit.t_f), (leg, -fit.depth), (inner, -fit.depth)], style.LIGHT, 2.0,
                       line=style.INK, gid="angle")
    tip = _hung_section(paper, c)
    d = h.bolts.d
    flats, head, nut, end = HEAD[0] * d + HEAD[1], HEAD[2] * d, HEAD[3] * d, HEAD[4] * d
    for x in (-h.g / 2, h.g / 2):
        for half, z0, z1 in ((d / 2, -fit.t_f - nut - end, shape.t_f), (flats / 2, shape.t_f, shape.t_f + head),
                             (flats / 2, -fit.t_f - nut, -fit.t_f)):
            paper.fill(_box(x - half, x + half, z0, z1), style.FAINT, 4.0, line=style.INK, weight=style.THIN, gid="bolt")
        paper.line([(x, shape.t_f + head + pt(8)), (x, -fit.t_f - nut - end - pt(6))], style.HAIR, style.CENTRE, z=6)
    level = top + pt(10)
    narrow, broad = sorted(((fit.width / 2, 0.0), (shape.b_f / 2, shape.t_f)))
    paper.across([-narrow[0], -h.g / 2, h.g / 2, narrow[0]], level, [narrow[1], shape.t_f + head, shape.t_f + head, narrow[1]])
    if broad[0] > narrow[0] + 1e-9:
        paper.across([-broad[0], broad[0]], level + pt(17), [broad[1]] * 2)
    paper.up([-fit.t_f, 0.0, shape.t_f], -wide - pt(12), [-fit.width / 2, -min(fit.width, shape.b_f) / 2, -shape.b_f / 2])
    items = [(shape.name, (shape.b_f / 2 - 0.2, shape.t_f / 2)), (fit.name, (fit.width / 2 - 0.2, -fit.t_f / 2)), (part.member, tip),
             (f"{_size(c.sizes[0])} bolts, gage {fraction(h.g)}", (h.g / 2 + 0.3 * flats, shape.t_f + head / 2))]
    _labels(paper, items, wide + pt(10), low, top - pt(4))
    return figure


def _hung_section(paper, c):
    """Draw the hung member beside or between the stem; return a point in it."""
    h, fit, part = c.hanger, c.fitting, c.hung.element
    end = -_member(h)[0] * cos(h.psi)
    low = -fit.depth - 1.6
    if not fit.tee:
        x0 = -part.t / 2
        paper.fill(_box(x0, x0 + part.t, low, end), style.SHADE, 3.0, line=style.INK, gid="member")
        return 0.0, low + 0.5
    face = fit.t_s / 2
    if part.series == "PL":
        paper.fill(_box(face, face + part.t, low, end), style.SHADE, 3.0, line=style.INK, gid="member")
        return face + part.t / 2, low + 0.5
    other = part.section.single.b_long + part.section.single.b_short - part.width
    for sense in (-1, 1):
        paper.fill(_box(sense * face, sense * (face + part.t), low, end), style.SHADE, 3.0, line=style.INK, gid="member")
        paper.fill(_box(sense * (face + part.t), sense * (face + other), low, end), style.PAPER, 2.9, line=style.INK, weight=style.THIN,
                   gid="outstanding")
    return face + 0.6 * other, low + 0.5
