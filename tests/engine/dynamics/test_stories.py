"""Displacements from story stiffness against a linear solver, and back."""

from __future__ import annotations

import numpy as np
import pytest
from hypothesis import given

from engine.dynamics import elastic_displacement, story_stiffness
from tests.support.shear_buildings import FEW, models, stiffness_matrix


def loaded(model):
    """The model's levels under forces in proportion to its weights."""
    return {"forces": 0.1 * model["weights"], "heights": model["heights"]}


@FEW
@given(models(most=40))
def test_a_linear_solver_agrees(model):
    k, h = model["stiffnesses"], model["heights"]
    forces = np.random.default_rng(len(h)).uniform(-20.0, 90.0, len(h))
    solved = np.linalg.solve(stiffness_matrix(k), forces)
    found = elastic_displacement(h, forces, k, h)
    assert np.abs(found - solved).max() <= 1e-9 * np.abs(solved).max()
    assert elastic_displacement(0.0, forces, k, h) == 0.0


@FEW
@given(models(most=40))
def test_stiffness_comes_back_from_the_displacements_in_any_order(model):
    k, h = model["stiffnesses"], model["heights"]
    delta = elastic_displacement(h, stiffnesses=k, **loaded(model))
    assert story_stiffness(h, displacements=delta, **loaded(model)) == pytest.approx(k, rel=1e-9)
    order = np.random.default_rng(7).permutation(len(h))
    mixed = {key: value[order] for key, value in loaded(model).items()}
    assert elastic_displacement(h, stiffnesses=k[order], **mixed) == pytest.approx(delta, rel=1e-12)
    assert story_stiffness(h, displacements=delta[order], **mixed) == pytest.approx(k, rel=1e-9)


def test_both_directions_of_a_load_give_the_same_stiffness():
    given_levels = {"h_x": [12.0, 24.0], "heights": [12.0, 24.0]}
    for sign in (1.0, -1.0):
        k = story_stiffness(
            forces=[4 * sign, 6 * sign], displacements=[0.5 * sign, 0.8 * sign], **given_levels
        )
        assert k == pytest.approx([20.0, 20.0])


def test_levels_at_one_height_stand_on_one_story():
    """By hand: 60 on 30 below, 25 + 15 on 20 above."""
    model = {"forces": [20.0, 25.0, 15.0], "heights": [10.0, 22.0, 22.0]}
    delta = elastic_displacement([10.0, 22.0], stiffnesses=[30.0, 20.0, 20.0], **model)
    assert delta.tolist() == [2.0, 4.0]
    assert story_stiffness([10.0, 22.0], displacements=[2.0, 4.0, 4.0], **model).tolist() == [30.0, 20.0]


def test_noise_of_a_subtraction_makes_no_second_story():
    noisy = 16.1 - 4.1
    assert noisy != 12.0
    model = {"forces": [1.0, 1.0, 2.0], "stiffnesses": [4.0, 4.0, 2.0], "heights": [noisy, 12.0, 24.0]}
    assert elastic_displacement([12.0, 24.0], **model).tolist() == [1.0, 2.0]
