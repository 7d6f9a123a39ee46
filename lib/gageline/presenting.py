"""The parts of a report as blocks of the sheet: tables of summary, inputs, loads and bolts, and the checks line by line."""

import re

from . import check, units
from .editions import REFERENCES
from .formula import Formula
from .loads import Demands
from .loads import permissible as permissible_load
from .render import value_latex
from .sheet import blocks as sheet
from .signoffs import HEADINGS, ROLES
from .symbols import SYMBOLS

NEEDS_NO_SOURCE = ("mark", "title", "purpose", "assumptions", "open_items", "U_basis", "gusset_K_basis", "p_basis", "p_beam_basis", "pin_shear_basis")
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


def _amount(value, unit, rounded):
    return f"{rounded(value)} {unit}".strip()


def runs_of(text):
    """Return a remark of ours as runs: what stands between dollar signs is a symbol."""
    parts = text.split("$")
    return [{"math": part, "alt": part.replace("_", " ")} if i % 2 else part for i, part in enumerate(parts) if part]


def required(each):
    """Return what a check requires, never rounded down."""
    return _amount(each.demand, each.unit, units.ceil_figures if each.kind == "strength" else _length)


def available(each):
    """Return what is available, never rounded up."""
    return _amount(each.available, each.unit, units.floor_figures if each.kind == "strength" else _length)


def figure(drawn):
    """Return a drawn figure as a block."""
    return sheet.figure(svg=drawn.svg, caption=drawn.caption, alt=drawn.alt, width=drawn.width)


def cover(calc):
    """Return the cover block of a calculation."""
    connection, job = calc.connection, calc.project
    governs = connection.governing
    applied = [each.title for each in connection.checks if each.applies and each.kind == "strength"]
    limits = sum(each.applies and each.kind != "strength" for each in connection.checks)
    applied.append(f"Spacing, edges, clearance, slenderness ({limits} limits)")
    apart = [[each.title, each.reason] for each in connection.checks if not each.applies and each.kind == "strength"]
    verdict = "all checks satisfied" if connection.ok else "N.G.: not every check is satisfied"
    taken = [[row["id"], runs_of(row["text"]), row["basis"], row["status"]] for row in calc.register() if row["kind"] == "assumption"]
    signed = calc.signed()
    return sheet.cover(
        title=connection.inputs.title or connection.title,
        governing=f"{governs.title} governs: required {required(governs)}, available {available(governs)}, "
                  f"D/C = {ratio(governs)}; {verdict}.",
        purpose=connection.inputs.purpose or f"{connection.title} of {connection.subject}: strength of the member's end and of its "
                                             "connection, from the gross section to the connection plate.",
        criteria=[["Specification", REFERENCES[job.edition]], ["Method", job.method], ["Loads", REFERENCES[job.loads]],
                  ["Materials", runs_of(connection.materials_text())], ["Units", "kip, inch, ksi"]],
        scope={"checked": applied, "not_applicable": apart, "by_others": list(connection.left_to_others())},
        assumptions=taken, open_items=calc.open_items(), cautions=list(CAUTIONS[:3]),
        revisions=[[job.rev, job.date.isoformat(), job.revision_text, signed["by"], signed["checked"], signed["approved"]]])


def summary(connection):
    """Return the summary blocks."""
    governs = connection.governing
    rows = []
    ranked = check.worst_first([each for each in connection.checks if each.kind == "strength"])
    ranked.remove(governs)
    for each in (governs, *ranked):
        title = each.title + (" — governs" if each is governs else "")
        rows.append({"cells": [title, each.clause, required(each), available(each), ratio(each), "OK" if each.ok else "N.G."],
                     "strong": each is governs or not each.ok})
    for each in connection.checks:
        if each.kind == "strength" and not each.applies:
            rows.append({"cells": [each.title, each.clause], "span_reason": [2, f"not applicable: {each.reason}"]})
    columns = [{"head": "Check", "width": 2.6}, {"head": "Clause", "width": 0.85}, {"head": "Required", "align": "right"}, {"head": "Available", "align": "right"},
               {"head": "D/C", "align": "right"}, {"head": ""}]
    out = [sheet.heading(text="Summary"), sheet.table(columns=columns, rows=rows)]
    limits = [each for each in connection.checks if each.kind != "strength"]
    failed = [each for each in limits if each.ok is False]
    said = "All limits of spacing, edge distance and clearance are met; they are listed in their own section." if not failed else \
        "Not met: " + "; ".join(f"{each.title} ({required(each)} against {available(each)})" for each in failed) + "."
    return [*out, sheet.prose(runs=said)]


