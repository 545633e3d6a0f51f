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


EITHER_WAY = {"delta_xe", "d_upper", "d_lower", "forces", "values", "displacements"}
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
    "hazard.spectral_acceleration": ["T"],
    "base_shear.coefficient_minimum_near_fault": ["S_1"],
    "base_shear.response_coefficient": ["S_1"],
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


BEYOND = [
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
