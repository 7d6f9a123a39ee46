"""The records of a project's reports folder: their names, their reading, and what is wrong with them."""

import hashlib
import re
from dataclasses import dataclass, field
from pathlib import Path

from .. import store
from ..errors import InputError, ReportError

_STEM = re.compile(r"(?P<mark>[\w.-]+)-rev(?P<rev>[0-9A-Za-z]+)", re.ASCII)
INTENT = ".issuing"

_LATER = {"mark": str, "rev": str, "when": str, "who": str, "reason": str, "files": dict}
_FIELDS = {"superseded": _LATER, "void": _LATER,
           "issue": {"mark": str, "rev": str, "issued": str, "sequence": int, "supersedes": list, "previous": str, "status": str, "date": str,
                     "title": str, "revision_text": str, "signed": dict, "content": str, "notebook": str,
                     "files": dict, "attachments": dict, "basis": dict, "inputs": dict, "results": dict, "versions": dict,
                     "register": list, "lines": list, "signoffs": list}}


def reports_folder(project_folder):
    """Return where a project's issues are kept: reports/<project>/ beside calcs/, or reports/ in the project's folder elsewhere."""
    folder = Path(project_folder).resolve()
    return folder.parent.parent / "reports" / folder.name if folder.parent.name == "calcs" else folder / "reports"


def stem(mark, rev):
    """Return the name that an issue's files begin with."""
    return f"{mark}-rev{rev}"


def order(rev):
    """Return a key that orders revisions: A, B, …, AA before 0, 1, 2, …; 1A after 1.

    Raises
    ------
    InputError
        The text is no revision.
    """
    if found := re.fullmatch(r"(\d{1,4})([A-Z]?)", rev, re.ASCII):
        if found[1] != str(int(found[1])):
            raise InputError(f"revision {rev!r} begins with 0; write {int(found[1])}{found[2]}")
        return 1, int(found[1]), found[2]
    if re.fullmatch(r"[A-Z]{1,2}", rev, re.ASCII):
        return 0, len(rev), rev
    raise InputError(f"revision {rev!r} is not allowed; use A, B, … before the first issue, then 0, 1, 2, … (1A between)")


def hashes(data):
    """Return name -> hash and size of a file's bytes; SHA-1 because some rules of practice name it."""
    return {"bytes": len(data), "sha256": hashlib.sha256(data).hexdigest(), "sha1": hashlib.sha1(data, usedforsecurity=False).hexdigest()}


def sealed(record):
    """Return a record as bytes, with the hash over all the rest of it inside."""
    return store.canonical(record | {"record_sha256": store.sha256(record)})


def read_record(path):
    """Return (bytes, record).

    Raises
    ------
    ReportError
        The record is missing, damaged, or was edited: it no longer gives its own hash.
    """
    raw, record = store.read_json(path)
    if "gageline_record" not in record:
        raise ReportError(f"{path} is no record of an issue")
    if store.sha256({key: value for key, value in record.items() if key != "record_sha256"}) != record.get("record_sha256"):
        raise ReportError(f"{path} was edited: it does not give its own hash")
    kind = record.get("kind")
    if kind not in _FIELDS or any(not isinstance(record.get(name), of) for name, of in _FIELDS[kind].items()):
        raise ReportError(f"{path} is no complete record")
    return raw, record


@dataclass
class Ledger:
    """What a reports folder holds: issues by (mark, rev), later marks by (mark, rev), and every fault found."""

    folder: Path
    issues: dict = field(default_factory=dict)
    later: dict = field(default_factory=dict)
    faults: list = field(default_factory=list)
    raw: dict = field(default_factory=dict)

    def revisions(self, mark):
        """Return the issue records of a mark, oldest revision first."""
        return sorted((each for (name, _), each in self.issues.items() if name == mark), key=lambda each: order(each["rev"]))

    def status(self, record):
        """Return an issue's status as of now: void, superseded (a newer record names it), or as issued."""
        key = record["mark"], record["rev"]
        if "void" in self.later.get(key, {}):
            return "void"
        newer = any(each["mark"] == key[0] and key[1] in each["supersedes"] for each in self.issues.values())
        return "superseded" if newer or "superseded" in self.later.get(key, {}) else record["status"]

    def last(self):
        """Return the record issued last in this folder, by sequence, or None."""
        return max(self.issues.values(), key=lambda each: each["sequence"], default=None)


