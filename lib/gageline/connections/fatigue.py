"""Fatigue of the details on the load path: each family says which it has, the check is one.  [AISC360] B3.11, Appendix 3."""

from collections.abc import Callable
from dataclasses import dataclass

from ..check import Check, Working, not_applicable
from ..errors import InputError, ScopeError
from ..facts import fatigue as facts
from ..provisions import fatigue

ID, TITLE, CLAUSE = "fatigue", "Fatigue", "Appendix 3"


@dataclass(frozen=True)
class Detail:
    """A detail that live load may crack.

    Parameters
    ----------
    id, title : of its check, the title after "Fatigue, ". part : of the load path.
    category : name of the detail category. case : its row of Table A-3.1, or why it is taken.
    area : (id of a check, symbol) of the area among that check's lines; or a function of ``do`` that returns it. [in²]
    force : function of (do, range of the member's force) that returns that of the detail; None where the detail carries all of it. [kip]
    F_y : of base metal whose largest stress is limited too; None for others. [ksi]
    root : (leg, thickness) of transverse fillets on both faces of a plate, whose root may crack. [in]
    note : a remark below the check.
    """

    id: str
    title: str
    part: str
    category: str
    case: str
    area: tuple | Callable
    force: Callable | None = None
    F_y: float | None = None
    root: tuple | None = None
    note: str = ""


def asked(given):
    """Return whether the inputs ask for a check against fatigue.

    Raises
    ------
    InputError
        Range or cycles are given without the other.
    """
    if (given.fatigue_range is None) != (given.fatigue_cycles is None):
        missing = "fatigue_cycles" if given.fatigue_cycles is None else "fatigue_range"
        raise InputError(f"input {missing} is missing: fatigue needs the range of the live load's force and its cycles in the design life")
    return given.fatigue_range is not None and given.fatigue_cycles > facts.CYCLES


def checks(c, made):
    """Yield the checks against fatigue of a connection, given its other checks; or the reason why there is none."""
    last = [part for part in c.parts if part != "detailing"][-1]
    if not asked(c.inputs):
        why = "no cycles are given: no more than 20 000 cycles of live load are taken for granted" if c.inputs.fatigue_cycles is None else \
            f"{c.inputs.fatigue_cycles:,.0f} cycles of live load, not more than 20 000".replace(",", " ", 1)
        yield not_applicable(ID, f"{TITLE}, every detail", last, CLAUSE, why)
        return
    by_id = {each.id: each for each in made}
    for detail in c.fatigue_details(by_id):
        do = Working()
        A_SR = detail.area(do) if callable(detail.area) else value_in(by_id[detail.area[0]], detail.area[1])
        yield _range(c.inputs, detail, do, A_SR, by_id)
        if detail.F_y is not None:
            yield _peak(c, detail, A_SR)


def _range(given, detail, do, A_SR, by_id):
    category = facts.category(detail.category)
    do.say(f"Category {category.name} ({detail.case}): {category.words}.")
    P_SR = given.fatigue_range if detail.force is None else detail.force(do, given.fatigue_range)
    if not callable(detail.area):
        do.say(f"The area is that of: {by_id[detail.area[0]].title}.")
    f_SR = do(fatigue.stress_range, P_SR, A_SR)
    n = given.fatigue_cycles
    if category.name == "F":
        F_SR = do(fatigue.allowable_range_of_throat, facts.F_100, category.C_f, n, category.F_TH)
    elif detail.root:
        R_FIL = do(fatigue.reduction_of_transverse_fillets, *detail.root, facts.T_REF)
        F_SR = do(fatigue.allowable_range_at_root, R_FIL, facts.F_1000, category.C_f, n)
    else:
        F_SR = do(fatigue.allowable_range, facts.F_1000, category.C_f, n, category.F_TH)
    notes = (detail.note,) if detail.note else ()
    return Check(f"{ID} {detail.id}", f"{TITLE}, {detail.title[0].lower()}{detail.title[1:]}", detail.part,
                 f"{CLAUSE}, category {category.name}", nominal=F_SR, available=F_SR, demand=f_SR, unit="ksi", steps=tuple(do.steps), notes=notes, tension=False)


