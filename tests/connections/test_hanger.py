"""A hanger below a beam: prying against plastic limit analysis, inclined pulls, every branch and refusal, sweeps, drawings."""

import json
import math
import time
from itertools import pairwise
from xml.etree import ElementTree

import numpy as np
import pytest
from helpers import checks, remarks, value_of
from hypothesis import HealthCheck, assume, given, settings
from hypothesis import strategies as st
from scipy.optimize import linprog

from gageline import study
from gageline.check import FACTORS
from gageline.connections.hanger import HangerConnection, flanges
from gageline.errors import GagelineError, InputError, ScopeError

WELDED = {"mark": "T1", "tension": "50 kip", "beam": "W21x57", "beam_grade": "A992", "beam_end": "10 ft", "fitting": "WT6x17.5",
          "fitting_grade": "A992", "rows": 2, "pitch": "5 in", "gage": "3-1/2 in", "fitting_end": "2 in", "bolt": "3/4", "bolt_grade": "A325",
          "member": "2L3x3x5/16", "member_grade": "A572-50", "joined": "welded", "weld": "3/16 in", "weld_length": "4 in"}
"""The published hanger (AISC Design Examples v16.0, II.D-1) with a given demand."""

BOLTED = {"mark": "T2", "tension": "30 kip", "beam": "W21x57", "beam_grade": "A992", "beam_end": "10 ft", "fitting": "WT7x34",
          "fitting_grade": "A992", "rows": 3, "pitch": "4 in", "gage": "4 in", "fitting_end": "2 in", "bolt": "3/4", "bolt_grade": "A325",
          "member": "PL 1/2 x 4", "member_grade": "A36", "joined": "bolted", "lower_bolt": "3/4", "lower_lines": 1, "lower_rows": 2,
          "lower_pitch": "2-1/2 in", "stem_end": "1-1/2 in", "member_end": "1-1/2 in"}
PLATE = WELDED | {"member": "PL 3/8 x 3", "weld": "1/4 in", "tension": "20 kip"}
DOUBLE = BOLTED | {"member": "2L3-1/2x3-1/2x5/16", "lower_gage_from_back": "2 in"}
ANGLES = BOLTED | {"fitting": "2L8x6x3/4", "bolted_leg": "long leg", "gage": "6 in", "beam": "W14x90", "stem_end": "1-1/4 in"}
INCLINED = BOLTED | {"inclination": "30 deg", "rows": 5, "stem_end": "1-1/4 in", "tension": "28 kip", "member_end": "1-1/4 in"}
SLIP = INCLINED | {"installation": "slip-critical", "slip_class": "A"}
STEEP = WELDED | {"inclination": "40 deg", "rows": 4, "weld_length": "3 in", "tension": "40 kip"}

BASES = {"welded angles": WELDED, "welded plate": PLATE, "bolted plate": BOLTED, "bolted angles": DOUBLE, "angle fitting": ANGLES,
         "inclined": INCLINED, "slip-critical": SLIP, "steep": STEEP}

each_base = pytest.mark.parametrize("base", BASES.values(), ids=BASES)


def hanger(base=WELDED, *, edition="360-22", method="LRFD", **changes):
    inputs = base | {"demand_level": method if "tension" in base | changes else None} | changes
    return HangerConnection.of(edition=edition, method=method, **{k: v for k, v in inputs.items() if v is not None})


def nominal(connection):
    return {each.id: each.nominal for each in connection.checks if each.kind == "strength" and each.applies}


