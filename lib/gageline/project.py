"""project.toml: what a project fixes for all its calculations; validated, every key explained by its field."""

import datetime
import os
import re
import tomllib
from pathlib import Path
from typing import Literal

from pydantic import BaseModel, ConfigDict, Field, ValidationError

from .editions import Basis
from .errors import InputError, nearest

FILE = "project.toml"

STATUSES = ("preliminary", "for review", "for approval", "for construction", "superseded", "void")
PROFILES = ("working", "record")


class Project(BaseModel):
    """A project's control data, as read from its project.toml."""

    model_config = ConfigDict(frozen=True, extra="forbid", strict=True)

    project: str = Field(description="name of the project", min_length=1)
    job: str = Field("", description="job number")
    client: str = Field("", description="client")
    location: str = Field("", description="location")
    firm: str = Field("", description="firm that makes the calculation")
    logo: str = Field("", description="file of the firm's logo beside this file, an SVG")
    edition: Literal["360-22", "360-16"] = Field(description="specification: 360-22 or 360-16 (AISC)")
    method: Literal["LRFD", "ASD"] = Field(description="LRFD or ASD")
    loads: Literal["7-22", "7-16"] = Field(description="loads standard: 7-22 or 7-16 (ASCE/SEI)")
    units: Literal["US", "SI", "dual"] = Field("US", description="units of print: US (kip, in), SI (kN, mm, MPa) or dual")
    paper: Literal["us-letter", "a4"] = Field("us-letter", description="us-letter or a4")
    prepared_by: str = Field("", description="who may sign as preparer, names with commas between; empty: anybody")
    checked_by: str = Field("", description="who may sign as checker; empty: anybody but the preparer")
    approved_by: str = Field("", description="who may sign as approver; empty: anybody")
    rev: str = Field("0", description="revision: 0, 1, … or A, B, … before 0", min_length=1, max_length=6)
    date: datetime.date = Field(description="date of the revision, as 2026-12-01")
    revision_text: str = Field("first issue", description="what this revision is")
    status: Literal[STATUSES] = Field("preliminary", description="status of an issue: preliminary, for review, for approval or for construction")
    profile: Literal[PROFILES] = Field("working", description="working: PDF/A-3 with its sources attached; record: PDF/A-2, sources beside it")

    def allowed(self, role):
        """Return the names that may sign in a role ("preparer", "checker", "approver"); empty where anybody may."""
        named = {"preparer": self.prepared_by, "checker": self.checked_by, "approver": self.approved_by}[role]
        return tuple(name.strip() for name in named.split(",") if name.strip())

    @property
    def basis(self):
        """Edition, method, loads standard and units of print."""
        return Basis(self.edition, self.method, self.loads, self.units)


def load(path):
    """Read a project.toml.

    Raises
    ------
    InputError
        The file is missing, is no TOML, or a key is unknown, missing or not allowed.
    """
    path = Path(path)
    try:
        data = tomllib.loads(path.read_text(encoding="utf-8"))
    except OSError:
        raise InputError(f"{path}: there is no such project file") from None
    except (tomllib.TOMLDecodeError, UnicodeDecodeError) as error:
        raise InputError(f"{path}: not readable as TOML: {error}") from None
    if unknown := [key for key in data if key not in Project.model_fields]:
        raise InputError(f"{path}: unknown key {unknown[0]!r}; nearest known keys: {nearest(unknown[0], Project.model_fields)}")
    try:
        return Project(**data)
    except ValidationError as error:
        first = error.errors()[0]
        key = first["loc"][0]
        what = Project.model_fields[key].description
        problem = "is missing" if first["type"] == "missing" else f"= {first['input']!r} is not allowed"
        raise InputError(f"{path}: {key} {problem}; give the {what}") from None


def find(start=None):
    """Return the path of the project file that governs a folder: in it, or in one of the two folders above.

    Without ``start`` the current folder is meant, or the one that GAGELINE_PROJECT names.

    Raises
    ------
    InputError
        There is none: edition and method are never assumed.
    """
    start = Path(start or os.environ.get("GAGELINE_PROJECT") or Path.cwd()).resolve()
    for folder in (start, *start.parents[:2]):
        if (folder / FILE).is_file():
            return folder / FILE
    raise InputError(f"no {FILE} in {start} or the two folders above; run the notebook in its project's folder (papermill: --cwd), "
                     "or set GAGELINE_PROJECT to it")


def write_new(folder, name):
    """Write a project.toml with every key and its meaning into a folder that has none, and return its path."""
    path = Path(folder) / FILE
    values = {"project": name, "edition": "360-22", "method": "LRFD", "loads": "7-22", "date": datetime.date.today()}
    rows = []
    for key, field in Project.model_fields.items():
        value = values.get(key, field.get_default() if not field.is_required() else "")
        text = value.isoformat() if isinstance(value, datetime.date) else '"' + re.sub(r'(["\\])', r"\\\1", str(value)) + '"'
        rows.append(f"{f'{key} = {text}':<44} # {field.description}")
    with open(path, "x", encoding="utf-8") as file:
        file.write("# Control data of the project; fixed for all its calculations.\n" + "\n".join(rows) + "\n")
    return path
