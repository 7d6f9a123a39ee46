"""Blocks against published areas, against an enumeration by groups of lines, and against areas cut by shapely."""

import time

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st
from shapely import LineString, Polygon, box, unary_union

from gageline.errors import InputError
from gageline.geometry import Attachment, End, Hole, Part, grid, mirrored, punched, tear_out_blocks

ALLOWANCE = 1 / 16


def plate(width, t, end, **names):
    return Part(width, t, (), End(end), **names)


def named(blocks, label):
    (block,) = [block for block in blocks if block.label == label]
    return block


def strength(block, pieces=1, F_y=50.0, F_u=65.0):
    """AISC 360-22 Eq. J4-5 with U_bs = 1, kips, as typed here for these tests."""
    tension = F_u * block.A_nt
    return pieces * (min(0.6 * F_u * block.A_nv, 0.6 * F_y * block.A_gv) + tension)


def by_groups(lines, width, t, end, dn):
    """(A_gv, A_nv, A_gt, A_nt) of every block of a plain plate: the lines split into neighbouring groups, each torn.

    A group is bounded on each side by a shear plane, the outer groups also by the edge; lines are (y, lead, number).
    """
    count = len(lines)
    found = []

    def piece(a, b, low, high):
        gv = nv = 0.0
        for line, cut in ((lines[a], low), (lines[b], high)):
            if cut == "line":
                length = end - line[1]
                gv, nv = gv + length * t, nv + (length - (line[2] - 0.5) * dn) * t
        tension = (width if high == "edge" else lines[b][0]) - (0.0 if low == "edge" else lines[a][0])
        holes = (b - a + 1) - 0.5 * (low == "line") - 0.5 * (high == "line")
        return np.array([gv, nv, tension * t, (tension - holes * dn) * t])

    def split(a, areas, net_section):
        if a == count:
            if not net_section:
                found.append(tuple(np.round(areas, 9)))
            return
        for b in range(a, count):
            for low in ("line", "edge") if a == 0 else ("line",):
                for high in ("line", "edge") if b == count - 1 else ("line",):
                    if a == b and low == high == "line":
                        continue
                    whole = a == 0 and b == count - 1 and low == high == "edge"
                    split(b + 1, areas + piece(a, b, low, high), whole)

    split(0, np.zeros(4), False)
    return sorted(found)


@st.composite
def patterns(draw, straight=False):
    """A plain plate of 1 to 5 lines with 1 to 4 bolts each, standard holes for 3/4 or 7/8 bolts."""
    number = draw(st.integers(1, 5))
    gages = [draw(st.sampled_from([2.5, 3.0, 3.5, 5.5])) for _ in range(number)]
    d_h = draw(st.sampled_from([0.8125, 0.9375]))
    lines, y = [], 0.0
    for gage in gages:
        y += gage
        lead = 0.0 if straight else draw(st.sampled_from([0.0, 1.5, 2.25]))
        lines.append((y, lead, draw(st.integers(1, 4))))
    holes = [Hole(lead + 3.0 * k, y, d_h, d_h, 0.5) for y, lead, rows in lines for k in range(rows)]
    return lines, draw(st.permutations(holes)), y + draw(st.sampled_from([1.25, 2.0])), d_h + ALLOWANCE


