"""Block shear: areas of a tear-out block and its strength.  [AISC360] J4.3."""

from ..formula import formula


@formula("J4.3")
def first_shear_planes(n_v, L_v, t):
    """Gross area of like shear planes of a tear-out block.

    Parameters
    ----------
    n_v : number of like planes. []
    L_v : gross length of one. [in]
    t : thickness. [in]

    Returns
    -------
    A_gv : gross area subject to shear. [in²]

    >>> first_shear_planes.bare(2, 10.5, 0.5)
    10.5
    """
    A_gv = n_v * L_v * t
    return A_gv


@formula("J4.3")
def more_shear_planes(A_gv0, n_v, L_v, t):
    """Gross area of like shear planes, added to that of the planes before.

    Parameters
    ----------
    A_gv0 : gross shear area of the planes before. [in²]
    n_v : number of like planes. []
    L_v : gross length of one. [in]
    t : thickness. [in]

    Returns
    -------
    A_gv : gross area subject to shear so far. [in²]

    >>> more_shear_planes.bare(5.0, 1, 10.0, 0.5)
    10.0
    """
    A_gv = A_gv0 + n_v * L_v * t
    return A_gv


@formula("J4.3, B4.3b")
def first_shear_plane_holes(n_h, d_n, t):
    """Area lost to holes along like shear planes.

    Parameters
    ----------
    n_h : number of holes, the hole at the block's corner as one half. []
    d_n : width deducted for one. [in]
    t : thickness. [in]

    Returns
    -------
    A_hv : area lost along the shear planes. [in²]

    >>> first_shear_plane_holes.bare(7, 1.0, 0.5)
    3.5
    """
    A_hv = n_h * d_n * t
    return A_hv


@formula("J4.3, B4.3b")
def more_shear_plane_holes(A_hv0, n_h, d_n, t):
    """Area lost to holes along like shear planes, added to that of the planes before.

    Parameters
    ----------
    A_hv0 : area lost along the planes before. [in²]
    n_h : number of holes, the hole at the block's corner as one half. []
    d_n : width deducted for one. [in]
    t : thickness. [in]

    Returns
    -------
    A_hv : area lost along the shear planes so far. [in²]

    >>> more_shear_plane_holes.bare(3.5, 1, 1.0, 0.5)
    4.0
    """
    A_hv = A_hv0 + n_h * d_n * t
    return A_hv


@formula("J4.3, B4.3b")
def net_shear_area(A_gv, A_hv):
    """Net area of a block subject to shear.

    Parameters
    ----------
    A_gv : gross area subject to shear. [in²]
    A_hv : area lost to holes along the shear planes. [in²]

    Returns
    -------
    A_nv : net area subject to shear. [in²]

    >>> net_shear_area.bare(10.5, 3.5)
    7.0
    """
    A_nv = A_gv - A_hv
    return A_nv


@formula("J4.3")
def gross_tension_area(n_j, w, t):
    """Gross area of the tension plane of a block, over like pieces.

    Parameters
    ----------
    n_j : number of like pieces. []
    w : width of the tension plane in one. [in]
    t : thickness. [in]

    Returns
    -------
    A_gt : gross area subject to tension. [in²]

    >>> gross_tension_area.bare(2, 3.0, 0.5)
    3.0
    """
    A_gt = n_j * w * t
    return A_gt


@formula("J4.3")
def gross_tension_area_with_attached(n_j, w, t, A_a):
    """Gross area of the tension plane of a block that tears with what hangs on it, over like pieces.

    Parameters
    ----------
    n_j : number of like pieces. []
    w : width of the tension plane in one. [in]
    t : thickness. [in]
    A_a : area of what hangs on the element and tears with it. [in²]

    Returns
    -------
    A_gt : gross area subject to tension. [in²]

    >>> gross_tension_area_with_attached.bare(1, 3.0, 0.5, 2.0)
    3.5
    """
    A_gt = n_j * (w * t + A_a)
    return A_gt


@formula("J4.3, B4.3b")
def tension_plane_holes(n_h, d_n, t):
    """Area lost to holes across the tension plane of a block.

    Parameters
    ----------
    n_h : number of holes, a hole at the block's corner as one half. []
    d_n : width deducted for one. [in]
    t : thickness. [in]

    Returns
    -------
    A_ht : area lost across the tension plane. [in²]

    >>> tension_plane_holes.bare(1, 1.0, 0.5)
    0.5
    """
    A_ht = n_h * d_n * t
    return A_ht


@formula("J4.3, B4.3b")
def net_tension_area(A_gt, A_ht):
    """Net area of a block subject to tension.

    Parameters
    ----------
    A_gt : gross area subject to tension. [in²]
    A_ht : area lost to holes across the tension plane. [in²]

    Returns
    -------
    A_nt : net area subject to tension. [in²]

    >>> net_tension_area.bare(1.5, 0.5)
    1.0
    """
    A_nt = A_gt - A_ht
    return A_nt


@formula("Eq. J4-5")
def block_shear(F_u, A_nv, U_bs, A_nt, F_y, A_gv):
    """Nominal strength of a block that shears along one or more planes and ruptures in tension across another.

    Parameters
    ----------
    F_u : specified minimum tensile strength. [ksi]
    A_nv : net area subject to shear. [in²]
    U_bs : 1.0 where the tension is uniform. []
    A_nt : net area subject to tension. [in²]
    F_y : specified minimum yield stress. [ksi]
    A_gv : gross area subject to shear. [in²]

    Returns
    -------
    R_n : nominal strength. [kip]

    >>> round(block_shear.bare(58.0, 1.875, 1.0, 0.375, 36.0, 2.8125), 2)
    82.5
    """
    R_nu = 0.60 * F_u * A_nv + U_bs * F_u * A_nt
    R_ny = 0.60 * F_y * A_gv + U_bs * F_u * A_nt
    R_n = min(R_nu, R_ny)
    return R_n
