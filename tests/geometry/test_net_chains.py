"""Chains against published net widths and against every chain there is, listed one by one."""

import time
from itertools import combinations

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from gageline.geometry import (
    Hole,
    chain_through,
    critical_chains,
    grid,
    polyline,
    punched,
    unfolded_gage,
)

M_09 = punched([(0, 2), (2.5, 5), (2.5, 9), (0, 12)], 0.8125, 0.8125, 0.5)


def every_chain(holes, A_g, allowance):
    """(net area / share, holes) of every chain by enumeration: all sets of holes at different heights."""
    bolts = sum(hole.bolted for hole in holes)
    found = []
    for number in range(1, len(holes) + 1):
        for picks in combinations(range(len(holes)), number):
            line = sorted((holes[i].y, holes[i].x, holes[i].t) for i in picks)
            ys, xs, ts = zip(*line)
            if len(set(ys)) < number:
                continue
            at = np.interp([hole.y for hole in holes], ys, xs)
            off = [i for i in range(len(holes)) if i not in picks]
            if any(abs(holes[i].x - at[i]) < 1e-6 and holes[i].y not in ys for i in off):
                continue
            ahead = sum(holes[i].bolted and holes[i].x < at[i] - 1e-6 for i in off)
            share = 1 - ahead / bolts if bolts else 1.0
            net = A_g - sum(holes[i].t * (holes[i].across + allowance) for i in picks)
            for k in range(number - 1):
                net += (xs[k + 1] - xs[k]) ** 2 / 4 / (ys[k + 1] - ys[k]) * min(ts[k], ts[k + 1])
            if share > 1e-12:
                found.append((net / share, picks))
    return sorted(found)


hole = st.builds(
    Hole, x=st.integers(0, 12).map(lambda i: i / 2), y=st.integers(1, 8).map(float),
    across=st.sampled_from([0.8125, 1.0, 1.125]), along=st.just(1.0), t=st.sampled_from([0.25, 0.5]),
    bolted=st.sampled_from([True, True, True, False]),
)


class TestEveryChain:
    @settings(max_examples=150, deadline=None)
    @given(st.lists(hole, min_size=1, max_size=9, unique_by=lambda h: (h.x, h.y)), st.integers(1, 7))
    def test_against_enumeration(self, holes, most):
        """Independent: the most critical chains are exactly those of the full list."""
        expected = every_chain(holes, 20.0, 1 / 16)
        chains = critical_chains(holes, 20.0, 1 / 16, most)
        of = {frozenset(picks): value for value, picks in expected}

        assert [c.net_area(20.0) / c.share for c in chains] == pytest.approx([v for v, _ in expected[:most]])
        for chain in chains:
            assert chain.net_area(20.0) / chain.share == pytest.approx(of[frozenset(chain.holes)])
        assert len({chain.holes for chain in chains}) == len(chains)

    def test_six_lines_of_twenty(self):
        """A pattern far beyond enumeration is done in under 0.3 s (here four times that, for a busy machine).

        By hand: from the second holes of lines 1, 3, 5 to the first of lines 2, 4, 6, s = 1/2, three bolts ahead.
        """
        holes = punched(grid(6, 20, 3.0, 3.0, stagger=2.5), 1.0, 1.0, 0.5)
        start = time.perf_counter()
        chains = critical_chains(holes, 9.0, 1 / 16)
        seconds = time.perf_counter() - start

        assert seconds < 1.2
        assert len(chains) == 5
        zigzag = 9.0 - 6 * 1.0625 * 0.5 + 5 * 0.5**2 / (4 * 3) * 0.5
        assert chains[0].holes == (1, 20, 41, 60, 81, 100)
        assert chains[0].net_area(9.0) / chains[0].share == pytest.approx(zigzag / (117 / 120))

    def test_no_holes(self):
        assert critical_chains([], 3.0, 1 / 16) == ()


