"""Bolts by diameter: threads, holes, pretension, edge distances, wrench clearances, lengths; groups: bolt_groups.py."""

import math
import re
from dataclasses import dataclass
from functools import cache

from ..errors import InputError, NotInTable
from .bolt_groups import BoltGroup, bolt_group, bolt_groups, usual_diameter
from .table import number, plain_fractions, read_table, value

__all__ = ["HOLE_KINDS", "WASHER", "BoltGroup", "BoltSize", "Clearances", "Hole", "bolt_group", "bolt_groups",
           "bolt_length_addition", "bolt_size", "bolt_sizes", "clearances", "edge_increment", "hole", "minimum_edge",
           "pretension", "size_notes", "thread_length"]

HOLE_KINDS = {"STD": "standard", "OVS": "oversized", "SSL": "short slot", "LSL": "long slot"}
WASHER = 5 / 32  # in., length to add for each flat washer; handbook table of bolt lengths

_KIND_WORDS = {"STANDARD": "STD", "OVERSIZE": "OVS", "OVERSIZED": "OVS", "SHORTSLOT": "SSL", "SHORTSLOTTED": "SSL",
               "LONGSLOT": "LSL", "LONGSLOTTED": "LSL"}


@dataclass(frozen=True)
class BoltSize:
    """A bolt diameter with its thread.

    Parameters
    ----------
    name : 3/4 or M20.
    d : nominal diameter. [in]
    A_b : area of the unthreaded body. [in²]
    tpi : threads per inch; for metric sizes 25.4 over the pitch. [1/in]
    A_t : tensile stress area. [in²]
    metric : True for M sizes.
    """

    name: str
    d: float
    A_b: float
    tpi: float
    A_t: float
    metric: bool


@dataclass(frozen=True)
class Hole:
    """A bolt hole: width across, length along the slot, equal for round holes. [in]"""

    kind: str
    width: float
    length: float


@dataclass(frozen=True)
class Clearances:
    """Room for the wrench on a heavy hex bolt: socket, head height H_1, shank beyond the nut H_2, clearances C_1..C_3. [in]

    Parameters
    ----------
    socket : diameter of the socket. [in]
    H_1 : height of the head. [in]
    H_2 : length taken by nut and wrench on the shank side. [in]
    C_1 : bolt centre to an obstruction, for tightening. [in]
    C_2 : bolt centre to an obstruction, for entering. [in]
    C_3, C_3_clipped : bolt centre to a fillet, circular and clipped washer. [in]
    """

    socket: float
    H_1: float
    H_2: float
    C_1: float
    C_2: float
    C_3: float
    C_3_clipped: float


def bolt_size(size):
    """Return a bolt size.

    Parameters
    ----------
    size : "3/4", "0.75 in", "1-1/8", "M20", a diameter in inches as a number, or a BoltSize.

    Returns
    -------
    size : BoltSize.

    Raises
    ------
    InputError : neither a number nor text.
    NotInTable : no such bolt; the three nearest sizes are given.

    >>> bolt_size("0.75").name, bolt_size("m 20").name, bolt_size(1.125).name
    ('3/4', 'M20', '1-1/8')
    """
    if isinstance(size, BoltSize):
        return size
    sizes = _sizes()
    if isinstance(size, str):
        text = plain_fractions(size).strip().upper().rstrip('."').removesuffix("IN").strip()
        metric = re.fullmatch(r"M\s*0*(\d+)", text)
        if metric and f"M{metric[1]}" in sizes:
            return sizes[f"M{metric[1]}"][0]
        if metric:
            d = float(metric[1]) / 25.4
        else:
            try:
                d = number(text)
            except InputError:
                raise NotInTable(f"bolt size {size!r} is not in the tables; they hold {', '.join(sizes)}") from None
            found = _by_diameter(d, metric=False)
            if found:
                return found
    elif isinstance(size, int | float) and not isinstance(size, bool):
        d = float(size)
        found = _by_diameter(d)
        if found:
            return found
    else:
        raise InputError(f"a bolt size is text such as '3/4' or 'M20', or inches, got {size!r}")
    close = sorted(sizes, key=lambda name: abs(sizes[name][0].d - d))[:3]
    raise NotInTable(f"bolt size {size!r} is not in the tables; nearest are {', '.join(close)}")


def bolt_sizes():
    """Return the names of all bolt sizes, inch sizes first."""
    return tuple(_sizes())


def size_notes(size, group):
    """Return what has to be said about a size in a group, refusing a size the group does not have.

    Parameters
    ----------
    size : see bolt_size().
    group : BoltGroup.

    Returns
    -------
    notes : tuple of sentences, empty when nothing is unusual.

    Raises
    ------
    NotInTable : the group is not made in that size.
    """
    size = bolt_size(size)
    if size.metric and not group.metric:
        raise NotInTable(f"{group.name} has no metric sizes; {size.name} is made in Groups 120 and 150 only")
    if not size.metric and not group.d_least <= size.d <= group.d_most:
        raise NotInTable(f"{group.name} is made from {_inch(group.d_least)} to {_inch(group.d_most)} in. diameter, "
                         f"got {size.name}")
    usual = usual_diameter(group)
    if size.d > usual + 1e-9:
        return (f"{group.product or group.name} is usually made to {_inch(usual)} in.: confirm {size.name}",)
    return ()


