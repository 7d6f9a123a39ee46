"""Spread widths against published ones and against construction by shapely."""

import numpy as np
import pytest
from shapely import LineString, Point
from shapely.affinity import rotate

from gageline.geometry import Hole, grid, punched, spread_width
from gageline.geometry.whitmore import whitmore

WIDE = (-100.0, 100.0)


def pattern(lines=2, rows=4, pitch=3.0, gage=3.0, stagger=0.0, edge=5.0):
    return punched(grid(lines, rows, pitch, gage, stagger, edge), 0.9375, 0.9375, 0.5)


class TestPublished:
    @pytest.mark.parametrize(("l", "g", "printed", "within"), [
        # check-values P-01 step 6: Design Examples v16.0 II.D-1, welds 4 long and 3 apart; G-07: II.C-3.
        (4.0, 3.0, 7.62, 0.005), (12.0, 5.5, 19.4, 0.05),
    ])
    def test_width(self, l, g, printed, within):
        assert spread_width(l, g) == pytest.approx(printed, abs=within)

    def test_g_07_from_bolts(self):
        """Design Examples v16.0, II.C-3: two lines of five at 3, gage 5-1/2: 19.4."""
        assert whitmore(pattern(2, 5, 3.0, 5.5), WIDE).L_w == pytest.approx(19.4, abs=0.05)


class TestWhitmore:
    def test_against_shapely(self):
        """Independent: rays turned by 30 degrees from the first bolts meet the section at the last row."""
        found = whitmore(pattern(), WIDE)
        section = LineString([(9.0, -100), (9.0, 100)])
        rays = [rotate(LineString([(0, y), (50, y)]), turn, origin=(0, y)) for y, turn in ((5, -30), (8, 30))]
        ends = [ray.intersection(section).y for ray in rays]

        assert (found.y_lo, found.y_hi) == pytest.approx(ends)
        assert found.L_w == pytest.approx(ends[1] - ends[0])
        assert (found.l, found.g, found.x_row) == (9.0, 3.0, 9.0)
        assert all(ray.distance(Point(p)) < 1e-9 for ray, line in zip(rays, found.lines) for p in line)

    def test_row_behind_which_the_plate_is_supported(self):
        """The section lies at the largest x, towards the support, whatever the order of the holes."""
        found = whitmore(pattern()[::-1], WIDE)

        assert found.x_row == 9.0
        assert sorted(found.holes_in_row) == [0, 4]

    def test_cut_at_one_edge(self):
        """Lower line 2 in. from the edge, spread 5.196: 3.196 is lost on that side alone."""
        found = whitmore(pattern(edge=2.0), 30.0)

        assert found.cut_lo == pytest.approx(9 * 3**-0.5 - 2.0)
        assert found.cut_hi == 0.0
        assert found.L_w == pytest.approx(2.0 + 3.0 + 9 * 3**-0.5)

    def test_never_wider_than_the_plate(self):
        assert whitmore(pattern(edge=1.5), 6.0).L_w == pytest.approx(6.0)

    def test_single_line(self):
        found = whitmore(pattern(lines=1), WIDE)

        assert found.g == 0.0
        assert found.L_w == pytest.approx(2 * 9 * 3**-0.5)

    def test_forty_five_degrees(self):
        assert whitmore(pattern(), WIDE, 45.0).L_w == pytest.approx(2 * 9 + 3)

    def test_staggered_lines_spread_each_from_its_first_bolt(self):
        """Upper line 1-1/2 behind: the section lies at 10-1/2, the lower line spreads 10-1/2, the upper 9."""
        found = whitmore(pattern(stagger=1.5), WIDE)

        assert found.L_w == pytest.approx(3.0 + (10.5 + 9.0) * 3**-0.5)
        assert found.L_w == pytest.approx(spread_width(found.l, found.g))
        assert found.holes_in_row == (7,)

    def test_open_hole_brings_no_spread_but_is_cut(self):
        holes = [*pattern(), Hole(9.2, 4.0, 0.9375, 0.9375, 0.5, bolted=False)]
        found = whitmore(holes, WIDE)

        assert found.L_w == whitmore(pattern(), WIDE).L_w
        assert found.holes_in_row == (3, 7, 8)

    def test_sweep(self):
        pitch = np.array([2.5, 3.0, 12.0])
        found = whitmore(pattern(pitch=pitch), 13.0)

        for i, p in enumerate(pitch):
            assert found.L_w[i] == pytest.approx(whitmore(pattern(pitch=float(p)), 13.0).L_w)
        assert found.L_w[2] == pytest.approx(13.0)
