"""The stories of a building as a chain from the base up: levels sorted by height, one story each height.

Levels at one height stand on one story: the first of them carries it, the others hang on it by rigid links,
whose flexibility is 0.
"""

from __future__ import annotations

import numpy as np
from numpy.typing import ArrayLike, NDArray

from engine import levels
from engine.errors import NotApplicable
from engine.require import Array, above


def checked_stiffnesses(stiffnesses: ArrayLike, heights: Array) -> Array:
    """Return the story stiffnesses of the levels: all above 0."""
    return levels.per_level("stiffnesses", above(0, "stiffnesses", stiffnesses), heights)


def chained(heights: Array, *columns: Array) -> tuple[Array, ...]:
    """Return the heights and the columns from the lowest level up, of one shape."""
    together = np.broadcast_arrays(heights, *columns)
    order = np.argsort(together[0], axis=-1, kind="stable")
    return tuple(np.take_along_axis(column, order, axis=-1) for column in together)


def flexibilities(stiffnesses: Array, heights: Array) -> Array:
    """Return the drift of each story under a unit shear; rigid links between levels at one height."""
    result: Array = 1 / of_story("stiffnesses", stiffnesses, heights)
    result[..., 1:][_twins(heights)] = 0.0
    return result


def of_story(name: str, values: Array, heights: Array) -> Array:
    """Return one value for each story; refuse levels at one height that hold different values."""
    step = np.abs(np.diff(values, axis=-1))
    torn = _twins(heights) & (step > levels.TOLERANCE * np.abs(values[..., 1:]))
    if torn.any():
        value = levels.first(values[..., 1:], torn)
        raise NotApplicable(name, value, "levels at one height stand on one story: give each the same value")
    return values


def from_the_top(values: Array) -> Array:
    """Return the sum of the values at and above each level."""
    result: Array = np.cumsum(values[..., ::-1], axis=-1)[..., ::-1]
    return result


def place_of(h_x: ArrayLike, heights: Array, base: bool) -> NDArray[np.intp]:
    """Return where the story below ``h_x`` stands in the chain; the first one for the base."""
    place = levels.position(h_x, heights, base=base)
    first: NDArray[np.intp] = np.argmax(~levels.is_below(place, heights), axis=-1)
    return first


def pick(values: Array, index: NDArray[np.intp]) -> Array:
    """Return the value at an index of the last axis, leading axes and index broadcast."""
    shape = np.broadcast_shapes(values.shape[:-1], index.shape)
    held = np.broadcast_to(values, (*shape, values.shape[-1]))
    result: Array = np.take_along_axis(held, np.broadcast_to(index, shape)[..., None], axis=-1)[..., 0]
    return result


def _twins(heights: Array) -> NDArray[np.bool_]:
    result: NDArray[np.bool_] = np.diff(heights, axis=-1) <= levels.slack(heights)
    return result
