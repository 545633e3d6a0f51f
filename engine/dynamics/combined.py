"""Story shears and drifts combined over the modes (12.9.1.3): each mode's response first, then one rule."""

from __future__ import annotations

from collections.abc import Callable
from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine.dynamics.combination import complete_combination, square_root_of_squares
from engine.dynamics.modes import mode_period
from engine.dynamics.response import modal_drift, modal_shear
from engine.require import Result, above, at_least, at_most, choice, finite, formula

#: the rules of combination that are computed
COMBINATIONS: Final = ("SRSS", "CQC")
MODEL: Final = ("weights", "stiffnesses", "heights")


@formula
def combined_shear(
    h_x: ArrayLike,
    mode_numbers: ArrayLike,
    mode_coefficients: ArrayLike,
    weights: ArrayLike,
    stiffnesses: ArrayLike,
    heights: ArrayLike,
    combination: str,
    damping: ArrayLike,
) -> Result:
    """Story shear just below a level, combined over modes; at 0, the base shear.

    V_x = SRSS or CQC of V_xm over the modes

    Parameters
        h_x: height of a level, or 0 for the base [ft or m]; any shape, broadcast with the leading axes
        mode_numbers: numbers of the modes [-], whole, at least 1; shape (..., m), m 1 to 1,000
        mode_coefficients: seismic response coefficient of each mode [-], above 0; shape (..., m)
        weights: weights of the levels [kip or kN], at least 0, one above 0; shape (..., n), n 1 to 1,000
        stiffnesses: stiffness of the story below each level [kip/in or kN/mm], above 0; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n)
        combination: one of COMBINATIONS
        damping: damping ratio of all modes [-], above 0, at most 1; the complete combination alone uses it
    Returns
        V_x [kip or kN], at least 0, the broadcast shape
    Raises
        NotApplicable: h_x is neither a level nor the base, no such mode, another combination
    Example
        >>> model = {"weights": [100] * 5, "stiffnesses": [31.54] * 5, "heights": [12, 24, 36, 48, 60]}
        >>> print(combined_shear(0, [1, 2], [0.1, 0.2], **model, combination="SRSS", damping=0.05))
        44.83

    Reference
        rule modal_combination: 7-16 12.9.1.3; 7-22 12.9.1.3
        rule modal_correlation: 7-16 12.9.1.3; 7-22 12.9.1.3
    """
    modes, model = (mode_numbers, mode_coefficients), (weights, stiffnesses, heights)
    return _combined(modal_shear, h_x, modes, model, combination, damping)


@formula
def combined_drift(
    h_x: ArrayLike,
    mode_numbers: ArrayLike,
    mode_coefficients: ArrayLike,
    weights: ArrayLike,
    stiffnesses: ArrayLike,
    heights: ArrayLike,
    combination: str,
    damping: ArrayLike,
) -> Result:
    """Elastic drift of the story below a level, combined over modes.

    Delta_xe = SRSS or CQC of the drifts in the modes

    Parameters
        h_x: height of a level above the base [ft or m]; any shape, broadcast with the leading axes
        mode_numbers, mode_coefficients, weights, stiffnesses, heights, combination, damping: as for the shear
    Returns
        Delta_xe [in or mm], at least 0, the broadcast shape
    Raises
        NotApplicable: h_x is no level, no such mode, another combination
    Example
        >>> model = {"weights": [100] * 5, "stiffnesses": [31.54] * 5, "heights": [12, 24, 36, 48, 60]}
        >>> print(combined_drift(12, [1, 2], [0.1, 0.2], **model, combination="SRSS", damping=0.05))
        1.421

    Reference
        rule modal_combination: 7-16 12.9.1.3; 7-22 12.9.1.3
        rule modal_correlation: 7-16 12.9.1.3; 7-22 12.9.1.3
    """
    modes, model = (mode_numbers, mode_coefficients), (weights, stiffnesses, heights)
    return _combined(modal_drift, h_x, modes, model, combination, damping)


def _combined(
    response: Callable[..., Result],
    h_x: ArrayLike,
    modes: tuple[ArrayLike, ArrayLike],
    model: tuple[ArrayLike, ArrayLike, ArrayLike],
    combination: str,
    damping: ArrayLike,
) -> Result:
    """Combine a response over modes that stand on a last axis of their own."""
    numbers = np.atleast_1d(at_least(1, "mode_numbers", modes[0]))
    C_sm = np.atleast_1d(above(0, "mode_coefficients", modes[1]))
    zeta = above(0, "damping", at_most(1, "damping", damping))
    w, K, h = (
        np.atleast_1d(finite(name, column))[..., None, :] for name, column in zip(MODEL, model, strict=True)
    )
    values = np.asarray(response(numbers, at_least(0, "h_x", h_x)[..., None], C_sm, w, K, h))
    if choice("combination", combination, COMBINATIONS) == COMBINATIONS[0]:
        return square_root_of_squares(values)
    periods = np.asarray(mode_period(numbers, w, K, h, units="si"))  # their ratios alone count
    return complete_combination(values, np.broadcast_to(periods, values.shape), zeta)
