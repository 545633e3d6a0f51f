"""What must hold for every building: closure, order, units, monotony, bounds."""

from __future__ import annotations

import numpy as np
from hypothesis import given, settings
from hypothesis import strategies as st

from engine.base_shear import response_coefficient
from engine.diaphragm import design_force, maximum_force, minimum_force
from engine.hazard import spectral_acceleration
from engine.vertical import (
    distribution_factor,
    distribution_factors,
    exponent,
    overturning_moment,
    story_force,
    story_height,
    story_shear,
)

FEW = settings(max_examples=40, deadline=None)
FOOT, KIP = 0.3048, 4.4482216152605


@st.composite
def buildings(draw, most=100):
    n = draw(st.integers(1, most))
    seed = np.random.default_rng(draw(st.integers(0, 2**32 - 1)))
    heights = np.cumsum(seed.uniform(8.0, 20.0, n))
    weights = np.where(seed.random(n) < 0.1, 0.0, seed.uniform(1.0, 5000.0, n))
    weights[seed.integers(n)] = 700.0
    return weights, heights, draw(st.floats(1.0, 2.0)), draw(st.floats(1.0, 1e5)), seed.permutation(n)


@FEW
@given(buildings())
def test_forces_close(building):
    weights, heights, k, V, _ = building
    C_vx = distribution_factors(weights, heights, k)
    F = story_force(V, C_vx)
    assert abs(C_vx.sum() - 1) <= 1e-12
    assert abs(F.sum() - V) <= 1e-12 * V
    assert abs(story_shear(0.0, F, heights) - V) <= 1e-12 * V
    assert abs(overturning_moment(0.0, F, heights) - (F * heights).sum()) <= 1e-12 * V * heights[-1]
    assert abs(story_height(heights, heights).sum() - heights[-1]) <= 1e-12 * heights[-1]


@FEW
@given(buildings())
def test_order_of_rows_does_not_matter(building):
    weights, heights, k, V, order = building
    F = story_force(V, distribution_factors(weights, heights, k))
    mixed = story_force(V, distribution_factors(weights[order], heights[order], k))
    assert np.allclose(mixed, F[order], rtol=1e-12, atol=0)
    for rule in (story_shear, overturning_moment):
        straight, shuffled = rule(heights, F, heights), rule(heights, F[order], heights[order])
        assert np.allclose(shuffled, straight, rtol=1e-12, atol=1e-12 * V * heights[-1])
    assert (story_height(heights, heights[order]) == story_height(heights, heights)).all()


@FEW
@given(buildings())
def test_unit_systems_agree(building):
    weights, heights, k, V, _ = building
    us = story_force(V, distribution_factors(weights, heights, k))
    si = story_force(V * KIP, distribution_factors(weights * KIP, heights * FOOT, k))
    assert np.allclose(si, us * KIP, rtol=1e-12, atol=0)
    moment = overturning_moment(0.0, us, heights) * KIP * FOOT
    assert np.isclose(overturning_moment(0.0, si, heights * FOOT), moment, rtol=1e-12)


@FEW
@given(buildings())
def test_one_level_is_its_row_of_the_column(building):
    weights, heights, k, _, _ = building
    column = distribution_factors(weights, heights, k)
    assert np.allclose(distribution_factor(weights, heights, weights, heights, k), column, rtol=1e-12, atol=0)


@FEW
@given(buildings())
def test_shear_grows_downwards_and_a_higher_k_lifts_the_forces(building):
    weights, heights, k, V, _ = building
    F = story_force(V, distribution_factors(weights, heights, k))
    V_x = story_shear(heights, F, heights)
    assert (np.diff(V_x) <= 1e-12 * V).all()
    linear = story_force(V, distribution_factors(weights, heights, 1.0))
    assert overturning_moment(0.0, F, heights) >= overturning_moment(0.0, linear, heights) * (1 - 1e-12)


@FEW
@given(buildings(most=30))
def test_diaphragm_forces_keep_both_limits(building):
    weights, heights, k, V, _ = building
    F = story_force(V, distribution_factors(weights, heights, k))
    F_px = design_force(weights, heights, F, weights, heights, 0.8, 1.25)
    assert (F_px >= minimum_force(weights, 0.8, 1.25)).all()
    assert (F_px <= maximum_force(weights, 0.8, 1.25)).all()


@FEW
@given(st.floats(0.01, 20.0), st.floats(0.0, 5.0))
def test_exponent_is_bounded_and_grows_with_the_period(T, more):
    for rule in ("interpolate", "two"):
        assert 1.0 <= exponent(T, rule) <= exponent(T + more, rule) <= 2.0
    assert exponent(T) <= exponent(T, "two")


SITES = st.fixed_dictionaries(
    {"S_DS": st.floats(0.1, 3.0), "S_D1": st.floats(0.05, 2.0), "T_L": st.floats(4.0, 16.0)}
)


@FEW
@given(SITES, st.floats(0.0, 1.2), st.floats(0.01, 20.0), st.floats(0.0, 5.0), st.floats(1.0, 8.0))
def test_coefficient_falls_with_period_and_ductility(site, S_1, T, more, R):
    given_site = {**site, "S_1": S_1, "I_e": 1.0, "edition": "7-22"}
    C_s = response_coefficient(T=T, R=R, **given_site)
    assert response_coefficient(T=T + more, R=R, **given_site) <= C_s * (1 + 1e-12)
    assert response_coefficient(T=T, R=R + 1, **given_site) <= C_s * (1 + 1e-12)
    assert response_coefficient(T=T, R=R, **{**given_site, "I_e": 1.5}) >= C_s * (1 - 1e-12)
    assert response_coefficient(T=T, R=R, **{**given_site, "edition": "7-16"}) == C_s


@FEW
@given(SITES, st.floats(0.0, 20.0))
def test_spectrum_stays_between_0_and_its_plateau(site, T):
    assert 0 < spectral_acceleration(T=T, **site) <= site["S_DS"]
