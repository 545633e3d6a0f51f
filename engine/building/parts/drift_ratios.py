"""Story drift ratios, and whether the exception for irregularities of stiffness and weight holds."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any, Final

from engine import irregularity
from engine.building.parts.findings import answer
from engine.building.records import Building
from engine.building.results import DirectionResult, Package

RULES: Final = ("drift_exception",)
PART: Final = "drift_ratios"


def solve(building: Building, package: Package, name: str, result: DirectionResult) -> Mapping[str, Any]:
    """Return each ratio over that of the story above, where drifts are given and the part is asked for."""
    if PART not in building.parts or result.drift_ratio is None:
        return {}
    h, ratios = package.h_x, result.drift_ratio
    return {
        "drift_ratio_above": irregularity.drift_comparison(h, ratios, h),
        "exception_holds": str(irregularity.drift_exception(ratios, h)),
    }


def whole(building: Building, package: Package) -> Mapping[str, Any]:
    """Return whether the exception holds in every direction."""
    found = [result.more.get("exception_holds") for result in package.direction.values()]
    return {} if None in found else {"drift_exception": answer(all(word == "yes" for word in found))}
