"""Starting a calculation: a template copied into a project, and the demonstration project laid out in a folder."""

import json
import re
import shutil
from pathlib import Path

from . import families, identity, project
from .cells import TAG
from .errors import InputError
from .sheet.assets import templates_root

DEMO = "conveyor-gallery"


def start(mark, folder, family="bolted"):
    """Copy a family's template into a project's folder as ``<mark>.ipynb`` and return its path; an existing one is never touched.

    Raises
    ------
    InputError
        A mark that names no file, an unknown family, or a notebook that is there already.
    """
    families.family(family)
    if not re.fullmatch(r"[\w.-]+", mark) or mark.startswith("."):
        raise InputError(f"mark {mark!r} cannot name a file; use letters, digits, - and _")
    folder = Path(folder)
    path = folder / f"{mark}.ipynb"
    if path.exists():
        raise InputError(f"{path} is there already; it is not overwritten")
    template = templates_root() / f"{family}.ipynb"
    book = json.loads(template.read_text(encoding="utf-8"))
    cell = next(cell for cell in book["cells"] if TAG in cell["metadata"].get("tags", ()))
    source = cell["source"] if isinstance(cell["source"], str) else "".join(cell["source"])
    cell["source"] = re.sub(r'^mark = .*$', f'mark = "{mark}"', source, count=1, flags=re.MULTILINE)
    book["metadata"]["gageline"] = {"template": template.name, "template_sha256": identity.file_hash(template)}
    try:
        folder.mkdir(parents=True, exist_ok=True)
        if not any((up / project.FILE).is_file() for up in (folder, *folder.resolve().parents[:2])):
            project.write_new(folder, folder.resolve().name)
        with open(path, "x", encoding="utf-8") as file:
            file.write(json.dumps(book, indent=1, ensure_ascii=False) + "\n")
    except OSError as error:
        raise InputError(f"{path} cannot be written: {(error.strerror or str(error)).lower()}") from None
    return path


def demonstration(folder):
    """Return the notebooks of the demonstration project, laid out under ``folder`` where they are missing.

    Raises
    ------
    InputError
        The folder cannot be written to.
    """
    target = Path(folder) / "calcs" / DEMO
    source = templates_root().parent / "calcs" / DEMO
    if not source.is_dir():
        source = templates_root().parent / "_demo" / DEMO
    try:
        target.mkdir(parents=True, exist_ok=True)
        for path in source.iterdir():
            if path.suffix in (".ipynb", ".toml", ".csv") and not (target / path.name).exists():
                shutil.copyfile(path, target / path.name)
    except OSError as error:
        raise InputError(f"{target} cannot be written: {(error.strerror or str(error)).lower()}") from None
    return sorted(target.glob("*.ipynb"))
