"""Rayleigh's quotient against a general eigensolver on random shear buildings, and published periods."""

from __future__ import annotations

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st
from scipy.linalg import eigh

from engine.period import rayleigh_period
from engine.units import GRAVITY
from engine.vertical import distribution_factors

FEW = settings(max_examples=40, deadline=None)
INCH, KIP = 25.4, 4.4482216152605


def stiffness_matrix(k):
    """The stiffness of a chain, from its lowest story up."""
    above = np.append(k[1:], 0.0)
    return np.diag(k + above) - np.diag(k[1:], 1) - np.diag(k[1:], -1)


def first_mode(k, weights, units):
    """Return the period and the shape of the first mode by a general eigensolver."""
    squares, shapes = eigh(stiffness_matrix(k), np.diag(weights / GRAVITY[units]))
    return 2 * np.pi / np.sqrt(squares[0]), np.abs(shapes[:, 0])


@st.composite
def chains(draw):
    n = draw(st.integers(1, 25))
    seed = np.random.default_rng(draw(st.integers(0, 2**32 - 1)))
    return seed.uniform(20.0, 900.0, n), seed.uniform(50.0, 3000.0, n), seed


@FEW
@given(chains(), st.sampled_from(["us", "si"]))
def test_inertia_forces_of_the_first_mode_give_its_period(chain, units):
    k, weights, _ = chain
    T, shape = first_mode(k, weights, units)
    forces = stiffness_matrix(k) @ shape
    assert rayleigh_period(weights, np.maximum(forces, 0.0), shape, units) == pytest.approx(T, rel=1e-9)


@FEW
@given(chains())
def test_any_other_forces_give_a_shorter_period(chain):
    k, weights, seed = chain
    T, _ = first_mode(k, weights, "us")
    heights = 12.0 * np.arange(1, len(k) + 1)
    for forces in (
        seed.uniform(0.0, 100.0, len(k)) + 1e-3,
        100.0 * distribution_factors(weights, heights, 1.5),
        np.append(np.zeros(len(k) - 1), 10.0),
    ):
        delta = np.linalg.solve(stiffness_matrix(k), forces)
        assert rayleigh_period(weights, forces, delta, "us") <= T * (1 + 1e-10)


def test_code_forces_come_close_to_the_first_mode():
    """The quotient errs by the square of the error of the shape: less than 1 % for code forces."""
    k, weights = np.array([90.0, 80.0, 70.0, 60.0, 50.0]), np.array([650.0, 600.0, 500.0, 450.0, 400.0])
    T, _ = first_mode(k, weights, "us")
    forces = distribution_factors(weights, 12.0 * np.arange(1, 6), 1.2)
    found = rayleigh_period(weights, forces, np.linalg.solve(stiffness_matrix(k), forces), "us")
    assert 0.99 * T < found <= T


@FEW
@given(chains())
def test_order_scale_and_units(chain):
    k, weights, seed = chain
    forces = seed.uniform(1.0, 100.0, len(k))
    delta = np.linalg.solve(stiffness_matrix(k), forces)
    T = rayleigh_period(weights, forces, delta, "us")
    mixed = seed.permutation(len(k))
    assert rayleigh_period(weights[mixed], forces[mixed], delta[mixed], "us") == pytest.approx(T, rel=1e-12)
    assert rayleigh_period(weights, 7.0 * forces, 7.0 * delta, "us") == pytest.approx(T, rel=1e-12)
    metric = rayleigh_period(KIP * weights, KIP * forces, INCH * delta, "si")
    assert metric == pytest.approx(T, rel=1e-12)


def test_several_buildings_at_once():
    weights, forces, delta = np.array([[100.0, 50.0], [10.0, 90.0]]), [3.0, 4.0], [[0.2, 0.5], [0.1, 0.9]]
    together = rayleigh_period(weights, [forces, forces], delta, "si")
    alone = [rayleigh_period(w, forces, d, "si") for w, d in zip(weights, delta, strict=True)]
    assert together.tolist() == alone


def test_a_published_first_period_in_metric_units():
    """M. Austin, University of Maryland, structural analysis course notes, four-story shear building."""
    k = np.array([3.2, 2.4, 1.6, 0.8])  # kN/mm, from the lowest story up
    weights = np.array([4500.0, 3000.0, 3000.0, 1500.0]) * 9.80665 / 1000
    _, shape = first_mode(k, weights, "si")
    period = rayleigh_period(weights, stiffness_matrix(k) @ shape, shape, "si")
    assert f"{period:.4f}" == "0.5789"


def test_an_oscillator():
    """One mass of 1 kip on 1 kip/in: 2 pi sqrt(1/386.0886)."""
    found = rayleigh_period(weights=[1.0], forces=[1.0], displacements=[1.0], units="us")
    assert found == pytest.approx(2 * np.pi / np.sqrt(386.08858267716535), rel=1e-14)
