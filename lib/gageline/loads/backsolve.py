"""The load a connection still permits: one unknown load, or two against each other, under every combination."""

from dataclasses import dataclass

import numpy as np

from ..errors import InputError
from .demand import acting, checked_loads, demands
from .factors import Combination, check_nature, combinations, number


@dataclass(frozen=True)
class Permissible:
    """The largest value of one load with the others fixed.

    Parameters
    ----------
    value : permissible value, or None where status is not "limited". [kip]
    status : "limited", "no solution" (the other loads alone exceed the strength) or "unlimited".
    combination : the Combination that limits or is exceeded; None where status is "unlimited".
    reason : the result as one sentence.
    note : sentence on net compression at that value, or empty.
    """

    value: float | None
    status: str
    combination: Combination | None
    reason: str
    note: str = ""


@dataclass(frozen=True, eq=False)
class Region:
    """All pairs of two loads that the strength permits, as a convex polygon; empty where there is no solution.

    Parameters
    ----------
    x : (n,) abscissas of the upper boundary from 0 to the largest permissible value. [kip]
    y : (n,) largest permissible ordinate at each x. [kip]
    combinations : (n - 1,) the Combination that limits between neighbouring points.
    x_combination : the Combination that limits x, or None where there is no solution.
    """

    x: np.ndarray
    y: np.ndarray
    combinations: tuple
    x_combination: Combination | None

    @property
    def polygon(self):
        """(m, 2) corners of the region, closed along the axes. [kip]"""
        if not self.x.size:
            return np.empty((0, 2))
        corners = [(0.0, 0.0), *zip(self.x.tolist(), self.y.tolist(), strict=True), (float(self.x[-1]), 0.0)]
        return np.array([corner for k, corner in enumerate(corners) if k == 0 or corner != corners[k - 1]])


def _strength(available):
    available = number(available, "available strength")
    if available <= 0.0:
        raise InputError(f"available strength must be above 0 kip, got {available:g}.")
    return available


def _acting_in_tension(method, standard, fixed, unknown, options):
    """Return (combination, effect of the fixed loads) for each combination, relieving variable loads left out."""
    cases = [acting(c, fixed, 1) for c in combinations(method, standard, {*fixed, *unknown}, **options)]
    return [(c, sum(f * fixed.get(n, 0.0) for n, f in c.factors.items())) for c in cases]


def _compression_note(loads, method, standard, options):
    row = demands(loads, method, standard, **options).compression if any(loads.values()) else None
    if row is None:
        return ""
    return (f"With this value {row.combination.text} gives a net compression of {-row.total:.4g} kip, "
            f"which the member and the connection must carry as well.")


def permissible(available, service, unknown, method, standard, **options):
    """Return the largest tension of one nature that the available strength permits, the other loads being fixed.

    Parameters
    ----------
    available : available tensile strength at the level of the method. [kip]
    service : service axial load by nature, tension positive; an entry for the unknown is ignored. [kip]
    unknown : the nature sought. It is taken as tension, but W_opposite as compression. E is sought as a magnitude.
    method : "LRFD" or "ASD".
    standard : "7-16" or "7-22".
    options : companion_L, S_DS, rho, Omega_0 of combinations().

    Returns
    -------
    permissible : Permissible, in kip.

    Raises
    ------
    InputError
        An unknown nature, a number that is not finite, a strength not above zero, or an option not allowed.
    NotInTable
        An edition of ASCE 7 that the table does not hold.

    Notes
    -----
    With T = sum of factor times load for each combination, the value is the least of (available − rest)/factor.

    >>> permissible(97.5, {"D": 20.0}, "L", "LRFD", "7-22").value
    45.9375
    """
    available = _strength(available)
    check_nature(unknown)
    fixed = {nature: value for nature, value in checked_loads(service).items() if nature != unknown}
    cases = _acting_in_tension(method, standard, fixed, [unknown], options)

    worst, rest = max(cases, key=lambda case: case[1])
    if rest > available:
        reason = (f"No {unknown} is permissible: {worst.text} gives {rest:.4g} kip with {unknown} = 0, "
                  f"above the available {available:.4g} kip.")
        return Permissible(None, "no solution", worst, reason)

    push = unknown == "W_opposite"
    limits = [((available - rest) / c.factors[unknown], c)
              for c, rest in cases if not push and c.factors.get(unknown, 0.0) > 0.0]
    if not limits:
        reason = (f"{unknown} has no limit from tension: it enters no combination as tension; "
                  f"the compression it causes is to be checked separately.")
        return Permissible(None, "unlimited", None, reason)
    value, governing = min(limits, key=lambda limit: limit[0])
    reason = f"With {unknown} = {value:.4g} kip, {governing.text} reaches the available {available:.4g} kip."
    note = _compression_note({**fixed, unknown: value}, method, standard, options)
    return Permissible(value, "limited", governing, reason, note)


