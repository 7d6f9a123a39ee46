"""The parts of a report as blocks of the sheet: tables of summary, inputs, loads and bolts, and the checks line by line."""

import functools
import re

from . import check, units
from .connections.si_tables import in_si
from .editions import REFERENCES
from .formula import Formula
from .loads import Demands
from .loads import permissible as permissible_load
from .render import value_latex
from .sheet import blocks as sheet
from .symbols import SYMBOLS

NEEDS_NO_SOURCE = ("mark", "title", "purpose", "assumptions", "open_items", "U_basis", "gusset_K_basis", "p_basis", "p_beam_basis", "pin_shear_basis",
                   "impact_basis", "system_cap_basis", "seismic_basis")
"""Inputs that are words about the calculation, not facts about the job."""

FAILED = "D/C above 1.00."
"""How an open item of a failed check ends; nobody can settle it."""

CAUTIONS = (
    "Verify every input against the contract documents before relying on this calculation.",
    "Local codes and the authority having jurisdiction govern where they ask for more.",
    "A licensed engineer is responsible for the use of this calculation; the program neither signs nor seals.",
    "Limit states listed as by others are not covered here.",
)



def ratio(each):
    """Return a check's D/C as printed."""
    return units.ratio_text(each.ratio)


def _length(value):
    return units.printed(value, 4, 2)


def _bound(value, unit, system):
    """Return a limit or what is provided, to four figures; a length in mm keeps no zeros."""
    if unit == "in" and system != "US":
        mm = f"{units.printed(value * units.shown_as('in', 'SI')[1], 4)} mm"
        return mm if system == "SI" else f"{_length(value)} in ({mm})"
    return units.amount(value, unit, system, _length)


def in_brackets(value, unit, system, rounded):
    """Return LaTeX of the value in SI in brackets where a project prints both, or nothing."""
    other, factor = units.shown_as(unit, "SI")
    return rf"\;\left({value_latex(rounded(value * factor), other)}\right)" if system == "dual" and other != unit else ""


def runs_of(text):
    """Return a remark of ours as runs: what stands between dollar signs is a symbol."""
    parts = text.split("$")
    return [{"math": part, "alt": part.replace("_", " ")} if i % 2 else part for i, part in enumerate(parts) if part]


def required(each, system="US"):
    """Return what a check requires, never rounded down."""
    if each.kind != "strength":
        return _bound(each.demand, each.unit, system)
    return units.amount(each.demand, each.unit, system, units.ceil_figures)


def available(each, system="US"):
    """Return what is available, never rounded up."""
    if each.kind != "strength":
        return _bound(each.available, each.unit, system)
    return units.amount(each.available, each.unit, system, units.floor_figures)


def figure(drawn, system="US", dimensioned=False):
    """Return a drawn figure as a block; a dimensioned one says its unit."""
    caption = drawn.caption.replace("dimensions in inches", "dimensions in mm") if system == "SI" else drawn.caption
    if system != "US" and dimensioned and "imensions in" not in caption:
        caption += f" Dimensions in {'mm' if system == 'SI' else 'inches'}."
    return sheet.figure(svg=drawn.svg, caption=units.told(caption, system), alt=units.told(drawn.alt, system), width=drawn.width)


UNITS = {"US": "kip, inch, ksi", "SI": "kN, mm, MPa (1 MPa = 1 N/mm²; 1 kN = 1000 N)",
         "dual": "kip, inch, ksi; results also in kN, mm, MPa in brackets"}
"""Units as the cover names them."""


