"""Diaphragm design forces of every level."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any, Final

import numpy as np

from engine import diaphragm
from engine.building.records import Building
from engine.building.results import DirectionResult, Package, texts

RULES: Final = ("F_px", "F_px_min", "F_px_max")


def solve(building: Building, package: Package, name: str, result: DirectionResult) -> Mapping[str, Any]:
    """Return the forces with both limits; w_px is the weight of the level where it is not given."""
    w, h, F = package.w_x, package.h_x, result.F_x
    given = [level.w_px for level in building.level]
    w_px = w if given[0] is None else np.array(given, dtype=np.float64)
    S_DS, I_e = building.site.S_DS, package.I_e
    return {
        "F_px_unlimited": diaphragm.unlimited_force(w_px, h, F, w, h),
        "F_px_min": diaphragm.minimum_force(w_px, S_DS, I_e),
        "F_px_max": diaphragm.maximum_force(w_px, S_DS, I_e),
        "F_px": diaphragm.design_force(w_px, h, F, w, h, S_DS, I_e),
        "F_px_bound": texts(diaphragm.design_force_bound(w_px, h, F, w, h, S_DS, I_e)),
    }
