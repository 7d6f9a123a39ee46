"""What the library refuses: each bad input gives one sentence that names the input, what is wrong and what is allowed."""

import re

import pytest
from helpers import ANGLE, FLANGES, PLATE, bolted

from gageline.connections.bolted import BoltedConnection
from gageline.errors import GagelineError, InputError, NotInTable, ScopeError

NO_GRID = {"lines": None, "rows": None, "pitch": None, "gage": None}
SLIP = {"installation": "slip-critical", "slip_class": "A"}
LOADS = {"tension": None, "demand_level": None}
REVERSING = {"compression": "10 kip"}

PLATE_CASES = {
    # misspelt, missing
    "misspelt name": ({"pich": "3 in"}, InputError, ["pich", "pitch"]),
    "misspelt name of a load": ({"P_d": "3 kip"}, InputError, ["P_d", "P_D"]),
    "two words run together": ({"platethickness": "1/2 in"}, InputError, ["platethickness", "plate_thickness"]),
    "missing mark": ({"mark": None}, InputError, ["mark", "missing"]),
    "missing member": ({"member": None}, InputError, ["member", "missing"]),
    "missing pitch": ({"pitch": None}, InputError, ["pitch", "missing"]),
    "missing rows": ({"rows": None}, InputError, ["rows", "missing"]),
    "missing lines": ({"lines": None}, InputError, ["lines", "missing"]),
    "missing gage": ({"gage": None}, InputError, ["gage", "2 lines"]),
    "missing load": (LOADS, InputError, ["load", "P_D", "tension"]),
    "demand without its level": ({"demand_level": None}, InputError, ["demand_level", "LRFD", "ASD"]),
    "demand of the other method": ({"demand_level": "ASD"}, InputError, ["ASD", "LRFD"]),
    "demand and service loads": ({"P_D": "30 kip"}, InputError, ["tension", "P_D"]),
    # units
    "no unit in the text": ({"pitch": "3"}, InputError, ["pitch", "no unit", "length"]),
    "a bare number": ({"pitch": 3}, InputError, ["pitch", "no unit", "quotes"]),
    "a bare decimal": ({"tension": 31.5}, InputError, ["tension", "no unit", "force"]),
    "a stress for a load": ({"tension": "31 ksi"}, InputError, ["tension", "wrong dimension", "kip"]),
    "a force for a length": ({"plate_thickness": "1/2 kip"}, InputError, ["plate_thickness", "wrong dimension", "length"]),
    "a length for a factor": ({"U_by_hand": "0.9 in", "U_basis": "because of a test"}, InputError, ["U_by_hand", "without unit"]),
    "an angle without unit": ({"plate_edge_angle": "90"}, InputError, ["plate_edge_angle", "angle", "deg"]),
    "an unknown unit": ({"tension": "3 bananas"}, InputError, ["tension", "bananas", "kip", "kN"]),
    "no number": ({"tension": "kip"}, InputError, ["tension", "number"]),
    "empty": ({"tension": ""}, InputError, ["tension", "number"]),
    "two slashes": ({"plate_thickness": "1/2/3 in"}, InputError, ["plate_thickness", "1/2/3"]),
    "a zero denominator": ({"plate_thickness": "1/0 in"}, InputError, ["plate_thickness", "zero"]),
    "points without units": (NO_GRID | {"holes": "0, 1"}, InputError, ["holes", "no unit"]),
    "a point with one coordinate": (NO_GRID | {"holes": "0 in; 3 in"}, InputError, ["holes", "point", "x, y"]),
    # not finite, absurd
    "NaN as text": ({"tension": "nan kip"}, InputError, ["tension", "nan"]),
    "NaN as number": ({"tension": float("nan")}, InputError, ["tension"]),
    "NaN as a factor": ({"U_by_hand": float("nan"), "U_basis": "because of a test"}, InputError, ["U_by_hand", "finite"]),
    "infinity": ({"tension": "inf kip"}, InputError, ["tension", "inf"]),
    "overflow": ({"tension": "1e400 kip"}, InputError, ["tension", "finite"]),
    "absurd load": ({"tension": "1e9 kip"}, InputError, ["tension", "50", "000 kip"]),
    "absurd service load": (LOADS | {"P_D": "1e7 kip"}, InputError, ["P_D", "50", "000 kip"]),
    "absurd thickness": ({"plate_thickness": "9 in"}, InputError, ["plate_thickness", "8 in"]),
    "absurd width": ({"plate_width": "500 ft"}, InputError, ["plate_width", "200 in"]),
    "absurd flat bar": ({"member": "PL 1/2 x 1000"}, InputError, ["PL 1/2 x 1000", "200 in"]),
    "absurd pitch": ({"pitch": "100 in"}, InputError, ["pitch", "24 in"]),
    "absurd rows": ({"rows": 4000}, InputError, ["rows", "40"]),
    "absurd lines": ({"lines": 11}, InputError, ["lines", "10"]),
    "absurd stagger": ({"stagger": "50 in"}, InputError, ["stagger", "24 in"]),
    "angle of the edge along the load": ({"plate_edge_angle": "0 deg"}, InputError, ["plate_edge_angle", "deg"]),
    "no tension": ({"tension": "0 kip"}, InputError, ["tension", "greater than 0"]),
    "pushing only": (LOADS | {"P_D": "-30 kip"}, InputError, ["tension"]),
    "all loads zero": (LOADS | {"P_D": "0 kip"}, InputError, ["zero"]),
    "negative compression": ({"compression": "-5 kip"}, InputError, ["compression", "0"]),
    "no thickness": ({"plate_thickness": "0 in"}, InputError, ["plate_thickness", "greater than 0"]),
    "negative thickness": ({"plate_thickness": "-1/2 in"}, InputError, ["plate_thickness", "greater than 0"]),
    # types
    "half a row": ({"rows": 2.5}, InputError, ["rows", "whole number"]),
    "rows in words": ({"rows": "three"}, InputError, ["rows", "whole number"]),
    "a truth for a count": ({"rows": True}, InputError, ["rows", "whole number"]),
    "no rows": ({"rows": 0}, InputError, ["rows", "1"]),
    "a number for a name": ({"member": 7}, InputError, ["member", "text"]),
    "an empty name": ({"member": ""}, InputError, ["member"]),
    "a list for a load": ({"tension": ["3 kip"]}, InputError, ["tension", "force"]),
    "maybe": ({"deformation_considered": "maybe"}, InputError, ["deformation_considered", "True or False"]),
    # tables
    "unknown shape": ({"member": "W8x22"}, NotInTable, ["W8x22", "W8x21", "W8x24", "W8x18"]),
    "no shape at all": ({"member": "banana"}, NotInTable, ["banana", "nearest"]),
    "a shape without a bolted end here": ({"member": "HSS6x4x3/8"}, InputError, ["HSS6x4x3/8", "WT"]),
    "a flat bar on edge": ({"member": "PL 6 x 1/2"}, InputError, ["PL 6 x 1/2", "thickness x width"]),
    "unknown grade": ({"member_grade": "A999"}, NotInTable, ["A999", "nearest", "A992"]),
    "unknown plate grade": ({"plate_grade": "B36"}, NotInTable, ["B36", "nearest", "A36"]),
    "grade not made as plate": ({"plate_grade": "A992"}, InputError, ["A992", "plate", "A572"]),
    "pipe grade for a plate": ({"plate_grade": "A53 B"}, InputError, ["A53", "plate", "A36"]),
    "unknown bolt": ({"bolt": "9/16"}, NotInTable, ["9/16", "5/8", "1/2"]),
    "unknown metric bolt": ({"bolt": "M19"}, NotInTable, ["M19", "M20"]),
    "unknown bolt grade": ({"bolt_grade": "A999"}, NotInTable, ["A999", "A490"]),
    "group of the later edition": ({"bolt_grade": "F3148", "edition": "360-16"}, NotInTable, ["Group 144", "360-16"]),
    "common bolts have no metric sizes": ({"bolt_grade": "A307", "bolt": "M20"}, NotInTable, ["A307", "metric", "M20"]),
    "unknown hole": ({"member_holes": "huge"}, InputError, ["member_holes", "STD", "LSL along"]),
    "unknown installation": ({"installation": "tight"}, InputError, ["installation", "snug", "pretensioned", "slip-critical"]),
    "unknown threads": ({"threads": "Y"}, InputError, ["threads", "N", "X"]),
    "three plates": ({"plates": 3}, InputError, ["plates", "1, 2"]),
    "unknown edition": ({"edition": "360-10"}, InputError, ["360-10", "360-22", "360-16"]),
    "unknown loads standard": ({"loads": "7-10"}, InputError, ["7-10", "7-22", "7-16"]),
    # layout
    "hole off the member": ({"gage": "7 in"}, InputError, ["hole", "PL 1/2 x 6", "6 in wide"]),
    "hole over the member's end": ({"member_end": "0.3 in"}, InputError, ["hole", "edge", "PL 1/2 x 6"]),
    "hole over the plate's edge": ({"plate_end": "0.2 in"}, InputError, ["hole", "edge", "connection plate"]),
    "plate pushed off the pattern": ({"plate_offset": "3 in"}, InputError, ["hole", "connection plate"]),
    "plate too narrow": ({"plate_width": "2 in"}, InputError, ["hole", "connection plate", "2 in wide"]),
    "hole upon hole": (NO_GRID | {"holes": "0 in, 3 in; 0 in, 3 in"}, ScopeError, ["0 in apart", "2-2/3 d", "J3.4"]),
    "overlapping holes": (NO_GRID | {"holes": "0 in, 3 in; 3/4 in, 3 in"}, ScopeError, ["apart", "2-2/3 d"]),
    "zero pitch": ({"pitch": "0 in"}, InputError, ["pitch", "greater than 0"]),
    "negative pitch": ({"pitch": "-3 in"}, InputError, ["pitch", "greater than 0"]),
    "zero gage": ({"gage": "0 in"}, InputError, ["gage", "greater than 0"]),
    "negative gage": ({"gage": "-3 in"}, InputError, ["gage", "greater than 0"]),
    "too many gages": ({"gage": "2 in, 2 in"}, InputError, ["gage", "got 2"]),
    "pitch under the minimum": ({"pitch": "2-1/4 in"}, ScopeError, ["2.25 in", "2.333 in", "2-2/3 d", "J3.4"]),
    "pitch under the minimum, 2016": ({"pitch": "2-1/4 in", "edition": "360-16"}, ScopeError, ["2-2/3 d", "J3.3"]),
    "bolt too big for the gage": ({"bolt": "1-1/4"}, ScopeError, ["3 in", "3.333 in", "2-2/3 d"]),
    "slots too near each other": (SLIP | {"member_holes": "LSL along"}, ScopeError, ["clear", "d = ⅞ in", "J3.4"]),
    "holes and a grid": ({"holes": "0 in, 1-1/2 in; 3 in, 1-1/2 in"}, InputError, ["holes", "lines", "rows"]),
    "gage from a back that a plate has not": ({"gage_from_back": "2 in"}, InputError, ["gage_from_back", "legs"]),
    "holes in a leg that a plate has not": ({"other_leg_holes": "0 in, 2 in"}, InputError, ["other_leg_holes", "angles"]),
    # scope of the provisions
    "oversized holes in bearing": ({"member_holes": "OVS"}, ScopeError, ["member_holes", "OVS", "slip-critical", "J3.3"]),
    "oversized holes in the plate, 2016": ({"plate_holes": "OVS", "edition": "360-16"}, ScopeError, ["plate_holes", "slip-critical", "J3.2"]),
    "short slot along the load in bearing": ({"member_holes": "SSL along"}, ScopeError, ["member_holes", "across", "J3.3"]),
    "long slot along the load in bearing": ({"plate_holes": "LSL along", "pitch": "4 in"}, ScopeError, ["plate_holes", "across", "J3.3"]),
    "long slots in both plies": ({"member_holes": "LSL across", "plate_holes": "LSL across"}, ScopeError, ["long slots", "one", "J3.3"]),
    "common bolts as slip-critical": (SLIP | {"bolt_grade": "A307"}, ScopeError, ["A307", "snug"]),
    "no class of faying surface": ({"installation": "slip-critical"}, InputError, ["slip_class", "A or B"]),
    "a class without slip": ({"slip_class": "A"}, InputError, ["slip_class", "slip-critical"]),
    "U over one": ({"U_by_hand": 1.2, "U_basis": "because of a test"}, InputError, ["U_by_hand", "1"]),
    "U without a basis": ({"U_by_hand": 0.9}, InputError, ["U_by_hand", "U_basis"]),
    "fillers without thickness": ({"fillers": 1}, InputError, ["fillers", "filler_thickness"]),
    "thickness without fillers": ({"filler_thickness": "1/2 in"}, InputError, ["fillers", "filler_thickness"]),
    "gap of a flat bar": ({"gap": "1 in"}, InputError, ["gap", "double angles"]),
    "compression without a support": (REVERSING, InputError, ["gusset_support", "chevron", "gusset_length"]),
    "compression without a length": (REVERSING | {"gusset_support": "chevron"}, InputError, ["gusset_length", "missing"]),
    "unknown support": (REVERSING | {"gusset_support": "floating", "gusset_length": "5 in"}, InputError, ["floating", "chevron"]),
    "K without a basis": (REVERSING | {"gusset_support": "by hand", "gusset_K": 0.6, "gusset_length": "5 in"}, InputError, ["gusset_K_basis"]),
    "rho between its values": (LOADS | {"P_D": "30 kip", "rho": 1.2}, InputError, ["rho", "1.0", "1.3"]),
    "companion factor between its values": (LOADS | {"P_D": "30 kip", "companion_L": 0.7}, InputError, ["companion_L", "0.5", "1.0"]),
}

