"""Processor seconds of one report by what they are spent on, in a fresh process and in a warm one.

usage: where_time_goes.py
"""

import importlib
import json
import resource
import subprocess
import sys

from measuring import DEMO, ENV


def spent():
    """Return the processor seconds of this process and of the programs it ran."""
    uses = [resource.getrusage(who) for who in (resource.RUSAGE_SELF, resource.RUSAGE_CHILDREN)]
    return sum(use.ru_utime + use.ru_stime for use in uses)


def report(laps):
    """Make one report in this process, and note in laps what each part cost."""
    from gageline import cells, running
    from gageline.calc import Calc
    from gageline.sheet import build, maths

    def lap(name, do):
        before = spent()
        done = do()
        laps[name] = laps.get(name, 0) + spent() - before
        return done

    path = DEMO / "H1.ipynb"
    book = running.read_notebook(path)
    calc = lap("inputs and checks", lambda: Calc("bolted", cells.inputs_of_notebook(book), DEMO / "project.toml"))
    lap("inputs and checks", lambda: calc.connection.checks)
    for number, cell in enumerate(book["cells"], start=1):
        source = "".join(cell["source"])
        if cell["cell_type"] == "code" and "calc." in source:
            call = source.strip().splitlines()[-1]
            kind = "figures" if any(word in call for word in ("drawing", "curve", "permissible")) else "lines and tables"
            part = lap(kind, lambda: eval(call, {"calc": calc})._repr_mimebundle_())
            cell["outputs"] = [{"output_type": "execute_result", "data": part, "metadata": {}, "execution_count": number}]
        cell["execution_count"] = number
    convert, inside = maths._convert, []
    maths._convert = lambda formulas: inside.append(spent()) or lap("pandoc", lambda: convert(formulas))
    before, pandoc = spent(), laps.get("pandoc", 0)
    data = build.sheet_data(book)
    laps["gathering blocks"] = laps.get("gathering blocks", 0) + spent() - before - (laps.get("pandoc", 0) - pandoc)
    maths._convert = convert
    lap("Typst", lambda: build.set_pdf(data))


def main():
    if "--inside" in sys.argv:
        turns = []
        before = spent()
        for name in ("gageline.calc", "gageline.figures", "gageline.sheet.build", "handcalcs.handcalcs"):
            importlib.import_module(name)
        turns.append({"imports": spent() - before})
        report(turns[0])
        turns.append({})
        report(turns[1])
        print(json.dumps(turns))
        return
    inside = subprocess.run([sys.executable, __file__, "--inside"], env=ENV, capture_output=True, text=True, check=True)
    fresh, warm = json.loads(inside.stdout.splitlines()[-1])
    before = spent()
    subprocess.run([sys.executable, "-c", "import ipykernel.kernelapp"], env=ENV, check=True)
    fresh = {"kernel": spent() - before} | fresh
    print(f"{'processor seconds':22}{'first':>8}{'again':>8}")
    for name in fresh:
        print(f"{name:22}{fresh[name]:8.2f}{warm.get(name, 0.0):8.2f}")
    print(f"{'all':22}{sum(fresh.values()):8.2f}{sum(warm.values()):8.2f}")


if __name__ == "__main__":
    main()
