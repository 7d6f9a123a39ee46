"""Contracts of every formula: symbols, docstring, three uses that agree, and a print that recomputes."""

import ast
import functools
import inspect
import math
import random
import re
import zlib

import numpy as np
import pytest
from helpers import assert_quantity, formulas, section

from gageline import units
from gageline.errors import FormulaError
from gageline.formula import _NAMESPACE, EDITIONS, formula
from gageline.symbols import SYMBOLS

EVERY = formulas()

each_formula = pytest.mark.parametrize("made", EVERY.values(), ids=[name.removeprefix("gageline.provisions.") for name in EVERY])

COUNTED = {"n", "n_a", "n_b", "n_h", "n_j", "n_p", "n_s", "n_z", "n_v"}
"""Symbols that are whole numbers in practice."""

RANGES = {"ksi": (10.0, 120.0), "in": (0.2, 40.0), "in²": (0.1, 60.0), "in³": (1.0, 900.0), "kip": (1.0, 900.0), "1/in": (0.1, 1.0),
          "kip/in": (0.5, 30.0), "kip·in": (1.0, 900.0), "rad": (0.1, 1.2), "": (0.05, 2.5)}
"""Values of the size that steel connections have, by display unit."""


def samples(made, count=40):
    """Return lists of positive arguments, the same in every run; factors, ratios and counts stay in the range they have in use."""
    rng = random.Random(zlib.crc32(made.where.encode()))
    out = []
    for _ in range(count):
        values = []
        for name in made.arguments:
            if name in COUNTED:
                values.append(rng.randint(1, 12))
            elif name == "lam":
                values.append(rng.uniform(26, 200))
            elif name == "E":
                values.append(29000.0)
            elif name == "t" and "t_f" in made.arguments:
                values.append(rng.uniform(0.2, 4.0))  # a web, not a block
            else:
                values.append(rng.uniform(*RANGES[SYMBOLS[name].unit]))
        if "n_a" in made.arguments and "n" in made.arguments:
            i, j = made.arguments.index("n_a"), made.arguments.index("n")
            values[i], values[j] = sorted((values[i], values[j] + 12))
        if "t_p" in made.arguments and "R_o" in made.arguments:
            values[made.arguments.index("t_p")] *= values[made.arguments.index("R_o")] / RANGES["in"][1]  # a gusset fits into its tube
        out.append(values)
    return out


def test_there_are_formulas_to_test():
    assert len(EVERY) > 50


class TestSymbols:
    @each_formula
    def test_every_name_is_in_the_symbol_table(self, made):
        used = {*made.arguments, *(line.symbol for line in made.body), *(name for line in made.body for name in line.names)}

        assert used <= set(SYMBOLS)

    def test_every_symbol_is_used_by_a_formula(self):
        used = {name for made in EVERY.values() for name in (*made.arguments, *(line.symbol for line in made.body))}

        assert sorted(set(SYMBOLS) - used) == []

    def test_units_are_known_and_signs_are_unlike(self):
        assert {symbol.unit for symbol in SYMBOLS.values()} <= set(units.DISPLAY)
        signs = [symbol.latex for symbol in SYMBOLS.values()]
        assert sorted({sign for sign in signs if signs.count(sign) > 1}) == []

    def test_every_meaning_stands_once(self):
        meanings = [symbol.meaning for symbol in SYMBOLS.values()]

        assert sorted({text for text in meanings if meanings.count(text) > 1}) == []


class TestDocstring:
    @each_formula
    def test_parameters_are_the_signature_with_the_units_of_the_table(self, made):
        documented = [(name, unit) for name, _, unit in section(made, "Parameters")]

        assert documented == [(name, SYMBOLS[name].unit) for name in made.arguments]

    @each_formula
    def test_returns_the_symbol_it_says_in_its_unit(self, made):
        documented = [(name, unit) for name, _, unit in section(made, "Returns")]

        assert documented == [(made.result, SYMBOLS[made.result].unit)]

    @each_formula
    def test_has_one_sentence_and_an_example(self, made):
        first = made.__doc__.strip().splitlines()[0]

        assert first.endswith(".") and len(first) < 130
        assert ">>>" in made.__doc__

    @each_formula
    def test_clause_stands_for_both_editions(self, made):
        assert set(made.clause) == set(EDITIONS)
        assert all(text.strip() for text in made.clause.values())


