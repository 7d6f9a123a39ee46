"""Room of each input before D/C reaches 1.00, and a joint as built against the joint as designed."""

import pytest

import gageline
from gageline.errors import InputError, ScopeError
from gageline.margins import against_design, changed, margins

TEE = {"mark": "H1", "member": "WT8x33.5", "member_grade": "A992", "connected_by": "flange", "plate_grade": "A572-50", "plate_end": "1-1/2 in",
       "member_end": "1-1/2 in", "bolt": "7/8", "bolt_grade": "A325", "P_D": "38 kip", "P_L": "46 kip", "plate_width": "11 in",
       "plate_thickness": "3/4 in", "lines": 2, "rows": 4, "pitch": "3 in", "gage": "5-1/2 in"}


@pytest.fixture(scope="module")
def room():
    """Input name -> its margin."""
    return {margin.name: margin for margin in margins(gageline.bolted(**TEE))}


class TestMargins:
    @pytest.mark.parametrize(("name", "limit", "why"), [
        ("P_D", (194.8278 - 1.6 * 46) / 1.2, "Bolts, shear"), ("P_L", (194.8278 - 1.2 * 38) / 1.6, "Bolts, shear"),
        ("gage", 10.2 - 2 * 1.125, "Member, side distance"), ("member_end", 6.0, "Member, edge distance, maximum")])
    def test_upper_limits_by_hand(self, room, name, limit, why):
        """8 bolts of 24.353 kip carry 1.2D + 1.6L = 194.83 kip; b_f = 10.2 in. less two edges of Table J3.4; 12t capped at 6 in."""
        assert room[name].upper == pytest.approx(limit, rel=1e-5)
        assert why in room[name].upper_why

    @pytest.mark.parametrize(("name", "limit", "why"), [
        ("pitch", 8 / 3 * 0.875, "minimum spacing"), ("member_end", 1.125, "end distance"), ("plate_end", 1.125, "end distance"),
        ("plate_width", 5.5 + 2 * 1.125, "side distance")])
    def test_lower_limits_by_hand(self, room, name, limit, why):
        """2-2/3 d, and Table J3.4's 1-1/8 in. for a 7/8 in. bolt."""
        assert room[name].lower == pytest.approx(limit, rel=1e-5)
        assert why in room[name].lower_why

    def test_at_the_limit_the_ratio_is_one(self, room):
        """A plate as thin as the margin allows is just strong enough."""
        thin = changed(gageline.bolted(**TEE), plate_thickness=room["plate_thickness"].lower)

        assert thin.ok
        assert thin.governing.ratio == pytest.approx(1.0, abs=1e-5)

    def test_changing_nothing_changes_nothing(self):
        """All inputs written back as texts give the same results."""
        before = gageline.bolted(**TEE)

        assert changed(before).to_dict() == before.to_dict()


class TestAsBuilt:
    BASIS = "survey of the steel, effect on the group judged small by the engineer"

    def test_a_missing_bolt_carries_nothing_and_its_hole_still_weakens(self):
        """7 of 8 bolts: 7/8 of the shear strength; rupture and block shear keep all holes."""
        designed = gageline.bolted(**TEE)
        built = gageline.bolted(**TEE, missing_bolts=[6], eccentricity_basis=self.BASIS)
        rows = {title: (before, after) for title, before, after, *_ in against_design(built, designed)}

        assert rows["Bolts, shear"][1] == pytest.approx(7 / 8 * rows["Bolts, shear"][0])
        assert rows["Member, rupture of the net section"][1] <= rows["Member, rupture of the net section"][0]
        assert rows["Member, block shear"][1] <= rows["Member, block shear"][0] + 1e-9
        assert built.joint.numbers == (1, 2, 3, 4, 5, 7, 8)

    def test_a_missing_lead_bolt_still_weakens_the_lead_row(self):
        """Net section through row 1 loses both holes though one bolt is missing there: 9.81 - 2 x 1.0 x 0.665 in²."""
        built = gageline.bolted(**TEE, missing_bolts=[1], eccentricity_basis=self.BASIS)
        check = next(each for each in built.checks if each.id == "member rupture")
        area = next(f.bare(*v) for f, v in (step for step in check.steps if not isinstance(step, str)) if f.__name__ == "net_area_straight")

        assert area == pytest.approx(9.81 - 2 * 1.0 * 0.665)

    def test_holes_where_they_were_measured(self):
        """An edge bolt drilled 1/2 in. too near the end tears out at l_c = 1 - 15/32 instead of 1-1/2 - 15/32 in."""
        flat = {"mark": "T1", "member": "PL 1/2 x 6", "member_grade": "A36", "plate_thickness": "1 in", "plate_width": "6 in", "plate_grade": "A36",
                "plate_end": "2 in", "member_end": "1 in", "bolt": "7/8 in", "bolt_grade": "A490", "tension": "20 kip", "demand_level": "LRFD"}
        built = gageline.bolted(**flat, holes="0 in, 1-1/2 in; 3-1/2 in, 1-1/2 in; 0 in, 4-1/2 in; 3 in, 4-1/2 in")
        from gageline.connections.bolt_group import bolt_table

        l_c = [row["member"][0] for row in bolt_table(built.joint)["rows"]]
        assert l_c[1] == pytest.approx(1 - 15 / 32) and l_c[3] == pytest.approx(1.5 - 15 / 32)

    def test_an_eccentric_group_needs_a_written_basis(self):
        """The centroid of 7 bolts is 0.39 in. off; without a basis J1.7 stops it, beyond 1/2 in. nothing helps."""
        with pytest.raises(ScopeError, match="J1.7"):
            gageline.bolted(**TEE, missing_bolts=[6])
        with pytest.raises(ScopeError, match="J1.7"):
            gageline.bolted(**TEE, missing_bolts=[6, 7], eccentricity_basis=self.BASIS)

    @pytest.mark.parametrize(("missing", "words"), [([9], "1 to 8"), ([0], "1 to 8"), (list(range(1, 9)), "no bolt is left")])
    def test_numbers_that_are_none(self, missing, words):
        """Bolts are numbered as in the bolt table."""
        with pytest.raises(InputError, match=words):
            gageline.bolted(**TEE, missing_bolts=missing, eccentricity_basis=self.BASIS)
