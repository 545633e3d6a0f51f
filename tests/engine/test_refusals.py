"""Bad input never gives a number: each case names the argument, and its error class the cell error."""

from __future__ import annotations

import numpy as np
import pytest

from engine.errors import ImpossibleValue, MissingValue, NotApplicable, WrongType
from tests.support.formulas import CALLS, function

NAN, INF = float("nan"), float("inf")
NUMBERS = [
    (name, key)
    for name, call in CALLS.items()
    for key, value in call.items()
    if isinstance(value, float | list)
]
WORDS = [(name, key) for name, call in CALLS.items() for key, value in call.items() if isinstance(value, str)]


def refused(name, error, match, **changes):
    with pytest.raises(error, match=match) as caught:
        function(name)(**{**CALLS[name], **changes})
    assert type(caught.value) is error


EITHER_WAY = {
    *("delta_xe", "d_upper", "d_lower", "forces", "values", "displacements"),
    *(
        "z_x",
        "z_0",
        "x_M",
        "x_R",
        "centers",
        "Delta_1",
        "Delta_2",
        "Delta_cm",
        "positions",
        "distances",
        "M_t",
        "d_i",
    ),
    *("Q_E", "D", "E_v", "E_h", "L", "S", "delta_e"),
}
NEVER = [
    (name, key, bad)
    for name, key in NUMBERS
    for bad in (NAN, INF, -INF, -1e9)
    if not (key in EITHER_WAY and bad == -1e9)
]


@pytest.mark.parametrize(("name", "key", "bad"), NEVER)
def test_number_that_is_none(name, key, bad):
    listed = isinstance(CALLS[name][key], list)
    refused(name, ImpossibleValue, key, **{key: [*CALLS[name][key][:-1], bad] if listed else bad})


@pytest.mark.parametrize(("name", "key"), NUMBERS)
@pytest.mark.parametrize(
    ("bad", "error"),
    [("12", WrongType), (None, MissingValue), (True, WrongType)],
    ids=["text", "blank", "flag"],
)
def test_no_number_at_all(name, key, bad, error):
    refused(name, error, f"{key} = .*must be a number", **{key: bad})


@pytest.mark.parametrize(("name", "key"), WORDS)
@pytest.mark.parametrize(
    ("bad", "error"),
    [("nowhere", NotApplicable), ("", MissingValue), (None, MissingValue), (7.0, WrongType)],
    ids=["unknown", "empty", "blank", "number"],
)
def test_word_that_is_not_in_the_list(name, key, bad, error):
    refused(name, error, f"{key} = .*one of", **{key: bad})


