"""Grades: strengths, forms, thickness limits, spelling, notes, filler metal."""

import pytest

from gageline.errors import InputError, NotInTable
from gageline.facts.grades import EDITIONS, FORMS, grade, grades, matching_filler, material, usual_grades

# Strengths as used in AISC Design Examples v16.0 (A992, A572-50, A500-C) and the ASTM summary tables in the Manual.
STRENGTHS = [("A36", 36, 58), ("A992", 50, 65), ("A572-42", 42, 60), ("A572-50", 50, 65), ("A572-55", 55, 70),
             ("A572-60", 60, 75), ("A572-65", 65, 80), ("A529-50", 50, 65), ("A529-55", 55, 70), ("A588", 50, 70),
             ("A913-65", 65, 80), ("A913-70", 70, 90), ("A1043-36", 36, 58), ("A283-C", 30, 55), ("A514", 100, 110),
             ("A53", 35, 60), ("A500-B", 46, 58), ("A500-C", 50, 62), ("A501", 50, 70), ("A618-III", 50, 65),
             ("A847", 50, 70), ("A1065-50", 50, 60), ("A1085", 50, 65), ("F1554-55", 55, 75), ("A193-B7", 105, 125),
             ("A709-HPS 70W", 70, 85)]


@pytest.mark.parametrize(("name", "F_y", "F_u"), STRENGTHS)
def test_strengths(name, F_y, F_u):
    """Least yield stress and tensile strength of the thinnest material."""
    assert (grade(name).F_y, grade(name).F_u) == (F_y, F_u)


@pytest.mark.parametrize("asked", ["A572-50", "A572 Gr 50", "a572 gr.50", "ASTM A572 Grade 50", "A572/A572M Gr. 50", "A57250"])
def test_forgiven_spelling(asked):
    """Case, blanks, ASTM, Gr. and the metric twin do not matter."""
    assert grade(asked).name == "A572 Gr. 50"


def test_only_grade_of_a_specification():
    """A specification with one grade needs no grade, one with several does."""
    assert grade("A53").name == "A53 Gr. B"
    with pytest.raises(NotInTable, match="A572 Gr. 42, A572 Gr. 50"):
        grade("A572")


@pytest.mark.parametrize("asked", ["A99", "", "steel", "A992-50", "S355"])
def test_miss_names_three(asked):
    """A miss names three grades there are."""
    with pytest.raises(NotInTable) as caught:
        grade(asked)
    listed = str(caught.value).split("nearest are ")[1].split(", ")

    assert len(listed) == 3 and set(listed) <= set(grades())


def test_every_name_round_trips():
    """Each printed name finds itself, in every form it is listed for."""
    for name in grades():
        assert grade(name).name == grade(name.lower().replace(" ", "")).name == name
        for form in grade(name).forms:
            for edition in EDITIONS:
                assert material(name, form=form, edition=edition).F_y >= 30


# Table A3.1 of 360-22: which forms a specification is listed for, by our reading; one that is and one that is not.
@pytest.mark.parametrize(("name", "form", "series"), [
    ("A500 C", "shape", "W"), ("A53", "plate", None), ("A992", "plate", None), ("A992", "bar", None), ("A913-65", "plate", None),
    ("A514", "shape", "W"), ("A36", "hss-rect", "HSS"), ("A36", "pipe", "Pipe"), ("A1085", "shape", "C"),
    ("A193 B7", "plate", None), ("A709-50S", "plate", None), ("A283 C", "bar", None), ("A1066-50", "shape", "L")])
def test_grade_not_made_for_the_form(name, form, series):
    """Refused in one sentence that says what is listed for the form."""
    for edition in EDITIONS:
        with pytest.raises(InputError, match=r"is not made as .*; Table A3.1 lists for .* A\d+"):
            material(name, form=form, series=series, edition=edition)


@pytest.mark.parametrize(("name", "form", "t", "edition", "F_y", "F_u"), [
    ("A36", "plate", 8.0, "360-22", 36, 58), ("A36", "plate", 8.001, "360-22", 32, 58),
    ("A588", "plate", 4.0, "360-22", 50, 70), ("A588", "plate", 4.5, "360-22", 46, 67),
    ("A588", "plate", 8.0, "360-22", 42, 63), ("A514", "plate", 2.5, "360-16", 100, 110),
    ("A514", "plate", 3.0, "360-16", 90, 100), ("A572-60", "plate", 2.5, "360-22", 60, 75),
    ("A193 B7", "rod", 3.0, "360-22", 95, 115), ("A500 C", "hss-round", 0.5, "360-16", 46, 62),
    ("A500 C", "hss-round", 0.5, "360-22", 50, 62), ("A500 B", "hss-round", 0.5, "360-16", 42, 58),
    ("A500 C", "hss-rect", 0.5, "360-16", 50, 62)])
