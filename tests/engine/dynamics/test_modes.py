"""Modes of shear buildings: closed forms, a general eigensolver, thirty digits, published values."""

from __future__ import annotations

from math import pi, sin, sqrt

import mpmath
import numpy as np
import pytest
import scipy.linalg
from hypothesis import given

from engine.dynamics import (
    VERDICTS,
    eigen,
    mode_participation,
    mode_period,
    mode_shape,
    mode_weight_share,
    modes_needed,
    modes_verdict,
    modes_weight_share,
)
from engine.errors import ImpossibleValue, NotApplicable
from engine.period import rayleigh_period
from engine.units import GRAVITY
from tests.support.shear_buildings import FEW, models, ordinates, stiffness_matrix

G = GRAVITY["us"]


def uniform(n, w=100.0, k=31.54):
    return {"weights": [w] * n, "stiffnesses": [k] * n, "heights": [12.0 * (i + 1) for i in range(n)]}


def numbers(model):
    return np.arange(1, len(model["heights"]) + 1)


def periods(model):
    return mode_period(mode=numbers(model), **model, units="us")


def test_periods_of_the_uniform_five_stories_at_printed_digits():
    """A. K. Chopra, Dynamics of Structures, 4th ed., 2012, section 12.8, where T_1 is chosen as 2.0 s."""
    T = periods(uniform(5))
    printed = ["2.0000", "0.6852", "0.4346", "0.3383", "0.2966"]
    assert [f"{t:.4f}" for t in T * 2.0 / T[0]] == printed


@pytest.mark.parametrize(
    ("load", "top", "shear"),
    [
        (
            [0, 0, 0, 0, 1],
            ["0.880", "0.967", "0.991", "0.998", "1.000"],
            ["1.252", "0.890", "1.048", "0.985", "1.000"],
        ),
        (
            [0, 0, 0, -1, 2],
            ["0.792", "0.915", "0.970", "0.994", "1.000"],
            ["1.353", "0.741", "1.172", "0.930", "1.000"],
        ),
    ],
)
def test_modal_contributions_at_printed_digits(load, top, shear):
    """A. K. Chopra, Dynamics of Structures, 2nd ed., modal contribution factors of five equal stories."""
    model = uniform(5)
    phi = ordinates(mode_shape, model, numbers(model))
    gamma = phi.T @ load / (phi**2).sum(axis=0)  # the masses are equal
    roof = gamma * phi[-1] * periods(model) ** 2
    base = gamma * phi.sum(axis=0)
    for parts, printed in ((roof, top), (base, shear)):
        assert [f"{x:.3f}" for x in np.cumsum(parts) / parts.sum()] == printed


@pytest.mark.parametrize("n", [1, 2, 3, 7, 30, 200])
def test_equal_stories_by_the_closed_form(n):
    """omega_m = 2 sqrt(k/m) sin((2m - 1) pi/(4n + 2)), phi_jm = sin((2m - 1) j pi/(2n + 1))."""
    model = uniform(n)
    angle = (2 * numbers(model) - 1) * pi / (2 * n + 1)
    exact = 2 * pi * sqrt(100.0 / (G * 31.54)) / (2 * np.sin(angle / 2))
    assert periods(model) == pytest.approx(exact, rel=1e-12)
    phi = mode_shape(numbers(model), h_x=12.0 * n, **model)
    foot = mode_shape(numbers(model), h_x=12.0, **model)
    assert foot / phi == pytest.approx(np.sin(angle) / np.sin(n * angle), rel=1e-9, abs=1e-12)
    moved = np.array([sum(sin(j * a) for j in range(1, n + 1)) for a in angle])
    squares = (2 * n + 1) / 4  # the sum of sin^2 over the levels
    assert mode_weight_share(numbers(model), **model) == pytest.approx(moved**2 / squares / n, rel=1e-9)


@FEW
@given(models(most=25))
def test_a_general_eigensolver_agrees(model):
    w, K = model["weights"], stiffness_matrix(model["stiffnesses"])
    values, vectors = scipy.linalg.eigh(K, np.diag(w / G))
    assert periods(model) == pytest.approx(2 * pi / np.sqrt(values), rel=1e-9)
    shares = (w @ vectors) ** 2 / (w @ vectors**2) / w.sum()
    assert mode_weight_share(numbers(model), **model) == pytest.approx(shares, rel=1e-6, abs=1e-12)
    phi = ordinates(mode_shape, model, numbers(model))
    largest = np.take_along_axis(vectors, np.abs(vectors).argmax(axis=0)[None], axis=0)
    assert np.abs(phi) == pytest.approx(np.abs(vectors / largest), rel=1e-6, abs=1e-7)


