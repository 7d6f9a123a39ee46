"""The pin of a pin connection: bearing, shear and bending.  [AISC360] F11, J4.2, J7, Table J3.2."""

from ..formula import formula


@formula("Eq. J7-1")
def bearing_on_pin(F_y, n_j, d_p, t):
    """Nominal strength of a pin and one ply in bearing on each other.

    Parameters
    ----------
    F_y : smaller yield stress of pin and ply. [ksi]
    n_j : number of like plies. []
    d_p : diameter of the pin. [in]
    t : thickness of one. [in]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> bearing_on_pin.bare(50.0, 1, 1.0, 0.5)
    45.0
    """
    A_pb = n_j * d_p * t
    R_n = 1.8 * F_y * A_pb
    return R_n


@formula("geometry")
def pin_area(d_p):
    """Area of the pin.

    Parameters
    ----------
    d_p : diameter of the pin. [in]

    Returns
    -------
    A_p : area of the pin. [in²]

    >>> round(pin_area.bare(1.0), 4)
    0.7854
    """
    A_p = pi * d_p**2 / 4
    return A_p


@formula("J4.2(a), by analogy")
def pin_shear_yielding(F_y, n_v, A_p):
    """Nominal strength of the pin when its shear planes yield.

    Parameters
    ----------
    F_y : specified minimum yield stress. [ksi]
    n_v : number of shear planes. []
    A_p : area of the pin. [in²]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> pin_shear_yielding.bare(50.0, 2, 3.0)
    180.0
    """
    R_n = 0.60 * F_y * n_v * A_p
    return R_n


@formula("Table J3.2, by analogy")
def pin_shear_rupture(F_u, n_v, A_p):
    """Nominal strength of the pin in shear, taken as a threaded part with no threads in the shear planes.

    Parameters
    ----------
    F_u : specified minimum tensile strength. [ksi]
    n_v : number of shear planes. []
    A_p : area of the pin. [in²]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> round(pin_shear_rupture.bare(60.0, 2, 3.0), 2)
    202.68
    """
    R_n = 0.563 * F_u * n_v * A_p
    return R_n


@formula("statics")
def pin_arm(t_s, g_p, t_m):
    """Arm of half the load at the middle of the pin, outer plies loading it at their middle, the inner one evenly.

    Parameters
    ----------
    t_s : thickness of one outer ply. [in]
    g_p : gap between an outer and the inner ply. [in]
    t_m : thickness of the inner ply. [in]

    Returns
    -------
    e_p : arm of half the load in the pin. [in]

    >>> pin_arm.bare(0.5, 0.0625, 1.0)
    0.5625
    """
    e_p = t_s / 2 + g_p + t_m / 4
    return e_p


@formula("geometry")
def plastic_modulus_of_pin(d_p):
    """Plastic section modulus of the pin.

    Parameters
    ----------
    d_p : diameter of the pin. [in]

    Returns
    -------
    Z_p : plastic section modulus of the pin. [in³]

    >>> plastic_modulus_of_pin.bare(3.0)
    4.5
    """
    Z_p = d_p**3 / 6
    return Z_p


@formula("geometry")
def elastic_modulus_of_pin(d_p):
    """Elastic section modulus of the pin.

    Parameters
    ----------
    d_p : diameter of the pin. [in]

    Returns
    -------
    S_p : elastic section modulus of the pin. [in³]

    >>> round(elastic_modulus_of_pin.bare(2.0), 4)
    0.7854
    """
    S_p = pi * d_p**3 / 32
    return S_p


@formula("Eq. F11-1, statics")
def pin_bending(F_y, Z_p, S_p, e_p):
    """Nominal strength, as load on the connection, when the pin reaches its strength in bending.

    Parameters
    ----------
    F_y : specified minimum yield stress. [ksi]
    Z_p : plastic section modulus of the pin. [in³]
    S_p : elastic section modulus of the pin. [in³]
    e_p : arm of half the load in the pin. [in]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> pin_bending.bare(50.0, 2.0, 1.0, 1.0)
    160.0
    """
    M_n = min(F_y * Z_p, 1.6 * F_y * S_p)
    R_n = 2 * M_n / e_p
    return R_n
