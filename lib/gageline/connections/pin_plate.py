"""Pin-connected plates and eyebars: their strengths and dimensional rules, for a member, a support or a lug.  [AISC360] D5, D6."""

from dataclasses import dataclass

import numpy as np

from ..check import Check, Working, not_applicable
from ..provisions import connecting, pin_plates, pins, tension
from .joint import INCH
from .outcome import Outcome, worked

CLOSE, LOOSE = 1 / 32, 1 / 16
"""Clearances of a pin in its hole that the edition names. [in]  [AISC360] D5.1, D5.2, D6.2."""

LARGE_PIN = 3.0
"""Diameter from which a pin that turns under full load may have the larger clearance, 360-22. [in]  [AISC360] D5.2."""

THINNEST_EYEBAR, STRONG_STEEL = 0.5, 70.0
"""Least thickness of an eyebar without nuts that clamp it [in], yield stress above which its hole is limited by 5 t [ksi].  [AISC360] D6.2."""


@dataclass(frozen=True)
class PinPlate:
    """One or more like plates on a pin.

    Parameters
    ----------
    name : of the part, "member", "support" or another part of the load path. title : how its checks begin.
    plates : number of like plates that share the load.
    F_y, F_u : of the plates. [ksi]
    t, w : thickness and width of one. [in]
    a : edge of the hole to the end, along the force; may be an array of shape (n,). [in]
    d_h : diameter of the hole. [in]
    cut : leg of its corners cut at 45 degrees, 0 for square corners. [in]
    b_0 : constant of the effective width beside the hole, inch or metric. [in]  [AISC360] D5.1.
    """

    name: str
    title: str
    plates: int
    F_y: float
    F_u: float
    t: float
    w: float
    a: object
    d_h: float
    cut: float = 0.0
    b_0: float = INCH.beside_pin


@dataclass(frozen=True)
class Eyebar:
    """One or more like eyebars on a pin: body of width ``w``, circular head of diameter ``head``, transition of radius ``radius``. [in]"""

    name: str
    title: str
    plates: int
    F_y: float
    F_u: float
    t: float
    w: float
    head: float
    radius: float
    d_h: float
    clamped: bool


def _shared(do, plate, P_n):
    """Work out the strength of all like plates from that of one."""
    if plate.plates == 1:
        return P_n
    do.say(f"{plate.plates} plates share the load equally.")
    return do(pin_plates.like_plates, plate.plates, P_n)


def effective_edge(plate, do):
    """Work out the width beside the hole that counts. [in]"""
    b_p = do(pin_plates.edge_width, plate.w, plate.d_h)
    return do(pin_plates.effective_edge_width, plate.t, plate.b_0, b_p)


def least_edge(plate):
    """Return the least distance from the hole to the end that D5.2 permits. [in]"""
    b_e = min(2 * plate.t + plate.b_0, (plate.w - plate.d_h) / 2)
    return pin_plates.least_edge.bare(b_e)


def tensile_rupture(plate):
    """Return rupture of the plates beside the hole."""

    def compute(do):
        return _shared(do, plate, do(pin_plates.tensile_rupture, plate.F_u, plate.t, effective_edge(plate, do)))

    return worked(compute)._replace(path="tension")


def shear_rupture(plate, d, edition):
    """Return rupture of the plates along the two planes from the pin to their end."""

    def compute(do):
        A_sf = do(pin_plates.shear_path_area, plate.t, plate.a, d)
        if edition == "360-16":
            return _shared(do, plate, do(pin_plates.shear_rupture_2016, plate.F_u, A_sf))
        C_r = do(pin_plates.close_hole if plate.d_h - d <= CLOSE + 1e-9 else pin_plates.loose_hole)
        return _shared(do, plate, do(pin_plates.shear_rupture, C_r, plate.F_u, A_sf))

    out = worked(compute)
    return Outcome(out.nominal) if isinstance(out.nominal, np.ndarray) else out._replace(path="shear")


def bearing(plate, pin):
    """Return bearing of the pin and the plates on each other, with the smaller of their yield stresses."""

    def compute(do):
        F_y = min(plate.F_y, pin.F_y)
        softer = "pin and plate have the same" if plate.F_y == pin.F_y else f"the {'pin' if pin.F_y < plate.F_y else 'plate'} has the smaller"
        do.say(f"Of the two parts in contact, {softer} yield stress, {F_y:g} ksi.")
        return do(pins.bearing_on_pin, F_y, plate.plates, pin.d, plate.t)

    return worked(compute)._replace(path="bearing")


def yielding(plate):
    """Return yielding of the plates on their gross width."""

    def compute(do):
        if plate.plates == 1:
            return do(tension.gross_yielding, plate.F_y, do(connecting.plate_area, plate.w, plate.t))
        return do(tension.gross_yielding, plate.F_y, do(connecting.like_plates_area, plate.plates, plate.w, plate.t))

    return worked(compute)


def eyebar_yielding(eyebar):
    """Return yielding of the eyebars' bodies, of a width that counts up to eight times the thickness."""
    return worked(lambda do: _shared(do, eyebar, do(tension.gross_yielding, eyebar.F_y, do(pin_plates.eyebar_body_area, eyebar.w, eyebar.t))))


def eyebar_rupture(eyebar):
    """Return rupture of the eyebars' bodies, which have no holes."""
    return worked(lambda do: _shared(do, eyebar, do(tension.net_rupture, eyebar.F_u, do(pin_plates.eyebar_body_area, eyebar.w, eyebar.t))))


