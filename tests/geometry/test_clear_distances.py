"""Clear and edge distances by hand."""

from math import sqrt

import numpy as np
import pytest

from gageline.geometry import End, Hole, clear_distances, edge_distances, grid, mirrored, punched

P_12_8 = punched(grid(2, 3, 3.0, 3.0, edge=1.5), 0.9375, 0.9375, 0.5)


class TestClearDistances:
    def test_interior_and_edge(self):
        """l_c = s - d_h and L_e - d_h/2 (AISC 360-22 J3.11a): 2-1/16 and 1-1/32 for 7/8 bolts."""
        found = clear_distances(P_12_8, (7.5, 0.0))

        assert [d.kind for d in found] == ["hole", "hole", "edge"] * 2
        assert [d.l_c for d in found] == pytest.approx([2.0625, 2.0625, 1.03125] * 2)

    def test_plate_is_read_mirrored(self):
        """Free edge 1-1/2 ahead of the first row: now the first hole tears to the edge."""
        found = clear_distances(mirrored(P_12_8), End(-1.5).mirrored())

        assert [d.kind for d in found] == ["edge", "hole", "hole"] * 2
        assert found[0].l_c == pytest.approx(1.03125)

    def test_neighbouring_line_does_not_stand_in_the_way(self):
        """Staggered lines: each hole looks along its own line; only a hole less than half its width aside counts."""
        beside = [Hole(0, 2.0, 1, 1, 0.5), Hole(2, 2.5, 1, 1, 0.5)]
        nearly = [Hole(0, 2.0, 1, 1, 0.5), Hole(2, 2.4, 1, 1, 0.5)]

        assert clear_distances(beside, (6.0, 0.0))[0] == (5.5, "edge")
        assert clear_distances(nearly, (6.0, 0.0))[0] == (1.0, "hole")

    def test_nearest_of_several(self):
        holes = punched([(6, 1), (0, 1), (3, 1)], 1.0, 1.0, 0.5)

        assert [d.l_c for d in clear_distances(holes, (8.0, 0.0))] == [1.5, 2.0, 2.0]

    def test_slots_count_with_their_length(self):
        holes = punched([(0, 1), (4, 1)], 0.8125, 1.875, 0.5)

        assert [d.l_c for d in clear_distances(holes, (6.0, 0.0))] == pytest.approx([2.125, 1.0625])

    def test_skewed_end_on_the_line_of_force(self):
        (found,) = clear_distances([Hole(0, 4, 1, 1, 0.5)], (6.0, -0.5))

        assert found == (3.5, "edge")

    def test_sweep(self):
        """Arrays of pitch: the end governs where the pitch is long."""
        pitch = np.array([3.0, 5.0])
        inner, last = clear_distances(punched([(0.0 * pitch, 1.0), (pitch, 1.0)], 1, 1, 0.5), (pitch + 2.0, 0.0))

        assert inner.l_c.tolist() == [2.0, 4.0]
        assert inner.kind.tolist() == ["hole", "hole"]
        assert last.l_c.tolist() == [1.5, 1.5]
        assert last.kind.tolist() == ["edge", "edge"]


class TestEdgeDistances:
    def test_square(self):
        assert edge_distances([Hole(3, 2, 1, 1, 0.5)], 7.0, (5.0, 0.0)) == [(2.0, 2, 5.0)]

    def test_skewed_is_at_right_angles(self):
        """45 degrees: the distance along the force over the root of 2."""
        (found,) = edge_distances([Hole(0, 2, 1, 1, 0.5)], 7.0, (5.0, -1.0))

        assert found.end == pytest.approx(3.0 / sqrt(2.0))
