"""Diaphragm design forces (12.10.1.1): the equation and both limits, each on its own.

Transfer forces and collectors, the alternative procedure and the one-story method stand beside this module.
"""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine import levels
from engine.require import Result, Words, above, agree, at_least, finite, formula, worded

BOUNDS: Final = (
    "w_px sum(F_i)/sum(w_i), Eq. 12.10-1",
    "minimum 0.2 S_DS I_e w_px, Eq. 12.10-2",
    "maximum 0.4 S_DS I_e w_px, Eq. 12.10-3",
)


@formula
def unlimited_force(
    w_px: ArrayLike, h_x: ArrayLike, forces: ArrayLike, weights: ArrayLike, heights: ArrayLike
) -> Result:
    """Diaphragm force before its limits.

    F_px = w_px sum(F_i)/sum(w_i) over the levels at and above h_x

    Parameters
        w_px: weight tributary to the diaphragm [kip or kN], 0 to the weight of the level; broadcast with h_x
        h_x: height of the level above the base [ft or m]; any shape, broadcast with the leading axes
        forces: story forces [kip or kN]; shape (..., n)
        weights: weights of the levels [kip or kN], at least 0, one above 0; shape (..., n), n 1 to 1,000
        heights: heights of the levels above the base [ft or m], above 0; shape (..., n)
    Returns
        F_px [kip or kN], the broadcast shape
    Raises
        NotApplicable: h_x is not a level, or w_px above its weight.
        ImpossibleValue: a value outside its range
    Notes
        Levels at one height enter both sums together. A diaphragm without weight has no force.
    Example
        >>> table = {"weights": [650, 600, 500, 450, 400], "heights": [12, 24, 36, 48, 60]}
        >>> print(unlimited_force(w_px=500, h_x=36, forces=[26.0, 48.0, 60.1, 72.1, 80.1], **table))
        78.6

    Reference
        rule F_px: 7-16 12.10.1.1, Eq. 12.10-1; 7-22 12.10.1.1, Eq. 12.10-1
    """
    h = levels.checked_heights(heights)
    w = levels.checked_weights(weights, h)
    F = levels.per_level("forces", finite("forces", forces), h)
    place = levels.position(h_x, h, base=False)
    w_px = at_least(0, "w_px", w_px)
    levels.refuse_heavier(w_px, place, w, h)
    below = levels.is_below(place, h)
    force, weight = levels.total(np.where(below, 0.0, F)), levels.total(np.where(below, 0.0, w))
    return w_px * force / np.where(weight > 0, weight, 1.0)


@formula
def minimum_force(w_px: ArrayLike, S_DS: ArrayLike, I_e: ArrayLike) -> Result:
    """Lower limit of the diaphragm force.

    F_px = 0.2 S_DS I_e w_px

    Parameters
        w_px: weight tributary to the diaphragm [kip or kN], at least 0; any shape
        S_DS: design spectral acceleration at short periods [g], above 0
        I_e: importance factor [-], at least 1
    Returns
        F_px [kip or kN], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Example
        >>> print(minimum_force(w_px=650, S_DS=0.6, I_e=1.0))
        78.0

    Reference
        rule F_px_min: 7-16 12.10.1.1, Eq. 12.10-2; 7-22 12.10.1.1, Eq. 12.10-2
    """
    return 0.2 * above(0, "S_DS", S_DS) * at_least(1, "I_e", I_e) * at_least(0, "w_px", w_px)


@formula
def maximum_force(w_px: ArrayLike, S_DS: ArrayLike, I_e: ArrayLike) -> Result:
    """Upper limit of the diaphragm force.

    F_px = 0.4 S_DS I_e w_px

    Parameters
        w_px: weight tributary to the diaphragm [kip or kN], at least 0; any shape
        S_DS: design spectral acceleration at short periods [g], above 0
        I_e: importance factor [-], at least 1
    Returns
        F_px [kip or kN], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Example
        >>> print(maximum_force(w_px=650, S_DS=0.6, I_e=1.0))
        156.0

    Reference
        rule F_px_max: 7-16 12.10.1.1, Eq. 12.10-3; 7-22 12.10.1.1, Eq. 12.10-3
    """
    return 2.0 * minimum_force(w_px, S_DS, I_e)


