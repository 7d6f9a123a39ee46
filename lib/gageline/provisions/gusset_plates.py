"""Gussets as plates: interaction at the edge, lengths in compression, free edge; crippling of the support's web.  [AISC360] J4, J10.3."""

from ..formula import formula


@formula("statics")
def ratio_normal(F_w, N_av):
    """Share of the edge's available strength that the force normal to it uses.

    Parameters
    ----------
    F_w : force on the edge that is compared with its strength. [kip]
    N_av : available strength of the edge for a normal force. [kip]

    Returns
    -------
    u_N : ratio of the normal force. []

    >>> ratio_normal.bare(50.0, 200.0)
    0.25
    """
    u_N = F_w / N_av
    return u_N


@formula("statics")
def ratio_shear(V_e, V_av):
    """Share of the edge's available strength that the shear along it uses.

    Parameters
    ----------
    V_e : shear along the edge. [kip]
    V_av : available strength of the edge in shear. [kip]

    Returns
    -------
    u_V : ratio of the shear. []

    >>> ratio_shear.bare(50.0, 100.0)
    0.5
    """
    u_V = V_e / V_av
    return u_V


@formula("published example, normal force and shear")
def interaction(u_N, u_V):
    """Normal force and shear on the edge together: at most 1.

    Parameters
    ----------
    u_N : ratio of the normal force. []
    u_V : ratio of the shear. []

    Returns
    -------
    I_e : sum of the interaction. []

    >>> interaction.bare(0.5, 0.5)
    0.3125
    """
    I_e = u_N**2 + u_V**4
    return I_e


@formula("published example, normal force and shear")
def load_at_interaction(P_br, u_N, u_V):
    """Load of the brace at which the interaction of its edge becomes 1, all forces growing with it; factors are within the ratios.

    Parameters
    ----------
    P_br : required load of the brace. [kip]
    u_N : ratio of the normal force. []
    u_V : ratio of the shear. []

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> round(load_at_interaction.bare(100.0, 0.0, 0.5), 6), round(load_at_interaction.bare(100.0, 0.5, 0.0), 6)
    (200.0, 200.0)
    """
    q_e = u_N**2 + sqrt(u_N**4 + 4 * u_V**4)
    R_n = P_br * sqrt(2 / q_e)
    return R_n


@formula("common practice, published study of 2006")
def mean_length(L_1, L_2, L_3):
    """Mean length from the Whitmore width to the supported edge.

    Parameters
    ----------
    L_1 : length on the axis of the brace. [in]
    L_2 : length at one end of the Whitmore width. [in]
    L_3 : length at its other end. [in]

    Returns
    -------
    L_b : length considered for buckling. [in]

    >>> mean_length.bare(9.0, 6.0, 3.0)
    6.0
    """
    L_b = (L_1 + L_2 + L_3) / 3
    return L_b


@formula("published study of 2006, from memory")
def compact_thickness(F_y, c_g, E, L_1):
    """Thickness from which a corner gusset counts as compact and yields before it buckles.

    Parameters
    ----------
    F_y : specified minimum yield stress. [ksi]
    c_g : corner of the brace's connection to the adjacent supported edge, the lesser of both sides. [in]
    E : modulus of elasticity. [ksi]
    L_1 : length on the axis of the brace. [in]

    Returns
    -------
    t_c : thickness from which the gusset is compact. [in]

    >>> round(compact_thickness.bare(50.0, 4.0, 29000.0, 8.0), 3)
    0.176
    """
    t_c = 1.5 * sqrt(F_y * c_g**3 / (E * L_1))
    return t_c


@formula("practice of seismic and bridge guides, advisory")
def free_edge_limit(t, E, F_y):
    """Length of a free edge up to which it needs no stiffener.

    Parameters
    ----------
    t : thickness. [in]
    E : modulus of elasticity. [ksi]
    F_y : specified minimum yield stress. [ksi]

    Returns
    -------
    l_fg : advisory length of a free edge. [in]

    >>> round(free_edge_limit.bare(0.5, 29000.0, 50.0), 2)
    9.03
    """
    l_fg = 0.75 * t * sqrt(E / F_y)
    return l_fg


@formula("geometry")
def area_along_brace_welds(l_w, t):
    """Area of the gusset along the two outer lines of the brace's welds.

    Parameters
    ----------
    l_w : length of one weld line. [in]
    t : thickness. [in]

    Returns
    -------
    A_gv : gross area subject to shear. [in²]

    >>> area_along_brace_welds.bare(8.0, 0.5)
    8.0
    """
    A_gv = 2 * l_w * t
    return A_gv


@formula("geometry")
def area_between_brace_welds(g, t):
    """Area of the gusset across the end of the brace's welds.

    Parameters
    ----------
    g : weld lines apart. [in]
    t : thickness. [in]

    Returns
    -------
    A_nt : net area subject to tension. [in²]

    >>> area_between_brace_welds.bare(4.0, 0.5)
    2.0
    """
    A_nt = g * t
    return A_nt


@formula("Eq. J10-4")
def web_crippling(t, l_b, d, t_f, E, F_y):
    """Nominal strength of a web against crippling under a compressive force, at least half the depth from the member's end.

    Parameters
    ----------
    t : thickness of the web. [in]
    l_b : length over which the load enters. [in]
    d : full nominal depth of the section. [in]
    t_f : thickness of the flange. [in]
    E : modulus of elasticity. [ksi]
    F_y : specified minimum yield stress of the web. [ksi]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> round(web_crippling.bare(0.5, 0.0, 20.0, 0.5, 29000.0, 50.0), 1)
    240.8
    """
    c_k = 1 + 3 * (l_b / d) * (t / t_f)**1.5
    R_n = 0.80 * t**2 * c_k * sqrt(E * F_y * t_f / t)
    return R_n


@formula("Eq. J10-5a")
def web_crippling_near_end_short(t, l_b, d, t_f, E, F_y):
    """Nominal strength of a web against crippling near the member's end, the force over at most a fifth of the depth.

    Parameters
    ----------
    t : thickness of the web. [in]
    l_b : length over which the load enters. [in]
    d : full nominal depth of the section. [in]
    t_f : thickness of the flange. [in]
    E : modulus of elasticity. [ksi]
    F_y : specified minimum yield stress of the web. [ksi]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> round(web_crippling_near_end_short.bare(0.5, 0.0, 20.0, 0.5, 29000.0, 50.0), 1)
    120.4
    """
    c_k = 1 + 3 * (l_b / d) * (t / t_f)**1.5
    R_n = 0.40 * t**2 * c_k * sqrt(E * F_y * t_f / t)
    return R_n


@formula("Eq. J10-5b")
def web_crippling_near_end(t, l_b, d, t_f, E, F_y):
    """Nominal strength of a web against crippling near the member's end, the force over more than a fifth of the depth.

    Parameters
    ----------
    t : thickness of the web. [in]
    l_b : length over which the load enters. [in]
    d : full nominal depth of the section. [in]
    t_f : thickness of the flange. [in]
    E : modulus of elasticity. [ksi]
    F_y : specified minimum yield stress of the web. [ksi]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> round(web_crippling_near_end.bare(0.5, 10.0, 20.0, 0.5, 29000.0, 50.0), 1)
    337.2
    """
    c_k = 1 + (4 * l_b / d - 0.2) * (t / t_f)**1.5
    R_n = 0.40 * t**2 * c_k * sqrt(E * F_y * t_f / t)
    return R_n
