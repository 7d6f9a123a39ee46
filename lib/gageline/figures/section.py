"""Cross-section of a connection at one row of bolts, drawn from the dimensions of the shape, the plates and the bolts."""

from dataclasses import dataclass
from math import cos, pi, sin

from ..geometry import lines_of
from ..units import fraction
from . import style
from .drafting import Drawing, grouped
from .elevation import bolt_text
from .scene import outline, plate_lo

WIDEST, TALLEST, LARGEST = 2.2, 2.4, 0.5  # [in], [in] of drawing and dimensions on paper; scale

HEAD = (1.5, 0.125, 0.625, 0.98, 0.3)
"""Heavy hex bolt, about, for drawing only: width across flats 1.5 d + 1/8 in, height of head and of nut, and end of the thread
beyond the nut as parts of d. From memory; no strength depends on it."""


@dataclass(frozen=True)
class Stack:
    """What one bolt passes, in section: u across the load within the element, v through the thickness. [in]

    Parameters
    ----------
    bodies : (name, corners) of everything cut, name "member", "plate" or "filler".
    grips : (v_0, v_1) of each bolt group. plies : (hole's width, v_0, v_1) of everything that has a hole.
    lo, hi : the member's outline in u. upright : whether u is drawn upwards.
    faces : v of the faces of one stack, for its dimensions. depth : (v_0, v_1) of the whole member.
    tip : a point in the member to label it at.
    """

    bodies: tuple
    grips: tuple
    plies: tuple
    lo: float
    hi: float
    upright: bool
    faces: tuple
    depth: tuple
    tip: tuple

    def at(self, u, v):
        """Return (x, y) on paper."""
        return (v, u) if self.upright else (u, v)


def _fillet(corner, one, other, r):
    """Arc of radius r in a re-entrant corner, from the edge along ``one`` to the edge along ``other``."""
    cx, cy = corner[0] + r * (one[0] + other[0]), corner[1] + r * (one[1] + other[1])
    if r <= 0:
        return [corner]
    return [(cx - r * (cos(a) * other[0] + sin(a) * one[0]), cy - r * (cos(a) * other[1] + sin(a) * one[1]))
            for a in (pi / 2 * k / 6 for k in range(7))]


def _tee(shape, depth, r):
    mid, half = shape.b_f / 2, shape.t_w / 2
    right = _fillet((mid + half, shape.t_f), (1, 0), (0, 1), r)
    left = [(2 * mid - x, y) for x, y in reversed(right)]
    return [(0, 0), (2 * mid, 0), (2 * mid, shape.t_f), *right, (mid + half, depth), (mid - half, depth), *left, (0, shape.t_f)]


def _wide_flange(shape, r):
    low = _fillet(((shape.b_f + shape.t_w) / 2, shape.t_f), (1, 0), (0, 1), r)
    right = [(shape.b_f, 0), (shape.b_f, shape.t_f), *low]
    right += [(x, shape.d - y) for x, y in reversed(right)]
    return [*right, *((shape.b_f - x, y) for x, y in reversed(right))]


def _channel(shape, r):
    low = _fillet((shape.t_w, shape.t_f), (1, 0), (0, 1), r)
    high = [(x, shape.d - y) for x, y in reversed(low)]
    return [(0, 0), (shape.b_f, 0), (shape.b_f, shape.t_f), *low, *high, (shape.b_f, shape.d - shape.t_f), (shape.b_f, shape.d), (0, shape.d)]


def _angle(leg, other, t, r):
    return [(0, 0), (leg, 0), (leg, t), *_fillet((t, t), (1, 0), (0, 1), r), (t, other), (0, other)]


