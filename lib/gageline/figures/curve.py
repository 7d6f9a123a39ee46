"""Diagrams: strength against connection length, and the loads that the connection still permits."""

from dataclasses import replace

import numpy as np

from ..loads import permissible_region
from ..units import ceil_figures, floor_figures, force, fraction, shown_as
from . import style

LABELS = {
    "member yielding": "member, yielding", "member rupture": "member, net rupture", "member block": "member, block shear",
    "bolt shear": "bolts, shear", "bolts member": "bolts, member holes", "bolts plate": "bolts, plate holes", "slip": "bolts, slip",
    "plate yielding": "plate, yielding", "plate rupture": "plate, net rupture", "Whitmore yielding": "Whitmore, yielding",
    "Whitmore rupture": "Whitmore, rupture", "plate block": "plate, block shear",
}
"""Limit state -> how it is called beside its curve."""

LOOKS = (
    ("-", "o"), ((0, (7, 2)), "s"), ((0, (7, 2, 1.2, 2)), "^"), ((0, (1.2, 1.6)), "D"), ((0, (3, 1.5)), "v"), ((0, (3, 1.5, 1, 1.5)), "<"),
    ("-", "x"), ((0, (10, 3)), "+"), ((0, (2, 4)), "1"), ((0, (12, 2, 2, 2)), "2"), ((0, (5, 4)), ">"), ((0, (5, 1.5, 1, 1.5, 1, 1.5)), "P"),
)
"""(dash pattern, marker) of the limit states in their order, so that no two look alike in print; slip, the last, is not in every joint."""

DROPPED = 0.5  # of the largest demand: combinations below it are counted, not drawn
MOST_DEMANDS = 4
SIZE, LEFT, RIGHT, BOTTOM, TOP = (6.6, 3.45), 0.56, 2.02, 0.5, 0.44  # [in]


def capacity_canvas(connection, curve):
    """Return the matplotlib Figure of a capacity curve; the lines of its axes carry the ids of the limit states as gid.

    Parameters
    ----------
    connection : a bolted connection. curve : its study.Curve.
    """
    curve, (kip, _) = _in_units(curve, connection), shown_as("kip", connection.basis.units_system)
    figure = style.canvas(*SIZE)
    axes = figure.add_axes((LEFT / SIZE[0], BOTTOM / SIZE[1], (SIZE[0] - LEFT - RIGHT) / SIZE[0], (SIZE[1] - BOTTOM - TOP) / SIZE[1]))
    demands, rest = _demands(curve)
    x_low, x_high, y_high = _limits(curve, demands)
    axes.set_xlim(x_low, x_high)
    axes.set_ylim(0, y_high)
    _frame(axes, connection, curve)
    ends = []  # (y wanted for the label, text, colour, sample line)
    for k, (id, strengths) in enumerate(sorted(curve.strengths.items(), key=lambda item: item[0] == "slip")):
        dash, marker = LOOKS[k % len(LOOKS)]
        look = {"color": style.SOFT, "lw": 0.9, "ls": dash}
        if curve.sweep.marks:  # a continuous sweep has no points to mark
            look |= {"marker": marker, "ms": 3.4, "mew": 0.7, "mfc": style.PAPER}
        axes.plot(curve.lengths, strengths, zorder=3, gid=id, **look)
        ends.append((float(strengths[-1]), LABELS.get(id, id), style.INK, look))
    if curve.stretched_lengths.size:
        axes.plot(curve.stretched_lengths, curve.stretched_envelope, color=style.INK, lw=0.7, zorder=4, gid="stretched envelope")
    axes.plot(curve.lengths, curve.envelope, color=style.INK, lw=2.3, zorder=5, gid="envelope", solid_joinstyle="round")
    for text, value in demands:
        governs = value == demands[0][1]
        look = {"color": style.ACCENT, "lw": 1.4 if governs else 0.8}
        axes.plot([x_low, x_high], [value, value], zorder=4.5, gid="demand", **look)
        ends.append((value, _demand_label(_loads(text), f" = {ceil_figures(value)} {kip}"), style.ACCENT, look))
    _labels(axes, ends, x_low, x_high, y_high)
    _not_drawn(axes, rest, x_low, x_high, y_high, kip)
    _design(axes, connection, curve, demands, (x_low, x_high, y_high))
    return figure


