"""Sign-offs, comments and settled items: who may sign when, what voids a signature, and that no event is lost or rewritten."""

import json
import os

import pytest

from gageline import signoffs, store
from gageline.archive import reading, statuses
from gageline.errors import GagelineError, InputError, ReportError

from .conftest import FINDINGS, edit


@pytest.fixture
def book(project):
    return project / "H1.ipynb"


def checked(book, who="C.D."):
    return reading.sign(book, "checker", who, method="line by line", findings=FINDINGS)


class TestSigning:
    def test_order_of_roles(self, book):
        """The checker signs after the preparer, the approver after the checker."""
        with pytest.raises(InputError, match="preparer has not signed"):
            checked(book)
        reading.sign(book, "preparer", "A.B.")
        with pytest.raises(InputError, match="checker has not signed"):
            reading.sign(book, "approver", "E.F.")
        checked(book)
        reading.sign(book, "approver", "E.F.")
        calc = reading.read(book).calc
        assert [calc.signed()[name] for name in ("by", "checked", "approved")] == ["A.B.", "C.D.", "E.F."]

    @pytest.mark.parametrize("name", ["A.B.", "a.b.", "A B", " ab "])
    def test_nobody_checks_their_own_work(self, book, name):
        """The preparer, however the name is spelt, cannot check."""
        reading.sign(book, "preparer", "A.B.")
        with pytest.raises(InputError, match="their own work"):
            checked(book, name)

    def test_a_checker_cannot_become_preparer_of_the_same_content(self, book, project):
        """Nor the other way round."""
        (project / "project.toml").write_text((project / "project.toml").read_text().replace('"A.B."', '""'))
        reading.sign(book, "preparer", "A.B.")
        checked(book)
        with pytest.raises(InputError, match="their own work"):
            reading.sign(book, "preparer", "C.D.")

    def test_only_those_whom_the_project_names(self, book):
        """project.toml's prepared_by names who may prepare."""
        with pytest.raises(InputError, match=r"project\.toml allows A\.B\."):
            reading.sign(book, "preparer", "X.Y.")

    @pytest.mark.parametrize(("change", "said"), [
        ({"method": ""}, "method of check"), ({"method": "glance"}, "line by line"), ({"findings": {"code": "yes"}}, "criteria"),
        ({"findings": FINDINGS | {"codes": "x"}}, "codes"), ({"findings": FINDINGS | {"code": "  "}}, "empty")])
    def test_a_check_says_how_and_answers_five_headings(self, book, change, said):
        """No check without its method and the five findings."""
        reading.sign(book, "preparer", "A.B.")
        with pytest.raises(InputError, match=said):
            reading.sign(book, "checker", "C.D.", **{"method": "review", "findings": FINDINGS} | change)

    @pytest.mark.parametrize(("name", "said"), [("", "empty"), ("..", "no letter"), ("x" * 25, "at most 24"), ("A\nB", "invisible"),
                                                ("A\u202eB", "invisible"), ("漢", "no sign"), ("Wwwwwwwwwwwwwwwwwwwwwww", "does not fit")])
    def test_a_name_that_no_title_block_can_hold(self, book, name, said):
        """It is refused before it is recorded, since a recorded one would stop every report."""
        with pytest.raises(GagelineError, match=said):
            reading.comment(book, name, "whole", "text")
        assert reading.read(book).calc.log.events == ()


