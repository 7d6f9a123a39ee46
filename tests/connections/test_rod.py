"""A threaded hanger rod: hand cases, editions, attachments against statics and against the pin connection, refusals, drawings."""

import json
import math

import numpy as np
import pytest
from helpers import checks, value_of
from hypothesis import HealthCheck, given, settings
from hypothesis import strategies as st
from scipy import integrate

from gageline import study
from gageline.connections.pinned import PinnedConnection
from gageline.connections.rod import RodConnection
from gageline.errors import InputError, NotInTable, ScopeError
from gageline.facts import bolts, rods
from gageline.facts.table import read_table

NUT = {"mark": "R", "rod": "3/4", "rod_grade": "A36", "P_D": "2 kip", "P_L": "5 kip",
       **{f"{end}{name}": value for end in ("upper", "lower") for name, value in
          {"": "nut and plate", "_thickness": "3/4 in", "_width": "4 in", "_grade": "A36", "_span": "3 in"}.items()}}
"""A rod with a nut and a plate at both ends."""

LUG = {name: value for name, value in NUT.items() if name != "upper_span"} | {
    "upper": "welded lug", "upper_thickness": "1/2 in", "upper_width": "3-1/2 in", "upper_edge": "2 in", "upper_pin": "1 in",
    "upper_pin_grade": "A36", "upper_arm": "3/8 in", "upper_gap": "1/16 in", "upper_weld": "1/4 in"}
"""The same with a welded lug at its upper end."""

WASHER = NUT | {"lower_washer": "3 in", "lower_washer_thickness": "1/2 in", "lower_washer_grade": "A572-50"}


def rod(base=NUT, *, edition="360-22", method="LRFD", **changes):
    """Build a rod from a base with changes; None removes an input."""
    return RodConnection.of(edition=edition, method=method, **{name: value for name, value in (base | changes).items() if value is not None})


def nominal(connection):
    """Return id -> nominal strength of every strength check that applies."""
    return {each.id: each.nominal for each in connection.checks if each.kind == "strength" and each.applies}