def limit_states(plate, of, pin_of, edition):
    """Return rows (id, title, part, clause, limit state, axial, evaluate) of a pin-connected plate.

    Parameters
    ----------
    plate : the PinPlate as designed. of, pin_of : functions of the design that return its PinPlate and its Pin.
    edition : code edition.
    """
    part, title, one = plate.name, plate.title, plate.plates == 1
    return [
        (f"{part} tension rupture", f"{title}, tensile rupture beside the hole", part, "D5.1(a)", "rupture", one,
         lambda design: tensile_rupture(of(design))),
        (f"{part} shear rupture", f"{title}, shear rupture beyond the hole", part, "D5.1(b)", "rupture", one,
         lambda design: shear_rupture(of(design), pin_of(design).d, edition)),
        (f"{part} bearing", f"{title}, bearing on the pin", part, "D5.1(c), J7", "contact bearing", False,
         lambda design: bearing(of(design), pin_of(design))),
        (f"{part} yielding", f"{title}, yielding of the gross section", part, "D5.1(d), D2(a)", "yielding", True,
         lambda design: yielding(of(design))),
    ]


# Dimensional rules

def limit(id, title, part, clause, required, provided, steps=(), at_most=False, kind="detailing", notes=(), unit="in"):
    """Return a dimensional rule as a check; ``at_most`` where the provided value may not exceed the limit."""
    demand, available = (provided, required) if at_most else (required, provided)
    return Check(id, title, part, clause, kind=kind, nominal=required, available=available, demand=demand, unit=unit, steps=tuple(steps),
                 notes=tuple(notes), at_most=at_most)


def clearance_limit(d, edition, turns):
    """Return the greatest clearance of a pin in the hole of a pin-connected plate. [in]

    Parameters
    ----------
    d : diameter of the pin. [in]
    edition : code edition.
    turns : whether the parts turn on the pin while under full load.
    """
    if edition == "360-16":
        return CLOSE
    return LOOSE if not turns or d >= LARGE_PIN - 1e-9 else CLOSE


def rules(plate, d, edition, turns):
    """Return the checks of D5.2 for a pin-connected plate: hole, width, edge distance, cut corners."""
    part, title, clause = plate.name, plate.title, "D5.2"
    do = Working()
    d_hmax = do(pin_plates.largest_hole, d, clearance_limit(d, edition, turns))
    yield limit(f"{part} hole", f"{title}, diameter of the pin hole", part, clause, d_hmax, plate.d_h, do.steps, at_most=True)
    do = Working()
    w_req = do(pin_plates.least_width, effective_edge(plate, do), d)
    yield limit(f"{part} width", f"{title}, width at the pin", part, clause, w_req, plate.w, do.steps)
    do = Working()
    a_req = do(pin_plates.least_edge, effective_edge(plate, do))
    yield limit(f"{part} edge", f"{title}, hole to the end", part, clause, a_req, plate.a, do.steps)
    id, name = f"{part} corner", f"{title}, hole to the cut corner"
    if not plate.cut:
        yield not_applicable(id, name, part, clause, "the corners are square", kind="detailing")
        return
    a_45 = do(pin_plates.edge_at_cut_corner, plate.a, plate.d_h, plate.w, plate.cut)
    yield limit(id, name, part, clause, a_req, a_45, do.steps,
                notes=("Beyond the hole a plate has to be as wide square to its cut corners as it has to be along the force.",))


def eyebar_rules(eyebar, d):
    """Return the checks of D6.2 for an eyebar: thickness, pin, hole, head, transition."""
    part, title, clause = eyebar.name, eyebar.title, "D6.2"
    id, name = f"{part} thickness", f"{title}, thickness"
    if eyebar.clamped:
        yield not_applicable(id, name, part, clause, "external nuts clamp the eyebar between filler plates", kind="detailing")
    else:
        yield limit(id, name, part, clause, THINNEST_EYEBAR, eyebar.t)
    do = Working()
    yield limit(f"{part} pin", f"{title}, diameter of the pin", part, clause, do(pin_plates.least_eyebar_pin, eyebar.w), d, do.steps)
    do = Working()
    yield limit(f"{part} hole", f"{title}, diameter of the pin hole", part, clause, do(pin_plates.largest_hole, d, CLOSE), eyebar.d_h, do.steps,
                at_most=True)
    id, name = f"{part} strong hole", f"{title}, diameter of the pin hole, strong steel"
    if eyebar.F_y > STRONG_STEEL:
        do = Working()
        yield limit(id, name, part, clause, do(pin_plates.largest_hole_of_strong_steel, eyebar.t), eyebar.d_h, do.steps, at_most=True)
    else:
        yield not_applicable(id, name, part, clause, f"yield stress not above {STRONG_STEEL:g} ksi", kind="detailing")
    b_p = pin_plates.edge_width.bare(eyebar.head, eyebar.d_h)
    do = Working()
    yield limit(f"{part} head", f"{title}, width beside the hole", part, clause, do(pin_plates.least_head, eyebar.w), b_p, do.steps,
                notes=(f"{title}: the head is {b_p:.4g} in wide on each side of the hole.",))
    do = Working()
    yield limit(f"{part} useful head", f"{title}, width beside the hole that counts", part, clause, do(pin_plates.useful_head, eyebar.w), b_p,
                do.steps, at_most=True, kind="advice",
                notes=("More than three quarters of the body's width beside the hole is permitted but does not count.",))
    yield limit(f"{part} transition", f"{title}, radius from head to body", part, clause, eyebar.head, eyebar.radius,
                notes=(f"{title}: the radius between head and body is at least the diameter of the head.",))
