"""Two-period design response spectrum (11.4): corner periods and ordinates."""

from __future__ import annotations

import numpy as np
from numpy.typing import ArrayLike

from engine.require import Result, above, at_least, finite, formula


@formula
def corner_period_T0(S_DS: ArrayLike, S_D1: ArrayLike) -> Result:
    """Period at which the plateau of the design spectrum begins.

    T_0 = 0.2 S_D1/S_DS

    Parameters
        S_DS: design spectral acceleration at short periods [g], above 0; any shape
        S_D1: design spectral acceleration at 1 s [g], above 0; broadcast with S_DS
    Returns
        T_0 [s], the broadcast shape
    Raises
        ImpossibleValue: a value at or below 0
    Example
        >>> print(corner_period_T0(S_DS=1.05, S_D1=1.04))
        0.198095

    Reference
        rule T_0: 7-16 11.4.6; 7-22 11.4.5.2
    """
    return 0.2 * corner_period_TS(S_DS, S_D1)


@formula
def corner_period_TS(S_DS: ArrayLike, S_D1: ArrayLike) -> Result:
    """Period at which the plateau of the design spectrum ends.

    T_S = S_D1/S_DS

    Parameters
        S_DS: design spectral acceleration at short periods [g], above 0; any shape
        S_D1: design spectral acceleration at 1 s [g], above 0; broadcast with S_DS
    Returns
        T_S [s], the broadcast shape
    Raises
        ImpossibleValue: a value at or below 0
    Example
        >>> print(corner_period_TS(S_DS=1.05, S_D1=1.04))
        0.990476

    Reference
        rule T_S: 7-16 11.4.6; 7-22 11.4.5.2
    """
    return above(0, "S_D1", S_D1) / above(0, "S_DS", S_DS)


@formula
def spectral_acceleration(T: ArrayLike, S_DS: ArrayLike, S_D1: ArrayLike, T_L: ArrayLike) -> Result:
    """Ordinate of the two-period design response spectrum.

    S_a = S_DS (0.4 + 0.6 T/T_0) for T < T_0; S_DS to T_S; S_D1/T to T_L; S_D1 T_L/T^2 beyond

    Parameters
        T: period [s], at least 0; any shape
        S_DS: design spectral acceleration at short periods [g], above 0
        S_D1: design spectral acceleration at 1 s [g], above 0
        T_L: long-period transition period [s], above 0
    Returns
        S_a [g], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Notes
        A T_L below T_S is not foreseen by the printed branches; they are then followed in their order.
    Example
        >>> print(spectral_acceleration(T=1.4905, S_DS=1.05, S_D1=1.04, T_L=8.0))
        0.698

    Reference
        rule S_a: 7-16 11.4.6, Eq. 11.4-5 to 11.4-7; 7-22 11.4.5.2, Eq. 11.4-3 to 11.4-5
    """
    T = at_least(0, "T", T)
    T_L = above(0, "T_L", T_L)
    T_S = corner_period_TS(S_DS, S_D1)
    rise = np.minimum(0.4 + 0.6 * T / (0.2 * T_S), 1.0)
    later = np.maximum(T, T_S)
    fall = finite("S_D1", S_D1) / later * np.minimum(T_L / later, 1.0)
    return np.where(T <= T_S, finite("S_DS", S_DS) * rise, fall)
