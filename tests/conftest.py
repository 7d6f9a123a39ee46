"""Shared by all tests: a summary of the published cases at the end of a run that held any."""

import sys
from pathlib import Path

sys.path.insert(0, str(Path(__file__).parent))


def pytest_terminal_summary(terminalreporter):
    runner = sys.modules.get("tests.published.test_published")
    if runner is not None and runner.DEVIATIONS:
        terminalreporter.write_sep("-", "published cases")
        for line in runner.summary():
            terminalreporter.write_line(line)
