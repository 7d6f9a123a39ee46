"""Figures: well-formed, reproducible, legible, and drawn from what was computed."""

import logging
import re
import warnings
from dataclasses import replace
from functools import cache
from itertools import pairwise
from xml.etree import ElementTree

import numpy as np
import pytest

from gageline import figures, study
from gageline.connections.bolted import BoltedConnection
from gageline.figures import curve as diagrams
from gageline.figures import scene, section, style
from gageline.figures.elevation import elevation_canvas, ratio, shown_check
from gageline.figures.paths import path_checks, paths_canvas
from gageline.geometry import Block, Chain, Whitmore
from gageline.loads import permissible_line
from gageline.sheet import blocks, guard

SVG = "{http://www.w3.org/2000/svg}"

TEE = {
    "mark": "T1", "member": "WT8x25", "member_grade": "A992", "connected_by": "flange", "plate_thickness": "5/8 in", "plate_width": "14 in",
    "plate_grade": "A572-50", "plate_end": "2 in", "lines": 2, "rows": 4, "pitch": "3 in", "gage": "3.5 in", "member_end": "1.75 in",
    "bolt": "7/8 in", "bolt_grade": "A325", "P_D": "20 kip", "P_L": "60 kip",
}
HOLES = [("0 in", "2 in"), ("3 in", "2 in"), ("1.5 in", "5 in"), ("4.5 in", "5 in"), ("1.5 in", "9 in"), ("4.5 in", "9 in"), ("0 in", "12 in"),
         ("3 in", "12 in")]
LEG = {"member_grade": "A36", "gage_from_back": "2.25 in", "plate_width": "9 in"}
CHANGES = {
    "tee": {},
    "double angle": LEG | {"member": "2L4x4x1/2", "connected_by": "leg", "lines": 1, "rows": 6, "gage": None, "P_W": "70 kip",
                           "P_W_opposite": "-70 kip", "gusset_support": "single brace", "gusset_length": "9 in"},
    "spread angles": LEG | {"member": "2L4x4x1/2", "connected_by": "leg", "lines": 1, "gage": None, "gap": "1 in"},
    "staggered flat": {"member": "PL 1/2 x 14", "member_grade": "A36", "connected_by": None, "lines": None, "rows": None, "pitch": None,
                       "gage": None, "holes": HOLES},
    "both flanges": {"member": "W12x40", "connected_by": "both flanges", "rows": 3, "gage": "5.5 in", "plate_width": "10 in"},
    "channel": {"member": "C10x20", "member_grade": "A36", "connected_by": "web", "rows": 3, "gage": "4 in", "plates": 2, "plate_width": "8 in",
                "plate_thickness": "3/8 in"},
    "wide flange web": {"member": "W14x61", "connected_by": "web", "lines": 3, "rows": 3, "gage": "3 in", "plate_width": "9 in"},
    "staggered leg": LEG | {"member": "L6x4x1/2", "connected_by": "long leg", "rows": 3, "stagger": "1.5 in", "gage": "2.5 in"},
    "open holes": LEG | {"member": "L6x4x1/2", "connected_by": "long leg", "rows": 3, "gage": "2.5 in",
                         "other_leg_holes": [("0 in", "2.5 in")]},
    "skewed": {"plate_edge_angle": "60 deg"},
    "wide gusset": LEG | {"member": "L4x4x1/2", "connected_by": "leg", "lines": 1, "rows": 3, "gage": None, "plate_width": "40 in"},
    "ten rows": {"rows": 10, "plate_width": "12 in"},
    "slots": {"member": "PL 1/2 x 9", "member_grade": "A36", "connected_by": None, "rows": 2, "gage": "5 in", "installation": "slip-critical",
              "slip_class": "A", "member_holes": "SSL along", "plate_holes": "OVS", "plate_width": "9 in", "P_D": "5 kip", "P_L": "10 kip"},
    "stem": {"member": "WT7x26.5", "connected_by": "stem", "lines": 1, "gage": None, "gage_from_back": "4 in", "plate_width": "5 in"},
}
_MADE = {}