def cover(calc):
    """Return the cover block of a calculation."""
    connection, job = calc.connection, calc.project
    governs, system = connection.governing, connection.basis.units_system
    applied = [each.title for each in connection.checks if each.applies and each.kind == "strength"]
    limits = sum(each.applies and each.kind != "strength" for each in connection.checks)
    applied.append(f"Spacing, edges, clearance, slenderness ({limits} limits)")
    apart = [[each.title, each.reason] for each in connection.checks if not each.applies and each.kind == "strength"]
    verdict = "all checks satisfied" if connection.ok else "N.G.: not every check is satisfied"
    taken = [[row["id"], runs_of(row["text"]), row["basis"], row["status"]] for row in calc.register() if row["kind"] == "assumption"]
    signed = calc.signed()
    return sheet.cover(
        title=connection.inputs.title or connection.title,
        governing=f"{governs.title} governs: required {required(governs, system)}, available {available(governs, system)}, "
                  f"D/C = {ratio(governs)}; {verdict}.",
        purpose=connection.inputs.purpose or f"{connection.title} of {connection.subject}: strength of the member's end and of its "
                                             "connection, from the gross section to the connection plate.",
        criteria=[["Specification", REFERENCES[job.edition]], ["Method", job.method], ["Loads", REFERENCES[job.loads]],
                  ["Materials", runs_of(units.told(connection.materials_text(), system))],
                  ["Units", UNITS[system]]],
        scope={"checked": applied, "not_applicable": apart, "by_others": list(connection.left_to_others())},
        assumptions=taken, open_items=calc.open_items(), cautions=[],
        revisions=[[job.rev, job.date.isoformat(), job.revision_text, signed["by"], signed["checked"], signed["approved"]]])


def summary(connection):
    """Return the summary blocks."""
    governs, system = connection.governing, connection.basis.units_system
    rows = []
    ranked = check.worst_first([each for each in connection.checks if each.kind == "strength"])
    ranked.remove(governs)
    for each in (governs, *ranked):
        title = each.title + (" — governs" if each is governs else "")
        rows.append({"cells": [title, each.clause, required(each, system), available(each, system), ratio(each), "OK" if each.ok else "N.G."],
                     "strong": each is governs or not each.ok})
    columns = [{"head": "Check"}, {"head": "Clause"}, {"head": "Required", "align": "right"}, {"head": "Available", "align": "right"},
               {"head": "D/C", "align": "right"}, {"head": ""}]
    out = [sheet.heading(text="Summary"), sheet.table(columns=columns, rows=rows)]
    limits = [each for each in connection.checks if each.kind != "strength"]
    failed = [each for each in limits if each.ok is False]
    said = f"All limits listed under “{connection.parts['detailing']}” are met." if not failed else \
        "Not met: " + "; ".join(f"{each.title} ({_limit(each, system)}, provided {_provided(each, system)}"
                                f"{', a recommendation' if each.kind == 'advice' else ''})"
                                for each in failed) + "."
    apart = not_applicable([each for each in connection.checks if each.kind == "strength"])
    return [*out, *apart, sheet.prose(runs=said)]


def not_applicable(some):
    """Return the checks that do not apply as one note with their clauses and reasons; [] if all do."""
    by_reason = {}
    for each in some:
        if not each.applies:
            by_reason.setdefault(each.reason, []).append(f"{each.title} ({each.clause})")
    said = "; ".join(f"{', '.join(titles)}: {reason}" for reason, titles in by_reason.items())
    return [sheet.note(runs=f"Not applicable: {said}.")] if said else []


def _bare(value, unit, system):
    """Return a limit's number: two decimals for a length, none added to a number without unit."""
    return _bound(value, unit, system) if unit else units.printed(value)


def _limit(each, system):
    return f"{'≤' if each.at_most else '≥'} {_bare(each.nominal, each.unit, system)}".replace(" ", "\u00a0")


def _provided(each, system):
    return _bare(each.demand if each.at_most else each.available, each.unit, system).replace(" ", "\u00a0")


def inputs(calc):
    """Return the inputs as executed: given ones with their source, defaults marked so."""
    rows, defaults, group, system = [], [], None, calc.connection.basis.units_system
    for heading, name, meaning, value, given in calc.connection.inputs.shown(system):
        if not given:
            defaults += [f"{name} = {value}"] if value not in ("not given", "none", "") else []
            continue
        if name in NEEDS_NO_SOURCE:
            continue
        if heading != group:
            rows.append({"cells": [], "span_reason": [0, [{"strong": heading}]]})
            group = heading
        typed = calc.given[name].value
        foreign = {"US": r"(mm|cm|kN|MPa|psi|lbf| m)$", "SI": r"(in|ft|[\"']|kip|kips|ksi|psi|lbf|cm| m)$", "dual": r"(cm|psi|lbf| m)$"}[system]
        if isinstance(typed, str) and typed != value and re.search(foreign, typed.strip()):
            value = f"{typed} = {value}"
        rows.append({"cells": [name, meaning, value, calc.sources[name] or "no source given"]})
    columns = [{"head": "Input"}, {"head": "Meaning"}, {"head": "Value"}, {"head": "Source"}]
    out = [sheet.heading(text="Inputs"), sheet.table(columns=columns, rows=rows)]
    return [*out, sheet.note(runs=f"Inputs left at their default: {'; '.join(defaults)}.")] if defaults else out


