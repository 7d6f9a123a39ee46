"""An executed notebook becomes one PDF: blocks collected, maths converted, all handed to Typst as one piece of data."""

import datetime
import functools
import json
import os
import re
import tempfile
from pathlib import Path

from ..errors import ReportError
from . import blocks as kinds
from . import guard, maths
from .assets import sheet_file
from .notebook import collect, source_text

STANDARDS = {"working": ("a-3a", "ua-1"), "record": ("a-2a", "ua-1")}
"""Profile -> what the PDF conforms to; PDF/A-2 takes no attachments."""


def build_pdf(notebook, *, attachments=(), sheet_folder=None, profile="working"):
    """Set an executed notebook as a calculation sheet.

    Parameters
    ----------
    notebook : NotebookNode or dict of notebook format 4, executed, with one block meta among its outputs.
    attachments : further {name, mime, text, description} beside those of meta; the notebook's source goes along anyway.
    sheet_folder : folder with a sheet.typ of the project's own, or None for the look that ships.
    profile : "working" (PDF/A-3a, all attached) or "record" (PDF/A-2a, nothing attached).

    Returns
    -------
    pdf : bytes, PDF/A and PDF/UA-1; the same notebook gives the same bytes.

    Raises
    ------
    ReportError : anything that would make the sheet wrong, unreadable or incomplete; the message is one sentence.
    """
    return set_pdf(sheet_data(notebook, attachments=attachments), sheet_folder=sheet_folder, profile=profile)


def set_pdf(data, *, sheet_folder=None, profile="working"):
    """Set what ``sheet_data`` returned, in one of the profiles of ``STANDARDS``, and return the PDF's bytes."""
    if profile == "record":
        data = data | {"attachments": []}
    return _compile(data, sheet_file(sheet_folder), STANDARDS[profile])


def check_printable(name, texts):
    """Stop where a sheet could not print a name in its title block or a text in a table: a sign its fonts lack, a word too long.

    Raises
    ------
    ReportError : one sentence that names the sign or the word.
    """
    meta = kinds.meta(project="-", mark="-", title="-", rev="-", rev_date="2000-01-01", edition="-", method="-", loads="-", status="-",
                      by=name, checked=name, approved=name)
    columns = [{"head": "", "width": width} for width in (0.5, 2.2, 3.2)]
    block = kinds.table(columns=columns, rows=[{"cells": ["", text, text]} for text in texts]) | {"where": "the text"}
    _check_text(block, "the text")
    head = {key: value for key, value in meta.items() if key not in ("attachments", "identification")}
    _compile({"meta": head, "blocks": [block], "attachments": []}, sheet_file(), STANDARDS["working"])


def sheet_data(notebook, *, attachments=()):
    """Return all that a sheet prints as one JSON-ready dict: meta, blocks (maths is Typst by now), attachments."""
    placed = collect(notebook)
    metas = [block for _, block in placed if block["kind"] == "meta"]
    if len(metas) != 1:
        raise ReportError(f"A notebook must display the block meta exactly once, this one does {len(metas)} times.")
    meta = metas[0]
    placed = [(where, block) for where, block in placed if block["kind"] != "meta"]
    _check_order(placed)
    if meta["identification"] and not any(block["kind"] == "identification" for _, block in placed):
        placed.append(("meta", {"kind": "heading", "level": 1, "text": ["Program identification"]}))
        placed.append(("meta", {"kind": "identification", "rows": meta["identification"]}))
    book = {
        "name": f"{re.sub(r'[^A-Za-z0-9._-]+', '-', meta['mark']).strip('-') or 'calc'}.ipynb",
        "mime": "application/x-ipynb+json",
        "text": source_text(notebook),
        "description": "The notebook this sheet was made from",
    }
    files = [book | {"relationship": "source"}]
    files += [dict(entry) | {"relationship": "supplement"} for entry in [*meta["attachments"], *attachments]]
    names = [entry["name"] for entry in files]
    if len(set(names)) != len(names):
        raise ReportError(f"Two attachments have one name: {', '.join(names)}.")
    for where, block in [("meta", meta), *placed]:
        _check_text(block, where)
    blocks = _with_typst_maths([block | {"where": where} for where, block in placed])
    head = {key: value for key, value in meta.items() if key not in ("attachments", "identification")}
    return {"meta": head, "blocks": blocks, "attachments": files}


def write_pdf(path, pdf):
    """Write a PDF so that path holds either what it held before or all of it, never a part.

    Parameters
    ----------
    path : where to; its folder must exist.
    pdf : bytes.

    Raises
    ------
    ReportError : the folder is missing or cannot be written to, or the PDF there is an issued one.
    """
    path = Path(path)
    if path.suffix == ".pdf" and _is_issued(path):
        raise ReportError(f"{path} is an issued revision and is never overwritten; give another name.")
    temporary = None
    try:
        handle, temporary = tempfile.mkstemp(dir=path.parent, prefix=f".{path.name}.", suffix=".part")
        with os.fdopen(handle, "wb") as file:
            file.write(pdf)
            file.flush()
            os.fsync(file.fileno())
        os.chmod(temporary, 0o644)
        os.replace(temporary, path)
    except OSError as error:
        if temporary is not None:
            Path(temporary).unlink(missing_ok=True)
        raise ReportError(f"The PDF cannot be written to {path}: {(error.strerror or str(error)).lower()}.") from None


def _is_issued(path):
    record = path.with_suffix(".json")
    try:
        return record.is_file() and b'"gageline_record"' in record.read_bytes()
    except OSError:
        return True


