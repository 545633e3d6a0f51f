"""The torsional irregularity ratio, and the amplification of accidental torsion."""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike, NDArray

from engine.errors import ImpossibleValue
from engine.occupancy import DESIGN_CATEGORIES
from engine.require import Result, above, at_least, choice, exceeds, finite, formula

IRREGULAR_RATIO: Final = 1.2
EXTREME_RATIO: Final = 1.4
#: the categories in which a torsional irregularity amplifies accidental torsion and asks for edge drifts
TORSIONAL_CATEGORIES: Final = ("C", "D", "E", "F")


@formula
def irregularity_ratio(Delta_1: ArrayLike, Delta_2: ArrayLike) -> Result:
    """Torsional irregularity ratio of a story.

    TIR = max(|Delta_1|, |Delta_2|)/|(Delta_1 + Delta_2)/2|

    Parameters
        Delta_1: story drift at one edge, accidental torsion included with A_x = 1 [in or mm], signed
        Delta_2: story drift at the opposite edge [in or mm], signed
    Returns
        TIR [-], at least 1, the broadcast shape
    Raises
        ImpossibleValue: both drifts cancel, so that there is no mean
    Notes
        Story drifts, not displacements from the base. Rigid or semirigid diaphragms. Edges that move in
        opposite directions lower the mean, which raises the ratio.
    Example
        >>> print(irregularity_ratio(Delta_1=0.30, Delta_2=0.20))
        1.2

    Reference
        rule TIR: 7-16 12.3.2.1, Table 12.3-1; 7-22 12.3.2.1, Table 12.3-1
    """
    one, other = finite("Delta_1", Delta_1), finite("Delta_2", Delta_2)
    mean = np.abs(one + other) / 2
    if (mean == 0).any():
        raise ImpossibleValue("Delta_1", 0.0, "the mean of Delta_1 and Delta_2 must not be 0")
    return np.maximum(np.abs(one), np.abs(other)) / mean


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


@formula
def applied_amplification(d_max: ArrayLike, d_avg: ArrayLike, TIR: ArrayLike, SDC: str) -> Result:
    """Amplification factor that applies to accidental torsion.

    A_x where TIR > 1.2 in Seismic Design Category C to F; else 1

    Parameters
        d_max: largest displacement of the level, computed with A_x = 1 [in or mm], at least d_avg; any shape
        d_avg: mean displacement of the extreme points of the level [in or mm], above 0; broadcast with d_max
        TIR: largest torsional irregularity ratio of the structure [-], at least 1
        SDC: Seismic Design Category, "A" to "F"
    Returns
        A_x [-], 1 to 3, the broadcast shape
    Raises
        ImpossibleValue: a value outside its range. NotApplicable: another category
    Notes
        One irregular story makes the structure irregular: give the largest ratio, not the level's own.
    Example
        >>> print(applied_amplification(d_max=1.4, d_avg=1.0, TIR=1.3, SDC="D"))
        1.361

    Reference
        rule A_x: 7-16 12.8.4.3, Eq. 12.8-14; 7-22 12.8.4.3, Eq. 12.8-15
    """
    return np.where(is_torsional(TIR, SDC), amplification(d_max, d_avg), 1.0)


def is_torsional(TIR: ArrayLike, SDC: str) -> NDArray[np.bool_]:
    """Tell where a torsional irregularity exists in a category that acts on it."""
    due = choice("SDC", SDC, DESIGN_CATEGORIES) in TORSIONAL_CATEGORIES
    return exceeds(at_least(1, "TIR", TIR), IRREGULAR_RATIO) & due
