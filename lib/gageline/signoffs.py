"""Who prepared, checked and approved a calculation, review comments and settled items: events beside the calc, only ever added.

The events of a mark are the files ``<mark>.signoffs/0001.json``, ``0002.json``, …; each names the hash of the one before, so that an
edited or missing one shows. A sign-off holds for the content it was given on; another content voids it.
"""

import re
import unicodedata
from dataclasses import dataclass
from pathlib import Path

from . import store
from .errors import InputError, ReportError, nearest

ROLES = ("preparer", "checker", "approver")
METHODS = ("line by line", "alternate calculation", "simplified calculation", "review", "test")
HEADINGS = ("code", "criteria", "assumptions", "method", "conclusions")
"""What a checker answers for, one sentence each."""

_LONGEST_NAME, _LONGEST_TEXT, _LONGEST_WORD = 24, 2000, 36


def content_hash(given, basis, results):
    """Return the hash of a calculation's content: inputs with their sources, basis, results to ten figures.

    Ten figures, so that another machine's last binary digit voids nothing.
    """
    inputs = {name: {"value": each.value, "source": each.source} for name, each in given.items()}
    return store.sha256(_to_ten_figures({"inputs": inputs, "basis": [basis.edition, basis.method, basis.loads], "results": results}))


def _to_ten_figures(data):
    match data:
        case bool():
            return data
        case float():
            return f"{data:.10g}"
        case dict():
            return {key: _to_ten_figures(value) for key, value in data.items()}
        case list() | tuple():
            return [_to_ten_figures(value) for value in data]
    return data


def identity_of(name):
    """Return a name without case, points and spaces: whether two names are one person's."""
    return "".join(sign for sign in unicodedata.normalize("NFKC", name).casefold() if sign.isalnum())


def checked_text(text, what, longest=_LONGEST_TEXT):
    """Return a text that can be printed, stripped.

    Raises
    ------
    InputError
        It is empty, too long, or holds control characters or a word that no line can hold.
    """
    text = text.strip()
    if not text:
        raise InputError(f"{what} is empty; give a text")
    if len(text) > longest:
        raise InputError(f"{what} has {len(text)} characters; at most {longest} are allowed")
    if bad := [sign for sign in text if unicodedata.category(sign) in ("Cc", "Cf", "Cs", "Co", "Cn", "Zl", "Zp")]:
        raise InputError(f"{what} holds the invisible sign U+{ord(bad[0]):04X}; leave it out")
    if long := [word for word in text.split() if len(word) > _LONGEST_WORD]:
        raise InputError(f"{what} holds a word of {len(long[0])} characters; at most {_LONGEST_WORD} are allowed")
    return text


def checked_name(name):
    """Return a name or initials as they may stand in a title block."""
    name = checked_text(name, "the name", _LONGEST_NAME)
    if not identity_of(name):
        raise InputError(f"the name {name!r} has no letter; give a name or initials")
    return name


@dataclass(frozen=True)
class Log:
    """The events of one mark, oldest first, and what is wrong with their files (edited, missing, clock gone back)."""

    folder: Path
    events: tuple
    faults: tuple
    head: str

    def sign_off(self, role, content, notebook=None):
        """Return the latest sign-off of a role that holds for this content (and this notebook's text, if given), or None."""
        return next((event for event in reversed(self.events) if event["kind"] == "sign-off" and event["role"] == role
                     and event["content"] == content and notebook in (None, event["notebook"])), None)

    def voided(self, content, notebook=None):
        """Return the latest sign-off of each role that has none for this content."""
        latest = {event["role"]: event for event in self.events if event["kind"] == "sign-off"}
        return [event for role, event in latest.items() if not self.sign_off(role, content, notebook)]

    def comments(self):
        """Return the review comments with their answers and whether they are closed."""
        found = {event["id"]: event | {"answers": [], "closed": None} for event in self.events if event["kind"] == "comment"}
        for event in self.events:
            if event["kind"] == "answer":
                found[event["to"]]["answers"].append(event)
            elif event["kind"] == "close":
                found[event["to"]]["closed"] = event
        return list(found.values())

    def open_comments(self):
        """Return the comments that are not closed."""
        return [comment for comment in self.comments() if not comment["closed"]]

    def settled(self):
        """Return text -> event of the assumptions confirmed and the items closed."""
        return {event["item"]: event for event in self.events if event["kind"] == "settle"}


def folder_of(project_folder, mark):
    """Return the folder of a mark's events.

    Raises
    ------
    InputError
        The mark cannot name a file.
    """
    if not re.fullmatch(r"[\w.-]+", mark, re.ASCII) or mark.startswith((".", "-")):
        raise InputError(f"mark {mark!r} cannot name a file, so it can be neither signed nor issued; use letters, digits, - and _")
    return Path(project_folder) / f"{mark}.signoffs"


def read(project_folder, mark):
    """Return the ``Log`` of a mark; of one without events an empty one."""
    try:
        folder = folder_of(project_folder, mark)
    except InputError:
        return Log(Path(project_folder), (), (), "")
    events, faults, head, last = [], [], "", ""
    files = sorted(folder.glob("[0-9]*.json")) if folder.is_dir() else []
    for number, path in enumerate(files, start=1):
        if path.name != f"{number:04d}.json":
            faults.append(f"{folder.name}/{number:04d}.json is missing")
            break
        try:
            raw, event = store.read_json(path)
        except ReportError as error:
            faults.append(str(error))
            break
        if event.get("previous") != head:
            faults.append(f"{folder.name}: an event before {path.name} was edited or exchanged")
        if not _well_formed(event, number, events):
            faults.append(f"{folder.name}/{path.name} is no event of this log")
            break
        if event["when"] < last:
            faults.append(f"{folder.name}/{path.name}: the clock went back from {last} to {event['when']}")
        last = max(last, event["when"])
        head = store.sha256(raw)
        events.append(event)
    return Log(folder, tuple(events), tuple(faults), head)


