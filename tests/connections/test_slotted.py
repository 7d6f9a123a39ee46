"""Hollow sections on gussets: hand cases, both editions, limits of scope, reinforcement, sweeps, monotony, figures."""

import json
import math
import time
from itertools import pairwise

import numpy as np
import pytest
from helpers import checks, remarks, value_of
from hypothesis import HealthCheck, given, settings
from hypothesis import strategies as st
from shapely.geometry import Point, Polygon, box

from gageline import study
from gageline.check import FACTORS
from gageline.connections.slotted import ORDER, SlottedConnection, advice, member
from gageline.errors import GagelineError, InputError, ScopeError
from gageline.facts import hollow, shapes

SQUARE = {"mark": "T1", "member": "HSS6x6x3/8", "member_grade": "A500-C", "plate_thickness": "1/2 in", "plate_width": "16 in",
          "plate_grade": "A572-50", "weld_length": "10 in", "weld_leg": "5/16 in", "weld_held_back": "5/16 in", "slot_overrun": "1/2 in",
          "tension": "150 kip"}
RECT = SQUARE | {"member": "HSS6x4x3/8", "side_along_gusset": "long"}
ROUND = SQUARE | {"member": "HSS6.000x0.500"}
PIPE = SQUARE | {"member": "Pipe6STD", "member_grade": "A53-B"}
SIDES = {key: value for key, value in SQUARE.items() if key not in ("weld_held_back", "slot_overrun")} | {"gussets": 2, "plate_width": "3-1/2 in"}
PLATES = {"reinforcing_thickness": "3/8 in", "reinforcing_width": "3 in", "reinforcing_length": "6 in", "reinforcing_leg": "3/16 in",
          "reinforcing_grade": "A572-50"}
BRACE = {"compression": "120 kip", "gusset_support": "single brace", "gusset_length": "8 in"}
BASES = {"square": SQUARE, "rectangular": RECT, "round": ROUND, "pipe": PIPE, "side gussets": SIDES, "reinforced": SQUARE | PLATES}

each_base = pytest.mark.parametrize("base", BASES.values(), ids=BASES)
each_edition = pytest.mark.parametrize("edition", ["360-22", "360-16"])


def slotted(base=SQUARE, *, edition="360-22", method="LRFD", **changes):
    """Build a connection from a base with changes; None removes an input. A given demand takes the level of the method."""
    inputs = base | {"demand_level": method if "tension" in base | changes else None} | changes
    return SlottedConnection.of(edition=edition, method=method, **{name: value for name, value in inputs.items() if value is not None})


def nominal(connection):
    """Return id -> nominal strength of every strength check that applies."""
    return {each.id: each.nominal for each in connection.checks if each.kind == "strength" and each.applies}


def never_weaker(connections, ids=None):
    """Assert that no strength falls from one connection to the next."""
    for before, after in pairwise([nominal(each) for each in connections]):
        for id in ids or before:
            assert after[id] >= before[id] * (1 - 1e-12), id


