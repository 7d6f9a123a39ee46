"""From a signed notebook to an issued PDF, its successor, and their proof: text, triangles, attachments, records, hostile words."""

import csv
import functools
import io
import json
import re
import shutil

import pikepdf
import pypdf
import pytest

from gageline import store
from gageline.archive import attached, changes, issuing, reading, records, register, stamping, verifying
from gageline.errors import GagelineError, InputError, ReportError
from gageline.sheet import write_pdf

from .conftest import DEMO, FINDINGS, edit, execute, snapshot

HOSTILE = 'Tie #x $y$ \\alpha @ref <b>&amp; "q" 50% ~a_b* `c` [red]=1+1[/red] {e} // -- Ω'


@pytest.fixture(scope="module")
def story(tmp_path_factory):
    """Return (project folder, reports folder) of H1: revision 0 for review, one input changed, revision 1 for approval."""
    folder = tmp_path_factory.mktemp("story") / "calcs" / "job"
    folder.mkdir(parents=True)
    for name in ("project.toml", "H1.ipynb"):
        shutil.copyfile(DEMO / name, folder / name)
    book, run = folder / "H1.ipynb", pytest.MonkeyPatch()
    run.setattr("gageline.running.execute", execute)
    reading.sign(book, "preparer", "A.B.")
    reading.comment(book, "C.D.", "bolt shear", HOSTILE)
    issuing.issue(book, status="for review")
    reports = folder.parents[1] / "reports" / "job"
    kept = snapshot(reports)
    reading.answer(book, "A.B.", "C1", "Kept: " + HOSTILE)
    reading.close(book, "C.D.", "C1")
    edit(book, '"46 kip"', '"48 kip"')
    reading.sign(book, "preparer", "A.B.")
    reading.sign(book, "checker", "C.D.", method="line by line", findings=FINDINGS)
    issuing.issue(book, status="for approval", rev="1", text="Live load 48 kip", date="2026-12-05")
    run.undo()
    assert {name: snapshot(reports)[name] for name in kept} == kept
    return folder, reports


@functools.cache
def texts(path):
    return [page.extract_text() for page in pypdf.PdfReader(path).pages]


def text_of(path, page=None):
    return "\n".join(texts(path)) if page is None else texts(path)[page]