class TestListOfChecks:
    @each_base
    @pytest.mark.parametrize("edition", ["360-22", "360-16"])
    @pytest.mark.parametrize("method", ["LRFD", "ASD"])
    def test_every_limit_state_stands_with_numbers_or_a_reason(self, base, edition, method):
        connection = hanger(base, edition=edition, method=method)

        ids = [each.id for each in connection.checks]
        assert len(set(ids)) == len(ids)
        wanted = {"member yielding", "member rupture", "member block", "stem yielding", "stem rupture", "Whitmore yielding", "Whitmore rupture",
                  "stem block", "bolt tension", "fitting prying", "beam prying", "fitting holes", "beam holes", "slip", "fitting shear yielding",
                  "fitting shear rupture", "beam shear yielding", "beam shear rupture", "web yielding", "flange bending", "web compression",
                  "spacing min", "fitting end edge", "beam side edge", "wrench", "slenderness", "flange holes"}
        assert wanted <= set(ids)
        for each in connection.checks:
            assert each.title and each.clause and each.part in (*connection.parts, "joint", "member", "plate")
            if each.applies:
                assert all(math.isfinite(number) for number in (each.nominal, each.available, each.demand, each.ratio)), each.id
                assert each.limit_state in FACTORS or each.kind != "strength"
            else:
                assert len(each.reason) > 10
        json.dumps(connection.to_dict(), allow_nan=False)

    def test_what_does_not_apply_says_why(self):
        found = checks(hanger())

        assert "not through a plate welded across" in found["flange bending"].reason
        assert "compression" in found["web compression"].reason
        assert "no shear" in found["slip"].reason and "no shear" in found["fitting holes"].reason
        assert "bearing" in checks(hanger(INCLINED))["slip"].reason

    def test_clauses_follow_the_edition(self):
        new, old = checks(hanger(SLIP)), checks(hanger(SLIP, edition="360-16"))

        assert (new["bolt tension"].clause, old["bolt tension"].clause) == ("J3.8", "J3.7")
        assert (new["slip"].clause, old["slip"].clause) == ("J3.10", "J3.9")
        assert (new["fitting holes"].clause, old["fitting holes"].clause) == ("J3.7, J3.11", "J3.6, J3.10")

    def test_report_has_the_prying_of_both_flanges(self):
        (made,) = hanger().tables("bolts")

        assert [row[0] for row in made.rows] == ["WT6x17.5", "W21x57"]
        assert len(hanger().tables("beam")[0].rows) == 6
        # (5 (1) + pi (1.5475) + 2 (1.53)) / 2, b = (3.5 - 0.405)/2
        assert "6.46 in of length per bolt" in made.remark


