"""Forces for drift alone, and the forces under which the displacements are computed."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any, Final

from engine import base_shear, hazard, period, vertical
from engine.building.parts.ground_motion import coefficient_increase, increased
from engine.building.parts.multi_period import method_1_ordinate
from engine.building.parts.short_building import S_DS_in_C_s
from engine.building.records import DRIFT_BASES, METHODS, Building, Direction
from engine.building.results import DirectionResult, Package
from engine.editions import EDITIONS
from engine.require import Array, Words

RULES: Final = ("drift_forces", "drift_period")


def solve(building: Building, package: Package, name: str, result: DirectionResult) -> Mapping[str, Any]:
    """Return the forces for drift, and those under which the displacements are computed."""
    usual = all(given.drift_basis == DRIFT_BASES[0] for given in building.direction.values())
    if usual and "drift_forces" not in building.parts:
        return {}
    known = {key: getattr(result, key) for key in ("T_a", "C_u", "T", "F_x", "V_x")}
    F_x, V_x = of_displacements(building, package, name, known)
    return {**drift_forces(building, package, name, known), "F_x_used": F_x, "V_x_used": V_x}


def drift_forces(building: Building, package: Package, name: str, known: Mapping[str, Any]) -> dict[str, Any]:
    """Return the steps from the period for drift to its story shears (12.8.6.1, 12.8.6.2)."""
    given, w, h = building.direction[name], package.w_x, package.h_x
    T_computed = known["T_a"] if given.T_computed is None else given.T_computed
    T = float(period.drift_period(known["T_a"], known["C_u"], T_computed, given.drift_cap))
    found = _response(building, package, name, T, known["T"])
    V = float(base_shear.base_shear(found["C_s_drift"], package.W))
    k = float(vertical.exponent(T, given.k_rule))
    C_vx = vertical.distribution_factors(w, h, k)
    F_x = vertical.story_force(V, C_vx)
    return {
        "T_drift": T,
        **found,
        "V_drift": V,
        "k_drift": k,
        "C_vx_drift": C_vx,
        "F_x_drift": F_x,
        "V_x_drift": vertical.story_shear(h, F_x, h),
    }


def of_displacements(
    building: Building, package: Package, name: str, known: Mapping[str, Any]
) -> tuple[Array, Array]:
    """Return F_x and V_x of the forces under which the displacements of a direction are computed."""
    if building.direction[name].drift_basis == DRIFT_BASES[0]:
        return known["F_x"], known["V_x"]
    found = drift_forces(building, package, name, known)
    return found["F_x_drift"], found["V_x_drift"]


def said(building: Building) -> list[str]:
    """Say in words where drifts do not go by the forces for strength."""
    return [
        f"direction {name}: drift and theta go by the forces for drift alone (12.8.6)"
        for name, given in building.direction.items()
        if given.drift_basis == DRIFT_BASES[1]
    ]


def _response(building: Building, package: Package, name: str, T: float, T_strength: float) -> dict[str, Any]:
    """Return C_s without the minimum of 0.044 S_DS I_e, with what it is made of."""
    site, given, I_e = building.site, building.direction[name], package.I_e
    S_a = _ordinate(building, T)
    if given.C_s_method == METHODS[1]:
        case = S_a, site.S_1, given.R, I_e, building.edition
        C_s, governs = float(base_shear.drift_coefficient_multi(*case)), base_shear.drift_bound_multi(*case)
    else:
        C_s, governs = _two_period(building, given, I_e, T, S_DS_in_C_s(building, T_strength))
    cap = float(base_shear.coefficient_cap(site.S_D1, T, site.T_L, given.R, I_e))
    return {"S_a_drift": S_a, "C_s_cap_drift": cap, "C_s_drift": C_s, "drift_bound": str(governs)}


def _two_period(
    building: Building, given: Direction, I_e: float, T: float, S_DS: float
) -> tuple[float, Words]:
    """Return C_s by the two-period route and which bound governs; exception 2 of 11.4.8 may increase it."""
    site, R = building.site, given.R
    case = S_DS, site.S_D1, site.S_1, T, site.T_L, R, I_e, building.edition
    governs = base_shear.drift_bound(*case)
    factor = coefficient_increase(site, T)
    if factor == 1:
        return float(base_shear.drift_coefficient(*case)), governs
    cap = float(base_shear.coefficient_cap(site.S_D1, T, site.T_L, R, I_e))
    upper = factor * min(float(base_shear.coefficient_plateau(S_DS, R, I_e)), cap)
    return increased(upper, float(base_shear.coefficient_minimum_near_fault(site.S_1, R, I_e)), str(governs))


def _ordinate(building: Building, T: float) -> float:
    """Return the design ordinate at a period: of the multi-period spectrum of 7-22 where it is given."""
    site = building.site
    if building.multi_period and building.edition != EDITIONS[0]:
        return method_1_ordinate(building, T)
    return float(hazard.spectral_acceleration(T, site.S_DS, site.S_D1, site.T_L))
