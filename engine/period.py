"""Fundamental period (12.8.2): approximate formulas, the C_u T_a cap, and the period used in design.

The wall formula with C_q and C_w, and computed periods, are left to the modules on walls and dynamics.
"""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine.errors import ImpossibleValue, NotApplicable
from engine.require import Result, above, at_least, choice, formula
from engine.tables import table
from engine.units import SYSTEMS

PERIOD_SYSTEMS: Final = table("period_coefficients").keys
MAX_STORIES: Final = 12


@formula
def approximate_period(h_n: ArrayLike, system: str, units: str) -> Result:
    """Approximate fundamental period from the height.

    T_a = C_t h_n^x

    Parameters
        h_n: structural height above the base [ft or m], above 0; any shape
        system: one of PERIOD_SYSTEMS, the row of Table 12.8-2
        units: "us" (h_n in ft) or "si" (h_n in m)
    Returns
        T_a [s], the shape of h_n
    Raises
        ImpossibleValue: h_n at or below 0. NotApplicable: unknown system or units
    Notes
        The coefficients are printed in both unit systems; the rounded pairs agree to about 0.3 %.
    Example
        >>> print(approximate_period(h_n=60.0, system="all other", units="us"))
        0.43

    Reference
        rule T_a: 7-16 12.8.2.1, Eq. 12.8-7; 7-22 12.8.2.1, Eq. 12.8-8
    """
    C_t = table("period_coefficients").entry("system", system, f"C_t_{choice('units', units, SYSTEMS)}")
    x = table("period_coefficients").entry("system", system, "x")
    return C_t * above(0, "h_n", h_n) ** x


@formula
def approximate_period_stories(N: ArrayLike) -> Result:
    """Approximate fundamental period from the number of stories.

    T_a = 0.1 N

    Parameters
        N: number of stories above the base [-], whole, 1 to 12; any shape
    Returns
        T_a [s], the shape of N
    Raises
        ImpossibleValue: N below 1 or not whole. NotApplicable: more than 12 stories
    Notes
        For moment frames of concrete or steel alone, with an average story height of at least 10 ft (3 m):
        the caller judges that.
    Example
        >>> print(approximate_period_stories(N=7))
        0.7

    Reference
        rule T_a_stories: 7-16 12.8.2.1, Eq. 12.8-8; 7-22 12.8.2.1, Eq. 12.8-9
    """
    N = at_least(1, "N", N)
    if (np.mod(N, 1) != 0).any():
        raise ImpossibleValue("N", float(N[np.mod(N, 1) != 0].flat[0]), "must be a whole number")
    if (N > MAX_STORIES).any():
        raise NotApplicable("N", float(N.max()), f"must be at most {MAX_STORIES} stories", "12.8.2.1")
    return 0.1 * N


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