class TestThreeUses:
    @each_formula
    def test_bare_quantities_and_lines_agree(self, made):
        for values in samples(made, 12):
            bare = made.bare(*values)
            lines = made.lines(*values)
            given = [units.quantity(value, SYMBOLS[name].unit) for name, value in zip(made.arguments, values)]
            quantity = made(*given)

            assert lines[-1].symbol == made.result
            assert lines[-1].result == pytest.approx(bare, rel=1e-12)
            assert quantity.magnitude == pytest.approx(bare, rel=1e-12)
            assert quantity.units == units.quantity(1.0, SYMBOLS[made.result].unit).units

    @each_formula
    def test_other_units_of_the_same_dimension_give_the_same(self, made):
        values = samples(made, 1)[0]
        other = {"in": "mm", "in²": "mm**2", "in³": "cm**3", "kip": "kN", "ksi": "MPa", "1/in": "1/mm", "rad": "degree"}
        given = []
        for name, value in zip(made.arguments, values):
            unit = SYMBOLS[name].unit
            quantity = units.quantity(value, unit)
            given.append(quantity.to(other[unit]) if unit in other else quantity)

        assert made(*given).magnitude == pytest.approx(made.bare(*values), rel=1e-9)

    @each_formula
    def test_arrays_give_the_scalar_results_one_by_one(self, made):
        if not made.arguments:
            pytest.skip("a constant of the Specification takes no values")
        rows = samples(made, 20)
        found = made.bare(*(np.array(column, dtype=float) for column in zip(*rows)))

        assert found == pytest.approx([made.bare(*row) for row in rows], rel=1e-12)

    @each_formula
    def test_one_array_among_floats_is_enough(self, made):
        row = samples(made, 1)[0]
        for i, name in enumerate(made.arguments):
            spread = np.array([row[i], 1.25 * row[i]])
            found = made.bare(*row[:i], spread, *row[i + 1:])
            wanted = [made.bare(*row[:i], value, *row[i + 1:]) for value in spread]

            assert np.broadcast_to(found, (2,)) == pytest.approx(wanted, rel=1e-12), name


def printed_lines(made, count=25):
    """Return the computed lines of a formula for several inputs: typical decimals and trade sizes, not only long fractions."""
    out = []
    for i, values in enumerate(samples(made, count)):
        if i % 3 == 1:
            values = [round(value, 2) for value in values]
        if i % 3 == 2:
            values = [round(value * 16) / 16 or 1 / 16 for value in values]
        out += made.lines(*values)
    return out


