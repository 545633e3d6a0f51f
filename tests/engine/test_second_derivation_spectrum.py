"""The rules of spectra a second time: exact fractions, a search on a fine grid, scipy's interpolation."""

from __future__ import annotations

from fractions import Fraction as Q
from itertools import pairwise

import numpy as np
import pytest
from hypothesis import Phase, given, settings
from hypothesis import strategies as st
from scipy.interpolate import make_interp_spline

from engine.hazard import (
    READINGS,
    TAILS,
    method_1_acceleration,
    multi_period_acceleration,
    one_second_from_spectrum,
    short_period_from_spectrum,
    site_coefficient_long,
    site_coefficient_short,
)

FEW = settings(max_examples=60, deadline=None, phases=[Phase.explicit, Phase.generate])
#: the 22 periods of 11.4.5.1, FEMA P-2082-1 (2020)
PERIODS = [
    Q(thousandths, 1000)
    for thousandths in (
        *(0, 10, 20, 30, 50, 75, 100, 150, 200, 250, 300),
        *(400, 500, 750, 1000, 1500, 2000, 3000, 4000, 5000, 7500, 10000),
    )
]
HUNDREDTHS = st.integers(1, 300).map(lambda n: Q(n, 100))


@st.composite
def spectra(draw):
    """Pairs by rising period: the standard's periods, or some of them with others between."""
    some = draw(st.sets(st.sampled_from(PERIODS), max_size=22)) | {Q(0), Q(10)}
    more = draw(st.sets(st.integers(1, 999).map(lambda n: Q(n, 100)), max_size=8))
    periods = sorted(draw(st.sampled_from([set(PERIODS), some | more])))
    return [(T, draw(HUNDREDTHS)) for T in periods]


def ordinate(pairs, T):
    for (T1, S1), (T2, S2) in pairwise(pairs):
        if T1 <= T <= T2:
            return S1 + (T - T1) / (T2 - T1) * (S2 - S1)
    raise AssertionError(T)


def with_tail(pairs, T, T_L, tail):
    if T <= 10:
        return ordinate(pairs, T)
    last = pairs[-1][1]
    if tail == "continuous at 10 s" and T_L < 10:
        return last * Q(100) / T**2
    return last * 10 / T if T <= T_L else last * 10 * T_L / T**2


def peak_held(pairs, T, T_L, tail):
    peak = max(S for _, S in pairs)
    return peak if max(t for t, S in pairs if peak == S) > T else with_tail(pairs, T, T_L, tail)


def band(pairs, low, high):
    inside = [(T, S) for T, S in pairs if low < T < high]
    return [(low, ordinate(pairs, low)), *inside, (high, ordinate(pairs, high))]


def largest_product(points, reading):
    found = [T * S for T, S in points]
    if reading == "every period":
        for (T1, S1), (T2, S2) in pairwise(points):
            b = (S1 - S2) / (T2 - T1)
            a = S1 + b * T1
            if b > 0 and T1 < a / (2 * b) < T2:
                found.append(a * a / (4 * b))
    return max(found)


def as_floats(pairs, seed):
    order = np.random.default_rng(seed).permutation(len(pairs))
    return {"T_i": [float(pairs[i][0]) for i in order], "S_ai": [float(pairs[i][1]) for i in order]}


@FEW
@given(spectra(), st.integers(0, 2500), st.integers(4, 16), st.sampled_from(TAILS), st.integers(0, 99))
def test_ordinates_by_fractions(pairs, T, T_L, tail, seed):
    for place in (Q(T, 100), *(T for T, _ in pairs[::3])):
        call = {"T": float(place), **as_floats(pairs, seed), "T_L": float(T_L), "tail": tail}
        exact = float(with_tail(pairs, place, Q(T_L), tail))
        assert multi_period_acceleration(**call) == pytest.approx(exact, rel=1e-12)
        exact = float(peak_held(pairs, place, Q(T_L), tail))
        assert method_1_acceleration(**call) == pytest.approx(exact, rel=1e-12)


@FEW
@given(spectra(), st.integers(0, 99))
def test_short_period_parameter_by_fractions(pairs, seed):
    exact = Q(9, 10) * max(S for _, S in band(pairs, Q(2, 10), Q(5)))
    assert short_period_from_spectrum(**as_floats(pairs, seed)) == pytest.approx(float(exact), rel=1e-12)


@FEW
@given(spectra(), st.sampled_from(READINGS), st.integers(0, 99))
@pytest.mark.parametrize(("edition", "share", "limit"), [("7-16", Q(1), 1200.0), ("7-22", Q(9, 10), 1450.0)])
def test_one_second_parameter_by_fractions(edition, share, limit, pairs, reading, seed):
    v_s = [limit, limit + 1]
    found = one_second_from_spectrum(
        **as_floats(pairs, seed), v_s=v_s, units="us", edition=edition, reading=reading
    )
    for value, end in zip(found, (5, 2), strict=True):
        exact = max(share * largest_product(band(pairs, Q(1), Q(end)), reading), ordinate(pairs, Q(1)))
        assert value == pytest.approx(float(exact), rel=1e-12)


@FEW
@given(spectra(), st.integers(0, 99))
def test_every_period_is_what_a_fine_search_finds(pairs, seed):
    given = {**as_floats(pairs, seed), "v_s": 900.0, "units": "us", "edition": "7-16"}
    listed, every = (one_second_from_spectrum(**given, reading=reading) for reading in READINGS)
    T = np.linspace(1, 5, 20001)
    searched = (T * np.interp(T, *([float(x) for x in column] for column in zip(*pairs, strict=True)))).max()
    assert listed <= every
    assert searched <= every * (1 + 1e-12)
    assert searched == pytest.approx(every, rel=1e-3)


@FEW
@given(st.lists(HUNDREDTHS, min_size=22, max_size=22))
def test_ordinates_by_scipys_linear_spline(ordinates):
    periods, values = [float(T) for T in PERIODS], [float(S) for S in ordinates]
    spline = make_interp_spline(periods, values, k=1)
    T = np.linspace(0, 10, 501)
    found = multi_period_acceleration(T, periods, values, 8.0, "as printed")
    assert found == pytest.approx(spline(T), rel=1e-9)


COLUMNS = {
    site_coefficient_short: (
        "1/4 1/2 3/4 1 5/4 3/2",
        {"C": "1.3 1.3 1.2 1.2 1.2 1.2", "D": "1.6 1.4 1.2 1.1 1 1"},
    ),
    site_coefficient_long: (
        "1/10 1/5 3/10 2/5 1/2 3/5",
        {"C": "1.5 1.5 1.5 1.5 1.5 1.4", "D": "2.4 2.2 2 1.9 1.8 1.7"},
    ),
}


@FEW
@given(st.integers(0, 200), st.sampled_from("CD"), st.sampled_from([*COLUMNS]))
def test_site_coefficients_by_fractions(hundredths, site_class, coefficient):
    """Rows written down a second time: ASCE/SEI 7-16, Tables 11.4-1 (from memory) and 11.4-2."""
    heads, rows = COLUMNS[coefficient]
    pairs = [(Q(a), Q(b)) for a, b in zip(heads.split(), rows[site_class].split(), strict=True)]
    S = min(max(Q(hundredths, 100), pairs[0][0]), pairs[-1][0])
    more = ("none",) if coefficient is site_coefficient_short else ()
    found = coefficient(hundredths / 100, site_class, *more)
    assert found == pytest.approx(float(ordinate(pairs, S)), rel=1e-13)
