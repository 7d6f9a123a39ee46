"""A whole calculation with every kind of block, set once and read back: text, structure, attachments, bytes."""

import io
import re

import nbformat
import pikepdf
import pytest

from gageline import sheet
from gageline.sheet import blocks as b

HOSTILE = 'Tie #3 $x$ \\alpha @ref <b> "q" 50% & ~a_b* `c` [d] {e} // -- é Ω Ж'
NOTES = '{"inputs": {"P_L": "31 kip # dwg \\"S-201\\""}}\n'


def picture(label, width=420, height=170):
    return (
        f'<svg xmlns="http://www.w3.org/2000/svg" width="{width}" height="{height}" viewBox="0 0 {width} {height}">'
        '<rect x="60" y="40" width="260" height="90" fill="#e9e6df" stroke="#1b1b1b"/>'
        '<rect x="200" y="20" width="190" height="130" fill="none" stroke="#1b1b1b"/>'
        + "".join(
            f'<circle cx="{x}" cy="{y}" r="6" fill="white" stroke="#1b1b1b"/>'
            for x in (220, 255, 290)
            for y in (60, 110)
        )
        + f'<text x="70" y="88" style="font: 11px \'Libertinus Serif\'">{label} ϕPₙ 1½</text></svg>'
    )


def line(lhs, *rows):
    return {"lhs": lhs, "rows": list(rows)}


def eq(lhs, *rows, clause, alt):
    return b.equation(lines=[line(lhs, *rows)], clause=clause, alt=alt)


def k(value, digits=1):
    return rf"{value:.{digits}f}\,\text{{kip}}"


META = b.meta(
    project="Conveyor gallery G2 (invented)", client="Example Aggregates (invented)", location="Nowhere, MN",
    job="26-014", mark="H3", title="Gallery hanger, bolted tee", rev="1", rev_date="2026-12-01", by="A. Bee",
    by_date="2026-11-28", checked="C. Dee", checked_date="2026-12-01", status="FOR REVIEW, NOT FOR CONSTRUCTION",
    firm="Example Firm, Consulting Engineers", edition="AISC 360-22", method="LRFD", loads="ASCE 7-22",
    attachments=[{"name": "inputs.json", "mime": "application/json", "text": NOTES, "description": "Inputs as read"}],
    identification=[["program", "gageline 0.0"], ["inputs, SHA-256", "9f86d081884c7d659a2feaa0c55ad015a3bf4f1b2b0b822cd15d6c15b0f00a08"]],
)  # fmt: skip

COVER = b.cover(
    title="Calculation H3",
    governing="Bolt group in shear, bearing and tearout (J3.7, J3.11): 178 kip / 195 kip = 0.912, OK",
    purpose="Strength of the bolted end connection of hanger H3 (WT7×26.5, bolted through its flange to a single gusset "
    "plate) under the governing load combination, and the shortest connection that carries it.",
    criteria=[
        ["Specification", "AISC 360-22, LRFD"], ["Loads", "ASCE 7-22, combinations of Section 2.3"],
        ["Member", "WT7×26.5, ASTM A992"], ["Plate", "PL 5/8 × 9, ASTM A572 Gr. 50"],
        ["Bolts", "3/4 in. Group 120, threads included, snug tight, STD holes"],
    ],
    scope={
        "checked": ["member gross yielding and net rupture", "block shear of member and plate",
                    "bolt shear, bearing and tearout", "plate yielding and rupture on the Whitmore width"],
        "not_applicable": [["slip", "joint designed in bearing, no reversal"]],
        "by_others": ["weld of the gusset to the beam", "hanger above the upper pin"],
    },
    assumptions=[["A1", "Hanger carries tension only", "dwg S-201, note 4", "closed"],
                 ["A2", "Dead load of cladding 12 psf", "e-mail of supplier", "open"]],
    open_items=["A2: confirm the dead load of the cladding before release."],
    cautions=["The sheet holds for static loading; fatigue is not examined."],
    revisions=[["0", "2026-11-10", "First issue", "A.B.", "C.D.", ""],
               ["1", "2026-12-01", "Load of walkway raised from 28 to 31 kip", "A.B.", "C.D.", ""]],
)  # fmt: skip


