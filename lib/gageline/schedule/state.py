"""What a schedule's run leaves behind, where it lies, and whether it still holds."""

import functools
import hashlib
import json
from dataclasses import dataclass
from pathlib import Path

from .. import identity, project, running, signoffs, store
from ..errors import ReportError
from ..sheet.notebook import source_text


@dataclass(frozen=True)
class Places:
    """Where things go: notebooks, PDFs, records of what was made, and the results workbook and summary of the whole."""

    books: Path
    pdfs: Path
    records: Path
    workbook: Path
    summary: Path

    @classmethod
    def of(cls, project_file, schedule_path):
        """Return the places of a schedule: calcs/<project>/<schedule>/ and reports/<project>/preview/<schedule>/."""
        folder, name = Path(project_file).resolve().parent, Path(schedule_path).stem
        top = running.preview_path(folder / "x.ipynb", folder, "x").parent
        top = top / "preview" if top == folder else top
        return cls(folder / name, top / name, top / name / ".made", top / f"{name}.xlsx", top / f"{name}.pdf")

    def book(self, mark):
        """Where a mark's notebook lies."""
        return self.books / f"{mark}.ipynb"

    def pdf(self, mark):
        """Where a mark's PDF lies."""
        return self.pdfs / f"{mark}.pdf"

    def make(self):
        """Make the folders.

        Raises
        ------
        ReportError
            One cannot be made or written to.
        """
        for folder in (self.books, self.pdfs, self.records):
            try:
                folder.mkdir(parents=True, exist_ok=True)
            except OSError as error:
                raise ReportError(f"the folder {folder} cannot be made: {store.reason(error)}") from None


def source_hash(book):
    """Return the SHA-256 of a notebook's cells as they were written, whatever it displayed and whoever saved it since."""
    parts = [[cell["cell_type"], cell["source"] if isinstance(cell["source"], str) else "".join(cell["source"])] for cell in book["cells"]]
    return store.sha256(parts)


@functools.cache
def _surroundings(project_folder, family):
    """Hash of what every mark of a project and family depends on: the project's files, templates, look, program and what it stands on."""
    digest = hashlib.sha256(repr(identity.rows(family)).encode())
    folder = Path(project_folder)
    for path in (folder / project.FILE, *sorted(folder.glob("*.svg")), *sorted((folder / "sheet").rglob("*"))):
        if path.is_file():
            digest.update(path.name.encode() + b"\0" + path.read_bytes() + b"\0")
    return digest.hexdigest()


def content_hash(mark, project_file):
    """Return the hash of all that a mark's notebook and PDF depend on."""
    folder = Path(project_file).parent
    events = signoffs.folder_of(folder, mark.mark)
    signed = [path.read_text(encoding="utf-8", errors="replace") for path in sorted(events.glob("*.json"))] if events.is_dir() else []
    return store.sha256({"notebook": source_text(mark.book), "family": mark.family, "signed": signed, "results": mark.results,
                         "around": _surroundings(str(folder), mark.family)})


def is_made(places, mark, content):
    """Return the record of a mark that was made from this very content and whose files are still there, else None."""
    try:
        record = json.loads((places.records / f"{mark.mark}.json").read_bytes())
        same = record["content"] == content and record["pdf"] == store.sha256(places.pdf(mark.mark).read_bytes())
        return record if same and source_hash(running.read_notebook(places.book(mark.mark))) == record["source"] else None
    except (OSError, ValueError, KeyError, TypeError, ReportError):
        return None


def refuse_edited(places, mark):
    """Stop where a mark's notebook was edited by hand since a schedule made it: it is not overwritten.

    Raises
    ------
    ReportError
        It was, or it was never made by a schedule.
    """
    path = places.book(mark.mark)
    if not path.exists():
        return
    try:
        book = running.read_notebook(path)
        ours = book["metadata"].get("gageline", {}).get("source_sha256") == source_hash(book)
    except (ReportError, KeyError, AttributeError, TypeError):
        ours = False
    if not ours:
        raise ReportError(f"{path} was edited by hand since, or is no notebook of this schedule; it is not overwritten: move or delete it")


def keep(places, mark, content, made):
    """Write a mark's notebook, PDF and, last, the record that both are whole; return the record."""
    from ..sheet import write_pdf

    source = source_hash(made.book)
    write_pdf(places.book(mark.mark), running.notebook_bytes(made.book))
    write_pdf(places.pdf(mark.mark), made.pdf)
    record = {"mark": mark.mark, "family": mark.family, "content": content, "source": source, "pdf": store.sha256(made.pdf)}
    write_pdf(places.records / f"{mark.mark}.json", store.canonical(record))
    return record
