"""Levels of a building as arrays: levels stand on the LAST axis, in any order.

Heights above the base are compared with a tolerance of 1e-9 of the highest level, so that the noise of a
subtraction of elevations can neither drop a level nor make two out of one.
"""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike, NDArray

from engine.errors import ImpossibleValue, NotApplicable, WrongType
from engine.require import Array, above, at_least

MAX_LEVELS: Final = 1000
TOLERANCE: Final = 1e-9

Mask = NDArray[np.bool_]


def checked_heights(heights: ArrayLike) -> Array:
    """Return the heights above the base of 1 to 1,000 levels; refuse any at or below the base."""
    return checked_count("heights", above(0, "heights", heights))


def checked_count(name: str, values: Array) -> Array:
    """Return one value for each of 1 to 1,000 levels."""
    array = np.atleast_1d(values)
    if not 1 <= array.shape[-1] <= MAX_LEVELS:
        raise ImpossibleValue(name, f"{array.shape[-1]} levels", f"must be 1 to {MAX_LEVELS} levels")
    return array


def checked_weights(weights: ArrayLike, heights: Array) -> Array:
    """Return the weights of the levels: none below 0, at least one above 0 in every building."""
    array = per_level("weights", at_least(0, "weights", weights), heights)
    if array.min() == 0 and not (highest(array) > 0).all():
        raise ImpossibleValue("weights", "all 0", "at least one level must have a weight above 0")
    return array


def counted(name: str, values: Array, what: str) -> Array:
    """Return one list of 1 to 1,000 values that are no levels (``what`` they are, in the plural)."""
    array = np.atleast_1d(values)
    if array.ndim > 1:
        raise WrongType(name, f"{array.ndim} axes", "must be one list")
    if not 1 <= array.size <= MAX_LEVELS:
        raise ImpossibleValue(name, f"{array.size} {what}", f"must be 1 to {MAX_LEVELS} {what}")
    return array


def per_level(name: str, values: Array, heights: Array) -> Array:
    """Return one value for each level; refuse another number of values than levels."""
    array = np.atleast_1d(values)
    if array.shape[-1] != heights.shape[-1]:
        raise WrongType(
            name, f"{array.shape[-1]} values", f"must be one for each of {heights.shape[-1]} levels"
        )
    return array


def slack(heights: Array) -> Array:
    """Return the height below which two heights count as one, kept as a last axis of length 1."""
    return TOLERANCE * highest(heights)


def highest(values: Array) -> Array:
    """Return the largest value over the levels, kept as a last axis of length 1."""
    result: Array = values.max(axis=-1, keepdims=True)
    return result


def total(values: Array) -> Array:
    """Return the sum over the levels."""
    result: Array = values.sum(axis=-1)
    return result


def position(h_x: ArrayLike, heights: Array, base: bool) -> Array:
    """Return ``h_x`` with a level axis of length 1; refuse a height that is no level (nor the base)."""
    place = at_least(0, "h_x", h_x)[..., None]
    known = (np.abs(place - heights) <= slack(heights)).any(axis=-1, keepdims=True)
    if base:
        known = known | (place <= slack(heights))
    if not known.all():
        raise NotApplicable("h_x", first(place, ~known), "must be the height of a level" + " or 0" * base)
    return place


def is_below(place: Array, heights: Array) -> Mask:
    """Tell which levels are below the place."""
    return heights < place - slack(heights)


def refuse_heavier(w_px: Array, place: Array, weights: Array, heights: Array) -> None:
    """Refuse a diaphragm heavier than the heaviest level at its height."""
    level = np.where(np.abs(place - heights) <= slack(heights), weights, 0.0).max(axis=-1)
    excess = w_px > level * (1 + TOLERANCE)
    if excess.any():
        raise NotApplicable("w_px", first(w_px, excess), "must be at most the weight of the level at h_x")


def refuse_stranger(w_x: ArrayLike, place: Array, weights: Array, heights: Array) -> None:
    """Refuse a weight and a height that are not one of the levels."""
    weight = at_least(0, "w_x", w_x)
    same = np.abs(weight[..., None] - weights) <= TOLERANCE * weights
    known = (same & (np.abs(place - heights) <= slack(heights))).any(axis=-1)
    if not known.all():
        raise NotApplicable("w_x", first(weight, ~known), "must be the weight of the level at h_x")


def next_lower(place: Array, heights: Array) -> Array:
    """Return the next height below the place, or 0 (the base)."""
    return highest(np.where(is_below(place, heights), heights, 0.0))


def next_higher(place: Array, heights: Array) -> Array:
    """Return the next height above the place; infinite at the top."""
    above_it = heights > place + slack(heights)
    result: Array = np.where(above_it, heights, np.inf).min(axis=-1, keepdims=True)
    return result


def held(name: str, values: Array, place: Array, heights: Array) -> Array:
    """Return the value that the levels at a place hold, infinite where none is; refuse values that differ."""
    there = np.abs(place - heights) <= slack(heights)
    least = np.where(there, values, np.inf).min(axis=-1)
    most = np.where(there, values, -np.inf).max(axis=-1)
    torn = most - least > TOLERANCE * np.maximum(np.abs(most), np.abs(least))
    if torn.any():
        raise NotApplicable(name, first(most, torn), "levels at one height hold different values")
    return np.asarray(least)


def first(values: Array, where: Mask | np.bool_) -> float:
    """Return the first of the values at the marked places, for a message."""
    return float(np.broadcast_to(values, where.shape)[where].flat[0])
