"""One ``gageline report`` from the shell against papermill + nbconvert --to pdf on the same notebook, turn by turn.

usage: cold_start.py [--turns 3]
"""

import shutil
import statistics
import subprocess
import tempfile
import time
from pathlib import Path

from measuring import DEMO, ENV, GAGELINE, Burdened, argument, baseline


def main():
    ours, theirs = [], []
    with tempfile.TemporaryDirectory() as folder, Burdened():
        home = Path(folder) / "calcs" / "bench"
        home.mkdir(parents=True)
        for name in ("project.toml", "H1.ipynb"):
            shutil.copyfile(DEMO / name, home / name)
        for _ in range(argument("turns", 3)):
            started = time.perf_counter()
            subprocess.run([*GAGELINE, "report", str(home / "H1.ipynb")], env=ENV, check=True, stdout=subprocess.DEVNULL)
            ours.append(time.perf_counter() - started)
            theirs.append(baseline(home / "H1.ipynb", folder))
    papermill, nbconvert = (statistics.median(each) for each in zip(*theirs))
    both = statistics.median(sum(each) for each in theirs)
    print(f"papermill {papermill:.1f} s, nbconvert --to pdf {nbconvert:.1f} s, both {both:.1f} s")
    print(f"gageline report {statistics.median(ours):.1f} s")
    print(f"ratio {statistics.median(ours) / both:.3f} (turn by turn: {', '.join(f'{a / sum(b):.3f}' for a, b in zip(ours, theirs))})")


if __name__ == "__main__":
    main()
