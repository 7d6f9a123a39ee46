"""One PDF of all marks of a project as issued: a cover with the index, continuous sheet numbers, bookmarks; its tags are kept.

The issued files are only read, and stay what can be verified; a bound set repeats them with its own sheet number at each foot.
"""

import io
from pathlib import Path

from .. import presenting, project, store, units
from ..errors import ReportError
from ..sheet import blocks as sheet
from ..sheet.build import set_pdf, sheet_data
from ..sheet.notebook import as_notebook
from . import records, stamping

STANDING = ("preliminary", "for review", "for approval", "for construction")


def bind(project_folder):
    """Return (PDF's bytes, records bound) of a project's latest standing revision of each mark.

    Parameters
    ----------
    project_folder : the folder of project.toml.

    Raises
    ------
    ReportError
        Nothing is issued, a file is not what was issued, or the set cannot be put together.
    """
    path = project.find(project_folder)
    ledger = records.read(records.reports_folder(path.parent))
    chosen = [next((each for each in reversed(ledger.revisions(mark)) if ledger.status(each) in STANDING), None)
              for mark in sorted({mark for mark, _ in ledger.issues})]
    chosen = [record for record in chosen if record]
    if not chosen:
        raise ReportError(f"{ledger.folder}: nothing is issued that could be bound")
    if ledger.faults:
        raise ReportError(f"a set is not bound while something is wrong with its records: {ledger.faults[0]}")
    return _joined(path, project.load(path), ledger, chosen), chosen


def _joined(path, job, ledger, chosen):
    import pikepdf

    parts = [pikepdf.open(ledger.folder / f"{records.stem(record['mark'], record['rev'])}.pdf") for record in chosen]
    try:
        counts = [len(part.pages) for part in parts]
        pages = 1
        # The cover's own length decides on which sheet each calculation begins.
        while True:
            cover = pikepdf.open(io.BytesIO(_cover(path, job, ledger, chosen, counts, pages)))
            if len(cover.pages) == pages:
                break
            pages = len(cover.pages)
        starts = [pages + sum(counts[:i]) for i in range(len(counts))]
        total = pages + sum(counts)
        for part in parts:
            _append(cover, part)
        stamping.overlay(cover, [{"stamp": "", "line": f"Set: sheet {i} of {total}"} for i in range(1, total + 1)])
        with cover.open_outline() as outline:
            outline.root[:] = [pikepdf.OutlineItem("Cover and index", 0)]
            for record, start, part in zip(chosen, starts, parts):
                item = pikepdf.OutlineItem(f"{record['mark']} rev {record['rev']}: {record['title']}", start)
                with part.open_outline() as inner:
                    item.children.extend(pikepdf.OutlineItem(each.title, start + _page_of(part, each)) for each in inner.root)
                outline.root.append(item)
        labels = pikepdf.Array([0, cover.make_indirect(pikepdf.Dictionary(S=pikepdf.Name.D, St=1))])
        cover.Root.PageLabels = cover.make_indirect(pikepdf.Dictionary(Nums=labels))
        return stamping.saved(cover)
    finally:
        for part in parts:
            part.close()


def _page_of(part, item):
    """Return the page index that a bookmark of a calculation leads to; named and explicit destinations both."""
    where = item.destination if item.destination is not None else item.action.D if item.action is not None else None
    if (where is not None and not hasattr(where, "__len__")) or isinstance(where, str):
        where = None
    try:
        page = where[0]
        return next(i for i, each in enumerate(part.pages) if each.obj.objgen == page.objgen)
    except (TypeError, IndexError, StopIteration, AttributeError, ValueError):
        return 0


