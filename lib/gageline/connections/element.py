"""The element through which a member is connected: its strip, what hangs on it, its eccentricity and its shear lag case."""

import re
from collections.abc import Callable
from dataclasses import dataclass
from fractions import Fraction

from .. import units
from ..errors import InputError, NotInTable
from ..facts import shapes
from ..geometry import Attachment
from ..provisions import shear_lag

WAYS = {
    **dict.fromkeys(("W", "M", "S", "HP"), ("both flanges", "web")),
    **dict.fromkeys(("WT", "MT", "ST"), ("flange", "stem")),
    **dict.fromkeys(("C", "MC"), ("web",)),
    **dict.fromkeys(("L", "2L"), ("long leg", "short leg")),
    "PL": ("flat",),
}
"""Series -> the elements through which it may be bolted."""

_FLAT = re.compile(r"\s*(?:plate|pl|bar|flat)\.?\s*(?P<t>[^x×]+?)\s*[x×]\s*(?P<w>.+?)\s*$", re.IGNORECASE)


@dataclass(frozen=True)
class Element:
    """The connected element of a member.

    Parameters
    ----------
    member : printed designation. series : its series, "PL" for flat bar and plate.
    name : of the element ("flange"). pieces : like pieces of the member that share the load (2 for both flanges and for 2L).
    joints : bolt groups (2 for both flanges). plies : member plies that one bolt passes (2 for 2L).
    width, t : of the strip that holds the holes. [in]
    back : distance from the back, from which gages are measured, to y = 0; None where the pattern is centred on the strip. [in]
    attachments : what hangs on the strip. faces : y of the faces that a wrench meets. [in]
    A_g, A_c : gross area of the member, gross area of its connected elements. [in²]
    eccentricity : function of ``do`` that returns x̄, or None for a member whose every element is connected. [in]
    case : "7 flange", "7 web", "8" or "" for what Table D3.1 offers besides case 2. wide_flange : b_f at least 2/3 d.
    r : least radius of gyration and r_name its sign. [in]
    offset : y of the member's centroid in the plane of the element, None where J1.7 does not ask for it. [in]
    section : the shape, for drawing. gap : between the backs of a double angle. other_leg : width of the leg not connected. [in]
    """

    member: str
    series: str
    name: str
    pieces: int
    joints: int
    plies: int
    width: float
    t: float
    back: float | None
    attachments: tuple
    faces: tuple
    A_g: float
    A_c: float
    eccentricity: Callable | None
    case: str
    wide_flange: bool
    r: float
    r_name: str
    offset: float | None
    section: object
    edge_names: tuple = ("lower edge", "upper edge")
    gap: float = 0.0
    other_leg: float = 0.0


def element(designation, way=None, gap=None, usual_gap=0.0):
    """Return the connected element of a member.

    Parameters
    ----------
    designation : shape, or "PL 1/2 x 6" (thickness x width) for a flat bar or plate.
    way : one of ``WAYS``; may be left out where there is one only, or where an angle has equal legs.
    gap : clear distance between the backs of a double angle; None: as written in the designation, or ``usual_gap``. [in]

    Raises
    ------
    NotInTable
        Unknown shape.
    InputError
        A way in which the series cannot be bolted, or none given where there are two.
    """
    flat = _FLAT.match(designation)
    if flat:
        if way not in (None, "flat"):
            raise InputError(f"connected_by = {way!r}: a flat bar or plate is bolted flat; leave connected_by out")
        return _flat(designation, units.read(_inch(flat["t"]), "in", "member thickness"), units.read(_inch(flat["w"]), "in", "member width"))
    shape = shapes.shape(designation)
    if shape.series not in WAYS:
        raise InputError(f"member {shape.name}: series {shape.series} has no bolted end here; bolted are {', '.join(WAYS)}")
    ways = WAYS[shape.series]
    single = shape.single or shape
    written = {"LLBB": "long leg", "SLBB": "short leg"}.get(shape.orientation)
    if written and single.b_long != single.b_short:
        if way not in (None, written):
            raise InputError(f"connected_by = {way!r}: {shape.name} is connected by its {written}s")
        way = written
    if (way == "leg" and "long leg" in ways) or (way is None and "long leg" in ways and single.b_long == single.b_short):
        if single.b_long != single.b_short:
            raise InputError(f"connected_by: {shape.name} has unequal legs; give long leg or short leg")
        way = "long leg"
    if way is None and len(ways) == 1:
        way = ways[0]
    if way not in ways:
        raise InputError(f"connected_by = {way!r}: {shape.name} may be bolted through {' or '.join(ways)}")
    build = {"both flanges": _flanges, "web": _web, "flange": _tee_flange, "stem": _stem}.get(way, _leg)
    if gap is None:
        gap = usual_gap if shape.gap is None else shape.gap
    return build(shape, way, gap)


def _inch(text):
    return text if re.search(r"[a-z\"']", text, re.IGNORECASE) else f"{text} in"


