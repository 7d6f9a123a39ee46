"""A calculation in a notebook: the inputs cell above it, the connection it describes, and the parts of its report.

Each part is an object the notebook displays: blocks for the sheet (``sheet.blocks``) and the same as HTML for JupyterLab.
"""

import html
import json
from functools import cached_property

from . import cells, families, identity, presenting, project, reviewing, signoffs, store, study, units
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
    # The cell that calls begin() is the last one entered; a runner that stores no history leaves the list at its first, empty entry.
    entered = shell.user_ns["In"]
    given = cells.inputs_of_session(entered[:-1]) if len(entered) > 1 else cells.inputs_of_namespace(shell.user_ns)
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
        with units.lengths_in("SI" if self.project.units == "SI" else "US"):  # names of plates hold their dimensions
            self.connection = made(made.Model.of(**{name: each.value for name, each in given.items()}), self.project.basis)

    @property
    def sources(self):
        """Input name -> where its value comes from."""
        return {name: each.source for name, each in self.given.items()}

    def results(self):
        """Return the results as plain data, the same that is attached to the PDF."""
        return self.connection.to_dict()

    @cached_property
    def content(self):
        """The hash that sign-offs hold for: inputs with their sources, basis and results."""
        return signoffs.content_hash(self.given, self.project.basis, self.results())

    @cached_property
    def log(self):
        """The sign-offs, comments and settled items of this mark, as they stood when they were first asked for."""
        return signoffs.read(self.project_path.parent, self.connection.inputs.mark)

    def register(self):
        """Return the assumptions and open items as dicts: id, kind, text, basis, status, and whether a sign-off may settle it."""
        settled, rows = self.log.settled(), []
        asked = self.connection.inputs.open_items
        unsourced = [name for name in self.given if not self.sources[name] and name not in presenting.NEEDS_NO_SOURCE]
        overridden = [name for name, source in self.sources.items() if source == cells.OVERRIDE]
        system = self.project.units
        with units.lengths_in(system):
            items = [("assumption", text if basis == "engineer" else units.told(text, system), basis, True)
                     for text, basis in self.connection.assumptions()]
            items += [("open item", text if text in asked else units.told(text, system),
                       "engineer" if text in asked else "a check of this calculation", not text.endswith(presenting.FAILED))
                      for text in self.connection.open_items()]
        items += [("open item", f"Inputs without a source: {', '.join(unsourced)}.", "inputs", False)] if unsourced else []
        items += [("open item", f"Inputs overridden at the run: {', '.join(overridden)}.", "inputs", False)] if overridden else []
        counts = {"assumption": 0, "open item": 0}
        for kind, text, basis, may in items:
            counts[kind] += 1
            done = settled.get(text) if may else None
            status = {"assumption": "stated", "open item": "open"}[kind]
            if done:
                status = f"{'confirmed' if kind == 'assumption' else 'closed'} {done['when'][:10]} by {done['who']}: {done['basis']}"
            rows.append({"id": f"{kind[0].upper()}{counts[kind]}", "kind": kind, "text": text, "basis": basis, "status": status, "may": may,
                         "open": kind == "open item" and not done})
        return rows

    def open_items(self):
        """Return what is open, as sentences: the engineer's items, failed checks, inputs without a source, comments, voided sign-offs."""
        open_now = [row["text"] for row in self.register() if row["open"]]
        comments = [f"Comment {each['id']} on {each['on']} ({each['who']}): {each['text']}" for each in self.log.open_comments()]
        void = [f"Sign-off of {each['when'][:10]} by {each['who']} ({each['role']}) is void: inputs or results have changed since."
                for each in self.log.voided(self.content)]
        return [*open_now, *comments, *void, *(f"Sign-off log: {fault}." for fault in self.log.faults)]

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
        if self.log.events:
            attached.append({"name": "signoffs.json", "mime": "application/json", "text": store.canonical(list(self.log.events)).decode(),
                             "description": "Sign-offs, comments and settled items"})
        # Only an issue carries the status it is entitled to.
        status = job.status.upper() + ("" if job.status == "preliminary" else ", NOT ISSUED")
        return sheet.meta(project=job.project, client=job.client, location=job.location, job=job.job, mark=who.mark,
                          title=who.title or self.connection.title, rev=job.rev, rev_date=job.date.isoformat(),
                          **self.signed(), status=status, firm=job.firm, logo=self._logo(), edition=job.basis.specification,
                          method=job.method, loads=job.basis.loads_standard, paper=job.paper, attachments=attached)

    def signed(self):
        """Return the title block's names and dates, from recorded sign-offs of this content and from nothing else."""
        out = {}
        for role, field in (("preparer", "by"), ("checker", "checked"), ("approver", "approved")):
            event = self.log.sign_off(role, self.content)
            out |= {field: event["who"] if event else "", f"{field}_date": event["when"][:10] if event else ""}
        return out

    def _logo(self):
        if not self.project.logo:
            return ""
        path = self.project_path.parent / self.project.logo
        if path.parent != self.project_path.parent or path.suffix != ".svg" or not path.is_file():
            raise InputError(f"{self.project_path}: logo = {self.project.logo!r} is no SVG file beside the project file")
        return path.read_text(encoding="utf-8")

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
        # A figure has no room for two systems: dual ones stay in inches.
        with units.lengths_in("SI" if self.project.units == "SI" else "US"):
            drawn = self.connection.drawings()
        return Part([sheet.heading(text="Connection as designed"), presenting.designed(self.connection),
                     *(presenting.figure(each, self.project.units, dimensioned=True) for each in drawn)])

    def checks(self, part):
        """Return the checks of one part of the load path, every line written out, with the tables that belong to it.

        Parameters
        ----------
        part : one of the connection's ``parts``, for example "member" or "detailing".
        """
        return Part(presenting.checks(self.connection, part))

    def curve(self):
        """Return the strength of each limit state against the connection's length, and the shortest length in words."""
        system = self.project.units
        with units.lengths_in(system):
            return self._curve(system)

    def _curve(self, system):
        found = study.capacity_curve(self.connection)
        head = sheet.heading(text="Capacity against connection length")
        if isinstance(found, str):
            return Part([head, sheet.prose(runs=units.told(found, system))])
        from .figures import capacity_curve

        return Part([head, sheet.prose(runs=units.told(found.sentence, system)), presenting.figure(capacity_curve(self.connection, found), system)])

    def permissible(self):
        """Return the largest value of each service load with the others as they are, and the plot of permissible D against L."""
        if not isinstance(self.connection.demand, Demands):
            return Part([sheet.heading(text="Permissible loads"), sheet.prose(
                runs="Not worked out: the demand is given as a required strength, not as service loads.")])
        from .figures import permissible_loads

        with units.lengths_in(self.project.units):
            drawn = permissible_loads(self.connection)
        return Part([*presenting.permissible(self.connection), *([presenting.figure(drawn, self.project.units)] if drawn else [])])

    def closing(self):
        """Return the review, notation, references, cautions and the identification of the program."""
        rows = [(name, units.told(said, self.project.units)) for name, said in identity.rows(self.connection.family)]
        return Part([*reviewing.review(self), *presenting.closing(self.connection), sheet.heading(text="Program identification"),
                     sheet.identification(rows=rows)])

    def _repr_html_(self):
        governs = self.connection.governing
        return (f"<p><b>{html.escape(self.connection.inputs.mark)}</b> {html.escape(self.connection.title)}: "
                f"{html.escape(governs.title)} governs, D/C = {presenting.ratio(governs)}.</p>")


__all__ = ["SHEET_MIME", "Calc", "Part", "begin"]
