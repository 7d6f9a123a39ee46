"""The slotted end of HSS and pipe: area of the full wall, net section at the slot, walls along the welds.  [AISC360] B4.2, B4.3, J4.2."""

from ..formula import formula


@formula("geometry, B4.2")
def rectangular_area(H, B, t):
    """Area of a rectangular tube of another design wall than the tables': outside corners of radius 2t, inside corners t.

    Parameters
    ----------
    H : overall height. [in]
    B : overall width. [in]
    t : design wall. [in]

    Returns
    -------
    A_g : gross area. [in²]

    >>> round(rectangular_area.bare(6.0, 6.0, 0.375), 2)
    8.08
    """
    A_g = 2 * t * (H + B - 2 * t) - 3 * (4 - pi) * t**2
    return A_g


@formula("geometry, B4.2")
def round_area(D, t):
    """Area of a round tube of another design wall than the tables'.

    Parameters
    ----------
    D : outside diameter. [in]
    t : design wall. [in]

    Returns
    -------
    A_g : gross area. [in²]

    >>> round(round_area.bare(6.0, 0.5), 3)
    8.639
    """
    A_g = pi * (D - t) * t
    return A_g


@formula("geometry")
def slot_width(t_p, c_s):
    """Width of the slot.

    Parameters
    ----------
    t_p : thickness of the gusset. [in]
    c_s : clearance of the slot, total. [in]

    Returns
    -------
    w_s : width of the slot. [in]

    >>> slot_width.bare(0.5, 0.0625)
    0.5625
    """
    w_s = t_p + c_s
    return w_s


@formula("B4.3b")
def slotted_net_area(A_g, t, w_s):
    """Net area of a tube with a slot in each of two walls.

    Parameters
    ----------
    A_g : gross area. [in²]
    t : design wall. [in]
    w_s : width of the slot. [in]

    Returns
    -------
    A_n : net area. [in²]

    >>> slotted_net_area.bare(8.0, 0.5, 0.75)
    7.25
    """
    A_n = A_g - 2 * t * w_s
    return A_n


@formula("B4.3b")
def unslotted_net_area(A_g):
    """Net area of a tube that is welded to side gussets and not slotted.

    Parameters
    ----------
    A_g : gross area. [in²]

    Returns
    -------
    A_n : net area. [in²]

    >>> unslotted_net_area.bare(8.0)
    8.0
    """
    A_n = A_g
    return A_n


@formula("Eq. D2-1, by analogy")
def slotted_section_yielding(F_y, A_n):
    """Nominal strength when a slotted length without welds yields.

    Parameters
    ----------
    F_y : specified minimum yield stress. [ksi]
    A_n : net area at the slot. [in²]

    Returns
    -------
    P_n : nominal axial strength. [kip]

    >>> slotted_section_yielding.bare(50.0, 7.0)
    350.0
    """
    P_n = F_y * A_n
    return P_n


@formula("J4.2")
def shear_area_along_welds(n_w, l_w, t):
    """Area of a part that is sheared along like weld lines.

    Parameters
    ----------
    n_w : number of weld lines. []
    l_w : length of one. [in]
    t : thickness of the part. [in]

    Returns
    -------
    A_gv : gross area subject to shear. [in²]

    >>> shear_area_along_welds.bare(4, 12.0, 0.375)
    18.0
    """
    A_gv = n_w * l_w * t
    return A_gv


@formula("AWS D1.1")
def leg_less_gap(w_f, delta_g):
    """Leg of a fillet weld that counts where the parts stand more than 1/16 in. apart.

    Parameters
    ----------
    w_f : leg size as welded. [in]
    delta_g : gap between tube and gusset at the weld. [in]

    Returns
    -------
    w_e : effective leg size. [in]

    >>> leg_less_gap.bare(0.375, 0.125)
    0.25
    """
    w_e = w_f - delta_g
    return w_e
