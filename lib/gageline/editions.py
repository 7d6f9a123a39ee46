"""The code editions and methods a calculation may be made to, and how they are printed."""

from dataclasses import dataclass

from .check import METHODS
from .errors import InputError
from .formula import EDITIONS
from .units import SYSTEMS

LOADS = ("7-22", "7-16")


@dataclass(frozen=True)
class Basis:
    """What a project fixes for all its calculations: specification edition, method, loads standard, units of print.

    With ``units_system`` "SI" the specification's own metric constants hold; "dual" prints both and keeps the inch constants.
    """

    edition: str = "360-22"
    method: str = "LRFD"
    loads: str = "7-22"
    units_system: str = "US"

    def __post_init__(self):
        for name, allowed in (("edition", EDITIONS), ("method", METHODS), ("loads", LOADS), ("units_system", SYSTEMS)):
            if getattr(self, name) not in allowed:
                raise InputError(f"{name} = {getattr(self, name)!r} is not known; allowed: {', '.join(allowed)}")

    @property
    def specification(self):
        """The specification as printed."""
        return f"AISC {self.edition}"

    @property
    def loads_standard(self):
        """The loads standard as printed."""
        return f"ASCE/SEI {self.loads}"


CLAUSES = {
    "bolt shear": {"360-16": "J3.6", "360-22": "J3.7"},
    "bearing and tearout": {"360-16": "J3.10", "360-22": "J3.11"},
    "combined tension and shear": {"360-16": "J3.7", "360-22": "J3.8"},
    "slip with tension": {"360-16": "J3.9", "360-22": "J3.10"},
    "slip": {"360-16": "J3.8", "360-22": "J3.9"},
    "minimum spacing": {"360-16": "J3.3", "360-22": "J3.4"},
    "minimum edge distance": {"360-16": "J3.4", "360-22": "J3.5"},
    "maximum spacing and edge distance": {"360-16": "J3.5", "360-22": "J3.6"},
    "holes": {"360-16": "J3.2", "360-22": "J3.3"},
}
"""Topic -> clause number by edition, where the two differ."""

REFERENCES = {
    "360-22": "ANSI/AISC 360-22, Specification for Structural Steel Buildings, American Institute of Steel Construction, 2022",
    "360-16": "ANSI/AISC 360-16, Specification for Structural Steel Buildings, American Institute of Steel Construction, 2016",
    "7-22": "ASCE/SEI 7-22, Minimum Design Loads and Associated Criteria for Buildings and Other Structures, 2022",
    "7-16": "ASCE/SEI 7-16, Minimum Design Loads and Associated Criteria for Buildings and Other Structures, 2016",
    "AISC 341 360-22": "ANSI/AISC 341-22, Seismic Provisions for Structural Steel Buildings, 2022, from memory; to be confirmed",
    "AISC 341 360-16": "ANSI/AISC 341-22, Seismic Provisions for Structural Steel Buildings, 2022, from memory; to be confirmed",
    "RCSC 360-22": "RCSC Specification for Structural Joints Using High-Strength Bolts, 2020",
    "RCSC 360-16": "RCSC Specification for Structural Joints Using High-Strength Bolts, 2014",
    "AWS D1.1 360-22": "AWS D1.1/D1.1M:2020, Structural Welding Code—Steel, American Welding Society",
    "AWS D1.1 360-16": "AWS D1.1/D1.1M:2015, Structural Welding Code—Steel, American Welding Society",
    "Manual 360-22": "Steel Construction Manual, 16th edition, American Institute of Steel Construction, 2023",
    "Manual 360-16": "Steel Construction Manual, 15th edition, American Institute of Steel Construction, 2017",
}
"""Works cited in a report, by edition."""
