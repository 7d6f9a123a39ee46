"""Welded ends: one connection by hand, shear lag and group rules, balanced welds, blocks by a second method, refusals, sweep, figures."""

import time

import numpy as np
import pytest
from helpers import checks, remarks, value_of
from hypothesis import given, settings
from hypothesis import strategies as st

from gageline import study
from gageline.check import silent
from gageline.connections import weld_group
from gageline.connections.weld_group import WeldLines
from gageline.connections.welded import WeldedConnection
from gageline.connections.welded import strengths as welded_strengths
from gageline.errors import GagelineError, InputError, ScopeError
from gageline.geometry import End, Hole, Part, tear_out_blocks

BAR = {"mark": "T1", "member": "PL 1/2 x 6", "member_grade": "A36", "plate_thickness": "5/8 in", "plate_width": "8 in", "plate_grade": "A36",
       "weld_size": "1/4 in", "weld_length": "6 in", "lap": "7 in", "tension": "50 kip"}
"""A flat bar lapped on a wider plate, welded along both its edges."""

ANGLES = BAR | {"member": "2L4x3x5/16", "member_grade": "A572-50", "connected_by": "long leg", "plate_width": "14 in", "lap": "13 in"}
TEE = BAR | {"member": "WT6x20", "member_grade": "A992", "connected_by": "flange", "plate_width": "12 in"}
CHANNEL = BAR | {"member": "C10x15.3", "plate_width": "12 in", "weld_size": "3/16 in"}
FLANGES = TEE | {"member": "W8x31", "connected_by": "both flanges"}
WEB = TEE | {"member": "W18x50", "connected_by": "web", "plates": 2}


def welded(base=BAR, *, edition="360-22", method="LRFD", **changes):
    """Build a welded connection from a base with changes; None removes an input. A given demand takes the level of the method."""
    inputs = base | {"demand_level": method if "tension" in base | changes else None} | changes
    return WeldedConnection.of(edition=edition, method=method, **{name: value for name, value in inputs.items() if value is not None})


class TestByHand:
    """A bar 1/2 x 6 of A36 on a plate 5/8 x 8 of A36, two 1/4 in welds of 6 in, E70: every nominal strength by hand."""

    HAND = {
        "member yielding": 36 * 3.0,
        "member rupture": 58 * 3.0 * 0.75,  # U = 3(36)/(3(36) + 36)
        "member shear yielding": 0.6 * 36 * 2 * 6 * 0.5,
        "member shear rupture": 0.6 * 58 * 2 * 6 * 0.5,
        "weld": 0.6 * 70 * 2 * 6 * 0.25 * 0.5**0.5,
        "plate shear yielding": 0.6 * 36 * 2 * 6 * 0.625,
        "plate shear rupture": 0.6 * 58 * 2 * 6 * 0.625,
        "plate block": 0.6 * 36 * 7.5 + 58 * 2 * 1 * 0.625,  # outside the welds: 1 in to each edge; between them it would be 379.5
        "Whitmore yielding": 36 * 8 * 0.625,  # 6 + 2(6)tan 30 = 12.93 is cut off at 8
        "Whitmore rupture": 58 * 8 * 0.625,
        "plate yielding": 36 * 5.0,
        "plate rupture": 58 * 5.0,
    }

    @pytest.mark.parametrize("id", HAND)
    def test_nominal_strength(self, id):
        assert checks(welded())[id].nominal == pytest.approx(self.HAND[id], rel=1e-9)

    def test_available_strengths_have_the_factors_of_the_clause(self):
        lrfd, asd = checks(welded()), checks(welded(method="ASD"))
        factors = {"member yielding": (0.90, 1.67), "weld": (0.75, 2.00), "plate shear yielding": (1.00, 1.50), "plate shear rupture": (0.75, 2.00),
                   "plate block": (0.75, 2.00)}

        for id, (phi, omega) in factors.items():
            assert lrfd[id].available == pytest.approx(phi * self.HAND[id])
            assert asd[id].available == pytest.approx(self.HAND[id] / omega)

    def test_every_limit_state_is_listed_once_and_the_weld_governs(self):
        made = welded()
        ids = [each.id for each in made.checks]

        assert len(set(ids)) == len(ids)
        assert set(self.HAND) <= set(ids)
        assert made.governing.id == "weld"
        assert {each.part for each in made.checks if each.kind == "strength"} == {"member", "weld", "plate"}