class TestEveryBlock:
    @settings(max_examples=150, deadline=None)
    @given(patterns())
    def test_against_groups(self, pattern):
        """Independent: the same areas from another way of listing them, and no block twice."""
        lines, holes, width, dn = pattern
        blocks = tear_out_blocks(holes, plate(width, 0.5, 14.0), ALLOWANCE)
        areas = sorted(tuple(np.round([b.A_gv, b.A_nv, b.A_gt, b.A_nt], 9)) for b in blocks)

        assert areas == [pytest.approx(row) for row in by_groups(lines, width, 0.5, 14.0, dn)]
        assert len({b.label for b in blocks}) == len({(b.shear, b.tension) for b in blocks}) == len(blocks)

    @settings(max_examples=60, deadline=None)
    @given(patterns(straight=True))
    def test_outlines_against_shapely(self, pattern):
        """Independent: shapely cuts the outlines out of the plate and takes the enlarged holes off the cut."""
        _, holes, width, dn = pattern
        sheet = box(-40.0, 0.0, 14.0, width)
        punches = unary_union([box(h.x - dn / 2, h.y - dn / 2, h.x + dn / 2, h.y + dn / 2) for h in holes])
        for block in tear_out_blocks(holes, plate(width, 0.5, 14.0), ALLOWANCE):
            torn = unary_union([Polygon(corners) for corners in block.outline])
            cut = torn.boundary.difference(sheet.boundary)

            assert np.multiply(lengths(cut), 0.5) == pytest.approx([block.A_gv, block.A_gt])
            assert np.multiply(lengths(cut.difference(punches)), 0.5) == pytest.approx([block.A_nv, block.A_nt])
            assert all(torn.buffer(1e-9).covers(LineString([(h.x, h.y), (h.x + 0.01, h.y)])) for h in holes)

    @settings(max_examples=60, deadline=None)
    @given(patterns(), st.floats(-0.5, 0.5))
    def test_skewed_end_against_shapely(self, pattern, slope):
        """Independent: staggered leads and a skewed end, gross areas from shapely's cut."""
        _, holes, width, _ = pattern
        end = End(20.0, slope)
        sheet = Polygon([(-40, 0), (end.at(0), 0), (end.at(width), width), (-40, width)])
        for block in tear_out_blocks(holes, Part(width, 0.5, (), end), ALLOWANCE):
            torn = unary_union([Polygon(corners) for corners in block.outline])
            across, along = 0.0, 0.0
            for part in parts_of(torn.boundary.difference(sheet.boundary.buffer(1e-9))):
                for (xa, ya), (xb, yb) in zip(part.coords, part.coords[1:]):
                    across, along = across + abs(yb - ya), along + (abs(xb - xa) if abs(yb - ya) < 1e-7 else 0.0)

            assert [along * 0.5, across * 0.5] == pytest.approx([block.A_gv, block.A_gt], abs=1e-6)


def parts_of(shape):
    return getattr(shape, "geoms", [shape])


def lengths(cut):
    """Lengths of the cut along the force and across it."""
    along = across = 0.0
    for part in parts_of(cut):
        for (xa, ya), (xb, yb) in zip(part.coords, part.coords[1:]):
            along, across = along + abs(xb - xa), across + abs(yb - ya)
    return along, across


def wt8x25():
    """check-values M-11: AISC teaching aid, WT8x25 bolted by its flange, six 1-in. bolts, end 2, gage 3-1/2."""
    holes = punched(grid(2, 3, 3.0, 3.5, edge=(7.07 - 3.5) / 2), 1.125, 1.125, 0.630)
    stem = Attachment(7.07 / 2, 7.37 - 7.07 * 0.630, 0.380, "stem", (8.13 - 1.03) * 0.380)
    return tear_out_blocks(holes, Part(7.07, 0.630, (stem,), (8.0, 0.0), "flange"), ALLOWANCE)


