"""Inputs of a gusset: the brace's connection to it, its own size, the edges it is supported on."""

from typing import Literal

from .. import plate
from ..base import CalcInputs
from ..bolted.inputs import HoleKind
from ..fields import Angle, Length, Lengths, Number, note

_BRACE, _GUSSET, _BOLTS, _WELDS = "Brace", "Gusset", "Brace bolted to the gusset", "Brace welded to the gusset"
_EDGES, _BEAM, _COLUMN, _COMPRESSION = "Supported edges", "Beam, or the only support", "Column", "Gusset in compression"


class GussetInputs(CalcInputs):
    """Inputs of a gusset at a corner of beam and column, or on one supported edge."""

    brace: str = note("brace, as called on the drawings; its own strength is another calculation", group=_BRACE, min_length=1)
    connected: Literal["bolts", "welds"] = note("how the brace is connected: bolts or welds", group=_BRACE)
    supports: Literal["corner", "one edge"] = note("corner of beam and column, or one edge", "corner", group=_BRACE)
    brace_angle: Angle = note("angle between the brace and the column's axis (corner), or the edge (one edge)", group=_BRACE, gt=0.15, lt=1.5709)
    work_point_distance: Length = note("work point to the last row of bolts or end of the welds, along the brace", group=_BRACE, gt=0, le=240)

    gusset_thickness: Length = note("thickness of the gusset", group=_GUSSET, gt=0, le=4)
    gusset_grade: str = note("steel of the gusset", group=_GUSSET, min_length=1)
    gusset_end: Length = note("first row of bolts, or outer end of the welds, to the gusset's free end", group=_GUSSET, ge=0, le=60)
    gusset_end_width: Length = note("width of the gusset at its free end, centred on the brace", group=_GUSSET, gt=0, le=120)

    lines: int | None = note("gage lines", None, group=_BOLTS, ge=1, le=10)
    rows: int | None = note("bolts in each line", None, group=_BOLTS, ge=1, le=40)
    pitch: Length | None = note("spacing along the line", None, group=_BOLTS, gt=0, le=24)
    gage: Lengths = note("spacing of the lines: one for all, or one for each space", (), group=_BOLTS)
    bolt: str | None = note("bolt size", None, group=_BOLTS)
    bolt_grade: str | None = note("bolt group or product", None, group=_BOLTS)
    threads: Literal["N", "X"] = note("threads in (N) or out of (X) the shear plane", "N", group=_BOLTS)
    installation: Literal["snug", "pretensioned", "slip-critical"] = note("snug, pretensioned or slip-critical", "snug", group=_BOLTS)
    slip_class: Literal["A", "B"] | None = note("faying surface of a slip-critical joint", None, group=_BOLTS)
    shear_planes: Literal[1, 2] = note("shear planes of each bolt: 1 (lap) or 2 (gusset between two parts of the brace)", 1, group=_BOLTS)
    gusset_holes: HoleKind = note("holes of the gusset; those of the brace are standard", "STD", group=_BOLTS)
    deformation_considered: bool = note("deformation at bolt holes at service load is a consideration", True, group=_BOLTS)

    brace_weld_lines: Literal[2, 4] | None = note("lines of fillet weld: 2 (one face), 4 (both faces, or a slotted member)", None, group=_WELDS)
    brace_weld_length: Length | None = note("length of each line", None, group=_WELDS, gt=0, le=120)
    brace_weld_apart: Length | None = note("distance between the lines of one face", None, group=_WELDS, gt=0, le=60)
    brace_weld: Length | None = note("leg size of the fillets", None, group=_WELDS, gt=0, le=2)
    brace_thickness: Length | None = note("thickness of the brace's part that is welded", None, group=_WELDS, gt=0, le=4)

    electrode: str = note("filler metal", "E70", group=_EDGES)
    moment_on: Literal["beam", "column"] = note("edge that takes the moment where the centroids do not fit the Uniform Force Method",
                                                "beam", group=_EDGES)
    redistribution: bool = note("weld of an edge for 1.25 times its average force where that exceeds the peak", True, group=_EDGES)
    directional: bool = note("directional strength increase of an edge's weld where no moment acts on it", True, group=_EDGES)

    beam: str = note("W shape under the gusset", group=_BEAM, min_length=1)
    beam_grade: str = note("steel of the beam", group=_BEAM, min_length=1)
    beam_edge: Length = note("length of the gusset welded to the beam", group=_BEAM, gt=0, le=240)
    beam_edge_start: Length = note("column face to the start of that weld", 0.0, group=_BEAM, ge=0, le=60)
    beam_weld: Length = note("leg size of the fillets, one on each side of the gusset", group=_BEAM, gt=0, le=2)
    beam_near_end: bool = note("one edge only: the support ends within its depth from the gusset", False, group=_BEAM)
    edge_offset: Length = note("one edge only: centroid of the edge from the point where the brace's axis meets it", 0.0, group=_BEAM,
                               ge=-120, le=120)

    column: str | None = note("W shape beside the gusset", None, group=_COLUMN)
    column_grade: str | None = note("steel of the column", None, group=_COLUMN)
    column_connected: Literal["flange", "web"] = note("part of the column the gusset is welded to", "flange", group=_COLUMN)
    column_edge: Length | None = note("length of the gusset welded to the column", None, group=_COLUMN, gt=0, le=240)
    column_edge_start: Length = note("beam face to the start of that weld", 0.0, group=_COLUMN, ge=0, le=60)
    column_weld: Length | None = note("leg size of the fillets, one on each side of the gusset", None, group=_COLUMN, gt=0, le=2)
    column_near_end: bool = note("the column ends within its depth from the gusset", False, group=_COLUMN)

    gusset_support: str | None = note(f"one of: {', '.join(plate.K_CHOICES)}; or by hand", None, group=_COMPRESSION)
    gusset_K: Number | None = note("effective length factor, with gusset_support = by hand", None, group=_COMPRESSION, gt=0, le=2.5)
    gusset_K_basis: str = note("written basis of gusset_K", "", group=_COMPRESSION)
