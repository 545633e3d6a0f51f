"""The seismic response coefficient for drift alone (12.8.6): the minimum 0.044 S_DS I_e is waived."""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine.base_shear import bounds, which
from engine.editions import EDITIONS, clauses
from engine.require import Result, Words, choice, formula

METHOD_1_EDITIONS: Final = tuple(clauses("C_s_method1"))


@formula
def drift_coefficient(
    S_DS: ArrayLike,
    S_D1: ArrayLike,
    S_1: ArrayLike,
    T: ArrayLike,
    T_L: ArrayLike,
    R: ArrayLike,
    I_e: ArrayLike,
    edition: str,
) -> Result:
    """Seismic response coefficient for drift alone by the two-period route.

    C_s = max(min(plateau, cap), near-fault minimum)

    Parameters
        S_DS: design spectral acceleration at short periods [g], above 0; any shape
        S_D1: design spectral acceleration at 1 s [g], above 0
        S_1: mapped MCE_R acceleration at 1 s [g], at least 0
        T: period for drift, which need not be capped [s], above 0
        T_L: long-period transition period [s], above 0
        R: response modification coefficient [-], at least 1
        I_e: importance factor [-], at least 1
        edition: "7-16" or "7-22"
    Returns
        C_s [-], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range. NotApplicable: unknown edition
    Notes
        The minimum 0.044 S_DS I_e, with its 0.01, is waived; 0.5 S_1/(R/I_e) stays. From memory.
    Example
        >>> site = {"S_DS": 1.0933, "S_D1": 0.7933, "S_1": 0.5, "T_L": 8.0}
        >>> print(drift_coefficient(**site, T=2.462, R=8.0, I_e=1.0, edition="7-22"))
        0.0403

    Reference
        rule drift_forces: 7-16 12.8.6.1; 7-22 12.8.6.1
    """
    choice("edition", edition, EDITIONS)
    plateau, cap = bounds.coefficient_plateau(S_DS, R, I_e), bounds.coefficient_cap(S_D1, T, T_L, R, I_e)
    return np.maximum(np.minimum(plateau, cap), bounds.coefficient_minimum_near_fault(S_1, R, I_e))


@formula
def drift_bound(
    S_DS: ArrayLike,
    S_D1: ArrayLike,
    S_1: ArrayLike,
    T: ArrayLike,
    T_L: ArrayLike,
    R: ArrayLike,
    I_e: ArrayLike,
    edition: str,
) -> Words:
    """Which bound gives the coefficient for drift alone, in words with its equation.

    the bound that equals C_s; of equal ones an upper bound first, the plateau before the cap

    Parameters
        S_DS, S_D1, S_1, T, T_L, R, I_e, edition: as for the coefficient for drift alone
    Returns
        a text, or texts of the broadcast shape
    Raises
        ImpossibleValue: a value outside its range. NotApplicable: unknown edition
    Example
        >>> site = {"S_DS": 1.0933, "S_D1": 0.7933, "S_1": 0.6, "T_L": 8.0}
        >>> drift_bound(**site, T=4.0, R=8.0, I_e=1.0, edition="7-22")
        'minimum 0.5 S_1/(R/I_e), Eq. 12.8-7'

    Reference
        rule drift_forces: 7-16 12.8.6.1; 7-22 12.8.6.1
    """
    C_s = drift_coefficient(S_DS, S_D1, S_1, T, T_L, R, I_e, edition)
    return which.named(
        edition, (*which.plateau_and_cap(C_s, S_DS, S_D1, T, T_L, R, I_e), which.near_fault(C_s, S_1, R, I_e))
    )


@formula
def drift_coefficient_multi(
    S_a: ArrayLike, S_1: ArrayLike, R: ArrayLike, I_e: ArrayLike, edition: str
) -> Result:
    """Seismic response coefficient for drift alone by the multi-period route (Method 1).

    C_s = max(S_a/(R/I_e), near-fault minimum)

    Parameters
        S_a: design spectral acceleration at the period for drift [g], above 0; any shape
        S_1: mapped MCE_R acceleration at 1 s [g], at least 0
        R: response modification coefficient [-], at least 1
        I_e: importance factor [-], at least 1
        edition: "7-22", the one that has the method
    Returns
        C_s [-], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range. NotApplicable: an edition without the method
    Notes
        From memory, and so is the relief.
    Example
        >>> print(drift_coefficient_multi(S_a=0.30, S_1=0.4, R=8.0, I_e=1.0, edition="7-22"))
        0.0375

    Reference
        rule C_s_method1: 7-16 none; 7-22 12.8.1.1, Eq. 12.8-2
        rule drift_forces: 7-16 12.8.6.1; 7-22 12.8.6.1
    """
    choice("edition", edition, METHOD_1_EDITIONS)
    near_fault = bounds.coefficient_minimum_near_fault(S_1, R, I_e)
    return np.maximum(bounds.coefficient_multi(S_a, R, I_e), near_fault)


@formula
def drift_bound_multi(S_a: ArrayLike, S_1: ArrayLike, R: ArrayLike, I_e: ArrayLike, edition: str) -> Words:
    """Which bound gives the coefficient for drift alone by the multi-period route, in words.

    the bound that equals C_s; of equal ones the spectrum

    Parameters
        S_a, S_1, R, I_e, edition: as for the coefficient for drift alone by the multi-period route
    Returns
        a text, or texts of the broadcast shape
    Raises
        ImpossibleValue: a value outside its range. NotApplicable: an edition without the method
    Example
        >>> drift_bound_multi(S_a=0.30, S_1=0.6, R=8.0, I_e=1.0, edition="7-22")
        'spectrum S_a/(R/I_e), Eq. 12.8-2'

    Reference
        rule C_s_method1: 7-16 none; 7-22 12.8.1.1, Eq. 12.8-2
        rule drift_forces: 7-16 12.8.6.1; 7-22 12.8.6.1
    """
    C_s = drift_coefficient_multi(S_a, S_1, R, I_e, edition)
    return which.named(edition, (which.spectrum(C_s, S_a, R, I_e), which.near_fault(C_s, S_1, R, I_e)))
