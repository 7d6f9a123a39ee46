"""What evaluating one limit state gives, for one design or for an array of them."""

from typing import NamedTuple

from ..check import Working


class Outcome(NamedTuple):
    """Nominal strength with the steps that lead to it, what a figure shades, remarks, and a table to print, each where there is one."""

    nominal: float
    steps: tuple = ()
    path: object = None
    notes: tuple = ()
    table: dict | None = None


def worked(compute):
    """Run ``compute(do)`` with a ``Working`` and return the Outcome of its strength and steps."""
    do = Working()
    return Outcome(compute(do), tuple(do.steps))
