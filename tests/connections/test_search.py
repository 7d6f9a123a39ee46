"""The search over layouts: what it finds is what the ordinary calculation says, detailing rules included; speed is benched elsewhere."""

import numpy as np
import pytest

import gageline
from gageline.errors import GagelineError, InputError
from gageline.search import search

TEE = {"mark": "H1", "member": "WT8x33.5", "member_grade": "A992", "connected_by": "flange", "plate_grade": "A572-50", "plate_end": "1-1/2 in",
       "member_end": "1-1/2 in", "bolt_grade": "A325", "P_D": "38 kip", "P_L": "46 kip", "plate_width": "11 in"}
ANGLE = {"mark": "B1", "member": "L4x4x1/2", "member_grade": "A36", "plate_grade": "A36", "plate_end": "1-1/2 in", "member_end": "1-1/2 in",
         "bolt_grade": "A325", "tension": "60 kip", "demand_level": "LRFD", "plate_width": "10 in", "lines": 1}
WEB = {"mark": "W1", "member": "W12x50", "member_grade": "A992", "connected_by": "web", "plate_grade": "A36", "plate_end": "1-1/2 in",
       "member_end": "1-1/2 in", "bolt": "3/4", "bolt_grade": "A325", "tension": "90 kip", "demand_level": "LRFD", "lines": 2, "stagger": "1 in"}

CASES = {
    "tee": (TEE, {"bolt": ["3/4", "1"], "rows": [2, 3, 4], "lines": [2], "pitch": ["2 in", "2-3/4 in", "3 in", "13 in"],
                  "gage": ["1-1/2 in", "2-1/2 in", "5-1/2 in", "9 in"], "plate_thickness": ["1/4 in", "3/4 in"]}),
    "angle": (ANGLE, {"bolt": ["5/8", "7/8"], "rows": [1, 2, 4], "pitch": ["2-1/2 in", "3 in"], "gage_from_back": ["1 in", "2-1/2 in", "3-1/2 in"],
                      "plate_thickness": ["1/4 in", "1/2 in"], "member_end": ["3/4 in", "1-1/2 in"]}),
    "staggered web": (WEB, {"rows": [2, 4], "pitch": ["2-1/2 in", "3 in"], "gage": ["1-1/2 in", "4 in", "9 in"], "plate_thickness": ["3/8 in"],
                            "plate_width": ["8 in", "12 in"]}),
}


@pytest.mark.parametrize(("base", "vary"), CASES.values(), ids=CASES)
class TestAgainstTheOrdinaryCalculation:
    def test_finds_exactly_what_passes_one_by_one(self, base, vary):
        """Every layout tried is built and checked on its own: the feasible ones, and their D/C, are those of the search."""
        import itertools

        passing = {}
        for values in itertools.product(*vary.values()):
            chosen = dict(zip(vary, values))
            try:
                connection = gageline.bolted(**(base | chosen))
            except GagelineError:
                continue
            if connection.ok:
                passing[tuple(str(value) for value in values)] = connection.governing.ratio
        found = search(base, vary)

        assert found.evaluated == np.prod([len(values) for values in vary.values()])
        assert found.feasible == len(passing) > 0
        named = {name: {gageline.units.read(v, "in"): v for v in values} if name in ("pitch", "gage", "gage_from_back", "plate_thickness",
                                                                                      "member_end", "plate_width") else None
                 for name, values in vary.items()}
        for i in range(found.feasible):
            key = tuple(str(named[name][found.layouts[name][i]] if named[name] else found.layouts[name][i]) for name in vary)
            assert found.layouts["ratio"][i] == pytest.approx(passing[key], rel=1e-9), key

    def test_the_winner_is_an_inputs_cell(self, base, vary):
        """The winner's inputs cell, read back, gives the winner."""
        from gageline import cells

        found = search(base, vary, "shortest connection")
        given = cells.read_inputs(found.inputs_cell())
        connection = gageline.bolted(**{name: each.value for name, each in given.items()})

        assert connection.ok
        assert connection.governing.ratio == pytest.approx(found.layouts["ratio"][0], rel=1e-9)
        assert found.connection().joint.length == found.layouts["length"][0] == min(found.layouts["length"])


