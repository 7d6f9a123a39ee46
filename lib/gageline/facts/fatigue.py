"""Detail categories of fatigue: constant, threshold, and what they stand for."""

from dataclasses import dataclass
from functools import cache

from ..errors import NotInTable
from .table import read_table, value

CYCLES = 20_000
"""Cycles of live load up to which no fatigue need be regarded.  AISC 360 Appendix 3.1."""
F_1000, F_100 = 1000.0, 100.0
"""Stresses that the equations of categories A to E' and G, and of category F, are written for. [ksi]  AISC 360 Appendix 3.3."""
T_REF = 1.0
"""Thickness that the reduction for transverse fillets is written for. [in]  AISC 360 Appendix 3.3."""
THICK = 0.5
"""Thickness above which the end of longitudinal welds is in category E'. [in]  AISC 360 Table A-3.1, 4.1."""


@dataclass(frozen=True)
class Category:
    """A detail category: constant C_f [-], threshold F_TH [ksi] and what it stands for."""

    name: str
    C_f: float
    F_TH: float
    words: str


@cache
def _categories():
    units, rows = read_table("fatigue.csv")
    return {row["category"]: Category(row["category"], value(row["C_f"], ""), value(row["F_TH"], units["F_TH"]), row["words"]) for row in rows}


def category(name):
    """Return a detail category.

    Parameters
    ----------
    name : A, B, B', C, D, E, E', F or G.

    Raises
    ------
    NotInTable
        No such category.

    >>> category("E'").C_f
    0.39
    """
    if name not in _categories():
        raise NotInTable(f"fatigue category {name!r} is not in the tables; they hold {', '.join(_categories())}")
    return _categories()[name]


def longitudinal(t):
    """Return the category of base metal of thickness t at the end of longitudinal fillets. [in]

    >>> longitudinal(0.5).name, longitudinal(0.625).name
    ('E', "E'")
    """
    return category("E" if t <= THICK + 1e-9 else "E'")
