"""The verification manual: every published case worked out by the installed version, beside what its source prints."""

import functools
import importlib
import math
import pkgutil
import tomllib
from collections import defaultdict
from dataclasses import dataclass
from types import SimpleNamespace

from .. import __version__, families, formula, geometry, identity, provisions
from ..check import FACTORS
from ..errors import ReportError
from ..facts import bolts, fatigue, shapes
from ..geometry.whitmore import whitmore
from ..sheet import blocks as sheet
from ..sheet.build import set_pdf, sheet_data
from ..sheet.notebook import as_notebook

KINDS = ("printed", "nominal", "lrfd", "asd")
EVIDENCE = {"found": "the page was read", "memory": "a published document recalled, the page not seen again",
            "derived": "evaluated from published constants; guards against change, no evidence"}


@dataclass(frozen=True)
class Result:
    """One printed number and what the installed version gives: text as printed, our value, the difference allowed, why."""

    what: str
    evidence: str
    printed: str
    found: float
    allowed: float
    why: str

    @property
    def ok(self):
        """Whether the value lies within the difference allowed."""
        # A value half way between two printed digits may lie a rounding error of binary on either side.
        return abs(self.found - float(self.printed)) <= self.allowed * (1 + 1e-9)


@functools.cache
def names():
    """Return what the steps of a case may call: formulas by module, computed bare, tables and geometry."""
    for module in pkgutil.walk_packages(provisions.__path__, provisions.__name__ + "."):
        importlib.import_module(module.name)
    modules = defaultdict(SimpleNamespace)
    for name, made in formula.FORMULAS.items():
        if name.startswith("gageline.provisions."):
            _, _, module, function = name.split(".")
            setattr(modules[module], function, made.bare)
    facts = {"group": bolts.bolt_group, "hole": bolts.hole, "pretension": bolts.pretension, "minimum_edge": bolts.minimum_edge,
             "shape": shapes.shape, "fatigue_facts": fatigue}
    return {**modules, **facts, **{name: getattr(geometry, name) for name in geometry.__all__}, "whitmore": whitmore, "radians": math.radians}


def work_out(example):
    """Return the ``Result`` of every printed number of a case, in its order."""
    edition = example.get("computed_by", example["edition"])

    @functools.cache
    def connection(method):
        given = {"mark": example["id"], **example["connection"]}
        if "tension" in given:
            given["demand_level"] = method
        return families.family(example.get("family", "bolted")).of(edition=edition, method=method, **given)

    scope = dict(names())
    exec(example.get("work", ""), scope)
    out = []
    for row in example["results"]:
        for kind in KINDS:
            if kind in row:
                found = float(_value(row, kind, connection, scope))
                allowed = 0.5 * 10.0 ** -len(row[kind].partition(".")[2])
                allowed = max(allowed, row.get("tolerance_percent", 0) / 100 * abs(float(row[kind])))
                words = row.get("is") or " ".join(row[name] for name in ("check", "step") if name in row) or "required tension"
                if kind in ("lrfd", "asd"):
                    words += f", {kind.upper()}"
                out.append(Result(words, row.get("evidence", example["evidence"]), row[kind], found, allowed, row.get("why", "")))
    return out


def _value(row, kind, connection, scope):
    method = "ASD" if kind == "asd" else "LRFD"
    if row.get("demand"):
        return connection(method).demand.required_tension
    if "check" in row:
        check = next(each for each in connection(method).checks if each.id == row["check"])
        if "step" in row:
            calls = [step for step in check.steps if not isinstance(step, str)]
            return next(made.bare(*values) for made, values in reversed(calls) if made.__name__ == row["step"])
        return check.nominal if kind in ("printed", "nominal") else check.available
    value = eval(row["is"], scope)
    if kind in ("printed", "nominal"):
        return value
    phi, omega = FACTORS[row["state"]]
    return phi * value if method == "LRFD" else value / omega