class TestRod:
    def test_thread_and_body_by_hand(self):
        """A_D = 0.441786; 0.75 · 58 · 0.441786 = 19.22, 36 · 0.441786 = 15.90, 58 · 0.441786 = 25.62."""
        found = checks(rod())

        assert found["rod thread"].nominal == pytest.approx(19.2177, rel=1e-5)
        assert found["rod thread"].available == pytest.approx(0.75 * 19.2177, rel=1e-5)
        assert found["rod yielding"].available == pytest.approx(0.90 * 15.9043, rel=1e-5)
        assert found["rod rupture"].nominal == pytest.approx(25.6236, rel=1e-5)
        assert checks(rod(method="ASD"))["rod thread"].available == pytest.approx(9.609, rel=1e-4)

    def test_an_a36_rod_is_governed_by_its_body(self):
        """0.90 · 36 = 32.4 ksi of the body against 0.75 · 0.75 · 58 = 32.6 ksi of the thread."""
        assert rod().governing.id == "rod yielding"

    def test_stress_area_is_an_option_of_360_22_only(self):
        new = rod(thread_strength="tensile stress area")

        assert nominal(new)["rod thread"] == pytest.approx(58 * 0.3345, rel=1e-3)
        assert "body area" in " ".join(checks(new)["rod thread"].notes)
        assert "tensile stress area" in " ".join(checks(rod())["rod thread"].notes)
        assert not checks(rod(edition="360-16"))["rod thread"].notes
        with pytest.raises(ScopeError, match=r"thread_strength.*360-16"):
            rod(edition="360-16", thread_strength="tensile stress area")

    def test_clause_moves_with_the_edition(self):
        assert checks(rod())["rod thread"].clause == "J3.7, Table J3.2"
        assert checks(rod(edition="360-16"))["rod thread"].clause == "J3.6, Table J3.2"
        assert nominal(rod(edition="360-16")) == pytest.approx(nominal(rod()))

    def test_metric_rod(self):
        found = rod(rod="M20", thread_strength="tensile stress area")

        # ISO 898-1: 245 mm² for M20
        assert value_of(checks(found)["rod thread"], "tensile_stress_area_metric") * 25.4**2 == pytest.approx(244.8, abs=0.1)

    def test_strength_of_a_graded_rod_falls_with_its_diameter(self):
        assert rod(rod="1-1/2", rod_grade="A449").material.F_u == 105
        assert rod(rod="2", rod_grade="A449", upper_width="5 in", lower_width="5 in").material.F_u == 90

    def test_upset_ends_are_advice(self):
        upset = checks(rod(rod="1", body_diameter="3/4 in"))

        assert upset["rod upset"].ok and upset["rod upset"].kind == "advice"
        assert upset["rod upset"].available == pytest.approx(0.75 * 58 * math.pi / 4)
        assert upset["rod yielding"].nominal == pytest.approx(15.9043, rel=1e-5)
        assert not checks(rod())["rod upset"].applies
        strong = checks(rod(rod="7/8", body_diameter="27/32 in", rod_grade="F1554-105"))["rod upset"]
        assert strong.ok is False and not strong.fails

    def test_elongation_at_service_load(self):
        """D + L = 7 kip on 12 ft: 7 · 144 / (29000 · 0.441786) = 0.0787 in, whatever the method."""
        for method in ("LRFD", "ASD"):
            found = checks(rod(method=method, rod_length="12 ft", elongation_limit="1/16 in"))["rod elongation"]
            assert found.demand == pytest.approx(0.07868, rel=1e-3)
            assert found.ok is False and not found.fails
        assert "0.079 in" in checks(rod(rod_length="12 ft"))["rod elongation"].reason

    def test_slenderness_does_not_apply(self):
        assert "no limit for rods" in checks(rod())["slenderness"].reason

    def test_there_is_no_curve_and_it_says_why(self):
        assert "no connection length" in study.capacity_curve(rod())

    @settings(max_examples=25, deadline=None, suppress_health_check=[HealthCheck.too_slow])
    @given(st.sampled_from(["5/8", "3/4", "7/8", "1", "1-1/4"]), st.sampled_from(["A36", "A572-50", "F1554-105"]))
    def test_larger_rods_are_stronger(self, size, grade):
        sizes = list(rods._threads())
        before, after = (nominal(rod(rod=each, rod_grade=grade, upper_width="8 in", lower_width="8 in")) for each in
                         (size, sizes[sizes.index(size) + 1]))

        assert all(after[id] > before[id] for id in ("rod thread", "rod yielding", "rod rupture"))
        assert after["upper plate bending"] < before["upper plate bending"]  # a larger hole


class TestNutAndPlate:
    def test_bearing_by_hand(self):
        """Heavy hex 3/4: 1-1/4 in across flats, hole 13/16: π/4 (1.5625 - 0.66016) = 0.70870 in²."""
        assert nominal(rod())["lower nut bearing"] == pytest.approx(1.8 * 36 * 0.70870, rel=1e-4)
        assert nominal(rod(nut="hex"))["lower nut bearing"] == pytest.approx(1.8 * 36 * math.pi / 4 * (1.125**2 - 0.8125**2))

    def test_plate_bending_by_statics(self):
        """Independent: moment of a simple beam by integrating its shear; the net section's plastic moment by integration."""
        R = nominal(rod())["lower plate bending"]
        M = integrate.quad(lambda x: R / 2, 0, 1.5)[0]
        M_p = 2 * integrate.quad(lambda y: 36 * (4 - 0.8125) * y, 0, 0.375)[0]

        assert pytest.approx(M) == M_p

    def test_washer_bending_by_integrating_its_pressure(self):
        """Independent: pressure on the strip beyond the nut's flat, its moment per inch against the plastic moment per inch."""
        found = checks(rod(WASHER))["lower washer bending"]
        q = found.nominal / (9 - math.pi / 4 * 0.8125**2)
        m = integrate.quad(lambda x: q * x, 0, (3 - 1.25) / 2)[0]

        assert m == pytest.approx(50 * 0.5**2 / 4)

    def test_washer_bearing_takes_the_smaller_yield_stress_and_nut_the_washers(self):
        found = checks(rod(WASHER))

        assert value_of(found["lower washer bearing"], "bearing_under_nut") == pytest.approx(1.8 * 36 * (9 - math.pi / 4 * 0.8125**2))
        assert value_of(found["lower nut bearing"], "bearing_under_nut") == pytest.approx(1.8 * 50 * math.pi / 4 * (1.25**2 - 0.8125**2))

    def test_what_is_not_checked_stands_with_its_reason(self):
        found = checks(rod(lower_span=None))

        assert "by others" in found["lower plate bending"].reason
        assert "without a plate washer" in found["lower washer bending"].reason


