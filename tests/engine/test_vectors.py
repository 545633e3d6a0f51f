"""Arrays are no other formula: every function gives on arrays what it gives one by one."""

from __future__ import annotations

import numpy as np
import pytest

from tests.support.formulas import CALLS, function, public_functions

#: three values for an argument whose neighbours would not be valid
THREE = {
    "N": [1.0, 7.0, 12.0],
    "I_e": [1.0, 1.25, 1.5],
    "mode": [1.0, 2.0, 3.0],
    "modes": [1.0, 2.0, 3.0],
    "h_x": [11.0, 25.0, 38.0],
    "w_x": [300.0, 250.0, 120.0],
    "w_px": [290.0, 240.0, 100.0],
    "k": [1.0, 1.15, 2.0],
    "rho": [1.0, 1.15, 1.3],
}
PLAIN = [name for name, call in CALLS.items() if any(isinstance(value, float) for value in call.values())]
LEVELED = [name for name, call in CALLS.items() if "heights" in call]


def widened(name):
    """Return the call with every plain number replaced by three of them."""
    return {
        key: np.array(THREE.get(key, [value, 1.1 * value, 1.25 * value]))
        for key, value in CALLS[name].items()
        if isinstance(value, float)
    }


def same(one, other):
    if isinstance(one, str):
        return one == other
    return np.allclose(one, other, rtol=1e-14, atol=0)


def test_every_public_function_is_called():
    assert set(CALLS) == {name for name, _ in public_functions()}


@pytest.mark.parametrize("name", PLAIN)
def test_array_equals_the_loop_of_scalars(name):
    call, wide = CALLS[name], widened(name)
    together = function(name)(**{**call, **wide})
    assert together.shape[0] == 3
    for place in range(3):
        alone = function(name)(**{**call, **{key: float(values[place]) for key, values in wide.items()}})
        assert isinstance(alone, np.float64 | str) or name == "vertical.distribution_factors"
        assert same(alone, together[place])


@pytest.mark.parametrize("name", PLAIN)
def test_two_axes_broadcast(name):
    call, wide = CALLS[name], widened(name)
    row = function(name)(**{**call, **wide})
    grid = function(name)(**{**call, **{key: np.stack([value, value]) for key, value in wide.items()}})
    assert grid.shape == (2, *row.shape)
    assert (grid == row).all()


#: whole numbers of modes: another list than that of the levels
NUMBERS = "mode_numbers"


@pytest.mark.parametrize("name", LEVELED)
def test_stacked_buildings_equal_one_by_one(name):
    call = CALLS[name]
    stacked = {
        key: np.stack([np.array(value) * (1.0 if key == NUMBERS else factor) for factor in (1.0, 1.2, 1.5)])
        for key, value in call.items()
        if isinstance(value, list)
    }
    places = {key: call[key] * np.array([1.0, 1.2, 1.5]) for key in ("h_x", "w_x", "w_px") if key in call}
    together = function(name)(**{**call, **stacked, **places})
    for i in range(3):
        one = {key: value[i] for key, value in (*stacked.items(), *places.items())}
        assert same(function(name)(**{**call, **one}), together[i])


@pytest.mark.parametrize("name", PLAIN)
def test_float_result_is_float64(name):
    result = function(name)(**CALLS[name])
    assert isinstance(result, str) or result.dtype == np.float64


@pytest.mark.parametrize("name", LEVELED)
def test_a_single_level_is_a_building(name):
    one = {key: value[1:2] if isinstance(value, list) else value for key, value in CALLS[name].items()}
    one |= {NUMBERS: [1.0]} if NUMBERS in one else {}
    result = function(name)(**one)
    assert isinstance(result, str) or np.isfinite(result).all()