class TestListOfChecks:
    @each_base
    @each_edition
    @pytest.mark.parametrize("reversing", [{}, BRACE], ids=["tension", "reversing"])
    def test_every_limit_state_stands_in_order_with_numbers_or_a_reason(self, base, edition, reversing):
        connection = slotted(base, edition=edition, **reversing)

        assert tuple(each.id for each in connection.checks if each.kind == "strength") == (*ORDER, "fatigue")
        for each in connection.checks:
            if each.applies:
                assert each.available > 0 and math.isfinite(each.ratio), each.id
                assert each.kind != "strength" or each.limit_state in FACTORS
            else:
                assert len(each.reason) > 10

    @each_base
    def test_results_are_plain_data_and_the_last_step_is_the_available_strength(self, base):
        connection = slotted(base, **BRACE)
        json.dumps(connection.to_dict(), allow_nan=False)
        for each in connection.checks:
            if each.kind == "strength" and each.applies:
                made, values = each.steps[-1]
                assert made.bare(*values) == each.available

    @each_base
    def test_capacity_is_what_it_carries(self, base):
        connection = slotted(base)

        assert slotted(base, tension=f"{connection.capacity * 0.999} kip").governing.ok
        assert not slotted(base, tension=f"{connection.capacity * 1.001} kip").ok

    def test_welds_and_walls_carry_the_larger_sense(self):
        found = checks(slotted(compression="180 kip", gusset_support="single brace", gusset_length="8 in"))

        for id in ("weld", "wall shear yielding", "wall shear rupture", "plate shear yielding", "plate shear rupture"):
            assert found[id].demand == 180
        assert found["member rupture"].demand == found["plate block"].demand == 150
        assert found["slot compression"].demand == found["gusset compression"].demand == 180

    @each_base
    def test_lrfd_and_asd_share_the_nominal_strength(self, base):
        lrfd, asd = nominal(slotted(base, **BRACE)), nominal(slotted(base, method="ASD", **BRACE))

        assert lrfd == asd

    def test_factors_are_those_of_the_specification(self):
        """D2, J2, J4: yielding and compression 0.90/1.67, shear yielding 1.00/1.50, the rest 0.75/2.00."""
        found = {id: FACTORS[each.limit_state] for id, each in checks(slotted(SQUARE | PLATES, **BRACE)).items() if each.limit_state}

        assert {id for id, pair in found.items() if pair == (1.00, 1.50)} == {"wall shear yielding", "plate shear yielding"}
        assert {id for id, pair in found.items() if pair == (0.90, 1.67)} == {"member yielding", "plate yielding", "Whitmore yielding",
                                                                              "slot compression", "gusset compression"}
        assert all(pair == (0.75, 2.00) for pair in set(found.values()) - {(1.00, 1.50), (0.90, 1.67)})


class TestByHand:
    """HSS6x6x3/8 (A 7.58 in², t 0.349 in), A500 Gr. C 50/62, gusset 1/2 x 16 of 50/65, four 5/16 fillets of 10 in, E70."""

    def test_member(self):
        found = nominal(slotted())
        A_n = 7.58 - 2 * 0.349 * (0.5 + 1 / 16)
        b, t, H = (6 - 0.5) / 2, 0.349, 6
        x_bar = b - (2 * b**2 + t * H - 2 * t**2) / (2 * H + 4 * b - 4 * t)

        assert found["member yielding"] == pytest.approx(50 * 7.58)
        assert found["member rupture"] == pytest.approx(62 * A_n * (1 - x_bar / 10))
        assert found["wall shear yielding"] == pytest.approx(0.6 * 50 * 4 * 10 * 0.349)
        assert found["wall shear rupture"] == pytest.approx(0.6 * 62 * 4 * 10 * 0.349)

    def test_welds_and_gusset(self):
        found = nominal(slotted(**BRACE))
        L_w = 6 + 2 * 10 * math.tan(math.radians(30))

        assert L_w > 16
        assert found["weld"] == pytest.approx(0.6 * 70 * 4 * 10 * 5 / 16 / math.sqrt(2))
        assert found["plate shear yielding"] == pytest.approx(0.6 * 50 * 2 * 10 * 0.5)
        assert found["plate shear rupture"] == pytest.approx(0.6 * 65 * 2 * 10 * 0.5)
        assert found["plate block"] == pytest.approx(0.6 * 50 * 10 + 65 * 3)
        assert found["plate yielding"] == found["Whitmore yielding"] == pytest.approx(50 * 8)
        assert found["Whitmore rupture"] == pytest.approx(65 * 8)
        assert found["slot compression"] == pytest.approx(50 * (7.58 - 2 * 0.349 * 0.5625))
        F_e = math.pi**2 * 29000 / (0.7 * 8 / (0.5 / math.sqrt(12))) ** 2
        assert found["gusset compression"] == pytest.approx(0.658 ** (50 / F_e) * 50 * 8)

    def test_a_wider_gusset_is_stressed_over_the_whitmore_width(self):
        found = nominal(slotted(plate_width="24 in"))

        assert found["Whitmore yielding"] == pytest.approx(50 * 0.5 * (6 + 20 * math.tan(math.radians(30))))
        assert found["plate yielding"] == pytest.approx(50 * 12)

    def test_side_gussets(self):
        found = nominal(slotted(SIDES))
        U = 3 * 10**2 / (3 * 10**2 + 6**2)

        assert found["member rupture"] == pytest.approx(62 * 7.58 * U)
        assert found["plate shear rupture"] == pytest.approx(0.6 * 65 * 4 * 10 * 0.5)
        assert found["plate yielding"] == found["Whitmore yielding"] == pytest.approx(50 * 2 * 3.5 * 0.5)
        old = nominal(slotted(SIDES, edition="360-16"))
        assert old["member rupture"] == pytest.approx(62 * 7.58 * (1 - 0.75 / 10))