def _combination(text):
    """Return a load combination as maths; W′ is the wind in the opposite sense."""
    latex = text.replace("W_opp", "W'").replace("Q_E", "Q_{E}").replace("S_DS", "S_{DS}").replace("Ω_0", r"\Omega_0 ").replace("ρ", r"\rho ")
    latex = re.sub(r"\bLr\b", "L_r", re.sub(r"(?<=\d)Lr", "L_r", latex)).replace("−", "-")
    return [{"math": latex, "alt": text}]


def loads(connection):
    """Return the loads: all combinations with numbers, or the given demand."""
    demand, basis, system = connection.demand, connection.basis, connection.basis.units_system
    unit, factor = units.shown_as("kip", system)
    sign = "P_u" if basis.method == "LRFD" else "P_a"
    up = functools.partial(units.ceil_figures, figures=4)
    service, (impact, expected) = getattr(demand, "service", demand), connection.load_steps()
    out = [sheet.heading(text="Loads and required strength"), *steps(impact, basis.edition, system)]
    if isinstance(service, Demands):
        rows = []
        for row in service.rows:
            governs = row is service.tension or row is service.compression
            numbers = " ".join(f"{'−' if value < 0 else '+' if i else ''} {units.printed(abs(value) * factor)}".strip()
                               for i, value in enumerate(row.terms.values()))
            total = units.printed(row.total * factor)
            rows.append({"cells": [row.combination.clause, _combination(row.combination.text), numbers, total.replace("-", "−")], "strong": governs})
        said = " ".join(row.combination.text for row in service.rows)
        columns = [{"head": "Clause"}, {"head": "Combination"}, {"head": f"With numbers, {unit}"}, {"head": f"Total, {unit}", "align": "right"}]
        out.append(sheet.table(columns=columns, rows=rows, caption=f"Combinations of {basis.loads_standard}, {basis.method}; tension positive, "
                                                                   "the governing ones in bold"
                                                                   + ("; W′: wind in the opposite sense." if "W_opp" in said else ".")))
    else:
        out.append(sheet.prose(runs=f"The required strength is given at {demand.level} level."))
    out += steps(expected, basis.edition, system)
    out.append(sheet.prose(runs=[
        "Required tension ", {"math": f"{sign} = {value_latex(up(demand.required_tension * factor), unit)}"
                                        + in_brackets(demand.required_tension, "kip", system, up), "alt": "required tension"},
        *([f"; required compression {units.amount(demand.required_compression, 'kip', system, up)}"] if demand.required_compression > 0 else
          ["; no combination gives compression" if isinstance(demand, Demands) else "; no compression is given"]), "."]))
    return out


def designed(connection):
    """Return what is to be built, for comparison with the drawings."""
    system = connection.basis.units_system
    with units.lengths_in(system):
        return sheet.pairs(rows=[[key, units.told(value, system), ""] for key, value in connection.designed()])


LEAST_REPEATED = 2
"""So many lines in a row that stand in a check before are not written out again; their results are."""


