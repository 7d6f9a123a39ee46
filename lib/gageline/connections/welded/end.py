"""A welded end as the limit states see it: the parts, the weld lines and where they lie; lengths may be arrays in a sweep."""

from dataclasses import dataclass

from ...geometry import Hole
from ..weld_group import WeldLines

TOL = 1e-9


@dataclass(frozen=True)
class Part:
    """Member or plate: its steel, the thickness at the welds and how many like pieces share the load.

    Parameters
    ----------
    name : "member" or "plate". F_y, F_u : of its steel. [ksi]
    t : thickness of one piece. [in]
    pieces : like pieces. width : of the strip in the plane of the welds. [in]
    """

    name: str
    F_y: float
    F_u: float
    t: float
    pieces: int
    width: float

    @property
    def strip(self):
        """Its holes: none."""
        return ()


@dataclass(frozen=True)
class WeldedEnd:
    """A welded tension connection, ready to be evaluated.

    Parameters
    ----------
    element : what of the member is connected. member, plate : the two parts. gusset : the plate's support in compression.
    w_f : leg size. F_EXX : of the filler metal. [in, ksi]
    l_1, l_2 : longitudinal welds along heel or lower edge and along toe or upper edge, 0 where there are none. [in]
    y_1, y_2 : where they lie, in the coordinates of the element. plate_lo : lower edge of the plate there. [in]
    across : number of transverse welds of one group: 0, 1 (the member's end) or 2 (and the plate's free edge).
    on_plate : whether the longitudinal welds run along the edges of a plate narrower than the member.
    groups : weld groups of the whole connection. lap : of member and plate. [in]
    concentric : whether the pull passes through the centroid of the welds.
    """

    element: object
    member: Part
    plate: Part
    gusset: object
    w_f: float
    F_EXX: float
    l_1: float
    l_2: float
    y_1: float
    y_2: float
    plate_lo: float
    across: int
    on_plate: bool
    groups: int
    lap: float
    concentric: bool
    U_by_hand: float | None = None
    U_basis: str = ""

    @property
    def sided(self):
        """Whether there are longitudinal welds."""
        return self.across != 2

    @property
    def g(self):
        """Distance between the longitudinal weld lines, or length of a transverse weld. [in]"""
        return self.y_2 - self.y_1

    @property
    def l_t(self):
        """Length of the transverse weld that lies between longitudinal ones, 0 where there is none. [in]"""
        return self.g if self.across == 1 else 0.0

    @property
    def ledges(self):
        """Room for the fillets between the edges of the narrower part and those of the wider one, lower and upper. [in]"""
        lo, hi = self.y_1 - self.plate_lo, self.plate_lo + self.plate.width - self.y_2
        return (self.y_1, self.element.width - self.y_2) if self.on_plate else (lo, hi)

    @property
    def equal(self):
        """Whether both longitudinal welds are of one length."""
        return self.l_1 is self.l_2

    @property
    def edges(self):
        """Names of the two edges that the longitudinal welds run along."""
        return ("lower edge", "upper edge") if self.on_plate or self.element.series not in ("L", "2L") else ("heel", "toe")

    @property
    def longitudinal(self):
        """The longitudinal WeldLines of the whole connection."""
        if not self.sided:
            return ()
        if self.equal:
            return (WeldLines(2 * self.groups, self.l_1, f"longitudinal welds, {2 * self.groups} lines"),)
        return tuple(WeldLines(self.groups, length, f"weld along the {edge}, {self.groups} line{'s' if self.groups > 1 else ''}")
                     for length, edge in zip((self.l_1, self.l_2), self.edges))

    @property
    def transverse(self):
        """The transverse WeldLines of the whole connection."""
        n = self.across * self.groups
        return (WeldLines(n, self.g, f"transverse weld{'s' if n > 1 else ''}, {n} line{'s' if n > 1 else ''}"),) if n else ()

    @property
    def plate_pattern(self):
        """Ends of the weld lines as points of the plate, y from its lower edge; the end of the member lies at x = 0."""
        points = [(-length, y) for length, y in ((self.l_1, self.y_1), (self.l_2, self.y_2)) if self.sided]
        points += [(0.0, self.y_1), (0.0, self.y_2)]
        return tuple(Hole(x, y - self.plate_lo, 0.0, 0.0, self.plate.t) for x, y in points)
