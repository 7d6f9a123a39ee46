"""Processes of ours and the pipe to each: how they are started, spoken to, and ended."""

import contextlib
import os
import signal
import socket
import subprocess
import sys
from multiprocessing.connection import Connection
from pathlib import Path

from ..errors import ReportError


class Started:
    """A process that serves one module of this package over a connection; it ends when the connection does.

    Parameters
    ----------
    module : name of the module of ``gageline.schedule`` whose ``serve(connection)`` it runs.
    """

    def __init__(self, module):
        if not hasattr(os, "fork"):
            raise ReportError("a schedule is run by forked processes, which this system does not have; run its notebooks one by one, or use WSL")
        ours, theirs = socket.socketpair()
        code = f"from gageline.schedule.wires import begin; begin({module!r}, {theirs.fileno()})"
        root = str(Path(__file__).resolve().parents[2])
        path = os.pathsep.join(dict.fromkeys([root, *filter(None, os.environ.get("PYTHONPATH", "").split(os.pathsep))]))
        # One thread each: processes share the cores, and a process with threads does not fork safely.
        alone = dict.fromkeys(("OPENBLAS_NUM_THREADS", "OMP_NUM_THREADS", "MKL_NUM_THREADS", "RAYON_NUM_THREADS"), "1")
        self.process = subprocess.Popen([sys.executable, "-P", "-c", code], pass_fds=[theirs.fileno()], stdin=subprocess.DEVNULL,
                                        stdout=subprocess.DEVNULL, stderr=subprocess.DEVNULL, env=os.environ | alone | {"PYTHONPATH": path})
        theirs.close()
        self.connection = Connection(ours.detach())

    def end(self):
        """End the process and wait for it; whatever it does."""
        self.connection.close()
        try:
            self.process.wait(0.5)
        except subprocess.TimeoutExpired:
            self.process.kill()
            self.process.wait()


def begin(module, handle):
    """Serve a module over a connection that was handed down; runs in the started process."""
    from importlib import import_module

    # A Ctrl-C of the terminal reaches the whole group; who started us ends us.
    signal.signal(signal.SIGINT, signal.SIG_IGN)
    connection = Connection(handle)
    with contextlib.suppress(EOFError, BrokenPipeError, ConnectionResetError):
        import_module(f"gageline.schedule.{module}").serve(connection)
    os._exit(0)
