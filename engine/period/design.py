"""The C_u T_a cap on a computed period, and the periods for strength and for drift (12.8.2, 12.8.6.2)."""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine.require import Result, Words, above, at_least, choice, exceeds, formula, worded
from engine.tables import table

PERIOD_BOUNDS: Final = ("the computed period", "upper limit C_u T_a")
#: where a computed period comes from
PERIOD_SOURCES: Final = ("entered", "Rayleigh", "story stiffness")
DRIFT_PERIODS: Final = ("without the cap", "with the cap")


@formula
def upper_limit_coefficient(S_D1: ArrayLike) -> Result:
    """Coefficient for the upper limit on a computed period.

    C_u = Table 12.8-1, linear between its rows, level beyond its ends

    Parameters
        S_D1: design spectral acceleration at 1 s [g], above 0; any shape
    Returns
        C_u [-], 1.4 to 1.7, the shape of S_D1
    Raises
        ImpossibleValue: S_D1 at or below 0
    Notes
        The table is from memory. Linear interpolation is normal practice; no printed note is recalled.
    Example
        >>> print(upper_limit_coefficient(S_D1=0.25))
        1.45

    Reference
        rule C_u: 7-16 12.8.2, Table 12.8-1; 7-22 12.8.2, Table 12.8-1
    """
    rows = table("upper_limit_coefficient")
    return np.interp(above(0, "S_D1", S_D1), rows.column("S_D1"), rows.column("C_u"))


@formula
def period_limit(C_u: ArrayLike, T_a: ArrayLike) -> Result:
    """Upper limit on the period used for strength.

    T_max = C_u T_a

    Parameters
        C_u: coefficient for the upper limit [-], at least 1; any shape
        T_a: approximate period [s], above 0; broadcast with C_u
    Returns
        T_max [s], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Example
        >>> print(period_limit(C_u=1.4, T_a=1.052))
        1.473

    Reference
        rule T_max: 7-16 12.8.2; 7-22 12.8.2
    """
    return at_least(1, "C_u", C_u) * above(0, "T_a", T_a)


@formula
def design_period(T_a: ArrayLike, C_u: ArrayLike, T_computed: ArrayLike) -> Result:
    """Period used for strength, where a computed period is available.

    T = min(T_computed, C_u T_a)

    Parameters
        T_a: approximate period [s], above 0; any shape
        C_u: coefficient for the upper limit [-], at least 1
        T_computed: period from a properly substantiated analysis [s], above 0
    Returns
        T [s], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Notes
        Without a computed period T_a itself is used. For drift alone the cap need not be applied.
    Example
        >>> print(design_period(T_a=1.052, C_u=1.4, T_computed=2.462))
        1.473

    Reference
        rule T: 7-16 12.8.2; 7-22 12.8.2
    """
    return np.minimum(above(0, "T_computed", T_computed), period_limit(C_u, T_a))


@formula
def period_bound(T_a: ArrayLike, C_u: ArrayLike, T_computed: ArrayLike) -> Words:
    """Which of the two gives the period used for strength, in words.

    the computed period, or the upper limit C_u T_a where it is shorter

    Parameters
        T_a, C_u, T_computed: as for the period used for strength
    Returns
        one of PERIOD_BOUNDS, or texts of the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Example
        >>> period_bound(T_a=1.052, C_u=1.4, T_computed=2.462)
        'upper limit C_u T_a'

    Reference
        rule T: 7-16 12.8.2; 7-22 12.8.2
    """
    T_computed = above(0, "T_computed", T_computed)
    return worded(PERIOD_BOUNDS, exceeds(T_computed, period_limit(C_u, T_a)))


@formula
def drift_period(T_a: ArrayLike, C_u: ArrayLike, T_computed: ArrayLike, cap: str) -> Result:
    """Period for the forces that serve to find the drift alone.

    T = T_computed without the cap; min(T_computed, C_u T_a) with it

    Parameters
        T_a: approximate period [s], above 0; any shape
        C_u: coefficient for the upper limit [-], at least 1
        T_computed: period from a properly substantiated analysis [s], above 0
        cap: "without the cap" to use the relief, or "with the cap"
    Returns
        T [s], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range. NotApplicable: another word
    Notes
        Strength keeps the cap, and so does everything but drift.
    Example
        >>> print(drift_period(T_a=1.052, C_u=1.4, T_computed=2.462, cap="without the cap"))
        2.462

    Reference
        rule drift_period: 7-16 12.8.6.2; 7-22 12.8.6.2
    """
    keeps = choice("cap", cap, DRIFT_PERIODS) != DRIFT_PERIODS[0]
    return np.where(keeps, design_period(T_a, C_u, T_computed), above(0, "T_computed", T_computed))
