"""A pin connection: hand cases, beam statics of the pin, editions, dimensional rules, refusals, sweep, drawings."""

import json
import math
import time

import numpy as np
import pytest
from helpers import checks, value_of
from hypothesis import HealthCheck, given, settings
from hypothesis import strategies as st
from scipy import integrate

from gageline import study
from gageline.connections import pin, pin_plate
from gageline.connections.pinned import PinnedConnection
from gageline.connections.pinned.drawing import moment, plate_outline
from gageline.errors import InputError, NotInTable, ScopeError

PLATE = {"mark": "P", "member_thickness": "1 in", "member_width": "7 in", "member_grade": "A572-50", "member_edge": "3-1/4 in",
         "pin_diameter": "2-1/4 in", "pin_grade": "A572-50", "gap": "9/16 in", "support_thickness": "5/8 in", "support_width": "7 in",
         "support_grade": "A572-50", "support_edge": "2-3/4 in", "tension": "130 kip", "demand_level": "LRFD"}
"""A pin plate between two support plates."""

EYEBAR = PLATE | {"member_kind": "eyebar", "member_thickness": "5/8 in", "member_width": "3 in", "member_edge": None, "pin_diameter": "3 in",
                  "head_diameter": "7-1/2 in", "head_radius": "8 in", "support_width": "9 in", "support_edge": "4 in", "tension": "50 kip"}
"""The eyebar of the published example, between plates of ours."""

ORDER = ["member tension rupture", "member shear rupture", "member bearing", "member yielding", "pin shear yielding", "pin shear rupture",
         "pin bending", "support tension rupture", "support shear rupture", "support bearing", "support yielding", "compression", "member hole",
         "member width", "member edge", "member corner", "support hole", "support width", "support edge", "support corner", "fatigue"]


def pinned(base=PLATE, *, edition="360-22", method="LRFD", **changes):
    """Build a pin connection from a base with changes; None removes an input."""
    inputs = base | {"demand_level": method} | changes
    return PinnedConnection.of(edition=edition, method=method, **{name: value for name, value in inputs.items() if value is not None})


def nominal(connection):
    """Return id -> nominal strength of every strength check that applies."""
    return {each.id: each.nominal for each in connection.checks if each.kind == "strength" and each.applies}


class TestByHand:
    def test_every_strength_of_the_plain_case(self):
        """Worked by hand: b_e member = min(2.63, (7 - 2.28125)/2) = 2.359375, support 1.88; e = 0.3125 + 0.5625 + 0.25 = 1.125."""
        found = nominal(pinned())

        assert found["member tension rupture"] == pytest.approx(65 * 2 * 1 * 2.359375)  # 306.72
        assert found["member shear rupture"] == pytest.approx(0.6 * 65 * 2 * (3.25 + 1.125))  # 341.25
        assert found["member bearing"] == pytest.approx(1.8 * 50 * 2.25)  # 202.5
        assert found["member yielding"] == pytest.approx(350.0)
        assert found["pin shear yielding"] == pytest.approx(0.6 * 50 * 2 * 3.97608, rel=1e-5)
        assert found["pin shear rupture"] == pytest.approx(0.563 * 65 * 2 * 3.97608, rel=1e-5)
        assert found["pin bending"] == pytest.approx(2 * 1.6 * 50 * 1.11827 / 1.125, rel=1e-5)  # 159.0
        assert found["support tension rupture"] == pytest.approx(2 * 65 * 2 * 0.625 * 1.88)
        assert found["support shear rupture"] == pytest.approx(2 * 0.6 * 65 * 2 * 0.625 * (2.75 + 1.125))
        assert found["support bearing"] == pytest.approx(2 * 1.8 * 50 * 2.25 * 0.625)
        assert found["support yielding"] == pytest.approx(2 * 50 * 7 * 0.625)

    def test_available_strengths_take_the_factors_of_their_limit_state(self):
        lrfd, asd = checks(pinned()), checks(pinned(method="ASD"))
        factors = {"member tension rupture": (0.75, 2.00), "member bearing": (0.75, 2.00), "member yielding": (0.90, 1.67),
                   "pin shear yielding": (1.00, 1.50), "pin shear rupture": (0.75, 2.00), "pin bending": (0.90, 1.67)}
        for id, (phi, omega) in factors.items():
            assert lrfd[id].available == pytest.approx(phi * lrfd[id].nominal)
            assert asd[id].available == pytest.approx(asd[id].nominal / omega)

    def test_checks_stand_in_order_with_numbers_or_a_reason(self):
        found = pinned().checks

        assert [each.id for each in found] == ORDER
        assert all(each.ratio is not None if each.applies else len(each.reason) > 10 for each in found)
        assert {each.part for each in found} <= set(PinnedConnection.parts)
        json.dumps(pinned().to_dict(), allow_nan=False)


