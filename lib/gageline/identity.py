"""What made a report: versions of the program and of what it stands on, hashes of its code and tables."""

import functools
import hashlib
import importlib.metadata
import platform
from pathlib import Path

from . import __version__
from .sheet.assets import templates_root

_STANDS_ON = ("handcalcs", "pint", "numpy", "matplotlib", "nbconvert", "pypandoc_binary", "typst")


_TRAVELLERS = ("_templates", "_demo", "_published")
"""What travels in a wheel inside the package and lies beside it in a checkout: no part of the program's own hash."""


@functools.cache
def program_hash():
    """Return the SHA-256 over the package's code and tables, names included."""
    return _hash(Path(__file__).parent, ("*.py", "*.csv", "*.toml"))


def _hash(root, patterns):
    digest = hashlib.sha256()
    for path in sorted(path for pattern in patterns for path in root.rglob(pattern)):
        if path.relative_to(root).parts[0] in _TRAVELLERS:
            continue
        digest.update(path.relative_to(root).as_posix().encode() + b"\0" + path.read_bytes() + b"\0")
    return digest.hexdigest()


def file_hash(path):
    """Return the SHA-256 of a file."""
    return hashlib.sha256(Path(path).read_bytes()).hexdigest()


def published_cases():
    """Return the paths of the published cases (TOML): in a wheel inside the package, in a checkout beside the tests; [] in neither."""
    package = Path(__file__).resolve().parent
    for root in (package / "_published", package.parents[1] / "tests" / "published" / "cases"):
        if found := sorted(root.glob("*.toml")):
            return found
    return []


@functools.cache
def verification_id():
    """Return the number of the verification manual that this program and these cases give; empty without cases."""
    paths = published_cases()
    digest = hashlib.sha256(program_hash().encode() + b"".join(path.read_bytes() for path in paths))
    return f"V-{digest.hexdigest()[:12]}" if paths else ""


def rows(family):
    """Return the (key, value) rows of a report's program identification."""
    versions = []
    for name in _STANDS_ON:
        try:
            versions.append(f"{name} {importlib.metadata.version(name)}")
        except importlib.metadata.PackageNotFoundError:
            versions.append(f"{name} not installed")
    root = templates_root()
    program = f"gageline {__version__} on Python {platform.python_version()}, {platform.system()} {platform.machine()}"
    return [("Program", f"{program}; modulus of elasticity of steel 29 000 ksi"), ("Code and tables, SHA-256", program_hash()),
            ("Verification manual", verification_id() or "published cases are not installed"),
            (f"Template {family}.ipynb, SHA-256", file_hash(root / f"{family}.ipynb")),
            ("Sheet, SHA-256", file_hash(root / "sheet" / "sheet.typ")),
            ("Stands on", ", ".join(versions))]
