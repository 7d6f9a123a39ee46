"""Braces of seismic systems: required strength by the brace's expected yielding, and the rules of its ends.

[AISC341] A3, D2, F1, F2 of the 2022 edition, from memory: a calculation says so until the engineer confirms them in ``seismic_basis``.
"""

from dataclasses import dataclass

from .. import units
from ..check import Check, Working, not_applicable, strength_check
from ..errors import InputError, ScopeError
from ..facts.expected import expected
from ..provisions import seismic, tension

SLENDER = 200.0
"""Slenderness up to which a brace of an SCBF may go.  [AISC341] F2.5b, from memory."""

ALPHA_S = {"LRFD": 1.0, "ASD": 1.5}
"""Level of seismic force by method.  [AISC341] F2.6c, from memory."""

BAND = 2.0
"""Thicknesses of gusset that the clear band beyond the brace has.  Common practice."""


@dataclass(frozen=True)
class Brace:
    """A brace: gross area [in²], steel [ksi], its printed name and product for R_y, least radius [in], length [in], gusset's thickness [in]."""

    A_g: float
    F_y: float
    steel: str
    product: str
    r: float
    length: float | None
    t_p: float


@dataclass(frozen=True)
class ExpectedDemand:
    """Required strengths of a brace's connection: ``service`` is the demand by the loads, ``steps`` how the expected strength came about. [kip]"""

    service: object
    required_tension: float
    required_compression: float
    steps: tuple
    notes: tuple = ()

    @property
    def level(self):
        """Level of the demand."""
        return self.service.level


def demand(c):
    """Return the demand of a connection whose brace is known: the loads', or by the brace's expected strength where a seismic system is given.

    Raises
    ------
    InputError, ScopeError
        A cap or a compression without its basis, loads without overstrength, or bolts that a seismic system may not have.
    """
    given, service = c.inputs, c.demand
    if given.seismic_system is None:
        return service
    _refuse(given)
    brace, do = c.brace(), Working()
    R_y, _ = expected(brace.steel, brace.product)
    P = do(seismic.expected_yield, R_y, brace.F_y, brace.A_g, ALPHA_S[c.basis.method])
    if given.system_cap is not None:
        P = do(seismic.capped, P, given.system_cap)
    T, C = service.required_tension, service.required_compression
    if given.seismic_system == "OCBF":
        do.say("An ordinary brace's connection carries the load with overstrength, but need not carry more than that.")
        T = min(T, P)
    else:
        T, C = max(T, P), max(C, P if given.brace_compression is None else given.brace_compression)
    return ExpectedDemand(service, T, C, tuple(do.steps), getattr(service, "notes", ()))


def _refuse(given):
    if (given.system_cap is None) != (len(given.system_cap_basis.strip()) < 10):
        raise InputError("system_cap and system_cap_basis go together: the largest force the system can deliver, and a written basis for it")
    if given.brace_compression is not None and len(given.seismic_basis.strip()) < 10:
        raise InputError("brace_compression, the brace's expected strength in compression, needs its basis in seismic_basis")
    if given.seismic_system == "OCBF" and given.P_E is not None and given.Omega_0 is None:
        raise InputError("Omega_0 is missing: the connection of an ordinary brace is for the load with overstrength (341 F1.6a, from memory)")
    installation = getattr(given, "installation", None)
    if installation is None:
        return
    if installation == "snug":
        raise ScopeError("installation = 'snug': bolts of a seismic system are pretensioned, faying surfaces class A or better "
                         "(341 D2.2, from memory)")
    kinds = (given.member_holes, given.plate_holes)
    for name, kind in zip(("member_holes", "plate_holes"), kinds):
        if kind not in ("STD", "SSL across", "OVS"):
            raise ScopeError(f"{name} = {kind!r}: bolts of a seismic system have standard holes or short slots across the load "
                             "(341 D2.2, from memory)")
        if kind == "OVS" and (installation != "slip-critical" or kinds == ("OVS", "OVS")):
            raise ScopeError(f"{name} = 'OVS': in a seismic system oversized holes are for one ply of a slip-critical joint (341 D2.2, from memory)")
    if not given.deformation_considered:
        raise ScopeError("deformation_considered = False: bearing in a seismic system is limited to 2.4 d t F_u (341 D2.2, from memory)")