class TestPin:
    """Independent: beam statics by numerical integration, section moduli by integration over the circle."""

    PIN = pin.Pin(2.0, 50.0, 65.0, t_outer=0.75, t_inner=1.5, gap=0.25)

    def test_moment_by_integrating_the_loads_of_the_plies(self):
        """Half the pin from its middle: an even load over half the inner ply, the resultant of the outer ply at its middle."""
        P, made = 80.0, self.PIN
        arm = made.t_outer / 2 + made.gap + made.t_inner / 2
        inner = integrate.quad(lambda z: P / made.t_inner * z, 0, made.t_inner / 2)[0]
        outer = integrate.quad(lambda z: P / 2 / made.t_outer * z, arm - made.t_outer / 2, arm + made.t_outer / 2)[0]

        assert moment(made, P, 0.0) == pytest.approx(outer - inner, rel=1e-9)
        assert P / 2 * value_of_arm(made) == pytest.approx(outer - inner, rel=1e-9)

    def test_moment_diagram_is_the_integral_of_the_shear(self):
        P, made = 80.0, self.PIN
        zs = np.linspace(-made.grip / 2, made.grip / 2, 40001)
        arm = made.t_outer / 2 + made.gap + made.t_inner / 2
        shear = np.where(np.abs(zs) > arm, 0.0, np.where(np.abs(zs) > made.t_inner / 2, -np.sign(zs) * P / 2, -P / made.t_inner * zs))
        by_integration = integrate.cumulative_trapezoid(shear, zs, initial=0.0)

        assert np.array([moment(made, P, z) for z in zs]) == pytest.approx(by_integration, abs=0.01)

    def test_bending_strength_as_load_gives_the_moment_strength_back(self):
        found = pin.bending(self.PIN).nominal

        assert moment(self.PIN, found, 0.0) == pytest.approx(1.6 * 50 * math.pi * 2.0**3 / 32)

    def test_moduli_by_integration_over_the_circle_and_which_limit_governs(self):
        r = 1.0
        width = lambda y: 2 * math.sqrt(r**2 - y**2)
        Z = 2 * integrate.quad(lambda y: y * width(y), 0, r)[0]
        S = 2 * integrate.quad(lambda y: y**2 * width(y), 0, r)[0] / r
        found = checks(pinned(pin_diameter="2 in", member_edge="4 in"))["pin bending"]

        assert value_of(found, "plastic_modulus_of_pin") == pytest.approx(Z)
        assert value_of(found, "elastic_modulus_of_pin") == pytest.approx(S)
        assert Z / S > 1.6

    def test_an_inner_ply_off_the_middle_bends_the_pin_less_than_the_gaps_do(self):
        """The assumption of a central ply is on the safe side for bending: shifted over by its gap, the greatest moment is less."""
        P, made = 80.0, self.PIN
        span = 2 * (made.t_outer / 2 + made.gap + made.t_inner / 2)
        near = made.t_outer / 2 + made.t_inner / 2
        R = P * (span - near) / span
        into = R / P * made.t_inner
        shifted = R * made.t_outer / 2 + integrate.quad(lambda z: R - P / made.t_inner * z, 0, into)[0]

        assert shifted < moment(made, P, 0.0)

    def test_the_lesser_shear_strength_governs_unless_set_aside_with_a_basis(self):
        both = checks(pinned())
        one = checks(pinned(pin_shear="yielding", pin_shear_basis="project criteria, section 4"))

        assert both["pin shear yielding"].applies and both["pin shear rupture"].applies
        assert "project criteria" in one["pin shear rupture"].reason
        assert one["pin shear yielding"].nominal == both["pin shear yielding"].nominal
        with pytest.raises(InputError, match="pin_shear_basis"):
            pinned(pin_shear="threaded part")

    def test_pin_and_bearing_carry_a_reversed_load(self):
        found = checks(pinned(tension="20 kip", compression="90 kip"))

        assert found["pin bending"].demand == found["member bearing"].demand == 90.0
        assert found["member yielding"].demand == 20.0
        assert "by others" in found["compression"].reason


