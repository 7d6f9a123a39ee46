"""A whole gusset: statics of its edges, layout, limiting cases, monotony, editions and methods, sweeps, refusals."""

import json
import math
import time
from itertools import pairwise
from pathlib import Path

import numpy as np
import pytest
from helpers import checks, remarks, value_of
from hypothesis import HealthCheck, given, settings
from hypothesis import strategies as st

from gageline import cells, study
from gageline.check import FACTORS, silent
from gageline.connections.gusset import GussetConnection, edges
from gageline.errors import GagelineError, InputError, ScopeError

CORNER = {"mark": "G1", "brace": "2L6x6x1/2", "connected": "bolts", "brace_angle": "45 deg", "work_point_distance": "24 in",
          "gusset_thickness": "1/2 in", "gusset_grade": "A572-50", "gusset_end": "1-1/2 in", "gusset_end_width": "12 in", "lines": 2, "rows": 4,
          "pitch": "3 in", "gage": "5-1/2 in", "bolt": "7/8", "bolt_grade": "A325", "beam": "W16x40", "beam_grade": "A992", "beam_edge": "18 in",
          "beam_edge_start": "1/2 in", "beam_weld": "1/4 in", "column": "W12x72", "column_grade": "A992", "column_edge": "16 in",
          "column_edge_start": "1/2 in", "column_weld": "1/4 in", "tension": "150 kip"}
WELDED = CORNER | {"connected": "welds", "brace_weld_lines": 4, "brace_weld_length": "10 in", "brace_weld_apart": "6 in", "brace_weld": "1/4 in",
                   "lines": None, "rows": None, "pitch": None, "gage": None, "bolt": None, "bolt_grade": None}
WEB = CORNER | {"column_connected": "web", "beam_edge": "26 in"}
SINGLE = {name: value for name, value in CORNER.items() if not name.startswith("column")} | {
    "supports": "one edge", "brace_angle": "60 deg", "work_point_distance": "8 in", "beam_edge": "24 in", "beam_edge_start": None}
BASES = {"corner": CORNER, "welded": WELDED, "column web": WEB, "one edge": SINGLE}
BRACE = {"compression": "120 kip", "gusset_support": "by hand", "gusset_K": 1.2, "gusset_K_basis": "written by the engineer"}

each_base = pytest.mark.parametrize("base", BASES.values(), ids=BASES)


def gusset(base=CORNER, *, edition="360-22", method="LRFD", **changes):
    """Build a gusset from a base with changes; None removes an input."""
    given = base | {"demand_level": method} | changes
    return GussetConnection.of(edition=edition, method=method, **{name: value for name, value in given.items() if value is not None})


def nominal(connection):
    return {each.id: each.nominal for each in connection.checks if each.kind == "strength" and each.applies}


class TestStatics:
    @pytest.mark.parametrize("moment_on", ["beam", "column"])
    @pytest.mark.parametrize("angle", [38, 45, 55])
    @pytest.mark.parametrize("base", [CORNER, WEB], ids=["flange", "web"])
    def test_edges_hold_the_brace_in_equilibrium(self, base, angle, moment_on):
        """Independent check: forces at the edges' centroids with the couple balance the pull through the work point."""
        joined = gusset(base, brace_angle=f"{angle} deg", moment_on=moment_on, work_point_distance="26 in").design.edges
        H_b, V_b, M_b = edges.forces(silent, joined, joined.beam)
        V_c, H_c, M_c = edges.forces(silent, joined, joined.column)
        theta = math.radians(angle)

        assert V_b + V_c == pytest.approx(joined.P * math.cos(theta))
        assert H_b + H_c == pytest.approx(joined.P * math.sin(theta))
        x, y = joined.e_c + joined.beam.centroid, joined.e_b + joined.column.centroid
        about_work_point = (x * V_b - joined.e_b * H_b) + (joined.e_c * V_c - y * H_c)
        assert M_b + M_c == pytest.approx(abs(about_work_point), abs=1e-9)

    def test_single_edge_by_components(self):
        joined = gusset(SINGLE, edge_offset="1.5 in").design.edges
        found = edges.forces(silent, joined, joined.beam)

        assert found == pytest.approx((75.0, 150 * 3**0.5 / 2, 1.5 * 150 * 3**0.5 / 2))

    def test_elastic_method_equals_stress_over_a_line(self):
        """Independent check: the line weld as 4000 short pieces, N/A + M c/I summed numerically."""
        found = checks(gusset(SINGLE, edge_offset="2 in"))["beam weld"]
        V, N, M, L = 75.0, 150 * math.sin(math.radians(60)), 2 * 150 * math.sin(math.radians(60)), 24.0
        x = (np.arange(4000) + 0.5) / 4000 * L - L / 2
        inertia = np.sum(x**2) * L / 4000
        high, low = (math.hypot(V / L, N / L + sense * M * L / 2 / inertia) for sense in (1, -1))

        assert value_of(found, "peak_force") == pytest.approx(high, rel=1e-6)
        assert value_of(found, "redistributed_force") == pytest.approx(max(high, 1.25 * (high + low) / 2), rel=1e-6)

    @pytest.mark.parametrize("method", ["LRFD", "ASD"])
    def test_interaction_is_used_up_at_the_strength_it_gives(self, method):
        found = checks(gusset(method=method))
        P = found["beam combined"].available
        joined = gusset(method=method, tension=f"{P} kip").design.edges
        V, N, M = edges.forces(silent, joined, joined.beam)
        A = 18 * 0.5
        phi_y, phi_v = (0.90, 1.00) if method == "LRFD" else (1 / 1.67, 1 / 1.50)

        assert ((N + 6 * M / 18) / (phi_y * 50 * A)) ** 2 + (V / (phi_v * 30 * A)) ** 4 == pytest.approx(1.0)

    def test_strengths_do_not_depend_on_the_load(self):
        one, other = nominal(gusset(tension="50 kip")), nominal(gusset(tension="140 kip"))

        assert one == pytest.approx(other)