def summary():
    columns = [{"head": "Check"}, {"head": "Clause"}] + [
        {"head": head, "align": "right"} for head in ("Required, kip", "Available, kip", "D/C")
    ]
    rows = [
        {
            "cells": ["Bolt group: shear, bearing, tearout (governs)", "J3.7, J3.11", "178", "195", "0.912"],
            "strong": True,
        },
        {"cells": ["Plate, block shear through both lines", "J4.3", "178", "231", "0.771"]},
        {"cells": ["Member, net rupture, chain 1–2", "D2(b)", "178", "450", "0.395"]},
        {"cells": ["Member, gross yielding", "D2(a)", "178", "351", "0.507"]},
        {"cells": ["Slip", "J3.9"], "span_reason": [2, "not applicable: joint designed in bearing, no reversal"]},
    ]
    return b.table(columns=columns, rows=rows, caption="Every limit state on the load path, governing first")


def bolt_table(count):
    heads = ("Bolt", "x, in.", "y, in.", "Shear, kip", "Bearing, member, kip", "Tearout, member, kip",
             "Bearing, plate, kip", "Tearout, plate, kip", "Least, kip", "Mode")  # fmt: skip
    columns = [{"head": h, "align": "left" if h in ("Bolt", "Mode") else "right"} for h in heads]
    rows = []
    for i in range(count):
        x, y = 1.5 + 3 * (i // 2), (2.75, 8.25)[i % 2]
        cells = [
            str(i + 1),
            f"{x:.2f}",
            f"{y:.2f}",
            "24.4",
            "57.9",
            "35.9" if i < 2 else "82.1",
            "54.8",
            "40.2",
            "24.4",
        ]
        rows.append({"cells": [*cells, "bolt shear"], "strong": i == 0})
    return b.table(columns=columns, rows=rows, caption="Nominal strength of each bolt; every ply, every mode")


def equations():
    yield eq("U_2", r"1 - \frac{\bar{x}}{l}", r"1 - \frac{1.38\,\text{in}}{9.00\,\text{in}}", "0.847",
             clause="Table D3.1, Case 2", alt="U 2 equals 1 minus x bar over l; the result is 0.847.")  # fmt: skip
    yield eq("U_7", "0.90", clause="Table D3.1, Case 7", alt="U 7 is 0.90.")
    yield eq(r"U_{lb}", r"\frac{b_f\,t_f}{A_g}", r"\frac{8.06\,\text{in}\cdot 0.660\,\text{in}}{7.80\,\text{in}^{2}}",
             "0.682", clause="D3", alt="The lower bound of U equals b f times t f over A g, 0.682.")  # fmt: skip
    yield b.equation(
        lines=[line("U", r"\max\left(U_2, U_7, U_{lb}\right)", r"\max\left(0.847, 0.90, 0.682\right)", "0.900")],
        clause="D3", note="larger value permitted", alt="U is the greatest of the three, 0.900.",
    )  # fmt: skip
    yield eq("A_n", r"A_g - n\,d_n\,t_f", r"7.80\,\text{in}^{2} - 2\cdot 0.875\,\text{in}\cdot 0.660\,\text{in}",
             r"6.645\,\text{in}^{2}", clause="B4.3b", alt="A n equals A g minus n times d n times t f, 6.645 square inches.")  # fmt: skip
    yield eq("A_n", r"A_g - n\,d_n\,t_f + \sum \frac{s^{2}\,t_f}{4\,g}",
             r"7.80\,\text{in}^{2} - 3\cdot 0.875\,\text{in}\cdot 0.660\,\text{in}"
             r" + \frac{\left(1.50\,\text{in}\right)^{2}\cdot 0.660\,\text{in}}{4\cdot 5.50\,\text{in}}",
             r"6.135\,\text{in}^{2}", clause="B4.3b", alt="A n of the zigzag chain, 6.135 square inches.")  # fmt: skip
    yield eq("A_e", r"U\,A_n", r"0.900\cdot 6.645\,\text{in}^{2}", r"5.981\,\text{in}^{2}", clause="Eq. D3-1",
             alt="A e equals U times A n, 5.981 square inches.")  # fmt: skip
    yield eq("P_n", r"F_u\,A_e", r"65.0\,\text{ksi}\cdot 5.981\,\text{in}^{2}", k(388.8), clause="Eq. D2-2",
             alt="P n equals F u times A e, 388.8 kips.")  # fmt: skip


def block_shear(what):
    yield eq("A_{gv}", r"n_l\,L_{gv}\,t", r"2\cdot 10.50\,\text{in}\cdot 0.625\,\text{in}", r"13.13\,\text{in}^{2}",
             clause="J4.3", alt=f"Gross shear area of the {what}, 13.13 square inches.")  # fmt: skip
    yield eq("A_{nv}", r"n_l\left(L_{gv} - n_h\,d_n\right) t",
             r"2\cdot\left(10.50\,\text{in} - 3.5\cdot 0.875\,\text{in}\right)\cdot 0.625\,\text{in}", r"9.297\,\text{in}^{2}",
             clause="J4.3", alt=f"Net shear area of the {what}, 9.297 square inches.")  # fmt: skip
    yield eq("A_{nt}", r"\left(g - d_n\right) t", r"\left(5.50\,\text{in} - 0.875\,\text{in}\right)\cdot 0.625\,\text{in}",
             r"2.891\,\text{in}^{2}", clause="J4.3", alt=f"Net tension area of the {what}, 2.891 square inches.")  # fmt: skip
    yield eq("R_n", r"\min\left(0.60\,F_u\,A_{nv} + U_{bs}\,F_u\,A_{nt}, 0.60\,F_y\,A_{gv} + U_{bs}\,F_u\,A_{nt}\right)",
             r"\min\left(0.60\cdot 65.0\,\text{ksi}\cdot 9.297\,\text{in}^{2} + 1.0\cdot 65.0\,\text{ksi}\cdot 2.891\,\text{in}^{2},"
             r" 0.60\cdot 50.0\,\text{ksi}\cdot 13.13\,\text{in}^{2} + 1.0\cdot 65.0\,\text{ksi}\cdot 2.891\,\text{in}^{2}\right)",
             k(550.5), clause="Eq. J4-5",
             alt=f"Block shear of the {what}: R n is the least of rupture and yielding in shear, each with tension rupture, 550.5 kips.")  # fmt: skip


def bolts():
    yield eq("l_c", r"l_e - \frac{d_h}{2}", r"1.50\,\text{in} - \frac{0.8125\,\text{in}}{2}", r"1.094\,\text{in}",
             clause="J3.11", alt="Clear distance, 1.094 inches.")  # fmt: skip
    yield eq("r_n", r"F_{nv}\,A_b", r"54.0\,\text{ksi}\cdot 0.442\,\text{in}^{2}", k(23.9), clause="Eq. J3-1",
             alt="Shear strength of a bolt, 23.9 kips.")  # fmt: skip
    yield eq("r_n", r"2.4\,d_b\,t\,F_u", r"2.4\cdot 0.750\,\text{in}\cdot 0.625\,\text{in}\cdot 65.0\,\text{ksi}", k(73.1),
             clause="Eq. J3-6a", alt="Bearing strength, 73.1 kips.")  # fmt: skip
    yield eq("r_n", r"1.2\,l_c\,t\,F_u", r"1.2\cdot 1.094\,\text{in}\cdot 0.625\,\text{in}\cdot 65.0\,\text{ksi}", k(53.3),
             clause="Eq. J3-6c", alt="Tearout strength, 53.3 kips.")  # fmt: skip
    yield eq("R_n", r"\sum r_n", r"8\cdot 23.9\,\text{kip}", k(191.2), clause="J3.7, user note",
             alt="Sum over the bolts, 191.2 kips.")  # fmt: skip
    yield eq("w", r"g + 2\,l\tan 30^{\circ}", r"5.50\,\text{in} + 2\cdot 9.00\,\text{in}\cdot 0.5774", r"15.89\,\text{in}",
             clause="Whitmore", alt="Whitmore width, 15.89 inches.")  # fmt: skip
    yield eq("r", r"\sqrt{\frac{I}{A_g}}", r"\sqrt{\frac{10.4\,\text{in}^{4}}{7.80\,\text{in}^{2}}}", r"1.155\,\text{in}",
             clause="", alt="Radius of gyration, 1.155 inches.")  # fmt: skip
    yield b.equation(
        lines=[line("F_e", r"\frac{\pi^{2}\,E}{\left(\frac{L_c}{r}\right)^{2}}",
                    r"\frac{\pi^{2}\cdot 29{,}000\,\text{ksi}}{\left(33.3\right)^{2}}", r"258\,\text{ksi}"),
               line("F_n", r"0.658^{\frac{F_y}{F_e}}\,F_y", r"0.658^{0.194}\cdot 50.0\,\text{ksi}", r"46.1\,\text{ksi}")],
        clause="E3", alt="F e is 258 ksi; F n is 46.1 ksi.",
    )  # fmt: skip


def content(svg=None):
    svg = svg or (picture("Elevation"), picture("Curve"))
    math = {"math": r"b_f \geq \frac{2}{3}\,d", "alt": "b f at least two thirds of d"}
    yield "code", [META, COVER]
    yield "code", [b.heading(text="Summary"), summary()]
    yield "code", [
        b.heading(text="Inputs"),
        b.pairs(rows=[["Live load of the walkway", [{"math": "P_L"}, " = 31 kip"], "dwg S-201, hanger schedule"],
                      ["Member", "WT7×26.5", "dwg S-201"], ["Remark as typed", HOSTILE, "test of the sheet"]]),
        b.heading(text="Connection"),
        b.figure(svg=svg[0], caption=["Elevation on the flange, to scale. Shaded: governing tear-out block of the member, ", {"math": "A_{nt}"},
                 ". Dimensions in inches."], alt="Elevation of the bolted tee with eight bolts", width=0.9),
    ]  # fmt: skip
    yield (
        "markdown",
        (
            "# Member: net section\n\nThe flange is bolted and the *stem* is **not** connected; see `S-201`. With "
            "$b_f \\ge \\frac{2}{3} d$ two cases apply:\n\n- Case 2, any shape;\n- Case 7, flange connected.\n\n"
            "| Case | U |\n|:--|--:|\n| 2 | 0.847 |\n| 7 | 0.90 |\n\n$$U = 1 - \\frac{\\bar{x}}{l}$$\n\n> Costs \\$5 each, #1.\n"
        ),
    )
    yield "code", [
        b.heading(text="Shear lag", level=2),
        b.prose(runs=["Flange bolted, stem not connected: Case 2 applies; Case 7 applies too, since ", math,
                      ". The larger value is permitted."]),
        *equations(),
        b.verdict(lhs=[{"math": r"\phi P_n = 0.75\cdot 388.8\,\text{kip} = 291.6\,\text{kip}"}], text="178 / 291.6", ratio_text="0.611", ok=True),
    ]  # fmt: skip
    yield "code", [
        b.heading(text="Block shear"), b.heading(text="Member", level=2), *block_shear("member"),
        b.verdict(lhs=[{"math": r"\phi R_n = 0.75\cdot 550.5\,\text{kip} = 412.9\,\text{kip}"}], text="178 / 412.9", ratio_text="0.432", ok=True),
        b.heading(text="Plate", level=2), *block_shear("plate"),
        b.verdict(lhs=[{"math": r"\phi R_n = 0.75\cdot 225.0\,\text{kip} = 168.8\,\text{kip}"}], text="178 / 168.8", ratio_text="1.055", ok=False),
        b.note(runs="Every block is enumerated from the hole pattern; the one shown governs."),
    ]  # fmt: skip
    yield "code", [
        b.heading(text="Bolts"), *bolts(), bolt_table(8), b.verdict(lhs=["Slenderness, advisory"], ratio_text="0.87", ok=None),
        b.heading(text="Capacity against connection length"),
        b.figure(svg=svg[1], caption="Strength of each limit state against connection length; heavy line: the least of them.",
                 alt="Curve of capacity against length", width=1.0),
        b.pagebreak(),
        b.heading(text="Notation"),
        b.notation(rows=[{"latex": latex, "alt": latex.replace("_", " "), "meaning": meaning, "unit": unit}
                         for latex, meaning, unit in (("A_g", "gross area", "in²"), ("A_n", "net area", "in²"), ("F_u", "tensile strength", "ksi"),
                         (r"\phi", "resistance factor", ""), (r"\bar{x}", "distance from centroid to shear plane", "in"),
                         ("l", "length of connection", "in"),
                         ("P_n", "nominal axial strength", "kip"), ("r_n", "nominal strength of one bolt", "kip"), ("t_f", "flange thickness", "in"),
                         ("U", "shear lag factor", ""), ("U_{bs}", "stress distribution factor of block shear", ""), ("F_y", "yield stress", "ksi"),
                         ("d_b", "nominal bolt diameter", "in"), ("A_{gv}", "gross area subject to shear", "in²"))]),
        b.heading(text="References"),
        b.references(rows=[["AISC 360-22", "Specification for Structural Steel Buildings, ANSI/AISC 360-22, August 1, 2022."],
                           ["ASCE 7-22", "Minimum Design Loads and Associated Criteria for Buildings and Other Structures, ASCE/SEI 7-22."]]),
        b.heading(text="Cautions"),
        b.cautions(rows=["Holds for static loading.", ["Eccentricity of the tee is not examined beyond ", {"math": "U"}, "."]]),
    ]  # fmt: skip


def notebook(parts):
    book = nbformat.v4.new_notebook()
    for kind, what in parts:
        if kind == "markdown":
            book.cells.append(nbformat.v4.new_markdown_cell(what, id=f"c{len(book.cells)}"))
            continue
        output = nbformat.v4.new_output("display_data", data={**b.mimebundle(what), "text/plain": "never printed"})
        talk = nbformat.v4.new_output("stream", name="stdout", text="stdout is never printed\n")
        cell = nbformat.v4.new_code_cell("secret_code()", execution_count=len(book.cells) + 1, outputs=[talk, output])
        cell.id = f"c{len(book.cells)}"
        book.cells.append(cell)
    return book


EXPECTED_OUTLINE = [
    "1 Summary", "2 Inputs", "3 Connection", "4 Member: net section", "4.1 Shear lag", "5 Block shear", "5.1 Member",
    "5.2 Plate", "6 Bolts", "7 Capacity against connection length", "8 Notation", "9 References", "10 Cautions",
    "11 Program identification",
]  # fmt: skip


@pytest.fixture(scope="module")
def pdf():
    return sheet.build_pdf(notebook(content()))


@pytest.fixture(scope="module")
def opened(pdf):
    return pikepdf.open(io.BytesIO(pdf))


@pytest.fixture(scope="module")
def pages(pdf):
    import pypdf

    return [page.extract_text() for page in pypdf.PdfReader(io.BytesIO(pdf)).pages]


def squeezed(text):
    """Text without spaces, mathematical letters as plain ones: extraction is free to place blanks as it likes."""
    import unicodedata

    return re.sub(r"\s+", "", unicodedata.normalize("NFKC", text))


def tagged(node):
    """Yield the structure elements of a PDF below node."""
    if isinstance(node, pikepdf.Array):
        for kid in node:
            yield from tagged(kid)
    elif isinstance(node, pikepdf.Dictionary):
        if "/S" in node:
            yield node
        if "/K" in node:
            yield from tagged(node.K)


def test_every_text_prints_as_typed(pages):
    """Whatever a user types stands in the PDF sign by sign; what belongs to code does not."""
    printed = squeezed("".join(pages))
    for text in (HOSTILE, "WT7×26.5", "dwg S-201, hanger schedule", "larger value permitted", "Table D3.1, Case 2",
                 "not applicable: joint designed in bearing, no reversal", "bolt shear", "Nowhere, MN", "Costs $5 each, #1.",
                 "OPEN ITEMS, TO BE CLOSED BEFORE RELEASE: 1", "A2: confirm the dead load of the cladding before release.",
                 "Load of walkway raised from 28 to 31 kip", "ϕPₙ 1½", "Example Firm, Consulting Engineers"):  # fmt: skip
        assert squeezed(text) in printed, text
    for text in ("secret_code", "neverprinted", "execution_count"):
        assert text not in printed


def test_equations_read_in_order(pages):
    """Symbols, numbers and result of a calculation are readable text, the left-hand side included."""
    printed = squeezed("".join(pages))

    assert "Pn=FuAe=65.0ksi⋅5.981in2=388.8kip" in printed
    assert "Rn=min(0.60FuAnv+UbsFuAnt,0.60FyAgv+UbsFuAnt)" in printed
    assert "ϕPn=0.75⋅388.8kip=291.6kip" in printed.replace("φ", "ϕ")


def test_verdicts_are_words(pages):
    """D/C, OK and N.G. are printed as text, so that meaning never hangs on colour."""
    printed = squeezed("".join(pages))

    assert "D/C=178/291.6=0.611OK" in printed
    assert "D/C=178/168.8=1.055N.G." in printed
    assert "Slenderness,advisoryD/C=0.87" in printed
    assert "Slenderness,advisoryD/C=0.87OK" not in printed


def test_each_sheet_is_numbered_and_identified(pages):
    """Every sheet carries sheet x of y, project, mark, revision with date, status and edition."""
    total = len(pages)
    assert 5 <= total <= 8
    for number, page in enumerate(pages, start=1):
        text = squeezed(page)
        for part in (f"Sheet{number}of{total}", "ConveyorgalleryG2(invented)", "H3", "2026-12-01",
                     "FORREVIEW,NOTFORCONSTRUCTION", "AISC360-22·LRFD·ASCE7-22"):  # fmt: skip
            assert part in text, (number, part)


def test_bookmarks_are_the_numbered_headings(opened):
    """The outline of the PDF holds each numbered heading, nested by level, and nothing of the cover."""
    with opened.open_outline() as outline:
        titles = [t for item in outline.root for t in (item.title, *(kid.title for kid in item.children))]

    assert titles == EXPECTED_OUTLINE


def test_record_of_the_pdf(opened):
    """Title, author, subject, keywords and language are those of the title block; the PDF claims A-3a and UA-1."""
    info, xmp = opened.docinfo, opened.Root.Metadata.read_bytes().decode()

    assert str(info["/Title"]) == "Calculation 26-014 H3: Gallery hanger, bolted tee"
    assert "A. Bee" in str(info["/Author"]) and "AISC 360-22" in str(info["/Subject"])
    assert "revision 1" in str(info["/Keywords"])
    assert str(info["/CreationDate"]).startswith("D:20261201")
    assert str(opened.Root.Lang) == "en-US"
    assert bool(opened.Root.ViewerPreferences.DisplayDocTitle) and bool(opened.Root.MarkInfo.Marked)
    assert "<pdfaid:part>3<" in xmp and "<pdfaid:conformance>A<" in xmp and "<pdfuaid:part>1<" in xmp


def test_every_formula_and_figure_has_alt_text(opened):
    """No formula and no figure of the structure tree is without a reading; those given by the calc are kept."""
    elements = list(tagged(opened.Root.StructTreeRoot))
    formulas = [str(e.get("/Alt", "")) for e in elements if e.S == "/Formula"]
    figures = [str(e.get("/Alt", "")) for e in elements if e.S == "/Figure"]
    given = [
        block["alt"] for _, what in content() if isinstance(what, list) for block in what if block["kind"] == "equation"
    ]

    assert len(given) == 24
    assert all(formulas) and all(figures) and len(figures) == 2
    assert sorted(f for f in formulas if f in given) == sorted(given)
    assert "b f at least two thirds of d" in formulas
    assert any("Elevation of the bolted tee" in f for f in figures)


def test_tables_have_tagged_heads(opened):
    """Header rows are tagged as such, so that a screen reader can name the column of a cell."""
    heads = [e for e in tagged(opened.Root.StructTreeRoot) if e.S == "/TH"]

    assert len(heads) >= 10 + 5 + 2


def test_fonts_are_embedded(opened):
    """Nothing but the fonts of the Typst wheel is used, and each is in the file."""
    names = set()
    for obj in opened.objects:
        if isinstance(obj, pikepdf.Dictionary) and obj.get("/Type") == "/FontDescriptor":
            names.add(str(obj.FontName).split("+")[-1])
            assert any(key in obj for key in ("/FontFile", "/FontFile2", "/FontFile3"))

    assert names and all(re.match(r"/?(LibertinusSerif|NewCM|NewComputerModern|DejaVuSansMono)", n) for n in names), (
        names
    )


def test_attachments_come_back_unchanged(opened):
    """The attached files are those given, byte by byte, and the notebook's source, which opens as a notebook."""
    files = {name: spec.get_file().read_bytes() for name, spec in opened.attachments.items()}

    assert set(files) == {"H3.ipynb", "inputs.json"}
    assert files["inputs.json"] == NOTES.encode()
    book = nbformat.reads(files["H3.ipynb"].decode(), as_version=4)
    nbformat.validate(book)
    assert [c.source for c in book.cells] == [c.source for c in notebook(content()).cells]
    assert not any(c.get("outputs") for c in book.cells)


def test_no_trace_of_a_broken_line(pages):
    """No leftover of LaTeX, of a unit registry or of a failed computation reaches the paper."""
    printed = "\n".join(pages).replace("\\alpha", "")

    assert not re.search(
        r"\\[a-zA-Z]{2,}|_per_|\bnan\b|\binf\b| \*\* |dimensionless|\bTrue\b|\bFalse\b|upright|dot\.op", printed
    )


def test_same_notebook_same_bytes(pdf):
    """Run times, execution counts and a second setting leave the bytes as they are; another input does not."""
    again = notebook(content())
    again.metadata["papermill"] = {"start_time": "2031-01-01T00:00:00"}
    for cell in again.cells:
        cell.metadata["execution"] = {"iopub.execute_input": "2031-01-01T00:00:00"}
        if cell.cell_type == "code":
            cell.execution_count += 7
    assert sheet.build_pdf(again) == pdf

    again.cells[0].source = "other_code()"
    assert sheet.build_pdf(again) != pdf


def test_long_table_repeats_its_head():
    """A table that runs over several sheets carries its head on each of them."""
    import pypdf

    made = sheet.build_pdf(notebook([("code", [META, b.heading(text="Bolts"), bolt_table(120)])]))
    texts = [squeezed(page.extract_text()) for page in pypdf.PdfReader(io.BytesIO(made)).pages]

    held = [t for t in texts if "boltshear" in t]
    assert len(held) >= 3
    assert all("Boltx,in." in t and "Tearout,plate,kip" in t for t in held)


def test_paper_and_missing_cover():
    """A4 is A4, and without a cover sheet 1 has the head of every sheet."""
    made = sheet.build_pdf(
        notebook([("code", [META | {"paper": "a4"}, b.heading(text="Only"), b.prose(runs="Text.")])])
    )
    opened = pikepdf.open(io.BytesIO(made))

    assert [round(float(v)) for v in opened.pages[0].mediabox] == [0, 0, 595, 842]
