"""Sweeps and search: layouts per second on arrays, against the same formulas one layout at a time with pint quantities.

Run in the repository: ``.venv/bin/python tests/bench/bench_sweep.py``
"""

import time

import numpy as np

import gageline
from gageline import study, units
from gageline.search import search
from gageline.symbols import SYMBOLS

TEE = {"mark": "H1", "member": "WT8x33.5", "member_grade": "A992", "connected_by": "flange", "plate_grade": "A572-50", "plate_end": "1-1/2 in",
       "member_end": "1-1/2 in", "bolt": "7/8", "bolt_grade": "A325", "P_D": "38 kip", "P_L": "46 kip", "plate_width": "11 in",
       "plate_thickness": "3/4 in", "lines": 2, "rows": 4, "pitch": "3 in", "gage": "5-1/2 in"}


def timed(work):
    """Return (seconds, result)."""
    start = time.perf_counter()
    result = work()
    return time.perf_counter() - start, result


def with_units(connection):
    """Evaluate every formula of a connection's strength checks again with pint quantities."""
    for each in connection.checks:
        if each.kind == "strength":
            for step in each.steps:
                if not isinstance(step, str):
                    formula, values = step
                    formula(*(units.quantity(value, SYMBOLS[name].unit) for name, value in zip(formula.arguments, values)))


def main():
    """Print the figures."""
    tee = gageline.bolted(**TEE)
    seconds, curve = timed(lambda: study.over_pitch(tee, np.linspace(2.5, 6.0, 10_000)))
    print(f"10,000 lengths of a whole connection, all {len(curve)} limit states: {seconds:.3f} s")
    x, y = np.linspace(2.4, 6.0, 400), np.linspace(0.3, 1.0, 250)
    sweep = min(timed(lambda: study.ratios(tee, pitch=x, plate_thickness=y))[0] for _ in range(3))
    loop = timed(lambda: [with_units(tee) for _ in range(20)])[0] / 20
    print(f"100,000 layouts in one call: {sweep:.3f} s; one layout with pint: {1000 * loop:.2f} ms; ratio {loop * 100_000 / sweep:,.0f}")
    vary = {"bolt": ["3/4", "7/8", "1"], "rows": [2, 3, 4, 5], "pitch": [f"{v:.6g} in" for v in np.arange(2, 6.01, 0.125)],
            "gage": [f"{v:.6g} in" for v in np.arange(3.5, 7.51, 0.125)], "plate_thickness": [f"{v:.6g} in" for v in np.arange(0.375, 1.26, 0.125)],
            "plate_width": [f"{v:.6g} in" for v in np.arange(8, 13.01, 0.5)]}
    base = {name: value for name, value in TEE.items() if name not in vary}
    seconds, found = timed(lambda: search(base, vary, "least plate weight"))
    print(f"search: {found.evaluated:,} layouts in {seconds:.2f} s, {found.evaluated / seconds:,.0f} a second; {found.feasible:,} feasible; best "
          f"{1000 * found.layouts['plate weight'][0]:.1f} lb of plate with {found.layouts['bolts'][0]} bolts, D/C {found.layouts['ratio'][0]:.3f}")


if __name__ == "__main__":
    main()
