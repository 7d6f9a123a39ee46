"""The rows of a schedule checked one by one, each into a calculation's notebook or into one sentence with its row and column."""

import copy
import json
import re
import types
from dataclasses import dataclass
from functools import cached_property
from pathlib import Path
from typing import Literal, Union, get_args, get_origin

from .. import cells, families, identity, running, units
from ..calc import Calc
from ..errors import GagelineError, InputError, nearest
from ..sheet.assets import templates_root
from .state import source_hash

OWN = ("family", "source")
"""Columns of the schedule itself: which family a mark is of, and where its row comes from."""

LEFT_OUT = ("none", "-", "–", "—")
"""What a cell says to leave an input out that the template gives."""

_PLAIN = re.compile(r"[-+−]?\s*[\d.¼½¾⅛⅜⅝⅞][\d\s./¼½¾⅛⅜⅝⅞-]*(?:[eE][-+]?\d+)?")


@dataclass(frozen=True)
class Fault:
    """What is wrong with a row, as one sentence; column is empty where it is the row as a whole."""

    row: int
    mark: str
    column: str
    sentence: str


@dataclass
class Mark:
    """A row that makes a calculation: its notebook, not run, and the results that the notebook has to come to."""

    row: int
    mark: str
    family: str
    book: dict
    given: dict
    defaults: dict
    results: dict
    fault: str = ""


class Template:
    """What rows start from: a family's template, or a project's own notebook."""

    def __init__(self, family, like=None):
        self.family = family
        self.path = Path(like) if like else templates_root() / f"{family}.ipynb"
        self.book = running.read_notebook(self.path)
        self.given = cells.inputs_of_notebook(self.book)
        self.fields = families.family(family).Model.model_fields

    @cached_property
    def hash(self):
        """SHA-256 of the template's file."""
        return identity.file_hash(self.path)


def validated(schedule, project_file, family="bolted", like=None, watch=lambda done: None):
    """Check every row and return (marks, faults), both in the order of the file.

    Parameters
    ----------
    schedule : what ``reading.read`` returned. project_file : path of the project's project.toml.
    family : family of rows that name none. like : notebook that rows start from instead of the family's template.
    watch : called with the number of rows done.

    Raises
    ------
    InputError
        A head names no input, or a unit that the input cannot have; or the schedule has no column mark.
    """
    if like:
        family = running.family_of(running.read_notebook(like), like)
    by_name = {column.name: column for column in schedule.columns}
    wanted = {family}
    if "family" in by_name:
        wanted |= {row.cells.get(by_name["family"].letter, "") or family for row in schedule.rows}
    templates = {name: Template(name, like if name == family else None) for name in sorted(wanted) if name in families.names()}
    if family not in templates:
        families.family(family)
    columns = _checked_columns(schedule, templates)
    marks, faults, seen = [], [], {}
    for done, row in enumerate(schedule.rows, start=1):
        here = {name: row.cells.get(column.letter, "") for name, column in columns.items()}
        try:
            if row.faults:
                letter, sentence = next(iter(row.faults.items()))
                raise InputError(f"column {letter}: {sentence}")
            made = _mark(schedule, row, here, columns, templates, family, project_file)
            first = seen.setdefault(made.mark.casefold(), row.number)
            if first != row.number:
                raise InputError(f"mark {made.mark} stands in row {first} already")
            marks.append(made)
        except GagelineError as error:
            faults.append(_fault(row, here, columns, str(error)))
        except Exception as error:
            faults.append(_fault(row, here, columns, f"unexpected {type(error).__name__}: {error}"))
        watch(done)
    return marks, faults


def _checked_columns(schedule, templates):
    fields = {name: field for template in templates.values() for name, field in template.fields.items()}
    folded = {name.casefold(): name for name in (*fields, *OWN)}
    columns = {}
    for column in schedule.columns:
        name = folded.get(column.name.casefold())
        if name is None:
            raise InputError(f"{schedule.path}: column {column.letter} ({column.head}) is no input; "
                             f"nearest known inputs: {nearest(column.name, folded.values())}")
        if column.unit and name in fields and (unit := unit_of(fields[name])) is not None:
            if unit == "":
                raise InputError(f"{schedule.path}: column {column.letter} ({column.head}): {name} is a number without unit")
            units.read(f"1 {column.unit}", unit, f"{schedule.path}: column {column.letter} ({column.head})")
        columns[name] = column
    if "mark" not in columns:
        raise InputError(f"{schedule.path}: no column is headed mark; each row needs a piece mark")
    return columns


