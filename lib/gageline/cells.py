"""Inputs cells: plain assignments with the source of each input in the comment behind it."""

import ast
import io
import tokenize
from dataclasses import dataclass

from .errors import InputError, ReportError

TAG, INJECTED = "parameters", "injected-parameters"
OVERRIDE = "override at the run"


@dataclass(frozen=True)
class Given:
    """One input as given: its value and where it comes from (empty where nobody said)."""

    value: object
    source: str


def is_inputs_cell(source):
    """Whether a cell holds nothing but assignments to single names."""
    try:
        body = ast.parse(source).body
    except SyntaxError:
        return False
    return bool(body) and all(isinstance(node, ast.Assign) and len(node.targets) == 1 and isinstance(node.targets[0], ast.Name) for node in body)


def read_inputs(source):
    """Return name -> Given of an inputs cell.

    Raises
    ------
    InputError
        A line that is not ``name = value``, a value that is no plain text, number or list of them, or a name assigned twice.
    """
    try:
        tree = ast.parse(source)
    except SyntaxError as error:
        raise InputError(f"inputs cell, line {error.lineno}: not readable; each line is name = \"value with unit\"  # source") from None
    comments = {token.start[0]: token.string.lstrip("#").strip() for token in tokenize.generate_tokens(io.StringIO(source).readline)
                if token.type == tokenize.COMMENT}
    given = {}
    for node in tree.body:
        if not (isinstance(node, ast.Assign) and len(node.targets) == 1 and isinstance(node.targets[0], ast.Name)):
            raise InputError(f"inputs cell, line {node.lineno}: only lines of the form name = \"value with unit\" may stand there")
        name = node.targets[0].id
        if name in given:
            raise InputError(f"inputs cell, line {node.lineno}: {name} is given twice")
        try:
            value = ast.literal_eval(node.value)
        except (ValueError, TypeError):
            raise InputError(f"inputs cell, line {node.lineno}: {name} must be a plain text, number or list; "
                             "quantities are texts with a unit, for example \"31 kip\"") from None
        given[name] = Given(value, comments.get(node.end_lineno, ""))
    return given


def merged(base, injected):
    """Return the inputs with overrides of an injected cell on top, marked as such."""
    return base | {name: Given(each.value, OVERRIDE) for name, each in injected.items()}


def inputs_of_notebook(notebook):
    """Return name -> Given of a notebook file's tagged cells.

    Raises
    ------
    ReportError
        No cell, or more than one, is tagged ``parameters``.
    """
    tagged = {tag: [cell for cell in notebook["cells"] if tag in cell["metadata"].get("tags", ())] for tag in (TAG, INJECTED)}
    if len(tagged[TAG]) != 1:
        raise ReportError(f"the notebook has {len(tagged[TAG]) or 'no'} cell{'s' if len(tagged[TAG]) > 1 else ''} tagged {TAG}; "
                          "exactly one must hold the inputs")
    given = read_inputs(_text(tagged[TAG][0]))
    for cell in tagged[INJECTED]:
        given = merged(given, read_inputs(_text(cell)))
    return given


def inputs_of_session(executed):
    """Return name -> Given from the cells run so far in a kernel, oldest first.

    The latest inputs cell that names the mark counts; inputs cells run after it are overrides.

    Raises
    ------
    InputError
        No such cell was run.
    """
    candidates = [source for source in executed if is_inputs_cell(source)]
    bases = [i for i, source in enumerate(candidates) if "mark" in read_inputs(source)]
    if not bases:
        raise InputError("no inputs cell was run before this one; run the cell tagged parameters, which gives the mark")
    given = read_inputs(candidates[bases[-1]])
    for source in candidates[bases[-1] + 1:]:
        given = merged(given, read_inputs(source))
    return given


def inputs_of_namespace(names):
    """Return name -> Given from a session's variables, for a kernel that keeps no history; where they come from is not known then."""
    plain = (str, int, float, bool, list, tuple)
    return {name: Given(value, "") for name, value in names.items() if not name.startswith("_") and name not in ("In", "Out") and type(value) in plain}


def injected_cell(overrides):
    """Return the source of a cell that overrides inputs, as papermill writes it."""
    return "# Parameters\n" + "".join(f"{name} = {value!r}\n" for name, value in overrides.items())


def _text(cell):
    source = cell["source"]
    return source if isinstance(source, str) else "".join(source)
