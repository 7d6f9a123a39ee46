"""The one unit registry, reading of dimensions as the trade writes them, and how numbers are printed.

Inside the package every number is a plain float in kip, inch and ksi; units are read here and printed from here.
"""

import functools
import math
import re
from contextlib import contextmanager
from contextvars import ContextVar
from fractions import Fraction

from .errors import InputError

# A registry of our own: pint's stock names (kip_per_square_inch) print as nested subscripts, and it loads 30 times slower.
_DEFINITIONS = """
inch = [length] = in = inches
foot = 12 * inch = ft = feet
mm = inch / 25.4 = _ = millimeter
cm = 10 * mm = _ = centimeter
m = 1000 * mm = _ = meter
kip = [force] = _ = kips
lbf = kip / 1000 = _ = lb = lbs
kN = kip / 4.4482216152605 = _ = kilonewton
N = kN / 1000 = _ = newton
ksi = kip / inch ** 2
psi = ksi / 1000
MPa = N / mm ** 2 = _ = megapascal
radian = [] = rad
degree = 0.017453292519943295 * radian = deg
"""

DISPLAY = {"in": "inch", "in²": "inch**2", "in³": "inch**3", "kip": "kip", "ksi": "ksi", "kip/in": "kip/inch", "rad": "radian",
           "kip·in": "kip*inch", "1/in": "1/inch", "": "dimensionless"}
"""Display unit as printed -> the registry's expression for it."""

SYSTEMS = ("US", "SI", "dual")
"""What a project may print in: inch and kip, SI, or inch and kip with results in SI in brackets."""

_KN, _MM = 4.4482216152605, 25.4  # kN in a kip, mm in an inch, both exact
_SI = {"in": ("mm", _MM), "in²": ("mm²", _MM**2), "in³": ("mm³", _MM**3), "kip": ("kN", _KN), "ksi": ("MPa", 1000 * _KN / _MM**2),
       "kip/in": ("kN/mm", _KN / _MM), "kip·in": ("kN·m", _KN * _MM / 1000), "1/in": ("1/mm", 1 / _MM)}

_LENGTHS = ContextVar("lengths", default="US")

_KIND = {"in": "a length, for example 3/4 in or 19 mm", "kip": "a force, for example 31 kip or 140 kN",
         "ksi": "a stress, for example 50 ksi or 345 MPa", "in²": "an area, for example 3.75 in^2",
         "rad": "an angle, for example 30 deg", "": "a number without unit"}

_VULGAR = {"¼": "1/4", "½": "1/2", "¾": "3/4", "⅛": "1/8", "⅜": "3/8", "⅝": "5/8", "⅞": "7/8"}
_NUMBER = r"(?:\d+(?:\.\d*)?|\.\d+)(?:[eE][-+]?\d+)?"
_AMOUNT = re.compile(rf"(?P<sign>[-+]?)\s*(?:(?P<whole>\d+)[\s-]+(?P<num>\d+)\s*/\s*(?P<den>\d+)"
                     rf"|(?P<num2>\d+)\s*/\s*(?P<den2>\d+)|(?P<dec>{_NUMBER}))")


@functools.cache
def registry():
    """Return the package's pint registry, made once and set as the application registry."""
    import pint

    ureg = pint.UnitRegistry(None, on_redefinition="raise")
    ureg.load_definitions(_DEFINITIONS.strip().splitlines())
    ureg.formatter.default_format = "~P"
    ureg.formatter.default_sort_func = None
    pint.set_application_registry(ureg)
    return ureg


def quantity(value, unit):
    """Return value as a pint quantity in a display unit ("in", "in²", "kip", "ksi", …)."""
    ureg = registry()
    return ureg.Quantity(value, DISPLAY[unit])


