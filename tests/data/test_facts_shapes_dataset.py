"""Shape tables row by row against the openly licensed dataset they were taken from."""

import csv
import importlib.util
from pathlib import Path

import pytest

import gageline.facts
from gageline.facts.shapes import double_angle_radii, names, shape
from gageline.facts.table import number

_spec = importlib.util.spec_from_file_location("transcribe_shapes", Path(__file__).with_name("transcribe_shapes.py"))
transcribe = importlib.util.module_from_spec(_spec)
_spec.loader.exec_module(transcribe)

TABLES = Path(gageline.facts.__file__).parent / "tables"

# Stated a second time, on purpose not shared with the import script: our attribute, their column.
SAME = [("W", "weight"), ("A", "area"), ("I_x", "Ix"), ("I_y", "Iy"), ("S_x", "Sx"), ("S_y", "Sy"), ("Z_x", "Zx"),
        ("Z_y", "Zy"), ("r_x", "rx"), ("r_y", "ry"), ("r_z", "rz"), ("b_f", "bf"), ("t_f", "tf"), ("t_w", "tw"),
        ("k_des", "k"), ("k_1", "k1"), ("x_bar", "x"), ("y_bar", "y"), ("t_des", "tdes"), ("t_nom", "tnom"),
        ("H", "Ht"), ("B", "B"), ("D", "OD"), ("WG_i", "WGi"), ("WG_o", "WGo"), ("t", "t")]
FROM_DESIGNATION = {"t", "t_nom", "H", "B", "D"}


@pytest.mark.parametrize("stem", transcribe.SERIES)
def test_file_is_what_the_import_yields(stem):
    """Our CSV is what the import yields from the dataset today, cell by cell."""
    header, units, body = transcribe.transcribed(stem)
    with open(TABLES / f"{stem}.csv", newline="", encoding="utf-8") as stream:
        found = list(csv.reader(stream))

    assert found[0] == header
    assert found[1] == units
    assert found[2:] == body


@pytest.mark.parametrize("stem", transcribe.SERIES)
def test_looked_up_shape_has_the_dataset_figures(stem):
    """Every dataset row is found by its trade name and carries the dataset's figures."""
    source, _, how = transcribe.SERIES[stem]
    for row in transcribe.dataset(source):
        found = shape(transcribe.spell(row["shape"], how))
        for ours, theirs in SAME:
            cell = row.get(theirs, "").strip()
            if cell in ("", "–"):
                assert getattr(found, ours) is None or theirs not in row, (found.name, ours)
            elif ours in FROM_DESIGNATION:
                assert getattr(found, ours) == pytest.approx(float(cell), rel=0.005, abs=0.0006), (found.name, ours)
            else:
                assert getattr(found, ours) == float(cell), (found.name, ours)
        if stem == "L":
            assert (found.b_long, found.b_short) == (float(row["b"]), float(row["d"])), found.name
        elif "d" in row:
            assert found.d == float(row["d"]), found.name


@pytest.mark.parametrize("stem", transcribe.SERIES)
def test_designation_says_the_dimensions(stem):
    """Legs, sides, diameters and walls in the name are those of the row."""
    source, _, how = transcribe.SERIES[stem]
    if stem not in ("L", "HSS-rect", "HSS-round"):
        return
    for row in transcribe.dataset(source):
        found = shape(transcribe.spell(row["shape"], how))
        said = [number(part) for part in found.name.removeprefix("HSS").removeprefix("L").split("x")]
        columns = {"L": ("b", "d", "t"), "HSS-rect": ("Ht", "B", "tnom"), "HSS-round": ("OD", "tnom")}[stem]
        for stated, column in zip(said, columns, strict=True):
            assert stated == pytest.approx(float(row[column]), rel=0.005, abs=0.0006), found.name


def test_no_row_is_missing_or_added():
    """The names of a series are exactly the dataset's."""
    counted = sum(len(transcribe.dataset(source)) for source, _, _ in transcribe.SERIES.values())

    assert len(names()) == counted + len(names("L"))


def test_double_angles_agree_with_the_dataset():
    """Radii of gyration by the parallel-axis theorem reproduce the published 2L table within its rounding.

    The inputs have three figures and the sum of squares doubles their error, so 0.7 percent is allowed.
    """
    rows = transcribe.dataset("DBL_L_shapes")
    for row in rows:
        name = row["shape"].removeprefix("DBL_L")
        back = name[-4:] if name.endswith(("LLBB", "SLBB")) else ""
        parts = [transcribe.spell_fraction(part) for part in name.removesuffix(back).split("X")]
        gap = number(parts[3]) if len(parts) == 4 else 0.0
        single = shape("L" + "x".join(parts[:3]))
        r_x, r_y = double_angle_radii(single, back != "SLBB", gap)

        assert pytest.approx(float(row["area"]), rel=0.005) == 2 * single.A, name
        assert r_x == pytest.approx(float(row["rx"]), rel=0.007), name
        assert r_y == pytest.approx(float(row["ry"]), rel=0.007), name
    assert len(rows) == 639
