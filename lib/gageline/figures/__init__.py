"""Figures of a connection, drawn to scale from the joint that is computed; each function returns SVG, caption and alt text.

elevation   elevation, paths
section     cross_section
curve       capacity_curve, permissible_loads
style       Figure, and how all of them look
drafting    a drawing to scale with dimensions
"""

from .elevation import elevation, paths
from .style import Figure

__all__ = ["Figure", "elevation", "paths"]
