"""gageline: calculation reports for steel tension members and their end connections.

In a notebook ``gageline.begin("bolted")`` reads the inputs cell; in a script ``gageline.bolted(...)`` builds the same connection
from keyword inputs and returns its results as data.
"""

__version__ = "0.1.0"


def begin(family):
    """Begin a calculation from the notebook's inputs cell; see ``calc.begin``."""
    from .calc import begin

    return begin(family)


def build(family, *, edition="360-22", method="LRFD", loads="7-22", **inputs):
    """Return a connection built from keyword inputs, quantities as texts with units; no notebook is needed.

    Raises
    ------
    GagelineError
        Whatever is wrong with the inputs, as one sentence.

    >>> tie = build("bolted", mark="T1", member="PL 1/2 x 6", member_grade="A572-50",
    ...             plate_thickness="1/2 in", plate_width="6 in",
    ...             plate_grade="A572-50", plate_end="1-1/2 in", lines=2, rows=3, pitch="3 in", gage="3 in", member_end="1-1/2 in",
    ...             bolt="7/8 in", bolt_grade="A325", tension="90 kip", demand_level="LRFD")
    >>> round(tie.capacity, 1), tie.governing.id
    (97.5, 'member rupture')
    """
    from .families import family as named

    return named(family).of(edition=edition, method=method, loads=loads, **inputs)


def __getattr__(name):
    """Give every family as a function of its own: ``gageline.bolted(...)`` is ``gageline.build("bolted", ...)``."""
    from functools import partial
    from pathlib import Path

    if name.startswith("_") or not (Path(__file__).parent / "connections" / name / "__init__.py").is_file():
        raise AttributeError(f"module 'gageline' has no attribute {name!r}")
    return partial(build, name)
