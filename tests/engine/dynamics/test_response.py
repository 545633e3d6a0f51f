"""Response in one mode: equilibrium, statics, and the sum over all modes of a rigid response."""

from __future__ import annotations

import numpy as np
import pytest
from hypothesis import given

from engine.dynamics import (
    elastic_displacement,
    modal_coefficient,
    modal_displacement,
    modal_drift,
    modal_force,
    modal_shear,
    mode_period,
    mode_weight_share,
)
from engine.units import GRAVITY
from engine.vertical import story_shear
from tests.support.shear_buildings import FEW, models, ordinates, stiffness_matrix

C_SM = 0.12


def forces(model, modes):
    given_levels = list(zip(model["weights"], model["heights"], strict=True))
    return np.array(
        [[modal_force(mode=m, w_x=w, h_x=h, C_sm=C_SM, **model) for m in modes] for w, h in given_levels]
    )


def near(found, expected):
    """Equal but for round-off of the largest value: signs make small differences of large numbers."""
    return np.abs(np.asarray(found) - expected).max() <= 1e-10 * np.abs(expected).max()


@FEW
@given(models())
def test_forces_of_a_mode_add_up_to_its_effective_weight(model):
    modes = np.arange(1, len(model["heights"]) + 1)
    F = forces(model, modes)
    base = modal_shear(mode=modes, h_x=0.0, C_sm=C_SM, **model)
    assert near(F.sum(axis=0), base)
    assert near(base, C_SM * mode_weight_share(modes, **model) * model["weights"].sum())
    assert near(F.sum(axis=1), C_SM * model["weights"])


@FEW
@given(models())
def test_shears_are_sums_of_forces_and_drifts_steps_of_displacements(model):
    h, modes = model["heights"], np.arange(1, len(model["heights"]) + 1)
    F = forces(model, modes)
    V = ordinates(modal_shear, model, modes, C_sm=C_SM)
    delta = ordinates(modal_displacement, model, modes, C_sm=C_SM)
    Delta = ordinates(modal_drift, model, modes, C_sm=C_SM)
    for m in modes - 1:
        assert near(V[:, m], story_shear(h, F[:, m], h))
        assert near(Delta[:, m], np.diff(delta[:, m], prepend=0.0))
        assert near(Delta[:, m] * model["stiffnesses"], V[:, m])


@FEW
@given(models())
def test_displacements_of_a_mode_are_those_of_its_forces(model):
    modes = np.arange(1, len(model["heights"]) + 1)
    F = forces(model, modes)
    delta = ordinates(modal_displacement, model, modes, C_sm=C_SM)
    solved = np.linalg.solve(stiffness_matrix(model["stiffnesses"]), F)
    for m in modes - 1:
        assert near(delta[:, m], solved[:, m])
        static = elastic_displacement(
            model["heights"], F[:, m], **{k: v for k, v in model.items() if k != "weights"}
        )
        assert near(delta[:, m], static)


def test_one_story_is_an_oscillator():
    """delta = S_a g/omega^2 of a single mass, divided by R/I_e."""
    model = {"weights": [300.0], "stiffnesses": [40.0], "heights": [12.0]}
    C_sm = modal_coefficient(S_a=0.8, R=8.0, I_e=1.25)
    T = mode_period(mode=1, **model, units="us")
    expected = 0.8 * GRAVITY["us"] * (T / (2 * np.pi)) ** 2 / 6.4
    given_mode = {"mode": 1, "h_x": 12.0, "C_sm": C_sm, **model}
    assert modal_displacement(**given_mode) == pytest.approx(expected, rel=1e-14)
    assert modal_drift(**given_mode) == pytest.approx(0.8 / 6.4 * 300 / 40, rel=1e-14)
    assert modal_shear(**given_mode) == pytest.approx(0.8 / 6.4 * 300, rel=1e-14)


def test_levels_at_one_height_share_the_story_and_keep_their_own_forces():
    model = {"weights": [90.0, 30.0, 50.0], "stiffnesses": [40.0, 25.0, 25.0], "heights": [10.0, 20.0, 20.0]}
    whole = {"weights": [90.0, 80.0], "stiffnesses": [40.0, 25.0], "heights": [10.0, 20.0]}
    for mode in (1, 2):
        at_roof = {"mode": mode, "h_x": 20.0, "C_sm": 0.1}
        for rule in (modal_shear, modal_displacement, modal_drift):
            assert rule(**at_roof, **model) == pytest.approx(rule(**at_roof, **whole), rel=1e-12)
        parts = [modal_force(w_x=w, **at_roof, **model) for w in (30.0, 50.0)]
        assert sum(parts) == pytest.approx(modal_force(w_x=80.0, **at_roof, **whole), rel=1e-12)
        assert parts[0] / parts[1] == pytest.approx(0.6)


@FEW
@given(models())
def test_order_of_rows_does_not_matter(model):
    order = np.random.default_rng(5).permutation(len(model["heights"]))
    mixed = {key: value[order] for key, value in model.items()}
    for rule in (modal_shear, modal_displacement, modal_drift):
        straight = rule(mode=1, h_x=model["heights"], C_sm=C_SM, **model)
        assert (rule(mode=1, h_x=model["heights"], C_sm=C_SM, **mixed) == straight).all()


@FEW
@given(models())
def test_unit_systems_agree(model):
    kip, inch, foot = 4.4482216152605, 25.4, 0.3048
    si = {
        "weights": model["weights"] * kip,
        "stiffnesses": model["stiffnesses"] * kip / inch,
        "heights": model["heights"] * foot,
    }
    for rule, unit in ((modal_shear, kip), (modal_displacement, inch), (modal_drift, inch)):
        us = rule(mode=1, h_x=model["heights"], C_sm=C_SM, **model)
        assert rule(mode=1, h_x=si["heights"], C_sm=C_SM, **si) == pytest.approx(us * unit, rel=1e-12)