def _lines(available, service, vary_x, solve_y, method, standard, options):
    """Return the combinations and, one entry each, factor on x, factor on y and what the fixed loads leave."""
    available = _strength(available)
    for nature in (vary_x, solve_y):
        check_nature(nature)
        if nature == "W_opposite":
            raise InputError("W_opposite is compression and has no limit from tension; plot W instead.")
    if vary_x == solve_y:
        raise InputError(f"the two loads of a permissible-load plot must differ, got {vary_x} twice.")
    fixed = {nature: value for nature, value in checked_loads(service).items() if nature not in (vary_x, solve_y)}
    cases = _acting_in_tension(method, standard, fixed, [vary_x, solve_y], options)
    a = np.array([c.factors.get(vary_x, 0.0) for c, _ in cases])
    b = np.array([c.factors.get(solve_y, 0.0) for c, _ in cases])
    left = np.array([available - rest for _, rest in cases])
    return [c for c, _ in cases], a, b, left


def permissible_line(available, service, xs, method, standard, *, vary_x="D", solve_y="L", **options):
    """Return the largest permissible load of one nature for each value of another, under every combination.

    Parameters
    ----------
    available : available tensile strength at the level of the method. [kip]
    service : the fixed service loads, tension positive; entries for the two natures varied are ignored. [kip]
    xs : (n,) values of vary_x, not negative. [kip]
    method : "LRFD" or "ASD".
    standard : "7-16" or "7-22".
    vary_x : nature on the abscissa.
    solve_y : nature on the ordinate.
    options : companion_L, S_DS, rho, Omega_0 of combinations().

    Returns
    -------
    ys : (n,) largest permissible solve_y, NaN where x alone exceeds the strength. [kip]

    Raises
    ------
    InputError
        As permissible(); also for a negative x, two equal natures, or W_opposite.
    """
    _, a, b, left = _lines(available, service, vary_x, solve_y, method, standard, options)
    xs = np.atleast_1d(np.asarray(xs, dtype=float))
    if not np.all(np.isfinite(xs)) or np.any(xs < 0.0):
        raise InputError(f"the values of {vary_x} on the abscissa must be finite and not negative.")
    room = left - np.outer(xs, a)
    pulls = b > 0.0
    ys = np.min(room[:, pulls] / b[pulls], axis=1)
    return np.where(np.all(room >= 0.0, axis=1), ys, np.nan)


def permissible_region(available, service, method, standard, *, vary_x="D", solve_y="L", **options):
    """Return the exact boundary of all permissible pairs of two loads, with the combination that limits each stretch.

    Parameters
    ----------
    available : available tensile strength at the level of the method. [kip]
    service : the fixed service loads, tension positive; entries for the two natures varied are ignored. [kip]
    method : "LRFD" or "ASD".
    standard : "7-16" or "7-22".
    vary_x : nature on the abscissa.
    solve_y : nature on the ordinate.
    options : companion_L, S_DS, rho, Omega_0 of combinations().

    Returns
    -------
    region : Region, in kip.

    Raises
    ------
    InputError
        As permissible_line().
    """
    names, a, b, left = _lines(available, service, vary_x, solve_y, method, standard, options)
    along_x = np.where(a > 0.0, left / np.where(a > 0.0, a, 1.0), np.inf)
    x_end = float(along_x.min())
    if np.any(left < 0.0) or x_end == 0.0:
        return Region(np.empty(0), np.empty(0), (), None)

    pulls = np.flatnonzero(b > 0.0)
    slope, start = -a[pulls] / b[pulls], left[pulls] / b[pulls]
    with np.errstate(divide="ignore", invalid="ignore"):
        crossing = (start[:, None] - start) / (slope - slope[:, None])
    # Several lines through one point cross there only within rounding; nine decimals of a kip make them one corner.
    crossing = np.round(crossing, 9)
    inside = crossing[(crossing > 1e-9) & (crossing < x_end - 1e-9)]
    xs = np.unique(np.concatenate(([0.0], inside, [x_end])))
    lowest = [int(np.argmin(start + slope * x)) for x in (xs[:-1] + xs[1:]) / 2.0]
    corners = [0] + [k for k in range(1, len(lowest)) if lowest[k] != lowest[k - 1]]
    x = np.append(xs[corners], x_end)
    y = np.maximum((start + np.outer(x, slope)).min(axis=1), 0.0)
    stretches = tuple(names[pulls[lowest[k]]] for k in corners)
    return Region(x, y, stretches, names[int(along_x.argmin())])
