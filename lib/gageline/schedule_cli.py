"""The verb of a schedule: its options, its progress display, and what it prints at the end."""

import sys
from pathlib import Path
from typing import Annotated

import typer

_TOLD = 20


def schedule(file: Annotated[Path, typer.Argument(help="the schedule: a CSV or XLSX file, a row per mark, input names as heads, e.g. pitch [in]")],
             project: Annotated[Path | None, typer.Option("--project", "-p", help="the project's folder; by default the schedule's own")] = None,
             family: Annotated[str, typer.Option("--family", "-f", help="family of rows that name none in a column family")] = "bolted",
             like: Annotated[Path | None, typer.Option("--like", help="a notebook that rows start from instead of the family's template")] = None,
             workers: Annotated[int | None, typer.Option("--workers", "-n", min=1, max=256, help="processes at work; by default one a core")] = None,
             dask: Annotated[str | None, typer.Option("--dask", help="address of a Dask scheduler whose cluster works instead")] = None,
             check: Annotated[bool, typer.Option("--check", help="check every row and make nothing")] = False):
    """Make the calculations of a whole schedule: notebooks, PDFs, a workbook of results and a summary."""
    from .errors import InputError
    from .schedule import run as running

    watch = _Progress()
    given = {"project_folder": project, "family": family, "like": like}
    try:
        found = running.check(file, **given, watch=watch) if check else running.run(file, **given, workers=workers, dask=dask, watch=watch)
    except KeyboardInterrupt:
        watch.end()
        typer.echo(f"{watch.done} marks were made now; the same command goes on with the rest")
        raise
    finally:
        watch.end()
    faults = found.all_faults
    for fault in faults[:_TOLD]:
        where = f"row {fault.row}" + (f", column {fault.column}" if fault.column else "") + (f", mark {fault.mark}" if fault.mark else "")
        typer.echo(f"{where}: {fault.sentence}")
    if len(faults) > _TOLD:
        typer.echo(f"… and {len(faults) - _TOLD} more" + ("" if check else ", on the workbook's sheet Errors"))
    if check:
        typer.echo(f"{len(found.marks)} of {len(found.schedule.rows)} rows are good")
    else:
        _conclude(found)
    if faults:
        raise InputError(f"{len(faults)} of {len(found.schedule.rows)} rows are at fault; see above")


def _conclude(found):
    failed = [mark.mark for mark in found.good if not mark.results["ok"]]
    typer.echo(f"{len(found.good)} of {len(found.schedule.rows)} marks stand ({len(found.made)} made now, {len(found.kept)} unchanged), "
               f"{len(failed)} N.G.")
    for what, path in (("notebooks", found.places.books), ("PDFs", found.places.pdfs), ("results", found.places.workbook),
                       ("summary", found.places.summary)):
        typer.echo(f"{what:>9}: {path}")
    if found.left_over:
        typer.echo(f"notebooks of marks that the schedule no longer has: {', '.join(found.left_over)}")


class _Progress:
    """A progress bar on a terminal's stderr with rate and time left; nothing elsewhere."""

    def __init__(self):
        self.done, self._bar = 0, None
        if sys.stderr.isatty():
            from rich.console import Console
            from rich.progress import BarColumn, MofNCompleteColumn, Progress, TextColumn, TimeRemainingColumn

            self._bar = Progress(TextColumn("{task.description}"), BarColumn(), MofNCompleteColumn(), TextColumn("{task.fields[rate]}"),
                                 TimeRemainingColumn(), console=Console(stderr=True), transient=True)
            self._task = self._bar.add_task("reading", total=None, rate="")
            self._bar.start()

    def checked(self, done, total):
        if self._bar:
            self._bar.update(self._task, description="checking rows", completed=done, total=total)

    def begun(self, total, kept):
        if self._bar:
            self._bar.reset(self._task, description="making reports", total=total, rate="")

    def finished(self, mark, fault):
        self.done += not fault
        if self._bar:
            speed = self._bar.tasks[0].speed
            self._bar.update(self._task, advance=1, rate=f"{3600 * speed:.0f}/h" if speed else "")

    def stage(self, text):
        if self._bar:
            self._bar.update(self._task, description=text)

    def end(self):
        if self._bar:
            self._bar.stop()
            self._bar = None
