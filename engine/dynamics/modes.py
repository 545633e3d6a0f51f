"""Modes of a building and what they hold of its weight (12.9.1.1).

The mode with the longest period is mode 1. A mode's shape has 1 as its largest ordinate; of two equally
large ones the higher level's. For the first mode that is the roof.
"""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine.dynamics.chain import pick
from engine.dynamics.eigen import EQUAL, solved
from engine.levels import total
from engine.require import Result, Words, above, at_most, choice, formula, worded
from engine.units import GRAVITY, SYSTEMS

ENOUGH: Final = 0.90
RIGID_PERIOD: Final = 0.05
VERDICTS: Final = (
    "100 % of the weight",
    "100 % of the weight, with the modes left out, all below 0.05 s, taken as one rigid mode at 0.05 s",
    "at least 90 % of the weight: enough by the exception",
    "below 90 % of the weight: take more modes",
)


@formula
def mode_period(
    mode: ArrayLike, weights: ArrayLike, stiffnesses: ArrayLike, heights: ArrayLike, units: str
) -> Result:
    """Period of a mode.

    T_m = 2 pi/omega_m, with K phi = omega^2 (w/g) phi of the shear building

    Parameters
        mode: number of the mode [-], whole, at least 1; any shape, broadcast with the leading axes
        weights: weights of the levels [kip or kN], at least 0, one above 0; shape (..., n), n 1 to 1,000
        stiffnesses: stiffness of the story below each level [kip/in or kN/mm], above 0; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n)
        units: "us" (kip/in) or "si" (kN/mm), for the acceleration of gravity
    Returns
        T_m [s], the broadcast shape
    Raises
        NotApplicable: a number above that of the modes, one for each height with weight
    Example
        >>> model = {"weights": [100] * 5, "stiffnesses": [31.54] * 5, "heights": [12, 24, 36, 48, 60]}
        >>> print(mode_period(mode=1, **model, units="us"))
        2.00

    Reference
        rule modes: 7-16 12.9.1.1; 7-22 12.9.1.1
    """
    g = GRAVITY[choice("units", units, SYSTEMS)]
    found = solved(weights, stiffnesses, heights)
    return 2 * np.pi * np.sqrt(found.of(found.extent, mode) / g)


@formula
def mode_shape(
    mode: ArrayLike, h_x: ArrayLike, weights: ArrayLike, stiffnesses: ArrayLike, heights: ArrayLike
) -> Result:
    """Ordinate of a mode's shape at a level.

    phi_xm, with 1 as the largest ordinate of the mode

    Parameters
        mode: number of the mode [-], whole, at least 1; any shape, broadcast with the leading axes
        h_x: height of a level above the base [ft or m]; broadcast with mode
        weights: weights of the levels [kip or kN], at least 0, one above 0; shape (..., n), n 1 to 1,000
        stiffnesses: stiffness of the story below each level [kip/in or kN/mm], above 0; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n)
    Returns
        phi_xm [-], -1 to 1, the broadcast shape
    Raises
        NotApplicable: h_x is not a level, or the mode's number is above that of the modes
    Example
        >>> model = {"weights": [100] * 5, "stiffnesses": [31.54] * 5, "heights": [12, 24, 36, 48, 60]}
        >>> print(mode_shape(mode=1, h_x=12, **model))
        0.285

    Reference
        rule modes: 7-16 12.9.1.1; 7-22 12.9.1.1
    """
    found = solved(weights, stiffnesses, heights)
    return found.at(found.shape, mode, h_x)


@formula
def mode_participation(
    mode: ArrayLike, weights: ArrayLike, stiffnesses: ArrayLike, heights: ArrayLike
) -> Result:
    """Participation factor of a mode.

    Gamma_m = sum(w_i phi_im)/sum(w_i phi_im^2)

    Parameters
        mode: number of the mode [-], whole, at least 1; any shape, broadcast with the leading axes
        weights: weights of the levels [kip or kN], at least 0, one above 0; shape (..., n), n 1 to 1,000
        stiffnesses: stiffness of the story below each level [kip/in or kN/mm], above 0; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n)
    Returns
        Gamma_m [-], signed, the broadcast shape
    Raises
        NotApplicable: a number above that of the modes
    Notes
        Its size and sign belong to the shape as normalised here; Gamma_m phi_xm is free of that.
    Example
        >>> model = {"weights": [100] * 5, "stiffnesses": [31.54] * 5, "heights": [12, 24, 36, 48, 60]}
        >>> print(mode_participation(mode=1, **model))
        1.252

    Reference
        rule modes: 7-16 12.9.1.1; 7-22 12.9.1.1
    """
    found = solved(weights, stiffnesses, heights)
    return found.of(found.participation, mode)


