"""How every figure looks: type, line weights, tints, and SVG text that is the same on every run.

Figures are drawn at the size they are printed, so a font size here is the size on paper.  Text is placed by its baseline
and measured by a table of widths of our own: the font belongs to the sheet, matplotlib only knows it by name.
"""

import contextlib
import io
import logging
from dataclasses import dataclass

from ..units import drawn_in_si, told

TEXT_WIDTH = 6.6
"""Width of the text of a sheet, about: 6.8 in on US Letter, 6.57 in on A4. [in]"""

INK, SOFT, FAINT, SHADE, LIGHT, PAPER, ACCENT = "#1b1b1b", "#5c5c5c", "#b5b5b5", "#bdb7aa", "#edebe5", "#ffffff", "#8a2b1e"
"""Lines and text; less of it; grids; the shaded path; the part in front; the part behind; what governs, and the demand."""

OUTLINE, THIN, HAIR, HEAVY = 0.9, 0.5, 0.35, 1.9
"""Line weights. [pt]"""

TYPE, SMALL, TINY = 8.5, 8.0, 7.4
"""Sizes of type: labels, dimensions, bolt numbers. [pt]"""

HIDDEN, CENTRE, PHANTOM, TORN = (0, (4, 2)), (0, (12, 2.5, 2, 2.5)), (0, (12, 2, 2, 2, 2, 2)), (0, (2.6, 1.3))
"""Dash patterns in multiples of the line weight: hidden edges, centre lines, phantom lines, tension planes."""

FAMILY = "Libertinus Serif"

_RC = {
    "svg.fonttype": "none", "svg.hashsalt": "gageline", "font.family": ["serif"], "font.serif": [FAMILY, "DejaVu Serif"],
    "font.size": SMALL, "axes.linewidth": 0.6, "axes.unicode_minus": True, "lines.scale_dashes": True, "path.simplify": False,
    "text.usetex": False, "text.parse_math": False,
}

_WIDTHS = {" ": 0.25, "@": 0.93, "=": 0.55, "+": 0.55, "−": 0.55, "-": 0.34, "/": 0.32, ".": 0.24, ",": 0.24, ":": 0.24, "l": 0.27,
           "i": 0.27, "t": 0.32, "f": 0.31, "r": 0.37, "j": 0.27, "m": 0.79, "w": 0.75, "W": 0.98, "M": 0.85, "°": 0.36, "…": 0.75,
           "≥": 0.55, "≤": 0.55, "(": 0.3, ")": 0.3} | dict.fromkeys("½¼¾⅛⅜⅝⅞", 0.76)
"""Advance of a character in ems, rounded up from a look at the printed font."""


@dataclass(frozen=True)
class Figure:
    """A finished figure.

    Parameters
    ----------
    svg : its SVG text. caption, alt : printed under it, and read aloud in its place.
    width : fraction of the sheet's text width at which it is to be printed, above 0 to 1.
    """

    svg: str
    caption: str
    alt: str
    width: float


def text_width(text, size):
    """Return about how wide a text prints. [pt]"""
    return size * sum(_WIDTHS.get(sign, 0.66 if sign.isupper() else 0.47 if sign.isdigit() else 0.5) for sign in text)


class _Known(logging.Filter):
    """Lets every message pass but the one that the sheet's font is not installed to matplotlib, which is meant."""

    def filter(self, record):
        return FAMILY not in record.getMessage()


@contextlib.contextmanager
def house():
    """Within it matplotlib draws in the house style whatever the user's settings are, and is as before afterwards."""
    import matplotlib.style

    log, known = logging.getLogger("matplotlib.font_manager"), _Known()
    log.addFilter(known)
    try:
        with matplotlib.style.context(_RC, after_reset=True):
            yield
    finally:
        log.removeFilter(known)


def canvas(width, height):
    """Return an empty matplotlib Figure of a size in inches, outside pyplot, so that nothing is kept of it.

    Call it within ``house()``.
    """
    from matplotlib.figure import Figure as Canvas

    return Canvas(figsize=(width, height), facecolor="none")


def svg_text(figure):
    """Return a matplotlib Figure as SVG text; equal figures give equal text.

    Call it within ``house()``.
    """
    from matplotlib.backends.backend_svg import FigureCanvasSVG

    if drawn_in_si():
        from matplotlib.text import Text

        for text in figure.findobj(Text):
            text.set_text(told(text.get_text(), "SI"))
    out = io.StringIO()
    FigureCanvasSVG(figure).print_svg(out, metadata={"Date": None, "Creator": None})
    return "\n".join(line.rstrip() for line in out.getvalue().splitlines()) + "\n"


def fraction_of_text(figure):
    """Return the printed width of a matplotlib Figure as a fraction of the sheet's text width."""
    return round(min(figure.get_figwidth() / TEXT_WIDTH, 1.0), 4)


def spread(wanted, apart, low, high):
    """Return places as near as can be to those wanted, ascending, at least ``apart`` from each other, within low and high.

    Where there is no room for all, they are spaced evenly from low to high.

    >>> spread([1.0, 1.2, 5.0], 1.0, 0.0, 9.0)
    [0.6, 1.6, 5.0]
    """
    if not wanted:
        return []
    if apart * (len(wanted) - 1) > high - low:
        apart = (high - low) / (len(wanted) - 1)
    runs = []  # of labels that touch: [first place, number of labels]
    for place in wanted:
        runs.append([min(max(place, low), high), 1])
        while len(runs) > 1 and runs[-2][0] + runs[-2][1] * apart > runs[-1][0] + 1e-9:
            start, n = runs.pop()
            before, m = runs.pop()
            first = (before * m + (start - m * apart) * n) / (m + n)
            runs.append([max(min(first, high - (m + n - 1) * apart), low), m + n])
    return [round(start + k * apart, 9) for start, n in runs for k in range(n)]