class TestLug:
    def test_a_lug_is_a_pin_plate(self):
        """The lug's checks are those of the pin connection with the same plate, pin and arms."""
        lug = nominal(rod(LUG))
        same = PinnedConnection.of(mark="P", member_thickness="1/2 in", member_width="3-1/2 in", member_grade="A36", member_edge="2 in",
                                   pin_diameter="1 in", pin_grade="A36", gap="1/16 in", support_thickness="3/8 in", support_width="4 in",
                                   support_grade="A36", support_edge="2 in", tension="9 kip", demand_level="LRFD")
        for id in ("tension rupture", "shear rupture", "bearing", "yielding"):
            assert lug[f"upper {id}"] == nominal(same)[f"member {id}"]
        for id in ("shear yielding", "shear rupture", "bending"):
            assert lug[f"upper pin {id}"] == nominal(same)[f"pin {id}"]

    def test_weld_by_hand(self):
        """Two 1/4 in fillets of 3-1/2 in, E70: 0.6 · 70 · 2 · 3.5 · 0.25 / √2 = 51.97 kip."""
        assert nominal(rod(LUG))["upper weld"] == pytest.approx(51.97, abs=0.005)
        assert checks(rod(LUG, upper_weld="1/8 in"))["upper weld size"].fails  # 3/16 by Table J2.4

    def test_rules_of_the_pin_hole(self):
        assert checks(rod(LUG, upper_edge="1-1/2 in"))["upper edge"].fails
        assert checks(rod(LUG, upper_hole_clearance="1/16 in"))["upper hole"].fails
        with pytest.raises(ScopeError, match="1/32"):
            rod(LUG, edition="360-16", upper_hole_clearance="1/16 in")

    def test_the_clevis_is_an_open_item(self):
        assert any("Clevis at the upper end" in text and "LRFD" in text for text in rod(LUG).open_items())
        assert not any("Clevis" in text for text in rod().open_items())