class TestShearLag:
    def test_rectangular_eccentricity_is_the_centroid_of_the_half_tube_beyond_the_gusset(self):
        """Independent: centroid of the half tube with sharp corners, by polygon geometry."""
        B, H, t, t_p = 4.0, 6.0, 0.349, 0.5
        half = box(0, 0, B, H).difference(box(t, t, B - t, H - t)).intersection(box(B / 2 + t_p / 2, 0, B, H))

        assert member.eccentricity(_bare, slotted(RECT).joint)[0] == pytest.approx(half.centroid.x - B / 2 - t_p / 2, abs=1e-9)

    def test_round_eccentricity_is_the_centroid_of_the_arc_beyond_the_gusset(self):
        """Independent: centroid of a thin outer ring beyond the gusset's face, by polygon geometry."""
        ring = Point(0, 0).buffer(3.0, quad_segs=2000).difference(Point(0, 0).buffer(2.999, quad_segs=2000))
        half = ring.intersection(box(0.25, -4, 4, 4))

        assert member.eccentricity(_bare, slotted(ROUND).joint)[0] == pytest.approx(half.centroid.x - 0.25, abs=2e-3)

    def test_the_side_along_the_gusset_is_h(self):
        """Table D3.1, case 6 of 360-16: (4² + 2·4·6)/40 = 1.6 with the long side along the gusset, (6² + 2·4·6)/40 = 2.1 with the short."""
        long, short = (checks(slotted(RECT, edition="360-16", side_along_gusset=side))["member rupture"] for side in ("long", "short"))

        assert value_of(long, "rectangular_shear_lag") == pytest.approx(1 - 1.6 / 10)
        assert value_of(short, "rectangular_shear_lag") == pytest.approx(1 - 2.1 / 10)

    @pytest.mark.parametrize("length, U", [("6 in", 1 - 6 / math.pi / 6), ("7-3/4 in", 1 - 6 / math.pi / 7.75), ("7.8 in", 1.0), ("12 in", 1.0)])
    def test_round_of_360_16_steps_at_1_3_d(self, length, U):
        check = checks(slotted(ROUND, edition="360-16", weld_length=length))["member rupture"]

        assert check.nominal == pytest.approx(62 * (8.09 - 2 * 0.465 * 0.5625) * U)

    def test_360_22_is_below_360_16_for_long_welds_of_round_tubes(self):
        new, old = (checks(slotted(ROUND, edition=edition))["member rupture"] for edition in ("360-22", "360-16"))

        assert value_of(new, "round_shear_lag") < value_of(old, "round_shear_lag_long") == 1.0

    @pytest.mark.parametrize("base, sign", [(SQUARE, "H"), (ROUND, "D"), (SIDES, "H")], ids=["square", "round", "side gussets"])
    def test_360_16_refuses_welds_shorter_than_the_tube_is_wide(self, base, sign):
        with pytest.raises(ScopeError, match=rf"360-16 needs l at least {sign} = 6 in"):
            slotted(base, edition="360-16", weld_length="5-3/4 in")

        slotted(base, edition="360-22", weld_length="5-3/4 in")

    def test_360_22_refuses_welds_shorter_than_the_eccentricity(self):
        with pytest.raises(ScopeError, match="not more than the eccentricity"):
            slotted(weld_length="1-3/4 in", plate_width="16 in")

    def test_u_by_hand_needs_and_prints_its_basis(self):
        with pytest.raises(InputError, match="U_basis"):
            slotted(U_by_hand=0.8)
        connection = slotted(U_by_hand=0.8, U_basis="finite element study FE-3 (invented)")

        assert checks(connection)["member rupture"].nominal == pytest.approx(62 * (7.58 - 2 * 0.349 * 0.5625) * 0.8)
        assert any("FE-3" in text for text, _ in connection.assumptions())


