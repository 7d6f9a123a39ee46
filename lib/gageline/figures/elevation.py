"""Elevation of a connection on the connected element, drawn from the joint that is computed, and what tears or ruptures in it."""

import math
from itertools import pairwise

from ..check import worst_first
from ..geometry import Block, Chain, lines_of
from ..units import ceil_figures, drawn_in_si, force, fraction, ratio_text
from . import style
from .drafting import Drawing, broken, grouped
from .scene import trace, view

TALLEST = 2.7  # [in] of an elevation on paper: a figure, its caption and some text fit one sheet
LARGEST = 0.38  # scale beyond which a small pattern looks coarse


def draw(paper, seen, path, numbers=True):
    """Draw member, plate, holes and the Trace of a path on a Drawing."""
    plate_first = path is not None and path.part == "plate"
    bodies = {"member": _member_body(paper, seen), "plate": _plate_body(paper, seen)}
    back, front = ("member", "plate") if plate_first else ("plate", "member")
    paper.fill(bodies[back][0], style.PAPER, 1.0)
    _edges(paper, bodies[back][1:], 1.2)
    cover = paper.fill(bodies[front][0], style.LIGHT, 2.0, gid=f"{front}-body")
    _edges(paper, bodies[back][1:], 2.2, hidden_by=cover)
    _edges(paper, bodies[front][1:], 4.0)
    if seen.unfolded is not None:
        corners = [(seen.left, seen.lo), (seen.left, seen.unfolded), (seen.end, seen.unfolded), (seen.end, seen.lo)]
        paper.line(corners, style.THIN, style.PHANTOM, z=3)
    _holes(paper, seen, front, numbers)
    if path is not None:
        _path(paper, path, cover)


def _member_body(paper, seen):
    cut = broken((seen.left, seen.lo), (seen.left, seen.hi), paper.pt(3.5))
    body = [*cut, (seen.end, seen.hi), (seen.end, seen.lo)]
    outline = [[(seen.left, seen.lo), (seen.end, seen.lo), (seen.end, seen.hi), (seen.left, seen.hi)]]
    return body, outline, [cut], [[(seen.left, y), (seen.end, y)] for y in seen.features]


def _plate_body(paper, seen):
    lo, hi, amplitude = seen.shown_lo, seen.shown_hi, paper.pt(3.5)
    edge_lo, edge_hi = seen.free_edge(lo), seen.free_edge(hi)
    right = [(seen.right, lo), (seen.right, hi)] if seen.support else broken((seen.right, lo), (seen.right, hi), amplitude, at=0.73)
    below = [(edge_lo, lo), (seen.right, lo)]
    above = [(seen.right, hi), (edge_hi, hi)]
    outline, cuts = [[(edge_lo, lo), (edge_hi, hi)]], [] if seen.support else [right]
    if lo > seen.plate_lo + 1e-9:
        below = broken(*below, amplitude, upright=False, at=0.8)
        cuts.append(below)
    else:
        outline.append(below)
    if hi < seen.plate_hi - 1e-9:
        above = broken(*above, amplitude, upright=False, at=0.2)
        cuts.append(above)
    else:
        outline.append(above)
    return [*below, *right[1:-1], *above], outline, cuts, []


def _edges(paper, lines, z, hidden_by=None):
    outline, cuts, features = lines
    for corners in outline:
        paper.line(corners, style.THIN if hidden_by else style.OUTLINE, style.HIDDEN if hidden_by else "-", z=z, within=hidden_by)
    for corners in features:
        paper.line(corners, style.THIN, style.HIDDEN if hidden_by else "-", z=z, within=hidden_by)
    for corners in cuts:
        if not hidden_by:
            paper.line(corners, style.THIN, z=z)