def value_of_arm(made):
    """Return the arm that the pin's check uses. [in]"""
    return next(formula.bare(*values) for formula, values in pin.bending(made).steps if formula.__name__ == "pin_arm")


class TestPlates:
    def test_effective_width_is_what_is_there_or_two_thicknesses_and_a_constant(self):
        wide, narrow = checks(pinned(member_width="12 in", member_edge="5 in")), checks(pinned())

        assert value_of(wide["member tension rupture"], "effective_edge_width") == pytest.approx(2.63)
        assert value_of(narrow["member tension rupture"], "effective_edge_width") == pytest.approx((7 - 2.28125) / 2)

    def test_two_member_plates_outside_one_support(self):
        one, two = nominal(pinned()), pinned(member_plates=2)

        assert nominal(two)["member tension rupture"] == pytest.approx(2 * one["member tension rupture"])
        assert nominal(two)["member yielding"] == pytest.approx(2 * one["member yielding"])
        assert nominal(two)["support bearing"] == pytest.approx(one["support bearing"] / 2)
        assert (two.joint.pin.t_outer, two.joint.pin.t_inner) == (1.0, 0.625)

    def test_bearing_takes_the_smaller_yield_stress(self):
        soft = nominal(pinned(pin_grade="A36"))

        assert soft["member bearing"] == pytest.approx(1.8 * 36 * 2.25)
        assert nominal(pinned(pin_grade="A193-B7"))["member bearing"] == pytest.approx(1.8 * 50 * 2.25)

    def test_edge_distance_counts_from_the_edge_of_the_hole(self):
        short = checks(pinned(member_edge="3 in"))

        assert short["member edge"].fails and short["member edge"].demand == pytest.approx(1.33 * 2.359375)

    def test_cut_corner_by_coordinates(self):
        """Independent: least distance from the hole's centre to the cut, by its end points, less the hole's radius."""
        found = checks(pinned(member_corner_cut="1-1/2 in"))["member corner"]
        end, half, cut = 3.25 + 2.28125 / 2, 3.5, 1.5
        a, b = np.array([end, half - cut]), np.array([end - cut, half])
        away = abs(a[0] * b[1] - a[1] * b[0]) / np.linalg.norm(b - a)

        assert found.available == pytest.approx(away - 2.28125 / 2)
        assert found.ok and checks(pinned(member_corner_cut="2-1/4 in"))["member corner"].fails

    @settings(max_examples=30, deadline=None, suppress_health_check=[HealthCheck.too_slow])
    @given(t=st.floats(0.375, 2.0), w=st.floats(4.0, 12.0), a=st.floats(1.0, 6.0), d=st.floats(1.0, 3.0), more=st.floats(1.01, 1.5))
    def test_more_steel_is_never_weaker(self, t, w, a, d, more):
        plain = {"member_thickness": f"{t} in", "member_width": f"{w} in", "member_edge": f"{a} in", "pin_diameter": f"{d} in"}
        before = nominal(pinned(**plain))
        for name, value in (("member_thickness", t), ("member_width", w), ("member_edge", a)):
            after = nominal(pinned(**plain | {name: f"{value * more} in"}))
            assert all(after[id] >= before[id] * (1 - 1e-12) for id in before if id.startswith("member"))
        thicker_pin = nominal(pinned(**plain | {"pin_diameter": f"{min(d * more, w - 0.4)} in"}))
        assert all(thicker_pin[id] >= before[id] * (1 - 1e-12) for id in before if id.startswith("pin")) or d * more > w - 0.4
        wider_gap = nominal(pinned(**plain, gap="2 in"))
        assert wider_gap["pin bending"] < before["pin bending"]


