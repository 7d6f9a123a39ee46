"""gageline: calculation reports for steel tension members and their end connections.

In a notebook ``gageline.begin("bolted")`` reads the inputs cell; in a script ``gageline.bolted(...)`` builds the same connection
from keyword inputs and returns its results as data.
"""

__version__ = "0.1.0"


def begin(family):
    """Begin a calculation from the notebook's inputs cell; see ``calc.begin``."""
    from .calc import begin

    return begin(family)


def bolted(*, edition="360-22", method="LRFD", loads="7-22", **inputs):
    """Return a bolted tension connection built from keyword inputs; see ``connections.bolted``.

    >>> tie = bolted(mark="T1", member="PL 1/2 x 6", member_grade="A572-50", plate_thickness="1/2 in", plate_width="6 in",
    ...              plate_grade="A572-50", plate_end="1-1/2 in", lines=2, rows=3, pitch="3 in", gage="3 in", member_end="1-1/2 in",
    ...              bolt="7/8 in", bolt_grade="A325", tension="90 kip", demand_level="LRFD")
    >>> round(tie.capacity, 1), tie.governing.id
    (97.5, 'member rupture')
    """
    from .connections.bolted import BoltedConnection

    return BoltedConnection.of(edition=edition, method=method, loads=loads, **inputs)
