"""The command line as a user meets it: verbs, exit codes, one sentence on stderr, and no file where something is wrong."""

import json
import os
import re
import stat
import subprocess
import sys

import pytest

from .conftest import DEMO, edit_inputs


def gageline(*words, cwd=None):
    """Run the command line in a process of its own and return it."""
    return subprocess.run([sys.executable, "-c", "from gageline.cli import main; main()", *map(str, words)], cwd=cwd, capture_output=True,
                          text=True, timeout=240)


def refused(run, *words):
    """Assert that a run failed with one sentence on stderr that holds the words, and left no PDF behind."""
    assert run.returncode not in (0, None), run.stdout
    assert run.stdout == ""
    sentence = run.stderr.strip()
    assert "\n" not in sentence and "Traceback" not in sentence and sentence.startswith("gageline: "), sentence
    for word in words:
        assert word in sentence, sentence


def files(folder):
    """Return every file below the folder that holds calcs/."""
    return {path.relative_to(folder) for path in folder.rglob("*") if path.is_file()}


class TestSimpleVerbs:
    def test_version(self):
        """--version prints the package's version."""
        from gageline import __version__

        assert gageline("--version").stdout.strip() == f"gageline {__version__}"

    def test_help_loads_nothing_heavy(self):
        """--help imports neither numpy, pint, pydantic, matplotlib nor jupyter, so that it answers at once."""
        code = ("import sys; sys.argv = ['gageline', '--help']\nfrom gageline.cli import main\ntry:\n    main()\nexcept SystemExit:\n    pass\n"
                "print([m for m in ('numpy', 'pint', 'pydantic', 'matplotlib', 'nbformat', 'nbclient', 'handcalcs') if m in sys.modules])")
        run = subprocess.run([sys.executable, "-c", code], capture_output=True, text=True)
        assert run.stdout.strip().endswith("[]")

    def test_shapes_lists_and_misses(self):
        """A beginning lists what starts with it; nonsense names the nearest."""
        assert "WT8x25" in gageline("shapes", "wt8").stdout.split()
        refused(gageline("shapes", "W8x22"), "W8x21", "nearest")

    def test_inputs_lists_every_input(self):
        """Every input of the family stands in the list, with its meaning."""
        from gageline.connections.bolted.inputs import BoltedInputs

        said = gageline("inputs", "bolted").stdout
        assert all(re.search(rf"^{name}\b", said, re.M) for name in BoltedInputs.model_fields)

    def test_unknown_verb_and_option(self):
        """A misspelt verb or option is one sentence and exit code 2."""
        for words in (("reprot", "x"), ("report", "--nosuch", "x")):
            run = gageline(*words)
            assert run.returncode == 2 and run.stderr.startswith("gageline: ") and run.stderr.count("\n") == 1


class TestNew:
    def test_starts_a_calculation_that_computes(self, tmp_path):
        """new lays out project.toml and the notebook; quick computes it; a second new does not overwrite it."""
        folder = tmp_path / "calcs" / "tower"
        assert gageline("new", "H7", "--project", folder).returncode == 0
        assert files(folder) == {p.relative_to(folder) for p in (folder / "H7.ipynb", folder / "project.toml")}
        run = gageline("quick", folder / "H7.ipynb")
        assert run.returncode == 0 and "Bolts, shear" in run.stdout
        before = (folder / "H7.ipynb").read_bytes()
        refused(gageline("new", "H7", "--project", folder), "not overwritten")
        assert (folder / "H7.ipynb").read_bytes() == before

    @pytest.mark.parametrize(("words", "said"), [(("a/b",), "cannot name a file"), (("H1", "--family", "bolt"), "bolted")])
    def test_refuses(self, tmp_path, words, said):
        """A mark that is no file name, and an unknown family, stop before anything is written."""
        refused(gageline("new", *words, "--project", tmp_path / "calcs" / "x"), said)
        assert files(tmp_path) == set()


