"""Importance and Seismic Design Category by Risk Category (chapters 1 and 11).

The choice of the Risk Category itself is the engineer's.
"""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike, NDArray

from engine.require import YES_NO, Words, above, at_least, choice, formula, short_of, worded, yes
from engine.tables import table

RISK_CATEGORIES: Final = table("importance_factor").keys
#: the Seismic Design Categories, mildest first
DESIGN_CATEGORIES: Final = ("A", "B", "C", "D", "E", "F")
#: mapped acceleration at 1 s from which the tables no longer decide [g]
NEAR_FAULT: Final = 0.75
A_LIMITS: Final = {"S_S": 0.15, "S_1": 0.04}


def importance_factor(risk_category: str) -> np.float64:
    """Seismic importance factor I_e of a Risk Category.

    I_e = the row of Table 1.5-2

    Parameters
        risk_category: "I", "II", "III" or "IV"; one text
    Returns
        I_e [-]: 1.0, 1.25 or 1.5
    Raises
        NotApplicable: another category. MissingValue: blank. WrongType: not a text
    Example
        >>> print(importance_factor("III"))
        1.25

    Reference
        rule I_e: 7-16 11.5.1, Table 1.5-2; 7-22 11.5.1, Table 1.5-2
    """
    return np.float64(table("importance_factor").entry("risk_category", risk_category, "I_e"))


@formula
def category_short(S_DS: ArrayLike, risk_category: str) -> Words:
    """Seismic Design Category by the acceleration at short periods alone.

    SDC = Table 11.6-1

    Parameters
        S_DS: design spectral acceleration at short periods [g], above 0; any shape
        risk_category: "I", "II", "III" or "IV"
    Returns
        "A", "B", "C" or "D", or texts of the shape of S_DS
    Raises
        ImpossibleValue: S_DS at or below 0. NotApplicable: another category
    Notes
        A value that misses a limit by round-off counts as the limit.
    Example
        >>> category_short(S_DS=0.30, risk_category="IV")
        'C'

    Reference
        rule SDC_short: 7-16 11.6, Table 11.6-1; 7-22 11.6, Table 11.6-1
    """
    return worded(DESIGN_CATEGORIES, _place("short", "S_DS", S_DS, risk_category))


@formula
def category_one_second(S_D1: ArrayLike, risk_category: str) -> Words:
    """Seismic Design Category by the acceleration at 1 s alone.

    SDC = Table 11.6-2

    Parameters
        S_D1: design spectral acceleration at 1 s [g], above 0; any shape
        risk_category: "I", "II", "III" or "IV"
    Returns
        "A", "B", "C" or "D", or texts of the shape of S_D1
    Raises
        ImpossibleValue: S_D1 at or below 0. NotApplicable: another category
    Notes
        A value that misses a limit by round-off counts as the limit.
    Example
        >>> category_one_second(S_D1=0.15, risk_category="II")
        'C'

    Reference
        rule SDC_one_second: 7-16 11.6, Table 11.6-2; 7-22 11.6, Table 11.6-2
    """
    return worded(DESIGN_CATEGORIES, _place("one_second", "S_D1", S_D1, risk_category))


@formula
def short_table_alone(
    S_1: ArrayLike, T_a_below: str, T_drift_below: str, plateau_used: str, rigid_diaphragms: str
) -> Words:
    """Whether the table at short periods may decide alone on the Seismic Design Category.

    "yes" if S_1 < 0.75 and every condition is met

    Parameters
        S_1: mapped MCE_R acceleration at 1 s [g], at least 0; any shape
        T_a_below: "yes" if T_a is below 0.8 T_S in both directions, else "no"
        T_drift_below: "yes" if the period used for drift is below T_S in both directions
        plateau_used: "yes" if C_s is taken as S_DS/(R/I_e)
        rigid_diaphragms: "yes" if the diaphragms are rigid, or vertical elements at most 40 ft (12.2 m) apart
    Returns
        "yes" or "no", or texts of the shape of S_1
    Raises
        ImpossibleValue: S_1 below 0. NotApplicable: another word
    Example
        >>> conditions = {"T_a_below": "yes", "T_drift_below": "yes", "plateau_used": "yes"}
        >>> short_table_alone(S_1=0.1, **conditions, rigid_diaphragms="no")
        'no'

    Reference
        rule SDC_alone: 7-16 11.6; 7-22 11.6
    """
    conditions = {
        **{"T_a_below": T_a_below, "T_drift_below": T_drift_below},
        **{"plateau_used": plateau_used, "rigid_diaphragms": rigid_diaphragms},
    }
    met = [yes(name, answer) for name, answer in conditions.items()]
    return worded(YES_NO, np.where((at_least(0, "S_1", S_1) < NEAR_FAULT) & all(met), 0, 1))


