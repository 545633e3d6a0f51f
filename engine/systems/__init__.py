"""Seismic force-resisting systems (12.2): coefficients, height limits, combinations of systems."""

from engine.systems.coefficients import (
    KNOWN,
    OVERSTRENGTH_RULES,
    SYSTEMS,
    coefficients_status,
    confidence,
    deflection_amplification,
    overstrength,
    reduced_overstrength,
    response_modification,
)
from engine.systems.combinations import (
    coefficient_of_least_R,
    least_R,
    lower_part_coefficient,
    transferred_force_factor,
)
from engine.systems.heights import height_limit, height_status

__all__ = [
    "KNOWN",
    "OVERSTRENGTH_RULES",
    "SYSTEMS",
    "coefficient_of_least_R",
    "coefficients_status",
    "confidence",
    "deflection_amplification",
    "height_limit",
    "height_status",
    "least_R",
    "lower_part_coefficient",
    "overstrength",
    "reduced_overstrength",
    "response_modification",
    "transferred_force_factor",
]
