"""The verbs of review and archive: each is one call into the package; heavy imports happen inside the verbs."""

from pathlib import Path
from typing import Annotated

import typer

from .terminal import console, progress

Notebook = Annotated[Path, typer.Argument(help="the calculation's notebook")]
Who = Annotated[str, typer.Option("--who", help="name or initials, as they stand in the title block")]


def sign(notebook: Notebook, role: Annotated[str, typer.Option("--role", help="preparer, checker or approver")], who: Who,
         method: Annotated[str, typer.Option("--method", help="checker: line by line, alternate calculation, simplified calculation, "
                                                              "review or test")] = "",
         code: Annotated[str, typer.Option("--code", help="checker's finding on compliance with the code")] = "",
         criteria: Annotated[str, typer.Option("--criteria", help="checker's finding on loads, materials, criteria")] = "",
         assumptions: Annotated[str, typer.Option("--assumptions", help="checker's finding on the assumptions")] = "",
         how: Annotated[str, typer.Option("--how", help="checker's finding on the method of calculation")] = "",
         conclusions: Annotated[str, typer.Option("--conclusions", help="checker's finding on results and conclusions")] = ""):
    """Record that a calculation was prepared, checked or approved; it holds for this content only. Not a signature, not a seal."""
    from .archive import reading

    said = zip(("code", "criteria", "assumptions", "method", "conclusions"), (code, criteria, assumptions, how, conclusions))
    event, found = reading.sign(notebook, role, who, method=method, findings={name: text for name, text in said if text})
    typer.echo(f"{found.mark}: {event['who']} signed as {role} at {event['when']}, content {event['content'][:12]}")


def comment(notebook: Notebook, on: Annotated[str, typer.Option("--on", help="a check's id, an input's name, \"line 12\" or \"whole\"")],
            text: Annotated[str, typer.Argument(help="the comment")], who: Who):
    """Record a review comment on a check, an input or a printed line."""
    from .archive import reading

    event, found = reading.comment(notebook, who, on, text)
    typer.echo(f"{found.mark}: comment {event['id']} on {event['on']}")


def answer(notebook: Notebook, id: Annotated[str, typer.Argument(help="the comment, for example C1")],
           text: Annotated[str, typer.Argument(help="the response")], who: Who):
    """Record the response to a review comment."""
    from .archive import reading

    _, found = reading.answer(notebook, who, id, text)
    typer.echo(f"{found.mark}: response to {id}")


def close(notebook: Notebook, id: Annotated[str, typer.Argument(help="the comment, for example C1")], who: Who):
    """Close a review comment that has a response, after a back-check."""
    from .archive import reading

    _, found = reading.close(notebook, who, id)
    typer.echo(f"{found.mark}: {id} closed")


def settle(notebook: Notebook, id: Annotated[str, typer.Argument(help="the item of the register, for example A2 or O1")],
           basis: Annotated[str, typer.Argument(help="on what basis")], who: Who):
    """Confirm an assumption or close an open item of the register."""
    from .archive import reading

    event, found = reading.settle(notebook, who, id, basis)
    typer.echo(f"{found.mark}: {id} settled: {event['item']}")


def review(notebook: Notebook):
    """Show who signed, what is void, the comments, and the register of assumptions and open items."""
    from . import signoffs
    from .archive import reading, statuses

    found = reading.read(notebook)
    log = found.calc.log
    for role in signoffs.ROLES:
        event = found.signed(role)
        how = f", {event['method']}" if event and event["method"] else ""
        typer.echo(f"{role}: {event['who']}, {event['when']}{how}" if event else f"{role}: not signed")
    for event in log.voided(found.content, found.notebook):
        typer.echo(f"void: {event['role']} {event['who']}, {event['when']}: inputs, results or the notebook's text have changed since")
    for each in log.comments():
        typer.echo(f"{each['id']} {'closed' if each['closed'] else 'OPEN'} on {each['on']} ({each['who']}): {each['text']}")
        for one in each["answers"]:
            typer.echo(f"   {one['who']}: {one['text']}")
    for row in found.calc.register():
        typer.echo(f"{row['id']} {row['status']}: {row['text']}")
    for fault in log.faults:
        typer.echo(f"FAULT: {fault}")
    for status in statuses.RULES:
        refused = statuses.refusals(status, found)
        typer.echo(f"{status}: {'; '.join(refused) if refused else 'may be issued'}")


def issue(notebook: Notebook, rev: Annotated[str | None, typer.Option("--rev", help="revision; by default project.toml's")] = None,
          status: Annotated[str | None, typer.Option("--status", help="preliminary, for review, for approval or for construction")] = None,
          text: Annotated[str | None, typer.Option("--text", help="what this revision is")] = None,
          date: Annotated[str | None, typer.Option("--date", help="date of the revision, as 2026-12-01")] = None,
          profile: Annotated[str | None, typer.Option("--profile", help="working or record")] = None):
    """Freeze a revision: PDF and record in the reports folder, never overwritten."""
    from .archive import issuing

    say, done = progress()
    try:
        path, record = issuing.issue(notebook, rev=rev, status=status, text=text, date=date, profile=profile, say=say)
    finally:
        done()
    old = f"; superseded: {', '.join(record['supersedes'])}" if record["supersedes"] else ""
    typer.echo(f"{record['mark']} revision {record['rev']} issued {record['status']}: {path}{old}")
    for name, said in record["files"].items():
        typer.echo(f"  {name}  SHA-256 {said['sha256']}  SHA-1 {said['sha1']}")