def stack(joint):
    """Return the Stack of a joint."""
    element, shape, t, t_p, f = joint.element, joint.element.section, joint.element.t, joint.plate.t, joint.t_filler
    lo, hi = outline(element)
    p0 = plate_lo(joint)
    p1 = p0 + joint.plate.width
    across, plate_across = joint.member.hole.across, joint.plate.hole.across
    two = joint.plate.n_plies == 2
    if element.plies == 2:
        return _double_angle(joint, p0, p1)
    if element.name == "plate":
        member, depth, tip = [(0, 0), (hi, 0), (hi, t), (0, t)], t, (hi - min(0.3, hi / 8), t / 2)
    elif element.joints == 2:
        member, depth, tip = _wide_flange(shape, max((shape.k_des or 0) - shape.t_f, 0.0)), shape.d, (hi / 2, shape.d * 0.5)
    elif element.name == "flange":
        member, depth, tip = _tee(shape, shape.d, max((shape.k_des or 0) - shape.t_f, 0.0)), shape.d, (hi / 2, shape.d * 0.7)
    else:
        member, tip = _upright_member(element, shape)
        depth = None
    faces, bodies, plies = [0.0, t], [("member", tuple(member))], [(across, 0.0, t)]
    sides = [(-1, 0.0)] + ([(1, t)] if two else [])
    for sense, face in sides:
        out, far = face + sense * f, face + sense * (f + t_p)
        spans = [(p0, p1)]
        if two and sense > 0 and element.name == "flange":
            clear = shape.t_w / 2 + max((shape.k_des or 0) - shape.t_f, 0.0)
            spans = [(p0, hi / 2 - clear), (hi / 2 + clear, p1)]
        bodies += [("plate", _box(a, b, out, far)) for a, b in spans]
        plies.append((plate_across, out, far))
        if f:
            bodies.append(("filler", _box(*_filler_span(joint), face, out)))
            plies.append((plate_across, face, out))
            faces.append(out)
        faces.append(far)
    low, high = min(faces), max(faces)
    grips = [(low, high)]
    if element.joints == 2:
        d = shape.d
        bodies += [(name, tuple((u, d - v) for u, v in corners)) for name, corners in bodies[1:]]
        plies += [(wide, d - a, d - b) for wide, a, b in plies]
        grips.append((d - low, d - high))
    vs = [v for _, v in member]
    upright = element.name not in ("plate", "flange")
    return Stack(tuple(bodies), tuple(grips), tuple(plies), lo, hi, upright, tuple(sorted(faces)),
                 (min(vs), max(vs)) if depth is None else (0.0, depth), tip)


def _box(a, b, v0, v1):
    return ((a, v0), (b, v0), (b, v1), (a, v1))


def _filler_span(joint):
    ys = [hole.y for hole in joint.pattern]
    return min(ys) - 1.75 * joint.bolts.d, max(ys) + 1.75 * joint.bolts.d


def _upright_member(element, shape):
    r = max((shape.k_des or 0) - (shape.t_f or shape.t or 0), 0.0)
    if element.name == "stem":
        corners = [(y - shape.t_f, x - shape.b_f / 2 + shape.t_w / 2) for x, y in _tee(shape, shape.d, r)]
        return corners, (-shape.t_f / 2, shape.b_f * 0.4)
    if element.name == "web" and element.series in ("C", "MC"):
        corners = [(y - shape.t_f, x) for x, y in _channel(shape, r)]
        return corners, (element.width + shape.t_f / 2, shape.b_f * 0.85)
    if element.name == "web":
        corners = [(y - shape.t_f, x - shape.b_f / 2 + shape.t_w / 2) for x, y in _wide_flange(shape, r)]
        return corners, (element.width + shape.t_f / 2, shape.b_f * 0.4)
    other = shape.b_long + shape.b_short - element.width
    return _angle(element.width, other, shape.t, r), (shape.t / 2, other * 0.85)


def _double_angle(joint, p0, p1):
    element, single, t, t_p, f = joint.element, joint.element.section.single, joint.element.t, joint.plate.t, joint.t_filler
    other = single.b_long + single.b_short - element.width
    face = t_p / 2 + f
    one = [(u, v + face) for u, v in _angle(element.width, other, t, max((single.k_des or 0) - t, 0.0))]
    bodies = [("member", tuple(one)), ("member", tuple((u, -v) for u, v in one)), ("plate", _box(p0, p1, -t_p / 2, t_p / 2))]
    plies = [(joint.plate.hole.across, -t_p / 2, t_p / 2)]
    faces = [-face - t, -t_p / 2, t_p / 2, face + t]
    for sense in (-1, 1):
        plies.append((joint.member.hole.across, sense * face, sense * (face + t)))
        if f:
            bodies.append(("filler", _box(*_filler_span(joint), sense * t_p / 2, sense * face)))
            plies.append((joint.member.hole.across, sense * t_p / 2, sense * face))
            faces += [sense * face]
    return Stack(tuple(bodies), ((-face - t, face + t),), tuple(plies), 0.0, element.width, True, tuple(sorted(faces)),
                 (-face - other, face + other), (t / 2, face + other * 0.85))


def _row(joint):
    """y of the bolts of the row with most of them, the first of such rows."""
    xs = sorted({round(hole.x, 6) for hole in joint.pattern})
    rows = [[hole.y for hole in joint.pattern if abs(hole.x - x) < 1e-5] for x in xs]
    return max(rows, key=len)