class TestSheets:
    def test_status_on_every_sheet(self, story):
        """The status word stands at each foot, its meaning on the cover."""
        for rev, words in (("0", "FOR REVIEW"), ("1", "FOR APPROVAL")):
            path = story[1] / f"H1-rev{rev}.pdf"
            assert all(words in page for page in texts(path))
        assert "not for construction" in text_of(story[1] / "H1-rev1.pdf", 0)

    def test_title_block_from_events(self, story):
        """Revision 0 was not checked, revision 1 was; both are told so."""
        assert "C.D." not in text_of(story[1] / "H1-rev0.pdf", 2)
        assert "C.D." in text_of(story[1] / "H1-rev1.pdf", 2)

    def test_open_comment_on_the_cover_of_revision_0_only(self, story):
        """With its words as typed."""
        flat = {rev: re.sub(r"\s+", " ", text_of(story[1] / f"H1-rev{rev}.pdf", 0)) for rev in "01"}
        assert "Comment C1 on check bolt shear" in flat["0"] and "[red]=1+1[/red]" in flat["0"]
        assert "Comment C1" not in flat["1"]

    def test_revision_table(self, story):
        """Revision 1 lists revision 0 with it."""
        assert re.search(r"0\s+2026-12-01.*1\s+2026-12-05\s+Live load 48 kip", text_of(story[1] / "H1-rev1.pdf", 0), re.S)

    def test_page_of_changes(self, story):
        """Old and new input and ratio; 127/146 instead of 124/146 by hand: 1.2·38 + 1.6·48 + 0.3·14 = 126.6, 123.4 before; 146.1 available."""
        said = re.sub(r"\s+", " ", text_of(story[1] / "H1-rev1.pdf"))
        assert "Changes since revision 0" in said and "46 kip 48 kip" in said
        assert "Bolts, shear 123.4 / 146.1 kip 0.845 126.6 / 146.1 kip 0.866 +0.022" in said.replace("123.40", "123.4").replace("126.60", "126.6")
        assert "Changes since" not in text_of(story[1] / "H1-rev0.pdf")

    def test_triangles_beside_changed_lines_only(self, story):
        """The changed input and what follows from it; gross area and unchanged inputs have none."""
        from gageline.sheet.build import sheet_data

        seen = []
        run = pytest.MonkeyPatch()
        run.setattr(issuing, "sheet_data", lambda node, **rest: seen.append(made := sheet_data(node, **rest)) or made)
        found = reading.read(story[0] / "H1.ipynb")
        older = records.read(story[1]).revisions("H1")[:1]
        issuing._set(execute(found.book, story[0]), found,
                     {"rev": "1", "status": "for approval", "text": "x", "date": "2026-12-05"}, older, "working")
        run.undo()
        rows = [row for block in seen[0]["blocks"] if block["kind"] == "table" for row in block["rows"]]
        assert [row["changed"] for row in rows if row["cells"][:1] == [["P_L"]] and len(row["cells"]) == 4 and "live" in row["cells"][1][0]] == ["1"]
        assert {row["changed"] for row in rows if row["cells"][:1] == [["plate_width"]]} == {""}
        assert {block["changed"] for block in seen[0]["blocks"] if block["kind"] == "verdict"} == {"1"}
        equations = [block["changed"] for block in seen[0]["blocks"] if block["kind"] == "equation"]
        assert equations.count("") == len(equations)

    def test_stamped_copy(self, story):
        """It says superseded on every sheet and in its title, keeps text and tags, and the original is untouched."""
        copy, issued = story[1] / "H1-rev0.superseded.pdf", story[1] / "H1-rev0.pdf"
        pages = pypdf.PdfReader(copy).pages
        assert len(pages) == len(texts(issued))
        assert all("SUPERSEDED by revision 1 of 2026-12-05" in pages[i].extract_text() for i in (0, 3, -1))
        with pikepdf.open(copy) as pdf:
            assert pdf.open_metadata()["dc:title"].startswith("SUPERSEDED: Calculation")
            assert "/StructTreeRoot" in pdf.Root
        assert stamping.stamped(issued, "superseded", "by revision 1 of 2026-12-05") == copy.read_bytes()

    def test_claims_and_attachments(self, story):
        """PDF/A-3a and PDF/UA-1, with the notebook, inputs, results, project file, sign-offs, register and versions inside."""
        path = story[1] / "H1-rev1.pdf"
        with pikepdf.open(path) as pdf:
            said = pdf.open_metadata()
            assert (said["pdfaid:part"], said["pdfaid:conformance"], said["pdfuaid:part"]) == ("3", "A", "1")
        files = attached.read_attachments(path)
        assert set(files) == {"H1.ipynb", "inputs.json", "results.json", "project.toml", "signoffs.json", "register.json", "versions.json"}
        assert files["project.toml"] == (story[0] / "project.toml").read_bytes()
        assert reading.notebook_hash(json.loads(files["H1.ipynb"])) == reading.read(story[0] / "H1.ipynb").notebook

    def test_same_input_same_bytes(self, story, tmp_path, in_process):
        """The same notebook, events and project in another folder give the same PDF."""
        folder = tmp_path / "calcs" / "job"
        shutil.copytree(story[0], folder)
        shutil.copytree(story[1], tmp_path / "reports" / "job")
        for path in (tmp_path / "reports" / "job").glob("H1-rev[01].*"):
            if "rev1" in path.name or "superseded" in path.name:
                path.unlink()
        path, _ = issuing.issue(folder / "H1.ipynb", status="for approval", rev="1", text="Live load 48 kip", date="2026-12-05")
        assert path.read_bytes() == (story[1] / "H1-rev1.pdf").read_bytes()


class TestRefused:
    @pytest.mark.parametrize(("change", "said"), [({"rev": "0"}, "never overwritten"), ({"rev": "A"}, "comes before"),
                                                  ({"rev": "../2"}, "not allowed"),
                                                  ({"rev": "2", "status": "for construction"}, "approver has not signed; open item"),
                                                  ({"rev": "2", "date": "5.12.2026"}, "2026-12-01")])
    def test_one_sentence(self, story, in_process, change, said):
        """And nothing is written."""
        before = snapshot(story[1])
        with pytest.raises(InputError, match=said):
            issuing.issue(story[0] / "H1.ipynb", **change)
        assert snapshot(story[1]) == before

    def test_a_notebook_that_bends_its_results(self, project, in_process):
        """What the notebook shows must be what its inputs give."""
        edit(project / "H1.ipynb", "calc.cover()", "calc.connection.checks[0].__dict__['nominal'] = 999.0\ncalc.cover()")
        with pytest.raises(ReportError, match="is not what its inputs cell gives"):
            issuing.issue(project / "H1.ipynb")
        assert not list(project.parents[1].glob("reports/*/*.pdf"))

    def test_no_cover(self, project, in_process):
        """A calculation is issued with its cover."""
        edit(project / "H1.ipynb", "calc.cover()", "calc.loads()")
        with pytest.raises(ReportError, match="no cover"):
            issuing.issue(project / "H1.ipynb")

    def test_a_preview_cannot_land_on_an_issued_pdf(self, story):
        """Whoever names it as output is refused."""
        with pytest.raises(ReportError, match="never overwritten"):
            write_pdf(story[1] / "H1-rev0.pdf", b"%PDF-")


