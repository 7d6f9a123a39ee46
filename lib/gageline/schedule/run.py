"""A schedule from its file to everything that is made of it."""

import contextlib
import os
from dataclasses import dataclass, field
from pathlib import Path

from .. import identity, project, store
from ..errors import GagelineError, ReportError
from ..running import CELL_SECONDS
from . import reading, rows, state
from .worker import Work


@dataclass
class Outcome:
    """What a run came to.

    Parameters
    ----------
    schedule : as read. places : where things lie. job : the project's data.
    marks : the good rows, each with its results, and a fault where it did not become a PDF.
    faults : what is wrong with the other rows. made, kept : marks made now, and left as they were.
    left_over : notebooks of marks that the schedule no longer has.
    """

    schedule: reading.Schedule
    places: state.Places
    job: project.Project
    marks: list
    faults: list
    made: list = field(default_factory=list)
    kept: list = field(default_factory=list)
    left_over: list = field(default_factory=list)

    @property
    def good(self):
        """Marks whose notebook and PDF stand, worst ratio first."""
        return sorted((mark for mark in self.marks if not mark.fault), key=lambda mark: (mark.results["ok"], -mark.results["ratio"], mark.row))

    @property
    def all_faults(self):
        """Faults of rows and of runs, in the order of the file."""
        return sorted([*self.faults, *(rows.Fault(mark.row, mark.mark, "", mark.fault) for mark in self.marks if mark.fault)],
                      key=lambda fault: fault.row)


class Watch:
    """What a run tells while it works; a command line's progress display has the same methods."""

    def checked(self, done, total):
        """So many rows are checked."""

    def begun(self, total, kept):
        """So many marks are to be made, so many stand already."""

    def finished(self, mark, fault):
        """A mark is made, or it failed for the reason given."""

    def stage(self, text):
        """What is done now."""


def check(path, *, project_folder=None, family="bolted", like=None, watch=None):
    """Read a schedule, check every row, and return the ``Outcome`` with nothing made.

    Raises
    ------
    GagelineError
        The file, its head or its project is at fault, so that no row can be read.
    """
    watch = watch or Watch()
    path = Path(path)
    schedule = reading.read(path)
    project_file = project.find(Path(project_folder or path.resolve().parent))
    job = project.load(project_file)
    marks, faults = rows.validated(schedule, project_file, family, like, lambda done: watch.checked(done, len(schedule.rows)))
    return Outcome(schedule, state.Places.of(project_file, path), job, marks, faults)


def run(path, *, project_folder=None, family="bolted", like=None, workers=None, dask=None, seconds=CELL_SECONDS, watch=None):
    """Make notebook and PDF of every good row that lacks them or has changed, the workbook of results and the summary.

    Parameters
    ----------
    path : the schedule, CSV or XLSX. project_folder : a folder of the project; by default the schedule's own.
    family, like : see ``rows.validated``. workers : processes at work; by default one a core.
    dask : address of a Dask scheduler whose cluster works instead. seconds : how long a cell may run.
    watch : a ``Watch``.

    Returns
    -------
    Outcome

    Raises
    ------
    GagelineError
        Nothing could be run; what is wrong with single rows stands in the outcome instead.
    """
    watch = watch or Watch()
    found = check(path, project_folder=project_folder, family=family, like=like, watch=watch)
    found.places.make()
    with store.locked(found.places.records):
        _make(found, project.find(Path(project_folder or Path(path).resolve().parent)), workers, dask, seconds, watch)
        known = {mark.mark for mark in found.marks} | {fault.mark for fault in found.faults}
        found.left_over = sorted(each.stem for each in found.places.books.glob("*.ipynb") if each.stem not in known)
        watch.stage("writing the workbook and the summary")
        _conclude(found)
    return found


def _make(found, project_file, workers, dask, seconds, watch):
    works = {}
    for mark in found.marks:
        content = state.content_hash(mark, project_file)
        if state.is_made(found.places, mark, content):
            found.kept.append(mark.mark)
            continue
        try:
            state.refuse_edited(found.places, mark)
        except GagelineError as error:
            mark.fault = str(error)
            continue
        works[mark.mark] = (mark, content)
    watch.begun(len(works), len(found.kept))
    if not works:
        return
    files = _files(project_file.parent) if dask else {}
    todo = [Work(name, mark.family, mark.book, str(found.places.books), str(project_file), files, identity.program_hash(), seconds)
            for name, (mark, _) in works.items()]
    if dask:
        from .cluster import each_made

        making = each_made(todo, dask)
    else:
        from .pool import each_made

        making = each_made(todo, workers or os.cpu_count() or 1)
    with contextlib.closing(making):
        for work, made in making:
            mark, content = works[work.mark]
            mark.fault = made.fault
            if not mark.fault and made.results != mark.results:
                mark.fault = "the notebook came to other results than its inputs give; run it in JupyterLab and compare"
            if not mark.fault:
                state.keep(found.places, mark, content, made)
                found.made.append(mark.mark)
            watch.finished(mark.mark, mark.fault)


def _files(folder):
    """Return name -> bytes of the project's files that a report depends on, its notebooks and big files left out."""
    paths = [path for pattern in ("*.toml", "*.svg", "sheet/**/*", "*.signoffs/*.json") for path in folder.glob(pattern)]
    return {path.relative_to(folder).as_posix(): path.read_bytes() for path in paths if path.is_file() and path.stat().st_size < 4 << 20}


def _conclude(found):
    """Write the workbook and the summary, unless they stand already for this very outcome."""
    from ..sheet import write_pdf
    from . import summary, workbook

    said = store.sha256({"program": identity.program_hash(), "schedule": store.sha256(found.schedule.path.read_bytes()), "project": repr(found.job),
                         "marks": [[mark.mark, mark.row, mark.fault, mark.results, mark.defaults] for mark in found.marks],
                         "faults": [vars(fault) for fault in found.all_faults], "left over": found.left_over})
    record = found.places.records / ".schedule"
    files = (found.places.workbook, found.places.summary)
    with contextlib.suppress(OSError, ReportError):
        if store.read_json(record)[1] == {"said": said, "files": [store.sha256(path.read_bytes()) for path in files]}:
            return
    data = (workbook.made(found), summary.made(found))
    for path, made in zip(files, data):
        write_pdf(path, made)
    write_pdf(record, store.canonical({"said": said, "files": [store.sha256(made) for made in data]}))
