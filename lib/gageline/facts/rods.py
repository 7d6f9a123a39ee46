"""Threads of hanger rods by diameter, and the nuts that go with them."""

from dataclasses import dataclass
from functools import cache

from ..errors import InputError, NotInTable
from . import bolts
from .table import number, plain_fractions, read_table

NUTS = {"heavy hex": 1 / 8, "hex": 0.0}
"""Kind of nut -> what its width across flats has beyond 1.5 times the thread's diameter. [in]  ASME B18.2.2, from memory."""


@dataclass(frozen=True)
class Thread:
    """A thread: its name, nominal diameter d [in], threads per inch tpi (25.4 over the pitch of metric ones) and whether it is metric."""

    name: str
    d: float
    tpi: float
    metric: bool


def thread(size):
    """Return the thread of a rod.

    Parameters
    ----------
    size : "3/4", "1-1/4 in", or "M20".

    Returns
    -------
    thread : Thread, UNC for inch sizes.

    Raises
    ------
    InputError : not text.
    NotInTable : no such rod; the three nearest sizes are given.

    >>> thread("3/4 in").tpi, thread("2").tpi
    (10.0, 4.5)
    """
    if not isinstance(size, str):
        raise InputError(f"a rod is named by text such as '3/4' or 'M20', got {size!r}")
    text = plain_fractions(size).strip().upper().rstrip('."').removesuffix("IN").strip()
    if text.startswith("M"):
        found = bolts.bolt_size(text)
        return Thread(found.name, found.d, found.tpi, True)
    try:
        d = number(text)
    except InputError:
        raise NotInTable(f"rod size {size!r} is not in the tables; they hold {', '.join(_threads())}") from None
    for name, (known, tpi) in _threads().items():
        if abs(known - d) < 1e-9:
            return Thread(name, known, tpi, False)
    close = sorted(_threads(), key=lambda name: abs(_threads()[name][0] - d))[:3]
    raise NotInTable(f"rod size {size!r} is not in the tables; nearest are {', '.join(close)}")


def nut_width(d, kind):
    """Return the width across flats of a nut. [in]

    Parameters
    ----------
    d : nominal diameter of the thread. [in]
    kind : a key of ``NUTS``.
    """
    return 1.5 * d + NUTS[kind]


def standard_hole(d):
    """Return the diameter of a standard hole for a rod, of the size that Table J3.3 gives for a bolt. [in]"""
    try:
        return bolts.hole(bolts.bolt_size(d), "STD").width
    except NotInTable:
        return d + (1 / 8 if d >= 1.0 else 1 / 16)


@cache
def _threads():
    _, rows = read_table("rods-inch.csv")
    return {row["size"]: (number(row["size"]), number(row["n"])) for row in rows}