class TestVerify:
    def test_sound(self, story):
        """Both revisions; nothing of the notebook is run for it."""
        for rev in "01":
            found = verifying.verify(story[1] / f"H1-rev{rev}.pdf")
            assert found.ok, (found.faults, found.differences)
            assert any(re.search(r"\d{3} numbers and verdicts computed again", fact) for fact in found.facts)

    def test_says_superseded(self, story):
        """The issue's status as of now; its stamped copy is told apart."""
        assert any("issued for review" in fact and "now superseded" in fact for fact in verifying.verify(story[1] / "H1-rev0.pdf").facts)
        assert any("superseded copy" in fact for fact in verifying.verify(story[1] / "H1-rev0.superseded.pdf").facts)

    @pytest.fixture
    def copy(self, story, tmp_path):
        shutil.copytree(story[1], tmp_path / "reports")
        return tmp_path / "reports" / "H1-rev1.pdf"

    def test_a_flipped_bit(self, copy):
        """Twelve places over the file: each is reported, none is a traceback."""
        good = copy.read_bytes()
        for i in range(12):
            bad = bytearray(good)
            bad[i * (len(good) - 1) // 11] ^= 4
            copy.write_bytes(bad)
            assert any("is not what was issued" in fault for fault in verifying.verify(copy).faults)

    def test_without_its_record(self, copy):
        """The numbers still come out, but the file is unproved."""
        copy.with_suffix(".json").unlink()
        found = verifying.verify(copy)
        assert not found.ok and found.faults[0].startswith("unproved") and not found.differences

    def tampered(self, copy, name, old, new):
        """Exchange an attachment's text and make the record agree with it, as a careful forger would."""
        with pikepdf.open(copy, allow_overwriting_input=True) as pdf:
            raw = pdf.attachments[name].get_file().read_bytes()
            assert old in raw
            pdf.attachments[name].get_file().obj.write(raw.replace(old, new))
            pdf.save(copy)
        _, data = records.read_record(copy.with_suffix(".json"))
        data.pop("record_sha256")
        data["files"][copy.name] = records.hashes(copy.read_bytes())
        data["attachments"][name] = store.sha256(raw.replace(old, new))
        data[name.removesuffix(".json")] = json.loads(raw.replace(old, new))
        copy.with_suffix(".json").write_bytes(records.sealed(data))
        return verifying.verify(copy)

    def test_forged_results_do_not_come_out_again(self, copy):
        """Every hash agrees; the numbers do not."""
        found = self.tampered(copy, "results.json", b'"ok": true', b'"ok": false')
        assert found.faults == [] and any(".ok: False as issued, True now" in text for text in found.differences)

    def test_forged_inputs(self, copy):
        """Other inputs give other numbers, each of them named."""
        found = self.tampered(copy, "inputs.json", b"48 kip", b"8 kip")
        assert found.faults == [] and any("checks[bolt shear].ratio" in text for text in found.differences)

    def test_inputs_that_the_program_refuses(self, copy):
        """One sentence."""
        found = self.tampered(copy, "inputs.json", b"48 kip", b"48 ksi")
        assert any("refuses the inputs" in text for text in found.differences)

    @pytest.mark.parametrize("text", [b"", b"%PDF-1.7\n", b"nonsense"])
    def test_no_pdf(self, tmp_path, text):
        """A sentence among the faults."""
        (tmp_path / "x.pdf").write_bytes(text)
        assert any("no readable PDF" in fault for fault in verifying.verify(tmp_path / "x.pdf").faults)
        with pytest.raises(ReportError, match="no such file"):
            verifying.verify(tmp_path / "y.pdf")

    def test_every_kind_of_difference(self):
        """Numbers beyond rounding, verdicts, missing and further entries; rounding is none."""
        old = {"a": 1.0, "b": True, "c": [{"id": "x", "v": 1.0}, {"id": "y", "v": 2.0}], "d": "t"}
        new = {"a": 1.0 + 1e-12, "b": False, "c": [{"id": "y", "v": 2.1}], "e": 0}
        count, out = verifying.compare_results(old, new)
        assert [text.split(":")[0] for text in out] == ["b", "c[x]", "c[y].v", "d", "e"] and count == 7


class TestCompare:
    def test_three_kinds_of_file_say_the_same(self, story):
        """PDF, record and notebook of one revision."""
        old = story[1] / "H1-rev0.pdf"
        lines = [changes.as_text(changes.compare(changes.state_of(old), changes.state_of(new)))[1:]
                 for new in (story[1] / "H1-rev1.pdf", story[1] / "H1-rev1.json", story[0] / "H1.ipynb")]
        assert lines[0] == lines[1] == lines[2]
        assert "  P_L: 46 kip → 48 kip  (load report LR-2, table 3: belt, material, walkway)" in lines[0]
        assert any(line.startswith("  Bolts, shear: ") and line.endswith("(D/C +0.022)") for line in lines[0])

    def test_nothing_changed(self, story):
        """One sentence."""
        state = changes.state_of(story[1] / "H1-rev1.json")
        assert changes.as_text(changes.compare(state, state))[1] == "no difference in inputs, assumptions, code or results"

    def test_code_source_and_basis(self, story, project):
        """A changed cell, a changed source, another method, a further assumption and an input left out are all shown."""
        book = project / "H1.ipynb"
        before = changes.state_of(book)
        edit(book, "calc.curve()", "calc.curve() ")
        edit(book, "dwg S-201, hanger schedule", "dwg S-202")
        edit(book, 'installation = "snug"  # dwg S-001, general notes', 'assumptions = ["Hanger is plumb."]')
        (project / "project.toml").write_text((project / "project.toml").read_text().replace("LRFD", "ASD"))
        said = "\n".join(changes.as_text(changes.compare(before, changes.state_of(book))))
        for words in ("method: LRFD → ASD", "dwg S-201, hanger schedule → dwg S-202", "installation: snug → not given",
                      "Hanger is plumb.: none → stated",
                      "notebook: calc.curve() → (nothing)"):
            assert words in said, words

    def test_other_files(self, tmp_path, story):
        """A sentence."""
        for path in (tmp_path / "x.txt", story[1] / "H1-rev0.superseded.json"):
            with pytest.raises(GagelineError):
                changes.state_of(path)


class TestRegister:
    def test_rows(self, story):
        """Status as of now beside the status as issued."""
        rows = register.rows(records.read(story[1]))
        assert [(row["rev"], row["status"], row["issued as"], row["checked"]) for row in rows] == [
            ("0", "superseded", "for review", ""), ("1", "for approval", "for approval", "C.D.")]
        assert rows[1]["sha256"] == store.sha256((story[1] / "H1-rev1.pdf").read_bytes())
        assert json.loads(register.as_json(records.read(story[1])))["issues"] == rows

    @pytest.mark.parametrize("text", ["=1+1", "+1", "-1", "@SUM(A1)", "\t=1", "\r=1", " =1", "＝1", "|calc", '=HYPERLINK("x")'])
    def test_no_cell_begins_a_formula(self, story, text):
        """Whatever a title begins with."""
        ledger = records.read(story[1])
        ledger.issues["H1", "1"]["title"] = text
        cells = [cell for row in csv.reader(io.StringIO(register.as_csv(ledger))) for cell in row]
        assert f"'{text}" in cells and not [cell for cell in cells if cell.lstrip()[:1] in tuple("=+-@|＝")]


@pytest.mark.parametrize("field", ["title", "purpose", "open_items"])
def test_hostile_inputs(project, in_process, field):
    """Words of any markup print as typed and are issued, recorded and verified."""
    value = [HOSTILE] if field == "open_items" else HOSTILE
    source = reading.cell_text(json.loads((project / "H1.ipynb").read_text())["cells"][0])
    edit(project / "H1.ipynb", re.search(rf"^{field} = .*$", source, re.M)[0], f"{field} = {value!r}")
    path, record = issuing.issue(project / "H1.ipynb")
    assert verifying.verify(path).ok
    assert "=1+1" in re.sub(r"\s+", "", text_of(path)) and record["inputs"][field]["value"] == value
