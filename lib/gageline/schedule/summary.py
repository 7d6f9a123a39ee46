"""The summary of a schedule as one PDF: every mark with its governing check and D/C, worst first, and what could not be made."""

import json
from collections import Counter

from .. import identity, units
from ..presenting import CAUTIONS
from ..sheet import blocks as sheet
from ..sheet.build import set_pdf, sheet_data

_NAMED = 12


def made(found):
    """Return the bytes of the summary of an ``Outcome``; the same outcome gives the same bytes."""
    blocks = [_meta(found), _cover(found), sheet.heading(text="Marks, worst first"), *_marks(found), *_faults(found), *_defaults(found),
              sheet.heading(text="Program identification"), sheet.identification(rows=_identification(found))]
    output = {"output_type": "display_data", "metadata": {}, "data": sheet.mimebundle(blocks)}
    cell = {"cell_type": "code", "id": "summary", "metadata": {}, "source": "", "outputs": [output], "execution_count": None}
    data = sheet_data({"nbformat": 4, "nbformat_minor": 5, "metadata": {}, "cells": [cell]})
    # What it was made from is the schedule, not a notebook.
    data["attachments"] = [entry for entry in data["attachments"] if not entry["name"].endswith(".ipynb")]
    own = found.places.books.parent / "sheet"
    return set_pdf(data, sheet_folder=own if (own / "sheet.typ").is_file() else None)


def _meta(found):
    job, results = found.job, [{"mark": mark.mark, "row": mark.row, **mark.results} for mark in found.good]
    read = {"heads": [vars(column) for column in found.schedule.columns], "rows": [vars(row) for row in found.schedule.rows]}
    files = {"results.json": (results, "The results of every mark"),
             "errors.json": ([vars(each) for each in found.all_faults], "The rows that were not made, and why"),
             "schedule.json": (read, "The schedule as read")}
    attached = [{"name": name, "mime": "application/json", "text": json.dumps(data, indent=1, ensure_ascii=False, sort_keys=True) + "\n",
                 "description": said} for name, (data, said) in files.items()]
    return sheet.meta(project=job.project, client=job.client, location=job.location, job=job.job, mark=_short(found), title="Summary of a schedule",
                      rev=job.rev, rev_date=job.date.isoformat(), status=f"{job.status.upper()}, NOT ISSUED", firm=job.firm,
                      edition=job.basis.specification, method=job.method, loads=job.basis.loads_standard, paper=job.paper, attachments=attached)


def _short(found):
    name = found.places.workbook.stem
    return name if len(name) <= 10 else "schedule"


def _cover(found):
    from ..editions import REFERENCES

    good, job = found.good, found.job
    failed = [mark for mark in good if not mark.results["ok"]]
    told = f"{len(good)} marks: {len(good) - len(failed)} OK, {len(failed)} N.G."
    if good:
        worst = max(good, key=lambda mark: mark.results["ratio"])
        told += f" Largest D/C = {units.ratio_text(worst.results['ratio'])}, mark {worst.mark}, {_governing(worst)['title'].lower()}."
    missing = len(found.all_faults)
    open_items = [f"Marks that are N.G.: {_list_of([mark.mark for mark in failed])}."] if failed else []
    open_items += [f"Rows of the schedule that were not made: {missing}; see the table of errors."] if missing else []
    open_items += [f"Notebooks of marks that the schedule no longer has: {_list_of(found.left_over)}."] if found.left_over else []
    return sheet.cover(title="Summary of a schedule", governing=told,
                       purpose=f"Governing check and D/C of every mark of {found.schedule.path.name}. Each mark has a calculation of its own, "
                               f"in the folder {found.places.pdfs.name}; this summary replaces none of them.",
                       criteria=[["Specification", REFERENCES[job.edition]], ["Method", job.method], ["Loads", REFERENCES[job.loads]],
                                 ["Units", "kip, inch, ksi"]],
                       open_items=open_items, cautions=list(CAUTIONS[:3]))


def _list_of(names):
    return ", ".join(names[:_NAMED]) + (f" and {len(names) - _NAMED} more" if len(names) > _NAMED else "")


def _governing(mark):
    return next(check for check in mark.results["checks"] if check["id"] == mark.results["governing"])


def _marks(found):
    rows = []
    for mark in found.good:
        governs, ok = _governing(mark), mark.results["ok"]
        others = [check["title"] for check in mark.results["checks"] if check["applies"] and check["ok"] is False and check["kind"] != "advice"
                  and check["id"] != governs["id"]]
        said = governs["title"] + (f"; N.G. too: {_list_of(others)}" if others else "")
        system = mark.results.get("units", "US")
        rows.append({"cells": [mark.mark, mark.family, said, governs["clause"], units.amount(governs["demand"], "kip", system, units.ceil_figures),
                               units.amount(governs["available"], "kip", system, units.floor_figures), units.ratio_text(mark.results["ratio"]),
                               "OK" if ok else "N.G."],
                     "strong": not ok})
    if not rows:
        return [sheet.prose(runs="No mark was made.")]
    columns = [{"head": "Mark"}, {"head": "Family"}, {"head": "Governing check", "width": 2.0}, {"head": "Clause"},
               {"head": "Required", "align": "right"}, {"head": "Available", "align": "right"}, {"head": "D/C", "align": "right"}, {"head": ""}]
    return [sheet.table(columns=columns, rows=rows)]


def _faults(found):
    if not found.all_faults:
        return []
    rows = [{"cells": [str(each.row), _broken(each.mark), _broken(each.column), _broken(each.sentence)]} for each in found.all_faults]
    columns = [{"head": "Row", "align": "right", "width": 0.45}, {"head": "Mark", "width": 0.9}, {"head": "Column", "width": 1.3},
               {"head": "What is wrong", "width": 4.0}]
    return [sheet.heading(text="Errors: rows that were not made"), sheet.table(columns=columns, rows=rows)]


def _broken(text):
    """Return a text that any column can hold: unprintable signs shown, words cut where they are too long for a line."""
    shown = "".join(sign if sign.isprintable() and ord(sign) < 0x2600 else f"U+{ord(sign):04X}" for sign in text)
    return " ".join(word if len(word) <= 14 else " ".join(word[i:i + 14] for i in range(0, len(word), 14)) for word in shown.split())


def _defaults(found):
    counts = Counter((name, str(value)) for mark in found.good for name, value in mark.defaults.items())
    if not counts:
        return []
    rows = [{"cells": [name, _broken(value), f"{count} of {len(found.good)} marks"]} for (name, value), count in sorted(counts.items())]
    return [sheet.heading(text="Inputs left at the template's default"),
            sheet.table(columns=[{"head": "Input"}, {"head": "Default"}, {"head": "Blank in", "align": "right"}], rows=rows)]


def _identification(found):
    families = sorted({mark.family for mark in found.marks}) or ["bolted"]
    return list(dict.fromkeys(row for family in families for row in identity.rows(family)))
