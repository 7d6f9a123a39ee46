"""The blocks a calc hands to the sheet: one constructor per kind, which is also the check of what a notebook brings.

A block is a plain dict that survives JSON.  Text is always data and prints as typed.  Runs are a text, or a list of
texts and of {"math": LaTeX, "alt": reading}, {"strong": text}, {"emph": text}, {"code": text}.
"""

import inspect
import re

from ..errors import ReportError, nearest

SHEET_MIME = "application/vnd.gageline.sheet+json"
PAPERS = ("us-letter", "a4")
ALIGNS = ("left", "center", "right")


def mimebundle(blocks):
    """Return the MIME bundle a notebook displays for a list of blocks."""
    return {SHEET_MIME: {"blocks": list(blocks)}}


def checked(block, where):
    """Return a block as its constructor makes it, or stop.

    Parameters
    ----------
    block : dict with "kind" and that kind's fields.
    where : text naming the place, for the message ("cell 7").

    Raises
    ------
    ReportError : no such kind, or a field missing, unknown or malformed.
    """
    if not isinstance(block, dict) or not isinstance(block.get("kind"), str):
        raise ReportError(f'A sheet block in {where} is not a mapping with a "kind".')
    kind, fields = block["kind"], {name: value for name, value in block.items() if name != "kind"}
    if kind not in KINDS:
        raise ReportError(f"The sheet knows no block {kind!r} ({where}); nearest are {nearest(kind, KINDS)}.")
    known = inspect.signature(KINDS[kind]).parameters
    for name in fields:
        if name not in known:
            raise ReportError(f"The block {kind} in {where} has no field {name!r}; nearest are {nearest(name, known)}.")
    for name, parameter in known.items():
        if parameter.default is parameter.empty and name not in fields:
            raise ReportError(f"The block {kind} in {where} lacks its field {name!r}.")
    try:
        return KINDS[kind](**fields)
    except ReportError as error:
        raise ReportError(f"In {where}: {error}") from None


def _text(value, name, filled=False):
    if not isinstance(value, str) or (filled and not value.strip()):
        raise ReportError(f"{name} must be {'a text that is not empty' if filled else 'a text'}, got {value!r}.")
    return value


def _list(value, name):
    if isinstance(value, (str, dict)) or not hasattr(value, "__iter__"):
        raise ReportError(f"{name} must be a list, got {value!r}.")
    return list(value)


def _texts(value, name):
    return [_text(entry, f"an entry of {name}") for entry in _list(value, name)]


def _runs(value, name):
    runs = [value] if isinstance(value, str) else _list(value, name)
    for run in runs:
        if isinstance(run, str):
            continue
        if not isinstance(run, dict) or set(run) not in ({"math"}, {"math", "alt"}, {"strong"}, {"emph"}, {"code"}):
            raise ReportError(f"{name} holds {run!r}; a run is a text or a mapping with math, strong, emph or code.")
        for key, text in run.items():
            _text(text, f"{key} in {name}", filled=key == "math")
    return runs


def _rows(value, name, width):
    rows = []
    for row in _list(value, name):
        cells = [_runs(cell, f"a cell of {name}") for cell in _list(row, f"a row of {name}")]
        if len(cells) != width:
            raise ReportError(f"A row of {name} has {len(cells)} cells where {width} belong: {row!r}.")
        rows.append(cells)
    return rows


