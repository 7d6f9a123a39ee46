"""Every table of facts/ has a unit row, full rows and an entry in SOURCES.md."""

import re
from pathlib import Path

import pytest

import gageline.facts
from gageline.errors import InputError
from gageline.facts.table import number, plain_fractions, read_table, trade

FACTS = Path(gageline.facts.__file__).parent
TABLES = sorted(path.name for path in (FACTS / "tables").iterdir())
UNITS = {"", "unit", "in", "in2", "in3", "in4", "lb/ft", "ksi", "kip", "1/in", "mm", "kN"}


@pytest.mark.parametrize("file", TABLES)
def test_unit_row(file):
    """The second row holds units only, and every unit is one the loaders know."""
    units, rows = read_table(file)

    assert set(units.values()) <= UNITS
    assert any(units.values())
    assert rows


@pytest.mark.parametrize("file", TABLES)
def test_numbers_where_a_unit_stands(file):
    """A column with a unit holds numbers or blanks, a row has as many cells as the header, no row is doubled."""
    units, rows = read_table(file)
    for row in rows:
        assert None not in row and None not in row.values()
        for column, unit in units.items():
            if unit in ("", "unit") or not row[column] or column in ("size", "F_EXX"):
                continue
            assert number(row[column]) > 0
    assert len({tuple(row.values()) for row in rows}) == len(rows)


@pytest.mark.parametrize("file", TABLES)
def test_source_is_named(file):
    """SOURCES.md has a table row for the file."""
    text = (FACTS / "SOURCES.md").read_text(encoding="utf-8")

    assert re.search(rf"^\| `tables/{re.escape(file)}`", text, re.MULTILINE) or (
        file.startswith("bolts-") and f"`tables/{file}`" in text)


def test_row_counts_of_sources():
    """The row counts that SOURCES.md states are those of the files."""
    text = (FACTS / "SOURCES.md").read_text(encoding="utf-8")
    stated = re.findall(r"^\| `tables/(\S+\.csv)` \| [^|]+ \| (\d+) \|$", text, re.MULTILINE)

    assert len(stated) == 13
    for file, count in stated:
        assert len(read_table(file)[1]) == int(count), file


@pytest.mark.parametrize(("text", "expected"), [("3/4", 0.75), ("1-1/8", 1.125), ("1 1/8", 1.125), (".5", 0.5),
                                                ("0750", 750.0), ("2.", 2.0), (" 7 / 16 ", 0.4375)])
def test_number(text, expected):
    """Trade figures are read exactly."""
    assert number(text) == expected


@pytest.mark.parametrize("text", ["", "3/0", "three", "1-", "-1", "1e3", "nan", "1/2/3"])
def test_number_refuses(text):
    """Anything else is refused."""
    with pytest.raises(InputError):
        number(text)


def test_trade_round_trip():
    """Every 64th up to 4 in. prints as a fraction that reads back."""
    for sixtyfourths in range(257):
        figure = sixtyfourths / 64
        assert number(trade(figure)) == figure
    assert plain_fractions("3½ × ⅜") == "3-1/2 × 3/8"