def _flat(designation, t, w):
    if not (0 < t <= 8 and 0.5 <= w <= 200 and t <= w):
        raise InputError(f"member {designation!r}: write PL thickness x width, with 0 < thickness <= 8 in and a width of 1/2 to 200 in")
    area = t * w
    return Element(f"PL {_fraction(t)} x {_fraction(w)}", "PL", "plate", 1, 1, 1, w, t, None, (), (), area, area, None, "", False,
                   t / 12**0.5, "t/√12", w / 2, None)


def _fraction(value):
    if units.drawn_in_si():
        return units.millimetres(value)
    return str(Fraction(value).limit_denominator(32)) if abs(value * 32 - round(value * 32)) < 1e-9 and value < 1 else units.fraction(value)


def _least_radius(shape, pairs):
    known = [(value, name) for name, value in pairs if value]
    if not known:
        raise NotInTable(f"member {shape.name}: the tables hold no radius of gyration")
    return min(known)


def _flanges(shape, way, gap):
    half = shape.A / 2
    stem = Attachment(shape.b_f / 2, half - shape.b_f * shape.t_f, shape.t_w, "web", (shape.d / 2 - shape.k_des) * shape.t_w)
    r, r_name = _least_radius(shape, [("r_x", shape.r_x), ("r_y", shape.r_y)])
    mid = shape.b_f / 2
    return Element(shape.name, shape.series, "flange", 2, 2, 1, shape.b_f, shape.t_f, None, (stem,),
                   (mid - shape.t_w / 2, mid + shape.t_w / 2), shape.A, 2 * shape.b_f * shape.t_f,
                   lambda do: do(shear_lag.eccentricity_of_half_section, shape.d, shape.Z_x, shape.A), "7 flange",
                   shape.b_f >= 2 / 3 * shape.d, r, r_name, mid, shape, ("lower flange tip", "upper flange tip"))


def _tee_flange(shape, way, gap):
    stem = Attachment(shape.b_f / 2, shape.A - shape.b_f * shape.t_f, shape.t_w, "stem", (shape.d - shape.k_des) * shape.t_w)
    r, r_name = _least_radius(shape, [("r_x", shape.r_x), ("r_y", shape.r_y)])
    mid = shape.b_f / 2
    return Element(shape.name, shape.series, "flange", 1, 1, 1, shape.b_f, shape.t_f, None, (stem,),
                   (mid - shape.t_w / 2, mid + shape.t_w / 2), shape.A, shape.b_f * shape.t_f, lambda do: shape.y_bar, "7 flange",
                   shape.b_f >= 2 / 3 * shape.parent_d, r, r_name, mid, shape, ("lower flange tip", "upper flange tip"))


def _web(shape, way, gap):
    clear = shape.d - 2 * shape.t_f
    beyond = (shape.A - clear * shape.t_w) / 2
    flanges = (Attachment(0.0, beyond, shape.t_w, "lower flange"), Attachment(clear, beyond, shape.t_w, "upper flange"))
    r, r_name = _least_radius(shape, [("r_x", shape.r_x), ("r_y", shape.r_y)])
    channel = shape.series in ("C", "MC")
    x_bar = (lambda do: shape.x_bar) if channel else (lambda do: do(shear_lag.eccentricity_of_split_web, shape.Z_y, shape.A))
    return Element(shape.name, shape.series, "web", 1, 1, 1, clear, shape.t_w, None, flanges, (0.0, clear), shape.A, clear * shape.t_w,
                   x_bar, "" if channel else "7 web", False, r, r_name, clear / 2, shape, ("lower flange", "upper flange"))


def _stem(shape, way, gap):
    depth = shape.d - shape.t_f
    flange = Attachment(0.0, shape.A - depth * shape.t_w, shape.t_w, "flange")
    r, r_name = _least_radius(shape, [("r_x", shape.r_x), ("r_y", shape.r_y)])
    return Element(shape.name, shape.series, "stem", 1, 1, 1, depth, shape.t_w, shape.t_f, (flange,), (0.0,), shape.A, depth * shape.t_w,
                   lambda do: do(shear_lag.eccentricity_of_split_web, shape.Z_y, shape.A), "7 web", False, r, r_name, None, shape,
                   ("flange", "stem tip"))


def _leg(shape, way, gap):
    single = shape.single or shape
    pieces = 2 if shape.single else 1
    long = way == "long leg"
    leg, other = (single.b_long, single.b_short) if long else (single.b_short, single.b_long)
    # Half the corner goes with each leg, so that an equal-leg angle has the ratio 0.50 that the published example uses.
    share = (leg - single.t / 2) / (leg + other - single.t)
    outstanding = Attachment(0.0, single.A - leg * single.t, single.t, "outstanding leg")
    if pieces == 2:
        r_x, r_y = shapes.double_angle_radii(single, long, gap)
        r, r_name = min((r_x, "r_x"), (r_y, "r_y"))
    else:
        r, r_name = _least_radius(single, [("r_z", single.r_z)])
    x_bar = single.x_bar if long else single.y_bar
    name = "leg" if single.b_long == single.b_short else way
    return Element(shape.name, shape.series, name, pieces, 1, pieces, leg, single.t, 0.0, (outstanding,), (single.t,), pieces * single.A,
                   share * pieces * single.A, lambda do: x_bar, "8", False, r, r_name, None, shape, ("heel", "toe"), gap, other)