def meta(
    *, project, mark, title, rev, rev_date, edition, method, loads, status,
    client="", location="", job="", firm="", by="", by_date="", checked="", checked_date="", approved="", approved_date="",
    paper="us-letter", logo="", watermark="", statement="", attachments=(), identification=(),
):  # fmt: skip
    """Return the data of the title block and of the PDF's own record; a notebook has exactly one.

    Parameters
    ----------
    project, mark, title, rev, edition, method, loads, status : text, not empty; edition like "AISC 360-22".
    rev_date : text, ISO date "2026-12-01"; it also dates the PDF, so that equal input gives equal bytes.
    client, location, job, firm, by, by_date, checked, checked_date, approved, approved_date : text, may be empty.
    paper : "us-letter" or "a4".
    logo : text of an SVG, or empty.
    watermark : a word or two printed large and pale behind every sheet, or empty.
    statement : sentence below the status on the cover, or empty.
    attachments : list of {name, mime, text, description}; each lands in the PDF unchanged.
    identification : list of [key, value]; printed at the end where no block identification prints its own.

    Raises
    ------
    ReportError : a field is malformed.
    """
    block = {"kind": "meta"}
    filled = {"project": project, "mark": mark, "title": title, "rev": rev, "rev_date": rev_date}
    filled |= {"edition": edition, "method": method, "loads": loads, "status": status}
    for name, value in filled.items():
        block[name] = _text(value, f"meta.{name}", filled=True)
    optional = {"client": client, "location": location, "job": job, "firm": firm, "logo": logo, "by": by, "by_date": by_date}
    optional |= {"watermark": watermark, "statement": statement}
    optional |= {"checked": checked, "checked_date": checked_date, "approved": approved, "approved_date": approved_date}
    for name, value in optional.items():
        block[name] = _text(value, f"meta.{name}")
    if not re.fullmatch(r"\d{4}-(0[1-9]|1[0-2])-(0[1-9]|[12]\d|3[01])", rev_date):
        raise ReportError(f"meta.rev_date must be a date like 2026-12-01, got {rev_date!r}.")
    if paper not in PAPERS:
        raise ReportError(f"meta.paper must be one of {', '.join(PAPERS)}, got {paper!r}.")
    block["paper"] = paper
    block["attachments"] = [_attachment(entry) for entry in _list(attachments, "meta.attachments")]
    block["identification"] = _rows(identification, "meta.identification", 2)
    return block


def _attachment(entry):
    if not isinstance(entry, dict) or set(entry) != {"name", "mime", "text", "description"}:
        raise ReportError("An attachment must have name, mime, text and description, and nothing else.")
    return {key: _text(value, f"attachment {key}", filled=key != "text") for key, value in entry.items()}


def cover(
    *, title, governing="", purpose="", criteria=(), scope=None, assumptions=(), open_items=(), cautions=(),
    revisions=(),
):  # fmt: skip
    """Return the cover, sheet 1: what was asked, on what terms, what governs, who stands for it.

    Parameters
    ----------
    title : text in large type.
    governing : runs, the one line a busy reviewer needs.
    purpose : runs.
    criteria : list of [key, value].
    scope : {"checked": [text], "not_applicable": [[check, reason]], "by_others": [text]}, or None.
    assumptions : list of [id, text, basis, status].
    open_items, cautions : list of runs.
    revisions : list of [rev, date, description, by, checked, approved].

    Raises
    ------
    ReportError : a field is malformed.
    """
    scope = dict(scope or {})
    parts = {
        "checked": _texts(scope.pop("checked", ()), "cover.scope.checked"),
        "not_applicable": _rows(scope.pop("not_applicable", ()), "cover.scope.not_applicable", 2),
        "by_others": _texts(scope.pop("by_others", ()), "cover.scope.by_others"),
    }
    if scope:
        raise ReportError(f"cover.scope has no part {next(iter(scope))!r}; it has {', '.join(parts)}.")
    return {
        "kind": "cover",
        "title": _text(title, "cover.title", filled=True),
        "governing": _runs(governing, "cover.governing"),
        "purpose": _runs(purpose, "cover.purpose"),
        "criteria": _rows(criteria, "cover.criteria", 2),
        "scope": parts,
        "assumptions": _rows(assumptions, "cover.assumptions", 4),
        "open_items": [_runs(entry, "cover.open_items") for entry in _list(open_items, "cover.open_items")],
        "cautions": [_runs(entry, "cover.cautions") for entry in _list(cautions, "cover.cautions")],
        "revisions": _rows(revisions, "cover.revisions", 6),
    }