class TestShearLag:
    @pytest.mark.parametrize("base, welds, length, case", [
        (BAR, "longitudinal", "6 in", "case 4"), (BAR, "longitudinal and end", "6 in", "case 1"), (BAR, "transverse, both ends", None, "case 1"),
        (ANGLES, "longitudinal", "6 in", "case 4"), (ANGLES, "longitudinal and end", "6 in", "case 2"),
        (TEE, "longitudinal", "6 in", "case 4"), (TEE, "transverse, both ends", None, "case 3"), (FLANGES, "longitudinal and end", "6 in", "case 2"),
        (CHANNEL, "longitudinal", "6 in", "case 4"), (WEB, "longitudinal and end", "6 in", "case 2"),
    ])
    def test_the_case_of_the_table_is_chosen_and_said(self, base, welds, length, case):
        plate = {"plate_width": "13 in"} if base is WEB else {}
        assert f"Table D3.1 {case}" in remarks(checks(welded(base, welds=welds, weld_length=length, **plate))["member rupture"])

    def test_channel_by_hand(self):
        """C10x15.3 welded at its heels: w is the full depth of 10 in, x 0.634 (Manual table)."""
        made = checks(welded(CHANNEL, weld_length="9 in", lap="10 in"))["member rupture"]

        assert value_of(made, "shear_lag_case_4") == pytest.approx(3 * 81 / (3 * 81 + 100) * (1 - 0.634 / 9), rel=2e-3)

    def test_short_welds_fall_back_on_the_area_ratio(self):
        """WT6x20, l = 2 in: case 4 is 0.072, so b_f t_f / A = 8.01(0.515)/5.84 = 0.706 counts."""
        made = checks(welded(TEE, weld_length="2 in", lap="3 in"))["member rupture"]

        assert made.nominal == pytest.approx(65 * 8.01 * 0.515, rel=2e-3)

    def test_a_flat_bar_has_no_area_ratio(self):
        made = checks(welded(weld_length="2 in"))["member rupture"]

        assert made.nominal == pytest.approx(58 * 3 * 12 / (12 + 36))

    def test_unequal_welds_count_with_their_mean(self):
        made = checks(welded(ANGLES, weld_length=None, weld_heel="12 in", weld_toe="6 in"))["member rupture"]

        assert value_of(made, "mean_weld_length") == 9.0

    @pytest.mark.parametrize("base", [BAR, ANGLES, TEE, FLANGES])
    def test_both_editions_agree(self, base):
        """Cases 1 to 4 and J2 are the same in 360-16 and 360-22."""
        new, old = (checks(welded(base, edition=edition)) for edition in ("360-22", "360-16"))

        assert {id: each.nominal for id, each in new.items()} == {id: each.nominal for id, each in old.items()}

    def test_set_by_hand_it_prints_its_basis(self):
        made = welded(U_by_hand=0.7, U_basis="test report TR-4 of the fabricator")

        assert checks(made)["member rupture"].nominal == pytest.approx(58 * 3 * 0.7)
        assert any("TR-4" in text for text, _ in made.assumptions())
        with pytest.raises(InputError, match="basis"):
            welded(U_by_hand=0.7)


