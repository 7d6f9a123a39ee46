"""Inputs of a hollow section on a gusset: HSS or pipe slotted over a concentric gusset, or HSS between two side gussets."""

from typing import Literal

from .. import plate
from ..base import CalcInputs
from ..fields import Length, Number, note

_MEMBER, _GUSSET, _WELDS, _REINFORCEMENT, _COMPRESSION = "Member", "Gusset", "Slot and welds", "Reinforcement", "Gusset in compression"


class SlottedInputs(CalcInputs):
    """Inputs of a hollow section on a gusset."""

    member: str = note("HSS or pipe", group=_MEMBER, min_length=1)
    member_grade: str = note("steel of the member", group=_MEMBER, min_length=1)
    side_along_gusset: Literal["long", "short"] | None = note("side of a rectangular tube that lies along the gusset", None, group=_MEMBER)
    member_length: Length | None = note("length for the advice on slenderness", None, group=_MEMBER, gt=0, le=24_000)
    U_by_hand: Number | None = note("shear lag factor set by the engineer", None, group=_MEMBER, gt=0, le=1)
    U_basis: str = note("written basis of U_by_hand", "", group=_MEMBER)

    gussets: Literal[1, 2] = note("1: concentric, through slots of the tube; 2: one on each side of a rectangular tube", 1, group=_GUSSET)
    plate_thickness: Length = note("thickness of one gusset", group=_GUSSET, gt=0, le=4)
    plate_width: Length = note("width of the gusset across the load, where the tube ends", group=_GUSSET, gt=0, le=200)
    plate_grade: str = note("steel of the gusset", group=_GUSSET, min_length=1)

    weld_length: Length = note("length of each of the four weld lines", group=_WELDS, gt=0, le=120)
    weld_leg: Length = note("leg of the fillet welds", group=_WELDS, gt=0, le=2)
    electrode: str = note("class of the filler metal", "E70", group=_WELDS)
    slot_clearance: Length = note("width of the slot over the thickness of the gusset, total", 1 / 16, group=_WELDS, ge=0, le=1)
    slot_end_width: Length | None = note("width of the slot's end where it is made wider, as by a drilled hole", None, group=_WELDS, gt=0, le=24)
    weld_gap: Length | None = note("largest gap between tube and gusset at a weld (default: the whole clearance)", None, group=_WELDS, ge=0, le=1)
    weld_held_back: Length = note("end of the weld short of the gusset's edge in the tube", 0.0, group=_WELDS, ge=0, le=24)
    slot_overrun: Length = note("end of the slot beyond the gusset's edge", 0.0, group=_WELDS, ge=0, le=48)
    end_return: bool = note("the welds return round the gusset's edge and close the slot", False, group=_WELDS)

    reinforcing_thickness: Length | None = note("thickness of two plates that reinforce the net section", None, group=_REINFORCEMENT, gt=0, le=4)
    reinforcing_width: Length | None = note("width of one reinforcing plate", None, group=_REINFORCEMENT, gt=0, le=48)
    reinforcing_length: Length | None = note("length of its welds on each side of the net section", None, group=_REINFORCEMENT, gt=0, le=60)
    reinforcing_leg: Length | None = note("leg of its fillet welds", None, group=_REINFORCEMENT, gt=0, le=2)
    reinforcing_grade: str | None = note("steel of the reinforcing plates", None, group=_REINFORCEMENT)

    gusset_support: str | None = note(f"one of: {', '.join(plate.K_CHOICES)}; or by hand", None, group=_COMPRESSION)
    gusset_length: Length | None = note("end of the tube to the support, along the load", None, group=_COMPRESSION, ge=0, le=240)
    gusset_K: Number | None = note("effective length factor, with gusset_support = by hand", None, group=_COMPRESSION, gt=0, le=2.5)
    gusset_K_basis: str = note("written basis of gusset_K", "", group=_COMPRESSION)
