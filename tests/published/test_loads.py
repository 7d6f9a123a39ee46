"""Load combinations against numbers printed by others; each docstring names the source and the grade of evidence.

The published sets are of ASCE 7-05 or 7-10. For dead, live, roof live and rain load their factors are those of 7-16 and
7-22; snow factors are those of 7-16 only, because S of 7-22 is a strength-level load.
"""

import pytest

from gageline.loads import combinations, demands, permissible

BOTH = pytest.mark.parametrize("standard", ["7-16", "7-22"])


def value_of(text, found):
    return next(row.total for row in found.rows if row.combination.text == text)


@BOTH
def test_beginners_guide_point_load(standard):
    """Published: A Beginner's Guide to ASCE 7-10, Table 2.5.1a, source 4 (D 12, L 10, Lr 13 kip), L factor 1.0."""
    found = demands({"D": 12.0, "L": 10.0, "Lr": 13.0}, "LRFD", standard)

    assert found.tension.total == pytest.approx(45.2, abs=0.05)
    assert found.tension.combination.text == "1.2D + 1.6Lr + L"
    assert min(row.total for row in found.rows) == pytest.approx(10.8, abs=0.05)
    assert value_of("1.4D", found) == pytest.approx(16.8, abs=0.05)
    assert value_of("1.2D + 1.6L + 0.5Lr", found) == pytest.approx(36.9, abs=0.05)
    assert found.compression is None


@BOTH
def test_beginners_guide_half_companion_live_load(standard):
    """Published: A Beginner's Guide to ASCE 7-05, Table 2.5.1, point load, L factor 0.5 in combination 3."""
    found = demands({"D": 12.0, "L": 10.0, "Lr": 13.0}, "LRFD", standard, companion_L=0.5)

    assert found.tension.total == pytest.approx(40.2, abs=0.05)
    assert found.tension.combination.text == "1.2D + 1.6Lr + 0.5L"
    assert value_of("1.2D + 1.6L + 0.5Lr", found) == pytest.approx(36.9, abs=0.05)


@BOTH
def test_beginners_guide_first_line_load(standard):
    """Published: A Beginner's Guide to ASCE 7-10, Table 2.5.1a, source 1 (D 0.85, L 0.55 klf, read as kip)."""
    found = demands({"D": 0.85, "L": 0.55}, "LRFD", standard)

    assert value_of("1.4D", found) == pytest.approx(1.19, abs=0.005)
    assert found.tension.total == pytest.approx(1.90, abs=0.005)
    assert min(row.total for row in found.rows) == pytest.approx(0.765, abs=0.0005)


def test_beginners_guide_second_line_load_with_snow():
    """Published: A Beginner's Guide to ASCE 7-05/7-10, source 2 (D 8, Lr 0.25, S 0.85); snow factors are those of 7-16.

    The printed 9.725 (2a) and 10.025 (2b) belong to combination 2, which without L is left out here as never governing.
    """
    found = demands({"D": 8.0, "Lr": 0.25, "S": 0.85}, "LRFD", "7-16")

    assert found.tension.total == pytest.approx(11.2, abs=0.05)
    assert min(row.total for row in found.rows) == pytest.approx(7.2, abs=0.05)
    assert value_of("1.2D + 1.6Lr", found) == pytest.approx(10.0, abs=0.05)
    assert value_of("1.2D + 1.6S", found) == pytest.approx(10.96, abs=0.005)


def test_beginners_guide_combination_two_with_snow():
    """Published: same table, rows 2a and 2b (9.725, 10.025); a vanishing L brings combination 2 into the list."""
    found = demands({"D": 8.0, "L": 1e-9, "Lr": 0.25, "S": 0.85}, "LRFD", "7-16")

    assert value_of("1.2D + 1.6L + 0.5Lr", found) == pytest.approx(9.725, abs=0.0005)
    assert value_of("1.2D + 1.6L + 0.5S", found) == pytest.approx(10.025, abs=0.0005)


@BOTH
def test_beginners_guide_lateral_load(standard):
    """Published: A Beginner's Guide to ASCE 7-10, Table 2.5.1a, source 3 (W 0.25, E 0.35): LRFD max 0.35, min −0.35."""
    found = demands({"W": 0.25, "E": 0.35}, "LRFD", standard)

    assert found.tension.total == pytest.approx(0.35, abs=0.005)
    assert found.compression.total == pytest.approx(-0.35, abs=0.005)


@BOTH
@pytest.mark.parametrize(
    ("D", "L", "lrfd", "asd"),
    [
        (30, 90, 180, 120), (20, 60, 120, 80), (40, 110, 224, 150), (4, 12, 24, 16), (25, 15, 54, 40),
        (33, 100, 200, 133), (50, 150, 300, 200), (262, 262, 734, 524), (345, 345, 966, 690), (102, 102, 286, 204),
        (113, 113, 316, 226),
    ],
)
def test_design_examples_dead_and_live(standard, D, L, lrfd, asd):
    """Published: AISC Design Examples v16.0 (ASCE/SEI 7-22), required strengths of the D + L examples."""
    service = {"D": float(D), "L": float(L)}

    assert demands(service, "LRFD", standard).required_tension == pytest.approx(lrfd, abs=0.5)
    assert demands(service, "ASD", standard).required_tension == pytest.approx(asd, abs=0.5)


