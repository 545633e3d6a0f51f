"""The ratios of a story to its neighbours that Table 12.3-2 limits.

Stories are told apart by the heights of the levels on top of them, so the order of rows is free. A story
without the neighbour that a rule compares it with has the ratio 1, which no rule limits.
"""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine import levels
from engine.require import Array, Result, Words, above, exceeds, formula, worded

DRIFT_EXCEPTION_LIMIT: Final = 1.3
ALONE: Final = 1.0


@formula
def stiffness_ratio(h_x: ArrayLike, stiffnesses: ArrayLike, heights: ArrayLike) -> Result:
    """Lateral stiffness of a story over that of the story above.

    K_x/K_above; 1 at the top

    Parameters
        h_x: height of the level on top of the story [ft or m]; any shape, broadcast with the leading axes
        stiffnesses: story stiffnesses of all levels [kip/in or kN/mm], above 0; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n), n 1 to 1,000
    Returns
        the ratio [-], the broadcast shape
    Raises
        NotApplicable: h_x is not a level, or levels at one height hold different stiffnesses
    Example
        >>> print(stiffness_ratio(h_x=12, stiffnesses=[70, 100, 90], heights=[12, 24, 36]))
        0.7

    Reference
        rule soft_story: 7-16 12.3.2.2, Table 12.3-2; 7-22 12.3.2.2, Table 12.3-2
    """
    return _over_above("stiffnesses", h_x, stiffnesses, heights)


@formula
def stiffness_ratio_of_three(h_x: ArrayLike, stiffnesses: ArrayLike, heights: ArrayLike) -> Result:
    """Lateral stiffness of a story over the mean of the three stories above.

    K_x/mean(K of the three stories above); 1 where fewer than three stand above

    Parameters
        h_x: height of the level on top of the story [ft or m]; any shape, broadcast with the leading axes
        stiffnesses: story stiffnesses of all levels [kip/in or kN/mm], above 0; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n), n 1 to 1,000
    Returns
        the ratio [-], the broadcast shape
    Raises
        NotApplicable: h_x is not a level, or levels at one height hold different stiffnesses
    Notes
        Where fewer than three stories stand above, only the story above is compared: common practice.
    Example
        >>> levels = {"stiffnesses": [80, 90, 100, 110], "heights": [12, 24, 36, 48]}
        >>> print(stiffness_ratio_of_three(h_x=12, **levels))
        0.8

    Reference
        rule soft_story: 7-16 12.3.2.2, Table 12.3-2; 7-22 12.3.2.2, Table 12.3-2
    """
    h, K, place = _stories("stiffnesses", h_x, stiffnesses, heights)
    here, total = levels.held("stiffnesses", K, place, h), np.asarray(0.0)
    for _ in range(3):
        place = levels.next_higher(place, h)
        total = total + levels.held("stiffnesses", K, place, h)
    return _ratio(here, total / 3)


@formula
def strength_ratio(h_x: ArrayLike, strengths: ArrayLike, heights: ArrayLike) -> Result:
    """Lateral strength of a story over that of the story above.

    strength_x/strength_above; 1 at the top

    Parameters
        h_x: height of the level on top of the story [ft or m]; any shape, broadcast with the leading axes
        strengths: story lateral strengths of all levels [kip or kN], above 0; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n), n 1 to 1,000
    Returns
        the ratio [-], the broadcast shape
    Raises
        NotApplicable: h_x is not a level, or levels at one height hold different strengths
    Example
        >>> print(strength_ratio(h_x=12, strengths=[64, 100, 90], heights=[12, 24, 36]))
        0.64

    Reference
        rule weak_story: 7-16 12.3.2.2, Table 12.3-2; 7-22 12.3.2.2, Table 12.3-2
    """
    return _over_above("strengths", h_x, strengths, heights)


@formula
def dimension_ratio(h_x: ArrayLike, dimensions: ArrayLike, heights: ArrayLike) -> Result:
    """Horizontal dimension of the system in a story over the smaller one of the stories next to it.

    L_x/min(L_above, L_below)

    Parameters
        h_x: height of the level on top of the story [ft or m]; any shape, broadcast with the leading axes
        dimensions: dimensions of the force-resisting system by story [ft or m], above 0; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n), n 1 to 1,000
    Returns
        the ratio [-], 1 for a single story, the broadcast shape
    Raises
        NotApplicable: h_x is not a level, or levels at one height hold different dimensions
    Example
        >>> print(dimension_ratio(h_x=12, dimensions=[80, 60, 60], heights=[12, 24, 36]))
        1.3333

    Reference
        rule geometric: 7-16 12.3.2.2, Table 12.3-2; 7-22 12.3.2.2, Table 12.3-2
    """
    h, L, place = _stories("dimensions", h_x, dimensions, heights)
    upper = levels.held("dimensions", L, levels.next_higher(place, h), h)
    lower = levels.held("dimensions", L, levels.next_lower(place, h), h)
    return _ratio(levels.held("dimensions", L, place, h), np.minimum(upper, lower))


