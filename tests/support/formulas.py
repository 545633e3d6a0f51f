"""Every public formula of the engine's concept modules, with one valid call each."""

from __future__ import annotations

from collections.abc import Callable, Iterator
from types import ModuleType
from typing import Any

from engine import (
    base_shear,
    diaphragm,
    drift,
    dynamics,
    hazard,
    occupancy,
    period,
    stability,
    torsion,
    vertical,
    weight,
)

CONCEPTS: tuple[ModuleType, ...] = (
    *(weight, occupancy, hazard, period, base_shear, vertical),
    *(torsion, drift, stability, diaphragm, dynamics),
)

SITE = {"S_DS": 0.9, "S_D1": 0.45, "S_1": 0.65, "T": 0.8, "T_L": 6.0, "R": 6.0, "I_e": 1.25}
LEVELS = {"heights": [11.0, 25.0, 38.0], "weights": [300.0, 250.0, 120.0]}
FORCES = {"heights": LEVELS["heights"], "forces": [20.0, 45.0, 35.0]}
DIAPHRAGM = {"w_px": 240.0, "h_x": 25.0, **LEVELS, "forces": FORCES["forces"]}
MODEL = {**LEVELS, "stiffnesses": [90.0, 60.0, 40.0]}
LIMITS = {"S_DS": 0.9, "I_e": 1.25}

SPECTRUM = {"T_i": [0.0, 0.1, 0.3, 1.0, 2.0, 5.0, 10.0], "S_ai": [0.4, 1.1, 0.9, 0.5, 0.28, 0.1, 0.03]}

