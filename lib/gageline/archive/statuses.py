"""The status words of an issue: what each needs, and what it prints."""

from dataclasses import dataclass

from ..errors import InputError, nearest


@dataclass(frozen=True)
class Rule:
    """What a status needs (roles that signed, all comments closed, no open item, all checks satisfied) and prints."""

    signed: tuple
    comments_closed: bool
    items_closed: bool
    checks_ok: bool
    statement: str
    watermark: str = ""


RULES = {
    "preliminary": Rule((), False, False, False, "Preliminary: issued for coordination only; not checked, not for construction.", "PRELIMINARY"),
    "for review": Rule(("preparer",), False, False, False, "Issued for review; not for construction."),
    "for approval": Rule(("preparer", "checker"), True, False, True, "Checked and issued for approval; not for construction."),
    "for construction": Rule(("preparer", "checker", "approver"), True, True, True, "Checked, approved and issued for construction."),
}
"""Status -> its rule. Superseded and void come only from a later issue or from ``void``, as further records."""


def refusals(status, reading):
    """Return why a calculation may not be issued with a status; [] where it may.

    Raises
    ------
    InputError
        No such status can be issued.
    """
    if status in ("superseded", "void"):
        raise InputError(f"nothing is issued {status}: an issue becomes so by a newer revision, or by gageline void")
    if status not in RULES:
        raise InputError(f"status {status!r} is unknown; allowed: {', '.join(RULES)} (nearest: {nearest(status, RULES, 1)})")
    rule, calc = RULES[status], reading.calc
    void = {event["role"] for event in calc.log.voided(reading.content, reading.notebook)}
    out = [f"the {role} has not signed" + (" since inputs, results or the notebook's text changed" if role in void else "")
           for role in rule.signed if not reading.signed(role)]
    if rule.comments_closed and (left := calc.log.open_comments()):
        out.append(f"comment{'s' if len(left) > 1 else ''} {', '.join(each['id'] for each in left)} {'are' if len(left) > 1 else 'is'} open")
    if rule.items_closed and (left := [row["id"] for row in calc.register() if row["open"]]):
        out.append(f"open item{'s' if len(left) > 1 else ''} {', '.join(left)}")
    if rule.checks_ok and not calc.connection.ok:
        out.append("not every check is satisfied")
    if rule.signed and (damaged := [fault for fault in calc.log.faults if "clock" not in fault]):
        out.append(f"the sign-off log is damaged: {damaged[0]}")
    return out
