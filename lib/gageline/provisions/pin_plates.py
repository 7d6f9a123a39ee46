"""Pin-connected plates and eyebars: strength and dimensional rules.  [AISC360] D5, D6."""

from ..formula import formula


@formula("D5.2, geometry")
def edge_width(w, d_h):
    """Distance from the edge of a pin hole, centred in the width, to the side of the plate.

    Parameters
    ----------
    w : width of the plate at the pin, or diameter of the head. [in]
    d_h : diameter of the pin hole. [in]

    Returns
    -------
    b_p : edge of the pin hole to the side of the plate. [in]

    >>> edge_width.bare(4.25, 1.25)
    1.5
    """
    b_p = (w - d_h) / 2
    return b_p


@formula("D5.1")
def effective_edge_width(t, b_0, b_p):
    """Width beside the hole that counts in tensile rupture, not more than what is there.

    Parameters
    ----------
    t : thickness. [in]
    b_0 : constant, 0.63 in. [in]
    b_p : edge of the pin hole to the side of the plate. [in]

    Returns
    -------
    b_e : effective width beside the hole. [in]

    >>> effective_edge_width.bare(0.5, 0.63, 1.75)
    1.63
    """
    b_e = min(2 * t + b_0, b_p)
    return b_e


@formula("Eq. D5-1")
def tensile_rupture(F_u, t, b_e):
    """Nominal strength of a pin-connected plate when it ruptures beside the hole.

    Parameters
    ----------
    F_u : specified minimum tensile strength. [ksi]
    t : thickness. [in]
    b_e : effective width beside the hole. [in]

    Returns
    -------
    P_n : nominal axial strength. [kip]

    >>> tensile_rupture.bare(65.0, 0.5, 1.6)
    104.0
    """
    P_n = F_u * (2 * t * b_e)
    return P_n


@formula("D5.1(b)")
def shear_path_area(t, a_p, d_p):
    """Area on the shear failure path, from the pin to the end of the plate on both sides.

    Parameters
    ----------
    t : thickness. [in]
    a_p : edge of the pin hole to the end of the plate, along the force. [in]
    d_p : diameter of the pin. [in]

    Returns
    -------
    A_sf : area on the shear failure path. [in²]

    >>> shear_path_area.bare(0.5, 2.25, 1.0)
    2.75
    """
    A_sf = 2 * t * (a_p + d_p / 2)
    return A_sf


@formula({"360-16": "not in 360-16", "360-22": "Eq. D5-2"})
def shear_rupture(C_r, F_u, A_sf):
    """Nominal strength of a pin-connected plate when the pin shears out of its end; 360-22.

    Parameters
    ----------
    C_r : reduction factor for the clearance of the hole. []
    F_u : specified minimum tensile strength. [ksi]
    A_sf : area on the shear failure path. [in²]

    Returns
    -------
    P_n : nominal axial strength. [kip]

    >>> shear_rupture.bare(1.0, 65.0, 2.75)
    107.25
    """
    P_n = 0.60 * C_r * F_u * A_sf
    return P_n


@formula({"360-16": "Eq. D5-2", "360-22": "Eq. D5-2 with 1.0 for the clearance"})
def shear_rupture_2016(F_u, A_sf):
    """Nominal strength of a pin-connected plate when the pin shears out of its end; 360-16.

    Parameters
    ----------
    F_u : specified minimum tensile strength. [ksi]
    A_sf : area on the shear failure path. [in²]

    Returns
    -------
    P_n : nominal axial strength. [kip]

    >>> shear_rupture_2016.bare(65.0, 2.75)
    107.25
    """
    P_n = 0.60 * F_u * A_sf
    return P_n


@formula({"360-16": "not in 360-16", "360-22": "D5.1(b)"})
def close_hole():
    """Reduction factor for a hole not more than 1/32 in. larger than its pin.

    Returns
    -------
    C_r : reduction factor for the clearance of the hole. []

    >>> close_hole.bare()
    1.0
    """
    C_r = 1.0
    return C_r


@formula({"360-16": "not in 360-16", "360-22": "D5.1(b)"})
def loose_hole():
    """Reduction factor for a hole more than 1/32 in. and not more than 1/16 in. larger than its pin.

    Returns
    -------
    C_r : reduction factor for the clearance of the hole. []

    >>> loose_hole.bare()
    0.95
    """
    C_r = 0.95
    return C_r