def inputs(calc):
    """Return the inputs as executed: given ones with their source, defaults marked so."""
    rows, defaults, group = [], [], None
    for heading, name, meaning, value, given in calc.connection.inputs.shown():
        if not given:
            defaults += [f"{name} = {value}"] if value not in ("not given", "none", "") else []
            continue
        if name in NEEDS_NO_SOURCE:
            continue
        if heading != group:
            rows.append({"cells": [], "span_reason": [0, [{"strong": heading}]]})
            group = heading
        typed = calc.given[name].value
        if isinstance(typed, str) and re.search(r"(mm|cm|kN|MPa|psi|lbf| m)$", typed.strip()):
            value = f"{typed} = {value}"
        rows.append({"cells": [name, meaning, value, calc.sources[name] or "no source given"]})
    columns = [{"head": "Input", "width": 1.35}, {"head": "Meaning", "width": 2.1}, {"head": "Value", "width": 1.45}, {"head": "Source"}]
    out = [sheet.heading(text="Inputs"), sheet.table(columns=columns, rows=rows)]
    return [*out, sheet.note(runs=f"Inputs left at their default: {'; '.join(defaults)}.")] if defaults else out


def _combination(text):
    """Return a load combination as maths; W′ is the wind in the opposite sense."""
    latex = text.replace("W_opp", "W'").replace("Q_E", "Q_{E}").replace("S_DS", "S_{DS}").replace("Ω_0", r"\Omega_0 ").replace("ρ", r"\rho ")
    latex = re.sub(r"\bLr\b", "L_r", re.sub(r"(?<=\d)Lr", "L_r", latex)).replace("−", "-")
    return [{"math": latex, "alt": text}]


def loads(connection):
    """Return the loads: all combinations with numbers, or the given demand."""
    demand, basis = connection.demand, connection.basis
    sign = "P_u" if basis.method == "LRFD" else "P_a"
    out = [sheet.heading(text="Loads and required strength")]
    if isinstance(demand, Demands):
        rows = []
        for row in demand.rows:
            governs = row is demand.tension or row is demand.compression
            numbers = " ".join(f"{'−' if value < 0 else '+' if i else ''} {units.printed(abs(value))}".strip()
                               for i, value in enumerate(row.terms.values()))
            total = units.printed(row.total)
            rows.append({"cells": [row.combination.clause, _combination(row.combination.text), numbers, total.replace("-", "−")], "strong": governs})
        columns = [{"head": "Clause"}, {"head": "Combination"}, {"head": "With numbers, kip"}, {"head": "Total, kip", "align": "right"}]
        out.append(sheet.table(columns=columns, rows=rows, caption=f"Combinations of {basis.loads_standard}, {basis.method}; tension positive, "
                                                                   "the governing ones in bold; W′: wind in the opposite sense."))
    else:
        out.append(sheet.prose(runs=f"The required strength is given at {demand.level} level."))
    out.append(sheet.prose(runs=[
        "Required tension ", {"math": f"{sign} = {value_latex(units.ceil_figures(demand.required_tension, 4), 'kip')}", "alt": "required tension"},
        *([f"; required compression {units.ceil_figures(demand.required_compression, 4)} kip"] if demand.required_compression > 0 else
          ["; no combination gives compression" if isinstance(demand, Demands) else "; no compression is given"]), "."]))
    return out


def designed(connection):
    """Return what is to be built, for comparison with the drawings."""
    return sheet.pairs(rows=[[key, value, ""] for key, value in connection.designed()])


