"""Reports an hour of a schedule against papermill + nbconvert --to pdf on the same notebooks, with as many processes, in one run.

usage: throughput.py [--marks 200] [--workers 2] [--baseline 6]

The baseline runs on notebooks of the same marks. It prints less than we do (nbconvert knows no drawings or equations of ours and
prints a line of text in their place), which is to its advantage. Baseline marks are run in two halves, before and after the
schedule, so that other work on the machine burdens both sides alike. Needs xelatex.
"""

import tempfile

from measuring import Burdened, argument, baselines, project, schedule


def main():
    marks, workers, sample = argument("marks", 200), argument("workers", 2), argument("baseline", 6)
    with tempfile.TemporaryDirectory() as folder, Burdened():
        seed = project(max(sample, workers), f"{folder}/seed")
        schedule(seed, workers)
        notebooks = sorted((seed.parent / "marks").glob("*.ipynb"))[:sample]
        half = len(notebooks) // 2
        base = baselines(notebooks[:half], workers, folder)
        seconds, made, memory = schedule(project(marks, f"{folder}/run"), workers)
        base += baselines(notebooks[half:], workers, folder)
    ours, theirs = 3600 * made / seconds, 3600 * len(notebooks) / base
    print(f"{'':24}{'marks':>7}{'seconds':>10}{'reports/h':>12}")
    print(f"{'papermill + nbconvert':24}{len(notebooks):7}{base:10.1f}{theirs:12.0f}")
    print(f"{'gageline schedule':24}{made:7}{seconds:10.1f}{ours:12.0f}")
    print(f"ratio with {workers} processes each: {ours / theirs:.1f}")
    for kind in ("worker", "zygote"):
        at = [(n, by[kind]) for n, by in memory if kind in by and n > 0]
        early = [mb for n, mb in at if n <= max(1, marks // 4)]
        late = [mb for n, mb in at if n > 3 * marks // 4]
        if early and late:
            print(f"{kind}: largest {max(early):.0f} MB up to mark {marks // 4}, {max(late):.0f} MB in the last quarter")


if __name__ == "__main__":
    main()
