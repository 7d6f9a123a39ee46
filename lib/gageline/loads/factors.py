"""The load combinations of ASCE 7, expanded to one factor per load; the factors stand in facts/combinations.toml."""

import itertools
import math
import numbers
import tomllib
from dataclasses import dataclass, replace
from functools import cache
from pathlib import Path

from ..errors import InputError, NotInTable, nearest

NATURES = {
    "D": "dead load",
    "L": "live load",
    "Lr": "roof live load",
    "S": "snow load",
    "R": "rain load",
    "W": "wind load in one sense",
    "W_opposite": "wind load in the other sense",
    "E": "horizontal seismic effect Q_E",
    "F": "fluid load",
    "H": "lateral earth pressure, ground water or bulk material",
}
METHODS = ("LRFD", "ASD")
STANDARDS = ("7-16", "7-22")

# E is not among them: it comes with both signs, so the row with the other sign covers its absence.
MAY_BE_ABSENT = frozenset(NATURES) - {"D", "E"}


@dataclass(frozen=True)
class Combination:
    """One combination with every alternative decided.

    Parameters
    ----------
    id : number in the standard and, where it has several expansions, a running number: "3a-2".
    pieces : (nature, sign, printed term) of each load, in the order of the standard.
    factors : load factor by nature, only of natures that are present. [-]
    clause : standard and section.
    omitted : natures left out because they would relieve and need not act.
    """

    id: str
    pieces: tuple
    factors: dict
    clause: str
    omitted: tuple = ()

    @property
    def text(self):
        """The combination as printed: "1.2D + 1.6L + 0.5Lr"."""
        (_, sign, first), *rest = self.pieces
        return ("−" if sign < 0 else "") + first + "".join(f" {'−' if s < 0 else '+'} {piece}" for _, s, piece in rest)

    def without(self, omitted):
        """Return the combination with the named natures not acting."""
        return replace(
            self,
            id=f"{self.id} without {', '.join(omitted)}",
            pieces=tuple(piece for piece in self.pieces if piece[0] not in omitted),
            factors={nature: factor for nature, factor in self.factors.items() if nature not in omitted},
            omitted=tuple(omitted),
        )


@cache
def _table():
    path = Path(__file__).parents[1] / "facts" / "combinations.toml"
    return tomllib.loads(path.read_text(encoding="utf-8"))


def number(value, name):
    """Return value as float; a text, a truth value, an infinity or a NaN is refused by name."""
    if isinstance(value, bool) or not isinstance(value, numbers.Real) or not math.isfinite(value):
        raise InputError(f"{name} must be a finite number, got {value!r}.")
    return float(value)


def check_method(method):
    """Refuse a design method other than LRFD and ASD."""
    if method not in METHODS:
        raise InputError(f"design method {method!r} is unknown; allowed are {' and '.join(METHODS)}.")


def check_nature(nature):
    """Refuse a load nature that is not in NATURES."""
    if nature not in NATURES:
        raise InputError(
            f"load nature {nature!r} is unknown; nearest are {nearest(nature, NATURES)}; "
            f"allowed are {', '.join(NATURES)}."
        )


def _check_options(companion_L, S_DS, rho, Omega_0):
    if number(companion_L, "companion_L") not in (0.5, 1.0):
        raise InputError(f"companion_L must be 1.0, or 0.5 where ASCE 7 2.3.1 permits it, got {companion_L!r}.")
    if not 0.0 <= number(S_DS, "S_DS") <= 4.0:
        raise InputError(f"S_DS must be a fraction of g between 0 and 4, got {S_DS!r}.")
    if number(rho, "rho") not in (1.0, 1.3):
        raise InputError(f"rho must be 1.0 or 1.3 (ASCE 7 12.3.4), got {rho!r}.")
    if Omega_0 is not None and number(Omega_0, "Omega_0") < 1.0:
        raise InputError(f"Omega_0 must be at least 1.0, or None for no overstrength, got {Omega_0!r}.")


