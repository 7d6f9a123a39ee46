"""A project bound into one PDF: index, sheet numbers, bookmarks, tags; and the record profile with its bundle."""

import re
import shutil

import pikepdf
import pypdf
import pytest

from gageline.archive import attached, binding, changes, commit, issuing, records, verifying
from gageline.errors import ReportError

from .conftest import DEMO, execute, snapshot


@pytest.fixture(scope="module")
def issued(tmp_path_factory):
    """Return (project folder, reports folder) with H1 issued and B2 in the record profile."""
    folder = tmp_path_factory.mktemp("bound") / "calcs" / "job"
    folder.mkdir(parents=True)
    for name in ("project.toml", "H1.ipynb", "B2.ipynb"):
        shutil.copyfile(DEMO / name, folder / name)
    run = pytest.MonkeyPatch()
    run.setattr("gageline.running.execute", execute)
    issuing.issue(folder / "H1.ipynb")
    issuing.issue(folder / "B2.ipynb", profile="record")
    run.undo()
    return folder, folder.parents[1] / "reports" / "job"


@pytest.fixture(scope="module")
def bound(issued, tmp_path_factory):
    """Return (path of the set, records bound)."""
    pdf, chosen = binding.bind(issued[0])
    path = tmp_path_factory.mktemp("set") / "set.pdf"
    path.write_bytes(pdf)
    return path, chosen


def tags(element):
    """Yield every structure element below one."""
    if isinstance(element, pikepdf.Array):
        for each in element:
            yield from tags(each)
    elif isinstance(element, pikepdf.Dictionary):
        if "/S" in element:
            yield element
        if "/K" in element:
            yield from tags(element.K)


class TestBound:
    def test_sheets_are_numbered_through(self, issued, bound):
        """Each foot says its place in the set; the pages are the cover's and all of the parts'."""
        parts = sum(len(pypdf.PdfReader(path).pages) for path in issued[1].glob("*-rev0.pdf"))
        pages = pypdf.PdfReader(bound[0]).pages
        assert len(pages) > parts
        for i in (0, 5, len(pages) - 1):
            assert f"Set: sheet {i + 1} of {len(pages)}" in pages[i].extract_text()

    def test_index_leads_to_the_sheets(self, bound):
        """The sheets that the index names begin with the mark's cover."""
        pages = pypdf.PdfReader(bound[0]).pages
        index = " ".join(pages[i].extract_text() for i in range(3))
        start, end = map(int, re.search(r"B2.*?preliminary\s+(\d+)–(\d+)", index, re.S).groups())
        assert "Side brace" in pages[start - 1].extract_text() and f"of {end - start + 1}" in pages[start - 1].extract_text()

    def test_bookmarks(self, bound):
        """A bookmark for each calculation, its sections below it, each leading to a sheet that holds its heading."""
        reader = pypdf.PdfReader(bound[0])
        top, *rest = reader.outline
        assert top.title == "Cover and index"
        assert [item.title.split(":")[0] for item in rest if not isinstance(item, list)] == ["B2 rev 0", "H1 rev 0"]
        for item in next(item for item in rest if isinstance(item, list))[:6]:
            words = re.sub(r"^\d+\s+", "", item.title)
            assert words in reader.pages[reader.get_destination_page_number(item)].extract_text()

    def test_tags_are_kept(self, issued, bound):
        """As many equations with their reading as in the parts, on pages of the set; each page finds its tags."""
        def formulas(pdf):
            return [each for each in tags(pdf.Root.StructTreeRoot.K) if each.S == "/Formula"]

        parts = 0
        for path in issued[1].glob("*-rev0.pdf"):
            with pikepdf.open(path) as pdf:
                parts += len(formulas(pdf))
        with pikepdf.open(bound[0]) as pdf:
            found = formulas(pdf)
            pages = {page.obj.objgen for page in pdf.pages}
            parents = dict(binding._numbers(pdf.Root.StructTreeRoot.ParentTree))
            assert len(found) == parts > 100 and all(str(each.Alt).strip() for each in found)
            assert all(each.Pg.objgen in pages for each in tags(pdf.Root.StructTreeRoot.K) if "/Pg" in each)
            for page in pdf.pages:
                assert {each.Pg.objgen for each in parents[int(page.obj.StructParents)] if isinstance(each, pikepdf.Dictionary) and "/Pg" in each} \
                    <= {page.obj.objgen}

    def test_nothing_issued_is_touched_and_the_set_repeats(self, issued, bound):
        """Binding twice gives the same bytes."""
        before = snapshot(issued[1])
        assert binding.bind(issued[0])[0] == bound[0].read_bytes()
        assert snapshot(issued[1]) == before

    def test_void_revisions_are_left_out_and_faults_stop(self, issued, tmp_path):
        """A set of what stands, and only of what was issued."""
        folder = tmp_path / "calcs" / "job"
        shutil.copytree(issued[0], folder)
        shutil.copytree(issued[1], tmp_path / "reports" / "job")
        commit.void(tmp_path / "reports" / "job" / "B2-rev0.pdf", "C.D.", "wrong brace")
        assert [record["mark"] for record in binding.bind(folder)[1]] == ["H1"]
        path = tmp_path / "reports" / "job" / "H1-rev0.pdf"
        path.write_bytes(path.read_bytes() + b"%")
        with pytest.raises(ReportError, match="not what was issued"):
            binding.bind(folder)
        shutil.rmtree(tmp_path / "reports")
        with pytest.raises(ReportError, match="nothing is issued"):
            binding.bind(folder)


class TestRecordProfile:
    def test_claims(self, issued):
        """PDF/A-2a and PDF/UA-1, nothing attached; the bundle beside it holds what would be."""
        path = issued[1] / "B2-rev0.pdf"
        with pikepdf.open(path) as pdf:
            said = pdf.open_metadata()
            assert (said["pdfaid:part"], said["pdfaid:conformance"], said["pdfuaid:part"]) == ("2", "A", "1")
            assert not pdf.attachments
        assert set(attached.read_attachments(path)) == {"B2.ipynb", "inputs.json", "results.json", "project.toml", "register.json", "versions.json"}

    def test_verified_with_its_bundle(self, issued, tmp_path):
        """The bundle's hash is in the record too; without it nothing can be computed again."""
        shutil.copytree(issued[1], tmp_path / "reports")
        path = tmp_path / "reports" / "B2-rev0.pdf"
        assert verifying.verify(path).ok
        assert not changes.compare(changes.state_of(path), changes.state_of(path.with_suffix(".json")))
        bundle = path.with_suffix(".zip")
        good = bundle.read_bytes()
        for bad in (good[:-1], good[:100] + bytes([good[100] ^ 1]) + good[101:], b""):
            bundle.write_bytes(bad)
            assert any("B2-rev0.zip is not what was issued" in fault for fault in verifying.verify(path).faults)
        bundle.unlink()
        assert any("no bundle" in fault for fault in verifying.verify(path).faults)
        assert any("B2-rev0.zip" in fault for fault in records.read(tmp_path / "reports").faults)

    def test_a_bundle_gives_the_same_bytes(self):
        """Whatever the order and the time."""
        assert attached.bundle({"b": b"2", "a": b"1"}) == attached.bundle({"a": b"1", "b": b"2"})