FLANGE_CASES = {
    "grade not made as a W": ({"member_grade": "A500 C"}, InputError, ["A500", "W", "A992"]),
    "no way given": ({"connected_by": None}, InputError, ["connected_by", "both flanges", "web"]),
    "a way of another series": ({"connected_by": "stem"}, InputError, ["connected_by", "stem", "both flanges"]),
    "one bolt per line": ({"rows": 1}, ScopeError, ["one bolt per line", "D3.1", "U_by_hand"]),
    "hole off the flange": ({"gage": "5 in"}, InputError, ["hole", "W8x21", "5.27 in wide"]),
    "bolt too near the web": ({"gage": "2 in", "bolt": "3/4", "member": "W10x112"}, InputError, ["bolt 3/4", "too big for the gage"]),
    "gap of a W": ({"gap": "1 in"}, InputError, ["gap", "double angles"]),
}

ANGLE_CASES = {
    "one bolt in the leg": ({"rows": 1}, ScopeError, ["one bolt per line", "case 2"]),
    "no gage from the back": ({"gage_from_back": None}, InputError, ["gage_from_back", "missing"]),
    "gage past the toe": ({"gage_from_back": "3.9 in"}, InputError, ["hole", "L4x4x1/2", "4 in wide"]),
    "bolt too big for the gage": ({"gage_from_back": "1-1/4 in"}, InputError, ["bolt 7/8", "too big for the gage", "0.75 in"]),
    "which leg": ({"member": "L6x4x1/2"}, InputError, ["connected_by", "long leg", "short leg"]),
    "a web it has not": ({"connected_by": "web"}, InputError, ["connected_by", "web", "long leg"]),
    "gap under the plate's thickness": ({"member": "2L4x4x1/2", "gap": "1/4 in"}, InputError, ["gap", "¼ in", "½ in"]),
    "two plates at a double angle": ({"member": "2L4x4x1/2", "plates": 2}, InputError, ["plates", "double angle"]),
    "unknown angle": ({"member": "L4x4x7/16x2"}, NotInTable, ["L4"]),
}

