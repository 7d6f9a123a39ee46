"""Required axial strength: from service loads by way of the combinations, or given with its level stated."""

from dataclasses import dataclass

from ..errors import InputError
from .factors import MAY_BE_ABSENT, METHODS, NATURES, Combination, check_method, check_nature, combinations, number


@dataclass(frozen=True)
class DemandRow:
    """One combination with its value.

    Parameters
    ----------
    combination : the Combination.
    total : axial force, tension positive. [kip]
    terms : share of each load in the total, by nature. [kip]
    """

    combination: Combination
    total: float
    terms: dict


@dataclass(frozen=True)
class Demands:
    """All combinations of one set of service loads.

    Parameters
    ----------
    rows : tuple of DemandRow, the combinations of the standard first, then those with a relieving load left out.
    tension : the row with the largest total (it may be negative).
    compression : the row with the most negative total, or None where no total is negative.
    level : "LRFD" or "ASD".
    standard : edition of ASCE 7.
    notes : sentences on what was taken for granted.
    """

    rows: tuple
    tension: DemandRow
    compression: DemandRow | None
    level: str
    standard: str
    notes: tuple = ()

    @property
    def required_tension(self):
        """Required tensile strength, 0 where no combination gives tension. [kip]"""
        return max(self.tension.total, 0.0)

    @property
    def required_compression(self):
        """Required compressive strength as a positive number, 0 where no combination gives compression. [kip]"""
        return -self.compression.total if self.compression else 0.0


@dataclass(frozen=True)
class GivenDemand:
    """A required strength handed over by others, with its level.

    Parameters
    ----------
    tension : required tensile strength, not negative. [kip]
    compression : required compressive strength as a positive number; 0 if the member never goes slack. [kip]
    level : "LRFD" (factored) or "ASD" (service combinations).

    Raises
    ------
    InputError
        A force that is negative or not finite, no force at all, or an unknown level.
    """

    tension: float
    compression: float
    level: str

    def __post_init__(self):
        if self.level not in METHODS:
            raise InputError(f"level of the given demand must be stated as LRFD or ASD, got {self.level!r}.")
        for name in ("tension", "compression"):
            value = number(getattr(self, name), f"given {name}")
            if value < 0.0:
                raise InputError(f"given {name} must be 0 or a positive number of kip, got {value:g}.")
            object.__setattr__(self, name, value)
        if self.tension == self.compression == 0.0:
            raise InputError("given demand is zero in tension and in compression; give at least one of them in kip.")

    @property
    def required_tension(self):
        """Required tensile strength. [kip]"""
        return self.tension

    @property
    def required_compression(self):
        """Required compressive strength as a positive number. [kip]"""
        return self.compression


def require_level(demand, method):
    """Refuse a demand of one level in a calculation by the other method.

    Parameters
    ----------
    demand : Demands or GivenDemand.
    method : "LRFD" or "ASD", the method of the calculation.

    Raises
    ------
    InputError
        The level of the demand is not that of the method.
    """
    check_method(method)
    if demand.level != method:
        raise InputError(f"the demand is at {demand.level} level but the calculation is by {method}; "
                         f"give a demand at {method} level or change the method.")


def checked_loads(service):
    """Return the service loads that are not zero, as floats; refuse unknown natures and numbers that are not finite."""
    if not isinstance(service, dict):
        raise InputError(f"service loads must be a mapping of nature to kip, such as {{'D': 10.0}}, got {service!r}.")
    loads = {}
    for nature, value in service.items():
        check_nature(nature)
        value = number(value, f"service load {nature}")
        if value != 0.0:
            loads[nature] = value
    return loads


def acting(combination, loads, sense):
    """Return the combination without the variable loads that relieve in the given sense (+1 tension, -1 compression).

    ASCE 7 2.3.1 and 2.4.1 ask for the effect of one or more loads not acting; D always acts.
    """
    omitted = tuple(nature for nature, factor in combination.factors.items()
                    if nature in MAY_BE_ABSENT and sense * factor * loads.get(nature, 0.0) < 0.0)
    return combination.without(omitted) if omitted else combination


def _row(combination, loads):
    terms = {nature: factor * loads[nature] for nature, factor in combination.factors.items()}
    return DemandRow(combination, sum(terms.values()), terms)


def _notes(loads, method, standard, options):
    notes = []
    if ("W" in loads) != ("W_opposite" in loads):
        given, other = ("W", "W_opposite") if "W" in loads else ("W_opposite", "W")
        notes.append(f"Wind acts in one sense only: {given} is given, {other} is not.")
    if "S" in loads:
        level = "strength level" if standard == "7-22" else "service level"
        notes.append(f"S is the snow load of ASCE {standard}, at {level}.")
    if "L" in loads and method == "LRFD" and options.get("companion_L", 1.0) == 0.5:
        notes.append("L as a companion load has the factor 0.5: L_o is at most 100 psf, no garage, no public assembly.")
    return tuple(notes)


def demands(service, method, standard, **options):
    """Return the value of every combination and which one governs in tension and in compression.

    A combination with a relieving variable load left out is added where it goes beyond all printed ones.

    Parameters
    ----------
    service : service axial load by nature, tension positive. [kip]
    method : "LRFD" or "ASD".
    standard : "7-16" or "7-22".
    options : companion_L, S_DS, rho, Omega_0 of combinations().

    Returns
    -------
    demands : Demands. [kip]

    Raises
    ------
    InputError
        An unknown nature, a number that is not finite, loads that are all zero, or an option not allowed.
    NotInTable
        An edition of ASCE 7 that the table does not hold.

    >>> demands({"D": 30.0, "L": 90.0}, "LRFD", "7-22").tension.total
    180.0
    """
    loads = checked_loads(service)
    if not loads:
        raise InputError(f"all service loads are zero; give at least one of {', '.join(NATURES)} in kip.")
    base = combinations(method, standard, loads, **options)
    rows = [_row(combination, loads) for combination in base]
    low, high = min(row.total for row in rows), max(row.total for row in rows)
    seen = {frozenset(combination.factors.items()) for combination in base}
    for combination in base:
        for sense in (1, -1):
            reduced = acting(combination, loads, sense)
            key = frozenset(reduced.factors.items())
            if not reduced.factors or key in seen:
                continue
            row = _row(reduced, loads)
            if low <= row.total <= high:
                continue
            seen.add(key)
            rows.append(row)
    tension = max(rows, key=lambda row: row.total)
    compression = min(rows, key=lambda row: row.total)
    return Demands(
        rows=tuple(rows),
        tension=tension,
        compression=compression if compression.total < 0.0 else None,
        level=method,
        standard=standard,
        notes=_notes(loads, method, standard, options),
    )