def _peak(c, detail, A_SR):
    do, (P_max, where) = Working(), c.service_tension()
    do.say(f"Tension at service load: {where}.")
    P_max = P_max if detail.force is None else detail.force(do, P_max)
    f_max = do(fatigue.peak_stress, P_max, A_SR)
    F_max = do(fatigue.peak_limit, detail.F_y)
    return Check(f"{ID} {detail.id} peak", f"{TITLE}, largest stress, {detail.title[0].lower()}{detail.title[1:]}", detail.part,
                 "Appendix 3.1", nominal=F_max, available=F_max, demand=f_max, unit="ksi", steps=tuple(do.steps), tension=False)


def value_in(check, symbol):
    """Return the value of a symbol in a check's lines: the last line's that computes it, else the last that takes it."""
    calls = [step for step in reversed(check.steps) if not isinstance(step, str)]
    found = [made.bare(*values) for made, values in calls if made.result == symbol]
    return (found or [values[made.arguments.index(symbol)] for made, values in calls if symbol in made.arguments])[0]


def holds(check, symbol):
    """Return whether a symbol is computed in a check's lines."""
    return any(step[0].result == symbol for step in check.steps if not isinstance(step, str))


def refuse_snug(installation, name="installation"):
    """Refuse snug-tight bolts under cyclic load.

    Raises
    ------
    ScopeError
    """
    if installation == "snug":
        raise ScopeError(f"{name} = 'snug': joints under more than 20 000 cycles of live load are slip-critical or pretensioned "
                         "(Appendix 3, Table A-3.1)")


def at_bolts(part, title, yielding, rupture, installation, F_y, force=None, note=""):
    """Return the detail of an element at its bolts: gross section of a slip-critical joint, net section of a pretensioned one.

    Parameters
    ----------
    part : of the load path. title : of the element. yielding, rupture : ids of the checks that hold its gross and net area.
    installation : as written in the inputs. F_y : of the element. [ksi]
    force : see ``Detail``. note : a remark below the check.
    """
    if installation == "slip-critical":
        return Detail(part, f"{title}, gross section at the bolts", part, "B", "Table A-3.1, 2.1", (yielding, "A_g"), force,
                      F_y, note=note)
    return Detail(part, f"{title}, net section at the bolts", part, "B", "Table A-3.1, 2.2", (rupture, "A_n"), force, F_y,
                  note=note)


def at_pin(part, title, plate, width):
    """Return the detail of pin plates or eyebars, on the net section across the pin hole.

    Parameters
    ----------
    part, title : see ``Detail``. plate : the PinPlate or Eyebar. width : at the pin, or the head's diameter. [in]
    """
    return Detail(f"{part} pin", f"{title}, net section at the pin", part, "E", "Table A-3.1, 2.4",
                  lambda do: do(fatigue.net_area_at_pin, plate.plates, width, plate.d_h, plate.t), F_y=plate.F_y)


def throats(part, title, lines):
    """Return the detail of fillet welds in shear on their throat.

    Parameters
    ----------
    part, title : see ``Detail``. lines : id of the check that holds their area.
    """
    return Detail(f"{part} throat", f"{title}, throat", part, "F", "Table A-3.1, 8.2", (lines, "A_we"))


def weld_ends(part, title, t, area, F_y, note=""):
    """Return the detail of an element of thickness t [in] at the ends of longitudinal fillets, on its effective area, which is the safe choice."""
    return Detail(f"{part} weld ends", f"{title}, ends of the longitudinal welds", part, facts.longitudinal(t).name, "Table A-3.1, 4.1", area,
                  F_y=F_y, note=note)


def thread(do, d, tpi, metric, n):
    """Work out the net tensile area of n threads alike. [in²]"""
    return do(fatigue.thread_areas, n, do(fatigue.thread_area_metric if metric else fatigue.thread_area, d, tpi))
