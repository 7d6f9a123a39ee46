"""Options of every family: fatigue, impact, seismic braces. Numbers worked by hand in the comments."""

import pytest
from helpers import ANGLE, PLATE, bolted, checks, remarks, value_of

from gageline import presenting
from gageline.connections.hanger import HangerConnection
from gageline.connections.pinned import PinnedConnection
from gageline.connections.rod import RodConnection
from gageline.connections.slotted import SlottedConnection
from gageline.connections.welded import WeldedConnection
from gageline.errors import InputError, NotInTable, ScopeError
from gageline.facts.expected import expected

CYCLIC = {"fatigue_range": "30 kip", "fatigue_cycles": 500_000}
LOADS = {"tension": None, "demand_level": None, "P_D": "20 kip", "P_L": "30 kip"}
TIE = {"mark": "T2", "member": "PL 1/2 x 6", "member_grade": "A572-50", "plate_thickness": "5/8 in", "plate_width": "10 in",
       "plate_grade": "A572-50", "weld_size": "1/4 in", "weld_length": "8 in", "lap": "9 in", "tension": "60 kip", "demand_level": "LRFD"}
ROD = {"mark": "R", "rod": "1 in", "rod_grade": "A36", "upper": "nut and plate", "upper_thickness": "3/4 in", "upper_width": "5 in", "upper_grade": "A36",
       "lower": "nut and plate", "lower_thickness": "3/4 in", "lower_width": "5 in", "lower_grade": "A36", "tension": "10 kip", "demand_level": "LRFD"}
PIN = {"mark": "P", "member_thickness": "1 in", "member_width": "7 in", "member_grade": "A572-50", "member_edge": "3-1/2 in", "pin_diameter": "2 in",
       "pin_grade": "A572-50", "gap": "1/16 in", "support_thickness": "3/4 in", "support_width": "7 in", "support_grade": "A572-50",
       "support_edge": "3-1/2 in", "tension": "60 kip", "demand_level": "LRFD"}
TUBE = {"mark": "V", "member": "HSS6x4x3/8", "member_grade": "A500-C", "side_along_gusset": "long", "plate_thickness": "5/8 in", "plate_width": "16 in",
        "plate_grade": "A572-50", "weld_length": "16 in", "weld_leg": "1/4 in", "gusset_support": "compact corner", "gusset_length": "6 in",
        "tension": "100 kip", "demand_level": "LRFD"}
SLIP = {"installation": "slip-critical", "slip_class": "A"}
HANGER = {"mark": "H", "tension": "50 kip", "demand_level": "LRFD", "beam": "W21x57", "beam_grade": "A992", "beam_end": "10 ft", "fitting": "WT6x17.5",
          "fitting_grade": "A992", "rows": 2, "pitch": "5 in", "gage": "3-1/2 in", "fitting_end": "2 in", "bolt": "3/4", "bolt_grade": "A325",
          "member": "2L3x3x5/16", "member_grade": "A572-50", "joined": "welded", "weld": "3/16 in", "weld_length": "4 in",
          "installation": "pretensioned"}
BOTH = pytest.mark.parametrize("edition", ["360-22", "360-16"])


