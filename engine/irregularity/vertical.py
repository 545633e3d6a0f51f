"""Verdicts on the vertical irregularities that are ratios of a story to its neighbours (Table 12.3-2)."""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike, NDArray

from engine import levels
from engine.editions import EDITIONS
from engine.irregularity.ratios import (
    dimension_ratio,
    stiffness_ratio,
    stiffness_ratio_of_three,
    strength_ratio,
    weight_ratio,
)
from engine.irregularity.types import NONE, has_type, named
from engine.occupancy import DESIGN_CATEGORIES
from engine.require import Words, choice, exceeds, formula, short_of, worded, yes

#: soft and extreme soft: against the story above, against the mean of three above
SOFT, EXTREME_SOFT = (0.70, 0.80), (0.60, 0.70)
WEAK, EXTREME_WEAK = 0.80, 0.65
WEIGHT_LIMIT, DIMENSION_LIMIT = 1.5, 1.3
#: the categories in which two stories are few enough; a single one is in every category
FEW_STORIES_CATEGORIES: Final = ("B", "C", "D")
BY_DRIFT: Final = ", exempt by story drift ratios (12.3.2.2)"
BY_STORIES: Final = ", exempt by the number of stories (12.3.2.2)"


@formula
def soft_story(
    h_x: ArrayLike,
    stiffnesses: ArrayLike,
    heights: ArrayLike,
    drift_exception: str,
    SDC: str,
    edition: str,
) -> Words:
    """Verdict on the stiffness of a story.

    soft below 0.70 of the story above or 0.80 of the mean of three above; extreme below 0.60 or 0.70

    Parameters
        h_x: height of the level on top of the story [ft or m]; any shape, broadcast with the leading axes
        stiffnesses: story stiffnesses of all levels [kip/in or kN/mm], above 0; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n), n 1 to 1,000
        drift_exception: "yes" where no story drift ratio is above 1.3 times that of the story above
        SDC: Seismic Design Category, "A" to "F"
        edition: "7-16" or "7-22"
    Returns
        the type, with the exception that frees it, or "no irregularity"; texts of the broadcast shape
    Raises
        NotApplicable: h_x is not a level, or another word
    Notes
        A single story is exempt, and two stories in Seismic Design Category B to D.
    Example
        >>> given = {"drift_exception": "no", "SDC": "D", "edition": "7-16"}
        >>> soft_story(h_x=12, stiffnesses=[65, 100, 90], heights=[12, 24, 36], **given)
        'Type 1a, soft story'

    Reference
        rule soft_story: 7-16 12.3.2.2, Table 12.3-2; 7-22 12.3.2.2, Table 12.3-2
    """
    one, three = (rule(h_x, stiffnesses, heights) for rule in (stiffness_ratio, stiffness_ratio_of_three))
    soft = short_of(one, SOFT[0]) | short_of(three, SOFT[1])
    extreme = short_of(one, EXTREME_SOFT[0]) | short_of(three, EXTREME_SOFT[1])
    state = np.where(extreme, 2, np.where(soft, 1, 0))
    texts = (named("soft story", edition), named("extreme soft story", edition))
    return _exempted(texts, state, _exemption(heights, drift_exception, SDC))


@formula
def weight_irregularity(
    h_x: ArrayLike, weights: ArrayLike, heights: ArrayLike, drift_exception: str, SDC: str, edition: str
) -> Words:
    """Verdict on the weight of a level.

    irregular above 1.5 times the weight of a level next to it; no type of 7-22

    Parameters
        h_x: height of the level above the base [ft or m]; any shape, broadcast with the leading axes
        weights: weights of all levels [kip or kN], at least 0, one above 0; shape (..., n), n 1 to 1,000
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n)
        drift_exception: "yes" where no story drift ratio is above 1.3 times that of the story above
        SDC: Seismic Design Category, "A" to "F"
        edition: "7-16" or "7-22"
    Returns
        the type, with the exception that frees it, or "no irregularity"; texts of the broadcast shape
    Raises
        NotApplicable: h_x is not a level, or another word
    Notes
        A roof lighter than the floor below is not considered.
    Example
        >>> given = {"drift_exception": "no", "SDC": "D", "edition": "7-16"}
        >>> weight_irregularity(h_x=24, weights=[400, 640, 300], heights=[12, 24, 36], **given)
        'Type 2, weight'

    Reference
        rule weight_irregularity: 7-16 12.3.2.2, Table 12.3-2; 7-22 none
    """
    state = np.where(exceeds(weight_ratio(h_x, weights, heights), WEIGHT_LIMIT), 1, 0)
    free = _exemption(heights, drift_exception, SDC)
    if not has_type("weight", choice("edition", edition, EDITIONS)):
        return worded([f"no type of {edition}"], np.zeros_like(state))
    return _exempted((named("weight", edition),), state, free)


