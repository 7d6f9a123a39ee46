"""LaTeX maths to Typst maths: tidied, refused where it would misprint, cut where a row may break, converted at once."""

import re

from ..errors import ReportError
from . import pandoc

_FORBIDDEN = re.compile(
    r"\\(tag|color|textcolor|colorbox|boxed|label|ref|href|url|input|include|hspace|vspace|def|newcommand)(?![A-Za-z])"
    r"|\\\\\s*\[|\\verb"
)
_COMMENT = re.compile(r"(?<!\\)%.*")
_ROMAN = re.compile(r"\\mathrm\s*\{([A-Za-z .·/-]+)\}")
_GROUPED_NUMBER = re.compile(r"\d+(?:\{,\}\d{3})+(?:\.\d+)?")
_WORDLESS = re.compile(r"\\[A-Za-z]+|[{}\\_^\s]")
_TYPST_STRING = re.compile(r'"(?:[^"\\]|\\.)*"')

SHORT_ROW = 45  # printed characters below which a row is never in want of a break
LONG_TERM = 60  # printed characters above which even a product may be broken

_cache = {}
_CACHE_LIMIT = 20_000
_NUMBER = re.compile(r"\d+\.\d+|\d{2,}")  # of one digit it may be an exponent or a factor: part of the shape
_STAND_IN = 90_710_000


def tidied(latex):
    """Return LaTeX without what pandoc drops or misprints; refuse what cannot be mended.

    Parameters
    ----------
    latex : text of one piece of maths, no delimiters.

    Raises
    ------
    ReportError : a construct whose meaning would be lost on the way to the sheet.
    """
    found = _FORBIDDEN.search(latex)
    if found:
        raise ReportError(f"The maths {latex!r} uses {found.group()}, which a sheet cannot print; write it without.")
    text = _COMMENT.sub("", latex)
    text = _ROMAN.sub(r"\\text{\1}", text)
    text = _GROUPED_NUMBER.sub(lambda m: rf"\text{{{m.group().replace('{,}', ',')}}}", text)
    text = text.replace(r"\;", r"\,").replace(r"\displaystyle", "").replace(r"\dfrac", r"\frac")
    return re.sub(r"\s+", " ", text).strip()


def row_of(latex):
    """Return what stands right of the equals sign, without a sign and without alignment marks of its own."""
    text = tidied(latex).lstrip("&= ").strip()
    if r"\begin" not in text and re.search(r"(?<!\\)&|\\\\", text):
        raise ReportError(f"The equation row {latex!r} holds an alignment or a line break; give it as rows of its own.")
    return text


def cuts(latex):
    """Cut a long row where it may break over two lines.

    Parameters
    ----------
    latex : tidied LaTeX of one row.

    Returns
    -------
    parts : list of lists of LaTeX; the outer list breaks after the commas of a least or greatest, the inner one before
        plus, minus or, in a long product, before the dot. Empty where the row is short or cannot be cut.
    """
    if len(_WORDLESS.sub("", latex)) <= SHORT_ROW or r"\begin" in latex:
        return []
    opened = _open_function(latex)
    if opened is None:
        terms = _terms(latex)
        return [terms] if len(terms) > 1 else []
    head, inside, tail = opened
    arguments = [
        part.strip() for part in _split(inside, lambda t, i: t[i] == "," and t[i - 1 : i] != "\\", keep="left")
    ]
    arguments[0] = rf"{head} ( {arguments[0]}"
    arguments[-1] = f"{arguments[-1]} ) {tail}".strip()
    return [_terms(argument, depth=1 if not i else 0) for i, argument in enumerate(arguments)]


def _open_function(latex):
    found = re.match(r"^(.{0,24}?\\(?:min|max|operatorname\{(?:min|max)\}))\s*(?:\\left)?\s*\(", latex)
    if not found:
        return None
    depth = 1
    for i in range(found.end(), len(latex)):
        depth += {"(": 1, ")": -1}.get(latex[i], 0)
        if depth == 0:
            inside = latex[found.end() : i]
            return found.group(1), re.sub(r"\\right\s*$", "", inside), latex[i + 1 :].strip()
    return None


def _split(text, is_cut, keep, base=0):
    parts, start, depth = [], 0, -base
    for i, sign in enumerate(text):
        depth += (sign in "({[") - (sign in ")}]")
        if depth <= 0 and is_cut(text, i):
            cut = i + 1 if keep == "left" else i
            if text[start:cut].strip():
                parts.append(text[start:cut])
                start = cut
    return [*parts, text[start:]]


def _terms(text, depth=0):
    def sum_sign(t, i):
        before = t[:i].rstrip()
        return t[i] in "+-" and bool(before) and before[-1] not in "(=,{+-" and not before.endswith(r"\cdot")

    def dot(t, i):
        return t.startswith((r"\cdot", r"\times"), i)

    terms = []
    for term in _split(text, sum_sign, "right", depth):
        long = len(_WORDLESS.sub("", term)) > LONG_TERM
        terms += _split(term, dot, "right", depth if not terms else 0) if long else [term]
    return [term.strip() for term in terms]


