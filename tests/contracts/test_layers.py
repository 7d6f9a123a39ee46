"""The house's order, read from its imports with ast: who may know whom, and how long a module may be."""

import ast
import subprocess
import sys
from pathlib import Path

import pytest

import gageline

ROOT = Path(gageline.__file__).parent
MODULES = sorted(path for path in ROOT.rglob("*.py") if "_templates" not in path.parts)

LEVEL = {
    "errors": 0, "symbols": 0,
    "store": 1, "units": 1, "facts": 1, "geometry": 1, "loads": 1,
    "formula": 2, "signoffs": 2,
    "render": 3, "provisions": 3,
    "check": 4,
    "editions": 5,
    "connections": 6,
    "study": 7, "families": 7,
    "figures": 8, "sheet": 8, "cells": 8, "project": 8, "search": 8, "margins": 8,
    "searching": 9, "identity": 9, "view": 9, "presenting": 9, "reviewing": 9,
    "calc": 10,
    "running": 11,
    "starting": 12, "archive": 12, "schedule": 12, "terminal": 12,
    "archive_cli": 13, "schedule_cli": 13,
    "cli": 14,
    "__main__": 15,
}
"""Part of the package -> its level. An import goes to a lower level, inside a part, or between parts named in ``BESIDE``."""

BESIDE = {
    ("formula", "render"),  # Line.rendered() imports its renderer when a line is printed: computing never loads handcalcs
}
"""(importer, imported) on one level, or upwards, each meant."""

OUTSIDE = {
    "pint": {"units", "formula"},
    "handcalcs": {"render"},
    "matplotlib": {"figures"},
    "pydantic": {"connections", "project"},
    "typer": {"cli", "archive_cli", "schedule_cli"},
    "rich": {"terminal", "cli", "archive_cli", "schedule_cli"},
    "openpyxl": {"schedule"},
    "distributed": {"schedule"},
    "IPython": {"calc", "schedule"},
    "typst": {"sheet", "archive"},
    "pypandoc": {"sheet"},
    "pikepdf": {"sheet", "archive"},
    "nbconvert": {"sheet"},
    "nbclient": {"running", "sheet"},
    "nbformat": {"sheet", "running", "starting", "cells", "archive"},
    "papermill": set(),
    "numpy": {"formula", "check", "geometry", "connections", "study", "search", "searching", "figures", "calc", "loads", "presenting"},
}
"""Outside library -> parts that may import it."""

STANDARD_ONLY = ("errors", "symbols", "facts", "provisions")
"""Parts that import nothing from outside but the standard library."""


DRAWING = ("drawing.py", "section.py")
"""Modules of a family that draw it. They may know figures; the rest of the family knows neither, but inside a function."""


def part_of(path):
    """Return the part of the package a module belongs to."""
    return path.relative_to(ROOT).parts[0].removesuffix(".py")


def imported(path, inside_functions=True):
    """Return (line, dotted name) of every import of a module, those inside functions too; our own begin with gageline."""
    package = ("gageline", *path.relative_to(ROOT).parent.parts)
    found, tree = [], ast.parse(path.read_text(encoding="utf-8"))
    for node in ast.walk(tree) if inside_functions else tree.body:
        if isinstance(node, ast.Import):
            found += [(node.lineno, alias.name) for alias in node.names]
        elif isinstance(node, ast.ImportFrom) and not node.level:
            found += [(node.lineno, f"{node.module}.{alias.name}") for alias in node.names]
        elif isinstance(node, ast.ImportFrom):
            base = package[: len(package) - node.level + 1]
            base = (*base, *node.module.split(".")) if node.module else base
            found += [(node.lineno, ".".join((*base, alias.name))) for alias in node.names]
    return found


def own(path):
    """Return (line, part) of every import of our own package, names of the package itself (``__version__``) left out."""
    found = [(line, name.split(".")[1]) for line, name in imported(path) if name.startswith("gageline.")]
    return [(line, part) for line, part in found if not part.startswith("__")]