class TestByHand:
    def test_published_hanger_by_hand(self):
        """T = 15 kip a bolt, B = 29.82; b' = 1.225, a' = 1.905, p = 4.5: t_np = sqrt(4 (15) 1.225 / (0.9 (4.5) 65)) = 0.528 in > 0.520, so the
        flange pries: alpha = ((15/29.82)(0.745/0.52)² - 1)/0.8194 = 0.0396, q = 29.82 (0.8194) 0.0396 (0.6430) (0.52/0.745)² = 0.30 kip."""
        check = checks(hanger(tension="60 kip"))["fitting prying"]

        assert value_of(check, "thickness_without_prying") == pytest.approx(math.sqrt(4 * 15 * 1.225 / (0.9 * 4.5 * 65)))
        assert value_of(check, "moment_ratio_at_load") == pytest.approx(0.0396, abs=5e-4)
        assert value_of(check, "prying_force") == pytest.approx(0.304, abs=5e-3)
        assert value_of(check, "bolt_force") == pytest.approx(15.304, abs=5e-3)

    def test_interaction_by_hand(self):
        """60 kip at 40 degrees on eight 3/4-N bolts: f_rv = 60 sin 40 / (8 (0.4418)) = 10.91 < 30 % of 40.5: no reduction; at 140 kip 25.46 ksi:
        F'nt = 117 - 90/40.5 (25.46) = 60.42 ksi."""
        low = checks(hanger(STEEP, tension="60 kip"))["bolt tension"]
        high = checks(hanger(STEEP, tension="140 kip"))["bolt tension"]

        assert value_of(low, "required_shear_stress") == pytest.approx(10.91, abs=0.005)
        assert value_of(low, "tensile_stress_with_shear") == 90.0
        assert value_of(high, "tensile_stress_with_shear") == pytest.approx(60.42, abs=0.01)
        assert high.nominal == pytest.approx(8 * 60.42 * 0.44179 / math.cos(math.radians(40)), rel=2e-4)

    def test_slip_by_hand(self):
        """k_sc = 1 - 28 cos 30 / (1.13 (28) 10) = 0.9234; R_n = 0.9234 (0.30)(1.13)(28)(10)/sin 30 = 175.3 kip."""
        check = checks(hanger(SLIP))["slip"]

        assert value_of(check, "slip_reduction") == pytest.approx(0.9234, abs=1e-4)
        assert check.nominal == pytest.approx(175.3, abs=0.05)
        asd = checks(hanger(SLIP, method="ASD"))["slip"]
        assert value_of(asd, "allowable_slip_reduction") == pytest.approx(1 - 1.5 * 0.0766, abs=1e-3)

    def test_web_near_the_beams_end_has_half_the_spread(self):
        """W21x57: 50 (0.405)(5 (1.15) + 5) = 217.7 kip; within the depth of 21.1 in from the end 50 (0.405)(2.5 (1.15) + 5) = 159.5 kip."""
        assert checks(hanger())["web yielding"].nominal == pytest.approx(217.7, abs=0.05)
        assert checks(hanger(beam_end="21 in"))["web yielding"].nominal == pytest.approx(159.5, abs=0.05)
        assert checks(hanger(beam_end="21.2 in"))["web yielding"].nominal == pytest.approx(217.7, abs=0.05)

    @pytest.mark.parametrize("edition, rows, p", [("360-22", 2, 4.5), ("360-22", 3, 4.5), ("360-16", 2, 3.2), ("360-22", 1, 4.0), ("360-16", 1, 3.2)])
    def test_tributary_length_by_edition(self, edition, rows, p):
        """b = 1.6: new rule 2.0 + min(2.5, 2.8) at an end, 2 (2.5) = 5.0 between; earlier rule 2 b = 3.2 in total."""
        connection = hanger(edition=edition, rows=rows, tension="20 kip")

        assert flanges.with_prying(connection.hanger, "fitting").table["p"] == pytest.approx(p)

    def test_inner_rows_count_where_they_have_less(self):
        connection = hanger(BOLTED, pitch="3 in", fitting_end="3 in", rows=4)

        # b = (4 - 0.415)/2 = 1.79: an end row has min(3, 3.14) + 1.5 = 4.5 but not more than the spacing of 3; an inner one 3.0
        assert flanges.with_prying(connection.hanger, "fitting").table["p"] == pytest.approx(3.0)

    def test_angles_take_b_to_the_centre_line_of_the_leg(self):
        # gage 6, plate 1/2 between, leg 3/4: (6 - 0.5 - 0.75)/2
        assert flanges.with_prying(hanger(ANGLES).hanger, "fitting").table["b"] == pytest.approx(2.375)

    def test_edge_beyond_the_bolt_is_the_narrower_flanges(self):
        found = hanger(BOLTED).hanger

        assert flanges.with_prying(found, "fitting").table["a"] == pytest.approx((6.56 - 4) / 2)
        assert flanges.with_prying(found, "beam").table["a"] == pytest.approx((6.56 - 4) / 2)


def limit_load(t, F_u, p, d_hole, b_r, a_r, B):
    """Return the largest T of a bolt by plastic limit analysis of its flange (linear programme): T and q at least 0, bolt force T + q at
    most B, moment q a' at the bolt line at most its net strength, moment T b' - q a' at the stem at most its gross strength."""
    strong = 0.90 * p * F_u * t**2 / 4
    net = strong * (1 - d_hole / p)
    found = linprog([-1, 0], A_ub=[[1, 1], [0, a_r], [b_r, -a_r]], b_ub=[B, net, strong])
    return found.x[0]


