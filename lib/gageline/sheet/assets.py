"""Where the files that travel with the package lie: in a checkout beside lib/, in a wheel inside the package."""

from pathlib import Path

from ..errors import ReportError


def templates_root():
    """Return the folder that holds the notebook templates and, in sheet/, the look of the sheet.

    Returns
    -------
    root : pathlib.Path of templates/ in a source checkout, of gageline/_templates in an installed wheel.

    Raises
    ------
    ReportError : neither folder is there, so the installation is incomplete.
    """
    package = Path(__file__).resolve().parents[1]
    for root in (package / "_templates", package.parents[1] / "templates"):
        if (root / "sheet" / "sheet.typ").is_file():
            return root
    raise ReportError(
        f"The look of the sheet is missing beside {package}: install gageline again, or work in a full checkout."
    )


def sheet_file(folder=None):
    """Return the sheet.typ to set with: the one in folder (a project's own look) or the one that ships.

    Parameters
    ----------
    folder : path of a folder holding sheet.typ, or None.

    Raises
    ------
    ReportError : folder holds no sheet.typ.
    """
    path = (Path(folder) if folder is not None else templates_root() / "sheet") / "sheet.typ"
    if not path.is_file():
        raise ReportError(f"The folder {path.parent} holds no sheet.typ; give a folder that does, or none.")
    return path
