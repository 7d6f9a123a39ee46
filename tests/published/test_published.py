"""The published cases of cases/*.toml, one printed number at a time.

An example names its ``source``, the ``edition`` it follows and its ``evidence``: "found" (the page was read), "memory" (a published
document recalled, its numbers recomputed) or "derived" (evaluated by hand from published constants: guards against change, no evidence).
It has ``work``, plain steps that call the package's formulas, tables and geometry, or a whole ``connection``; its ``family`` is that of
its file where it names none. Each of its ``results`` is an expression (``is``) or a ``check`` of the connection (or one ``step`` of it, by the
formula's name, or its ``demand``), with what the source prints: ``printed`` or ``nominal``, and ``lrfd`` and ``asd`` where it prints
available strengths (by the ``state`` of check.FACTORS).

Half the last printed digit is allowed; a source that rounds on the way gets a ``tolerance_percent`` and says ``why``.
"""

import functools
import tomllib
from collections import defaultdict
from pathlib import Path

import pytest
from helpers import checks, value_of

from gageline import families
from gageline.archive import manual
from gageline.check import FACTORS
from gageline.formula import EDITIONS

EVIDENCE = ("found", "memory", "derived")
EXAMPLE_KEYS = {"id", "source", "edition", "evidence", "work", "connection", "family", "computed_by", "results"}
RESULT_KEYS = {"is", "check", "step", "demand", "state", "printed", "nominal", "lrfd", "asd", "evidence", "tolerance_percent", "why"}

DEVIATIONS = {}
"""Case id -> (evidence, family, deviation over tolerance, printed, found); filled as the cases run."""


def problems(example):
    """Return what is wrong with an example, before it is run."""
    found = [f"{name} is missing" for name in ("id", "source", "edition", "results") if not example.get(name)]
    found += [f"unknown key {name}" for name in set(example) - EXAMPLE_KEYS]
    if len(example.get("source", "")) < 20:
        found.append("the source does not name a document and a place")
    for row in example.get("results", []):
        found += [f"unknown key {name}" for name in set(row) - RESULT_KEYS]
        if row.get("evidence", example.get("evidence")) not in EVIDENCE:
            found.append(f"evidence must be one of {', '.join(EVIDENCE)}")
        if ("tolerance_percent" in row) != ("why" in row):
            found.append("tolerance_percent and why go together")
        if row.get("tolerance_percent", 0) > 1.2:
            found.append("a tolerance above 1.2 % is no comparison")
        if not {"printed", "nominal", "lrfd", "asd"} & set(row):
            found.append("nothing printed to compare with")
        if not all(isinstance(row[name], str) for name in ("printed", "nominal", "lrfd", "asd") if name in row):
            found.append("what the source prints is given as text, so that its digits count")
        if ("is" in row) + ("check" in row) + ("demand" in row) != 1:
            found.append("a result is an expression, a check or the demand")
        if "is" in row and {"lrfd", "asd"} & set(row) and row.get("state") not in FACTORS:
            found.append("available strengths need a state of check.FACTORS")
    return found


NAMES = manual.names()


def half_digit(printed):
    """Return half a unit of the last printed digit."""
    return 0.5 * 10.0 ** -len(printed.partition(".")[2])


class Runner:
    """Works out an example once; its results are asked for one by one."""

    def __init__(self, example):
        self.example = example
        self.edition = example.get("computed_by", example["edition"])
        self.connection = functools.cache(self._connection)

    @functools.cached_property
    def scope(self):
        scope = dict(NAMES)
        exec(self.example.get("work", ""), scope)
        return scope

    def _connection(self, method):
        given = {"mark": self.example["id"], **self.example["connection"]}
        if "tension" in given:
            given["demand_level"] = method
        return families.family(self.example.get("family", "bolted")).of(edition=self.edition, method=method, **given)

    def found(self, row, kind):
        method = "ASD" if kind == "asd" else "LRFD"
        if row.get("demand"):
            return self.connection(method).demand.required_tension
        if "check" in row:
            check = checks(self.connection(method))[row["check"]]
            if "step" in row:
                return value_of(check, row["step"])
            return check.nominal if kind in ("printed", "nominal") else check.available
        value = eval(row["is"], self.scope)
        if kind in ("printed", "nominal"):
            return value
        phi, omega = FACTORS[row["state"]]
        return phi * value if method == "LRFD" else value / omega


"""File -> the family whose examples it holds where an example names none; other files bear the family's name."""

EXAMPLES = [{"family": path.stem} | example
            for path in sorted((Path(__file__).parent / "cases").glob("*.toml"))
            for example in tomllib.loads(path.read_text(encoding="utf-8"))["example"]]


def collect(examples):
    """Return (case id, runner, result row, kind) of every printed number."""
    cases = []
    for example in examples:
        runner = Runner(example)
        for number, row in enumerate(example["results"], start=1):
            for kind in ("printed", "nominal", "lrfd", "asd"):
                if kind in row:
                    what = row.get("is") or row.get("step") or row.get("check") or "demand"
                    cases.append((f"{example['id']}-{number} {what} {kind}", runner, row, kind))
    return cases


