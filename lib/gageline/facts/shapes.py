"""Rolled shapes, hollow sections and pipe of the current US set: dimensions and properties in inches, see SOURCES.md."""

import re
from collections import namedtuple
from dataclasses import dataclass, fields, replace
from functools import cache, lru_cache

from ..errors import InputError, NotInTable, nearest
from .table import number, plain_fractions, read_table, trade, value

_TABLES = {"W": ("W",), "M": ("M",), "S": ("S",), "HP": ("HP",), "C": ("C",), "MC": ("MC",), "L": ("L",),
           "WT": ("WT",), "MT": ("MT",), "ST": ("ST",), "HSS": ("HSS-rect", "HSS-round"), "Pipe": ("Pipe",)}
SERIES = (*_TABLES, "2L")
_PARENT = {"WT": "W", "MT": "M", "ST": "S"}

_NAME = re.compile(r"\s*(2\s*L|HSS|PIPE|HP|MC|WT|MT|ST|W|M|S|C|L)\s*(.+)")
_WALL = re.compile(r"(.+?)\s*(?:X\s+)?(STD|XXS|XS)\.?")
_BACK_TO_BACK = re.compile(r"(.+?)\s*(LLBB|SLBB)?")

# The tables round 5/16 to 0.313 and 13.375 to 13.4; the designation gives these dimensions exactly.
_EXACT = {"L": ("b_long", "b_short", "t"), "HSS-rect": ("H", "B", "t_nom"), "HSS-round": ("D",)}

# A thickness printed to three decimals (0.188, 0.313) stands for the sixteenth next to it.
_ROUNDING = 0.0006
_HALVED = 0.1


@dataclass(frozen=True)
class Shape:
    """One section; a property that its series does not have is None, lengths are in inches.

    Parameters
    ----------
    name : designation as the trade prints it, for example W8x21.
    series : W, M, S, HP, C, MC, L, WT, MT, ST, 2L, HSS or Pipe.
    W : nominal weight. [lb/ft]
    A : gross area; of both angles for 2L. [in²]
    d : overall depth. [in]
    b_f, t_f, t_w : flange width, flange thickness, web or stem thickness. [in]
    k_des, k_det, k_1 : design and detailing distance to the web toe of the fillet; web centre to the flange toe. [in]
    x_bar : centroid from the back of a channel, or from the back of an angle's long leg. [in]
    y_bar : centroid of a tee from the face of its flange, of an angle from the back of its short leg. [in]
    I_x, I_y : moments of inertia. [in⁴]
    S_x, S_y, Z_x, Z_y : elastic and plastic section moduli. [in³]
    r_x, r_y, r_z : radii of gyration; z is an angle's minor principal axis. [in]
    b_long, b_short, t : legs and nominal thickness of an angle. [in]
    H, B, D : overall height and width of rectangular HSS; outside diameter of round HSS and pipe. [in]
    t_nom, t_des : nominal wall; design wall 0.93 times nominal, on which A, I, S, Z and r rest. [in]
    WG_i, WG_o : workable gage of the flange (inner pair) and spacing to the outer pair. [in]
    parent, parent_d : section a tee was cut from, and its depth. [in]
    single, orientation, gap : of 2L: the one angle, LLBB or SLBB, and the space between the backs. [in]
    """

    name: str
    series: str
    W: float | None = None
    A: float | None = None
    d: float | None = None
    b_f: float | None = None
    t_f: float | None = None
    t_w: float | None = None
    k_des: float | None = None
    k_det: float | None = None
    k_1: float | None = None
    x_bar: float | None = None
    y_bar: float | None = None
    I_x: float | None = None
    S_x: float | None = None
    Z_x: float | None = None
    r_x: float | None = None
    I_y: float | None = None
    S_y: float | None = None
    Z_y: float | None = None
    r_y: float | None = None
    r_z: float | None = None
    b_long: float | None = None
    b_short: float | None = None
    t: float | None = None
    H: float | None = None
    B: float | None = None
    D: float | None = None
    t_nom: float | None = None
    t_des: float | None = None
    WG_i: float | None = None
    WG_o: float | None = None
    parent: str | None = None
    parent_d: float | None = None
    single: "Shape | None" = None
    orientation: str | None = None
    gap: float | None = None

    @property
    def k(self):
        """Distance from the back of a leg, or from the flange face, to the toe of the fillet, as designed with. [in]"""
        return self.k_des

    @property
    def form(self):
        """Product form under which Table A3.1 lists its grades: shape, hss-rect, hss-round or pipe."""
        if self.series == "HSS":
            return "hss-rect" if self.D is None else "hss-round"
        return "pipe" if self.series == "Pipe" else "shape"


