"""Fatigue: stress range of the live load against the allowable range of a detail category.  [AISC360] Appendix 3."""

from ..formula import formula


@formula("Appendix 3.2")
def stress_range(P_SR, A_SR):
    """Elastic stress range, without stress concentration: the detail category stands for it.

    Parameters
    ----------
    P_SR : range of the force by live load at service level. [kip]
    A_SR : area that the stress range is figured on. [in²]

    Returns
    -------
    f_SR : stress range. [ksi]

    >>> stress_range.bare(40.0, 5.0)
    8.0
    """
    f_SR = P_SR / A_SR
    return f_SR


@formula("Appendix 3.3(a)")
def allowable_range(F_1000, C_f, n_SR, F_TH):
    """Allowable stress range of base metal, welds and threads, categories A to E' and G.

    Parameters
    ----------
    F_1000 : stress that the equation is written for, 1000 ksi. [ksi]
    C_f : constant of the detail category. []
    n_SR : cycles of the stress range in the design life. []
    F_TH : threshold of the detail category. [ksi]

    Returns
    -------
    F_SR : allowable stress range. [ksi]

    >>> round(allowable_range.bare(1000.0, 12.0, 2e6, 16.0), 2), allowable_range.bare(1000.0, 12.0, 1e7, 16.0)
    (18.24, 16.0)
    """
    F_SR = max(F_1000 * (C_f / n_SR)**0.333, F_TH)
    return F_SR


@formula("Appendix 3.3(b)")
def allowable_range_of_throat(F_100, C_f, n_SR, F_TH):
    """Allowable stress range of shear on the throat of a weld, category F.

    Parameters
    ----------
    F_100 : stress that the equation of category F is written for, 100 ksi. [ksi]
    C_f : constant of the detail category. []
    n_SR : cycles of the stress range in the design life. []
    F_TH : threshold of the detail category. [ksi]

    Returns
    -------
    F_SR : allowable stress range. [ksi]

    >>> round(allowable_range_of_throat.bare(100.0, 1.5, 5e5, 8.0), 2)
    11.96
    """
    F_SR = max(F_100 * (C_f / n_SR)**0.167, F_TH)
    return F_SR


@formula("Appendix 3.3(c)")
def reduction_of_transverse_fillets(w_f, t_l, t_ref):
    """Reduction of the allowable range of a plate joined at its end by transverse fillets on both faces.

    Parameters
    ----------
    w_f : leg of the fillets. [in]
    t_l : thickness of the plate loaded. [in]
    t_ref : thickness that the equation is written for, 1 in. [in]

    Returns
    -------
    R_FIL : reduction for the root of transverse fillets. []

    >>> round(reduction_of_transverse_fillets.bare(0.25, 0.5, 1.0), 4)
    0.4715
    """
    R_FIL = min((0.06 + 0.72 * w_f / t_l) / (t_l / t_ref)**0.167, 1)
    return R_FIL


@formula("Appendix 3.3(c)")
def allowable_range_at_root(R_FIL, F_1000, C_f, n_SR):
    """Allowable stress range of a plate joined by transverse fillets on both faces, crack from the root; there is no threshold.

    Parameters
    ----------
    R_FIL : reduction for the root of transverse fillets. []
    F_1000 : stress that the equation is written for, 1000 ksi. [ksi]
    C_f : constant of the detail category, 4.4. []
    n_SR : cycles of the stress range in the design life. []

    Returns
    -------
    F_SR : allowable stress range. [ksi]

    >>> round(allowable_range_at_root.bare(0.4715, 1000.0, 4.4, 2e6), 2)
    6.16
    """
    F_SR = R_FIL * F_1000 * (C_f / n_SR)**0.333
    return F_SR