def steps(done, edition, system="US", worked=None, title=""):
    """Return remembered steps as blocks: remarks as prose, each formula call as an equation with its clause.

    Parameters
    ----------
    done : the steps of a check. edition : of the specification. system : of units.
    worked : calls written out before in the same part -> title of their check, added to; None to write out every line.
    title : of this check.
    """
    out, worked, k = [], {} if worked is None else worked, 0
    before = {key: check for key, check in worked.items() if key != _call(done[-1])}  # the available strength is always written out
    while k < len(done):
        step, end = done[k], k
        while end < len(done) and before.get(_call(done[end])) == before.get(_call(step), "none"):
            end += 1
        while end > k and isinstance(done[end - 1], str):  # a remark stays with the line it introduces
            end -= 1
        repeated = [each for each in done[k:end] if not isinstance(each, str)]
        if len(repeated) >= LEAST_REPEATED:
            out.append(_as_before(before[_call(step)], repeated, edition, system))
            k = end
            continue
        k += 1
        worked[_call(step)] = title
        if isinstance(step, str):
            out.append(sheet.prose(runs=runs_of(step)))
            continue
        formula, values = step
        lines = [line.rendered(system) for line in formula.lines(*values, edition=edition)]
        out.append(sheet.equation(lines=[{"lhs": line.sign, "rows": [row for row in (line.symbolic, line.numeric, line.result) if row]}
                                         for line in lines],
                                  alt=" ".join(line.reading for line in lines), clause=formula.clause[edition]))
    return out


def _call(step):
    """Return what tells a step from others: a remark's text, or the formula and its values."""
    return step if isinstance(step, str) else (id(step[0]), *map(repr, step[1]))


def _as_before(title, repeated, edition, system):
    """Return the results of lines written out in a check before, as one remark that names it."""
    runs = [f"As under “{title}”: "]
    for i, (formula, values) in enumerate(repeated):
        line = formula.lines(*values, edition=edition)[-1].rendered(system)
        runs += [", "] if i else []
        runs.append({"math": f"{line.sign} = {line.result}", "alt": line.reading})
    return sheet.prose(runs=[*runs, "."])


def checks(connection, part):
    """Return the checks of one part, every line written out; detailing as one table."""
    if part == "detailing":
        return _detailing(connection)
    system = connection.basis.units_system
    out = [sheet.heading(text=connection.parts[part])]
    shown = [each for each in connection.checks if each.part == part and each.kind == "strength"]
    worked = {}
    for each in shown:
        if not each.applies:
            continue
        out.append(sheet.heading(text=_within(each), level=2))
        out += steps(each.steps, connection.basis.edition, system, worked, _within(each))
        sign = r"\phi " if connection.basis.method == "LRFD" else ""
        nominal = "P_n" if each.axial else "R_n"
        strength = f"{sign}{nominal}" if sign else rf"{nominal}/\Omega"
        if each.unit != "kip":
            strength = SYMBOLS[each.steps[-1][0].result].latex
        unit, factor = units.shown_as(each.unit, system)
        lhs = [{"math": f"{strength} = {value_latex(units.floor_figures(each.available * factor), unit)}"
                        + in_brackets(each.available, each.unit, system, units.floor_figures), "alt": f"available strength {available(each, system)}"}]
        out.append(sheet.verdict(lhs=lhs, text=f"{units.ceil_figures(each.demand * factor)} / {units.floor_figures(each.available * factor)}",
                                 ratio_text=ratio(each), ok=each.ok))
        out += [sheet.note(runs=remark) for remark in each.notes]
    for made in connection.tables(part):
        out += _table(made, system)
    return [*out, *not_applicable(shown)]


def _within(each):
    """Return a check's title as a heading under its part."""
    title = each.title if each.part == "bolts" or each.unit != "kip" else each.title.partition(", ")[2]
    return title[0].upper() + title[1:]


def _detailing(connection):
    rows, system = [], connection.basis.units_system
    for each in connection.checks:
        if each.kind == "strength":
            continue
        if not each.applies:
            rows.append({"cells": [each.title, each.clause], "span_reason": [2, f"not applicable: {each.reason}"]})
            continue
        limit = [step for step in each.steps if not isinstance(step, str)]
        shown = ""
        if limit:
            formula, values = limit[-1]
            line = formula.lines(*values)[-1].rendered(system)
            shown = [{"math": f"{line.sign} = {line.symbolic} = {line.result}" if line.symbolic else f"{line.sign} = {line.result}",
                      "alt": line.reading}]
        verdict = "OK" if each.ok else ("see note" if each.kind == "advice" else "N.G.")
        rows.append({"cells": [each.title, each.clause, shown, _limit(each, system), _provided(each, system), ratio(each), verdict],
                     "strong": not each.ok})
    columns = [{"head": "Check"}, {"head": "Clause"}, {"head": "Limit"}, {"head": "Required", "align": "right"},
               {"head": "Provided", "align": "right"}, {"head": "D/C", "align": "right"}, {"head": ""}]
    remarks = dict.fromkeys(remark for each in connection.checks if each.kind != "strength" for remark in each.notes)
    return [sheet.heading(text=connection.parts["detailing"]), sheet.table(columns=columns, rows=rows),
            *([sheet.note(runs=" ".join(remarks))] if remarks else [])]