class TestWelds:
    def test_group_of_longitudinal_and_transverse(self):
        """1/4 in E70: 7.4246 kip/in; 12 in along and 6 in across: 0.85(89.1) + 1.5(44.5) = 142.6 is more than 133.6."""
        made = checks(welded(welds="longitudinal and end"))["weld"]

        assert made.nominal == pytest.approx(142.6, abs=0.05)
        assert made.available == pytest.approx(106.9, abs=0.05)

    def test_transverse_welds_alone_are_half_again_as_strong(self):
        made = checks(welded(welds="transverse, both ends", weld_length=None))["weld"]

        assert made.nominal == pytest.approx(0.6 * 70 * 12 * 0.25 * 0.5**0.5 * 1.5)

    def test_no_increase_where_the_group_is_eccentric(self):
        """One angle with equal welds and one across its end: the plain sum, less than the group rule."""
        eccentric = welded(BAR, member="L4x4x1/2", welds="longitudinal and end")
        per_inch = 0.6 * 70 * 0.25 * 0.5**0.5

        assert checks(eccentric)["weld"].nominal == pytest.approx(per_inch * (12 + 4))
        across = welded(BAR, member="L4x4x1/2", welds="transverse, both ends", weld_length=None)
        assert checks(across)["weld"].nominal == pytest.approx(per_inch * 8)

    @pytest.mark.parametrize("ratio, counted", [(50, 50), (100, 100), (150, 135), (200, 160), (250, 175), (300, 180), (400, 180)])
    def test_end_loaded_length(self, ratio, counted):
        """l_eff/w = l/w (1.2 - 0.002 l/w), worked by hand from J2.2b; one by one and in an array."""
        assert weld_group.counted_length(silent, ratio * 0.25, 0.25) == pytest.approx(counted * 0.25)
        assert weld_group.counted_length(silent, np.array([ratio * 0.25, 5.0]), 0.25) == pytest.approx([counted * 0.25, 5.0])

    def test_all_like_groups_are_counted(self):
        lines = {name: welded(base, weld_length="6 in", **more).end.longitudinal for name, base, more in (
            ("bar", BAR, {}), ("two plates", BAR, {"plates": 2}), ("two angles", ANGLES, {}), ("flanges", FLANGES, {}), ("tee", TEE, {}))}

        assert {name: sum(line.n for line in found) for name, found in lines.items()} == {
            "bar": 2, "two plates": 4, "two angles": 4, "flanges": 4, "tee": 2}

    def test_strength_of_two_bars_of_lines_adds_up(self):
        both = weld_group.strength(silent, (WeldLines(2, 5.0, "a"), WeldLines(2, 7.0, "b")), (), 0.25, 70.0)

        assert both == pytest.approx(weld_group.strength(silent, (WeldLines(4, 6.0, "a"),), (), 0.25, 70.0))


class TestBalance:
    @pytest.mark.parametrize("welds", ["longitudinal", "longitudinal and end"])
    def test_moments_about_the_angle_s_centroid_vanish(self, welds):
        """2L4x3x5/16 by the long leg: centroid 1.25 in from the heel (Manual table)."""
        made = welded(ANGLES, weld_length=None, weld_balanced="18 in", welds=welds)
        l_1, l_2 = made.exact
        l_t = 4.0 if welds.endswith("end") else 0.0

        assert l_1 + l_2 + l_t == pytest.approx(18.0)
        assert l_1 * 1.25 == pytest.approx(l_2 * 2.75 + l_t * 0.75, abs=0.02)

    def test_lengths_are_rounded_up_to_a_quarter(self):
        end = welded(ANGLES, weld_length=None, weld_balanced="18 in").end

        assert (end.l_1, end.l_2) == (12.5, 5.75)
        assert end.concentric

    def test_equal_welds_on_an_angle_are_said_to_be_off(self):
        made = welded(ANGLES)

        assert not made.end.concentric
        assert any("0.75 in from" in text and "J1.7" in basis for text, basis in made.assumptions())

    def test_short_leg_has_its_own_centroid(self):
        made = welded(ANGLES, connected_by="short leg", weld_length=None, weld_balanced="16 in")

        assert made.exact[1] == pytest.approx(16 * 0.75 / 3, rel=2e-2)


def second_method(end, part):
    """Return the least block of geometry.tear_out_blocks for points without size at both ends of the welds. [kip]"""
    holes = [Hole(x, y - end.plate_lo, 0.0, 0.0, part.t) for y in (end.y_1, end.y_2) for x in (-end.l_1, 0.0)]
    turned = [Hole(-hole.x, hole.y, 0.0, 0.0, part.t) for hole in holes]
    blocks = tear_out_blocks(turned, Part(part.width, part.t, (), End(end.l_1), "plate", ("a", "b")), 0.0)
    return min(min(0.6 * part.F_u * b.A_nv, 0.6 * part.F_y * b.A_gv) + part.F_u * b.A_nt for b in blocks)