class TestPublished:
    def test_m_11_stem_shear(self):
        block = named(wt8x25(), "flange torn off the stem")

        assert (block.A_gv, block.A_nt) == (pytest.approx(3.04, abs=0.005), pytest.approx(3.18, abs=0.005))
        assert strength(block) == pytest.approx(298, abs=0.5)

    def test_m_11_flange_tips(self):
        block = named(wt8x25(), "both edge strips")

        assert block.A_gv == pytest.approx(10.1, abs=0.05)
        assert (block.A_nv, block.A_nt) == (pytest.approx(6.34, abs=0.005), pytest.approx(1.50, abs=0.005))
        assert strength(block) == pytest.approx(345, abs=0.5)

    def test_m_11_between_the_lines(self):
        block = named(wt8x25(), "between the two gage lines, with the stem")

        assert block.A_nt == pytest.approx(4.37, abs=0.005)
        assert strength(block) == pytest.approx(531, abs=0.55)

    def test_m_11_governs(self):
        assert 0.75 * min(strength(block) for block in wt8x25()) == pytest.approx(223, abs=0.5)

    @pytest.mark.parametrize(("key", "layout", "width", "t", "end", "d_h", "label", "pieces", "published"), [
        # check-values section 3, AISC Design Examples v16.0: II.A-1A; II.A-19B (pulled along its rows of two); II.B-1;
        # II.C-3; Design Guide 29, example 5.1 (each side). Tolerance 0.6 %, the rounding of their intermediate lines.
        ("K-01", (1, 8, 3.0, (), 2.125), 3.5, 0.3125, 22.25, 0.8125, "strip from the gage line to the upper edge", 2,
         420),
        ("K-06 L", (5, 2, 3.0, 3.0, 1.5), 15.0, 0.75, 5.0, 1.125, "strip from line 1 to the upper edge", 1, 492),
        ("K-06 U", (5, 2, 3.0, 3.0, 1.5), 15.0, 0.75, 5.0, 1.125, "between the outer lines", 1, 542),
        ("K-07 strips", (2, 4, 3.0, 4.0, 1.5), 7.0, 0.75, 10.5, 0.9375, "both edge strips", 1, 508),
        ("K-07 line", (2, 4, 3.0, 4.0, 1.5), 7.0, 0.75, 10.5, 0.9375, "strip from line 2 to the lower edge", 1, 400),
        ("K-10", (2, 5, 3.0, 5.5, 2.0), 9.5, 0.375, 14.0, 1.125, "between the two gage lines", 2, 717),
        ("K-17", (1, 7, 3.0, (), 2.25), 9.0, 0.625, 19.75, 0.9375, "strip from the gage line to the lower edge", 1,
         392),
    ])
    def test_plates_and_legs(self, key, layout, width, t, end, d_h, label, pieces, published):
        lines, rows, pitch, gage, edge = layout
        holes = punched(grid(lines, rows, pitch, gage, edge=edge), d_h, d_h, t)
        block = named(tear_out_blocks(holes, plate(width, t, end), ALLOWANCE), label)

        assert strength(block, pieces) == pytest.approx(published, rel=0.006)

    def test_k_01_and_k_10_areas(self):
        """Printed: K-01 13.9, 9.80, 0.586 of two angles; K-10 21.0, 13.0, 3.23 of two gussets."""
        leg = tear_out_blocks(punched(grid(1, 8, 3.0, edge=2.125), 0.8125, 0.8125, 0.3125),
                              plate(3.5, 0.3125, 22.25, edge_names=("heel", "toe")), ALLOWANCE)
        gusset = tear_out_blocks(punched(grid(2, 5, 3.0, 5.5, edge=2.0), 1.125, 1.125, 0.375),
                                 plate(9.5, 0.375, 14.0), ALLOWANCE)
        a, b = named(leg, "strip from the gage line to the toe"), named(gusset, "between the two gage lines")

        assert [2 * a.A_gv, 2 * a.A_nv, 2 * a.A_nt] == pytest.approx([13.9, 9.80, 0.586], rel=0.0006)
        assert 2 * b.A_gv == 21.0
        assert [2 * b.A_nv, 2 * b.A_nt] == [pytest.approx(13.0, abs=0.05), pytest.approx(3.23, abs=0.005)]

    def test_k_08_w_flange(self):
        """Design Examples v16.0, II.B-1: W18x50 flange, strips outside both lines: 294 of phi R_n."""
        web = Attachment(3.75, 14.7 - 7.5 * 0.57, 0.355, "web")
        holes = punched(grid(2, 4, 3.0, 4.0, edge=1.75), 0.9375, 0.9375, 0.570)
        block = named(tear_out_blocks(holes, Part(7.5, 0.57, (web,), (10.25, 0.0), "flange"), ALLOWANCE),
                      "both edge strips")

        assert 0.75 * strength(block) == pytest.approx(294, rel=0.006)

    def test_k_18_angle_leg(self):
        """Steel Design (memory): L3-1/2x3-1/2x3/8 A36: 2.813, 1.875, 0.375, min(87.00, 82.51)."""
        holes = punched(grid(1, 3, 3.0, edge=2.0), 0.9375, 0.9375, 0.375)
        leg = Part(3.5, 0.375, (Attachment(0.0, 2.50 - 3.5 * 0.375, 0.375, "outstanding leg"),), (7.5, 0.0), "leg",
                   ("heel", "toe"))
        block = named(tear_out_blocks(holes, leg, ALLOWANCE), "strip from the gage line to the toe")

        assert [block.A_gv, block.A_nv, block.A_nt] == pytest.approx([2.8125, 1.875, 0.375])
        assert strength(block, F_y=36.0, F_u=58.0) == pytest.approx(82.51, abs=0.02)  # printed from the rounded 2.813
        assert 0.6 * 58 * block.A_nv + 58 * block.A_nt == pytest.approx(87.00, abs=0.005)

    @pytest.mark.parametrize(("rows", "end", "gross", "net"), [(3, 1.5, 169, 146), (4, 1.25, 231, 197),
                                                               (4, 1.5, 236, 205)])
    def test_manual_table_9_3(self, rows, end, gross, net):
        """Manual Tables 9-3b and 9-3c as used in Design Examples v16.0, II.B-1: kip/in., LRFD, 7/8 bolts."""
        holes = punched(grid(1, rows, 3.0, edge=2.0), 0.9375, 0.9375, 1.0)
        (plane,) = tear_out_blocks(holes, plate(4.0, 1.0, (rows - 1) * 3.0 + end), ALLOWANCE)[0].shear

        assert 0.75 * 0.6 * 50 * plane.gross == pytest.approx(gross, abs=0.51)
        assert 0.75 * 0.6 * 65 * plane.net == pytest.approx(net, abs=0.51)


