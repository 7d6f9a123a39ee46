"""A whole tension splice: shares of the load, hand cases, published plate numbers, limiting cases, monotony, sweeps, refusals."""

import json
import math
from itertools import pairwise
from pathlib import Path

import pytest
from helpers import checks, remarks, value_of
from hypothesis import HealthCheck, given, settings
from hypothesis import strategies as st

from gageline import cells, study
from gageline.check import FACTORS
from gageline.connections.bolted import BoltedConnection
from gageline.connections.splice import SpliceConnection
from gageline.errors import GagelineError, ScopeError

FLANGES = {"mark": "S1", "member": "W12x72", "member_grade": "A992", "plate_grade": "A572-50", "joint_gap": "1/2 in",
           "flange_plate_thickness": "3/4 in", "flange_plate_width": "12 in", "flange_plate_end": "1-1/2 in", "flange_lines": 2, "flange_rows": 4,
           "flange_pitch": "3 in", "flange_gage": "5-1/2 in", "flange_member_end": "1-3/4 in", "bolt": "7/8", "bolt_grade": "A325",
           "tension": "300 kip"}
WEB_ONLY = {name: value for name, value in FLANGES.items() if not name.startswith("flange")} | {
    "web_plate_thickness": "5/16 in", "web_plate_width": "8-1/2 in", "web_plate_end": "1-1/2 in", "web_lines": 2, "web_rows": 3, "web_pitch": "3 in",
    "web_gage": "5-1/2 in", "web_member_end": "1-3/4 in", "tension": "100 kip"}
BOTH = FLANGES | {name: value for name, value in WEB_ONLY.items() if name.startswith("web")} | {"web_rows": 2}
FLAT = WEB_ONLY | {
    "member": "PL 1 x 12", "member_grade": "A572-50", "web_plate_thickness": "9/16 in", "web_plate_width": "12 in", "web_lines": 3,
    "web_gage": "3-1/2 in", "tension": "300 kip"}
BASES = {"both": BOTH, "flanges": FLANGES, "web": WEB_ONLY, "flat": FLAT}

each_base = pytest.mark.parametrize("base", BASES.values(), ids=BASES)


def splice(base=BOTH, *, edition="360-22", method="LRFD", **changes):
    """Build a splice from a base with changes; None removes an input."""
    made = base | {"demand_level": method} | changes
    return SpliceConnection.of(edition=edition, method=method, **{name: value for name, value in made.items() if value is not None})


def nominal(connection):
    return {each.id: each.nominal for each in connection.checks if each.kind == "strength" and each.applies}


class TestByHand:
    def test_shares_follow_the_areas(self):
        """W12x72: A 21.1, b_f 12.0, t_f 0.670 in (AISC shapes): flanges 16.08 in² carry 0.7621, the rest 0.2379."""
        flange, web = (value_of(checks(splice())[f"{name} bolt shear"], "share_by_area") for name in ("flange", "web"))

        assert (flange, web) == pytest.approx((16.08 / 21.1, 5.02 / 21.1), rel=1e-6)
        assert flange + web == pytest.approx(1.0)

    def test_bolts_in_single_and_in_double_shear(self):
        """7/8 in, 54 ksi: 32.47 kip a plane. Flanges 16 bolts, one plane each; web 4 bolts, two planes; over their shares."""
        found = nominal(splice())

        assert found["flange bolt shear"] == pytest.approx(16 * 54 * math.pi / 4 * 0.875**2 / (16.08 / 21.1), rel=1e-6)
        assert found["web bolt shear"] == pytest.approx(8 * 54 * math.pi / 4 * 0.875**2 / (5.02 / 21.1), rel=1e-6)

    def test_net_section_takes_all_holes(self):
        """Holes 15/16 + 1/16 = 1.0 in: 4 in the flanges, 2 in the web of 0.430 in; U = 1.0."""
        assert nominal(splice())["member rupture"] == pytest.approx(65 * (21.1 - 4 * 0.670 - 2 * 0.430), rel=1e-6)

    def test_filler_takes_from_the_bolts(self):
        """3/8 in of filler: 1 - 0.4 (0.375 - 0.25) = 0.95 (J5.2)."""
        plain, filled = nominal(splice()), nominal(splice(flange_filler="3/8 in"))

        assert filled["flange bolt shear"] == pytest.approx(0.95 * plain["flange bolt shear"])
        assert filled["web bolt shear"] == plain["web bolt shear"]

    def test_plates_in_compression_across_the_joint(self):
        """2 PL 9/16 x 12 between rows 2 (1.75) + 0.5 = 4.0 in apart: KL/r = 0.65 (4)/(0.5625/√12) = 16.0, so they yield: 50 (13.5) = 675."""
        found = checks(splice(FLAT, compression="50 kip"))["web plate compression"]

        assert value_of(found, "effective_slenderness") == pytest.approx(16.01, abs=0.01)
        assert found.nominal == pytest.approx(675.0)