class TestEditions:
    def test_only_the_clearance_factor_differs(self):
        old, new = pinned(edition="360-16"), pinned()

        assert nominal(old) == pytest.approx(nominal(new))
        names = {step[0].__name__ for each in old.checks for step in each.steps if not isinstance(step, str)}
        assert "shear_rupture_2016" in names and not {"close_hole", "loose_hole", "shear_rupture"} & names

    def test_a_loose_hole_reduces_shear_rupture_in_360_22(self):
        tight, loose = pinned(), pinned(hole_clearance="1/16 in", moves_under_load=False)

        assert nominal(loose)["member shear rupture"] == pytest.approx(0.95 * nominal(tight)["member shear rupture"])
        assert checks(loose)["member hole"].ok

    def test_a_loose_hole_is_refused_in_360_16(self):
        with pytest.raises(ScopeError, match=r"hole_clearance .* 360-16 .* 1/32"):
            pinned(edition="360-16", hole_clearance="1/16 in")

    @pytest.mark.parametrize("diameter, turns, good", [("2-1/4 in", True, False), ("2-1/4 in", False, True), ("3 in", True, True)])
    def test_clearance_of_a_pin_that_turns_under_full_load(self, diameter, turns, good):
        found = checks(pinned(hole_clearance="1/16 in", moves_under_load=turns, pin_diameter=diameter))["member hole"]

        assert found.ok is good


class TestEyebar:
    def test_body_governs_by_hand(self):
        found = nominal(pinned(EYEBAR))

        assert found["member yielding"] == pytest.approx(50 * 3 * 0.625)
        assert found["member rupture"] == pytest.approx(65 * 3 * 0.625)
        assert not checks(pinned(EYEBAR))["member shear rupture"].applies
        assert all(not each.fails for each in pinned(EYEBAR).checks)

    def test_width_beyond_eight_thicknesses_does_not_count(self):
        wide = pinned(EYEBAR, member_width="6 in", pin_diameter="5-1/2 in", head_diameter="14 in", head_radius="15 in", support_width="14 in")

        assert nominal(wide)["member yielding"] == pytest.approx(50 * 5.0 * 0.625)

    @pytest.mark.parametrize("changes, id", [
        ({"member_thickness": "7/16 in"}, "member thickness"), ({"pin_diameter": "2-1/2 in"}, "member pin"),
        ({"hole_clearance": "1/16 in"}, "member hole"), ({"head_diameter": "6-3/4 in"}, "member head"),
        ({"head_radius": "7 in"}, "member transition"),
        ({"member_grade": "A514", "pin_diameter": "3-1/4 in", "head_diameter": "7-3/4 in", "member_thickness": "5/8 in"}, "member strong hole"),
    ])
    def test_each_rule_of_proportion(self, changes, id):
        found = checks(pinned(EYEBAR, **changes))[id]

        assert found.fails and found.clause == "D6.2"

    def test_a_thin_bar_clamped_by_nuts_is_allowed(self):
        assert not checks(pinned(EYEBAR, member_thickness="7/16 in", eyebar_clamped=True))["member thickness"].applies

    def test_a_wide_head_is_advice_only(self):
        found = pinned(EYEBAR, head_diameter="8 in")

        assert checks(found)["member useful head"].ok is False and not checks(found)["member useful head"].fails

    def test_outline_is_smooth_from_head_to_body(self):
        corners = plate_outline(pinned(EYEBAR).joint.member, 12.0)

        assert max(y for _, y in corners) == pytest.approx(3.75, abs=0.02)
        assert {round(abs(y), 9) for x, y in corners if x <= -11.9} == {1.5}