class TestBlocks:
    @pytest.mark.parametrize("length, width, offset", [("4 in", "10 in", "0 in"), ("6 in", "8 in", "0 in"), ("3 in", "24 in", "2 in"),
                                                       ("10 in", "12 in", "1-1/2 in")])
    def test_plate_block_is_that_of_the_hole_pattern_geometry(self, length, width, offset):
        end = welded(weld_length=length, plate_width=width, plate_offset=offset, lap="11 in").end
        found = welded_strengths.block_shear(end, end.plate, welded_strengths.plate_tears(end)).nominal

        assert found == pytest.approx(second_method(end, end.plate))

    def test_angle_legs_part_from_the_outstanding_legs(self):
        """2L4x3x5/16, A572-50, l = 6: tension 65(4)(0.3125) and shear 0.6(50)(6)(0.3125) in each angle."""
        made = checks(welded(ANGLES))["member block"]

        assert made.nominal == pytest.approx(2 * (65 * 4 * 0.3125 + 0.6 * 50 * 6 * 0.3125))

    def test_block_of_a_flat_bar_does_not_apply(self):
        assert "flat bar" in checks(welded())["member block"].reason

    def test_end_weld_turns_shear_along_the_welds_into_a_block(self):
        made = checks(welded(welds="longitudinal and end"))

        assert made["member shear yielding"].reason and made["plate shear rupture"].reason
        assert made["member block"].nominal == pytest.approx(0.6 * 36 * 6 + 58 * 6 * 0.5)

    def test_plate_narrower_than_the_flange(self):
        """W8x31, plates 5 in wide on flanges 7.995 in: the plates have the shear lag of case 4, the flange tears round the welds."""
        made = checks(welded(FLANGES, plate_width="5 in"))

        assert made["plate rupture"].nominal == pytest.approx(2 * 58 * 5 * 0.625 * 3 * 36 / (3 * 36 + 25))
        assert made["fillet maximum"].nominal == pytest.approx(5 / 8 - 1 / 16)
        assert made["Whitmore yielding"].nominal == pytest.approx(2 * 36 * 5 * 0.625)
        assert made["member block"].applies and made["member block"].path.part == "member"

    def test_unequal_welds_shear_unequal_planes(self):
        made = checks(welded(ANGLES, weld_length=None, weld_heel="10 in", weld_toe="4 in"))

        assert made["plate shear yielding"].nominal == pytest.approx(0.6 * 36 * 14 * 0.625)
        assert made["member shear rupture"].nominal == pytest.approx(0.6 * 65 * 2 * 14 * 0.3125)


class TestReversal:
    GIVEN = {"tension": "30 kip", "compression": "45 kip", "gusset_support": "single brace", "gusset_length": "6 in"}

    def test_welds_and_base_metal_take_the_larger_force(self):
        made = checks(welded(**self.GIVEN))

        assert {made[id].demand for id in ("weld", "member shear yielding", "plate shear rupture")} == {45.0}
        assert made["member rupture"].demand == 30.0

    def test_gusset_by_hand(self):
        """Strip 8 in wide, 5/8 thick, K 0.7, L 6: KL/r = 23.3, so it yields: 36(8)(0.625) = 180."""
        made = checks(welded(**self.GIVEN))["gusset compression"]

        assert made.nominal == pytest.approx(180.0)
        assert made.demand == 45.0 and not made.tension

    def test_support_must_be_given(self):
        with pytest.raises(InputError, match="gusset_support"):
            welded(compression="20 kip")