class TestPublished:
    """Numbers of AISC, Companion to the Steel Construction Manual, Vol. 1, v16.0, Example II.B-1: one flange and its plate; here are two."""

    GIVEN = FLANGES | {"member": "W18x50", "flange_plate_width": "7 in", "flange_gage": "4 in", "flange_member_end": "1-1/4 in"}

    def test_block_shear_of_the_flange_plate(self):
        """K-07: L path 400 kip nominal, 300 / 200 available."""
        found = checks(splice(self.GIVEN))["flange plate block"]

        # Edge strips, 380 kip available, and the L path, 300: the L path governs.
        assert found.nominal / 2 == pytest.approx(400, abs=0.5)
        assert found.available / 2 == pytest.approx(300, abs=0.5)
        assert checks(splice(self.GIVEN, method="ASD"))["flange plate block"].available / 2 == pytest.approx(200, abs=0.5)

    def test_block_shear_of_the_beam_flange(self):
        """K-08: edge strips of the flange alone, 294 / 197; the source sums rounded table values."""
        shared = self.GIVEN | {name: value for name, value in BOTH.items() if name.startswith("web")} | {"web_rows": 2}
        found = checks(splice(shared))["flange member block"]
        xi = 2 * 7.50 * 0.570 / 14.7
        listed = next(note for note in found.notes if "both edge strips" in note)
        governing = "both edge strips" in listed.partition(" Next")[0]
        other = float(listed.partition("both edge strips: ")[2].partition(" kip")[0]) if not governing else found.nominal * xi

        assert 0.75 * other / 2 == pytest.approx(294, rel=0.0035)

    def test_compression_of_the_flange_plate(self):
        """G-08: PL 3/4 x 7, K 0.65, L 3: KL/r 8.99, 237 / 157 (the source rounds r and the nominal strength)."""
        given = self.GIVEN | {"flange_member_end": "1-1/2 in", "joint_gap": "0 in", "compression": "50 kip"}
        found = checks(splice(given))["flange plate compression"]

        assert value_of(found, "effective_slenderness") == pytest.approx(8.99, rel=0.003)
        assert found.available / 2 == pytest.approx(237, rel=0.0035)
        assert checks(splice(given, method="ASD"))["flange plate compression"].available / 2 == pytest.approx(157, rel=0.0035)

    def test_two_side_plates_in_millimetres(self):
        """A public worked example to CSA S16-14: PL 25x300 with 3x2 bolts and two PL 14x220, 24 mm deducted for a hole; areas only."""
        # 13/16 in hole of a 3/4 in bolt is 20.6 mm: 24 mm less 1/16 in is 22.4 mm, that of M20 (22 mm); so areas are compared with M20.
        made = splice(FLAT, member="PL 25 mm x 300 mm", web_plate_thickness="14 mm", web_plate_width="220 mm", web_rows=2,
                      web_gage="70 mm", bolt="M20",
                      web_member_end="40 mm", web_plate_end="40 mm", web_pitch="70 mm")
        member, plates = value_of(checks(made)["member rupture"], "net_area_straight"), value_of(checks(made)["web plate rupture"],
                                                                                                 "net_area_straight")
        hole = 22 + 25.4 / 16

        assert member * 645.16 == pytest.approx(25 * (300 - 3 * hole), rel=1e-6)
        assert plates * 645.16 == pytest.approx(2 * 14 * (220 - 3 * hole), rel=1e-6)
        assert member * 645.16 == pytest.approx(5700, rel=0.006) and plates * 645.16 / 2 == pytest.approx(2072, rel=0.01)