class TestRanking:
    def test_objectives(self):
        """The first layout has the least of what was asked for; a weighted sum lies between."""
        base, vary = CASES["tee"]
        for objective, name in (("fewest bolts", "bolts"), ("shortest connection", "length"), ("least plate weight", "plate weight")):
            found = search(base, vary, objective)
            assert found.layouts[name][0] == min(found.layouts[name])
        mixed = search(base, vary, {"fewest bolts": 1.0, "least plate weight": 100.0})
        score = mixed.layouts["bolts"] + 100.0 * mixed.layouts["plate weight"]
        assert score[0] == min(score)

    def test_pareto_set_is_beaten_by_nothing(self):
        """No feasible layout has fewer bolts and a lighter plate than a member of the Pareto set."""
        found = search(*CASES["tee"])
        x, y = found.layouts["bolts"], found.layouts["plate weight"]
        for i in found.pareto():
            assert not np.any((x <= x[i]) & (y < y[i] - 1e-12))

    def test_plate_weight_by_hand(self):
        """11 x 3/4 in plate, 1.5 + 6 + 1.5 in long, 490 lb/ft³: 0.021 kip."""
        found = search(TEE, {"bolt": ["7/8"], "rows": [3], "lines": [2], "pitch": ["3 in"], "gage": ["5-1/2 in"], "plate_thickness": ["3/4 in"]})

        assert found.layouts["plate weight"][0] == pytest.approx(11 * 0.75 * 9 / 1728 * 0.490, rel=1e-5)


@pytest.mark.parametrize(("vary", "objective", "words"), [
    ({"rowz": [2]}, "fewest bolts", "rowz"), ({"rows": []}, "fewest bolts", "no values"), ({"rows": [2]}, "cheapest", "cheapest"),
    ({"holes": ["0 in, 1 in"]}, "fewest bolts", "holes"), ({"seismic_system": ["SCBF"]}, "fewest bolts", "tension only"), ({"pitch": ["3"]}, "fewest bolts", "unit")])
def test_refuses_what_it_cannot_search(vary, objective, words):
    """Unknown inputs, empty lists, unknown objectives and missing units are one sentence each."""
    with pytest.raises(InputError, match=words):
        search(ANGLE, vary, objective)


class TestSweeps:
    @pytest.mark.parametrize("axes", [("pitch",), ("plate_thickness", "gage"), ("member_end", "plate_width")], ids=" ".join)
    def test_equal_to_one_design_at_a_time(self, axes):
        """D/C over one or two lengths, on arrays, is that of each design built alone, to 1e-9."""
        from gageline import study
        from gageline.margins import changed

        spans = {"pitch": [2.5, 3.0, 4.25], "plate_thickness": [0.25, 0.5, 0.75], "gage": [3.5, 5.5], "member_end": [1.25, 1.5], "plate_width": [8.0, 11.0]}
        tee = gageline.bolted(**TEE, bolt="7/8", rows=3, lines=2, pitch="3 in", gage="5-1/2 in", plate_thickness="3/8 in")
        found = study.ratios(tee, **{name: spans[name] for name in axes})

        assert found.shape == tuple(len(spans[name]) for name in axes)
        for index in np.ndindex(found.shape):
            alone = changed(tee, **{name: spans[name][i] for name, i in zip(axes, index)})
            weakest = min(each.available for each in alone.checks if each.kind == "strength" and each.applies and each.tension)
            assert found[index] == pytest.approx(alone.demand.required_tension / weakest, rel=1e-9)

    def test_figures_of_a_search(self):
        """The Pareto plot holds the set's points; the contour plot is drawn; both are the same twice."""
        from gageline import study
        from gageline.figures import contour, pareto

        found = search(*CASES["tee"])
        tee = gageline.bolted(**TEE, bolt="7/8", rows=3, lines=2, pitch="3 in", gage="5-1/2 in", plate_thickness="3/8 in")
        x, y = np.linspace(2.5, 6, 12), np.linspace(0.2, 0.6, 9)
        drawn = contour(study.ratios(tee, pitch=x, plate_thickness=y), ("pitch", x), ("plate_thickness", y), (3.0, 0.375))

        assert pareto(found).svg == pareto(found).svg and f"{len(found.pareto())} of them" in pareto(found).alt
        assert "1.00" in drawn.svg and "this design" in drawn.svg


def test_refuses_a_member_that_reverses():
    """The search knows no buckling of the gusset: it says so instead of ranking layouts by half of their checks."""
    inputs = {name: value for name, value in ANGLE.items() if name not in ("tension", "demand_level")}
    inputs |= {"P_D": "2 kip", "P_W": "30 kip", "P_W_opposite": "-30 kip", "gusset_support": "single brace", "gusset_length": "6 in",
               "bolt": "3/4", "pitch": "3 in", "gage_from_back": "2-1/2 in", "plate_thickness": "1/2 in"}
    with pytest.raises(InputError, match="compression"):
        search(inputs, {"rows": [2, 3]})


def test_one_bolt_in_line_is_no_layout_of_a_partly_connected_member():
    """Table D3.1 gives no U without a length, so the search finds none either, however small the load."""
    small = ANGLE | {"tension": "1 kip", "bolt": "3/4", "gage_from_back": "2-1/2 in", "plate_thickness": "1/2 in", "pitch": "3 in"}

    assert search(small, {"rows": [1]}).feasible == 0
    assert search(small, {"rows": [2]}).feasible == 1
