"""A bolted joint as the limit states see it: plies with their holes, bolts, and the plates; numbers may be arrays in a sweep."""

from dataclasses import dataclass

from ..geometry import End, connection_length, lines_of, mirrored, rows_per_line

MM = 1 / 25.4


@dataclass(frozen=True)
class Constants:
    """Lengths that the Specification states in round inches and in round millimetres, not the same to the last digit. [in]

    Parameters
    ----------
    damage : allowance for damage round a hole in net areas, B4.3b.
    long_joint : fastener pattern length beyond which bolt shear is reduced, Table J3.2. long_joint_text : the same in words.
    filler_free, filler_slope : thickness of fillers without reduction, reduction per length beyond it, J5.2(a). [in], [1/in]
    spacing, spacing_weathering, edge : upper limits of spacing (painted; bare weathering steel) and of edge distance, J3.6.
    beside_pin : constant of the effective width beside a pin hole, D5.1.
    """

    damage: float = 1 / 16
    long_joint: float = 38.0
    long_joint_text: str = "38 in"
    filler_free: float = 0.25
    filler_text: str = "1/4 in."
    filler_slope: float = 0.4
    spacing: float = 12.0
    spacing_weathering: float = 7.0
    edge: float = 6.0
    beside_pin: float = 0.63


INCH = Constants()
METRIC = Constants(2 * MM, 950 * MM, "950 mm", 6 * MM, "6 mm", 0.0154 / MM, 300 * MM, 180 * MM, 150 * MM, 16 * MM)


def constants(basis):
    """Return the constants of the Specification that go with a basis: metric where the project is in SI, inch otherwise."""
    return METRIC if basis.units_system == "SI" else INCH


@dataclass(frozen=True)
class Ply:
    """One side of the joint, member or plate, seen so that its end lies towards +x.

    Parameters
    ----------
    name : "member" or "plate". F_y, F_u : of its steel. [ksi]
    t : thickness of one ply; n_plies : plies one bolt passes; pieces : plies in the whole connection. [in]
    holes : its holes, x towards its end. end : its end edge. width : of the strip the holes are in. [in]
    kind : hole as written in the inputs ("STD", "LSL across", …). constants : of the Specification, inch or metric.
    """

    name: str
    F_y: float
    F_u: float
    t: float
    n_plies: int
    pieces: int
    holes: tuple
    end: End
    width: float
    kind: str
    constants: Constants = INCH

    @property
    def bolted(self):
        """Holes that hold a bolt."""
        return tuple(hole for hole in self.holes if hole.bolted)

    @property
    def strip(self):
        """Holes of the strip that holds the bolts, open ones among them; open holes in an outstanding leg are left out."""
        return tuple(hole for hole in self.holes if hole.bolted or hole.y >= 0)

    @property
    def hole(self):
        """One of its bolt holes, for its dimensions."""
        return self.bolted[0]


@dataclass(frozen=True)
class Bolts:
    """The bolts of a joint: diameter, nominal shear stress, shear planes, pretension (0 where none) and how they are installed."""

    name: str
    group: str
    d: float
    F_nv: float
    threads: str
    n_s: int
    T_b: float
    installation: str
    mu: float


@dataclass(frozen=True)
class Gusset:
    """The connection plate beyond its holes: width, side distances, free length and support for compression. [in]"""

    width: float
    y_lo: float
    y_hi: float
    K: float | None
    length: float | None
    basis: str


@dataclass(frozen=True)
class Joint:
    """A bolted tension connection, ready to be evaluated.

    ``member`` and ``plate`` are seen from their own ends; ``element`` says what of the member is connected.
    """

    element: object
    member: Ply
    plate: Ply
    bolts: Bolts
    gusset: Gusset
    t_filler: float
    n_fillers: int
    deformation: bool
    U_by_hand: float | None = None
    U_basis: str = ""

    @property
    def pattern(self):
        """Bolt holes in the joint's own coordinates, the member's body towards -x."""
        return self.member.bolted

    @property
    def numbers(self):
        """Number of each bolt of the pattern, as in the bolt table; a missing bolt keeps its number."""
        return tuple(i for i, hole in enumerate(self.member.strip, start=1) if hole.bolted)

    @property
    def plate_pattern(self):
        """The plate's bolt holes in the joint's own coordinates, the plate's free edge towards -x."""
        return tuple(mirrored(self.plate.bolted))

    @property
    def length(self):
        """First to last bolt along the force. [in]"""
        return connection_length(self.pattern)

    @property
    def n_bolts(self):
        """Bolts of the whole connection."""
        return len(self.pattern) * self.element.joints

    @property
    def rows(self):
        """Fewest bolts in any gage line."""
        return min(rows_per_line(self.pattern))

    @property
    def n_lines(self):
        """Number of gage lines of one bolt group."""
        return len(lines_of(self.pattern))