class TestRules:
    def test_single_line_has_no_block_of_its_own_line(self):
        labels = [b.label for b in tear_out_blocks(punched(grid(1, 3, 3.0, edge=2.0), 1, 1, 0.5),
                                                   plate(4.0, 0.5, 8.0), ALLOWANCE)]

        assert labels == ["strip from the gage line to the lower edge", "strip from the gage line to the upper edge"]

    def test_web_between_flanges(self):
        """One line in a web: each strip with its flange or off it, and the web off one flange or off both."""
        flanges = (Attachment(0.0, 4.0, 0.3, "lower flange"), Attachment(12.0, 4.0, 0.3, "upper flange"))
        blocks = tear_out_blocks(punched(grid(1, 3, 3.0, edge=6.0), 1, 1, 0.3),
                                 Part(12.0, 0.3, flanges, (8.0, 0.0), "web"), 0.0)

        assert sorted(b.label for b in blocks) == sorted([
            "strip from the gage line to the lower edge, with the lower flange",
            "strip from the gage line to the lower edge, torn off the lower flange",
            "strip from the gage line to the upper edge, with the upper flange",
            "strip from the gage line to the upper edge, torn off the upper flange",
            "web torn off the lower flange and the upper flange",
            "web torn off the lower flange, with the upper flange",
            "web torn off the upper flange, with the lower flange",
        ])
        off = named(blocks, "web torn off the lower flange and the upper flange")
        assert (off.A_gv, off.A_nv, off.A_nt) == pytest.approx((2 * 8 * 0.3, 2 * 8 * 0.3, (12 - 1) * 0.3))

    def test_slots(self):
        """Long slots along the force: their length off the shear plane, their width off the tension plane."""
        holes = punched(grid(2, 2, 4.0, 3.0, edge=2.0), 0.8125, 1.875, 0.5)
        block = named(tear_out_blocks(holes, plate(7.0, 0.5, 6.0), ALLOWANCE), "between the two gage lines")

        assert block.A_nv == pytest.approx(2 * (6 - 1.5 * 1.9375) * 0.5)
        assert block.A_nt == pytest.approx((3 - 0.875) * 0.5)

    def test_open_holes(self):
        """One in the line behind the lead bolt, one alone between the lines, one ahead of the lead bolt: all but the
        last weaken the block.
        """
        bolts = punched(grid(2, 2, 4.0, 6.0, edge=2.0), 1.0, 1.0, 0.5)
        open_holes = punched([(2.0, 2.0), (0.0, 5.0), (-2.0, 8.0)], 1.0, 1.0, 0.5, bolted=False)
        block = named(tear_out_blocks(bolts + open_holes, plate(10.0, 0.5, 6.0), 0.0), "between the two gage lines")

        assert block.A_nv == pytest.approx(((6 - 2.5) + (6 - 1.5)) * 0.5)
        assert block.A_nt == pytest.approx((6 - 1 - 1) * 0.5)
        assert [plane.n_holes for plane in block.shear] == [2.5, 1.5]

    def test_stem_of_a_staggered_tee_shears_from_where_the_tear_crosses_it(self):
        holes = punched([(0.0, 1.0), (2.0, 5.0)], 1.0, 1.0, 0.5)
        part = Part(6.0, 0.5, (Attachment(3.0, 2.0, 0.25, "stem"),), (8.0, 0.0), "flange")

        assert named(tear_out_blocks(holes, part, 0.0), "flange torn off the stem").A_gv == pytest.approx(7.0 * 0.25)

    def test_stem_of_a_skewed_end(self):
        """The end lies at 8 on the lower edge and recedes by 1/2 an inch: at the stem, 3 in. up, 6-1/2 are left."""
        holes = punched([(0.0, 1.0), (0.0, 5.0)], 1.0, 1.0, 0.5)
        part = Part(6.0, 0.5, (Attachment(3.0, 2.0, 0.25, "stem"),), (8.0, -0.5), "flange")

        assert named(tear_out_blocks(holes, part, 0.0), "flange torn off the stem").A_gv == pytest.approx(6.5 * 0.25)

    def test_mirrored_plate(self):
        """A plate with its free edge at smaller x, 2 in. ahead of the first row, tears back to it."""
        holes = mirrored(punched(grid(2, 3, 3.0, 3.0, edge=1.5), 1.0, 1.0, 0.5))
        block = named(tear_out_blocks(holes, Part(6.0, 0.5, (), End(-2.0).mirrored()), 0.0),
                      "between the two gage lines")

        assert block.A_gv == pytest.approx(2 * 8 * 0.5)

    def test_many_lines_are_counted_not_numbered(self):
        blocks = tear_out_blocks(punched(grid(8, 1, 3.0, 3.0, edge=1.5), 1.0, 1.0, 0.5), plate(24.0, 0.5, 2.0), 0.0)

        assert not any("line 1" in b.label or "lines 1" in b.label for b in blocks)

    def test_no_more_than_ten_lines(self):
        holes = punched(grid(11, 1, 3.0, 3.0, edge=1.5), 1.0, 1.0, 0.5)

        with pytest.raises(InputError, match="at most 10 gage lines, got 11"):
            tear_out_blocks(holes, plate(33.0, 0.5, 2.0), 0.0)

    def test_no_bolts(self):
        assert tear_out_blocks([], plate(6.0, 0.5, 2.0), 0.0) == ()

    def test_speed(self):
        """Two lines of six rows take under 1 ms (best of twenty, as other work runs beside)."""
        holes, part = punched(grid(2, 6, 3.0, 3.0, edge=1.5), 1.0, 1.0, 0.5), plate(6.0, 0.5, 17.0)
        seconds = []
        for _ in range(20):
            start = time.perf_counter()
            for block in tear_out_blocks(holes, part, ALLOWANCE):
                assert block.A_nv < block.A_gv
            seconds.append(time.perf_counter() - start)

        assert min(seconds) < 1e-3