def named(paths):
    return pytest.mark.parametrize("path", paths, ids=[str(path.relative_to(ROOT)) for path in paths])


def within(*parts):
    """Parametrize over the modules of some parts of the package."""
    return named([path for path in MODULES if part_of(path) in parts])


each_module = named(MODULES)
below_the_door = named([path for path in MODULES if part_of(path) != "__init__"])


@below_the_door
def test_part_has_its_level(path):
    assert part_of(path) in LEVEL, f"{path.name}: give the new part its level in this test"


@below_the_door
def test_imports_run_downwards(path):
    here = part_of(path)
    wrong = [f"line {line}: {here} imports {there}" for line, there in own(path)
             if there != here and LEVEL[there] >= LEVEL[here] and (here, there) not in BESIDE and (here, there) != ("connections", "figures")]

    assert not wrong


@within("connections")
def test_a_family_computes_without_its_drawing(path):
    if path.name in DRAWING:
        return
    loaded = [name for _, name in imported(path, inside_functions=False)]

    assert not [name for name in loaded if name.startswith("gageline.figures") or {"drawing", "section"} & set(name.split("."))]


def test_computing_loads_neither_drawing_nor_report():
    families = sorted(path.parent.name for path in ROOT.glob("connections/*/__init__.py"))
    heavy = ("matplotlib", "handcalcs", "IPython", "nbformat", "typst", "pypandoc", "typer")
    code = f"import sys; {'; '.join(f'import gageline.connections.{name}' for name in families)}; print([m for m in {heavy} if m in sys.modules])"
    found = subprocess.run([sys.executable, "-c", code], capture_output=True, text=True, timeout=60)

    assert found.stdout.strip() == "[]", found.stderr[-300:]


def test_every_exception_to_the_order_is_needed():
    used = {(part_of(path), there) for path in MODULES for _, there in own(path)}

    assert set(BESIDE) <= used


def test_front_door_imports_nothing_at_import():
    tree = ast.parse((ROOT / "__init__.py").read_text(encoding="utf-8"))

    assert not [node for node in tree.body if isinstance(node, (ast.Import, ast.ImportFrom))]


@within("facts", "geometry")
def test_facts_and_geometry_stand_alone(path):
    assert {there for _, there in own(path)} <= {part_of(path), "errors"}


@within("provisions")
def test_provisions_hold_formulas_only(path):
    tree = ast.parse(path.read_text(encoding="utf-8"))

    assert {there for _, there in own(path)} <= {"formula"}
    for node in tree.body:
        if isinstance(node, ast.FunctionDef):
            assert any(ast.unparse(decorator).startswith("formula(") for decorator in node.decorator_list), node.name
        else:
            assert isinstance(node, (ast.Expr, ast.ImportFrom, ast.Assign)), ast.unparse(node)


@each_module
def test_outside_libraries_stay_where_they_belong(path):
    names = {name.split(".")[0] for _, name in imported(path)}

    assert not [name for name in names & set(OUTSIDE) if part_of(path) not in OUTSIDE[name]]


@within(*STANDARD_ONLY)
def test_lowest_parts_need_no_outside_library(path):
    names = {name.split(".")[0] for _, name in imported(path)} - {"gageline"}

    assert names <= set(sys.stdlib_module_names)


@each_module
def test_module_fits_one_sitting(path):
    assert len(path.read_text(encoding="utf-8").splitlines()) <= 420


@each_module
def test_module_says_what_it_holds(path):
    text = path.read_text(encoding="utf-8")

    assert not text.strip() or ast.get_docstring(ast.parse(text))


@named([path for path in MODULES if part_of(path) not in ("check", "facts", "loads")])
def test_factors_stand_in_check_only(path):
    # A copy of a safety factor elsewhere would be changed in one place only; tables and load factors have their own numbers.
    numbers = {node.value for node in ast.walk(ast.parse(path.read_text(encoding="utf-8"))) if isinstance(node, ast.Constant)}

    assert not {1.67, 1.76, 2.14} & numbers
