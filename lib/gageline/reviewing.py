"""The record of review as blocks of the sheet: sign-offs, checker's list, comments with responses, register of open items."""

from .sheet import blocks as sheet
from .signoffs import HEADINGS, ROLES


def review(calc):
    """Return the record of review: sign-offs, the checker's list, comments with responses, the register of open items; [] if there is none."""
    log, out = calc.log, []
    register = [row for row in calc.register() if row["kind"] == "open item"]
    if not log.events and not register:
        return []
    out.append(sheet.heading(text="Sign-offs, review and open items"))
    held = [log.sign_off(role, calc.content) for role in ROLES]
    rows = [{"cells": [role.capitalize(), each["who"], each["when"][:10], each["method"] or "–"]} if each
            else {"cells": [role.capitalize()], "span_reason": [1, "not signed"]}
            for role, each in zip(ROLES, held)]
    if any(held):
        out.append(sheet.table(columns=[{"head": "Role"}, {"head": "Name"}, {"head": "Date"}, {"head": "Method of check"}], rows=rows))
    else:
        out.append(sheet.prose(runs=f"Not signed yet by {', '.join(ROLES[:-1])} or {ROLES[-1]}."))
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