def heading(*, text, level=1):
    """Return a numbered heading; level 1 to 3, text may be runs."""
    if level not in (1, 2, 3):
        raise ReportError(f"The level of heading {text!r} must be 1, 2 or 3, got {level!r}.")
    return {"kind": "heading", "level": level, "text": _runs(text, "heading.text")}


def prose(*, runs):
    """Return a paragraph of runs."""
    return {"kind": "prose", "runs": _runs(runs, "prose.runs")}


def note(*, runs):
    """Return a remark of runs, set apart and smaller than the text."""
    return {"kind": "note", "runs": _runs(runs, "note.runs")}


def pagebreak():
    """Return the start of a new sheet."""
    return {"kind": "pagebreak"}


def pairs(*, rows):
    """Return a list of [key, value, note]; each of them runs, note may be empty."""
    return {"kind": "pairs", "rows": _rows(rows, "pairs.rows", 3)}


def table(*, columns, rows, caption=""):
    """Return a table whose head repeats on every sheet it reaches.

    Parameters
    ----------
    columns : list of {"head": runs, "align": "left" | "center" | "right", "width": inches, optional}.
    rows : list of {"cells": [runs], "strong": bool, "span_reason": [from_column, runs], "changed": revision,
        optional}; a row with a reason has from_column cells, and the reason spans what is left.
    caption : runs.

    Raises
    ------
    ReportError : a field is malformed, or a row does not fill the columns.
    """
    heads = []
    for column in _list(columns, "table.columns"):
        if not isinstance(column, dict) or "head" not in column or set(column) - {"head", "align", "width"}:
            raise ReportError(f"A column of a table has head, align and perhaps width, got {column!r}.")
        align, width = column.get("align", "left"), column.get("width")
        if align not in ALIGNS:
            raise ReportError(f"A column of a table is aligned {', '.join(ALIGNS)}, got {align!r}.")
        if width is not None and not (isinstance(width, (int, float)) and width > 0):
            raise ReportError(f"The width of a table column is a number of inches above 0, got {width!r}.")
        heads.append({"head": _runs(column["head"], "table.columns.head"), "align": align, "width": width})
    if not heads:
        raise ReportError("A table must have at least one column.")
    lines = [_table_row(row, len(heads)) for row in _list(rows, "table.rows")]
    return {"kind": "table", "columns": heads, "rows": lines, "caption": _runs(caption, "table.caption")}


def _table_row(row, width):
    if not isinstance(row, dict) or "cells" not in row or set(row) - {"cells", "strong", "span_reason", "changed"}:
        raise ReportError(f"A row of a table has cells and perhaps strong, span_reason and changed, got {row!r}.")
    cells = [_runs(cell, "a cell of table.rows") for cell in _list(row["cells"], "table.rows.cells")]
    span = row.get("span_reason")
    if span is not None:
        start, reason = _list(span, "span_reason")
        span = [start, _runs(reason, "span_reason")]
        if not isinstance(start, int) or not 0 <= start < width:
            raise ReportError(f"A span_reason starts at a column from 0 to {width - 1}, got {start!r}.")
    filled = width if span is None else span[0]
    if len(cells) != filled:
        raise ReportError(f"A row of a table has {len(cells)} cells where {filled} belong: {row['cells']!r}.")
    changed = _text(row.get("changed", ""), "changed of a table's row")
    return {"cells": cells, "strong": bool(row.get("strong", False)), "span_reason": span, "changed": changed}