class TestPrint:
    @each_formula
    def test_every_body_line_is_printed(self, made):
        wanted = [line.targets[0].id for line in body_of(made)]

        assert [line.symbol for line in made.lines(*samples(made, 1)[0])] == wanted
        for line in made.lines(*samples(made, 1)[0]):
            assert line.rendered().sign == SYMBOLS[line.symbol].latex
            assert line.rendered().latex.startswith(r"\begin{aligned}" + SYMBOLS[line.symbol].latex)

    @each_formula
    def test_every_symbol_and_every_number_of_a_line_is_in_its_latex(self, made):
        for line in made.lines(*samples(made, 1)[0]):
            shown = line.rendered()
            if isinstance(line.body.expression, ast.Constant):
                assert shown.symbolic == shown.numeric == ""
                continue
            assert shown.symbolic or SYMBOLS[line.symbol].latex not in (shown.symbolic, "")
            rows = shown.symbolic or shown.sign
            assert all(SYMBOLS[name].latex in rows for name in line.body.names)
            if shown.numeric:
                assert all(text in shown.numeric for text in shown.inputs_printed)

    @each_formula
    def test_constants_of_the_body_are_printed_as_written(self, made):
        for line in made.lines(*samples(made, 1)[0]):
            shown = line.rendered().latex
            for node in ast.walk(line.body.expression):
                if isinstance(node, ast.Constant):
                    assert re.search(rf"(?<![\d.]){re.escape(f'{node.value:g}')}(\.?0+)?(?![\d.])", shown), (node.value, shown)

    @each_formula
    def test_printed_numbers_recompute_to_the_printed_result(self, made):
        for line in printed_lines(made):
            shown = line.rendered()
            scope = dict(_NAMESPACE) | dict(zip(line.body.names, map(float, shown.inputs_printed)))
            again = eval(line.body.code, scope)
            half = 0.5 * 10.0 ** -len(shown.result_printed.partition(".")[2])

            assert abs(again - float(shown.result_printed)) <= half * (1 + 1e-6), (shown.latex, again)

    @each_formula
    def test_printed_result_is_the_computed_one(self, made):
        for line in printed_lines(made):
            printed = float(line.rendered().result_printed)

            assert printed == pytest.approx(line.result, rel=6e-3 if abs(line.result) < 1e-2 else 6e-4, abs=6e-5)

    @each_formula
    def test_printed_inputs_are_the_given_ones(self, made):
        for line in printed_lines(made):
            for text, value in zip(line.rendered().inputs_printed, line.values):
                assert float(text) == pytest.approx(float(value), rel=6e-4, abs=6e-5)

    @each_formula
    def test_latex_is_well_formed(self, made):
        for line in made.lines(*samples(made, 1)[0]):
            shown = line.rendered().latex
            bare = shown.replace(r"\{", "").replace(r"\}", "")
            depth = 0
            for sign in bare:
                depth += {"{": 1, "}": -1}.get(sign, 0)
                assert depth >= 0
            assert depth == 0
            assert shown.count(r"\left") == shown.count(r"\right")
            assert not re.search("[가-힣]", shown), "a slot was not filled"
            assert not re.search(r"(?<![A-Za-z\\])Z[a-z]\b", shown), "a neutral name was not filled"
            assert not any("_" in text for text in re.findall(r"\\text\{([^{}]*)\}", shown))
            assert r"\mathrm" not in shown and "operatorname" not in shown

    @each_formula
    def test_every_dimensioned_number_has_its_unit(self, made):
        for line in made.lines(*samples(made, 1)[0]):
            shown = line.rendered()
            if SYMBOLS[line.symbol].unit:
                assert r"\text{" in shown.result
            else:
                assert r"\text" not in shown.result
            if shown.numeric:
                wanted = sum(bool(SYMBOLS[name.id].unit) for name in ast.walk(line.body.expression)
                             if isinstance(name, ast.Name) and name.id in SYMBOLS)
                assert shown.numeric.count(r"\text{") == wanted

    @each_formula
    def test_reading_is_plain_words(self, made):
        for line in made.lines(*samples(made, 1)[0]):
            said = line.rendered().reading

            assert said.endswith(".") and not re.search(r"[*/_\\{}^=<>]", said)
            assert SYMBOLS[line.symbol].meaning in said
            assert line.rendered().result_printed in said
            assert not re.search("[가-힣]", said)

    def test_an_integer_and_a_float_print_alike(self):
        made = EVERY["gageline.provisions.bolts.first_like_bolts"]

        assert made.lines(4, 20)[0].rendered().latex == made.lines(4.0, 20.0)[0].rendered().latex


PRINTED = {"in": "mm", "in²": "mm**2", "in³": "mm**3", "kip": "kN", "ksi": "MPa", "kip/in": "kN/mm", "kip·in": "kN*m", "1/in": "1/mm"}
"""Display unit -> the registry's expression of the unit printed in SI; the registry's own definitions are the second way."""


@functools.cache
def inch_per(unit):
    """Return by how much a printed SI number is multiplied to come to kip and inch, by the unit registry."""
    if unit not in PRINTED:
        return 1.0
    return float(units.registry().Quantity(1.0, PRINTED[unit]).to(units.DISPLAY[unit]).magnitude)


