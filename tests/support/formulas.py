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
    irregularity,
    load_effects,
    occupancy,
    period,
    redundancy,
    separation,
    stability,
    systems,
    torsion,
    two_stage,
    vertical,
    weight,
)

CONCEPTS: tuple[ModuleType, ...] = (
    *(weight, occupancy, hazard, systems, period, base_shear, vertical),
    *(torsion, irregularity, redundancy, load_effects, drift, stability),
    *(diaphragm, separation, two_stage, dynamics),
)

SITE = {"S_DS": 0.9, "S_D1": 0.45, "S_1": 0.65, "T": 0.8, "T_L": 6.0, "R": 6.0, "I_e": 1.25}
LEVELS = {"heights": [11.0, 25.0, 38.0], "weights": [300.0, 250.0, 120.0]}
FORCES = {"heights": LEVELS["heights"], "forces": [20.0, 45.0, 35.0]}
DIAPHRAGM = {"w_px": 240.0, "h_x": 25.0, **LEVELS, "forces": FORCES["forces"]}
MODEL = {**LEVELS, "stiffnesses": [90.0, 60.0, 40.0]}
FRAME = {"system": "B. Steel special concentrically braced frames", "edition": "7-16"}
HEIGHT = {**FRAME, "SDC": "D", "increase": "no", "units": "us"}
SHORT = {"N": 3.0, "T": 0.3, "regular": "yes", "redundant": "yes", "soft_site": "no", "risk_category": "II"}
MULTI = {"S_a": 0.8, "S_1": 0.65, "R": 6.0, "I_e": 1.25, "edition": "7-22"}
STORIES = {"h_x": 25.0, "heights": LEVELS["heights"], "stiffnesses": [90.0, 60.0, 80.0]}
STRENGTHS = {"h_x": 25.0, "heights": LEVELS["heights"], "strengths": [90.0, 60.0, 80.0]}
DIMENSIONS = {"h_x": 25.0, "heights": LEVELS["heights"], "dimensions": [90.0, 80.0, 60.0]}
DRIFTS = {"heights": LEVELS["heights"], "drift_ratios": [0.013, 0.009, 0.007]}
EXEMPT = {"drift_exception": "no", "SDC": "E", "edition": "7-16"}
REDUNDANCY = {
    **{"SDC": "D", "configuration": "a: loss of one element", "TIR_X": 1.15, "TIR_Y": 1.05},
    **{"edition": "7-16"},
}
COLLECTOR = {"E_story": 30.0, "E_sum": 34.0, "E_low": 40.0, "Omega_0": 2.0, "light_frame": "no"}
LIMITS = {"S_DS": 0.9, "I_e": 1.25}

