"""Redundancy factor of each direction by its conditions, beside the one that is entered."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any, Final

from engine import redundancy
from engine.building.parts.findings import design_category
from engine.building.records import DIRECTIONS, Building
from engine.building.results import DirectionResult, Package

RULES: Final = ("rho_value",)


def solve(building: Building, package: Package, name: str, result: DirectionResult) -> Mapping[str, Any]:
    """Return the factor and its reason where the category and the ratios of both directions are known."""
    SDC = design_category(building, package)
    TIR_X, TIR_Y = (_largest_ratio(building, package, direction) for direction in DIRECTIONS)
    if SDC is None or TIR_X is None or TIR_Y is None:
        return {}
    given = (SDC, building.direction[name].configuration, TIR_X, TIR_Y, building.edition)
    return {
        "rho_rule": float(redundancy.redundancy_factor(*given)),
        "rho_reason": str(redundancy.redundancy_reason(*given)),
    }


def _largest_ratio(building: Building, package: Package, name: str) -> float | None:
    """The ratio of the story table, or the one that is entered."""
    if name not in package.direction:
        return None
    found: float | None = package.direction[name].more.get("TIR_max", building.direction[name].TIR_max)
    return found