@formula
def design_category(
    S_DS: ArrayLike, S_D1: ArrayLike, S_1: ArrayLike, risk_category: str, alone: str = "no"
) -> Words:
    """Seismic Design Category.

    SDC = the worse of Tables 11.6-1 and 11.6-2; E (Risk Category IV: F) from S_1 = 0.75 on

    Parameters
        S_DS: design spectral acceleration at short periods [g], above 0; any shape
        S_D1: design spectral acceleration at 1 s [g], above 0
        S_1: mapped MCE_R acceleration at 1 s [g], at least 0
        risk_category: "I", "II", "III" or "IV"
        alone: "yes" if Table 11.6-1 may decide alone (see ``short_table_alone``), else "no"
    Returns
        "A" to "F", or texts of the broadcast shape
    Raises
        ImpossibleValue: a value outside its range. NotApplicable: another word
    Notes
        Any reduction of S_DS in C_s or by soil-structure interaction leaves the category as it is.
    Example
        >>> design_category(S_DS=0.30, S_D1=0.15, S_1=0.1, risk_category="II")
        'C'

    Reference
        rule SDC: 7-16 11.6; 7-22 11.6
    """
    short = _place("short", "S_DS", S_DS, risk_category)
    long = _place("one_second", "S_D1", S_D1, risk_category)
    worse = np.maximum(short, 0 * long if yes("alone", alone) else long)
    near_fault = at_least(0, "S_1", S_1) >= NEAR_FAULT
    return worded(DESIGN_CATEGORIES, np.where(near_fault, 5 if risk_category == "IV" else 4, worse))


@formula
def design_category_reason(
    S_DS: ArrayLike, S_D1: ArrayLike, S_1: ArrayLike, risk_category: str, alone: str = "no"
) -> Words:
    """Which rule gives the Seismic Design Category, in words.

    the rule on S_1, the table used alone, or the table that governs, with what the other gives

    Parameters
        S_DS, S_D1, S_1, risk_category, alone: as for the design category
    Returns
        a text, or texts of the broadcast shape
    Raises
        ImpossibleValue: a value outside its range. NotApplicable: another word
    Example
        >>> design_category_reason(S_DS=0.30, S_D1=0.15, S_1=0.1, risk_category="II")
        'Table 11.6-2 (S_D1); Table 11.6-1 (S_DS) gives B'

    Reference
        rule SDC: 7-16 11.6; 7-22 11.6
    """
    short = _place("short", "S_DS", S_DS, risk_category)
    long = _place("one_second", "S_D1", S_D1, risk_category)
    near_fault = at_least(0, "S_1", S_1) >= NEAR_FAULT
    conditions = [near_fault, yes("alone", alone), short == long, short > long]
    texts = (
        *("S_1 at least 0.75 g", "Table 11.6-1 (S_DS) alone", "Tables 11.6-1 and 11.6-2 alike"),
        *(f"Table 11.6-1 (S_DS); Table 11.6-2 (S_D1) gives {letter}" for letter in DESIGN_CATEGORIES),
        *(f"Table 11.6-2 (S_D1); Table 11.6-1 (S_DS) gives {letter}" for letter in DESIGN_CATEGORIES),
    )
    return worded(texts, np.select(np.broadcast_arrays(*conditions), [0, 1, 2, 3 + long], 9 + short))


@formula
def category_A_permitted(S_S: ArrayLike, S_1: ArrayLike) -> Words:
    """Whether 7-16 permits Seismic Design Category A by the mapped accelerations alone.

    "yes" if S_S <= 0.15 and S_1 <= 0.04

    Parameters
        S_S: mapped MCE_R acceleration at short periods [g], at least 0; any shape
        S_1: mapped MCE_R acceleration at 1 s [g], at least 0
    Returns
        "yes" or "no", or texts of the broadcast shape
    Raises
        ImpossibleValue: a value below 0
    Notes
        A permission: the engineer decides whether to use it.
    Example
        >>> category_A_permitted(S_S=0.12, S_1=0.04)
        'yes'

    Reference
        rule SDC_A: 7-16 11.4.2; 7-22 none
    """
    low = (at_least(0, "S_S", S_S) <= A_LIMITS["S_S"]) & (at_least(0, "S_1", S_1) <= A_LIMITS["S_1"])
    return worded(YES_NO, np.where(low, 0, 1))


def _place(name: str, symbol: str, S: ArrayLike, risk_category: str) -> NDArray[np.intp]:
    """Return the place among the categories of the row of a table that a value reaches."""
    rows = table(f"design_category_{name}")
    column = choice("risk_category", risk_category, RISK_CATEGORIES)
    letters = np.array([DESIGN_CATEGORIES.index(row[column]) for row in rows.rows])
    reached = ~short_of(above(0, symbol, S)[..., None], rows.column(symbol))
    return np.asarray(letters[reached.sum(axis=-1) - 1])