def _amount(text, where):
    match = _AMOUNT.match(text)
    if not match:
        raise InputError(f"{where}: cannot read a number in {text!r}; write for example 3/4 in, 1-1/2 in, 10'-6 1/2\" or 31 kip")
    part = match.groupdict()
    try:
        if part["dec"] is not None:
            value = float(part["dec"])
        elif part["num2"] is not None:
            value = float(Fraction(int(part["num2"]), int(part["den2"])))
        else:
            value = float(int(part["whole"]) + Fraction(int(part["num"]), int(part["den"])))
    except ZeroDivisionError:
        raise InputError(f"{where}: {text!r} divides by zero") from None
    return (-value if part["sign"] == "-" else value), text[match.end():].strip()


def read(text, unit, where="quantity"):
    """Read a dimensioned text and return it as a float in a display unit.

    Parameters
    ----------
    text : for example ``"3/4 in"``, ``"1-1/8 in"``, ``"10'-6 1/2\\""``, ``"19 mm"``, ``"31 kip"``, ``"30 deg"``.
    unit : display unit wanted, a key of ``DISPLAY``; ``""`` for a number without unit.
    where : name of the input, for the error sentence.

    Raises
    ------
    InputError
        Text without a unit, of another dimension, not a finite number, or not readable.

    >>> read("10'-6 1/2\\"", "in")
    126.5
    """
    wanted = _KIND.get(unit, f"a quantity in {unit}")
    if isinstance(text, bool) or not isinstance(text, (str, int, float)):
        raise InputError(f"{where}: {text!r} is not {wanted}")
    if not isinstance(text, str):
        if unit == "" and math.isfinite(text):
            return float(text)
        raise InputError(f"{where} = {text!r} has no unit; give {wanted}, as text in quotes" if unit else
                         f"{where} = {text!r} is not a finite number")
    raw = text
    text = text.strip().replace("−", "-").replace("–", "-").replace("″", '"').replace("′", "'").replace("”", '"').replace("’", "'")
    for sign, plain in _VULGAR.items():
        text = re.sub(rf"(\d)\s*{sign}", rf"\1 {plain}", text).replace(sign, plain)
    value, rest = _amount(text, where)
    if rest.startswith("'"):
        inches = rest[1:].strip().lstrip("-").strip()
        feet, sign = value, -1.0 if text.startswith("-") else 1.0
        extra, tail = _amount(inches, where) if inches else (0.0, '"')
        if tail not in ('"', "in"):
            raise InputError(f"{where}: cannot read {raw!r}; write feet and inches as 10'-6 1/2\"")
        value, rest = feet * 12.0 + sign * extra, "in"
    rest = {'"': "in"}.get(rest, rest).replace("²", "**2").replace("³", "**3").replace("^", "**").replace("·", "*")
    if not math.isfinite(value):
        raise InputError(f"{where} = {raw!r} is not a finite number")
    if unit == "" and not rest:
        return value
    if not rest:
        raise InputError(f"{where} = {raw!r} has no unit; give {wanted}")
    ureg = registry()
    import pint

    try:
        return float(ureg.Quantity(value, rest).to(DISPLAY[unit]).magnitude)
    except pint.DimensionalityError:
        raise InputError(f"{where} = {raw!r} has the wrong dimension; give {wanted}") from None
    except Exception:
        known = "in, ft, mm, cm, m, kip, lbf, kN, N, ksi, psi, MPa, deg, rad"
        raise InputError(f"{where} = {raw!r}: unit {rest!r} is not known; known are {known}") from None


def shown_as(unit, system):
    """Return (unit as printed, factor from a number in the display unit) of a system; dual prints as US does.

    >>> shown_as("in", "SI"), shown_as("kip", "US"), shown_as("", "SI")
    (('mm', 25.4), ('kip', 1.0), ('', 1.0))
    """
    return _SI.get(unit, (unit, 1.0)) if system == "SI" else (unit, 1.0)


