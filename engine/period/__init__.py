"""Fundamental period (12.8.2): approximate formulas, the C_u T_a cap, computed and design periods."""

from engine.period.approximate import (
    MOMENT_FRAMES,
    PERIOD_FORMULAS,
    PERIOD_SYSTEMS,
    approximate_period,
    approximate_period_stories,
    stories_formula_status,
)
from engine.period.design import (
    DRIFT_PERIODS,
    PERIOD_BOUNDS,
    PERIOD_SOURCES,
    design_period,
    drift_period,
    period_bound,
    period_limit,
    upper_limit_coefficient,
)
from engine.period.rayleigh import rayleigh_period
from engine.period.walls import C_Q, wall_period, wall_ratio

__all__ = [
    "C_Q",
    "DRIFT_PERIODS",
    "MOMENT_FRAMES",
    "PERIOD_BOUNDS",
    "PERIOD_FORMULAS",
    "PERIOD_SOURCES",
    "PERIOD_SYSTEMS",
    "approximate_period",
    "approximate_period_stories",
    "design_period",
    "drift_period",
    "period_bound",
    "period_limit",
    "rayleigh_period",
    "stories_formula_status",
    "upper_limit_coefficient",
    "wall_period",
    "wall_ratio",
]