def test_thickness_and_edition(name, form, t, edition, F_y, F_u):
    """Strength falls with thickness where the standard says so; round A500 has the values of its time."""
    found = material(name, form=form, thickness=t, edition=edition)

    assert (found.F_y, found.F_u) == (F_y, F_u)


@pytest.mark.parametrize(("name", "t", "edition"), [("A572-50", 4.01, "360-22"), ("A572-42", 6.5, "360-22"),
                                                    ("A572-55", 2.1, "360-22"), ("A572-60", 2.0, "360-16"),
                                                    ("A572-65", 1.5, "360-22"), ("A588", 8.1, "360-22"), ("A514", 6.1, "360-22")])
def test_too_thick(name, t, edition):
    """Thicker than the grade is made: refused with the limit."""
    with pytest.raises(InputError, match=r"plate is listed to .* in\., got"):
        material(name, form="plate", thickness=t, edition=edition)


@pytest.mark.parametrize("t", [0.0, -1.0, float("nan"), float("inf")])
def test_absurd_thickness(t):
    """A thickness is a positive number."""
    with pytest.raises(InputError, match="more than 0 in"):
        material("A36", form="plate", thickness=t, edition="360-22")


def test_unknown_form_series_edition():
    """Each is refused with the known ones."""
    with pytest.raises(InputError, match="hss-rect"):
        material("A36", form="beam", edition="360-22")
    with pytest.raises(NotInTable, match="360-16, 360-22"):
        material("A36", form="plate", edition="360-10")
    with pytest.raises(NotInTable, match="2L"):
        material("A36", form="shape", series="IPE", edition="360-22")


def test_notes():
    """The usual choice is silent; an unusual grade, an unknown thickness and a lower strength are said."""
    assert material("A992", form="shape", series="W", edition="360-22").note == ""
    assert "A992" in material("A36", form="shape", series="W", edition="360-22").note
    assert "thickness not given" in material("A588", form="plate", edition="360-22").note
    assert "32 ksi" in material("A36", form="plate", thickness=9, edition="360-22").note
    assert material("A36", form="shape", series="L", edition="360-16").note == ""
    assert "A36" in material("A572-50", form="shape", series="L", edition="360-16").note


def test_design_wall_factor():
    """Section B4.2: 0.93, but 1.00 for A1065 and A1085; no factor for other forms."""
    factors = {name: grade(name).t_factor for name in grades() if {"hss-rect", "hss-round", "pipe"} & set(grade(name).forms)}

    assert {name for name, factor in factors.items() if factor == 1.0} == {"A1065 Gr. 50", "A1065 Gr. 50W", "A1085 Gr. A"}
    assert set(factors.values()) == {0.93, 1.0}
    assert grade("A992").t_factor is None


def test_usual_grades_exist():
    """Each usual grade is a grade listed for the form of its series."""
    forms = {"plate": "plate", "bar": "bar", "HSS": "hss-rect", "Pipe": "pipe"}
    for series in ("W", "M", "S", "HP", "C", "MC", "L", "2L", "WT", "MT", "ST", "HSS", "Pipe", "plate", "bar"):
        for edition in EDITIONS:
            for name in usual_grades(series, edition):
                assert name in grades(forms.get(series, "shape"))
    with pytest.raises(NotInTable):
        usual_grades("IPE", "360-22")


def test_grades_by_form():
    """Every form has grades, and only rods take rod steels."""
    assert all(grades(form) for form in FORMS)
    assert "F1554 Gr. 36" in grades("rod") and "F1554 Gr. 36" not in grades("bar")


@pytest.mark.parametrize(("name", "t", "F_EXX", "low_hydrogen"), [
    ("A36", 0.75, (60, 70), False), ("A36", 0.76, (70,), True), ("A572-50", 1, (70,), True), ("A992", 1, (70,), True),
    ("A913-65", 1, (80,), True), ("A913-70", 1, (90,), True)])
def test_matching_filler(name, t, F_EXX, low_hydrogen):
    """User note table of Section J2.6, 360-22."""
    assert matching_filler(name, t) == (F_EXX, low_hydrogen)


def test_no_matching_filler():
    """A grade the note does not name is refused with those it does."""
    with pytest.raises(NotInTable, match="A514; the table holds A36, A572 Gr. 50"):
        matching_filler("A514", 1)
