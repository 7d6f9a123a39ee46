"""The coverage table of README: family, limit state, clause, and how it is verified; read from the code, the cases and the tests.

``python -m tests.published.coverage`` prints it, ``--write`` puts it between its markers in README.md.
"""

import ast
import json
import re
import sys
from pathlib import Path

sys.path.insert(0, str(Path(__file__).parents[1]))

from gageline import cells, families, project

from . import test_published

ROOT = Path(__file__).parents[2]
BEGIN, END = "<!-- coverage -->", "<!-- end of coverage -->"

OPTIONS = {"fatigue_range": "30 kip", "fatigue_cycles": 500_000}
"""Inputs that bring a family's checks against fatigue, where it has any."""

ALIKE = ((r"\b[Uu]pper |\b[Ll]ower ", ""), (r"^Web splice, ", "Flange splices, "), (r"^Edge on the (beam|column|support)", "Edge"),
         (r"(flange|web|face) of \S*\d\S*", r"\1 of the support"), (r"^Fatigue, largest stress, .*", "Fatigue, largest stress at service load"),
         (r"^Fatigue, .*(gross section|net section|ends of|throat|root of|thread)", r"Fatigue, \1"))
"""What is left out of titles, or put for it, so that checks of one kind on parts alike share a row."""

HEAD = """*Published*: numbers of a document, named beside each in `tests/published`, that a report's section of this limit state reproduces. *Equations*: how
many of the equations it may print are called by such a number, wherever. *Independent*: tests of the family that work it by another method.
*Tests*: other tests that name it, most of them worked by hand. Fatigue has no published example: its constants are read, its values worked by hand.
Limits of spacing, edges and sizes are not listed. Written by `python -m tests.published.coverage --write`.
"""


FACTORED = {f"detailing.{name}" for name in ("design_strength", "allowable_strength", "design_axial_strength", "allowable_axial_strength")}
"""Equations of the last line of every check."""


def demonstrations():
    """Yield every demonstration mark as a connection, and where its family can, with fatigue asked for."""
    for path in sorted((ROOT / "calcs").glob("*/*.ipynb")):
        book = json.loads(path.read_text(encoding="utf-8"))
        family = re.search(r'begin\("(\w+)"\)', "".join("".join(cell["source"]) for cell in book["cells"]))[1]
        given = {name: each.value for name, each in cells.inputs_of_notebook(book).items()}
        made, basis = families.family(family), project.load(path.with_name(project.FILE)).basis
        yield made(made.Model.of(**given), basis)
        if hasattr(made, "fatigue_details"):
            cyclic = given | OPTIONS | ({"installation": "pretensioned"} if given.get("installation") == "snug" else {})
            if given.get("joined") != "bolted":
                yield made(made.Model.of(**cyclic), basis)
    # The demonstration hanger is bolted at its stem, where fatigue is refused: the published one is welded.
    welded = next(example["connection"] for example in test_published.EXAMPLES if example.get("connection", {}).get("joined") == "welded")
    yield families.family("hanger").of(**{"mark": "hanger"} | welded | OPTIONS | {"installation": "pretensioned"}
                                       | ({"demand_level": "LRFD"} if "tension" in welded else {}))


def examples():
    """Yield (connection, its published results) of every whole example whose evidence is a document."""
    seen = set()
    for _, runner, _, kind in test_published.CASES:
        example = runner.example
        if "connection" not in example or example["evidence"] == "derived" or id(runner) in seen:
            continue
        seen.add(id(runner))
        yield runner.connection("ASD" if kind == "asd" else "LRFD"), example["results"]


def called(check):
    """Return the equations of a check by module and name."""
    return {f"{made.where.split('.')[-2]}.{made.__name__}" for made, _ in (step for step in check.steps if not isinstance(step, str))}


def published():
    """Return (equations called by published numbers, (family, check) -> published numbers, connections met)."""
    equations, numbers, met = set(), {}, []
    for example in test_published.EXAMPLES:
        if example["evidence"] != "derived":
            text = example.get("work", "") + " ".join(row.get("is", "") for row in example["results"])
            equations |= set(re.findall(r"\b[a-z]\w*\.[a-z]\w*\b", text))
    for connection, results in examples():
        met.append(connection)
        by_id = {each.id: each for each in connection.checks}
        for row in results:
            if "check" in row:
                key = connection.family, row["check"]
                numbers[key] = numbers.get(key, 0) + len({"printed", "nominal", "lrfd", "asd"} & set(row))
                equations |= {name for name in called(by_id[row["check"]]) if row.get("step") in (None, name.partition(".")[2])}
    return equations, numbers, met