def made(name, **changes):
    """The connection of a case, made once."""
    key = (name, *sorted(changes.items()))
    if key not in _MADE:
        inputs = TEE | CHANGES[name] | changes
        basis = {"method": inputs.pop("method")} if "method" in inputs else {}
        _MADE[key] = BoltedConnection.of(**{k: v for k, v in inputs.items() if v is not None}, **basis)
    return _MADE[key]


class Heard(logging.Handler):
    def __init__(self):
        super().__init__(logging.WARNING)
        self.said = []

    def emit(self, record):
        self.said.append(record.getMessage())


@cache
def drawn(name):
    """Elevation, cross-section and paths of a case, and what was warned of meanwhile."""
    heard = Heard()
    log = logging.getLogger()
    log.addHandler(heard)
    try:
        with warnings.catch_warnings(record=True) as warned:
            warnings.simplefilter("always")
            made_of = tuple(draw(made(name)) for draw in (figures.elevation, figures.cross_section, figures.paths))
    finally:
        log.removeHandler(heard)
    return *made_of, [str(warning.message) for warning in warned] + heard.said


def check_of(connection, id):
    return next(check for check in connection.checks if check.id == id)


def texts(svg):
    return ["".join(node.itertext()).strip() for node in ElementTree.fromstring(svg).iter(f"{SVG}text")]


def ids(svg):
    return [node.get("id") for node in ElementTree.fromstring(svg).iter() if node.get("id")]


def artists(canvas, gid):
    axes = canvas.axes[0]
    return [artist for artist in (*axes.patches, *axes.lines) if artist.get_gid() and re.fullmatch(gid, artist.get_gid())]


def in_house(draw, *arguments):
    with style.house():
        return draw(*arguments)


@cache
def diagrams_of(name):
    connection = made(name)
    found = study.capacity_curve(connection)
    curve = () if isinstance(found, str) else (figures.capacity_curve(connection, found),)
    return *curve, figures.permissible_loads(connection)


def every_figure(name):
    return *drawn(name)[:3], *diagrams_of(name)


class TestEveryFigure:
    @pytest.mark.parametrize("name", ["tee", "staggered flat", "double angle"])
    def test_is_accepted_by_the_sheet_and_says_what_it_shows(self, name):
        for figure in every_figure(name):
            block = blocks.figure(svg=figure.svg, caption=figure.caption, alt=figure.alt, width=figure.width)
            guard.svg(figure.svg, "the figure")

            assert ElementTree.fromstring(block["svg"]).tag == f"{SVG}svg"
            assert figure.caption.endswith(".") and figure.alt.endswith(".")

    def test_is_the_same_to_the_byte_when_drawn_again(self):
        first = [figure.svg for figure in every_figure("tee")]
        again = [figure.svg for figure in (*drawn.__wrapped__("tee")[:3], *diagrams_of.__wrapped__("tee"))]

        assert first == again
        assert "date" not in "".join(first).lower()

    def test_has_no_mathtext_no_outlined_text_and_one_family(self):
        for figure in every_figure("tee"):
            set_in = re.findall(r"font(?:-family)?: ([^;\"]*'[^;\"]*)", figure.svg)

            assert len(set_in) == len(texts(figure.svg)) > 0
            assert all(font.split("'")[1] == "Libertinus Serif" for font in set_in)
            assert not any("$" in text or "\\" in text for text in texts(figure.svg))
            assert "DejaVuSerif-" not in figure.svg

    @pytest.mark.parametrize("name", list(CHANGES))
    def test_has_no_type_under_seven_points_in_print(self, name):
        for figure in drawn(name)[:3]:
            natural = float(ElementTree.fromstring(figure.svg).get("width").removesuffix("pt"))
            printed = figure.width * 6.57 * 72 / natural  # A4: the narrower of the two papers
            sizes = [float(size) for size in re.findall(r"font(?:-size)?: [^;'\"]*?([\d.]+)px", figure.svg)]

            assert len(sizes) == len(texts(figure.svg)) > 0
            assert natural <= style.TEXT_WIDTH * 72 + 0.5
            assert min(sizes) * printed >= 7.0

    @pytest.mark.parametrize("name", list(CHANGES))
    def test_warns_of_nothing(self, name):
        assert drawn(name)[-1] == []

    def test_leaves_other_font_warnings_alone(self, caplog):
        log = logging.getLogger("matplotlib.font_manager")
        with style.house(), caplog.at_level(logging.WARNING):
            log.warning("findfont: Font family %s not found.", "'Some Other'")
            log.warning("findfont: Font family %s not found.", "'Libertinus Serif'")

        assert [record.getMessage() for record in caplog.records] == ["findfont: Font family 'Some Other' not found."]
        assert not log.filters

    def test_leaves_the_users_settings_and_pyplot_alone(self):
        import matplotlib
        from matplotlib import _pylab_helpers

        with matplotlib.rc_context({"lines.linewidth": 7.5, "svg.fonttype": "path"}):
            first = figures.elevation(made("tee")).svg

            assert matplotlib.rcParams["lines.linewidth"] == 7.5
            assert matplotlib.rcParams["svg.fonttype"] == "path"
        assert first == figures.elevation(made("tee")).svg
        assert not _pylab_helpers.Gcf.figs


