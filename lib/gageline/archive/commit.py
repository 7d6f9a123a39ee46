"""Writing an issue so that it is there wholly or not at all, once, whatever happens meanwhile.

Under the folder's lock: an intent names the files and their hashes; the files are created; the record is created, and with it the
revision is issued; the intent is removed. A kill before the record leaves an intent with files that nobody was given: the next
issue removes exactly those whose hash the intent names. Older revisions are superseded by the new record itself; the further record and
the stamped copy beside each are made afterwards, and made up for by the next issue where a kill prevented them.
"""

import contextlib
import json
import os
from pathlib import Path

from .. import store
from ..errors import InputError, ReportError
from . import records, stamping


def commit(folder, name, made, record, built_on):
    """Create an issue's files and its record, exclusively, and return the record as written.

    Parameters
    ----------
    folder : the reports folder. name : what the issue's files begin with.
    made : file name -> bytes. record : the record without what only this moment knows.
    built_on : revisions of the mark that the issue was compared with, oldest first.

    Raises
    ------
    GagelineError
        It is issued already, another one was issued meanwhile, or the disk does not take it; then nothing of it remains.
    """
    folder = Path(folder)
    with store.locked(folder):
        tidy(folder)
        ledger = records.read(folder, files=False)
        last = ledger.last()
        taken = [path for path in (folder / f"{name}.json", *(folder / each for each in made)) if path.exists()]
        if taken:
            raise InputError(f"{taken[0]} is there already and is never overwritten; give a new revision")
        mine = [each["rev"] for each in ledger.revisions(record["mark"])]
        if mine != list(built_on):
            raise InputError(f"revision {mine[-1]} of {record['mark']} was issued at this moment by another process; look at it and try again")
        record = record | {
            "issued": store.now(), "sequence": last["sequence"] + 1 if last else 1,
            "previous": store.sha256(ledger.raw[last["mark"], last["rev"]]) if last else "",
            "supersedes": [each["rev"] for each in ledger.revisions(record["mark"]) if ledger.status(each) not in ("superseded", "void")],
            "files": {each: records.hashes(data) for each, data in made.items()}}
        intent = folder / f".{name}{records.INTENT}"
        try:
            store.create(intent, store.canonical({each: store.sha256(data) for each, data in made.items()}))
            for each, data in made.items():
                store.create(folder / each, data)
            for each, data in made.items():
                if (folder / each).read_bytes() != data:
                    raise ReportError(f"{folder / each} does not read back as written; nothing is issued")
            store.create(folder / f"{name}.json", records.sealed(record))
        except FileExistsError as error:
            raise InputError(f"{error.filename2 or error.filename} was created by another process at this moment; nothing is overwritten") from None
        finally:
            # Removes the files of an issue that failed, or only the intent of one whose record stands.
            with contextlib.suppress(OSError):
                tidy(folder)
        complete(folder)
    return record


def tidy(folder):
    """Remove what a killed or failed issue left behind; call it only with the folder locked.

    A file is removed only if an intent names it with its very hash and no record stands beside it.
    """
    folder = Path(folder)
    store.sweep_parts(folder)
    for intent in folder.glob(f".*{records.INTENT}"):
        name = intent.name[1:].removesuffix(records.INTENT)
        if not (folder / f"{name}.json").exists():
            for each, said in json.loads(intent.read_bytes()).items():
                path = folder / each
                if path.parent == folder and path.is_file() and store.sha256(path.read_bytes()) == said:
                    os.unlink(path)
        os.unlink(intent)


def complete(folder):
    """Make the further records and stamped copies of superseded revisions that are still missing; call it with the folder locked."""
    ledger = records.read(folder, files=False)
    for newer in sorted(ledger.issues.values(), key=lambda each: each["sequence"]):
        for rev in newer["supersedes"]:
            older = ledger.issues.get((newer["mark"], rev))
            if older and "superseded" not in ledger.later.get((newer["mark"], rev), {}):
                mark_later(folder, older, "superseded", f"by revision {newer['rev']} of {newer['date']}", newer["signed"]["by"])


def void(pdf, who, reason):
    """Mark an issued revision void by a further record and a stamped copy, and return the record.

    Raises
    ------
    GagelineError
        There is no record beside the PDF, or the revision is void already.
    """
    from ..sheet.build import check_printable
    from ..signoffs import checked_name, checked_text

    who, reason = checked_name(who), checked_text(reason, "the reason")
    check_printable(who, [reason])
    pdf = Path(pdf)
    _, older = records.read_record(pdf.with_suffix(".json"))
    with store.locked(pdf.parent):
        tidy(pdf.parent)
        return mark_later(pdf.parent, older, "void", reason, who)


def mark_later(folder, older, kind, reason, who):
    """Create the further record of an issued revision and its stamped copy, and return the record; the issue itself is not touched."""
    name = records.stem(older["mark"], older["rev"])
    copy, source = folder / f"{name}.{kind}.pdf", folder / f"{name}.pdf"
    if (folder / f"{name}.{kind}.json").exists():
        raise InputError(f"{name} is {kind} already")
    files = {}
    # The copy of a PDF that is lost or altered would prove something false.
    if source.is_file() and records.hashes(source.read_bytes()) == older["files"][source.name]:
        if not copy.exists():
            store.create(copy, stamping.stamped(source, kind, reason))
        files = {copy.name: records.hashes(copy.read_bytes())}
    record = {"gageline_record": 1, "kind": kind, "mark": older["mark"], "rev": older["rev"], "when": store.now(), "who": who, "reason": reason,
              "files": files}
    with contextlib.suppress(FileExistsError):
        store.create(folder / f"{name}.{kind}.json", records.sealed(record))
    return record