class TestPryingIndependently:
    @settings(max_examples=60, deadline=None)
    @given(t=st.floats(0.2, 1.5), p=st.floats(2.5, 6), b=st.floats(1.2, 3), a=st.floats(1.0, 3.5), B=st.floats(10, 70))
    def test_formulas_give_the_plastic_limit_load(self, t, p, b, a, B):
        """Independent method: the model's closed form against a linear programme of the same equilibrium."""
        from gageline.provisions import prying, prying_strength

        b_r, a_r = prying.reduced_lever_arm.bare(b, 0.75), prying.reduced_edge.bare(a, b, 0.75)
        rho, delta = prying.lever_ratio.bare(b_r, a_r), prying.share_between_holes.bare(0.8125, p)
        t_c = prying_strength.thickness_for_bolt.bare(B, b_r, 0.90, p, 65.0)
        Q = prying_strength.share_of_bolt.bare(t, t_c, delta, prying_strength.moment_ratio_at_strength.bare(t_c, t, delta, rho))

        assert limit_load(t, 65.0, p, 0.8125, b_r, a_r, B) == pytest.approx(Q * B, rel=1e-6)

    @pytest.mark.parametrize("T", [5.0, 12.0, 20.0, 26.0, 29.0])
    def test_least_thickness_carries_exactly_the_load(self, T):
        """Independent method: at t_min the linear programme carries T, and a hair thinner it does not."""
        from gageline.provisions import prying_strength as rules

        b_r, a_r, p, B = 1.41, 1.935, 3.57, 29.82
        rho, delta = b_r / a_r, 1 - 0.8125 / p
        beta = rules.reserve_of_bolt.bare(rho, B, T)
        alpha = 1.0 if beta >= 1 else rules.moment_ratio_by_reserve.bare(beta, delta)
        t = rules.thickness_with_prying.bare(rules.thickness_without_prying.bare(T, b_r, 0.90, p, 65.0), delta, alpha)

        assert limit_load(t, 65.0, p, 0.8125, b_r, a_r, B) == pytest.approx(T, rel=1e-6)
        assert limit_load(0.99 * t, 65.0, p, 0.8125, b_r, a_r, B) < T

    @pytest.mark.parametrize("base", [WELDED, BOLTED, ANGLES], ids=["welded", "bolted", "angle fitting"])
    @pytest.mark.parametrize("side", ["fitting", "beam"])
    @pytest.mark.parametrize("method", ["LRFD", "ASD"])
    def test_load_and_prying_force_fill_the_bolt_at_the_strength(self, base, side, method):
        """Equilibrium: with the strength as its demand T + q = B while bolt and flange govern together; a flange alone leaves the bolt room."""
        limit = checks(hanger(base, method=method))[f"{side} prying"].available
        check = checks(hanger(base, method=method, tension=f"{limit:.9f} kip"))[f"{side} prying"]
        made = flanges.with_prying(hanger(base, method=method).hanger, side).table

        assert check.ratio == pytest.approx(1.0)
        if value_of(check, "moment_ratio_at_strength") <= 1:
            assert value_of(check, "bolt_force") == pytest.approx(made["B"], rel=1e-6)
            assert value_of(check, "thickness_with_prying") == pytest.approx(made["t"], rel=1e-6)
        else:
            assert value_of(check, "bolt_force") < made["B"]


