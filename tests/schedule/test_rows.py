"""Rows into calculations: what a cell means, what is wrong with it, and that a row computes what the single calculation computes."""

import contextlib
import re

import pytest
from hypothesis import HealthCheck, given, settings
from hypothesis import strategies as st

import gageline
from gageline import cells, project
from gageline.errors import InputError
from gageline.schedule import reading, rows, run

from .conftest import SAMPLE, sample_rows, write_csv

HEADS, ROWS = sample_rows()
TEMPLATE = rows.Template("bolted")


def checked(folder, heads, lines, **options):
    return run.check(write_csv(folder / "marks.csv", heads, lines), **options)


def by_keywords(row, heads):
    """Return the results of a sample row as the package's own keyword interface computes them, defaults as the template has them."""
    loads = {"P_D", "P_L", "P_S", "P_W", "P_W_opposite"}
    given = {name: each.value for name, each in TEMPLATE.given.items() if name not in loads}
    for head in heads:
        name, unit = re.fullmatch(r"(\w+)(?: \[(\w+)\])?", head).groups()
        if name == "source" or not row[head]:
            continue
        if row[head] == "none":
            del given[name]
        else:
            given[name] = int(row[head]) if name in ("plates", "lines", "rows") else f"{row[head]} {unit}" if unit else row[head]
    basis = project.load(SAMPLE.parent / "project.toml").basis
    return gageline.bolted(edition=basis.edition, method=basis.method, loads=basis.loads, **given).to_dict()


class TestSample:
    def test_sixty_good_marks_marked_invented(self):
        found = run.check(SAMPLE)

        assert len(found.marks) == 60 and not found.faults
        assert "invented" in SAMPLE.read_text(encoding="utf-8").splitlines()[0]

    def test_each_equals_the_calculation_by_keywords(self, project):
        found = checked(project, HEADS, ROWS)

        assert [mark.results for mark in found.marks] == [by_keywords(row, HEADS) for row in ROWS]

    def test_notebook_reads_back_as_given(self):
        for mark in run.check(SAMPLE).marks[::7]:
            assert cells.inputs_of_notebook(mark.book) == mark.given


class TestCells:
    def value(self, name, text, unit=""):
        return rows._value(text, TEMPLATE.fields[name], unit)

    @pytest.mark.parametrize("text, meant", [("3", "3 in"), ("2-1/2", "2-1/2 in"), ("2 1/2", "2 1/2 in"), ("1½", "1½ in"), (".75", ".75 in"),
                                             ("76 mm", "76 mm"), ("1'-3\"", "1'-3\""), ("-1/4", "-1/4 in")])
    def test_head_unit_where_the_cell_has_none(self, text, meant):
        assert self.value("pitch", text, "in") == meant

    def test_lists_take_the_unit_one_by_one(self):
        assert self.value("gage", "3, 4 in, 75 mm", "in") == "3 in, 4 in, 75 mm"
        assert self.value("holes", "0, 3; 3, 3", "in") == "0 in, 3 in; 3 in, 3 in"

    def test_kinds(self):
        assert self.value("rows", "4") == 4 and self.value("rows", "4.0") == 4
        assert self.value("plates", "2") == 2
        assert self.value("deformation_considered", "No") is False
        assert self.value("assumptions", "One. | Two.") == ["One.", "Two."]
        assert self.value("bolt", "7/8", "in") == "7/8 in"
        assert self.value("rows", "four") == "four"