BAD = [
    ("misspelt name", lambda s: s.replace("pitch =", "pich ="), ("pich", "pitch")),
    ("missing unit", lambda s: s.replace('"38 kip"', "38"), ("P_D", "unit")),
    ("wrong dimension", lambda s: s.replace('"46 kip"', '"31 ksi"'), ("P_L", "31 ksi", "force")),
    ("unknown shape", lambda s: s.replace("WT8x33.5", "WT8x34"), ("WT8x34", "nearest", "WT8x33.5")),
    ("unknown grade", lambda s: s.replace('"A992"', '"A993"'), ("A993",)),
    ("unknown bolt", lambda s: s.replace('"7/8 in"  # dwg S-001', '"13/16 in"  # dwg S-001'), ("13/16",)),
    ("grade not for the series", lambda s: s.replace('member_grade = "A992"', 'member_grade = "A500 C"'), ("A500", "not made")),
    ("nan", lambda s: s.replace('"46 kip"', '"nan kip"'), ("P_L",)),
    ("absurd size", lambda s: s.replace('plate_thickness = "3/4 in"', 'plate_thickness = "40 ft"'), ("plate_thickness",)),
    ("zero pitch", lambda s: s.replace('pitch = "3 in"', 'pitch = "0 in"'), ("pitch",)),
    ("two statements", lambda s: s + "\nimport os", ("inputs cell",)),
    ("formula as value", lambda s: s.replace('"46 kip"', "3 * 4"), ("P_L", "plain text")),
    ("given twice", lambda s: s + '\nrows = 4', ("rows", "twice")),
]


class TestBadInput:
    @pytest.mark.parametrize(("change", "words"), [case[1:] for case in BAD], ids=[case[0] for case in BAD])
    def test_quick_refuses_in_one_sentence(self, project, change, words):
        """Each wrong input is one sentence with what is wrong, exit code not 0."""
        edit_inputs(project / "H1.ipynb", change)
        refused(gageline("quick", project / "H1.ipynb"), *words)

    @pytest.mark.slow
    def test_report_writes_nothing_on_bad_input(self, project):
        """A wrong input stops the report before any cell is run: no PDF, no half-written file, the notebook untouched."""
        edit_inputs(project / "H1.ipynb", BAD[0][1])
        before, book = files(project.parents[1]), (project / "H1.ipynb").read_bytes()
        refused(gageline("report", project / "H1.ipynb"), "pich", "pitch")
        assert files(project.parents[1]) == before and (project / "H1.ipynb").read_bytes() == book

    def test_no_inputs_cell(self, project):
        """A notebook without a cell tagged parameters is refused."""
        book = json.loads((project / "H1.ipynb").read_text())
        for cell in book["cells"]:
            cell["metadata"].pop("tags", None)
        (project / "H1.ipynb").write_text(json.dumps(book))
        refused(gageline("report", project / "H1.ipynb"), "no cell tagged parameters")

    @pytest.mark.parametrize(("text", "said"), [("not json", "not a notebook"), ('{"nbformat": 3, "cells": []}', "format 4")])
    def test_no_notebook(self, project, text, said):
        """Another file is refused."""
        (project / "X.ipynb").write_text(text)
        refused(gageline("report", project / "X.ipynb"), said)

    def test_missing_files(self, project):
        """A missing notebook and a missing project.toml are named."""
        refused(gageline("report", project / "none.ipynb"), "none.ipynb")
        (project / "project.toml").unlink()
        refused(gageline("quick", project / "H1.ipynb"), "project.toml")

    @pytest.mark.parametrize(("old", "new", "words"), [
        ('method = "LRFD"', 'method = "lrfd"', ("method", "lrfd")), ('edition = "360-22"', 'edition = "360-10"', ("edition", "360-10")),
        ('paper = "us-letter"', 'papre = "a4"', ("papre", "paper")), ("date = 2026-12-01", "", ("date",)), ('rev = "0"', "rev = 0", ("rev",))])
    def test_project_file(self, project, old, new, words):
        """A wrong, unknown or missing key of project.toml is named with what is allowed."""
        path = project / "project.toml"
        path.write_text(path.read_text().replace(old, new))
        refused(gageline("quick", project / "H1.ipynb"), *words)

    @pytest.mark.slow
    def test_failing_cell(self, project):
        """A notebook that fails half way gives its cell and reason, and no PDF."""
        book = json.loads((project / "H1.ipynb").read_text())
        book["cells"].insert(4, {"cell_type": "code", "id": "bad", "metadata": {}, "source": "1 / 0", "outputs": [], "execution_count": None})
        (project / "H1.ipynb").write_text(json.dumps(book))
        before = files(project.parents[1])
        refused(gageline("report", project / "H1.ipynb"), "cell 5", "division by zero")
        assert files(project.parents[1]) == before

    @pytest.mark.slow
    def test_dead_kernel(self, project):
        """A kernel that dies costs one sentence, not a hang."""
        book = json.loads((project / "H1.ipynb").read_text())
        book["cells"].insert(2, {"cell_type": "code", "id": "die", "metadata": {}, "source": "import os; os._exit(1)", "outputs": [],
                                 "execution_count": None})
        (project / "H1.ipynb").write_text(json.dumps(book))
        refused(gageline("report", project / "H1.ipynb"), "kernel died", "cell 3")

    def test_unwritable_folder(self, project, tmp_path):
        """A place that cannot be written to is named before anything is run."""
        if os.geteuid() == 0:
            blocked = tmp_path / "file"
            blocked.write_text("a file where a folder should be")
            refused(gageline("report", project / "H1.ipynb", "--out", blocked / "x.pdf"), str(blocked))
        else:
            locked = tmp_path / "locked"
            locked.mkdir()
            locked.chmod(stat.S_IRUSR | stat.S_IXUSR)
            refused(gageline("report", project / "H1.ipynb", "--out", locked / "x.pdf"), str(locked))

    def test_bad_override(self, project):
        """--set needs name=value and a known name."""
        refused(gageline("quick", project / "H1.ipynb", "--set", "rows"), "name=value")
        refused(gageline("quick", project / "H1.ipynb", "--set", "rowz=4"), "rowz", "rows")


