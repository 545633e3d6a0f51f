"""Short regular buildings: the S_DS that C_s may use."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any, Final

from engine import base_shear
from engine.building.parts.findings import answer
from engine.building.records import Building
from engine.building.results import DirectionResult, Package

RULES: Final = ("S_DS_cap",)


def S_DS_in_C_s(building: Building, T: float) -> float:
    """Return the S_DS [g] of C_s at a period [s]: capped where the conditions are answered and hold."""
    conditions = _conditions(building, T)
    S_DS = building.site.S_DS
    return float(base_shear.capped_S_DS(S_DS, *conditions)) if conditions else S_DS


def solve(building: Building, package: Package, name: str, result: DirectionResult) -> Mapping[str, Any]:
    """Return the S_DS of C_s and whether it may be capped, where the conditions are answered."""
    conditions = _conditions(building, result.T)
    if not conditions:
        return {}
    return {
        "S_DS_status": str(base_shear.S_DS_cap_status(*conditions)),
        "S_DS_C": S_DS_in_C_s(building, result.T),
    }


def _conditions(building: Building, T: float) -> tuple[float, float, str, str, str, str] | None:
    site = building.site
    if site.N is None or site.regular is None or site.redundant is None or site.soft_site is None:
        return None
    flags = answer(site.regular), answer(site.redundant), answer(site.soft_site)
    return site.N, T, *flags, site.risk_category
