"""Schedule files as people write them: separators, codings, spreadsheets with dates, formulas and errors."""

import datetime

import openpyxl
import pytest

from gageline.errors import InputError
from gageline.schedule.reading import read


def csv_file(folder, text, coding="utf-8"):
    path = folder / "marks.csv"
    path.write_bytes(text.encode(coding))
    return path


def xlsx_file(folder, rows):
    book = openpyxl.Workbook()
    for row in rows:
        book.active.append(row)
    book.save(folder / "marks.xlsx")
    return folder / "marks.xlsx"


class TestCsv:
    def test_heads_carry_names_and_units(self, tmp_path):
        found = read(csv_file(tmp_path, "mark,pitch [in],plate thickness [mm]\nA1,3,16\n"))

        assert [(column.letter, column.name, column.unit) for column in found.columns] == [("A", "mark", ""), ("B", "pitch", "in"),
                                                                                          ("C", "plate_thickness", "mm")]
        assert [(row.number, row.cells) for row in found.rows] == [(2, {"A": "A1", "B": "3", "C": "16"})]

    @pytest.mark.parametrize("comma", [",", ";", "\t"])
    @pytest.mark.parametrize("coding", ["utf-8", "utf-8-sig"])
    def test_separators_and_codings(self, tmp_path, comma, coding):
        found = read(csv_file(tmp_path, comma.join(["mark", "title"]) + "\n" + comma.join(["A1", "Tie ½"]) + "\n", coding))

        assert found.rows[0].cells == {"A": "A1", "B": "Tie ½"}

    def test_text_of_windows(self, tmp_path):
        assert read(csv_file(tmp_path, "mark,title\nA1,Tie ½\n", "cp1252")).rows[0].cells["B"] == "Tie ½"

    def test_remarks_and_empty_rows_keep_the_numbers_of_the_file(self, tmp_path):
        found = read(csv_file(tmp_path, '# invented\n\nmark,title\n,\n# not this one\nA1,"two\nlines"\nA2,x\n'))

        assert [(row.number, row.cells["A"]) for row in found.rows] == [(6, "A1"), (8, "A2")]

    def test_cell_without_head(self, tmp_path):
        row = read(csv_file(tmp_path, "mark,gage [in]\nA1,3,4\n")).rows[0]

        assert list(row.faults) == ["C"] and "quote a text that holds a comma" in row.faults["C"]

    @pytest.mark.parametrize("text, said", [("", "no row"), ("mark,pitch [in\nA,3\n", "column B"), ("mark,Mark\nA,B\n", "twice"),
                                            ("mark,ti\0tle\n", "no text file")])
    def test_refused(self, tmp_path, text, said):
        with pytest.raises(InputError, match=said):
            read(csv_file(tmp_path, text))

    def test_missing_file_and_other_kinds(self, tmp_path):
        for name, said in (("none.csv", "no such file"), ("marks.pdf", r"\.csv or an \.xlsx"), ("", "csv")):
            with pytest.raises(InputError, match=said):
                read(tmp_path / name)


class TestXlsx:
    def test_numbers_become_texts(self, tmp_path):
        found = read(xlsx_file(tmp_path, [["mark", "pitch [in]", "rows", "deformation_considered"], ["A1", 2.5, 3, False], [17, 3.0, 4, True]]))

        assert [row.cells for row in found.rows] == [{"A": "A1", "B": "2.5", "C": "3", "D": "no"}, {"A": "17", "B": "3", "C": "4", "D": "yes"}]

    def test_a_fraction_that_became_a_date_is_told(self, tmp_path):
        row = read(xlsx_file(tmp_path, [["mark", "bolt"], ["A1", datetime.datetime(2026, 7, 8)]])).rows[0]

        assert "made a date of it" in row.faults["B"]

    def test_formulas_without_value_and_errors_are_told(self, tmp_path):
        rows = read(xlsx_file(tmp_path, [["mark", "pitch [in]", "rows"], ["A1", "=1+2", 3], ["A2", 3, "#REF!"]])).rows

        assert "formula whose value is not stored" in rows[0].faults["B"]
        assert "error #REF!" in rows[1].faults["C"]

    def test_no_workbook(self, tmp_path):
        (tmp_path / "marks.xlsx").write_bytes(b"PK\3\4 not really")

        with pytest.raises(InputError, match="no readable workbook"):
            read(tmp_path / "marks.xlsx")
