"""The families of connection by name, each imported only when asked for."""

from importlib import import_module

from .errors import InputError, nearest

FAMILIES = {"bolted": ("gageline.connections.bolted", "BoltedConnection", "bolted tension member and its connection plates")}
"""Name -> module, class, what it is for; the template of a family has its name."""


def family(name):
    """Return the connection class of a family.

    Raises
    ------
    InputError
        There is no such family.
    """
    if name not in FAMILIES:
        raise InputError(f"there is no family {name!r}; known: {', '.join(FAMILIES)} (nearest: {nearest(name, FAMILIES)})")
    module, made, _ = FAMILIES[name]
    return getattr(import_module(module), made)
