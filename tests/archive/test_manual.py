"""The verification manual: it compares every published number, finds a wrong one, and its number is in each report."""

import tomllib

import pypdf
import pytest

from gageline import identity
from gageline.archive import manual
from gageline.errors import ReportError

CASE = '''[[example]]
id = "T-1"
source = "Evaluated by hand: 50 ksi on 10 sq. in."
edition = "360-22"
evidence = "derived"
work = "P_y = tension.gross_yielding(50, 10)"
results = [{is = "P_y", state = "yielding", printed = "500", lrfd = "450", asd = "%s"},
  {is = "P_y", printed = "502", tolerance_percent = 0.5, why = "read off a graph"}]

[[example]]
id = "T-2"
source = "Evaluated by hand: required strength of a given demand"
edition = "360-22"
evidence = "found"
results = [{demand = true, lrfd = "90"}, {check = "member yielding", lrfd = "135", asd = "89.8"},
  {check = "member rupture", step = "net_area_straight", printed = "2.00"}]
[example.connection]
member = "PL 1/2 x 6"
member_grade = "A572-50"
plate_thickness = "1/2 in"
plate_width = "6 in"
plate_grade = "A572-50"
plate_end = "1-1/2 in"
lines = 2
rows = 3
pitch = "3 in"
gage = "3 in"
member_end = "1-1/2 in"
bolt = "7/8"
bolt_grade = "A325"
tension = "90 kip"
'''


@pytest.fixture
def cases(tmp_path, monkeypatch):
    """Return the path of a file of cases that the manual takes instead of the shipped ones."""
    path = tmp_path / "cases.toml"
    monkeypatch.setattr(identity, "published_cases", lambda: [path])
    path.write_text(CASE % "299")
    return path


class TestManual:
    def test_good_cases(self, cases):
        """Hand values of yielding, 0.90·50·10 and 50·10/1.67, of a 1/2 x 6 plate and of its net area, 0.5·(6 − 2·1)."""
        pdf, number, count, wrong = manual.manual("2026-12-01")
        (cases.parent / "m.pdf").write_bytes(pdf)
        said = "\n".join(page.extract_text() for page in pypdf.PdfReader(cases.parent / "m.pdf").pages)
        assert (count, wrong) == (8, 0) and number in said and "read off a graph" in said
        assert identity.program_hash() in said.replace("\n", "")

    def test_a_wrong_value_is_found(self, cases):
        """One number off by more than half its last digit."""
        cases.write_text(CASE % "301")
        pdf, _, count, wrong = manual.manual("2026-12-01")
        (cases.parent / "m.pdf").write_bytes(pdf)
        said = "\n".join(page.extract_text() for page in pypdf.PdfReader(cases.parent / "m.pdf").pages)
        assert (count, wrong) == (8, 1) and "DIFFERS" in said and "1 lie outside" in said

    def test_same_input_same_bytes(self, cases):
        """Two manuals of one date."""
        assert manual.manual("2026-12-01")[0] == manual.manual("2026-12-01")[0]

    def test_without_cases(self, monkeypatch):
        """A sentence."""
        monkeypatch.setattr(identity, "published_cases", list)
        with pytest.raises(ReportError, match="not installed"):
            manual.manual("2026-12-01")


def test_number_is_in_each_report():
    """The identification of a report names the manual."""
    assert dict(identity.rows("bolted"))["Verification manual"] == identity.verification_id() != ""


def test_every_shipped_case_is_worked_out():
    """As many numbers as the files print, each within what is allowed."""
    examples = [example for path in identity.published_cases() for example in tomllib.loads(path.read_text(encoding="utf-8"))["example"]]
    results = [result for example in examples for result in manual.work_out(example)]
    assert len(results) == sum(kind in row for example in examples for row in example["results"] for kind in manual.KINDS) > 500
    assert [result for result in results if not result.ok] == []