LegGages = namedtuple("LegGages", "g g_1 g_2")
LegGages.__doc__ = "Usual gages of one angle leg: g for one line of bolts, g_1 and g_2 for two (None where two do not fit). [in]"


def shape(name):
    """Return the section of a designation.

    Parameters
    ----------
    name : designation such as "W8x21", "L4x4x1/2", "HSS6x4x3/8", "HSS6.000x0.500", "Pipe6STD" or "2L6x4x1/2x3/8LLBB";
        case, spaces, × for x, leading zeros and .5 for 1/2 do not matter.  A fourth figure of 2L is the gap in inches.

    Returns
    -------
    shape : Shape.

    Raises
    ------
    InputError : the name is not text.
    NotInTable : no such section; the three nearest names are given.

    >>> shape("l 4×4×.5").name, shape("L4x4x1/2").A
    ('L4x4x1/2', 3.75)
    """
    if not isinstance(name, str):
        raise InputError(f"a shape is named by text such as 'W8x21', got {name!r}")
    return _find(" ".join(plain_fractions(name).split()))


def names(series=None):
    """Return the printed names of every section, or of one series.

    Parameters
    ----------
    series : one of SERIES, in any case; None for all.

    Returns
    -------
    names : tuple of str in the order of the tables; 2L without gap or orientation.

    Raises
    ------
    NotInTable : no such series.
    """
    if series is None:
        return tuple(name for one in SERIES for name in names(one))
    known = {one.upper(): one for one in SERIES}
    one = known.get(str(series).strip().upper())
    if one is None:
        raise NotInTable(f"series {series!r} is not in the shape tables; they hold {', '.join(SERIES)}")
    if one == "2L":
        return tuple("2" + name for name in names("L"))
    return tuple(found.name for found in _series(one).values())


def double_angle_radii(single, long_legs_back_to_back, gap):
    """Radii of gyration of two equal angles back to back, by the parallel-axis theorem.

    Parameters
    ----------
    single : Shape of series L.
    long_legs_back_to_back : True when the long legs lie on the gusset, False for the short legs.
    gap : space between the backs, the gusset thickness. [in]

    Returns
    -------
    r_x : about the axis normal to the gusset faces' line, the same as for one angle. [in]
    r_y : about the axis of symmetry in the middle of the gusset. [in]

    Raises
    ------
    InputError : not an angle, or a negative gap.
    """
    if getattr(single, "series", None) != "L":
        raise InputError(f"a double angle is made of two L sections, got {getattr(single, 'name', single)!r}")
    if not 0.0 <= gap < float("inf"):
        raise InputError(f"the gap between the angles must be 0 in. or more, got {gap} in.")
    if long_legs_back_to_back:
        r_x, inertia, offset = single.r_x, single.I_y, single.x_bar
    else:
        r_x, inertia, offset = single.r_y, single.I_x, single.y_bar
    return r_x, ((inertia + single.A * (offset + gap / 2) ** 2) / single.A) ** 0.5


def workable_gages(leg):
    """Return the usual gages for bolt lines in an angle leg, from the back of the other leg.

    Parameters
    ----------
    leg : width of the leg. [in]

    Returns
    -------
    gages : LegGages (g, g_1, g_2). [in]

    Raises
    ------
    NotInTable : no usual gage for that leg.

    >>> workable_gages(4)
    LegGages(g=2.5, g_1=None, g_2=None)
    """
    table = _leg_gages()
    for known, gages in table.items():
        if abs(known - leg) < 1e-6:
            return gages
    close = sorted(table, key=lambda known: abs(known - leg))[:3]
    raise NotInTable(f"no usual gage for a leg of {leg} in.; nearest legs are {', '.join(f'{n:g}' for n in close)} in.")


