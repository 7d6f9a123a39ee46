"""A provision's equation, written once as a Python function and used three ways.

``f.bare(...)`` computes plain floats or numpy arrays, ``f(...)`` pint quantities with dimensions checked, and ``f.lines(...)``
gives the printed lines. A body holds only ``symbol = expression`` lines and ``return symbol``, and is refused at import
otherwise: a report printed from it cannot say anything that the program does not compute.
"""

import ast
import functools
import inspect
import math
import textwrap
from dataclasses import dataclass

from . import units
from .errors import FormulaError
from .symbols import SYMBOLS

FORMULAS = {}
"""Every formula of the package by qualified name, in order of definition; contract tests run over it."""

EDITIONS = ("360-22", "360-16")
_CALLS = ("min", "max", "sqrt", "sin", "cos", "tan", "acos")
_NODES = (ast.Expression, ast.BinOp, ast.UnaryOp, ast.Name, ast.Constant, ast.Call, ast.Load, ast.Add, ast.Sub, ast.Mult, ast.Div,
          ast.Pow, ast.USub)


def _array(values):
    return any(getattr(value, "shape", ()) for value in values)


def _least(*values):
    if _array(values):
        import numpy

        return functools.reduce(numpy.minimum, values)
    return min(values)


def _greatest(*values):
    if _array(values):
        import numpy

        return functools.reduce(numpy.maximum, values)
    return max(values)


def _root(value):
    return value**0.5


def _sine(value):
    if _array((value,)):
        import numpy

        return numpy.sin(value)
    return math.sin(value)


def _cosine(value):
    if _array((value,)):
        import numpy

        return numpy.cos(value)
    return math.cos(value)


def _tangent(value):
    if _array((value,)):
        import numpy

        return numpy.tan(value)
    return math.tan(value)


def _arc_cosine(value):
    if _array((value,)):
        import numpy

        return numpy.arccos(value)
    return math.acos(value)


_NAMESPACE = {"min": _least, "max": _greatest, "sqrt": _root, "sin": _sine, "cos": _cosine, "tan": _tangent, "acos": _arc_cosine,
              "pi": math.pi, "__builtins__": {}}


@dataclass(frozen=True)
class BodyLine:
    """One ``symbol = expression`` line: its target, the expression as written and parsed, and the names it uses, in order of appearance."""

    symbol: str
    source: str
    expression: ast.expr
    names: tuple
    code: object


@dataclass(frozen=True)
class Line:
    """One computed line of a report: the symbol, the values that entered and the value that came out, as they were at that line."""

    body: BodyLine
    values: tuple
    result: float
    clause: str

    @property
    def symbol(self):
        """Name of the quantity computed."""
        return self.body.symbol

    def rendered(self, system="US"):
        """Return the line as printed in a system of units: LaTeX rows, plain-text reading, printed numbers (see ``render.Rendered``)."""
        from .render import render_line

        return render_line(self, system)


