"""Vertical distribution (12.8.3 to 12.8.5): k, C_vx, F_x, story shear, overturning, story height.

Levels stand on the LAST axis, in any order; heights are measured from the base. A place ``h_x`` is the
height of a level, or 0 for the base where a rule reaches down to it, and broadcasts with the leading axes.
"""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine import levels
from engine.require import Array, Result, above, choice, finite, formula, within

EXPONENT_RULES: Final = ("interpolate", "two")
SHORT_PERIOD: Final = 0.5


@formula
def exponent(T: ArrayLike, rule: str = "interpolate") -> Result:
    """Exponent of the vertical distribution.

    k = 1 for T <= 0.5; 2 for T >= 2.5; between, 0.75 + 0.5 T, or 2 by the permitted rule "two"

    Parameters
        T: the design period used for C_s [s], above 0; any shape
        rule: "interpolate" or "two"
    Returns
        k [-], 1 to 2, the shape of T
    Raises
        ImpossibleValue: T at or below 0. NotApplicable: another rule
    Example
        >>> print(exponent(T=1.4726), exponent(T=1.4726, rule="two"))
        1.4863 2.0

    Reference
        rule exponent: 7-16 12.8.3; 7-22 12.8.3
        rule exponent_two: 7-16 12.8.3; 7-22 12.8.3
    """
    T = above(0, "T", T)
    if choice("rule", rule, EXPONENT_RULES) == "two":
        return np.where(T > SHORT_PERIOD, 2.0, 1.0)
    return np.clip(0.75 + 0.5 * T, 1.0, 2.0)


@formula
def distribution_factors(weights: ArrayLike, heights: ArrayLike, k: ArrayLike) -> Result:
    """Vertical distribution factors of all levels.

    C_vx = w_x h_x^k / sum(w_i h_i^k)

    Parameters
        weights: weights of the levels [kip or kN], at least 0, one above 0; shape (..., n), n 1 to 1,000
        heights: heights above the base [ft or m], above 0; shape (..., n)
        k: exponent [-], at least 1 and at most 2; one for each building, shape (...)
    Returns
        C_vx [-], shape (..., n); the factors of a building add up to 1
    Raises
        ImpossibleValue: a value outside its range. WrongType: weights and heights of unequal lengths
    Example
        >>> C_vx = distribution_factors(weights=[650, 600, 500, 450, 400], heights=[12, 24, 36, 48, 60], k=1)
        >>> [round(float(c), 3) for c in C_vx]
        [0.091, 0.168, 0.21, 0.252, 0.28]

    Reference
        rule C_vx: 7-16 12.8.3, Eq. 12.8-12; 7-22 12.8.3, Eq. 12.8-13
    """
    h = levels.checked_heights(heights)
    w = levels.checked_weights(weights, h)
    moments = w * h ** _on_levels(_exponent(k))
    return moments / levels.total(moments)[..., None]


@formula
def distribution_factor(
    w_x: ArrayLike, h_x: ArrayLike, weights: ArrayLike, heights: ArrayLike, k: ArrayLike
) -> Result:
    """Vertical distribution factor of one level, or of each level in a column.

    C_vx = w_x h_x^k / sum(w_i h_i^k)

    Parameters
        w_x: weight of the level [kip or kN]; any shape, broadcast with the leading axes of the levels
        h_x: height of the level above the base [ft or m]; as w_x
        weights: weights of all levels [kip or kN], at least 0, one above 0; shape (..., n), n 1 to 1,000
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n)
        k: exponent [-], at least 1 and at most 2; broadcast with w_x
    Returns
        C_vx [-], the broadcast shape
    Raises
        NotApplicable: w_x and h_x are not one of the levels. ImpossibleValue: a value outside its range
    Example
        >>> levels = {"weights": [650, 600, 500, 450, 400], "heights": [12, 24, 36, 48, 60]}
        >>> print(distribution_factor(w_x=450, h_x=48, **levels, k=1))
        0.252

    Reference
        rule C_vx: 7-16 12.8.3, Eq. 12.8-12; 7-22 12.8.3, Eq. 12.8-13
    """
    h = levels.checked_heights(heights)
    w = levels.checked_weights(weights, h)
    k = _exponent(k)
    levels.refuse_stranger(w_x, levels.position(h_x, h, base=False), w, h)
    return finite("w_x", w_x) * finite("h_x", h_x) ** k / levels.total(w * h ** _on_levels(k))


@formula
def story_force(V: ArrayLike, C_vx: ArrayLike) -> Result:
    """Lateral story force.

    F_x = C_vx V

    Parameters
        V: seismic base shear [kip or kN], above 0; any shape
        C_vx: vertical distribution factor [-], 0 to 1; broadcast with V
    Returns
        F_x [kip or kN, the unit of V], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Notes
        For several buildings give V a last axis of length 1, so that it meets the levels.
    Example
        >>> print(story_force(V=286.0, C_vx=0.280))
        80.1

    Reference
        rule F_x: 7-16 12.8.3, Eq. 12.8-11; 7-22 12.8.3, Eq. 12.8-12
    """
    return within(0, 1, "C_vx", C_vx) * above(0, "V", V)


