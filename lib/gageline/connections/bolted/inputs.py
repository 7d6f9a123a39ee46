"""Inputs of a bolted tension connection."""

import math
from typing import Literal

from .. import plate
from ..base import CalcInputs
from ..fields import Angle, Count, Length, Lengths, Number, Points, note

HoleKind = Literal["STD", "OVS", "SSL across", "SSL along", "LSL across", "LSL along"]

_MEMBER, _PLATE, _PATTERN, _BOLTS, _GUSSET = "Member", "Connection plate", "Bolt pattern", "Bolts", "Gusset in compression"


class BoltedInputs(CalcInputs):
    """Inputs of a bolted tension connection."""

    member: str = note("shape, or PL thickness x width", group=_MEMBER, min_length=1)
    member_grade: str = note("steel of the member", group=_MEMBER, min_length=1)
    connected_by: str | None = note("connected element: both flanges, web, flange, stem, long leg, short leg", None, group=_MEMBER)
    member_length: Length | None = note("length for the advice on slenderness", None, group=_MEMBER, gt=0, le=24_000)
    gap: Length | None = note("clear distance between the two angles (default: the plate's thickness)", None, group=_MEMBER, ge=0, le=12)
    U_by_hand: Number | None = note("shear lag factor set by the engineer", None, group=_MEMBER, gt=0, le=1)
    U_basis: str = note("written basis of U_by_hand", "", group=_MEMBER)

    plates: Literal[1, 2] = note("connection plates at each bolt group: 1 (lap) or 2 (both sides)", 1, group=_PLATE)
    plate_thickness: Length = note("thickness of one plate", group=_PLATE, gt=0, le=8)
    plate_width: Length = note("width of the plate across the load", group=_PLATE, gt=0, le=200)
    plate_grade: str = note("steel of the plate", group=_PLATE, min_length=1)
    plate_end: Length = note("first row to the free edge of the plate, on the axis of the pattern", group=_PLATE, gt=0, le=60)
    plate_edge_angle: Angle = note("angle between the load and the free edge of the plate", math.pi / 2, group=_PLATE, gt=0.5, lt=2.65)
    plate_offset: Length = note("axis of the pattern off the centre line of the plate", 0.0, group=_PLATE, ge=-100, le=100)
    filler_thickness: Length = note("fillers at one shear plane, total thickness", 0.0, group=_PLATE, ge=0, le=6)
    fillers: Count = note("number of fillers at one shear plane", 0, group=_PLATE, ge=0, le=4)

    lines: Count | None = note("gage lines", None, group=_PATTERN, ge=1, le=10)
    rows: Count | None = note("bolts in each line", None, group=_PATTERN, ge=1, le=40)
    pitch: Length | None = note("spacing along the line", None, group=_PATTERN, le=24)
    gage: Lengths = note("spacing of the lines: one for all, or one for each space", (), group=_PATTERN)
    gage_from_back: Length | None = note("back of the leg, or outer face of the tee's flange, to the first line", None, group=_PATTERN, gt=0, le=60)
    stagger: Length = note("shift of every second line along the load", 0.0, group=_PATTERN, ge=-24, le=24)
    holes: Points = note("hole centres instead of lines and rows: x from the first row, y from the back or the lower edge", (), group=_PATTERN)
    missing_bolts: tuple[Count, ...] = note("as built: numbers, as in the bolt table, of bolts that are missing; their holes stay open", (), group=_PATTERN)
    eccentricity_basis: str = note("as built: written basis for accepting a bolt group up to 1/2 in off the member's centroid", "", group=_PATTERN)
    member_end: Length = note("last row to the end of the member", group=_PATTERN, gt=0, le=60)
    other_leg_holes: Points = note("open holes in the outstanding leg: x from the first row, y from the back", (), group=_PATTERN)

    bolt: str = note("bolt size", group=_BOLTS, min_length=1)
    bolt_grade: str = note("bolt group or product", group=_BOLTS, min_length=1)
    threads: Literal["N", "X"] = note("threads in (N) or out of (X) the shear plane", "N", group=_BOLTS)
    installation: Literal["snug", "pretensioned", "slip-critical"] = note("snug, pretensioned or slip-critical", "snug", group=_BOLTS)
    slip_class: Literal["A", "B"] | None = note("faying surface of a slip-critical joint", None, group=_BOLTS)
    member_holes: HoleKind = note("holes of the member", "STD", group=_BOLTS)
    plate_holes: HoleKind = note("holes of the plates", "STD", group=_BOLTS)
    deformation_considered: bool = note("deformation at bolt holes at service load is a consideration", True, group=_BOLTS)
    bare_weathering: bool = note("bare weathering steel outdoors", False, group=_BOLTS)

    gusset_support: str | None = note(f"one of: {', '.join(plate.K_CHOICES)}; or by hand", None, group=_GUSSET)
    gusset_length: Length | None = note("last row to the support, along the load", None, group=_GUSSET, ge=0, le=240)
    gusset_K: Number | None = note("effective length factor, with gusset_support = by hand", None, group=_GUSSET, gt=0, le=2.5)
    gusset_K_basis: str = note("written basis of gusset_K", "", group=_GUSSET)
