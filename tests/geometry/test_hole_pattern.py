"""Patterns against positions and distances worked out by hand."""

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st
from shapely import LineString, Point

from gageline.errors import InputError
from gageline.geometry import (
    End,
    Hole,
    centred_edge,
    closest_pair,
    connection_length,
    grid,
    lines_of,
    mirrored,
    outside,
    overlapping,
    punched,
    rows_per_line,
    tightest_pair,
)


def round_holes(centres, d=1.0):
    return punched(centres, d, d, 0.5)


def outline(hole):
    """A round hole or slot drawn the other way: a line through its centre, widened."""
    half_x, half_y = max(hole.along - hole.across, 0) / 2, max(hole.across - hole.along, 0) / 2
    core = LineString([(hole.x - half_x, hole.y - half_y), (hole.x + half_x, hole.y + half_y)])
    return (core if core.length else Point(hole.x, hole.y)).buffer(min(hole.across, hole.along) / 2, quad_segs=256)


class TestGrid:
    def test_plain(self):
        """Lines are listed from the lowest, each from x = 0."""
        assert grid(2, 2, 3.0, 4.0, edge=1.5) == [(0.0, 1.5), (3.0, 1.5), (0.0, 5.5), (3.0, 5.5)]

    def test_gages_and_stagger(self):
        """Every second line is shifted, unequal gages add up."""
        assert grid(3, 1, 3.0, [2.0, 5.0], stagger=1.5) == [(0.0, 0.0), (1.5, 2.0), (0.0, 7.0)]

    def test_negative_stagger_starts_at_zero(self):
        assert grid(2, 1, 3.0, 4.0, stagger=-1.5) == [(1.5, 0.0), (0.0, 4.0)]

    def test_one_line_has_no_stagger(self):
        assert grid(1, 2, 3.0, stagger=-1.5) == [(0.0, 0.0), (3.0, 0.0)]

    def test_sweep_of_pitches(self):
        assert grid(1, 3, np.array([2.0, 3.0]))[2][0].tolist() == [4.0, 6.0]

    @pytest.mark.parametrize("wrong", [
        (0, 3, 3.0), (1, 0, 3.0), (1, 2, 0.0), (1, 2, -3.0), (1, 2, float("nan")), (2, 2, 3.0, 0.0), (3, 2, 3.0, [3.0]),
    ])
    def test_refused(self, wrong):
        with pytest.raises(InputError):
            grid(*wrong)

    def test_centred(self):
        assert centred_edge(14.0, 4, [3.0, 4.0, 3.0]) == 2.0
        assert centred_edge(7.0, 2, 4.0) == 1.5
        assert centred_edge(3.0, 1) == 1.5


class TestLines:
    def test_sorted_by_height_then_along(self):
        holes = round_holes([(3, 5), (0, 1), (1.5, 5), (3, 1)])

        assert lines_of(holes) == ((1, 3), (2, 0))

    def test_rounding_of_millimetres_keeps_a_line_together(self):
        holes = round_holes([(0, 76.2 / 25.4), (3, 3.0000000001)])

        assert lines_of(holes) == ((0, 1),)

    def test_open_holes_are_no_rows(self):
        holes = [*round_holes(grid(2, 3, 3.0, 4.0)), Hole(1.5, 2.0, 1, 1, 0.5, bolted=False)]

        assert rows_per_line(holes) == (3, 3)

    def test_length_is_out_to_out(self):
        """Two rows of three at 3 in., staggered by 1-1/2: 6 + 1-1/2."""
        assert connection_length(round_holes(grid(2, 3, 3.0, 3.0, stagger=1.5))) == 7.5
        assert connection_length(round_holes([(2, 2)])) == 0.0


class TestDistances:
    def test_closest_pair(self):
        holes = round_holes([(0, 0), (3, 0), (0, 2.5)])

        assert closest_pair(holes) == (0, 2, 2.5, 1.5)

    def test_slots_end_to_end(self):
        """LSL for 3/4 bolts, 1-7/8 long, 3 in. apart along their length: 3 - 1.875 clear."""
        holes = punched([(0, 0), (3, 0)], 0.8125, 1.875, 0.5)

        assert tightest_pair(holes).clear == pytest.approx(1.125)

    def test_overlap(self):
        assert overlapping(round_holes([(0, 0), (3, 0), (3.6, 0.7)]))[:2] == (1, 2)
        assert overlapping(round_holes([(0, 0), (1.0, 0)])), "holes that touch leave no steel between them"
        assert overlapping(round_holes([(0, 0), (1.01, 0)])) is None
        assert overlapping(round_holes([(0, 0)])) is None

    @settings(max_examples=200, deadline=None)
    @given(*[st.tuples(st.floats(0, 4), st.floats(0, 4), st.floats(0.5, 1.5), st.floats(0.5, 1.5))] * 2)
    def test_clear_distance_against_shapely(self, a, b):
        """Independent: the outlines drawn by shapely touch or stand apart by the same distance."""
        holes = [Hole(*values, 0.5) for values in (a, b)]
        apart = outline(holes[0]).distance(outline(holes[1]))

        assert max(tightest_pair(holes).clear, 0.0) == pytest.approx(apart, abs=1e-4)


class TestOutside:
    def test_side_edges(self):
        holes = round_holes([(0, 0.5), (0, 0.4), (0, 5.5), (0, 5.6)])

        assert outside(holes, 6.0) == (1, 3)

    def test_square_ends(self):
        holes = round_holes([(0.4, 3), (0.5, 3), (9.5, 3), (9.6, 3)])

        assert outside(holes, 6.0, end=(10.0, 0.0), start=(0.0, 0.0)) == (0, 3)

    @pytest.mark.parametrize("end", [(0.8, 1.0), (6.8, -1.0)])
    def test_end_of_a_transverse_slot_is_cut(self, end):
        """At 45 degrees the edge passes 0.57 from the slot's centre but 0.04 from the centre of one round end."""
        assert outside([Hole(3.0, 3.0, 2.0, 0.5, 0.5)], 6.0, end=end) == (0,)

    @settings(max_examples=150, deadline=None)
    @given(st.floats(2, 5), st.floats(-1.5, 1.5), st.floats(0.5, 2), st.floats(0.5, 2), st.booleans())
    def test_skewed_end_against_shapely(self, x0, slope, across, along, turned):
        """Independent: shapely's outline of the hole crosses the edge line, or not."""
        hole = Hole(3.0, 3.0, across, along, 0.5)
        ends = {"start": End(-x0, -slope)} if turned else {"end": End(x0, slope)}
        edge = LineString([(x0 - 50 * slope, -50), (x0 + 50 * slope, 50)])
        room = outline(hole).distance(edge) if x0 + 3 * slope > 3 else -1.0
        if abs(room) < 1e-3:
            return

        assert bool(outside(mirrored([hole]) if turned else [hole], 6.0, **ends)) == (room <= 0)