class TestElevation:
    @pytest.mark.parametrize("name", list(CHANGES))
    def test_has_a_hole_for_every_bolt_where_it_is_computed(self, name):
        connection = made(name)
        svg = drawn(name)[0].svg
        marks = artists(in_house(elevation_canvas, connection), r"hole-\d+")
        centres = [patch.get_path().transformed(patch.get_patch_transform()).get_extents() for patch in marks]

        assert sum(bool(re.fullmatch(r"hole-\d+", id)) for id in ids(svg)) == len(connection.joint.pattern)
        for hole, box in zip(connection.joint.pattern, centres, strict=True):
            assert ((box.x0 + box.x1) / 2, (box.y0 + box.y1) / 2) == pytest.approx((hole.x, hole.y), abs=1e-6)
            assert (box.width, box.height) == pytest.approx((hole.along, hole.across), abs=1e-6)

    def test_prints_the_dimensions_in_fractions(self):
        # by hand: 4 rows at 3 in; b_f of WT8x25 is 7.07 in, so (7.07 - 3.5)/2 = 1.785; (14 - 3.5)/2 = 5-1/4
        printed = texts(drawn("tee")[0].svg)

        for text in ("3 @ 3", "l = 9", "1¾", "2", "3½", "7.07", "1.785", "5¼", "14", "PL ⅝ x 14", "WT8x25", "8 bolts ⅞ in A325-N", "Pᵤ = 120 kip"):
            assert text in printed

    def test_never_counts_an_edge_distance_among_the_pitches(self):
        printed = texts(figures.elevation(made("tee", plate_end="3 in", member_end="3 in")).svg)

        assert "3 @ 3" in printed and printed.count("3") >= 2 + 1  # both ends, and the number of a bolt
        assert "5 @ 3" not in printed

    def test_numbers_the_bolts_as_their_table_does(self):
        printed = texts(drawn("tee")[0].svg)

        assert all(str(n) in printed for n in range(1, 9))

    def test_calls_the_force_by_the_method(self):
        assert "Pₐ = 80.0 kip" in texts(figures.elevation(made("tee", method="ASD")).svg)

    def test_names_the_angle_of_a_skewed_edge_and_draws_it_on_the_plate_that_is_computed(self):
        connection = made("skewed")
        canvas = in_house(elevation_canvas, connection, check_of(connection, "plate block"))
        body = artists(canvas, "plate-body")[0].get_xy()
        low, high = min(body, key=lambda corner: (corner[1], corner[0])), max(body, key=lambda corner: (corner[1], -corner[0]))

        assert "60°" in texts(figures.elevation(connection).svg)
        assert (high[1] - low[1]) / (low[0] - high[0]) == pytest.approx(np.tan(np.radians(60)))

    @pytest.mark.parametrize("name", list(CHANGES))
    def test_shades_the_block_of_the_member(self, name):
        connection = made(name)
        check = check_of(connection, "member block")
        canvas = in_house(elevation_canvas, connection, check)
        drawn = artists(canvas, r"block-\d+")

        assert len(drawn) == len(check.path.outline)
        for patch, outline in zip(drawn, check.path.outline, strict=True):
            np.testing.assert_allclose(patch.get_xy()[:-1], outline, atol=1e-9)

    @pytest.mark.parametrize("name", ["tee", "skewed", "staggered leg"])
    def test_shades_the_block_of_the_plate_in_the_joints_coordinates(self, name):
        connection = made(name)
        check = check_of(connection, "plate block")
        drawn = artists(in_house(elevation_canvas, connection, check), r"block-\d+")
        # independent: the plate's holes, in its own frame, name the shift of y and the turned x
        shift = connection.joint.pattern[0].y - connection.joint.plate.holes[0].y
        for patch, outline in zip(drawn, check.path.outline, strict=True):
            np.testing.assert_allclose(patch.get_xy()[:-1], [(-x, y + shift) for x, y in outline], atol=1e-9)

    @pytest.mark.parametrize("name", list(CHANGES))
    def test_draws_the_chain_through_its_holes_from_edge_to_edge(self, name):
        connection = made(name)
        check = check_of(connection, "member rupture")
        (line,) = artists(in_house(elevation_canvas, connection, check), "torn")
        corners = list(zip(*line.get_data(), strict=True))
        holes = [(connection.joint.member.holes[i].x, connection.joint.member.holes[i].y) for i in check.path.holes]

        assert isinstance(check.path, Chain)
        assert corners[1:-1] == holes
        assert corners[-1][1] == scene.outline(connection.joint.element)[1]

    def test_a_chain_into_the_outstanding_leg_is_drawn_on_the_unfolded_leg(self):
        connection = made("open holes")
        (line,) = artists(in_house(elevation_canvas, connection, check_of(connection, "member rupture")), "torn")

        # by hand: 4 in leg beyond the 1/2 in thickness of the other reaches to -(4 - 1/2)
        assert line.get_ydata()[0] == pytest.approx(-3.5)

    def test_draws_the_whitmore_lines_at_thirty_degrees(self):
        connection = made("tee")
        check = check_of(connection, "Whitmore yielding")
        canvas = in_house(elevation_canvas, connection, check)
        (width,) = artists(canvas, "torn")
        spread = [np.array(line.get_data()) for line in artists(canvas, "spread")]

        assert isinstance(check.path, Whitmore)
        assert np.ptp(width.get_ydata()) == pytest.approx(2 * 9 * np.tan(np.pi / 6) + 3.5)
        for x, y in spread:
            assert abs((y[1] - y[0]) / (x[1] - x[0])) == pytest.approx(np.tan(np.pi / 6))

    def test_shows_the_governing_path_or_else_the_weakest_of_the_member(self):
        channel, tee = made("channel"), made("tee")

        assert shown_check(channel) is channel.governing
        assert tee.governing.path is None
        shown = shown_check(tee)
        assert shown.part == "member" and shown.path is not None
        assert shown.ratio == max(check.ratio for check in tee.checks if check.part == "member" and check.path is not None)

    def test_breaks_off_a_wide_gusset_and_says_so(self):
        connection = made("wide gusset")
        seen = scene.view(connection.joint)
        printed = texts(figures.elevation(connection).svg)

        assert seen.shown_hi - seen.shown_lo < 20 < connection.joint.plate.width
        assert "PL ⅝ x 40, broken off" in printed

    def test_is_to_scale(self):
        canvas = in_house(elevation_canvas, made("tee"))
        axes = canvas.axes[0]
        width, height = canvas.get_size_inches()

        assert width / np.ptp(axes.get_xlim()) == pytest.approx(height / np.ptp(axes.get_ylim()))


