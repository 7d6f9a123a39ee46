"""Steel grades: strengths, the product forms a grade is listed for, thickness limits, usual grades, filler metal."""

import re
from dataclasses import dataclass
from functools import cache

from ..errors import InputError, NotInTable, nearest
from .shapes import SERIES
from .table import read_table, value

E = 29000.0  # ksi, modulus of elasticity of steel, AISC 360 Section A (Symbols)
FORMS = ("shape", "hss-rect", "hss-round", "pipe", "plate", "bar", "rod")
EDITIONS = ("360-16", "360-22")

_PLAIN = {"shape": "rolled shapes", "hss-rect": "rectangular HSS", "hss-round": "round HSS", "pipe": "pipe",
          "plate": "plate", "bar": "bar", "rod": "threaded rod"}
_USUAL = {"hss-rect": "HSS", "hss-round": "HSS", "pipe": "Pipe", "plate": "plate", "bar": "bar"}
_FILLER_WORDS = re.compile(r"/[AF]\d+M|ASTM|GRADE|GR\.?|[^A-Z0-9]")


@dataclass(frozen=True)
class Grade:
    """A steel grade as listed in Table A3.1.

    Parameters
    ----------
    name : printed name, for example A572 Gr. 50.
    F_y, F_u : least yield stress and tensile strength, of the thinnest material. [ksi]
    forms : product forms it is listed for, members of FORMS.
    t_factor : design wall over nominal wall of HSS and pipe, Section B4.2; None for other forms.
    """

    name: str
    F_y: float
    F_u: float
    forms: tuple
    t_factor: float | None


@dataclass(frozen=True)
class Material:
    """Strengths of one grade in one form and thickness.

    Parameters
    ----------
    name : printed name of the grade.
    F_y, F_u : least yield stress and tensile strength. [ksi]
    note : what a reviewer should know about the choice; empty when nothing is unusual.
    t_factor : design wall over nominal wall of HSS and pipe; None for other forms.
    """

    name: str
    F_y: float
    F_u: float
    note: str
    t_factor: float | None


def grade(name):
    """Return a grade by its name.

    Parameters
    ----------
    name : such as "A36", "A572-50", "ASTM A572 Gr. 50" or "a500 grade c".

    Returns
    -------
    grade : Grade.

    Raises
    ------
    NotInTable : no such grade, or a specification with several grades and none chosen.

    >>> grade("ASTM a572 gr.50").F_u
    65.0
    """
    rows = _rows(name)
    forms = tuple(form for form in FORMS if any(form in row["forms"] for row in rows))
    first = rows[0]
    return Grade(first["name"], first["F_y"], first["F_u"], forms, first["t_factor"])


def grades(form=None):
    """Return the printed names of all grades, or of those listed for one form.

    Parameters
    ----------
    form : one of FORMS; None for all.

    Returns
    -------
    names : tuple of str.
    """
    listed = {row["name"]: None for rows in _table().values() for row in rows if form is None or form in row["forms"]}
    return tuple(listed)


def material(name, *, form, series=None, thickness=None, edition):
    """Return the strengths of a grade in the form and thickness used.

    Parameters
    ----------
    name : grade, see grade().
    form : one of FORMS.
    series : series of the shape, for the note on usual grades; None for plate, bar and rod.
    thickness : thickness of a plate, bar or HSS wall, diameter of a rod; None where unknown. [in]
    edition : "360-16" or "360-22".

    Returns
    -------
    material : Material.

    Raises
    ------
    InputError : unknown form, a thickness that is not positive or that the grade is not made in,
        or a grade that is not listed for the form.
    NotInTable : unknown grade, series or edition.

    >>> material("A36", form="plate", thickness=9.0, edition="360-22").F_y
    32.0
    """
    if edition not in EDITIONS:
        raise NotInTable(f"code edition {edition!r} is not in the tables; they hold {', '.join(EDITIONS)}")
    if form not in FORMS:
        raise InputError(f"product form {form!r} is not known; it must be one of {', '.join(FORMS)}")
    if series is not None and series not in SERIES:
        raise NotInTable(f"series {series!r} is not in the shape tables; they hold {', '.join(SERIES)}")
    if thickness is not None and not 0.0 < thickness < float("inf"):
        raise InputError(f"the thickness of {name} must be more than 0 in., got {thickness} in.")
    rows = _rows(name)
    printed = rows[0]["name"]
    rows = [row for row in rows if form in row["forms"] and row["edition"] in ("", edition)]
    if not rows:
        what = f"{_PLAIN[form]} ({series})" if form == "shape" and series else _PLAIN[form]
        raise InputError(f"{printed} is not made as {what}; Table A3.1 lists for {_PLAIN[form]} {_short_list(form)}")
    row = _band(rows, thickness, f"{printed} {_PLAIN[form]}")
    notes = [row["note"]]
    if thickness is None and len(rows) > 1:
        notes.append(f"thickness not given: values of {printed} to {rows[0]['t_to']:g} in.")
    usual = usual_grades(series or _USUAL[form], edition) if series or form in _USUAL else ()
    if usual and printed not in usual:
        notes.append(f"the usual grade for {series or _PLAIN[form]} is {' or '.join(usual)}: confirm availability")
    return Material(printed, row["F_y"], row["F_u"], "; ".join(filter(None, notes)), row["t_factor"])