class TestDetailing:
    def test_limits_by_hand(self):
        """Thinner part 1/2: least fillet 3/16, greatest 7/16, least length 1, lap 5(1/2) = 2.5, ledge (8 - 6)/2."""
        made = checks(welded())

        assert [made[id].nominal for id in ("fillet minimum", "fillet maximum", "weld length", "lap")] == [3 / 16, 7 / 16, 1.0, 2.5]
        assert made["ledge"].available == 1.0

    @pytest.mark.parametrize("changes, id", [({"weld_size": "1/8 in"}, "fillet minimum"), ({"weld_size": "1/2 in"}, "fillet maximum"),
                                             ({"weld_length": "3/4 in"}, "weld length"), ({"weld_length": "2 in", "lap": "2 in"}, "lap")])
    def test_a_limit_not_met_fails(self, changes, id):
        made = welded(**changes)

        assert checks(made)[id].fails and not made.ok

    def test_a_thin_edge_may_be_filled(self):
        assert checks(welded(member="PL 3/16 x 6", weld_size="3/16 in"))["fillet maximum"].nominal == 3 / 16

    def test_transverse_welds_run_along_an_edge_of_both_parts(self):
        made = checks(welded(welds="transverse, both ends", weld_length=None, plate_thickness="3/8 in"))

        assert made["fillet maximum"].nominal == 5 / 16

    def test_clauses_have_letters_in_the_edition_they_were_read_in(self):
        assert [checks(welded(edition=edition))["lap"].clause for edition in ("360-22", "360-16")] == ["J2.2b(f)", "J2.2b"]

    def test_heels_of_a_channel_are_no_edge(self):
        assert "corners" in checks(welded(CHANNEL))["fillet maximum"].reason

    def test_advice_does_not_fail(self):
        made = welded(weld_length="4 in", lap="4 in", tension="20 kip")

        assert checks(made)["length and distance"].ok is False and checks(made)["hold back"].ok is False
        assert made.ok


REFUSED = [
    (BAR, {"weld_length": None}, InputError, "exactly one of"),
    (BAR, {"weld_balanced": "12 in"}, InputError, "exactly one of"),
    (BAR, {"weld_length": None, "weld_heel": "6 in", "weld_toe": "4 in"}, ScopeError, "J1.7"),
    (ANGLES, {"weld_length": None, "weld_heel": "6 in"}, InputError, "give both"),
    (ANGLES, {"weld_length": None, "weld_balanced": "2 in"}, InputError, "along the toe"),
    (BAR, {"lap": "5 in"}, InputError, "lengthen the lap"),
    (BAR, {"plate_width": "6 in"}, InputError, "ledge"),
    (BAR, {"plate_width": "4 in"}, InputError, "on flanges and webs only"),
    (BAR, {"plate_offset": "3/4 in", "plate_width": "7 in"}, InputError, "ledge"),
    (FLANGES, {"plate_width": "8 in"}, InputError, "wider or narrower"),
    (WEB, {"plate_width": "16-1/2 in"}, InputError, "wider or narrower"),
    (TEE, {"connected_by": "stem"}, ScopeError, "second edge"),
    (TEE, {"plates": 2}, InputError, "plates = 2"),
    (ANGLES, {"welds": "transverse, both ends", "weld_length": None}, ScopeError, "J2.2b"),
    (BAR, {"welds": "transverse, both ends"}, InputError, "no longitudinal welds"),
    (BAR, {"electrode": "E90"}, ScopeError, "J2.6"),
    (BAR, {"electrode": "E55"}, GagelineError, "E60, E70, E80, E90"),
    (BAR, {"member": "HSS6x4x3/8"}, InputError, "HSS"),
    (BAR, {"weld_length": "6"}, InputError, "weld_length"),
    (BAR, {"weld_lenght": "6 in"}, InputError, "weld_length"),
]


@pytest.mark.parametrize("base, changes, kind, word", REFUSED, ids=[f"{word}" for *_, word in REFUSED])
def test_refused(base, changes, kind, word):
    with pytest.raises(kind, match=word):
        welded(base, **changes)


