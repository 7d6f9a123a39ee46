"""A calculation in a notebook: the inputs cell above it, the connection it describes, and the parts of its report.

Each part is an object the notebook displays: blocks for the sheet (``sheet.blocks``) and the same as HTML for JupyterLab.
"""

import html
import json

from . import cells, families, identity, presenting, project, study
from .errors import InputError
from .loads import Demands
from .sheet import blocks as sheet
from .sheet.blocks import SHEET_MIME, mimebundle
from .view import to_html


class Part:
    """A part of a report: what the sheet prints, shown as HTML where a browser reads it."""

    def __init__(self, blocks):
        self.blocks = list(blocks)

    def _repr_mimebundle_(self, include=None, exclude=None):
        kinds = ", ".join(dict.fromkeys(block["kind"] for block in self.blocks))
        return {"text/html": to_html(self.blocks), "text/plain": f"<sheet: {kinds}>", **mimebundle(self.blocks)}


def begin(family):
    """Read the inputs cell run above, build the connection it describes and return the calculation.

    Parameters
    ----------
    family : name of the family of connection, for example "bolted".

    Raises
    ------
    InputError
        Whatever is wrong with the inputs, as one sentence; nothing is assumed.
    """
    try:
        from IPython import get_ipython

        shell = get_ipython()
    except ImportError:
        shell = None
    if shell is None:
        raise InputError("begin() is for notebooks; in a script build the connection directly, for example gageline.bolted(...)")
    # The cell that calls begin() is the last one entered.
    given = cells.inputs_of_session(shell.user_ns["In"][:-1])
    made = Calc(family, given, project.find())
    shell.set_custom_exc((Exception,), _one_sentence)
    return made


def _one_sentence(shell, kind, error, trace, tb_offset=None):
    """Show an error of ours as its sentence; others as Python does."""
    from .errors import GagelineError

    if isinstance(error, GagelineError):
        print(f"{kind.__name__}: {error}")
        return [f"{kind.__name__}: {error}"]
    return shell.showtraceback((kind, error, trace), tb_offset=tb_offset)


class Calc:
    """One calculation: its inputs with their sources, its project, its connection, and the parts of its report."""

    def __init__(self, family, given, project_path):
        self.given = given
        self.project_path = project_path
        self.project = project.load(project_path)
        made = families.family(family)
        self.connection = made(made.Model.of(**{name: each.value for name, each in given.items()}), self.project.basis)

    @property
    def sources(self):
        """Input name -> where its value comes from."""
        return {name: each.source for name, each in self.given.items()}

    def results(self):
        """Return the results as plain data, the same that is attached to the PDF."""
        return self.connection.to_dict()

    def open_items(self):
        """Return the open items: the engineer's, failed checks, and inputs without a source."""
        unsourced = [name for name in self.given if not self.sources[name] and name not in presenting.NEEDS_NO_SOURCE]
        extra = [f"Inputs without a source: {', '.join(unsourced)}."] if unsourced else []
        overridden = [name for name, source in self.sources.items() if source == cells.OVERRIDE]
        extra += [f"Inputs overridden at the run: {', '.join(overridden)}."] if overridden else []
        return [*self.connection.open_items(), *extra]

    def cover(self):
        """Return the cover: title block data, criteria, scope, assumptions, open items, what governs."""
        return Part([self._meta(), presenting.cover(self)])

    def _meta(self):
        job, who = self.project, self.connection.inputs
        files = {"inputs.json": ({name: {"value": each.value, "source": each.source} for name, each in self.given.items()},
                                 "The inputs as given, with their sources"),
                 "results.json": (self.results(), "The results of every check")}
        attached = [{"name": name, "mime": "application/json", "text": json.dumps(data, indent=1, ensure_ascii=False, sort_keys=True) + "\n",
                     "description": said} for name, (data, said) in files.items()]
        attached.append({"name": project.FILE, "mime": "application/toml", "text": self.project_path.read_text(encoding="utf-8"),
                         "description": "The project's control data"})
        return sheet.meta(project=job.project, client=job.client, location=job.location, job=job.job, mark=who.mark,
                          title=who.title or self.connection.title, rev=job.rev, rev_date=job.date.isoformat(), by=job.prepared_by,
                          by_date=job.date.isoformat(), status=job.status.upper(), firm=job.firm, edition=job.basis.specification,
                          method=job.method, loads=job.basis.loads_standard, paper=job.paper, attachments=attached)

    def summary(self):
        """Return the summary: the governing check first, then every check by its ratio, then those that do not apply."""
        return Part(presenting.summary(self.connection))

    def inputs(self):
        """Return the inputs as executed, each with its source."""
        return Part(presenting.inputs(self))

    def loads(self):
        """Return the loads: every combination, or the given demand, and what is required."""
        return Part(presenting.loads(self.connection))

    def drawing(self):
        """Return the connection as designed: what is to be built, elevation with the governing path, cross-section."""
        return Part([sheet.heading(text="Connection as designed"), presenting.designed(self.connection),
                     *(presenting.figure(each) for each in self.connection.drawings())])

    def checks(self, part):
        """Return the checks of one part of the load path, every line written out, with the tables that belong to it.

        Parameters
        ----------
        part : one of the connection's ``parts``, for example "member" or "detailing".
        """
        return Part(presenting.checks(self.connection, part))

    def curve(self):
        """Return the strength of each limit state against the connection's length, and the shortest length in words."""
        found = study.capacity_curve(self.connection)
        head = sheet.heading(text="Capacity against connection length")
        if isinstance(found, str):
            return Part([head, sheet.prose(runs=found)])
        from .figures import capacity_curve

        return Part([head, sheet.prose(runs=found.sentence), presenting.figure(capacity_curve(self.connection, found))])

    def permissible(self):
        """Return the largest value of each service load with the others as they are, and the plot of permissible D against L."""
        if not isinstance(self.connection.demand, Demands):
            return Part([sheet.heading(text="Permissible loads"), sheet.prose(
                runs="Not worked out: the demand is given as a required strength, not as service loads.")])
        from .figures import permissible_loads

        drawn = permissible_loads(self.connection)
        return Part([*presenting.permissible(self.connection), *([presenting.figure(drawn)] if drawn else [])])

    def closing(self):
        """Return notation, references, cautions and the identification of the program."""
        return Part([*presenting.closing(self.connection), sheet.heading(text="Program identification"),
                     sheet.identification(rows=identity.rows(self.connection.family))])

    def _repr_html_(self):
        governs = self.connection.governing
        return (f"<p><b>{html.escape(self.connection.inputs.mark)}</b> {html.escape(self.connection.title)}: "
                f"{html.escape(governs.title)} governs, D/C = {presenting.ratio(governs)}.</p>")


__all__ = ["SHEET_MIME", "Calc", "Part", "begin"]