@formula("Appendix 3.4")
def share_of_pretensioned_bolts(P_SR, T_q, T_qt):
    """Range of force in pretensioned bolts: one fifth of the cyclic load with its prying.

    Parameters
    ----------
    P_SR : range of the force by live load at service level. [kip]
    T_q : required tension of one bolt, prying not included. [kip]
    T_qt : required tension of one bolt, prying included. [kip]

    Returns
    -------
    P_SRb : range of the force in the part considered. [kip]

    >>> share_of_pretensioned_bolts.bare(50.0, 20.0, 25.0)
    12.5
    """
    P_SRb = 0.20 * P_SR * T_qt / T_q
    return P_SRb


@formula("Appendix 3.4")
def thread_areas(n_b, A_ts):
    """Net tensile area of all threads that share the force.

    Parameters
    ----------
    n_b : number of bolts alike. []
    A_ts : tensile stress area of one thread. [in²]

    Returns
    -------
    A_SR : area that the stress range is figured on. [in²]

    >>> thread_areas.bare(4, 0.5)
    2.0
    """
    A_SR = n_b * A_ts
    return A_SR


@formula("Appendix 3.1")
def peak_stress(P_max, A_SR):
    """Largest stress at service load.

    Parameters
    ----------
    P_max : largest tension at service load. [kip]
    A_SR : area that the stress range is figured on. [in²]

    Returns
    -------
    f_max : largest stress at service load. [ksi]

    >>> peak_stress.bare(60.0, 3.0)
    20.0
    """
    f_max = P_max / A_SR
    return f_max


@formula("Appendix 3.1")
def peak_limit(F_y):
    """Limit of the largest stress at service load under which the appendix holds.

    Parameters
    ----------
    F_y : specified minimum yield stress. [ksi]

    Returns
    -------
    F_max : limit of the largest stress at service load. [ksi]

    >>> peak_limit.bare(50.0)
    33.0
    """
    F_max = 0.66 * F_y
    return F_max


@formula("Appendix 3.4")
def thread_area(d_r, n_t):
    """Net tensile area of an inch thread.

    Parameters
    ----------
    d_r : nominal diameter of the thread. [in]
    n_t : threads per inch. [1/in]

    Returns
    -------
    A_ts : tensile stress area of the thread. [in²]

    >>> round(thread_area.bare(0.75, 10), 4)
    0.3345
    """
    A_ts = pi / 4 * (d_r - 0.9743 / n_t)**2
    return A_ts


@formula("Appendix 3.4")
def thread_area_metric(d_r, n_t):
    """Net tensile area of a metric thread.

    Parameters
    ----------
    d_r : nominal diameter of the thread. [in]
    n_t : threads per inch, 25.4 mm over the pitch. [1/in]

    Returns
    -------
    A_ts : tensile stress area of the thread. [in²]

    >>> round(thread_area_metric.bare(20 / 25.4, 25.4 / 2.5) * 25.4**2, 1)
    244.8
    """
    A_ts = pi / 4 * (d_r - 0.9382 / n_t)**2
    return A_ts


@formula("Table A-3.1, 2.4")
def net_area_at_pin(n_j, w, d_h, t):
    """Net area of pin plates or heads of eyebars across the pin hole.

    Parameters
    ----------
    n_j : number of like plates. []
    w : width at the pin, or diameter of the head. [in]
    d_h : diameter of the pin hole. [in]
    t : thickness of one. [in]

    Returns
    -------
    A_SR : area that the stress range is figured on. [in²]

    >>> net_area_at_pin.bare(2, 5.0, 2.0, 0.5)
    3.0
    """
    A_SR = n_j * (w - d_h) * t
    return A_SR


@formula("statics, load shared by areas")
def share_of_range(xi_g, P_SR):
    """Share of a range of force that goes through a part of the section.

    Parameters
    ----------
    xi_g : share of the member's load carried by the group. []
    P_SR : range of the force by live load at service level. [kip]

    Returns
    -------
    P_SRb : range of the force in the part considered. [kip]

    >>> share_of_range.bare(0.75, 40.0)
    30.0
    """
    P_SRb = xi_g * P_SR
    return P_SRb
