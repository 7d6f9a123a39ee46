"""A computed line as a reviewer reads it: symbol = expression, = numbers with units, = result; and the same as a sentence.

The LaTeX comes from handcalcs, which sees each name as a slot: a line is parsed once per process and filled for every printing,
by symbols for the first row and by numbers for the second. How many digits are printed is decided here: enough that the printed
numbers recompute to the printed result within half its last digit.
"""

import ast
import functools
import re
from dataclasses import dataclass

from . import units
from .formula import _NAMESPACE
from .symbols import SYMBOLS

_SLOT = 0xAC00  # Hangul syllables: one character each, in no LaTeX command, so slots survive handcalcs' rewriting
_RESULT_DIGITS = 4
_MOST_DIGITS = 9

_SPOKEN_UNIT = {"in": "inches", "in²": "square inches", "in³": "cubic inches", "kip": "kips", "ksi": "ksi", "kip/in": "kips per inch",
                "kip·in": "kip inches", "1/in": "per inch", "rad": "radians", "": "",
                "mm": "millimetres", "mm²": "square millimetres", "mm³": "cubic millimetres", "kN": "kilonewtons", "MPa": "megapascals",
                "kN/mm": "kilonewtons per millimetre", "kN·m": "kilonewton metres", "1/mm": "per millimetre"}
_LATEX_UNIT = {"in": r"\text{in}", "in²": r"\text{in}^{2}", "in³": r"\text{in}^{3}", "kip": r"\text{kip}", "ksi": r"\text{ksi}",
               "kip/in": r"\text{kip/in}", "kip·in": r"\text{kip·in}", "1/in": r"\text{in}^{-1}", "rad": r"\text{rad}", "": "",
               "mm": r"\text{mm}", "mm²": r"\text{mm}^{2}", "mm³": r"\text{mm}^{3}", "kN": r"\text{kN}", "MPa": r"\text{MPa}",
               "kN/mm": r"\text{kN/mm}", "kN·m": r"\text{kN·m}", "1/mm": r"\text{mm}^{-1}"}


@dataclass(frozen=True)
class Rendered:
    """One printed line: LaTeX of the sign, the expression with symbols, with numbers, and the result; a reading; the printed numbers."""

    sign: str
    symbolic: str
    numeric: str
    result: str
    reading: str
    inputs_printed: tuple
    result_printed: str

    @property
    def latex(self):
        """The line as one aligned LaTeX environment, for the notebook."""
        rows = [row for row in (self.symbolic, self.numeric, self.result) if row]
        return r"\begin{aligned}" + self.sign + " &= " + r" \\ &= ".join(rows) + r"\end{aligned}"


class _Slot:
    """A value that prints itself as one character, whatever handcalcs asks of it."""

    def __init__(self, number):
        self.sign = chr(_SLOT + number)

    def _repr_latex_(self):
        return self.sign

    __str__ = __repr__ = _repr_latex_


@functools.lru_cache(maxsize=1024)
def _template(line):
    """Return the LaTeX of a body line's expression with one slot character per name."""
    from handcalcs.handcalcs import LatexRenderer

    # Neutral names, so that no part of one is taken for Greek, a subscript or a function.
    neutral = {name: f"Z{chr(97 + i)}" for i, name in enumerate(line.names)}
    source = re.sub(r"[A-Za-z_]\w*", lambda match: neutral.get(match[0], match[0]), line.source)
    values = {new: _Slot(i) for i, new in enumerate(neutral.values())}
    # A trailing sum keeps handcalcs from taking a constant, a name or a bracketed product for a parameter without expression.
    values |= {"Zz": _Slot(99), "Zy": _Slot(98), "pi": _Slot(97)}
    text = LatexRenderer(f"Zy = {source} + Zz", values, {"override": "", "precision": "", "sci_not": ""}).render()
    end = f"+ {chr(_SLOT + 99)}"
    body = text[: text.rindex(end)]
    body = body[body.rindex("=") + 1 :] if "&=" not in body else re.split(r"(?<![<>\\])=", body)[-1]
    return _tidy(body)


def _tidy(body):
    slot = f"[{chr(_SLOT)}-{chr(_SLOT + 99)}]"
    body = body.strip().lstrip("=").strip().replace(chr(_SLOT + 97), r"\pi")
    body = re.sub(r"\\operatorname\{(min|max)\}", r"\\\1", body).replace(r",\ ", ",")
    body = re.sub(rf"\\left\( (\\pi|[\d.]+|{slot}) \\right\) \^\{{", r"\1^{", body)
    body = re.sub(r"\^\{ \\left\( \\frac\{([^{}]*)\}\{([^{}]*)\} \\right\) \}", r"^{\1/\2}", body)  # a fraction in an exponent is too small to read
    body = re.sub(r"\^\{ \\left\( - (\d+) \\right\) \}", r"^{-\1}", body)
    return re.sub(r"\s+", " ", body)


def _fill(template, texts, joint, bases=None):
    out = template.replace(r"\cdot", joint) if joint != r"\cdot" else template
    for i, text in enumerate(texts):
        out = out.replace(f"{chr(_SLOT + i)}^", f"{(bases or texts)[i]}^")
        out = out.replace(chr(_SLOT + i), text)
    return out


def value_latex(text, unit, base=False):
    """Return a printed number with its unit as LaTeX; as the base of a power it is bracketed."""
    latex = text if not unit else rf"{text}\,{_LATEX_UNIT[unit]}"
    return rf"\left({latex}\right)" if base and unit else latex


