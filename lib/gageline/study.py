"""Sweeps: the strength of every limit state against the connection's length, from the same limit states that the checks use."""

from dataclasses import dataclass

import numpy as np

from . import units
from .check import FACTORS
from .loads import Demands

CONTINUOUS_POINTS = 200


@dataclass(frozen=True)
class Curve:
    """Available strengths against connection length.

    Parameters
    ----------
    rows, lengths : (n,) rows per line and the length they make at the chosen pitch. [in]
    strengths : id -> (n,) available strength. [kip]
    titles : id -> what it is called.
    stretched_lengths, stretched : (m,) lengths that the design's rows make at other pitches, and id -> (m,) strength there. [in, kip]
    demands : (text, required tension) of every combination that pulls, largest first. [kip]
    design_rows : rows of the design.
    sentence : the shortest length that satisfies all, in words.
    """

    rows: np.ndarray
    lengths: np.ndarray
    strengths: dict
    titles: dict
    stretched_lengths: np.ndarray
    stretched: dict
    demands: tuple
    design_rows: int
    sentence: str

    @property
    def envelope(self):
        """(n,) the least available strength. [kip]"""
        return np.minimum.reduce(list(self.strengths.values()))

    @property
    def stretched_envelope(self):
        """(m,) the least available strength of the design's rows at other pitches. [kip]"""
        return np.minimum.reduce(list(self.stretched.values())) if self.stretched else np.array([])


def available_strengths(connection, joint):
    """Return id -> available strength of every limit state in tension; arrays where the joint holds arrays. [kip]"""
    out = {}
    for id, _, _, _, state, _, evaluate in connection.limit_states(joint):
        phi, omega = FACTORS[state]
        nominal = evaluate(joint).nominal
        out[id] = phi * nominal if connection.basis.method == "LRFD" else nominal / omega
    return out


def over_pitch(connection, pitches):
    """Return id -> available strength of the design's rows at an array of pitches.

    Parameters
    ----------
    connection : a bolted connection with lines and rows.
    pitches : (n,) spacing along the line. [in]

    Returns
    -------
    dict
        id -> (n,) available strength. [kip]
    """
    pitches = np.asarray(pitches, dtype=float)
    found = available_strengths(connection, connection.at(pitch=pitches))
    return {id: np.broadcast_to(value, pitches.shape) for id, value in found.items()}


def capacity_curve(connection):
    """Return the strength of every limit state for one row of bolts more and more, or None where holes are given one by one."""
    given = connection.inputs
    if given.holes:
        return None
    design, pitch = given.rows, given.pitch or 3.0
    first = 1 if connection.element.eccentricity is None or given.U_by_hand is not None else 2
    rows = np.arange(first, max(design + 4, 8) + 1)
    points = [available_strengths(connection, connection.at(rows=int(n), pitch=pitch)) for n in rows]
    strengths = {id: np.array([float(point[id]) for point in points]) for id in points[0]}
    titles = {row[0]: row[1] for row in connection.limit_states(connection.joint)}
    lengths = (rows - 1) * pitch + abs(given.stagger) * (given.lines > 1)
    stretched_lengths, stretched = np.array([]), {}
    if design > 1:
        thinner = min(connection.joint.member.t, connection.joint.plate.t)
        least, most = 8 / 3 * connection.size.d, max(pitch, min(24 * thinner, 12.0, 2 * pitch))
        pitches = np.linspace(least, most, CONTINUOUS_POINTS)
        stretched = over_pitch(connection, pitches)
        stretched_lengths = (design - 1) * pitches + abs(given.stagger) * (given.lines > 1)
    curve = Curve(rows, lengths, strengths, titles, stretched_lengths, stretched, _demands(connection), design, "")
    return Curve(*(getattr(curve, name) for name in list(Curve.__dataclass_fields__)[:-1]), _sentence(connection, curve, pitch))


def _demands(connection):
    if isinstance(connection.demand, Demands):
        rows = {(row.combination.text, row.total) for row in connection.demand.rows if row.total > 0}
        return tuple(sorted(rows, key=lambda row: -row[1]))
    return (("given demand", connection.demand.required_tension),)


def _sentence(connection, curve, pitch):
    T = connection.demand.required_tension
    said = f"{units.ceil_figures(T)} kip"
    enough = np.flatnonzero(curve.envelope >= T * (1 - 1e-12))
    if not len(enough):
        best = int(np.argmax(curve.envelope))
        limit = min(curve.strengths, key=lambda id: curve.strengths[id][best])
        return (f"No length up to {curve.rows[-1]} rows carries {said}: {curve.titles[limit]} limits it to "
                f"{units.floor_figures(curve.envelope[best])} kip.")
    i = int(enough[0])
    limit = min(curve.strengths, key=lambda id: curve.strengths[id][i])
    n = int(curve.rows[i])
    text = (f"The shortest length that carries {said} in every limit state is {n} row{'s' if n > 1 else ''} at {units.fraction(pitch)} in, "
            f"l = {units.fraction(float(curve.lengths[i]))} in; {curve.titles[limit]} governs there with {units.floor_figures(curve.envelope[i])} kip.")
    if curve.design_rows > n:
        text += f" This design has {curve.design_rows} rows."
    return text
