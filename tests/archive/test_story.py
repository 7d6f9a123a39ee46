"""The whole story on the command line, in processes and kernels of their own: new words, same proof."""

import json
import subprocess
import sys

import pytest

from .conftest import FINDINGS, edit, snapshot


def gageline(*words, cwd, ask=None):
    return subprocess.run([sys.executable, "-c", "from gageline.cli import main; main()", *map(str, words)], cwd=cwd, input=ask,
                          capture_output=True, text=True, timeout=240)


def done(*words, cwd, ask=None):
    run = gageline(*words, cwd=cwd, ask=ask)
    assert run.returncode == 0, (words, run.stdout, run.stderr)
    return run.stdout


@pytest.mark.slow
def test_from_comment_to_bound_set(project):
    """Report, comment, issue 0, change, issue 1, compare, verify both, register, bind."""
    job, book = project.parents[1], project / "H1.ipynb"
    reports = job / "reports" / "job"
    said = done("review", book, cwd=job)
    assert "preparer: not signed" in said and "for construction: the preparer has not signed" in said
    assert "content" in done("sign", book, "--role", "preparer", "--who", "A.B.", cwd=job)
    assert "comment C1 on check bolt shear" in done("comment", book, "--on", "bolt shear", "Threads excluded?", "--who", "C.D.", cwd=job)
    done("issue", book, "--status", "for review", cwd=job)
    frozen = snapshot(reports)
    done("answer", book, "C1", "N is assumed: safe.", "--who", "A.B.", cwd=job)
    done("close", book, "C1", "--who", "C.D.", cwd=job)
    done("settle", book, "O1", "Cladding chosen: letter 14.", "--who", "C.D.", cwd=job)
    edit(book, '"46 kip"', '"48 kip"')
    assert "void: preparer A.B." in done("review", book, cwd=job)
    refused = gageline("issue", book, "--rev", "1", "--status", "for approval", cwd=job)
    assert refused.returncode == 1 and "has not signed since" in refused.stderr and refused.stderr.count("\n") == 1
    done("sign", book, "--role", "preparer", "--who", "A.B.", cwd=job)
    words = [each for name, text in FINDINGS.items() for each in (f"--{'how' if name == 'method' else name}", text)]
    done("sign", book, "--role", "checker", "--who", "C.D.", "--method", "line by line", *words, cwd=job)
    done("sign", book, "--role", "approver", "--who", "E.F.", cwd=job)
    assert "superseded: 0" in done("issue", book, "--rev", "1", "--status", "for construction", "--text", "Live load 48 kip", cwd=job)
    assert {name: snapshot(reports)[name] for name in frozen} == frozen
    assert "P_L: 46 kip → 48 kip" in done("compare", reports / "H1-rev0.pdf", reports / "H1-rev1.pdf", cwd=job)
    for rev in "01":
        assert f"H1-rev{rev}.pdf: verified" in done("verify", reports / f"H1-rev{rev}.pdf", cwd=job)
    assert "superseded" in done("register", project, cwd=job)
    rows = json.loads(done("register", project, "--json", cwd=job))["issues"]
    assert [row["status"] for row in rows] == ["superseded", "for construction"] and rows[1]["approved"] == "E.F."
    assert "1 calculations bound" in done("bind", project, cwd=job)

    stopped = gageline("verify", reports / "H1-rev1.pdf", "--run", cwd=job, ask="n\n")
    assert stopped.returncode == 130 and "the attached notebook was run" not in stopped.stdout
    assert "values compared, 0 differ" in done("verify", reports / "H1-rev1.pdf", "--run", "--yes", cwd=job)

    refused = gageline("report", book, "--out", reports / "H1-rev1.pdf", cwd=job)
    assert refused.returncode == 1 and "never overwritten" in refused.stderr
    done("void", reports / "H1-rev1.pdf", "Hanger deleted.", "--who", "E.F.", cwd=job)
    assert '"void"' in done("register", project, "--csv", cwd=job)
    (reports / "H1-rev1.pdf").write_bytes((reports / "H1-rev1.pdf").read_bytes()[:-1])
    bad = gageline("verify", reports / "H1-rev1.pdf", cwd=job)
    assert bad.returncode == 1 and "is not what was issued" in bad.stdout and "NOT verified" in bad.stdout
