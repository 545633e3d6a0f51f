"""Irregularities (12.3.2): ratios, limits and types of both editions, and what each one entails (12.3.3)."""

from engine.irregularity.horizontal import (
    DIAPHRAGMS,
    diaphragm_irregularity,
    reentrant_irregularity,
    reentrant_ratio,
    torsional_irregularity,
)
from engine.irregularity.ratios import (
    dimension_ratio,
    drift_comparison,
    drift_exception,
    stiffness_ratio,
    stiffness_ratio_of_three,
    strength_ratio,
    weight_ratio,
)
from engine.irregularity.types import (
    IRREGULARITIES,
    JUDGED,
    consequence,
    judged_irregularity,
)
from engine.irregularity.vertical import (
    geometric_irregularity,
    soft_story,
    weak_story,
    weight_irregularity,
)

__all__ = [
    "DIAPHRAGMS",
    "IRREGULARITIES",
    "JUDGED",
    "consequence",
    "diaphragm_irregularity",
    "dimension_ratio",
    "drift_comparison",
    "drift_exception",
    "geometric_irregularity",
    "judged_irregularity",
    "reentrant_irregularity",
    "reentrant_ratio",
    "soft_story",
    "stiffness_ratio",
    "stiffness_ratio_of_three",
    "strength_ratio",
    "torsional_irregularity",
    "weak_story",
    "weight_irregularity",
    "weight_ratio",
]