@formula
def design_force(
    w_px: ArrayLike,
    h_x: ArrayLike,
    forces: ArrayLike,
    weights: ArrayLike,
    heights: ArrayLike,
    S_DS: ArrayLike,
    I_e: ArrayLike,
) -> Result:
    """Diaphragm design force of a level, within both limits.

    F_px = w_px sum(F_i)/sum(w_i), from 0.2 S_DS I_e w_px to 0.4 S_DS I_e w_px

    Parameters
        w_px: weight tributary to the diaphragm [kip or kN], 0 to the weight of the level; broadcast with h_x
        h_x: height of the level above the base [ft or m]; any shape, broadcast with the leading axes
        forces: story forces [kip or kN]; shape (..., n)
        weights: weights of the levels [kip or kN], at least 0, one above 0; shape (..., n), n 1 to 1,000
        heights: heights of the levels above the base [ft or m], above 0; shape (..., n)
        S_DS: design spectral acceleration at short periods [g], above 0
        I_e: importance factor [-], at least 1
    Returns
        F_px [kip or kN], the broadcast shape
    Raises
        NotApplicable: h_x is not a level, or w_px above its weight.
        ImpossibleValue: a value outside its range
    Notes
        Forces transferred by offsets or changes of stiffness are to be added.
    Example
        >>> table = {"weights": [650, 600, 500, 450, 400], "heights": [12, 24, 36, 48, 60]}
        >>> F_x = [26.0, 48.0, 60.1, 72.1, 80.1]
        >>> print(design_force(w_px=650, h_x=12, forces=F_x, **table, S_DS=0.6, I_e=1.0))
        78.0

    Reference
        rule F_px: 7-16 12.10.1.1, Eq. 12.10-1; 7-22 12.10.1.1, Eq. 12.10-1
        rule F_px_min: 7-16 12.10.1.1, Eq. 12.10-2; 7-22 12.10.1.1, Eq. 12.10-2
        rule F_px_max: 7-16 12.10.1.1, Eq. 12.10-3; 7-22 12.10.1.1, Eq. 12.10-3
    """
    force = unlimited_force(w_px, h_x, forces, weights, heights)
    return np.clip(force, minimum_force(w_px, S_DS, I_e), maximum_force(w_px, S_DS, I_e))


@formula
def design_force_bound(
    w_px: ArrayLike,
    h_x: ArrayLike,
    forces: ArrayLike,
    weights: ArrayLike,
    heights: ArrayLike,
    S_DS: ArrayLike,
    I_e: ArrayLike,
) -> Words:
    """Which equation gives the diaphragm design force, in words.

    the equation whose value is the design force; of equal ones the first

    Parameters
        w_px, h_x, forces, weights, heights, S_DS, I_e: as for the design force
    Returns
        one of BOUNDS, or texts of the broadcast shape
    Raises
        NotApplicable: h_x is not a level, or w_px above its weight.
        ImpossibleValue: a value outside its range
    Notes
        The equation numbers are the same in both editions.
    Example
        >>> table = {"weights": [650, 600, 500, 450, 400], "heights": [12, 24, 36, 48, 60]}
        >>> F_x = [26.0, 48.0, 60.1, 72.1, 80.1]
        >>> design_force_bound(w_px=650, h_x=12, forces=F_x, **table, S_DS=0.6, I_e=1.0)
        'minimum 0.2 S_DS I_e w_px, Eq. 12.10-2'

    Reference
        rule F_px: 7-16 12.10.1.1, Eq. 12.10-1; 7-22 12.10.1.1, Eq. 12.10-1
        rule F_px_min: 7-16 12.10.1.1, Eq. 12.10-2; 7-22 12.10.1.1, Eq. 12.10-2
        rule F_px_max: 7-16 12.10.1.1, Eq. 12.10-3; 7-22 12.10.1.1, Eq. 12.10-3
    """
    force = unlimited_force(w_px, h_x, forces, weights, heights)
    low, high = minimum_force(w_px, S_DS, I_e), maximum_force(w_px, S_DS, I_e)
    tie = agree(force, low) | agree(force, high)
    return worded(BOUNDS, np.select([tie, force < low, force > high], [0, 1, 2], 0))