def usual_grades(series, edition):
    """Return the grades a series is usually ordered in: availability, no rule of the standard.

    Parameters
    ----------
    series : one of the shape series, "plate" or "bar".
    edition : "360-16" or "360-22", for the Manual of its time.

    Returns
    -------
    names : tuple of printed grade names, the most usual first.

    Raises
    ------
    NotInTable : no entry for that series or edition.
    """
    _, rows = read_table("usual-grades.csv")
    for row in rows:
        if row["series"] == series and edition in EDITIONS:
            return tuple(row[edition].split(" or "))
    known = ", ".join(row["series"] for row in rows)
    raise NotInTable(f"no usual grade for {series!r} in {edition!r}; the table holds {known} in {', '.join(EDITIONS)}")


def matching_filler(name, thickness):
    """Return the filler metal classes that match a base metal, user note table of Section J2.6.

    Parameters
    ----------
    name : grade of the base metal.
    thickness : its thickness. [in]

    Returns
    -------
    F_EXX : tuple of filler metal strengths. [ksi]
    low_hydrogen : True where SMAW needs low-hydrogen electrodes.

    Raises
    ------
    NotInTable : the table names no filler for that grade.
    """
    key = _rows(name)[0]["key"]
    units, rows = read_table("fillers.csv")
    for row in rows:
        upper = value(row["t_to"], units["t_to"])
        if row["spec"] + row["grade"] == key and (upper is None or thickness <= upper):
            return tuple(float(F_EXX) for F_EXX in row["F_EXX"].split()), row["low_hydrogen"] == "yes"
    listed = dict.fromkeys(_printed(row["spec"], row["grade"]) for row in rows)
    raise NotInTable(f"no matching filler metal is tabulated for {name}; the table holds {', '.join(listed)}")


def _rows(name):
    if not isinstance(name, str):
        raise InputError(f"a grade is named by text such as 'A572-50', got {name!r}")
    table = _table()
    key = _key(name)
    if key in table:
        return table[key]
    family = [rows for rows in table.values() if rows[0]["spec"] == key]
    if len(family) == 1:
        return family[0]
    if family:
        raise NotInTable(f"{key} comes in several grades; name one of {', '.join(rows[0]['name'] for rows in family)}")
    raise NotInTable(f"steel grade {name!r} is not in the tables; nearest are {nearest(name, grades())}")


def _band(rows, thickness, what):
    if thickness is None:
        return rows[0]
    for row in rows:
        if row["t_to"] is None or thickness <= row["t_to"]:
            return row
    raise InputError(f"{what} is listed to {rows[-1]['t_to']:g} in., got {thickness:g} in.")


def _short_list(form):
    families = {}
    for rows in _table().values():
        if any(form in row["forms"] for row in rows):
            families.setdefault(rows[0]["spec"], []).append(rows[0]["grade"])
    return ", ".join(f"{spec} {'/'.join(steps)}".strip() for spec, steps in families.items())


def _key(name):
    return _FILLER_WORDS.sub("", name.upper())


def _printed(spec, step):
    return f"{spec} Gr. {step}" if step else spec


@cache
def _table():
    units, rows = read_table("grades.csv")
    table = {}
    for row in rows:
        figures = {column: value(row[column], units[column]) for column in ("t_over", "t_to", "F_y", "F_u", "t_factor")}
        key = _key(row["spec"] + row["grade"])
        text = {column: row[column] for column in ("spec", "grade", "edition", "note")}
        table.setdefault(key, []).append({**text, **figures, "key": key, "name": _printed(row["spec"], row["grade"]),
                                          "forms": tuple(row["forms"].split())})
    return table