class TestInclinedPull:
    @pytest.mark.parametrize("method", ["LRFD", "ASD"])
    @pytest.mark.parametrize("base", [INCLINED, SLIP, STEEP], ids=["inclined", "slip-critical", "steep"])
    def test_capacity_is_the_pull_that_the_hanger_just_carries(self, base, method):
        """Independent check: with the capacity as its demand the hanger's governing ratio is 1."""
        limit = hanger(base, method=method).capacity

        assert hanger(base, method=method, tension=f"{limit:.9f} kip").governing.ratio == pytest.approx(1.0, rel=1e-6)
        assert not hanger(base, method=method, tension=f"{1.001 * limit:.6f} kip").ok

    def test_a_hardly_inclined_pull_is_as_a_straight_one(self):
        """Limiting case: strengths are continuous where the pull becomes vertical."""
        straight, leaning = nominal(hanger()), nominal(hanger(inclination="0.001 deg"))

        for id, value in straight.items():
            assert leaning[id] == pytest.approx(value, rel=1e-3), id

    def test_stem_in_pure_shear(self):
        """Limiting case: at 90 degrees and no lever arm the ellipse leaves 0.60 F_y A_g."""
        from gageline.provisions import hanger as rules

        assert rules.stem_yielding_inclined.bare(50.0, 3.0, math.pi / 2, 0.0, 9.0) == pytest.approx(90.0)
        assert rules.stem_yielding_inclined.bare(50.0, 3.0, 0.0, 1.0, 9.0) == pytest.approx(150.0)

    def test_shear_that_uses_up_the_bolts_leaves_no_strength(self):
        found = checks(hanger(STEEP, tension="400 kip"))

        assert found["bolt tension"].available <= 0 and found["bolt tension"].ratio == math.inf
        assert "nothing is left" in remarks(found["bolt tension"])
        assert found["fitting prying"].fails

    def test_edges_of_the_stem_across_the_pull(self):
        """Geometry apart: points at those distances across the pull lie on the outline of the stem."""
        h = hanger(INCLINED).hanger
        (low, high), psi, z = h.edges, h.psi, h.depth_of_last
        x = z * math.tan(psi)
        for distance, sense in ((low, -1), (high, 1)):
            px, pz = x + sense * distance * math.cos(psi), z - sense * distance * math.sin(psi)
            outline = min(abs(abs(px) - h.length / 2), abs(pz - h.fitting.depth), abs(pz - h.fitting.k))
            assert outline == pytest.approx(0, abs=1e-9)


class TestMonotony:
    @each_base
    def test_more_rows_are_never_weaker(self, base):
        found = [nominal(hanger(base, rows=rows)) for rows in range(base["rows"], base["rows"] + 4)]
        for before, after in pairwise(found):
            for id in before:
                assert after[id] >= before[id] * (1 - 1e-12), id

    def test_a_thicker_flange_is_never_weaker(self):
        tees = ["WT7x30.5", "WT7x34", "WT7x37", "WT7x41"]
        found = [checks(hanger(BOLTED, fitting=tee))["fitting prying"].nominal for tee in tees]

        assert found == sorted(found)

    def test_a_wider_gage_pries_more(self):
        found = [checks(hanger(ANGLES, gage=f"{g} in"))["fitting prying"].nominal for g in (5.5, 6, 7, 8)]

        assert found == sorted(found, reverse=True)

    @settings(max_examples=30, deadline=None, suppress_health_check=[HealthCheck.filter_too_much])
    @given(rows=st.integers(1, 6), pitch=st.sampled_from(["3 in", "4 in", "5-1/2 in"]), gage=st.sampled_from(["3-1/2 in", "4 in", "5 in"]),
           bolt=st.sampled_from(["5/8", "3/4", "7/8"]), angle=st.sampled_from(["0 deg", "5 deg", "20 deg", "35 deg"]),
           tee=st.sampled_from(["WT7x34", "WT6x25", "WT8x28.5"]), method=st.sampled_from(["LRFD", "ASD"]),
           edition=st.sampled_from(["360-22", "360-16"]), load=st.integers(2, 80))
    def test_random_hangers_are_finite_or_refused(self, rows, pitch, gage, bolt, angle, tee, method, edition, load):
        try:
            connection = hanger(BOLTED, edition=edition, method=method, rows=rows, pitch=pitch, gage=gage, bolt=bolt, inclination=angle, fitting=tee,
                                tension=f"{load} kip", stem_end="1-1/4 in", member_end="1-1/4 in")
        except GagelineError:
            assume(False)
        assert all(math.isfinite(each.nominal) and each.nominal >= 0 for each in connection.checks if each.applies)
        assert 0 < connection.capacity < math.inf
        assert connection.ok == all(not each.fails for each in connection.checks)