class TestFatigue:
    @BOTH
    def test_slip_critical_lap_by_hand(self, edition):
        """Gross section 1/2 x 6 = 3.00 in², 30 kip: 10.0 ksi; category B at 500 000 cycles: 1000 (12/5e5)^0.333 = 28.95 ksi."""
        found = checks(bolted(**CYCLIC, **SLIP, edition=edition))["fatigue member"]

        assert found.demand == pytest.approx(10.0)
        assert found.available == pytest.approx(28.95, abs=0.005)
        assert (found.unit, found.kind, found.tension) == ("ksi", "strength", False)
        assert "2.1" in remarks(found)

    def test_pretensioned_lap_by_hand(self):
        """Net section 3.00 - 2 (15/16 + 1/16) 1/2 = 2.00 in²: 15.0 ksi."""
        assert checks(bolted(**CYCLIC, installation="pretensioned"))["fatigue member"].demand == pytest.approx(15.0)

    def test_method_does_not_matter(self):
        ranges = [checks(bolted(**CYCLIC, **SLIP, method=method))["fatigue member"].ratio for method in ("LRFD", "ASD")]

        assert ranges[0] == ranges[1]

    def test_infinite_life_below_the_threshold(self):
        """16 ksi of category B times 3.00 in² is 48 kip, for any number of cycles."""
        found = checks(bolted(**SLIP, fatigue_range="47.9 kip", fatigue_cycles=1e9))["fatigue member"]

        assert found.ok and found.available == 16.0

    def test_largest_stress_by_hand(self):
        """D 20 + L 30 = 50 kip on 3.00 in² = 16.67 ksi; 0.66 of 50 is 33 ksi."""
        found = checks(bolted(**CYCLIC, **SLIP, **LOADS))["fatigue member peak"]

        assert (found.demand, found.available) == (pytest.approx(16.667, abs=0.001), pytest.approx(33.0))

    def test_a_range_beyond_the_allowable_fails_and_leaves_the_static_capacity(self):
        base, worn = bolted(**SLIP), bolted(**SLIP, fatigue_range="90 kip", fatigue_cycles=2e6)

        assert not worn.ok and worn.governing.id == "fatigue member"
        assert worn.capacity == base.capacity

    @pytest.mark.parametrize("given, words", [({}, "no cycles"), (CYCLIC | {"fatigue_cycles": 20_000}, "not more than 20 000")])
    def test_reason_where_there_is_no_fatigue(self, given, words):
        found = checks(bolted(**given))["fatigue"]

        assert not found.applies and words in found.reason

    def test_bolts_in_tension_take_a_fifth(self):
        from gageline.provisions.fatigue import share_of_pretensioned_bolts

        assert share_of_pretensioned_bolts.bare(100.0, 1.0, 1.0) == 20.0

    def test_refusals(self):
        with pytest.raises(ScopeError, match="snug.*20 000"):
            assert bolted(**CYCLIC).checks
        with pytest.raises(InputError, match="fatigue_cycles is missing"):
            bolted(fatigue_range="30 kip")
        with pytest.raises(ScopeError, match="transverse"):
            assert WeldedConnection.of(**TIE | CYCLIC | {"welds": "longitudinal and end"}).checks

    @pytest.mark.parametrize("thickness, category", [("1/2 in", "E"), ("5/8 in", "E'")])
    def test_ends_of_longitudinal_welds(self, thickness, category):
        made = checks(WeldedConnection.of(**TIE | CYCLIC | {"member": f"PL {thickness} x 6"}))

        assert made["fatigue member weld ends"].clause.endswith(f"category {category}")
        assert made["fatigue weld throat"].clause.endswith("category F")

    def test_throat_of_welds_by_hand(self):
        """2 lines of 8 in, throat 1/4/√2: 2.828 in²; 30 kip: 10.6 ksi against 100 (1.5/5e5)^0.167 = 11.96 ksi."""
        found = checks(WeldedConnection.of(**TIE | CYCLIC))["fatigue weld throat"]

        assert (found.demand, found.available) == (pytest.approx(10.607, abs=0.001), pytest.approx(11.96, abs=0.005))

    def test_thread_of_a_rod_by_hand(self):
        """5 kip on 0.6057 in² (1 in, 8 threads) is 8.25 ksi; category G at 2 million cycles: the threshold, 7 ksi."""
        found = checks(RodConnection.of(**ROD, fatigue_range="5 kip", fatigue_cycles=2e6))["fatigue thread"]

        assert (found.demand, found.available, found.ok) == (pytest.approx(8.255, abs=0.002), 7.0, False)

    def test_lug_of_a_rod_by_hand(self):
        """Lug 3/4 x 4: 5 kip on 3.00 in² is 1.67 ksi; R_FIL = (0.06 + 0.72/3) / 0.75^0.167 = 0.3148, times 13.06 ksi; 2 throats of 0.1768 x 4."""
        lug = {"upper": "welded lug", "upper_thickness": "3/4 in", "upper_width": "4 in", "upper_edge": "2 in", "upper_pin": "1-1/4 in",
               "upper_pin_grade": "A36", "upper_arm": "1/2 in", "upper_gap": "1/16 in", "upper_weld": "1/4 in"}
        made = checks(RodConnection.of(**ROD | lug, fatigue_range="5 kip", fatigue_cycles=2e6))

        assert (made["fatigue upper weld"].demand, made["fatigue upper weld"].available) == (pytest.approx(1.6667, abs=1e-4), pytest.approx(4.111, abs=2e-3))
        assert made["fatigue upper throat"].demand == pytest.approx(5 / 1.4142, rel=1e-4)
        assert made["fatigue upper pin"].demand == pytest.approx(5 / (0.75 * (4 - 1.28125)))

    def test_bolts_of_a_hanger_by_hand(self):
        """Four 3/4 in bolts, 0.3345 in² each; a fifth of 30 kip, raised by the prying of the required load; category G."""
        found = checks(HangerConnection.of(**HANGER, **CYCLIC))
        worst = max((found[f"{side} prying"] for side in ("fitting", "beam")), key=lambda each: value_of(each, "bolt_force"))
        prying = value_of(worst, "bolt_force") / 12.5

        assert prying >= 1
        assert found["fatigue bolts"].demand == pytest.approx(0.2 * 30 * prying / (4 * 0.3345), rel=1e-3)
        assert found["fatigue bolts"].available == pytest.approx(9.25, abs=0.005)
        with pytest.raises(ScopeError, match="snug"):
            assert HangerConnection.of(**HANGER | CYCLIC | {"installation": "snug"}).checks

    def test_net_section_of_a_pin_plate_by_hand(self):
        """(7 - 2-1/32) 1 = 4.969 in²; 30 kip: 6.04 ksi, category E."""
        found = checks(PinnedConnection.of(**PIN, **CYCLIC))["fatigue member pin"]

        assert (found.demand, found.available) == (pytest.approx(6.0377, abs=0.001), pytest.approx(13.06, abs=0.005))

    def test_report_prints_ksi(self):
        printed = str(presenting.checks(bolted(**CYCLIC, **SLIP), "member"))

        assert "F_{SR} = " in printed and "10.0 / 28.9" in printed
        assert not any("fatigue" in text for text in bolted(**CYCLIC, **SLIP).left_to_others())
        assert any("fatigue" in text for text in bolted().left_to_others())


