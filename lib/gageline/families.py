"""The families of connection by name. A family ``x`` is the package ``connections.x`` with its class as ``CONNECTION``, and the
template ``x.ipynb``; adding one needs no entry anywhere else."""

import pkgutil
from importlib import import_module
from pathlib import Path

from .errors import InputError, nearest


def names():
    """Return the names of all families."""
    folder = Path(__file__).parent / "connections"
    return tuple(sorted(found.name for found in pkgutil.iter_modules([str(folder)]) if found.ispkg))


def family(name):
    """Return the connection class of a family.

    Raises
    ------
    InputError
        There is no such family.
    """
    if name not in names():
        raise InputError(f"there is no family {name!r}; known: {', '.join(names())} (nearest: {nearest(name, names(), 1)})")
    return import_module(f"gageline.connections.{name}").CONNECTION
