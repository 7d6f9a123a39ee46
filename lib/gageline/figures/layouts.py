"""Diagrams of a search: the feasible layouts with their Pareto set, and D/C over two lengths."""

import numpy as np

from ..units import fraction
from . import style

SIZE = (6.6, 3.6)  # [in]
FRAME = (0.09, 0.14, 0.87, 0.8)
MOST_DOTS = 4000
LEVELS = (0.5, 0.6, 0.7, 0.8, 0.9, 1.0, 1.2, 1.5)


def pareto(found, x="bolts", y="plate weight"):
    """Return the Figure of a search's feasible layouts, the Pareto set joined and the best layout marked.

    Parameters
    ----------
    found : search.Found with at least one feasible layout. x, y : two of its results.
    """
    with style.house():
        return _pareto(found, x, y)


def _pareto(found, x, y):
    figure, axes = _axes()
    xs, ys = (np.asarray(found.layouts[name], dtype=float) * (1000 if "weight" in name else 1) for name in (x, y))
    front = found.pareto(x, y)
    axes.plot(xs[:MOST_DOTS], ys[:MOST_DOTS], ".", color=style.FAINT, ms=3, gid="layouts", zorder=2)
    axes.plot(xs[front], ys[front], "-o", color=style.INK, lw=1.2, ms=4, mfc=style.PAPER, gid="pareto", zorder=3)
    axes.plot(xs[:1], ys[:1], "D", color=style.ACCENT, ms=6, gid="best", zorder=4)
    axes.annotate("best by the objective", (xs[0], ys[0]), (8, 8), textcoords="offset points", color=style.ACCENT, fontsize=style.TYPE)
    unit = {"bolts": "number", "length": "in", "ratio": "D/C"}
    axes.set_xlabel(f"{x}, {unit.get(x, 'lb')}")
    axes.set_ylabel(f"{y}, {unit.get(y, 'lb')}")
    axes.margins(0.08)
    return _finished(figure, f"Feasible layouts by {x} and {y}; joined: those that no other beats in both. Marked: the best by the objective.",
                          f"Scatter diagram of {found.feasible} feasible layouts; {len(front)} of them form the Pareto set of {x} and {y}.")


def contour(ratio, x, y, design=None):
    """Return the Figure of D/C over two lengths.

    Parameters
    ----------
    ratio : (n, m) D/C, as ``study.ratios`` returns it.
    x, y : (name, (n,) values) and (name, (m,) values). [in]
    design : (x, y) of the design, marked; None for none. [in]
    """
    with style.house():
        return _contour(ratio, x, y, design)


def _contour(ratio, x, y, design):
    figure, axes = _axes()
    (x_name, xs), (y_name, ys) = x, y
    levels = [level for level in LEVELS if np.nanmin(ratio) < level < np.nanmax(np.where(np.isfinite(ratio), ratio, np.nan))]
    if levels:
        lines = axes.contour(xs, ys, np.asarray(ratio).T, levels=levels, colors=style.INK,
                             linewidths=[2.0 if level == 1.0 else 0.8 for level in levels])
        axes.clabel(lines, fmt="%.2f", fontsize=style.SMALL, inline=True)
    if design:
        axes.plot(*design, "o", color=style.ACCENT, ms=6, gid="design")
        axes.annotate("this design", design, (8, 6), textcoords="offset points", color=style.ACCENT, fontsize=style.TYPE)
    axes.set_xlabel(f"{x_name.replace('_', ' ')}, in")
    axes.set_ylabel(f"{y_name.replace('_', ' ')}, in")
    least, most = (f"{fraction(float(value), unit=' in')}" for value in (xs[0], xs[-1]))
    return _finished(figure, f"D/C over {x_name.replace('_', ' ')} and {y_name.replace('_', ' ')}; heavy: D/C = 1.00.",
                          f"Contour diagram of D/C for {x_name.replace('_', ' ')} from {least} to {most}; "
                          f"least D/C {np.nanmin(ratio):.2f}.")


def _axes():
    figure = style.canvas(*SIZE)
    axes = figure.add_axes(FRAME)
    axes.grid(lw=0.25, color=style.FAINT)
    axes.spines[["top", "right"]].set_visible(False)
    return figure, axes


def _finished(figure, caption, alt):
    return style.Figure(style.svg_text(figure), caption, alt, style.fraction_of_text(figure))
