"""Period, response coefficient and base shear of one direction, and the forces of its levels."""

from __future__ import annotations

from typing import Any

from engine import base_shear, period, vertical
from engine.building import periods
from engine.building.parts.ground_motion import coefficient_increase, increased
from engine.building.parts.multi_period import method_1_ordinate
from engine.building.parts.short_building import S_DS_in_C_s
from engine.building.records import METHODS, Building, Direction
from engine.building.results import Package


def strength(building: Building, package: Package, name: str) -> dict[str, Any]:
    """Return the steps from the period to the base shear and the exponent."""
    given = building.direction[name]
    T_a = periods.approximate(building, name, package.h_n)
    C_u = float(period.upper_limit_coefficient(building.site.S_D1))
    T = T_a if given.T_computed is None else float(period.design_period(T_a, C_u, given.T_computed))
    found = response(building, package, given, T)
    return {
        "T_a": T_a,
        "C_u": C_u,
        "T_max": float(period.period_limit(C_u, T_a)),
        "T": T,
        **found,
        "V": float(base_shear.base_shear(found["C_s"], package.W)),
        "k": float(vertical.exponent(T, given.k_rule)),
    }


def response(building: Building, package: Package, given: Direction, T: float) -> dict[str, Any]:
    """Return the bounds of C_s at a period, C_s, and which bound governs."""
    site, I_e, R = building.site, package.I_e, given.R
    S_DS = S_DS_in_C_s(building, T)
    return {
        "C_s_plateau": float(base_shear.coefficient_plateau(S_DS, R, I_e)),
        "C_s_cap": float(base_shear.coefficient_cap(site.S_D1, T, site.T_L, R, I_e)),
        "C_s_min": float(base_shear.coefficient_minimum(S_DS, I_e)),
        "C_s_min_S1": float(base_shear.coefficient_minimum_near_fault(site.S_1, R, I_e)),
        **(_method_1 if given.C_s_method == METHODS[1] else _method_2)(building, package, given, T, S_DS),
    }


def _method_1(
    building: Building, package: Package, given: Direction, T: float, S_DS: float
) -> dict[str, Any]:
    S_a = method_1_ordinate(building, T)
    case = (S_a, S_DS, building.site.S_1, given.R, package.I_e, building.edition)
    return {
        "C_s": float(base_shear.response_coefficient_multi(*case)),
        "governing_bound": base_shear.governing_bound_multi(*case),
    }


def _method_2(
    building: Building, package: Package, given: Direction, T: float, S_DS: float
) -> dict[str, Any]:
    site, R, I_e = building.site, given.R, package.I_e
    case = (S_DS, site.S_D1, site.S_1, T, site.T_L, R, I_e, building.edition)
    governs = base_shear.governing_bound(*case)
    factor = coefficient_increase(site, T)
    if factor == 1:
        return {"C_s": float(base_shear.response_coefficient(*case)), "governing_bound": governs}
    cap = float(base_shear.coefficient_cap(site.S_D1, T, site.T_L, R, I_e))
    upper = factor * min(float(base_shear.coefficient_plateau(S_DS, R, I_e)), cap)
    near_fault = float(base_shear.coefficient_minimum_near_fault(site.S_1, R, I_e))
    lower = max(float(base_shear.coefficient_minimum(S_DS, I_e)), near_fault)
    C_s, governs = increased(upper, lower, str(governs))
    return {"C_s": C_s, "governing_bound": governs}


def forces(package: Package, strength: dict[str, Any]) -> dict[str, Any]:
    """Return the forces, shears and overturning moments of every level."""
    w, h = package.w_x, package.h_x
    C_vx = vertical.distribution_factors(w, h, strength["k"])
    F = vertical.story_force(strength["V"], C_vx)
    return {
        "C_vx": C_vx,
        "F_x": F,
        "V_x": vertical.story_shear(h, F, h),
        "V_base": float(vertical.story_shear(0.0, F, h)),
        "M_x": vertical.overturning_moment(h, F, h),
        "M_base": float(vertical.overturning_moment(0.0, F, h)),
    }