def _in_units(curve, connection):
    """Return the curve with its lengths and forces as the project prints them."""
    system = connection.basis.units_system
    (inch, by), (_, times) = shown_as("in", system), shown_as("kip", system)
    if system != "SI":
        return curve
    label = f"{curve.sweep.label.removesuffix(', in')}, {inch}"
    return replace(curve, lengths=curve.lengths * by, strengths={id: values * times for id, values in curve.strengths.items()},
                   stretched_lengths=curve.stretched_lengths * by,
                   stretched={id: values * times for id, values in curve.stretched.items()},
                   demands=tuple((text, value * times) for text, value in curve.demands), sweep=replace(curve.sweep, label=label))


def _loads(text):
    """Return natures of loads as they are printed; W′ is the wind in the opposite sense."""
    return text.replace("W_opposite", "W′").replace("W_opp", "W′").replace("Ω_0", "Ω₀").replace("S_DS", "SDS").replace("Q_E", "QE")


def _demand_label(text, value):
    """Return a combination with its value; its last terms are left out where the column of labels is too narrow for them."""
    kept, more = text, ""
    while style.text_width(kept + more + value, style.SMALL) > RIGHT * 72 - 37:
        cut = max(kept.rfind(" + "), kept.rfind(" − "))
        if cut <= max(kept.rfind(")"), 0):
            break
        kept, more = kept[:cut], " + …"
    return kept + more + value


def _demands(curve):
    """(text, value) of the combinations that are drawn, largest first, and the values of those that are not. [kip]"""
    shown, seen, rest = [], set(), []
    for text, value in curve.demands:
        key = round(value, 6)
        if key in seen:
            continue
        seen.add(key)
        if value >= DROPPED * curve.demands[0][1] and len(shown) < MOST_DEMANDS:
            shown.append((text, value))
        else:
            rest.append(value)
    return shown, rest


def _not_drawn(axes, rest, x_low, x_high, y_high, kip):
    if not rest:
        return
    across, up = (x_high - x_low) / ((SIZE[0] - LEFT - RIGHT) * 72), y_high / ((SIZE[1] - BOTTOM - TOP) * 72)
    lines = (f"{len(rest)} further combination{'s' if len(rest) > 1 else ''},", f"at most {ceil_figures(max(rest))} {kip}, not drawn")
    for k, line in enumerate(lines):
        axes.text(x_high + 15 * across, (-25 - 9 * k) * up, line, fontsize=style.TINY, va="baseline", color=style.SOFT, clip_on=False)


def _limits(curve, demands):
    x_low, x_high = float(curve.lengths[0]), float(curve.lengths[-1])
    if curve.stretched_lengths.size:
        x_low = min(x_low, float(curve.stretched_lengths[0]))
    tallest = max(float(max(values)) for values in curve.strengths.values())
    # What governs fills half of the height at least; strengths far above it leave the frame, and their labels say so.
    useful = 2.1 * max(float(curve.envelope.max()), demands[0][1])
    pad = 0.03 * (x_high - x_low)
    return x_low - pad, x_high + pad, min(1.06 * tallest, useful)


