"""What changed between two revisions: inputs, assumptions, code and results, old and new, as data, as text and as blocks of a sheet."""

import difflib
import json
from dataclasses import dataclass
from pathlib import Path

from .. import identity, store, units
from ..cells import is_inputs_cell
from ..errors import ReportError
from ..sheet import blocks as sheet
from .attached import read_attachments
from .reading import cell_text, notebook_hash, read, template_rows
from .records import read_record

CALC_FILES = ("inputs.json", "results.json", "register.json", "versions.json")


@dataclass(frozen=True)
class State:
    """What is compared of one revision: name, inputs with sources, basis, register, versions, results, sources of the cells (or None)."""

    name: str
    inputs: dict
    basis: dict
    register: list
    versions: dict
    results: dict
    notebook: str
    sources: list | None = None


def state_of(path):
    """Return the ``State`` of a PDF, a record or a notebook, told apart by the file's name.

    Raises
    ------
    GagelineError
        The file cannot be read as one of them.
    """
    path = Path(path)
    if path.suffix == ".ipynb":
        return of_reading(read(path))
    if path.suffix == ".json":
        return of_record(read_record(path)[1])
    if path.suffix == ".pdf":
        return of_attachments(path, read_attachments(path))
    raise ReportError(f"{path}: give an issued PDF, a record (.json) or a notebook (.ipynb)")


def of_reading(reading):
    """Return the ``State`` of a notebook read."""
    calc = reading.calc
    return State(f"{reading.mark} as in {reading.path.name}", inputs_of(calc), basis_of(calc), register_of(calc),
                 dict([*identity.rows(calc.connection.family), *template_rows(reading)]), calc.results(), reading.notebook,
                 [cell_text(cell) for cell in reading.book["cells"]])


def of_record(record):
    """Return the ``State`` of an issue's record."""
    if record["kind"] != "issue":
        raise ReportError(f"the record of {record['mark']} revision {record['rev']} says it is {record['kind']}; give the issue's own record")
    return State(f"{record['mark']} revision {record['rev']}", record["inputs"], record["basis"], record["register"], record["versions"],
                 record["results"], record["notebook"])


def of_attachments(path, files):
    """Return the ``State`` of what is attached to a PDF."""
    try:
        data = {name: json.loads(files[name]) for name in CALC_FILES if name in files}
        book = next(json.loads(raw) for name, raw in files.items() if name.endswith(".ipynb"))
        results = data["results.json"]
        return State(Path(path).name, data["inputs.json"], {name: results[name] for name in ("edition", "method", "loads")},
                     data.get("register.json", {"rows": []})["rows"], data.get("versions.json", {}), results, notebook_hash(book),
                     [cell_text(cell) for cell in book["cells"]])
    except (KeyError, StopIteration, TypeError, json.JSONDecodeError) as error:
        raise ReportError(f"{path} does not carry the calculation it was made from ({type(error).__name__}: {error})") from None


def inputs_of(calc):
    """Return a calculation's inputs as plain data: name -> value and source."""
    return json.loads(store.canonical({name: {"value": each.value, "source": each.source} for name, each in calc.given.items()}))


def basis_of(calc):
    """Return edition, method and loads standard as plain data."""
    basis = calc.project.basis
    return {"edition": basis.edition, "method": basis.method, "loads": basis.loads}


def register_of(calc):
    """Return the register of assumptions and open items as plain data."""
    return [{name: row[name] for name in ("id", "kind", "text", "basis", "status")} for row in calc.register()]


@dataclass(frozen=True)
class Changes:
    """Differences of two states; each entry is a tuple of texts, the results' ones with the difference in D/C."""

    old: State
    new: State
    inputs: tuple
    register: tuple
    code: tuple
    results: tuple

    def __bool__(self):
        return bool(self.inputs or self.register or self.code or self.results)


def compare(old, new):
    """Return the ``Changes`` from one ``State`` to another."""
    return Changes(old, new, tuple(_inputs(old, new)), tuple(_register(old, new)), tuple(_code(old, new)), tuple(_results(old, new)))


def _inputs(old, new):
    for name in ("edition", "method", "loads"):
        if old.basis.get(name) != new.basis.get(name):
            yield name, _shown(old.basis.get(name)), _shown(new.basis.get(name)), "project.toml"
    for name in dict.fromkeys((*old.inputs, *new.inputs)):
        before, after = old.inputs.get(name), new.inputs.get(name)
        if before != after:
            source = "" if after is None else after["source"] or "no source given"
            if before and after and before["source"] != after["source"]:
                source = f"{before['source'] or 'no source given'} → {source}"
            yield name, "not given" if before is None else _shown(before["value"]), "not given" if after is None else _shown(after["value"]), source


def _shown(value):
    if isinstance(value, bool):
        return "yes" if value else "no"
    return "; ".join(map(str, value)) if isinstance(value, list) else str(value)


def _register(old, new):
    before, after = ({(row["kind"], row["text"]): row["status"] for row in state.register} for state in (old, new))
    for key in dict.fromkeys((*before, *after)):
        if before.get(key) != after.get(key):
            yield *key, before.get(key, "none"), after.get(key, "removed")


