"""A wheel built from the repository, installed elsewhere, does a whole job: template and sheet travel in it."""

import os
import subprocess
import sys
from pathlib import Path

import pytest

ROOT = Path(__file__).parents[2]


@pytest.mark.slow
def test_wheel_makes_a_calc_and_its_pdf_in_an_empty_folder(tmp_path):
    """Built, installed beside nothing of the checkout, it starts a project and makes a PDF; the demonstration travels too."""
    built, target, job = tmp_path / "dist", tmp_path / "site", tmp_path / "elsewhere"
    job.mkdir()
    run = subprocess.run([sys.executable, "-m", "build", "--wheel", "--no-isolation", "--outdir", built, ROOT], capture_output=True, text=True)
    assert run.returncode == 0, run.stdout[-2000:] + run.stderr[-2000:]
    wheel = next(built.glob("*.whl"))
    subprocess.run([sys.executable, "-m", "pip", "install", "--quiet", "--no-deps", "--target", target, wheel], check=True, capture_output=True)
    environment = os.environ | {"PYTHONPATH": str(target)}

    def gageline(*words):
        code = "import gageline; assert 'site' in gageline.__file__, gageline.__file__; from gageline.cli import main; main()"
        return subprocess.run([sys.executable, "-c", code, *words], cwd=job, env=environment, capture_output=True, text=True, timeout=240)

    assert gageline("new", "H7", "--project", "calcs/tower").returncode == 0
    made = gageline("report", "calcs/tower/H7.ipynb")
    assert made.returncode == 0, made.stderr
    assert (job / "reports" / "tower" / "preview" / "H7.pdf").read_bytes().startswith(b"%PDF")
    assert (target / "gageline" / "_demo" / "conveyor-gallery" / "H1.ipynb").is_file()
