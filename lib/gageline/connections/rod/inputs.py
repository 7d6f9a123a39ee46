"""Inputs of a threaded hanger rod and its two attachments."""

from typing import Literal

from pydantic import create_model

from ...errors import InputError
from ..base import CalcInputs
from ..fields import Length, note

ENDS = ("upper", "lower")
_ROD = "Rod"


class _Rod(CalcInputs):
    """Inputs of a threaded hanger rod."""

    rod: str = note("diameter of the thread", group=_ROD, min_length=1)
    rod_grade: str = note("steel of the rod", group=_ROD, min_length=1)
    rod_length: Length | None = note("length of the rod, for its elongation", None, group=_ROD, gt=0, le=6000)
    body_diameter: Length | None = note("diameter of the body, where less than that of the thread: upset ends or rolled threads", None, group=_ROD,
                                        gt=0.1, le=6)
    thread_strength: Literal["body area", "tensile stress area"] = note("area of the thread's strength; tensile stress area: 360-22 only",
                                                                        "body area", group=_ROD)
    nut: Literal["heavy hex", "hex"] = note("nuts: heavy hex or hex", "heavy hex", group=_ROD)
    elongation_limit: Length | None = note("greatest elongation wanted at service load", None, group=_ROD, gt=0, le=12)
    lug_electrode: str = note("filler metal of lugs' welds", "E70", group=_ROD)


def _of_end(end):
    """Return the fields of one attachment."""
    group = f"{end.capitalize()} attachment"
    size = Length | None
    return {
        end: (Literal["nut and plate", "welded lug"], note("nut and plate, or welded lug with clevis and pin", group=group)),
        f"{end}_thickness": (Length, note("thickness of the plate or the lug", group=group, gt=0, le=8)),
        f"{end}_width": (Length, note("width of the plate, or of the lug at its pin", group=group, gt=0, le=60)),
        f"{end}_grade": (str, note("steel of the plate or the lug", group=group, min_length=1)),
        f"{end}_hole": (size, note("diameter of the plate's hole (default: standard hole)", None, group=group, gt=0, le=8)),
        f"{end}_span": (size, note("span of the plate between its two supports, where it bends under the nut", None, group=group, gt=0, le=120)),
        f"{end}_washer": (size, note("width of a square plate washer under the nut", None, group=group, gt=0, le=24)),
        f"{end}_washer_thickness": (size, note("thickness of the plate washer", None, group=group, gt=0, le=4)),
        f"{end}_washer_grade": (str | None, note("steel of the plate washer", None, group=group)),
        f"{end}_edge": (size, note("lug: edge of the hole (not its centre) to its end, along the force", None, group=group, gt=0, le=40)),
        f"{end}_pin": (size, note("lug: diameter of the pin", None, group=group, gt=0.25, le=12)),
        f"{end}_pin_grade": (str | None, note("lug: steel of the pin", None, group=group)),
        f"{end}_hole_clearance": (size, note("lug: diameter of the hole less that of the pin (default: 1/32 in)", None, group=group, ge=0, le=1)),
        f"{end}_arm": (size, note("lug: thickness of one arm of the clevis", None, group=group, gt=0, le=4)),
        f"{end}_gap": (size, note("lug: clear gap between an arm of the clevis and the lug", None, group=group, ge=0, le=4)),
        f"{end}_weld": (size, note("lug: leg of the fillet welds on both its faces", None, group=group, gt=0, le=2)),
    }


OF_NUT = ("hole", "span", "washer", "washer_thickness", "washer_grade")
OF_LUG = ("edge", "pin", "pin_grade", "arm", "gap", "weld")
"""Inputs of an attachment that one kind only has; those of a lug are all needed."""

_RodInputs = create_model("RodInputs", __base__=_Rod, **{name: field for end in ENDS for name, field in _of_end(end).items()})


class RodInputs(_RodInputs):
    """Inputs of a threaded hanger rod, its upper and its lower attachment."""


def checked(given, end):
    """Refuse inputs of an attachment that do not go with its kind, or that are missing.

    Raises
    ------
    InputError
    """
    lug = getattr(given, end) == "welded lug"
    for name in OF_NUT if lug else (*OF_LUG, "hole_clearance"):
        if getattr(given, f"{end}_{name}") is not None:
            raise InputError(f"{end}_{name} does not go with {end} = \"{getattr(given, end)}\"; remove it")
    needed = OF_LUG if lug else ("washer", "washer_thickness", "washer_grade") if given_washer(given, end) else ()
    for name in needed:
        if getattr(given, f"{end}_{name}") is None:
            raise InputError(f"input {end}_{name} is missing: {type(given).model_fields[f'{end}_{name}'].description}")


def given_washer(given, end):
    """Return whether any input of a plate washer is given."""
    return any(getattr(given, f"{end}_{name}") is not None for name in ("washer", "washer_thickness", "washer_grade"))


