"""C_vx and F_x of 100,000 buildings with 12 levels, beside the bare array expression without any check.

Figures: python -m pytest tests/bench/test_distribution.py --benchmark-enable; both stand in one group, and
the aim is at most 1.4 times the bare expression. Timed by accident or not, both must give the same forces.
"""

from __future__ import annotations

import numpy as np
import pytest

from engine.vertical import distribution_factors, story_force

SEED = np.random.default_rng(1)
WEIGHTS = SEED.uniform(100.0, 900.0, (100_000, 12))
HEIGHTS = np.cumsum(SEED.uniform(9.0, 15.0, (100_000, 12)), axis=1)
V = SEED.uniform(10.0, 500.0, (100_000, 1))
EXPONENTS = {"one k each": SEED.uniform(1.0, 2.0, 100_000), "k = 1.37": 1.37, "k = 2": 2.0}


def bare(k):
    moments = WEIGHTS * HEIGHTS ** (k[:, None] if isinstance(k, np.ndarray) else k)
    return moments / moments.sum(axis=-1, keepdims=True) * V


def engine(k):
    return story_force(V, distribution_factors(WEIGHTS, HEIGHTS, k))


@pytest.mark.parametrize("which", [bare, engine])
@pytest.mark.parametrize("name", EXPONENTS)
def test_forces(benchmark, which, name):
    benchmark.group = name
    found = benchmark.pedantic(which, args=(EXPONENTS[name],), rounds=9, warmup_rounds=1)
    assert np.allclose(found, bare(EXPONENTS[name]), rtol=1e-13, atol=0)
    assert np.allclose(found.sum(axis=-1, keepdims=True), V, rtol=1e-12, atol=0)