class TestOverride:
    def test_override_changes_the_result(self, project):
        """One row more gives the bolts a third more strength: 146 kip for 3 rows, 194 kip for 4 (24.35 kip a bolt, Manual table 7-1)."""
        assert "146 kip" in gageline("quick", project / "H1.ipynb").stdout
        assert "194 kip" in gageline("quick", project / "H1.ipynb", "--set", "rows=4").stdout

    def test_text_override(self, project):
        """A text needs no quotes."""
        assert "WT8x33.5" not in gageline("quick", project / "H1.ipynb", "--set", "member=WT8x50", "--set", "plate_width=12 in").stderr


def test_demo_marks_compute():
    """Every demonstration mark computes, and its checks are satisfied."""
    for path in sorted(DEMO.glob("*.ipynb")):
        run = gageline("quick", path)
        assert run.returncode == 0 and "N.G." not in run.stdout, (path.name, run.stdout, run.stderr)


class TestStudies:
    def test_search_prints_the_best_and_its_inputs_cell(self, project, tmp_path):
        """Three rows of 7/8 in bolts at 3 in carry the hanger; the winner comes as an inputs cell, the plot as a file."""
        run = gageline("search", project / "H1.ipynb", "--vary", "rows=2:5:1", "--vary", "plate_thickness=3/8 in,3/4 in", "--plot", tmp_path / "p.svg")

        assert run.returncode == 0, run.stderr
        assert "8 layouts evaluated" in run.stdout and "rows = 3  # chosen by the search" in run.stdout
        assert (tmp_path / "p.svg").read_text().startswith("<?xml")

    def test_search_refuses_a_bad_range(self, project):
        """A range needs start, stop and step, and a known input."""
        refused(gageline("search", project / "H1.ipynb", "--vary", "rows=2:5"), "start:stop:step")
        refused(gageline("search", project / "H1.ipynb", "--vary", "rowz=2,3"), "rowz", "rows")

    def test_margins_name_the_check_that_governs(self, project):
        """The live load may grow to where the bolts fail."""
        run = gageline("margins", project / "H1.ipynb")

        assert run.returncode == 0 and "P_L" in run.stdout and "Bolts, shear" in run.stdout

    def test_built_against_designed(self, project):
        """A plate measured at 0.70 in. instead of 3/4 in. has 6.7 % less; a missing bolt is refused without a written basis."""
        refused(gageline("built", project / "H1.ipynb", "--set", "missing_bolts=[2]"), "J1.7")
        run = gageline("built", project / "H1.ipynb", "--set", "plate_thickness=0.70 in")

        assert run.returncode == 0, run.stderr
        assert "-6.7 %" in run.stdout and "As built: OK" in run.stdout
