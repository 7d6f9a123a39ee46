"""What every family of connection shares: who it is for, its loads, its list of checks and its results as data."""

from dataclasses import dataclass
from functools import cached_property
from typing import Literal

from .. import check, loads, units
from ..editions import Basis
from ..errors import InputError, ScopeError
from . import fatigue, impact, seismic
from .fields import Force, Inputs, Length, Number, Texts, note

_WHO, _LOADS, _SAID, _FATIGUE, _SEISMIC = "Identification", "Loads", "Assumptions", "Fatigue", "Seismic brace"


class CalcInputs(Inputs):
    """Inputs of every calculation: identification, service loads or a given demand, assumptions, open items."""

    mark: str = note("piece mark of the calculation", group=_WHO, min_length=1)
    title: str = note("what the member is", "", group=_WHO)
    purpose: str = note("purpose and scope in a sentence or two", "", group=_WHO)

    P_D: Force | None = note("dead load, service, tension positive", None, group=_LOADS)
    P_L: Force | None = note("live load", None, group=_LOADS)
    P_Lr: Force | None = note("roof live load", None, group=_LOADS)
    P_S: Force | None = note("snow load (strength level in ASCE 7-22)", None, group=_LOADS)
    P_R: Force | None = note("rain load", None, group=_LOADS)
    P_W: Force | None = note("wind load in one sense", None, group=_LOADS)
    P_W_opposite: Force | None = note("wind load in the other sense, normally negative", None, group=_LOADS)
    P_E: Force | None = note("horizontal seismic effect Q_E, both senses taken", None, group=_LOADS)
    S_DS: Number = note("design spectral response, for the vertical seismic effect", 0.0, group=_LOADS, ge=0, le=5)
    rho: Number = note("redundancy factor", 1.0, group=_LOADS, ge=1, le=1.3)
    Omega_0: Number | None = note("overstrength factor, where the load with overstrength is required", None, group=_LOADS, ge=1, le=4)
    companion_L: Number = note("factor of L as a companion load (0.5 where ASCE 7 allows it)", 1.0, group=_LOADS)
    impact: str = note("impact on the moving live load before combination: 20 %, 50 %, or 33 % legacy", "", group=_LOADS)
    P_L_moving: Force | None = note("part of P_L that moves, where not all of it does", None, group=_LOADS, gt=0)
    impact_basis: str = note("written basis of an impact that ASCE 7 4.6 does not name", "", group=_LOADS)
    tension: Force | None = note("required tension, instead of service loads", None, group=_LOADS, gt=0, le=50_000)
    compression: Force | None = note("required compression, with a given required tension", None, group=_LOADS, ge=0, le=50_000)
    demand_level: Literal["LRFD", "ASD"] | None = note("level of the given demand: LRFD or ASD", None, group=_LOADS)

    fatigue_range: Force | None = note("range of the live load's axial force at service level, both senses together", None, group=_FATIGUE,
                                      gt=0, le=50_000)
    fatigue_cycles: Number | None = note("cycles of that range in the design life; up to 20 000 need no check", None, group=_FATIGUE, ge=0, le=1e10)

    seismic_system: Literal["SCBF", "OCBF"] | None = note("frame that the brace belongs to: SCBF (special) or OCBF (ordinary)", None, group=_SEISMIC)
    system_cap: Force | None = note("largest force that the system can deliver to the brace", None, group=_SEISMIC, gt=0, le=50_000)
    system_cap_basis: str = note("written basis of system_cap", "", group=_SEISMIC)
    brace_compression: Force | None = note("expected strength of a special brace in compression (default: that in tension)", None, group=_SEISMIC,
                                          gt=0, le=50_000)
    clear_band: Length | None = note("clear band of the gusset between the brace's end and the line of restraint", None, group=_SEISMIC, gt=0, le=60)
    seismic_basis: str = note("who confirmed the provisions of AISC 341, and how", "", group=_SEISMIC)

    assumptions: Texts = note("assumptions of the engineer, each a sentence", (), group=_SAID)
    open_items: Texts = note("what has to be confirmed, each a sentence", (), group=_SAID)

    def required(self, basis):
        """Return the demand: all combinations of the service loads, or the given demand with its level.

        Raises
        ------
        InputError
            Both or neither are given, the level is missing, or it is not that of the method.
        """
        service = self.service()
        given = [name for name in ("tension", "compression", "demand_level") if getattr(self, name) is not None]
        if service and given:
            raise InputError(f"{given[0]} is given together with service loads ({', '.join(SERVICE[n] for n in service)}); give one or the other")
        if not service:
            if self.tension is None:
                raise InputError("no load: give service loads (P_D, P_L, …), or tension with demand_level")
            if self.demand_level is None:
                raise InputError("tension is given without demand_level; state whether it is LRFD (factored) or ASD (service combinations)")
            demand = loads.GivenDemand(self.tension, self.compression or 0.0, self.demand_level)
        else:
            if too_big := [SERVICE[nature] for nature, value in service.items() if abs(value) > 50_000]:
                raise InputError(f"{too_big[0]} is more than 50 000 kip; check the number and its unit")
            demand = loads.demands(service, basis.method, basis.loads, **self.load_options())
            if demand.required_tension <= 0:
                raise InputError("no combination of the loads gives tension; this calculation is for tension members")
        loads.require_level(demand, basis.method)
        return demand

    def load_options(self):
        """Return the options of the load combinations."""
        return {"companion_L": self.companion_L, "S_DS": self.S_DS, "rho": self.rho, "Omega_0": self.Omega_0}

    def service(self):
        """Return the service loads given, by nature, the live load with its impact. [kip]"""
        given = {nature: getattr(self, name) for nature, name in SERVICE.items() if getattr(self, name) is not None}
        return given | ({"L": impact.live_load(self)} if impact.fraction(self)[0] else {})


