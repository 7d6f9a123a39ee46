"""What must stop the press: each fault gives one sentence that names the place, and no PDF."""

import re

import nbformat
import pytest

from gageline import sheet
from gageline.errors import ReportError
from gageline.sheet import blocks as b

META = b.meta(
    project="Gallery (invented)", mark="H3", title="Hanger", rev="0", rev_date="2026-12-01", by="A. Bee",
    edition="AISC 360-22", method="LRFD", loads="ASCE 7-22", status="FOR REVIEW",
)  # fmt: skip
WIDE = r"\frac{" + r" + ".join(rf"a_{{{i}}}\,b_{{{i}}}" for i in range(30)) + "}{c}"


def notebook(*outputs, markdown=None, count=1):
    cells = [nbformat.v4.new_markdown_cell(markdown)] if markdown else []
    cells.append(nbformat.v4.new_code_cell("calc.run()", execution_count=count, outputs=list(outputs)))
    return nbformat.v4.new_notebook(cells=cells)


def shown(*blocks):
    return nbformat.v4.new_output("display_data", data=b.mimebundle(blocks))


def calc(*blocks, meta=META):
    return notebook(shown(meta, b.heading(text="Only"), *blocks))


def eq(row, alt="reading"):
    return {"kind": "equation", "lines": [{"lhs": "R_n", "rows": [row]}], "alt": alt}


def table(*cells, width=1):
    columns = [{"head": f"Column {i}"} for i in range(width)]
    return b.table(columns=columns, rows=[{"cells": list(cells)}])


def error(name="ValueError", value="pitch below 2-2/3 d\nmore"):
    return nbformat.v4.new_output("error", ename=name, evalue=value, traceback=[])


def picture(font):
    svg = f'<svg xmlns="http://www.w3.org/2000/svg" width="9" height="9"><text style="font: 9px \'{font}\'">a</text></svg>'
    return b.figure(svg=svg, caption="c", alt="a")


CASES = {
    "failed cell": (notebook(shown(META), error()), r"cell 1 failed with ValueError: pitch below 2-2/3 d;"),
    "warning on stderr": (
        notebook(shown(META), nbformat.v4.new_output("stream", name="stderr", text="x\nUnitStrippedWarning: y\n")),
        r"cell 1 wrote a warning.*UnitStrippedWarning",
    ),
    "cell not run": (notebook(count=None), r"cell 1 has not been run"),
    "no meta": (notebook(shown(b.heading(text="x"))), r"meta exactly once, this one does 0 times"),
    "two metas": (notebook(shown(META, META)), r"this one does 2 times"),
    "unknown block": (calc({"kind": "tabel"}), r"no block 'tabel' \(cell 1\); nearest are table,"),
    "unknown field": (calc({"kind": "heading", "txt": "a"}), r"heading in cell 1 has no field 'txt'; nearest are text"),
    "missing field": (
        calc({"kind": "figure", "svg": "<svg/>", "caption": ""}),
        r"figure in cell 1 lacks its field 'alt'",
    ),
    "not a block": (calc("text"), r"sheet block in cell 1 is not a mapping"),
    "no alt": (calc(eq("a", alt=" ")), r"In cell 1: equation.alt must be a text that is not empty"),
    "row of a table": (
        calc({"kind": "table", "columns": [{"head": "a"}], "rows": [{"cells": ["1", "2"]}]}),
        r"has 2 cells where 1 belong",
    ),
    "bad date": (calc(meta=META | {"rev_date": "1 Dec 2026"}), r"rev_date must be a date like 2026-12-01"),
    "bad paper": (calc(meta=META | {"paper": "letter"}), r"paper must be one of us-letter, a4"),
    "late cover": (calc(b.cover(title="T")), r"cover must stand once, before everything else"),
    "heading jump": (calc(b.heading(text="Deep", level=3)), r"'Deep' in cell 1 is of level 3 right after level 1"),
    "unreadable maths": (calc(eq(r"\frac{a}{")), r"The maths '\\\\frac\{a\}\{' cannot be read"),
    "tag in maths": (calc(eq(r"a \tag{D2-1}")), r"uses \\tag, which a sheet cannot print"),
    "colour in maths": (calc(eq(r"\color{red} a")), r"uses \\color"),
    "alignment in a row": (calc(eq(r"a &= b \\ c")), r"holds an alignment or a line break"),
    "unknown command": (calc(eq(r"\foobar a")), r"cannot be read"),
    "maths in markdown": (notebook(shown(META), markdown=r"see $\frac{a}{b$ x"), r"cell 1 would print '\\\\frac'"),
    "wide equation": (calc(eq(WIDE, alt="a long sum")), r"equation in cell 1 is wider than the sheet.*: a long sum"),
    "wide table": (
        calc(table(*["incompressible-word"] * 12, width=12)),
        r"table in cell 1 is wider than the sheet even in its smallest type",
    ),
    "wide display": (
        notebook(shown(META), markdown=f"# A\n\n$${WIDE}$$"),
        r"formula in cell 1 is wider than the sheet",
    ),
    "sign no font has": (
        calc(meta=META | {"project": "橋 (invented)"}),
        r"no sign for '橋' in project \('橋 \(invented\)'\)",
    ),
    "sign in a block": (calc(b.prose(runs="see 図 3")), r"no sign for '図' in cell 1"),
    "font of a picture": (calc(picture("DejaVu Sans")), r"picture in cell 1 asks for the font 'DejaVu Sans'"),
    "long word": (calc(b.prose(runs="x" * 90)), r"word of 90 characters in cell 1 fits no line"),
    "long project": (
        calc(meta=META | {"project": "Donaudampfschifffahrtsgesellschaft"}),
        r"project .* does not fit its place",
    ),
    "long status": (calc(meta=META | {"status": "for review " * 9}), r"status .* does not fit its place"),
    "nan in a table": (calc(table("nan kip")), r"printed value in cell 1 holds 'nan'"),
    "inf in a verdict": (calc(b.verdict(lhs="x", ratio_text="inf", ok=False)), r"holds 'inf'"),
    "bool as a value": (calc(table("True")), r"holds 'True'"),
    "raw unit": (calc(b.pairs(rows=[["F", "50 kip_per_square_inch", ""]])), r"holds 'kip_per_square_inch'"),
    "unit-less word": (calc(table("0.9 dimensionless")), r"holds 'dimensionless'"),
    "nan in maths": (calc(eq(r"\mathrm{nan}\,\text{kip}")), r"would print 'nan'"),
    "bool in maths": (calc(eq("True")), r"would print 'T r u e'"),
    "raw html": (notebook(shown(META), markdown="<div>a</div>"), r"markdown of cell 1 holds raw HTML"),
    "picture in markdown": (notebook(shown(META), markdown="![a](b.png)"), r"holds a picture \(use a figure block\)"),
    "open fence": (
        nbformat.v4.new_notebook(cells=[nbformat.v4.new_markdown_cell("```\nx"), nbformat.v4.new_markdown_cell("y")]),
        r"leaves a code fence open",
    ),
    "attachments of one name": (
        calc(meta=META | {"attachments": [{"name": "H3.ipynb", "mime": "a/b", "text": "", "description": "d"}]}),
        r"Two attachments have one name",
    ),
}