ZERO_REFUSED = {
    "weight.storage_ratio": ["w_other"],
    "hazard.coefficient_increase": ["T", "T_S"],
    "hazard.analysis_triggers": ["T", "T_S"],
    "hazard.mce_parameter_short": ["F_a"],
    "hazard.mce_parameter_one_second": ["F_v"],
    "hazard.design_parameter_short": ["S_MS"],
    "hazard.design_parameter_one_second": ["S_M1"],
    "hazard.multi_period_acceleration": ["T_L"],
    "hazard.method_1_acceleration": ["T_L"],
    "hazard.one_second_from_spectrum": ["v_s"],
    "hazard.site_specific_minimum": ["S", "S_mapped"],
    "occupancy.category_short": ["S_DS"],
    "occupancy.category_one_second": ["S_D1"],
    "occupancy.design_category": ["S_DS", "S_D1"],
    "hazard.corner_period_T0": ["S_DS", "S_D1"],
    "hazard.corner_period_TS": ["S_DS", "S_D1"],
    "hazard.spectral_acceleration": ["S_DS", "S_D1", "T_L"],
    "period.approximate_period": ["h_n"],
    "period.approximate_period_stories": ["N"],
    "period.upper_limit_coefficient": ["S_D1"],
    "period.period_limit": ["C_u", "T_a"],
    "period.design_period": ["T_a", "C_u", "T_computed"],
    "base_shear.coefficient_plateau": ["S_DS", "R", "I_e"],
    "base_shear.coefficient_cap": ["S_D1", "T", "T_L", "R", "I_e"],
    "base_shear.coefficient_minimum": ["S_DS", "I_e"],
    "base_shear.coefficient_minimum_near_fault": ["R", "I_e"],
    "base_shear.response_coefficient": ["S_DS", "S_D1", "T", "T_L", "R", "I_e"],
    "base_shear.governing_bound": ["S_DS", "S_D1", "T", "T_L", "R", "I_e"],
    "base_shear.base_shear": ["C_s", "W"],
    "vertical.exponent": ["T"],
    "vertical.distribution_factors": ["k"],
    "vertical.distribution_factor": ["k"],
    "vertical.story_force": ["V"],
    "torsion.amplification": ["d_avg"],
    "drift.amplified_deflection": ["C_d", "I_e"],
    "drift.design_story_drift": ["C_d", "I_e"],
    "drift.allowable_drift": ["h_sx", "rho"],
    "stability.stability_coefficient": ["I_e", "V_x", "h_sx", "C_d"],
    "stability.stability_limit": ["C_d", "beta"],
    "stability.demand_ratio": ["beta", "Omega_0"],
    "stability.stability_verdict": ["theta_max"],
    "diaphragm.minimum_force": ["S_DS", "I_e"],
    "diaphragm.maximum_force": ["S_DS", "I_e"],
    "diaphragm.design_force": ["S_DS", "I_e"],
    "diaphragm.design_force_bound": ["S_DS", "I_e"],
    "torsion.accidental_eccentricity": ["L_perp"],
    "torsion.accidental_scope": ["TIR"],
    "torsion.applied_amplification": ["d_avg", "TIR"],
    "torsion.direct_shear": ["R_i"],
    "torsion.torsional_shear": ["R_i", "J"],
    "irregularity.torsional_irregularity": ["TIR"],
    "irregularity.reentrant_ratio": ["L_x", "L_y"],
    "redundancy.redundancy_factor": ["TIR_X", "TIR_Y"],
    "redundancy.redundancy_in_use": ["rho"],
    "redundancy.wall_bays": ["L_w", "h_sx"],
    "redundancy.counts_for_redundancy": ["V"],
    "load_effects.horizontal_effect": ["rho"],
    "load_effects.vertical_effect": ["S_DS"],
    "load_effects.vertical_effect_spectrum": ["S_av"],
    "load_effects.overstrength_effect": ["Omega_0"],
    "load_effects.limited_overstrength_effect": ["Omega_0"],
    "load_effects.dead_load_factor": ["S_DS"],
    "drift.edges_due": ["TIR"],
    "diaphragm.flexibility_ratio": ["Delta_ADVE"],
    "diaphragm.flexibility": ["Delta_ADVE"],
    "diaphragm.total_force": ["rho", "Omega_0"],
    "diaphragm.collector_force": ["Omega_0"],
    "diaphragm.one_story_coefficient": ["S_DS", "S_D1", "I_e", "R_diaph", "T_diaph"],
    "diaphragm.wall_force": ["S_DS", "I_e"],
    "diaphragm.anchorage_force": ["S_DS", "k_a", "I_e"],
    "diaphragm.base_coefficient": ["S_DS", "I_e"],
    "diaphragm.first_mode_factor": ["z_s", "N"],
    "diaphragm.higher_mode_factor": ["z_s", "N"],
    "diaphragm.higher_mode_coefficient": ["N", "S_DS", "S_D1", "I_e"],
    "diaphragm.lower_coefficient": ["C_p0", "G_m1", "Omega_0", "C_s"],
    "diaphragm.top_coefficient": ["C_pi", "G_m1", "Omega_0", "C_s"],
    "diaphragm.coefficient_at_height": ["N", "C_p0", "C_pi", "C_pn"],
    "diaphragm.alternative_force": ["C_px", "R_s", "S_DS", "I_e"],
    "separation.largest_displacement": ["C_d", "I_e"],
    "separation.mce_displacement": ["R", "I_e"],
    "systems.coefficients_status": ["R", "Omega_0", "C_d"],
    "systems.height_status": ["h_n"],
    "systems.reduced_overstrength": ["Omega_0"],
    "systems.lower_part_coefficient": ["upper", "lower", "R_upper", "R_lower"],
    "systems.transferred_force_factor": ["R_upper", "R_lower"],
    "period.wall_ratio": ["A_B", "h_n"],
    "period.wall_period": ["h_n", "C_w"],
    "period.stories_formula_status": ["N", "h_n"],
    "period.period_bound": ["T_a", "C_u", "T_computed"],
    "period.drift_period": ["T_a", "C_u", "T_computed"],
    "base_shear.coefficient_multi": ["S_a", "R", "I_e"],
    "base_shear.response_coefficient_multi": ["S_a", "S_DS", "R", "I_e"],
    "base_shear.governing_bound_multi": ["S_a", "S_DS", "R", "I_e"],
    "base_shear.drift_coefficient": ["S_DS", "S_D1", "T", "T_L", "R", "I_e"],
    "base_shear.drift_bound": ["S_DS", "S_D1", "T", "T_L", "R", "I_e"],
    "base_shear.drift_coefficient_multi": ["S_a", "R", "I_e"],
    "base_shear.drift_bound_multi": ["S_a", "R", "I_e"],
    "base_shear.capped_S_DS": ["S_DS", "N", "T"],
    "base_shear.S_DS_cap_status": ["N", "T"],
    "base_shear.interaction_minimum": ["V", "R"],
    "two_stage.part_stiffness": ["V", "delta"],
    "two_stage.stiffness_ratio": ["K_lower", "K_upper"],
    "two_stage.period_ratio": ["T_whole", "T_upper"],
    "two_stage.reaction_factor": ["R_upper", "rho_upper", "R_lower", "rho_lower"],
    "two_stage.two_stage_status": ["stiffness_ratio", "period_ratio"],
    "dynamics.mode_period": ["mode"],
    "dynamics.mode_shape": ["mode"],
    "dynamics.mode_participation": ["mode"],
    "dynamics.mode_weight_share": ["mode"],
    "dynamics.modes_weight_share": ["modes"],
    "dynamics.modes_needed": ["share"],
    "dynamics.modes_verdict": ["modes"],
    "dynamics.modal_coefficient": ["S_a", "R", "I_e"],
    "dynamics.modal_force": ["mode", "C_sm"],
    "dynamics.modal_shear": ["mode", "C_sm"],
    "dynamics.modal_displacement": ["mode", "C_sm"],
    "dynamics.modal_drift": ["mode", "C_sm"],
    "dynamics.correlation": ["T_i", "T_j", "damping"],
    "dynamics.complete_combination": ["damping"],
    "dynamics.force_scale": ["V", "V_t"],
    "dynamics.drift_scale": ["V_t", "W", "R", "I_e"],
}