class TestOverrides:
    def test_tributary_length_by_hand_is_an_assumption(self):
        basis = "yield line study of the flange, calc 12"
        connection = hanger(p_by_hand="4 in", p_basis=basis, p_beam_by_hand="6 in", p_beam_basis=basis)

        assert flanges.with_prying(connection.hanger, "fitting").table["p"] == 4.0
        assert flanges.with_prying(connection.hanger, "beam").table["p"] == 6.0
        assert sum(basis in text for text, _ in connection.assumptions()) == 2
        assert basis in remarks(checks(connection)["fitting prying"])

    def test_shear_lag_factor_by_hand(self):
        basis = "test report TR-7 of the maker"
        connection = hanger(U_by_hand="0.6", U_basis=basis)

        assert checks(connection)["member rupture"].nominal == pytest.approx(0.6 * 65 * 3.56)
        assert any(basis in text for text, _ in connection.assumptions())


REFUSED = [
    (WELDED, {"pitch": None}, InputError, "pitch is missing"),
    (WELDED, {"weld": None}, InputError, "weld is missing"),
    (WELDED, {"lower_rows": 2}, InputError, "remove it"),
    (WELDED, {"lower_pitch": "3 in"}, InputError, "remove it"),
    (WELDED, {"weld_length": "1/2 in"}, ScopeError, "four times"),
    (WELDED, {"weld": "0.06 in", "fitting": "WT22x115", "weld_length": "19 in", "rows": 12, "gage": "5-1/2 in"}, GagelineError, "300 times"),
    (WELDED, {"weld_length": "5-3/4 in"}, InputError, "fillet"),
    (WELDED, {"p_by_hand": "4 in"}, InputError, "written basis"),
    (WELDED, {"p_beam_by_hand": "4 in", "p_beam_basis": "short"}, InputError, "written basis"),
    (WELDED, {"bolt_grade": "A490"}, ScopeError, "pretensioned"),
    (WELDED, {"bolt_grade": "A307", "installation": "pretensioned"}, ScopeError, "only"),
    (WELDED, {"installation": "slip-critical"}, InputError, "slip_class"),
    (WELDED, {"slip_class": "A"}, InputError, "slip_class"),
    (WELDED, {"fitting_holes": "OVS"}, ScopeError, "slip-critical"),
    (WELDED, {"beam_holes": "SSL along"}, ScopeError, "slip-critical"),
    (WELDED, {"beam_holes": "LSL across", "fitting_holes": "LSL across"}, ScopeError, "one ply"),
    (WELDED, {"fitting": "W12x26"}, InputError, "tee"),
    (WELDED, {"beam": "C12x20.7"}, InputError, "W, M, S or HP"),
    (WELDED, {"gap": "1/2 in"}, InputError, "double angles"),
    (WELDED, {"member": "W8x21", "connected_by": "web"}, ScopeError, "plate"),
    (WELDED, {"gage": "6 in"}, InputError, "gage"),
    (WELDED, {"gage": "1-3/4 in"}, ScopeError, "minimum spacing"),
    (WELDED, {"fitting_end": "3/8 in"}, InputError, "fitting_end"),
    (WELDED, {"beam_end": "4 in"}, InputError, "beam_end"),
    (WELDED, {"compression": "5 kip"}, ScopeError, "compression"),
    (WELDED, {"inclination": "70 deg"}, InputError, "inclination"),
    (WELDED, {"inclination": "40 deg"}, InputError, "too short"),
    (BOLTED, {"lower_rows": 1, "lower_pitch": None}, ScopeError, "one bolt at the stem"),
    (BOLTED, {"lower_pitch": None}, InputError, "lower_pitch"),
    (BOLTED, {"lower_pitch": "1-1/2 in"}, ScopeError, "minimum spacing"),
    (BOLTED, {"stem_end": None}, InputError, "stem_end"),
    (BOLTED, {"stem_end": "4 in"}, InputError, "fillet"),
    (BOLTED, {"member_end": "3 in"}, InputError, "reaches"),
    (BOLTED, {"lower_holes": "LSL across"}, ScopeError, "long slots"),
    (BOLTED, {"lower_gage_from_back": "2 in"}, InputError, "double angles"),
    (DOUBLE, {"lower_gage_from_back": None}, InputError, "lower_gage_from_back"),
    (DOUBLE, {"lower_gage_from_back": "3-1/4 in"}, InputError, "cut by an edge"),
    (ANGLES, {"bolted_leg": None}, InputError, "bolted_leg"),
    (ANGLES, {"bolted_leg": "leg"}, InputError, "bolted_leg"),
    (ANGLES, {"gap": "1/4 in"}, InputError, "gap"),
    (ANGLES, {"member": "2L3-1/2x3-1/2x5/16", "lower_gage_from_back": "2 in", "gap": "1/2 in"}, ScopeError, "use a tee"),
]