class TestSweep:
    def test_arrays_give_every_layout(self):
        """Pitch, stagger, gage, width and end as arrays: each entry is the block of that layout, in plain floats."""
        pitch, stagger, gage = np.array([2.5, 3.0, 4.0]), np.array([-1.0, 0.0, 1.5]), np.array([3.0, 3.5, 5.0])
        stem = {"area": 2.0, "t_junction": 0.4, "name": "stem", "area_cut": 1.8}

        def blocks_of(p, s, g):
            holes = [Hole(s * (line % 2) + p * row, 1.5 + line * g, 0.9, 1.1, 0.5)
                     for line in range(3) for row in range(3)]
            part = Part(3.0 + 2 * g, 0.5, (Attachment(1.5 + 1.5 * g, **stem),), End(2 * p + 3.5, 0.25), "flange")
            return tear_out_blocks(holes, part, ALLOWANCE)

        sweep = blocks_of(pitch, stagger, gage)
        for i in range(3):
            single = blocks_of(float(pitch[i]), float(stagger[i]), float(gage[i]))
            assert [b.label for b in single] == [b.label for b in sweep]
            for one, every in zip(single, sweep):
                for area in ("A_gv", "A_nv", "A_gt", "A_nt"):
                    assert type(getattr(one, area)) is float
                    assert getattr(every, area)[i] == pytest.approx(getattr(one, area))
