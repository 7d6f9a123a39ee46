"""The edge of a gusset against its support: forces on it, and every limit state of gusset, weld and support there.

Every strength is referred to the load of the brace: all forces on an edge grow with it.
"""

from dataclasses import dataclass

import numpy as np

from ...check import FACTORS, silent
from ...facts.grades import E
from ...provisions import beam, block_shear, connecting, gusset_edges, gusset_plates, gussets, welds
from ..outcome import worked

FILLETS = 2
"""Fillets of an edge: one on each side of the gusset."""


@dataclass(frozen=True)
class Support:
    """The member that an edge is welded to.

    Parameters
    ----------
    name : its designation. part : "flange" or "web", what the gusset is welded to. F_y, F_u : of its steel. [ksi]
    t : thickness of that part. t_w, t_f, k : web, flange, and distance to the toe of the web's fillet. d : depth. [in]
    near_end : whether the member ends within its depth from the force.
    """

    name: str
    part: str
    F_y: float
    F_u: float
    t: float
    t_w: float
    t_f: float
    k: float
    d: float
    near_end: bool


@dataclass(frozen=True)
class Edge:
    """One supported edge: "beam" or "column", its start and length (which may be an array), the leg of its fillets, its support. [in]"""

    name: str
    start: float
    L: float
    w_f: float
    support: Support

    @property
    def centroid(self):
        """Distance of its centroid from the corner. [in]"""
        return self.start + self.L / 2


@dataclass(frozen=True)
class Edges:
    """The supported edges of a gusset and what loads them.

    Parameters
    ----------
    beam, column : Edge; column is None on a single edge. t, F_y, F_u : of the gusset. F_EXX : of the filler metal. [in, ksi]
    P : required load of the brace. angle : of the brace, see GussetInputs. e_b, e_c : work point to the faces. [kip, rad, in]
    moment_on : edge that takes the moment. offset : of a single edge's centroid from the brace's axis. [in]
    redistribution, directional : see GussetInputs.
    """

    beam: Edge
    column: Edge | None
    t: float
    F_y: float
    F_u: float
    F_EXX: float
    P: float
    angle: float
    e_b: float
    e_c: float
    moment_on: str
    offset: float
    redistribution: bool
    directional: bool


def ideal(do, edges):
    """Work out (α, β) of the Uniform Force Method: the centroid of the edge without moment as built, the other from it."""
    if edges.moment_on == "beam":
        beta_g = edges.column.centroid
        do.say(f"The column edge takes no moment: $\\beta_g$ is its centroid as built, {_inches(beta_g)}.")
        return do(gussets.ideal_alpha, edges.e_b, beta_g, edges.angle, edges.e_c), beta_g
    alpha_g = edges.beam.centroid
    do.say(f"The beam edge takes no moment: $\\alpha_g$ is its centroid as built, {_inches(alpha_g)}.")
    return alpha_g, do(gussets.ideal_beta, alpha_g, edges.e_c, edges.angle, edges.e_b)


def _inches(value):
    return f"{value:.5g} in" if not isinstance(value, np.ndarray) else ""


def forces(do, edges, edge):
    """Work out (shear, normal force, moment) on an edge. [kip, kip, kip·in]"""
    if edges.column is None:
        V_e = do(gussets.single_edge_shear, edges.P, edges.angle)
        N_e = do(gussets.single_edge_normal, edges.P, edges.angle)
        return V_e, N_e, (do(gussets.single_edge_moment, N_e, abs(edges.offset)) if edges.offset else 0.0)
    alpha_g, beta_g = ideal(do, edges)
    r_g = do(gussets.force_radius, alpha_g, edges.e_c, beta_g, edges.e_b)
    if edge.name == "beam":
        V_e = do(gussets.beam_edge_shear, alpha_g, r_g, edges.P)
        N_e = do(gussets.beam_edge_normal, edges.e_b, r_g, edges.P)
        M_e = do(gussets.beam_edge_moment, N_e, alpha_g, edge.centroid) if edges.moment_on == "beam" else 0.0
        do.say("On this edge $H_b$ is the shear $V_e$ and $V_b$ the normal force $N_e$.")
        return V_e, N_e, M_e
    V_e = do(gussets.column_edge_shear, beta_g, r_g, edges.P)
    N_e = do(gussets.column_edge_normal, edges.e_c, r_g, edges.P)
    M_e = do(gussets.column_edge_moment, N_e, beta_g, edge.centroid) if edges.moment_on == "column" else 0.0
    do.say("On this edge $V_c$ is the shear $V_e$ and $H_c$ the normal force $N_e$.")
    return V_e, N_e, M_e


