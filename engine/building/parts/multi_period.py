"""Multi-period or site-specific spectrum: design ordinates, the parameters by 21.4, ordinates at T."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any, Final

import numpy as np

from engine import base_shear, hazard
from engine.building.records import Building
from engine.building.results import DirectionResult, Package
from engine.editions import EDITIONS
from engine.require import Array

RULES: Final = ("S_DS_spectrum", "S_D1_spectrum", "S_floor", "S_a_design", "S_aM")
METHOD_RULES: Final = ("S_a_multi", "C_s_method1")


def spectrum(building: Building) -> tuple[Array, Array]:
    """Return the periods [s] and the design ordinates [g], as listed."""
    T_i = np.array([row.T for row in building.multi_period], dtype=np.float64)
    S_a = np.array([row.S_a for row in building.multi_period], dtype=np.float64)
    as_given = building.site.ordinates_given == "design"
    return T_i, S_a if as_given else np.asarray(hazard.design_ordinate(S_a))


def design_parameters(building: Building) -> tuple[float, float]:
    """Return S_DS and S_D1 [g] by 21.4, in 7-16 with their floor."""
    site, pairs = building.site, spectrum(building)
    v_s = 0.0 if site.v_s is None else site.v_s
    S_DS = float(hazard.short_period_from_spectrum(*pairs))
    case = building.units, building.edition, site.reading
    S_D1 = float(hazard.one_second_from_spectrum(*pairs, v_s, *case))
    if site.S_DS_mapped is None or site.S_D1_mapped is None:
        return S_DS, S_D1
    floored = hazard.site_specific_minimum
    return float(floored(S_DS, site.S_DS_mapped)), float(floored(S_D1, site.S_D1_mapped))


def solve(building: Building, package: Package) -> Mapping[str, Any]:
    """Return the ordinates of both spectra and the parameters."""
    if not building.multi_period:
        return {}
    site = building.site
    S_ai = spectrum(building)[1]
    return {
        "S_ai": S_ai,
        "S_aMi": np.asarray(hazard.mce_ordinate(S_ai)),
        "S_DS": site.S_DS,
        "S_D1": site.S_D1,
        "S_MS": float(hazard.mce_ordinate(site.S_DS)),
        "S_M1": float(hazard.mce_ordinate(site.S_D1)),
    }


def method_1_ordinate(building: Building, T: float) -> float:
    """Return the ordinate that Method 1 of 7-22 takes at a period [s]."""
    site = building.site
    return float(hazard.method_1_acceleration(T, *spectrum(building), site.T_L, site.tail))


def solve_direction(
    building: Building, package: Package, name: str, result: DirectionResult
) -> Mapping[str, Any]:
    """Return the ordinates at the period of the direction, and the bound of Method 1."""
    if not building.multi_period or building.edition == EDITIONS[0]:
        return {}
    site, given = building.site, building.direction[name]
    S_a = method_1_ordinate(building, result.T)
    at_T = hazard.multi_period_acceleration(result.T, *spectrum(building), site.T_L, site.tail)
    return {
        "S_a_multi": float(at_T),
        "S_a_method1": S_a,
        "C_s_spectrum": float(base_shear.coefficient_multi(S_a, given.R, package.I_e)),
    }
