"""A project in SI or in both systems: constants, sentences, tables, figures, published SI cases, a whole report."""

import re
import shutil
from pathlib import Path

import pypdf
import pytest
from helpers import PLATE, bolted, checks, value_of

from gageline import presenting, project, running, units
from gageline.connections.bolted import BoltedConnection
from gageline.connections.joint import INCH, METRIC
from gageline.connections.si_tables import in_si
from gageline.editions import Basis
from gageline.errors import InputError
from gageline.facts import bolts as facts

SOURCES = Path(presenting.__file__).parent
DEMO = Path(__file__).parents[2] / "calcs" / "conveyor-gallery"
METRIC_PLATE = PLATE | {"member": "PL 12 mm x 160 mm", "plate_thickness": "12 mm", "plate_width": "160 mm", "plate_end": "40 mm", "pitch": "75 mm",
                        "gage": "80 mm", "member_end": "40 mm", "bolt": "M20", "tension": "200 kN"}


def made(system, base=METRIC_PLATE, **changes):
    """Return a bolted connection whose project prints in a system."""
    return BoltedConnection(BoltedConnection.Model.of(**(base | changes)), Basis(units_system=system))


class TestConstants:
    def test_the_specification_states_them_in_round_millimetres(self):
        """AISC 360-22: B4.3b 2 mm, Table J3.2 950 mm, J5.2(a) 6 mm and 0.0154, J3.6 300, 180 and 150 mm, D5.1 16 mm."""
        lengths = (METRIC.damage, METRIC.long_joint, METRIC.filler_free, METRIC.spacing, METRIC.spacing_weathering, METRIC.edge, METRIC.beside_pin)

        assert [round(25.4 * length, 9) for length in lengths] == [2, 950, 6, 300, 180, 150, 16]
        assert METRIC.filler_slope / 25.4 == pytest.approx(0.0154, rel=1e-12)
        assert (INCH.damage, INCH.long_joint, INCH.filler_free, INCH.filler_slope) == (0.0625, 38.0, 0.25, 0.4)
        assert (INCH.spacing, INCH.spacing_weathering, INCH.edge, INCH.beside_pin) == (12.0, 7.0, 6.0, 0.63)

    @pytest.mark.parametrize(("system", "deducted"), [("US", 22 + 25.4 / 16), ("dual", 22 + 25.4 / 16), ("SI", 24.0)])
    def test_hole_deducted_for_m20(self, system, deducted):
        """M20 in a standard hole of 22 mm (Table J3.3M); only a project in SI takes the 2 mm."""
        found = checks(made(system))["member rupture"]

        assert 25.4 * value_of(found, "hole_width") == pytest.approx(deducted, rel=1e-12)

    def test_long_joint_begins_at_950_mm(self):
        """12 rows at 87 mm: 957 mm, which is 37.7 in, long by the metric rule and not by that of 38 in."""
        changes = {"rows": 12, "pitch": "87 mm"}

        assert value_of(checks(made("SI", **changes))["bolt shear"], "long_joint") > 0
        assert value_of(checks(made("US", **changes))["bolt shear"], "short_joint") > 0

    def test_fillers(self):
        """A filler of 10 mm: 1 - 0.0154 (10 - 6) = 0.9384 by the metric rule."""
        assert value_of(checks(made("SI", filler_thickness="10 mm", fillers=1))["bolt shear"], "filler_factor") == pytest.approx(0.9384, rel=1e-9)

    def test_upper_limits_of_spacing_and_edges(self):
        found = checks(made("SI", member="PL 40 mm x 160 mm", plate_thickness="40 mm"))

        assert 25.4 * found["spacing max"].nominal == pytest.approx(300)
        assert 25.4 * found["member max edge"].nominal == pytest.approx(150)

    def test_dual_computes_as_us(self):
        us, dual = made("US"), made("dual")

        assert [each.available for each in us.checks] == [each.available for each in dual.checks]
        assert {key: value for key, value in dual.to_dict().items() if key not in ("units", "checks")} == \
            {key: value for key, value in us.to_dict().items() if key != "checks"}

    def test_what_is_converted_is_said(self):
        assert any("0.0154 per mm" in text for text, _ in made("SI").assumptions())
        assert not any("0.0154 per mm" in text for text, _ in made("US").assumptions() + made("dual").assumptions())