def equation(*, lines, alt, clause="", note="", changed=""):
    """Return lines of a calculation, aligned on their equals signs, with the clause beside them.

    Parameters
    ----------
    lines : list of {"lhs": LaTeX, "rows": [LaTeX]}; rows are what stands right of each "=": symbols, numbers, result.
    alt : text that reads the lines aloud; a PDF without it is not accessible.
    clause : text in the right column, such as "Eq. D2-2".
    note : text under the clause.
    changed : revision that changed these lines, printed in a triangle beside them, or empty.

    Raises
    ------
    ReportError : a field is malformed.
    """
    made = []
    for line in _list(lines, "equation.lines"):
        if not isinstance(line, dict) or set(line) != {"lhs", "rows"}:
            raise ReportError(f"A line of an equation has lhs and rows, got {line!r}.")
        rows = [_text(row, "a row of an equation", filled=True) for row in _list(line["rows"], "equation.rows")]
        if not rows:
            raise ReportError(f"The equation for {line['lhs']!r} has no rows.")
        made.append({"lhs": _text(line["lhs"], "lhs of an equation", filled=True), "rows": rows})
    if not made:
        raise ReportError("An equation must have at least one line.")
    return {
        "kind": "equation",
        "lines": made,
        "alt": _text(alt, "equation.alt", filled=True),
        "clause": _text(clause, "equation.clause"),
        "note": _text(note, "equation.note"),
        "changed": _text(changed, "equation.changed"),
    }


def verdict(*, lhs, ratio_text, ok, text="", changed=""):
    """Return the line that closes a check: available strength, "D/C = text = ratio", and OK or N.G. in words.

    Parameters
    ----------
    lhs : runs, such as the available strength.
    text : text of the quotient ("178 / 451"), may be empty.
    ratio_text : text of the ratio as it may be printed: never rounded down past a limit.
    ok : True, False, or None where nothing is judged.
    changed : revision that changed it, or empty.
    """
    if ok not in (True, False, None):
        raise ReportError(f"verdict.ok must be true, false or null, got {ok!r}.")
    return {
        "kind": "verdict",
        "lhs": _runs(lhs, "verdict.lhs"),
        "text": _text(text, "verdict.text"),
        "ratio_text": _text(ratio_text, "verdict.ratio_text", filled=True),
        "ok": ok,
        "changed": _text(changed, "verdict.changed"),
    }


def figure(*, svg, caption, alt, width=0.9):
    """Return a picture; svg is its text with svg.fonttype "none", width a fraction of the text width, above 0 to 1."""
    if not isinstance(width, (int, float)) or not 0 < width <= 1:
        raise ReportError(f"figure.width must be above 0 and at most 1, got {width!r}.")
    if "<svg" not in _text(svg, "figure.svg"):
        raise ReportError("figure.svg is not the text of an SVG.")
    return {
        "kind": "figure",
        "svg": svg,
        "caption": _runs(caption, "figure.caption"),
        "alt": _text(alt, "figure.alt", filled=True),
        "width": width,
    }


def notation(*, rows):
    """Return the list of symbols; rows are {"latex", "alt", "meaning", "unit"}."""
    made = []
    for row in _list(rows, "notation.rows"):
        if not isinstance(row, dict) or set(row) != {"latex", "alt", "meaning", "unit"}:
            raise ReportError(f"A row of notation has latex, alt, meaning and unit, got {row!r}.")
        made.append({key: _text(value, f"notation {key}", filled=key == "latex") for key, value in row.items()})
    return {"kind": "notation", "rows": made}


def references(*, rows):
    """Return the list of sources; rows are [short name, full title with edition]."""
    return {"kind": "references", "rows": _rows(rows, "references.rows", 2)}


def cautions(*, rows):
    """Return a numbered list of cautions, each runs."""
    return {"kind": "cautions", "rows": [_runs(row, "cautions.rows") for row in _list(rows, "cautions.rows")]}


def identification(*, rows):
    """Return what made this document (versions, hashes); rows are [key, value]."""
    return {"kind": "identification", "rows": _rows(rows, "identification.rows", 2)}


KINDS = {
    make.__name__: make
    for make in (
        meta, cover, heading, prose, note, pagebreak, pairs, table, equation, verdict, figure, notation, references,
        cautions, identification,
    )
}  # fmt: skip