class TestPrintInSI:
    """The printed numbers, with their printed units, recompute to the printed result."""

    def test_every_unit_of_the_symbols_has_its_si_twin(self):
        assert {symbol.unit for symbol in SYMBOLS.values()} - set(PRINTED) == {"", "rad"}
        for unit in PRINTED:
            assert units.shown_as(unit, "SI")[1] * inch_per(unit) == pytest.approx(1.0, rel=1e-14)

    @each_formula
    def test_printed_si_numbers_recompute_to_the_printed_result(self, made):
        for line in printed_lines(made, 12):
            shown = line.rendered("SI")
            scope = {name: float(text) * inch_per(SYMBOLS[name].unit) for name, text in zip(line.body.names, shown.inputs_printed)}
            again = eval(line.body.code, dict(_NAMESPACE) | scope) / inch_per(SYMBOLS[line.symbol].unit)
            half = 0.5 * 10.0 ** -len(shown.result_printed.partition(".")[2])

            assert abs(again - float(shown.result_printed)) <= half * (1 + 1e-5), (shown.latex, again)

    @each_formula
    def test_si_lines_hold_no_inch_and_say_their_units(self, made):
        for line in printed_lines(made, 2):
            shown = line.rendered("SI")

            assert not re.search(r"\\text\{(in|kip|ksi)", shown.latex) and not re.search(r"\b(inches|kips?|ksi)\b", shown.reading.replace(
                SYMBOLS[line.symbol].meaning, ""))
            assert bool(SYMBOLS[line.symbol].unit) == (r"\text{" in shown.result)

    @each_formula
    def test_dual_is_the_us_line_with_the_result_in_si(self, made):
        for line in printed_lines(made, 4):
            us, dual = line.rendered(), line.rendered("dual")

            assert (dual.symbolic, dual.numeric, dual.inputs_printed) == (us.symbolic, us.numeric, us.inputs_printed)
            assert dual.result_printed == us.result_printed
            if SYMBOLS[line.symbol].unit not in PRINTED:
                assert dual == us
                continue
            bracket = re.fullmatch(re.escape(us.result) + r"\\;\\left\(([-\d.]+)\\,.*\\right\)", dual.result)
            assert float(bracket[1]) * inch_per(SYMBOLS[line.symbol].unit) == pytest.approx(line.result, rel=6e-4, abs=6e-6)

    def test_a_line_known_by_hand(self):
        """50 ksi on 3.75 in²: 187.5 kip, times 4.4482216 is 834.04 kN; 50 ksi is 344.74 MPa, 3.75 in² is 2419.35 mm²."""
        line = EVERY["gageline.provisions.tension.gross_yielding"].lines(50.0, 3.75)[-1]

        assert line.rendered("SI").result == r"834.0\,\text{kN}"
        assert line.rendered("dual").result == r"187.5\,\text{kip}\;\left(834.0\,\text{kN}\right)"
        assert line.rendered("SI").numeric.startswith(r"344.7") and r"\text{mm}^{2}" in line.rendered("SI").numeric


def body_of(made):
    """Return the assignments of a formula's source."""
    tree = ast.parse(inspect.getsource(inspect.unwrap(made) if not hasattr(made, "__wrapped__") else made.__wrapped__)).body[0]
    return [node for node in tree.body if isinstance(node, ast.Assign)]


class TestCall:
    yielding = EVERY["gageline.provisions.tension.gross_yielding"]

    def test_quantities_come_out_in_the_display_unit(self):
        found = self.yielding(units.quantity(345.0, "ksi").to("MPa") / 6.894757293168361, units.quantity(10.0, "in²"))

        assert f"{found.units:~P}" == "kip"
        assert_quantity(self.yielding(units.quantity(50.0, "ksi"), units.quantity(10.0, "in²")), "500 kip")

    def test_swapped_arguments_are_refused_by_name(self):
        with pytest.raises(FormulaError, match=r"gross_yielding: F_y must be in units like ksi, got .*in²"):
            self.yielding(units.quantity(10.0, "in²"), units.quantity(50.0, "ksi"))

    def test_a_number_without_its_unit_is_refused_by_name(self):
        with pytest.raises(FormulaError, match="gross_yielding: A_g must be in units like in²"):
            self.yielding(units.quantity(50.0, "ksi"), 10.0)

    def test_a_missing_argument_is_refused_with_the_names(self):
        with pytest.raises(FormulaError, match="F_y, A_g"):
            self.yielding(units.quantity(50.0, "ksi"))

    def test_a_ratio_takes_a_plain_number(self):
        made = EVERY["gageline.provisions.tension.effective_net_area"]

        assert_quantity(made(units.quantity(5.0, "in²"), 0.9), "4.5 in²")