def _numbers(line, system):
    """Return printed inputs and result; digits are added to the inputs until they recompute to the printed result.

    Printed numbers go back to inch and kip by the exact factors, so the printed units are accounted for (MPa times mm² is N).
    """
    wanted = SYMBOLS[line.symbol]
    factor, places = _scale(wanted, system)
    scales = [_scale(SYMBOLS[name], system) for name in line.body.names]
    result = float(line.result) * factor
    for figures in (_RESULT_DIGITS, 3):
        printed_result = units.printed(result, figures, places)
        half = 0.5 * 10.0 ** -len(printed_result.partition(".")[2]) * (1 + 1e-6)
        for digits in range(4, _MOST_DIGITS + 1):
            texts = tuple(units.printed(float(value) * by, digits, least) for value, (by, least) in zip(line.values, scales))
            back = {name: float(text) / by for name, text, (by, _) in zip(line.body.names, texts, scales)}
            again = eval(line.body.code, dict(_NAMESPACE, **back)) * factor
            if abs(again - float(printed_result)) <= half:
                return texts, printed_result
    return texts, units.printed(result, 3, places)


def _scale(symbol, system):
    """Return the factor to the unit printed, and the least decimals: a length in mm needs none."""
    unit, factor = units.shown_as(symbol.unit, system)
    return factor, 0 if unit == "mm" else symbol.places


def render_line(line, system="US"):
    """Return a formula's computed line rendered for print.

    Parameters
    ----------
    line : a ``formula.Line``.
    system : "US", "SI", or "dual": the US line, its result also in SI in brackets.
    """
    body, wanted = line.body, SYMBOLS[line.symbol]
    template = _template(body)
    texts, result = _numbers(line, system)
    shown = {name: units.shown_as(SYMBOLS[name].unit, system)[0] for name in body.names}
    unit = units.shown_as(wanted.unit, system)[0]
    symbolic = _fill(template, [SYMBOLS[name].latex for name in body.names], r"\,")
    filled = [value_latex(text, shown[name]) for text, name in zip(texts, body.names)]
    bracketed = [value_latex(text, shown[name], True) for text, name in zip(texts, body.names)]
    numeric = _fill(template, filled, r"\cdot", bracketed) if body.names else ""
    printed = value_latex(result, unit)
    spoken = f"{result} {_SPOKEN_UNIT[unit]}".strip()
    other, factor = units.shown_as(wanted.unit, "SI")
    if system == "dual" and other != unit:
        also = units.printed(float(line.result) * factor, _RESULT_DIGITS)
        printed += rf"\;\left({value_latex(also, other)}\right)"
        spoken += f", that is {also} {_SPOKEN_UNIT[other]}"
    if not body.names and not any(isinstance(n, ast.BinOp) for n in ast.walk(body.expression)):
        symbolic = ""
    if re.sub(r"\\,|\s", "", symbolic) == re.sub(r"\s", "", wanted.latex):
        symbolic = ""
    if isinstance(body.expression, ast.Name):
        numeric = ""
    said = {name: f"{text} {_SPOKEN_UNIT[shown[name]]}".strip() for text, name in zip(texts, body.names)}
    parts = [f"{wanted.spoken}, {wanted.meaning},"]
    if symbolic:
        parts.append(f"equals {_say(body.expression, {name: SYMBOLS[name].spoken for name in body.names})};")
    if numeric:
        parts.append(f"{'with numbers,' if symbolic else 'equals'} {_say(body.expression, said)};")
    parts.append(f"{'the result is' if symbolic or numeric else 'is'} {spoken}.")
    return Rendered(wanted.latex, symbolic, numeric, printed, " ".join(parts), texts, result)


def _say(node, names):
    """Read an expression aloud, so that it is understood without seeing it."""
    say = functools.partial(_say, names=names)
    match node:
        case ast.Expression():
            return say(node.body)
        case ast.Name():
            return names.get(node.id, node.id)
        case ast.Constant():
            return str(node.value)
        case ast.UnaryOp():
            return f"minus {say(node.operand)}"
        case ast.Call():
            parts = [say(part) for part in node.args]
            word = {"min": "the least of", "max": "the greatest of", "sqrt": "the square root of", "sin": "the sine of", "cos": "the cosine of",
                    "tan": "the tangent of", "acos": "the arc cosine of"}[node.func.id]
            return f"{word} {parts[0]}" if len(parts) == 1 else f"{word} {', '.join(parts[:-1])} and {parts[-1]}"
        case ast.BinOp(op=ast.Pow(), right=ast.Constant(value=2)):
            return f"{_grouped(node.left, names)} squared"
    words = {ast.Add: "plus", ast.Sub: "minus", ast.Mult: "times", ast.Div: "divided by", ast.Pow: "to the power of"}
    flat = isinstance(node.op, (ast.Add, ast.Sub))
    left = say(node.left) if flat else _grouped(node.left, names, also=(ast.Mult, ast.Div) if isinstance(node.op, ast.Pow) else ())
    right = _grouped(node.right, names, also=(ast.Mult, ast.Div) if isinstance(node.op, (ast.Div, ast.Pow)) else ())
    return f"{left} {words[type(node.op)]} {right}"


def _grouped(node, names, also=()):
    said = _say(node, names)
    grouped = isinstance(node, ast.BinOp) and isinstance(node.op, (ast.Add, ast.Sub, *also))
    return f"the quantity {said}, end quantity," if grouped else said
