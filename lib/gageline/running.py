"""Running a calculation's notebook in a kernel of this interpreter, and making its PDF from what it displayed."""

import contextlib
import copy
import json
import logging
import os
import re
import subprocess
import sys
import tempfile
from concurrent.futures import ThreadPoolExecutor
from pathlib import Path

from . import cells
from .errors import ReportError

_LOADED_EARLY = ["for _ in ('gageline.calc', 'gageline.figures', 'gageline.render', 'handcalcs.handcalcs', 'matplotlib.figure', "
                 "'matplotlib.backends.backend_svg'): __import__(_)", "del _"]
"""What a kernel runs while its owner checks the inputs; it leaves no name behind."""

CELL_SECONDS = 300
"""A cell that runs longer is taken to hang."""


def read_notebook(path):
    """Return a notebook file as data.

    Raises
    ------
    ReportError
        The file is missing or is no notebook.
    """
    path = Path(path)
    try:
        book = json.loads(path.read_text(encoding="utf-8"))
    except OSError as error:
        raise ReportError(f"{path}: {(error.strerror or 'cannot be read').lower()}") from None
    except (json.JSONDecodeError, UnicodeDecodeError):
        raise ReportError(f"{path}: this is not a notebook") from None
    if not isinstance(book, dict) or book.get("nbformat") != 4 or "cells" not in book:
        raise ReportError(f"{path}: this is not a notebook of format 4")
    return book


def with_overrides(book, overrides):
    """Return a copy of a notebook with a cell that overrides inputs after its inputs cell; an earlier one is replaced."""
    book = copy.deepcopy(book)
    book["cells"] = [cell for cell in book["cells"] if cells.INJECTED not in cell["metadata"].get("tags", ())]
    if overrides:
        at = next(i for i, cell in enumerate(book["cells"]) if cells.TAG in cell["metadata"].get("tags", ()))
        made = {"cell_type": "code", "id": "overrides", "metadata": {"tags": [cells.INJECTED]}, "source": cells.injected_cell(overrides),
                "outputs": [], "execution_count": None}
        book["cells"].insert(at + 1, made)
    return book


def execute(book, folder, on_cell=None, before=lambda: None):
    """Run a notebook's cells in order and return it with its outputs.

    Parameters
    ----------
    book : notebook as data; not changed.
    folder : where the kernel runs.
    on_cell : called with (cell number, number of cells) before each code cell.
    before : called once while the kernel boots; what it raises stops the run before any cell.

    Raises
    ------
    ReportError
        No kernel could be started, a cell failed or hung, or its kernel died; the message names the cell and the reason.
    """
    import asyncio

    # The caller's check runs beside the kernel's boot, and its imports beside nbclient's.
    with ThreadPoolExecutor(1) as pool:
        checked = pool.submit(before)
        return asyncio.run(_execute(book, folder, on_cell, checked))


async def _execute(book, folder, on_cell, checked):
    import asyncio

    from jupyter_client.manager import AsyncKernelManager

    with _without_grammars():
        import nbformat
    from nbclient import NotebookClient
    from nbclient.exceptions import CellExecutionError, CellTimeoutError, DeadKernelError

    logging.getLogger("traitlets").setLevel(logging.ERROR)
    node = nbformat.from_dict(copy.deepcopy(book))
    manager = AsyncKernelManager(kernel_name="python3")
    sockets = tempfile.TemporaryDirectory(prefix="gl-")
    if os.name == "posix":
        # ipc sockets leave no port to race for and draw no notice about an unencrypted connection; their path must be absolute and short.
        manager.transport, manager.ip = "ipc", str(Path(sockets.name) / "k")
    client = NotebookClient(node, km=manager, timeout=CELL_SECONDS, resources={"metadata": {"path": str(folder)}},
                            extra_arguments=[f"--IPKernelApp.exec_lines={_LOADED_EARLY!r}"])
    number = 0
    quiet = {"PYDEVD_DISABLE_FILE_VALIDATION": "1", "GAGELINE_PROJECT": str(folder)}
    try:
        async with client.async_setup_kernel(env=os.environ | quiet, stderr=subprocess.DEVNULL):
            await asyncio.wrap_future(checked)
            for number, cell in enumerate(node.cells, start=1):
                if cell.cell_type == "code" and cell.source.strip():
                    if on_cell:
                        on_cell(number, len(node.cells))
                    await client.async_execute_cell(cell, number - 1, execution_count=None)
    except CellExecutionError as error:
        raise ReportError(f"cell {number} failed: {_last_line(error)}") from None
    except CellTimeoutError:
        raise ReportError(f"cell {number} ran longer than {CELL_SECONDS} s and was stopped") from None
    except DeadKernelError:
        raise ReportError(f"the kernel died while cell {number} ran" if number else "the kernel died as it started") from None
    finally:
        sockets.cleanup()
    return node


