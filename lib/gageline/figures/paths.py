"""The governing path of every limit state that has one, as small elevations to one scale."""

import math

from . import style
from .drafting import Drawing
from .elevation import described, draw, ratio
from .scene import trace, view

PATHS = (("member rupture",), ("member block",), ("plate rupture",), ("plate block",), ("Whitmore yielding", "Whitmore rupture"))
"""Checks with a path to draw; of those in one entry, which share a path, the one with the larger ratio."""


def path_checks(connection):
    """Return the checks whose paths are drawn, in the order of PATHS."""
    by_id = {check.id: check for check in connection.checks if check.path is not None and check.ratio is not None}
    return [max((by_id[id] for id in ids if id in by_id), key=lambda check: check.ratio) for ids in PATHS if any(id in by_id for id in ids)]


def paths_canvas(connection):
    """Return the matplotlib Figure of the small elevations, one axes for each of ``path_checks``."""
    checks = path_checks(connection)
    joint = connection.joint
    traces = [trace(joint, check) for check in checks]
    views = [view(joint, path, supported=False) for path in traces]
    across = max(seen.wide[1] - seen.wide[0] for seen in views)
    tall = max(seen.top - seen.bottom for seen in views)
    gap, words, tallest, edge = 0.14, 40, 1.75, 8

    def scale_for(columns):
        rows = math.ceil(len(checks) / columns)
        wide = (style.TEXT_WIDTH - gap * (columns - 1)) / columns
        return min((wide - 2 * edge / 72) / across, (min(tallest, 3.7 / rows) - words / 72) / tall, 0.3)

    columns = max(range(2, max(3, min(len(checks), 3) + 1)), key=lambda n: (round(scale_for(n), 4), -n))
    scale = scale_for(columns)
    rows = math.ceil(len(checks) / columns)
    cell = (style.TEXT_WIDTH - gap * (columns - 1)) / columns
    height = tall * scale + (words + 14) / 72
    figure = style.canvas(style.TEXT_WIDTH, rows * height)
    for k, (check, path, seen) in enumerate(zip(checks, traces, views)):
        row, column = divmod(k, columns)
        in_row = min(columns, len(checks) - row * columns)
        start = (style.TEXT_WIDTH - in_row * cell - (in_row - 1) * gap) / 2
        place = (start + column * (cell + gap), (rows - 1 - row) * height, cell, height)
        pt = 1 / 72 / scale
        x0, x1 = seen.wide
        middle = (x0 + x1) / 2
        paper = Drawing(figure, place, (middle - cell / scale / 2, (seen.bottom + seen.top) / 2 - tall / 2 - words * pt), scale)
        draw(paper, seen, path, numbers=False)
        base = (seen.bottom + seen.top) / 2 - tall / 2 - 12 * pt
        governs = check.id == connection.governing.id
        colour = style.ACCENT if governs else style.INK
        paper.text(middle, base, check.title, style.TYPE, "center", weight="bold" if governs else "normal", colour=colour)
        paper.text(middle, base - 11 * pt, f"D/C {ratio(check)}{', governs' if governs else ''}", style.TYPE, "center", colour=colour)
    return figure


def paths(connection):
    """Draw the governing path of every limit state that has one, as small elevations to one scale.

    Returns
    -------
    figure : style.Figure.
    """
    checks = path_checks(connection)
    with style.house():
        drawn = paths_canvas(connection)
        svg, width = style.svg_text(drawn), style.fraction_of_text(drawn)
    listed = "; ".join(f"{check.title[0].lower()}{check.title[1:]}: {described(check)[0]}" for check in checks)
    caption = ("Governing paths by limit state, all to one scale. Shaded: tear-out blocks, sheared along solid and torn along dashed lines; "
               "heavy lines: chains of holes and the Whitmore width.")
    alt = f"{len(checks)} small elevations. " + listed[:1].upper() + listed[1:] + "."
    return style.Figure(svg, caption, alt, width)
