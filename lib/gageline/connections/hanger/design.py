"""A hanger as its limit states see it: fitting, bolts, beam, and the joint of the hung member to the stem; numbers may be arrays in a sweep."""

from dataclasses import dataclass

import numpy as np

from ...check import silent
from ...provisions import hanger
from ..joint import Bolts, Joint


@dataclass(frozen=True)
class Fitting:
    """The tee or double angle below the beam, and its steel.

    Parameters
    ----------
    name : printed designation. tee : False for a double angle. section : its shape.
    t_f, t_s : thickness of the flange or leg on the beam, and of the stem or one vertical leg. [in]
    plies : stems that a bolt or the load passes, 2 for a double angle. gap : between the angles, 0 for a tee. [in]
    width, depth : across the beam, both angles; and down from the beam. [in]
    k : face on the beam to the toe of the fillet, as designed. [in]
    F_y, F_u : of its steel. [ksi]
    """

    name: str
    tee: bool
    section: object
    t_f: float
    t_s: float
    plies: int
    gap: float
    width: float
    depth: float
    k: float
    F_y: float
    F_u: float


@dataclass(frozen=True)
class Beam:
    """The supporting beam: shape, steel [ksi], and the distance from the middle of the hanger to its nearest end. [in]"""

    section: object
    F_y: float
    F_u: float
    end: float


@dataclass(frozen=True)
class Welds:
    """Fillets along both edges of each hung piece: leg, length, filler metal, distance of the two lines of a piece, pieces. [in, ksi]"""

    w_f: float
    length: float
    F_EXX: float
    apart: float
    pieces: int


@dataclass(frozen=True)
class Hung:
    """The hung member: its element, steel [ksi], pieces, thickness of one, and the shear lag factor set by the engineer."""

    element: object
    F_y: float
    F_u: float
    U_by_hand: float | None
    U_basis: str


@dataclass(frozen=True)
class Hanger:
    """A hanger ready to be evaluated.

    Parameters
    ----------
    upper : the bolts to the beam as a joint in shear: its member is the fitting's flange, its plate the beam's.
    F_nt : nominal tensile stress of these bolts. [ksi]
    rows, s, e, g : bolt rows along the beam, their spacing, the end distance, the gage across. [in]
    psi : angle between the pull and the bolts. [rad] P : required pull. [kip]
    welds, lower : how the member meets the stem: one of them is None.
    stem_end : lead row, or start of the welds, to the free edge of the stem, along the pull. [in]
    p_by_hand : tributary length by flange ("fitting", "beam"), where the engineer set it. [in]
    """

    fitting: Fitting
    beam: Beam
    hung: Hung
    upper: Joint
    F_nt: float
    rows: int
    s: float
    e: float
    g: float
    psi: float
    P: float
    method: str
    edition: str
    welds: Welds | None
    lower: Joint | None
    stem_end: float
    p_by_hand: dict

    @property
    def bolts(self) -> Bolts:
        """The bolts to the beam."""
        return self.upper.bolts

    @property
    def n(self):
        """Bolts to the beam."""
        return 2 * self.rows

    @property
    def length(self):
        """Length of the fitting along the beam. [in]"""
        return (self.rows - 1) * self.s + 2 * self.e

    @property
    def spread(self):
        """(length, width) from which the load spreads into the stem. [in]"""
        if self.welds:
            return self.welds.length, self.welds.apart
        ys = [hole.y for hole in self.lower.pattern]
        return self.lower.length, max(ys) - min(ys)

    @property
    def depth_of_last(self):
        """Face on the beam to the last row, or to the end of the welds, on the axis of the pull. [in]"""
        return hanger.depth_of_last_row.bare(self.fitting.depth, self.stem_end, self.spread[0], self.psi)

    @property
    def edges(self):
        """Axis of the pull to both edges of the stem, across the pull at the last row; where it is inclined, to the flange or free edge. [in]"""
        return self.edges_worked(silent)

    def edges_worked(self, do):
        """Work out ``edges``."""
        if not self.psi:
            return self.length / 2, self.length / 2
        fit = self.fitting
        h_s = do(hanger.depth_of_last_row, fit.depth, self.stem_end, self.spread[0], self.psi)
        low = do(hanger.edge_beside_pull, self.length, h_s, self.psi, fit.depth)
        high = do(hanger.edge_towards_pull, self.length, h_s, self.psi, fit.k)
        # Below the smallest length that can be built a sweep would turn negative.
        return _plain(np.maximum(low, 0.05)), _plain(np.maximum(high, 0.05))


def _plain(value):
    return value if np.ndim(value) else float(value)