@formula
def geometric_irregularity(h_x: ArrayLike, dimensions: ArrayLike, heights: ArrayLike, edition: str) -> Words:
    """Verdict on the horizontal dimension of the seismic force-resisting system in a story.

    irregular above 1.3 times the dimension of a story next to it

    Parameters
        h_x: height of the level on top of the story [ft or m]; any shape, broadcast with the leading axes
        dimensions: dimensions of the force-resisting system by story [ft or m], above 0; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n), n 1 to 1,000
        edition: "7-16" or "7-22"
    Returns
        the type in words, or "no irregularity"; texts of the broadcast shape
    Raises
        NotApplicable: h_x is not a level, or unknown edition
    Example
        >>> geometric_irregularity(h_x=12, dimensions=[80, 60], heights=[12, 24], edition="7-22")
        'Type 2, geometric'

    Reference
        rule geometric: 7-16 12.3.2.2, Table 12.3-2; 7-22 12.3.2.2, Table 12.3-2
    """
    ratio = dimension_ratio(h_x, dimensions, heights)
    return worded((NONE, named("geometric", edition)), exceeds(ratio, DIMENSION_LIMIT))


@formula
def weak_story(h_x: ArrayLike, strengths: ArrayLike, heights: ArrayLike, edition: str) -> Words:
    """Verdict on the lateral strength of a story.

    weak below 0.80 of the story above; extreme below 0.65

    Parameters
        h_x: height of the level on top of the story [ft or m]; any shape, broadcast with the leading axes
        strengths: story lateral strengths of all levels [kip or kN], above 0; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n), n 1 to 1,000
        edition: "7-16" or "7-22"
    Returns
        the type in words, or "no irregularity"; texts of the broadcast shape
    Raises
        NotApplicable: h_x is not a level, or unknown edition
    Example
        >>> weak_story(h_x=12, strengths=[64, 100, 90], heights=[12, 24, 36], edition="7-22")
        'Type 4b, extreme weak story'

    Reference
        rule weak_story: 7-16 12.3.2.2, Table 12.3-2; 7-22 12.3.2.2, Table 12.3-2
    """
    ratio = strength_ratio(h_x, strengths, heights)
    state = np.where(short_of(ratio, EXTREME_WEAK), 2, np.where(short_of(ratio, WEAK), 1, 0))
    return worded((NONE, named("weak story", edition), named("extreme weak story", edition)), state)


def _exempted(types: tuple[str, ...], state: NDArray[np.intp], free: NDArray[np.intp]) -> Words:
    """State 0 is no irregularity; the others are the types, each with the exception that frees it."""
    texts = [NONE, *(f"{name}{by}" for name in types for by in ("", BY_DRIFT, BY_STORIES))]
    return worded(texts, np.where(state == 0, 0, 1 + 3 * (state - 1) + free))


def _exemption(heights: ArrayLike, drift_exception: str, SDC: str) -> NDArray[np.intp]:
    """Tell which exception of 12.3.2.2 holds: none, drift ratios, number of stories."""
    h = levels.checked_heights(heights)
    steps = np.diff(np.sort(h, axis=-1), axis=-1) > levels.slack(h)
    most = 2 if choice("SDC", SDC, DESIGN_CATEGORIES) in FEW_STORIES_CATEGORIES else 1
    by_drift = 1 if yes("drift_exception", drift_exception) else 0
    return np.where(1 + steps.sum(axis=-1) <= most, 2, by_drift)