@cache
def _leg_gages():
    units, rows = read_table("angle-gages.csv")
    legs = [{column: value(row[column], unit) for column, unit in units.items()} for row in rows]
    return {row["leg"]: LegGages(row["g"], row["g_1"], row["g_2"]) for row in legs}


@lru_cache(maxsize=1024)
def _find(text):
    match = _NAME.fullmatch(text.upper().replace("×", "X").replace("*", "X"))
    if match:
        prefix, size = match[1].replace(" ", ""), match[2]
        series = "Pipe" if prefix == "PIPE" else prefix
        found = _double(size) if series == "2L" else _lookup(series, size)
        if found:
            return found
        close = _neighbours(series, size)
    else:
        close = nearest(text, names())
    raise NotInTable(f"shape {text!r} is not in the tables; nearest are {close}")


def _neighbours(series, size):
    mark, table = ("2", "L") if series == "2L" else ("", series)
    key = _key("X".join(size.split("X")[:3]), table)
    alike = {known: found.name for known, found in _series(table).items() if key and len(known) == len(key)}
    if alike and series != "Pipe":
        def distance(known):
            sides = zip(sorted(known[:-1]), sorted(key[:-1]), strict=True)
            return sum(abs(a - b) for a, b in sides), abs(known[-1] - key[-1])

        return ", ".join(mark + alike[known] for known in sorted(alike, key=distance)[:3])
    return nearest(series + size.replace(" ", ""), names(series))


def _lookup(series, size):
    key = _key(size, series)
    if key is None:
        return None
    table = _series(series)
    found = table.get(key) or next((table[known] for known in table if _same(key, known)), None)
    return _with_parent(found) if found and series in _PARENT else found


def _same(key, known):
    if len(key) != len(known) or (key[-1:] != known[-1:] and isinstance(known[-1], str)):
        return False
    return all(a == b if isinstance(b, str) else abs(a - b) < _ROUNDING for a, b in zip(key, known))


def _key(size, series):
    wall = ()
    if series == "Pipe":
        match = _WALL.fullmatch(size)
        if not match:
            return None
        size, wall = match[1], (match[2],)
    try:
        return tuple(number(part) for part in size.split("X")) + wall
    except InputError:
        return None


def _double(size):
    match = _BACK_TO_BACK.fullmatch(size)
    parts, orientation = match[1].split("X"), match[2]
    single = _lookup("L", "X".join(parts[:3])) if len(parts) in (3, 4) else None
    if single is None:
        return None
    name, gap, r_x, r_y = "2" + single.name, None, None, None
    if len(parts) == 4:
        try:
            gap = number(parts[3])
        except InputError:
            return None
        name = f"{name}x{trade(gap)}"
    equal = single.b_long == single.b_short
    if equal or orientation:
        r_x, at_gap = double_angle_radii(single, orientation != "SLBB", gap or 0.0)
        r_y = None if gap is None else at_gap
    orientation = None if equal else orientation
    return Shape(name + (orientation or ""), "2L", W=2 * single.W, A=2 * single.A, b_long=single.b_long,
                 b_short=single.b_short, t=single.t, k_des=single.k_des, x_bar=single.x_bar, y_bar=single.y_bar,
                 r_x=r_x, r_y=r_y, r_z=single.r_z, single=single, orientation=orientation, gap=gap)


def _with_parent(tee):
    depth, weight = _key(tee.name[2:].upper(), tee.series)
    whole = _series(_PARENT[tee.series])
    # Half of S6x17.25 is printed ST3x8.6, so the weight agrees to 0.1 lb/ft only.
    parent = next(whole[key] for key in whole if key[0] == 2 * depth and abs(key[1] - 2 * weight) < _HALVED)
    return replace(tee, parent=parent.name, parent_d=parent.d, k_det=parent.k_det)


@cache
def _series(series):
    known = {field.name for field in fields(Shape)}
    found = {}
    for file in _TABLES[series]:
        units, rows = read_table(f"{file}.csv")
        columns = [(column, unit) for column, unit in units.items() if column in known and column != "name"]
        for row in rows:
            key = _key(row["name"][len(series):].upper(), series)
            figures = {column: float(row[column]) if row[column] else None for column, unit in columns}
            figures.update(zip(_EXACT.get(file, ()), key))
            found[key] = Shape(row["name"], series, **figures)
    return found