# What a body may not hold. Each function is read from this file's source, as a module's formulas are at import.

def branch(F_y, A_g):
    if F_y:
        P_n = F_y * A_g
    return P_n


def loop(F_y, A_g):
    for P_n in (F_y, A_g):
        pass
    return P_n


def guard(F_y, A_g):
    assert F_y > 0
    P_n = F_y * A_g
    return P_n


def keyword(F_y, A_g):
    P_n = max(F_y, A_g, key=None)
    return P_n


def continued(F_y, A_g):
    P_n = (F_y *
           A_g)
    return P_n


def assigned_twice(F_y, A_g):
    P_n = F_y * A_g
    P_n = P_n * A_g
    return P_n


def argument_overwritten(F_y, A_g):
    F_y = F_y * A_g
    return F_y


def unknown_symbol(F_y, A_g):
    foo = F_y * A_g
    return foo


def unknown_argument(bar, A_g):
    P_n = bar * A_g
    return P_n


def unknown_name(F_y, A_g):
    P_n = F_u * A_g
    return P_n


def unknown_call(F_y, A_g):
    P_n = round(F_y * A_g)
    return P_n


def method_call(F_y, A_g):
    P_n = F_y.sum() * A_g
    return P_n


def no_return(F_y, A_g):
    P_n = F_y * A_g


def returns_expression(F_y, A_g):
    return F_y * A_g


def returns_unknown(F_y, A_g):
    P_n = F_y * A_g
    return R_n


def default(F_y, A_g=1.0):
    P_n = F_y * A_g
    return P_n


def star(*F_y):
    P_n = F_y * 2
    return P_n


def two_targets(F_y, A_g):
    P_n = R_n = F_y * A_g
    return P_n


def augmented(F_y, A_g):
    P_n = F_y * A_g
    P_n += A_g
    return P_n


def conditional(F_y, A_g):
    P_n = F_y if F_y else A_g
    return P_n


def comparison(F_y, A_g):
    P_n = F_y * (A_g > 1)
    return P_n


def indexed(F_y, A_g):
    P_n = F_y[0] * A_g
    return P_n


def listed(F_y, A_g):
    P_n = [F_y, A_g]
    return P_n


def lambda_in(F_y, A_g):
    P_n = (lambda: F_y)() * A_g
    return P_n


def walrus(F_y, A_g):
    P_n = (R_n := F_y) * A_g
    return P_n


REFUSED = {branch: "if F_y", loop: "for P_n", guard: "assert F_y", keyword: "key=None", continued: "F_y * A_g",
           assigned_twice: "P_n is assigned twice", argument_overwritten: "F_y is assigned twice", unknown_symbol: "foo",
           unknown_argument: "bar", unknown_name: "F_u is used before it is known", unknown_call: "round", method_call: "F_y.sum()",
           no_return: "must end with return", returns_expression: "must end with return", returns_unknown: "return R_n",
           default: "A_g=1.0", star: "F_y", two_targets: "P_n = R_n", augmented: "P_n += A_g", conditional: "IfExp",
           comparison: "Compare", indexed: "F_y[0]", listed: "List", lambda_in: "lambda", walrus: "NamedExpr"}


class TestRefusedAtImport:
    @pytest.mark.parametrize("function", REFUSED, ids=lambda function: function.__name__)
    def test_a_bad_body_is_refused_with_its_line_named(self, function):
        with pytest.raises(FormulaError) as refused:
            formula("none")(function)

        message = str(refused.value)
        assert function.__name__ in message
        assert REFUSED[function] in message
        assert re.search(r"line \d+", message)

    def test_nothing_refused_is_registered(self):
        assert not any(name.endswith(tuple("." + function.__name__ for function in REFUSED)) for name in EVERY)

    def test_a_formula_cannot_reach_builtins(self):
        assert _NAMESPACE["__builtins__"] == {}
        assert math.pi == _NAMESPACE["pi"]
