"""Maths converted by its shape, numbers filled in afterwards, is what pandoc makes of it number for number."""

import importlib
import random

from gageline.formula import FORMULAS
from gageline.sheet import maths

ODD = (r"12{,}345.6\,\text{kip}", r"x_{12}^{20}", r"\frac{12}{34}", r"10^{-12}", r"29\,000\,\text{ksi}", "1.2D+1.6L", "2.50", r"\sqrt{12.5}",
       r"\sqrt[3]{12}", r"\text{M12 and 3.5}", "1,234", ".75", "90710001+12.5", "3.0+3.0", r"\left(12.5\,\text{in}\right)^{2}",
       r"\min\left(1.25,\,12\right)", "")


def test_numbers_do_not_change_the_conversion():
    for module in ("tension", "bolts", "connecting", "detailing"):
        importlib.import_module(f"gageline.provisions.{module}")
    dice, rows = random.Random(11), {maths.tidied(latex) for latex in ODD if latex}
    for formula in list(FORMULAS.values()):
        values = [dice.choice([dice.uniform(0.1, 30), dice.uniform(30, 3000), float(dice.randint(1, 60))]) for _ in formula.arguments]
        try:
            printed = [line.rendered() for line in formula.lines(*values)]
        except (ValueError, ZeroDivisionError, TypeError):  # outside of what the formula is for
            continue
        rows |= {maths.row_of(text) for line in printed for text in (line.sign, line.symbolic, line.numeric, line.result) if text}
    rows = sorted(rows)

    direct, complaint = maths._convert(rows)

    assert not complaint and len(rows) > 150
    assert maths.converted(rows) == dict(zip(rows, direct))


def test_an_unreadable_formula_is_named_as_written():
    import pytest

    from gageline.errors import ReportError

    with pytest.raises(ReportError, match=r"12\.5"):
        maths.converted([r"\frac{12.5"])
