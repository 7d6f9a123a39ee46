"""Expected over specified minimum strengths of steels, for seismic systems; from memory."""

from functools import cache

from ..errors import NotInTable, nearest
from .table import read_table, value


@cache
def _table():
    return {(row["grade"], row["product"]): (value(row["R_y"], ""), value(row["R_t"], "")) for row in read_table("expected.csv")[1]}


def expected(name, product):
    """Return (R_y, R_t) of a steel.

    Parameters
    ----------
    name : printed name of the grade.
    product : "rolled" (shapes and bars), "hollow" (HSS and pipe) or "plate".

    Raises
    ------
    NotInTable
        The steel has no factors in the table; the nearest steels that have.

    >>> expected("A500 Gr. C", "hollow")
    (1.3, 1.2)
    """
    if (name, product) not in _table():
        listed = [grade for grade, form in _table() if form == product]
        raise NotInTable(f"R_y and R_t of {name} ({product}) are not in the tables; nearest are {nearest(name, listed)}")
    return _table()[name, product]