@BOTH
def test_seismic_design_manual(standard):
    """Published: 2009 IBC Structural/Seismic Design Manual, load-combination example: S_DS 1.10, rho 1.3, f1 0.5.

    Printed: 1.42D + 1.3Q_E + 0.5L and 0.68D + 1.3Q_E.
    """
    found = {c.text: c.factors for c in combinations(
        "LRFD", standard, ["D", "L", "E"], S_DS=1.10, rho=1.3, companion_L=0.5)}

    assert found["(1.2 + 0.2S_DS)D + ρQ_E + 0.5L"] == pytest.approx({"D": 1.42, "E": 1.3, "L": 0.5})
    assert found["(0.9 − 0.2S_DS)D + ρQ_E"] == pytest.approx({"D": 0.68, "E": 1.3})
    assert found["(0.9 − 0.2S_DS)D − ρQ_E"] == pytest.approx({"D": 0.68, "E": -1.3})


def test_snow_of_7_22():
    """Published: STRUCTURE magazine, Feb 2022, Eq. 1 (1.2D + 1.0S); ibid., 7-22 combinations 3a, 4a, 6a reprinted."""
    lrfd = [c.factors for c in combinations("LRFD", "7-22", ["D", "S"])]
    asd = {c.id: c.factors for c in combinations("ASD", "7-22", ["D", "L", "S", "W"])}

    assert {"D": 1.2, "S": 1.0} in lrfd
    assert asd["3a"] == pytest.approx({"D": 1.0, "S": 0.7})
    assert asd["4a"] == pytest.approx({"D": 1.0, "L": 0.75, "S": 0.75 * 0.7})
    assert asd["6a"] == pytest.approx({"D": 1.0, "L": 0.75, "W": 0.75 * 0.6, "S": 0.75 * 0.7})


def as_sets(rows):
    return {frozenset((nature, round(factor, 9)) for nature, factor in row.items()) for row in rows}


def with_roof(**factors):
    """Expand roof = factor into the three alternatives Lr, S, R, and E = factor into both signs."""
    rows = [factors]
    if "roof" in factors:
        roof = factors.pop("roof")
        rows = [{**factors, nature: roof} for nature in ("Lr", "S", "R")]
    if "E" in factors:
        rows = [{**row, "E": sign * row["E"]} for row in rows for sign in (1, -1)]
    return rows


def test_building_code_allowable_stress():
    """Published: Florida Building Code, 5th edition, 1605.3.1, Eqs. 16-8 to 16-16 (factors of ASCE 7-10 = 7-16).

    16-8 prints D + F; H, if present, is added to it as ASCE 7 2.4.1 asks.
    """
    printed = [
        *with_roof(D=1, F=1, H=1), *with_roof(D=1, F=1, H=1, L=1), *with_roof(D=1, F=1, H=1, roof=1),
        *with_roof(D=1, F=1, H=1, L=0.75, roof=0.75), *with_roof(D=1, F=1, H=1, W=0.6),
        *with_roof(D=1, F=1, H=1, E=0.7),
        *with_roof(D=1, F=1, H=1, W=0.45, L=0.75, roof=0.75), *with_roof(D=1, F=1, H=1, E=0.525, L=0.75, S=0.75),
        *with_roof(D=0.6, W=0.6, H=1), *with_roof(D=0.6, F=0.6, E=0.7, H=1),
    ]
    ours = [c.factors for c in combinations("ASD", "7-16", ["D", "F", "H", "L", "Lr", "S", "R", "W", "E"])]

    assert as_sets(ours) == as_sets(printed)
    assert len(ours) == len(printed)


@pytest.mark.parametrize("f1", [1.0, 0.5])
def test_building_code_strength(f1):
    """Published: New York City Building Code 1605.2, Eqs. 16-1 to 16-7, with f2 = 0.2 (factors of ASCE 7-10 = 7-16).

    16-1 prints 1.4(D + F); H, if present, is added to it as ASCE 7 2.3.1 asks.
    """
    printed = [
        *with_roof(D=1.4, F=1.4, H=1.6), *with_roof(D=1.2, F=1.2, L=1.6, H=1.6, roof=0.5),
        *with_roof(D=1.2, F=1.2, roof=1.6, H=1.6, L=f1), *with_roof(D=1.2, F=1.2, roof=1.6, H=1.6, W=0.5),
        *with_roof(D=1.2, F=1.2, W=1.0, L=f1, H=1.6, roof=0.5), *with_roof(D=1.2, F=1.2, E=1.0, L=f1, H=1.6, S=0.2),
        *with_roof(D=0.9, W=1.0, H=1.6), *with_roof(D=0.9, F=0.9, E=1.0, H=1.6),
    ]
    natures = ["D", "F", "H", "L", "Lr", "S", "R", "W", "E"]
    ours = [c.factors for c in combinations("LRFD", "7-16", natures, companion_L=f1)]

    assert as_sets(ours) == as_sets(printed)
    assert len(ours) == len(printed)


@BOTH
@pytest.mark.parametrize(("D", "L", "lrfd"), [(30.0, 90.0, 180.0), (4.0, 12.0, 24.0), (50.0, 150.0, 300.0)])
def test_backwards_from_design_examples(standard, D, L, lrfd):
    """Published numbers read backwards: the printed required strength as available gives the printed L again."""
    assert permissible(lrfd, {"D": D}, "L", "LRFD", standard).value == pytest.approx(L, rel=1e-12)
    assert permissible(D + L, {"D": D}, "L", "ASD", standard).value == pytest.approx(L, rel=1e-12)
