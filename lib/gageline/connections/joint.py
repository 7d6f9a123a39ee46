"""A bolted joint as the limit states see it: plies with their holes, bolts, and the plates; numbers may be arrays in a sweep."""

from dataclasses import dataclass

from ..geometry import End, connection_length, lines_of, mirrored, rows_per_line

DAMAGE = 1 / 16
"""Allowance for damage round a hole in net areas. [in]  [AISC360] B4.3b."""


@dataclass(frozen=True)
class Ply:
    """One side of the joint, member or plate, seen so that its end lies towards +x.

    Parameters
    ----------
    name : "member" or "plate". F_y, F_u : of its steel. [ksi]
    t : thickness of one ply; n_plies : plies one bolt passes; pieces : plies in the whole connection. [in]
    holes : its holes, x towards its end. end : its end edge. width : of the strip the holes are in. [in]
    kind : hole as written in the inputs ("STD", "LSL across", …).
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

    @property
    def bolted(self):
        """Holes that hold a bolt."""
        return tuple(hole for hole in self.holes if hole.bolted)

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