def _holes(paper, seen, front, numbers):
    joint = seen.joint
    at_front, at_back = (joint.plate, joint.member) if front == "plate" else (joint.member, joint.plate)
    alike = at_front.kind == at_back.kind
    pattern = joint.pattern
    xs = [hole.x for hole in pattern]
    for line in lines_of(pattern):
        y, past = pattern[line[0]].y, paper.pt(9)
        paper.line([(min(xs) - past, y), (max(xs) + past, y)], style.HAIR, style.CENTRE, z=5)
    numbered = _numbered(paper, joint) if numbers else ()
    for i, bolt in enumerate(pattern):
        hole, other = at_front.bolted[i], at_back.bolted[i]
        paper.hole(bolt.x, bolt.y, hole.across, hole.along, gid=f"hole-{i + 1}")
        if not alike:
            paper.hole(bolt.x, bolt.y, other.across, other.along, fill=None, dash=style.HIDDEN, weight=style.THIN, z=6.1)
        if at_front.kind != "STD":
            paper.hole(bolt.x, bolt.y, joint.bolts.d, joint.bolts.d, fill=style.FAINT, weight=style.THIN, z=6.2)
        reach = paper.pt(2.0)
        wide, tall = hole.along / 2 + reach, hole.across / 2 + reach
        paper.line([(bolt.x - wide, bolt.y), (bolt.x + wide, bolt.y)], style.HAIR, z=6.5)
        paper.line([(bolt.x, bolt.y - tall), (bolt.x, bolt.y + tall)], style.HAIR, z=6.5)
        if i in numbered:
            off = 0.36 * min(hole.across, hole.along)
            paper.text(bolt.x + max(off, hole.along / 2 - 0.2 * hole.across) + paper.pt(1.6), bolt.y + max(off, hole.across / 2 - 0.2 * hole.along)
                       + paper.pt(1.2), str(joint.numbers[i]), style.TINY, z=8.5)
    for hole in joint.member.holes:
        if not hole.bolted:
            paper.hole(hole.x, hole.y, hole.across, hole.along)
            reach = hole.along / 2 + paper.pt(2.0)
            paper.line([(hole.x - reach, hole.y), (hole.x + reach, hole.y)], style.HAIR, z=6.5)
            paper.line([(hole.x, hole.y - reach), (hole.x, hole.y + reach)], style.HAIR, z=6.5)
    if numbers and seen.unfolded is not None:
        paper.text(seen.left + paper.pt(22), seen.unfolded + paper.pt(4), "unfolded leg, open holes", style.TINY)


def _numbered(paper, joint):
    """Indices of the bolts that there is room to number: all, or the first and the last of each line."""
    lines = lines_of(joint.pattern)
    spaces = [joint.pattern[b].x - joint.pattern[a].x for line in lines for a, b in pairwise(line)]
    room = min(spaces, default=math.inf) / paper.pt()
    ys = [joint.pattern[line[0]].y for line in lines]
    if min((b - a for a, b in pairwise(ys)), default=math.inf) < paper.pt(2 * style.TINY):
        return ()
    if room >= joint.member.hole.along / 2 / paper.pt() + 4 + style.text_width(str(joint.n_bolts), style.TINY):
        return range(len(joint.pattern))
    return {i for line in lines for i in (line[0], line[-1])}


def _path(paper, path, cover):
    # Only a plate can reach beyond what is drawn of it; clipping the member's lines would halve those along its edges.
    within = cover if path.part == "plate" else None
    for k, piece in enumerate(path.pieces, start=1):
        paper.fill(piece, style.SHADE, 2.6, gid=f"block-{k}").set_clip_path(within)
    for line in path.spread:
        paper.line(line, 0.9, style.PHANTOM, style.ACCENT, z=6.8, gid="spread", within=within)
    for line in path.torn:
        paper.line(line, style.HEAVY, style.TORN if path.pieces else "-", style.ACCENT, z=6.9, gid="torn", within=within)
    for line in path.shear:
        paper.line(line, style.HEAVY, "-", style.ACCENT, z=6.9, gid="sheared", within=within)


def _fit(seen, left, right, below, above, widest, tallest):
    """Scale at which a View with margins in points fits a width and a height. [in]"""
    x0, x1 = seen.wide
    return min((widest - (left + right) / 72) / (x1 - x0), (tallest - (below + above) / 72) / (seen.top - seen.bottom), LARGEST)


def _chains(seen):
    """(stops, texts, starts) of the chain along the load, and of the chains across it: member, member in all, plate, plate in all."""
    joint = seen.joint
    xs = sorted({round(hole.x, 6) for hole in joint.pattern})
    along = [seen.free_edge(seen.axis), *xs, seen.end]
    ys = [joint.pattern[line[0]].y for line in lines_of(joint.pattern)]
    member, plate = [seen.lo, *ys, seen.hi], [seen.plate_lo, ys[0], ys[-1], seen.plate_hi]
    up = [(*grouped(member, 3), seen.end), ([seen.lo, seen.hi], None, seen.end)]
    whole = seen.shown_lo == seen.plate_lo and seen.shown_hi == seen.plate_hi
    if whole and (abs(seen.plate_lo - seen.lo) > 1e-6 or abs(seen.plate_hi - seen.hi) > 1e-6):
        up += [(sorted(set(plate)), None, seen.right), ([seen.plate_lo, seen.plate_hi], None, seen.right)]
    return grouped(along), up


