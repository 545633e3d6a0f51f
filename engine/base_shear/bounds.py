"""The bounds of the seismic response coefficient (12.8.1.1), each on its own."""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine.require import Result, above, at_least, formula

S_1_THRESHOLD: Final = 0.6
C_S_FLOOR: Final = 0.01


@formula
def coefficient_plateau(S_DS: ArrayLike, R: ArrayLike, I_e: ArrayLike) -> Result:
    """Seismic response coefficient on the plateau of the spectrum.

    C_s = S_DS/(R/I_e)

    Parameters
        S_DS: design spectral acceleration at short periods [g], above 0; any shape
        R: response modification coefficient [-], at least 1
        I_e: importance factor [-], at least 1
    Returns
        C_s [-], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Example
        >>> print(coefficient_plateau(S_DS=0.60, R=5.5, I_e=1.0))
        0.1091

    Reference
        rule C_s_plateau: 7-16 12.8.1.1, Eq. 12.8-2; 7-22 12.8.1.1, Eq. 12.8-3
    """
    return above(0, "S_DS", S_DS) / _reduction(R, I_e)


@formula
def coefficient_cap(S_D1: ArrayLike, T: ArrayLike, T_L: ArrayLike, R: ArrayLike, I_e: ArrayLike) -> Result:
    """Upper bound of the seismic response coefficient from the falling branches of the spectrum.

    C_s = S_D1/(T R/I_e) for T <= T_L; S_D1 T_L/(T^2 R/I_e) beyond

    Parameters
        S_D1: design spectral acceleration at 1 s [g], above 0; any shape
        T: design period [s], above 0
        T_L: long-period transition period [s], above 0
        R: response modification coefficient [-], at least 1
        I_e: importance factor [-], at least 1
    Returns
        C_s [-], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Example
        >>> print(coefficient_cap(S_D1=0.41, T=0.43, T_L=4.0, R=5.5, I_e=1.0))
        0.17

    Reference
        rule C_s_cap: 7-16 12.8.1.1, Eq. 12.8-3; 7-22 12.8.1.1, Eq. 12.8-4
        rule C_s_cap_long: 7-16 12.8.1.1, Eq. 12.8-4; 7-22 12.8.1.1, Eq. 12.8-5
    """
    T = above(0, "T", T)
    fall = np.minimum(above(0, "T_L", T_L) / T, 1.0)
    return above(0, "S_D1", S_D1) * fall / (T * _reduction(R, I_e))


@formula
def coefficient_multi(S_a: ArrayLike, R: ArrayLike, I_e: ArrayLike) -> Result:
    """Seismic response coefficient from an ordinate of the multi-period spectrum (Method 1).

    C_s = S_a/(R/I_e)

    Parameters
        S_a: design spectral acceleration at T, not below the peak at periods shorter than the peak's [g],
            above 0; any shape
        R: response modification coefficient [-], at least 1
        I_e: importance factor [-], at least 1
    Returns
        C_s [-], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Notes
        The method is from memory. Both minimums apply to it, the caps of the two-period spectrum do not.
    Example
        >>> print(coefficient_multi(S_a=0.60, R=8.0, I_e=1.25))
        0.09375

    Reference
        rule C_s_method1: 7-16 none; 7-22 12.8.1.1, Eq. 12.8-2
    """
    return above(0, "S_a", S_a) / _reduction(R, I_e)


@formula
def coefficient_minimum(S_DS: ArrayLike, I_e: ArrayLike) -> Result:
    """Lower bound of the seismic response coefficient at every site.

    C_s = 0.044 S_DS I_e >= 0.01

    Parameters
        S_DS: design spectral acceleration at short periods [g], above 0; any shape
        I_e: importance factor [-], at least 1
    Returns
        C_s [-], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Notes
        Need not be considered for drift alone.
    Example
        >>> print(coefficient_minimum(S_DS=0.60, I_e=1.0))
        0.0264

    Reference
        rule C_s_min: 7-16 12.8.1.1, Eq. 12.8-5; 7-22 12.8.1.1, Eq. 12.8-6
    """
    return np.maximum(0.044 * above(0, "S_DS", S_DS) * at_least(1, "I_e", I_e), C_S_FLOOR)


@formula
def coefficient_minimum_near_fault(S_1: ArrayLike, R: ArrayLike, I_e: ArrayLike) -> Result:
    """Lower bound of the seismic response coefficient where S_1 is at least 0.6 g.

    C_s = 0.5 S_1/(R/I_e) for S_1 >= 0.6; 0 below, where there is no such bound

    Parameters
        S_1: mapped MCE_R acceleration at 1 s [g], at least 0; any shape
        R: response modification coefficient [-], at least 1
        I_e: importance factor [-], at least 1
    Returns
        C_s [-], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Example
        >>> print(coefficient_minimum_near_fault(S_1=0.65, R=8.0, I_e=1.0))
        0.040625

    Reference
        rule C_s_min_S1: 7-16 12.8.1.1, Eq. 12.8-6; 7-22 12.8.1.1, Eq. 12.8-7
    """
    S_1 = at_least(0, "S_1", S_1)
    return np.where(S_1 >= S_1_THRESHOLD, 0.5 * S_1, 0.0) / _reduction(R, I_e)


def _reduction(R: ArrayLike, I_e: ArrayLike) -> Result:
    return at_least(1, "R", R) / at_least(1, "I_e", I_e)
