"""The rules with branches, worked a second time: exact fractions, and fifty digits with mpmath."""

from __future__ import annotations

from fractions import Fraction as Q

import mpmath
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from engine.base_shear import response_coefficient
from engine.hazard import spectral_acceleration
from engine.vertical import distribution_factors, exponent, overturning_moment, story_shear

FEW = settings(max_examples=60, deadline=None)
HUNDREDTHS = st.integers(5, 300).map(lambda n: Q(n, 100))
PERIODS = st.integers(1, 2000).map(lambda n: Q(n, 100))


def spectrum(T, S_DS, S_D1, T_L):
    T_S = S_D1 / S_DS
    if T < T_S / 5:
        return S_DS * (Q(2, 5) + Q(3, 5) * T / (T_S / 5))
    if T <= T_S:
        return S_DS
    return S_D1 / T if T <= T_L else S_D1 * T_L / T**2


def coefficient(S_DS, S_D1, S_1, T, T_L, R, I_e):
    reduction = R / I_e
    cap = S_D1 / (T * reduction) if T <= T_L else S_D1 * T_L / (T**2 * reduction)
    C_s = min(S_DS / reduction, cap)
    C_s = max(C_s, Q(44, 1000) * S_DS * I_e, Q(1, 100))
    return max(C_s, S_1 / 2 / reduction) if Q(6, 10) <= S_1 else C_s


def floats(values):
    return {key: float(value) for key, value in values.items()}


@FEW
@given(
    st.fixed_dictionaries(
        {"T": PERIODS, "S_DS": HUNDREDTHS, "S_D1": HUNDREDTHS, "T_L": st.integers(4, 16).map(Q)}
    )
)
def test_spectrum_by_fractions(values):
    assert spectral_acceleration(**floats(values)) == pytest.approx(float(spectrum(**values)), rel=1e-13)


@FEW
@given(
    st.fixed_dictionaries(
        {
            **{"S_DS": HUNDREDTHS, "S_D1": HUNDREDTHS, "S_1": HUNDREDTHS, "T": PERIODS},
            "T_L": st.integers(4, 16).map(Q),
            "R": st.integers(4, 32).map(lambda n: Q(n, 4)),
            "I_e": st.sampled_from([Q(1), Q(5, 4), Q(3, 2)]),
        }
    ),
    st.sampled_from(["7-16", "7-22"]),
)
def test_coefficient_by_fractions(values, edition):
    engine = response_coefficient(**floats(values), edition=edition)
    assert engine == pytest.approx(float(coefficient(**values)), rel=1e-13)


@FEW
@given(st.lists(st.tuples(st.integers(1, 4000), st.integers(1, 300)), min_size=1, max_size=20), PERIODS)
def test_distribution_with_fifty_digits(levels, T):
    with mpmath.workdps(50):
        k = min(max(mpmath.mpf(3) / 4 + mpmath.mpf(T.numerator) / T.denominator / 2, 1), 2)
        moments = [w * mpmath.mpf(h) ** k for w, h in levels]
        exact = [float(moment / mpmath.fsum(moments)) for moment in moments]
    weights, heights = zip(*levels, strict=True)
    assert distribution_factors(weights, heights, exponent(float(T))) == pytest.approx(exact, rel=1e-13)


@FEW
@given(st.lists(st.tuples(st.integers(0, 900), st.integers(1, 60)), min_size=1, max_size=20))
def test_shear_and_overturning_by_integers(levels):
    forces, heights = zip(*levels, strict=True)
    for place in (0, *heights):
        shear = sum(F for F, h in levels if h >= place)
        moment = sum(F * (h - place) for F, h in levels if h > place)
        assert story_shear(place, forces, heights) == shear
        assert overturning_moment(place, forces, heights) == moment