SERVICE = {"D": "P_D", "L": "P_L", "Lr": "P_Lr", "S": "P_S", "R": "P_R", "W": "P_W", "W_opposite": "P_W_opposite", "E": "P_E"}
"""Nature of a load -> the input that holds it."""


METRIC_CONSTANTS = (
    "The Specification's metric constants are used for the allowance for damage at holes (2 mm), long joints (950 mm), fillers (6 mm, 0.0154 "
    "per mm), upper limits of spacing and edge distance (300, 180 and 150 mm) and the effective width beside a pin hole (16 mm). Strengths of "
    "steels, bolts and filler metals, E, least sizes and edge margins of fillet welds, clearances of pins and all other limits of length are those "
    "of the inch and ksi tables, converted exactly; the Specification's rounded metric values of these are not used.")
"""What is metric and what is converted where a project is in SI; printed as an assumption."""


@dataclass(frozen=True)
class Table:
    """A table of a family's own: heads and rows of text, a caption, a remark below; numbers right of the first column."""

    title: str
    heads: tuple
    rows: tuple
    caption: str = ""
    remark: str = ""


@dataclass(frozen=True)
class Sweep:
    """How a family's connection grows: what a study evaluates to draw strength against length.

    Parameters
    ----------
    lengths : (n,) connection lengths of ``designs``. [in]
    designs : n designs that ``limit_states`` evaluates one by one, or one that holds arrays of shape (n,).
    design : index of the design itself, or None where it is none of them.
    describe : function of an index that says how the connection is made ("4 rows at 3 in").
    stretched : (lengths (m,), design holding arrays of shape (m,)) of another way to lengthen it, or None.
    stretched_name : what that other way is, in words.
    label : what the length is, for the axis.
    marks : (n,) short texts beside the lengths ("4 rows"), or () on a continuous sweep.
    """

    lengths: object
    designs: object
    design: int | None
    describe: object
    stretched: tuple | None = None
    stretched_name: str = ""
    label: str = "connection length l, in"
    marks: tuple = ()


