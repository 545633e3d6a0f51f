"""C_s by the multi-period route and for drift: every bound on both sides, and exact fractions."""

from __future__ import annotations

from fractions import Fraction as Q

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from engine.base_shear import (
    coefficient_minimum,
    drift_bound,
    drift_bound_multi,
    drift_coefficient,
    drift_coefficient_multi,
    governing_bound_multi,
    interaction_minimum,
    response_coefficient,
    response_coefficient_multi,
)
from engine.editions import EDITIONS

FEW = settings(max_examples=60, deadline=None)
HUNDREDTHS = st.integers(5, 300).map(lambda n: Q(n, 100))
SITE = {
    **{"S_DS": HUNDREDTHS, "S_D1": HUNDREDTHS, "S_1": HUNDREDTHS},
    **{"T": st.integers(1, 2000).map(lambda n: Q(n, 100)), "T_L": st.integers(4, 16).map(Q)},
    "R": st.integers(4, 32).map(lambda n: Q(n, 4)),
    "I_e": st.sampled_from([Q(1), Q(5, 4), Q(3, 2)]),
}
MULTI = {"S_a": 0.6, "S_DS": 1.0, "S_1": 0.3, "R": 8.0, "I_e": 1.0, "edition": "7-22"}
BASE = {"S_DS": 1.0, "S_D1": 0.5, "S_1": 0.3, "T": 0.4, "T_L": 4.0, "R": 5.0, "I_e": 1.0}
SPECTRUM = "spectrum S_a/(R/I_e), Eq. 12.8-2"


def floats(values):
    return {key: float(value) for key, value in values.items()}


def near_fault(S_1, reduction):
    return S_1 / 2 / reduction if Q(6, 10) <= S_1 else Q(0)


@FEW
@given(st.fixed_dictionaries(SITE), st.sampled_from(EDITIONS))
def test_drift_by_fractions(values, edition):
    reduction = values["R"] / values["I_e"]
    T, T_L = values["T"], values["T_L"]
    cap = values["S_D1"] / (T * reduction) * (1 if T <= T_L else T_L / T)
    exact = max(min(values["S_DS"] / reduction, cap), near_fault(values["S_1"], reduction))
    found = drift_coefficient(**floats(values), edition=edition)
    assert found == pytest.approx(float(exact), rel=1e-13)
    strength = response_coefficient(**floats(values), edition=edition)
    minimum = coefficient_minimum(float(values["S_DS"]), float(values["I_e"]))
    assert strength == pytest.approx(max(found, minimum), rel=1e-13)


@FEW
@given(st.fixed_dictionaries({key: SITE[key] for key in ("S_DS", "S_1", "R", "I_e")}), HUNDREDTHS)
def test_multi_period_by_fractions(values, S_a):
    reduction = values["R"] / values["I_e"]
    relieved = max(S_a / reduction, near_fault(values["S_1"], reduction))
    exact = max(relieved, Q(44, 1000) * values["S_DS"] * values["I_e"], Q(1, 100))
    given_values = {**floats(values), "S_a": float(S_a), "edition": "7-22"}
    assert response_coefficient_multi(**given_values) == pytest.approx(float(exact), rel=1e-13)
    del given_values["S_DS"]
    assert drift_coefficient_multi(**given_values) == pytest.approx(float(relieved), rel=1e-13)


@pytest.mark.parametrize(
    ("changes", "C_s", "words"),
    [
        ({}, 0.075, SPECTRUM),
        ({"S_a": 0.352}, 0.044, SPECTRUM),
        ({"S_a": 0.35}, 0.044, "minimum 0.044 S_DS I_e, Eq. 12.8-6"),
        ({"S_a": 0.05, "S_DS": 0.1}, 0.01, "minimum 0.01, Eq. 12.8-6"),
        ({"S_a": 0.1, "S_1": 0.75}, 0.046875, "minimum 0.5 S_1/(R/I_e), Eq. 12.8-7"),
        ({"S_a": 0.3, "S_1": 0.6}, 0.044, "minimum 0.044 S_DS I_e, Eq. 12.8-6"),
    ],
)
def test_governing_bound_of_the_multi_period_route(changes, C_s, words):
    assert response_coefficient_multi(**{**MULTI, **changes}) == pytest.approx(C_s)
    assert governing_bound_multi(**{**MULTI, **changes}) == words


@pytest.mark.parametrize(
    ("changes", "C_s", "words"),
    [
        ({}, 0.075, SPECTRUM),
        ({"S_a": 0.05}, 0.00625, SPECTRUM),
        ({"S_a": 0.05, "S_1": 0.6 - 1e-9}, 0.00625, SPECTRUM),
        ({"S_a": 0.05, "S_1": 0.6}, 0.0375, "minimum 0.5 S_1/(R/I_e), Eq. 12.8-7"),
    ],
)
def test_drift_by_the_multi_period_route(changes, C_s, words):
    call = {key: value for key, value in {**MULTI, **changes}.items() if key != "S_DS"}
    assert drift_coefficient_multi(**call) == pytest.approx(C_s)
    assert drift_bound_multi(**call) == words


@pytest.mark.parametrize(
    ("changes", "C_s", "words", "numbers"),
    [
        ({}, 0.2, "plateau S_DS/(R/I_e)", ("12.8-2", "12.8-3")),
        ({"T": 1.0}, 0.1, "cap S_D1/(T R/I_e)", ("12.8-3", "12.8-4")),
        ({"T": 3.0}, 1 / 30, "cap S_D1/(T R/I_e)", ("12.8-3", "12.8-4")),
        ({"T": 8.0}, 0.00625, "cap S_D1 T_L/(T^2 R/I_e)", ("12.8-4", "12.8-5")),
        ({"T": 3.0, "S_1": 0.6}, 0.06, "minimum 0.5 S_1/(R/I_e)", ("12.8-6", "12.8-7")),
    ],
)
@pytest.mark.parametrize(("edition", "place"), [("7-16", 0), ("7-22", 1)])
def test_drift_waives_one_minimum_and_keeps_the_other(changes, C_s, words, numbers, edition, place):
    """The number 12.8-6 is the one kept in 7-16 and the one waived in 7-22."""
    call = {**BASE, **changes, "edition": edition}
    assert drift_coefficient(**call) == pytest.approx(C_s)
    assert drift_bound(**call) == f"{words}, Eq. {numbers[place]}"


def test_several_at_once_are_named_one_by_one():
    found = governing_bound_multi(**{**MULTI, "S_a": np.array([0.6, 0.1])})
    assert found.tolist() == [SPECTRUM, "minimum 0.044 S_DS I_e, Eq. 12.8-6"]


@pytest.mark.parametrize(
    ("R", "alpha"),
    [(1.0, 0.7), (3.0, 0.7), (3.0 + 1e-6, 0.7), (4.5, 0.8), (6.0 - 1e-6, 0.9), (6.0, 0.9), (8.0, 0.9)],
)
def test_limit_of_the_interaction(R, alpha):
    assert interaction_minimum(V=10.0, R=R) == pytest.approx(10 * alpha, abs=1e-5)