class TestPaths:
    @pytest.mark.parametrize("name", ["tee", "skewed", "staggered flat"])
    def test_has_one_panel_for_each_path_with_its_name_and_ratio(self, name):
        connection = made(name)
        checks = path_checks(connection)
        printed = texts(drawn(name)[2].svg)

        assert [check.id.split()[0] for check in checks] == ["member", "member", "plate", "plate", "Whitmore"]
        for check in checks:
            assert check.title in printed
            assert any(ratio(check) in text for text in printed)

    def test_panels_are_to_one_scale(self):
        canvas = in_house(paths_canvas, made("tee"))
        width = canvas.get_figwidth()
        scales = {round(axes.get_position().width * width / np.ptp(axes.get_xlim()), 9) for axes in canvas.axes}

        assert len(canvas.axes) == 5 and len(scales) == 1

    def test_shades_blocks_only_where_the_path_is_one(self):
        connection = made("tee")
        canvas = in_house(paths_canvas, connection)
        shaded = [any((patch.get_gid() or "").startswith("block") for patch in axes.patches) for axes in canvas.axes]

        assert shaded == [isinstance(check.path, Block) for check in path_checks(connection)]


def area(corners):
    x, y = np.array(corners, dtype=float).T
    return abs(np.dot(x, np.roll(y, 1)) - np.dot(y, np.roll(x, 1))) / 2


