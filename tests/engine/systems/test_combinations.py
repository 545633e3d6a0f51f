"""Combinations of systems, on both sides of equal R and with ties."""

from __future__ import annotations

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from engine.systems import (
    coefficient_of_least_R,
    least_R,
    lower_part_coefficient,
    transferred_force_factor,
)

FEW = settings(max_examples=40, deadline=None)
COEFFICIENTS = st.floats(1.0, 8.0)


@pytest.mark.parametrize(
    ("R_upper", "R_lower", "lower_part", "factor"),
    [(6.5, 5.0, 3.5, 1.3), (5.0, 5.0, 4.0, 1.0), (5.0, np.nextafter(5.0, 4), 3.5, 1.0), (3.0, 5.0, 4.0, 1.0)],
)
def test_the_lower_part(R_upper, R_lower, lower_part, factor):
    parts = {"R_upper": R_upper, "R_lower": R_lower}
    assert lower_part_coefficient(upper=4.0, lower=3.5, **parts) == lower_part
    assert transferred_force_factor(**parts) == pytest.approx(factor)


@FEW
@given(COEFFICIENTS, COEFFICIENTS)
def test_the_lower_part_never_has_the_larger_R(R_upper, R_lower):
    R = lower_part_coefficient(R_upper, R_lower, R_upper, R_lower)
    assert min(R_upper, R_lower) == R
    assert transferred_force_factor(R_upper, R_lower) == pytest.approx(max(R_upper / R, 1.0))


def test_a_tie_takes_the_larger_coefficient_also_beyond_round_off():
    assert coefficient_of_least_R(coefficients=[3.0, 4.0, 9.0], R_systems=[5.0, 5.0, 6.0]) == 4.0
    assert coefficient_of_least_R(coefficients=[3.0, 4.0], R_systems=[5.0, np.nextafter(5.0, 6)]) == 4.0
    assert coefficient_of_least_R(coefficients=[3.0, 4.0], R_systems=[5.0, 5.001]) == 3.0


@FEW
@given(st.lists(st.tuples(COEFFICIENTS, COEFFICIENTS), min_size=1, max_size=9))
def test_the_order_of_the_systems_is_free(pairs):
    coefficients, R = zip(*pairs, strict=True)
    assert least_R(R) == min(R)
    assert coefficient_of_least_R(coefficients, R) == coefficient_of_least_R(coefficients[::-1], R[::-1])
    assert coefficient_of_least_R(coefficients, R) in coefficients
