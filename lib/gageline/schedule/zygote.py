"""A process that has loaded and warmed all that a calculation needs, and runs each notebook in a forked child of its own.

The child is the notebook's kernel: it has the warm modules and an unused shell, and nothing of any notebook before it. Whatever
it does (hangs, leaks, dies, leaves processes behind) ends with it.
"""

import ast
import contextlib
import gc
import json
import os
import resource
import signal
import sys
from multiprocessing.connection import Pipe, wait
from pathlib import Path

ROOM = 4 << 30
"""How much memory a notebook may take beyond what the warm process has. [bytes]"""


def serve(connection):
    """Warm up for (families, project file), then run one notebook after the other until the connection ends."""
    families, project_file = connection.recv()
    for family in families:
        with contextlib.suppress(Exception):  # what is wrong with it will be said where it is used
            _warm(family, project_file)
    os.environ.setdefault("MPLBACKEND", "module://matplotlib_inline.backend_inline")
    from . import shell

    unused = shell.make()
    gc.collect()
    gc.freeze()
    while True:
        connection.send(_in_a_child(unused, *connection.recv(), connection))


def _warm(family, project_file):
    """Run a family's template here, so that modules, tables, fonts and parsed formula lines are there for every child."""
    from .. import cells, render, running
    from ..calc import Calc
    from ..facts import shapes
    from ..formula import FORMULAS
    from ..sheet.assets import templates_root

    shapes.names()
    book = running.read_notebook(templates_root() / f"{family}.ipynb")
    calc = Calc(family, cells.inputs_of_notebook(book), Path(project_file))
    for cell in book["cells"]:
        source = cell["source"] if isinstance(cell["source"], str) else "".join(cell["source"])
        if cell["cell_type"] == "code" and "calc." in source:
            last = ast.Expression(ast.parse(source).body[-1].value)
            eval(compile(last, "template", "eval"), {"calc": calc})._repr_mimebundle_()
    for formula in FORMULAS.values():
        for line in formula.body:
            render._template(line)


def _in_a_child(shell, book, folder, seconds, owner):
    """Run a notebook in a child and return (the notebook with its outputs or None, None or the sentence why it failed)."""
    reader, writer = Pipe(duplex=False)
    pid = os.fork()
    if pid == 0:
        code = 1
        try:
            reader.close()
            owner.close()
            _child(shell, book, folder, writer)
            code = 0
        finally:
            os._exit(code)
    writer.close()
    number, said = 0, None
    while said is None:
        ready = wait([reader, owner], seconds)
        if owner in ready:  # it never speaks before we have answered: it is gone
            _kill(pid)
            os._exit(0)
        if not ready:
            said = (None, f"cell {number} ran longer than {seconds:g} s and was stopped")
            break
        try:
            kind, *rest = json.loads(reader.recv_bytes())
        except (EOFError, OSError, ValueError):
            said = (None, f"the kernel died while cell {number} ran" if number else "the kernel died as it started")
        else:
            if kind == "cell":
                number = rest[0]
            else:
                said = tuple(rest)
    reader.close()
    _kill(pid)
    return said


def _kill(pid):
    """End a child with all processes it started."""
    for end in (os.killpg, os.kill):
        with contextlib.suppress(ProcessLookupError, PermissionError):
            end(pid, signal.SIGKILL)
    with contextlib.suppress(ChildProcessError):
        os.waitpid(pid, 0)


def _child(shell, book, folder, writer):
    from ..running import sentence_of
    from .shell import run_cells

    os.setsid()
    signal.signal(signal.SIGINT, signal.default_int_handler)
    _, most = resource.getrlimit(resource.RLIMIT_AS)
    resource.setrlimit(resource.RLIMIT_AS, (_taken() + ROOM, most))
    gc.set_threshold(100_000, 50, 50)
    os.chdir(folder)
    sys.path.insert(0, "")
    os.environ["GAGELINE_PROJECT"] = str(folder)
    node, failed = run_cells(shell, book, lambda number: writer.send_bytes(json.dumps(["cell", number]).encode()))
    sentence = failed and f"cell {failed[0]} failed: {sentence_of(failed[1], failed[2])}"
    writer.send_bytes(json.dumps(["done", node, sentence]).encode())


def _taken():
    """Return the size of this process's address space. [bytes]"""
    try:
        with open("/proc/self/statm") as file:
            return int(file.read().split()[0]) * resource.getpagesize()
    except OSError:
        return resource.getrusage(resource.RUSAGE_SELF).ru_maxrss * 1024
