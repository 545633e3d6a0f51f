"""C_vx and F_x of many buildings at once, beside the bare array expression without any check."""

from __future__ import annotations

from typing import Any

import numpy as np
import pytest

from engine.vertical import distribution_factors, story_force

LEVELS, TARGET = 12, "target at most 1.5 times the bare expression"


@pytest.mark.parametrize("exponents", ["one k each", "k = 1.37", "k = 2"])
def test_forces_of_many_buildings(full: bool, figure: Any, best: Any, exponents: str) -> None:
    count = 100_000 if full else 1_000
    seed = np.random.default_rng(1)
    weights = seed.uniform(100.0, 900.0, (count, LEVELS))
    heights = np.cumsum(seed.uniform(9.0, 15.0, (count, LEVELS)), axis=1)
    V = seed.uniform(10.0, 500.0, (count, 1))
    k = seed.uniform(1.0, 2.0, count) if exponents == "one k each" else float(exponents.split()[-1])

    def bare() -> Any:
        moments = weights * heights ** (k[:, None] if isinstance(k, np.ndarray) else k)
        return moments / moments.sum(axis=-1, keepdims=True) * V

    def engine() -> Any:
        return story_force(V, distribution_factors(weights, heights, k))

    assert np.allclose(engine(), bare(), rtol=1e-13, atol=0)
    assert np.allclose(engine().sum(axis=-1, keepdims=True), V, rtol=1e-12, atol=0)
    plain, checked = best(bare, engine, rounds=15)
    figure(f"C_vx and F_x, {count:,} buildings of {LEVELS} levels, {exponents}", checked / plain, TARGET)
    figure(f"  the same, million levels a second, {exponents}", count * LEVELS / checked / 1e6, "no target")