def shown_check(connection):
    """Return the check an elevation shows: the governing one if it has a path, else the member's path with the largest ratio."""
    if connection.governing.path is not None:
        return connection.governing
    drawn = [check for check in connection.checks if check.path is not None and check.kind == "strength"]
    return next(iter(worst_first([check for check in drawn if check.part == "member"]) or worst_first(drawn)), None)


def elevation_canvas(connection, check=None):
    """Return the matplotlib Figure of an elevation; its first axes are in the joint's own inches.

    Parameters
    ----------
    connection : a bolted connection.
    check : the Check whose path is shaded; by default ``shown_check``.
    """
    joint = connection.joint
    path = None if check is None or check.path is None else trace(joint, check)
    seen = view(joint, path)
    (along, texts), up = _chains(seen)
    force = _force(connection)
    left = max(style.text_width(line, style.TYPE) for line in force) + 14
    right, above, below = 15 * len(up) + 10, 40 if joint.length else 24, 32 if not seen.support else 48
    for _ in range(2):  # the texts that do not fit their space, and so the margins, depend on the scale
        scale = _fit(seen, left, right, below, above, style.TEXT_WIDTH, TALLEST)
        x0, x1 = seen.wide
        paper_at = Drawing.measure(scale)
        rows = [paper_at.rows(stops, words) for stops, words, _ in up]
        right = sum(15 + 8 * (n - 1) for n in rows) + 8
        above = (40 if joint.length else 24) + 8 * (paper_at.rows(along, texts) - 1)
    width, height = (x1 - x0) * scale + (left + right) / 72, (seen.top - seen.bottom) * scale + (below + above) / 72
    figure = style.canvas(width, height)
    pt = 1 / 72 / scale
    paper = Drawing(figure, (0, 0, width, height), (x0 - left * pt, seen.bottom - below * pt), scale)
    draw(paper, seen, path)
    _dimension(paper, seen, along, texts, up, rows)
    _annotate(paper, seen, connection, force)
    return figure


def _dimension(paper, seen, along, texts, up, rows):
    joint, pt = seen.joint, paper.pt
    level = seen.top + pt(13)
    starts = []
    for k, stop in enumerate(along):
        if k == 0:
            skewed = joint.plate.end.slope != 0.0
            starts.append(seen.axis if skewed else seen.shown_hi)
        elif k == len(along) - 1:
            starts.append(seen.hi)
        else:
            at = [hole for hole in joint.pattern if abs(hole.x - stop) < 1e-5]
            starts.append(max(hole.y + hole.across / 2 for hole in at) + pt(1))
    paper.across(along, level, starts, texts)
    if joint.length:
        first, last = min(h.x for h in joint.pattern), max(h.x for h in joint.pattern)
        level += pt(15 + 8 * (paper.rows(along, texts) - 1))
        paper.across([first, last], level, [level - pt(12)] * 2, [f"l = {fraction(last - first)}"])
    x = seen.wide[1]
    for k, ((stops, words, start), n) in enumerate(zip(up, rows)):
        x += pt(15 + 8 * (n - 1))
        begin = [start] * len(stops)
        if k == 0:
            outer = {line_y: max(h.x + h.along / 2 for h in joint.pattern if abs(h.y - line_y) < 1e-5) + pt(7) for line_y in stops[1:-1]}
            begin = [start, *(outer[y] for y in stops[1:-1]), start]
        elif k == 1 or k == 3:
            begin = [x - pt(11)] * 2
        elif k == 2:
            begin = [start if y in (seen.plate_lo, seen.plate_hi) else x - pt(11) for y in stops]
        paper.up(stops, x, begin, words)
    if seen.support:
        last = max(h.x for h in joint.pattern)
        level = seen.bottom - pt(15)
        low = min(h.y - h.across / 2 for h in joint.pattern if abs(h.x - last) < 1e-5)
        paper.across([last, seen.support], level, [low - pt(1), seen.shown_lo], [f"{fraction(seen.support - last)} to the support"])


