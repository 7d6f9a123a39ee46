"""Threaded hanger rods: thread, body, elongation, and nut, washer and plate at the ends.  [AISC360] D2, F11, J3, J7."""

from ..formula import formula


@formula("Table J3.2")
def thread_area(d_r):
    """Area on the major diameter of the thread.

    Parameters
    ----------
    d_r : nominal diameter of the thread. [in]

    Returns
    -------
    A_D : area on the major diameter of the thread. [in²]

    >>> round(thread_area.bare(0.75), 4)
    0.4418
    """
    A_D = pi * d_r**2 / 4
    return A_D


@formula({"360-16": "J3.6, Table J3.2", "360-22": "J3.7, Table J3.2"})
def thread_rupture(F_u, A_D):
    """Nominal strength of a rod's thread in tension, 0.75 of the tensile strength on the area of the major diameter.

    Parameters
    ----------
    F_u : specified minimum tensile strength. [ksi]
    A_D : area on the major diameter of the thread. [in²]

    Returns
    -------
    P_n : nominal axial strength. [kip]

    >>> thread_rupture.bare(60.0, 2.0)
    90.0
    """
    P_n = 0.75 * F_u * A_D
    return P_n


@formula({"360-16": "not in 360-16", "360-22": "J3.7, Table J3.2"})
def tensile_stress_area(d_r, n_t):
    """Tensile stress area of an inch thread.

    Parameters
    ----------
    d_r : nominal diameter of the thread. [in]
    n_t : threads per inch. [1/in]

    Returns
    -------
    A_ts : tensile stress area of the thread. [in²]

    >>> round(tensile_stress_area.bare(0.75, 10), 4)
    0.3345
    """
    A_ts = pi / 4 * (d_r - 0.9743 / n_t)**2
    return A_ts


@formula({"360-16": "not in 360-16", "360-22": "J3.7, Table J3.2"})
def tensile_stress_area_metric(d_r, n_t):
    """Tensile stress area of a metric thread.

    Parameters
    ----------
    d_r : nominal diameter of the thread. [in]
    n_t : threads per inch, 25.4 mm over the pitch. [1/in]

    Returns
    -------
    A_ts : tensile stress area of the thread. [in²]

    >>> round(tensile_stress_area_metric.bare(20 / 25.4, 25.4 / 2.5) * 25.4**2, 1)
    244.8
    """
    A_ts = pi / 4 * (d_r - 0.9382 / n_t)**2
    return A_ts


@formula({"360-16": "not in 360-16", "360-22": "J3.7, Table J3.2"})
def thread_rupture_on_stress_area(F_u, A_ts):
    """Nominal strength of the thread of a rod in tension on its tensile stress area, permitted by 360-22.

    Parameters
    ----------
    F_u : specified minimum tensile strength. [ksi]
    A_ts : tensile stress area of the thread. [in²]

    Returns
    -------
    P_n : nominal axial strength. [kip]

    >>> thread_rupture_on_stress_area.bare(60.0, 2.0)
    120.0
    """
    P_n = F_u * A_ts
    return P_n


@formula("geometry")
def body_area(d_y):
    """Gross area of the rod's body.

    Parameters
    ----------
    d_y : diameter of the body. [in]

    Returns
    -------
    A_g : gross area of the body. [in²]

    >>> round(body_area.bare(1.0), 4)
    0.7854
    """
    A_g = pi * d_y**2 / 4
    return A_g


@formula("statics")
def elongation(P_s, L_r, E, A_g):
    """Elongation of the rod at service load.

    Parameters
    ----------
    P_s : tension at service load. [kip]
    L_r : length of the rod. [in]
    E : modulus of elasticity, 29000 ksi. [ksi]
    A_g : gross area of the body. [in²]

    Returns
    -------
    Delta_r : elongation of the rod. [in]

    >>> elongation.bare(29.0, 200.0, 29000.0, 2.0)
    0.1
    """
    Delta_r = P_s * L_r / (E * A_g)
    return Delta_r


@formula("geometry")
def nut_contact(w_n, d_h):
    """Contact area of a nut, round of the width across its flats, round the hole under it.

    Parameters
    ----------
    w_n : width of the nut across flats. [in]
    d_h : diameter of the hole. [in]

    Returns
    -------
    A_pb : bearing area. [in²]

    >>> round(nut_contact.bare(2.0, 1.0), 4)
    2.3562
    """
    A_pb = pi / 4 * (w_n**2 - d_h**2)
    return A_pb


@formula("geometry")
def washer_contact(w_w, d_h):
    """Contact area of a square plate washer round the hole under it.

    Parameters
    ----------
    w_w : width of the plate washer. [in]
    d_h : diameter of the hole. [in]

    Returns
    -------
    A_pb : bearing area. [in²]

    >>> round(washer_contact.bare(3.0, 2.0), 4)
    5.8584
    """
    A_pb = w_w**2 - pi / 4 * d_h**2
    return A_pb


@formula("Eq. J7-1")
def bearing_under_nut(F_y, A_pb):
    """Nominal strength in bearing under a nut or a washer.

    Parameters
    ----------
    F_y : smaller yield stress of the parts in contact. [ksi]
    A_pb : bearing area. [in²]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> bearing_under_nut.bare(50.0, 2.0)
    180.0
    """
    R_n = 1.8 * F_y * A_pb
    return R_n


@formula("F11, statics")
def washer_bending(F_y, t, w_w, w_n, A_pb):
    """Nominal strength, as load on the rod, when a square plate washer yields along the nut's flat.

    Parameters
    ----------
    F_y : specified minimum yield stress. [ksi]
    t : thickness of the washer. [in]
    w_w : width of the plate washer. [in]
    w_n : width of the nut across flats. [in]
    A_pb : bearing area. [in²]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> washer_bending.bare(36.0, 0.5, 3.0, 2.0, 8.0)
    144.0
    """
    c_w = (w_w - w_n) / 2
    R_n = F_y * t**2 / (2 * c_w**2) * A_pb
    return R_n


@formula("F11, statics")
def plate_bending(F_y, w, d_h, t, L_s):
    """Nominal strength, as load on the rod, when the plate under the nut bends between its two supports.

    Parameters
    ----------
    F_y : specified minimum yield stress. [ksi]
    w : width of the plate. [in]
    d_h : diameter of the hole. [in]
    t : thickness of the plate. [in]
    L_s : span of the plate. [in]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> plate_bending.bare(36.0, 5.0, 1.0, 1.0, 6.0)
    24.0
    """
    Z_t = (w - d_h) * t**2 / 4
    M_n = F_y * Z_t
    R_n = 4 * M_n / L_s
    return R_n