def _append(cover, part):
    """Append a PDF's pages with their tags: its structure becomes a further part of the set's structure."""
    import pikepdf

    root = cover.Root.StructTreeRoot
    shift = int(root.ParentTreeNextKey) if "/ParentTreeNextKey" in root else _next_key(root.ParentTree)
    first = len(cover.pages)
    cover.pages.extend(part.pages)
    theirs = cover.copy_foreign(part.make_indirect(part.Root.StructTreeRoot))
    highest = -1
    for page in cover.pages[first:]:
        holders = [page.obj, *page.obj.get("/Annots", [])]
        for holder in holders:
            for key in ("/StructParents", "/StructParent"):
                if key in holder:
                    highest = max(highest, int(holder[key]))
                    holder[key] = int(holder[key]) + shift
    flat = [(number + shift, value) for number, value in _numbers(theirs.ParentTree)]
    nums = [each for pair in [*_numbers(root.ParentTree), *flat] for each in pair]
    root.ParentTree = cover.make_indirect(pikepdf.Dictionary(Nums=pikepdf.Array(nums)))
    root.ParentTreeNextKey = shift + max([highest, *(number - shift for number, _ in flat)]) + 1
    kids = list(theirs.K) if isinstance(theirs.K, pikepdf.Array) else [theirs.K]
    for kid in kids:
        kid.P = root
    mine = list(root.K) if isinstance(root.K, pikepdf.Array) else [root.K]
    root.K = pikepdf.Array([*mine, *kids])
    for name in ("/RoleMap", "/ClassMap"):
        if name in theirs:
            root[name] = cover.make_indirect(pikepdf.Dictionary({**dict(root.get(name, {})), **dict(theirs[name])}))


def _numbers(tree):
    """Return (number, value) of a number tree, flattened."""
    out = [(int(tree.Nums[i]), tree.Nums[i + 1]) for i in range(0, len(tree.Nums), 2)] if "/Nums" in tree else []
    for kid in tree.get("/Kids", ()):
        out += _numbers(kid)
    return out


def _next_key(tree):
    return max((number for number, _ in _numbers(tree)), default=-1) + 1


def _cover(path, job, ledger, chosen, counts, pages):
    """Return the PDF of the project's cover and index."""
    start, rows = pages + 1, []
    for record, count in zip(chosen, counts):
        results = record["results"]
        governing = next((each["title"] for each in results["checks"] if each["id"] == results["governing"]), results["governing"])
        rows.append({"cells": [record["mark"], record["title"], governing, units.ratio_text(results["ratio"]), record["rev"],
                               ledger.status(record), f"{start}–{start + count - 1}"], "strong": not results["ok"]})
        start += count
    columns = [{"head": "Mark"}, {"head": "Title", "width": 1.9}, {"head": "Governing check", "width": 1.6}, {"head": "D/C", "align": "right"},
               {"head": "Rev"}, {"head": "Status"}, {"head": "Sheets", "align": "right"}]
    status = min((ledger.status(record) for record in chosen), key=STANDING.index)
    marks = ", ".join(record["mark"] for record in chosen)
    date = max(record["date"] for record in chosen)
    worst = max(chosen, key=lambda record: record["results"]["ratio"])
    open_items = [f"{record['mark']}: {row['text']}" for record in chosen for row in record["register"]
                  if row["kind"] == "open item" and row["status"] == "open"]
    manifest = [[each, f"SHA-256 {said['sha256']}", f"SHA-1 {said['sha1']}"] for record in chosen for each, said in record["files"].items()]
    logo = (path.parent / job.logo).read_text(encoding="utf-8") if job.logo else ""
    made = [
        sheet.meta(project=job.project, client=job.client, location=job.location, job=job.job, mark="set", title="Calculations of all marks",
                   rev="–", rev_date=date, status=status.upper(), firm=job.firm, edition=job.basis.specification, method=job.method,
                   loads=job.basis.loads_standard, paper=job.paper, logo=logo,
                   statement="The status of the set is the lowest of its calculations; each carries its own."),
        sheet.cover(title=job.project, governing=f"{len(chosen)} calculations; largest D/C = {units.ratio_text(worst['results']['ratio'])} "
                                                 f"({worst['mark']}).",
                    purpose=f"Calculations of the marks {marks} as issued, each in its latest standing revision.",
                    criteria=[["Specification", job.basis.specification], ["Method", job.method], ["Loads", job.basis.loads_standard]],
                    open_items=open_items, cautions=list(presenting.CAUTIONS[:3])),
        sheet.heading(text="Index of calculations"), sheet.table(columns=columns, rows=rows),
        sheet.heading(text="Files as issued"), sheet.pairs(rows=manifest),
        sheet.note(runs="The bound set repeats the issued files with its own sheet numbers; the issued files are what is verified."),
    ]
    index = {"name": "index.json", "mime": "application/json", "description": "The records of the bound calculations",
             "text": store.canonical({"records": [record["mark"] + "-rev" + record["rev"] for record in chosen]}).decode()}
    return set_pdf(sheet_data(as_notebook(made), attachments=[index]), sheet_folder=_look(path))


def _look(path):
    own = Path(path).parent / "sheet"
    return own if (own / "sheet.typ").is_file() else None
