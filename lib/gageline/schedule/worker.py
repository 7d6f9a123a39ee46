"""A worker: one warm kernel and one Typst compiler, which make the executed notebook and the PDF of one mark after the other."""

import json
import tempfile
import threading
from dataclasses import dataclass, field
from multiprocessing.connection import wait
from pathlib import Path

from .. import identity
from ..errors import GagelineError, ReportError
from ..running import CELL_SECONDS
from .wires import Started


@dataclass(frozen=True)
class Work:
    """One mark to be made: all that a worker must know, here or on another machine.

    Parameters
    ----------
    mark, family : whose calculation. book : its notebook as data, not run.
    folder : where the kernel runs. project_file : the project's project.toml.
    files : name -> bytes of the project's files, given where the worker may not see the folder; else empty.
    program : hash of the program that asks. seconds : how long a cell may run.
    """

    mark: str
    family: str
    book: dict
    folder: str
    project_file: str
    files: dict = field(default_factory=dict)
    program: str = ""
    seconds: float = CELL_SECONDS


@dataclass(frozen=True)
class Made:
    """What came of it: the notebook with its outputs, the PDF, the results attached to it; or the sentence why there are none."""

    book: dict | None = None
    pdf: bytes = b""
    results: dict | None = None
    fault: str = ""


class Worker:
    """Makes marks one after the other; ``owner`` is the connection whose end stops it, also while a notebook runs."""

    def __init__(self, families, project_file, owner=None):
        self._begun_with, self._owner = (tuple(families), project_file), owner
        self._zygote = None

    def make(self, work):
        """Return the ``Made`` of a ``Work``; whatever is wrong is told as its fault."""
        try:
            return self._make(work)
        except GagelineError as error:
            return Made(fault=str(error))
        except (EOFError, OSError):
            self.end()
            return Made(fault="the process that holds the kernel died")
        except Exception as error:
            return Made(fault=f"unexpected {type(error).__name__}: {error}")

    def _make(self, work):
        from ..sheet import build_pdf

        if self._zygote is None:
            self._zygote = Started("zygote")
            self._zygote.connection.send(self._begun_with)
        connection = self._zygote.connection
        connection.send((work.book, work.folder, work.seconds))
        if self._owner is not None and self._owner in wait([connection, self._owner]):
            self.end()
            raise SystemExit
        book, fault = connection.recv()
        if fault:
            raise ReportError(fault)
        own = Path(work.project_file).parent / "sheet"
        pdf = build_pdf(book, sheet_folder=own if (own / "sheet.typ").is_file() else None)
        return Made(book, pdf, _attached(book, "results.json"))

    def end(self):
        """End the kernel's process."""
        if self._zygote is not None:
            self._zygote.end()
            self._zygote = None


def _attached(book, name):
    """Return the JSON that an executed notebook attaches to its PDF under a name."""
    from ..sheet.blocks import SHEET_MIME

    shown = (output.get("data", {}).get(SHEET_MIME) for cell in book["cells"] for output in cell.get("outputs", ()))
    meta = next(block for bundle in shown if bundle for block in bundle["blocks"] if block["kind"] == "meta")
    return json.loads(next(entry["text"] for entry in meta["attachments"] if entry["name"] == name))


def serve(connection):
    """Make each ``Work`` that comes over a connection, and send back what came of it, until the connection ends."""
    worker = Worker(*connection.recv(), owner=connection)
    try:
        while True:
            connection.send(worker.make(connection.recv()))
    finally:
        worker.end()


_here = threading.local()


def make_anywhere(work):
    """Make one mark in a process of somebody else's cluster: the project's files travel with the work; the kernel stays warm."""
    if work.program != identity.program_hash():
        return Made(fault="the cluster runs another version of gageline than this one")
    with tempfile.TemporaryDirectory(prefix="gageline-") as root:
        folder = Path(root) / "calcs" / Path(work.project_file).parent.name
        for name, data in work.files.items():
            path = folder / name
            path.parent.mkdir(parents=True, exist_ok=True)
            path.write_bytes(data)
        here = Work(work.mark, work.family, work.book, str(folder), str(folder / Path(work.project_file).name), seconds=work.seconds)
        worker = getattr(_here, "worker", None)
        if worker is None:
            worker = _here.worker = Worker([work.family], here.project_file)
        return worker.make(here)