@pytest.mark.parametrize("case", CASES)
def test_fault_stops_with_one_sentence(case):
    """A fault raises ReportError whose message names what and where, on one line."""
    book, pattern = CASES[case]

    with pytest.raises(ReportError) as caught:
        sheet.build_pdf(book)
    message = str(caught.value)
    assert re.search(pattern, message), message
    assert "\n" not in message


@pytest.mark.parametrize(
    "text",
    [
        "inf. note",
        "Nan Inc.",
        "as stated: True",
        "C:\\temp\\new_per_day",
        "a ** b",
        "Ünïcode Ščř",
        "Ψ ω Ελλ",
        "Дом Ж",
        "“q” ’ – — … × ≤ ½",
    ],
)
def test_innocent_text_prints(text):
    """What only looks like a tell-tale, in a place where users write, does not stop the press; Latin, Greek, Cyrillic print."""
    book = calc(b.prose(runs=text), b.pairs(rows=[["key", "value", text]]), meta=META | {"title": text})

    assert sheet.build_pdf(book).startswith(b"%PDF-")


def test_long_equation_is_broken_not_clipped():
    """A row too long for the line is continued on the next one where it is a sum, a product or a least of several."""
    total = " + ".join(rf"{i}.25\,\text{{kip}}\cdot a_{{{i}}}" for i in range(12))
    product = r" \cdot ".join(rf"{i}.375\,\text{{in}}" for i in range(16))
    least = rf"\min\left({total}, {product}\right)"

    for row in (total, product, least):
        assert sheet.build_pdf(calc(eq(row))).startswith(b"%PDF-")


def test_written_whole_or_not_at_all(tmp_path):
    """write_pdf replaces a file in one step, leaves nothing else behind, and refuses a folder that is not there."""
    path = tmp_path / "H3.pdf"
    sheet.write_pdf(path, b"old")
    sheet.write_pdf(path, b"new")
    assert path.read_bytes() == b"new"
    assert [p.name for p in tmp_path.iterdir()] == ["H3.pdf"]

    for target in (tmp_path / "missing" / "H3.pdf", path / "inside.pdf"):
        with pytest.raises(ReportError, match="cannot be written to"):
            sheet.write_pdf(target, b"x")
    assert path.read_bytes() == b"new"


def test_failed_replacement_keeps_the_old_file(tmp_path, monkeypatch):
    """When the disk fails before the last step, the old file stands and no part is left."""
    path = tmp_path / "H3.pdf"
    sheet.write_pdf(path, b"old")

    def full(*_):
        raise OSError(28, "No space left on device")

    monkeypatch.setattr("os.fsync", full)
    with pytest.raises(ReportError, match="no space left on device"):
        sheet.write_pdf(path, b"new")
    assert path.read_bytes() == b"old"
    assert [p.name for p in tmp_path.iterdir()] == ["H3.pdf"]


def test_folder_without_a_look(tmp_path):
    """A project's own folder must hold a sheet.typ."""
    with pytest.raises(ReportError, match="holds no sheet"):
        sheet.build_pdf(calc(), sheet_folder=tmp_path)