def _check_order(placed):
    covers = [i for i, (_, block) in enumerate(placed) if block["kind"] == "cover"]
    if len(covers) > 1 or covers[:1] not in ([], [0]):
        raise ReportError("The block cover must stand once, before everything else that is printed.")
    level = 0
    for where, block in placed:
        if block["kind"] == "heading":
            if block["level"] > level + 1:
                text = "".join(run for run in block["text"] if isinstance(run, str))
                raise ReportError(
                    f"The heading {text!r} in {where} is of level {block['level']} right after level {level}."
                )
            level = block["level"]


_VALUE_FIELDS = {
    "verdict": ("lhs", "text", "ratio_text"),
    "table": ("rows",),
    "pairs": ("rows",),
    "cover": ("governing",),
}


def _check_text(block, where):
    kind = block["kind"]
    if kind == "figure":
        guard.svg(block["svg"], where)
    for name, entry in block.items():
        if name in ("svg", "logo", "attachments", "identification", "lines"):
            continue
        for text in _texts(entry):
            guard.words(text, where)
        if name in _VALUE_FIELDS.get(kind, ()):
            rows = [row[:2] for row in entry] if kind == "pairs" else entry
            for text in _texts(rows):
                guard.value(text, where)


def _texts(entry):
    """Yield every text of a block that prints as text; maths and its readings are looked at on their own."""
    if isinstance(entry, str):
        yield entry
    elif isinstance(entry, dict):
        for key, value in entry.items():
            if key not in ("math", "alt", "latex", "lhs", "lines", "kind", "code"):
                yield from _texts(value)
    elif isinstance(entry, (list, tuple)):
        for value in entry:
            yield from _texts(value)


def _with_typst_maths(blocks):
    """Return the blocks with every formula as Typst maths, converted in one call."""
    formulas = {}

    def want(latex, where):
        formulas.setdefault(maths.tidied(latex), where)
        return maths.tidied(latex)

    def gather(entry, where):
        match entry:
            case {"math": latex}:
                return entry | {"math": want(latex, where), "alt": entry.get("alt") or maths.reading(latex)}
            case {"kind": "equation"}:
                return entry | {"lines": [gather_line(line, where) for line in entry["lines"]]}
            case {"latex": latex}:
                return entry | {"math": want(latex, where), "alt": entry.get("alt") or maths.reading(latex)}
            case dict():
                return {key: value if key == "svg" else gather(value, where) for key, value in entry.items()}
            case list():
                return [gather(value, where) for value in entry]
        return entry

    def gather_line(line, where):
        rows = []
        for latex in line["rows"]:
            whole = maths.row_of(latex)
            cuts = [[want(term, where) for term in part] for part in maths.cuts(whole)]
            rows.append({"math": want(whole, where), "cuts": cuts})
        return {"math": want(line["lhs"], where), "rows": rows}

    gathered = [gather(block, block["where"]) for block in blocks]
    typst = maths.converted(formulas)
    for latex, where in formulas.items():
        guard.maths(typst[latex], latex, where)

    def exchange(entry):
        match entry:
            case dict():
                done = {
                    key: value if key == "svg" else exchange(value) for key, value in entry.items() if key != "latex"
                }
                if "math" in entry:
                    done["math"] = typst[entry["math"]]
                if "cuts" in entry:
                    done["cuts"] = [[typst[term] for term in part] for part in entry["cuts"]]
                return done
            case list():
                return [exchange(value) for value in entry]
        return entry

    return [exchange(block) for block in gathered]


@functools.cache
def fonts():
    """Return the fonts that travel with the compiler; no other is used."""
    import typst

    return typst.Fonts(include_system_fonts=False, include_embedded_fonts=True)


def _compile(data, look, standards):
    try:
        import typst
    except ImportError:
        raise ReportError("Typst is missing: install the package typst.") from None
    # As a file, not as an input: Typst forgets all it has laid out when an input changes. A firm's older look may still ask for the input.
    source, text = look.read_bytes(), json.dumps(data, ensure_ascii=False)
    noon = datetime.datetime.fromisoformat(data["meta"]["rev_date"] + "T12:00:00+00:00")
    try:
        pdf, warnings = typst.compile_with_warnings(
            {"main.typ": source, "data.json": text.encode()},
            root=str(look.parent),
            font_paths=fonts(),
            ignore_system_fonts=True,
            format="pdf",
            pdf_standards=list(standards),
            timestamp=int(noon.timestamp()),
            sys_inputs={"data": text} if b"sys.inputs" in source else {},
        )
    except typst.TypstError as error:
        raise ReportError(_explained(error, data)) from None
    if warnings:
        raise ReportError(f"The sheet was set with a warning, which counts as a fault: {warnings[0].message}.")
    return pdf


def _explained(error, data):
    """Turn what Typst says into one sentence with the place."""
    refused = re.search(r'panicked with: "SHEET: (.*)"', error.message, re.DOTALL)
    if refused:
        return json.loads(f'"{refused.group(1)}"')
    blank = re.findall(r'the text `"((?:[^"\\]|\\.)*)"` could not be displayed', error.diagnostic)
    if blank:
        signs = "".join(dict.fromkeys("".join(blank)))
        return (
            f"The sheet's fonts have no sign for {signs!r}{_place_of(signs, data)}; "
            "Latin, Greek, Cyrillic and mathematical signs can be printed."
        )
    first = next((line for line in error.diagnostic.splitlines() if line.startswith("error")), error.message)
    return f"The sheet could not be set: {first.removeprefix('error: ')}."


def _place_of(signs, data):
    for name, entry in data["meta"].items():
        if isinstance(entry, str) and any(sign in entry for sign in signs):
            return f" in {name} ({entry!r})"
    for block in data["blocks"]:
        if any(sign in json.dumps(block, ensure_ascii=False) for sign in signs):
            return f" in {block['where']}"
    return ""
