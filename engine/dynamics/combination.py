"""Sums of a response over the modes (12.9.1.3), and scaling to the equivalent lateral force (12.9.1.4).

One value for each mode stands on the LAST axis, in any order.
"""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine.base_shear import coefficient_minimum_near_fault
from engine.errors import ImpossibleValue, WrongType
from engine.levels import total
from engine.require import Array, Result, above, at_most, finite, formula

MAX_MODES: Final = 1000


@formula
def square_root_of_squares(values: ArrayLike) -> Result:
    """Combined response by the square root of the sum of the squares (SRSS).

    r = sqrt(sum(r_m^2))

    Parameters
        values: response in each mode [any unit], signed; shape (..., n), n 1 to 1,000
    Returns
        r [the unit of values], at least 0, shape (...)
    Raises
        ImpossibleValue: no value, more than 1,000, or one that is not finite
    Notes
        For modes whose periods lie well apart; closely spaced modes need the complete combination.
    Example
        >>> print(square_root_of_squares(values=[3.0, -4.0]))
        5.0

    Reference
        rule modal_combination: 7-16 12.9.1.3; 7-22 12.9.1.3
    """
    return np.sqrt(total(_each_mode(values) ** 2))


@formula
def absolute_sum(values: ArrayLike) -> Result:
    """Absolute sum of the responses in the modes: no combination of them exceeds it.

    r = sum(|r_m|)

    Parameters
        values: response in each mode [any unit], signed; shape (..., n), n 1 to 1,000
    Returns
        r [the unit of values], at least 0, shape (...)
    Raises
        ImpossibleValue: no value, more than 1,000, or one that is not finite
    Example
        >>> print(absolute_sum(values=[3.0, -4.0]))
        7.0

    Reference
        rule modal_combination: 7-16 12.9.1.3; 7-22 12.9.1.3
    """
    return total(np.abs(_each_mode(values)))


@formula
def correlation(T_i: ArrayLike, T_j: ArrayLike, damping: ArrayLike) -> Result:
    """Correlation coefficient of two modes of equal damping in the complete combination.

    rho = 8 zeta^2 (1 + beta) beta^1.5/((1 - beta^2)^2 + 4 zeta^2 beta (1 + beta)^2), beta = T_i/T_j

    Parameters
        T_i: period of one mode [s], above 0; any shape
        T_j: period of the other mode [s], above 0
        damping: damping ratio of both modes [-], above 0, at most 1
    Returns
        rho [-], 0 to 1, the broadcast shape; the same for the two modes exchanged
    Raises
        ImpossibleValue: a value outside its range
    Notes
        A. Der Kiureghian, 1981, and E. L. Wilson, A. Der Kiureghian and E. P. Bayo, 1981, both in
        Earthquake Engineering and Structural Dynamics 9; from memory.
    Example
        >>> print(correlation(T_i=0.9, T_j=1.0, damping=0.05))
        0.473

    Reference
        rule modal_correlation: 7-16 12.9.1.3; 7-22 12.9.1.3
    """
    T_i, T_j = above(0, "T_i", T_i), above(0, "T_j", T_j)
    beta = np.minimum(T_i, T_j) / np.maximum(T_i, T_j)
    zeta = above(0, "damping", at_most(1, "damping", damping))
    spread = (1 - beta**2) ** 2 + 4 * zeta**2 * beta * (1 + beta) ** 2
    return 8 * zeta**2 * (1 + beta) * beta**1.5 / spread


