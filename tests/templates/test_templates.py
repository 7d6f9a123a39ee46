"""Every template and demonstration notebook: well formed, free of outputs where it is a template, and runs as it stands."""

import json
import os
import subprocess
import sys
from pathlib import Path

import pytest

from gageline import cells, families

ROOT = Path(__file__).parents[2]
TEMPLATES = sorted((ROOT / "templates").glob("*.ipynb"))
CALCS = sorted((ROOT / "calcs").glob("*/*.ipynb"))


@pytest.mark.parametrize("path", TEMPLATES, ids=lambda path: path.stem)
class TestTemplate:
    def test_is_a_family_with_one_inputs_cell(self, path):
        """A template has its family's name, one inputs cell, a source behind each input, and no outputs."""
        book = json.loads(path.read_text(encoding="utf-8"))
        given = cells.inputs_of_notebook(book)

        assert path.stem in families.names()
        assert all(each.source for name, each in given.items() if name not in ("mark", "title"))
        assert not any(cell.get("outputs") for cell in book["cells"])

    def test_holds_no_formula(self, path):
        """Beside the inputs a template only asks the calculation for its parts."""
        book = json.loads(path.read_text(encoding="utf-8"))
        for cell in book["cells"]:
            if cell["cell_type"] == "code" and "parameters" not in cell["metadata"].get("tags", ()):
                for line in "".join(cell["source"]).splitlines():
                    assert line == "" or line.startswith(("import gageline", "calc = gageline.begin(", "calc.")), line

    @pytest.mark.slow
    def test_runs_under_nbval(self, path):
        """nbval runs every cell of the template without an error."""
        run = subprocess.run([sys.executable, "-m", "pytest", "--nbval-lax", "-q", "-p", "no:cacheprovider", "-c", os.devnull, str(path)],
                             cwd=path.parent, capture_output=True, text=True, timeout=300)
        assert run.returncode == 0, run.stdout[-2000:]


def test_every_family_has_a_template():
    """No family without a template of its name."""
    assert {path.stem for path in TEMPLATES} == set(families.names())


@pytest.mark.parametrize("path", CALCS, ids=lambda path: path.stem)
def test_demonstration_inputs_have_sources(path):
    """Each input of a demonstration mark says where it comes from; the project is marked as invented."""
    given = cells.inputs_of_notebook(json.loads(path.read_text(encoding="utf-8")))

    assert all(each.source for name, each in given.items() if name not in ("mark", "title", "purpose", "open_items", "assumptions"))
    assert "invented" in (path.parent / "project.toml").read_text(encoding="utf-8")


@pytest.mark.slow
@pytest.mark.parametrize("command", [["papermill", "--cwd", "{folder}", "{book}", "{out}", "-p", "rows", "4", "--no-progress-bar"],
                                     ["jupyter", "execute", "--output", "{out}", "{book}"]], ids=["papermill", "jupyter execute"])
def test_runs_with_other_runners(command, tmp_path):
    """papermill (with an override) and jupyter execute run a template, and the result can be set as a sheet."""
    from gageline.sheet import build_pdf

    path, out = ROOT / "templates" / "bolted.ipynb", tmp_path / "out.ipynb"
    words = [word.format(folder=path.parent, book=path, out=out) for word in command]
    run = subprocess.run([str(Path(sys.executable).parent / words[0]), *words[1:]], cwd=path.parent, capture_output=True, text=True, timeout=300)
    assert run.returncode == 0, run.stderr[-2000:]

    book = json.loads(out.read_text(encoding="utf-8"))

    assert build_pdf(book).startswith(b"%PDF")
    if command[0] == "papermill":
        assert "override at the run" in out.read_text(encoding="utf-8")
