"""The pin of a connection in double shear: shear, bearing in its plies, bending.  [AISC360] F11, J4.2, J7, Table J3.2."""

from dataclasses import dataclass

from ..provisions import pins
from .outcome import worked

PLANES = 2
"""Shear planes of a pin between two outer plies."""

SHEAR_BASES = ("both", "yielding", "threaded part")
"""Which strength in shear counts: the Specification has no clause for the shear of a pin."""


@dataclass(frozen=True)
class Pin:
    """A pin through two outer plies and one inner ply.

    Parameters
    ----------
    d : diameter. [in]
    F_y, F_u : of the pin. [ksi]
    t_outer, t_inner : thickness of one outer ply and of the inner ply. [in]
    gap : between an outer and the inner ply. [in]
    """

    d: float
    F_y: float
    F_u: float
    t_outer: float
    t_inner: float
    gap: float

    @property
    def grip(self):
        """Outer face to outer face of the plies. [in]"""
        return 2 * self.t_outer + self.t_inner + 2 * self.gap


def shear_yielding(pin):
    """Return yielding of the pin in its two shear planes, by analogy with J4.2."""
    return worked(lambda do: do(pins.pin_shear_yielding, pin.F_y, PLANES, do(pins.pin_area, pin.d)))


def shear_rupture(pin):
    """Return rupture of the pin in its two shear planes, as a threaded part with its threads outside them."""
    return worked(lambda do: do(pins.pin_shear_rupture, pin.F_u, PLANES, do(pins.pin_area, pin.d)))


def bending(pin):
    """Return bending of the pin at its middle."""

    def compute(do):
        e_p = do(pins.pin_arm, pin.t_outer, pin.gap, pin.t_inner)
        Z_p, S_p = do(pins.plastic_modulus_of_pin, pin.d), do(pins.elastic_modulus_of_pin, pin.d)
        return do(pins.pin_bending, pin.F_y, Z_p, S_p, e_p)

    return worked(compute)._replace(path="bending")


def limit_states(part, title, of, shear_basis, ids):
    """Return rows (id, title, part, clause, limit state, axial, evaluate) of a pin.

    Parameters
    ----------
    part : of the load path. title : how the checks begin.
    of : function of the design that returns its Pin.
    shear_basis : one of ``SHEAR_BASES``.
    ids : how the ids begin.
    """
    rows = []
    if shear_basis != "threaded part":
        rows.append((f"{ids} shear yielding", f"{title}, shear yielding", part, "J4.2(a)", "shear yielding", False,
                     lambda design: shear_yielding(of(design))))
    if shear_basis != "yielding":
        rows.append((f"{ids} shear rupture", f"{title}, shear as a threaded part", part, "Table J3.2", "bolts", False,
                     lambda design: shear_rupture(of(design))))
    return [*rows, (f"{ids} bending", f"{title}, bending", part, "F11", "bending", False, lambda design: bending(of(design)))]