class TestCrossSection:
    # independent: the tabulated area, against the area of what is drawn; the fillets are drawn with the design radius k_des - t_f,
    # toes square and flanges without slope, hence not exact
    @pytest.mark.parametrize("name", ["tee", "double angle", "both flanges", "channel", "wide flange web", "staggered leg", "stem"])
    def test_draws_the_member_with_the_area_of_the_tables(self, name):
        joint = made(name).joint
        drawn = sum(area(corners) for body, corners in section.stack(joint).bodies if body == "member")

        assert drawn == pytest.approx(joint.element.A_g, rel=0.03)

    @pytest.mark.parametrize("name", list(CHANGES))
    def test_plates_are_as_wide_and_thick_as_given(self, name):
        joint = made(name).joint
        plates = [corners for body, corners in section.stack(joint).bodies if body == "plate"]

        assert len(plates) == joint.plate.pieces
        for corners in plates:
            assert area(corners) == pytest.approx(joint.plate.width * joint.plate.t)

    @pytest.mark.parametrize("name", list(CHANGES))
    def test_plies_of_a_bolt_fill_its_grip_without_overlap(self, name):
        joint = made(name).joint
        cut = section.stack(joint)
        for low, high in (sorted(grip) for grip in cut.grips):
            plies = sorted(sorted(ply[1:]) for ply in cut.plies if low - 1e-9 <= min(ply[1:]) and max(ply[1:]) <= high + 1e-9)

            assert plies[0][0] == pytest.approx(low) and plies[-1][1] == pytest.approx(high)
            assert all(a[1] == pytest.approx(b[0]) for a, b in pairwise(plies))

    def test_spread_angles_have_fillers_in_their_gap(self):
        # by hand: gap 1, plate 5/8: 3/16 on either side
        printed = texts(figures.cross_section(made("spread angles")).svg)

        assert "fillers 3/16 each" in printed

    def test_prints_dimensions_and_labels(self):
        # d of WT8x25: 8.13 in, t_f 0.630 in (AISC shapes database v15/v16)
        printed = texts(drawn("tee")[1].svg)

        for text in ("8.13", "0.63", "⅝", "3½", "1.785", "14", "WT8x25", "PL ⅝ x 14", "⅞ in A325-N"):
            assert text in printed

    def test_has_the_bolts_of_the_fullest_row(self):
        drawn = artists(in_house(section.section_canvas, made("staggered flat")), "bolt-0")

        assert len(drawn) == 2 * 3  # two of the four staggered lines meet in a row; shank, head and nut each


