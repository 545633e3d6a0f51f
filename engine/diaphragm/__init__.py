"""Diaphragms, collectors and walls (12.3.1.3, 12.10, 12.11)."""

from engine.diaphragm.alternative import (
    DIAPHRAGM_TYPES,
    MODE_SHAPES,
    alternative_force,
    base_coefficient,
    coefficient_at_height,
    diaphragm_reduction,
    first_mode_factor,
    higher_mode_coefficient,
    higher_mode_factor,
    lower_coefficient,
    mode_shape_factor,
    top_coefficient,
)
from engine.diaphragm.collector import COLLECTOR_BOUNDS, collector_bound, collector_force, total_force
from engine.diaphragm.flexibility import FLEXIBILITIES, flexibility, flexibility_ratio
from engine.diaphragm.force import (
    BOUNDS,
    design_force,
    design_force_bound,
    maximum_force,
    minimum_force,
    unlimited_force,
)
from engine.diaphragm.one_story import one_story_coefficient
from engine.diaphragm.wall import WALL_DIAPHRAGMS, anchorage_factor, anchorage_force, wall_force

__all__ = [
    "BOUNDS",
    "COLLECTOR_BOUNDS",
    "DIAPHRAGM_TYPES",
    "FLEXIBILITIES",
    "MODE_SHAPES",
    "WALL_DIAPHRAGMS",
    "alternative_force",
    "anchorage_factor",
    "anchorage_force",
    "base_coefficient",
    "coefficient_at_height",
    "collector_bound",
    "collector_force",
    "design_force",
    "design_force_bound",
    "diaphragm_reduction",
    "first_mode_factor",
    "flexibility",
    "flexibility_ratio",
    "higher_mode_coefficient",
    "higher_mode_factor",
    "lower_coefficient",
    "maximum_force",
    "minimum_force",
    "mode_shape_factor",
    "one_story_coefficient",
    "top_coefficient",
    "total_force",
    "unlimited_force",
    "wall_force",
]