def _annotate(paper, seen, connection, force):
    pt, joint = paper.pt, seen.joint
    y, x = seen.axis, seen.left - pt(7)
    x = min(x, seen.wide[0] + pt(2)) if seen.wide[0] < seen.left else x
    tail, head = x, x - pt(40)
    paper.arrow((tail, y), (head, y))
    paper.text((tail + head) / 2 - pt(2), y + pt(5), force[0], ha="center")
    if len(force) > 1:
        paper.text((tail + head) / 2 - pt(2), y - pt(12), force[1], ha="center")
    if seen.support:
        paper.line([(seen.support, seen.shown_lo), (seen.support, seen.shown_hi)], 1.6, z=4.5)
        step, at = pt(6), seen.shown_lo
        while at < seen.shown_hi - pt(1):
            rise = min(step * 0.8, seen.shown_hi - at)
            paper.line([(seen.support, at), (seen.support + rise, at + rise)], style.HAIR, z=4.5)
            at += step
    if joint.plate.end.slope:
        _skew(paper, seen)
    base = seen.bottom - pt(22 if not seen.support else 38)
    _labels(paper, seen, connection, base)


def _skew(paper, seen):
    """The angle between the load and the free edge, in the plate's corner where that angle lies inside the plate."""
    slope = seen.joint.plate.end.slope
    angle = math.degrees(math.atan2(1.0, slope))
    corner = (seen.free_edge(seen.shown_hi), seen.shown_hi)
    radius = paper.pt(20)
    arc = [(corner[0] + radius * math.cos(a), corner[1] - radius * math.sin(a)) for a in
           (math.radians(angle) * k / 24 for k in range(25))]
    paper.line(arc, style.THIN, z=4.4)
    half = math.radians(angle / 2)
    reach = paper.pt(31)
    paper.text(corner[0] + reach * math.cos(half), corner[1] - reach * math.sin(half), f"{angle:.4g}°", style.SMALL, "center", middle=True)


def _labels(paper, seen, connection, base):
    joint, pt = seen.joint, paper.pt
    given = connection.inputs
    plate = f"PL {fraction(given.plate_thickness)} x {fraction(given.plate_width)}"
    if given.plates == 2:
        plate = f"2 {plate}, near one not shown"
    elif seen.shown_lo > seen.plate_lo or seen.shown_hi < seen.plate_hi:
        plate += ", broken off"
    bolts = f"{joint.n_bolts} bolt{'s' if joint.n_bolts > 1 else ''} {bolt_text(connection)}"
    low = _pointed_at(joint)
    texts = [(seen.left, "left", joint.element.member), (None, "center", bolts), (seen.wide[1], "right", plate)]
    wide = [pt(style.text_width(text, style.TYPE)) for _, _, text in texts]
    member_x = seen.left + min(wide[0] / 2, pt(14))
    start, stop = seen.left - pt(6), seen.wide[1] + pt(4)
    edge = paper.axes.get_xlim()[1] - pt(2)
    if start + wide[0] + pt(12) + wide[2] > edge:  # no room for what is not shown; the section shows it
        plate = plate.partition(",")[0]
        wide[2] = pt(style.text_width(plate, style.TYPE))
    for said in (bolts, f"{joint.n_bolts} bolt{'s' if joint.n_bolts > 1 else ''}"):
        wide[1] = pt(style.text_width(said, style.TYPE))
        ends = start + wide[0] + wide[1] + wide[2] + pt(28)
        if fits := ends <= edge:
            stop = max(stop, ends)
            break
    centre = min(max(low.x, start + wide[0] + pt(14) + wide[1] / 2), stop - wide[2] - pt(14) - wide[1] / 2)
    paper.text(start, base, texts[0][2])
    paper.line([(member_x, base + pt(8)), (member_x, seen.lo)], style.HAIR, z=4.6)
    plate_x = stop - min(wide[2] / 2, pt(14))
    foot = seen.shown_lo
    paper.text(max(stop, start + wide[0] + pt(12) + wide[2]), base, plate, ha="right")
    paper.line([(plate_x, base + pt(8)), (min(plate_x, seen.right - pt(3)), foot)], style.HAIR, z=4.6)
    if fits:
        paper.text(centre, base, said, ha="center")
        r = joint.member.hole.across / 2
        paper.line([(low.x + (0.3 * (centre - low.x) if centre != low.x else 0), base + pt(8)), (low.x, low.y - r - pt(2.5))], style.HAIR, z=4.6)