@FEW
@given(models(most=6))
def test_thirty_digits_agree(model):
    n = len(model["heights"])
    with mpmath.workdps(30):
        root = [mpmath.sqrt(mpmath.mpf(w) / mpmath.mpf(G)) for w in model["weights"]]
        K = stiffness_matrix(model["stiffnesses"])
        A = mpmath.matrix(n, n)
        for i in range(n):
            for j in range(n):
                A[i, j] = mpmath.mpf(K[i, j]) / (root[i] * root[j])
        values, vectors = mpmath.eigsy(A)
        T = [float(2 * mpmath.pi / mpmath.sqrt(v)) for v in values]
        moved = [mpmath.fsum(root[i] * vectors[i, m] for i in range(n)) ** 2 for m in range(n)]
        shares = [float(x / mpmath.fsum(r**2 for r in root)) for x in moved]
    assert periods(model) == pytest.approx(T, rel=1e-12)
    assert mode_weight_share(numbers(model), **model) == pytest.approx(shares, rel=1e-9, abs=1e-14)


@FEW
@given(models())
def test_modes_are_orthogonal_and_hold_all_the_weight(model):
    w, K = model["weights"], stiffness_matrix(model["stiffnesses"])
    phi = ordinates(mode_shape, model, numbers(model))
    for matrix in (np.diag(w), K):
        product = phi.T @ matrix @ phi
        size = np.sqrt(np.outer(np.diag(product), np.diag(product)))
        assert np.abs(product / size - np.eye(len(w))).max() < 1e-9
    gamma = mode_participation(numbers(model), **model)
    assert gamma == pytest.approx(w @ phi / (w @ phi**2), rel=1e-9)
    assert phi @ gamma == pytest.approx(np.ones(len(w)), abs=1e-9)
    shares = mode_weight_share(numbers(model), **model)
    assert shares.sum() == pytest.approx(1.0, abs=1e-12)
    assert modes_weight_share(numbers(model), **model) == pytest.approx(np.cumsum(shares), rel=1e-14)
    assert (np.diff(periods(model)) < 0).all()


@FEW
@given(models())
def test_order_of_rows_does_not_matter(model):
    order = np.random.default_rng(3).permutation(len(model["heights"]))
    mixed = {key: value[order] for key, value in model.items()}
    assert (periods(mixed) == periods(model)).all()
    shape = mode_shape(mode=1, h_x=model["heights"], **model)
    assert (mode_shape(mode=1, h_x=model["heights"], **mixed) == shape).all()


@FEW
@given(models())
def test_unit_systems_agree(model):
    kip, inch, foot = 4.4482216152605, 25.4, 0.3048
    si = {
        "weights": model["weights"] * kip,
        "stiffnesses": model["stiffnesses"] * kip / inch,
        "heights": model["heights"] * foot,
    }
    assert mode_period(numbers(model), **si, units="si") == pytest.approx(periods(model), rel=1e-12)


@FEW
@given(models())
def test_rayleigh_of_the_first_mode_is_its_period(model):
    w, h = model["weights"], model["heights"]
    T_1 = mode_period(mode=1, **model, units="us")
    phi = mode_shape(mode=1, h_x=h, **model)
    extent = G * (T_1 / (2 * pi)) ** 2
    found = rayleigh_period(weights=w, forces=w * phi, displacements=extent * phi, units="us")
    assert found == pytest.approx(T_1, rel=1e-12)


@FEW
@given(models(least=3))
def test_a_level_without_weight_is_condensed_out(model):
    w = model["weights"].copy()
    w[1] = 0.0
    given_model = {**model, "weights": w}
    K = stiffness_matrix(model["stiffnesses"])
    kept = np.flatnonzero(w)
    condensed = K[np.ix_(kept, kept)] - K[np.ix_(kept, [1])] @ K[np.ix_([1], kept)] / K[1, 1]
    values, vectors = scipy.linalg.eigh(condensed, np.diag(w[kept] / G))
    count = len(kept)
    assert mode_period(np.arange(1, count + 1), **given_model, units="us") == pytest.approx(
        2 * pi / np.sqrt(values), rel=1e-9
    )
    phi = mode_shape(mode=1, h_x=model["heights"], **given_model)
    first = vectors[:, 0] / vectors[-1, 0]
    assert phi[kept] == pytest.approx(first, rel=1e-7)
    assert phi[1] == pytest.approx(-(K[1, kept] @ first) / K[1, 1], rel=1e-7)
    with pytest.raises(NotApplicable, match=f"at most {count}, the number of modes"):
        mode_period(count + 1, **given_model, units="us")


def test_a_roof_without_weight_rides_on_the_level_below():
    model = {"weights": [100.0, 80.0, 0.0], "stiffnesses": [50.0, 40.0, 30.0], "heights": [10.0, 20.0, 30.0]}
    assert mode_shape(mode=1, h_x=[20.0, 30.0], **model) == pytest.approx([1.0, 1.0])
    lower = {key: value[:2] for key, value in model.items()}
    assert mode_period([1, 2], **model, units="us") == pytest.approx(
        mode_period([1, 2], **lower, units="us"), rel=1e-14
    )


