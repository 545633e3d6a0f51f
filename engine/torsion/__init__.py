"""Torsion (12.8.4): eccentricities, story torsion, the irregularity ratio, A_x, and shares of the walls."""

from engine.torsion.moments import (
    SCOPES,
    accidental_eccentricity,
    accidental_moment,
    accidental_scope,
    inherent_eccentricity,
    inherent_moment,
)
from engine.torsion.ratios import (
    EXTREME_RATIO,
    IRREGULAR_RATIO,
    TORSIONAL_CATEGORIES,
    amplification,
    applied_amplification,
    irregularity_ratio,
)
from engine.torsion.walls import center_of_rigidity, direct_shear, polar_rigidity, torsional_shear

__all__ = [
    "EXTREME_RATIO",
    "IRREGULAR_RATIO",
    "SCOPES",
    "TORSIONAL_CATEGORIES",
    "accidental_eccentricity",
    "accidental_moment",
    "accidental_scope",
    "amplification",
    "applied_amplification",
    "center_of_rigidity",
    "direct_shear",
    "inherent_eccentricity",
    "inherent_moment",
    "irregularity_ratio",
    "polar_rigidity",
    "torsional_shear",
]