def _mark(schedule, row, here, columns, templates, family, project_file):
    family = here.get("family") or family
    if family not in templates:
        families.family(family)
    template = templates[family]
    mark = here["mark"]
    if not mark:
        raise InputError("mark is empty; each row needs a piece mark")
    if not re.fullmatch(r"[\w.-]{1,80}", mark) or mark.startswith(".") or mark.endswith("."):
        raise InputError(f"mark {mark!r} cannot name a file; use letters, digits, - and _, at most 80")
    source = " ".join((here.get("source") or f"schedule {schedule.path.name}").split()).lstrip("# ")
    typed, left_out = {}, set()
    for name, text in here.items():
        if name in OWN or not text:
            continue
        if name not in template.fields:
            raise InputError(f"{name} = {text!r}: a {family} connection has no such input; leave the cell empty")
        if text.casefold() in LEFT_OUT:
            left_out.add(name)
        else:
            typed[name] = _value(text, template.fields[name], columns[name].unit)
    loads = {name for name, field in template.fields.items() if (field.json_schema_extra or {}).get("group") == "Loads"}
    if loads & set(columns):
        left_out |= loads  # an example's loads never stand in for loads that the schedule does not give
    kept = {name: each.value for name, each in template.given.items() if name not in typed and name not in left_out}
    defaults = {name: value for name, value in kept.items() if name != "mark"}
    book = _book(template, mark, schedule, typed, defaults, source)
    given = cells.inputs_of_notebook(book)
    calc = Calc(family, given, Path(project_file))
    return Mark(row.number, mark, family, book, given, defaults, calc.results())


def unit_of(field):
    """Return the display unit of a quantity field, "" for a plain number, None for what is no quantity."""
    marks = [*field.metadata, *(mark for part in get_args(field.annotation) for mark in getattr(part, "__metadata__", ()))]
    return next((mark.unit for mark in marks if hasattr(mark, "unit")), None)


def _value(text, field, unit):
    """Return a cell's text as an inputs cell would give it."""
    kinds = set(_kinds(field.annotation))
    if bool in kinds and (word := {"yes": True, "true": True, "no": False, "false": False}.get(text.casefold())) is not None:
        return word
    if int in kinds and re.fullmatch(r"[-+]?\d+(?:\.0+)?", text):
        return int(float(text))
    listed = unit_of(field) is not None and tuple in kinds
    if unit:
        with_unit = lambda part: f"{part.rstrip()} {unit}" if _PLAIN.fullmatch(part.strip()) else part
        return re.sub(r"[^,;]+", lambda match: with_unit(match[0]), text) if listed else with_unit(text)
    if tuple in kinds and unit_of(field) is None:
        return [part.strip() for part in re.split(r"[|\n]", text) if part.strip()]
    return text


def _kinds(annotation):
    """Yield the plain types that an annotation allows."""
    origin = get_origin(annotation)
    if origin in (Union, types.UnionType):
        for part in get_args(annotation):
            yield from _kinds(part)
    elif origin is Literal:
        yield from (type(choice) for choice in get_args(annotation))
    elif hasattr(annotation, "__metadata__"):
        yield from _kinds(annotation.__origin__)
    else:
        yield origin or annotation


def _book(template, mark, schedule, typed, defaults, source):
    book = copy.deepcopy(template.book)
    left = f"default of {template.path.name}, blank in the schedule"
    lines, group = [f"# Inputs of mark {mark} from {schedule.path.name}; the comment behind a line is the source of that input and is printed."], None
    for name, field in template.fields.items():
        if name not in typed and name not in defaults:
            continue
        heading = (field.json_schema_extra or {}).get("group", "")
        if heading != group:
            lines += ["", f"# {heading}"]
            group = heading
        value = typed.get(name, defaults.get(name))
        lines.append(f"{name} = {_literal(value)}  # {source if name in typed else left}")
    cell = next(cell for cell in book["cells"] if cells.TAG in cell["metadata"].get("tags", ()))
    cell["source"] = "\n".join(lines)
    for cell in book["cells"]:
        if cell["cell_type"] == "code":
            cell |= {"outputs": [], "execution_count": None}
    book["cells"] = [cell for cell in book["cells"] if cells.INJECTED not in cell["metadata"].get("tags", ())]
    book["metadata"]["gageline"] = {"template": template.path.name, "template_sha256": template.hash, "schedule": schedule.path.name,
                                    "source_sha256": source_hash(book)}
    return book


def _literal(value):
    return json.dumps(value, ensure_ascii=False) if isinstance(value, str) else \
        f"[{', '.join(map(_literal, value))}]" if isinstance(value, (list, tuple)) else repr(value)


def _fault(row, here, columns, sentence):
    """Return a fault with the column of the first input that its sentence names."""
    letter = re.match(r"column ([A-Z]+): ", sentence)
    words = re.findall(r"\w+", sentence)
    name = next((word for word in words if word in columns and (word not in ("lines", "rows", "bolt", "holes", "member", "pitch") or
                                                                re.match(rf"(?:input )?{word}\b", sentence))), "")
    column = next((each for each in columns.values() if letter and each.letter == letter[1]), columns.get(name))
    shown = f"{column.letter} ({column.head})" if column else letter[1] if letter else ""
    return Fault(row.number, here.get("mark", ""), shown, " ".join((sentence[letter.end():] if letter else sentence).split()))
