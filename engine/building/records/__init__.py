"""The inputs of one building as frozen records; each field carries its own check.

Heights and weights in the unit system's length and force units, displacements in its displacement unit.
"""

from __future__ import annotations

from engine.building.records.building import STIFFNESS_ROUTE, Building, category_asked, level_values
from engine.building.records.direction import DIRECTIONS, DRIFT_BASES, METHODS, Direction
from engine.building.records.fields import may_be_left_out
from engine.building.records.level import SEPARATION_ENTRIES, Level, level_label
from engine.building.records.rows import (
    ROW_TABLES,
    WEIGHT_KINDS,
    AnchorRow,
    LowerRow,
    MemberRow,
    ModeRow,
    MotionRow,
    SpectrumRow,
    SystemRow,
    WallRow,
    WeightRow,
    row_label,
)
from engine.building.records.site import Site

__all__ = [
    "DIRECTIONS",
    "DRIFT_BASES",
    "METHODS",
    "ROW_TABLES",
    "SEPARATION_ENTRIES",
    "STIFFNESS_ROUTE",
    "WEIGHT_KINDS",
    "AnchorRow",
    "Building",
    "Direction",
    "Level",
    "LowerRow",
    "MemberRow",
    "ModeRow",
    "MotionRow",
    "Site",
    "SpectrumRow",
    "SystemRow",
    "WallRow",
    "WeightRow",
    "category_asked",
    "level_label",
    "level_values",
    "may_be_left_out",
    "row_label",
]
