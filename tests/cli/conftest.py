"""A project in a temporary folder, with one calculation of each demonstration mark's kind."""

import json
import shutil
from pathlib import Path

import pytest

ROOT = Path(__file__).parents[2]
DEMO = ROOT / "calcs" / "conveyor-gallery"


@pytest.fixture
def project(tmp_path):
    """Return calcs/job of a fresh project with the demonstration's project file and its hanger H1."""
    folder = tmp_path / "calcs" / "job"
    folder.mkdir(parents=True)
    for name in ("project.toml", "H1.ipynb"):
        shutil.copyfile(DEMO / name, folder / name)
    return folder


def edit_inputs(path, change):
    """Rewrite a notebook's inputs cell by a function of its source."""
    book = json.loads(path.read_text(encoding="utf-8"))
    cell = next(cell for cell in book["cells"] if "parameters" in cell["metadata"].get("tags", ()))
    cell["source"] = change("".join(cell["source"]))
    path.write_text(json.dumps(book), encoding="utf-8")