class TestWhole:
    @pytest.mark.parametrize("base", [NUT, LUG, WASHER], ids=["nuts", "lug", "washer"])
    def test_every_check_has_numbers_or_a_reason(self, base):
        connection = rod(base)
        ids = [each.id for each in connection.checks]

        assert len(set(ids)) == len(ids)
        for each in connection.checks:
            assert each.part in connection.parts and each.title.partition(", ")[2]
            assert math.isfinite(each.ratio) if each.applies else len(each.reason) > 10
        json.dumps(connection.to_dict(), allow_nan=False)
        assert connection.capacity == min(each.available for each in connection.checks if each.kind == "strength" and each.applies)

    @pytest.mark.parametrize("base, gids", [(NUT, ["upper-plate", "lower-nut", "torn"]), (LUG, ["upper-lug", "upper-clevis", "lower-thread"]),
                                            (WASHER, ["lower-washer"])], ids=["nuts", "lug", "washer"])
    def test_drawings_show_both_ends(self, base, gids):
        side, cut = rod(base).drawings()

        assert all(f'id="{gid}"' in side.svg for gid in gids)
        assert "upper end" in cut.svg and "lower end" in cut.svg and side.alt and cut.alt

    @pytest.mark.parametrize("base, changes, id, gid", [
        (NUT, {"lower_thickness": "3/8 in"}, "lower plate bending", "bent"),
        (LUG, {"upper_pin": "5/8 in", "upper_gap": "1 in"}, "upper pin bending", "pin-governs"),
        (LUG, {"upper_thickness": "1/8 in"}, "upper bearing", "borne"),
        (WASHER, {"lower_washer_thickness": "1/8 in"}, "lower washer bending", "bent"),
        (LUG, {"upper_weld": "1/16 in", "rod": "1-1/4"}, "upper weld", "weld"),
    ])
    def test_what_governs_is_marked(self, base, changes, id, gid):
        connection = rod(base, **changes)

        assert connection.governing.id == id
        assert f'id="{gid}"' in connection.drawings()[0].svg

    @pytest.mark.parametrize("base, changes, error, words", [
        (NUT, {"P_W_opposite": "-12 kip"}, ScopeError, ["tension only", "D2"]),
        (NUT, {"rod": "9/16"}, NotInTable, ["9/16", "5/8", "1/2"]),
        (NUT, {"rod": "thick"}, NotInTable, ["thick", "3/4"]),
        (NUT, {"rod_grade": "A992"}, InputError, ["A992", "threaded rod"]),
        (NUT, {"body_diameter": "1 in"}, InputError, ["body_diameter", "thread"]),
        (NUT, {"upper_hole": "1/2 in"}, InputError, ["upper_hole", "smaller than the rod"]),
        (NUT, {"upper_hole": "1-1/4 in"}, InputError, ["upper_hole", "plate washer"]),
        (NUT, {"upper_width": "1 in"}, InputError, ["upper_width", "narrower"]),
        (NUT, {"upper_washer": "3 in"}, InputError, ["upper_washer_thickness", "missing"]),
        (WASHER, {"lower_washer": "1 in"}, InputError, ["lower_washer", "wider than the nut"]),
        (WASHER, {"lower_washer": "6 in"}, InputError, ["lower_washer", "not wider than the plate"]),
        (NUT, {"upper_pin": "1 in"}, InputError, ["upper_pin", "nut and plate", "remove"]),
        (LUG, {"upper_edge": None}, InputError, ["upper_edge", "missing"]),
        (LUG, {"upper_span": "3 in"}, InputError, ["upper_span", "welded lug", "remove"]),
        (LUG, {"upper_hole_clearance": "1/8 in"}, ScopeError, ["upper_hole_clearance", "D5", "1/16"]),
        (LUG, {"upper_width": "1-1/4 in"}, InputError, ["upper_width", "1/8"]),
        (LUG, {"lug_electrode": "E99"}, NotInTable, ["E99", "E70"]),
        (LUG, {"lug_electrode": "E90"}, ScopeError, ["E90", "Table J2.5"]),
        (NUT, {"upper": "hook"}, InputError, ["upper", "nut and plate, welded lug"]),
        (NUT, {"rodd": "3/4"}, InputError, ["rodd", "rod"]),
        (NUT, {"thread_strength": "all"}, InputError, ["thread_strength", "body area"]),
    ])
    def test_bad_inputs(self, base, changes, error, words):
        with pytest.raises(error) as refused:
            rod(base, **changes)

        assert all(word in str(refused.value) for word in words), str(refused.value)


class TestThreads:
    def test_rods_have_the_threads_of_bolts(self):
        """Two tables set down apart: threads of rods against those of bolts, 1/2 to 1-1/2 in."""
        for name in bolts.bolt_sizes():
            if not name.startswith("M"):
                assert rods.thread(name).tpi == bolts.bolt_size(name).tpi

    def test_threads_get_coarser_with_the_diameter(self):
        _, rows = read_table("rods-inch.csv")
        found = [rods.thread(row["size"]) for row in rows]

        assert np.all(np.diff([each.d for each in found]) > 0) and np.all(np.diff([each.tpi for each in found]) <= 0)

    def test_standard_holes(self):
        """Table J3.3: d + 1/16 below 1 in, d + 1/8 from 1 in on."""
        assert rods.standard_hole(0.75) == 0.8125
        assert rods.standard_hole(1.0) == 1.125 and rods.standard_hole(2.0) == 2.125
        assert rods.standard_hole(0.375) == 0.4375