class TestImpact:
    def test_by_hand(self):
        """1.2 (20) + 1.6 (30 + 0.20 · 30) = 81.6; half of the load moving: 1.2 (20) + 1.6 (30 + 3) = 76.8 kip."""
        assert bolted(**LOADS, impact="20 %").demand.required_tension == pytest.approx(81.6)
        assert bolted(**LOADS, impact="20 %", P_L_moving="15 kip").demand.required_tension == pytest.approx(76.8)

    def test_legacy_is_off_and_tagged(self):
        assert bolted(**LOADS).inputs.service()["L"] == 30.0
        made = bolted(**LOADS, impact="33 % legacy")

        assert made.inputs.service()["L"] == pytest.approx(39.9)
        assert any("legacy" in basis for _, basis in made.assumptions())

    @pytest.mark.parametrize("given, words", [({"impact": "33 %"}, "impact_basis"), ({"impact": "a bit"}, "cannot be read"),
                                              ({"impact": "20 %", "P_L": None}, "P_L is not given"), ({"P_L_moving": "5 kip"}, "go with impact"),
                                              ({"impact": "20 %", "P_L_moving": "31 kip"}, "P_L_moving")])
    def test_refusals(self, given, words):
        with pytest.raises(InputError, match=words):
            bolted(**LOADS | given)

    def test_the_line_is_printed(self):
        assert "P_{L,i}" in str(presenting.loads(bolted(**LOADS, impact="20 %")))


