"""Modal response of the story model: modes, combined shears and drifts, scaling to the base shear."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any, Final

import numpy as np

from engine import dynamics, hazard
from engine.building.parts.multi_period import spectrum
from engine.building.records import Building, level_values
from engine.building.results import DirectionResult, Package
from engine.editions import EDITIONS
from engine.require import Array

RULES: Final = ("modes", "modal_response", "modal_combination", "modal_correlation")
SCALING_RULES: Final = ("modal_scaling", "modal_drift_scaling")
SHARE: Final = 0.9


def whole(building: Building, package: Package) -> Mapping[str, Any]:
    """Return how many modes are taken in."""
    return {"modes_used": float(len(building.mode))} if building.mode else {}


def solve(building: Building, package: Package, name: str, result: DirectionResult) -> Mapping[str, Any]:
    """Return modes and responses, where modes are listed and story stiffness is given."""
    K_x = level_values(building, f"K_x_{name}")
    if not building.mode or K_x is None:
        return {}
    model = package.w_x, K_x, package.h_x
    numbers = np.array([row.number for row in building.mode], dtype=np.float64)
    modes = _modes(building, package, name, numbers, model)
    return {**modes, **_response(building, package, name, result, numbers, modes, model)}


def _modes(
    building: Building, package: Package, name: str, numbers: Array, model: tuple[Array, Array, Array]
) -> dict[str, Any]:
    T_m = np.asarray(dynamics.mode_period(numbers, *model, building.units))
    S_am = _ordinates(building, T_m)
    C_sm = np.asarray(dynamics.modal_coefficient(S_am, building.direction[name].R, package.I_e))
    return {
        "T_m": T_m,
        "Gamma_m": dynamics.mode_participation(numbers, *model),
        "mass_m": dynamics.mode_weight_share(numbers, *model),
        "mass_sum": dynamics.modes_weight_share(numbers, *model),
        "S_am": S_am,
        "C_sm": C_sm,
        "V_m": np.asarray(dynamics.modal_shear(numbers, 0.0, C_sm, *model)),
        "modes_needed": float(dynamics.modes_needed(SHARE, *model)),
        "modes_status": str(dynamics.modes_verdict(float(len(numbers)), *model, building.units)),
    }


def _ordinates(building: Building, T_m: Array) -> Array:
    """Return the design spectrum at the periods: the multi-period one of 7-22 where it is given."""
    site = building.site
    if building.multi_period and building.edition != EDITIONS[0]:
        pairs = spectrum(building)
        return np.asarray(hazard.multi_period_acceleration(T_m, *pairs, site.T_L, site.tail))
    return np.asarray(hazard.spectral_acceleration(T_m, site.S_DS, site.S_D1, site.T_L))


def _response(
    building: Building,
    package: Package,
    name: str,
    result: DirectionResult,
    numbers: Array,
    modes: Mapping[str, Any],
    model: tuple[Array, Array, Array],
) -> dict[str, Any]:
    site, given, h = building.site, building.direction[name], package.h_x
    rule, zeta, C_sm = site.combination, site.damping, modes["C_sm"]
    by_rule = {
        word: dynamics.combined_shear(h, numbers, C_sm, *model, word, zeta) for word in dynamics.COMBINATIONS
    }
    V_t = {
        "SRSS": float(dynamics.square_root_of_squares(modes["V_m"])),
        "CQC": float(dynamics.complete_combination(modes["V_m"], modes["T_m"], zeta)),
    }
    scale = float(dynamics.force_scale(result.V, V_t[rule]))
    drift_scale = float(dynamics.drift_scale(V_t[rule], package.W, site.S_1, given.R, package.I_e))
    elastic = dynamics.combined_drift(h, numbers, C_sm, *model, rule, zeta)
    return {
        "V_t_srss": V_t["SRSS"],
        "V_t_cqc": V_t["CQC"],
        "V_t": V_t[rule],
        "modal_scale": scale,
        "modal_drift_scale": drift_scale,
        "V_srss": by_rule["SRSS"],
        "V_cqc": by_rule["CQC"],
        "V_modal": scale * by_rule[rule],
        "V_modal_ratio": scale * by_rule[rule] / result.V_x,
        "Delta_modal": drift_scale * given.C_d * elastic / package.I_e,
    }
