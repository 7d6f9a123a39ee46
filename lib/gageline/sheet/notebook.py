"""What an executed notebook brings to the sheet: its blocks and markdown in order, or the reason why it brings none."""

import json

from ..errors import ReportError
from . import markdown
from .blocks import SHEET_MIME, checked

_VOLATILE_CELL = ("execution", "papermill", "ExecuteTime")
_VOLATILE_BOOK = ("papermill", "widgets", "signature")


def collect(notebook):
    """Return the blocks of an executed notebook, each with the place it comes from.

    Parameters
    ----------
    notebook : NotebookNode or dict of notebook format 4.

    Returns
    -------
    placed : list of (where, block), in the order of the notebook; blocks are checked.

    Raises
    ------
    ReportError : a cell failed, warned or was not run, a block is unknown or malformed, markdown cannot be printed.
    """
    places, texts = [], []
    for number, cell in enumerate(notebook["cells"], start=1):
        where = f"cell {number}"
        if cell["cell_type"] == "markdown" and _source(cell).strip():
            places.append(len(texts))
            texts.append((where, _source(cell)))
        elif cell["cell_type"] == "code":
            places.append((where, _code_blocks(cell, where)))
    read = markdown.to_blocks(texts)
    placed = []
    for place in places:
        where, found = place if isinstance(place, tuple) else (texts[place][0], read[place])
        placed += [(where, block) for block in found]
    return placed


def as_notebook(blocks):
    """Return blocks as an executed notebook of one cell, for documents that no notebook was written for."""
    bundle = {SHEET_MIME: {"blocks": list(blocks)}}
    cell = {"cell_type": "code", "id": "blocks", "metadata": {}, "source": "", "execution_count": 1,
            "outputs": [{"output_type": "display_data", "metadata": {}, "data": bundle}]}
    return {"nbformat": 4, "nbformat_minor": 5, "metadata": {}, "cells": [cell]}


def source_text(notebook):
    """Return the notebook as text without outputs and run times, so that the same calc always gives the same text."""
    cells = []
    for cell in notebook["cells"]:
        kept = {key: value for key, value in cell.items() if key not in ("outputs", "execution_count")}
        kept["source"] = _source(cell)
        kept["metadata"] = {k: v for k, v in cell.get("metadata", {}).items() if k not in _VOLATILE_CELL}
        if cell["cell_type"] == "code":
            kept |= {"outputs": [], "execution_count": None}
        cells.append(kept)
    book = {key: value for key, value in notebook.items() if key != "cells"}
    book["metadata"] = {k: v for k, v in notebook.get("metadata", {}).items() if k not in _VOLATILE_BOOK}
    book["cells"] = cells
    return json.dumps(book, indent=1, ensure_ascii=False, sort_keys=True) + "\n"


def _source(cell):
    source = cell.get("source", "")
    return source if isinstance(source, str) else "".join(source)


def _code_blocks(cell, where):
    if _source(cell).strip() and cell.get("execution_count") is None:
        raise ReportError(f"The notebook's {where} has not been run; run all cells, then print.")
    found = []
    for output in cell.get("outputs", []):
        kind = output.get("output_type")
        if kind == "error":
            raise ReportError(f"The notebook's {where} failed with {_one_line(output)}; nothing is printed.")
        if kind == "stream" and output.get("name") == "stderr":
            said = output.get("text", "")
            said = (said if isinstance(said, str) else "".join(said)).strip().splitlines()
            raise ReportError(
                f"The notebook's {where} wrote a warning, and nothing is printed: {said[-1] if said else ''}"
            )
        bundle = output.get("data", {}).get(SHEET_MIME) if kind in ("display_data", "execute_result") else None
        if bundle is None:
            continue
        if isinstance(bundle, (str, list)):
            bundle = json.loads(bundle if isinstance(bundle, str) else "".join(bundle))
        if not isinstance(bundle, dict) or not isinstance(bundle.get("blocks"), list):
            raise ReportError(f"The output of {where} is not a list of sheet blocks.")
        found += [checked(block, where) for block in bundle["blocks"]]
    return found


def _one_line(output):
    value = str(output.get("evalue", "")).strip().splitlines()
    return f"{output.get('ename', 'an error')}{': ' + value[0] if value else ''}"
