"""The two kinds of attachment of a hanger rod: a nut on a plate, and a welded lug with a pin.  [AISC360] D5, F11, J2.4, J7."""

from dataclasses import dataclass

from ...check import Working, not_applicable
from ...facts import welds as weld_facts
from ...provisions import rods, welds
from .. import pin, pin_plate
from ..outcome import worked

BESIDE_NUT = 1 / 8
"""By how much a nut without plate washer has to be wider than its hole, so that it bears all round. [in]  Practice, from memory."""


@dataclass(frozen=True)
class Nut:
    """A nut that bears on a plate, by way of a square plate washer or not.

    Parameters
    ----------
    end : "upper" or "lower".
    w_n : width of the nut across flats. [in]
    d_h : diameter of the hole. [in]
    F_y, t, w : of the plate. [ksi, in]
    span : of the plate between its supports, or None where others check its bending. [in]
    washer : (width, thickness, F_y, diameter of its hole) of the plate washer, or None. [in, in, ksi, in]
    """

    end: str
    w_n: float
    d_h: float
    F_y: float
    t: float
    w: float
    span: float | None
    washer: tuple | None

    @property
    def title(self):
        """How its checks begin."""
        return f"{self.end.capitalize()} end"


@dataclass(frozen=True)
class Lug:
    """A plate welded to the structure, with the pin of the rod's clevis through it; welds of leg ``w_f`` [in], metal ``F_EXX`` [ksi]."""

    end: str
    plate: pin_plate.PinPlate
    pin: pin.Pin
    w_f: float
    F_EXX: float

    @property
    def title(self):
        """How its checks begin."""
        return self.plate.title


def bearing_of_nut(nut):
    """Return bearing under the nut: on its plate washer, or on the plate."""

    def compute(do):
        on_washer = nut.washer is not None
        A_pb = do(rods.nut_contact, nut.w_n, nut.washer[3] if on_washer else nut.d_h)
        return do(rods.bearing_under_nut, nut.washer[2] if on_washer else nut.F_y, A_pb)

    return worked(compute)


def bearing_of_washer(nut):
    """Return bearing of the plate washer on the plate, with the smaller of their yield stresses."""

    def compute(do):
        w_w, _, F_y, _ = nut.washer
        return do(rods.bearing_under_nut, min(F_y, nut.F_y), do(rods.washer_contact, w_w, nut.d_h))

    return worked(compute)


def bending_of_washer(nut):
    """Return bending of the plate washer beyond the nut, under even pressure."""

    def compute(do):
        w_w, t, F_y, _ = nut.washer
        do.say("The washer is a cantilever beyond the flat of the nut, under even pressure on its contact area.")
        return do(rods.washer_bending, F_y, t, w_w, nut.w_n, do(rods.washer_contact, w_w, nut.d_h))

    return worked(compute)


def bending_of_plate(nut):
    """Return bending of the plate between its two supports, the rod at the middle, the hole deducted."""

    def compute(do):
        do.say("The plate spans between two supports with the rod in the middle; the hole is deducted, the nut's width is not regarded.")
        return do(rods.plate_bending, nut.F_y, nut.w, nut.d_h, nut.t, nut.span)

    return worked(compute)


def weld_of_lug(lug):
    """Return strength of the lug's two fillet welds, no directional increase taken."""

    def compute(do):
        do.say("Fillet welds on both faces over the width of the lug; the increase for load across the weld is not taken.")
        A_we = do(welds.weld_area, 2, do(welds.throat, lug.w_f), lug.plate.w)
        return do(welds.fillet_strength, lug.F_EXX, A_we, 1.0)

    return worked(compute)


def nut_states(nut):
    """Return rows (id, title, part, clause, limit state, axial, evaluate) of a nut and what it bears on."""
    end, title = nut.end, nut.title
    what = "the plate washer" if nut.washer else "the plate"
    rows = [(f"{end} nut bearing", f"{title}, bearing of the nut on {what}", end, "J7", "contact bearing", False,
             lambda design: bearing_of_nut(getattr(design, end)))]
    if nut.washer:
        rows += [(f"{end} washer bearing", f"{title}, bearing of the plate washer", end, "J7", "contact bearing", False,
                  lambda design: bearing_of_washer(getattr(design, end))),
                 (f"{end} washer bending", f"{title}, bending of the plate washer", end, "F11", "bending", False,
                  lambda design: bending_of_washer(getattr(design, end)))]
    if nut.span is not None:
        rows.append((f"{end} plate bending", f"{title}, bending of the plate", end, "F11", "bending", False,
                     lambda design: bending_of_plate(getattr(design, end))))
    return rows


def nut_reasons(nut):
    """Return the checks of a nut's attachment that do not apply, with their reasons."""
    end, title = nut.end, nut.title
    if not nut.washer:
        reason = "the nut bears on the plate without a plate washer"
        yield not_applicable(f"{end} washer bearing", f"{title}, bearing of the plate washer", end, "J7", reason)
        yield not_applicable(f"{end} washer bending", f"{title}, bending of the plate washer", end, "F11", reason)
    if nut.span is None:
        yield not_applicable(f"{end} plate bending", f"{title}, bending of the plate", end, "F11",
                             f"by others: no span of the plate under the nut is given ({end}_span)")


def lug_states(lug, edition):
    """Return rows (id, title, part, clause, limit state, axial, evaluate) of a lug: a pin-connected plate, its pin and its weld."""
    end = lug.end
    rows = pin_plate.limit_states(lug.plate, lambda design: getattr(design, end).plate, lambda design: getattr(design, end).pin, edition)
    rows += pin.limit_states(end, f"{lug.title}, pin", lambda design: getattr(design, end).pin, "both", f"{end} pin")
    return [*rows, (f"{end} weld", f"{lug.title}, fillet welds", end, "J2.4", "weld", False, lambda design: weld_of_lug(getattr(design, end)))]


def lug_rules(lug, edition):
    """Return the dimensional rules of a lug: D5.2, and the least size of its welds."""
    yield from pin_plate.rules(lug.plate, lug.pin.d, edition, True)
    id, title = f"{lug.end} weld size", f"{lug.title}, leg of the welds, minimum"
    note = "Least leg by the thickness of the lug; the part it is welded to may be thinner and is not known here."
    yield pin_plate.limit(id, title, lug.end, "Table J2.4", weld_facts.minimum_fillet(lug.plate.t), lug.w_f, Working().steps, notes=(note,))