def steps(done, edition):
    """Return remembered steps as blocks: remarks as prose, each formula call as an equation with its clause."""
    out = []
    for step in done:
        if isinstance(step, str):
            out.append(sheet.prose(runs=runs_of(step)))
            continue
        formula, values = step
        lines = [line.rendered() for line in formula.lines(*values, edition=edition)]
        out.append(sheet.equation(lines=[{"lhs": line.sign, "rows": [row for row in (line.symbolic, line.numeric, line.result) if row]}
                                         for line in lines],
                                  alt=" ".join(line.reading for line in lines), clause=formula.clause[edition]))
    return out


def checks(connection, part):
    """Return the checks of one part, every line written out; detailing as one table."""
    if part == "detailing":
        return _detailing(connection)
    out = [sheet.heading(text=connection.parts[part])]
    apart = []
    for each in connection.checks:
        if each.part != part or each.kind != "strength":
            continue
        if not each.applies:
            apart.append([each.title, each.reason, each.clause])
            continue
        out.append(sheet.heading(text=_within(each), level=2))
        out += steps(each.steps, connection.basis.edition)
        sign = r"\phi " if connection.basis.method == "LRFD" else ""
        nominal = "P_n" if each.axial else "R_n"
        strength = f"{sign}{nominal}" if sign else rf"{nominal}/\Omega"
        lhs = [{"math": f"{strength} = {value_latex(units.floor_figures(each.available), 'kip')}", "alt": f"available strength {available(each)}"}]
        out.append(sheet.verdict(lhs=lhs, text=f"{units.ceil_figures(each.demand)} / {units.floor_figures(each.available)}",
                                 ratio_text=ratio(each), ok=each.ok))
        out += [sheet.note(runs=remark) for remark in each.notes]
    for made in connection.tables(part):
        out += _table(made)
    if apart:
        out += [sheet.heading(text="Not applicable", level=2), sheet.pairs(rows=apart)]
    return out


def _within(each):
    """Return a check's title as a heading under its part."""
    title = each.title if each.part == "bolts" or each.unit != "kip" else each.title.partition(", ")[2]
    return title[0].upper() + title[1:]


def _detailing(connection):
    rows = []
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
            line = formula.lines(*values)[-1].rendered()
            shown = [{"math": f"{line.sign} = {line.symbolic} = {line.result}" if line.symbolic else f"{line.sign} = {line.result}",
                      "alt": line.reading}]
        verdict = "OK" if each.ok else ("see note" if each.kind == "advice" else "N.G.")
        provided = each.demand if each.at_most else each.available
        bound = f"{'≤' if each.at_most else '≥'} {_amount(each.nominal, each.unit, _length)}"
        rows.append({"cells": [each.title, each.clause, shown, bound, _amount(provided, each.unit, _length), ratio(each), verdict],
                     "strong": not each.ok})
    columns = [{"head": "Check", "width": 1.6}, {"head": "Clause", "width": 0.75}, {"head": "Limit", "width": 2.0}, {"head": "Required", "align": "right"},
               {"head": "Provided", "align": "right"}, {"head": "D/C", "align": "right"}, {"head": ""}]
    remarks = dict.fromkeys(remark for each in connection.checks if each.kind != "strength" for remark in each.notes)
    return [sheet.heading(text=connection.parts["detailing"]), sheet.table(columns=columns, rows=rows),
            *(sheet.note(runs=remark) for remark in remarks)]


def _table(made):
    """Return a family's own table as blocks."""
    columns = [{"head": runs_of(head), "align": "right" if i else "left"} for i, head in enumerate(made.heads)]
    rows = [{"cells": [runs_of(cell) for cell in row]} for row in made.rows]
    out = [sheet.heading(text=made.title, level=2), sheet.table(columns=columns, rows=rows, caption=runs_of(made.caption))]
    return [*out, sheet.prose(runs=runs_of(made.remark))] if made.remark else out


