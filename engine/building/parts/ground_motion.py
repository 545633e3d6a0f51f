"""Ground motion from mapped values: site coefficients and what 11.4.8 of 7-16 asks for."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any, Final

from engine import hazard, occupancy
from engine.building.parts.findings import answer
from engine.building.records import Building, Site
from engine.building.results import DirectionResult, Package

RULES: Final = ("F_a", "F_v", "S_MS", "S_M1", "S_DS", "S_D1", "hazard_analysis", "SDC_A")
INCREASE_RULES: Final = ("C_s_increase",)
NO_TRIGGER: Final = "none"
INCREASED: Final = "upper bound increased, exception 2 of 11.4.8"


def mce_parameters(site: Site) -> tuple[float | None, float | None]:
    """Return S_MS and S_M1 [g] as entered or of the site class; ``None`` where S_DS and S_D1 are entered."""
    if site.S_S is None or site.site_class is None:
        return site.S_MS, site.S_M1
    F_a, F_v = _coefficients(site, site.S_S, site.site_class)
    S_M1 = hazard.mce_parameter_one_second(site.S_1, F_v, site.long_exception)
    return float(hazard.mce_parameter_short(site.S_S, F_a)), float(S_M1)


def solve(building: Building, package: Package) -> Mapping[str, Any]:
    """Return the coefficients of the site class, and what still demands a site-specific analysis."""
    site = building.site
    if site.S_S is None or site.site_class is None:
        return {}
    F_a, F_v = _coefficients(site, site.S_S, site.site_class)
    exceptions = site.short_exception, site.long_exception
    T = max(result.T for result in package.direction.values())
    used = answer(site.isolated), *exceptions, T, package.T_S
    trigger = str(hazard.analysis_triggers(site.S_S, site.S_1, site.site_class, *used))
    return {
        "F_a": F_a,
        "F_v": F_v,
        "S_MS": site.S_MS,
        "S_M1": site.S_M1,
        "S_DS": site.S_DS,
        "S_D1": site.S_D1,
        "hazard_status": "✓ none" if trigger == NO_TRIGGER else f"✗ {trigger}",
        "SDC_A_permitted": str(occupancy.category_A_permitted(site.S_S, site.S_1)),
    }


def increase(building: Building, package: Package, name: str, result: DirectionResult) -> Mapping[str, Any]:
    """Return the factor on the upper bounds of C_s by exception 2 as first printed."""
    if building.site.S_S is None:
        return {}
    return {"C_s_increase": coefficient_increase(building.site, result.T)}


def increased(upper: float, lower: float, governs: str) -> tuple[float, str]:
    """Return C_s by an upper bound that is increased, and in words which bound governs."""
    return max(upper, lower), INCREASED if upper >= lower else governs


def coefficient_increase(site: Site, T: float) -> float:
    """Return the factor at a period; 1 without site class or without the exception."""
    T_S = hazard.corner_period_TS(site.S_DS, site.S_D1)
    return float(hazard.coefficient_increase(T, T_S, site.long_exception))


def _coefficients(site: Site, S_S: float, site_class: str) -> tuple[float, float]:
    F_a = float(hazard.site_coefficient_short(S_S, site_class, site.short_exception))
    return F_a, float(hazard.site_coefficient_long(site.S_1, site_class))
