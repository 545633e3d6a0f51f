"""The wall formula: exact fractions, one period in feet and metres, and the printed metric constant."""

from __future__ import annotations

from fractions import Fraction as Q

import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from engine.errors import NotApplicable
from engine.period import C_Q, wall_period, wall_ratio
from engine.units import FOOT

FEW = settings(max_examples=40, deadline=None)
WALLS = st.lists(st.tuples(st.integers(1, 400), st.integers(1, 400)), min_size=1, max_size=12)


@FEW
@given(WALLS, st.integers(1, 120), st.integers(100, 90_000))
def test_ratio_by_fractions(walls, h_n, A_B):
    exact = Q(100, A_B) * sum(Q(A) / (1 + Q(83, 100) * Q(h_n, D) ** 2) for A, D in walls)
    areas, lengths = zip(*walls, strict=True)
    assert wall_ratio(A_B, h_n, areas, lengths) == pytest.approx(float(exact), rel=1e-13)
    assert wall_ratio(A_B, h_n, areas[::-1], lengths[::-1]) == pytest.approx(float(exact), rel=1e-13)


@FEW
@given(WALLS, st.floats(5.0, 120.0), st.floats(100.0, 9e4))
def test_feet_and_metres_give_one_period(walls, h_n, A_B):
    """The ratio has no unit, so a coefficient that carries seconds and a length must convert."""
    areas, lengths = ([float(number) for number in column] for column in zip(*walls, strict=True))
    us = wall_period(h_n, wall_ratio(A_B, h_n, areas, lengths), "us")
    metric = [number * FOOT**2 for number in areas], [number * FOOT for number in lengths]
    si = wall_period(h_n * FOOT, wall_ratio(A_B * FOOT**2, h_n * FOOT, *metric), "si")
    assert si == pytest.approx(us, rel=1e-12)


def test_the_printed_metric_constant_is_not_used():
    assert C_Q["us"] == 0.0019
    assert C_Q["si"] == pytest.approx(0.0062336, abs=5e-8)
    assert C_Q["si"] / 0.00058 == pytest.approx(10.75, abs=0.005)


@pytest.mark.parametrize(("units", "highest"), [("us", 120.0), ("si", 36.6)])
def test_the_printed_limit_in_each_system(units, highest):
    assert wall_period(highest, 1.0, units) == pytest.approx(C_Q[units] * highest)
    with pytest.raises(NotApplicable, match=f"must be at most {highest:g} for this formula"):
        wall_period(highest * (1 + 1e-9), 1.0, units)