class TestPublished:
    """Notes on steel structures of a university, with SI examples to CSA S16-14, T01 and T10: s²/4g and A_n F_u are the same in AISC 360."""

    @pytest.mark.parametrize(("holes", "diagonals", "printed"), [(1, (), 186.0), (2, ((50, 45),), 175.9), (3, ((55, 50), (50, 45)), 167.0)])
    def test_t01_net_width(self, holes, diagonals, printed):
        from gageline.provisions import tension

        credit = sum(tension.diagonal_credit.bare(1, s / 25.4, g / 25.4, 1 / 25.4) for s, g in diagonals)
        lost = tension.first_hole_loss.bare(holes, tension.hole_width.bare(22 / 25.4, METRIC.damage), 1 / 25.4)
        area = 210 / 645.16 - lost + credit

        assert 645.16 * area == pytest.approx(printed, abs=0.051)

    @pytest.mark.parametrize(("width", "thickness", "plates", "A_n", "gross", "net"),
                             [(300, 25, 1, 5700, 2362, 1924), (220, 14, 2, 2072, 1940, 1399)])
    def test_t10_plates_of_a_splice(self, width, thickness, plates, A_n, gross, net):
        """F_y 350, F_u 450 MPa, three holes of 24 mm in line across; printed in kN with 0.90 and 0.75."""
        from gageline.provisions import tension

        ksi = units.read("1 MPa", "ksi")
        A_g = width * thickness / 645.16
        lost = tension.first_hole_loss.bare(3, tension.hole_width.bare(22 / 25.4, METRIC.damage), thickness / 25.4)
        A = tension.net_area_straight.bare(A_g, lost)
        yielding = tension.gross_yielding.lines(350 * ksi, plates * A_g)[-1]
        rupture = tension.net_rupture.lines(450 * ksi, plates * A)[-1]

        assert pytest.approx(A_n, abs=0.5) == A * 645.16
        assert 0.90 * float(yielding.rendered("SI").result_printed) == pytest.approx(gross, abs=1.0)
        assert 0.75 * float(rupture.rendered("SI").result_printed) == pytest.approx(net, abs=1.0)

    @pytest.mark.parametrize(("group", "printed"), [("120", (91, 142, 176, 205, 267, 326, 475)), ("150", (114, 179, 221, 257, 334, 408, 595))])
    def test_pretensions_print_as_the_metric_table(self, group, printed):
        """AISC 360 Table J3.1M, M16 to M36, in kN."""
        sizes = ("M16", "M20", "M22", "M24", "M27", "M30", "M36")
        found = [facts.pretension(size, facts.bolt_group(group, "360-22")) for size in sizes]

        assert [units.amount(value, "kip", "SI", units.printed) for value in found] == [f"{value} kN" for value in printed]


class TestSentences:
    @pytest.mark.parametrize(("us", "si"), [
        ("Fillers of 1/4 in or less", "Fillers of 6.4 mm or less"), ("from 1/4 to 1/2 in wide", "from 6.4 to 12.7 mm wide"),
        ("3 bolts in line, 2 in line", "3 bolts in line, 2 in line"), ("governing 8.46 in², next 120.5 kip", "governing 5458 mm², next 536.0 kN"),
        ("6 bolts 7/8 in, A325", "6 bolts 7/8 in, A325"), ("$F_y$ 50 ksi", "$F_y$ 344.7 MPa"), ("a moment of 12 kip·in", "a moment of 1.356 kN·m"),
        ("P = 87 kip (−20)", "P = 387.0 kN (−88.96)"), ("Table J3.4, D2(a), 0.75", "Table J3.4, D2(a), 0.75"), ("0.5 kip/in", "0.08756 kN/mm")])
    def test_told_in_si(self, us, si):
        assert units.told(us, "SI") == si
        assert units.told(us, "US") == us

    def test_told_in_both(self):
        assert units.told("at 3 in, 20 kip", "dual") == "at 3 in (76.2 mm), 20 kip (88.96 kN)"
        assert units.told("187 kip (832 kN)", "dual") == "187 kip (832 kN)"

    def test_rounding_keeps_its_direction(self):
        """124.01 kip required is 551.6 kN, never 551; 124.99 available is 555.9, so 555 kN."""
        assert units.amount(124.01, "kip", "SI", units.ceil_figures) == "552 kN"
        assert units.amount(124.99, "kip", "SI", units.floor_figures) == "555 kN"

    def test_the_system_ends_with_its_block(self):
        with pytest.raises(ZeroDivisionError), units.lengths_in("SI"):
            assert units.fraction(1.5, unit=" in") == "38.1 mm" and units.feet(126.5) == "3213 mm"
            raise ZeroDivisionError
        assert units.fraction(1.5, unit=" in") == "1½ in"

    def test_no_source_writes_the_inch_behind_a_fraction(self):
        """fraction() may return millimetres, so its unit comes from itself."""
        for path in SOURCES.rglob("*.py"):
            found = re.search(r"\bunits\.fraction\([^{}]*\)\} in\b|[{ ]fraction\((?!value\))[^{}]*\)\} in\b(?! \{)", path.read_text(encoding="utf-8"))
            assert not found or "unit=" in found[0], (path, found[0])


