"""What several test folders share: every formula of the package, a plain connection to vary, an assertion on quantities."""

import importlib
import pkgutil
import re

import pytest

from gageline import formula, provisions, units
from gageline.connections.bolted import BoltedConnection

PARAMETER = re.compile(r"^(?P<name>\w+) : (?P<text>.+\.) \[(?P<unit>[^\]]*)\]$")
"""A parameter or result as a formula's docstring writes it: ``F_y : yield stress. [ksi]``."""

PLATE = {"mark": "T1", "member": "PL 1/2 x 6", "member_grade": "A572-50", "plate_thickness": "1/2 in", "plate_width": "6 in",
         "plate_grade": "A572-50", "plate_end": "1-1/2 in", "lines": 2, "rows": 3, "pitch": "3 in", "gage": "3 in",
         "member_end": "1-1/2 in", "bolt": "7/8", "bolt_grade": "A325", "tension": "50 kip", "demand_level": "LRFD"}
"""A flat tie on a plate of its own size: the plain case that tests vary."""

ANGLE = PLATE | {"member": "L4x4x1/2", "member_grade": "A36", "lines": 1, "rows": 4, "gage": None, "gage_from_back": "2-1/2 in",
                 "plate_width": "10 in"}
"""A single angle by one leg, one gage line."""

FLANGES = PLATE | {"member": "W8x21", "member_grade": "A992", "connected_by": "both flanges", "gage": "2-3/4 in", "bolt": "3/4",
                   "plate_width": "8 in"}
"""A W bolted by both its flanges, one plate on each."""


def formulas():
    """Return every formula of the package by qualified name, all modules of provisions imported."""
    for module in pkgutil.walk_packages(provisions.__path__, provisions.__name__ + "."):
        importlib.import_module(module.name)
    # Formulas that other tests define on purpose do not belong to the package.
    return {name: made for name, made in formula.FORMULAS.items() if name.startswith("gageline.provisions.")}


def section(function, heading):
    """Return [(name, text, unit)] of one section of a formula's docstring, in order; a line of another form fails the test."""
    lines = [line.strip() for line in (function.__doc__ or "").splitlines()]
    if heading not in lines:
        return []
    found = []
    for line in lines[lines.index(heading) + 2:]:
        if not line or line.startswith(">>>"):
            break
        match = PARAMETER.match(line)
        assert match, f"{function.where}: docstring line {line!r} is not `name : text. [unit]`"
        found.append((match["name"], match["text"], match["unit"]))
    return found


def bolted(base=PLATE, *, edition="360-22", method="LRFD", **changes):
    """Build a connection from a base with changes; None removes an input. A given demand takes the level of the method."""
    inputs = base | {"demand_level": method if "tension" in base | changes else None} | changes
    inputs = {name: value for name, value in inputs.items() if value is not None}
    return BoltedConnection.of(edition=edition, method=method, **inputs)


def checks(connection):
    """Return the checks of a connection by id."""
    return {each.id: each for each in connection.checks}


def value_of(check, name):
    """Return the value of a formula among a check's steps, by the formula's name; the last where it was used more than once."""
    steps = [step for step in check.steps if not isinstance(step, str)]
    return next(made.bare(*values) for made, values in reversed(steps) if made.__name__ == name)


def remarks(check):
    """Return the remarks between the lines of a check, as one text."""
    return " ".join(step for step in check.steps if isinstance(step, str))


def assert_quantity(actual, expected, rel=1e-9):
    """Assert that a pint quantity has the unit and the value of a text such as ``"500 kip"``."""
    unit = expected.split()[1]
    assert f"{actual.units:~P}" == unit
    assert actual.magnitude == pytest.approx(units.read(expected, unit), rel=rel)