class TestLayout:
    def test_lengths_to_the_support_by_hand(self):
        """45°, last row 24 in out: (16.971, 16.971); beam face at 8.0 in: (16.971 - 8)/cos 45 = 12.686 in. Ends of the Whitmore
        width by the same statics of similar triangles."""
        design = gusset().design

        assert design.edges.e_b == pytest.approx(8.0, abs=0.01)
        assert design.lengths[0] == pytest.approx((24 * math.sqrt(0.5) - design.edges.e_b) * math.sqrt(2))
        half = design.found.L_w / 2
        low = (24 + half) * math.sqrt(0.5) - design.edges.e_b
        assert max(design.lengths[1:]) <= low * math.sqrt(2)

    def test_whitmore_is_cut_where_it_meets_the_column(self):
        near = gusset(brace_angle="30 deg", work_point_distance="22 in", beam_edge="9 in", column_edge="22 in").design

        assert near.found.cut_lo > 0
        x, _ = near.layout.at(near.layout.last, near.found.y_lo - near.axis)
        assert x == pytest.approx(near.edges.e_c, abs=1e-6)

    def test_what_crosses_the_free_edge_is_not_counted(self):
        wide, narrow = gusset().design.found, gusset(gusset_end_width="9 in", beam_edge="9 in").design.found

        assert narrow.cut_hi > wide.cut_hi >= 0

    def test_block_shear_regards_a_gusset_that_narrows(self):
        straight = nominal(gusset(SINGLE, brace_angle="90 deg", beam_edge="12 in"))["gusset block"]
        narrowing = nominal(gusset(SINGLE, brace_angle="90 deg", beam_edge="8 in", work_point_distance="4 in"))["gusset block"]

        assert narrowing < straight

    def test_mean_length_goes_with_a_noncompact_corner(self):
        found = checks(gusset(compression="100 kip", gusset_support="noncompact corner"))["gusset compression"]
        design = gusset().design

        assert value_of(found, "mean_length") == pytest.approx(sum(design.lengths) / 3)

    def test_a_compact_corner_is_refused_where_it_is_none(self):
        with pytest.raises(ScopeError, match="noncompact corner"):
            gusset(compression="100 kip", gusset_support="compact corner", gusset_thickness="1/4 in", work_point_distance="40 in", beam_edge="40 in",
                   column_edge="40 in")

    def test_a_compact_corner_yields(self):
        found = checks(gusset(compression="100 kip", gusset_support="compact corner", gusset_thickness="3/4 in"))["gusset compression"]
        design = gusset(gusset_thickness="3/4 in").design

        assert found.nominal == pytest.approx(50 * 0.75 * design.found.L_w)