class TestVoiding:
    @pytest.mark.parametrize(("old", "new"), [('"46 kip"', '"47 kip"'), ("table 3: belt", "table 4: belt")])
    def test_a_changed_input_or_source_voids(self, book, old, new):
        """The title block empties, and the cover says which sign-offs are void."""
        reading.sign(book, "preparer", "A.B.")
        checked(book)
        edit(book, old, new)
        calc = reading.read(book).calc
        assert set(calc.signed().values()) == {""}
        assert sum("is void" in item for item in calc.open_items()) == 2

    def test_another_method_voids(self, book, project):
        """The basis is part of the content."""
        reading.sign(book, "preparer", "A.B.")
        (project / "project.toml").write_text((project / "project.toml").read_text().replace("LRFD", "ASD"))
        assert reading.read(book).calc.signed()["by"] == ""

    def test_a_changed_text_of_the_notebook_voids_for_issuing(self, book):
        """Content is the same, but the notebook says something else."""
        reading.sign(book, "preparer", "A.B.")
        edit(book, "calc.curve()", "calc.loads()")
        found = reading.read(book)
        assert found.signed("preparer") is None
        assert statuses.refusals("for review", found) == ["the preparer has not signed since inputs, results or the notebook's text changed"]

    def test_a_rerun_voids_nothing(self, book):
        """Outputs and metadata are no content."""
        reading.sign(book, "preparer", "A.B.")
        data = json.loads(book.read_text())
        data["metadata"]["language_info"]["version"] = "9"
        data["cells"][3]["execution_count"] = 7
        book.write_text(json.dumps(data))
        assert reading.read(book).signed("preparer")

    def test_the_last_binary_digit_voids_nothing(self, book):
        """Another machine's rounding is no change; a change of the seventh figure is."""
        calc = reading.read(book).calc
        results = calc.results()
        basis = calc.project.basis
        tiny, small = (results | {"capacity": results["capacity"] * (1 + by)} for by in (1e-15, 1e-7))
        assert signoffs.content_hash(calc.given, basis, tiny) == calc.content
        assert signoffs.content_hash(calc.given, basis, small) != calc.content


class TestComments:
    def test_life_of_a_comment(self, book):
        """Asked, answered, closed by somebody else; open ones stand on the cover."""
        event, _ = reading.comment(book, "C.D.", "bolt shear", "Are threads excluded?")
        assert event["on"] == "check bolt shear"
        assert any("Are threads excluded?" in item for item in reading.read(book).calc.open_items())
        with pytest.raises(InputError, match="no response"):
            reading.close(book, "C.D.", "C1")
        reading.answer(book, "A.B.", "C1", "N is assumed: safe.")
        with pytest.raises(InputError, match="somebody else"):
            reading.close(book, "A.B.", "C1")
        reading.close(book, "C.D.", "C1")
        assert not any("C1" in item for item in reading.read(book).calc.open_items())
        with pytest.raises(InputError, match="closed"):
            reading.answer(book, "A.B.", "C1", "more")

    def test_tied_to_an_input_or_a_line(self, book):
        """An input by its name, a line by its number with its reading; anything else names the nearest."""
        assert reading.comment(book, "C.D.", "P_L", "x")[0]["on"] == "P_L"
        assert "A g" in reading.comment(book, "C.D.", "line 1", "x")[0]["on"]
        for wrong, said in (("bolts shear", "bolt shear"), ("line 0", "lines run from 1"), ("line 999", "lines run"), ("P_l", "P_L")):
            with pytest.raises(InputError, match=said):
                reading.comment(book, "C.D.", wrong, "x")
        with pytest.raises(InputError, match="C2"):
            reading.answer(book, "A.B.", "C3", "x")

    @pytest.mark.parametrize("text", ["漢字", "a" * 40, "x\x00y", "x" * 2001, "the value is nan here", "a\u2028b"])
    def test_what_a_sheet_cannot_print_is_not_recorded(self, book, text):
        """Events are never taken back, so one that no sheet can print would stop every report."""
        with pytest.raises(GagelineError):
            reading.comment(book, "C.D.", "whole", text)
        assert not reading.read(book).calc.log.events


class TestRegister:
    def test_settling(self, book):
        """An open item is closed and an assumption confirmed with who, when and why."""
        reading.settle(book, "C.D.", "O1", "Cladding chosen: letter 14.")
        reading.settle(book, "C.D.", "A2", "dwg S-001")
        rows = {row["id"]: row for row in reading.read(book).calc.register()}
        assert rows["O1"]["status"].endswith("by C.D.: Cladding chosen: letter 14.") and not rows["O1"]["open"]
        assert rows["A2"]["status"].startswith("confirmed") and rows["A1"]["status"] == "stated"

    def test_what_no_signature_settles(self, book):
        """A failed check and an input without a source stay open."""
        edit(book, '"46 kip"  # load report LR-2, table 3: belt, material, walkway', '"146 kip"')
        rows = {row["text"][:7]: row for row in reading.read(book).calc.register() if row["kind"] == "open item"}
        for start in ("Inputs ", "Bolts, "):
            with pytest.raises(InputError, match="cannot be settled"):
                reading.settle(book, "C.D.", rows[start]["id"], "because")

    def test_unknown_item(self, book):
        """The register's items are named."""
        with pytest.raises(InputError, match="O1"):
            reading.settle(book, "C.D.", "O9", "x")