def _code(old, new):
    for name in dict.fromkeys((*old.versions, *new.versions)):
        if old.versions.get(name) != new.versions.get(name):
            yield name, old.versions.get(name, "none"), new.versions.get(name, "none")
    if old.sources is not None and new.sources is not None:
        before, after = (_calling(state.sources) for state in (old, new))
        for line in difflib.unified_diff(before, after, lineterm="", n=0):
            if line[:1] in "+-" and not line.startswith(("+++", "---")):
                yield "notebook", *((line[1:], "") if line[0] == "-" else ("", line[1:]))
    elif old.notebook != new.notebook and old.inputs == new.inputs:
        yield "notebook's text", old.notebook, new.notebook


def _calling(sources):
    """Return the lines of all cells but the inputs cell, which is compared input by input."""
    return [line for source in sources if not is_inputs_cell(source) for line in source.splitlines()]


def _results(old, new):
    before, after = ({each["id"]: each for each in state.results["checks"]} for state in (old, new))
    for id in dict.fromkeys((*after, *before)):
        a, b = before.get(id), after.get(id)
        if a is None or b is None or any(_moved(a.get(name), b.get(name)) for name in ("applies", "ratio", "demand", "available", "ok", "reason")):
            yield ((b or a)["title"], *_numbers(a), *_numbers(b), _difference(a, b))
    if old.results["governing"] != new.results["governing"]:
        names = [side.get(state.results["governing"], {}).get("title", "?") for side, state in ((before, old), (after, new))]
        yield "Governing check", names[0], "", names[1], "", ""


def _moved(a, b):
    if isinstance(a, float) and isinstance(b, float):
        return abs(a - b) > 1e-9 * max(abs(a), abs(b))
    return a != b


def _numbers(check):
    """Return (required / available, D/C) of a check's results as printed."""
    if check is None:
        return "not among the checks", "–"
    if not check["applies"]:
        return f"not applicable: {check['reason']}", "–"
    if check["ratio"] is None:
        return "–", "–"
    return f"{units.printed(check['demand'])} / {units.printed(check['available'])} {check['unit']}", units.ratio_text(check["ratio"])


def _difference(a, b):
    if not (a and b and a.get("ratio") is not None and b.get("ratio") is not None):
        return "–"
    return f"{b['ratio'] - a['ratio']:+.3f}".replace("-", "−")


def as_text(changes):
    """Return the changes as lines of text."""
    out = [f"{changes.old.name} → {changes.new.name}"]
    if not changes:
        return [*out, "no difference in inputs, assumptions, code or results"]
    for name, rows, line in (
            ("inputs", changes.inputs, lambda row: f"{row[0]}: {row[1]} → {row[2]}" + (f"  ({row[3]})" if row[3] else "")),
            ("assumptions and open items", changes.register, lambda row: f"{row[0]}: {row[1]}: {row[2]} → {row[3]}"),
            ("code", changes.code, lambda row: f"{row[0]}: {row[1] or '(nothing)'} → {row[2] or '(nothing)'}"),
            ("results", changes.results, lambda row: f"{row[0]}: {row[1]}" + (f", D/C {row[2]}" if row[2] else "") + f" → {row[3]}"
             + (f", D/C {row[4]}" if row[4] else "") + (f"  (D/C {row[5]})" if row[5] not in ("", "–") else ""))):
        out.append(f"{name}: " + (f"{len(rows)} differ" if rows else "no difference"))
        out += [f"  {line(row)}" for row in rows]
    return out


def as_blocks(changes, rev):
    """Return the page of changes as blocks of the sheet of the new revision."""
    out = [sheet.heading(text=f"Changes since revision {rev}")]
    if not changes:
        return [*out, sheet.prose(runs="No input, assumption, line of code or result differs.")]
    tables = (("Inputs", changes.inputs, ("Input", "Old", "New", "Source")),
              ("Assumptions and open items", changes.register, ("Kind", "Text", "Old", "New")),
              ("Program and notebook", changes.code, ("What", "Old", "New")))
    for name, rows, heads in tables:
        out.append(sheet.heading(text=name, level=2))
        if not rows:
            out.append(sheet.prose(runs="No difference."))
            continue
        cells = [[_breakable(cell) for cell in row] for row in rows]
        out.append(sheet.table(columns=[{"head": head} for head in heads], rows=[{"cells": row} for row in cells]))
    out.append(sheet.heading(text="Results", level=2))
    if not changes.results:
        return [*out, sheet.prose(runs="No difference.")]
    columns = [{"head": "Check"}, {"head": "Old, required / available"}, {"head": "D/C", "align": "right"},
               {"head": "New, required / available"}, {"head": "D/C", "align": "right"}, {"head": "Change", "align": "right"}]
    return [*out, sheet.table(columns=columns, rows=[{"cells": list(row)} for row in changes.results])]


def _breakable(text):
    """Return a text whose long words (hashes) are cut, so that a column can hold them; tables compare by their beginning."""
    return " ".join(word if len(word) <= 24 else word[:16] + "…" for word in text.split()) or "–"