def _printed(nature, factor, vertical, S_DS, overstrength):
    if nature == "D" and vertical and S_DS:
        return f"({factor:.1f} {'−' if vertical < 0 else '+'} {abs(vertical):g}S_DS)D"
    name = {"E": "Ω_0Q_E" if overstrength else "ρQ_E", "W_opposite": "W_opp"}.get(nature, nature)
    return name if abs(factor) == 1.0 else f"{abs(factor):g}{name}"


def _choices(term, present, companion_L):
    """Return the alternatives of one term among the loads present, as (nature, factor) pairs."""
    chosen = []
    for nature, factor in term.items():
        factor = companion_L if factor == "companion" else factor
        senses = {"W": [("W", factor), ("W_opposite", factor)], "E": [("E", factor), ("E", -factor)]}
        chosen += [pair for pair in senses.get(nature, [(nature, factor)]) if pair[0] in present]
    return chosen or [None]


def combinations(method, standard, natures, *, companion_L=1.0, S_DS=0.0, rho=1.0, Omega_0=None):
    """Return every ASCE 7 combination of the loads present, with all alternatives expanded.

    A combination whose leading variable load is absent is left out where it lies between others that stay.

    Parameters
    ----------
    method : "LRFD" (section 2.3) or "ASD" (section 2.4).
    standard : "7-16" or "7-22", the edition of ASCE 7.
    natures : names of the loads present, out of NATURES.
    companion_L : factor on L in LRFD combinations 3, 4 and 6; 0.5 is for L_o up to 100 psf, not for garages or public
        assembly. Without effect in ASD. [-]
    S_DS : design spectral acceleration, fraction of g; above 0 it adds E_v = 0.2 S_DS D, also where E is absent. [-]
    rho : redundancy factor on Q_E, 1.0 or 1.3. [-]
    Omega_0 : overstrength factor; given, it replaces rho (E_mh instead of E_h). [-]

    Returns
    -------
    combinations : tuple of Combination, in the order of the standard, none twice.

    Raises
    ------
    InputError
        A method, nature or option that is not allowed, or no nature at all.
    NotInTable
        An edition of ASCE 7 that the table does not hold.

    Notes
    -----
    Sources: facts/combinations.toml, line by line.

    >>> [c.text for c in combinations("LRFD", "7-22", ["D", "L"])]
    ['1.4D', '1.2D + 1.6L', '0.9D']
    """
    check_method(method)
    if standard not in STANDARDS:
        raise NotInTable(f"loads standard {standard!r} is not in the table of combinations; it holds "
                         f"{' and '.join(STANDARDS)} of ASCE 7.")
    present = set(natures)
    for nature in sorted(present, key=str):
        check_nature(nature)
    if not present:
        raise InputError(f"no load is present; give at least one of {', '.join(NATURES)}.")
    _check_options(companion_L, S_DS, rho, Omega_0)

    kept, seen = [], set()
    leading = present | ({"S_DS"} if S_DS > 0.0 else set()) | ({"W"} if "W_opposite" in present else set())
    for row in _table()[standard][method]:
        if not all(leading.intersection(group) for group in row.get("needs", [])):
            continue
        vertical = row.get("vertical", 0.0)
        expanded = []
        for picked in itertools.product(*(_choices(term, present, companion_L) for term in row["terms"])):
            pairs = [pair for pair in picked if pair]
            factors = dict(pairs)
            if "D" in factors:
                factors["D"] += vertical * S_DS
            if "E" in factors:
                factors["E"] *= rho if Omega_0 is None else Omega_0
            key = frozenset(factors.items())
            if not pairs or key in seen:
                continue
            seen.add(key)
            pieces = tuple((n, f, _printed(n, f, vertical, S_DS, Omega_0 is not None)) for n, f in pairs)
            expanded.append(Combination(row["number"], pieces, factors, f"ASCE {standard} {row['clause']}"))
        if len(expanded) > 1:
            expanded = [replace(c, id=f"{c.id}-{k}") for k, c in enumerate(expanded, start=1)]
        kept += expanded
    return tuple(kept)
