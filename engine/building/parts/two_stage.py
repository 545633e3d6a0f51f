"""Two-stage procedure: the lower part with the reactions of the upper part, and the conditions."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any, Final

import numpy as np

from engine import base_shear, period, two_stage, vertical
from engine.building.parts.findings import answer
from engine.building.records import Building
from engine.building.results import DirectionResult, Package

RULES: Final = (
    *("two_stage", "two_stage_stiffness", "two_stage_period", "two_stage_reactions", "two_stage_transition"),
)
PERMITTED: Final = "permitted"


def whole(building: Building, package: Package) -> Mapping[str, Any]:
    """Return the heights, the height and the weight of the lower part."""
    if not building.lower or building.site.lower_base is None:
        return {}
    h = np.array([row.elevation - building.site.lower_base for row in building.lower])
    weight = sum(row.weight for row in building.lower)
    return {"lower_h": h, "h_n_lower": float(h.max()), "W_lower": float(weight)}


def solve(building: Building, package: Package, name: str, result: DirectionResult) -> Mapping[str, Any]:
    """Return base shear, forces, shears and overturning of the lower part, and what the conditions say."""
    if not building.lower:
        return {}
    own = _own(building, package, name, result)
    given = building.direction[name]
    factor = float(two_stage.reaction_factor(given.R, given.rho, given.R_lower, given.rho_lower))
    V, M = factor * result.V_base, factor * result.M_base
    h, F = package.more["lower_h"], own["lower_F"]
    arm = package.more["h_n_lower"] - h
    return {
        **own,
        **{"reaction_factor": factor, "V_reaction": V, "M_reaction": M},
        "lower_V": vertical.story_shear(h, F, h) + V,
        "lower_M": vertical.overturning_moment(h, F, h) + M + V * arm,
        **_conditions(building, name, result.V, own["V_lower"] + V),
    }


def _own(building: Building, package: Package, name: str, result: DirectionResult) -> dict[str, Any]:
    """The lower part by itself: period, coefficient, base shear and story forces."""
    site, given, more = building.site, building.direction[name], package.more
    T_a = float(period.approximate_period(more["h_n_lower"], given.period_system_lower, building.units))
    T = T_a
    if given.T_lower_computed is not None:
        T = float(period.design_period(T_a, result.C_u, given.T_lower_computed))
    case = (site.S_DS, site.S_D1, site.S_1, T, site.T_L, given.R_lower, package.I_e, building.edition)
    C_s = float(base_shear.response_coefficient(*case))
    V = float(base_shear.base_shear(C_s, more["W_lower"]))
    k = float(vertical.exponent(T, given.k_rule))
    weights = [row.weight for row in building.lower]
    C_vx = vertical.distribution_factors(weights, more["lower_h"], k)
    return {
        **{"T_a_lower": T_a, "T_lower": T, "C_s_lower": C_s, "V_lower": V, "k_lower": k},
        "C_s_lower_bound": base_shear.governing_bound(*case),
        "lower_C_vx": C_vx,
        "lower_F": vertical.story_force(V, C_vx),
    }


def _conditions(building: Building, name: str, V_upper: float, V_lower: float) -> dict[str, Any]:
    given = building.direction[name]
    K_upper = float(two_stage.part_stiffness(V_upper, given.delta_upper))
    K_lower = float(two_stage.part_stiffness(V_lower, given.delta_lower))
    K_ratio = float(two_stage.stiffness_ratio(K_lower, K_upper))
    T_ratio = float(two_stage.period_ratio(given.T_whole, given.T_upper))
    procedures = given.upper_procedure, given.lower_procedure
    status = str(two_stage.two_stage_status(K_ratio, T_ratio, *procedures))
    return {
        **{"stiffness_upper": K_upper, "stiffness_lower": K_lower, "K_ratio": K_ratio, "T_ratio": T_ratio},
        "two_stage_status": f"✓ {status}" if status == PERMITTED else f"✗ {status}",
        "transition": str(two_stage.transition_amplification(answer(given.transition_discontinuity))),
    }
