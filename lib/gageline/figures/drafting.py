"""A drawing to scale: lines, fills and text in inches of the real thing, dimensions and labels in points of the paper."""

import math
from itertools import groupby, pairwise

from ..units import fraction
from . import style


class Drawing:
    """A piece of paper on which one inch of the part is drawn ``scale`` inches long.

    Parameters
    ----------
    figure : matplotlib Figure.
    place : (left, bottom, width, height) on the figure. [in]
    origin : (x, y) of the part that comes to lie at the lower left corner. [in]
    scale : inches of paper per inch of part.
    """

    def __init__(self, figure, place, origin, scale):
        w, h = figure.get_size_inches()
        left, bottom, width, height = place
        self.axes = figure.add_axes((left / w, bottom / h, width / w, height / h))
        self.axes.set_xlim(origin[0], origin[0] + width / scale)
        self.axes.set_ylim(origin[1], origin[1] + height / scale)
        self.axes.set_axis_off()
        self.scale = scale

    @classmethod
    def measure(cls, scale):
        """Return a Drawing without paper, to measure with before the size of the paper is known."""
        bare = cls.__new__(cls)
        bare.scale = scale
        return bare

    def pt(self, points=1.0):
        """Return the inches of the part that lie under so many points of the paper."""
        return points / 72.0 / self.scale

    def fill(self, corners, colour, z=1.0, gid=None, line=None, weight=style.OUTLINE):
        """Fill a polygon, outlined where ``line`` names a colour; return it, for clipping."""
        from matplotlib.patches import Polygon

        patch = Polygon(corners, closed=True, fc=colour, ec=line or "none", lw=weight if line else 0.0, zorder=z, gid=gid, joinstyle="miter")
        return self.axes.add_artist(patch)

    def line(self, corners, weight=style.OUTLINE, dash="-", colour=style.INK, z=3.0, gid=None, within=None):
        """Draw a line through corners, cut off outside the polygon ``within``."""
        from matplotlib.lines import Line2D

        drawn = Line2D(*zip(*corners), lw=weight, ls=dash, color=colour, zorder=z, gid=gid, solid_capstyle="butt", dash_capstyle="butt",
                       solid_joinstyle="miter", dash_joinstyle="miter")
        self.axes.add_artist(drawn)  # plot() would reckon limits anew for each of some hundred lines
        if within is not None:
            drawn.set_clip_path(within)
        return drawn

    def hole(self, x, y, across, along, fill=style.PAPER, dash="-", weight=0.8, z=6.0, gid=None):
        """Draw a hole: a circle, or a slot with round ends. [in]"""
        from matplotlib.patches import Circle, FancyBboxPatch

        r = min(across, along) / 2
        look = {"fc": fill or "none", "ec": style.INK, "lw": weight, "ls": dash, "zorder": z, "gid": gid}
        if abs(across - along) < 1e-9:
            return self.axes.add_artist(Circle((x, y), r, **look))
        core_x, core_y = along / 2 - r, across / 2 - r
        box = FancyBboxPatch((x - core_x, y - core_y), 2 * core_x, 2 * core_y, boxstyle=f"round,pad={r},rounding_size={r}", mutation_aspect=1,
                             **look)
        return self.axes.add_artist(box)

    def text(self, x, y, text, size=style.TYPE, ha="left", upright=False, colour=style.INK, middle=False, weight="normal", z=9.0):
        """Set a text on its baseline, or with ``middle`` centred on the point; ``upright`` turns it to be read from the right."""
        if middle:
            drop = self.pt(0.31 * size)
            x, y = (x + drop, y) if upright else (x, y - drop)
        return self.axes.text(x, y, text, fontsize=size, ha=ha, va="baseline", rotation=90 if upright else 0, rotation_mode="anchor",
                              color=colour, fontweight=weight, zorder=z, clip_on=False)

    def arrow(self, tail, head, weight=1.3, size=7.0, colour=style.INK):
        """Draw a straight arrow with a filled head of a size in points."""
        dx, dy = head[0] - tail[0], head[1] - tail[1]
        length = math.hypot(dx, dy)
        ux, uy, a = dx / length, dy / length, self.pt(size)
        neck = (head[0] - a * ux, head[1] - a * uy)
        self.line([tail, neck], weight, colour=colour, z=8)
        self.fill([head, (neck[0] - 0.36 * a * uy, neck[1] + 0.36 * a * ux), (neck[0] + 0.36 * a * uy, neck[1] - 0.36 * a * ux)], colour, z=8)

    def leader(self, point, elbow):
        """Draw a leader: a dot on a point of the part, a thin line to the elbow."""
        from matplotlib.patches import Circle

        self.line([point, elbow], style.HAIR, z=8)
        self.axes.add_artist(Circle(point, self.pt(1.3), fc=style.INK, ec="none", zorder=8))

    def across(self, stops, y, starts, texts=None):
        """Dimension distances along x on a line at the height y.

        Parameters
        ----------
        stops : x of the ticks, ascending. [in]
        starts : for each stop, y from which its extension line comes, None where there is none. [in]
        texts : one for each space; fractions of an inch by default.
        """
        self._chain(stops, y, starts, texts, upright=False)

    def up(self, stops, x, starts, texts=None):
        """Dimension distances along y on a line at x, as ``across`` does along x."""
        self._chain(stops, x, starts, texts, upright=True)

    def _chain(self, stops, level, starts, texts, upright):
        def at(along, off):
            return (off, along) if upright else (along, off)

        for stop, start in zip(stops, starts):
            if start is not None:
                away = math.copysign(1.0, level - start)
                self.line([at(stop, start + away * self.pt(2)), at(stop, level + away * self.pt(3))], style.HAIR, colour=style.SOFT, z=2.8)
        self.line([at(stops[0], level), at(stops[-1], level)], style.THIN, z=7)
        slash = self.pt(2.4)
        for stop in stops:
            cross = [(stop - slash, level - slash), (stop + slash, level + slash)]
            self.line([at(*cross[0]), at(*cross[1])], 1.0, z=7)
        for text, centre, row, tail in self.placed(stops, texts or _fractions(stops)):
            if tail is not None:
                self.line([at(stops[0] if tail < stops[0] else stops[-1], level), at(tail, level)], style.THIN, z=7)
            off = self.pt(2.2 + row * style.SMALL)
            base = level - off if upright else level + off
            half, rise = self.pt(style.text_width(text, style.SMALL) / 2 + 0.8), self.pt(-5.8 if upright else 5.8)
            # Extension lines of other chains stop short of a text.
            self.fill([at(centre - half, base), at(centre + half, base), at(centre + half, base + rise), at(centre - half, base + rise)],
                      style.PAPER, 6.0)
            self.text(*at(centre, base), text, style.SMALL, "center", upright)

    def placed(self, stops, texts):
        """Return (text, centre, line of text, end of the line drawn out) for each space of a chain, no two texts overlapping. [in]"""
        out, last = [], len(texts) - 1
        for k, (a, b, text) in enumerate(zip(stops, stops[1:], texts)):
            wide = self.pt(style.text_width(text, style.SMALL) + 6.5)
            centre, row, tail = (a + b) / 2, 0, None
            if wide > b - a and k in (0, last):
                sense = 1.0 if k == last else -1.0
                tail = (b if k == last else a) + sense * (self.pt(5) + wide)
                centre = (b if k == last else a) + sense * (self.pt(5) + wide / 2)
            elif wide > b - a:
                row = 1  # above its line, where the ticks are not in the way
            while any(r == row and abs(centre - c) < (wide + w) / 2 for _, c, r, _, w in out):
                row += 1
            out.append((text, centre, row, tail, wide))
        return [entry[:4] for entry in out]

    def rows(self, stops, texts=None):
        """Return how many lines of text stand on a chain."""
        return 1 + max(row for _, _, row, _ in self.placed(stops, texts or _fractions(stops)))


