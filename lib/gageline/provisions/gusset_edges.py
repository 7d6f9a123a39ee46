"""The edge of a gusset against its support: forces per length by the elastic method, strengths referred to the brace's load."""

from ..formula import formula


@formula("geometry")
def edge_area(L_g, t):
    """Area of the gusset along its edge.

    Parameters
    ----------
    L_g : length of the gusset's edge. [in]
    t : thickness. [in]

    Returns
    -------
    A_gv : gross area subject to shear. [in²]

    >>> edge_area.bare(20.0, 0.5)
    10.0
    """
    A_gv = L_g * t
    return A_gv


@formula("statics")
def referred_to_brace(P_br, Q_e, F_w):
    """Strength of the edge, referred to the load of the brace.

    Parameters
    ----------
    P_br : required load of the brace. [kip]
    Q_e : nominal strength of the edge, for the force on it. [kip]
    F_w : force on the edge that is compared with its strength. [kip]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> referred_to_brace.bare(100.0, 150.0, 50.0)
    300.0
    """
    R_n = P_br * Q_e / F_w
    return R_n


@formula("statics")
def equivalent_normal_force(N_e, M_e, L_g):
    """Normal force that stresses the whole edge as force and moment together stress its worst end, elastically.

    Parameters
    ----------
    N_e : force normal to the edge. [kip]
    M_e : moment on the edge. [kip·in]
    L_g : length of the gusset's edge. [in]

    Returns
    -------
    F_w : force on the edge that is compared with its strength. [kip]

    >>> equivalent_normal_force.bare(50.0, 100.0, 20.0)
    80.0
    """
    F_w = N_e + 6 * M_e / L_g
    return F_w


@formula("statics, elastic method")
def force_along(V_e, L_g):
    """Force per length along the edge.

    Parameters
    ----------
    V_e : shear along the edge. [kip]
    L_g : length of the gusset's edge. [in]

    Returns
    -------
    f_v : force per length along the edge. [kip/in]

    >>> round(force_along.bare(440.0, 31.5), 1)
    14.0
    """
    f_v = V_e / L_g
    return f_v


@formula("statics, elastic method")
def force_normal(N_e, L_g):
    """Force per length normal to the edge, from the normal force.

    Parameters
    ----------
    N_e : force normal to the edge. [kip]
    L_g : length of the gusset's edge. [in]

    Returns
    -------
    f_a : force per length normal to the edge, from the normal force. [kip/in]

    >>> round(force_normal.bare(269.0, 31.5), 2)
    8.54
    """
    f_a = N_e / L_g
    return f_a


@formula("statics, elastic method")
def force_of_moment(M_e, L_g):
    """Greatest force per length normal to the edge, from the moment.

    Parameters
    ----------
    M_e : moment on the edge. [kip·in]
    L_g : length of the gusset's edge. [in]

    Returns
    -------
    f_b : force per length normal to the edge, from the moment. [kip/in]

    >>> force_of_moment.bare(100.0, 10.0)
    6.0
    """
    f_b = 6 * M_e / L_g**2
    return f_b


@formula("statics, elastic method")
def peak_force(f_v, f_a, f_b):
    """Force per length at the end of the edge where normal force and moment add.

    Parameters
    ----------
    f_v : force per length along the edge. [kip/in]
    f_a : force per length normal to the edge, from the normal force. [kip/in]
    f_b : force per length normal to the edge, from the moment. [kip/in]

    Returns
    -------
    f_p : greatest force per length of the edge. [kip/in]

    >>> peak_force.bare(3.0, 3.0, 1.0)
    5.0
    """
    f_p = sqrt(f_v**2 + (f_a + f_b)**2)
    return f_p


@formula("statics, elastic method")
def least_force(f_v, f_a, f_b):
    """Force per length at the end of the edge where the moment takes from the normal force.

    Parameters
    ----------
    f_v : force per length along the edge. [kip/in]
    f_a : force per length normal to the edge, from the normal force. [kip/in]
    f_b : force per length normal to the edge, from the moment. [kip/in]

    Returns
    -------
    f_l : force per length at the other end of the edge. [kip/in]

    >>> least_force.bare(3.0, 5.0, 1.0)
    5.0
    """
    f_l = sqrt(f_v**2 + (f_a - f_b)**2)
    return f_l


@formula("common practice, redistribution")
def redistributed_force(f_p, f_l):
    """Force per length a weld of a gusset's edge is made for: the peak, or 1.25 times the average where that is more.

    Parameters
    ----------
    f_p : greatest force per length of the edge. [kip/in]
    f_l : force per length at the other end of the edge. [kip/in]

    Returns
    -------
    f_w : force per length that the weld is made for. [kip/in]

    >>> redistributed_force.bare(10.0, 8.0)
    11.25
    """
    f_avg = (f_p + f_l) / 2
    f_w = max(f_p, 1.25 * f_avg)
    return f_w


@formula("statics, elastic method")
def force_without_redistribution(f_p):
    """Force per length a weld of a gusset's edge is made for, without allowance for redistribution: the peak.

    Parameters
    ----------
    f_p : greatest force per length of the edge. [kip/in]

    Returns
    -------
    f_w : force per length that the weld is made for. [kip/in]

    >>> force_without_redistribution.bare(10.0)
    10.0
    """
    f_w = f_p
    return f_w


@formula("statics")
def whole_edge_force(f_w, L_g):
    """Force that loads the whole edge as the worst inch of it is loaded.

    Parameters
    ----------
    f_w : force per length that the weld is made for. [kip/in]
    L_g : length of the gusset's edge. [in]

    Returns
    -------
    F_w : force on the edge that is compared with its strength. [kip]

    >>> whole_edge_force.bare(10.0, 20.0)
    200.0
    """
    F_w = f_w * L_g
    return F_w


@formula("J2.4, Table J2.5")
def directional_factor_of_components(f_a, f_p):
    """Directional strength increase of the edge's weld, from the components of the force per length; without moment on the edge only.

    Parameters
    ----------
    f_a : force per length normal to the edge, from the normal force. [kip/in]
    f_p : greatest force per length of the edge. [kip/in]

    Returns
    -------
    k_ds : directional strength increase factor. []

    >>> round(directional_factor_of_components.bare(8.54, 16.4), 3)
    1.188
    """
    k_ds = 1.0 + 0.50 * (f_a / f_p)**1.5
    return k_ds
