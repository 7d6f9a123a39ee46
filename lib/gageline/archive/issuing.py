"""Issuing a calculation: what is printed and recorded, built before anything is written; see ``commit`` for how it is written."""

import copy
import datetime
import json
from pathlib import Path

from .. import running, store
from ..errors import InputError, ReportError
from ..sheet.blocks import SHEET_MIME
from ..sheet.build import set_pdf, sheet_data
from . import attached, changes, records, statuses
from .commit import commit
from .reading import SIGN_ROLES, read, template_rows

NOT_COMPARED = "Sign-offs, review and open items"
"""The section whose rows get no triangles: it is new at each revision."""


def issue(path, *, rev=None, status=None, text=None, date=None, profile=None, say=lambda words: None):
    """Run a calculation, freeze its PDF and record in the reports folder, and mark older revisions superseded.

    Parameters
    ----------
    path : the notebook.
    rev, status, text, date, profile : revision, status, what it is, its date (ISO) and PDF profile; by default project.toml's.
    say : called with a few words at each stage.

    Returns
    -------
    tuple
        (path of the PDF, the record).

    Raises
    ------
    GagelineError
        Whatever is wrong, as one sentence; then nothing is issued.
    """
    reading = read(path)
    job = reading.calc.project
    rev, status, profile = rev or job.rev, status or job.status, profile or job.profile
    said = {"rev": rev, "status": status, "text": text if text is not None else job.revision_text, "date": _date(date or job.date.isoformat())}
    folder = records.reports_folder(reading.project_folder)
    ledger = records.read(folder, files=False)
    _allowed(reading, said, ledger)
    say("running the notebook")
    node = running.execute(reading.book, Path(path).resolve().parent, lambda i, n: say(f"running cell {i} of {n}"))
    older = ledger.revisions(reading.mark)
    say("setting the sheets")
    pdf, files, lines = _set(node, reading, said, older, profile)
    record = _record(reading, said, files, lines, profile)
    name = records.stem(reading.mark, rev)
    made = {f"{name}.pdf": pdf} | ({f"{name}.zip": attached.bundle(files)} if profile == "record" else {})
    say("writing")
    record = commit(folder, name, made, record, built_on=[each["rev"] for each in older])
    return folder / f"{name}.pdf", record


def _date(text):
    try:
        return datetime.date.fromisoformat(text).isoformat()
    except ValueError:
        raise InputError(f"date {text!r} is no date; write it as 2026-12-01") from None


def _allowed(reading, said, ledger):
    mark, rev = reading.mark, said["rev"]
    order = records.order(rev)
    if refused := statuses.refusals(said["status"], reading):
        raise InputError(f"{mark} cannot be issued {said['status']}: {'; '.join(refused)}")
    name = records.stem(mark, rev)
    if (mark, rev) in ledger.issues or (ledger.folder / f"{name}.json").exists():
        raise InputError(f"{name} is issued already and is never overwritten; give a new revision")
    older = ledger.revisions(mark)
    if older and records.order(older[-1]["rev"]) > order:
        raise InputError(f"revision {rev} comes before {older[-1]['rev']}, which is issued; give a later one")
    if damaged := [fault for fault in ledger.faults if f"{ledger.folder / mark}-rev" in fault and "not finished" not in fault]:
        raise ReportError(f"{mark} is not issued while its records are damaged: {damaged[0]}")