@pytest.mark.parametrize(
    ("name", "key"), [(name, key) for name, keys in ZERO_REFUSED.items() for key in keys]
)
def test_zero(name, key):
    refused(name, ImpossibleValue, f"{key} = 0: must be", **{key: 0.0})


@pytest.mark.parametrize(
    ("name", "key"), [(name, key) for name, keys in ZERO_REFUSED.items() for key in keys]
)
def test_the_limit_itself(name, key):
    """Whatever is above 0 may be small; whatever is at least 1 may be 1."""
    with pytest.raises(ImpossibleValue) as caught:
        function(name)(**{**CALLS[name], key: 0.0})
    allowed = {"must be above 0": 1e-3, "must be at least 1": 1.0}[caught.value.allowed]
    result = function(name)(**{**CALLS[name], key: allowed})
    assert isinstance(result, str) or np.isfinite(result).all()


ZERO_ACCEPTED = {
    "torsion.direct_shear": ["V"],
    "irregularity.reentrant_ratio": ["p_x", "p_y"],
    "irregularity.reentrant_irregularity": ["ratio"],
    "irregularity.diaphragm_irregularity": ["opening", "change"],
    "redundancy.counts_for_redundancy": ["V_x"],
    "load_effects.limited_overstrength_effect": ["Q_E", "E_cl"],
    "diaphragm.flexibility_ratio": ["delta_MDD"],
    "diaphragm.total_force": ["F_px", "F_transfer"],
    "diaphragm.collector_force": ["E_story", "E_sum", "E_low"],
    "diaphragm.wall_force": ["W_w"],
    "diaphragm.anchorage_factor": ["L_f"],
    "diaphragm.anchorage_force": ["W_p"],
    "diaphragm.first_mode_factor": ["c_m1"],
    "diaphragm.top_coefficient": ["G_m2", "C_s2"],
    "diaphragm.coefficient_at_height": ["h_x"],
    "diaphragm.alternative_force": ["w_px"],
    "separation.largest_displacement": ["delta_max", "delta_di"],
    "separation.required_separation": ["delta_M1", "delta_M2"],
    "separation.separation_verdict": ["gap", "delta_MT"],
    "separation.mce_displacement": ["delta_e", "delta_di"],
    "weight.area_weight": ["area", "unit_load"],
    "weight.storage_unit_load": ["live_load"],
    "weight.storage_ratio": ["w_storage"],
    "weight.partition_unit_load": ["partitions"],
    "weight.snow_unit_load": ["p_f"],
    "weight.level_weight": ["equipment"],
    "hazard.site_coefficient_short": ["S_S"],
    "hazard.site_coefficient_long": ["S_1"],
    "hazard.analysis_triggers": ["S_S", "S_1"],
    "hazard.mce_parameter_short": ["S_S"],
    "hazard.mce_parameter_one_second": ["S_1"],
    "hazard.mce_ordinate": ["S_a"],
    "hazard.design_ordinate": ["S_aM"],
    "hazard.multi_period_acceleration": ["T"],
    "hazard.method_1_acceleration": ["T"],
    "occupancy.design_category": ["S_1"],
    "occupancy.category_A_permitted": ["S_S", "S_1"],
    "hazard.spectral_acceleration": ["T"],
    "base_shear.coefficient_minimum_near_fault": ["S_1"],
    "base_shear.response_coefficient": ["S_1"],
    "base_shear.response_coefficient_multi": ["S_1"],
    "base_shear.drift_coefficient": ["S_1"],
    "base_shear.drift_coefficient_multi": ["S_1"],
    "vertical.story_force": ["C_vx"],
    "vertical.story_shear": ["h_x"],
    "vertical.overturning_moment": ["h_x"],
    "stability.stability_coefficient": ["P_x", "Delta"],
    "stability.second_order_factor": ["theta"],
    "stability.stability_verdict": ["theta"],
    "diaphragm.unlimited_force": ["w_px"],
    "diaphragm.minimum_force": ["w_px"],
    "diaphragm.design_force": ["w_px"],
    "dynamics.elastic_displacement": ["h_x"],
    "dynamics.modal_shear": ["h_x"],
    "dynamics.drift_scale": ["S_1"],
}


