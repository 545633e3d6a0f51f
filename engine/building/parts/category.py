"""Seismic Design Category, where it is asked for in place of an entry."""

from __future__ import annotations

from collections.abc import Iterable, Mapping
from typing import Any, Final

from engine import occupancy
from engine.building.parts.findings import answer
from engine.building.records import Building, category_asked
from engine.building.results import DirectionResult, Package
from engine.require import ROUND_OFF

RULES: Final = ("SDC_short", "SDC_one_second", "SDC", "SDC_alone")
CONDITIONS: Final = ("T_a_short", "T_drift_short", "on_plateau")
#: part of T_S below which T_a must lie for Table 11.6-1 alone
SHARE: Final = 0.8


def conditions(building: Building, package: Package, name: str, result: DirectionResult) -> Mapping[str, Any]:
    """Return the conditions of Table 11.6-1 alone that speak of one direction."""
    if not category_asked(building):
        return {}
    T_drift = result.more.get("T_drift", result.T)
    off_plateau = abs(result.C_s - result.C_s_plateau)
    return {
        "T_a_short": answer(result.T_a < SHARE * package.T_S),
        "T_drift_short": answer(T_drift < package.T_S),
        "on_plateau": answer(off_plateau <= ROUND_OFF * result.C_s_plateau),
    }


def solve(building: Building, package: Package) -> Mapping[str, Any]:
    """Return the category with its reason, and what decides on Table 11.6-1 alone."""
    if not category_asked(building):
        return {}
    site = building.site
    short, drift, plateau = (
        _all(result.more[key] for result in package.direction.values()) for key in CONDITIONS
    )
    rigid = answer(bool(site.rigid_diaphragms))
    permitted = str(occupancy.short_table_alone(site.S_1, short, drift, plateau, rigid))
    used = answer(bool(site.short_table_alone) and permitted == "yes")
    case = site.S_DS, site.S_D1, site.S_1, site.risk_category, used
    return {
        "alone_permitted": permitted,
        "alone_used": used,
        "SDC_short": str(occupancy.category_short(site.S_DS, site.risk_category)),
        "SDC_one": str(occupancy.category_one_second(site.S_D1, site.risk_category)),
        "SDC": str(occupancy.design_category(*case)),
        "SDC_reason": str(occupancy.design_category_reason(*case)),
    }


def _all(answers: Iterable[str]) -> str:
    return answer(all(word == "yes" for word in answers))
