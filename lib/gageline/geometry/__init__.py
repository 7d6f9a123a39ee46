"""Hole patterns and what can happen to them: net-section chains, tear-out blocks, clearances, spread of load.

Plain floats (or numpy arrays, where a docstring says so) in inches; no clause, no table, no unit registry.

pattern      Hole, End, grid, punched, mirrored, gage lines, overlapping and misplaced holes
chains       critical_chains, chain_through, Chain
blocks       tear_out_blocks, Part, Attachment, Block
clearances   clear_distances, edge_distances
whitmore     whitmore, spread_width (whitmore itself is imported from its module)
"""

from .blocks import Attachment, Block, Part, ShearPlane, TensionPlane, tear_out_blocks
from .chains import Chain, chain_through, critical_chains, polyline, unfolded_gage
from .clearances import ClearDistance, EdgeDistance, clear_distances, edge_distances
from .pattern import (
    End,
    Hole,
    Pair,
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
from .whitmore import Whitmore, spread_width

__all__ = [
    "Attachment", "Block", "Chain", "ClearDistance", "EdgeDistance", "End", "Hole", "Pair", "Part", "ShearPlane",
    "TensionPlane", "Whitmore", "centred_edge", "chain_through", "clear_distances", "closest_pair",
    "connection_length", "critical_chains", "edge_distances", "grid", "lines_of", "mirrored", "outside", "overlapping",
    "polyline", "punched", "rows_per_line", "spread_width", "tear_out_blocks", "tightest_pair",
    "unfolded_gage",
]
