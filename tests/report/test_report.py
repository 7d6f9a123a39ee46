"""A whole report, from inputs cell to PDF, read back: every check, every input, attachments, bytes, both papers, hostile names."""

import json
import re
import shutil
from pathlib import Path

import pikepdf
import pypdf
import pytest

from gageline import running
from gageline.presenting import ratio

DEMO = Path(__file__).parents[2] / "calcs" / "conveyor-gallery"

pytestmark = pytest.mark.slow


def made(folder, mark, project=lambda text: text, inputs=lambda text: text, **options):
    """Copy a demonstration mark into a folder, change it, and make its report: (path of the PDF, calculation)."""
    place = folder / "calcs" / "job"
    place.mkdir(parents=True)
    (place / "project.toml").write_text(project((DEMO / "project.toml").read_text(encoding="utf-8")), encoding="utf-8")
    book = json.loads((DEMO / f"{mark}.ipynb").read_text(encoding="utf-8"))
    cell = next(cell for cell in book["cells"] if "parameters" in cell["metadata"].get("tags", ()))
    cell["source"] = inputs("".join(cell["source"]))
    (place / f"{mark}.ipynb").write_text(json.dumps(book), encoding="utf-8")
    return running.report(place / f"{mark}.ipynb", **options)


@pytest.fixture(scope="module")
def hanger(tmp_path_factory):
    """The tee hanger's report."""
    return made(tmp_path_factory.mktemp("hanger"), "H1")


@pytest.fixture(scope="module")
def text(hanger):
    """The hanger's text, all sheets, white space folded."""
    return re.sub(r"\s+", " ", " ".join(page.extract_text() for page in pypdf.PdfReader(hanger[0]).pages))


class TestContents:
    def test_lies_where_readme_says(self, hanger):
        """An unissued PDF lies in reports/<project>/preview, and nothing else is left there."""
        path = hanger[0]

        assert path.parts[-4:] == ("reports", "job", "preview", "H1.pdf")
        assert [each.name for each in path.parent.iterdir()] == ["H1.pdf"]

    def test_every_check_is_there(self, hanger, text):
        """Every check stands in the report: with its ratio, or with the reason why it does not apply."""
        for each in hanger[1].connection.checks:
            assert re.sub(r"\s+", " ", each.title) in text, each.title
            if each.applies:
                assert ratio(each) in text, each.title
            else:
                assert each.reason in text, each.title

    def test_every_input_is_there_with_its_source(self, hanger, text):
        """Each given input is echoed with its source."""
        squeezed = text.replace(" ", "")
        for name, given in hanger[1].given.items():
            if given.source:
                assert name in text and given.source.replace(" ", "") in squeezed, name

    def test_sections_in_order(self, hanger):
        """The bookmarks are the report's sections in the order of the work."""
        outline = [item.title for item in pypdf.PdfReader(hanger[0]).outline if not isinstance(item, list)]
        wanted = ["Summary", "Inputs", "Loads and required strength", "Connection as designed", "Member", "Bolts", "Connection plate",
                  "Spacing, edges, clearance", "Capacity against connection length", "Permissible loads", "Notation", "References", "Cautions",
                  "Program identification"]

        assert [re.sub(r"^\d+\s*", "", title) for title in outline if re.sub(r"^\d+\s*", "", title) in wanted] == wanted

    def test_published_numbers_appear_as_printed(self, text):
        """Manual table 7-1 gives 24.3 kip for a 7/8 in Group 120-N bolt in single shear; six of them are 146 kip."""
        assert "146 kip" in text and "0.845" in text

    def test_sheet_x_of_y_on_every_sheet(self, hanger):
        """Each sheet carries its number, the count, mark, revision and status."""
        pages = pypdf.PdfReader(hanger[0]).pages
        for number, page in enumerate(pages, start=1):
            said = re.sub(r"\s+", " ", page.extract_text())
            assert f"{number} of {len(pages)}" in said and "H1" in said and "PRELIMINARY" in said

    @pytest.mark.parametrize("token", [r"\\[a-z]+", "_per_", r"\bnan\b", r"\binf\b", r"\*\*", "dimensionless", "Traceback", "calc\\.", "import "])
    def test_no_forbidden_tokens(self, text, token):
        """No code, no LaTeX, no unit names of a registry, no missing numbers."""
        assert not re.search(token, text)

    def test_cautions_and_identification(self, text):
        """The cautions stand there, and the program says what it is; nothing is signed."""
        assert "licensed engineer is responsible" in text and "gageline 0." in text and "SHA-256" in text