class TestBlocks:
    @pytest.fixture(scope="class")
    def blocks(self):
        c = made("SI")
        return [*presenting.summary(c), *presenting.loads(c), presenting.designed(c), *presenting.closing(c),
                *(block for part in c.parts for block in presenting.checks(c, part))]

    def test_nothing_is_in_inch_or_kip(self, blocks):
        """An inch or kip with a number before it stands nowhere in a project in SI."""
        said = re.sub(r"'alt': '[^']*'", "", repr(blocks))

        assert not re.search(r"[\d½¼¾⅛⅜⅝⅞] (in|kip|ksi|in²)(?![\w²])", said)
        assert not re.search(r"text\{(in|kip|ksi)|, in\b'|, kip\b'", said)
        assert "kN" in said and "MPa" in said and "mm" in said

    def test_a_verdict_is_in_kn(self, blocks):
        verdict = next(block for block in blocks if block["kind"] == "verdict")

        assert "kN" in repr(verdict["lhs"]) and verdict["text"].startswith("200 / ")

    def test_bolt_table(self, blocks):
        c = made("SI")
        us = c.tables("bolts")[0]
        si = in_si(us)

        assert si.heads[1] == "x, mm" and "in kN" in si.caption
        assert si.rows[1][1] == "75" and float(si.rows[1][2]) == pytest.approx(25.4 * units.read(f"{us.rows[1][2]} in", "in"), abs=0.06)
        assert float(si.rows[0][4]) == pytest.approx(4.44822 * float(us.rows[0][4]), rel=1e-3)

    def test_us_says_what_it_said(self):
        """The default system changes no sentence: told and amount give back the US text."""
        c = bolted()
        assert c.basis.units_system == "US"
        assert presenting.required(c.governing) == presenting.required(c.governing, "US") == f"{units.ceil_figures(c.governing.demand)} kip"
        assert "units" not in c.to_dict()


class TestProject:
    def write(self, folder, units_line):
        path = folder / "project.toml"
        path.write_text(f'project = "x"\nedition = "360-22"\nmethod = "LRFD"\nloads = "7-22"\ndate = 2026-12-01\n{units_line}\n', encoding="utf-8")
        return project.load(path)

    def test_default_and_choices(self, tmp_path):
        assert self.write(tmp_path, "").basis.units_system == "US"
        assert self.write(tmp_path, 'units = "SI"').basis.units_system == "SI"
        with pytest.raises(InputError, match="units = 'metric' is not allowed"):
            self.write(tmp_path, 'units = "metric"')
        with pytest.raises(InputError, match="units_system"):
            Basis(units_system="metric")

    def test_new_project_names_it(self, tmp_path):
        assert 'units = "US"' in project.write_new(tmp_path, "x").read_text(encoding="utf-8")


@pytest.mark.slow
@pytest.mark.parametrize("system", ["SI", "dual"])
def test_a_whole_report(system, tmp_path):
    place = tmp_path / "calcs" / "job"
    place.mkdir(parents=True)
    text = (DEMO / "project.toml").read_text(encoding="utf-8")
    (place / "project.toml").write_text(f'{text}\nunits = "{system}"\n', encoding="utf-8")
    shutil.copy(DEMO / "H1.ipynb", place)
    path, calc = running.report(place / "H1.ipynb")
    text = re.sub(r"\s+", " ", " ".join(page.extract_text() for page in pypdf.PdfReader(path).pages))

    assert calc.results()["units"] == system
    assert "549 kN" in text and "available strength" in text
    if system == "dual":
        assert "124 kip (549 kN)" in text
        return
    assert "Pᵤ = 549 kN" in text and "connection length l, mm" in text and "dead load D, kN" in text and "imensions in mm" in text
    # What the engineer typed stands beside its value; nothing else is in inch or kip, but the name of an inch bolt.
    left = re.findall(r"[\d½¼¾⅛⅜⅝⅞] (?:kip|ksi|in²|in)\b(?! =)(?! line| A\d| the)", text)
    assert [each for each in left if each != "8 in"] == []
