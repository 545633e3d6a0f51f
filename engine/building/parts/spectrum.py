"""Ordinates of the two-period spectrum: at the periods listed, and at the period of each direction."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any, Final

import numpy as np

from engine import hazard
from engine.building.records import Building
from engine.building.results import DirectionResult, Package

RULES: Final = ("S_a", "S_aM")


def solve(building: Building, package: Package) -> Mapping[str, Any]:
    """Return the design and MCE_R ordinates at the periods listed."""
    if not building.spectrum:
        return {}
    site = building.site
    periods = np.array([row.T for row in building.spectrum], dtype=np.float64)
    S_a = np.asarray(hazard.spectral_acceleration(periods, site.S_DS, site.S_D1, site.T_L))
    return {"S_a": S_a, "S_aM": np.asarray(hazard.mce_ordinate(S_a))}


def solve_direction(
    building: Building, package: Package, name: str, result: DirectionResult
) -> Mapping[str, Any]:
    """Return the design ordinate at the period of the direction."""
    if not building.spectrum:
        return {}
    site = building.site
    return {"S_a_T": float(hazard.spectral_acceleration(result.T, site.S_DS, site.S_D1, site.T_L))}