SPECTRUM = {"T_i": [0.0, 0.1, 0.3, 1.0, 2.0, 5.0, 10.0], "S_ai": [0.4, 1.1, 0.9, 0.5, 0.28, 0.1, 0.03]}
COMBINED: dict[str, Any] = {
    **{"mode_numbers": [1.0, 2.0, 3.0], "mode_coefficients": [0.1, 0.15, 0.12]},
    **{"combination": "CQC", "damping": 0.05},
}

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
    "hazard.coefficient_increase": {**{"T": 0.7, "T_S": 0.5, "exception": "exception 2: C_s increased"}},
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
    "systems.response_modification": FRAME,
    "systems.overstrength": FRAME,
    "systems.deflection_amplification": FRAME,
    "systems.confidence": FRAME,
    "systems.coefficients_status": {**FRAME, "R": 6.0, "Omega_0": 2.0, "C_d": 5.0},
    "systems.height_limit": HEIGHT,
    "systems.height_status": {**HEIGHT, "h_n": 150.0},
    "systems.reduced_overstrength": {"Omega_0": 2.5, "reduction": "flexible diaphragms"},
    "systems.lower_part_coefficient": {"upper": 4.0, "lower": 3.5, "R_upper": 6.5, "R_lower": 5.0},
    "systems.transferred_force_factor": {"R_upper": 6.5, "R_lower": 5.0},
    "systems.least_R": {"R_systems": [6.5, 5.0, 8.0]},
    "systems.coefficient_of_least_R": {"coefficients": [4.0, 3.5, 5.5], "R_systems": [6.5, 5.0, 8.0]},
    "period.wall_ratio": {
        **{"A_B": 4800.0, "h_n": 30.0, "wall_areas": [20.0, 25.0], "wall_lengths": [22.0, 31.0]}
    },
    "period.wall_period": {"h_n": 28.0, "C_w": 0.373, "units": "us"},
    "period.rayleigh_period": {
        "weights": LEVELS["weights"],
        "forces": FORCES["forces"],
        "displacements": [0.3, 0.8, 1.2],
        "units": "us",
    },
    "period.stories_formula_status": {"N": 7.0, "h_n": 77.0, "frames": "yes", "units": "us"},
    "period.period_bound": {"T_a": 0.6, "C_u": 1.4, "T_computed": 0.8},
    "period.drift_period": {"T_a": 0.6, "C_u": 1.4, "T_computed": 0.9, "cap": "without the cap"},
    "base_shear.coefficient_multi": {"S_a": 0.8, "R": 6.0, "I_e": 1.25},
    "base_shear.response_coefficient_multi": {**MULTI, "S_DS": 0.9},
    "base_shear.governing_bound_multi": {**MULTI, "S_DS": 0.9},
    "base_shear.drift_coefficient": {**SITE, "edition": "7-22"},
    "base_shear.drift_bound": {**SITE, "edition": "7-22"},
    "base_shear.drift_coefficient_multi": MULTI,
    "base_shear.drift_bound_multi": MULTI,
    "base_shear.capped_S_DS": {**SHORT, "S_DS": 1.6},
    "base_shear.S_DS_cap_status": SHORT,
    "base_shear.interaction_minimum": {"V": 100.0, "R": 4.5},
    "two_stage.part_stiffness": {"V": 120.0, "delta": 0.8},
    "two_stage.stiffness_ratio": {"K_lower": 1500.0, "K_upper": 120.0},
    "two_stage.period_ratio": {"T_whole": 0.63, "T_upper": 0.6},
    "two_stage.reaction_factor": {"R_upper": 6.5, "rho_upper": 1.1, "R_lower": 4.0, "rho_lower": 1.2},
    "two_stage.two_stage_status": {
        **{"stiffness_ratio": 12.0, "period_ratio": 1.05},
        **{"upper_procedure": "modal", "lower_procedure": "equivalent lateral force"},
    },
    "two_stage.transition_amplification": {"discontinuity": "yes"},
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
    "torsion.inherent_eccentricity": {"x_M": 32.0, "x_R": 24.0},
    "torsion.accidental_eccentricity": {"L_perp": 90.0},
    "torsion.inherent_moment": {"h_x": 25.0, "x_R": 24.0, **FORCES, "centers": [30.0, 33.0, 28.0]},
    "torsion.accidental_moment": {
        **{"h_x": 25.0, **FORCES, "dimensions": [80.0, 70.0, 60.0], "amplifications": [1.0, 1.4, 1.2]}
    },
    "torsion.accidental_scope": {"TIR": 1.3, "SDC": "D", "edition": "7-22"},
    "torsion.irregularity_ratio": {"Delta_1": 0.3, "Delta_2": 0.2},
    "torsion.applied_amplification": {"d_max": 1.5, "d_avg": 1.0, "TIR": 1.25, "SDC": "D"},
    "torsion.center_of_rigidity": {"rigidities": [6.0, 4.0], "positions": [5.0, 60.0]},
    "torsion.polar_rigidity": {"rigidities": [6.0, 4.0, 3.0], "distances": [-24.0, 36.0, 20.0]},
    "torsion.direct_shear": {"V": 100.0, "R_i": 4.5, "rigidities": [4.5, 5.5]},
    "torsion.torsional_shear": {"M_t": 900.0, "R_i": 4.5, "d_i": 49.5, "J": 27248.0},
    "irregularity.stiffness_ratio": STORIES,
    "irregularity.stiffness_ratio_of_three": STORIES,
    "irregularity.strength_ratio": STRENGTHS,
    "irregularity.dimension_ratio": DIMENSIONS,
    "irregularity.weight_ratio": {"h_x": 25.0, **LEVELS},
    "irregularity.drift_comparison": {"h_x": 25.0, **DRIFTS},
    "irregularity.drift_exception": DRIFTS,
    "irregularity.soft_story": {**STORIES, **EXEMPT},
    "irregularity.weight_irregularity": {"h_x": 25.0, **LEVELS, **EXEMPT},
    "irregularity.geometric_irregularity": {**DIMENSIONS, "edition": "7-22"},
    "irregularity.weak_story": {**STRENGTHS, "edition": "7-22"},
    "irregularity.torsional_irregularity": {
        **{"TIR": 1.3, "diaphragm": "rigid or semirigid", "one_sided": "no", "edition": "7-22"}
    },
    "irregularity.reentrant_ratio": {"p_x": 30.0, "p_y": 16.0, "L_x": 120.0, "L_y": 90.0},
    "irregularity.reentrant_irregularity": {"ratio": 0.18, "edition": "7-16"},
    "irregularity.diaphragm_irregularity": {"opening": 0.45, "change": 0.3, "edition": "7-16"},
    "irregularity.judged_irregularity": {
        **{"irregularity": "in-plane discontinuity", "exists": "yes", "edition": "7-22"}
    },
    "irregularity.consequence": {"irregularity": "weak story", "SDC": "E", "edition": "7-16"},
    "redundancy.redundancy_factor": REDUNDANCY,
    "redundancy.redundancy_reason": REDUNDANCY,
    "redundancy.redundancy_in_use": {"use": "strength", "rho": 1.3},
    "redundancy.wall_bays": {"L_w": 24.0, "h_sx": 10.0, "light_frame": "yes"},
    "redundancy.counts_for_redundancy": {"V_x": 100.0, "V": 280.0},
    "load_effects.horizontal_effect": {"rho": 1.3, "Q_E": 50.0},
    "load_effects.vertical_effect": {"S_DS": 0.9, "D": 120.0, "taken": "counted"},
    "load_effects.vertical_effect_spectrum": {"S_av": 0.8, "D": 120.0},
    "load_effects.overstrength_effect": {"Omega_0": 2.5, "Q_E": 50.0},
    "load_effects.limited_overstrength_effect": {"Omega_0": 2.5, "Q_E": 50.0, "E_cl": 110.0},
    "load_effects.combination_factor": {"combination": "2.4.5-9", "term": "S", "edition": "7-16"},
    "load_effects.combined_effect": {
        **{"combination": "2.3.6-6", "D": 100.0, "E_v": 20.0, "E_h": 60.0, "L": 40.0, "S": 30.0},
        **{"edition": "7-16"},
    },
    "load_effects.dead_load_factor": {"combination": "2.3.6-7", "S_DS": 0.9, "edition": "7-22"},
    "drift.edges_due": {"TIR": 1.3, "SDC": "D"},
    "drift.drift_to_check": {"Delta_cm": 1.0, "Delta_1": 1.4, "Delta_2": 0.6, "edges": "yes"},
    "diaphragm.flexibility_ratio": {"delta_MDD": 0.9, "Delta_ADVE": 0.4},
    "diaphragm.flexibility": {"delta_MDD": 0.9, "Delta_ADVE": 0.4},
    "diaphragm.total_force": {
        **{"F_px": 80.0, "F_transfer": 40.0, "rho": 1.3, "Omega_0": 2.5, "offset": "no"}
    },
    "diaphragm.collector_force": COLLECTOR,
    "diaphragm.collector_bound": COLLECTOR,
    "diaphragm.one_story_coefficient": {
        **{"S_DS": 0.9, "S_D1": 0.45, "I_e": 1.25, "R_diaph": 4.5, "T_diaph": 0.7}
    },
    "diaphragm.wall_force": {"S_DS": 0.9, "I_e": 1.25, "W_w": 50.0},
    "diaphragm.anchorage_factor": {"L_f": 60.0, "diaphragm": "flexible", "units": "us"},
    "diaphragm.anchorage_force": {"S_DS": 0.9, "k_a": 1.6, "I_e": 1.25, "W_p": 2.5},
    "diaphragm.mode_shape_factor": {"system": "moment frame"},
    "diaphragm.diaphragm_reduction": {"diaphragm": "wood sheathed"},
    "diaphragm.base_coefficient": {"S_DS": 0.9, "I_e": 1.25},
    "diaphragm.first_mode_factor": {"z_s": 0.7, "N": 5.0, "c_m1": 0.5},
    "diaphragm.higher_mode_factor": {"z_s": 0.7, "N": 5.0},
    "diaphragm.higher_mode_coefficient": {"N": 5.0, "S_DS": 0.9, "S_D1": 0.45, "I_e": 1.25},
    "diaphragm.lower_coefficient": {"C_p0": 0.45, "G_m1": 1.3, "Omega_0": 2.5, "C_s": 0.16},
    "diaphragm.top_coefficient": {
        **{"C_pi": 0.47, "G_m1": 1.3, "Omega_0": 2.5, "C_s": 0.16, "G_m2": 0.4, "C_s2": 0.9}
    },
    "diaphragm.coefficient_at_height": {
        **{"h_x": 25.0, "h_n": 60.0, "N": 5.0, "C_p0": 0.45, "C_pi": 0.5, "C_pn": 0.8}
    },
    "diaphragm.alternative_force": {"C_px": 0.7, "w_px": 240.0, "R_s": 2.0, "S_DS": 0.9, "I_e": 1.25},
    "separation.largest_displacement": {
        **{"delta_max": 0.8, "delta_di": 0.3, "C_d": 5.0, "I_e": 1.25, "edition": "7-22"}
    },
    "separation.required_separation": {"delta_M1": 3.0, "delta_M2": 4.0},
    "separation.separation_verdict": {"gap": 6.0, "delta_MT": 5.0},
    "separation.mce_displacement": {"delta_e": 0.5, "delta_di": 0.4, "R": 6.0, "I_e": 1.25},
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
    "dynamics.combined_shear": {"h_x": 25.0, **MODEL, **COMBINED},
    "dynamics.combined_drift": {"h_x": 25.0, **MODEL, **COMBINED},
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