def manual(date):
    """Return (PDF's bytes, its number, numbers compared, numbers outside their tolerance).

    Parameters
    ----------
    date : ISO date that the manual bears.

    Raises
    ------
    ReportError
        The published cases are not installed.
    """
    paths = identity.published_cases()
    if not paths:
        raise ReportError("the published cases are not installed; install gageline again, or work in a full checkout")
    examples = [example for path in paths for example in tomllib.loads(path.read_text(encoding="utf-8"))["example"]]
    worked = [(example, work_out(example)) for example in examples]
    every = [result for _, results in worked for result in results]
    wrong = [result for result in every if not result.ok]
    pdf = set_pdf(sheet_data(as_notebook(_blocks(date, worked, every, wrong))))
    return pdf, identity.verification_id(), len(every), len(wrong)


def _blocks(date, worked, every, wrong):
    counts = {name: sum(result.evidence == name for result in every) for name in EVIDENCE}
    published = [result for result in every if result.evidence != "derived"]
    far = max(published, key=lambda result: abs(result.found / float(result.printed) - 1))
    rows = identity.rows("bolted")
    said = f"{len(every)} numbers of {len(worked)} cases compared; " + \
        ("all lie within the difference allowed." if not wrong else f"{len(wrong)} lie outside the difference allowed.")
    yield sheet.meta(project="gageline", job=identity.verification_id(), mark="VM", title="Verification manual", rev=__version__, rev_date=date,
                     edition="AISC 360-22, 360-16", method="LRFD, ASD", loads="ASCE/SEI 7", status="VERIFICATION")
    yield sheet.cover(
        title="Verification manual", governing=said,
        purpose="Each case is worked out by the installed version and set beside what its source prints, so that a firm can judge whether to "
                "accept the program for use. Half of the last printed digit is allowed, or a percentage with its reason where the source "
                "rounds on the way. The manual is made on the user's own machine and holds for the code and tables whose hash it bears.",
        criteria=[["Program", f"gageline {__version__}"], ["Manual no.", identity.verification_id()],
                  ["Evidence", "; ".join(f"{counts[name]} {name}: {words}" for name, words in EVIDENCE.items())],
                  ["Largest difference", f"{100 * abs(far.found / float(far.printed) - 1):.2f} % ({far.what})"]],
        open_items=[f"{result.what}: printed {result.printed}, found {result.found:.6g}." for result in wrong])
    yield sheet.heading(text="Program identification")
    yield sheet.identification(rows=rows)
    yield sheet.heading(text="Cases")
    columns = [{"head": "Result", "width": 2.3}, {"head": "Printed", "align": "right"}, {"head": "Found", "align": "right"},
               {"head": "Difference", "align": "right"}, {"head": "Allowed", "align": "right"}, {"head": "Reason", "width": 1.3}, {"head": ""}]
    for example, results in worked:
        yield sheet.heading(text=example["id"], level=2)
        yield sheet.prose(runs=f"{example['source']}. Edition {example['edition']}"
                               + (f", computed by {example['computed_by']}" if "computed_by" in example else "") + f"; {example['evidence']}.")
        if given := example.get("connection"):
            family = example.get("family", "bolted")
            yield sheet.note(runs=f"Inputs ({family}): " + "; ".join(f"{name} = {value}" for name, value in given.items()) + ".")
        for line in example.get("work", "").strip().splitlines():
            yield sheet.prose(runs=[{"code": _wrapped(line.strip())}])
        lines = [{"cells": [_wrapped(each.what), each.printed, f"{each.found:.6g}", f"{100 * (each.found / float(each.printed) - 1):+.2f} %".replace(
                      "-", "−") if float(each.printed) else "–", f"±{each.allowed:.2g}", each.why, "OK" if each.ok else "DIFFERS"],
                  "strong": not each.ok} for each in results]
        yield sheet.table(columns=columns, rows=lines)


def _wrapped(text):
    """Return a step of a case with room to break after its brackets and commas."""
    return " ".join(text.replace("(", "( ").replace(")", " )").replace(".", ".\u200b").replace("_", "_\u200b").split()) if len(text) > 24 else text