@FEW
@given(models())
def test_two_levels_at_one_height_are_one_with_the_weight_of_both(model):
    parts = {
        "weights": np.append(model["weights"], 0.4 * model["weights"][-1]),
        "stiffnesses": np.append(model["stiffnesses"], model["stiffnesses"][-1]),
        "heights": np.append(model["heights"], model["heights"][-1]),
    }
    whole = {**model, "weights": model["weights"] * np.append(np.ones(len(model["weights"]) - 1), 1.4)}
    m = numbers(model)
    assert mode_period(m, **parts, units="us") == pytest.approx(periods(whole), rel=1e-12)
    assert mode_weight_share(m, **parts) == pytest.approx(mode_weight_share(m, **whole), rel=1e-8, abs=1e-14)
    with pytest.raises(NotApplicable, match="the number of modes"):
        mode_period(len(m) + 1, **parts, units="us")


def test_the_largest_ordinate_is_1_and_of_equal_ones_the_highest():
    """By hand: w = 2, 1 on k = 1, 1 has phi_1/phi_2 = +-1/sqrt(2); on k = 2, 1 mode 2 is (-1, 1)."""
    model = {"weights": [2.0, 1.0], "stiffnesses": [1.0, 1.0], "heights": [1.0, 2.0]}
    assert mode_shape(mode=[1, 2], h_x=2.0, **model) == pytest.approx([1.0, 1.0])
    assert mode_shape(mode=[1, 2], h_x=1.0, **model) == pytest.approx([1 / sqrt(2), -1 / sqrt(2)])
    tied = {**model, "stiffnesses": [2.0, 1.0]}
    assert mode_shape(mode=2, h_x=[1.0, 2.0], **tied) == pytest.approx([-1.0, 1.0])
    # a light, stiff roof hardly moves in mode 2 of these: the level below it counts
    buried = {"weights": [9.0, 9.0, 0.1], "stiffnesses": [1.0, 1.0, 900.0], "heights": [1.0, 2.0, 3.0]}
    assert mode_shape(mode=2, h_x=1.0, **buried) == pytest.approx(1.0)


@pytest.mark.parametrize(
    ("modes", "stiffness", "verdict"),
    [(1, 31.54, 3), (2, 31.54, 2), (4, 31.54, 2), (5, 31.54, 0), (1, 31.54 * 188, 1), (1, 31.54 * 187, 3)],
)
def test_verdict(modes, stiffness, verdict):
    """T_2 = 0.68532 s with 31.54 falls below 0.05 s with 187.86 times that."""
    assert modes_verdict(modes=modes, **uniform(5, k=stiffness), units="us") == VERDICTS[verdict]


def test_a_share_is_reached_to_a_billionth():
    """Two equal stories by hand: mode 1 holds 1/2 + 1/sqrt(5) of the weight."""
    model, share = uniform(2), 0.5 + 1 / sqrt(5)
    assert mode_weight_share(mode=1, **model) == pytest.approx(share, rel=1e-13)
    wanted = [share - 1e-6, share, share + 0.9e-9, share + 1.1e-9, 1.0]
    assert modes_needed(share=wanted, **model).tolist() == [1, 1, 1, 2, 2]


def test_a_building_is_solved_once_for_all_its_cells(monkeypatch):
    calls = []
    svd = np.linalg.svd
    monkeypatch.setattr(np.linalg, "svd", lambda G: calls.append(1) or svd(G))
    eigen._solved.cache_clear()
    model = uniform(60)
    for h_x in model["heights"]:
        for mode in range(1, 21):
            mode_shape(mode=mode, h_x=h_x, **model)
    assert len(calls) == 1
    mode_period(mode=1, **{**model, "weights": [101.0] * 60}, units="us")
    assert len(calls) == 2


def test_a_building_that_is_refused_is_solved_once_too(monkeypatch):
    calls = []
    svd = np.linalg.svd
    monkeypatch.setattr(np.linalg, "svd", lambda G: calls.append(1) or svd(G))
    model = {**uniform(3), "stiffnesses": [1e17, 31.54, 31.54]}
    eigen._solved.cache_clear()
    for mode in (1, 2, 3):
        with pytest.raises(ImpossibleValue, match="weight is lost in the modes"):
            mode_period(mode=mode, **model, units="us")
    assert len(calls) == 1


def test_kept_results_can_not_be_written_to():
    held = eigen.solved(**uniform(3))
    for array in (held.heights, held.shape, held.shear, held.participation, held.extent, held.share):
        with pytest.raises(ValueError, match="read-only"):
            array[...] = 0.0


def test_numbers_that_do_not_decompose_are_refused(monkeypatch):
    def fail(G):
        raise np.linalg.LinAlgError("did not converge")

    monkeypatch.setattr(np.linalg, "svd", fail)
    eigen._solved.cache_clear()
    with pytest.raises(ImpossibleValue, match="too large or too small"):
        mode_period(mode=1, **uniform(2), units="us")
