"""A calculation read from its notebook without running it, with the hashes that sign-offs and records hold for."""

import re
from dataclasses import dataclass
from functools import cached_property
from pathlib import Path

from .. import cells, identity, running, signoffs, store
from ..calc import Calc
from ..errors import InputError, nearest
from ..project import find
from ..sheet.assets import templates_root

SIGN_ROLES = dict(zip(signoffs.ROLES, ("by", "checked", "approved")))


@dataclass(frozen=True)
class Reading:
    """A notebook, the calculation computed from its inputs, and the file they came from."""

    path: Path
    book: dict
    calc: Calc

    @property
    def mark(self):
        """The piece mark."""
        return self.calc.connection.inputs.mark

    @property
    def project_folder(self):
        """The folder of project.toml."""
        return self.calc.project_path.parent

    @cached_property
    def notebook(self):
        """The hash of the notebook's text: kinds and sources of its cells, nothing that a mere run changes."""
        return notebook_hash(self.book)

    @property
    def content(self):
        """The hash of inputs, basis and results."""
        return self.calc.content

    def signed(self, role):
        """Return the sign-off of a role that holds for this content and this text, or None."""
        return self.calc.log.sign_off(role, self.content, self.notebook)


def read(path):
    """Return the ``Reading`` of a notebook.

    Raises
    ------
    GagelineError
        Whatever is wrong with the notebook, its project or its inputs.
    """
    path = Path(path)
    book = running.read_notebook(path)
    calc = Calc(running.family_of(book, path), cells.inputs_of_notebook(book), find(path.resolve().parent))
    signoffs.folder_of(calc.project_path.parent, calc.connection.inputs.mark)
    return Reading(path, book, calc)


def notebook_hash(book):
    """Return the hash of a notebook's cells, outputs and metadata left out."""
    return store.sha256([[cell["cell_type"], cell_text(cell)] for cell in book["cells"]])


def cell_text(cell):
    """Return a cell's source as one text."""
    return cell["source"] if isinstance(cell["source"], str) else "".join(cell["source"])


def template_rows(reading):
    """Return rows that name the notebook's template and the sheet's look, with hashes, and whether they are the shipped ones."""
    said = reading.book["metadata"].get("gageline", {})
    shipped = templates_root() / f"{reading.calc.connection.family}.ipynb"
    rows = [("Template of this notebook", "not started from a template")]
    if said:
        same = said.get("template_sha256") == identity.file_hash(shipped)
        rows = [("Template of this notebook", f"{said.get('template')}, SHA-256 {said.get('template_sha256')} "
                 f"({'the shipped one' if same else 'not the one shipped with this version'})")]
    own = reading.project_folder / "sheet" / "sheet.typ"
    look = own if own.is_file() else templates_root() / "sheet" / "sheet.typ"
    return [*rows, ("Look of the sheet", f'SHA-256 {identity.file_hash(look)} ({"own to the project" if own.is_file() else "the shipped one"})')]


def place_of(reading, on):
    """Return what a comment is tied to, in words: a check, an input, a numbered line with its reading, or the whole.

    Parameters
    ----------
    on : id of a check, name of an input, "line 12", or "whole".

    Raises
    ------
    InputError
        There is no such place.
    """
    connection = reading.calc.connection
    ids = [each.id for each in connection.checks]
    if on == "whole" or on in reading.calc.given:
        return on
    if on in ids:
        return f"check {on}"
    if found := re.fullmatch(r"line (\d+)", on):
        lines = _lines(reading)
        if not 1 <= int(found[1]) <= len(lines):
            raise InputError(f"there is no {on}; the lines run from 1 to {len(lines)}")
        reading_aloud = lines[int(found[1]) - 1]
        return f"{on} ({reading_aloud if len(reading_aloud) < 90 else reading_aloud[:88] + '…'})"
    raise InputError(f"{on!r} is no check, input or line of this calculation; nearest: {nearest(on, [*ids, *reading.calc.given])}; "
                     "or write \"line 12\", or \"whole\"")


def _lines(reading):
    """Return the readings of the numbered lines, in the order in which the notebook prints its checks."""
    from ..presenting import checks

    connection = reading.calc.connection
    asked = re.findall(r"""\.checks\(\s*["'](\w+)["']\s*\)""", "\n".join(cell_text(cell) for cell in reading.book["cells"]))
    parts = [part for part in asked if part in connection.parts] or list(connection.parts)
    return [block["alt"] for part in parts for block in checks(connection, part) if block["kind"] == "equation"]


def sign(path, role, who, *, method="", findings=None):
    """Record a sign-off of a notebook's calculation and return (event, Reading); see ``signoffs.sign_off``."""
    reading = read(path)
    make = signoffs.sign_off(role, who, reading.content, reading.notebook, method=method, findings=findings,
                             allowed=reading.calc.project.allowed(role))
    return _added(reading, make, who, *(findings or {}).values())


def comment(path, who, on, text):
    """Record a review comment and return (event, Reading)."""
    reading = read(path)
    return _added(reading, signoffs.comment(who, place_of(reading, on), text), who, text)


def answer(path, who, id, text):
    """Record the response to a comment and return (event, Reading)."""
    return _added(read(path), signoffs.answer(who, id, text), who, text)


def close(path, who, id):
    """Close a comment and return (event, Reading)."""
    return _added(read(path), signoffs.close(who, id), who)


def settle(path, who, id, basis):
    """Confirm an assumption or close an open item by its number in the register, and return (event, Reading).

    Raises
    ------
    InputError
        There is no such item, or a sign-off cannot settle it: a failed check, an input without a source.
    """
    reading = read(path)
    rows = {row["id"]: row for row in reading.calc.register()}
    if id not in rows:
        raise InputError(f"there is no item {id!r}; the register has {', '.join(rows) or 'none'}")
    if not rows[id]["may"]:
        raise InputError(f"{id} ({rows[id]['text']}) cannot be settled by a signature; change the calculation")
    return _added(reading, signoffs.settle(who, rows[id]["text"], basis), who, basis)


def _added(reading, make, who, *texts):
    from ..sheet.build import check_printable

    # What could not be printed would stop every later report, since events are never taken back.
    check_printable(who.strip(), [text.strip() for text in texts])
    return signoffs.add(reading.project_folder, reading.mark, make), reading
