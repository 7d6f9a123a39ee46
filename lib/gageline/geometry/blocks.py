"""Every tear-out block of a bolted part: the pieces that can leave it together, each bolt in or on one of them.

Between neighbouring gage lines, and between an outer line and the edge, the part either tears across in tension or
stays whole. A line with a torn side and a whole side shears along itself to the end of the part; a line torn on both
sides loses its hole from the tension width; a line whole on both sides would lose single bolts, which is tearout and
no block. All gaps torn is the net section and no block either. What hangs on the strip (the stem of a tee, the
outstanding leg of an angle) and is crossed by the tear is torn with it, or sheared off along its junction.
"""

from dataclasses import dataclass
from functools import cached_property
from itertools import combinations, product

import numpy as np

from ..errors import InputError
from .pattern import TOL, End, first, least, lines_of

MOST_LINES = 10
MOST_NUMBERED = 6  # beyond this a reviewer no longer counts lines in a drawing


@dataclass(frozen=True)
class Attachment:
    """What hangs on a strip at one height: a stem, a flange, an outstanding leg.

    Parameters
    ----------
    y : height of its junction on the strip. [in]
    area : its area beyond the strip, fillets included. [in²]
    t_junction : thickness of the plane along which it can be sheared off. [in]
    name : as a reviewer calls it, without article.
    area_cut : its area beyond that plane; None: all of it. Less than area where the fillets stay with the strip, more
        where the plane lies within the strip's width. [in²]
    """

    y: float
    area: float
    t_junction: float
    name: str
    area_cut: float | None = None


@dataclass(frozen=True)
class Part:
    """The connected element of a part as a flat strip that ends at larger x.

    Parameters
    ----------
    width, t : width (may be (N,)) and thickness of the strip. [in]
    attachments : Attachment, any number.
    end : End or (x0, slope); x0 may be (N,). [in]
    name : of the element, without article, such as "flange".
    edge_names : of the edges at y = 0 and at y = width, such as ("heel", "toe").
    """

    width: float
    t: float
    attachments: tuple
    end: tuple
    name: str = "part"
    edge_names: tuple = ("lower edge", "upper edge")


@dataclass(frozen=True)
class ShearPlane:
    """A plane sheared along the force from x0 to x1 at the height y. [in]

    n_holes counts the lead hole by half; deducted is their area, damage allowance included. [in²]
    """

    y: float
    x0: float
    x1: float
    t: float
    n_holes: float
    deducted: float

    @property
    def gross(self):
        """Gross area. [in²]"""
        return (self.x1 - self.x0) * self.t

    @property
    def net(self):
        """Net area. [in²]"""
        return self.gross - self.deducted


@dataclass(frozen=True)
class TensionPlane:
    """A plane torn across the force from (x0, y0) to (x1, y1), or the area of an attachment (y0 = y1). [in]

    n_holes counts a hole at its end by half; gross and deducted are areas, damage allowance included. [in²]
    """

    y0: float
    y1: float
    x0: float
    x1: float
    t: float
    gross: float
    n_holes: float = 0.0
    deducted: float = 0.0
    name: str = ""


    @property
    def net(self):
        """Net area. [in²]"""
        return self.gross - self.deducted


@dataclass(frozen=True)
class Block:
    """One tear-out block: what it is in words, its planes, and its pieces as polygons of (x, y). [in]"""

    label: str
    shear: tuple
    tension: tuple
    outline: tuple

    @cached_property
    def A_gv(self):
        """Gross area in shear. [in²]"""
        return sum(plane.gross for plane in self.shear)

    @cached_property
    def A_nv(self):
        """Net area in shear. [in²]"""
        return sum(plane.net for plane in self.shear)

    @cached_property
    def A_gt(self):
        """Gross area in tension. [in²]"""
        return sum(plane.gross for plane in self.tension)

    @cached_property
    def A_nt(self):
        """Net area in tension. [in²]"""
        return sum(plane.net for plane in self.tension)