def tests(family):
    """Return (check id -> tests that work it independently, check id -> other tests that name it) of a family."""
    independent, others = {}, {}
    for path in (ROOT / "tests" / "connections" / f"test_{family}.py", ROOT / "tests" / "connections" / "test_options.py"):
        tree = ast.parse(path.read_text(encoding="utf-8"))
        holders = [(tree, ""), *((node, ast.get_docstring(node) or "") for node in tree.body if isinstance(node, ast.ClassDef))]
        for holder, said in holders:
            for node in holder.body:
                if not (isinstance(node, ast.FunctionDef) and node.name.startswith("test_")):
                    continue
                named = {leaf.value for leaf in ast.walk(node) if isinstance(leaf, ast.Constant) and isinstance(leaf.value, str)}
                counted = independent if (ast.get_docstring(node) or said).startswith("Independent") or "Independent" in said else others
                for name in named:
                    counted[name] = counted.get(name, 0) + 1
    return independent, others


def alike(title):
    """Return a title without the words that tell parts alike from each other."""
    for pattern, instead in ALIKE:
        title = re.sub(pattern, instead, title)
    return title[0].upper() + title[1:]


def rows():
    """Return (family, limit state, clause, how verified), one for each limit state of each family."""
    equations, numbers, met = published()
    found = {}
    for connection in (*met, *demonstrations()):
        for each in connection.checks:
            if each.kind == "strength" and not (each.id == "fatigue" and not each.applies):
                ids, checks, clauses = found.setdefault((connection.family, alike(each.title)), (set(), [], []))
                ids.add(each.id)
                checks.append(each)
                clauses.append(each.clause.partition(", category")[0])
    out = []
    for (family, title), (ids, checks, clauses) in sorted(found.items(), key=lambda item: item[0][0]):
        independent, others = tests(family)
        used = set().union(*(called(each) for each in checks if each.applies)) - FACTORED
        count = sum(numbers.get((family, id), 0) for id in ids)
        said = [f"published {count}"] if count else []
        said += [f"equations {len(used & equations)}/{len(used)}"] if used else []
        said += [f"{word} {sum(named.get(id, 0) for id in ids)}" for word, named in (("independent", independent), ("tests", others))
                 if any(id in named for id in ids)]
        out.append((family, title, clauses[-1], said or ["reason only"], used - equations))
    tested = [(family, left) for family, _, _, said, left in out if said[-1].startswith("tests") or any("independent" in each for each in said)]
    return [(family, title, clause, "; ".join([*said, *_elsewhere(family, said, left, tested)])) for family, title, clause, said, left in out]


def _elsewhere(family, said, left, tested):
    """Return in which families' tests the equations without a published number are worked, where the family itself has no test of its check."""
    if len(said) > 1 or not left:
        return []
    others = [name for name in dict.fromkeys(name for name, _ in tested) if left <= set().union(*(used for each, used in tested if each == name))]
    return [f"tests in {others[0]}" + (", another check" if others[0] == family else "")] if others else []


def table():
    """Return the coverage table with its heading, as it stands between the markers."""
    lines = ["## How each limit state is verified", "", HEAD, "| family | limit state | clause | verified by |", "|---|---|---|---|"]
    return "\n".join([*lines, *(f"| {' | '.join(row)} |" for row in rows())]) + "\n"


def between(text):
    """Return what stands between the markers of a text."""
    return text.partition(BEGIN + "\n")[2].partition("\n" + END)[0]


if __name__ == "__main__":
    made, readme = table(), ROOT / "README.md"
    if "--write" in sys.argv[1:]:
        text = readme.read_text(encoding="utf-8")
        if BEGIN not in text:
            text = text.replace("## Cautions", f"{BEGIN}\n{END}\n\n## Cautions", 1)
        head, _, rest = text.partition(BEGIN)
        readme.write_text(f"{head}{BEGIN}\n{made}\n{END}{rest.partition(END)[2]}", encoding="utf-8")
    else:
        print(made)
