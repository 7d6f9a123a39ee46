"""The parts of the sheet by themselves: maths, markdown, blocks, the exporter, where the look is found."""

import json
import shutil
import subprocess
import sys
from pathlib import Path

import nbformat
import pytest

import gageline
from gageline.sheet import assets, blocks, build_pdf, markdown, maths


@pytest.mark.parametrize(
    ("latex", "typst"),
    [
        (r"\frac{a}{b}", "a / b"),
        (r"5\;\mathrm{in}^{2}", '5 thin upright("in")^2'),
        (r"29{,}000\,\text{ksi}", "29,000"),
        (r"\phi P_n", "phi.alt P_n"),
        (r"\mathbf{0.912}", "upright(bold(0.912))"),
        (r"F'_{nt}", "F'_(n t)"),
        (r"\begin{cases} a & x > 1, \\ b & x < 1 \end{cases}", r"\,"),
        (r"65\,\text{ksi} % comment", '65 thin upright("ksi")'),
    ],
)
def test_maths_converts(latex, typst):
    """LaTeX of the kinds a calc writes becomes Typst maths; the repairs of known traps are in it (report B6)."""
    tidy = maths.tidied(latex)

    assert typst in maths.converted([tidy])[tidy]
    assert "comment" not in maths.converted([tidy])[tidy]


def test_text_in_maths_cannot_run():
    """Text inside maths stays text: it reaches Typst quoted, never as code."""
    latex = r"\text{a \# panic(1) @b}"

    assert maths.converted([latex])[latex] == 'upright("a #panic(1) @b")'


def test_maths_is_converted_once(monkeypatch):
    """A formula seen before costs no call of pandoc, many new ones cost a single one."""
    calls = []
    real = maths.pandoc.run
    monkeypatch.setattr(maths.pandoc, "run", lambda *a: calls.append(a) or real(*a))
    formulas = [rf"q_{{{i}}} + 1" for i in range(50)]

    first = maths.converted(formulas)
    assert maths.converted(formulas[::-1]) == first
    assert len(calls) == 1


def test_cuts_keep_every_sign():
    """Cutting a row loses nothing but the stretch of its outer brackets."""
    row = maths.tidied(
        r"\min\left(0.60\cdot 65.0\,\text{ksi}\cdot 9.297\,\text{in}^{2} + 1.0\cdot 65.0\,\text{ksi}\cdot 2.891\,\text{in}^{2},"
        r" 0.60\cdot 50.0\,\text{ksi}\cdot \left(13.13 - 1.2\right)\,\text{in}^{2}\right)"
    )
    parts = maths.cuts(row)

    assert [len(part) for part in parts] == [2, 1]
    joined = "".join(term for part in parts for term in part).replace(" ", "")
    assert joined == row.replace(r"\min\left(", r"\min(").replace(r"\text{in}^{2}\right)", r"\text{in}^{2})").replace(
        " ", ""
    )


@pytest.mark.parametrize("row", ["a + b", r"F_u\,A_e", r"\frac{a}{b}"])
def test_short_rows_are_not_cut(row):
    """Rows that fit anyway are left whole."""
    assert maths.cuts(row) == []


def test_reading_of_maths():
    """Maths of markdown gets a plain reading without LaTeX."""
    assert maths.reading(r"b_f \ge \frac{2}{3} d") == "b f is at least (2 over 3) d"
    assert maths.reading(r"\phi P_n = 5\,\text{kip}") == "phi P n equals 5 kip"


def test_markdown_becomes_blocks():
    """Headings, paragraphs, emphasis, lists, tables, quotations and maths arrive as data; comments vanish."""
    text = '# A "b" #1\n\n<!-- gone -->\nx *y* **z** `c` $a_1$ \\$5\n\n- p\n- q\n\n| h | k |\n|:-|-:|\n| 1 | 2 |\n\n> n\n\n$$E$$\n'
    (made,) = markdown.to_blocks([("cell 1", text)])

    assert [block["kind"] for block in made] == ["heading", "prose", "list", "table", "note", "display"]
    assert made[0]["text"] == ['A "b" #1']
    assert made[1]["runs"] == [
        "x ",
        {"emph": "y"},
        " ",
        {"strong": "z"},
        " ",
        {"code": "c"},
        " ",
        {"math": "a_1"},
        " $5",
    ]
    assert [c["align"] for c in made[3]["columns"]] == ["left", "right"]


def test_links_print_their_target():
    """On paper a link is worth its address."""
    (made,) = markdown.to_blocks([("cell 1", "see [here](https://example.org/a)")])

    assert made[0]["runs"] == ["see here (https://example.org/a)"]