_FIELDS = {"sign-off": ("role", "content", "notebook", "method", "findings"), "comment": ("id", "on", "text"), "answer": ("to", "text"),
           "close": ("to",), "settle": ("item", "basis")}


def _well_formed(event, number, before):
    fields = _FIELDS.get(event.get("kind"))
    if fields is None or event.get("n") != number or not all(isinstance(event.get(name), str) for name in ("who", "when", "previous")):
        return False
    known = {each.get("id") for each in before}
    return all(name in event for name in fields) and ("to" not in fields or event["to"] in known)


def add(project_folder, mark, make):
    """Add an event and return it.

    Parameters
    ----------
    make : function of the ``Log`` as it stands that returns the event's fields, or raises why it may not be added.

    Raises
    ------
    ReportError
        The log is damaged, or cannot be written.
    """
    folder = folder_of(project_folder, mark)
    with store.locked(folder):
        store.sweep_parts(folder)
        log = read(project_folder, mark)
        if damaged := [fault for fault in log.faults if "clock" not in fault]:
            raise ReportError(f"nothing is added to a damaged log: {damaged[0]}; restore it first")
        number = len(log.events) + 1
        event = make(log) | {"n": number, "when": store.now(), "previous": log.head}
        try:
            store.create(folder / f"{number:04d}.json", store.canonical(event))
        except FileExistsError:
            raise ReportError(f"{folder.name}/{number:04d}.json was added by another process at this moment; try again") from None
    return event


def sign_off(role, who, content, notebook, *, method="", findings=None, allowed=()):
    """Return what ``add`` needs to record a sign-off.

    Parameters
    ----------
    role : "preparer", "checker" or "approver". who : name or initials, at most 24 characters.
    content, notebook : hashes of the content and of the notebook's text.
    method : of ``METHODS``, the checker's. findings : heading -> sentence for each of ``HEADINGS``, the checker's.
    allowed : names that the project allows in this role; empty allows anybody.

    Raises
    ------
    InputError
        An unknown role or method, a missing heading, a person not allowed; in ``add``: the same person as preparer and checker, or
        a role whose turn it is not.
    """
    if role not in ROLES:
        raise InputError(f"role {role!r} is unknown; allowed: {', '.join(ROLES)}")
    who = checked_name(who)
    if allowed and identity_of(who) not in {identity_of(name) for name in allowed}:
        raise InputError(f"{who} may not sign as {role}; project.toml allows {', '.join(allowed)}")
    findings = {name: checked_text(text, f"the finding on {name}") for name, text in (findings or {}).items()}
    if role == "checker":
        if method not in METHODS:
            raise InputError(f"a checker states the method of check: {', '.join(METHODS)}; got {method!r}")
        if missing := [name for name in HEADINGS if name not in findings]:
            raise InputError(f"a checker answers for {', '.join(HEADINGS)}; missing: {', '.join(missing)}")
    elif method or findings:
        raise InputError(f"method and findings of a check are the checker's, not the {role}'s")
    if unknown := [name for name in findings if name not in HEADINGS]:
        raise InputError(f"there is no heading {unknown[0]!r} in the checker's list; nearest: {nearest(unknown[0], HEADINGS)}")

    def make(log):
        if role != "preparer" and not log.sign_off(ROLES[ROLES.index(role) - 1], content):
            before = ROLES[ROLES.index(role) - 1]
            raise InputError(f"the {before} has not signed this content; the {role} signs after the {before}")
        other = {"preparer": "checker", "checker": "preparer"}.get(role)
        held = log.sign_off(other, content) if other else None
        if held and identity_of(held["who"]) == identity_of(who):
            raise InputError(f"{who} is the {other} of this content and cannot be its {role} too; nobody checks their own work")
        return {"kind": "sign-off", "role": role, "who": who, "content": content, "notebook": notebook, "method": method,
                "findings": findings}

    return make


def comment(who, on, text):
    """Return what ``add`` needs to record a review comment on a check, an input, a line or the whole."""
    who, text = checked_name(who), checked_text(text, "the comment")
    return lambda log: {"kind": "comment", "id": f"C{len(log.comments()) + 1}", "who": who, "on": on, "text": text}


def _known(log, id):
    found = {each["id"]: each for each in log.comments()}
    if id not in found:
        raise InputError(f"there is no comment {id!r}; " + (f"nearest: {nearest(id, found)}" if found else "there are none"))
    if found[id]["closed"]:
        raise InputError(f"comment {id} is closed; make a new one")
    return found[id]


def answer(who, id, text):
    """Return what ``add`` needs to record the response to a comment."""
    who, text = checked_name(who), checked_text(text, "the response")

    def make(log):
        _known(log, id)
        return {"kind": "answer", "who": who, "to": id, "text": text}

    return make


def close(who, id):
    """Return what ``add`` needs to close a comment; it must have a response, by somebody else."""
    who = checked_name(who)

    def make(log):
        answers = _known(log, id)["answers"]
        if not answers:
            raise InputError(f"comment {id} has no response yet; it is closed after one")
        if identity_of(answers[-1]["who"]) == identity_of(who):
            raise InputError(f"{who} gave the response to {id}; somebody else closes it")
        return {"kind": "close", "who": who, "to": id}

    return make


def settle(who, item, basis):
    """Return what ``add`` needs to confirm an assumption or close an open item, by its text."""
    who, basis = checked_name(who), checked_text(basis, "the basis")
    return lambda log: {"kind": "settle", "who": who, "item": item, "basis": basis}
