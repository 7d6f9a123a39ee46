"""One check of a calculation: what was computed, the strength available, the demand, the ratio, the verdict.

Strengths are computed once, bare, by a ``Working`` that remembers each formula called; a report prints what it remembers.
"""

import functools
from dataclasses import dataclass, replace

from .provisions import detailing
from .units import told

FACTORS = {
    "yielding": (0.90, 1.67),
    "rupture": (0.75, 2.00),
    "bolts": (0.75, 2.00),
    "block shear": (0.75, 2.00),
    "weld": (0.75, 2.00),
    "slip, standard holes or short slots across": (1.00, 1.50),
    "slip, oversized holes or short slots along": (0.85, 1.76),
    "slip, long slots": (0.70, 2.14),
    "compression": (0.90, 1.67),
    "shear yielding": (1.00, 1.50),
    "shear rupture": (0.75, 2.00),
    "web local yielding": (1.00, 1.50),
    "bending": (0.90, 1.67),
    "contact bearing": (0.75, 2.00),
    "interaction, factors within": (1.00, 1.00),
    "web crippling": (0.75, 2.00),
}
"""Limit state -> (phi, Omega), as printed in the Specification: [AISC360] D2, D5, E1, F1, J3, J4, J7. The only place they stand."""

METHODS = ("LRFD", "ASD")


class Working:
    """Calls formulas bare and remembers them, with remarks between, in order."""

    def __init__(self):
        self.steps = []

    def __call__(self, formula, *values):
        """Return ``formula.bare(*values)`` and remember the call."""
        self.steps.append((formula, values))
        return formula.bare(*values)

    def say(self, text):
        """Remember a remark, printed as a sentence between the lines."""
        self.steps.append(text)


def silent(formula, *values):
    """Compute without remembering: what a sweep or a comparison of candidates passes instead of a ``Working``."""
    return formula.bare(*values)


silent.say = lambda text: None


def governing(candidates, strength):
    """Evaluate every candidate and return the weakest one with its working.

    Parameters
    ----------
    candidates : non-empty sequence of anything ``strength`` understands.
    strength : function of (candidate, do) that returns the nominal strength; ``do`` is a ``Working`` or ``silent``.

    Returns
    -------
    tuple
        (nominal strength, candidate, steps). For array-valued strengths the element-wise least, with None and no steps.
    """
    values = [strength(candidate, silent) for candidate in candidates]
    if any(getattr(value, "shape", ()) for value in values):
        import numpy

        return functools.reduce(numpy.minimum, values), None, ()
    index = min(range(len(values)), key=values.__getitem__)
    working = Working()
    return strength(candidates[index], working), candidates[index], tuple(working.steps)


@dataclass(frozen=True)
class Check:
    """One row of the summary, with all that its section of the report prints.

    ``kind`` is "strength", "detailing" (required against provided, in inches) or "advice" (never fails a calculation).
    A check that does not apply has ``reason`` and no numbers. ``path`` is what a figure shades: a chain, a block or None.
    ``tension`` is False for a check against compression, ``axial`` says that the nominal strength is
    called P_n, ``at_most`` that a detailing limit is an upper one.
    """

    id: str
    title: str
    part: str
    clause: str
    kind: str = "strength"
    limit_state: str = ""
    nominal: float | None = None
    available: float | None = None
    demand: float | None = None
    unit: str = "kip"
    steps: tuple = ()
    reason: str = ""
    notes: tuple = ()
    path: object = None
    tension: bool = True
    axial: bool = False
    at_most: bool = False

    @property
    def applies(self):
        """Whether numbers stand here rather than a reason."""
        return not self.reason

    @property
    def ratio(self):
        """Demand over available strength, or required over provided; None where the check does not apply."""
        if not self.applies or self.demand is None:
            return None
        return self.demand / self.available if self.available > 0 else float("inf")

    @property
    def ok(self):
        """True where the ratio is at most 1.00 at full precision; None where the check does not apply."""
        return None if self.ratio is None else bool(self.ratio <= 1.0 + 1e-12)

    @property
    def fails(self):
        """Whether this check makes the design N.G.; advice never does."""
        return self.ok is False and self.kind != "advice"

    def to_dict(self):
        """Return the check's results as plain data."""
        out = {"id": self.id, "title": self.title, "part": self.part, "clause": self.clause, "kind": self.kind}
        if not self.applies:
            return out | {"applies": False, "reason": self.reason}
        return out | {"applies": True, "unit": self.unit, "nominal": self.nominal, "available": self.available, "demand": self.demand,
                      "ratio": self.ratio, "ok": self.ok, "notes": list(self.notes)}


def strength_check(id, title, part, clause, limit_state, method, nominal, demand, steps=(), axial=False, **rest):
    """Return a check of nominal strength against demand, with the line for the available strength added to its steps."""
    phi, omega = FACTORS[limit_state]
    last = Working()
    if method == "LRFD":
        available = last(detailing.design_axial_strength if axial else detailing.design_strength, phi, nominal)
    else:
        available = last(detailing.allowable_axial_strength if axial else detailing.allowable_strength, nominal, omega)
    return Check(id, title, part, clause, limit_state=limit_state, nominal=nominal, available=available, demand=demand,
                 steps=(*steps, *last.steps), axial=axial, **rest)


def not_applicable(id, title, part, clause, reason, kind="strength"):
    """Return a check that stands in the table with the reason why it does not apply."""
    return Check(id, title, part, clause, kind=kind, reason=reason)


def in_units(each, system):
    """Return a check with its sentences in a system of units; its numbers stay in kip and inch."""
    return replace(each, steps=tuple(told(step, system) if isinstance(step, str) else step for step in each.steps),
                   notes=tuple(told(note, system) for note in each.notes), reason=told(each.reason, system))


def worst_first(checks):
    """Return the checks that apply, largest ratio first, failures before the rest."""
    return sorted((check for check in checks if check.ratio is not None), key=lambda check: (not check.fails, -check.ratio))


def governing_check(checks):
    """Return the strength check with the largest ratio."""
    return max((check for check in checks if check.kind == "strength" and check.ratio is not None), key=lambda check: check.ratio)