def _refer(do, edges, Q_e, F_w, force):
    do.say(f"That strength is $Q_e$ of the edge; the force on it, $F_w$, is {force}.")
    return do(gusset_edges.referred_to_brace, edges.P, Q_e, F_w)


def shear_yielding(edges, edge):
    """Return yielding of the gusset in shear along the edge; here the forces on the edge are written out."""

    def compute(do):
        V_e, _, _ = forces(do, edges, edge)
        A_gv = do(gusset_edges.edge_area, edge.L, edges.t)
        return _refer(do, edges, do(welds.shear_yielding, edges.F_y, A_gv), V_e, "the shear $V_e$")

    return worked(compute)


def _normal(do, edges, edge, N_e, M_e):
    if np.any(np.asarray(M_e) > 0):
        return do(gusset_edges.equivalent_normal_force, N_e, M_e, edge.L), "the normal force with the moment, as above"
    return N_e, "the normal force $N_e$"


def normal_yielding(edges, edge, first=False):
    """Return yielding of the gusset under the normal force and the moment on the edge, elastically; ``first`` writes the forces out."""

    def compute(do):
        if not first:
            do.say("Forces on the edge as in the check of shear yielding.")
        _, N_e, M_e = forces(do if first else silent, edges, edge)
        F_w, force = _normal(do, edges, edge, N_e, M_e)
        A_g = do(connecting.plate_area, edge.L, edges.t)
        return _refer(do, edges, do(connecting.plate_yielding, edges.F_y, A_g), F_w, force)

    return worked(compute)


def combined(edges, edge, method):
    """Return the load of the brace at which normal force and shear together use up the gusset's edge."""

    def available(Q_e, state):
        phi, omega = FACTORS[state]
        return phi * Q_e if method == "LRFD" else Q_e / omega

    def compute(do):
        V_e, N_e, M_e = forces(silent, edges, edge)
        F_w, _ = _normal(silent, edges, edge, N_e, M_e)
        A = gusset_edges.edge_area.bare(edge.L, edges.t)
        do.say("Available strengths of the edge from the two checks before, each with its own factor.")
        u_N = do(gusset_plates.ratio_normal, F_w, available(connecting.plate_yielding.bare(edges.F_y, A), "yielding"))
        u_V = do(gusset_plates.ratio_shear, V_e, available(welds.shear_yielding.bare(edges.F_y, A), "shear yielding"))
        do(gusset_plates.interaction, u_N, u_V)
        return do(gusset_plates.load_at_interaction, edges.P, u_N, u_V)

    return worked(compute)


def force_per_length(do, edges, edge):
    """Work out (force per length for the weld, part of it normal to the edge, whether a moment acts)."""
    V_e, N_e, M_e = forces(silent, edges, edge)
    f_v, f_a = do(gusset_edges.force_along, V_e, edge.L), do(gusset_edges.force_normal, N_e, edge.L)
    f_b = do(gusset_edges.force_of_moment, M_e, edge.L) if np.any(np.asarray(M_e) > 0) else 0.0
    f_p = do(gusset_edges.peak_force, f_v, f_a, f_b)
    if not edges.redistribution:
        return do(gusset_edges.force_without_redistribution, f_p), f_a, f_p, M_e
    return do(gusset_edges.redistributed_force, f_p, do(gusset_edges.least_force, f_v, f_a, f_b)), f_a, f_p, M_e


def weld(edges, edge):
    """Return the strength of the edge's two fillets against the greatest force per length, by the elastic method."""

    def compute(do):
        do.say("Forces on the edge as in the check of shear yielding.")
        f_w, f_a, f_p, M_e = force_per_length(do, edges, edge)
        F_w = do(gusset_edges.whole_edge_force, f_w, edge.L)
        A_we = do(welds.weld_area, FILLETS, do(welds.throat, edge.w_f), edge.L)
        k_ds = _directional(do, edges, f_a, f_p, M_e)
        return _refer(do, edges, do(welds.fillet_strength, edges.F_EXX, A_we, k_ds), F_w, "as above")

    return worked(compute)


