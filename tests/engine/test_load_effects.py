"""Load effects: signs, zero cases, limits, and the combinations written out a second time."""

from __future__ import annotations

from fractions import Fraction as Q

import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from engine.load_effects import (
    COMBINATIONS,
    TERMS,
    VERTICAL_CASES,
    combination_factor,
    combined_effect,
    dead_load_factor,
    limited_overstrength_effect,
    overstrength_effect,
    vertical_effect,
)

FEW = settings(max_examples=60, deadline=None)
EFFECT = st.integers(-10_000, 10_000)


def written_out(combination, D, E_v, E_h, L, S, edition):
    """The combinations as they are printed."""
    snow = {"7-16": (Q(1, 5), Q(3, 4)), "7-22": (Q(3, 20), Q(1, 10))}[edition]
    return {
        "2.3.6-6": Q(6, 5) * D + E_v + E_h + L + snow[0] * S,
        "2.3.6-7": Q(9, 10) * D - E_v + E_h,
        "2.4.5-8": D + Q(7, 10) * E_v + Q(7, 10) * E_h,
        "2.4.5-9": D + Q(3, 4) * Q(7, 10) * (E_v + E_h) + Q(3, 4) * L + snow[1] * S,
        "2.4.5-10": Q(6, 10) * D - Q(7, 10) * E_v + Q(7, 10) * E_h,
    }[combination]


@FEW
@given(st.tuples(*[EFFECT] * 5), st.sampled_from(COMBINATIONS), st.sampled_from(["7-16", "7-22"]))
def test_combinations_by_fractions(effects, combination, edition):
    exact = float(written_out(combination, *effects, edition))
    found = combined_effect(combination, *map(float, effects), edition)
    assert found == pytest.approx(exact, rel=1e-12, abs=1e-9)
    factors = [combination_factor(combination, term, edition) for term in TERMS]
    by_factors = sum(f * e for f, e in zip(factors, effects, strict=True))
    assert found == pytest.approx(by_factors, rel=1e-12, abs=1e-9)


@FEW
@given(st.integers(1, 300), st.sampled_from(COMBINATIONS), st.sampled_from(["7-16", "7-22"]))
def test_dead_load_factor_takes_the_vertical_effect_in(S_DS, combination, edition):
    exact = written_out(combination, Q(1), Q(S_DS, 500), 0, 0, 0, edition)
    assert dead_load_factor(combination, S_DS / 100, edition) == pytest.approx(float(exact), rel=1e-13)


@pytest.mark.parametrize("edition", ["7-16", "7-22"])
def test_the_editions_differ_in_snow_alone(edition):
    other = {"7-16": "7-22", "7-22": "7-16"}[edition]
    for combination in COMBINATIONS:
        differing = {
            term
            for term in TERMS
            if combination_factor(combination, term, edition) != combination_factor(combination, term, other)
        }
        assert differing == ({"S"} if combination in ("2.3.6-6", "2.4.5-9") else set())


@pytest.mark.parametrize(("taken", "effect"), list(zip(VERTICAL_CASES, (-18.0, 0.0, 0.0), strict=True)))
def test_vertical_effect_is_counted_or_zero(taken, effect):
    assert vertical_effect(S_DS=0.9, D=-100.0, taken=taken) == pytest.approx(effect, abs=0, rel=1e-14)


@pytest.mark.parametrize(
    ("Q_E", "E_cl", "E_mh"),
    [
        (50.0, 125.0, 125.0),
        (50.0, 124.0, 124.0),
        (-50.0, 124.0, -124.0),
        (-50.0, 126.0, -125.0),
        (50.0, 0.0, 0.0),
    ],
)
def test_capacity_limits_the_magnitude(Q_E, E_cl, E_mh):
    assert limited_overstrength_effect(Omega_0=2.5, Q_E=Q_E, E_cl=E_cl) == E_mh
    assert abs(E_mh) <= abs(overstrength_effect(Omega_0=2.5, Q_E=Q_E))