#: dotted name below ``engine`` -> a valid call, no two arguments alike so that a swap shows
CALLS: dict[str, dict[str, Any]] = {
    "weight.area_weight": {"area": 9600.0, "unit_load": 80.0, "units": "us"},
    "weight.storage_unit_load": {"live_load": 125.0, "storage": "counted"},
    "weight.storage_ratio": {"w_storage": 30.0, "w_other": 640.0},
    "weight.partition_unit_load": {"partitions": 12.0, "units": "us"},
    "weight.snow_unit_load": {"p_f": 50.0, "edition": "7-22", "units": "us"},
    "weight.level_weight": {
        **{"areas": [9600.0, 3300.0], "unit_loads": [80.0, 15.0], "units": "us", "equipment": 22.5}
    },
    "hazard.site_coefficient_short": {"S_S": 0.6, "site_class": "D", "exception": "none"},
    "hazard.site_coefficient_long": {"S_1": 0.35, "site_class": "D"},
    "hazard.analysis_triggers": {
        **{"S_S": 1.2, "S_1": 0.5, "site_class": "E", "isolated": "yes", "short_exception": "none"},
        **{"long_exception": "exception 3: T at most T_S", "T": 0.4, "T_S": 0.9},
    },
    "hazard.coefficient_increase": {
        **{"T": 0.7, "S_DS": 0.9, "S_D1": 0.45, "T_L": 6.0, "exception": "exception 2: C_s increased"}
    },
    "hazard.mce_parameter_short": {"S_S": 1.1, "F_a": 1.06},
    "hazard.mce_parameter_one_second": {
        **{"S_1": 0.4, "F_v": 1.9, "exception": "exception 2 of Supplement 3: S_M1 up 50 %"}
    },
    "hazard.design_parameter_short": {"S_MS": 1.2},
    "hazard.design_parameter_one_second": {"S_M1": 0.8},
    "hazard.mce_ordinate": {"S_a": 0.7},
    "hazard.design_ordinate": {"S_aM": 0.7},
    "hazard.multi_period_acceleration": {**{"T": 0.6, **SPECTRUM, "T_L": 6.0, "tail": "as printed"}},
    "hazard.method_1_acceleration": {**{"T": 0.6, **SPECTRUM, "T_L": 6.0, "tail": "as printed"}},
    "hazard.short_period_from_spectrum": SPECTRUM,
    "hazard.one_second_from_spectrum": {
        **{**SPECTRUM, "v_s": 1300.0, "units": "us", "edition": "7-22", "reading": "listed periods"}
    },
    "hazard.site_specific_minimum": {"S": 0.7, "S_mapped": 0.9},
    "occupancy.importance_factor": {"risk_category": "III"},
    "occupancy.category_short": {"S_DS": 0.3, "risk_category": "III"},
    "occupancy.category_one_second": {"S_D1": 0.15, "risk_category": "III"},
    "occupancy.short_table_alone": {
        **{"S_1": 0.3, "T_a_below": "yes", "T_drift_below": "yes", "plateau_used": "yes"},
        "rigid_diaphragms": "yes",
    },
    "occupancy.design_category": {
        **{"S_DS": 0.3, "S_D1": 0.15, "S_1": 0.1, "risk_category": "III", "alone": "no"}
    },
    "occupancy.design_category_reason": {
        **{"S_DS": 0.3, "S_D1": 0.15, "S_1": 0.1, "risk_category": "III", "alone": "no"}
    },
    "occupancy.category_A_permitted": {"S_S": 0.12, "S_1": 0.03},
    "hazard.corner_period_T0": {"S_DS": 0.9, "S_D1": 0.45},
    "hazard.corner_period_TS": {"S_DS": 0.9, "S_D1": 0.45},
    "hazard.spectral_acceleration": {"T": 0.8, "S_DS": 0.9, "S_D1": 0.45, "T_L": 6.0},
    "period.approximate_period": {"h_n": 38.0, "system": "steel moment frame", "units": "us"},
    "period.approximate_period_stories": {"N": 7.0},
    "period.upper_limit_coefficient": {"S_D1": 0.17},
    "period.period_limit": {"C_u": 1.4, "T_a": 0.6},
    "period.design_period": {"T_a": 0.6, "C_u": 1.4, "T_computed": 0.8},
    "base_shear.coefficient_plateau": {"S_DS": 0.9, "R": 6.0, "I_e": 1.25},
    "base_shear.coefficient_cap": {"S_D1": 0.45, "T": 0.8, "T_L": 6.0, "R": 5.0, "I_e": 1.25},
    "base_shear.coefficient_minimum": {"S_DS": 0.9, "I_e": 1.25},
    "base_shear.coefficient_minimum_near_fault": {"S_1": 0.65, "R": 6.0, "I_e": 1.25},
    "base_shear.response_coefficient": {**SITE, "edition": "7-22"},
    "base_shear.governing_bound": {**SITE, "edition": "7-22"},
    "base_shear.base_shear": {"C_s": 0.1, "W": 670.0},
    "vertical.exponent": {"T": 0.8, "rule": "interpolate"},
    "vertical.distribution_factors": {**LEVELS, "k": 1.15},
    "vertical.distribution_factor": {"w_x": 250.0, "h_x": 25.0, **LEVELS, "k": 1.15},
    "vertical.story_force": {"V": 100.0, "C_vx": 0.45},
    "vertical.story_shear": {"h_x": 25.0, **FORCES},
    "vertical.overturning_moment": {"h_x": 25.0, **FORCES},
    "vertical.story_height": {"h_x": 25.0, "heights": LEVELS["heights"]},
    "vertical.value_below": {"h_x": 25.0, "values": [0.3, 0.8, 1.2], "heights": LEVELS["heights"]},
    "torsion.amplification": {"d_max": 1.5, "d_avg": 1.0},
    "drift.amplified_deflection": {"delta_xe": 0.8, "C_d": 5.0, "I_e": 1.25},
    "drift.design_story_drift": {"d_upper": 0.8, "d_lower": 0.3, "C_d": 5.0, "I_e": 1.25},
    "vertical.height_above_base": {"z_x": 129.0, "z_0": 100.0},
    "drift.allowable_drift": {**{"h_sx": 14.0, "structure": "all other", "risk_category": "III", "rho": 1.3}},
    "stability.stability_coefficient": {
        **{"P_x": 900.0, "Delta": 2.0, "I_e": 1.25, "V_x": 80.0, "h_sx": 168.0, "C_d": 5.0}
    },
    "stability.stability_limit": {"C_d": 5.0, "beta": 0.7},
    "stability.demand_ratio": {"beta": 0.3, "Omega_0": 2.5, "edition": "7-22"},
    "stability.second_order_factor": {"theta": 0.15},
    "stability.stability_verdict": {"theta": 0.15, "theta_max": 0.2},
    "diaphragm.unlimited_force": DIAPHRAGM,
    "diaphragm.minimum_force": {"w_px": 240.0, **LIMITS},
    "diaphragm.maximum_force": {"w_px": 240.0, **LIMITS},
    "diaphragm.design_force": {**DIAPHRAGM, **LIMITS},
    "diaphragm.design_force_bound": {**DIAPHRAGM, **LIMITS},
    "dynamics.elastic_displacement": {"h_x": 25.0, **FORCES, "stiffnesses": MODEL["stiffnesses"]},
    "dynamics.story_stiffness": {"h_x": 25.0, **FORCES, "displacements": [0.3, 0.8, 1.2]},
    "dynamics.mode_period": {"mode": 1.0, **MODEL, "units": "us"},
    "dynamics.mode_shape": {"mode": 1.0, "h_x": 25.0, **MODEL},
    "dynamics.mode_participation": {"mode": 1.0, **MODEL},
    "dynamics.mode_weight_share": {"mode": 1.0, **MODEL},
    "dynamics.modes_weight_share": {"modes": 1.0, **MODEL},
    "dynamics.modes_needed": {"share": 0.7, **MODEL},
    "dynamics.modes_verdict": {"modes": 1.0, **MODEL, "units": "us"},
    "dynamics.modal_coefficient": {"S_a": 0.9, "R": 6.0, "I_e": 1.25},
    "dynamics.modal_force": {"mode": 1.0, "w_x": 250.0, "h_x": 25.0, "C_sm": 0.1, **MODEL},
    "dynamics.modal_shear": {"mode": 1.0, "h_x": 25.0, "C_sm": 0.1, **MODEL},
    "dynamics.modal_displacement": {"mode": 1.0, "h_x": 25.0, "C_sm": 0.1, **MODEL},
    "dynamics.modal_drift": {"mode": 1.0, "h_x": 25.0, "C_sm": 0.1, **MODEL},
    "dynamics.square_root_of_squares": {"values": [3.0, -4.0, 1.0]},
    "dynamics.absolute_sum": {"values": [3.0, -4.0, 1.0]},
    "dynamics.correlation": {"T_i": 0.9, "T_j": 1.2, "damping": 0.05},
    "dynamics.complete_combination": {
        **{"values": [3.0, -4.0, 1.0], "periods": [1.0, 0.9, 0.3], "damping": 0.05}
    },
    "dynamics.force_scale": {"V": 100.0, "V_t": 80.0},
    "dynamics.drift_scale": {"V_t": 40.0, "W": 2000.0, "S_1": 0.75, "R": 6.0, "I_e": 1.25},
}


def public_functions() -> Iterator[tuple[str, Callable[..., Any]]]:
    """Yield every public function that a concept module defines, by its dotted name below ``engine``."""
    for module in CONCEPTS:
        for name, member in vars(module).items():
            home = getattr(member, "__module__", "")
            own = home == module.__name__ or home.startswith(f"{module.__name__}.")
            if callable(member) and not name.startswith("_") and own:
                yield f"{module.__name__.removeprefix('engine.')}.{name}", member


def function(name: str) -> Callable[..., Any]:
    """Return a formula by its dotted name."""
    return dict(public_functions())[name]