class Formula:
    """A function whose body is the printed equations; made by the ``formula`` decorator."""

    def __init__(self, function, clause):
        functools.update_wrapper(self, function)
        self.clause = dict.fromkeys(EDITIONS, clause) if isinstance(clause, str) else dict(clause)
        self._source = textwrap.dedent(inspect.getsource(function))
        self._first_line = function.__code__.co_firstlineno
        tree = ast.parse(self._source).body[0]
        self._def_line = tree.lineno
        self.arguments = tuple(argument.arg for argument in tree.args.args)
        self.where = f"{function.__module__}.{function.__name__}"
        self.body = tuple(self._read(tree))
        self._check_names(tree)
        self._bare = self._compile(tree)

    def _refuse(self, node, why):
        # ast.arguments has no line of its own; it stands on the function's.
        line = self._first_line + getattr(node, "lineno", self._def_line) - 1
        raise FormulaError(f"{self.where}, line {line}: {why}: {ast.unparse(node)}")

    def _read(self, tree):
        if tree.args.vararg or tree.args.kwarg or tree.args.kwonlyargs or tree.args.defaults:
            self._refuse(tree.args, "a formula takes plain positional arguments only")
        statements = tree.body[1:] if ast.get_docstring(tree) is not None else tree.body
        if not statements or not isinstance(statements[-1], ast.Return) or not isinstance(statements[-1].value, ast.Name):
            self._refuse(tree, "the body must end with return and one symbol")
        known = set(self.arguments)
        for node in statements[:-1]:
            if not (isinstance(node, ast.Assign) and len(node.targets) == 1 and isinstance(node.targets[0], ast.Name)):
                self._refuse(node, "only lines of the form symbol = expression are allowed")
            if node.lineno != node.end_lineno:
                self._refuse(node, "an expression stands on one line")
            for part in ast.walk(node.value):
                if not isinstance(part, _NODES):
                    self._refuse(node, f"{type(part).__name__} is not allowed in a formula")
                if isinstance(part, ast.Call) and (part.keywords or ast.unparse(part.func) not in _CALLS):
                    self._refuse(node, f"only {', '.join(_CALLS)} with positional arguments may be called")
            names = tuple(dict.fromkeys(n.id for n in ast.walk(node.value) if isinstance(n, ast.Name) and n.id not in (*_CALLS, "pi")))
            symbol = node.targets[0].id
            if symbol in known:
                self._refuse(node, f"{symbol} is assigned twice")
            if unknown := [name for name in names if name not in known]:
                self._refuse(node, f"{', '.join(unknown)} is used before it is known")
            known.add(symbol)
            code = compile(ast.fix_missing_locations(ast.Expression(node.value)), self.where, "eval")
            yield BodyLine(symbol, ast.get_source_segment(self._source, node.value), node.value, names, code)
        if statements[-1].value.id not in known:
            self._refuse(statements[-1], "the returned symbol is not computed")
        self.result = statements[-1].value.id

    def _check_names(self, tree):
        for name in (*self.arguments, *(line.symbol for line in self.body)):
            if name not in SYMBOLS:
                self._refuse(tree.args, f"{name} is not in the symbol table (symbols.py)")

    def _compile(self, tree):
        plain = ast.FunctionDef(name=tree.name, args=tree.args, body=tree.body, decorator_list=[], type_params=[])
        module = ast.fix_missing_locations(ast.Module([plain], type_ignores=[]))
        scope = dict(_NAMESPACE)
        exec(compile(module, self.where, "exec"), scope)
        return scope[tree.name]

    def bare(self, *values):
        """Compute with plain floats or numpy arrays in the symbols' display units (kip, in., ksi)."""
        return self._bare(*values)

    def __call__(self, *quantities):
        """Compute with pint quantities; dimensions are checked and each line comes out in its symbol's display unit.

        Raises
        ------
        FormulaError
            An argument without its unit, or of another dimension.
        """
        import pint

        if len(quantities) != len(self.arguments):
            raise FormulaError(f"{self.__name__}: takes {', '.join(self.arguments)}")
        scope = dict(_NAMESPACE, sin=lambda angle: math.sin(angle.to("radian").magnitude),
                     cos=lambda angle: math.cos(angle.to("radian").magnitude),
                     tan=lambda angle: math.tan(angle.to("radian").magnitude),
                     acos=lambda ratio: units.quantity(math.acos(ratio.to("").magnitude), "rad"))
        for name, given in zip(self.arguments, quantities):
            unit = SYMBOLS[name].unit
            given = given if isinstance(given, pint.Quantity) else units.quantity(given, "")
            try:
                scope[name] = given.to(units.DISPLAY[unit])
            except pint.DimensionalityError:
                raise FormulaError(f"{self.__name__}: {name} must be in units like {unit or 'a plain number'}, got {given:~P}") from None
        for line in self.body:
            value = eval(line.code, scope)
            value = value if isinstance(value, pint.Quantity) else units.quantity(value, "")
            scope[line.symbol] = value.to(units.DISPLAY[SYMBOLS[line.symbol].unit])
        return scope[self.result]

    def lines(self, *values, edition="360-22"):
        """Return the printed lines for given values (floats in display units, or pint quantities)."""
        scope = dict(_NAMESPACE)
        for name, value in zip(self.arguments, values, strict=True):
            unit = SYMBOLS[name].unit
            scope[name] = value.to(units.DISPLAY[unit]).magnitude if hasattr(value, "magnitude") else value
        out = []
        for line in self.body:
            scope[line.symbol] = eval(line.code, scope)
            out.append(Line(line, tuple(scope[name] for name in line.names), scope[line.symbol], self.clause[edition]))
        return tuple(out)


def formula(clause):
    """Make a formula of a function; clause is the printed clause, one text or a mapping from edition to text."""

    def wrap(function):
        made = Formula(function, clause)
        FORMULAS[made.where] = made
        return made

    return wrap