@formula
def mode_weight_share(
    mode: ArrayLike, weights: ArrayLike, stiffnesses: ArrayLike, heights: ArrayLike
) -> Result:
    """Part of the total weight that moves in a mode: its effective modal mass over the total mass.

    W_m/W = sum(w_i phi_im)^2/(sum(w_i phi_im^2) sum(w_i))

    Parameters
        mode: number of the mode [-], whole, at least 1; any shape, broadcast with the leading axes
        weights: weights of the levels [kip or kN], at least 0, one above 0; shape (..., n), n 1 to 1,000
        stiffnesses: stiffness of the story below each level [kip/in or kN/mm], above 0; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n)
    Returns
        W_m/W [-], above 0, at most 1; the shares of all modes add up to 1
    Raises
        NotApplicable: a number above that of the modes
    Example
        >>> model = {"weights": [100] * 5, "stiffnesses": [31.54] * 5, "heights": [12, 24, 36, 48, 60]}
        >>> print(mode_weight_share(mode=1, **model))
        0.8795

    Reference
        rule modes: 7-16 12.9.1.1; 7-22 12.9.1.1
    """
    found = solved(weights, stiffnesses, heights)
    return found.of(found.share, mode)


@formula
def modes_weight_share(
    modes: ArrayLike, weights: ArrayLike, stiffnesses: ArrayLike, heights: ArrayLike
) -> Result:
    """Part of the total weight that moves in the first modes together.

    sum(W_m/W) over modes 1 to the given number

    Parameters
        modes: how many modes, from the first on [-], whole, at least 1; any shape, broadcast as for mode
        weights: weights of the levels [kip or kN], at least 0, one above 0; shape (..., n), n 1 to 1,000
        stiffnesses: stiffness of the story below each level [kip/in or kN/mm], above 0; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n)
    Returns
        the sum [-], above 0, at most 1, the broadcast shape
    Raises
        NotApplicable: more modes than the building has
    Example
        >>> model = {"weights": [100] * 5, "stiffnesses": [31.54] * 5, "heights": [12, 24, 36, 48, 60]}
        >>> print(modes_weight_share(modes=2, **model))
        0.967

    Reference
        rule modes: 7-16 12.9.1.1; 7-22 12.9.1.1
    """
    found = solved(weights, stiffnesses, heights)
    return pick(np.cumsum(found.share, axis=-1), found.number("modes", modes))


@formula
def modes_needed(share: ArrayLike, weights: ArrayLike, stiffnesses: ArrayLike, heights: ArrayLike) -> Result:
    """How many modes, from the first on, hold a given part of the weight.

    the least number of modes with sum(W_m/W) >= share

    Parameters
        share: part of the weight to be held [-], above 0, at most 1; any shape, broadcast as for mode
        weights: weights of the levels [kip or kN], at least 0, one above 0; shape (..., n), n 1 to 1,000
        stiffnesses: stiffness of the story below each level [kip/in or kN/mm], above 0; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n)
    Returns
        the number of modes [-], whole, the broadcast shape
    Raises
        ImpossibleValue: a share outside its range
    Notes
        Sums are compared to a billionth, so that round-off asks for no further mode.
    Example
        >>> model = {"weights": [100] * 5, "stiffnesses": [31.54] * 5, "heights": [12, 24, 36, 48, 60]}
        >>> print(modes_needed(share=[0.5, 0.9, 1.0], **model))
        [1. 2. 5.]

    Reference
        rule modes: 7-16 12.9.1.1; 7-22 12.9.1.1
    """
    wanted = above(0, "share", at_most(1, "share", share))
    found = solved(weights, stiffnesses, heights)
    short = np.cumsum(found.share, axis=-1) < (wanted - EQUAL)[..., None]
    return 1.0 + total(short.astype(np.float64))


@formula
def modes_verdict(
    modes: ArrayLike, weights: ArrayLike, stiffnesses: ArrayLike, heights: ArrayLike, units: str
) -> Words:
    """Whether the first modes hold enough of the weight, in words.

    sum(W_m/W) against 1 and against 0.90; the periods left out against 0.05 s

    Parameters
        modes: how many modes, from the first on [-], whole, at least 1; any shape, broadcast as for mode
        weights: weights of the levels [kip or kN], at least 0, one above 0; shape (..., n), n 1 to 1,000
        stiffnesses: stiffness of the story below each level [kip/in or kN/mm], above 0; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n)
        units: "us" (kip/in) or "si" (kN/mm), for the acceleration of gravity
    Returns
        one of VERDICTS, or texts of the broadcast shape
    Raises
        NotApplicable: more modes than the building has, or unknown units
    Notes
        The 90 % and the 0.05 s are from memory.
    Example
        >>> model = {"weights": [100] * 5, "stiffnesses": [31.54] * 5, "heights": [12, 24, 36, 48, 60]}
        >>> modes_verdict(modes=2, **model, units="us")
        'at least 90 % of the weight: enough by the exception'

    Reference
        rule modes: 7-16 12.9.1.1; 7-22 12.9.1.1
    """
    found = solved(weights, stiffnesses, heights)
    held = modes_weight_share(modes, weights, stiffnesses, heights)
    after = np.minimum(found.number("modes", modes) + 2, found.count)
    rest = mode_period(after, weights, stiffnesses, heights, units)
    conditions = [held >= 1 - EQUAL, rest < RIGID_PERIOD, held >= ENOUGH - EQUAL]
    return worded(VERDICTS, np.select(conditions, range(len(conditions)), len(conditions)))