def _fractions(stops):
    return [fraction(b - a) for a, b in pairwise(stops)]


def grouped(stops, most_single=2):
    """Return (stops, texts) of a chain from edge to edge in which more than ``most_single`` equal spaces in a row are one: "3 @ 3".

    The first and the last space are distances from edges and stay by themselves.

    >>> grouped([0.0, 3.0, 6.0, 9.0, 12.0, 15.0])
    ([0.0, 3.0, 12.0, 15.0], ['3', '3 @ 3', '3'])
    """
    spaces = [round(b - a, 6) for a, b in pairwise(stops)]
    kept, texts, at = stops[:2], [fraction(spaces[0])], 1
    for space, run in groupby(spaces[1:-1]):
        n = len(list(run))
        if n > most_single:
            kept.append(stops[at + n])
            texts.append(f"{n} @ {fraction(space)}")
        else:
            kept += stops[at + 1:at + n + 1]
            texts += [fraction(space)] * n
        at += n
    return [*kept, stops[-1]], [*texts, fraction(spaces[-1])]


def broken(a, b, amplitude, upright=True, at=0.27):
    """Return the corners of a break line from a to b: straight with one zigzag, ``at`` so far along it.

    Parameters
    ----------
    a, b : its ends (x, y), one above the other, or beside each other with ``upright`` False. [in]
    amplitude : of the zigzag. [in]
    """
    (x0, y0), (x1, y1) = a, b
    cx, cy = x0 + at * (x1 - x0), y0 + at * (y1 - y0)
    k = math.copysign(amplitude, (y1 - y0) if upright else (x1 - x0))
    if upright:
        return [a, (cx, cy - 1.3 * k), (cx - amplitude, cy - 0.45 * k), (cx + amplitude, cy + 0.45 * k), (cx, cy + 1.3 * k), b]
    return [a, (cx - 1.3 * k, cy), (cx - 0.45 * k, cy - amplitude), (cx + 0.45 * k, cy + amplitude), (cx + 1.3 * k, cy), b]
