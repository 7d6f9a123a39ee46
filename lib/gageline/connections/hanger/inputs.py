"""Inputs of a hanger below a beam."""

from typing import Literal

from ..base import CalcInputs
from ..fields import Angle, Length, Number, note

HoleKind = Literal["STD", "OVS", "SSL across", "SSL along", "LSL across", "LSL along"]
LowerHoleKind = Literal["STD", "SSL across", "LSL across"]

_BEAM, _FITTING, _BOLTS, _MEMBER, _LOWER, _BY_HAND = ("Supporting beam", "Fitting", "Bolts to the beam", "Hung member", "Hung member to stem",
                                                      "Set by the engineer")


class HangerInputs(CalcInputs):
    """Inputs of a tee or double-angle hanger bolted to the bottom flange of a beam."""

    inclination: Angle = note("angle between the pull and the bolts, in the plane of the beam's web", 0.0, group="Loads", ge=0, le=1.0473)

    beam: str = note("supporting beam, a W, M, S or HP shape", group=_BEAM, min_length=1)
    beam_grade: str = note("steel of the beam", group=_BEAM, min_length=1)
    beam_end: Length = note("middle of the hanger to the nearest end of the beam", group=_BEAM, gt=0, le=24_000)

    fitting: str = note("tee (WT, MT, ST) or double angle below the beam", group=_FITTING, min_length=1)
    fitting_grade: str = note("steel of the fitting", group=_FITTING, min_length=1)
    bolted_leg: str | None = note("leg of unequal angles bolted to the beam: long leg or short leg", None, group=_FITTING)
    gap: Length | None = note("clear distance between the angles (default: the hung plate's thickness)", None, group=_FITTING, gt=0, le=4)

    rows: int = note("bolt rows along the beam, two bolts each", group=_BOLTS, ge=1, le=12)
    pitch: Length | None = note("spacing of the rows along the beam", None, group=_BOLTS, gt=0, le=24)
    gage: Length = note("spacing of the two bolt lines across the beam", group=_BOLTS, gt=0, le=30)
    fitting_end: Length = note("end row to the end of the fitting", group=_BOLTS, gt=0, le=24)
    bolt: str = note("bolt size", group=_BOLTS, min_length=1)
    bolt_grade: str = note("bolt group or product", group=_BOLTS, min_length=1)
    threads: Literal["N", "X"] = note("threads in (N) or out of (X) the shear plane", "N", group=_BOLTS)
    installation: Literal["snug", "pretensioned", "slip-critical"] = note("snug, pretensioned or slip-critical", "snug", group=_BOLTS)
    slip_class: Literal["A", "B"] | None = note("faying surface of a slip-critical joint", None, group=_BOLTS)
    fitting_holes: HoleKind = note("holes of the fitting; along and across are meant to the beam", "STD", group=_BOLTS)
    beam_holes: HoleKind = note("holes of the beam's flange; along and across are meant to the beam", "STD", group=_BOLTS)
    deformation_considered: bool = note("deformation at bolt holes at service load is a consideration", True, group=_BOLTS)

    member: str = note("hung member: PL thickness x width, or a double angle on both sides of the stem", group=_MEMBER, min_length=1)
    member_grade: str = note("steel of the hung member", group=_MEMBER, min_length=1)
    connected_by: str | None = note("leg of unequal angles on the stem: long leg or short leg", None, group=_MEMBER)
    member_length: Length | None = note("length for the advice on slenderness", None, group=_MEMBER, gt=0, le=24_000)
    U_by_hand: Number | None = note("shear lag factor set by the engineer", None, group=_MEMBER, gt=0, le=1)
    U_basis: str = note("written basis of U_by_hand", "", group=_MEMBER)

    joined: Literal["welded", "bolted"] = note("hung member to stem: welded or bolted", group=_LOWER)
    stem_end: Length = note("lead bolt row, or start of the welds, to the free edge of the stem, along the pull", 0.0, group=_LOWER, ge=0, le=60)
    weld: Length | None = note("leg of the fillets along both edges of each hung piece", None, group=_LOWER, gt=0, le=1)
    weld_length: Length | None = note("length of each weld line, along the pull", None, group=_LOWER, gt=0, le=60)
    electrode: str = note("filler metal", "E70", group=_LOWER)
    lower_bolt: str | None = note("bolt size at the stem", None, group=_LOWER)
    lower_lines: int | None = note("gage lines at the stem", None, group=_LOWER, ge=1, le=4)
    lower_rows: int | None = note("bolts in each line at the stem", None, group=_LOWER, ge=1, le=12)
    lower_pitch: Length | None = note("spacing along the pull at the stem", None, group=_LOWER, gt=0, le=24)
    lower_gage: Length | None = note("spacing of the lines at the stem", None, group=_LOWER, gt=0, le=24)
    lower_gage_from_back: Length | None = note("back of the hung leg to the first gage line", None, group=_LOWER, gt=0, le=24)
    lower_threads: Literal["N", "X"] = note("threads in (N) or out of (X) the shear planes at the stem", "N", group=_LOWER)
    lower_holes: LowerHoleKind = note("holes of stem and hung member at the stem", "STD", group=_LOWER)
    member_end: Length | None = note("last bolt row to the end of the hung member", None, group=_LOWER, gt=0, le=60)

    p_by_hand: Length | None = note("tributary length of the fitting per bolt, set by the engineer", None, group=_BY_HAND, gt=0, le=60)
    p_basis: str = note("written basis of p_by_hand", "", group=_BY_HAND)
    p_beam_by_hand: Length | None = note("tributary length of the beam's flange per bolt, set by the engineer", None, group=_BY_HAND, gt=0, le=60)
    p_beam_basis: str = note("written basis of p_beam_by_hand", "", group=_BY_HAND)