@pytest.mark.parametrize(
    ("name", "key"), [(name, key) for name, keys in ZERO_ACCEPTED.items() for key in keys]
)
def test_zero_that_is_a_value(name, key):
    result = function(name)(**{**CALLS[name], key: 0.0})
    assert isinstance(result, str) or np.isfinite(result).all()


CLT = "A. Cross-laminated timber shear walls"
BEYOND = [
    ("torsion.irregularity_ratio", ImpossibleValue, "mean of Delta_1 and Delta_2", {"Delta_2": -0.3}),
    ("torsion.accidental_moment", ImpossibleValue, "at most 3", {"amplifications": [1.0, 3.1, 1.0]}),
    ("torsion.accidental_moment", ImpossibleValue, "dimensions = 0", {"dimensions": [0.0, 9.0, 9.0]}),
    ("torsion.inherent_moment", WrongType, "centers = '2 values'", {"centers": [1.0, 2.0]}),
    ("torsion.inherent_moment", NotApplicable, "h_x = 0: must be the height of a level", {"h_x": 0.0}),
    ("torsion.center_of_rigidity", WrongType, "positions = '1 values'.*2 walls", {"positions": [1.0]}),
    ("torsion.polar_rigidity", WrongType, "distances = '1 values'.*3 walls", {"distances": [1.0]}),
    ("torsion.polar_rigidity", ImpossibleValue, "'0 walls': must be 1 to 1000", {"rigidities": []}),
    ("torsion.polar_rigidity", WrongType, "must be one list", {"rigidities": [[5.0], [6.0]]}),
    ("irregularity.stiffness_ratio", NotApplicable, "h_x = 24: must be", {"h_x": 24.0}),
    ("irregularity.stiffness_ratio", ImpossibleValue, "stiffnesses = 0", {"stiffnesses": [0.0, 1.0, 1.0]}),
    (
        *("irregularity.stiffness_ratio", NotApplicable, "stiffnesses = 9: levels at one height hold diff"),
        {"heights": [11.0, 25.0, 25.0], "stiffnesses": [5.0, 8.0, 9.0]},
    ),
    ("irregularity.weight_ratio", ImpossibleValue, "at least one level", {"weights": [0.0, 0.0, 0.0]}),
    ("irregularity.drift_exception", ImpossibleValue, "drift_ratios = 0", {"drift_ratios": [0.0, 1.0, 1.0]}),
    ("irregularity.diaphragm_irregularity", ImpossibleValue, "opening = 1.01", {"opening": 1.01}),
    ("redundancy.redundancy_in_use", ImpossibleValue, "rho = 1.31: must be at most 1.3", {"rho": 1.31}),
    ("load_effects.horizontal_effect", ImpossibleValue, "rho = 1.31: must be at most 1.3", {"rho": 1.31}),
    ("diaphragm.total_force", ImpossibleValue, "rho = 1.31: must be at most 1.3", {"rho": 1.31}),
    ("diaphragm.first_mode_factor", ImpossibleValue, "N = 2.5: must be a whole", {"N": [2.0, 2.5]}),
    (
        "diaphragm.coefficient_at_height",
        ImpossibleValue,
        "h_x = 61: must be at most h_n",
        {"h_x": [9.0, 61.0]},
    ),
    ("diaphragm.coefficient_at_height", ImpossibleValue, "h_n = 0: must be above 0", {"h_n": 0.0}),
    ("diaphragm.anchorage_force", ImpossibleValue, "k_a = 2.1: must be at most 2", {"k_a": 2.1}),
    ("systems.response_modification", NotApplicable, "system = 'B.99': .*85 texts", {"system": "B.99"}),
    (
        *("systems.response_modification", NotApplicable, "R = 3 is uncertain here"),
        {"system": CLT, "edition": "7-22"},
    ),
    ("systems.overstrength", NotApplicable, "Omega0 = 3 is uncertain", {"system": CLT, "edition": "7-22"}),
    ("systems.confidence", NotApplicable, "85 texts from 'A. Special", {"system": CLT}),
    (
        *("systems.height_limit", NotApplicable, "increase = 'yes': 12.2.5.4 is not known to list"),
        {"system": "A. Special reinforced masonry shear walls", "increase": "yes"},
    ),
    ("systems.coefficient_of_least_R", WrongType, "coefficients = '2 values'", {"coefficients": [4.0, 3.5]}),
    ("systems.least_R", ImpossibleValue, "0 systems': must be 1 to 1000", {"R_systems": []}),
    ("systems.least_R", WrongType, "must be one list", {"R_systems": [[5.0], [6.0]]}),
    ("period.wall_ratio", WrongType, "wall_lengths = '1 values'", {"wall_lengths": [20.0]}),
    ("period.wall_ratio", ImpossibleValue, "wall_areas = 0: must be above", {"wall_areas": [0.0, 9.0]}),
    ("period.wall_ratio", ImpossibleValue, "wall_lengths = 0: must be", {"wall_lengths": [0.0, 9.0]}),
    ("period.wall_period", NotApplicable, "h_n = 120.001: must be at most 120", {"h_n": [9.0, 120.001]}),
    (
        *("period.wall_period", NotApplicable, "h_n = 36.601: must be at most 36.6"),
        {"h_n": 36.601, "units": "si"},
    ),
    ("period.rayleigh_period", ImpossibleValue, "forces = -1: must be", {"forces": [9.0, -1.0, 9.0]}),
    (
        *("period.rayleigh_period", ImpossibleValue, "displacements = -1: must be at least 0"),
        {"displacements": [0.3, -1.0, 0.4]},
    ),
    ("period.rayleigh_period", ImpossibleValue, "must move a force", {"forces": [0.0, 0.0, 0.0]}),
    ("period.rayleigh_period", ImpossibleValue, "and a weight", {"weights": [0.0, 0.0, 0.0]}),
    ("period.rayleigh_period", ImpossibleValue, "must move", {"displacements": [0.0, 0.0, 0.0]}),
    ("period.rayleigh_period", WrongType, "one for each of 3 levels", {"forces": [1.0, 2.0]}),
    ("period.stories_formula_status", ImpossibleValue, "N = 2.5: must be a whole", {"N": 2.5}),
    ("base_shear.S_DS_cap_status", ImpossibleValue, "N = 2.5: must be a whole", {"N": 2.5}),
    ("base_shear.response_coefficient_multi", NotApplicable, "one of 7-22", {"edition": "7-16"}),
    ("base_shear.drift_coefficient_multi", NotApplicable, "one of 7-22", {"edition": "7-16"}),
    ("weight.level_weight", WrongType, "must be one for each of 2 areas", {"unit_loads": [1.0, 2.0, 3.0]}),
    ("weight.level_weight", ImpossibleValue, "1 to 1000 items", {"areas": [], "unit_loads": []}),
    (
        *("weight.level_weight", ImpossibleValue, "1 to 1000 items"),
        {"areas": [1.0] * 1001, "unit_loads": [1.0] * 1001},
    ),
    ("weight.level_weight", WrongType, "must be one list", {"areas": [[1.0, 2.0]] * 2}),
    ("dynamics.mode_period", ImpossibleValue, "mode = 1.5: must be a whole number", {"mode": [1.0, 1.5]}),
    ("dynamics.mode_period", NotApplicable, "mode = 4: must be at most 3, the number", {"mode": [3.0, 4.0]}),
    (
        *("dynamics.mode_shape", NotApplicable, "mode = 3: must be at most 2, the number"),
        {"mode": 3.0, "weights": [300.0, 0.0, 120.0]},
    ),
    (
        *("dynamics.modes_weight_share", NotApplicable, "modes = 3: must be at most 2"),
        {"modes": 3.0, "heights": [11.0, 25.0, 25.0], "stiffnesses": [90.0, 60.0, 60.0]},
    ),
    (
        *("dynamics.elastic_displacement", NotApplicable, "stiffnesses = 40: levels at one height"),
        {"heights": [11.0, 25.0, 25.0]},
    ),
    (
        *("dynamics.story_stiffness", NotApplicable, "displacements = 1.2: levels at one height"),
        {"heights": [11.0, 25.0, 25.0]},
    ),
    (
        *("dynamics.story_stiffness", ImpossibleValue, "displacements = 0: the drift of a story must go"),
        {"displacements": [0.8, 0.8, 1.2]},
    ),
    (
        *("dynamics.story_stiffness", ImpossibleValue, "displacements = -0.1: the drift of a story must go"),
        {"displacements": [0.9, 0.8, 1.2]},
    ),
    ("dynamics.story_stiffness", NotApplicable, "h_x = 0: must be the height of a level$", {"h_x": 0.0}),
    ("dynamics.story_stiffness", WrongType, "displacements = '2 values'", {"displacements": [1.0, 2.0]}),
    ("dynamics.elastic_displacement", NotApplicable, "h_x = 24: .* a level or 0", {"h_x": 24.0}),
    ("dynamics.elastic_displacement", WrongType, "stiffnesses = '2 values'", {"stiffnesses": [1.0, 2.0]}),
    ("dynamics.elastic_displacement", ImpossibleValue, "above 0", {"stiffnesses": [9.0, 0.0, 4.0]}),
    ("dynamics.modal_force", NotApplicable, "w_x = 300: must be the weight", {"w_x": 300.0}),
    ("dynamics.modal_drift", NotApplicable, "h_x = 0: must be the height of a level$", {"h_x": 0.0}),
    (
        *("dynamics.mode_period", ImpossibleValue, "stories differ too much: weight is lost"),
        {"stiffnesses": [1e17, 60.0, 40.0]},
    ),
    ("dynamics.modes_needed", ImpossibleValue, "share = 1.1: must be at most 1", {"share": 1.1}),
    ("dynamics.correlation", ImpossibleValue, "damping = 1.1: must be at most 1", {"damping": 1.1}),
    ("dynamics.complete_combination", WrongType, "one for each of 3 modes", {"periods": [1.0, 0.9]}),
    ("dynamics.absolute_sum", ImpossibleValue, "0 modes': must be 1 to 1000", {"values": []}),
    ("dynamics.absolute_sum", ImpossibleValue, "1001 modes': must be 1 to 1000", {"values": [1.0] * 1001}),
    ("period.approximate_period_stories", ImpossibleValue, "N = 2.5: must be a whole", {"N": [2.0, 2.5]}),
    ("period.approximate_period_stories", NotApplicable, "N = 13: must be at most", {"N": [2.0, 13.0]}),
    ("stability.second_order_factor", ImpossibleValue, "theta = 1.5: must be below", {"theta": [0.2, 1.5]}),
    ("torsion.amplification", ImpossibleValue, "d_max = 0.9: in parts of d_avg", {"d_max": [1.5, 0.9]}),
    ("vertical.story_shear", WrongType, "forces = .*rows of one length", {"forces": [[1.0], [2.0, 3.0]]}),
    (
        *("vertical.distribution_factors", ImpossibleValue, "at least one level must have"),
        {"weights": [[1.0, 2.0, 3.0], [0.0, 0.0, 0.0]]},
    ),
    ("vertical.story_shear", NotApplicable, "h_x = 12: must be the height", {"h_x": [11.0, 12.0]}),
    ("diaphragm.design_force", NotApplicable, "w_px = 251: must be", {"w_px": [240.0, 251.0], "h_x": 25.0}),
    (
        *("diaphragm.design_force", NotApplicable, "w_px = 0.4: must be at most the weight"),
        {"w_px": 0.4, "weights": [300.0, 0.0, 120.0]},
    ),
    ("period.approximate_period_stories", ImpossibleValue, "whole number", {"N": 2.5}),
    ("period.approximate_period_stories", NotApplicable, "at most 12 stories", {"N": 13.0}),
    ("base_shear.response_coefficient", ImpossibleValue, "R = 0.999: must be at least 1", {"R": 0.999}),
    ("base_shear.response_coefficient", ImpossibleValue, "I_e = 0.9: must be at least 1", {"I_e": 0.9}),
    ("vertical.distribution_factors", ImpossibleValue, "k = 2.1: must be at most 2", {"k": 2.1}),
    ("vertical.distribution_factors", ImpossibleValue, "k = 0.9: must be at least 1", {"k": 0.9}),
    ("vertical.distribution_factors", ImpossibleValue, "at least one level", {"weights": [0.0, 0.0, 0.0]}),
    (
        "vertical.distribution_factors",
        ImpossibleValue,
        "heights = 0: must be above 0",
        {"heights": [0.0, 5, 9]},
    ),
    ("vertical.distribution_factors", WrongType, "one for each of 3 levels", {"weights": [1.0, 2.0]}),
    ("vertical.distribution_factors", ImpossibleValue, "1 to 1000 levels", {"weights": [], "heights": []}),
    (
        *("vertical.distribution_factors", ImpossibleValue, "1 to 1000 levels"),
        {"weights": [1.0] * 1001, "heights": [1.0] * 1001},
    ),
    (
        "vertical.distribution_factors",
        WrongType,
        "shapes must fit",
        {"k": [1.0, 1.5], "weights": [[1.0, 2, 3]] * 3},
    ),
    ("vertical.distribution_factor", NotApplicable, "w_x = 300: must be the weight", {"w_x": 300.0}),
    ("vertical.distribution_factor", NotApplicable, "h_x = 24: must be the height of a level", {"h_x": 24.0}),
    ("vertical.distribution_factor", NotApplicable, "h_x = 0: must be the height of a level$", {"h_x": 0.0}),
    (
        "vertical.distribution_factor",
        NotApplicable,
        "w_x = 250: must be",
        {"w_x": [300.0, 250.0], "h_x": 11.0},
    ),
    ("vertical.story_force", ImpossibleValue, "C_vx = 1.01: must be at most 1", {"C_vx": 1.01}),
    ("vertical.story_shear", NotApplicable, "h_x = 24: must be the height of a level or 0", {"h_x": 24.0}),
    ("vertical.story_shear", WrongType, "forces = '2 values'", {"forces": [1.0, 2.0]}),
    ("vertical.overturning_moment", NotApplicable, "h_x = 39: must be", {"h_x": 39.0}),
    ("vertical.story_height", NotApplicable, "h_x = 0: must be the height of a level", {"h_x": 0.0}),
    ("vertical.value_below", NotApplicable, "h_x = 0: must be the height of a level", {"h_x": 0.0}),
    (
        "vertical.value_below",
        NotApplicable,
        "hold different values",
        {"h_x": 38.0, "heights": [11.0, 11.0, 38.0]},
    ),
    ("torsion.amplification", ImpossibleValue, "at least the mean displacement", {"d_max": 0.99}),
    ("stability.stability_limit", ImpossibleValue, "beta = 1.01: must be at most 1", {"beta": 1.01}),
    ("stability.second_order_factor", ImpossibleValue, "theta = 1: must be below 1", {"theta": 1.0}),
    ("diaphragm.design_force", NotApplicable, "w_px = 251: must be at most", {"w_px": 251.0}),
    ("diaphragm.design_force", NotApplicable, "h_x = 0: must be the height of a level", {"h_x": 0.0}),
    (
        "hazard.spectral_acceleration",
        WrongType,
        "shapes must fit",
        {"T": [0.1, 0.2], "S_D1": [0.4, 0.5, 0.6]},
    ),
]


@pytest.mark.parametrize(
    ("name", "error", "match", "changes"), BEYOND, ids=[f"{name}: {match}" for name, _, match, _ in BEYOND]
)
def test_beyond_a_limit(name, error, match, changes):
    refused(name, error, match, **changes)


@pytest.mark.parametrize(
    ("error", "code"),
    [(ImpossibleValue, "#NUM!"), (WrongType, "#VALUE!"), (MissingValue, "#VALUE!"), (NotApplicable, "#N/A")],
)
def test_cause_names_the_cell_error(error, code):
    assert error.cell_code == code