def _directional(do, edges, f_a, f_p, M_e):
    if not edges.directional:
        do.say("No directional increase is taken: $k_{ds}$ = 1.0.")
        return 1.0
    concentric = np.asarray(M_e) <= 1e-9 * edges.P
    if not concentric.ndim and concentric:
        do.say("The two fillets are a linear group loaded through its centroid: the directional increase is allowed (J2.4).")
        return do(gusset_edges.directional_factor_of_components, f_a, f_p)
    if concentric.ndim:
        return np.where(concentric, gusset_edges.directional_factor_of_components.bare(f_a, f_p), 1.0)
    do.say("A moment acts on the edge: no directional increase is taken, $k_{ds}$ = 1.0 (safe).")
    return 1.0


def gusset_rupture(edges, edge):
    """Return rupture of the gusset along its welds, under the resultant that the welds are made for."""

    def compute(do):
        do.say("Under the force per length of the check of the weld.")
        f_w, *_ = force_per_length(silent, edges, edge)
        F_w = do(gusset_edges.whole_edge_force, f_w, edge.L)
        A_nv = do(welds.net_area_without_holes, do(gusset_edges.edge_area, edge.L, edges.t))
        return _refer(do, edges, do(welds.shear_rupture, edges.F_u, A_nv), F_w, "as above")

    return worked(compute)


def support_rupture(edges, edge):
    """Return rupture of the support's flange or web beside the two fillets, under the same resultant."""

    def compute(do):
        do.say(f"Under the force per length of the check of the weld; it passes into the {edge.support.part} of {edge.support.name} "
               "beside both fillets.")
        f_w, *_ = force_per_length(silent, edges, edge)
        F_w = do(gusset_edges.whole_edge_force, f_w, edge.L)
        A_nv = do(welds.net_area_without_holes, do(block_shear.first_shear_planes, FILLETS, edge.L, edge.support.t))
        return _refer(do, edges, do(welds.shear_rupture, edge.support.F_u, A_nv), F_w, "as above")

    return worked(compute)


def web_yielding(edges, edge):
    """Return local yielding of the support's web under the normal force and the moment."""
    support = edge.support

    def compute(do):
        do.say("Forces on the edge as in the check of shear yielding.")
        _, N_e, M_e = forces(silent, edges, edge)
        F_w, force = _normal(do, edges, edge, N_e, M_e)
        values = (support.F_y, support.t_w, support.k, edge.L)
        if isinstance(support.near_end, np.ndarray):
            Q_e = np.where(support.near_end, beam.web_local_yielding_near_end.bare(*values), beam.web_local_yielding.bare(*values))
            return gusset_edges.referred_to_brace.bare(edges.P, Q_e, F_w)
        near = support.near_end
        do.say(f"{support.name}: the force enters {'not farther from' if near else 'farther from'} the end of the member than its depth.")
        return _refer(do, edges, do(beam.web_local_yielding_near_end if near else beam.web_local_yielding, *values), F_w, force)

    return worked(compute)


def web_crippling(edges, edge):
    """Return crippling of the support's web under the normal force and the moment, the brace in compression."""
    support = edge.support

    def compute(do):
        do.say("Forces on the edge as in the check of shear yielding.")
        _, N_e, M_e = forces(silent, edges, edge)
        F_w, force = _normal(do, edges, edge, N_e, M_e)
        near = edge.centroid < support.d / 2 if edge.name == "beam" and edges.column is not None else support.near_end
        do.say(f"{support.name}: the force is taken {'within' if near else 'farther than'} half the depth from the end of the member.")
        rule = gusset_plates.web_crippling
        if near:
            short = edge.L / support.d <= 0.2
            rule = gusset_plates.web_crippling_near_end_short if short else gusset_plates.web_crippling_near_end
        return _refer(do, edges, do(rule, support.t_w, edge.L, support.d, support.t_f, E, support.F_y), F_w, force)

    return worked(compute)