def _frame(axes, connection, curve):
    from matplotlib.ticker import MaxNLocator

    sign = "ϕRₙ" if connection.basis.method == "LRFD" else "Rₙ/Ω"
    axes.set_xlabel(curve.sweep.label, fontsize=style.TYPE, labelpad=3)
    axes.set_ylabel(f"available strength {sign}, {shown_as('kip', connection.basis.units_system)[0]}", fontsize=style.TYPE, labelpad=4)
    axes.yaxis.set_major_locator(MaxNLocator(6, steps=[1, 2, 2.5, 5, 10]))
    axes.xaxis.set_major_locator(MaxNLocator(9, steps=[1, 2, 3, 6, 10]))
    axes.tick_params(labelsize=style.SMALL, width=0.6, length=3, pad=2.5)
    axes.ticklabel_format(style="plain", useOffset=False)
    axes.grid(axis="y", lw=0.3, color=style.FAINT)
    axes.set_axisbelow(True)
    axes.spines["right"].set_visible(False)
    if not curve.sweep.marks:
        axes.spines["top"].set_visible(False)
        return
    texts, common = _shortened(curve.sweep.marks)
    above = axes.secondary_xaxis("top")
    room = (SIZE[0] - LEFT - RIGHT) * 72 / (max(style.text_width(text, style.SMALL) for text in texts) + 9)
    step, start = max(1, -int(-len(texts) // room)), curve.sweep.design or 0
    kept = [k for k in range(len(texts)) if (k - start) % step == 0]
    above.set_xticks([float(curve.lengths[k]) for k in kept], [texts[k] for k in kept])
    above.tick_params(labelsize=style.SMALL, width=0.6, length=3, pad=2)
    above.spines["top"].set_linewidth(0.6)
    above.set_xlabel(common, fontsize=style.TYPE, labelpad=4)


def _shortened(marks):
    """Return the texts of the marks without the word they all end in, and that word.

    >>> _shortened(("1 rows", "2 rows"))
    (['1', '2'], 'rows')
    """
    split = [mark.rpartition(" ") for mark in marks]
    words = {word for _, _, word in split}
    if len(words) == 1 and all(number for number, _, _ in split):
        return [number for number, _, _ in split], words.pop()
    return list(marks), ""


def _labels(axes, ends, x_low, x_high, y_high):
    """Set the labels in one column right of the frame, in the order of the curves' ends, with a sample of each line."""
    per_pt = y_high / ((SIZE[1] - BOTTOM - TOP) * 72)
    across = (x_high - x_low) / ((SIZE[0] - LEFT - RIGHT) * 72)
    order = sorted(range(len(ends)), key=lambda k: (min(ends[k][0], y_high), ends[k][0], -k))
    wanted = [min(ends[k][0], y_high) for k in order]
    places = style.spread(wanted, 10.4 * per_pt, -12 * per_pt, y_high + 16 * per_pt)
    for k, y in zip(order, places):
        value, text, colour, look = ends[k]
        if value > y_high:
            text = f"{text} (↑ {floor_figures(value)})"
        start = x_high if colour == style.ACCENT else x_high - 0.03 / 1.06 * (x_high - x_low)
        end_y = min(value, y_high)
        axes.plot([start, x_high + 4 * across, x_high + 15 * across], [end_y, end_y, y] if value <= y_high else [y_high, y_high, y],
                  lw=0.35, color=style.SOFT if colour == style.INK else colour, clip_on=False, zorder=2, gid="to-label")
        middle = {"markevery": [1]} if "marker" in look else {}
        axes.plot([x_high + (15 + 9 * j) * across for j in range(3)], [y] * 3, clip_on=False, zorder=3, gid="sample", **middle, **look)
        axes.text(x_high + 37 * across, y - 0.3 * style.SMALL * per_pt, text, fontsize=style.SMALL, va="baseline", color=colour, clip_on=False)


def _design(axes, connection, curve, demands, limits):
    """Mark the design on the envelope and say what it is where the fewest lines pass."""
    at = curve.sweep.design
    if at is None:
        return
    x, y = float(curve.lengths[at]), float(curve.envelope[at])
    axes.plot([x], [y], "o", color=style.INK, ms=6.5, mfc=style.PAPER, mew=1.6, zorder=6, gid="design")
    kip, _ = shown_as("kip", connection.basis.units_system)
    text = f"this design: {curve.sweep.marks[at] + ', ' if curve.sweep.marks else ''}{floor_figures(y)} {kip}"
    x_low, x_high, y_high = limits
    px = (x_high - x_low) / ((SIZE[0] - LEFT - RIGHT) * 72)
    py = y_high / ((SIZE[1] - BOTTOM - TOP) * 72)
    wide, tall = (style.text_width(text, style.TYPE) + 4) * px, 10 * py
    curves = [(curve.lengths, values) for values in (*curve.strengths.values(), curve.envelope)]
    curves.append((curve.stretched_lengths, curve.stretched_envelope))
    curves += [(np.array([x_low, x_high]), np.array([value, value])) for _, value in demands]

    def crossed(left, low):
        xs = np.linspace(left, left + wide, 20)
        ys = np.array([np.interp(xs, cx, cy, left=np.nan, right=np.nan) for cx, cy in curves if len(cx)])
        hits = int(((ys > low - 2 * py) & (ys < low + tall)).sum())
        return 40 * hits + abs(left + wide / 2 - x) / px + abs(low + tall / 2 - y) / py

    across, up = np.linspace(x_low + 3 * px, x_high - wide - 3 * px, 17), np.linspace(3 * py, y_high - tall - 3 * py, 25)
    places = [(left, low) for left in across for low in up
              if not (left - 6 * px < x < left + wide + 6 * px and low - 8 * py < y < low + tall + 8 * py)]
    left, low = min(places, key=lambda place: crossed(*place))
    near = min(max(x, left), left + wide)
    to_y = low - 1 * py if low > y else low + tall
    if low <= y <= low + tall:
        near, to_y = (left - 2 * px if left > x else left + wide), low + tall / 2
    away = np.hypot((near - x) / px, (to_y - y) / py)
    cut = min(4.5 / away, 1.0)
    axes.plot([x + cut * (near - x), near], [y + cut * (to_y - y), to_y], lw=0.5, color=style.INK, zorder=6)
    axes.fill([left, left + wide, left + wide, left], [low - py] * 2 + [low + 9 * py] * 2, color=style.PAPER, lw=0, zorder=2)
    axes.text(left + 2 * px, low + 2 * py, text, fontsize=style.TYPE, va="baseline", fontweight="bold", color=style.INK, zorder=6)


def capacity_curve(connection, curve):
    """Draw the available strength of each limit state against connection length.

    Parameters
    ----------
    connection : a bolted connection.
    curve : study.Curve of it.

    Returns
    -------
    figure : style.Figure.
    """
    with style.house():
        drawn = capacity_canvas(connection, curve)
        svg, width = style.svg_text(drawn), style.fraction_of_text(drawn)
    how = "markers at what can be built, joined to guide the eye; " if curve.sweep.marks else ""
    caption = f"Available strength of each limit state against length: {how}heavy, the least of them"
    if curve.stretched_lengths.size:
        caption += f"; thin solid, {curve.sweep.stretched_name or 'another way to lengthen it'}"
    caption += ". Horizontal lines: required tension of the load combinations." if len(curve.demands) > 1 else ". Horizontal line: required tension."
    at = curve.sweep.design
    here = "" if at is None else f" The design ({curve.sweep.describe(at)}) has {force(float(curve.envelope[at]), floor_figures)}."
    alt = (f"Diagram of {len(curve.strengths)} limit states over lengths of {fraction(float(curve.lengths[0]))} to "
           f"{fraction(float(curve.lengths[-1]), unit=' in')}; the largest demand is {force(curve.demands[0][1], ceil_figures)}.{here} "
           f"{curve.sentence}")
    return style.Figure(svg, caption, alt, width)


def _region(connection):
    service = connection.inputs.service()
    if not {"D", "L"} & set(service) or connection.capacity <= 0:
        return None
    region = permissible_region(connection.capacity, service, connection.basis.method, connection.basis.loads, **connection.inputs.load_options())
    return region if region.x.size else None


def permissible_canvas(connection, region):
    """Return the matplotlib Figure of the permissible D against L, with the design point."""
    service = connection.inputs.service()
    kip, times = shown_as("kip", connection.basis.units_system)
    dead, live = times * service.get("D", 0.0), times * service.get("L", 0.0)
    region = replace(region, x=times * region.x, y=times * region.y)
    size, left, bottom, right, top = (4.6, 2.3), 0.56, 0.46, 0.7, 0.14
    figure = style.canvas(*size)
    wide, tall = size[0] - left - right, size[1] - bottom - top
    axes = figure.add_axes((left / size[0], bottom / size[1], wide / size[0], tall / size[1]))
    x_high, y_high = 1.12 * max(float(region.x.max()), dead), 1.14 * max(float(region.y.max()), live)
    axes.set_xlim(min(0.0, 1.1 * dead), x_high)
    axes.set_ylim(min(0.0, 1.1 * live), y_high)
    px, py = (x_high - axes.get_xlim()[0]) / (wide * 72), (y_high - axes.get_ylim()[0]) / (tall * 72)
    from matplotlib.patches import Polygon

    axes.add_patch(Polygon(region.polygon, closed=True, fc=style.LIGHT, ec="none", zorder=1, gid="permissible"))
    axes.plot([*region.x, region.x[-1]], [*region.y, 0.0], color=style.INK, lw=2.0, zorder=3, gid="boundary", solid_joinstyle="miter")
    for k, combination in enumerate(region.combinations):
        a, b = (region.x[k], region.y[k]), (region.x[k + 1], region.y[k + 1])
        dx, dy = (b[0] - a[0]) / px, (b[1] - a[1]) / py
        long, text = np.hypot(dx, dy), _loads(combination.text)
        middle = ((a[0] + b[0]) / 2, (a[1] + b[1]) / 2)
        if long > style.text_width(text, style.SMALL) + 10:
            turn = float(np.degrees(np.arctan2(dy, dx)))
            away = 5.0 / long
            axes.text(middle[0] - dy * away * px, middle[1] + dx * away * py, text, fontsize=style.SMALL, rotation=turn, ha="center",
                      va="baseline", rotation_mode="anchor", zorder=4)
        else:
            axes.text(middle[0] + 6 * px, middle[1] + 3 * py, text, fontsize=style.SMALL, va="baseline", zorder=4)
    if float(region.y[-1]) > 14 * py:
        text = _loads(region.x_combination.text)
        axes.text(region.x[-1] + 4 * px, region.y[-1] / 2 - 2.5 * py, text, fontsize=style.SMALL, va="baseline", zorder=4)
    axes.plot([dead], [live], "o", color=style.ACCENT, ms=6, zorder=5, gid="design", clip_on=False)
    _design_loads(axes, region, (dead, live, kip), px, py)
    axes.set_xlabel(f"dead load D, {kip}", fontsize=style.TYPE, labelpad=3)
    axes.set_ylabel(f"live load L, {kip}", fontsize=style.TYPE, labelpad=4)
    axes.tick_params(labelsize=style.SMALL, width=0.6, length=3, pad=2.5)
    for side in ("top", "right"):
        axes.spines[side].set_visible(False)
    return figure


def _design_loads(axes, region, loads, px, py):
    """Write the design's loads beside its point, below the boundary where there is room."""
    dead, live, kip = loads
    text = f"D = {ceil_figures(dead)}, L = {ceil_figures(live)} {kip}"
    wide = style.text_width(text, style.TYPE) * px
    if dead - wide - 8 * px > max(0.0, axes.get_xlim()[0]):
        x, y, side = dead - 6 * px, max(live - 3 * py, axes.get_ylim()[0] + 4 * py), "right"
    else:
        x, side = dead + 7 * px, "left"
        reach = float(np.interp(x + wide + 4 * px, region.x, region.y, right=0.0))
        y = max(min(live - 3 * py, reach - 12 * py), axes.get_ylim()[0] + 4 * py)
    axes.text(x, y, text, fontsize=style.TYPE, ha=side, va="baseline", color=style.ACCENT, zorder=5)


def permissible_loads(connection):
    """Draw the dead and live load that the connection permits against each other, the other loads as they are.

    Parameters
    ----------
    connection : a connection with service loads.

    Returns
    -------
    figure : style.Figure, or None where there is neither D nor L, or where the other loads alone exceed the capacity.
    """
    region = _region(connection)
    if region is None:
        return None
    with style.house():
        drawn = permissible_canvas(connection, region)
        svg, width = style.svg_text(drawn), style.fraction_of_text(drawn)
    others = [_loads(nature) for nature in connection.inputs.service() if nature not in ("D", "L")]
    capacity = f"{force(connection.capacity, floor_figures)}"
    fixed = f", with {', '.join(others)} as given" if others else ""
    caption = (f"Permissible dead load against live load for the available strength of {capacity} in tension{fixed}; along the boundary the "
               "combination that limits. Dot: this design.")
    dead, live = (connection.inputs.service().get(nature, 0.0) for nature in "DL")
    alt = (f"Region of dead and live load permitted by {capacity}: at most {force(float(region.x[-1]), floor_figures)} of D without L, "
           f"{force(float(region.y[0]), floor_figures)} of L without D; the design has D = {force(dead, ceil_figures)} "
           f"and L = {force(live, ceil_figures)}.")
    return style.Figure(svg, caption, alt, width)