class TestSlot:
    def test_a_wider_end_of_the_slot_is_deducted(self):
        """A drilled end of 1-1/16 in instead of a slot of 9/16 in takes 2 (0.349)(0.5) in² more."""
        narrow, drilled = (value_of(checks(slotted(slot_end_width=width))["member rupture"], "slotted_net_area") for width in (None, "1-1/16 in"))

        assert narrow - drilled == pytest.approx(2 * 0.349 * 0.5)

    @pytest.mark.parametrize("clearance, gap, counted", [("1/16 in", None, 5 / 16), ("1/8 in", None, 3 / 16), ("1/8 in", "1/16 in", 5 / 16),
                                                         ("3/16 in", None, 1 / 8), ("3/16 in", "1/8 in", 3 / 16)])
    def test_a_gap_of_more_than_a_sixteenth_comes_off_the_leg(self, clearance, gap, counted):
        found = checks(slotted(slot_clearance=clearance, weld_gap=gap))

        assert found["weld"].nominal == pytest.approx(0.6 * 70 * 4 * 10 * counted / math.sqrt(2))

    def test_gaps_beyond_3_16_are_refused(self):
        with pytest.raises(ScopeError, match="3/16 in is the most"):
            slotted(slot_clearance="1/4 in")

    def test_a_gap_below_half_the_clearance_cannot_be(self):
        with pytest.raises(InputError, match="less than half the slot_clearance"):
            slotted(slot_clearance="3/16 in", weld_gap="1/16 in")

    def test_a_return_is_not_counted_and_the_slot_stays_deducted(self):
        plain, returned = slotted(), slotted(end_return=True, weld_held_back=None, slot_overrun=None)

        assert nominal(plain) == nominal(returned)
        assert checks(returned)["weld end"].reason and "return" in " ".join(checks(returned)["member rupture"].notes)

    def test_a_slot_longer_than_the_tube_is_deep_may_yield(self):
        short, long = (checks(slotted(slot_overrun=overrun)) for overrun in ("1/2 in", "8 in"))

        assert not short["slot yielding"].applies
        assert long["slot yielding"].nominal == pytest.approx(50 * (7.58 - 2 * 0.349 * 0.5625))

    def test_a_weld_to_the_edge_is_advised_against(self):
        connection = slotted(weld_held_back=None)

        assert checks(connection)["weld end"].ok is False and connection.ok
        assert any("gusset's edge" in item for item in connection.open_items())


class TestWall:
    def test_full_wall_steels_have_their_own_area(self):
        """B4.2: 1.0 t_nom for A1065 and A1085; published area of HSS6x6x3/8 in A1085: 8.08 in² (AISC teaching aid)."""
        found = checks(slotted(member_grade="A1085"))

        assert value_of(found["member yielding"], "rectangular_area") == pytest.approx(8.08, abs=5e-3)
        assert found["wall shear yielding"].nominal == pytest.approx(0.6 * 50 * 4 * 10 * 0.375)
        assert "full nominal wall" in remarks(found["member yielding"])

    def test_the_printed_area_is_the_one_used(self):
        for base, name in ((SQUARE, "rectangular_area"), (ROUND, "round_area")):
            connection = slotted(base, member_grade="A1085")
            assert value_of(checks(connection)["member yielding"], name) == pytest.approx(connection.joint.tube.A_g, rel=1e-12)

    def test_recomputed_properties_are_those_of_the_tables(self):
        """Independent: with the tables' wall the formulas give the tables' printed areas and radii, three figures and a rounded wall."""
        for name in shapes.names("HSS"):
            one = shapes.shape(name)
            found = hollow.rectangular_tube(one.H, one.B, one.t_des) if one.D is None else hollow.round_tube(one.D, one.t_des)
            printed = (one.A, one.r_x, one.r_y) if one.D is None else (one.A, one.r_x)

            assert found == pytest.approx(printed, rel=0.011), name

    def test_rounded_rectangle_by_another_method(self):
        """Independent: area and inertia of the cross-section by polygon geometry (shapely), corners of 2t and t."""
        H, B, t = 6.0, 4.0, 0.375
        outer = box(2 * t, 2 * t, B - 2 * t, H - 2 * t).buffer(2 * t, quad_segs=400)
        inner = box(2 * t, 2 * t, B - 2 * t, H - 2 * t).buffer(t, quad_segs=400)
        A, r_x, r_y = hollow.rectangular_tube(H, B, t)

        assert outer.area - inner.area == pytest.approx(A, rel=1e-5)
        assert math.sqrt((_inertia(outer, H / 2) - _inertia(inner, H / 2)) / A) == pytest.approx(r_x, rel=1e-5)
        assert r_y < r_x