class TestChecks:
    @each_base
    @pytest.mark.parametrize("reversing", [{}, BRACE], ids=["tension", "reversing"])
    def test_numbers_or_a_reason_everywhere(self, base, reversing):
        connection = gusset(base, **reversing)

        assert len({each.id for each in connection.checks}) == len(connection.checks)
        for each in connection.checks:
            assert each.part in {*connection.parts, "joint", "plate"} and each.clause
            assert ", " in each.title or each.kind != "strength"
            if each.applies:
                assert math.isfinite(each.ratio) and each.available > 0, each.id
                assert each.limit_state in FACTORS or each.kind != "strength"
            else:
                assert len(each.reason) > 10

    def test_every_edge_has_its_limit_states(self):
        found = checks(gusset())
        for name in ("beam", "column"):
            for state in ("shear", "normal", "combined", "weld", "gusset", "support", "web"):
                assert found[f"{name} {state}"].applies, state
            assert not found[f"{name} bending"].applies

    def test_column_web_takes_no_normal_force(self):
        found = checks(gusset(WEB))

        assert found["column shear"].applies
        for state in ("normal", "web"):
            assert not found[f"column {state}"].applies

    def test_an_upright_brace_brings_no_shear(self):
        found = checks(gusset(SINGLE, brace_angle="90 deg"))

        assert not found["beam shear"].applies and found["beam normal"].applies
        assert value_of(found["beam normal"], "single_edge_normal") == pytest.approx(150.0)

    def test_reversal_without_support_is_refused(self):
        with pytest.raises(InputError, match="gusset_support"):
            gusset(compression="10 kip")

    def test_k_by_hand_is_printed(self):
        connection = gusset(**BRACE)

        assert any("K by hand" in text for text, _ in connection.assumptions())
        assert "written by the engineer" in remarks(checks(connection)["gusset compression"])

    def test_a_weld_with_moment_takes_no_directional_increase(self):
        with_moment, without = checks(gusset()), checks(gusset(moment_on="column"))

        assert "k_{ds}$ = 1.0" in remarks(with_moment["beam weld"])
        assert value_of(without["beam weld"], "directional_factor_of_components") > 1.0

    def test_fillet_strength_by_hand(self):
        """0.60 (70) 2 (0.25/√2) = 14.849 kip per inch of edge; 16 in on the column, no moment there: 1.25 times the average governs."""
        found = checks(gusset(directional=False))["column weld"]
        f = value_of(found, "redistributed_force")

        assert f == pytest.approx(1.25 * value_of(found, "peak_force"))
        assert found.nominal == pytest.approx(150 * 14.8492 / f, rel=1e-5)

    def test_welded_block_by_hand(self):
        """Two planes of 10 in, 6 in across, 1/2 in thick: min(0.6·65·10, 0.6·50·10) + 65·3 = 495 kip."""
        assert checks(gusset(WELDED))["gusset block"].nominal == pytest.approx(495.0)

    def test_web_crippling_by_hand(self):
        """W16x40: t_w 0.305, t_f 0.505, d 16.0; edge 18 in, its centroid 9.5 in from the end, not less than d/2. J10-4, from memory:
        0.80 (0.305²) [1 + 3 (18/16) (0.305/0.505)^1.5] √(29000 · 50 · 0.505/0.305) = 0.07442 (2.5841) (1549.5) = 298.0 kip."""
        found = checks(gusset(**BRACE))["beam crippling"]

        assert value_of(found, "web_crippling") == pytest.approx(298.0, abs=0.1)
        assert found.demand == 120.0 and not found.tension

    def test_web_crippling_near_the_end_and_in_tension_only(self):
        near = checks(gusset(beam_edge="10 in", gusset_end_width="9 in", **BRACE))["beam crippling"]

        assert value_of(near, "web_crippling_near_end") > 0
        assert "no combination" in checks(gusset())["beam crippling"].reason

    def test_long_brace_welds_count_less(self):
        found = checks(gusset(WELDED, brace_weld_length="30 in", brace_weld="3/16 in", work_point_distance="24 in"))["brace weld"]

        assert value_of(found, "end_loaded_factor") == pytest.approx(1.2 - 0.002 * 160)


class TestEditionsAndMethods:
    @each_base
    def test_both_editions_give_the_same_strengths(self, base):
        assert nominal(gusset(base, edition="360-16", **BRACE)) == nominal(gusset(base, **BRACE))

    @each_base
    def test_lrfd_and_asd_share_the_nominal_strength(self, base):
        lrfd, asd = checks(gusset(base, **BRACE)), checks(gusset(base, method="ASD", **BRACE))
        for id, check in lrfd.items():
            # In the interaction the factors stand within the ratios, so its strength differs between the methods by itself.
            if check.kind == "strength" and check.applies and not id.endswith("combined"):
                phi, omega = FACTORS[check.limit_state]
                assert asd[id].nominal == pytest.approx(check.nominal)
                assert (check.available, asd[id].available) == pytest.approx((phi * check.nominal, check.nominal / omega))


