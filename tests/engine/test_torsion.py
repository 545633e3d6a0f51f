"""Torsion: both sides of each limit, and the walls of a rigid diaphragm by a stiffness matrix."""

from __future__ import annotations

from fractions import Fraction as Q

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from engine.torsion import (
    SCOPES,
    accidental_moment,
    accidental_scope,
    applied_amplification,
    center_of_rigidity,
    direct_shear,
    inherent_moment,
    irregularity_ratio,
    polar_rigidity,
    torsional_shear,
)

FEW = settings(max_examples=40, deadline=None)
EPS = 1e-9


@pytest.mark.parametrize(
    ("one", "other", "ratio"),
    [(0.2, 0.2, 1.0), (0.3, 0.2, 1.2), (0.2, 0.3, 1.2), (-0.3, -0.2, 1.2), (0.4, 0.0, 2.0), (0.3, -0.1, 3.0)],
)
def test_ratio_of_the_edges(one, other, ratio):
    assert irregularity_ratio(one, other) == pytest.approx(ratio)


@pytest.mark.parametrize("SDC", "ABCDEF")
@pytest.mark.parametrize(("TIR", "irregular"), [(1.0, False), (1.2, False), (1.2 + EPS, True), (1.5, True)])
def test_amplification_applies_from_category_C_with_an_irregularity(SDC, TIR, irregular):
    expected = 1.361 if irregular and SDC in "CDEF" else 1.0
    assert applied_amplification(d_max=1.4, d_avg=1.0, TIR=TIR, SDC=SDC) == pytest.approx(expected, abs=5e-4)


def test_a_ratio_of_1_2_but_for_round_off_is_no_irregularity():
    ratio = irregularity_ratio(0.3, 0.2)
    for TIR in (np.nextafter(ratio, 0), ratio, np.nextafter(1.2, 2)):
        assert applied_amplification(d_max=1.4, d_avg=1.0, TIR=TIR, SDC="D") == 1.0


@pytest.mark.parametrize(
    ("SDC", "TIR", "counts"),
    [
        *[("A", 2.0, 0), ("B", 1.4, 0), ("B", 1.4 + EPS, 1), ("C", 1.2, 0), ("C", 1.2 + EPS, 1)],
        *[("D", 1.2, 0), ("D", 1.3, 1), ("E", 1.3, 1), ("F", 1.3, 1)],
    ],
)
def test_scope_of_accidental_torsion(SDC, TIR, counts):
    assert accidental_scope(TIR, SDC, "7-16") == SCOPES[counts]
    assert accidental_scope(TIR, SDC, "7-22") == f"{SCOPES[counts]} (uncertain: confirm)"


LEVEL = st.tuples(*[st.integers(1, 900)] * 2, st.integers(-400, 400), st.integers(100, 300))


@FEW
@given(st.lists(LEVEL, min_size=1, max_size=12), st.integers(-50, 50), st.randoms(use_true_random=False))
def test_story_torsion_by_fractions_in_any_order(levels, x_R, random):
    random.shuffle(levels)
    heights, forces, centers, factors = zip(*levels, strict=True)
    amplifications = [factor / 100 for factor in factors]
    for place in set(heights):
        standing = [level for level in levels if level[0] >= place]
        inherent = sum(F * (x - x_R) for _, F, x, _ in standing)
        accidental = sum(Q(F, 20) * (abs(x) + 1) * Q(A, 100) for _, F, x, A in standing)
        dimensions = [abs(x) + 1 for x in centers]
        assert inherent_moment(place, x_R, forces, centers, heights) == inherent
        assert accidental_moment(place, forces, dimensions, amplifications, heights) == pytest.approx(
            float(accidental), rel=1e-13
        )


WALLS = st.lists(st.tuples(st.floats(0.5, 9.0), st.floats(0.0, 90.0)), min_size=2, max_size=6)


@FEW
@given(WALLS, WALLS, st.floats(10.0, 900.0), st.floats(0.0, 90.0))
def test_walls_by_a_stiffness_matrix(along_y, along_x, V, x_M):
    """A rigid plate on springs: two translations and a rotation, solved; V along y acts at x_M."""
    springs = [(R, np.array([0.0, 1.0, x])) for R, x in along_y]
    springs += [(R, np.array([1.0, 0.0, -y])) for R, y in along_x]
    K = sum(R * np.outer(row, row) for R, row in springs)
    if np.linalg.cond(K) > 1e10:  # all walls meet in one point: nothing resists the rotation
        return
    moved = np.linalg.solve(K, V * np.array([0.0, 1.0, x_M]))
    expected = [R * (row @ moved) for R, row in springs]
    x_R, y_R = (center_of_rigidity(*zip(*walls, strict=True)) for walls in (along_y, along_x))
    R = np.array([R for R, _ in springs])
    d = np.array([*(x - x_R for _, x in along_y), *(y_R - y for _, y in along_x)])
    torsional = torsional_shear(V * (x_M - x_R), R, d, polar_rigidity(R, d))
    direct = direct_shear(V, R[: len(along_y)], R[: len(along_y)])
    found = torsional + np.concatenate([direct, np.zeros(len(along_x))])
    assert np.allclose(found, expected, rtol=1e-7, atol=1e-7 * V * 90)