class TestAttachments:
    def test_results_and_inputs_travel(self, hanger):
        """The PDF carries notebook, inputs, results and project file; the results are the calculation's own."""
        path, calc = hanger
        with pikepdf.open(path) as pdf:
            files = {name: spec.get_file().read_bytes() for name, spec in pdf.attachments.items()}

        assert set(files) == {"H1.ipynb", "inputs.json", "results.json", "project.toml"}
        assert json.loads(files["results.json"]) == json.loads(json.dumps(calc.results()))
        assert files["project.toml"] == (DEMO / "project.toml").read_bytes()
        assert json.loads(files["inputs.json"])["P_L"]["value"] == "46 kip"

    def test_claims_archival_and_accessible(self, hanger):
        """The metadata claims PDF/A-3a and PDF/UA-1, with title and language."""
        with pikepdf.open(hanger[0]) as pdf, pdf.open_metadata() as meta:
            assert meta.pdfa_status == "3A" and meta.get("pdfuaid:part") == "1"
            assert str(pdf.Root.Lang).startswith("en") and pdf.Root.MarkInfo.Marked

    def test_same_input_same_bytes(self, hanger, tmp_path):
        """Another run in another folder gives the same bytes."""
        again, _ = made(tmp_path, "H1")

        assert again.read_bytes() == hanger[0].read_bytes()


def test_override_is_printed_as_one(tmp_path):
    """An input set at the run is computed with, marked as overridden, and listed as an open item."""
    path, calc = made(tmp_path, "H1", overrides={"rows": 4})
    said = re.sub(r"\s+", " ", " ".join(page.extract_text() for page in pypdf.PdfReader(path).pages))

    assert calc.connection.joint.n_bolts == 8
    assert "override at the run" in said and "Inputs overridden at the run: rows" in said


def test_hostile_names_print_as_typed_on_a4_by_allowable_stress(tmp_path):
    """Signs that mean something to Typst, LaTeX and HTML, and letters beyond Latin, print as typed; A4 and ASD work."""
    name = r'Мост № 7 #1 $x$ \n @ref <b> "quoted" Ωμέγα łódź [a] {b} ~ % & * _'
    toml = json.dumps(name, ensure_ascii=False)

    def project(text):
        text = re.sub(r'project = ".*"', lambda _: f"project = {toml}", text).replace('"LRFD"', '"ASD"').replace('"us-letter"', '"a4"')
        return re.sub(r'edition = ".*"', 'edition = "360-16"', text)

    path, _ = made(tmp_path, "B2", project=project)
    pdf = pypdf.PdfReader(path)
    squeezed = "".join(page.extract_text() for page in pdf.pages).replace("\n", "").replace(" ", "")

    assert name.replace(" ", "") in squeezed
    assert round(float(pdf.pages[0].mediabox.width)) == 595
    assert "AISC360-16" in squeezed and "J3.10" in squeezed and "R_n/Ω" not in squeezed


def test_saved_notebook_exports_by_itself(tmp_path):
    """A calculation saved with its outputs is exported by nbconvert under our name, to the same sheets."""
    from nbconvert.exporters import get_exporter

    path, _ = made(tmp_path, "C4", save=True)
    exporter = get_exporter("gageline")()
    pdf, _ = exporter.from_filename(str(tmp_path / "calcs" / "job" / "C4.ipynb"))

    assert pdf == path.read_bytes()


def test_own_look_of_a_project(tmp_path):
    """A project's own sheet/sheet.typ is used in place of the shipped one."""
    place = tmp_path / "calcs" / "job" / "sheet"
    shutil.copytree(Path(__file__).parents[2] / "templates" / "sheet", place)
    typ = (place / "sheet.typ").read_text(encoding="utf-8")
    (place / "sheet.typ").write_text(typ.replace("#8a2b1e", "#1e4f8a") if "#8a2b1e" in typ else typ + "\n", encoding="utf-8")
    (tmp_path / "calcs" / "job" / "project.toml").write_bytes((DEMO / "project.toml").read_bytes())
    shutil.copyfile(DEMO / "C4.ipynb", tmp_path / "calcs" / "job" / "C4.ipynb")

    path, _ = running.report(tmp_path / "calcs" / "job" / "C4.ipynb")

    assert path.read_bytes().startswith(b"%PDF")
