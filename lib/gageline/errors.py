"""Everything gageline refuses, one class per kind; every message is one sentence a user can act on."""

import difflib


class GagelineError(Exception):
    """Base of all errors that are the input's or the surroundings' doing; printed as one sentence, without a traceback."""


class InputError(GagelineError, ValueError):
    """An input is missing, misspelt, malformed, of the wrong dimension or out of range."""


class NotInTable(GagelineError, LookupError):
    """A shape, grade, bolt, hole or edition that the tables do not hold."""


class ScopeError(GagelineError, ValueError):
    """Input that a provision does not cover; the message names the clause and its limit."""


class FormulaError(GagelineError, TypeError):
    """A formula function that breaks the contract, or a call with the wrong dimension."""


class ReportError(GagelineError, RuntimeError):
    """A notebook that did not run, or a sheet that could not be set without fault."""


def nearest(name, known, n=3):
    """Return the n entries of known that look most like name, best first, as one comma-separated text."""
    pool = {str(entry).casefold(): str(entry) for entry in known}
    close = difflib.get_close_matches(str(name).casefold(), pool, n=n, cutoff=0.0)
    return ", ".join(pool[entry] for entry in close)
