"""The command line: each verb is one call into the package; heavy imports happen inside the verbs."""

import sys
from pathlib import Path
from typing import Annotated

import typer

from . import __version__, archive_cli, schedule_cli
from .errors import GagelineError
from .terminal import console, progress

app = typer.Typer(add_completion=False, no_args_is_help=True, pretty_exceptions_enable=False, rich_markup_mode=None,
                  help="Calculation reports for steel tension members and their end connections.")

Notebook = Annotated[Path, typer.Argument(help="the calculation's notebook")]
Set = Annotated[list[str], typer.Option("--set", help="override an input, for example --set 'rows=5' (may be repeated)")]


def _version(value: bool):
    if value:
        typer.echo(f"gageline {__version__}")
        raise typer.Exit()


@app.callback()
def _main(debug: Annotated[bool, typer.Option("--debug", help="show a traceback on errors")] = False,
          version: Annotated[bool, typer.Option("--version", callback=_version, is_eager=True, help="print the version")] = False):
    pass


@app.command()
def new(mark: Annotated[str, typer.Argument(help="piece mark, which names the notebook")],
        project: Annotated[Path, typer.Option("--project", "-p", help="the project's folder, made where it is missing")],
        family: Annotated[str, typer.Option("--family", "-f", help="family of connection")] = "bolted"):
    """Start a calculation from a template in a project."""
    from .starting import start

    typer.echo(f"{start(mark, project, family)}: edit its inputs cell, run it in JupyterLab, then: gageline report <notebook>")


@app.command()
def report(notebook: Notebook, set_: Set = [], out: Annotated[Path | None, typer.Option("--out", "-o", help="the PDF to write")] = None,
           save: Annotated[bool, typer.Option("--save", help="write the notebook back with its outputs")] = False):
    """Run one calculation and make its PDF."""
    from . import running

    say, done = progress()
    try:
        path, calc = running.report(notebook, overrides(set_), out, save, say)
    finally:
        done()
    _told(path, calc)


@app.command()
def quick(notebook: Notebook, set_: Set = []):
    """Compute one calculation from its inputs alone and print its summary; no notebook is run, no PDF made."""
    _print_summary(_calc(notebook, set_).connection)


@app.command()
def search(notebook: Notebook, vary: Annotated[list[str], typer.Option("--vary", help="values of an input: rows=2,3,4 or 'pitch=2 in:4 in:1/4 in'")],
           objective: Annotated[str, typer.Option(help="fewest bolts, shortest connection, least plate weight or least member weight")] = "fewest bolts",
           most: Annotated[int, typer.Option(help="how many layouts to list")] = 10,
           plot: Annotated[Path | None, typer.Option(help="write the Pareto set of bolts against plate weight as SVG")] = None):
    """Find every bolted layout that satisfies all checks, and print the best with the inputs cell of the winner."""
    from . import cells, running, searching

    given = cells.inputs_of_notebook(running.read_notebook(notebook))
    typer.echo(searching.told({name: each.value for name, each in given.items()}, notebook.resolve().parent, vary, objective, most, plot))


@app.command()
def margins(notebook: Notebook, set_: Set = []):
    """Print how far each input may drift before D/C reaches 1.00, and which check governs there."""
    from rich.table import Table

    from . import margins as room

    table = Table("input", "value", "down to", "where", "up to", "where", box=None, pad_edge=False)
    for each in room.margins(_calc(notebook, set_).connection):
        table.add_row(each.name, f"{each.value:.6g} {each.unit}", room.said(each, "lower"), each.lower_why, room.said(each, "upper"), each.upper_why)
    console().print(table)


@app.command()
def built(notebook: Notebook, set_: Set):
    """Print the strength of what was built against what was designed; --set gives what was measured, for example 'missing_bolts=[3]'."""
    from rich.table import Table

    from . import margins as room

    designed, as_built = _calc(notebook, []).connection, _calc(notebook, set_).connection
    table = Table("check", "designed, kip", "built, kip", "change", "D/C designed", "D/C built", box=None, pad_edge=False)
    for title, before, after, change, old, new in room.against_design(as_built, designed):
        table.add_row(title, f"{before:.4g}", f"{after:.4g}", f"{change:+.1f} %", f"{old:.3f}", f"{new:.3f}")
    console().print(table)
    typer.echo(f"As built: {'OK' if as_built.ok else 'N.G.'}")


