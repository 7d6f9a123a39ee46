"""A family's own table in SI: its cells were written in inch and kip, its heads and caption say which."""

import re
from dataclasses import replace

from .. import units


def in_si(made):
    """Return a family's table in SI: columns by the unit in their head, or in words below the table where the head names none."""
    named = [re.search(r", (in|in²|kip|kip·in)$", head) for head in made.heads]
    forces = "kip" if "in kip" in made.caption else ""
    column = [found[1] if found else forces if i and not re.search(r"l_w/w_f|share|alpha|lines", head) else ""
              for i, (head, found) in enumerate(zip(made.heads, named))]
    heads = tuple(head[:found.start()] + f", {units.shown_as(found[1], 'SI')[0]}" if found else head for head, found in zip(made.heads, named))
    rows = tuple(tuple(_cell(cell, unit) for cell, unit in zip(row, column)) for row in made.rows)
    caption = units.told(made.caption.replace("in kip", "in kN"), "SI")
    return replace(made, heads=heads, rows=rows, caption=caption, remark=units.told(made.remark, "SI"))


def _cell(cell, unit):
    """Return a cell of a table in SI: its leading number times the unit's factor."""
    found = re.match(r"[−-]?[\d.,/¼½¾⅛⅜⅝⅞-]*\d?[\d¼½¾⅛⅜⅝⅞]", cell)
    if not unit or not found:
        return units.told(cell, "SI")
    number = units.read(f"{found[0].replace('−', '-')} {unit.replace('²', '**2').replace('·', '*')}", unit)
    if unit == "in":
        return units.millimetres(number) + cell[found.end():]
    return units.printed(number * units.shown_as(unit, "SI")[1]) + cell[found.end():]