def permissible(connection):
    """Return the table of the largest value of each service load with the others fixed."""
    inputs, basis = connection.inputs, connection.basis
    service, capacity = inputs.service(), connection.capacity
    rows = []
    for nature, value in service.items():
        if value < 0:
            continue
        found = permissible_load(capacity, service, nature, basis.method, basis.loads, **inputs.load_options())
        limit = _combination(found.combination.text) if found.combination else ""
        largest = f"{units.floor_figures(found.value)} kip" if found.value is not None else "none"
        rows.append({"cells": [nature, f"{units.printed(value)} kip", largest, limit if found.value is not None else found.reason]})
    columns = [{"head": "Load"}, {"head": "As given", "align": "right"}, {"head": "Permissible", "align": "right"}, {"head": "Limited by"}]
    return [sheet.heading(text="Permissible loads"),
            sheet.prose(runs=f"The connection permits a required tension of {units.floor_figures(capacity)} kip ({basis.method}). "
                             "Largest value of each load with the others as given:"),
            sheet.table(columns=columns, rows=rows)]


def review(calc):
    """Return the record of review: sign-offs, the checker's list, comments with responses, the register of open items; [] if there is none."""
    log, out = calc.log, []
    register = [row for row in calc.register() if row["kind"] == "open item"]
    if not log.events and not register:
        return []
    out.append(sheet.heading(text="Sign-offs, review and open items"))
    held = [log.sign_off(role, calc.content) for role in ROLES]
    rows = [{"cells": [role, each["who"], each["when"][:10], each["method"] or "–"]} if each else {"cells": [role], "span_reason": [1, "not signed"]}
            for role, each in zip(ROLES, held)]
    out.append(sheet.table(columns=[{"head": "Role"}, {"head": "Name"}, {"head": "Date"}, {"head": "Method of check"}], rows=rows))
    if checker := held[ROLES.index("checker")]:
        out += [sheet.heading(text="Checker's list", level=2),
                sheet.pairs(rows=[[name.capitalize(), checker["findings"][name], ""] for name in HEADINGS])]
    if comments := log.comments():
        rows = []
        for each in comments:
            answers = "; ".join(f"{one['text']} ({one['who']}, {one['when'][:10]})" for one in each["answers"]) or "none yet"
            closed = f"closed {each['closed']['when'][:10]} by {each['closed']['who']}" if each["closed"] else "open"
            rows.append({"cells": [each["id"], f"{each['on']} ({each['who']}, {each['when'][:10]}): {each['text']}", answers, closed],
                         "strong": not each["closed"]})
        columns = [{"head": "No."}, {"head": "Comment", "width": 2.6}, {"head": "Response", "width": 2.2}, {"head": "Status"}]
        out += [sheet.heading(text="Review comments", level=2), sheet.table(columns=columns, rows=rows)]
    if register:
        rows = [{"cells": [row["id"], row["text"], row["basis"], row["status"]], "strong": row["open"]} for row in register]
        columns = [{"head": "No."}, {"head": "Item", "width": 2.9}, {"head": "Raised by", "width": 1.2}, {"head": "Status"}]
        out += [sheet.heading(text="Register of open items", level=2), sheet.table(columns=columns, rows=rows)]
    return out


def used_symbols(connection):
    """Return the symbols that the report's lines use, in the table's order."""
    used = set()
    for each in connection.checks:
        for step in each.steps:
            if isinstance(step, tuple) and isinstance(step[0], Formula):
                used |= set(step[0].arguments) | {line.symbol for line in step[0].body}
    return [symbol for name, symbol in SYMBOLS.items() if name in used]


def closing(connection):
    """Return notation, references and cautions."""
    basis = connection.basis
    rows = [{"latex": symbol.latex, "alt": symbol.spoken, "meaning": symbol.meaning, "unit": symbol.unit or "–"} for symbol in used_symbols(connection)]
    works = [[basis.specification, REFERENCES[basis.edition]], [basis.loads_standard, REFERENCES[basis.loads]],
             ["RCSC", REFERENCES[f"RCSC {basis.edition}"]]]
    return [sheet.heading(text="Notation"), sheet.notation(rows=rows), sheet.heading(text="References"), sheet.references(rows=works),
            sheet.heading(text="Cautions"), sheet.cautions(rows=list(CAUTIONS))]
