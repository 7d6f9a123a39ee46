"""Figures of a connection, drawn to scale from the joint that is computed; each function returns SVG, caption and alt text.

elevation   elevation
paths       paths: the governing path of each limit state
section     cross_section
layouts     pareto, contour
curve       capacity_curve, permissible_loads
style       Figure, and how all of them look
scene       what an elevation shows of a joint, and the path of a check in it
drafting    a drawing to scale with dimensions
"""

from .curve import capacity_curve, permissible_loads
from .elevation import elevation
from .layouts import contour, pareto
from .paths import paths
from .section import cross_section
from .style import Figure

__all__ = ["Figure", "capacity_curve", "contour", "cross_section", "elevation", "pareto", "paths", "permissible_loads"]
