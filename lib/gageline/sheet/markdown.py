"""Markdown cells to blocks of the sheet, through pandoc's document tree; what the sheet cannot print is refused."""

import json
import re

from ..errors import ReportError
from . import blocks, pandoc

READER = "commonmark+tex_math_dollars+pipe_tables"
_MARK = "gageline-cell-boundary"
_LATEX = re.compile(r"\\[A-Za-z]{2,}")  # pandoc takes maths with an open brace for text


def to_blocks(cells):
    """Return the blocks of each markdown cell, all read in one call of pandoc.

    Parameters
    ----------
    cells : list of (where, text).

    Returns
    -------
    made : list of lists of blocks, one for each cell.

    Raises
    ------
    ReportError : pandoc complains, or a cell holds raw HTML, a picture, or anything else a sheet does not print.
    """
    if not cells:
        return []
    joined = "".join(f"\n\n```{_MARK}\n```\n\n{text}" for _, text in cells)
    out, complaint = pandoc.run(joined, READER, "json")
    if complaint:
        raise ReportError(f"The markdown of this notebook cannot be read: {complaint.splitlines()[0]}")
    parts = []
    for node in json.loads(out)["blocks"]:
        if node["t"] == "CodeBlock" and _MARK in node["c"][0][1]:
            parts.append([])
        else:
            parts[-1].append(node)
    if len(parts) != len(cells):
        raise ReportError("A markdown cell leaves a code fence open; close it.")
    return [[made for node in part for made in _block(node, where)] for part, (where, _) in zip(parts, cells)]


def _block(node, where):
    kind, content = node["t"], node.get("c")
    match kind:
        case "Header":
            return [blocks.heading(text=_runs(content[2], where), level=min(content[0], 3))]
        case "Para" | "Plain":
            if len(content) == 1 and content[0]["t"] == "Math" and content[0]["c"][0]["t"] == "DisplayMath":
                return [{"kind": "display", "math": content[0]["c"][1]}]
            return [blocks.prose(runs=_runs(content, where))]
        case "BulletList":
            return [{"kind": "list", "ordered": False, "items": [_item(item, where) for item in content]}]
        case "OrderedList":
            return [{"kind": "list", "ordered": True, "items": [_item(item, where) for item in content[1]]}]
        case "BlockQuote":
            return [blocks.note(runs=_paragraph(part, where)) for part in content]
        case "CodeBlock":
            return [{"kind": "verbatim", "text": content[1]}]
        case "HorizontalRule":
            return [{"kind": "rule"}]
        case "Table":
            return [_table(content, where)]
        case "RawBlock" if content[1].lstrip().startswith("<!--"):
            return []
    raise ReportError(f"The markdown of {where} holds {_NAMES.get(kind, kind)}, which a sheet does not print.")


_NAMES = {"RawBlock": "raw HTML", "RawInline": "raw HTML", "Image": "a picture (use a figure block)"}


def _item(item, where):
    return [made for node in item for made in _block(node, where)]


def _paragraph(node, where):
    if node["t"] not in ("Para", "Plain"):
        raise ReportError(f"A quotation or table cell in {where} holds more than plain paragraphs.")
    return _runs(node["c"], where)


def _table(content, where):
    columns, head, bodies = content[2], content[3], content[4]
    align = {"AlignRight": "right", "AlignCenter": "center"}
    heads = [_cell(cell, where) for cell in head[1][0][1]]
    made = [{"head": h, "align": align.get(c[0]["t"], "left")} for h, c in zip(heads, columns)]
    rows = [{"cells": [_cell(cell, where) for cell in row[1]]} for body in bodies for row in body[3]]
    return blocks.table(columns=made, rows=rows)


def _cell(cell, where):
    return [run for part in cell[4] for run in _paragraph(part, where)]


def _runs(nodes, where):
    runs = []
    for node in nodes:
        made = _run(node, where)
        for run in made if isinstance(made, list) else [made]:
            if isinstance(run, str) and runs and isinstance(runs[-1], str):
                runs[-1] += run
            elif run != "":
                runs.append(run)
    return runs


def _run(node, where):
    kind, content = node["t"], node.get("c")
    match kind:
        case "Str":
            leftover = _LATEX.search(content)
            if leftover:
                raise ReportError(
                    f"The markdown of {where} would print {leftover.group()!r} as typed; "
                    "close its dollar signs and braces, or set it as `code`."
                )
            return content
        case "Space" | "SoftBreak":
            return " "
        case "LineBreak":
            return "\n"
        case "Math":
            return {"math": content[1]}
        case "Code":
            return {"code": content[1]}
        case "Strong" | "Emph":
            inner = _runs(content, where)
            if any(not isinstance(run, str) for run in inner):
                return inner
            return {kind.lower(): "".join(inner)}
        case "Link":
            inner, target = _runs(content[1], where), content[2][0]
            return (
                inner if "".join(run for run in inner if isinstance(run, str)) == target else [*inner, f" ({target})"]
            )
        case "RawInline" if content[1].startswith("<!--"):
            return ""
    raise ReportError(f"The markdown of {where} holds {_NAMES.get(kind, kind)}, which a sheet does not print.")