@formula
def weight_ratio(h_x: ArrayLike, weights: ArrayLike, heights: ArrayLike) -> Result:
    """Effective weight of a level over the lighter one of the levels next to it.

    w_x/min(w_above, w_below), a roof lighter than the floor below left out

    Parameters
        h_x: height of the level above the base [ft or m]; any shape, broadcast with the leading axes
        weights: weights of all levels [kip or kN], at least 0, one above 0; shape (..., n), n 1 to 1,000
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n)
    Returns
        the ratio [-], 1 where no level is left to compare with, the broadcast shape
    Raises
        NotApplicable: h_x is not a level. ImpossibleValue: a value outside its range
    Notes
        Levels at one height are weighed together. Levels without weight are passed over. The roof is the
        highest level with a weight.
    Example
        >>> print(weight_ratio(h_x=24, weights=[400, 640, 300], heights=[12, 24, 36]))
        1.6

    Reference
        rule weight_irregularity: 7-16 12.3.2.2, Table 12.3-2; 7-22 none
    """
    h = levels.checked_heights(heights)
    w = levels.checked_weights(weights, h)
    place = levels.position(h_x, h, base=False)
    here, weighty = _weight_at(place, w, h), np.where(w > 0, h, 0.0)
    upper, lower = levels.next_higher(place, weighty), levels.next_lower(place, weighty)
    above_it, below_it = _weight_at(upper, w, h), _weight_at(lower, w, h)
    roof = np.isinf(levels.next_higher(upper, weighty))[..., 0]
    left_out = (above_it == 0) | (roof & (above_it < here))
    neighbours = np.where(left_out, np.inf, above_it), np.where(below_it == 0, np.inf, below_it)
    return _ratio(here, np.minimum(*neighbours))


@formula
def drift_comparison(h_x: ArrayLike, drift_ratios: ArrayLike, heights: ArrayLike) -> Result:
    """Story drift ratio of a story over that of the story above, for the exception of the clause.

    (Delta/h)_x/(Delta/h)_above; 1 for the top two stories, which need not be compared

    Parameters
        h_x: height of the level on top of the story [ft or m]; any shape, broadcast with the leading axes
        drift_ratios: design story drifts over story heights, torsion left out [-], above 0; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n), n 1 to 1,000
    Returns
        the ratio [-], the broadcast shape
    Raises
        NotApplicable: h_x is not a level, or levels at one height hold different drift ratios
    Example
        >>> print(drift_comparison(h_x=12, drift_ratios=[0.013, 0.01, 0.009], heights=[12, 24, 36]))
        1.3

    Reference
        rule drift_exception: 7-16 12.3.2.2; 7-22 12.3.2.2
    """
    h, r, place = _stories("drift_ratios", h_x, drift_ratios, heights)
    upper = levels.next_higher(place, h)
    compared = levels.held("drift_ratios", r, upper, h)
    top = np.isinf(levels.next_higher(upper, h))[..., 0]
    return _ratio(levels.held("drift_ratios", r, place, h), np.where(top, np.inf, compared))


@formula
def drift_exception(drift_ratios: ArrayLike, heights: ArrayLike) -> Words:
    """Whether the exception by story drift ratios holds for the building: "yes" or "no".

    no story drift ratio above 1.3 times that of the story above

    Parameters
        drift_ratios: design story drifts over story heights, torsion left out [-], above 0; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n), n 1 to 1,000
    Returns
        "yes" or "no", or texts of the leading axes
    Raises
        NotApplicable: levels at one height hold different drift ratios
    Notes
        It frees from the soft story types, in 7-16 from the weight type as well.
    Example
        >>> drift_exception(drift_ratios=[0.014, 0.01, 0.009], heights=[12, 24, 36])
        'no'

    Reference
        rule drift_exception: 7-16 12.3.2.2; 7-22 12.3.2.2
    """
    h = levels.checked_heights(heights)
    each = np.moveaxis(h, -1, 0)
    ratios = [drift_comparison(place, drift_ratios, heights) for place in each]
    return worded(("yes", "no"), exceeds(np.max(ratios, axis=0), DRIFT_EXCEPTION_LIMIT))


def _stories(name: str, h_x: ArrayLike, values: ArrayLike, heights: ArrayLike) -> tuple[Array, Array, Array]:
    h = levels.checked_heights(heights)
    return h, levels.per_level(name, above(0, name, values), h), levels.position(h_x, h, base=False)


def _over_above(name: str, h_x: ArrayLike, values: ArrayLike, heights: ArrayLike) -> Array:
    h, held, place = _stories(name, h_x, values, heights)
    upper = levels.held(name, held, levels.next_higher(place, h), h)
    return _ratio(levels.held(name, held, place, h), upper)


def _ratio(here: Array, neighbour: Array) -> Array:
    """The ratio to a neighbour, whose value is infinite where there is none."""
    return np.where(np.isinf(neighbour), ALONE, here / neighbour)


def _weight_at(place: Array, weights: Array, heights: Array) -> Array:
    return levels.total(np.where(np.abs(place - heights) <= levels.slack(heights), weights, 0.0))