def test_blocks_survive_json():
    """A block is its own description: through JSON and the check it comes back equal."""
    made = [
        blocks.heading(text="a", level=2), blocks.prose(runs=["a", {"math": "b"}]), blocks.note(runs="n"),
        blocks.pagebreak(), blocks.pairs(rows=[["k", "v", ""]]),
        blocks.table(columns=[{"head": "h", "align": "right", "width": 1.5}, {"head": "k"}],
                     rows=[{"cells": ["1", "2"], "strong": True}, {"cells": ["1"], "span_reason": [1, "none"]}]),
        blocks.equation(lines=[{"lhs": "a", "rows": ["b"]}], alt="x", clause="c", note="n"),
        blocks.verdict(lhs="l", text="1 / 2", ratio_text="0.5", ok=True),
        blocks.figure(svg="<svg/>", caption="c", alt="a"),
        blocks.notation(rows=[{"latex": "a", "alt": "a", "meaning": "m", "unit": ""}]),
        blocks.references(rows=[["a", "b"]]), blocks.cautions(rows=["a"]), blocks.identification(rows=[["a", "b"]]),
        blocks.cover(title="T", scope={"checked": ["a"]}, assumptions=[["A1", "a", "b", "open"]]),
    ]  # fmt: skip

    assert {block["kind"] for block in made} == set(blocks.KINDS) - {"meta"}
    for block in json.loads(json.dumps(made)):
        assert blocks.checked(block, "cell 1") == block


def calc_notebook():
    meta = blocks.meta(project="P", mark="H 3/a", title="T", rev="0", rev_date="2026-12-01", by="A", edition="E",
                       method="M", loads="L", status="S")  # fmt: skip
    output = nbformat.v4.new_output("display_data", data=blocks.mimebundle([meta, blocks.heading(text="Only")]))
    cell = nbformat.v4.new_code_cell("x", execution_count=1, outputs=[output], id="c0")
    return nbformat.v4.new_notebook(cells=[cell])


def test_exporter_gives_the_same_pdf():
    """nbconvert's way and the direct call give one PDF, under the extension .pdf."""
    from gageline.sheet.exporter import SheetExporter

    pdf, resources = SheetExporter().from_notebook_node(calc_notebook())

    assert pdf == build_pdf(calc_notebook())
    assert resources["output_extension"] == ".pdf"


def test_own_look_of_a_project(tmp_path):
    """A project's folder with a changed sheet.typ sets the sheet its way."""
    look = (assets.templates_root() / "sheet" / "sheet.typ").read_text(encoding="utf-8")
    (tmp_path / "sheet.typ").write_text(look.replace('"#8a2b1e"', '"#103060"'), encoding="utf-8")

    assert build_pdf(calc_notebook(), sheet_folder=tmp_path) != build_pdf(calc_notebook())


def test_installed_package_finds_its_look(tmp_path):
    """With the layout of an installed wheel, from another folder, the same PDF comes out."""
    package = Path(gageline.__file__).parent
    installed = tmp_path / "site" / "gageline"
    shutil.copytree(package / "sheet", installed / "sheet", ignore=shutil.ignore_patterns("__pycache__"))
    for name in ("__init__.py", "errors.py"):
        shutil.copy(package / name, installed / name)
    shutil.copytree(assets.templates_root() / "sheet", installed / "_templates" / "sheet")
    book = tmp_path / "book.ipynb"
    nbformat.write(calc_notebook(), book)
    code = (
        "import json, sys; from gageline import sheet; from gageline.sheet import assets;"
        "assert '_templates' in str(assets.templates_root());"
        "sheet.write_pdf('out.pdf', sheet.build_pdf(json.load(open('book.ipynb', encoding='utf-8'))))"
    )
    subprocess.run([sys.executable, "-c", code], cwd=tmp_path, env={"PYTHONPATH": str(tmp_path / "site")}, check=True)

    assert (tmp_path / "out.pdf").read_bytes() == build_pdf(calc_notebook())


def test_light_import():
    """Importing the package loads neither typst nor pandoc nor nbconvert nor nbformat."""
    code = "import sys, gageline.sheet; print([m for m in ('typst', 'pypandoc', 'nbconvert', 'nbformat') if m in sys.modules])"
    env = {"PYTHONPATH": str(Path(gageline.__file__).parents[1])}
    out = subprocess.run([sys.executable, "-c", code], env=env, check=True, capture_output=True, text=True)

    assert out.stdout.strip() == "[]"