def _set(node, reading, said, older, profile):
    """Return (PDF, attached files, hashes of the printed lines) of an executed notebook as it is issued."""
    node = json.loads(json.dumps(node))
    bundles = [output["data"][SHEET_MIME] for cell in node["cells"] for output in cell.get("outputs", ()) if SHEET_MIME in output.get("data", {})]
    every = [block for bundle in bundles for block in bundle["blocks"]]
    meta = next((block for block in every if block["kind"] == "meta"), None)
    if meta is None or not any(block["kind"] == "cover" for block in every):
        raise ReportError(f"{reading.path}: the notebook shows no cover; a calculation is issued with one (calc.cover())")
    _check_same(meta, reading)
    rule = statuses.RULES[said["status"]]
    meta |= {"rev": said["rev"], "rev_date": said["date"], "status": said["status"].upper(), "statement": rule.statement,
             "watermark": rule.watermark} | _signed(reading)
    lines = _lines(every)
    if older:
        before = set(older[-1]["lines"])
        for block, key in lines:
            if key not in before:
                block["changed"] = said["rev"]
    own = reading.project_folder / "sheet" / "sheet.typ"
    for block in every:
        if block["kind"] == "cover":
            block["revisions"] = [*([each["rev"], each["date"], each["revision_text"], *(each["signed"][field] for field in SIGN_ROLES.values())]
                                    for each in older), [said["rev"], said["date"], said["text"], meta["by"], meta["checked"], meta["approved"]]]
        if block["kind"] == "identification":
            block["rows"] = [*block["rows"], *template_rows(reading)]
    state = changes.of_reading(reading)
    if older:
        page = changes.as_blocks(changes.compare(changes.of_record(older[-1]), state), older[-1]["rev"])
        blocks = next(bundle["blocks"] for bundle in bundles if any(block["kind"] == "cover" for block in bundle["blocks"]))
        blocks[next(i for i, block in enumerate(blocks) if block["kind"] == "cover") + 1:0] = page
    extra = [{"name": name, "mime": "application/json", "text": store.canonical(data).decode(), "description": words} for name, data, words in (
        ("register.json", {"rows": state.register}, "Assumptions and open items"),
        ("versions.json", state.versions, "Program and what it stands on"))]
    data = sheet_data(node, attachments=extra)
    pdf = set_pdf(data, sheet_folder=own.parent if own.is_file() else None, profile=profile)
    return pdf, {entry["name"]: entry["text"].encode() for entry in data["attachments"]}, [key for _, key in lines]


def _check_same(meta, reading):
    """Stop where the notebook shows other inputs, results or sign-offs than its inputs cell gives."""
    shown = {entry["name"]: entry["text"] for entry in meta["attachments"]}
    expected = {"inputs.json": changes.inputs_of(reading.calc), "results.json": json.loads(store.canonical(reading.calc.results()))}
    if reading.calc.log.events:
        expected["signoffs.json"] = list(reading.calc.log.events)
    for name, data in expected.items():
        if json.loads(shown.get(name, "null")) != data:
            raise ReportError(f"{reading.path}: the notebook's {name} is not what its inputs cell gives; something in it, or somebody at this "
                              "moment, changed them")


def _signed(reading):
    out = {}
    for role, field in zip(("preparer", "checker", "approver"), ("by", "checked", "approved")):
        event = reading.signed(role)
        out |= {field: event["who"] if event else "", f"{field}_date": event["when"][:10] if event else ""}
    return out


def _lines(blocks):
    """Return (block or row, hash) of every printed line that may be marked as changed: equations, verdicts, rows of tables."""
    out, apart = [], False
    for block in blocks:
        if block["kind"] == "heading" and block["level"] == 1:
            apart = "".join(run for run in block["text"] if isinstance(run, str)) == NOT_COMPARED
        if apart:
            continue
        if block["kind"] in ("equation", "verdict"):
            out.append((block, _key({name: value for name, value in block.items() if name != "changed"})))
        elif block["kind"] == "table":
            out += [(row, _key([row["cells"], row.get("span_reason")])) for row in block["rows"]]
    return out


def _key(data):
    return store.sha256(copy.deepcopy(data))[:16]


def _record(reading, said, files, lines, profile):
    calc = reading.calc
    job, state = calc.project, changes.of_reading(reading)
    return {"gageline_record": 1, "kind": "issue", "project": job.project, "job": job.job, "client": job.client, "location": job.location,
            "firm": job.firm, "mark": reading.mark, "title": calc.connection.inputs.title or calc.connection.title,
            "family": calc.connection.family, "rev": said["rev"], "revision_text": said["text"], "date": said["date"], "status": said["status"],
            "profile": profile, "signed": {field: (reading.signed(role) or {}).get("who", "") for role, field in SIGN_ROLES.items()},
            "content": reading.content, "notebook": reading.notebook, "basis": state.basis, "inputs": state.inputs, "results": state.results,
            "register": state.register, "versions": state.versions, "signoffs": list(calc.log.events),
            "signoff_head": calc.log.head, "lines": lines,
            "attachments": {name: store.sha256(data) for name, data in sorted(files.items())}}
