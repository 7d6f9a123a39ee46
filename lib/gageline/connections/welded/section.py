"""Cross-section of a welded end through its longitudinal welds, from the dimensions of the shape, the plates and the fillets."""

from ...figures import section as outlines
from ...figures import style
from ...figures.drafting import Drawing
from ...units import fraction

WIDEST, TALLEST = 4.0, 2.6  # [in] of drawing and dimensions on paper


def _solids(end):
    """Return (name, corners (u, v)) of everything cut; u along the plate's width, v through the thickness. [in]"""
    part, shape, t, t_p = end.element, end.element.section, end.member.t, end.plate.t
    p0, p1 = end.plate_lo, end.plate_lo + end.plate.width

    def box(v0, v1):
        return [(p0, v0), (p1, v0), (p1, v1), (p0, v1)]

    if part.series == "2L":
        single = shape.single
        other = single.b_long + single.b_short - part.width
        one = [(u, v + t_p / 2) for u, v in outlines._angle(part.width, other, t, max((single.k_des or 0) - t, 0.0))]
        return [("plate", box(-t_p / 2, t_p / 2)), ("member", one), ("member", [(u, -v) for u, v in one])]
    r = max((getattr(shape, "k_des", None) or 0) - (getattr(shape, "t_f", None) or 0), 0.0)
    if part.name == "plate":
        member = [(0, 0), (part.width, 0), (part.width, t), (0, t)]
    elif part.joints == 2:
        member = outlines._wide_flange(shape, r)
    elif part.name == "flange":
        member = outlines._tee(shape, shape.d, r)
    else:
        member, _ = outlines._upright_member(part, shape)
    out = [("member", member), ("plate", box(-t_p, 0.0))]
    if end.plate.pieces == 2:
        far = shape.d if part.joints == 2 else t
        out.append(("plate", box(far, far + t_p)))
    return out


def _fillets(end):
    """Return corners (u, v) of every longitudinal fillet in section. [in]"""
    w, t_p, out = end.w_f, end.plate.t, []
    if not end.sided:
        return []
    faces = {"2L": [(t_p / 2, 1), (-t_p / 2, -1)]}.get(end.element.series, [(0.0, 1)])
    if end.plate.pieces == 2:
        faces = [(0.0, 1), (end.element.section.d if end.element.joints == 2 else end.member.t, -1)]
    for face, sense in faces:
        sense = -sense if end.on_plate else sense
        out += [[(y, face), (y + outward * w, face), (y, face + sense * w)] for y, outward in ((end.y_1, -1), (end.y_2, 1))]
    return out


def section_canvas(connection):
    """Return the matplotlib Figure of the cross-section; its axes are in inches of the parts."""
    end = connection.end
    upright = end.element.name not in ("plate", "flange")

    def at(u, v):
        return (v, u) if upright else (u, v)

    solids = [(name, [at(*corner) for corner in corners]) for name, corners in _solids(end)]
    xs, ys = [x for _, corners in solids for x, _ in corners], [y for _, corners in solids for _, y in corners]
    x0, x1, y0, y1 = min(xs), max(xs), min(ys), max(ys)
    labels = {"member": end.element.member, "plate": f"PL {fraction(end.plate.t)} x {fraction(end.plate.width)}",
              "weld": f"fillet {fraction(end.w_f)}"}
    wordy = max(style.text_width(text, style.TYPE) for text in labels.values()) + 34
    left, below, above = 46, 42, 14
    scale = min((WIDEST - left / 72) / (x1 - x0), (TALLEST - (below + above) / 72) / (y1 - y0), 0.5)
    width, height = (x1 - x0) * scale + (left + wordy) / 72, (y1 - y0) * scale + (below + above) / 72
    figure, pt = style.canvas(width, height), 1 / 72 / scale
    paper = Drawing(figure, (0, 0, width, height), (x0 - left * pt, y0 - below * pt), scale)
    tints = {"member": style.SHADE, "plate": style.LIGHT}
    for k, (name, corners) in enumerate(solids):
        paper.fill(corners, tints[name], 2.0, gid=f"{name}-{k}", line=style.INK)
    fillets = [[at(*corner) for corner in corners] for corners in _fillets(end)]
    for k, corners in enumerate(fillets, start=1):
        paper.fill(corners, style.INK, 3.0, gid=f"weld-{k}")
    p0, p1 = end.plate_lo, end.plate_lo + end.plate.width
    stops = sorted({p0, end.y_1, end.y_2, p1})
    stops = [u for i, u in enumerate(stops) if not i or u - stops[i - 1] > 1e-6]
    v = sorted({round(v, 6) for name, corners in _solids(end) if name == "plate" for _, v in corners})[:2]
    if upright:
        paper.up(stops, x0 - pt * 16, [x0] * len(stops))
        paper.across(v, y0 - pt * 16, [p0] * 2)
    else:
        paper.across(stops, y0 - pt * 16, [y0] * len(stops))
        paper.up(v, x0 - pt * 16, [p0] * 2)
    _label(paper, at, end, labels, solids, fillets, (x1, y0, y1))
    return figure


def _label(paper, at, end, labels, solids, fillets, box):
    pt, (x1, y0, y1) = paper.pt, box
    plate = next(corners for name, corners in solids if name == "plate")
    member = [corners for name, corners in solids if name == "member"]
    centre = (sum(x for x, _ in plate) / 4, sum(y for _, y in plate) / 4)
    far = max(x for x, _ in plate)
    points = {"plate": (centre[0], max(y for _, y in plate) - 0.08 * end.plate.width) if end.element.name not in ("plate", "flange")
              else (far - 0.05 * end.plate.width, centre[1])}
    t = end.member.t
    shown = (end.element.width * 0.75, t / 2)
    if end.element.name == "flange":
        shown = (end.element.width / 2, end.element.section.d * 0.6)
    if end.element.series == "2L":
        shown = (shown[0], end.plate.t / 2 + t / 2)
    points["member"] = at(*shown) if member else (x1, y1)
    if fillets:
        corner = max(fillets, key=lambda corners: (round(sum(y for _, y in corners), 6), sum(x for x, _ in corners)))
        points["weld"] = (sum(x for x, _ in corner) / 3, sum(y for _, y in corner) / 3)
    order = sorted(points, key=lambda name: points[name][1])
    places = style.spread([points[name][1] for name in order], pt(14), y0 + pt(4), y1 - pt(2))
    for name, y in zip(order, places):
        elbow = x1 + pt(20)
        paper.line([(x1 + pt(10), y), (elbow, y)], style.HAIR, z=8)
        paper.leader(points[name], (x1 + pt(10), y))
        paper.text(elbow + pt(2.5), y, labels[name], middle=True)


def cross_section(connection):
    """Draw the section of the connection through its longitudinal welds, to scale."""
    end = connection.end
    with style.house():
        drawn = section_canvas(connection)
        svg, width = style.svg_text(drawn), style.fraction_of_text(drawn)
    count = f"{end.plate.pieces} plates" if end.plate.pieces > 1 else "a plate"
    plate = f"{count} {fraction(end.plate.t)} x {fraction(end.plate.width, unit=' in')}"
    where = "through the longitudinal welds" if end.sided else "of the lapped parts, between the welds across"
    return style.Figure(svg, f"Cross-section {where}, to scale; dimensions in inches, fillets black.",
                        f"Cross-section of {end.element.member} welded by its {end.element.name} to {plate}.", width)

