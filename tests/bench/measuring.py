"""What the benchmarks share: projects with as many marks as wanted, the baseline, and the time and memory of process trees."""

import csv
import os
import re
import shutil
import subprocess
import sys
import tempfile
import threading
import time
from concurrent.futures import ThreadPoolExecutor
from pathlib import Path

ROOT = Path(__file__).resolve().parents[2]
DEMO = ROOT / "calcs" / "conveyor-gallery"
SAMPLE = DEMO / "schedule-hangers.csv"
BIN = Path(sys.executable).parent
GAGELINE = [sys.executable, "-c", "from gageline.cli import main; main()"]
# A kernel runs in its notebook's folder: a path must not depend on where one stands.
ENV = os.environ | {"PYTHONPATH": str(ROOT / "lib"), "PATH": f"{BIN}{os.pathsep}{os.environ['PATH']}"}


def project(marks, folder):
    """Write a project with a schedule of so many marks, all different, and return the schedule's path."""
    home = Path(folder) / "calcs" / "bench"
    home.mkdir(parents=True)
    shutil.copyfile(DEMO / "project.toml", home / "project.toml")
    lines = [line for line in SAMPLE.read_text(encoding="utf-8").splitlines() if not line.startswith("#")]
    heads, *rows = csv.reader(lines)
    with open(home / "marks.csv", "w", newline="", encoding="utf-8") as file:
        out = csv.writer(file)
        out.writerow(heads)
        for i in range(marks):
            row = list(rows[i % len(rows)])
            row[heads.index("mark")] += f"-{i // len(rows)}"
            dead = heads.index("P_D [kip]")
            row[dead] = f"{float(row[dead]) + 0.1 * (i // len(rows)):g}"
            out.writerow(row)
    return home / "marks.csv"


def schedule(path, workers):
    """Run a schedule from the shell and return (seconds, number of PDFs, list of (PDFs so far, MB of each worker's kernel and setter))."""
    pdfs = path.parents[2] / "reports" / "bench" / "preview" / "marks"
    shutil.rmtree(path.parents[2] / "reports", ignore_errors=True)
    shutil.rmtree(path.parent / "marks", ignore_errors=True)
    started = time.perf_counter()
    process = subprocess.Popen([*GAGELINE, "schedule", str(path), "--workers", str(workers)], env=ENV,
                               stdout=subprocess.DEVNULL, stderr=subprocess.PIPE)
    memory = []
    while process.poll() is None:
        memory.append((len(list(pdfs.glob("*.pdf"))), tree(process.pid)))
        time.sleep(0.5)
    if process.returncode:
        raise SystemExit(process.stderr.read().decode())
    return time.perf_counter() - started, len(list(pdfs.glob("*.pdf"))), memory


def tree(pid):
    """Return {command: MB resident, the largest of its kind} of the processes below a process."""
    import psutil

    found = {}
    for child in psutil.Process(pid).children(recursive=True):
        try:
            line = " ".join(child.cmdline())
            kind = next((kind for kind in ("worker", "zygote") if f"'{kind}'" in line), "")
            if kind:
                found[kind] = max(found.get(kind, 0), child.memory_info().rss / 2**20)
        except psutil.Error:
            continue
    return found


def baseline(notebook, folder):
    """Run papermill and then nbconvert --to pdf (xelatex) on a notebook, and return their seconds."""
    out = Path(tempfile.mkdtemp(dir=folder))
    laps = [time.perf_counter()]
    for command in ([BIN / "papermill", "--cwd", notebook.parent, notebook, out / "out.ipynb", "--no-progress-bar", "--log-level", "ERROR"],
                    [BIN / "jupyter", "nbconvert", "--to", "pdf", out / "out.ipynb"]):
        done = subprocess.run([str(word) for word in command], env=ENV, capture_output=True, text=True)
        if done.returncode:
            raise SystemExit(f"the baseline failed: {done.stderr[-600:]}")
        laps.append(time.perf_counter())
    return [laps[1] - laps[0], laps[2] - laps[1]]


def baselines(notebooks, processes, folder):
    """Run the baseline on notebooks, so many at once, and return the seconds for all."""
    started = time.perf_counter()
    with ThreadPoolExecutor(processes) as pool:
        list(pool.map(lambda notebook: baseline(notebook, folder), notebooks))
    return time.perf_counter() - started


class Burdened:
    """Within it, what else the machine had to do is sampled: with other work on it only ratios of one run mean anything."""

    def __enter__(self):
        self._loads, self._stop = [], threading.Event()
        self._thread = threading.Thread(target=self._sample, daemon=True)
        self._thread.start()
        return self

    def _sample(self):
        while not self._stop.wait(2):
            self._loads.append(os.getloadavg()[0])

    def __exit__(self, *_):
        self._stop.set()
        mean = sum(self._loads) / max(1, len(self._loads))
        print(f"cores {os.cpu_count()}, mean load while measuring {mean:.1f}")


def argument(name, default):
    """Return the whole number behind ``--name`` on the command line."""
    given = re.search(rf"--{name}[ =](\d+)", " ".join(sys.argv[1:]))
    return int(given[1]) if given else default