class TestRules:
    def test_blank_takes_the_default_and_says_so(self, project):
        mark = checked(project, HEADS, ROWS[:1]).marks[0]

        assert mark.given["threads"].source != ""
        assert mark.defaults["plates"] == 1
        assert mark.given["plates"].source == "default of bolted.ipynb, blank in the schedule"

    def test_example_loads_never_stand_in(self, project):
        row = ROWS[0] | {"P_L [kip]": ""}
        mark = checked(project, HEADS, [row]).marks[0]

        assert "P_L" not in mark.given and mark.results["demand"]["tension"] == pytest.approx(1.4 * float(row["P_D [kip]"]))

    def test_none_leaves_an_input_out(self, project):
        mark = checked(project, HEADS, [ROWS[0] | {"member_length": "none"}]).marks[0]

        assert "member_length" not in mark.given

    def test_own_notebook_to_start_from(self, project):
        like = SAMPLE.parent / "H1.ipynb"
        mark = checked(project, ["mark", "rows"], [{"mark": "N1", "rows": "4"}], like=like).marks[0]

        assert mark.defaults["member"] == cells.inputs_of_notebook(rows.running.read_notebook(like))["member"].value

    @pytest.mark.parametrize("heads, said", [
        (["mark", "pich [in]"], "pitch"), (["pitch [in]"], "no column is headed mark"), (["mark", "pitch [kip]"], "wrong dimension"),
        (["mark", "pitch [furlong]"], "not known"), (["mark", "rho [in]"], "without unit")])
    def test_wrong_head_stops_all(self, project, heads, said):
        with pytest.raises(InputError, match=said):
            checked(project, heads, [dict.fromkeys(heads, "3")])

    @pytest.mark.parametrize("change, column, said", [
        ({"pitch [in]": "3 kip"}, "pitch", "wrong dimension"), ({"member": "WT8x26"}, "member", "not in the tables"),
        ({"mark": ""}, "mark", "empty"), ({"mark": "A/1"}, "mark", "cannot name a file"), ({"mark": "../x"}, "mark", "cannot name a file"),
        ({"rows": "3.5"}, "rows", "whole number"), ({"threads": "Y"}, "threads", "allowed: N, X"), ({"plates": "3"}, "plates", "allowed: 1, 2"),
        ({"P_D [kip]": "=1+1"}, "P_D", "cannot read a number"), ({"bolt [in]": "9/16"}, "bolt", ""), ({"member": "none"}, "", "member")])
    def test_wrong_cell_names_its_row_and_column(self, project, change, column, said):
        found = checked(project, HEADS, [ROWS[0], ROWS[1] | change])

        assert [mark.mark for mark in found.marks] == [ROWS[0]["mark"]]
        fault = found.faults[0]
        assert fault.row == 3 and said in fault.sentence and "\n" not in fault.sentence
        assert re.search(rf"\({column}\b", fault.column) or not column

    def test_mark_twice_also_in_other_case(self, project):
        found = checked(project, HEADS, [ROWS[0], ROWS[1] | {"mark": ROWS[0]["mark"].lower()}])

        assert found.faults[0].sentence.endswith("stands in row 2 already")


WRONG = st.one_of(
    st.sampled_from(["", "none", "0", "-3", "1e400", "nan", "inf", "3 kip", "31", "three", "=cmd|' /C calc'!A0", "@SUM(1)", "1/0", "3,4", "'", '"',
                     "\\", "#", "½", "3 in in", "１２", "999999", "PL 1/2", "WT8x25", "2L4x4x3/8", "HSS4x4x1/4", "LSL along", "yes", "None", "True",
                     "[]", "3;4", "٣", "-"]),
    # A NUL makes a file no text file: it is refused whole, in one sentence (test_reading).
    st.text(st.characters(exclude_characters="\0", exclude_categories=["Cs"]), max_size=12))


@st.composite
def half_wrong(draw):
    """Rows of the sample, about half of them with cells overwritten by anything."""
    lines = []
    for i, row in enumerate(draw(st.lists(st.sampled_from(ROWS), min_size=1, max_size=6))):
        row = dict(row, mark=f"{row['mark']}-{i}")
        if i % 2:
            for head in draw(st.lists(st.sampled_from(HEADS), min_size=1, max_size=3)):
                row[head] = draw(WRONG)
        lines.append(row)
    return lines


@settings(max_examples=25, deadline=None, suppress_health_check=[HealthCheck.function_scoped_fixture, HealthCheck.too_slow])
@given(lines=half_wrong())
def test_random_rows_are_right_or_told(project, lines):
    """Every row becomes results equal to the keyword interface's, or one sentence with its row; never an exception, never both."""
    found = checked(project, HEADS, lines)

    assert len(found.marks) + len(found.faults) == len(found.schedule.rows)
    for fault in found.faults:
        assert fault.sentence and "\n" not in fault.sentence and "unexpected" not in fault.sentence and "Traceback" not in fault.sentence
    for mark in found.marks:
        again = gageline.build(mark.family, edition=found.job.edition, method=found.job.method, loads=found.job.loads,
                               **{name: each.value for name, each in mark.given.items()})
        assert mark.results == again.to_dict()
    got = {mark.row: mark.results for mark in found.marks}
    for number, row in enumerate(lines[::2], start=1):
        assert list(by_keywords(row, HEADS).items()) in [list(results.items()) for results in got.values()], number


def test_any_bytes_are_no_crash(tmp_path):
    """A file of any content is read or refused by one sentence."""
    import random

    dice = random.Random(5)
    for _ in range(200):
        path = tmp_path / f"x.{dice.choice(['csv', 'xlsx'])}"
        path.write_bytes(bytes(dice.choice([dice.randrange(256), 44, 10, 34, 91, 93]) for _ in range(dice.randrange(200))))
        with contextlib.suppress(InputError):
            reading.read(path)