class TestRules:
    def test_lead_row_carries_all_and_the_next_less(self):
        """Two lines of three rows: at the second row two of six bolts are ahead."""
        holes = punched(grid(2, 3, 3.0, 3.0, edge=1.5), 0.9375, 0.9375, 0.5)
        first, second = chain_through(holes, (0, 3), 1 / 16), chain_through(holes, (1, 4), 1 / 16)

        assert (first.n_ahead, first.share) == (0, 1.0)
        assert (second.n_ahead, second.share) == (2, pytest.approx(4 / 6))
        assert first.net_area(3.0) == pytest.approx(2.0)  # provisions 12.8
        assert critical_chains(holes, 3.0, 1 / 16)[0] == first

    def test_hole_on_the_chain_is_not_ahead(self):
        holes = punched([(0, 1), (1, 2), (2, 3)], 1, 1, 0.5)

        assert chain_through(holes, (0, 2), 0.0).n_ahead == 0

    def test_open_hole_weakens_and_brings_no_load(self):
        """A wider open hole ahead of all bolts takes nothing from the load at the bolts."""
        holes = [Hole(0, 3, 2.0, 2.0, 0.5, bolted=False), *punched([(4, 2), (4, 4)], 1.0, 1.0, 0.5)]
        chain = critical_chains(holes, 3.0, 0.0)[0]

        assert chain.holes == (0,)
        assert chain_through(holes, (1, 2), 0.0).share == 1.0

    def test_open_hole_behind_all_bolts_is_no_chain(self):
        holes = [Hole(9, 3, 5.0, 5.0, 0.5, bolted=False), *punched([(4, 2)], 1.0, 1.0, 0.5)]

        assert [chain.holes for chain in critical_chains(holes, 3.0, 0.0)] == [(1,), (1, 0)]
        assert chain_through(holes, (0,), 0.0).share == 0.0

    def test_of_equal_chains_the_straighter_first(self):
        """The diagonal gives 2²/(4·2) = 1/2, just what its second hole is wider: net 1 like the straight chain."""
        holes = [Hole(0, 1, 1, 1, 1.0), Hole(2, 3, 1.5, 1.5, 1.0), Hole(0, 5, 1, 1, 1.0, bolted=False)]
        chains = critical_chains(holes, 3.0, 0.0)

        assert [chain.holes for chain in chains[:3]] == [(0, 1, 2), (0, 2), (0, 1)]
        assert [chain.net_area(3.0) for chain in chains[:3]] == [0.5, 1.0, 1.0]
        assert [chain.zigzags for chain in chains[:3]] == [2, 0, 1]

    def test_lesser_thickness_on_the_diagonal(self):
        holes = [Hole(0, 1, 1, 1, 0.5), Hole(2, 3, 1, 1, 0.25)]
        chain = chain_through(holes, (0, 1), 0.0)

        assert chain.spaces == ((2, 2, 0.25),)
        assert (chain.removed, chain.added) == (0.75, 0.125)

    def test_sweep(self):
        """Arrays of x give the chain of every layout."""
        stagger = np.array([0.5, 1.5, 2.5])
        sweep = chain_through(punched([(0.0, 1.0), (stagger, 4.0)], 1, 1, 0.5), (0, 1), 0.0)

        for i, s in enumerate(stagger):
            assert sweep.added[i] == chain_through(punched([(0.0, 1.0), (s, 4.0)], 1, 1, 0.5), (0, 1), 0.0).added

    def test_polyline_runs_from_edge_to_edge(self):
        chain = chain_through(M_09, (0, 1), 0.0)

        assert polyline(chain, M_09, 14.0) == ((0, 0.0), (0, 2), (2.5, 5), (2.5, 14.0))


class TestPublished:
    """check-values M-09, M-11, M-15, M-16: source and tolerance named there."""

    @pytest.mark.parametrize(("picks", "width", "exact"), [
        ((0, 3), 12.3, 12.250), ((0, 1, 2, 3), 11.5, 11.5417), ((0, 1, 2), 11.9, 11.8958), ((0, 2, 3), 12.1, 12.1190),
    ])
    def test_m_09_paths(self, picks, width, exact):
        """AISC Design Examples v16.0, D.9: plate 14 x 1/2, net widths of the paths."""
        net = chain_through(M_09, picks, 1 / 16).net_area(7.0) / 0.5

        assert net == pytest.approx(exact, abs=5e-5)
        assert net == pytest.approx(width, abs=0.05 + 1e-9)

    def test_m_09_least(self):
        chain = critical_chains(M_09, 7.0, 1 / 16)[0]

        assert chain.holes == (0, 1, 2, 3)
        assert chain.net_area(7.0) == pytest.approx(5.75, rel=0.004)

    def test_m_11_flange(self):
        """AISC teaching aid, WT8x25 bolted by its flange: A_n = 5.87."""
        holes = punched(grid(2, 3, 3.0, 3.5, edge=1.785), 1.125, 1.125, 0.630)

        assert critical_chains(holes, 7.37, 1 / 16)[0].net_area(7.37) == pytest.approx(5.87, abs=0.005)

    def test_sd_3_6(self):
        """Steel Design, example 3.6 (memory): plate 3/4 x 16, s = 3, g = 5: 13.52 and 10.1."""
        holes = punched([(0, 3), (3, 8), (0, 13)], 1.0625, 1.0625, 0.75)
        straight, zigzag = chain_through(holes, (0, 2), 1 / 16), chain_through(holes, (0, 1, 2), 1 / 16)

        assert straight.net_area(12.0) / 0.75 == pytest.approx(13.75)
        assert zigzag.net_area(12.0) / 0.75 == pytest.approx(13.52, abs=0.0051)
        assert critical_chains(holes, 12.0, 1 / 16)[0] == zigzag
        assert zigzag.net_area(12.0) == pytest.approx(10.1, abs=0.05)

    def test_sd_3_7(self):
        """Steel Design, example 3.7 (memory): L8x6x1/2 unfolded to 13.5: 11.5, 10.73, 10.03."""
        y = np.cumsum([2.5, 2.5, unfolded_gage(3.0, 2.25, 0.5), 3.0])
        holes = punched(list(zip([0, 1.5, 0, 1.5], y)), 0.9375, 0.9375, 0.5)
        widths = [chain_through(holes, picks, 1 / 16).net_area(6.75) / 0.5 for picks in [(0, 2), (0, 1, 3), range(4)]]

        assert widths == pytest.approx([11.5, 10.73, 10.03], abs=0.0051)
        assert critical_chains(holes, 6.75, 1 / 16)[0].net_area(6.75) == pytest.approx(5.015, abs=0.0005)

    @pytest.mark.parametrize(("centres", "width"), [
        ([(0, 60)], 186.0), ([(0, 60), (50, 105)], 175.9), ([(0, 60), (55, 110), (5, 155)], 167.0),
        ([(0, 60), (50, 110)], 174.5), ([(0, 60), (50, 110), (0, 205)], 157.1),
    ])
    def test_t01_millimetres(self, centres, width):
        """A public worked example to CSA S16-14: 210 wide, holes 24 mm, net widths."""
        holes = punched(centres, 24.0, 24.0, 10.0)

        assert chain_through(holes, range(len(holes)), 0.0).net_area(2100.0) / 10.0 == pytest.approx(width, abs=0.0501)