def adjusted(c, made):
    """Return the checks of a connection, those of a special brace itself set against what they are for."""
    if c.inputs.seismic_system != "SCBF":
        return made
    brace = c.brace()
    _, R_t = expected(brace.steel, brace.product)
    return tuple(_of_brace(c, each, R_t) for each in made)


def _of_brace(c, each, R_t):
    if not each.applies or each.id not in ("member yielding", "member rupture"):
        return each
    demand, steps, nominal, notes = each.demand, each.steps[:-1], each.nominal, each.notes
    do = Working()
    if each.id == "member yielding":
        demand = c.demand.service.required_tension
        notes = (*notes, f"Yielding of the brace is what the system counts on: the check is for the loads, {units.force(demand, units.ceil_figures)}.")
    else:
        do.say("Rupture of the brace against its own expected yielding may count on its expected tensile strength (341 A3.2, from memory).")
        nominal = do(seismic.expected_rupture, R_t, nominal)
    return strength_check(each.id, each.title, each.part, each.clause, each.limit_state, c.basis.method, nominal, demand,
                          (*steps, *do.steps), each.axial, path=each.path, notes=notes)


def checks(c, made):
    """Yield the rules of a seismic brace's end; nothing where no seismic system is given."""
    given = c.inputs
    if given.seismic_system is None:
        return
    from .fatigue import value_in

    brace, special = c.brace(), given.seismic_system == "SCBF"
    id, title, clause = "seismic net area", "Seismic, effective net area of the brace", "341 F2.5b"
    if special:
        A_e = value_in(next(each for each in made if each.id == "member rupture"), "A_e")
        yield Check(id, title, "member", clause, kind="detailing", nominal=brace.A_g, available=A_e, demand=brace.A_g, unit="in²",
                    notes=("The effective net area of a special brace is not less than its gross area: reinforce it where it is (from memory).",))
    else:
        yield not_applicable(id, title, "member", clause, "a rule for special braces (SCBF)", kind="detailing")
    id, title = "seismic slenderness", "Seismic, slenderness of the brace, at most 200"
    if not special or brace.length is None:
        why = "member length not given" if special else "a rule for special braces (SCBF); a V-type ordinary brace has one of its own, by others"
        yield not_applicable(id, title, "member", clause, why, kind="detailing")
    else:
        do = Working()
        lam = do(tension.slenderness, brace.length, brace.r)
        yield Check(id, title, "member", clause, kind="detailing", nominal=SLENDER, available=SLENDER, demand=lam, unit="", steps=tuple(do.steps),
                    at_most=True)
    id, title, clause = "seismic band", "Seismic, clear band of the gusset, twice its thickness", "common practice"
    if given.clear_band is None:
        yield not_applicable(id, title, "plate", clause, "clear_band is not given", kind="advice")
    else:
        needed = BAND * brace.t_p
        yield Check(id, title, "plate", clause, kind="advice", nominal=needed, available=given.clear_band, demand=needed, unit="in",
                    notes=("A gusset lets a brace buckle out of its plane where a band of twice its thickness is clear between the brace's end and the "
                           "line of restraint; an elliptical band of 8 thicknesses is an alternative.",))


def notes(c):
    """Return (text, basis) of what a seismic brace takes for granted."""
    given = c.inputs
    if given.seismic_system is None:
        return []
    out = [(f"The brace belongs to a frame of the kind {given.seismic_system}; provisions of AISC 341-22 are set down from memory.",
            given.seismic_basis or "to be confirmed")]
    if given.system_cap is not None:
        out.append((f"The system delivers no more than {units.printed(given.system_cap)} kip to the brace: {given.system_cap_basis}", "engineer"))
    if given.seismic_system == "SCBF" and given.brace_compression is None:
        out.append(("In compression the brace is taken to be as strong as in tension, which is safe for its connection.", "conservative"))
    if hasattr(given, "installation"):
        out.append(("Bolts are pretensioned, faying surfaces class A or better.", "341 D2.2, from memory"))
    return out


def open_items(c):
    """Return what a seismic brace leaves to be confirmed."""
    given = c.inputs
    if given.seismic_system is None:
        return []
    unconfirmed = [] if len(given.seismic_basis.strip()) >= 10 else \
        ["Provisions of AISC 341-22 (required strength, R_y and R_t, net area, bolts) are from memory: confirm them against the standard."]
    return [*unconfirmed, "Gusset and its edge under the brace's buckling, protected zone and demand-critical welds: AISC 341, by others."]
