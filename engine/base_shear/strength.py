"""The governing seismic response coefficient for strength, by both routes, and which bound governs."""

from __future__ import annotations

import numpy as np
from numpy.typing import ArrayLike

from engine.base_shear import bounds, which
from engine.base_shear.drift_forces import drift_coefficient, drift_coefficient_multi
from engine.require import Result, Words, formula


@formula
def response_coefficient(
    S_DS: ArrayLike,
    S_D1: ArrayLike,
    S_1: ArrayLike,
    T: ArrayLike,
    T_L: ArrayLike,
    R: ArrayLike,
    I_e: ArrayLike,
    edition: str,
) -> Result:
    """Governing seismic response coefficient by the two-period route.

    C_s = max(min(plateau, cap), minimum, near-fault minimum)

    Parameters
        S_DS: design spectral acceleration at short periods [g], above 0; any shape
        S_D1: design spectral acceleration at 1 s [g], above 0
        S_1: mapped MCE_R acceleration at 1 s [g], at least 0
        T: design period [s], above 0
        T_L: long-period transition period [s], above 0
        R: response modification coefficient [-], at least 1
        I_e: importance factor [-], at least 1
        edition: "7-16" or "7-22"
    Returns
        C_s [-], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range. NotApplicable: unknown edition
    Notes
        Both editions give the same number by this route; their equation numbers differ by one.
    Example
        >>> site = {"S_DS": 1.0933, "S_D1": 0.7933, "S_1": 0.5, "T_L": 8.0}
        >>> print(response_coefficient(**site, T=1.473, R=8.0, I_e=1.0, edition="7-22"))
        0.067

    Reference
        rule C_s: 7-16 12.8.1.1; 7-22 12.8.1.1
    """
    relieved = drift_coefficient(S_DS, S_D1, S_1, T, T_L, R, I_e, edition)
    return np.maximum(relieved, bounds.coefficient_minimum(S_DS, I_e))


@formula
def governing_bound(
    S_DS: ArrayLike,
    S_D1: ArrayLike,
    S_1: ArrayLike,
    T: ArrayLike,
    T_L: ArrayLike,
    R: ArrayLike,
    I_e: ArrayLike,
    edition: str,
) -> Words:
    """Which bound gives the governing seismic response coefficient, in words with its equation.

    the bound that equals C_s; of equal ones an upper bound first, the plateau before the cap

    Parameters
        S_DS, S_D1, S_1, T, T_L, R, I_e, edition: as for the response coefficient
    Returns
        a text, or texts of the broadcast shape
    Raises
        ImpossibleValue: a value outside its range. NotApplicable: unknown edition
    Example
        >>> site = {"S_DS": 1.0933, "S_D1": 0.7933, "S_1": 0.5, "T_L": 8.0}
        >>> governing_bound(**site, T=1.473, R=8.0, I_e=1.0, edition="7-22")
        'cap S_D1/(T R/I_e), Eq. 12.8-4'

    Reference
        rule C_s: 7-16 12.8.1.1; 7-22 12.8.1.1
    """
    C_s = response_coefficient(S_DS, S_D1, S_1, T, T_L, R, I_e, edition)
    found = (
        *which.plateau_and_cap(C_s, S_DS, S_D1, T, T_L, R, I_e),
        *which.minimum(C_s, S_DS, I_e),
        which.near_fault(C_s, S_1, R, I_e),
    )
    return which.named(edition, found)


@formula
def response_coefficient_multi(
    S_a: ArrayLike, S_DS: ArrayLike, S_1: ArrayLike, R: ArrayLike, I_e: ArrayLike, edition: str
) -> Result:
    """Governing seismic response coefficient by the multi-period route (Method 1).

    C_s = max(S_a/(R/I_e), minimum, near-fault minimum)

    Parameters
        S_a: design spectral acceleration at T, not below the peak at periods shorter than the peak's [g],
            above 0; any shape
        S_DS: design spectral acceleration at short periods [g], above 0
        S_1: mapped MCE_R acceleration at 1 s [g], at least 0
        R: response modification coefficient [-], at least 1
        I_e: importance factor [-], at least 1
        edition: "7-22", the one that has the method
    Returns
        C_s [-], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range. NotApplicable: an edition without the method
    Notes
        From memory. It can exceed the two-period coefficient at short periods, since S_DS is 0.9 of a
        maximum from 0.2 s on.
    Example
        >>> site = {"S_a": 0.60, "S_DS": 1.0, "S_1": 0.4}
        >>> print(response_coefficient_multi(**site, R=8.0, I_e=1.0, edition="7-22"))
        0.075

    Reference
        rule C_s_method1: 7-16 none; 7-22 12.8.1.1, Eq. 12.8-2
        rule C_s_min: 7-16 12.8.1.1, Eq. 12.8-5; 7-22 12.8.1.1, Eq. 12.8-6
        rule C_s_min_S1: 7-16 12.8.1.1, Eq. 12.8-6; 7-22 12.8.1.1, Eq. 12.8-7
    """
    relieved = drift_coefficient_multi(S_a, S_1, R, I_e, edition)
    return np.maximum(relieved, bounds.coefficient_minimum(S_DS, I_e))


@formula
def governing_bound_multi(
    S_a: ArrayLike, S_DS: ArrayLike, S_1: ArrayLike, R: ArrayLike, I_e: ArrayLike, edition: str
) -> Words:
    """Which bound gives the coefficient by the multi-period route, in words with its equation.

    the bound that equals C_s; of equal ones the spectrum first

    Parameters
        S_a, S_DS, S_1, R, I_e, edition: as for the coefficient by the multi-period route
    Returns
        a text, or texts of the broadcast shape
    Raises
        ImpossibleValue: a value outside its range. NotApplicable: an edition without the method
    Example
        >>> site = {"S_a": 0.60, "S_DS": 1.0, "S_1": 0.4}
        >>> governing_bound_multi(**site, R=8.0, I_e=1.0, edition="7-22")
        'spectrum S_a/(R/I_e), Eq. 12.8-2'

    Reference
        rule C_s_method1: 7-16 none; 7-22 12.8.1.1, Eq. 12.8-2
    """
    C_s = response_coefficient_multi(S_a, S_DS, S_1, R, I_e, edition)
    found = (
        which.spectrum(C_s, S_a, R, I_e),
        *which.minimum(C_s, S_DS, I_e),
        which.near_fault(C_s, S_1, R, I_e),
    )
    return which.named(edition, found)
