"""The last look before printing: tell-tales of a broken line, words too long for a line, fonts that are not there."""

import re

from ..errors import ReportError

FONTS = ("Libertinus Serif", "New Computer Modern", "New Computer Modern Math", "DejaVu Sans Mono")
_GENERIC = ("serif", "sans-serif", "monospace", "inherit")

_LONGEST_WORD = 70  # printed characters that surely fit a line of text
_VALUE_TALES = re.compile(
    r"(?<![\w.'])[-+]?(?:nan|inf|NaN)(?![\w.'])|\b\w+_per_\w+|(?<=\S) \*\* (?=\S)|\bdimensionless\b"
    r"|^(?:True|False|None)$"
)
_MATHS_TALES = re.compile(
    r"(?<![A-Za-z])(?:nan|n a n|inf|i n f|True|T r u e|False|F a l s e|dimensionless)(?![A-Za-z])"
    r"|_per_|\*\*|\\\\?[A-Za-z]{2,}"
)
_FAMILY = re.compile(r"font(?:-family)?\s*[:=]\s*(\"[^\"]*\"|[^;\">]*)")


def value(text, where):
    """Stop if a printed value carries the mark of a computation that went wrong."""
    found = _VALUE_TALES.search(text.strip())
    if found:
        raise ReportError(
            f"A printed value in {where} holds {found.group().strip()!r}: {text.strip()!r}; correct the calc."
        )


def maths(typst, latex, where):
    """Stop if converted maths carries the mark of a conversion or a computation that went wrong."""
    found = _MATHS_TALES.search(typst)
    if found:
        raise ReportError(f"The maths {latex!r} in {where} would print {found.group()!r}; correct the calc.")


def words(text, where):
    """Stop at a word that no line can hold."""
    for word in text.split():
        if len(word) > _LONGEST_WORD:
            raise ReportError(f"A word of {len(word)} characters in {where} fits no line: {word[:40]}…; break it up.")


def svg(text, where):
    """Stop if a picture asks for a font that the sheet does not carry: it would be set in another without a word."""
    for found in _FAMILY.finditer(text):
        families = re.findall(r"'([^']+)'", found.group(1)) or [found.group(1).strip("\"' ")]
        names = [name.strip() for family in families for name in family.split(",")]
        if not any(name in FONTS or name in _GENERIC for name in names) and not re.match(r"^[\d.]+(px|pt)?$", names[0]):
            raise ReportError(
                f"The picture in {where} asks for the font {names[0]!r}; a sheet carries {', '.join(FONTS)}."
            )
