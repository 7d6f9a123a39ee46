"""A hollow section on its gusset as the limit states see it; the length of the welds may be an array in a sweep."""

from dataclasses import dataclass

from ...geometry import Hole
from ..joint import Gusset

FREE_GAP, MOST_GAP = 1 / 16, 3 / 16
"""Gap at a fillet weld that needs no larger leg, and the largest at all. [in]  AWS D1.1, as quoted in handbooks."""


@dataclass(frozen=True)
class Tube:
    """The hollow section.

    Parameters
    ----------
    name, series : its designation, HSS or Pipe.
    H, B : overall height along the gusset and width across it, of a rectangular tube. D : outside diameter of a round one. [in]
    t : design wall. full_wall : whether that is the nominal wall, so that area and radii are not the tables'. [in]
    A_g : gross area. r, r_name : least radius of gyration and its sign. [in², in]
    F_y, F_u : of its steel. [ksi]
    """

    name: str
    series: str
    H: float | None
    B: float | None
    D: float | None
    t: float
    t_nom: float
    full_wall: bool
    A_g: float
    r: float
    r_name: str
    F_y: float
    F_u: float

    @property
    def round(self):
        """Whether it is a round tube."""
        return self.D is not None

    @property
    def depth(self):
        """Overall size in the plane of the gusset. [in]"""
        return self.D if self.round else self.H

    @property
    def across(self):
        """Overall size at right angles to the gusset. [in]"""
        return self.D if self.round else self.B

    @property
    def flat(self):
        """Flat of the wall along the gusset between corners of twice the wall. [in]"""
        return self.H - 4 * self.t


@dataclass(frozen=True)
class Plate:
    """The gusset, or one of two like ones: thickness, width, steel. [in, ksi]"""

    t: float
    width: float
    pieces: int
    F_y: float
    F_u: float

    @property
    def strip(self):
        """Its holes: none."""
        return ()


@dataclass(frozen=True)
class Reinforcement:
    """Two plates over the net section, one on each side: thickness, width, weld length each side, leg that counts, gap. [in, ksi]"""

    t: float
    width: float
    length: float
    leg: float
    gap: float
    F_y: float
    F_u: float


@dataclass(frozen=True)
class SlottedJoint:
    """A hollow section on its gusset, ready to be evaluated.

    Parameters
    ----------
    l : length of each weld line; may be (n,). leg, gap : leg of the welds and gap at them. F_EXX : filler metal strength. [in, ksi]
    clearance : of the slot, where it is widest, over the thickness of the gusset. unwelded : slotted length without welds. [in]
    """

    tube: Tube
    plate: Plate
    gusset: Gusset
    l: float
    leg: float
    gap: float
    F_EXX: float
    clearance: float
    unwelded: float
    edition: str
    reinforcement: Reinforcement | None = None
    U_by_hand: float | None = None
    U_basis: str = ""

    @property
    def concentric(self):
        """Whether one gusset passes through the tube, rather than two lying against it."""
        return self.plate.pieces == 1

    @property
    def spacing(self):
        """Distance between the two weld lines of one gusset: walls that cross it, or its own edges. [in]"""
        return self.tube.depth if self.concentric else self.plate.width

    @property
    def plate_pattern(self):
        """The ends of the weld lines on one gusset, its free edge towards -x, as points that its Whitmore width spreads between."""
        low, high = (self.plate.width - self.spacing) / 2, (self.plate.width + self.spacing) / 2
        return tuple(Hole(x, y, 0.0, 0.0, self.plate.t) for y in (low, high) for x in (0.0, self.l))