class Connection:
    """A designed connection: validated inputs, and every check on the load path computed once.

    A family gives: ``Model`` (its inputs), ``family`` and ``title`` (its name in words), ``parts`` (part of the load path -> heading,
    in the order of the report), ``design`` (what ``limit_states`` evaluates), ``limit_states(design)``, ``_checks()``, ``subject``,
    ``materials_text()``, ``designed()``, ``sweep()``; and where it has them ``tables()`` and ``drawings()``.
    """

    family = ""
    title = ""
    Model = CalcInputs
    parts = {}

    def __init__(self, inputs, basis=None):
        self.inputs = inputs
        self.basis = basis or Basis()
        self.demand = inputs.required(self.basis)
        for name, wanted, method in (("fatigue_range", fatigue.asked(inputs), "fatigue_details"), ("seismic_system", inputs.seismic_system, "brace")):
            if wanted and not hasattr(self, method):
                raise ScopeError(f"{name} is not for this calculation: {self.title.lower()} has no check for it; do that part by hand, "
                                 "and remove the input")

    @classmethod
    def of(cls, *, edition="360-22", method="LRFD", loads="7-22", **inputs):
        """Build a connection from keyword inputs, as in a script; quantities are texts with units.

        Raises
        ------
        GagelineError
            Whatever is wrong with the inputs, as one sentence.
        """
        return cls(cls.Model.of(**inputs), Basis(edition, method, loads))

    @cached_property
    def checks(self):
        """Every limit state on the load path in order, those that do not apply with their reason."""
        system = self.basis.units_system
        with units.lengths_in(system):
            made = seismic.adjusted(self, tuple(self._checks()))
            made = (*made, *fatigue.checks(self, made), *seismic.checks(self, made))
        return made if system == "US" else tuple(check.in_units(each, system) for each in made)

    def load_steps(self):
        """Return (steps before the combinations, steps after them): impact on the live load, expected strength of a seismic brace."""
        do = check.Working()
        impact.live_load(self.inputs, do)
        return tuple(do.steps), getattr(self.demand, "steps", ())

    def service_tension(self):
        """Return (tension at service load, in words where from). [kip]"""
        if service := self.inputs.service():
            found = loads.demands(service, "ASD", self.basis.loads, **self.inputs.load_options())
            return found.required_tension, "the largest ASD combination"
        return self.inputs.tension, f"the given demand, {self.inputs.demand_level}"

    @property
    def governing(self):
        """The strength check with the largest ratio."""
        return check.governing_check(self.checks)

    @property
    def ok(self):
        """Whether no check fails."""
        return not any(each.fails for each in self.checks)

    @property
    def capacity(self):
        """The largest tension that every strength check in tension permits, at the method's level. [kip]"""
        return min(each.available for each in self.checks if each.kind == "strength" and each.applies and each.tension)

    def to_dict(self):
        """Return identification, basis, demand, checks and verdict as plain data."""
        demand = {"tension": self.demand.required_tension, "compression": self.demand.required_compression}
        return {"family": self.family, "mark": self.inputs.mark, "edition": self.basis.edition, "method": self.basis.method,
                "loads": self.basis.loads, "demand": demand, "checks": [each.to_dict() for each in self.checks],
                "governing": self.governing.id, "ratio": self.governing.ratio, "ok": self.ok, "capacity": self.capacity,
                **({} if self.basis.units_system == "US" else {"units": self.basis.units_system})}

    def assumptions(self):
        """Return (text, basis) of what the calculation takes for granted, the engineer's own first."""
        i, basis = impact.fraction(self.inputs)
        moving = [(f"The moving part of the live load is raised by {100 * i:.3g} % for impact.", basis)] if i else []
        metric = [(METRIC_CONSTANTS, "project.toml")] if self.basis.units_system == "SI" else []
        return [*((text, "engineer") for text in self.inputs.assumptions), *moving, *seismic.notes(self), *metric]

    def open_items(self):
        """Return what has to be confirmed or decided before the calculation may be relied on."""
        failed = [f"{each.title}: D/C above 1.00." for each in self.checks if each.fails]
        advice = [f"{each.title}: recommendation not met." for each in self.checks if each.kind == "advice" and each.ok is False]
        return [*self.inputs.open_items, *failed, *advice, *seismic.open_items(self)]

    def by_others(self):
        """Return what the scope leaves to others."""
        return ()

    def left_to_others(self):
        """Return what the scope leaves to others, without what the options of this calculation cover."""
        covered = fatigue.asked(self.inputs)
        return tuple(text.replace("fatigue, ", "").replace(", fatigue", "") if covered else text for text in self.by_others())

    def tables(self, part):
        """Return the family's own tables of a part of the load path."""
        return ()

    def drawings(self):
        """Return the figures of the connection as designed."""
        return ()

    def sweep(self):
        """Return the ``Sweep`` of the connection's length, or a sentence why there is none."""
        return "Not drawn: this connection has no length along the load that could be varied."
