"""Combinations over the modes: thirty digits, bounds and limits; both sides of each scaling."""

from __future__ import annotations

import mpmath
import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

from engine.dynamics import (
    absolute_sum,
    complete_combination,
    correlation,
    drift_scale,
    force_scale,
    square_root_of_squares,
)
from tests.support.shear_buildings import FEW

DAMPING = st.floats(0.005, 1.0)
#: to a thousandth: squares of numbers below 1e-154 would vanish
VALUES = st.integers(-100_000, 100_000).map(lambda n: n / 1000)
RESPONSES = st.lists(
    st.tuples(VALUES, st.floats(0.02, 10.0)),
    min_size=1,
    max_size=8,
    unique_by=lambda x: x[1],
)


def columns(rows):
    values, periods = zip(*rows, strict=True)
    return list(values), list(periods)


def exact(values, periods, damping):
    """The double sum by the form with the ratio of frequencies, not ordered."""
    with mpmath.workdps(30):
        z, total = mpmath.mpf(damping), mpmath.mpf(0)
        for r_i, T_i in zip(values, periods, strict=True):
            for r_j, T_j in zip(values, periods, strict=True):
                b = mpmath.mpf(T_j) / mpmath.mpf(T_i)
                rho = 8 * z**2 * (1 + b) * b ** mpmath.mpf("1.5")
                rho /= (1 - b**2) ** 2 + 4 * z**2 * b * (1 + b) ** 2
                total += rho * mpmath.mpf(r_i) * mpmath.mpf(r_j)
        return float(mpmath.sqrt(max(total, 0)))


@FEW
@given(RESPONSES, DAMPING)
def test_thirty_digits_agree(rows, damping):
    values, periods = columns(rows)
    size = absolute_sum(values)
    found = complete_combination(values, periods, damping)
    assert found == pytest.approx(exact(values, periods, damping), rel=1e-9, abs=1e-7 * size)


@FEW
@given(RESPONSES, DAMPING)
def test_no_combination_leaves_its_bounds(rows, damping):
    values, periods = columns(rows)
    most, r = absolute_sum(values), complete_combination(values, periods, damping)
    assert 0 <= r <= most * (1 + 1e-12)
    assert np.abs(values).max() <= square_root_of_squares(values) * (1 + 1e-12)
    assert square_root_of_squares(values) <= most * (1 + 1e-12)
    same_sign = np.abs(values)
    assert complete_combination(same_sign, periods, damping) >= square_root_of_squares(values) * (1 - 1e-12)


@FEW
@given(RESPONSES, DAMPING)
def test_order_sign_and_unit_of_time_do_not_matter(rows, damping):
    values, periods = columns(rows)
    r, size = complete_combination(values, periods, damping), absolute_sum(values)
    for other in (
        complete_combination(values[::-1], periods[::-1], damping),
        complete_combination(-np.array(values), periods, damping),
        complete_combination(values, 2.0 * np.array(periods), damping),
    ):
        assert other == pytest.approx(r, rel=1e-9, abs=1e-7 * size)
    assert square_root_of_squares(values[::-1]) == pytest.approx(square_root_of_squares(values), rel=1e-14)


@FEW
@given(st.lists(VALUES, min_size=1, max_size=6), DAMPING)
def test_modes_of_one_period_add_with_their_signs(values, damping):
    r = complete_combination(values, [0.7] * len(values), damping)
    assert r == pytest.approx(abs(sum(values)), rel=1e-9, abs=1e-6)


def test_modes_that_cancel_give_0_and_no_square_root_of_less():
    """Round-off makes the double sum of the first two negative."""
    for values in ([0.9, 8.7, -9.6], [7.1, -9.3, 2.2], [0.1, 0.2, -0.3]):
        assert complete_combination(values, [1.0] * 3, 0.05) == pytest.approx(0.0, abs=1e-6)


def test_well_separated_modes_are_those_of_the_squares():
    values = [3.0, -4.0, 12.0]
    assert complete_combination(values, [10.0, 0.1, 0.001], 0.05) == pytest.approx(13.0, rel=1e-4)
    assert complete_combination(values, [1.0, 0.8, 0.6], 1e-9) == pytest.approx(13.0, rel=1e-12)


def test_opposite_signs_of_close_modes_cancel_in_part():
    close = {"periods": [1.0, 0.95], "damping": 0.05}
    same, opposite = (complete_combination([3.0, s * 3.0], **close) for s in (1, -1))
    assert opposite < square_root_of_squares([3.0, 3.0]) < same


@FEW
@given(st.floats(0.01, 20.0), st.floats(0.01, 20.0), DAMPING)
def test_correlation_is_symmetric_and_at_most_1(T_i, T_j, damping):
    rho = correlation(T_i, T_j, damping)
    assert 0 < rho <= 1 + 1e-12
    assert correlation(T_j, T_i, damping) == rho
    assert correlation(T_i, T_i, damping) == pytest.approx(1.0, rel=1e-14)


def test_all_levels_are_combined_at_once():
    values = np.array([[3.0, 4.0], [-1.0, 2.0], [5.0, 0.0]])
    together = complete_combination(values, [1.0, 0.9], 0.05)
    alone = [complete_combination(row, [1.0, 0.9], 0.05) for row in values]
    assert together.tolist() == pytest.approx(alone, rel=1e-15)
    assert square_root_of_squares(values).tolist() == pytest.approx([5.0, 5**0.5, 5.0])


@pytest.mark.parametrize(("V_t", "factor"), [(99.0, 100 / 99), (100.0, 1.0), (101.0, 1.0)])
def test_forces_are_scaled_to_all_of_V(V_t, factor):
    assert force_scale(V=100.0, V_t=V_t) == pytest.approx(factor)


@pytest.mark.parametrize(
    ("V_t", "S_1", "factor"),
    [(74.0, 0.6, 75 / 74), (75.0, 0.6, 1.0), (76.0, 0.6, 1.0), (10.0, 0.6 - 1e-9, 1.0), (10.0, 0.0, 1.0)],
)
def test_drifts_are_scaled_to_the_near_fault_minimum_alone(V_t, S_1, factor):
    """By hand: 0.5 x 0.6/(5/1.25) x 1000 = 75."""
    assert drift_scale(V_t=V_t, W=1000.0, S_1=S_1, R=5.0, I_e=1.25) == pytest.approx(factor)