class TestReinforcement:
    def test_by_hand(self):
        """Two plates 3/8 x 3, 6 in each side, 3/16 fillets; plate at 2.75 + 0.1875 in from the gusset's face."""
        found = nominal(slotted(SQUARE | PLATES))
        A_ns, A_r = 7.58 - 2 * 0.349 * 0.5625, 2 * 3 * 0.375
        b, t = 2.75, 0.349
        x_t = b - (2 * b**2 + t * 6 - 2 * t**2) / (12 + 4 * b - 4 * t)
        U = 1 - (A_ns * x_t + A_r * (b + 0.1875)) / (A_ns + A_r) / 10
        U_r = 3 * 36 / (3 * 36 + 9)

        assert found["member rupture"] == pytest.approx(62 * (A_ns + U_r * A_r) * U)
        assert found["rupture beyond plates"] == pytest.approx(62 * A_ns * (1 - x_t / 10) / (1 - 6 / 10))
        weld = 0.6 * 70 * 4 * 6 * 3 / 16 / math.sqrt(2)
        assert found["plates weld"] == pytest.approx(weld / (A_r / (A_ns + A_r)))

    def test_it_strengthens_a_rectangular_net_section(self):
        for edition in ("360-22", "360-16"):
            bare, plated = (nominal(slotted(base, edition=edition))["member rupture"] for base in (SQUARE, SQUARE | PLATES))
            assert plated > bare

    @pytest.mark.parametrize("base", [SQUARE, RECT, ROUND, PIPE], ids=["square", "rectangular", "round", "pipe"])
    @each_edition
    def test_a_net_section_that_falls_short_names_plates_that_do(self, base, edition):
        connection = slotted(base, edition=edition, weld_length="14 in", slot_end_width="1-1/4 in")
        T = 1.03 * checks(connection)["member rupture"].available
        short = slotted(base, edition=edition, weld_length="14 in", slot_end_width="1-1/4 in", tension=f"{T} kip")
        found = advice.lightest_reinforcement(short.joint, T, "LRFD")
        if found is None:
            assert "would do" in " ".join(checks(short)["member rupture"].notes)
            return
        text = {"reinforcing_thickness": f"{found.t} in", "reinforcing_width": f"{found.width} in", "reinforcing_length": f"{found.length} in",
                "reinforcing_leg": f"{found.leg} in", "reinforcing_grade": "A572-50"}
        mended = checks(slotted(base, edition=edition, weld_length="14 in", slot_end_width="1-1/4 in", tension=f"{T} kip", **text))

        assert "Reinforcement needed" in " ".join(checks(short)["member rupture"].notes)
        assert all(mended[id].ok for id in ("member rupture", "rupture beyond plates", "plates weld", "plates leg min", "plates leg max"))

    def test_a_net_section_that_suffices_asks_for_none(self):
        assert "Reinforcement needed" not in " ".join(checks(slotted())["member rupture"].notes)

    @pytest.mark.parametrize("missing", PLATES)
    def test_all_of_its_inputs_go_together(self, missing):
        with pytest.raises(InputError, match=f"input {missing} is missing"):
            slotted(SQUARE | PLATES, **{missing: None})

    @pytest.mark.parametrize("changes, words", [({"reinforcing_width": "5 in"}, "room"), ({"reinforcing_length": "12 in"}, "beyond the welds")])
    def test_plates_that_do_not_fit_are_refused(self, changes, words):
        with pytest.raises(InputError, match=words):
            slotted(SQUARE | PLATES, **changes)

    def test_a_wide_flat_bar_stands_off_a_round_tube(self):
        with pytest.raises(ScopeError, match="off the round tube"):
            slotted(ROUND | PLATES)


