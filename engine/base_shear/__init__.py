"""Seismic base shear (12.8.1): C_s by both routes with every bound on its own, V, and C_s for drift."""

from engine.base_shear.bounds import (
    coefficient_cap,
    coefficient_minimum,
    coefficient_minimum_near_fault,
    coefficient_multi,
    coefficient_plateau,
)
from engine.base_shear.drift_forces import (
    METHOD_1_EDITIONS,
    drift_bound,
    drift_bound_multi,
    drift_coefficient,
    drift_coefficient_multi,
)
from engine.base_shear.shear import base_shear, interaction_minimum
from engine.base_shear.short_buildings import S_DS_cap_status, capped_S_DS
from engine.base_shear.strength import (
    governing_bound,
    governing_bound_multi,
    response_coefficient,
    response_coefficient_multi,
)

__all__ = [
    "METHOD_1_EDITIONS",
    "S_DS_cap_status",
    "base_shear",
    "capped_S_DS",
    "coefficient_cap",
    "coefficient_minimum",
    "coefficient_minimum_near_fault",
    "coefficient_multi",
    "coefficient_plateau",
    "drift_bound",
    "drift_bound_multi",
    "drift_coefficient",
    "drift_coefficient_multi",
    "governing_bound",
    "governing_bound_multi",
    "interaction_minimum",
    "response_coefficient",
    "response_coefficient_multi",
]