def read(folder, *, files=True):
    """Return the ``Ledger`` of a reports folder.

    Parameters
    ----------
    files : also hash every issued file against its record.
    """
    folder = Path(folder)
    ledger = Ledger(folder)
    for path in sorted(folder.glob("*.json")) if folder.is_dir() else ():
        _take(ledger, path)
    for (mark, rev), record in ledger.issues.items():
        ledger.faults += _file_faults(folder, stem(mark, rev), record) if files else []
    if folder.is_dir():
        ledger.faults += _strays(folder, ledger)
    ledger.faults += _chain_faults(ledger)
    return ledger


def _take(ledger, path):
    name, _, kind = path.stem.rpartition(".")
    if kind not in ("superseded", "void"):
        name, kind = path.stem, ""
    found = _STEM.fullmatch(name)
    try:
        raw, record = read_record(path)
        if not found or (record.get("mark"), record.get("rev")) != (found["mark"], found["rev"]) or record["kind"] != (kind or "issue"):
            raise ReportError(f"{path} is not the record that its name says")
    except ReportError as error:
        ledger.faults.append(str(error))
        return
    key = found["mark"], found["rev"]
    if kind:
        ledger.later.setdefault(key, {})[kind] = record
    else:
        ledger.issues[key] = record
        ledger.raw[key] = raw


def _file_faults(folder, name, record):
    out = []
    for what, said in record["files"].items():
        path = folder / what
        try:
            found = hashes(path.read_bytes())
        except OSError as error:
            out.append(f"{path} of revision {record['rev']} cannot be read: {store.reason(error)}")
            continue
        if found != said:
            out.append(f"{path} is not what was issued: its hash differs from the record's")
    return out


def _strays(folder, ledger):
    """Yield PDFs without a record: unfinished issues are named as such, others have lost their record."""
    out = []
    intents = {path.name[1:].removesuffix(INTENT) for path in folder.glob(f".*{INTENT}")}
    for path in sorted(folder.glob("*.pdf")):
        name = path.stem.removesuffix(".superseded").removesuffix(".void")
        found = _STEM.fullmatch(name)
        if not found or (found["mark"], found["rev"]) in ledger.issues or path.with_name(f"{name}.json").exists():
            continue
        out.append(f"{path} belongs to an issue that was not finished; the next issue removes it" if name in intents
                   else f"{path} has no record; restore {name}.json")
    return out


def _chain_faults(ledger):
    """Yield breaks of the chain in which each record names the hash of the one issued before it."""
    out, by_number = [], {}
    for key, record in ledger.issues.items():
        if record["sequence"] in by_number:
            out.append(f"{stem(*key)} and {stem(*by_number[record['sequence']])} have one number ({record['sequence']}); they were issued in "
                       "copies of this folder at the same time")
        by_number.setdefault(record["sequence"], key)
    last = ""
    for number in range(1, max(by_number, default=0) + 1):
        if number not in by_number:
            out.append(f"issue no. {number} of {ledger.folder} is missing or unreadable")
            continue
        key, record = by_number[number], ledger.issues[by_number[number]]
        before = by_number.get(number - 1)
        if before and record["previous"] != store.sha256(ledger.raw[before]):
            out.append(f"the record of {stem(*before)} was edited or exchanged after {stem(*key)} was issued")
        if record["issued"] < last:
            out.append(f"the clock went back before {stem(*key)} was issued: {last}, then {record['issued']}")
        last = max(last, record["issued"])
    return out
