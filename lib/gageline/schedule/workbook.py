"""The results of a schedule as a workbook: one sheet of marks, one of every check, one of the inputs, one of errors."""

import datetime
import io
import math
import re
import zipfile

from .. import __version__, identity

_GREY, _RED = "FFEDEBE5", "FF8A2B1E"
_UNPRINTABLE = re.compile(r"[\x00-\x08\x0b\x0c\x0e-\x1f\ud800-\udfff\ufffe\uffff]")


def made(found):
    """Return the bytes of the workbook of an ``Outcome``; the same outcome gives the same bytes.

    Every text is stored as text: one that begins like a formula is never computed, here or where it is edited.
    """
    from openpyxl import Workbook

    book = Workbook()
    book.remove(book.active)
    _results(book.create_sheet("Results"), found)
    _checks(book.create_sheet("Checks"), found)
    _inputs(book.create_sheet("Inputs"), found)
    _sheet(book.create_sheet("Errors"), ("Row", "Mark", "Column", "What is wrong"), (8, 16, 26, 110),
           [(fault.row, fault.mark, fault.column, fault.sentence) for fault in found.all_faults])
    _sheet(book.create_sheet("About"), ("What", "Value"), (26, 90), [
        ("Project", found.job.project), ("Job", found.job.job), ("Revision", found.job.rev), ("Date of the revision", found.job.date.isoformat()),
        ("Specification", found.job.basis.specification), ("Method", found.job.method), ("Loads", found.job.basis.loads_standard),
        ("Schedule", found.schedule.path.name), ("Program", f"gageline {__version__}"), ("Code and tables, SHA-256", identity.program_hash()),
        ("Units", "kip, inch"), ("Caution", "Results of calculations that nobody has signed; the PDFs say what they stand on.")])
    stamp = datetime.datetime.combine(found.job.date, datetime.time(12))
    book.properties.creator, book.properties.title = "gageline", f"Results of {_plain(found.schedule.path.name)}"
    book.properties.created = stamp
    out = io.BytesIO()
    book.save(out)
    return _undated(out.getvalue(), stamp)


def _results(sheet, found):
    rows = []
    for mark in found.good:
        results = mark.results
        governs = next(check for check in results["checks"] if check["id"] == results["governing"])
        rows.append((mark.mark, mark.row, mark.family, governs["title"], governs["clause"], governs["demand"], governs["available"],
                     _up(results["ratio"]), "OK" if results["ok"] else "N.G.", results["demand"]["tension"], results["demand"]["compression"],
                     results["capacity"], f"{found.places.pdfs.name}/{mark.mark}.pdf"))
    heads = ("Mark", "Row", "Family", "Governing check", "Clause", "Required, kip", "Available, kip", "D/C", "Verdict", "Tension, kip",
             "Compression, kip", "Capacity, kip", "PDF")
    _sheet(sheet, heads, (16, 7, 12, 36, 14, 14, 14, 9, 9, 13, 17, 14, 30), rows, {6: "0.0", 7: "0.0", 8: "0.000", 10: "0.0", 11: "0.0", 12: "0.0"})
    for line, mark in enumerate(found.good, start=2):
        sheet.cell(line, 13).hyperlink = f"{found.places.pdfs.name}/{mark.mark}.pdf"


def _checks(sheet, found):
    rows = []
    for mark in found.good:
        for check in mark.results["checks"]:
            said = (mark.mark, check["title"], check["part"], check["clause"], check["kind"])
            if not check["applies"]:
                rows.append((*said, None, None, "", None, "not applicable", check["reason"]))
                continue
            verdict = "OK" if check["ok"] else "see note" if check["kind"] == "advice" else "N.G."
            rows.append((*said, check["demand"], check["available"], check["unit"], None if check["ratio"] is None else _up(check["ratio"]), verdict,
                         " ".join(check["notes"])))
    heads = ("Mark", "Check", "Part", "Clause", "Kind", "Required", "Available", "Unit", "D/C", "Verdict", "Remark")
    _sheet(sheet, heads, (16, 40, 12, 14, 11, 12, 12, 7, 9, 15, 60), rows, {6: "0.000", 7: "0.000", 9: "0.000"})


def _inputs(sheet, found):
    from openpyxl.styles import Font

    rows = [(mark.mark, name, _shown(each.value), each.source, "template's default" if name in mark.defaults else "schedule")
            for mark in found.marks for name, each in mark.given.items()]
    _sheet(sheet, ("Mark", "Input", "Value", "Source", "From"), (16, 24, 40, 50, 20), rows)
    for line in sheet.iter_rows(min_row=2):
        if line[4].value == "template's default":
            for cell in line:
                cell.font = Font(italic=True, color=_RED)


def _sheet(sheet, heads, widths, rows, formats=None):
    """Fill a sheet: bold frozen head with filters, texts as texts, numbers as numbers in their format."""
    from openpyxl.styles import Alignment, Font, PatternFill
    from openpyxl.utils import get_column_letter

    for i, (head, width) in enumerate(zip(heads, widths), start=1):
        cell = sheet.cell(1, i, head)
        cell.font, cell.fill = Font(bold=True), PatternFill("solid", fgColor=_GREY)
        cell.alignment = Alignment(vertical="top", wrap_text=True)
        sheet.column_dimensions[get_column_letter(i)].width = width
    for line, row in enumerate(rows, start=2):
        for i, value in enumerate(row, start=1):
            cell = sheet.cell(line, i)
            if isinstance(value, str):
                text = _plain(value)
                cell.value = text
                cell.data_type = "s"
                cell.quotePrefix = text[:1] in ("=", "+", "-", "@", "\t", "\r")
                cell.alignment = Alignment(vertical="top", wrap_text=len(text) > widths[i - 1])
            elif value is not None:
                cell.value = value if not isinstance(value, float) or math.isfinite(value) else "∞"
                cell.number_format = (formats or {}).get(i, "General")
                cell.alignment = Alignment(vertical="top")
            if value == "N.G.":
                cell.font = Font(bold=True, color=_RED)
    sheet.freeze_panes = "B2"
    sheet.auto_filter.ref = f"A1:{get_column_letter(len(heads))}{max(2, len(rows) + 1)}"
    sheet.print_title_rows = "1:1"


def _up(ratio):
    """Return D/C to three decimals, never rounded past 1.00 and never below a value that is over it."""
    from ..units import ratio_text

    return ratio if not math.isfinite(ratio) else float(ratio_text(ratio))


def _plain(text):
    return _UNPRINTABLE.sub("�", text)[:32_000]


def _shown(value):
    return "; ".join(map(_shown, value)) if isinstance(value, (list, tuple)) else "yes" if value is True else "no" if value is False else str(value)


def _undated(data, stamp):
    """Return a workbook's bytes without the time at which it was saved."""
    out = io.BytesIO()
    with zipfile.ZipFile(io.BytesIO(data)) as old, zipfile.ZipFile(out, "w", zipfile.ZIP_DEFLATED) as new:
        for entry in old.infolist():
            text = old.read(entry)
            if entry.filename == "docProps/core.xml":
                text = re.sub(rb"(<dcterms:modified[^>]*>)[^<]*", rb"\g<1>" + stamp.strftime("%Y-%m-%dT%H:%M:%SZ").encode(), text)
            kept = zipfile.ZipInfo(entry.filename, (1980, 1, 1, 0, 0, 0))
            kept.compress_type, kept.external_attr = zipfile.ZIP_DEFLATED, 0o644 << 16
            new.writestr(kept, text)
    return out.getvalue()