def _pointed_at(joint):
    """The bolt of the lowest line that a leader from below reaches best: near the middle, over no open hole."""
    line = lines_of(joint.pattern)[0]
    bolts = [joint.pattern[i] for i in line]
    barred = [hole.x for hole in joint.member.holes if not hole.bolted]
    free = [bolt for bolt in bolts if all(abs(bolt.x - x) > bolt.along for x in barred)] or bolts
    return min(free, key=lambda bolt: (abs(bolt.x - (bolts[0].x + bolts[-1].x) / 2), bolt.x))


def bolt_size(connection):
    """Return the size of the bolts, in fractions of an inch or as metric."""
    size = connection.size
    if size.metric:
        return size.name
    # An inch bolt keeps its name: 22.2 mm would be taken for M22.
    return f"{size.name} in" if drawn_in_si() else fraction(size.d, unit=" in")


def bolt_text(connection):
    """Return size, kind and threads of the bolts as a drawing calls them."""
    group = connection.bolt_group
    return f"{bolt_size(connection)} {group.product or group.name}-{connection.joint.bolts.threads}"


def _force(connection):
    sign = "Pᵤ" if connection.basis.method == "LRFD" else "Pₐ"
    demand = connection.demand
    lines = [f"{sign} = {force(demand.required_tension, ceil_figures)}"]
    if demand.required_compression > 0:
        lines.append(f"(−{force(demand.required_compression, ceil_figures)})")
    return lines


def ratio(check):
    """Return D/C as printed."""
    return ratio_text(check.ratio) if math.isfinite(check.ratio) else "unlimited, no strength"


def described(check):
    """Return (what is shaded, in words; what the line styles mean) of a check's path."""
    path = check.path
    if isinstance(path, Block):
        return f"tear-out block, {path.label}", "Heavy lines: sheared solid, torn dashed."
    if isinstance(path, Chain):
        n, kind = len(path.holes), "zigzag" if path.zigzags else "straight"
        ahead = f", {path.n_ahead} of {path.n_total} bolts on its load side" if path.n_ahead else ""
        return f"{kind} chain of {n} hole{'s' if n > 1 else ''}{ahead}", ""
    return f"Whitmore width of {path.L_w:.4g} in, spread at 30°", ""


def elevation(connection, check=None):
    """Draw the connection on its connected element, to scale, with the path of one check.

    Parameters
    ----------
    connection : a bolted connection.
    check : the Check whose path is shaded; by default the governing one if it has a path, else the member's weakest path.

    Returns
    -------
    figure : style.Figure.
    """
    check = check or shown_check(connection)
    with style.house():
        drawn = elevation_canvas(connection, check)
        svg, width = style.svg_text(drawn), style.fraction_of_text(drawn)
    joint, element = connection.joint, connection.joint.element
    seen_from = {"flange": " seen from the side of the " + ("stem" if element.joints == 1 else "web, one of two alike")}.get(element.name, "")
    caption = f"Elevation on the {element.name}{seen_from}, to scale; dimensions in inches."
    given, n, lines = connection.inputs, len(joint.pattern), joint.n_lines
    alt = (f"Elevation of {element.member}, bolted by {n} bolt{'s' if n > 1 else ''} {bolt_size(connection)} in {lines} gage line"
           f"{'s' if lines > 1 else ''}, length {fraction(joint.length, unit=' in')}, to a plate "
           f"{fraction(given.plate_thickness, unit=' in')} thick and "
           f"{fraction(given.plate_width, unit=' in')} wide.")
    if check is not None and check.path is not None:
        what, styles = described(check)
        verb = "Shaded" if isinstance(check.path, Block) else "Heavy line"
        governs = ", which governs" if check.id == connection.governing.id else ""
        caption += f" {verb}: {check.title[0].lower()}{check.title[1:]}, {what} (D/C {ratio(check)}{governs})." + (f" {styles}" if styles else "")
        alt += f" Marked: {check.title}, {what}, D/C {ratio(check)}."
    return style.Figure(svg, caption, alt, width)