def amount(value, unit, system, rounded):
    """Return a number with its unit as a system prints it; ``rounded`` is a function of the number that returns text.

    >>> amount(187.13, "kip", "US", floor_figures), amount(187.13, "kip", "SI", floor_figures), amount(187.13, "kip", "dual", floor_figures)
    ('187 kip', '832 kN', '187 kip (832 kN)')
    """
    printed_unit, factor = shown_as(unit, system)
    text = f"{rounded(value * factor)} {printed_unit}".strip()
    if system == "dual" and unit in _SI:
        printed_unit, factor = _SI[unit]
        text += f" ({rounded(value * factor)} {printed_unit})"
    return text


@contextmanager
def lengths_in(system):
    """Within it, ``fraction`` and ``feet`` write millimetres where the system is SI; it ends with the block that opens it."""
    token = _LENGTHS.set(system)
    try:
        yield
    finally:
        _LENGTHS.reset(token)


def force(value, rounded):
    """Return kips rounded with their unit, or kN, or both, as the block of ``lengths_in`` has it; rounded once, so never the wrong way.

    >>> force(123.4, ceil_figures)
    '124 kip'
    """
    return amount(value, "kip", _LENGTHS.get(), rounded)


def drawn_in_si():
    """Return whether lengths are being written in millimetres."""
    return _LENGTHS.get() == "SI"


def millimetres(value):
    """Return inches as millimetres in print: one decimal at most, two figures below 1 mm.

    >>> millimetres(3.0), millimetres(1 / 16), millimetres(1 / 32)
    ('76.2', '1.6', '0.79')
    """
    size = abs(value) * _MM
    text = f"{size:.2g}" if 0 < size < 0.95 else f"{size + 1e-9:.1f}".removesuffix(".0")
    return ("−" if value < 0 and text != "0" else "") + text


_ONE = r"(?:\d+-\d+/\d+|\d+/\d+|\d*[¼½¾⅛⅜⅝⅞]|\d+(?: \d{3})*(?:\.\d+)?)"
_TOLD = re.compile(rf"(?<![\w.,/’'-])(?<!bolts )(?<!bolt )(?P<numbers>{_ONE}(?:(?: x | × | to | and | by |–){_ONE})*)"
                   r"(?P<gap>[ -])(?P<unit>kip/in|kip·in|kip inches|kips?|ksi|in[²³]|inches|in\.(?= [a-z(])|in)(?![\w²³/·^])"
                   r"(?! (?:the|line|lines|series|tension|shear|bearing|a row)\b)(?! bolt|,? [AF]\d{3})(?! \(\d)(?P<also> \(−\d[\d.]*\))?")
# "2 in line" is no length; an inch bolt keeps its name; what has a number in brackets behind it stands in both systems already.
_TOLD_UNIT = {"kips": "kip", "inches": "in", "in.": "in", "kip inches": "kip·in"}


def told(text, system):
    """Return a sentence with its quantities in a system: SI instead of inch and kip, or with SI in brackets for dual.

    >>> told("an edge of 1-1/2 in, 20.5 kip", "SI"), told("at 3 in", "dual"), told("at 3 in", "US")
    ('an edge of 38.1 mm, 91.19 kN', 'at 3 in (76.2 mm)', 'at 3 in')
    """
    if system == "US":
        return text

    def one(match):
        unit = _TOLD_UNIT.get(match["unit"], match["unit"])
        si, factor = _SI[unit]

        def number(found):
            plain = found[0].replace(" ", "")
            for sign, spelt in _VULGAR.items():
                plain = plain.replace(sign, f"-{spelt}").lstrip("-")
            value = _amount(plain, "number")[0]
            return millimetres(value) if unit == "in" else printed(value * factor, max(4, len(plain.replace(".", "").lstrip("0"))))

        said = f"{re.sub(_ONE, number, match['numbers'])}{match['gap']}{si}"
        if system == "dual":
            return f"{match[0]} ({said.replace('-', ' ')})"
        return said + re.sub(_ONE, number, match["also"] or "")

    return _TOLD.sub(one, text)


