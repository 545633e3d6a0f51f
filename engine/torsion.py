"""Accidental torsion (12.8.4): the amplification factor."""

from __future__ import annotations

import numpy as np
from numpy.typing import ArrayLike

from engine.errors import ImpossibleValue
from engine.require import Result, above, finite, formula


@formula
def amplification(d_max: ArrayLike, d_avg: ArrayLike) -> Result:
    """Torsional amplification factor.

    A_x = (delta_max/(1.2 delta_avg))^2, from 1 to 3

    Parameters
        d_max: largest displacement of the level, computed with A_x = 1 [in or mm], at least d_avg; any shape
        d_avg: mean displacement of the extreme points of the level [in or mm], above 0; broadcast with d_max
    Returns
        A_x [-], 1 to 3, the broadcast shape
    Raises
        ImpossibleValue: d_avg at or below 0, or d_max below d_avg
    Notes
        Displacements are measured from the base, as magnitudes.
    Example
        >>> print(amplification(d_max=1.4, d_avg=1.0))
        1.361

    Reference
        rule A_x: 7-16 12.8.4.3, Eq. 12.8-14; 7-22 12.8.4.3, Eq. 12.8-15
    """
    ratio = finite("d_max", d_max) / above(0, "d_avg", d_avg)
    if (ratio < 1).any():
        raise ImpossibleValue(
            "d_max", float(ratio.min()), "in parts of d_avg: must be at least the mean displacement d_avg"
        )
    return np.clip((ratio / 1.2) ** 2, 1.0, 3.0)