def _table(made, system="US"):
    """Return a family's own table as blocks."""
    if system == "SI":
        made = in_si(made)
    columns = [{"head": runs_of(head), "align": "right" if i else "left"} for i, head in enumerate(made.heads)]
    rows = [{"cells": [runs_of(cell) for cell in row]} for row in made.rows]
    out = [sheet.heading(text=made.title, level=2), sheet.table(columns=columns, rows=rows, caption=runs_of(made.caption))]
    return [*out, sheet.prose(runs=runs_of(made.remark))] if made.remark else out


def permissible(connection):
    """Return the table of the largest value of each service load with the others fixed."""
    inputs, basis = connection.inputs, connection.basis
    service, capacity, system = inputs.service(), connection.capacity, basis.units_system
    rows = []
    for nature, value in service.items():
        if value < 0:
            continue
        found = permissible_load(capacity, service, nature, basis.method, basis.loads, **inputs.load_options())
        limit = _combination(found.combination.text) if found.combination else ""
        largest = units.amount(found.value, "kip", system, units.floor_figures) if found.value is not None else "none"
        rows.append({"cells": [nature, units.amount(value, "kip", system, units.printed), largest,
                               limit if found.value is not None else units.told(found.reason, system)]})
    columns = [{"head": "Load"}, {"head": "As given", "align": "right"}, {"head": "Permissible", "align": "right"}, {"head": "Limited by"}]
    return [sheet.heading(text="Permissible loads"),
            sheet.prose(runs=f"The connection permits a required tension of {units.amount(capacity, 'kip', system, units.floor_figures)} "
                             f"({basis.method}). Largest value of each load with the others as given:"),
            sheet.table(columns=columns, rows=rows)]


def used_symbols(connection):
    """Return the symbols that the report's lines use, in the table's order."""
    used = set()
    for done in (*connection.load_steps(), *(each.steps for each in connection.checks)):
        for step in done:
            if isinstance(step, tuple) and isinstance(step[0], Formula):
                used |= set(step[0].arguments) | {line.symbol for line in step[0].body}
    return [symbol for name, symbol in SYMBOLS.items() if name in used]


def _works(connection):
    """Return the works beside specification and loads that a calculation goes by: for bolts, for welds, for what the Manual alone gives."""
    built = " ".join(word for row in connection.designed() for word in row).lower()
    clauses = " ".join(each.clause for each in connection.checks if each.applies)
    asked = {"RCSC": re.search(r"\bbolts?\b", built), "AWS D1.1": re.search(r"weld|fillet", built), "Manual": "Manual" in clauses,
             "AISC 341": connection.inputs.seismic_system}
    return [name for name, needed in asked.items() if needed]


def closing(connection):
    """Return notation, references and cautions."""
    basis = connection.basis
    rows = [{"latex": symbol.latex, "alt": symbol.spoken, "meaning": symbol.meaning,
             "unit": units.shown_as(symbol.unit, basis.units_system)[0] or "–"} for symbol in used_symbols(connection)]
    works = [[basis.specification, REFERENCES[basis.edition]], [basis.loads_standard, REFERENCES[basis.loads]],
             *([name, REFERENCES[f"{name} {basis.edition}"]] for name in _works(connection))]
    return [sheet.heading(text="Notation"), sheet.notation(rows=rows), sheet.heading(text="References"), sheet.references(rows=works),
            sheet.heading(text="Cautions"), sheet.cautions(rows=list(CAUTIONS))]