class TestSweep:
    @pytest.mark.parametrize("base, changes", [(BAR, {}), (ANGLES, {"weld_length": None, "weld_balanced": "14 in"}), (FLANGES, {}),
                                               (TEE, {"welds": "longitudinal and end"}), (FLANGES, {"plate_width": "5 in"})])
    def test_array_gives_what_single_lengths_give(self, base, changes):
        made = welded(base, **changes)
        lengths = np.array([3.0, 6.5, 11.0])
        found = study.over(made, made.at(lengths), lengths.shape)

        for i, length in enumerate(lengths):
            one = study.available_strengths(made, made.at(float(length)))
            assert {id: float(values[i]) for id, values in found.items()} == pytest.approx(one)

    def test_design_is_a_point_of_its_curve(self):
        made = welded()
        curve = study.capacity_curve(made)

        assert float(curve.envelope[made.sweep().design]) == pytest.approx(made.capacity)
        assert "welds of l =" in curve.sentence

    def test_longer_welds_never_weaken_anything(self):
        for base in (BAR, ANGLES, TEE, FLANGES):
            curve = study.capacity_curve(welded(base))
            assert all(np.all(np.diff(values) > -1e-9) for values in curve.strengths.values())

    def test_ten_thousand_lengths_in_less_than_a_second(self):
        made, lengths = welded(ANGLES), np.linspace(1, 60, 10_000)
        start = time.perf_counter()
        found = study.over(made, made.at(lengths), lengths.shape)

        assert time.perf_counter() - start < 1.0
        assert all(np.all(np.isfinite(values)) for values in found.values())

    def test_transverse_welds_have_no_length_to_vary(self):
        assert "transverse welds only" in welded(welds="transverse, both ends", weld_length=None).sweep()


class TestMonotone:
    @pytest.mark.parametrize("name, values", [("plate_thickness", ("3/8 in", "1/2 in", "3/4 in")), ("weld_size", ("3/16 in", "1/4 in", "5/16 in")),
                                              ("plate_width", ("7 in", "9 in", "16 in"))])
    def test_more_is_never_weaker(self, name, values):
        capacities = [welded(**{name: value}).capacity for value in values]

        assert capacities == sorted(capacities)


@settings(max_examples=60, deadline=None)
@given(base=st.sampled_from([BAR, ANGLES, TEE, FLANGES, CHANNEL]), end=st.booleans(), sixteenths=st.integers(3, 6), length=st.integers(4, 60),
       edition=st.sampled_from(["360-22", "360-16"]), method=st.sampled_from(["LRFD", "ASD"]))
def test_random_ends_are_finite_and_longer_welds_are_never_weaker(base, end, sixteenths, length, edition, method):
    """Any valid end gives finite strengths, and four inches more of weld and lap weaken nothing."""
    def made(extra):
        return checks(welded(base, edition=edition, method=method, welds="longitudinal and end" if end else "longitudinal", plate_width="14 in",
                             weld_size=f"{sixteenths}/16 in", weld_length=f"{length + extra} in", lap=f"{length + extra + 1} in"))

    short, long = made(0), made(4)
    for id, each in short.items():
        if each.kind == "strength" and each.applies:
            assert 0 < each.available < float("inf")
            assert long[id].available >= each.available * (1 - 1e-12)


@pytest.mark.parametrize("base, changes", [
    (BAR, {}), (BAR, {"welds": "longitudinal and end"}), (BAR, {"welds": "transverse, both ends", "weld_length": None}), (BAR, {"plates": 2}),
    (ANGLES, {"weld_length": None, "weld_balanced": "14 in"}), (TEE, {}), (FLANGES, {}), (FLANGES, {"plate_width": "5 in"}), (CHANNEL, {}),
    (WEB, {"welds": "longitudinal and end", "plate_width": "13 in"}), (BAR, {"member": "L4x4x1/2", "plate_width": "24 in"})])
def test_figures_show_every_weld_and_say_what_they_mark(base, changes):
    made = welded(base, **changes)
    elevation, section = made.drawings()
    lines = {0: 2, 1: 3, 2: 2}[made.end.across]

    assert elevation.svg.count('id="weld-') == lines
    assert section.svg.count('id="weld-') == (2 * made.end.groups if made.end.sided else 0)
    assert "nan" not in elevation.svg and "nan" not in section.svg
    assert f"({'D/C'}" in elevation.caption and made.element.member in elevation.alt


def test_results_are_plain_data():
    made = welded(ANGLES).to_dict()

    assert made["family"] == "welded" and made["governing"] in {each["id"] for each in made["checks"]}
