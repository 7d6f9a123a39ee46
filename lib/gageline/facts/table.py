"""Reading the CSV tables: a header row of symbols, a row of units, then the rows; numbers may be trade fractions."""

import csv
import os.path
import re

from ..errors import InputError

FOLDER = os.path.join(os.path.dirname(__file__), "tables")

_FACTOR = {"in": 1.0, "kip": 1.0, "mm": 1 / 25.4, "kN": 1 / 4.4482216152605}
_VULGAR = {"½": "1/2", "¼": "1/4", "¾": "3/4", "⅛": "1/8", "⅜": "3/8", "⅝": "5/8", "⅞": "7/8"}
_NUMBER = re.compile(r"(?:(\d+)[-\s]+)?(\d+)\s*/\s*(\d+)|(\d+\.?\d*|\.\d+)")


def plain_fractions(text):
    """Return text with one-character fractions spelt out, so that 3½ reads 3-1/2.

    Parameters
    ----------
    text : any text.

    Returns
    -------
    text : the same with ½ ¼ ¾ ⅛ ⅜ ⅝ ⅞ written as n/d, joined to a whole number by a hyphen.

    >>> plain_fractions("L3½x3½x⅜")
    'L3-1/2x3-1/2x3/8'
    """
    for glyph, spelt in _VULGAR.items():
        text = re.sub(rf"(\d)\s*{glyph}", rf"\1-{spelt}", text).replace(glyph, spelt)
    return text


def number(text):
    """Return the number a trade figure stands for.

    Parameters
    ----------
    text : "3/4", "1-1/8", "1 1/8", ".75" or "0750", without a unit.

    Returns
    -------
    number : float.

    Raises
    ------
    InputError : the text is no such number.

    >>> number("1-1/8")
    1.125
    """
    match = _NUMBER.fullmatch(text.strip())
    if not match or (match[3] and not int(match[3])):
        raise InputError(f"{text.strip()!r} is not a number such as 3/4, 1-1/8 or 0.75")
    whole, top, bottom, decimal = match.groups()
    return float(decimal) if decimal else int(whole or 0) + int(top) / int(bottom)


def trade(figure):
    """Return a number as the trade writes it: in fractions down to 1/64, otherwise in decimals.

    Parameters
    ----------
    figure : float, zero or more.

    Returns
    -------
    text : for example 1-1/8.

    >>> trade(1.125), trade(0.3)
    ('1-1/8', '0.3')
    """
    top, bottom = figure.as_integer_ratio()
    if bottom == 1:
        return str(top)
    if bottom > 64:
        return f"{figure:g}"
    whole, rest = divmod(top, bottom)
    return f"{whole}-{rest}/{bottom}" if whole else f"{rest}/{bottom}"


def read_table(file):
    """Return the rows of one table of this package.

    Parameters
    ----------
    file : name of a CSV file in facts/tables.

    Returns
    -------
    units : dict from column to the unit printed below it, "" where the column is text.
    rows : list of dict from column to the cell's text.
    """
    with open(os.path.join(FOLDER, file), newline="", encoding="utf-8") as stream:
        reader = csv.DictReader(stream)
        units = next(reader)
        return units, list(reader)


def value(cell, unit):
    """Return a cell in kip and inch.

    Parameters
    ----------
    cell : text of the cell.
    unit : unit of its column; mm and kN are converted, every other unit is left as it stands.

    Returns
    -------
    number : float, or None for an empty cell.
    """
    return number(cell) * _FACTOR.get(unit, 1.0) if cell else None