class TestLongWelds:
    @pytest.mark.parametrize("l, counted", [(18.75, 18.75), (25.0, 25 * (1.2 - 0.002 * 25 / 0.1875)), (60.0, 180 * 0.1875)])
    def test_end_loaded_welds_lose_length(self, l, counted):
        """J2.2b: all of it to 100 legs, beta to 300 legs, 180 legs beyond; leg 3/16 in."""
        found = checks(slotted(weld_leg="3/16 in", weld_length=f"{l} in"))

        assert found["weld"].nominal == pytest.approx(0.6 * 70 * 4 * counted * 0.1875 / math.sqrt(2))


class TestRefused:
    @pytest.mark.parametrize("changes, words", [
        ({"member": "W8x31"}, "no hollow section"),
        ({"member": "HSS6x4x3/8"}, "side_along_gusset is missing"),
        ({"side_along_gusset": "long"}, "tubes with unequal sides"),
        ({"member": "HSS6.000x0.500", "gussets": 2, "weld_held_back": None, "slot_overrun": None}, "is round"),
        ({"gussets": 2}, "is for a slotted tube"),
        ({"gussets": 2, "weld_held_back": None, "slot_overrun": None}, "flare groove"),
        ({"plate_width": "6-1/2 in"}, "must stand out"),
        ({"weld_length": "1 in"}, "four times the leg"),
        ({"end_return": True}, "not held back"),
        ({"end_return": True, "weld_held_back": None}, "cannot close a slot"),
        ({"electrode": "E90"}, "classes above matching"),
        ({"slot_end_width": "1/2 in"}, "less than the slot itself"),
        ({"plate_thickness": "4 in", "member": "HSS4x4x1/4"}, "cut away the whole wall"),
        ({"compression": "20 kip"}, "gusset_support"),
        ({"compression": "20 kip", "gusset_support": "chevron"}, "gusset_length"),
        ({"gusset_support": "by hand", "gusset_K": 0.8}, "gusset_K_basis"),
        ({"gusset_support": "somehow"}, "is not known"),
        ({"member_grade": "A992"}, "A992"),
        ({"weld_size": "1/4 in"}, "unknown input"),
    ])
    def test_in_one_sentence(self, changes, words):
        with pytest.raises(GagelineError) as refused:
            slotted(**changes)

        assert words in str(refused.value) and "\n" not in str(refused.value)


class TestSweep:
    @each_base
    @each_edition
    def test_array_of_lengths_equals_one_design_at_a_time(self, base, edition):
        connection = slotted(base, edition=edition)
        lengths = np.array([6.75, 7.8, 10.0, 31.25, 40.0, 100.0])
        swept = study.over(connection, connection.at(lengths), lengths.shape)

        for i, l in enumerate(lengths):
            single = checks(slotted(base, edition=edition, weld_length=f"{float(l)!r} in"))
            for id, strengths in swept.items():
                assert strengths[i] == pytest.approx(single[id].available, rel=1e-9), (id, l)

    @each_base
    @each_edition
    def test_curve_passes_through_the_design_and_never_falls(self, base, edition):
        connection = slotted(base, edition=edition)
        curve = study.capacity_curve(connection)
        i = curve.sweep.design

        assert curve.lengths[i] == connection.joint.l
        assert curve.envelope[i] == pytest.approx(connection.capacity, rel=1e-12)
        assert np.all(np.isfinite(curve.envelope)) and np.all(curve.envelope > 0)

    def test_ten_thousand_lengths_in_under_a_second(self):
        connection = slotted(SQUARE | PLATES)
        lengths = np.linspace(6.0, 40.0, 10_000)
        start = time.perf_counter()
        swept = study.over(connection, connection.at(lengths), lengths.shape)

        assert time.perf_counter() - start < 1.0
        assert all(values.shape == lengths.shape for values in swept.values())