class TestSeismic:
    BRACE = SLIP | {"seismic_system": "SCBF", "gusset_support": "compact corner", "gusset_length": "6 in", "rows": 8, "member_length": "10 ft"}

    def made(self, method="LRFD", **more):
        return bolted(ANGLE, method=method, **self.BRACE | more)

    def test_required_strength_by_hand(self):
        """L4x4x1/2, A36: 1.5 (36) 3.75 = 202.5 kip; by ASD 135 kip."""
        assert self.made().demand.required_tension == pytest.approx(202.5)
        assert self.made("ASD").demand.required_tension == pytest.approx(135.0)

    def test_cap(self):
        made = self.made(system_cap="150 kip", system_cap_basis="uplift of the footing, calculation F-2")

        assert made.demand.required_tension == 150.0
        assert any("footing" in text for text, _ in made.assumptions())

    def test_the_brace_itself(self):
        """Yielding is for the loads; rupture counts R_t = 1.2; A_e is less than A_g, so the rule of the net area is not met."""
        made, plain = checks(self.made()), checks(bolted(ANGLE, **self.BRACE | {"seismic_system": None}))

        assert made["member yielding"].demand == 50.0
        assert made["member rupture"].nominal == pytest.approx(1.2 * plain["member rupture"].nominal)
        assert made["seismic net area"].demand == pytest.approx(3.75)
        assert made["seismic net area"].available == pytest.approx(value_of(plain["member rupture"], "effective_net_area"))
        assert made["seismic net area"].fails
        assert made["seismic slenderness"].demand == pytest.approx(120 / 0.776, rel=1e-3)
        assert not made["seismic band"].applies

    def test_band_is_advice(self):
        found = checks(self.made(clear_band="3/4 in"))["seismic band"]

        assert (found.kind, found.demand, found.ok, found.fails) == ("advice", 1.0, False, False)

    def test_open_until_confirmed(self):
        assert any("from memory" in text for text in self.made().open_items())
        assert not any("from memory" in text for text in self.made(seismic_basis="checked against AISC 341-22 by the engineer").open_items())

    def test_ordinary_brace_needs_no_more_than_its_load(self):
        made = self.made(seismic_system="OCBF")

        assert made.demand.required_tension == 50.0
        assert not checks(made)["seismic net area"].applies

    @pytest.mark.parametrize("given, words", [({"installation": "snug", "slip_class": None}, "snug"), ({"plate_holes": "LSL across"}, "short slots"),
                                              ({"plate_holes": "OVS", "member_holes": "OVS"}, "one ply"),
                                              ({"deformation_considered": False}, "2.4 d t F_u")])
    def test_bolts(self, given, words):
        with pytest.raises(ScopeError, match=words):
            self.made(**given)

    def test_other_refusals(self):
        with pytest.raises(InputError, match="system_cap_basis"):
            self.made(system_cap="150 kip")
        with pytest.raises(ScopeError, match="seismic_system is not for"):
            PinnedConnection.of(**PIN, seismic_system="SCBF")
        with pytest.raises(NotInTable, match="R_y"):
            expected("A514", "plate")

    def test_tube_and_weld(self):
        """HSS6x4x3/8 A500 C: 1.3 (50) 6.18 = 401.7 kip; PL 1/2 x 6 A572-50 plate: 1.1 (50) 3.00 = 165 kip."""
        tube = SlottedConnection.of(**TUBE, seismic_system="SCBF")
        tie = WeldedConnection.of(**TIE, seismic_system="SCBF", gusset_support="compact corner", gusset_length="6 in")

        assert tube.demand.required_tension == pytest.approx(401.7)
        assert tie.demand.required_tension == pytest.approx(165.0)
        assert checks(tie)["seismic net area"].applies
        assert "P_{exp}" in str(presenting.loads(tube))


def test_plain_calculations_have_no_seismic_rows():
    assert not [each for each in bolted(PLATE).checks if each.id.startswith("seismic")]