class TestRefusals:
    @pytest.mark.parametrize("base, changes, error, word", REFUSED, ids=[f"{i}-{'-'.join(row[1])}" for i, row in enumerate(REFUSED)])
    def test_is_one_sentence_that_names_what_is_wrong(self, base, changes, error, word):
        with pytest.raises(error) as refused:
            hanger(base, **changes)

        assert word in str(refused.value) and "\n" not in str(refused.value)

    def test_one_bolt_per_line_in_an_angle(self):
        with pytest.raises(ScopeError, match="one bolt per line"):
            hanger(DOUBLE | {"member": "2L6x6x1/2", "beam": "W14x90"}, lower_lines=2, lower_rows=1, lower_pitch=None, lower_gage="2-1/2 in",
                   lower_gage_from_back="2-1/4 in")


class TestSweep:
    @each_base
    def test_arrays_give_what_single_pitches_give(self, base):
        connection = hanger(base)
        pitches = np.array([3.5, 4.0, 5.0])
        many = study.available_strengths(connection, connection.at(s=pitches))
        for i, s in enumerate(pitches):
            one = study.available_strengths(connection, connection.at(s=float(s)))
            for id, value in one.items():
                assert np.broadcast_to(many[id], (3,))[i] == pytest.approx(value, rel=1e-12), id

    @each_base
    def test_curve_meets_the_checks_at_the_design(self, base):
        connection = hanger(base)
        curve = study.capacity_curve(connection)

        at = curve.sweep.design
        assert curve.envelope[at] == pytest.approx(min(each.available for each in connection.checks if each.kind == "strength" and each.applies))
        assert curve.lengths[at] == pytest.approx(connection.hanger.length)

    def test_ten_thousand_lengths_take_less_than_a_second(self):
        connection = hanger(INCLINED)
        start = time.perf_counter()
        study.available_strengths(connection, connection.at(s=np.linspace(3, 9, 10_000)))

        assert time.perf_counter() - start < 1.0


class TestDrawings:
    @each_base
    def test_figures_are_svg_with_the_governing_path(self, base):
        for figure, wanted in zip(hanger(base).drawings(), ({"member", "bolt", "path"}, {"bolt", "member"}), strict=True):
            ids = {node.get("id") for node in ElementTree.fromstring(figure.svg).iter()}
            assert wanted <= ids
            assert figure.alt and figure.caption and 0 < figure.width <= 1

    def test_every_kind_of_governing_check_is_marked(self):
        connection = hanger(BOLTED)
        from gageline.connections.hanger import drawing

        class Governed:
            """The connection with another check said to govern."""

            def __init__(self, check):
                self.governing = check

            def __getattr__(self, name):
                return getattr(connection, name)

        for check in connection.checks:
            if check.kind == "strength" and check.applies:
                svg = drawing.elevation(Governed(check)).svg
                assert 'id="path"' in svg, check.id
