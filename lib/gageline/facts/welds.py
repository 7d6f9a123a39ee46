"""Fillet welds: least size by thickness joined, electrodes, and how a filler metal's strength stands to the base metal's."""

import re
from dataclasses import dataclass
from functools import cache

from ..errors import InputError, NotInTable
from .grades import matching_filler
from .table import read_table, value

EDGE_THICKNESS = 1 / 4
"""Thickness from which a fillet along an edge stays below it. [in]  AISC 360 J2.2b(b)."""
EDGE_MARGIN = 1 / 16
"""By how much it stays below. [in]  AISC 360 J2.2b(b)."""
LEAST_LAP = 1.0
"""Lower limit of the lap of a lap joint. [in]  AISC 360 J2.2b."""
CLASS_STEP = 10.0
"""Strength from one filler metal class to the next. [ksi]  AISC 360 J2.6."""


@dataclass(frozen=True)
class Electrode:
    """A class of filler metal: its name and its strength F_EXX. [ksi]"""

    name: str
    F_EXX: float


def electrode(name):
    """Return a filler metal class.

    Parameters
    ----------
    name : such as "E70", "E70XX", "e7018" or "70".

    Returns
    -------
    electrode : Electrode.

    Raises
    ------
    NotInTable : no such class.

    >>> electrode("E70XX").F_EXX, electrode("e7018").F_EXX
    (70.0, 70.0)
    """
    digits = re.sub(r"[^0-9]", "", str(name))
    found = next((each for each in _electrodes() if digits and digits[:2] == each.name[1:]), None)
    if found is None or len(digits) not in (2, 4):
        raise NotInTable(f"electrode {name!r} is not in the tables; they hold {', '.join(each.name for each in _electrodes())}")
    return found


def minimum_fillet(thickness):
    """Return the least leg size of a fillet weld, Table J2.4, the same in 360-16 and 360-22.

    Parameters
    ----------
    thickness : of the thinner part joined. [in]

    Returns
    -------
    w_min : least leg size. [in]

    Raises
    ------
    InputError : the thickness is not positive.

    >>> minimum_fillet(0.25), minimum_fillet(0.3125), minimum_fillet(1.0)
    (0.125, 0.1875, 0.3125)
    """
    if not 0.0 < thickness < float("inf"):
        raise InputError(f"the thickness of the thinner part joined must be more than 0 in., got {thickness} in.")
    return next(w_min for t_to, w_min in _minimum() if t_to is None or thickness <= t_to + 1e-9)


def classes_above_matching(F_EXX, grade, thickness):
    """Return how many classes a filler metal lies above the strongest one that matches the base metal; negative when below.

    For fillet, plug and slot welds any class up to one above matching is allowed (Table J2.5).

    Parameters
    ----------
    F_EXX : filler metal strength. [ksi]
    grade : name of the base metal's grade.
    thickness : of the base metal. [in]

    Returns
    -------
    classes : int.

    Raises
    ------
    NotInTable : the user note table of Section J2.6 names no filler metal for that grade.

    >>> classes_above_matching(70.0, "A992", 0.5), classes_above_matching(90.0, "A36", 1.0)
    (0, 2)
    """
    matching, _ = matching_filler(grade, thickness)
    return round((F_EXX - max(matching)) / CLASS_STEP)


def electrodes():
    """Return the names of all filler metal classes."""
    return tuple(each.name for each in _electrodes())


@cache
def _electrodes():
    _, rows = read_table("electrodes.csv")
    return tuple(Electrode(row["class"], float(row["F_EXX"])) for row in rows)


@cache
def _minimum():
    units, rows = read_table("fillet-minimum.csv")
    return tuple((value(row["t_to"], units["t_to"]), value(row["w_min"], units["w_min"])) for row in rows)