class TestChecks:
    @each_base
    @pytest.mark.parametrize("changes", [{}, {"compression": "60 kip"}, {"installation": "slip-critical", "slip_class": "B"}],
                             ids=["tension", "reversing", "slip-critical"])
    def test_numbers_or_a_reason_everywhere(self, base, changes):
        connection = splice(base, **changes)

        assert len({each.id for each in connection.checks}) == len(connection.checks)
        for each in connection.checks:
            assert each.part in connection.parts and each.clause
            assert ", " in each.title or each.kind != "strength"
            if each.applies:
                assert math.isfinite(each.ratio) and each.available > 0, each.id
                assert each.limit_state in FACTORS or each.kind != "strength"
            else:
                assert len(each.reason) > 10

    def test_slip_is_checked_where_asked_for(self):
        found = checks(splice(installation="slip-critical", slip_class="A"))

        # 16 bolts, one plane: 0.30 (1.13) 39 (16) over the share of the flanges
        assert found["flange slip"].nominal == pytest.approx(0.30 * 1.13 * 39 * 16 / (16.08 / 21.1), rel=1e-6)

    @pytest.mark.parametrize("base, way, prefix", [(FLANGES, "both flanges", "flange"), (WEB_ONLY, "web", "web")])
    def test_one_group_alone_is_the_bolted_connection(self, base, way, prefix):
        """Independent check: half a splice of one group is a bolted end of the same bolts and plates."""
        made = splice(base)
        given = {"mark": "B", "member": "W12x72", "member_grade": "A992", "connected_by": way, "plate_grade": "A572-50", "bolt": "7/8",
                 "bolt_grade": "A325", "tension": "100 kip", "demand_level": "LRFD", "member_end": base[f"{prefix}_member_end"],
                 "plates": 2 if prefix == "web" else 1}
        given |= {name: base[f"{prefix}_{name}"] for name in ("plate_thickness", "plate_width", "plate_end", "lines", "rows", "pitch", "gage")}
        other, own = nominal(BoltedConnection.of(**given)), nominal(made)

        for id in ("bolt shear", "bolts member", "bolts plate", "member block", "plate yielding", "plate rupture", "Whitmore yielding",
                   "plate block"):
            assert own[f"{prefix} {id}"] == pytest.approx(other[id]), id
        assert own["member rupture"] == pytest.approx(other["member rupture"])

    def test_block_shear_beside_a_loaded_web_gets_no_help_from_it(self):
        assert nominal(splice(BOTH))["flange member block"] * 16.08 / 21.1 <= nominal(splice(FLANGES))["flange member block"] * (1 + 1e-9)

    def test_the_basis_of_the_share_is_printed(self):
        found = checks(splice())

        assert "share" in remarks(found["web plate block"])
        assert any("proportion to their areas" in text for text, _ in splice().assumptions())


class TestEditionsAndMethods:
    @each_base
    def test_both_editions_give_the_same_strengths(self, base):
        assert nominal(splice(base, edition="360-16", compression="50 kip")) == nominal(splice(base, compression="50 kip"))

    @each_base
    def test_lrfd_and_asd_share_the_nominal_strength(self, base):
        lrfd, asd = checks(splice(base, compression="50 kip")), checks(splice(base, method="ASD", compression="50 kip"))
        for id, check in lrfd.items():
            if check.kind == "strength" and check.applies:
                phi, omega = FACTORS[check.limit_state]
                assert asd[id].nominal == pytest.approx(check.nominal)
                assert (check.available, asd[id].available) == pytest.approx((phi * check.nominal, check.nominal / omega))