def section_canvas(connection):
    """Return the matplotlib Figure of the cross-section; its axes are in inches of the part."""
    joint = connection.joint
    cut, d, row = stack(joint), joint.bolts.d, _row(joint)
    flats, head, nut, end = HEAD[0] * d + HEAD[1], HEAD[2] * d, HEAD[3] * d, HEAD[4] * d
    solid = [cut.at(*corner) for _, corners in cut.bodies for corner in corners]
    solid += [cut.at(row[0], v + (nut + end if v == max(grip) else -nut - end)) for grip in cut.grips for v in grip]
    x0, x1 = min(x for x, _ in solid), max(x for x, _ in solid)
    y0, y1 = min(y for _, y in solid), max(y for _, y in solid)
    labels = _texts(connection)
    wordy = max(style.text_width(text, style.TYPE) for text in labels.values()) + 34
    left = below = 46
    for _ in range(2):  # texts that do not fit their space, and so the margins, depend on the scale
        scale = min((WIDEST - left / 72) / (x1 - x0), (TALLEST - below / 72) / (y1 - y0), LARGEST)
        more = 8 * (Drawing.measure(scale).rows(_plies(cut)) - 1)
        left, below = (46, 46 + more) if cut.upright else (46 + more, 46)
    width, height = (x1 - x0) * scale + (left + wordy) / 72, (y1 - y0) * scale + (below + 14) / 72
    pt = 1 / 72 / scale
    figure = style.canvas(width, height)
    paper = Drawing(figure, (0, 0, width, height), (x0 - left * pt, y0 - below * pt), scale)
    tints = {"member": style.SHADE, "plate": style.LIGHT, "filler": style.FAINT}
    for k, (name, corners) in enumerate(cut.bodies):
        paper.fill([cut.at(*corner) for corner in corners], tints[name], 2.0, gid=f"{name}-{k}", line=style.INK)
    for y in row:
        for wide, v0, v1 in cut.plies:
            paper.fill([cut.at(*corner) for corner in _box(y - wide / 2, y + wide / 2, v0, v1)], style.PAPER, 3.0, line=style.INK, weight=style.THIN)
        for k, grip in enumerate(cut.grips):
            _bolt(paper, cut, y, grip, d, (flats, head, nut, end), f"bolt-{k}")
    for line in lines_of(joint.pattern):
        y = joint.pattern[line[0]].y
        for a, b in cut.grips:
            v0, v1 = min(a, b) - nut - end - paper.pt(3), max(a, b) + nut + end + paper.pt(3)
            paper.line([cut.at(y, v0), cut.at(y, v1)], style.HAIR, style.CENTRE, z=6)
    _dimension(paper, cut, joint, (x0, y0), nut + end)
    _label(paper, cut, connection, labels, x1, (y0, y1))
    return figure


def _bolt(paper, cut, u, grip, d, sizes, gid):
    """A bolt with its head outside the first face of its grip and its nut outside the second."""
    flats, head, nut, end = sizes
    first, second = grip
    sense = 1.0 if second > first else -1.0
    parts = [(d, first, second + sense * (nut + end), style.FAINT), (flats, first - sense * head, first, style.FAINT),
             (flats, second, second + sense * nut, style.FAINT)]
    for wide, v0, v1, tint in parts:
        paper.fill([cut.at(*corner) for corner in _box(u - wide / 2, u + wide / 2, v0, v1)], tint, 4.0, line=style.INK, weight=style.THIN, gid=gid)


def _dimension(paper, cut, joint, corner, past):
    pt, low = paper.pt, min(cut.faces)
    ys = [joint.pattern[line[0]].y for line in lines_of(joint.pattern)]
    p0 = plate_lo(joint)
    p1 = p0 + joint.plate.width
    stops, texts = grouped([cut.lo, *ys, cut.hi], 3)
    edges = cut.depth[0] if cut.upright else 0.0
    chains = [(stops, [edges if u in (cut.lo, cut.hi) else low - past for u in stops], texts), ([p0, p1], [low] * 2, None)]
    if p1 - p0 < cut.hi - cut.lo - 1e-9:
        chains.reverse()
    up, across = (chains, _through(cut)) if cut.upright else (_through(cut), chains)
    if cut.upright:
        across[0] = (across[0][0], [cut.lo] * len(_plies(cut)), None)
        across[1:] = [(ends, [cut.lo] * 2, None) for ends, _, _ in across[1:]]
    else:
        up[0] = (up[0][0], [min(p0, 0.0)] * len(_plies(cut)), None)
    for chains, corner_at, draw in ((up, corner[0], paper.up), (across, corner[1], paper.across)):
        at = corner_at - pt(14)
        for ends, starts, words in chains:
            at -= pt(8 * (paper.rows(ends, words) - 1)) if draw == paper.across else 0.0
            draw(ends, at, starts, words)
            at -= pt(16)


