"""What the verbs show on a terminal: a line of progress, and tables as wide as it is."""

import sys


def progress():
    """Return (say, done) of a one-line progress display on a terminal's stderr; silent elsewhere."""
    if not sys.stderr.isatty():
        return (lambda text: None), (lambda: None)
    from rich.console import Console

    status = Console(stderr=True).status("starting")
    status.start()
    return status.update, status.stop


def console():
    """Return the terminal to print tables on; 140 columns wide where it is none."""
    from rich.console import Console

    return Console(width=None if sys.stdout.isatty() else 140)
