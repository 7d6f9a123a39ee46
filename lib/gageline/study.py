"""Sweeps: the strength of every limit state against the connection's length, from the same limit states that the checks use."""

from dataclasses import dataclass, replace

import numpy as np

from . import units
from .check import FACTORS
from .loads import Demands


@dataclass(frozen=True)
class Curve:
    """Available strengths against connection length.

    Parameters
    ----------
    lengths : (n,) lengths evaluated. [in]
    strengths : id -> (n,) available strength. [kip]
    titles : id -> what it is called.
    stretched_lengths, stretched : (m,) lengths of another way to lengthen the connection, and id -> (m,) strength there. [in, kip]
    demands : (text, required tension) of every combination that pulls, largest first. [kip]
    sweep : the family's ``Sweep``, with labels and marks.
    sentence : the shortest length that satisfies all, in words.
    """

    lengths: np.ndarray
    strengths: dict
    titles: dict
    stretched_lengths: np.ndarray
    stretched: dict
    demands: tuple
    sweep: object
    sentence: str = ""

    @property
    def envelope(self):
        """(n,) the least available strength. [kip]"""
        return np.minimum.reduce(list(self.strengths.values()))

    @property
    def stretched_envelope(self):
        """(m,) the least available strength of the other way. [kip]"""
        return np.minimum.reduce(list(self.stretched.values())) if self.stretched else np.array([])


def available_strengths(connection, design):
    """Return id -> available strength of every limit state in tension; arrays where the design holds arrays. [kip]"""
    out = {}
    for id, _, _, _, state, _, evaluate in connection.limit_states(design):
        phi, omega = FACTORS[state]
        nominal = evaluate(design).nominal
        out[id] = phi * nominal if connection.basis.method == "LRFD" else nominal / omega
    return out


def over(connection, design, shape):
    """Return id -> available strength, broadcast to a shape, of a design that holds arrays. [kip]"""
    return {id: np.broadcast_to(value, shape) for id, value in available_strengths(connection, design).items()}


def ratios(connection, **lengths):
    """Return D/C of a bolted connection over one or two of its lengths, from the checks' own limit states.

    Parameters
    ----------
    connection : a bolted connection with lines and rows.
    lengths : name -> (n,) values of one of ``search.LENGTHS``; with two names the grid of both. [in]

    Returns
    -------
    ratio : (n,) or (n of the first, m of the second) D/C, infinite where no strength is left.
    """
    axes = [np.asarray(values, dtype=float) for values in lengths.values()]
    grids = [grid.ravel() for grid in np.meshgrid(*axes, indexing="ij")]
    changes = {name: (grid,) if name == "gage" else grid for name, grid in zip(lengths, grids)}
    strengths = over(connection, connection.at(**changes), grids[0].shape)
    weakest = np.minimum.reduce(list(strengths.values()))
    with np.errstate(divide="ignore"):
        found = np.where(weakest > 0, connection.demand.required_tension / np.maximum(weakest, 1e-300), np.inf)
    return found.reshape([axis.size for axis in axes])


def over_pitch(connection, pitches):
    """Return id -> (n,) available strength of a bolted design's rows at an array of pitches. [kip]

    Parameters
    ----------
    connection : a bolted connection with lines and rows.
    pitches : (n,) spacing along the line. [in]
    """
    pitches = np.asarray(pitches, dtype=float)
    return over(connection, connection.at(pitch=pitches), pitches.shape)


def capacity_curve(connection):
    """Return the ``Curve`` of a connection, or a sentence why there is none."""
    if connection.inputs.seismic_system is not None:
        return "Not drawn: the demand follows the brace's own expected strength, against which its yielding is not checked."
    sweep = connection.sweep()
    if isinstance(sweep, str):
        return sweep
    lengths = np.asarray(sweep.lengths, dtype=float)
    if isinstance(sweep.designs, (list, tuple)):
        points = [available_strengths(connection, design) for design in sweep.designs]
        strengths = {id: np.array([float(point[id]) for point in points]) for id in points[0]}
    else:
        strengths = over(connection, sweep.designs, lengths.shape)
    stretched_lengths, stretched = np.array([]), {}
    if sweep.stretched:
        stretched_lengths = np.asarray(sweep.stretched[0])
        stretched = over(connection, sweep.stretched[1], stretched_lengths.shape)
    titles = {row[0]: row[1] for row in connection.limit_states(connection.design)}
    curve = Curve(lengths, strengths, titles, stretched_lengths, stretched, _demands(connection), sweep)
    return replace(curve, sentence=_sentence(connection, curve))


def _demands(connection):
    if isinstance(connection.demand, Demands):
        rows = {(row.combination.text.replace("W_opp", "W′"), row.total) for row in connection.demand.rows if row.total > 0}
        return tuple(sorted(rows, key=lambda row: -row[1]))
    return (("given demand", connection.demand.required_tension),)


def _sentence(connection, curve):
    T, sweep = connection.demand.required_tension, curve.sweep
    said, envelope = f"{units.force(T, units.ceil_figures)}", curve.envelope

    def limit(i):
        return curve.titles[min(curve.strengths, key=lambda id: curve.strengths[id][i])]

    enough = np.flatnonzero(envelope >= T * (1 - 1e-12))
    if not len(enough):
        best = int(np.argmax(envelope))
        return (f"No length up to {sweep.describe(len(envelope) - 1)} carries {said}: "
                f"the most is {units.force(envelope[best], units.floor_figures)}, "
                f"limited by: {limit(best)}.")
    i = int(enough[0])
    text = (f"The shortest connection that carries {said} in every limit state is {sweep.describe(i)}; "
            f"governing there: {limit(i)}, {units.force(envelope[i], units.floor_figures)}.")
    if sweep.design is not None and sweep.design != i:
        text += f" This design has {sweep.describe(sweep.design)}."
    return text