def converted(formulas):
    """Convert LaTeX maths to Typst maths, all in one call of pandoc.

    Parameters
    ----------
    formulas : iterable of tidied LaTeX.

    Returns
    -------
    typst : dict from LaTeX to Typst maths.

    Raises
    ------
    ReportError : pandoc, which is told to take no warning, could not read a formula; the message holds it.
    """
    shapes = {latex: _shape(latex) for latex in formulas}
    missing = list(dict.fromkeys(shape for shape, _ in shapes.values() if shape not in _cache))
    if missing:
        done, complaint = _convert(missing)
        if complaint:
            raise ReportError(_unreadable(list(shapes), complaint))
        if len(_cache) + len(missing) > _CACHE_LIMIT:
            _cache.clear()
            return converted(formulas)
        _cache.update(zip(missing, done))
    return {latex: _with_numbers(_cache[shape], numbers) for latex, (shape, numbers) in shapes.items()}


def _shape(latex):
    """Return maths with its numbers exchanged for stand-ins, and the numbers: marks of a schedule differ in numbers alone."""
    numbers = []

    def stand_in(match):
        numbers.append(match[0])
        return f"{_STAND_IN + len(numbers)}{'.5' if '.' in match[0] else ''}"

    return (latex, ()) if str(_STAND_IN)[:4] in latex else (_NUMBER.sub(stand_in, latex), tuple(numbers))


def _with_numbers(typst, numbers):
    for i, number in enumerate(numbers, start=1):
        stand_in = f"{_STAND_IN + i}{'.5' if '.' in number else ''}"
        if typst.count(stand_in) != 1:
            raise ReportError(f"The number {number} of a formula would be lost on the way to the sheet; write the formula more simply.")
        typst = typst.replace(stand_in, number)
    return typst


def _convert(formulas):
    blocks = []
    for latex in formulas:
        blocks.append({"t": "RawBlock", "c": ["typst", "@@gageline@@"]})
        blocks.append({"t": "Para", "c": [{"t": "Math", "c": [{"t": "InlineMath"}, latex]}]})
    out, complaint = pandoc.run(pandoc.document(blocks), "json", "typst")
    if complaint:
        return [], complaint
    pieces = [piece.strip() for piece in out.split("@@gageline@@")[1:]]
    return [_unwrapped(piece, latex) for piece, latex in zip(pieces, formulas, strict=True)], ""


def _unwrapped(piece, latex):
    if not (piece.startswith("$") and piece.endswith("$") and len(piece) > 2):
        raise ReportError(f"The maths {latex!r} did not convert to a formula.")
    text = piece[1:-1]
    code = _TYPST_STRING.sub("", text).replace(r"\#", "").replace("#scale(x:", "")
    if "#" in code:
        raise ReportError(f"The maths {latex!r} uses a construct that a sheet cannot print; write it more simply.")
    return text


def _unreadable(formulas, complaint):
    for latex in formulas:
        _, own = _convert([latex])
        if own:
            reason = re.search(r"unexpected [^\n]+", own)
            return f"The maths {latex!r} cannot be read{': ' + reason.group() if reason else ''}."
    return f"The maths of this calc cannot be converted: {complaint.splitlines()[0]}"


_WORDS = {
    r"\leq": "is at most", r"\le": "is at most", r"\geq": "is at least", r"\ge": "is at least", r"\cdot": "times",
    r"\times": "times", r"\neq": "is not", r"\approx": "about", r"\pm": "plus or minus", "=": "equals", "+": "plus",
    "<": "is less than", ">": "is more than", "/": "over",
}  # fmt: skip


def reading(latex):
    """Return a plain reading of short maths, for alt text where the author gave none."""
    text = tidied(latex)
    text = re.sub(r"\\(?:text|operatorname|mathbf|mathrm|boldsymbol)\s*\{([^{}]*)\}", r"\1", text)
    text = re.sub(r"\\(?:bar|overline)\s*\{([^{}]*)\}", r"\1 bar", text)
    for _ in range(4):
        text = re.sub(r"\\[dt]?frac\s*\{([^{}]*)\}\s*\{([^{}]*)\}", r"(\1 over \2)", text)
        text = re.sub(r"\\sqrt\s*\{([^{}]*)\}", r"the square root of (\1)", text)
        text = re.sub(r"\^\s*\{?\s*2\s*\}?", " squared", text)
        text = re.sub(r"\^\s*\{([^{}]*)\}|\^\s*(\w)", r" to the power \1\2", text)
        text = re.sub(r"_\s*\{([^{}]*)\}|_\s*(\w)", r" \1\2", text)
    for sign, word in sorted(_WORDS.items(), key=lambda pair: -len(pair[0])):
        ending = "(?![A-Za-z])" if sign.startswith("\\") else ""
        text = re.sub(re.escape(sign) + ending, f" {word} ", text)
    text = re.sub(r"\\(?:left|right|quad|qquad|begin\{\w+\}|end\{\w+\})|\\[,;:! \\]|[&{}]", " ", text)
    text = re.sub(r"\\([A-Za-z]+)", r" \1 ", text).replace("'", " prime")
    return re.sub(r"\s+", " ", text).strip() or "formula"
