"""The workbook and the summary read back: heads, formats, what is refused to be a formula, and every mark worst first."""

import io

import openpyxl
import pikepdf
import pytest

from gageline.schedule import run, summary, workbook

from .conftest import sample_rows, write_csv

HEADS, ROWS = sample_rows()
EVIL = "=HYPERLINK(\"http://x\",\"y\")"


@pytest.fixture(scope="module")
def found(tmp_path_factory):
    """Return a checked outcome of the sample with some rows made bad, one of them with a formula for a mark."""
    import shutil

    from .conftest import DEMO

    folder = tmp_path_factory.mktemp("book") / "calcs" / "job"
    folder.mkdir(parents=True)
    shutil.copyfile(DEMO / "project.toml", folder / "project.toml")
    lines = [dict(row) for row in ROWS[:30]]
    lines[3] |= {"mark": EVIL}
    lines[4] |= {"member": "@SUM(1+1)"}
    lines[5] |= {"source": "+41 dwg\x0b 7"}
    return run.check(write_csv(folder / "ties.csv", HEADS, lines))


@pytest.fixture(scope="module")
def book(found):
    return openpyxl.load_workbook(io.BytesIO(workbook.made(found)))


class TestWorkbook:
    def test_sheets_with_frozen_heads_and_filters(self, book):
        assert book.sheetnames == ["Results", "Checks", "Inputs", "Errors", "About"]
        for sheet in book:
            assert sheet.freeze_panes == "B2" and sheet.auto_filter.ref.startswith("A1:") and sheet["A1"].font.bold

    def test_results_are_those_of_the_marks_worst_first(self, book, found):
        rows = list(book["Results"].iter_rows(min_row=2, values_only=True))
        by_mark = {mark.mark: mark.results for mark in found.marks}

        assert len(rows) == 28
        verdicts = [(row[8] == "OK", -row[7]) for row in rows]
        assert verdicts == sorted(verdicts)
        for row in rows:
            assert row[7] == pytest.approx(by_mark[row[0]]["ratio"], abs=0.0011)
            assert row[11] == pytest.approx(by_mark[row[0]]["capacity"], rel=1e-12)
            assert (row[7] > 1) == (by_mark[row[0]]["ratio"] > 1)

    def test_number_formats(self, book):
        sheet = book["Results"]

        assert [sheet.cell(2, i).number_format for i in (6, 7, 8, 12)] == ["0.0", "0.0", "0.000", "0.0"]
        assert all(isinstance(sheet.cell(2, i).value, (int, float)) for i in (6, 7, 8))

    def test_no_cell_is_a_formula(self, book):
        """What a spreadsheet could compute is stored as text, and stays text where it is edited."""
        cells = [cell for sheet in book for line in sheet.iter_rows() for cell in line]

        assert not [cell.coordinate for cell in cells if cell.data_type == "f"]
        risky = [cell for cell in cells if isinstance(cell.value, str) and cell.value[:1] in "=+-@" and cell.value]
        assert {cell.value for cell in risky} >= {EVIL, "+41 dwg 7"}
        assert all(cell.quotePrefix for cell in risky)

    def test_errors_by_row_column_and_sentence(self, book):
        rows = list(book["Errors"].iter_rows(min_row=2, values_only=True))

        assert [(row[0], row[2]) for row in rows] == [(5, "A (mark)"), (6, "H (member)")]

    def test_defaults_are_told_from_what_was_given(self, book, found):
        rows = [row for row in book["Inputs"].iter_rows(min_row=2, values_only=True) if row[0] == found.marks[0].mark]

        assert {row[1] for row in rows if row[4] == "template's default"} == set(found.marks[0].defaults)

    def test_same_outcome_same_bytes(self, found):
        assert workbook.made(found) == workbook.made(found)


class TestSummary:
    def test_every_mark_worst_first_and_every_error(self, found):
        pypdf = pytest.importorskip("pypdf")
        data = summary.made(found)
        text = "\n".join(page.extract_text() for page in pypdf.PdfReader(io.BytesIO(data)).pages)
        places = [text.index(f"\n{mark.mark} ") if f"\n{mark.mark} " in text else text.index(mark.mark) for mark in found.good[2:]]

        assert places == sorted(places)
        assert "Errors: rows that were not made" in text and "B2(member)" not in text
        assert summary.made(found) == data

    def test_data_travel_along(self, found):
        with pikepdf.open(io.BytesIO(summary.made(found))) as pdf:
            assert set(pdf.attachments) == {"results.json", "errors.json", "schedule.json"}

    def test_no_mark_at_all(self, project):
        nothing = run.check(write_csv(project / "ties.csv", HEADS, [ROWS[0] | {"member": "none"}]))

        assert summary.made(nothing).startswith(b"%PDF") and workbook.made(nothing)
