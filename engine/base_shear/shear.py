"""The seismic base shear, and how far soil-structure interaction may reduce it (12.8.1, 12.8.1.2)."""

from __future__ import annotations

import numpy as np
from numpy.typing import ArrayLike

from engine.require import Result, above, at_least, formula


@formula
def base_shear(C_s: ArrayLike, W: ArrayLike) -> Result:
    """Seismic base shear.

    V = C_s W

    Parameters
        C_s: governing seismic response coefficient [-], above 0; any shape
        W: effective seismic weight [kip or kN], above 0; broadcast with C_s
    Returns
        V [kip or kN, the unit of W], the broadcast shape
    Raises
        ImpossibleValue: a value at or below 0
    Example
        >>> print(base_shear(C_s=0.11, W=2600.0))
        286.0

    Reference
        rule V: 7-16 12.8.1, Eq. 12.8-1; 7-22 12.8.1, Eq. 12.8-1
    """
    return above(0, "C_s", C_s) * above(0, "W", W)


@formula
def interaction_minimum(V: ArrayLike, R: ArrayLike) -> Result:
    """Least base shear when it is reduced for soil-structure interaction.

    alpha V, alpha = 0.5 + R/15, from 0.7 (R to 3) to 0.9 (R from 6)

    Parameters
        V: base shear without interaction [kip or kN], above 0; any shape
        R: response modification coefficient [-], at least 1; broadcast with V
    Returns
        the least reduced base shear [kip or kN, the unit of V], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Notes
        From memory. The reduction itself is not computed here.
    Example
        >>> print(interaction_minimum(V=100.0, R=4.5))
        80.0

    Reference
        rule interaction_minimum: 7-16 19.2; 7-22 19.2
    """
    return np.clip(0.5 + at_least(1, "R", R) / 15.0, 0.7, 0.9) * above(0, "V", V)
