"""Proof of what was issued: hashes, attachments and records of a PDF, and its numbers computed again from its inputs."""

import json
import tempfile
import tomllib
from dataclasses import dataclass, field
from pathlib import Path

from .. import __version__, families, identity, store, units
from ..editions import Basis
from ..errors import GagelineError, ReportError
from . import records
from .attached import read_attachments

TOLERANCE = 1e-9
"""Relative difference below which two numbers are one: the last binary digits of another machine."""


@dataclass
class Finding:
    """What verifying found: facts that hold, faults (the file is not what was issued), and numbers that differ today."""

    path: Path
    facts: list = field(default_factory=list)
    faults: list = field(default_factory=list)
    differences: list = field(default_factory=list)

    @property
    def ok(self):
        """Whether nothing is wrong and every number comes out again."""
        return not self.faults and not self.differences


def verify(path, *, run=False):
    """Check an issued PDF against its record and compute its numbers again with the installed version.

    Parameters
    ----------
    path : the PDF; its record is expected beside it.
    run : also run the attached notebook, which executes its code, and compare the results it shows.

    Returns
    -------
    Finding

    Raises
    ------
    ReportError
        The file is missing or is no PDF that carries a calculation.
    """
    path = Path(path)
    found = Finding(path)
    if not path.is_file():
        raise ReportError(f"{path}: there is no such file")
    record = _against_record(path, found)
    try:
        files = read_attachments(path)
    except ReportError as error:
        found.faults.append(str(error))
        return found
    if record:
        _against_attachments(files, record, found)
    _recomputed(files, found)
    if run:
        _rerun(files, found)
    return found


def _against_record(path, found):
    try:
        _, record = records.read_record(path.with_suffix(".json"))
    except ReportError as error:
        found.faults.append(f"unproved: {error}")
        return None
    if record["kind"] != "issue":
        found.facts.append(f"this is the {record['kind']} copy of {record['mark']} revision {record['rev']} ({record['reason']}); "
                           "verify the issued file itself for its numbers")
    for name, said in record["files"].items():
        try:
            same = records.hashes((path.parent / name).read_bytes()) == said
        except OSError as error:
            found.faults.append(f"{name} cannot be read: {store.reason(error)}")
            continue
        if same:
            found.facts.append(f"{name}: SHA-256 {said['sha256'][:16]}… and SHA-1 as recorded")
        else:
            found.faults.append(f"{name} is not what was issued: its hash differs from the record's")
    if path.name not in record["files"]:
        found.faults.append(f"the record beside {path.name} does not name it")
    if record["kind"] != "issue":
        return None
    ledger = records.read(path.parent, files=False)
    status = ledger.status(record)
    found.facts.append(f"{record['mark']} revision {record['rev']} of {record['date']}, issued {record['status']} at {record['issued']}"
                       + (f", now {status}" if status != record["status"] else ""))
    found.faults += [fault for fault in ledger.faults if records.stem(record["mark"], record["rev"]) in fault]
    return record


def _against_attachments(files, record, found):
    for name, said in record["attachments"].items():
        if name not in files:
            found.faults.append(f"the attachment {name} is missing")
        elif store.sha256(files[name]) != said:
            found.faults.append(f"the attachment {name} is not the one recorded")
    found.faults += [f"the attachment {name} is not in the record" for name in files if name not in record["attachments"]]
    for name in ("inputs", "results"):
        try:
            same = json.loads(files.get(f"{name}.json", b"")) == record[name]
        except ValueError:
            same = False
        if not same:
            found.faults.append(f"the record's {name} are not those attached")
    if not found.faults:
        found.facts.append(f"{len(record['attachments'])} attached files as recorded")


def _recomputed(files, found):
    """Compute the results from the attached inputs, by the package's own code only, and compare each number."""
    try:
        inputs, results = json.loads(files["inputs.json"]), json.loads(files["results.json"])
        project = tomllib.loads(files["project.toml"].decode())
        basis = Basis(results["edition"], results["method"], results["loads"], results.get("units", "US"))
        family = families.family(results["family"])
        values = {name: each["value"] for name, each in inputs.items()}
        made_by = json.loads(files.get("versions.json", b"{}"))
    except (KeyError, TypeError, AttributeError, ValueError) as error:
        found.faults.append(f"the attached inputs, results or project file cannot be read: {error}")
        return
    if any(project.get(name) != results[name] for name in ("edition", "method", "loads")):
        found.faults.append("the attached project.toml names another edition, method or loads standard than the results")
    if made_by:
        same = made_by.get("Code and tables, SHA-256") == identity.program_hash()
        found.facts.append(f"made by {made_by.get('Program', 'an unknown version')}; computed again by gageline {__version__}, "
                           + ("the same code and tables" if same else "other code or tables"))
    try:
        with units.lengths_in("SI" if basis.units_system == "SI" else "US"):
            again = family(family.Model.of(**values), basis).to_dict()
    except GagelineError as error:
        found.differences.append(f"the installed version refuses the inputs: {error}")
        return
    count, found_differences = compare_results(results, json.loads(store.canonical(again)))
    found.differences += found_differences
    found.facts.append(f"{count} numbers and verdicts computed again from the inputs, {len(found_differences)} differ")


def compare_results(old, new):
    """Return (how many values were compared, sentences on those that differ) of two results as plain data."""
    count, out = 0, []

    def walk(a, b, where):
        nonlocal count
        if isinstance(a, dict) and isinstance(b, dict):
            for name in dict.fromkeys((*a, *b)):
                walk(a.get(name), b.get(name), f"{where}.{name}" if where else name)
        elif isinstance(a, list) and isinstance(b, list):
            named = all(isinstance(each, dict) and "id" in each for each in (*a, *b))
            pairs = {each["id"] if named else i: each for i, each in enumerate(a)}, {each["id"] if named else i: each for i, each in enumerate(b)}
            for key in dict.fromkeys((*pairs[0], *pairs[1])):
                walk(pairs[0].get(key), pairs[1].get(key), f"{where}[{key}]")
        else:
            count += 1
            number = all(isinstance(each, (int, float)) and not isinstance(each, bool) for each in (a, b))
            if abs(a - b) > TOLERANCE * max(abs(a), abs(b)) if number else a != b:
                out.append(f"{where}: {'absent' if a is None else a} as issued, {'absent' if b is None else b} now")

    walk(old, new, "")
    return count, out


def _rerun(files, found):
    from .. import running
    from ..sheet.blocks import SHEET_MIME

    with tempfile.TemporaryDirectory(prefix="gageline-verify-") as folder:
        (Path(folder) / "project.toml").write_bytes(files["project.toml"])
        book = next((json.loads(raw) for name, raw in files.items() if name.endswith(".ipynb")), None)
        if book is None:
            found.faults.append("no notebook is attached")
            return
        try:
            node = running.execute(book, folder)
        except GagelineError as error:
            found.differences.append(f"the attached notebook does not run: {error}")
            return
    blocks = [block for cell in node["cells"] for output in cell.get("outputs", ()) for block in
              output.get("data", {}).get(SHEET_MIME, {}).get("blocks", ())]
    shown = {entry["name"]: entry["text"] for block in blocks if block["kind"] == "meta" for entry in block["attachments"]}
    count, differences = compare_results(json.loads(files["results.json"]), json.loads(shown.get("results.json", "{}")))
    found.differences += [f"by the notebook: {each}" for each in differences]
    found.facts.append(f"the attached notebook was run: {count} values compared, {len(differences)} differ")