def register(project: Annotated[Path, typer.Argument(help="the project's folder, or its reports folder")],
             csv: Annotated[bool, typer.Option("--csv", help="as CSV")] = False,
             json: Annotated[bool, typer.Option("--json", help="as JSON")] = False):
    """List every issue of a project from its records, and every fault found among them."""
    from .archive import records
    from .archive import register as made

    ledger = records.read(_reports(project))
    if csv or json:
        typer.echo(made.as_csv(ledger) if csv else made.as_json(ledger), nl=False)
    else:
        from rich.markup import escape
        from rich.table import Table

        shown = [name for name in made.COLUMNS if name not in ("issued as", "program", "file", "sha256")]
        table = Table(*shown, box=None, pad_edge=False)
        for row in made.rows(ledger):
            table.add_row(*(escape(row[name]) for name in shown), style="dim" if row["status"] in ("superseded", "void") else None)
        console().print(table)
    for fault in ledger.faults:
        typer.echo(f"FAULT: {fault}", err=True)
    if ledger.faults:
        raise typer.Exit(1)


def _reports(folder):
    from .archive import records
    from .errors import ReportError
    from .project import FILE

    if not folder.is_dir():
        raise ReportError(f"{folder}: there is no such folder")
    return records.reports_folder(folder) if (folder / FILE).is_file() else folder


def verify(pdf: Annotated[Path, typer.Argument(help="an issued PDF")],
           run: Annotated[bool, typer.Option("--run", help="also run the attached notebook; its code is executed")] = False,
           yes: Annotated[bool, typer.Option("--yes", help="do not ask before running it")] = False):
    """Prove an issued PDF: hashes, attachments, record, and every number computed again from its inputs."""
    from .archive import verifying

    if run and not yes:
        typer.confirm(f"Run the code of the notebook attached to {pdf}?", abort=True)
    found = verifying.verify(pdf, run=run)
    for text in found.facts:
        typer.echo(text)
    for text in found.differences:
        typer.echo(f"DIFFERS: {text}")
    for text in found.faults:
        typer.echo(f"FAULT: {text}")
    typer.echo(f"{pdf.name}: " + ("verified" if found.ok else "NOT verified"))
    if not found.ok:
        raise typer.Exit(1)


def compare(old: Annotated[Path, typer.Argument(help="an issued PDF, a record (.json) or a notebook")],
            new: Annotated[Path, typer.Argument(help="the later one")]):
    """Show what changed between two revisions: inputs, assumptions, code, results."""
    from .archive import changes

    typer.echo("\n".join(changes.as_text(changes.compare(changes.state_of(old), changes.state_of(new)))))


def void(pdf: Annotated[Path, typer.Argument(help="an issued PDF")], reason: Annotated[str, typer.Argument(help="why")], who: Who):
    """Mark an issued revision void, by a further record and a stamped copy; the issued file stays as it is."""
    from .archive import commit

    record = commit.void(pdf, who, reason)
    typer.echo(f"{record['mark']} revision {record['rev']} is void: {reason}")


def bind(project: Annotated[Path, typer.Argument(help="the project's folder")],
         out: Annotated[Path | None, typer.Option("--out", "-o", help="the PDF to write; by default <project>-set.pdf in preview/")] = None):
    """Bind the issued calculations of a project into one PDF with a cover, an index and continuous sheet numbers."""
    from .archive import binding, records
    from .sheet import write_pdf

    pdf, bound = binding.bind(project)
    if out is None:
        out = records.reports_folder(project) / "preview" / f"{project.resolve().name}-set.pdf"
        out.parent.mkdir(exist_ok=True)
    write_pdf(out, pdf)
    typer.echo(f"{len(bound)} calculations bound: {out}")


def manual(out: Annotated[Path, typer.Option("--out", "-o", help="the PDF to write")] = Path("verification-manual.pdf"),
           date: Annotated[str | None, typer.Option("--date", help="date that it bears, as 2026-12-01; by default today's")] = None):
    """Work out every published case with the installed version and set it beside what its source prints."""
    import datetime

    from .archive import manual as made
    from .sheet import write_pdf

    pdf, number, count, wrong = made.manual(date or datetime.date.today().isoformat())
    write_pdf(out, pdf)
    typer.echo(f"{number}: {count} numbers compared, {wrong} outside the difference allowed: {out}")
    if wrong:
        raise typer.Exit(1)


VERBS = (sign, comment, answer, close, settle, review, issue, register, verify, compare, void, bind, manual)


def add_to(app):
    """Add the verbs of this module to the command line."""
    for verb in VERBS:
        app.command()(verb)
