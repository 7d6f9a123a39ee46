"""A whole run: what it makes, what a second one makes anew, and what is left when it is stopped or killed at any instant."""

import json
import os
import random
import signal
import subprocess
import sys
import time

import pytest

from gageline import running, starting
from gageline.errors import ReportError
from gageline.schedule import run, state

from .conftest import sample_rows, write_csv

HEADS, ROWS = sample_rows()
CHOSEN = [ROWS[0], ROWS[26], ROWS[40]]
COMMAND = [sys.executable, "-c", "from gageline.cli import main; main()", "schedule"]


def made_files(folder):
    """Return name -> bytes of every file of a project's run, lock files left out."""
    root = folder.parents[1]
    return {path.relative_to(root).as_posix(): path.read_bytes() for path in sorted(root.rglob("*"))
            if path.is_file() and path.name != ".gageline-lock"}


@pytest.fixture(scope="module")
def undisturbed(tmp_path_factory):
    """Return (project folder, outcome, files) of a run of three good rows and two bad ones."""
    import shutil

    from .conftest import DEMO

    folder = tmp_path_factory.mktemp("run") / "calcs" / "job"
    folder.mkdir(parents=True)
    shutil.copyfile(DEMO / "project.toml", folder / "project.toml")
    lines = [CHOSEN[0], ROWS[1] | {"member": "WT8x26"}, *CHOSEN[1:], ROWS[2] | {"title": "🏗 crane"}]
    found = run.run(write_csv(folder / "ties.csv", HEADS, lines), workers=1)
    return folder, found, made_files(folder)


class TestRun:
    def test_good_rows_stand_and_bad_ones_are_told(self, undisturbed):
        _, found, files = undisturbed

        assert found.made == [row["mark"] for row in CHOSEN]
        assert found.all_faults[0].row == 3 and found.all_faults[0].sentence.startswith("member: shape 'WT8x26' is not in the tables; nearest are")
        assert found.all_faults[1].row == 6 and "fonts have no sign" in found.all_faults[1].sentence
        for row in CHOSEN:
            assert files[f"reports/job/preview/ties/{row['mark']}.pdf"].startswith(b"%PDF")
        assert "reports/job/preview/ties.pdf" in files and "reports/job/preview/ties.xlsx" in files

    def test_notebooks_hold_their_outputs(self, undisturbed):
        _, found, _ = undisturbed

        book = running.read_notebook(found.places.book(CHOSEN[0]["mark"]))

        assert all(cell["outputs"] for cell in book["cells"] if cell["cell_type"] == "code" and "calc" in cell["source"])

    @pytest.mark.slow
    def test_each_equals_the_single_report(self, undisturbed, tmp_path):
        """The very bytes that ``gageline report`` makes of the same notebook in a kernel of Jupyter."""
        _, found, _ = undisturbed

        for row in CHOSEN:
            path, _ = running.report(found.places.book(row["mark"]), out=tmp_path / "single.pdf")

            assert path.read_bytes() == found.places.pdf(row["mark"]).read_bytes()

    def test_second_run_makes_nothing(self, undisturbed):
        folder, found, files = undisturbed
        before = {path: path.stat().st_mtime_ns for path in found.places.pdfs.parent.rglob("*") if path.is_file() and path.name != ".gageline-lock"}
        # The row whose title cannot be printed is tried again, and fails again.
        again = run.run(folder / "ties.csv", workers=1)

        assert again.made == [] and again.kept == [row["mark"] for row in CHOSEN]
        assert {path: path.stat().st_mtime_ns for path in before} == before
        assert made_files(folder) == files


class TestSecondRun:
    @pytest.fixture
    def again(self, undisturbed, tmp_path):
        """Return (folder, schedule, run it) of a copy of the undisturbed run with its good rows."""
        import shutil

        shutil.copytree(undisturbed[0].parents[1], tmp_path / "copy")
        folder = tmp_path / "copy" / "calcs" / "job"
        write_csv(folder / "ties.csv", HEADS, CHOSEN)
        return folder, lambda: run.run(folder / "ties.csv", workers=1)

    def test_missing_and_changed_only(self, again):
        folder, once_more = again
        names = [row["mark"] for row in CHOSEN]
        (folder.parents[1] / "reports/job/preview/ties" / f"{names[0]}.pdf").unlink()
        write_csv(folder / "ties.csv", HEADS, [CHOSEN[0], CHOSEN[1] | {"P_D [kip]": "3"}, CHOSEN[2]])

        assert sorted(once_more().made) == sorted(names[:2])

    def test_moved_rows_are_not_changed_rows(self, again):
        folder, once_more = again
        write_csv(folder / "ties.csv", HEADS, CHOSEN[::-1])

        assert once_more().made == []

    def test_what_the_project_fixes_changes_all(self, again):
        folder, _ = again
        found = run.check(folder / "ties.csv")
        places = found.places
        hashes = [state.content_hash(mark, folder / "project.toml") for mark in found.marks]
        assert all(state.is_made(places, mark, content) for mark, content in zip(found.marks, hashes))
        toml = folder / "project.toml"
        toml.write_text(toml.read_text(encoding="utf-8").replace('client = "', 'client = "Another '), encoding="utf-8")
        state._surroundings.cache_clear()

        assert not any(state.is_made(places, mark, state.content_hash(mark, toml)) for mark in found.marks)

    def test_a_notebook_edited_by_hand_is_never_overwritten(self, again):
        folder, once_more = again
        path = folder / "ties" / f"{CHOSEN[0]['mark']}.ipynb"
        book = json.loads(path.read_text(encoding="utf-8"))
        book["cells"][0]["source"] += "\n# mine"
        path.write_text(json.dumps(book), encoding="utf-8")
        write_csv(folder / "ties.csv", HEADS, [CHOSEN[0] | {"P_D [kip]": "3"}])

        found = once_more()

        assert "edited by hand" in found.all_faults[0].sentence
        assert json.loads(path.read_text(encoding="utf-8")) == book
        assert found.left_over == sorted(row["mark"] for row in CHOSEN[1:])

    def test_a_notebook_saved_by_jupyter_is_still_ours(self, again):
        folder, _ = again
        found = run.check(folder / "ties.csv")
        path = found.places.book(CHOSEN[0]["mark"])
        book = json.loads(path.read_text(encoding="utf-8"))
        for cell in book["cells"]:
            cell["source"] = cell["source"].splitlines(keepends=True)
        path.write_text(json.dumps(book), encoding="utf-8")

        state.refuse_edited(found.places, found.marks[0])
        assert state.is_made(found.places, found.marks[0], state.content_hash(found.marks[0], folder / "project.toml"))

    def test_a_started_calculation_of_that_name_is_not_overwritten(self, project):
        starting.start("HG01", project / "ties")
        found = run.check(write_csv(project / "ties.csv", HEADS, ROWS[:1]), project_folder=project)

        with pytest.raises(ReportError, match="no notebook of this schedule"):
            state.refuse_edited(found.places, found.marks[0])