def fraction(value, denominator=16, unit=""):
    """Return inches as the trade writes them ("1½", "5/16", "10-3/16"), or as a decimal where no such fraction fits.

    Within ``lengths_in("SI")`` it returns millimetres, and a unit " in" becomes " mm".

    >>> fraction(1.5), fraction(0.3125), fraction(0.3)
    ('1½', '5/16', '0.3')
    """
    if _LENGTHS.get() == "SI":
        return millimetres(value) + unit.replace("in", "mm")
    whole, part = divmod(abs(value) * denominator, denominator)
    if abs(part - round(part)) > 1e-6 * denominator:
        return ("−" if value < 0 else "") + f"{abs(value):.4g}" + unit
    frac = Fraction(round(part), denominator)
    whole, frac = (int(whole) + 1, Fraction(0)) if frac == 1 else (int(whole), frac)
    glyph = {plain: sign for sign, plain in _VULGAR.items()}.get(str(frac))
    text = str(whole) if frac == 0 else (f"{whole or ''}{glyph}" if glyph else f"{whole}-{frac}" if whole else str(frac))
    return ("−" if value < 0 else "") + text + unit


def length(value):
    """Return inches as the trade writes them with their unit, or millimetres within ``lengths_in("SI")``.

    >>> length(1.5)
    '1½ in'
    """
    return fraction(value, unit=" in")


def feet(value):
    """Return inches as feet and inches.

    >>> print(feet(270.0), feet(126.5))
    22'-6" 10'-6½"
    """
    if _LENGTHS.get() == "SI":
        return f"{value * _MM:.0f} mm"
    whole, rest = divmod(value, 12.0)
    return f"{int(whole)}'-{fraction(rest)}\""


def printed(value, digits=4, places=0):
    """Return a number for print: exact short decimals as they are, others to ``digits`` significant figures.

    ``places`` is the least number of decimals kept on a short decimal, so that 3 prints as 3.00 where that is the custom.

    >>> printed(0.8125), printed(2.87822), printed(65.0), printed(3.0, places=2), printed(1.1875, places=2), printed(468.52)
    ('0.8125', '2.878', '65', '3.00', '1.1875', '468.5')
    """
    if value == 0:
        return f"{0.0:.{places}f}"
    size = math.floor(math.log10(abs(value)))
    shortest = next((n for n in range(places, 5) if abs(value - round(value, n)) <= 1e-12 * abs(value)), None)
    # Lengths keep a fifth figure: 1-3/16 in is 1.1875 in.
    if shortest is not None and size + 1 + shortest <= digits + (places > 0):
        return f"{value:.{shortest}f}"
    return f"{value:.{max(0, digits - 1 - size)}f}"


def floor_figures(value, figures=3):
    """Round towards zero to significant figures: an available strength is never rounded up."""
    return _figures(value, figures, math.floor)


def ceil_figures(value, figures=3):
    """Round away from zero to significant figures: a demand is never rounded down."""
    return _figures(value, figures, math.ceil)


def _figures(value, figures, towards):
    if value == 0 or not math.isfinite(value):
        return f"{value:.0f}"
    size = math.floor(math.log10(abs(value)))
    places = max(0, figures - 1 - size)
    scale = 10.0**places
    # 1e-9: a product that is 140.31000000000003 in binary is 140.31
    nudge = 1e-9 if towards is math.floor else -1e-9
    number = math.copysign(towards(abs(value) * scale * (1 + nudge)) / scale, value)
    return f"{number:.{places}f}"


def ratio_text(ratio):
    """Return D/C to three decimals, never rounded past 1.00 and never below a value that is over it.

    >>> ratio_text(0.9124), ratio_text(1.0002), ratio_text(0.99999)
    ('0.912', '1.001', '1.000')
    """
    if ratio == math.inf:
        return "∞"
    if ratio > 1.0 + 1e-9:
        return f"{math.ceil(ratio * 1000 - 1e-6) / 1000:.3f}"
    return f"{ratio:.3f}"
