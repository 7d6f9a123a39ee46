"""Whether a schedule's time is linear in its marks, and what a second worker brings; all in one run.

usage: scaling.py [--marks 40]
"""

import tempfile

from measuring import Burdened, argument, project, schedule


def main():
    marks = argument("marks", 40)
    seconds = {}
    with tempfile.TemporaryDirectory() as folder, Burdened():
        for name, count, workers in (("half, one worker", marks // 2, 1), ("all, one worker", marks, 1), ("all, two workers", marks, 2)):
            seconds[name] = schedule(project(count, f"{folder}/{count}-{workers}"), workers)[0]
            print(f"{name:20}{count:5} marks {seconds[name]:8.1f} s")
    each = (seconds["all, one worker"] - seconds["half, one worker"]) / (marks - marks // 2)
    print(f"each further mark {each:.2f} s, fixed {seconds['all, one worker'] - marks * each:.1f} s")
    print(f"two workers: {seconds['all, one worker'] / seconds['all, two workers']:.2f} times one")


if __name__ == "__main__":
    main()