class TestMonotony:
    @each_base
    def test_longer_welds_are_never_weaker(self, base):
        # Beyond the plates' end a longer weld leaves more of the load in the tube, so that state is left out.
        ids = [id for id in nominal(slotted(base)) if id != "rupture beyond plates"]

        never_weaker([slotted(base, weld_length=f"{l} in") for l in (7, 8, 10, 14, 20, 28)], ids)

    @each_base
    def test_a_larger_leg_is_never_weaker(self, base):
        never_weaker([slotted(base, weld_leg=f"{n}/16 in") for n in (3, 4, 5)])

    @pytest.mark.parametrize("base", [SQUARE, RECT, ROUND, PIPE], ids=["square", "rectangular", "round", "pipe"])
    def test_a_thicker_gusset_is_never_weaker_but_for_its_slot(self, base):
        ids = [id for id in nominal(slotted(base, **BRACE)) if id not in ("member rupture", "slot compression")]

        never_weaker([slotted(base, plate_thickness=f"{n}/16 in", **BRACE) for n in (6, 8, 10, 12, 16)], ids)

    def test_a_wider_slot_is_never_stronger(self):
        never_weaker([slotted(slot_clearance=f"{n}/16 in") for n in (3, 2, 1, 0)])

    @settings(max_examples=40, deadline=None, suppress_health_check=list(HealthCheck))
    @given(name=st.sampled_from(shapes.names("HSS")), sixteenths=st.integers(4, 24), length=st.integers(16, 160), leg=st.integers(3, 8),
           edition=st.sampled_from(["360-22", "360-16"]), method=st.sampled_from(["LRFD", "ASD"]), side=st.sampled_from(["long", "short"]))
    def test_random_connections_are_finite_or_refused_in_a_sentence(self, name, sixteenths, length, leg, edition, method, side):
        one = shapes.shape(name)
        unequal = one.D is None and one.H != one.B
        try:
            connection = slotted(member=name, side_along_gusset=side if unequal else None, plate_thickness=f"{sixteenths}/16 in",
                                 weld_length=f"{length / 4} in", weld_leg=f"{leg}/16 in", plate_width="60 in", edition=edition, method=method)
        except GagelineError as refused:
            assert len(str(refused)) > 20
            return
        for each in connection.checks:
            assert not each.applies or (each.available > 0 and math.isfinite(each.ratio))


class TestSaid:
    @each_base
    def test_figures_are_drawn(self, base):
        """Two figures, the second a section, each with caption and alternative text; the same text on every run."""
        connection = slotted(base)
        first, second = connection.drawings()

        assert "<svg" in first.svg and "<svg" in second.svg
        assert connection.governing.title[1:] in first.caption and connection.shape.name in first.alt and connection.shape.name in second.alt
        assert [each.svg for each in slotted(base).drawings()] == [first.svg, second.svg]

    @each_base
    def test_materials_and_parts_are_named(self, base):
        connection = slotted(base, **BRACE)
        built = dict(connection.designed())

        assert connection.shape.name in built["Member"] and "4 fillets 5/16 in x 10 in" in built["Welds"]
        assert "F_{EXX}" in connection.materials_text()
        assert connection.by_others()[0] == "the member in compression between its ends"
        assert all(text.endswith(".") for text, _ in connection.assumptions())

    def test_round_grades_differ_by_edition(self):
        """A500 Gr. C round: 46 ksi in the 360-16 era, 50 ksi since (tables of grades)."""
        assert [slotted(ROUND, edition=edition).member_material.F_y for edition in ("360-16", "360-22")] == [46.0, 50.0]


def _bare(made, *values):
    return made.bare(*values)


_bare.say = lambda text: None


def _inertia(polygon: Polygon, y0):
    """Second moment of a polygon about the horizontal line at y0, by Green's theorem."""
    xs, ys = polygon.exterior.xy
    xs, ys = np.array(xs), np.array(ys) - y0
    cross = xs[:-1] * ys[1:] - xs[1:] * ys[:-1]
    return abs(float(np.sum(cross * (ys[:-1] ** 2 + ys[:-1] * ys[1:] + ys[1:] ** 2)) / 12))