@formula
def story_shear(h_x: ArrayLike, forces: ArrayLike, heights: ArrayLike) -> Result:
    """Seismic design story shear just below a level; at 0, the base shear.

    V_x = sum(F_i) over the levels at and above h_x

    Parameters
        h_x: height of a level, or 0 for the base [ft or m]; any shape, broadcast with the leading axes
        forces: story forces [kip or kN]; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n), n 1 to 1,000
    Returns
        V_x [kip or kN], the broadcast shape
    Raises
        NotApplicable: h_x is neither a level nor the base. WrongType: unequal lengths
    Example
        >>> print(story_shear(h_x=48, forces=[26.0, 48.0, 60.1, 72.1, 80.1], heights=[12, 24, 36, 48, 60]))
        152.2

    Reference
        rule V_x: 7-16 12.8.4, Eq. 12.8-13; 7-22 12.8.4, Eq. 12.8-14
    """
    h = levels.checked_heights(heights)
    F = levels.per_level("forces", finite("forces", forces), h)
    below = levels.is_below(levels.position(h_x, h, base=True), h)
    return levels.total(np.where(below, 0.0, F))


@formula
def overturning_moment(h_x: ArrayLike, forces: ArrayLike, heights: ArrayLike) -> Result:
    """Overturning moment at a level; at 0, at the base.

    M_x = sum(F_i (h_i - h_x)) over the levels above h_x

    Parameters
        h_x: height of a level, or 0 for the base [ft or m]; any shape, broadcast with the leading axes
        forces: story forces [kip or kN]; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n), n 1 to 1,000
    Returns
        M_x [kip-ft or kN-m], the broadcast shape
    Raises
        NotApplicable: h_x is neither a level nor the base. WrongType: unequal lengths
    Example
        >>> print(overturning_moment(h_x=24, forces=[48.0, 60.1, 72.1], heights=[24, 36, 48]))
        2451.6

    Reference
        rule M_x: 7-16 12.8.5; 7-22 12.8.5
    """
    h = levels.checked_heights(heights)
    F = levels.per_level("forces", finite("forces", forces), h)
    place = levels.position(h_x, h, base=True)
    return levels.total(F * np.where(levels.is_below(place, h), 0.0, h - place))


@formula
def height_above_base(z_x: ArrayLike, z_0: ArrayLike) -> Result:
    """Height of a level above the base, from elevations.

    h_x = z_x - z_0

    Parameters
        z_x: elevation of the level [ft or m], above the base; any shape
        z_0: elevation of the base [ft or m], broadcast with z_x
    Returns
        h_x [ft or m], above 0, the broadcast shape
    Raises
        ImpossibleValue: a level at or below the base
    Example
        >>> print(height_above_base(z_x=129.0, z_0=100.0))
        29.0

    Reference
        rule h_x: 7-16 12.8.3; 7-22 12.8.3
    """
    return above(0, "h_x", finite("z_x", z_x) - finite("z_0", z_0))


@formula
def story_height(h_x: ArrayLike, heights: ArrayLike) -> Result:
    """Height of the story below a level.

    h_sx = h_x - the next lower height, or 0 (the base)

    Parameters
        h_x: height of a level above the base [ft or m]; any shape, broadcast with the leading axes
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n), n 1 to 1,000
    Returns
        h_sx [ft or m], the broadcast shape
    Raises
        NotApplicable: h_x is not a level
    Notes
        Levels at one height count as one.
    Example
        >>> print(story_height(h_x=24, heights=[12, 24, 24, 36]))
        12.0

    Reference
        rule story_height: 7-16 11.3; 7-22 11.3
    """
    h = levels.checked_heights(heights)
    place = levels.position(h_x, h, base=False)
    return finite("h_x", h_x) - levels.next_lower(place, h)[..., 0]


@formula
def value_below(h_x: ArrayLike, values: ArrayLike, heights: ArrayLike) -> Result:
    """Value at the next lower level, such as the displacement at the foot of a story; 0 at the base.

    value_below = value_i of the level at the next lower height

    Parameters
        h_x: height of a level above the base [ft or m]; any shape, broadcast with the leading axes
        values: one value for each level; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n), n 1 to 1,000
    Returns
        the value [the unit of values], the broadcast shape
    Raises
        NotApplicable: h_x is not a level, or levels at the next lower height hold different values
    Example
        >>> print(value_below(h_x=24, values=[0.31, 0.74, 1.02], heights=[12, 24, 36]))
        0.31

    Reference
        rule story_height: 7-16 11.3; 7-22 11.3
    """
    h = levels.checked_heights(heights)
    held = levels.per_level("values", finite("values", values), h)
    lower = levels.next_lower(levels.position(h_x, h, base=False), h)
    return np.where(lower[..., 0] == 0, 0.0, levels.held("values", held, lower, h))


def _exponent(k: ArrayLike) -> Array:
    return within(1, 2, "k", k)


def _on_levels(value: Array) -> Array | float:
    # a plain number keeps numpy's quick paths for whole exponents
    return value[..., None] if value.ndim else float(value)
