"""Inputs of a pin-connected end."""

from typing import Literal

from ..base import CalcInputs
from ..fields import Length, note

_MEMBER, _EYEBAR, _PIN, _SUPPORT = "Member", "Eyebar", "Pin", "Support plates"


class PinnedInputs(CalcInputs):
    """Inputs of a pin-connected plate or eyebar, its pin and the plates that hold the pin."""

    member_kind: Literal["pin plate", "eyebar"] = note("pin plate (D5) or eyebar (D6)", "pin plate", group=_MEMBER)
    member_plates: Literal[1, 2] = note("1: between two support plates; 2: outside one support plate", 1, group=_MEMBER)
    member_thickness: Length = note("thickness of one plate or bar", group=_MEMBER, gt=0, le=8)
    member_width: Length = note("width of the plate, or of the eyebar's body", group=_MEMBER, gt=0, le=60)
    member_grade: str = note("steel of the member", group=_MEMBER, min_length=1)
    member_edge: Length | None = note("edge of the hole (not its centre) to the end of a pin plate", None, group=_MEMBER, gt=0, le=40)
    member_corner_cut: Length = note("leg of corners cut at 45 degrees", 0.0, group=_MEMBER, ge=0, le=30)

    head_diameter: Length | None = note("diameter of the eyebar's head", None, group=_EYEBAR, gt=0, le=120)
    head_radius: Length | None = note("radius of the transition from head to body", None, group=_EYEBAR, gt=0, le=240)
    eyebar_clamped: bool = note("external nuts clamp pin plates and fillers on the eyebar", False, group=_EYEBAR)

    pin_diameter: Length = note("diameter of the pin", group=_PIN, gt=0.25, le=20)
    pin_grade: str = note("steel of the pin", group=_PIN, min_length=1)
    hole_clearance: Length = note("diameter of the holes less that of the pin", 1 / 32, group=_PIN, ge=0, le=1)
    moves_under_load: bool = note("the parts turn on the pin while under full load", True, group=_PIN)
    gap: Length = note("clear gap between an outer and the inner ply", group=_PIN, ge=0, le=6)
    pin_shear: Literal["both", "yielding", "threaded part"] = note("shear of the pin: by yielding, as a threaded part, or the lesser of both",
                                                                   "both", group=_PIN)
    pin_shear_basis: str = note("written basis of pin_shear, where not both", "", group=_PIN)

    support_thickness: Length = note("thickness of one support plate", group=_SUPPORT, gt=0, le=8)
    support_width: Length = note("width of a support plate at the pin", group=_SUPPORT, gt=0, le=120)
    support_grade: str = note("steel of the support plates", group=_SUPPORT, min_length=1)
    support_edge: Length = note("edge of the hole (not its centre) to the end of a support plate, on the side the pin bears on", group=_SUPPORT,
                                gt=0, le=40)
    support_corner_cut: Length = note("leg of corners cut at 45 degrees", 0.0, group=_SUPPORT, ge=0, le=30)
