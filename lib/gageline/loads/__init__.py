"""Service axial loads by nature, their ASCE 7 combinations, and the load a connection still permits.

Every load is an axial force in kip with tension positive. The natures are those of NATURES; W is the wind in one sense,
W_opposite the wind in the other (normally of the other sign), E the horizontal seismic effect Q_E, whose sign is
immaterial because both senses are taken. Flood, tornado, ice and self-straining loads are not covered; an impact
allowance is to be in the load before it comes here.
"""

from .backsolve import Permissible, Region, permissible, permissible_line, permissible_region
from .demand import DemandRow, Demands, GivenDemand, demands, require_level
from .factors import METHODS, NATURES, STANDARDS, Combination, combinations

__all__ = [
    "METHODS",
    "NATURES",
    "STANDARDS",
    "Combination",
    "DemandRow",
    "Demands",
    "GivenDemand",
    "Permissible",
    "Region",
    "combinations",
    "demands",
    "permissible",
    "permissible_line",
    "permissible_region",
    "require_level",
]