def hole(size, kind):
    """Return the nominal hole of Table J3.3 or J3.3M, the same in 360-16 and 360-22.

    Parameters
    ----------
    size : see bolt_size().
    kind : STD, OVS, SSL or LSL, or in words.

    Returns
    -------
    hole : Hole.

    Raises
    ------
    NotInTable : no such bolt or hole.

    >>> hole("3/4", "SSL")
    Hole(kind='SSL', width=0.8125, length=1.0)
    """
    kind = _kind(kind)
    row = _row(size)
    if kind in ("STD", "OVS"):
        return Hole(kind, row[kind], row[kind])
    return Hole(kind, row[kind + "_w"], row[kind + "_l"])


def minimum_edge(size):
    """Return the least distance from the centre of a standard hole to an edge, Table J3.4 or J3.4M.

    Parameters
    ----------
    size : see bolt_size().

    Returns
    -------
    L_e : edge distance. [in]

    >>> minimum_edge("7/8")
    1.125
    """
    return _row(size)["L_e"]


def edge_increment(size, kind, toward_edge):
    """Return the addition C_2 to the minimum edge distance, Table J3.5 or J3.5M.

    Parameters
    ----------
    size : see bolt_size().
    kind : hole kind, see hole().
    toward_edge : True where a slot's long axis points to the edge.

    Returns
    -------
    C_2 : addition for a slot of full length. [in]

    >>> edge_increment("3/4", "LSL", True)
    0.5625
    """
    kind = _kind(kind)
    row = _row(size)
    if kind == "OVS":
        return row["C_2_OVS"]
    if kind == "STD" or not toward_edge:
        return 0.0
    return row["C_2_SSL"] if kind == "SSL" else 0.75 * bolt_size(size).d


def pretension(size, group):
    """Return the least pretension of Table J3.1 or J3.1M.

    Parameters
    ----------
    size : see bolt_size().
    group : BoltGroup.

    Returns
    -------
    T_b : pretension. [kip]

    Raises
    ------
    NotInTable : the group is not pretensioned, or not made in that size.

    >>> pretension("3/4", bolt_group("120", "360-22"))
    28.0
    """
    if not group.T_b:
        raise NotInTable(f"{group.name} has no pretension in Table J3.1: it is for snug-tight joints only")
    size_notes(size, group)
    return _row(size)[group.T_b]


def clearances(size):
    """Return entering and tightening clearances for heavy hex bolts with aligned wrench.

    Parameters
    ----------
    size : see bolt_size().

    Returns
    -------
    clearances : Clearances.

    Raises
    ------
    NotInTable : the table does not hold that size.

    >>> clearances("3/4").C_1
    1.25
    """
    row = _row(size, "socket", "clearance table")
    return Clearances(*(row[name] for name in Clearances.__dataclass_fields__))


def bolt_length_addition(size):
    """Return the length to add to the grip, washers excepted; the sum is rounded up to 1/4 in.

    Parameters
    ----------
    size : see bolt_size().

    Returns
    -------
    addition : for nut and point. [in]

    Raises
    ------
    NotInTable : the table does not hold that size.
    """
    return _row(size, "add", "bolt length table")["add"]


def thread_length(size):
    """Return the thread length of a structural bolt.

    Parameters
    ----------
    size : see bolt_size().

    Returns
    -------
    thread : length of thread. [in]

    Raises
    ------
    NotInTable : the table does not hold that size.
    """
    return _row(size, "thread", "thread length table")["thread"]


def _kind(kind):
    text = re.sub(r"[^A-Z]", "", str(kind).upper())
    text = _KIND_WORDS.get(text, text)
    if text not in HOLE_KINDS:
        known = ", ".join(f"{short} ({words})" for short, words in HOLE_KINDS.items())
        raise NotInTable(f"hole kind {kind!r} is not in Table J3.3; it must be one of {known}")
    return text


def _row(size, column=None, table=None):
    name = bolt_size(size).name
    row = _sizes()[name][1]
    if column and row.get(column) is None:
        held = [other for other, (_, figures) in _sizes().items() if figures.get(column) is not None]
        raise NotInTable(f"the {table} does not hold {name}; it holds {', '.join(held)} in.")
    return row


def _by_diameter(d, metric=None):
    for size, _ in _sizes().values():
        if abs(size.d - d) < 1e-6 and metric in (None, size.metric):
            return size
    return None


def _inch(d):
    return next((size.name for size, _ in _sizes().values() if abs(size.d - d) < 1e-9), f"{d:g}")


@cache
def _sizes():
    sizes = {}
    for file, metric in (("bolts-inch.csv", False), ("bolts-metric.csv", True)):
        units, rows = read_table(file)
        for row in rows:
            name = row.pop("size")
            d = value(name.removeprefix("M"), units["size"])
            figures = {column: value(cell, units[column]) for column, cell in row.items()}
            if metric:
                tpi, A_t = 1 / figures["p"], math.pi / 4 * (d - 0.9382 * figures["p"]) ** 2
            else:
                tpi, A_t = figures["n"], math.pi / 4 * (d - 0.9743 / figures["n"]) ** 2
            sizes[name] = BoltSize(name, d, math.pi * d**2 / 4, tpi, A_t, metric), figures
    return sizes