@app.command()
def demo(folder: Annotated[Path, typer.Argument(help="where to build the demonstration project")] = Path()):
    """Build the demonstration project: its notebooks and their PDFs."""
    from . import running
    from .starting import demonstration

    for notebook in demonstration(folder):
        say, done = progress()
        try:
            path, calc = running.report(notebook, say=say)
        finally:
            done()
        _told(path, calc)


@app.command()
def inputs(family: Annotated[str, typer.Argument(help="family of connection")] = "bolted"):
    """List every input of a family with its meaning."""
    from rich.table import Table

    from . import families

    table = Table("input", "meaning", "default", box=None, pad_edge=False)
    group = None
    for name, field in families.family(family).Model.model_fields.items():
        if field.json_schema_extra["group"] != group:
            group = field.json_schema_extra["group"]
            table.add_row(f"[bold]{group}[/bold]")
        default = "compulsory" if field.is_required() else "" if field.default in (None, (), "") else str(field.default)
        table.add_row(name, field.description, default)
    console().print(table)


@app.command()
def shapes(like: Annotated[str, typer.Argument(help="a series (WT) or the beginning of a designation (WT8)")] = ""):
    """List the shapes of the tables."""
    from .facts import shapes as tables

    wanted = like.replace(" ", "").replace("×", "x").upper()
    found = [name for name in tables.names() if name.upper().startswith(wanted)]
    if not found:
        tables.shape(like)
    typer.echo("\n".join(found))


archive_cli.add_to(app)
app.command()(schedule_cli.schedule)


def _calc(notebook, set_):
    """Return the calculation of a notebook's inputs, computed without running it."""
    from . import cells, running
    from .calc import Calc
    from .project import find

    book = running.read_notebook(notebook)
    given = cells.inputs_of_notebook(book)
    given = cells.merged(given, {name: cells.Given(value, "") for name, value in overrides(set_).items()})
    return Calc(running.family_of(book, notebook), given, find(notebook.resolve().parent))


def overrides(pairs):
    """Return name -> value of ``name=value`` texts; numbers and True/False are read as such, everything else is text."""
    import ast

    from .errors import InputError

    out = {}
    for pair in pairs:
        name, equals, text = pair.partition("=")
        if not equals or not name.strip():
            raise InputError(f"--set {pair!r}: write name=value, for example --set 'rows=5'")
        try:
            out[name.strip()] = ast.literal_eval(text.strip())
        except (ValueError, SyntaxError):
            out[name.strip()] = text.strip()
    return out


def _told(path, calc):
    from .presenting import ratio

    governs = calc.connection.governing
    verdict = "OK" if calc.connection.ok else "N.G."
    typer.echo(f"{calc.connection.inputs.mark}: {verdict}, {governs.title} governs, D/C = {ratio(governs)}; {path}")


def _print_summary(connection):
    from rich.table import Table

    from . import check, presenting

    system = connection.basis.units_system
    table = Table("check", "clause", "required", "available", "D/C", "", box=None, pad_edge=False)
    # Strengths first: what governs stands on top, limits of detailing and advice below.
    for each in sorted(check.worst_first(connection.checks), key=lambda each: (each.kind != "strength")):
        table.add_row(each.title, each.clause, presenting.required(each, system), presenting.available(each, system), presenting.ratio(each),
                      "OK" if each.ok else "see note" if each.kind == "advice" else "N.G.", style="bold" if each is connection.governing else None)
    for each in connection.checks:
        if not each.applies:
            table.add_row(each.title, each.clause, "", "", "–", each.reason, style="dim")
    console().print(table)


def main():
    """Run the command line; errors of ours are one sentence on stderr and exit code 1."""
    debug = "--debug" in sys.argv
    try:
        # Without its standalone mode typer returns the exit code, that of a Ctrl-C too.
        code = app(standalone_mode=False)
        if code == 130:
            raise KeyboardInterrupt
        sys.exit(code if isinstance(code, int) else 0)
    except GagelineError as error:
        if debug:
            raise
        sys.stderr.write(f"gageline: {error}\n")
        sys.exit(1)
    except typer.Exit as stop:
        sys.exit(stop.exit_code)
    except (typer.Abort, KeyboardInterrupt):
        sys.stderr.write("gageline: stopped\n")
        sys.exit(130)
    except Exception as error:
        if debug:
            raise
        if hasattr(error, "format_message"):
            sys.stderr.write(f"gageline: {error.format_message()}\n")
            sys.exit(2)
        sys.stderr.write(f"gageline: unexpected {type(error).__name__}: {error} (run again with --debug for a traceback)\n")
        sys.exit(3)
