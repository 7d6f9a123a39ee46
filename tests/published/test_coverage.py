"""README's coverage table is the one that code, cases and tests give, and leaves no limit state unverified."""

from . import coverage

ROWS = coverage.rows()


def test_readme_is_current():
    text = (coverage.ROOT / "README.md").read_text(encoding="utf-8")

    assert coverage.between(text) == coverage.table(), "run python -m tests.published.coverage --write"


def test_every_family_is_in_it():
    from gageline import families

    assert {row[0] for row in ROWS} == set(families.names())
    assert len({row[:2] for row in ROWS}) == len(ROWS)


def test_nothing_that_computes_is_unverified():
    """A limit state with equations has a published number, a published equation, or a test that names it."""
    bare = [row for row in ROWS if row[3].startswith("equations 0/") and ";" not in row[3]]

    assert bare == []