class TestRefusals:
    @pytest.mark.parametrize("changes, error, words", [
        ({"member_edge": None}, InputError, ["member_edge", "missing"]),
        ({"hole_clearance": "1/8 in"}, ScopeError, ["hole_clearance", "D5", "1/16"]),
        ({"head_diameter": "8 in"}, InputError, ["head_diameter", "eyebar"]),
        ({"member_width": "2-3/8 in"}, InputError, ["member", "2⅜", "hole"]),
        ({"support_width": "2 in"}, InputError, ["support", "hole"]),
        ({"member_corner_cut": "3 in"}, InputError, ["member_corner_cut", "shear planes"]),
        ({"member_width": "14 in", "member_corner_cut": "4-1/2 in"}, InputError, ["member_corner_cut", "width beside", "4.391"]),
        ({"pin_grade": "A992"}, InputError, ["A992"]),
        ({"member_grade": "A999"}, NotInTable, ["A999", "nearest"]),
        ({"member_plates": 3}, InputError, ["member_plates", "1, 2"]),
        ({"pin_diameter": "0 in"}, InputError, ["pin_diameter"]),
        ({"gap": "-1/16 in"}, InputError, ["gap"]),
        ({"gapp": "1/16 in"}, InputError, ["gapp", "gap"]),
        ({"member_kind": "hook"}, InputError, ["member_kind", "pin plate, eyebar"]),
    ])
    def test_plate(self, changes, error, words):
        with pytest.raises(error) as refused:
            pinned(**changes)

        assert all(word in str(refused.value) for word in words), str(refused.value)

    @pytest.mark.parametrize("changes, words", [
        ({"head_radius": None}, ["head_radius", "missing"]), ({"member_edge": "2 in"}, ["member_edge", "circular head"]),
        ({"head_diameter": "3 in"}, ["head_diameter", "width of the body"]),
    ])
    def test_eyebar(self, changes, words):
        with pytest.raises(InputError) as refused:
            pinned(EYEBAR, **changes)

        assert all(word in str(refused.value) for word in words), str(refused.value)


class TestSweep:
    def test_marks_the_design_and_starts_at_the_least_edge_distance(self):
        connection = pinned()
        curve = study.capacity_curve(connection)
        at = curve.sweep.design

        assert curve.lengths[0] == pytest.approx(1.33 * 2.359375) and curve.lengths[at] == 3.25
        assert curve.envelope[at] == pytest.approx(connection.capacity)
        assert "D5.2" in curve.sentence or "edge distance" in curve.sentence

    def test_arrays_give_what_single_designs_give(self):
        connection = pinned()
        edges = np.linspace(3.2, 6.0, 7)
        swept = study.available_strengths(connection, connection.at(edge=edges))["member shear rupture"]

        assert swept == pytest.approx([checks(pinned(member_edge=f"{edge} in"))["member shear rupture"].available for edge in edges])

    def test_ten_thousand_lengths_take_less_than_a_second(self):
        connection, edges = pinned(), np.linspace(3.0, 9.0, 10_000)
        start = time.perf_counter()
        study.over(connection, connection.at(edge=edges), edges.shape)

        assert time.perf_counter() - start < 1.0

    def test_an_eyebar_has_none_and_says_so(self):
        assert "D6.2" in study.capacity_curve(pinned(EYEBAR))

    def test_a_design_below_the_least_edge_is_not_on_the_curve(self):
        assert study.capacity_curve(pinned(member_edge="3 in")).sweep.design is None


class TestDrawings:
    @pytest.mark.parametrize("base, changes", [(PLATE, {}), (PLATE, {"member_plates": 2, "member_corner_cut": "1 in"}), (EYEBAR, {})],
                             ids=["plate", "two plates", "eyebar"])
    def test_elevation_and_section_show_what_is_computed(self, base, changes):
        connection = pinned(base, **changes)
        elevation, section = connection.drawings()

        assert 'id="pin"' in elevation.svg and 'id="member-body"' in elevation.svg and 'id="support-body"' in elevation.svg
        assert 'id="moment"' in section.svg and section.svg.count("-ply") == 3
        assert elevation.alt and "to scale" in elevation.caption and 0 < elevation.width <= 1

    @pytest.mark.parametrize("changes, gid", [({"member_edge": "2 in", "member_width": "12 in", "pin_diameter": "4 in", "support_thickness": "2 in",
                                                "support_width": "12 in", "support_edge": "6 in"}, "sheared"),
                                              ({"member_width": "4-1/4 in", "support_thickness": "2 in"}, "torn"), ({}, "borne")])
    def test_the_weakest_path_is_marked(self, changes, gid):
        assert f'id="{gid}"' in pinned(**changes).drawings()[0].svg

    def test_the_report_says_what_is_left_to_others(self):
        said = " ".join(pinned().by_others())

        assert all(word in said for word in ("support", "retention", "dishing", "fatigue"))
        assert any("J4.2" in text for text, _ in pinned().assumptions())


def test_least_edge_is_that_of_the_rule():
    assert pin_plate.least_edge(pinned().joint.member) == checks(pinned())["member edge"].demand
