"""How far an input may drift before D/C reaches 1.00, and what is there as built against what was designed."""

from dataclasses import dataclass

from . import units
from .connections.fields import unit_of
from .errors import GagelineError

STEPS = 24
"""Halvings of the search for a limit: the last interval is a millionth of the first."""

@dataclass(frozen=True)
class Margin:
    """One input's room: its value, and in each sense the value at which D/C reaches 1.00 with the check that governs there.

    ``lower`` and ``upper`` are None where the input may drift as far as was tried; ``*_why`` says what happens there.
    """

    name: str
    value: float
    unit: str
    lower: float | None
    lower_why: str
    upper: float | None
    upper_why: str


def margins(connection):
    """Return the room of every numeric input that was given, between zero and ten times its value.

    Parameters
    ----------
    connection : a connection whose checks are satisfied.

    Returns
    -------
    tuple
        A ``Margin`` for each length, force, angle or number of the inputs; counts are left out.
    """
    out = []
    for name in type(connection.inputs).model_fields:
        unit, value = unit_of(connection.inputs, name), getattr(connection.inputs, name)
        value = value[0] if isinstance(value, tuple) and len(value) == 1 else value
        if name not in connection.inputs.model_fields_set or unit is None or not isinstance(value, float) or value == 0:
            continue
        sides = [_limit(connection, name, value, end) for end in ((0.0, 10 * value) if value > 0 else (10 * value, 0.0))]
        out.append(Margin(name, value, unit, *sides[0], *sides[1]))
    return tuple(out)


def changed(connection, **changes):
    """Return the connection with some inputs replaced, validated anew; quantities are floats in display units or texts.

    Raises
    ------
    GagelineError
        The changed inputs are refused.
    """
    made = type(connection)
    given = {name: _typed(connection.inputs, name) for name in connection.inputs.model_fields_set}
    return made(made.Model.of(**(given | {name: _text(connection.inputs, name, value) for name, value in changes.items()})), connection.basis)


def _typed(inputs, name):
    return _text(inputs, name, getattr(inputs, name))


def _text(inputs, name, value):
    """Return an input as it may be given again: quantities as texts with their unit."""
    unit = unit_of(inputs, name)
    if unit is None or value is None or isinstance(value, (str, int)):
        return list(value) if isinstance(value, tuple) else value
    unit = {"": "", "rad": " rad"}.get(unit, f" {unit}")
    if isinstance(getattr(inputs, name), tuple) and isinstance(value, float):
        return [f"{value!r}{unit}"]
    if isinstance(value, tuple):
        return [", ".join(f"{v!r}{unit}" for v in part) if isinstance(part, tuple) else f"{part!r}{unit}" for part in value]
    return f"{value!r}{unit}" if unit else value


def _governing(connection):
    """Return (whether all is satisfied, what decides)."""
    failed = [each for each in connection.checks if each.fails]
    worst = max(failed, key=lambda each: each.ratio) if failed else connection.governing
    return not failed, worst.title


def _try(connection, name, value):
    try:
        return _governing(changed(connection, **{name: value}))
    except GagelineError as refusal:
        return False, f"refused: {refusal}"


def _limit(connection, name, value, end):
    """Return (value at the limit, why) on the way to an end, or (None, why) where nothing happens on it."""
    good, reason = _try(connection, name, end if end else value * 1e-6)
    if good:
        return None, "no limit within reach"
    inside, outside = value, end
    for _ in range(STEPS):
        middle = (inside + outside) / 2
        good, why = _try(connection, name, middle)
        if good:
            inside = middle
        else:
            outside, reason = middle, why
    return inside, reason


def against_design(built, designed):
    """Return what is there as built against what was designed.

    Parameters
    ----------
    built, designed : connections of one family.

    Returns
    -------
    list
        (title, available as designed, available as built, change in per cent, D/C as designed, D/C as built) of every strength check that
        applies to both, largest D/C as built first. [kip]
    """
    before = {each.id: each for each in designed.checks if each.kind == "strength" and each.applies}
    rows = [(each.title, before[each.id].available, each.available, 100 * (each.available / before[each.id].available - 1), before[each.id].ratio,
             each.ratio) for each in built.checks if each.id in before and each.kind == "strength" and each.applies]
    return sorted(rows, key=lambda row: -row[5])


def said(margin, which):
    """Return one limit of a margin as printed."""
    value = getattr(margin, which)
    if value is None:
        return "–"
    # A limit towards the unsafe side is rounded back into the safe one.
    towards = units.ceil_figures if (which == "lower") == (margin.value > 0) else units.floor_figures
    return f"{towards(value, 4)} {margin.unit}".strip()