class TestMonotony:
    @each_base
    def test_a_thicker_gusset_is_never_weaker(self, base):
        found = [nominal(gusset(base, gusset_thickness=t, **BRACE)) for t in ("3/8 in", "1/2 in", "3/4 in", "1 in")]
        for before, after in pairwise(found):
            for id in before:
                assert after[id] >= before[id] * (1 - 1e-12), id

    @each_base
    def test_larger_fillets_are_never_weaker(self, base):
        found = [nominal(gusset(base, beam_weld=w))["beam weld"] for w in ("3/16 in", "1/4 in", "3/8 in")]

        assert found == sorted(found)

    def test_redistribution_never_helps(self):
        for id in ("beam weld", "column weld", "beam gusset"):
            assert nominal(gusset())[id] <= nominal(gusset(redistribution=False))[id]


class TestSweep:
    @pytest.mark.parametrize("base", [CORNER, WEB, SINGLE, WELDED], ids=["corner", "column web", "one edge", "welded"])
    def test_arrays_give_what_single_designs_give(self, base):
        connection = gusset(base, edge_offset="1 in" if base is SINGLE else None)
        curve = study.capacity_curve(connection)
        at = {length: int(np.argmin(abs(curve.lengths - length))) for length in (0.8 * connection.inputs.beam_edge, connection.inputs.beam_edge)}
        for length, i in at.items():
            single = checks(gusset(base, beam_edge=f"{curve.lengths[i]} in", edge_offset="1 in" if base is SINGLE else None))
            for id, strengths in curve.strengths.items():
                # The layout of the sweep stays as designed; the edges do not depend on it.
                if id.startswith(("beam", "column")):
                    assert strengths[i] == pytest.approx(single[id].available, rel=1e-9), (id, length)

    def test_ten_thousand_lengths_in_a_second(self):
        connection = gusset()
        start = time.perf_counter()
        curve = study.capacity_curve(connection)

        assert len(curve.lengths) >= 10_000
        assert time.perf_counter() - start < 1.0


REFUSED = {
    "no bolts": ({"bolt": None}, "bolt is missing"),
    "no pitch": ({"pitch": None}, "pitch is missing"),
    "gages": ({"gage": "3 in, 3 in"}, "spaces between them"),
    "column missing": ({"column_edge": None}, "column_edge is missing"),
    "column on one edge": ({"supports": "one edge"}, "is given, but supports"),
    "angle as support": ({"beam": "L4x4x1/2"}, "W, M, S or HP"),
    "level brace": ({"brace_angle": "85 deg"}, "nearly level"),
    "in the support": ({"work_point_distance": "9 in"}, "support"),
    "hole outside": ({"gusset_end_width": "6 in"}, "cut by an edge"),
    "one bolt": ({"lines": 1, "rows": 1, "gage": None}, "one bolt"),
    "oversized in bearing": ({"gusset_holes": "OVS"}, "gusset_holes"),
    "slip class alone": ({"slip_class": "A"}, "go together"),
    "K without by hand": ({"gusset_K": 1.0}, "by hand"),
    "negative alpha": ({"brace_angle": "12 deg", "beam_edge": "5 in"}, "α"),
    "no W shape of that name": ({"beam": "W16x41"}, "W16x4"),
}


class TestRefused:
    @pytest.mark.parametrize("changes, word", REFUSED.values(), ids=REFUSED)
    def test_one_sentence_that_names_the_input(self, changes, word):
        with pytest.raises(GagelineError, match=word) as refused:
            gusset(**changes)

        assert "\n" not in str(refused.value)

    @settings(max_examples=30, deadline=None, suppress_health_check=[HealthCheck.too_slow])
    @given(angle=st.floats(20, 75), distance=st.floats(14, 40), edge=st.floats(6, 36), other=st.floats(6, 36), rows=st.integers(2, 6),
           offset=st.sampled_from(["beam", "column"]))
    def test_any_layout_gives_strengths_or_a_sentence(self, angle, distance, edge, other, rows, offset):
        try:
            connection = gusset(brace_angle=f"{angle} deg", work_point_distance=f"{distance} in", beam_edge=f"{edge} in", column_edge=f"{other} in",
                                rows=rows, moment_on=offset)
        except GagelineError as refused:
            assert str(refused)
            return
        for id, value in nominal(connection).items():
            assert math.isfinite(value) and value > 0, id
        assert connection.design.found.L_w > 0


class TestReport:
    @each_base
    def test_figures_are_drawn_with_words(self, base):
        for figure in gusset(base, **BRACE).drawings():
            assert figure.svg.startswith("<?xml") and figure.caption and figure.alt
            assert 0 < figure.width <= 1

    def test_demonstration_mark_is_in_order_and_not_idle(self):
        path = Path(__file__).parents[2] / "calcs" / "conveyor-gallery" / "G11.ipynb"
        inputs = cells.inputs_of_notebook(json.loads(path.read_text(encoding="utf-8")))
        connection = GussetConnection.of(**{name: each.value for name, each in inputs.items()})

        assert connection.ok and 0.75 <= connection.governing.ratio <= 0.98
