"""A project in a temporary folder, issues made without a kernel, small PDFs and records for the tests of the archive itself."""

import io
import json
import shutil
from pathlib import Path

import pikepdf
import pytest

import gageline
from gageline import running, store
from gageline.archive import reading

DEMO = Path(__file__).parents[2] / "calcs" / "conveyor-gallery"
FINDINGS = {"code": "AISC 360-22 throughout.", "criteria": "Loads as in LR-2.", "assumptions": "A1 to A6 agreed.",
            "method": "Each line recomputed by hand.", "conclusions": "Bolt shear governs, agreed."}


@pytest.fixture
def project(tmp_path):
    """Return calcs/job of a fresh project with the demonstration's project file and its hanger H1."""
    folder = tmp_path / "calcs" / "job"
    folder.mkdir(parents=True)
    for name in ("project.toml", "H1.ipynb"):
        shutil.copyfile(DEMO / name, folder / name)
    return folder


@pytest.fixture
def in_process(monkeypatch):
    """Let issuing run notebooks in this process: the same cells, no kernel to boot."""
    monkeypatch.setattr(running, "execute", execute)


def execute(book, folder, on_cell=None, before=lambda: None):
    """Run a notebook's cells here and return it with the outputs a kernel would give."""
    before()
    node, space = json.loads(json.dumps(book)), {}
    path = Path(folder) / "now.ipynb"
    path.write_text(json.dumps(book), encoding="utf-8")
    made = reading.read(path).calc
    path.unlink()
    space["gageline"] = type("gageline", (), {"begin": staticmethod(lambda family: made), "__version__": gageline.__version__})
    for cell in node["cells"]:
        source = reading.cell_text(cell).replace("import gageline\n", "")
        cell["execution_count"], cell["outputs"] = 1, []
        *head, last = source.strip().split("\n")
        exec("\n".join(head), space)
        if last.startswith("calc."):
            data = json.loads(json.dumps(eval(last, space)._repr_mimebundle_()))
            cell["outputs"] = [{"output_type": "execute_result", "metadata": {}, "data": data, "execution_count": 1}]
        else:
            exec(last, space)
    return node


def edit(path, old, new):
    """Replace a text in a notebook's sources."""
    book = json.loads(path.read_text(encoding="utf-8"))
    sources = [reading.cell_text(cell) for cell in book["cells"]]
    assert any(old in source for source in sources), old
    for cell, source in zip(book["cells"], sources):
        cell["source"] = source.replace(old, new)
    path.write_text(json.dumps(book), encoding="utf-8")


def small_pdf(text="x"):
    """Return the bytes of a PDF of one empty page that says its text in its title."""
    pdf, out = pikepdf.new(), io.BytesIO()
    pdf.add_blank_page(page_size=(612, 792))
    pdf.docinfo["/Title"] = text
    pdf.save(out, deterministic_id=True)
    return out.getvalue()


def record(mark="H1", rev="0", **changes):
    """Return the record of an issue before ``commit`` adds what only that moment knows."""
    check = {"id": "bolt shear", "title": "Bolts, shear", "applies": True, "ratio": 0.5, "demand": 1.0, "available": 2.0, "ok": True, "unit": "kip"}
    results = {"checks": [check], "governing": "bolt shear", "ratio": 0.5, "ok": True}
    return {"gageline_record": 1, "kind": "issue", "mark": mark, "rev": rev, "status": "preliminary", "date": "2026-12-01", "title": "Tie",
            "revision_text": "first", "signed": {"by": "A.B.", "checked": "", "approved": ""}, "content": "", "notebook": "", "attachments": {},
            "basis": {"edition": "360-22", "method": "LRFD", "loads": "7-22"}, "inputs": {}, "results": results, "versions": {}, "register": [],
            "lines": [], "signoffs": []} | changes


def snapshot(folder):
    """Return name -> SHA-256 of every file in a folder that is part of an issue."""
    return {path.name: store.sha256(path.read_bytes()) for path in Path(folder).iterdir() if path.suffix in (".pdf", ".json", ".zip")}
