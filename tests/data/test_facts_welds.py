"""Tables of fillet welds against the printed ones."""

import pytest

from gageline.errors import InputError, NotInTable
from gageline.facts import welds


@pytest.mark.parametrize("thickness, least", [(1 / 8, 1 / 8), (1 / 4, 1 / 8), (0.2501, 3 / 16), (1 / 2, 3 / 16), (9 / 16, 1 / 4), (3 / 4, 1 / 4),
                                              (0.751, 5 / 16), (4, 5 / 16)])
def test_least_fillet(thickness, least):
    """AISC 360-22 Table J2.4: to 1/4 1/8, to 1/2 3/16, to 3/4 1/4, over 5/16, by the thinner part."""
    assert welds.minimum_fillet(thickness) == least


@pytest.mark.parametrize("thickness", [0, -1, float("nan"), float("inf")])
def test_no_fillet_for_no_thickness(thickness):
    with pytest.raises(InputError):
        welds.minimum_fillet(thickness)


@pytest.mark.parametrize("name, F_EXX", [("E70", 70), ("E70XX", 70), ("e7018", 70), ("60", 60), ("E80T1", None), ("E55", None), ("", None)])
def test_electrode(name, F_EXX):
    """The two digits behind E are the strength in ksi."""
    if F_EXX is None:
        with pytest.raises(NotInTable, match="E60, E70, E80, E90"):
            welds.electrode(name)
    else:
        assert welds.electrode(name).F_EXX == F_EXX


@pytest.mark.parametrize("F_EXX, grade, thickness, classes", [(70, "A36", 0.5, 0), (60, "A36", 0.5, -1), (80, "A36", 1.0, 1), (70, "A992", 0.5, 0),
                                                              (80, "A572-50", 0.5, 1), (70, "A913-65", 1.0, -1)])
def test_classes_above_matching(F_EXX, grade, thickness, classes):
    """User note table of AISC 360-22 J2.6: A36 to 3/4 in 60 or 70, over 70; A992, A572 Gr. 50 70; A913 Gr. 65 80."""
    assert welds.classes_above_matching(F_EXX, grade, thickness) == classes


def test_unlisted_steel():
    with pytest.raises(NotInTable, match="A500"):
        welds.classes_above_matching(70, "A500-C", 0.5)
