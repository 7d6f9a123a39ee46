"""A search as the command line asks for it: ranges as text, the best layouts as a table, the winner as an inputs cell."""

from pathlib import Path

import numpy as np

from . import project, units
from .errors import InputError
from .search import LENGTHS, search

MOST_VALUES = 2000


def values_of(text):
    """Return (name, values) of ``name=a,b,c`` or ``name=start:stop:step``; lengths stay texts with their unit.

    Raises
    ------
    InputError
        Not of that form, or a range without end.

    >>> values_of("rows=2:4:1"), values_of("pitch=2-1/2 in, 3 in")
    (('rows', [2, 3, 4]), ('pitch', ['2-1/2 in', '3 in']))
    """
    name, equals, listed = text.partition("=")
    name, parts = name.strip(), [part.strip() for part in listed.split(":" if ":" in listed else ",")]
    if not equals or not all(parts):
        raise InputError(f"--vary {text!r}: write name=a,b,c or name=start:stop:step, for example 'pitch=2 in:4 in:1/4 in'")
    if ":" not in listed:
        return name, [int(part) if part.isdecimal() and name not in LENGTHS and name != "bolt" else part for part in parts]
    if len(parts) != 3:
        raise InputError(f"--vary {text!r}: a range is start:stop:step")
    unit = "in" if name in LENGTHS else ""
    start, stop, step = (units.read(part, unit, name) for part in parts)
    if step <= 0 or stop < start or (stop - start) / step > MOST_VALUES:
        raise InputError(f"--vary {text!r}: the step must be greater than 0, the stop not below the start, at most {MOST_VALUES} values")
    stops = start + step * np.arange(int((stop - start) / step + 1e-9) + 1)
    return name, [f"{value:.10g} in" for value in stops] if unit else [round(value) for value in stops]


def told(inputs, folder, vary, objective, most, plot):
    """Run a search on a notebook's inputs and return what is printed; ``plot`` is written where it is given."""
    basis = project.load(project.find(folder)).basis
    spans = dict(values_of(text) for text in vary)
    base = {name: value for name, value in inputs.items() if name not in spans}
    found = search(base, spans, objective, edition=basis.edition, method=basis.method, loads=basis.loads)
    lines = [f"{found.evaluated} layouts evaluated, {found.feasible} satisfy every check."]
    lines += [f"{count} of the kinds tried: {why}" for why, count in found.refused.items()]
    if not found.feasible:
        return "\n".join(lines)
    names = list(found.layouts)
    rows = [[_said(name, found.layouts[name][i]) for name in names] for i in range(min(most, len(found.layouts["ratio"])))]
    widths = [max(len(name), *(len(row[k]) for row in rows)) for k, name in enumerate(names)]
    lines += ["", "  ".join(name.ljust(width) for name, width in zip(names, widths))]
    lines += ["  ".join(cell.ljust(width) for cell, width in zip(row, widths)) for row in rows]
    if plot is not None:
        from .figures import pareto

        Path(plot).write_text(pareto(found).svg, encoding="utf-8")
        lines += ["", f"Pareto set of bolts against plate weight: {plot}"]
    return "\n".join([*lines, "", "Inputs cell of the best:", found.inputs_cell()])


def _said(name, value):
    if name in LENGTHS or name == "length":
        return units.fraction(float(value), 32) + " in"
    if name in ("plate weight", "member weight"):
        return f"{1000 * value:.4g} lb" + ("/ft" if name.startswith("member") else "")
    return units.ratio_text(float(value)) if name == "ratio" else str(value)