def _kept(files):
    """Return the files that an engineer looks at; a killed write may leave a hidden part behind."""
    return {name: data for name, data in files.items() if not name.endswith(".part")}


@pytest.mark.slow
def test_killed_at_random_instants_and_resumed(undisturbed, tmp_path):
    """SIGKILL to the whole command, and SIGINT, at instants drawn at random; resumed until done, the files are those of the undisturbed run."""
    import shutil

    folder = tmp_path / "calcs" / "job"
    folder.mkdir(parents=True)
    for name in ("project.toml", "ties.csv"):
        shutil.copyfile(undisturbed[0] / name, folder / name)
    dice = random.Random(7)
    for how in (signal.SIGKILL, signal.SIGINT, signal.SIGKILL):
        process = subprocess.Popen([*COMMAND, str(folder / "ties.csv"), "--workers", "2"], stdout=subprocess.PIPE, stderr=subprocess.PIPE, text=True,
                                   start_new_session=True, preexec_fn=lambda: signal.signal(signal.SIGINT, signal.SIG_DFL))
        time.sleep(dice.uniform(1.5, 6.0))
        process.send_signal(how)
        _, said = process.communicate(timeout=20)
        assert "Traceback" not in said
        assert process.returncode in (-signal.SIGKILL, 130, 1)
        assert _gone(process.pid)
    last = subprocess.run([*COMMAND, str(folder / "ties.csv"), "--workers", "2"], capture_output=True, text=True, timeout=120)

    assert "3 of 5 marks stand" in last.stdout and last.returncode == 1
    assert _kept(made_files(folder)) == undisturbed[2]


def _gone(group):
    """Whether every process of a session has ended within a few seconds of its leader's."""
    for _ in range(100):
        alive = []
        for pid in filter(str.isdigit, os.listdir("/proc")):
            try:
                with open(f"/proc/{pid}/stat") as file:
                    fields = file.read().rpartition(")")[2].split()
                if int(fields[3]) == group and fields[0] != "Z":
                    alive.append(pid)
            except OSError:
                continue
        if not alive:
            return True
        time.sleep(0.1)
    return False


@pytest.mark.slow
def test_a_notebook_gone_wrong_costs_its_own_row(project, monkeypatch):
    """Four of six marks are poisoned after their rows were checked, as an edited template would do; the other two are made."""
    poisons = {0: ("import os; os._exit(1)", "kernel died"), 1: ("while True: pass", "ran longer than"),
               3: ("import os, signal; os.kill(os.getppid(), 9)", "process that holds the kernel died"), 4: ("x = bytearray(9 << 30)", "MemoryError")}
    plain = run.rows.validated

    def poisoned(*args, **kwargs):
        marks, faults = plain(*args, **kwargs)
        for i, (source, _) in poisons.items():
            marks[i].book["cells"][3]["source"] += "\n" + source
        return marks, faults

    monkeypatch.setattr(run.rows, "validated", poisoned)
    found = run.run(write_csv(project / "ties.csv", HEADS, ROWS[:6]), workers=1, seconds=6)

    assert sorted(found.made) == [ROWS[2]["mark"], ROWS[5]["mark"]]
    faults = {fault.mark: fault.sentence for fault in found.all_faults}
    assert len(faults) == 4
    for i, (_, said) in poisons.items():
        assert said in faults[ROWS[i]["mark"]]


def test_a_dead_worker_is_replaced(project, monkeypatch):
    """Killing a worker from outside costs the mark it had; the pool goes on with a new one."""
    from gageline.schedule import pool
    from gageline.schedule.worker import Work

    works = [Work(str(i), "bolted", {"cells": [], "metadata": {}, "nbformat": 4, "nbformat_minor": 5}, str(project), str(project / "project.toml"))
             for i in range(3)]
    real, started = pool.Started, []

    def start(module):
        started.append(real(module))
        if len(started) == 1:
            started[0].process.kill()
        return started[-1]

    monkeypatch.setattr(pool, "Started", start)
    faults = {work.mark: made.fault for work, made in pool.each_made(works, 1)}

    assert faults["0"] == "the process that worked on it died"
    assert "display the block meta" in faults["1"] and "display the block meta" in faults["2"]
    assert len(started) == 2 and all(each.process.poll() is not None for each in started)
