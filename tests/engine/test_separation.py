"""Separation and drifts at the edges: both editions, both sides of each limit."""

from __future__ import annotations

import math

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

from engine.drift import amplified_deflection, drift_to_check, edges_due
from engine.separation import (
    GAPS,
    largest_displacement,
    mce_displacement,
    required_separation,
    separation_verdict,
)

LENGTH = st.floats(0.0, 500.0)


@given(LENGTH, LENGTH)
def test_both_editions_agree_without_a_diaphragm_deflection(delta, di):
    given = {"delta_max": delta, "C_d": 5.0, "I_e": 1.25}
    older, newer = (largest_displacement(**given, delta_di=di, edition=e) for e in ("7-16", "7-22"))
    assert older == amplified_deflection(delta, 5.0, 1.25)
    assert newer == older + di


@given(LENGTH, LENGTH)
def test_least_gap_is_the_root_of_the_squares(one, other):
    assert required_separation(one, other) == pytest.approx(
        math.sqrt(one**2 + other**2), rel=1e-14, abs=1e-150
    )
    assert required_separation(one, 0.0) == one


@pytest.mark.parametrize(("gap", "word"), [(5.0, 0), (5.0 - 1e-9, 1), (6.0, 0), (0.0, 1)])
def test_gap(gap, word):
    assert separation_verdict(gap=gap, delta_MT=5.0) == GAPS[word]


def test_a_gap_of_just_the_least_distance_is_wide_enough():
    assert separation_verdict(gap=np.nextafter(5.0, 0), delta_MT=5.0) == GAPS[0]


@given(st.floats(-9.0, 9.0), LENGTH)
def test_mce_displacement_is_a_magnitude(delta_e, di):
    given = {"delta_di": di, "R": 8.0, "I_e": 1.0}
    assert mce_displacement(delta_e=delta_e, **given) == mce_displacement(delta_e=-delta_e, **given)
    assert mce_displacement(delta_e=delta_e, **given) == pytest.approx(1.5 * (8 * abs(delta_e) + di))


@pytest.mark.parametrize("SDC", "ABCDEF")
@pytest.mark.parametrize(("TIR", "irregular"), [(1.2, False), (1.2 + 1e-9, True)])
def test_edges_are_due_from_category_C_with_an_irregularity(SDC, TIR, irregular):
    assert edges_due(TIR, SDC) == ("yes" if irregular and SDC in "CDEF" else "no")


@pytest.mark.parametrize(
    ("edges", "one", "other", "drift"),
    [("yes", 1.4, 0.6, 1.4), ("yes", 0.6, -1.5, 1.5), ("yes", 0.5, 0.6, 0.6), ("no", 1.4, 0.6, 1.0)],
)
def test_drift_to_check(edges, one, other, drift):
    assert drift_to_check(Delta_cm=-1.0, Delta_1=one, Delta_2=other, edges=edges) == drift
