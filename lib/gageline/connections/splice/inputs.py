"""Inputs of a bolted tension splice; both halves are alike, one is described."""

from typing import Literal

from ..base import CalcInputs
from ..bolted.inputs import HoleKind
from ..fields import Length, Lengths, note

_MEMBER, _FLANGE, _WEB, _BOLTS = "Member", "Flange splice", "Web splice, or the splice of a flat member", "Bolts"


class SpliceInputs(CalcInputs):
    """Inputs of a bolted tension splice of a W shape or a flat plate."""

    member: str = note("W shape, or PL thickness x width", group=_MEMBER, min_length=1)
    member_grade: str = note("steel of the member", group=_MEMBER, min_length=1)
    member_length: Length | None = note("length for the advice on slenderness", None, group=_MEMBER, gt=0, le=24_000)
    joint_gap: Length = note("gap between the ends of the two members", group=_MEMBER, ge=0, le=12)
    plate_grade: str = note("steel of all splice plates", group=_MEMBER, min_length=1)

    flange_plate_thickness: Length | None = note("thickness of the plate on the outer face of each flange", None, group=_FLANGE, gt=0, le=8)
    flange_plate_width: Length | None = note("width of that plate", None, group=_FLANGE, gt=0, le=60)
    flange_plate_end: Length | None = note("row farthest from the joint to the end of that plate", None, group=_FLANGE, gt=0, le=60)
    flange_lines: int | None = note("gage lines in each flange", None, group=_FLANGE, ge=2, le=8)
    flange_rows: int | None = note("bolts in each line on one side of the joint", None, group=_FLANGE, ge=1, le=40)
    flange_pitch: Length | None = note("spacing along the line", None, group=_FLANGE, gt=0, le=24)
    flange_gage: Lengths = note("spacing of the lines: one for all, or one for each space", (), group=_FLANGE)
    flange_member_end: Length | None = note("row next to the joint to the end of the member", None, group=_FLANGE, gt=0, le=60)
    flange_filler: Length = note("filler between flange and plate, total thickness", 0.0, group=_FLANGE, ge=0, le=6)

    web_plates: Literal[1, 2] = note("plates on the web or flat member: 1 (one side) or 2 (both sides)", 2, group=_WEB)
    web_plate_thickness: Length | None = note("thickness of one plate", None, group=_WEB, gt=0, le=8)
    web_plate_width: Length | None = note("width of the plates across the load", None, group=_WEB, gt=0, le=60)
    web_plate_end: Length | None = note("row farthest from the joint to the end of the plates", None, group=_WEB, gt=0, le=60)
    web_lines: int | None = note("gage lines", None, group=_WEB, ge=1, le=10)
    web_rows: int | None = note("bolts in each line on one side of the joint", None, group=_WEB, ge=1, le=40)
    web_pitch: Length | None = note("spacing along the line", None, group=_WEB, gt=0, le=24)
    web_gage: Lengths = note("spacing of the lines: one for all, or one for each space", (), group=_WEB)
    web_member_end: Length | None = note("row next to the joint to the end of the member", None, group=_WEB, gt=0, le=60)
    web_filler: Length = note("filler at each shear plane, total thickness", 0.0, group=_WEB, ge=0, le=6)

    bolt: str = note("bolt size", group=_BOLTS, min_length=1)
    bolt_grade: str = note("bolt group or product", group=_BOLTS, min_length=1)
    threads: Literal["N", "X"] = note("threads in (N) or out of (X) the shear plane", "N", group=_BOLTS)
    installation: Literal["snug", "pretensioned", "slip-critical"] = note("snug, pretensioned or slip-critical", "snug", group=_BOLTS)
    slip_class: Literal["A", "B"] | None = note("faying surface of a slip-critical joint", None, group=_BOLTS)
    member_holes: HoleKind = note("holes of the member", "STD", group=_BOLTS)
    plate_holes: HoleKind = note("holes of the plates", "STD", group=_BOLTS)
    deformation_considered: bool = note("deformation at bolt holes at service load is a consideration", True, group=_BOLTS)
    bare_weathering: bool = note("bare weathering steel outdoors", False, group=_BOLTS)
