"""Shear lag of HSS and pipe on gussets.  [AISC360] D3, Table D3.1, cases 5 and 6, of both editions."""

from ..formula import formula

_RECT = {"360-16": "Table D3.1, case 6", "360-22": "Table D3.1, case 5"}


@formula("geometry")
def outside_radius(D):
    """Outside radius of a round tube.

    Parameters
    ----------
    D : outside diameter. [in]

    Returns
    -------
    R_o : outside radius. [in]

    >>> outside_radius.bare(6.0)
    3.0
    """
    R_o = D / 2
    return R_o


@formula("Table D3.1, case 5")
def half_arc(t_p, R_o):
    """Half the angle of a round tube's arc between the two faces of the gusset, on one side of it.

    Parameters
    ----------
    t_p : thickness of the gusset. [in]
    R_o : outside radius. [in]

    Returns
    -------
    theta_g : half the angle. [rad]

    >>> round(half_arc.bare(0.5, 3.0), 3)
    1.487
    """
    theta_g = acos(t_p / (2 * R_o))
    return theta_g


@formula("Table D3.1, case 5")
def round_eccentricity(R_o, theta_g, t_p):
    """Distance from the gusset's face to the centroid of a round tube's arc, 360-22.

    Parameters
    ----------
    R_o : outside radius. [in]
    theta_g : half the angle of the arc. [rad]
    t_p : thickness of the gusset. [in]

    Returns
    -------
    x_bar : eccentricity. [in]

    >>> round(round_eccentricity.bare(3.0, 1.48737, 0.5), 2)
    1.76
    """
    x_bar = R_o * sin(theta_g) / theta_g - t_p / 2
    return x_bar


@formula("Table D3.1, case 5")
def round_shear_lag(x_bar, l):
    """Shear lag factor of a round tube on one concentric gusset, 360-22.

    Parameters
    ----------
    x_bar : eccentricity. [in]
    l : length of the welds. [in]

    Returns
    -------
    U : shear lag factor. []

    >>> round(round_shear_lag.bare(1.76, 6.0), 3)
    0.822
    """
    U = (1 + (x_bar / l)**3.2)**(-10)
    return U


@formula("Table D3.1, case 5")
def round_eccentricity_of_360_16(D):
    """Eccentricity of a round tube on one concentric gusset, 360-16.

    Parameters
    ----------
    D : outside diameter. [in]

    Returns
    -------
    x_bar : eccentricity. [in]

    >>> round(round_eccentricity_of_360_16.bare(6.0), 3)
    1.91
    """
    x_bar = D / pi
    return x_bar


@formula("Table D3.1, case 5")
def round_shear_lag_short(x_bar, l):
    """Shear lag factor of a round tube on one concentric gusset, welds of one to 1.3 diameters, 360-16.

    Parameters
    ----------
    x_bar : eccentricity. [in]
    l : length of the welds. [in]

    Returns
    -------
    U : shear lag factor. []

    >>> round_shear_lag_short.bare(2.0, 8.0)
    0.75
    """
    U = 1 - x_bar / l
    return U


@formula("Table D3.1, case 5")
def round_shear_lag_long():
    """Shear lag factor of a round tube on one concentric gusset, welds of at least 1.3 diameters, 360-16.

    Returns
    -------
    U : shear lag factor. []

    >>> round_shear_lag_long.bare()
    1.0
    """
    U = 1.0
    return U


@formula("Table D3.1, case 5")
def wall_distance(B, t_p):
    """Distance from the outside of a rectangular tube's wall to the near face of the gusset.

    Parameters
    ----------
    B : overall width. [in]
    t_p : thickness of the gusset. [in]

    Returns
    -------
    b_w : distance. [in]

    >>> wall_distance.bare(4.0, 0.5)
    1.75
    """
    b_w = (B - t_p) / 2
    return b_w


@formula("Table D3.1, case 5")
def rectangular_eccentricity(b_w, t, H):
    """Distance from the gusset's face to the centroid of the half tube beyond it, 360-22.

    Parameters
    ----------
    b_w : outside of the wall to the near face of the gusset. [in]
    t : design wall. [in]
    H : overall height. [in]

    Returns
    -------
    x_bar : eccentricity. [in]

    >>> round(rectangular_eccentricity.bare(1.75, 0.349, 6.0), 3)
    1.297
    """
    x_bar = b_w - (2 * b_w**2 + t * H - 2 * t**2) / (2 * H + 4 * b_w - 4 * t)
    return x_bar


@formula("Table D3.1, case 6")
def rectangular_eccentricity_of_360_16(B, H):
    """Eccentricity of a rectangular tube on one concentric gusset, 360-16.

    Parameters
    ----------
    B : overall width. [in]
    H : overall height. [in]

    Returns
    -------
    x_bar : eccentricity. [in]

    >>> rectangular_eccentricity_of_360_16.bare(4.0, 6.0)
    1.6
    """
    x_bar = (B**2 + 2 * B * H) / (4 * (B + H))
    return x_bar


@formula(_RECT)
def rectangular_shear_lag(x_bar, l):
    """Shear lag factor of a rectangular tube on one concentric gusset.

    Parameters
    ----------
    x_bar : eccentricity. [in]
    l : length of the welds. [in]

    Returns
    -------
    U : shear lag factor. []

    >>> rectangular_shear_lag.bare(1.6, 16.0)
    0.9
    """
    U = 1 - x_bar / l
    return U


@formula("Table D3.1, case 6")
def side_gusset_eccentricity_of_360_16(B, H):
    """Eccentricity of a rectangular tube between two side gussets, 360-16.

    Parameters
    ----------
    B : overall width, from gusset to gusset. [in]
    H : overall height. [in]

    Returns
    -------
    x_bar : eccentricity. [in]

    >>> side_gusset_eccentricity_of_360_16.bare(6.0, 6.0)
    0.75
    """
    x_bar = B**2 / (4 * (B + H))
    return x_bar


@formula("Table D3.1, case 6")
def side_gusset_shear_lag_of_360_16(x_bar, l):
    """Shear lag factor of a rectangular tube between two side gussets, 360-16.

    Parameters
    ----------
    x_bar : eccentricity. [in]
    l : length of the welds. [in]

    Returns
    -------
    U : shear lag factor. []

    >>> side_gusset_shear_lag_of_360_16.bare(0.75, 7.5)
    0.9
    """
    U = 1 - x_bar / l
    return U


@formula("Table D3.1, case 6")
def side_gusset_shear_lag(l, B, H):
    """Shear lag factor of a rectangular tube between two side gussets, 360-22: its two pairs of walls weighted by their widths.

    Parameters
    ----------
    l : length of the welds. [in]
    B : overall width, from gusset to gusset. [in]
    H : overall height. [in]

    Returns
    -------
    U : shear lag factor. []

    >>> round(side_gusset_shear_lag.bare(8.0, 6.0, 6.0), 3)
    0.842
    """
    U_B = 3 * l**2 / (3 * l**2 + B**2)
    U_H = 3 * l**2 / (3 * l**2 + H**2)
    U = (B * U_B + H * U_H) / (H + B)
    return U
