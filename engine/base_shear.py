"""Seismic base shear (12.8.1): C_s with every bound on its own, which bound governs, and V.

The two-period route of both editions (Method 2 of 7-22). The S_DS cap for short regular buildings and
the multi-period route are left out here.
"""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine.editions import EDITIONS, clause
from engine.require import Result, Words, above, agree, at_least, choice, finite, formula, worded

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
    choice("edition", edition, EDITIONS)
    upper = np.minimum(coefficient_plateau(S_DS, R, I_e), coefficient_cap(S_D1, T, T_L, R, I_e))
    lower = np.maximum(coefficient_minimum(S_DS, I_e), coefficient_minimum_near_fault(S_1, R, I_e))
    return np.maximum(upper, lower)


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
    long = finite("T", T) > finite("T_L", T_L)
    cap, minimum = coefficient_cap(S_D1, T, T_L, R, I_e), coefficient_minimum(S_DS, I_e)
    conditions = [
        agree(coefficient_plateau(S_DS, R, I_e), C_s),
        agree(cap, C_s) & ~long,
        agree(cap, C_s) & long,
        agree(minimum, C_s) & (minimum > C_S_FLOOR),
        agree(minimum, C_s),
    ]
    return worded(_bounds(edition), np.select(conditions, range(len(conditions)), len(conditions)))


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


def _reduction(R: ArrayLike, I_e: ArrayLike) -> Result:
    return at_least(1, "R", R) / at_least(1, "I_e", I_e)


def _bounds(edition: str) -> tuple[str, ...]:
    texts = (
        ("plateau S_DS/(R/I_e)", "C_s_plateau"),
        ("cap S_D1/(T R/I_e)", "C_s_cap"),
        ("cap S_D1 T_L/(T^2 R/I_e)", "C_s_cap_long"),
        ("minimum 0.044 S_DS I_e", "C_s_min"),
        ("minimum 0.01", "C_s_min"),
        ("minimum 0.5 S_1/(R/I_e)", "C_s_min_S1"),
    )
    return tuple(f"{text}, Eq. {clause(edition, key).equation}" for text, key in texts)
