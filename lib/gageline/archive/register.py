"""The register of a project's issues, read from their records: rows, CSV, JSON."""

import csv
import io

from .. import store, units
from . import records
from .reading import SIGN_ROLES

COLUMNS = ("mark", "rev", "status", "issued as", "date", "title", "governing check", "D/C", "verdict", "prepared", "checked", "approved",
           "program", "file", "sha256")


def rows(ledger):
    """Return the register's rows as dicts of texts by ``COLUMNS``, by mark and revision."""
    out = []
    for mark in sorted({mark for mark, _ in ledger.issues}):
        for record in ledger.revisions(mark):
            results = record["results"]
            governing = next((each["title"] for each in results["checks"] if each["id"] == results["governing"]), results["governing"])
            name = f"{records.stem(mark, record['rev'])}.pdf"
            out.append(dict(zip(COLUMNS, (
                mark, record["rev"], ledger.status(record), record["status"], record["date"], record["title"], governing,
                units.ratio_text(results["ratio"]), "OK" if results["ok"] else "N.G.", *(record["signed"][field] for field in SIGN_ROLES.values()),
                record["versions"].get("Program", ""), name, record["files"].get(name, {}).get("sha256", "")))))
    return out


def as_json(ledger):
    """Return the register with its faults as JSON text."""
    return store.canonical({"folder": ledger.folder.name, "issues": rows(ledger), "faults": ledger.faults}).decode()


def as_csv(ledger):
    """Return the register as CSV text; no cell can begin a formula in a spreadsheet."""
    out = io.StringIO()
    writer = csv.writer(out, quoting=csv.QUOTE_ALL)
    writer.writerow(COLUMNS)
    writer.writerows([unformula(row[name]) for name in COLUMNS] for row in rows(ledger))
    return out.getvalue()


def unformula(text):
    """Return a text that a spreadsheet takes as text: an apostrophe goes before what could begin a formula.

    >>> unformula("=1+1"), unformula("H1"), unformula(" @x")
    ("'=1+1", 'H1', "' @x")
    """
    return f"'{text}" if text.lstrip()[:1] in tuple("=+-@|%＝＋－＠") or (text[:1] in "\t\r\n" and text) else text