def tear_out_blocks(holes, part, allowance):
    """Return every tear-out block of a part.

    Parameters
    ----------
    holes : the holes in the strip; x and y may be (N,). Their t is not read: the strip has the part's.
    part : Part; a plate with its free edge at smaller x is passed mirrored.
    allowance : what is added to either hole dimension for damage. [in]

    Returns
    -------
    blocks : tuple of Block, single pieces first, no two alike, not ranked; areas are floats, or (N,) in a sweep.

    Raises
    ------
    InputError : more than ten gage lines.

    Notes
    -----
    The tear crosses each line at its lead bolt (smallest x); s²/(4g) of a staggered tear is not credited and every
    line it crosses loses a hole, which is safe. Along a shear plane hole dimensions along the force are deducted,
    the lead hole by half. A stem or flange sheared off is so from where the tear crosses it to the end.
    A strip cut along the face of a stem is left out: it shears more and tears more than the strip cut along its
    gage line. Areas follow AISC 360-22, J4.3 and its commentary figures.
    """
    every = lines_of(holes)
    lines = [_Line(holes, line, part, allowance) for line in every if any(holes[i].bolted for i in line)]
    if len(lines) > MOST_LINES:
        raise InputError(f"Tear-out blocks are enumerated for at most {MOST_LINES} gage lines, got {len(lines)}.")
    if not lines:
        return ()
    unbolted = [(holes[line[0]].y, max(holes[i].across for i in line) + allowance)
                for line in every if not any(holes[i].bolted for i in line)]
    gaps = [_Gap(g, lines, part, unbolted) for g in range(len(lines) + 1)]
    found = []
    for torn in _torn_gaps(len(lines)):
        hung = [(g, attachment) for g in torn for attachment in gaps[g].attachments]
        for kept in product((True, False), repeat=len(hung)):
            if len(torn) < len(gaps) or not all(kept):
                found.append(_block(torn, list(zip(hung, kept)), lines, gaps, part))
    return tuple(sorted(found, key=lambda block: len(block.outline)))


class _Line:
    """A gage line: where its lead bolt is, half that hole across, and the plane it would shear along."""

    def __init__(self, holes, line, part, allowance):
        bolts = [i for i in line if holes[i].bolted]
        self.lead, self.y = _plain(least([holes[i].x for i in bolts])), _plain(holes[line[0]].y)
        self.half = (holes[bolts[0]].across + allowance) / 2.0
        number, deducted = -0.5, -(holes[bolts[0]].along + allowance) / 2.0
        for i in line:
            behind = 1 if holes[i].bolted else (holes[i].x >= self.lead - TOL) * 1
            number, deducted = number + behind, deducted + behind * (holes[i].along + allowance)
        x1 = _plain(End(*part.end).at(self.y))
        self.plane = ShearPlane(self.y, self.lead, x1, part.t, number, deducted * part.t)


class _Gap:
    """The strip between two neighbouring lines, or between an outer line and the edge, torn in tension."""

    def __init__(self, g, lines, part, unbolted):
        below, above = lines[g - 1] if g else None, lines[g] if g < len(lines) else None
        self.y0, self.y1 = below.y if below else 0.0, above.y if above else _plain(part.width)
        self.x0, self.x1 = (below or above).lead, (above or below).lead
        low, high = first(self.y0) if below else -np.inf, first(self.y1) if above else np.inf
        self.attachments = tuple(a for a in part.attachments if low < first(a.y) < high)
        crossed = [size for y, size in unbolted if low < first(y) < high]
        number = 0.5 * bool(below) + 0.5 * bool(above) + len(crossed)
        deducted = (below.half if below else 0.0) + (above.half if above else 0.0) + sum(crossed)
        self.plane = TensionPlane(self.y0, self.y1, self.x0, self.x1, part.t, (self.y1 - self.y0) * part.t, number,
                                  deducted * part.t)

    def x_at(self, y):
        if self.x0 is self.x1:
            return self.x0
        return self.x0 + (self.x1 - self.x0) * (y - self.y0) / (self.y1 - self.y0)