def _plies(cut):
    return cut.faces if len(cut.faces) <= 4 else (cut.faces[0], cut.faces[-1])


def _through(cut):
    """Chains through the thickness: the plies of a stack, or where fillers crowd them the grip; the depth of the member where it is more."""
    out = [(list(_plies(cut)), None, None)]
    if cut.depth[1] - cut.depth[0] > max(cut.faces) - min(cut.faces) or cut.depth[1] > max(cut.faces) + 1e-9:
        out.append((list(cut.depth), [0.0] * 2, None))
    return out


def _texts(connection):
    joint, given = connection.joint, connection.inputs
    count = f"{joint.plate.pieces} " if joint.plate.pieces > 1 else ""
    out = {"member": joint.element.member, "plate": f"{count}PL {fraction(joint.plate.t)} x {fraction(joint.plate.width)}",
           "bolt": bolt_text(connection)}
    if joint.t_filler:
        each = " each" if joint.bolts.n_s > 1 else ""
        several = given.fillers > 1 or joint.bolts.n_s > 1
        out["filler"] = f"filler{'s' if several else ''} {fraction(joint.t_filler)}{each}"
    return out


def _label(paper, cut, connection, labels, x1, heights):
    joint, pt = connection.joint, paper.pt
    ys = _row(joint)
    p0 = plate_lo(joint)
    plates = [corners for name, corners in cut.bodies if name == "plate"]
    plate = max(plates, key=lambda corners: corners[0][1]) if cut.upright else plates[0]
    v_plate = sum(v for _, v in plate) / 4
    second = cut.grips[0][1]
    flats = HEAD[0] * joint.bolts.d + HEAD[1]
    if cut.upright:
        u_plate = max(u for u, _ in plate) - 0.06 * joint.plate.width
        points = {"member": cut.tip, "plate": (u_plate, v_plate), "bolt": (ys[-1], second + 0.5 * HEAD[3] * joint.bolts.d)}
    else:
        u_plate = p0 + joint.plate.width - 0.04 * joint.plate.width
        points = {"member": cut.tip, "plate": (u_plate, v_plate), "bolt": (ys[-1] + 0.3 * flats, second + 0.5 * HEAD[3] * joint.bolts.d)}
    if "filler" in labels:
        filler = next(corners for name, corners in cut.bodies if name == "filler")
        points["filler"] = (filler[1][0] - 0.1, sum(v for _, v in filler) / 4)
    order = sorted(labels, key=lambda name: cut.at(*points[name])[1])
    wanted = [cut.at(*points[name])[1] for name in order]
    places = style.spread(wanted, pt(14), heights[0] + pt(4), heights[1] - pt(2))
    for name, y in zip(order, places):
        x, py = cut.at(*points[name])
        elbow = x1 + pt(20)
        paper.line([(x1 + pt(10), y), (elbow, y)], style.HAIR, z=8)
        paper.leader((x, py), (x1 + pt(10), y))
        paper.text(elbow + pt(2.5), y, labels[name], middle=True)


def cross_section(connection):
    """Draw the section of the connection at one row of bolts, to scale.

    Parameters
    ----------
    connection : a bolted connection.

    Returns
    -------
    figure : style.Figure.
    """
    with style.house():
        drawn = section_canvas(connection)
        svg, width = style.svg_text(drawn), style.fraction_of_text(drawn)
    joint, labels = connection.joint, _texts(connection)
    low, high = stack(joint).grips[0]
    n = len(_row(joint))
    caption = f"Cross-section at a row of bolts, to scale; dimensions in inches. {labels['member']}, {labels['plate']}; bolts drawn simplified."
    alt = (f"Cross-section of {labels['member']} bolted through the {joint.element.name} to {labels['plate']} with bolts {labels['bolt']}; "
           f"{n} bolt{'s' if n > 1 else ''} in the row, grip {abs(high - low):.4g} in.")
    return style.Figure(svg, caption, alt, width)
