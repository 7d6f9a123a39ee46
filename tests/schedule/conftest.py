"""A project in a temporary folder and rows of a schedule that are good as they stand."""

import csv
import shutil
from pathlib import Path

import pytest

ROOT = Path(__file__).parents[2]
DEMO = ROOT / "calcs" / "conveyor-gallery"
SAMPLE = DEMO / "schedule-hangers.csv"


@pytest.fixture
def project(tmp_path):
    """Return calcs/job of a fresh project with the demonstration's project file."""
    folder = tmp_path / "calcs" / "job"
    folder.mkdir(parents=True)
    shutil.copyfile(DEMO / "project.toml", folder / "project.toml")
    return folder


def sample_rows(n=None):
    """Return (heads, rows as dicts) of the sample schedule, its first n marks."""
    lines = [line for line in SAMPLE.read_text(encoding="utf-8").splitlines() if not line.startswith("#")]
    reader = csv.DictReader(lines)
    return list(reader.fieldnames), list(reader)[:n]


def write_csv(path, heads, rows):
    """Write rows (dicts) as a CSV file under heads and return its path."""
    with open(path, "w", newline="", encoding="utf-8") as file:
        writer = csv.DictWriter(file, heads, restval="", lineterminator="\n")
        writer.writeheader()
        writer.writerows(rows)
    return path