class TestStatuses:
    def test_each_status_asks_more(self, book):
        """Preliminary asks nothing, construction everything."""
        def may():
            return [status for status in statuses.RULES if not statuses.refusals(status, reading.read(book))]

        assert may() == ["preliminary"]
        reading.sign(book, "preparer", "A.B.")
        assert may() == ["preliminary", "for review"]
        checked(book)
        assert may() == ["preliminary", "for review", "for approval"]
        reading.comment(book, "E.F.", "whole", "One question.")
        assert may() == ["preliminary", "for review"]
        reading.answer(book, "A.B.", "C1", "One answer.")
        reading.close(book, "E.F.", "C1")
        reading.sign(book, "approver", "E.F.")
        assert may() == ["preliminary", "for review", "for approval"]
        reading.settle(book, "E.F.", "O1", "Letter 14.")
        assert may() == list(statuses.RULES)

    def test_a_failing_calculation(self, book):
        """It may be reviewed, not approved."""
        edit(book, '"46 kip"', '"146 kip"')
        reading.sign(book, "preparer", "A.B.")
        checked(book)
        assert statuses.refusals("for approval", reading.read(book)) == ["not every check is satisfied"]

    @pytest.mark.parametrize(("status", "said"), [("superseded", "newer revision"), ("void", "gageline void"),
                                                  ("for constrution", "for construction")])
    def test_words_that_cannot_be_issued(self, book, status, said):
        """Superseded and void come from later records only."""
        with pytest.raises(InputError, match=said):
            statuses.refusals(status, reading.read(book))


class TestLog:
    def fill(self, book, n=4):
        reading.sign(book, "preparer", "A.B.")
        for i in range(n - 1):
            reading.comment(book, "C.D.", "whole", f"Comment {i}.")
        return sorted((book.parent / "H1.signoffs").glob("*.json"))

    def test_an_edited_event_shows(self, book):
        """Each event names the hash of the one before."""
        files = self.fill(book)
        files[1].write_text(files[1].read_text().replace("Comment 0", "Comment X"))
        assert any("edited" in fault for fault in reading.read(book).calc.log.faults)
        with pytest.raises(ReportError, match="damaged"):
            reading.comment(book, "C.D.", "whole", "more")

    def test_a_missing_event_shows(self, book):
        """A gap in the numbers is a fault, printed on the cover."""
        self.fill(book)[1].unlink()
        assert any("0002.json is missing" in item for item in reading.read(book).calc.open_items())

    @pytest.mark.parametrize("text", ["", "[]", "{}", '{"kind": "sign-off"}', "\x00", '{"n": 2, "kind": "answer", "to": "C9"}'])
    def test_a_damaged_event_shows(self, book, text):
        """Whatever stands in its place."""
        self.fill(book)[1].write_text(text)
        assert reading.read(book).calc.log.faults

    def test_a_clock_that_goes_back_is_said_and_stops_nothing(self, book, monkeypatch):
        """Order is by number, not by time."""
        monkeypatch.setattr(store, "now", lambda: "2030-01-01T00:00:00Z")
        reading.comment(book, "C.D.", "whole", "first")
        monkeypatch.setattr(store, "now", lambda: "2026-01-01T00:00:00Z")
        reading.comment(book, "C.D.", "whole", "second")
        log = reading.read(book).calc.log
        assert [each["text"] for each in log.comments()] == ["first", "second"] and "clock went back" in log.faults[0]

    def test_two_at_once_lose_nothing(self, project):
        """Twelve processes add at the same moment: twelve events, one chain."""
        children = []
        for i in range(12):
            child = os.fork()
            if not child:
                try:
                    signoffs.add(project, "H1", signoffs.comment("C.D.", "whole", f"No. {i}"))
                finally:
                    os._exit(0)
            children.append(child)
        for child in children:
            os.waitpid(child, 0)
        log = signoffs.read(project, "H1")
        assert not log.faults and {each["text"] for each in log.comments()} == {f"No. {i}" for i in range(12)}