CASES = collect(EXAMPLES)


def compared(case):
    """Return (found, printed, tolerance) of one case and remember its deviation."""
    name, runner, row, kind = case
    found, printed = float(runner.found(row, kind)), row[kind]
    allowed = half_digit(printed)
    if "tolerance_percent" in row:
        allowed = max(allowed, row["tolerance_percent"] / 100 * abs(float(printed)))
    # 1e-9: a value half way between two printed digits may lie a rounding error of binary on either side
    off = abs(found - float(printed)) / (allowed * (1 + 1e-9))
    evidence = row.get("evidence", runner.example["evidence"])
    DEVIATIONS[name] = (evidence, runner.example["family"], off, printed, found)
    return found, printed, allowed, off


def summary():
    """Return lines: published numbers by grade of evidence, by family, and the largest deviations."""
    rows = list(DEVIATIONS.items())
    published = [row for row in rows if row[1][0] != "derived"]
    grades = ", ".join(f"{sum(row[1][0] == grade for row in rows)} {grade}" for grade in EVIDENCE)
    examples = {runner.example["id"] for name, runner, _, _ in CASES if name in DEVIATIONS and DEVIATIONS[name][0] != "derived"}
    whole = {runner.example["id"] for name, runner, _, _ in CASES if name in DEVIATIONS and "connection" in runner.example}
    out = [f"{len(published)} published numbers from {len(examples)} examples ({grades}; {len(whole)} examples run as whole connections)"]
    families = defaultdict(list)
    for name, (_, family, off, _, _) in published:
        families[family].append((off, name))
    for family, found in sorted(families.items()):
        cases = {id(row) for name, _, row, _ in CASES if name in {each for _, each in found}}
        off, worst = max(found)
        out.append(f"  {family}: {len(cases)} cases, {len(found)} numbers, largest deviation {off:.2f} of its tolerance ({worst})")
    if published:
        name, (_, _, off, printed, found) = max(published, key=lambda row: row[1][2])
        out.append(f"largest deviation: {off:.2f} of its tolerance, {name}: printed {printed}, found {found:.5g}")
        name, (_, _, _, printed, found) = max(published, key=lambda row: abs(row[1][4] / float(row[1][3]) - 1))
        out.append(f"largest in per cent: {100 * abs(found / float(printed) - 1):.2f} %, {name}: printed {printed}, found {found:.5g}")
    return out


@pytest.mark.parametrize("example", EXAMPLES, ids=[example.get("id", "?") for example in EXAMPLES])
def test_example_is_sourced(example):
    assert problems(example) == []


@pytest.mark.parametrize("case", CASES, ids=[case[0] for case in CASES])
def test_printed_value(case):
    found, printed, allowed, off = compared(case)

    assert off <= 1, f"printed {printed}, found {found:.6g}, allowed ±{allowed:.3g}"


def test_ids_are_unlike():
    names = [case[0] for case in CASES]

    assert len(set(names)) == len(names)


def test_enough_is_published():
    evidence = [row.get("evidence", runner.example["evidence"]) for _, runner, row, _ in CASES]
    counted = {(runner.example["id"], i) for i, (_, runner, _, _) in enumerate(CASES) if evidence[i] != "derived"}

    assert len(counted) >= 90
    assert {runner.edition for _, runner, _, _ in CASES if "connection" in runner.example} == set(EDITIONS)


GOOD = {"id": "x", "source": "A document, a place in it", "edition": "360-22", "evidence": "found", "results": [{"is": "1", "printed": "1"}]}


class TestRunnerRefuses:
    def test_a_complete_example_passes(self):
        assert problems(GOOD) == []

    @pytest.mark.parametrize("change, word", [
        ({"source": ""}, "source"), ({"source": "a book"}, "source"), ({"evidence": "own output"}, "evidence"), ({"evidence": None}, "evidence"),
        ({"edition": ""}, "edition"), ({"results": [{"is": "1", "printed": 1.0}]}, "text"),
        ({"results": [{"is": "1", "printed": "1", "tolerance_percent": 0.5}]}, "why"),
        ({"results": [{"is": "1", "printed": "1", "tolerance_percent": 5, "why": "so"}]}, "no comparison"),
        ({"results": [{"is": "1"}]}, "nothing printed"), ({"results": [{"is": "1", "lrfd": "1"}]}, "state"),
        ({"notes": "x"}, "unknown key notes"),
    ])
    def test_an_incomplete_example_does_not(self, change, word):
        assert any(word in text for text in problems(GOOD | change))

    def test_half_of_the_last_printed_digit_is_allowed(self):
        assert [half_digit(text) for text in ("4.76", "332", "0.80", "5.0")] == pytest.approx([0.005, 0.5, 0.005, 0.05])
