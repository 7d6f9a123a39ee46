"""Inputs of a welded tension connection."""

from typing import Literal

from .. import plate
from ..base import CalcInputs
from ..fields import Length, Number, note

WELDS = ("longitudinal", "longitudinal and end", "transverse, both ends")

_MEMBER, _PLATE, _WELDS, _GUSSET = "Member", "Connection plate", "Welds", "Gusset in compression"


class WeldedInputs(CalcInputs):
    """Inputs of a welded tension connection."""

    member: str = note("shape, or PL thickness x width", group=_MEMBER, min_length=1)
    member_grade: str = note("steel of the member", group=_MEMBER, min_length=1)
    connected_by: str | None = note("connected element: both flanges, web, flange, long leg, short leg", None, group=_MEMBER)
    member_length: Length | None = note("length for the advice on slenderness", None, group=_MEMBER, gt=0, le=24_000)
    U_by_hand: Number | None = note("shear lag factor set by the engineer", None, group=_MEMBER, gt=0, le=1)
    U_basis: str = note("written basis of U_by_hand", "", group=_MEMBER)

    plates: Literal[1, 2] = note("plates on a flat bar or on a web: 1 (lap) or 2 (both sides)", 1, group=_PLATE)
    plate_thickness: Length = note("thickness of one plate", group=_PLATE, gt=0, le=8)
    plate_width: Length = note("width of the plate across the load", group=_PLATE, gt=0, le=200)
    plate_grade: str = note("steel of the plate", group=_PLATE, min_length=1)
    plate_offset: Length = note("middle between the welds off the centre line of the plate", 0.0, group=_PLATE, ge=-100, le=100)

    welds: Literal[WELDS] = note(f"one of: {'; '.join(WELDS)}", "longitudinal", group=_WELDS)
    weld_size: Length = note("leg size of the fillet welds", group=_WELDS, gt=0, le=2)
    electrode: str = note("filler metal", "E70", group=_WELDS, min_length=1)
    lap: Length = note("lap of member and plate along the load", group=_WELDS, gt=0, le=240)
    weld_length: Length | None = note("length of each longitudinal weld, both alike", None, group=_WELDS, gt=0, le=240)
    weld_heel: Length | None = note("length along the heel of an angle, where heel and toe differ", None, group=_WELDS, gt=0, le=240)
    weld_toe: Length | None = note("length along the toe of an angle", None, group=_WELDS, gt=0, le=240)
    weld_balanced: Length | None = note("total length of the welds of one angle, shared so that they balance on its centroid", None, group=_WELDS,
                                        gt=0, le=480)

    gusset_support: str | None = note(f"one of: {', '.join(plate.K_CHOICES)}; or by hand", None, group=_GUSSET)
    gusset_length: Length | None = note("end of the welds to the support, along the load", None, group=_GUSSET, ge=0, le=240)
    gusset_K: Number | None = note("effective length factor, with gusset_support = by hand", None, group=_GUSSET, gt=0, le=2.5)
    gusset_K_basis: str = note("written basis of gusset_K", "", group=_GUSSET)
