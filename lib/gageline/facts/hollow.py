"""HSS and pipe of another design wall than the tables': properties recomputed with the tables' own corner radii.

The tables rest on 0.93 times the nominal wall (AISC 360 B4.2). A steel whose full wall may be used (A1065, A1085) gets its
properties here; outside corners have a radius of twice, inside corners of once the wall, which is how the tables' areas come out.
"""

from dataclasses import replace
from math import pi, sqrt

from ..errors import InputError

# A square corner less its quarter circle, for radius 1: area, centroid from the outer edges, own inertia. Calculus.
_SPANDREL = (1 - pi / 4, (10 - 3 * pi) / (12 - 3 * pi), 1 / 3 - pi / 16 - 1 / (9 * (4 - pi)))


def round_tube(D, t):
    """Return area and radius of gyration of a round tube.

    Parameters
    ----------
    D, t : outside diameter and wall. [in]

    Returns
    -------
    A, r : area and radius of gyration. [in², in]

    >>> [round(value, 3) for value in round_tube(6.0, 0.465)]
    [8.086, 1.964]
    """
    inner = D - 2 * t
    return pi / 4 * (D**2 - inner**2), sqrt(D**2 + inner**2) / 4


def rectangular_tube(H, B, t):
    """Return area and radii of gyration of a rectangular tube with rounded corners.

    Parameters
    ----------
    H, B, t : height, width and wall. [in]

    Returns
    -------
    A, r_x, r_y : area, radius about the axis across H, radius about the axis across B. [in², in, in]

    >>> [round(value, 2) for value in rectangular_tube(6.0, 4.0, 0.349)]
    [6.18, 2.14, 1.55]
    """
    outer_A, outer_x, outer_y = _rounded(H, B, 2 * t)
    inner_A, inner_x, inner_y = _rounded(H - 2 * t, B - 2 * t, t)
    A = outer_A - inner_A
    return A, sqrt((outer_x - inner_x) / A), sqrt((outer_y - inner_y) / A)


def _rounded(H, B, R):
    """Area and moments of inertia of a rectangle with rounded corners."""
    area, centroid, inertia = _SPANDREL[0] * R**2, _SPANDREL[1] * R, _SPANDREL[2] * R**4
    I_x = B * H**3 / 12 - 4 * (inertia + area * (H / 2 - centroid) ** 2)
    I_y = H * B**3 / 12 - 4 * (inertia + area * (B / 2 - centroid) ** 2)
    return H * B - 4 * area, I_x, I_y


def of_full_wall(shape):
    """Return a section of HSS or pipe whose design wall is its nominal wall.

    Parameters
    ----------
    shape : facts.shapes.Shape of series HSS or Pipe.

    Returns
    -------
    shape : Shape with t_des, A, r_x and r_y of the nominal wall; its other properties are None.

    Raises
    ------
    InputError : the section is not hollow.
    """
    if shape.t_nom is None:
        raise InputError(f"{shape.name} is not hollow, so it has no design wall")
    if shape.D is None:
        A, r_x, r_y = rectangular_tube(shape.H, shape.B, shape.t_nom)
    else:
        A, r_x = round_tube(shape.D, shape.t_nom)
        r_y = r_x
    gone = dict.fromkeys(("I_x", "S_x", "Z_x", "I_y", "S_y", "Z_y"))
    return replace(shape, t_des=shape.t_nom, A=A, r_x=r_x, r_y=r_y, **gone)
