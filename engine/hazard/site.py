"""Site coefficients F_a and F_v of 7-16 (11.4.4). 7-22 has none: its S_MS and S_M1 hold the site class."""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine.errors import NotApplicable
from engine.hazard.words import F_A_OF_CLASS_C, SHORT_EXCEPTIONS, TABLE_SITE_CLASSES
from engine.require import Array, Result, at_least, choice, formula
from engine.tables import table

DEFAULT_MINIMUM: Final = 1.2
EXCEPTION_1_FROM: Final = 1.0
NOT_PRINTED: Final = "11.4.8"
_F: Final = "site class F needs a site response analysis by 11.4.8"


@formula
def site_coefficient_short(S_S: ArrayLike, site_class: str, exception: str) -> Result:
    """Site coefficient at short periods, 7-16.

    F_a = Table 11.4-1, linear between its columns; at least 1.2 for "D default"

    Parameters
        S_S: mapped MCE_R acceleration at short periods [g], at least 0; any shape
        site_class: one of TABLE_SITE_CLASSES
        exception: one of SHORT_EXCEPTIONS; exception 1 of 11.4.8 takes class E as class C from S_S = 1.0 on
    Returns
        F_a [-], the shape of S_S
    Raises
        NotApplicable: another class or exception, class F, or a value of S_S for which the table prints
        none (class E above 0.75). ImpossibleValue: S_S below 0
    Notes
        The table is from memory. Class E between 0.75 and 1.0 has no printed value to interpolate to.
    Example
        >>> print(site_coefficient_short(S_S=0.6, site_class="D", exception="none"))
        1.32

    Reference
        rule F_a: 7-16 11.4.4, Table 11.4-1; 7-22 none
    """
    S_S = at_least(0, "S_S", S_S)
    excused = choice("exception", exception, SHORT_EXCEPTIONS) == F_A_OF_CLASS_C
    F_a = _printed("site_coefficient_short", S_S, _word(site_class))
    if site_class == "E" and excused:
        F_a = np.where(S_S >= EXCEPTION_1_FROM, _printed("site_coefficient_short", S_S, "C"), F_a)
    return _settled("F_a", "S_S", S_S, F_a, site_class, DEFAULT_MINIMUM)


@formula
def site_coefficient_long(S_1: ArrayLike, site_class: str) -> Result:
    """Site coefficient at long periods, 7-16.

    F_v = Table 11.4-2, linear between its columns

    Parameters
        S_1: mapped MCE_R acceleration at 1 s [g], at least 0; any shape
        site_class: one of TABLE_SITE_CLASSES
    Returns
        F_v [-], the shape of S_1
    Raises
        NotApplicable: another class, class F, or a value of S_1 for which the table prints none (class E
        above 0.1). ImpossibleValue: S_1 below 0
    Notes
        From S_1 = 0.2 on the values of class D need an exception of 11.4.8 or a hazard analysis.
    Example
        >>> print(site_coefficient_long(S_1=0.45, site_class="D"))
        1.85

    Reference
        rule F_v: 7-16 11.4.4, Table 11.4-2; 7-22 none
    """
    S_1 = at_least(0, "S_1", S_1)
    F_v = _printed("site_coefficient_long", S_1, _word(site_class))
    return _settled("F_v", "S_1", S_1, F_v, site_class, 0.0)


def _word(site_class: str) -> str:
    """Return the row of a class: its letter."""
    return choice("site_class", site_class, TABLE_SITE_CLASSES, _F)[0]


def _printed(name: str, S: Array, row: str) -> Array:
    """Return the coefficient of a row, NaN where a neighbouring column prints no value."""
    key, *columns = table(name).rows[0]
    cells = next(cells for cells in table(name).rows if cells[key] == row)
    values = [np.nan if cells[c] == NOT_PRINTED else float(cells[c]) for c in columns]
    return np.asarray(np.interp(S, [float(c) for c in columns], values))


def _settled(symbol: str, argument: str, S: Array, F: Array, site_class: str, minimum: float) -> Array:
    """Return the coefficient by the class's own rule; refuse a place of the table without a value."""
    if np.isnan(F).any():
        where = float(np.broadcast_to(S, F.shape)[np.isnan(F)].flat[0])
        reason = f"no {symbol} is printed for site class {site_class} there"
        raise NotApplicable(argument, where, f"{reason}: see 11.4.8, or enter {symbol} yourself", "11.4.8")
    if site_class == "B not measured":
        return np.ones_like(F)
    return np.maximum(F, minimum) if site_class == "D default" else F