class TestCapacityCurve:
    @pytest.mark.parametrize("name", ["tee", "channel", "slots"])
    def test_lines_are_the_arrays_of_the_study(self, name):
        connection = made(name)
        found = study.capacity_curve(connection)
        canvas = in_house(diagrams.capacity_canvas, connection, found)
        drawn = {line.get_gid(): np.array(line.get_data()) for line in canvas.axes[0].lines}

        for id, strengths in found.strengths.items():
            np.testing.assert_array_equal(drawn[id], [found.lengths, strengths])
        np.testing.assert_array_equal(drawn["envelope"], [found.lengths, found.envelope])
        np.testing.assert_array_equal(drawn["stretched envelope"], [found.stretched_lengths, found.stretched_envelope])
        assert drawn["design"][1] == pytest.approx(connection.capacity)

    def test_no_two_limit_states_look_alike(self):
        connection = made("slots")
        canvas = in_house(diagrams.capacity_canvas, connection, study.capacity_curve(connection))
        looks = [(str(line.get_linestyle()), str(line._dash_pattern), line.get_marker()) for line in canvas.axes[0].lines
                 if line.get_gid() in {row[0] for row in connection.limit_states(connection.joint)}]

        assert len(looks) == 12 == len(set(looks))

    def test_labels_are_apart_from_each_other(self):
        connection = made("slots")
        canvas = in_house(diagrams.capacity_canvas, connection, study.capacity_curve(connection))
        axes = canvas.axes[0]
        beyond = axes.get_xlim()[1]
        heights = sorted(text.get_position()[1] for text in axes.texts if text.get_position()[0] > beyond)
        points = np.diff(heights) / np.ptp(axes.get_ylim()) * axes.get_position().height * canvas.get_figheight() * 72

        assert len(heights) >= 13 and points.min() >= 8.9

    def test_draws_the_demands_that_matter_and_counts_the_others(self):
        # by hand, ASCE 7-22 2.3.1 with D = 20, L = 60: 1.2D + 1.6L = 120; 1.4D = 28 is under half of it
        printed = texts(diagrams_of("tee")[0].svg)

        assert "1.2D + 1.6L = 120 kip" in printed
        assert not any(text.startswith("1.4D") for text in printed)
        assert any("further combination" in text for text in printed) and "at most 28.0 kip, not drawn" in printed

    def test_marks_the_rows_above(self):
        connection = made("tee")
        canvas = in_house(diagrams.capacity_canvas, connection, study.capacity_curve(connection))
        (above,) = canvas.axes[0].child_axes

        assert [label.get_text() for label in above.get_xticklabels()] == ["2", "3", "4", "5", "6", "7", "8"]
        assert list(above.get_xticks()) == [3, 6, 9, 12, 15, 18, 21]

    def test_a_continuous_sweep_has_no_markers(self):
        connection = made("tee")
        found = study.capacity_curve(connection)
        smooth = replace(found, sweep=replace(found.sweep, marks=(), design=None))
        canvas = in_house(diagrams.capacity_canvas, connection, smooth)

        assert all(line.get_marker() in (None, "None", "") for line in canvas.axes[0].lines)


class TestSpread:
    @pytest.mark.parametrize("wanted", [[1.0, 1.1, 1.2, 1.3], [0.0, 0.0, 9.9, 10.0, 10.0], [5.0], [2.0] * 8, [-4.0, 3.0, 30.0]])
    def test_keeps_order_distance_and_frame(self, wanted):
        places = style.spread(wanted, 1.0, 0.0, 10.0)

        assert len(places) == len(wanted)
        assert min(places) >= -1e-9 and max(places) <= 10 + 1e-9
        assert all(b - a >= 1.0 - 1e-6 for a, b in pairwise(places))

    def test_leaves_alone_what_is_apart(self):
        assert style.spread([1.0, 4.0, 8.0], 1.0, 0.0, 10.0) == [1.0, 4.0, 8.0]


class TestPermissibleLoads:
    def test_the_boundary_is_what_the_loads_permit(self):
        connection = made("tee")
        region = diagrams._region(connection)
        (line,) = artists(in_house(diagrams.permissible_canvas, connection, region), "boundary")
        xs, ys = line.get_data()
        asked = permissible_line(connection.capacity, connection.inputs.service(), xs[:-1], "LRFD", "7-22")

        np.testing.assert_allclose(ys[:-1], asked, atol=1e-9)
        # by hand, ASCE 7-22 2.3.1: 1.6 L alone, 1.4 D alone
        assert ys[0] == pytest.approx(connection.capacity / 1.6)
        assert xs[-1] == pytest.approx(connection.capacity / 1.4)

    def test_the_design_point_is_the_service_loads(self):
        connection = made("tee")
        (point,) = artists(in_house(diagrams.permissible_canvas, connection, diagrams._region(connection)), "design")

        assert (point.get_xdata()[0], point.get_ydata()[0]) == (20.0, 60.0)

    def test_there_is_none_for_a_given_demand(self):
        given = made("tee", P_D=None, P_L=None, tension="100 kip", demand_level="LRFD")

        assert figures.permissible_loads(given) is None
