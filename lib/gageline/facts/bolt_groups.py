"""Strength groups of bolts: nominal stresses, what installation they permit, the products that belong to them."""

import re
from dataclasses import dataclass
from functools import cache

from ..errors import NotInTable, nearest
from .grades import EDITIONS
from .table import read_table, value

_GROUP_WORDS = re.compile(r"ASTM|GROUP|GRADE|GR\.?|F3125|[^A-Z0-9]")
_GROUP_ALIAS = {"A": "120", "B": "150", "C": "200-2", "200": "200-2", "C1": "200-1", "C2": "200-2",
                "2001": "200-1", "2002": "200-2"}


@dataclass(frozen=True)
class BoltGroup:
    """A strength group under one code edition.

    Parameters
    ----------
    name : as that edition prints it: Group 120 in 360-22, Group A in 360-16.
    key : A307, 120, 144, 150, 200-1 or 200-2.
    product : the bolt standard it was asked by, None when asked by group.
    F_u : tensile strength of the bolt. [ksi]
    F_nt : nominal tensile stress. [ksi]
    F_nv_N, F_nv_X : nominal shear stress with threads in, and out of, the shear plane. [ksi]
    T_b : heading of its pretensions in the tables by diameter, empty where it has none.
    installation : what is permitted, of snug, pretensioned, slip-critical.
    d_least, d_most : smallest and largest diameter. [in]
    metric : True where metric sizes are tabulated.
    notes : tuple of sentences that go with the group.
    """

    name: str
    key: str
    product: str | None
    F_u: float
    F_nt: float
    F_nv_N: float
    F_nv_X: float
    T_b: str
    installation: tuple
    d_least: float
    d_most: float
    metric: bool
    notes: tuple


def bolt_group(name, edition):
    """Return a strength group by group or by product.

    Parameters
    ----------
    name : "120", "Group 120", "A" (the 2016 letter), "A307", "A325", "A490", "F1852", "F2280", "F3148", "F3043",
        "F3111", "A354 BC", "A354 BD"; "200 Grade 1" or "200 Grade 2", where 200 alone means Grade 2.
    edition : "360-16" or "360-22".

    Returns
    -------
    group : BoltGroup.

    Raises
    ------
    NotInTable : no such group, or a group the edition does not have.

    >>> bolt_group("A325", "360-16").name, bolt_group("A", "360-22").F_nt
    ('Group A', 90.0)
    """
    if edition not in EDITIONS:
        raise NotInTable(f"code edition {edition!r} is not in the tables; they hold {', '.join(EDITIONS)}")
    groups, products = _groups(), _products()
    key = _GROUP_WORDS.sub("", str(name).upper())
    product = products.get(key) or products.get(key.removesuffix("M"))
    step = None
    if product is None and key[:-1] in products and key[-1] in "12":
        product, step = products[key[:-1]], key[-1]
    key = product["key"] if product else _GROUP_ALIAS.get(key, key)
    if step and key.startswith("200"):
        key = f"200-{step}"
    if key not in groups:
        known = [*groups, *(row["product"] for row in products.values())]
        raise NotInTable(f"bolt group {name!r} is not in the tables; nearest are {nearest(name, known)}")
    row = groups[key]
    printed = row["name_16" if edition == "360-16" else "name_22"]
    if not printed:
        have = "; ".join(other["name_16"] for other in groups.values() if other["name_16"])
        raise NotInTable(f"{row['name_22']} (F3148) is not in {edition}; that edition has {have}")
    notes = [f"{printed}: {note}" for note in row["notes"]]
    if key == "200-2" and not step and not re.search(r"2$", str(name).strip().replace("200", "")):
        notes.insert(0, f"{printed} taken, since the grade was not given")
    if product and product["note"]:
        notes.append(f"{product['product']}: {product['note']}")
    return BoltGroup(printed, key, product and product["product"], row["F_u"], row["F_nt"], row["F_nv_N"],
                     row["F_nv_X"], row["T_b"], row["installation"], row["d_least"], row["d_most"], row["metric"],
                     tuple(notes))


def bolt_groups(edition):
    """Return the printed names of the groups of a code edition, "360-16" or "360-22"."""
    return tuple(row["name_" + edition[-2:]] for row in _groups().values() if row["name_" + edition[-2:]])


def usual_diameter(group):
    """Return the largest diameter a group, or the product it was asked by, is usually made in. [in]"""
    usual = [row["d_usual"] for row in _products().values() if row["key"] == group.key
             and group.product in (None, row["product"])]
    return max(usual, default=group.d_most)


@cache
def _groups():
    units, rows = read_table("bolt-groups.csv")
    stresses = ("F_u", "F_nt", "F_nv_N", "F_nv_X", "d_least", "d_most")
    return {row["key"]: {**row, **{column: value(row[column], units[column]) for column in stresses},
                         "installation": tuple(row["installation"].split()), "metric": row["metric"] == "yes",
                         "notes": tuple(filter(None, row["notes"].split("|")))} for row in rows}


@cache
def _products():
    units, rows = read_table("bolt-products.csv")
    return {_GROUP_WORDS.sub("", row["product"]): {**row, "d_usual": value(row["d_usual"], units["d_usual"])}
            for row in rows}