def _plain(value):
    return value if isinstance(value, np.ndarray) and value.ndim else float(value)


def _torn_gaps(lines):
    """All sets of torn gaps, as sorted tuples, in which every line has a torn side."""
    every = range(lines + 1)
    for number in range(1, lines + 2):
        for torn in combinations(every, number):
            if all(line in torn or line + 1 in torn for line in range(lines)):
                yield torn


def _block(torn, hung, lines, gaps, part):
    shear = [lines[i].plane for i in range(len(lines)) if (i in torn) != (i + 1 in torn)]
    tension = [gaps[g].plane for g in torn]
    for (g, a), kept in hung:
        x, y = gaps[g].x_at(a.y), _plain(a.y)
        left = a.area
        if not kept:
            shear.append(ShearPlane(y, x, _plain(End(*part.end).at(y)), a.t_junction, 0.0, 0.0))
            left = 0.0 if a.area_cut is None else a.area - a.area_cut
        if kept or first(left):
            name = a.name if kept else f"{part.name} at the {a.name}"
            tension.append(TensionPlane(y, y, x, x, a.t_junction, left, name=name))
    pieces = _pieces(torn)
    outline = tuple(_polygon(piece, gaps, part) for piece in pieces)
    return Block(_label(pieces, hung, len(lines), part), tuple(shear), tuple(tension), outline)


def _pieces(torn):
    """Runs of neighbouring torn gaps, as (first gap, last gap)."""
    pieces = []
    for g in torn:
        if pieces and pieces[-1][1] == g - 1:
            pieces[-1] = (pieces[-1][0], g)
        else:
            pieces.append((g, g))
    return pieces


def _polygon(piece, gaps, part):
    run = gaps[piece[0]:piece[1] + 1]
    corners = [(run[0].x0, run[0].y0), *((gap.x1, gap.y1) for gap in run)]
    end = End(*part.end)
    return (*corners, (end.at(run[-1].y1), run[-1].y1), (end.at(run[0].y0), run[0].y0))


def _label(pieces, hung, lines, part):
    kept = [a.name for (_, a), with_it in hung if with_it]
    off = [a.name for (_, a), with_it in hung if not with_it]
    if pieces == [(0, lines)]:
        text = part.name
    elif len(pieces) == 2 and pieces[0][0] == 0 and pieces[1][1] == lines:
        text = "both edge strips" + _split(pieces, lines)
    else:
        text = " and ".join(_piece_label(piece, lines, part) for piece in pieces)
    if off:
        text += ("" if pieces == [(0, lines)] else ",") + " torn off the " + " and the ".join(off)
    return text + (", with the " + " and the ".join(kept) if kept else "")


def _split(pieces, lines):
    last, following = pieces[0][1], pieces[1][0]
    if lines == 2:
        return ""
    if lines > MOST_NUMBERED:
        return f" ({last + 1} and {lines - following + 1} gage lines)"
    return f" (up to line {last + 1}, and from line {following})"


def _piece_label(piece, lines, part):
    low, high = piece[0], piece[1] + 1  # the lines, counted from 1, on which the piece is bounded
    if piece[0] == 0 or piece[1] == lines:
        edge = part.edge_names[0 if piece[0] == 0 else 1]
        line, number = (high, high) if piece[0] == 0 else (low, lines - low + 1)
        if lines == 1:
            return f"strip from the gage line to the {edge}"
        return f"strip of {number} gage lines to the {edge}" if lines > MOST_NUMBERED else (
            f"strip from line {line} to the {edge}")
    if (low, high) == (1, lines):
        return "between the two gage lines" if lines == 2 else "between the outer lines"
    return f"between {high - low + 1} gage lines" if lines > MOST_NUMBERED else f"between lines {low} and {high}"