@formula
def complete_combination(values: ArrayLike, periods: ArrayLike, damping: ArrayLike) -> Result:
    """Combined response by the complete quadratic combination (CQC).

    r = sqrt(sum(rho_ij r_i r_j)) over all pairs of modes

    Parameters
        values: response in each mode [any unit], signed; shape (..., n), n 1 to 1,000
        periods: period of each mode [s], above 0; shape (..., n)
        damping: damping ratio of all modes [-], above 0, at most 1; broadcast with the leading axes
    Returns
        r [the unit of values], at least 0, the broadcast shape
    Raises
        ImpossibleValue: a value outside its range. WrongType: unequal lengths
    Notes
        The signs of the responses count: give them as the modes have them.
    Example
        >>> print(complete_combination(values=[3.0, 4.0], periods=[1.0, 0.9], damping=0.05))
        6.03

    Reference
        rule modal_combination: 7-16 12.9.1.3; 7-22 12.9.1.3
        rule modal_correlation: 7-16 12.9.1.3; 7-22 12.9.1.3
    """
    r = _each_mode(values)
    T = np.atleast_1d(above(0, "periods", periods))
    if T.shape[-1] != r.shape[-1]:
        raise WrongType("periods", f"{T.shape[-1]} values", f"must be one for each of {r.shape[-1]} modes")
    zeta = finite("damping", damping)[..., None, None]
    rho = correlation(T[..., :, None], T[..., None, :], zeta)
    square = total(total(rho * r[..., :, None] * r[..., None, :]))
    # the form is never negative; where modes cancel, round-off is
    return np.sqrt(np.maximum(square, 0.0))


@formula
def force_scale(V: ArrayLike, V_t: ArrayLike) -> Result:
    """Factor on the combined forces, so that the base shear reaches that of the equivalent lateral force.

    V/V_t where V_t < V, else 1

    Parameters
        V: base shear of 12.8, its period at most C_u T_a [kip or kN], above 0; any shape
        V_t: combined base shear of the modes [kip or kN], above 0
    Returns
        the factor [-], at least 1, the broadcast shape
    Raises
        ImpossibleValue: a value at or below 0
    Notes
        To 100 % of V in both editions, where older ones ask for 85 %; from memory.
    Example
        >>> print(force_scale(V=100.0, V_t=80.0))
        1.25

    Reference
        rule modal_scaling: 7-16 12.9.1.4.1; 7-22 12.9.1.4.1
    """
    return np.maximum(above(0, "V", V) / above(0, "V_t", V_t), 1.0)


@formula
def drift_scale(V_t: ArrayLike, W: ArrayLike, S_1: ArrayLike, R: ArrayLike, I_e: ArrayLike) -> Result:
    """Factor on the combined drifts, where the minimum for S_1 of at least 0.6 g exceeds the modes' shear.

    C_s W/V_t where V_t < C_s W with C_s = 0.5 S_1/(R/I_e) for S_1 >= 0.6, else 1

    Parameters
        V_t: combined base shear of the modes [kip or kN], above 0; any shape
        W: effective seismic weight [kip or kN], above 0
        S_1: mapped MCE_R acceleration at 1 s [g], at least 0
        R: response modification coefficient [-], at least 1
        I_e: importance factor [-], at least 1
    Returns
        the factor [-], at least 1, the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Notes
        The minimum is Eq. 12.8-6 of 7-16 and Eq. 12.8-7 of 7-22.
    Example
        >>> print(drift_scale(V_t=50.0, W=2000.0, S_1=0.75, R=8.0, I_e=1.0))
        1.875

    Reference
        rule modal_drift_scaling: 7-16 12.9.1.4.2; 7-22 12.9.1.4.2
        rule C_s_min_S1: 7-16 12.8.1.1, Eq. 12.8-6; 7-22 12.8.1.1, Eq. 12.8-7
    """
    least = coefficient_minimum_near_fault(S_1, R, I_e) * above(0, "W", W)
    return np.maximum(least / above(0, "V_t", V_t), 1.0)


def _each_mode(values: ArrayLike) -> Array:
    r = np.atleast_1d(finite("values", values))
    if not 1 <= r.shape[-1] <= MAX_MODES:
        raise ImpossibleValue("values", f"{r.shape[-1]} modes", f"must be 1 to {MAX_MODES} modes")
    return r
