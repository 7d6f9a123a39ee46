"""Notebooks in the forked kernel: the same outputs as a kernel of Jupyter, nothing left from one to the next, and faults that stay with their own."""

import json
import os
import time

import pytest

from gageline import running
from gageline.schedule.wires import Started
from gageline.schedule.worker import Work, Worker

from .conftest import DEMO


def notebook(*sources):
    cells = [{"cell_type": "code", "id": f"c{i}", "metadata": {}, "source": source, "outputs": [], "execution_count": None}
             for i, source in enumerate(sources)]
    return {"cells": cells, "metadata": {"kernelspec": {"name": "python3", "display_name": "Python 3"}}, "nbformat": 4, "nbformat_minor": 5}


@pytest.fixture(scope="module")
def kernel():
    """Return a function that runs a notebook in a child of one zygote without warm families."""
    zygote = Started("zygote")
    zygote.connection.send(((), str(DEMO / "project.toml")))

    def run(book, folder=DEMO, seconds=20):
        zygote.connection.send((book, str(folder), seconds))
        return zygote.connection.recv()

    yield run
    zygote.end()


EVERY_KIND = notebook(
    "import sys, os\nprint('one')\nprint('two', file=sys.stderr)\nprint('three')\n41 + 1",
    "from IPython.display import display, HTML, Markdown\ndisplay(HTML('<b>x</b>'))\n"
    "h = display(Markdown('a'), display_id='k')\nh.update(Markdown('b'))",
    "", "_ + 1", "1;", "async def f():\n    return 7\nawait f()", "In[1][:6], Out[1]", "None",
    "class Kind:\n    def _repr_mimebundle_(self, include=None, exclude=None):\n"
    "        return {'text/plain': 'k', 'application/x-own+json': {'a': [1]}}\nKind()")


def outputs(book):
    """Return outputs with neighbouring pieces of one stream joined, as they are shown."""
    shown = []
    for cell in book["cells"]:
        made = [{key: value for key, value in output.items() if key != "metadata"} for output in json.loads(json.dumps(cell["outputs"]))]
        streams = {name: "".join(each["text"] for each in made if each.get("name") == name) for name in ("stdout", "stderr")}
        shown.append(([each for each in made if each["output_type"] != "stream"], streams, cell["execution_count"]))
    return shown


@pytest.mark.slow
def test_same_outputs_as_a_kernel_of_jupyter(kernel):
    ours, fault = kernel(EVERY_KIND)

    assert fault is None
    assert outputs(ours) == outputs(running.execute(EVERY_KIND, DEMO))


def test_what_a_program_writes_is_the_cells_output(kernel):
    # ipykernel does the same, but not where pytest runs it.
    book, _ = kernel(notebook("import os\nos.system('echo out; echo err >&2')"))

    assert outputs(book)[0][1] == {"stdout": "out\n", "stderr": "err\n"}


def test_nothing_is_left_for_the_next(kernel):
    kernel(notebook("left = 1\nimport sys, os, builtins\nsys.path.append('/x')\nos.environ['LEFT'] = '1'\nbuiltins.left_too = 1\nos.chdir('/')"))
    asked = "'left' in dir(), hasattr(__builtins__, 'left_too'), 'LEFT' in os.environ, '/x' in sys.path, os.getcwd()"
    book, fault = kernel(notebook(f"import os, sys\nprint({asked})", "len(In)"))

    assert fault is None
    assert book["cells"][0]["outputs"][0]["text"] == f"False False False False {DEMO}\n"
    assert book["cells"][1]["outputs"][0]["data"]["text/plain"] == "3"


@pytest.mark.parametrize("source, said", [
    ("raise ValueError('not so')", "cell 2 failed: not so"), ("1/0", "cell 2 failed: division by zero"), ("x =", "cell 2 failed: invalid syntax"),
    ("import os; os._exit(0)", "the kernel died while cell 2 ran"),
    ("import os, signal; os.kill(os.getpid(), 9)", "the kernel died while cell 2 ran"),
    ("import ctypes; ctypes.string_at(0)", "the kernel died while cell 2 ran"), ("import sys; sys.exit(3)", "cell 2 failed: SystemExit: 3"),
    ("while True: pass", "cell 2 ran longer than 1 s"),
    ("import signal; signal.pthread_sigmask(0, {2, 15})\nwhile True: pass", "cell 2 ran longer than 1 s"),
    ("x = bytearray(9 << 30)", "cell 2 failed: MemoryError"), ("input()", "cell 2 failed"), ("raise KeyboardInterrupt", "KeyboardInterrupt")])
def test_faults_are_one_sentence_and_stay_with_their_own(kernel, source, said):
    _, fault = kernel(notebook("1", source), seconds=1)
    after, none = kernel(notebook("2 + 2"))

    assert said in fault and "\n" not in fault
    assert none is None and after["cells"][0]["outputs"][0]["data"]["text/plain"] == "4"


def test_processes_it_started_end_with_it(kernel, tmp_path):
    mark = tmp_path / "alive"
    late = f"import time; time.sleep(2); open({str(mark)!r}, 'w')"
    _, fault = kernel(notebook(f"import subprocess, sys\nstarted = subprocess.Popen([sys.executable, '-c', {late!r}])"))
    time.sleep(2.6)

    assert fault is None and not mark.exists()


def test_a_killed_zygote_costs_one_mark_and_is_replaced(tmp_path):
    worker = Worker((), str(DEMO / "project.toml"))
    work = Work("X", "bolted", notebook("import os, signal; os.kill(os.getppid(), signal.SIGKILL)"), str(DEMO), str(DEMO / "project.toml"), seconds=5)
    try:
        assert worker.make(work).fault == "the process that holds the kernel died"
        assert "display the block meta" in worker.make(Work("X", "bolted", notebook("1"), str(DEMO), str(DEMO / "project.toml"))).fault
    finally:
        worker.end()


def test_zygote_ends_when_its_owner_does():
    zygote = Started("zygote")
    zygote.connection.send(((), str(DEMO / "project.toml")))
    zygote.connection.send((notebook("import time; time.sleep(60)"), str(DEMO), 100))
    time.sleep(1.5)
    child = [int(pid) for pid in os.listdir("/proc") if pid.isdigit() and _parent(pid) == zygote.process.pid] if os.path.isdir("/proc") else []
    zygote.connection.close()

    assert zygote.process.wait(5) is not None
    assert not any(os.path.exists(f"/proc/{pid}") for pid in child)


def _parent(pid):
    try:
        with open(f"/proc/{pid}/stat") as file:
            return int(file.read().rpartition(")")[2].split()[1])
    except OSError:
        return None


def test_warming_loads_what_a_report_needs():
    """A warm zygote is what makes a schedule fast; if warming fails it would only be slow, so it is held here."""
    from gageline import render
    from gageline.formula import FORMULAS
    from gageline.schedule.zygote import _warm

    _warm("bolted", DEMO / "project.toml")
    before = render._template.cache_info().misses
    for formula in FORMULAS.values():
        for line in formula.body:
            render._template(line)

    assert render._template.cache_info().misses == before
