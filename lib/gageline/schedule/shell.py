"""A notebook's cells run one by one in an IPython shell of this process, and their outputs kept as a kernel would have sent them."""

import copy
import os
import sys
import tempfile

from IPython.core.displayhook import DisplayHook
from IPython.core.displaypub import DisplayPublisher
from IPython.core.interactiveshell import InteractiveShell
from traitlets import Any, Type
from traitlets.config import Config


class _Stream:
    """What stands in for sys.stdout and sys.stderr: text goes to the cell's outputs in the order it is written."""

    encoding, errors, closed = "utf-8", "strict", False

    def __init__(self, name, collected):
        self.name, self._collected = name, collected

    def write(self, text):
        self._collected.text(self.name, str(text))
        return len(text)

    def writelines(self, texts):
        for text in texts:
            self.write(text)

    def flush(self):
        pass

    def isatty(self):
        return False

    def writable(self):
        return True

    def fileno(self):
        return {"stdout": 1, "stderr": 2}[self.name]


class _Collected:
    """The outputs of the cell that runs."""

    def __init__(self):
        self.outputs, self.displays = [], {}

    def text(self, name, text):
        last = self.outputs[-1] if self.outputs else {}
        if last.get("output_type") == "stream" and last["name"] == name:
            last["text"] += text
        elif text:
            self.outputs.append({"output_type": "stream", "name": name, "text": text})


class _Publisher(DisplayPublisher):
    collected = Any()

    def publish(self, data, metadata=None, source=None, *, transient=None, update=False, **_):
        made = {"output_type": "display_data", "data": data, "metadata": metadata or {}}
        known = (transient or {}).get("display_id")
        if update:
            for output in self.collected.displays.get(known, ()):
                output |= {"data": data, "metadata": metadata or {}}
            return
        if known:
            self.collected.displays.setdefault(known, []).append(made)
        self.collected.outputs.append(made)

    def clear_output(self, wait=False):
        self.collected.outputs.clear()


class _Hook(DisplayHook):
    collected = Any()

    def write_output_prompt(self):
        pass

    def write_format_data(self, format_dict, md_dict=None):
        self.collected.outputs.append({"output_type": "execute_result", "data": format_dict, "metadata": md_dict or {},
                                       "execution_count": self.prompt_count})

    def finish_displayhook(self):
        pass


class Shell(InteractiveShell):
    """The shell that a kernel runs, without the kernel's wires."""

    display_pub_class = Type(_Publisher)
    displayhook_class = Type(_Hook)
    collected = Any()

    def _showtraceback(self, etype, evalue, stb):
        self.collected.outputs.append({"output_type": "error", "ename": etype.__name__, "evalue": str(evalue), "traceback": list(stb)})


def make():
    """Return the process's shell, new."""
    Shell.clear_instance()
    shell = Shell.instance(config=Config({"HistoryManager": {"enabled": False}, "InteractiveShell": {"colors": "nocolor"}}))
    shell.collected = shell.display_pub.collected = shell.displayhook.collected = _Collected()
    return shell


def run_cells(shell, book, on_cell):
    """Run a notebook's code cells in order, stopping at the first that fails.

    What is written to the process's own standard streams, by a library or a program it starts, counts as the cell's output too.

    Parameters
    ----------
    shell : what ``make`` returned, unused so far.
    book : notebook as data; not changed.
    on_cell : called with each code cell's number, counted from 1 over all cells, before it runs.

    Returns
    -------
    tuple
        (the notebook with its outputs, None or (number, name of the exception, its text) of the cell that failed).
    """
    book, kept = copy.deepcopy(book), shell.collected
    streams = {name: _Stream(name, kept) for name in ("stdout", "stderr")}
    sys.stdout, sys.stderr = streams.values()
    files = {name: tempfile.TemporaryFile() for name in streams}
    for name, file in files.items():
        os.dup2(file.fileno(), streams[name].fileno())
    for number, cell in enumerate(book["cells"], start=1):
        if cell["cell_type"] != "code":
            continue
        source = cell["source"] if isinstance(cell["source"], str) else "".join(cell["source"])
        cell |= {"outputs": [], "execution_count": None}
        if not source.strip():
            continue
        on_cell(number)
        kept.outputs = cell["outputs"]
        cell["execution_count"] = shell.execution_count
        done = shell.run_cell(source, store_history=True)
        for name, file in files.items():
            file.seek(0)
            kept.text(name, file.read().decode("utf-8", "replace"))
            file.seek(0)
            file.truncate()
        if not done.success:
            error = done.error_before_exec or done.error_in_exec
            return book, (number, type(error).__name__, str(error))
    return book, None
