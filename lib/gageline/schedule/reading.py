"""A schedule file, CSV or XLSX, as rows of texts under named columns with their units; what cannot be read is told by cell."""

import csv
import datetime
import io
import re
import zipfile
from dataclasses import dataclass
from pathlib import Path

from ..errors import InputError

_HEAD = re.compile(r"\s*([^\[\]]+?)\s*(?:\[\s*([^\[\]]*?)\s*\])?\s*")


@dataclass(frozen=True)
class Column:
    """A column: its place as a letter, its head as written, the name and the unit in it (or empty)."""

    letter: str
    head: str
    name: str
    unit: str


@dataclass(frozen=True)
class Row:
    """A row that is not empty: its number in the file, column letter -> text, and column letter -> sentence of what cannot be read."""

    number: int
    cells: dict
    faults: dict


@dataclass(frozen=True)
class Schedule:
    """A schedule as written."""

    path: Path
    columns: tuple
    rows: tuple


def read(path):
    """Return the ``Schedule`` in a file.

    The first row that is neither empty nor a remark (its first cell begins with #) is the head: names, each with a unit in square
    brackets where its cells may go without, as in ``pitch [in]``.

    Raises
    ------
    InputError
        The file cannot be read, or a head is empty, twice there, or not of this form.
    """
    path = Path(path)
    readers = {".csv": _csv, ".xlsx": _xlsx, ".xlsm": _xlsx}
    if path.suffix.lower() not in readers:
        raise InputError(f"{path}: a schedule is a .csv or an .xlsx file")
    try:
        data = path.read_bytes()
    except OSError as error:
        raise InputError(f"{path}: {(error.strerror or 'cannot be read').lower()}") from None
    lines = [(number, texts, faults) for number, texts, faults in readers[path.suffix.lower()](path, data)
             if (any(texts.values()) and not next(iter(texts.values())).startswith("#")) or faults]
    if not lines:
        raise InputError(f"{path}: there is no row in it; the first row names the inputs, one a column")
    _, heads, faults = lines[0]
    if faults:
        raise InputError(f"{path}: the head of column {next(iter(faults))}: {next(iter(faults.values()))}")
    columns = tuple(_column(path, letter, text) for letter, text in heads.items() if text)
    names = [column.name.casefold() for column in columns]
    if twice := next((column for i, column in enumerate(columns) if column.name.casefold() in names[:i]), None):
        raise InputError(f"{path}: column {twice.letter} ({twice.head}) is there twice")
    rows = []
    for number, texts, faults in lines[1:]:
        known = {column.letter for column in columns}
        if beyond := next((letter for letter, text in texts.items() if text and letter not in known), None):
            faults = faults | {beyond: f"{texts[beyond]!r} stands under no head; quote a text that holds a comma"}
        rows.append(Row(number, {letter: text for letter, text in texts.items() if letter in known}, faults))
    return Schedule(path, columns, tuple(rows))


def _column(path, letter, text):
    read = _HEAD.fullmatch(text)
    if not read:
        raise InputError(f"{path}: column {letter}: the head {text!r} is not a name with a unit in brackets, as in pitch [in]")
    return Column(letter, " ".join(text.split()), re.sub(r"[\s-]+", "_", read[1]), read[2] or "")


def _csv(path, data):
    for coding in ("utf-8-sig", "cp1252"):
        try:
            text = data.decode(coding)
            break
        except UnicodeDecodeError:
            continue
    else:
        raise InputError(f"{path}: is neither UTF-8 nor Windows text")
    if "\0" in text:
        raise InputError(f"{path}: is no text file")
    first = next((line for line in text.splitlines() if line.strip() and not line.lstrip('"').startswith("#")), "")
    comma = max(",;\t", key=first.count)
    lines = csv.reader(io.StringIO(text, newline=""), delimiter=comma)
    while True:
        # A record may reach over several lines; its own first one is what an editor shows.
        number = lines.line_num + 1
        try:
            cells = next(lines)
        except StopIteration:
            return
        except csv.Error as error:
            raise InputError(f"{path}, row {number}: not readable as CSV: {error}") from None
        yield number, {_letter(i): cell.strip() for i, cell in enumerate(cells)}, {}


def _xlsx(path, data):
    import openpyxl
    from openpyxl.utils.exceptions import InvalidFileException

    try:
        shown, typed = (openpyxl.load_workbook(io.BytesIO(data), data_only=only).worksheets[0] for only in (True, False))
    except (InvalidFileException, zipfile.BadZipFile, KeyError, ValueError, IndexError, OSError, EOFError):
        raise InputError(f"{path}: this is no readable workbook") from None
    for values, formulas in zip(shown.iter_rows(), typed.iter_rows()):
        texts, faults = {}, {}
        for cell, formula in zip(values, formulas):
            try:
                texts[cell.column_letter] = _text(cell.value, formula)
            except InputError as error:
                faults[cell.column_letter] = str(error)
            except AttributeError:  # a cell merged into its neighbour
                continue
        if texts or faults:
            yield values[0].row, texts, faults


def _text(value, formula):
    if isinstance(value, (datetime.date, datetime.time, datetime.timedelta)):
        raise InputError(f"the spreadsheet made a date of it ({value}); format the cell as text and type the value again")
    if (isinstance(value, str) and formula.data_type == "e") or (str(value).startswith("#") and formula.data_type == "f"):
        raise InputError(f"the cell holds the error {value}")
    if value is None and formula.data_type == "f":
        raise InputError("the cell holds a formula whose value is not stored; open the workbook, save it, and try again")
    if isinstance(value, bool):
        return "yes" if value else "no"
    if isinstance(value, float):
        return f"{value:.12g}"
    return "" if value is None else str(value).strip()


def _letter(i):
    letters = ""
    i += 1
    while i:
        i, rest = divmod(i - 1, 26)
        letters = chr(65 + rest) + letters
    return letters