@contextlib.contextmanager
def _without_grammars():
    """Within it jsonschema does without rfc3987_syntax, which builds grammars for two seconds at import that no notebook needs."""
    name = "rfc3987_syntax"
    if name in sys.modules:
        yield
        return
    sys.modules[name] = None
    try:
        yield
    finally:
        del sys.modules[name]


def _last_line(error):
    if error.ename:
        return sentence_of(error.ename, str(error.evalue))
    return str(error).strip().splitlines()[-1]


def sentence_of(name, text):
    """Return what to say of an exception of this name and text that stopped a cell."""
    said = text.strip().splitlines()
    return said[0] if name.endswith("Error") and said else f"{name}: {said[0] if said else ''}"


def save_notebook(path, node):
    """Write an executed notebook back, whole or not at all, without what changes from run to run."""
    from .sheet import write_pdf

    write_pdf(path, notebook_bytes(node))


def notebook_bytes(node):
    """Return an executed notebook as it is kept: without what changes from run to run."""
    book = json.loads(json.dumps(node))
    for cell in book["cells"]:
        cell["metadata"].pop("execution", None)
        for output in cell.get("outputs", []):
            output.get("metadata", {}).clear()
    return (json.dumps(book, indent=1, ensure_ascii=False, sort_keys=True) + "\n").encode()


def preview_path(notebook_path, project_folder, mark):
    """Return where an unissued PDF goes: reports/<project>/preview beside calcs/, or beside the notebook elsewhere."""
    folder = Path(project_folder).resolve()
    safe = "".join(sign if sign.isalnum() or sign in "-_." else "-" for sign in mark).strip("-.") or "calc"
    if folder.parent.name == "calcs":
        return folder.parent.parent / "reports" / folder.name / "preview" / f"{safe}.pdf"
    return Path(notebook_path).resolve().parent / f"{safe}.pdf"


def report(path, overrides=None, out=None, save=False, say=lambda text: None):
    """Validate a calculation's inputs, run its notebook, and write its PDF.

    Parameters
    ----------
    path : the notebook. overrides : inputs that replace the notebook's, name -> value.
    out : where the PDF goes; by default see ``preview_path``.
    save : write the notebook back with its outputs (not together with overrides).
    say : called with a few words at each stage.

    Returns
    -------
    tuple
        (path of the PDF, the validated connection).

    Raises
    ------
    GagelineError
        Whatever is wrong, as one sentence; then no PDF is written.
    """
    path = Path(path)
    book = read_notebook(path)
    given = cells.inputs_of_notebook(book)
    if overrides:
        given = cells.merged(given, {name: cells.Given(value, "") for name, value in overrides.items()})
        book = with_overrides(book, overrides)
    family, folder = family_of(book, path), path.resolve().parent
    checked = []

    def check():
        from .calc import Calc
        from .project import find

        calc = Calc(family, given, find(folder))
        target = Path(out) if out else preview_path(path, calc.project_path.parent, calc.connection.inputs.mark)
        _writable(target)
        checked.append((calc, target))
        warming.submit(warm)

    def warm():
        from .sheet.build import check_printable

        check_printable("-", ["-"])

    say("checking the inputs")
    # While the kernel runs the cells, the compiler reads fonts and look.
    with ThreadPoolExecutor(1) as warming:
        node = execute(book, folder, lambda i, n: say(f"running cell {i} of {n}"), before=check)
    calc, out = checked[0]
    say("setting the sheets")
    from .sheet import build_pdf, write_pdf

    own = calc.project_path.parent / "sheet"
    pdf = build_pdf(node, sheet_folder=own if (own / "sheet.typ").is_file() else None)
    write_pdf(out, pdf)
    if save and not overrides:
        save_notebook(path, node)
    return out, calc


def family_of(book, path):
    """Return the family that a notebook begins."""
    for cell in book["cells"]:
        source = cell["source"] if isinstance(cell["source"], str) else "".join(cell["source"])
        if cell["cell_type"] == "code" and (found := re.search(r"""\bbegin\(\s*["'](\w+)["']\s*\)""", source)):
            return found[1]
    raise ReportError(f"{path}: no cell calls gageline.begin(\"<family>\"); start a calculation with gageline new")


def _writable(out):
    try:
        out.parent.mkdir(parents=True, exist_ok=True)
    except OSError as error:
        raise ReportError(f"the folder {out.parent} cannot be made: {(error.strerror or str(error)).lower()}") from None
    if not os.access(out.parent, os.W_OK):
        raise ReportError(f"the folder {out.parent} cannot be written to")
    if out.is_dir():
        raise ReportError(f"{out} is a folder; give the PDF's file name")