CASES = [pytest.param(base, *case, id=name) for base, cases in ((PLATE, PLATE_CASES), (FLANGES, FLANGE_CASES), (ANGLE, ANGLE_CASES))
         for name, case in cases.items()]

JARGON = re.compile(r"\b(gt|ge|lt|le) |[Mm](in|ax) length|\b(String|Input) should|pydantic|Traceback|np\.|numpy|<class|type=|validation error")


def refusal(base, changes):
    """Build a connection with the changes made literally, and return what it raised."""
    inputs = {key: value for key, value in (base | changes).items() if key not in ("edition", "method") and value is not None}
    try:
        found = BoltedConnection.of(edition=changes.get("edition", "360-22"), **inputs).checks
    except Exception as error:
        return error
    raise AssertionError(f"accepted: {len(found)} checks")


@pytest.mark.parametrize("base, changes, kind, words", CASES)
class TestRefused:
    def test_by_the_right_class_with_the_right_words(self, base, changes, kind, words):
        error = refusal(base, changes)

        assert type(error) is kind, repr(error)
        assert [word for word in words if word not in str(error)] == [], str(error)

    def test_in_one_plain_sentence(self, base, changes, kind, words):
        message = str(refusal(base, changes))

        assert "\n" not in message and 15 < len(message) < 300
        # a sentence may hold "J3.4", "in." and "1.5"; a second one would begin with a capital after a full stop
        assert not re.search(r"[.!?] +[A-Z]", message.replace("Eq. ", "").replace("Gr. ", ""))
        assert not JARGON.search(message), message