class TestMonotony:
    @each_base
    def test_more_rows_are_never_weaker_at_the_bolts(self, base):
        name = "web" if "web_rows" in base else "flange"
        found = [nominal(splice(base, **{f"{name}_rows": rows})) for rows in (2, 3, 4, 6)]
        for before, after in pairwise(found):
            for id in ("bolt shear", "bolts member", "bolts plate", "member block", "plate block"):
                assert after[f"{name} {id}"] >= before[f"{name} {id}"] * (1 - 1e-12), id

    def test_thicker_plates_are_never_weaker(self):
        found = [nominal(splice(flange_plate_thickness=t)) for t in ("1/2 in", "5/8 in", "3/4 in", "1 in")]
        for before, after in pairwise(found):
            for id in before:
                assert after[id] >= before[id] * (1 - 1e-12), id


class TestSweep:
    @each_base
    def test_the_sweep_holds_the_design(self, base):
        connection = splice(base)
        curve = study.capacity_curve(connection)
        at = connection.sweep().design

        assert curve.envelope[at] == pytest.approx(connection.capacity)
        assert list(curve.lengths) == sorted(curve.lengths)


REFUSED = {
    "no plates": ({name: None for name in FLANGES if name.startswith("flange")}, "no splice plate"),
    "half a group": ({"flange_gage": None}, "flange_gage"),
    "missing rows": ({"flange_rows": None}, "flange_rows is missing"),
    "web inputs without plates": ({"web_rows": 2}, "web_plate_thickness is not"),
    "flanges of a plate": ({"member": "PL 1 x 12", "member_grade": "A36"}, "no flanges"),
    "an angle": ({"member": "L4x4x1/2"}, "W, M, S and HP"),
    "over the web": ({"flange_lines": 3, "flange_gage": "3 in"}, "over the web"),
    "hole outside": ({"flange_gage": "11-1/2 in"}, "cut by an edge"),
    "too near": ({"flange_pitch": "2 in"}, "minimum spacing"),
    "oversized in bearing": ({"plate_holes": "OVS"}, "plate_holes"),
}


class TestRefused:
    @pytest.mark.parametrize("changes, word", REFUSED.values(), ids=REFUSED)
    def test_one_sentence_that_names_the_input(self, changes, word):
        with pytest.raises(GagelineError, match=word) as refused:
            splice(FLANGES, **changes)

        assert "\n" not in str(refused.value)

    def test_web_plates_stay_between_the_fillets(self):
        with pytest.raises(GagelineError, match="between the fillets"):
            splice(web_plate_width="11 in")

    def test_one_row_has_no_shear_lag_factor(self):
        with pytest.raises(ScopeError, match=r"D3\.1"):
            splice(FLANGES, flange_rows=1)

    @settings(max_examples=25, deadline=None, suppress_health_check=[HealthCheck.too_slow])
    @given(lines=st.sampled_from([2, 4]), rows=st.integers(1, 6), pitch=st.floats(2, 6), gage=st.floats(2, 6), t=st.floats(0.25, 1.5),
           end=st.floats(1, 3), bolt=st.sampled_from(["3/4", "7/8", "1"]))
    def test_any_splice_gives_strengths_or_a_sentence(self, lines, rows, pitch, gage, t, end, bolt):
        try:
            connection = splice(flange_lines=lines, flange_rows=rows, flange_pitch=f"{pitch} in", flange_gage=f"{gage} in", bolt=bolt,
                                flange_plate_thickness=f"{t} in", flange_member_end=f"{end} in", flange_plate_end=f"{end} in")
        except GagelineError as refused:
            assert str(refused)
            return
        for id, value in nominal(connection).items():
            assert math.isfinite(value) and value > 0, id


class TestReport:
    @each_base
    def test_figures_are_drawn_with_words(self, base):
        for figure in splice(base, compression="50 kip").drawings():
            assert figure.svg.startswith("<?xml") and figure.caption and figure.alt
            assert 0 < figure.width <= 1

    def test_demonstration_mark_is_in_order_and_not_idle(self):
        path = Path(__file__).parents[2] / "calcs" / "conveyor-gallery" / "S12.ipynb"
        inputs = cells.inputs_of_notebook(json.loads(path.read_text(encoding="utf-8")))
        connection = SpliceConnection.of(**{name: each.value for name, each in inputs.items()})

        assert connection.ok and 0.75 <= connection.governing.ratio <= 0.98