@formula("statics")
def like_plates(n_j, P_n):
    """Strength of like plates that share the load.

    Parameters
    ----------
    n_j : number of plates. []
    P_n : nominal axial strength of one. [kip]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> like_plates.bare(2, 100.0)
    200.0
    """
    R_n = n_j * P_n
    return R_n


@formula("D5.2")
def least_width(b_e, d_p):
    """Least width of a pin-connected plate at the pin.

    Parameters
    ----------
    b_e : effective width beside the hole. [in]
    d_p : diameter of the pin. [in]

    Returns
    -------
    w_req : least width at the pin. [in]

    >>> least_width.bare(1.5, 1.0)
    4.0
    """
    w_req = 2 * b_e + d_p
    return w_req


@formula("D5.2")
def least_edge(b_e):
    """Least distance from the edge of the pin hole to the end of the plate, along the force.

    Parameters
    ----------
    b_e : effective width beside the hole. [in]

    Returns
    -------
    a_req : least edge distance of the pin hole. [in]

    >>> least_edge.bare(2.0)
    2.66
    """
    a_req = 1.33 * b_e
    return a_req


@formula("D5.2, geometry")
def edge_at_cut_corner(a_p, d_h, w, c_p):
    """Distance from the edge of the pin hole to a corner cut at 45 degrees, square to the cut.

    Parameters
    ----------
    a_p : edge of the pin hole to the end of the plate, along the force. [in]
    d_h : diameter of the pin hole. [in]
    w : width of the plate at the pin. [in]
    c_p : leg of the cut corner. [in]

    Returns
    -------
    a_45 : edge of the pin hole to the cut corner. [in]

    >>> round(edge_at_cut_corner.bare(2.0, 1.0, 5.0, 1.0), 4)
    2.3284
    """
    a_45 = (a_p + d_h / 2 + w / 2 - c_p) / sqrt(2) - d_h / 2
    return a_45


@formula("D5.2, D6.2")
def largest_hole(d_p, delta_p):
    """Greatest diameter of a pin hole.

    Parameters
    ----------
    d_p : diameter of the pin. [in]
    delta_p : greatest clearance of the pin in its hole. [in]

    Returns
    -------
    d_hmax : greatest diameter of the pin hole. [in]

    >>> largest_hole.bare(2.0, 0.0625)
    2.0625
    """
    d_hmax = d_p + delta_p
    return d_hmax


@formula("D6.1")
def eyebar_body_area(w, t):
    """Gross area of an eyebar's body, of a width that counts up to eight times the thickness.

    Parameters
    ----------
    w : width of the body. [in]
    t : thickness. [in]

    Returns
    -------
    A_g : gross area of the body. [in²]

    >>> eyebar_body_area.bare(3.0, 0.625)
    1.875
    """
    w_b = min(w, 8 * t)
    A_g = w_b * t
    return A_g


@formula("D6.2")
def least_eyebar_pin(w):
    """Least diameter of the pin of an eyebar.

    Parameters
    ----------
    w : width of the body. [in]

    Returns
    -------
    d_pmin : least diameter of the pin. [in]

    >>> least_eyebar_pin.bare(4.0)
    3.5
    """
    d_pmin = 7 / 8 * w
    return d_pmin


@formula("D6.2")
def least_head(w):
    """Width beside the pin hole of an eyebar that must be exceeded.

    Parameters
    ----------
    w : width of the body. [in]

    Returns
    -------
    b_min : least width beside the hole. [in]

    >>> least_head.bare(3.0)
    2.0
    """
    b_min = 2 / 3 * w
    return b_min


@formula("D6.2")
def useful_head(w):
    """Greatest width beside the pin hole of an eyebar that counts in calculation.

    Parameters
    ----------
    w : width of the body. [in]

    Returns
    -------
    b_max : greatest width beside the hole that counts. [in]

    >>> useful_head.bare(3.0)
    2.25
    """
    b_max = 3 / 4 * w
    return b_max


@formula("D6.2")
def largest_hole_of_strong_steel(t):
    """Greatest diameter of a pin hole in an eyebar of more than 70 ksi yield stress.

    Parameters
    ----------
    t : thickness. [in]

    Returns
    -------
    d_hmax : greatest diameter of the pin hole. [in]

    >>> largest_hole_of_strong_steel.bare(0.625)
    3.125
    """
    d_hmax = 5 * t
    return d_hmax