def test_the_bases_are_accepted():
    for base in (PLATE, FLANGES, ANGLE):
        assert bolted(base).checks


def test_every_error_is_one_of_ours():
    for kind in (InputError, NotInTable, ScopeError):
        assert issubclass(kind, GagelineError)


@pytest.mark.parametrize("name, base, changes", [
    ("member_grade", PLATE, {"member_grade": "A999"}), ("plate_grade", PLATE, {"plate_grade": "A992"}), ("bolt_grade", PLATE, {"bolt_grade": "A999"}),
    ("member", PLATE, {"member": "W8x22"}), ("bolt", PLATE, {"bolt": "9/16"}), ("member_grade", FLANGES, {"member_grade": "A500 C"}),
])
def test_a_miss_in_a_table_names_the_input(name, base, changes):
    """Two grades stand in one cell of inputs: the sentence has to say which."""
    assert re.search(rf"\b{name}\b", str(refusal(base, changes)))


@pytest.mark.parametrize("text", ["#$\\@\"<>", "Ω ψ ж 橋", "a\tb", "{%raw%}", "x" * 5000])
def test_text_is_taken_as_it_is(text):
    connection = bolted(title=text, mark="T1", purpose=text, assumptions=[text], open_items=[text])

    assert connection.inputs.title == connection.inputs.purpose == text
    assert text in connection.open_items() and (text, "engineer") in connection.assumptions()


@pytest.mark.parametrize("given", [
    {"pitch": "76.2 mm"}, {"pitch": "3\""}, {"pitch": "0'-3\""}, {"pitch": "0.25 ft"}, {"gage": "3in"}, {"plate_thickness": ".5 in"},
    {"plate_thickness": "½ in"}, {"member": "pl 0.5 × 6"}, {"member": "Plate 1/2 in x 6 in"}, {"member": "plate 1/2 x 6"}, {"bolt": "0.875"},
    {"bolt": "7/8 in"}, {"bolt_grade": "a325"}, {"bolt_grade": "Group 120"}, {"member_grade": "A572 Gr. 50"},
    {"plate_grade": "a572 grade 50"}, {"tension": "222.4110807630275 kN"},
], ids=lambda given: next(iter(given.values())))
def test_ways_of_writing_the_same(given):
    plain, written = bolted(), bolted(**given)

    assert {each.id: each.ratio for each in written.checks if each.applies} == \
        pytest.approx({each.id: each.ratio for each in plain.checks if each.applies}, rel=1e-9)
