"""Forces on the edges of a gusset: a corner by the Uniform Force Method, a single edge by statics."""

from ..formula import formula

_UFM = "statics, Uniform Force Method"


@formula(_UFM)
def ideal_alpha(e_b, beta_g, theta_br, e_c):
    """Distance of the beam edge's centroid from the column face at which no edge carries a moment.

    Parameters
    ----------
    e_b : half depth of the beam. [in]
    beta_g : beam face to the centroid of the column edge. [in]
    theta_br : angle between the brace and the column axis. [rad]
    e_c : half depth of the column, 0 at its web. [in]

    Returns
    -------
    alpha_g : column face to the centroid of the beam edge without moment. [in]

    >>> round(ideal_alpha.bare(8.0, 8.0, 0.7853981633974483, 6.0), 6)
    10.0
    """
    alpha_g = (e_b + beta_g) * tan(theta_br) - e_c
    return alpha_g


@formula(_UFM)
def ideal_beta(alpha_g, e_c, theta_br, e_b):
    """Distance of the column edge's centroid from the beam face at which no edge carries a moment.

    Parameters
    ----------
    alpha_g : column face to the centroid of the beam edge. [in]
    e_c : half depth of the column, 0 at its web. [in]
    theta_br : angle between the brace and the column axis. [rad]
    e_b : half depth of the beam. [in]

    Returns
    -------
    beta_g : beam face to the centroid of the column edge without moment. [in]

    >>> round(ideal_beta.bare(10.0, 6.0, 0.7853981633974483, 8.0), 6)
    8.0
    """
    beta_g = (alpha_g + e_c) / tan(theta_br) - e_b
    return beta_g


@formula(_UFM)
def force_radius(alpha_g, e_c, beta_g, e_b):
    """Length of the line whose components share the brace's load among the edges.

    Parameters
    ----------
    alpha_g : column face to the centroid of the beam edge. [in]
    e_c : half depth of the column. [in]
    beta_g : beam face to the centroid of the column edge. [in]
    e_b : half depth of the beam. [in]

    Returns
    -------
    r_g : radius of the Uniform Force Method. [in]

    >>> round(force_radius.bare(10.0, 6.0, 8.0, 8.0), 2)
    22.63
    """
    r_g = sqrt((alpha_g + e_c)**2 + (beta_g + e_b)**2)
    return r_g


@formula(_UFM)
def column_edge_shear(beta_g, r_g, P_br):
    """Vertical force on the edge against the column, along that edge.

    Parameters
    ----------
    beta_g : beam face to the centroid of the column edge. [in]
    r_g : radius of the Uniform Force Method. [in]
    P_br : required load of the brace. [kip]

    Returns
    -------
    V_c : vertical force on the column edge. [kip]

    >>> column_edge_shear.bare(12.0, 24.0, 100.0)
    50.0
    """
    V_c = beta_g / r_g * P_br
    return V_c


@formula(_UFM)
def column_edge_normal(e_c, r_g, P_br):
    """Horizontal force on the edge against the column, normal to that edge.

    Parameters
    ----------
    e_c : half depth of the column. [in]
    r_g : radius of the Uniform Force Method. [in]
    P_br : required load of the brace. [kip]

    Returns
    -------
    H_c : horizontal force on the column edge. [kip]

    >>> column_edge_normal.bare(6.0, 24.0, 100.0)
    25.0
    """
    H_c = e_c / r_g * P_br
    return H_c


@formula(_UFM)
def beam_edge_normal(e_b, r_g, P_br):
    """Vertical force on the edge against the beam, normal to that edge.

    Parameters
    ----------
    e_b : half depth of the beam. [in]
    r_g : radius of the Uniform Force Method. [in]
    P_br : required load of the brace. [kip]

    Returns
    -------
    V_b : vertical force on the beam edge. [kip]

    >>> beam_edge_normal.bare(6.0, 24.0, 100.0)
    25.0
    """
    V_b = e_b / r_g * P_br
    return V_b


@formula(_UFM)
def beam_edge_shear(alpha_g, r_g, P_br):
    """Horizontal force on the edge against the beam, along that edge.

    Parameters
    ----------
    alpha_g : column face to the centroid of the beam edge. [in]
    r_g : radius of the Uniform Force Method. [in]
    P_br : required load of the brace. [kip]

    Returns
    -------
    H_b : horizontal force on the beam edge. [kip]

    >>> beam_edge_shear.bare(12.0, 24.0, 100.0)
    50.0
    """
    H_b = alpha_g / r_g * P_br
    return H_b


@formula(_UFM)
def beam_edge_moment(V_b, alpha_g, alpha_c):
    """Moment on the beam edge, whose centroid does not lie where the Uniform Force Method wants it.

    Parameters
    ----------
    V_b : vertical force on the beam edge. [kip]
    alpha_g : column face to the centroid of the beam edge without moment. [in]
    alpha_c : column face to the centroid of the beam edge as built. [in]

    Returns
    -------
    M_e : moment on the edge. [kip·in]

    >>> beam_edge_moment.bare(30.0, 10.0, 12.0)
    60.0
    """
    M_e = V_b * max(alpha_g - alpha_c, alpha_c - alpha_g)
    return M_e


@formula(_UFM)
def column_edge_moment(H_c, beta_g, beta_c):
    """Moment on the column edge, whose centroid does not lie where the Uniform Force Method wants it.

    Parameters
    ----------
    H_c : horizontal force on the column edge. [kip]
    beta_g : beam face to the centroid of the column edge without moment. [in]
    beta_c : beam face to the centroid of the column edge as built. [in]

    Returns
    -------
    M_e : moment on the edge. [kip·in]

    >>> column_edge_moment.bare(30.0, 10.0, 12.0)
    60.0
    """
    M_e = H_c * max(beta_g - beta_c, beta_c - beta_g)
    return M_e


@formula("statics")
def single_edge_shear(P_br, theta_e):
    """Force along the only supported edge of a gusset.

    Parameters
    ----------
    P_br : required load of the brace. [kip]
    theta_e : angle between the brace and the edge. [rad]

    Returns
    -------
    V_e : shear along the edge. [kip]

    >>> round(single_edge_shear.bare(100.0, 1.0471975511965976), 6)
    50.0
    """
    V_e = P_br * cos(theta_e)
    return V_e


@formula("statics")
def single_edge_normal(P_br, theta_e):
    """Force normal to the only supported edge of a gusset.

    Parameters
    ----------
    P_br : required load of the brace. [kip]
    theta_e : angle between the brace and the edge. [rad]

    Returns
    -------
    N_e : force normal to the edge. [kip]

    >>> round(single_edge_normal.bare(100.0, 0.5235987755982988), 6)
    50.0
    """
    N_e = P_br * sin(theta_e)
    return N_e


@formula("statics")
def single_edge_moment(N_e, e_w):
    """Moment on the only supported edge of a gusset, about the centroid of its weld.

    Parameters
    ----------
    N_e : force normal to the edge. [kip]
    e_w : centroid of the edge to the point where the brace's axis meets it. [in]

    Returns
    -------
    M_e : moment on the edge. [kip·in]

    >>> single_edge_moment.bare(50.0, 2.0)
    100.0
    """
    M_e = N_e * e_w
    return M_e
