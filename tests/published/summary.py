"""Print how many published numbers are reproduced and how well: ``python -m tests.published.summary`` in the repository."""

import sys
from pathlib import Path

sys.path.insert(0, str(Path(__file__).parents[1]))

from . import test_published

if __name__ == "__main__":
    for case in test_published.CASES:
        test_published.compared(case)
    print("\n".join(test_published.summary()))
