"""When 7-16 demands a ground motion hazard analysis (11.4.8), and what its exceptions cost."""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine.hazard.words import (
    C_S_INCREASED,
    F_A_OF_CLASS_C,
    LONG_EXCEPTIONS,
    S_M1_RAISED,
    SHORT_EXCEPTIONS,
    SHORT_T,
    SITE_CLASSES,
)
from engine.require import (
    Result,
    Words,
    above,
    at_least,
    choice,
    exceeds,
    formula,
    reasons,
    yes,
)

TRIGGERS: Final = (
    "class F: site response analysis",
    "class E with S_S at least 1.0",
    "class D or E with S_1 at least 0.2",
    "isolated or damped with S_1 at least 0.6",
)
NO_TRIGGER: Final = "none"
MAX_INCREASE: Final = 1.5
_SHORT_LIMIT, _LONG_LIMIT, _ISOLATED_LIMIT = 1.0, 0.2, 0.6


@formula
def analysis_triggers(
    S_S: ArrayLike,
    S_1: ArrayLike,
    site_class: str,
    isolated: str,
    short_exception: str,
    long_exception: str,
    T: ArrayLike,
    T_S: ArrayLike,
) -> Words:
    """Why a site-specific analysis is still needed by 7-16, after the exceptions that are used.

    the triggers of 11.4.8 that hold and that no exception lifts; "none" without one

    Parameters
        S_S: mapped MCE_R acceleration at short periods [g], at least 0; any shape
        S_1: mapped MCE_R acceleration at 1 s [g], at least 0
        site_class: one of SITE_CLASSES
        isolated: "yes" for a seismically isolated structure or one with damping systems, else "no"
        short_exception: one of SHORT_EXCEPTIONS
        long_exception: one of LONG_EXCEPTIONS
        T: longest period used in design, either direction [s], above 0
        T_S: period at which the plateau of the design spectrum ends [s], above 0
    Returns
        the texts of TRIGGERS that hold, joined, or "none"; texts of the broadcast shape
    Raises
        ImpossibleValue: a value outside its range. NotApplicable: another word
    Notes
        Exceptions 1 and 3 are for class E, exception 2 is for class D, none is for isolated or damped
        structures. One public source gives exception 2 to class E too, and the condition T at most T_S to
        the S_S trigger: the stricter reading is kept here.
    Example
        >>> site = {"S_S": 1.2, "S_1": 0.5, "site_class": "E", "isolated": "no", "T": 0.4, "T_S": 0.9}
        >>> analysis_triggers(**site, short_exception="exception 1: F_a of class C", long_exception="none")
        'class D or E with S_1 at least 0.2'

    Reference
        rule hazard_analysis: 7-16 11.4.8; 7-22 none
    """
    letter = choice("site_class", site_class, SITE_CLASSES)[0]
    damped = yes("isolated", isolated)
    short = choice("short_exception", short_exception, SHORT_EXCEPTIONS) == F_A_OF_CLASS_C
    long = choice("long_exception", long_exception, LONG_EXCEPTIONS)
    early = ~exceeds(above(0, "T", T), above(0, "T_S", T_S))
    lifted = (letter == "D" and long in (C_S_INCREASED, S_M1_RAISED)) | (
        (letter == "E") & (long == SHORT_T) & early
    )
    S_S, S_1 = at_least(0, "S_S", S_S), at_least(0, "S_1", S_1)
    holds = (
        letter == "F",
        (letter == "E") & (S_S >= _SHORT_LIMIT) & (damped or not short),
        (letter in "DE") & (S_1 >= _LONG_LIMIT) & (damped | ~lifted),
        damped & (S_1 >= _ISOLATED_LIMIT),
    )
    return reasons(TRIGGERS, holds, NO_TRIGGER)


@formula
def coefficient_increase(T: ArrayLike, T_S: ArrayLike, exception: str) -> Result:
    """Factor on the upper bound of C_s where exception 2 of 11.4.8 is used as first printed.

    factor = T/T_S, at least 1 and at most 1.5; 1 without that exception

    Parameters
        T: design period [s], above 0; any shape
        T_S: period at which the plateau of the design spectrum ends [s], above 0
        exception: one of LONG_EXCEPTIONS
    Returns
        factor [-], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range. NotApplicable: another exception
    Notes
        Multiplies min(plateau, cap) before the minimums. The clause takes the plateau to T = 1.5 T_S, which
        is T/T_S times the cap there, and 1.5 times the cap beyond, on either side of T_L (beyond it from
        memory). A T_L below 1.5 T_S is not foreseen.
    Example
        >>> print(coefficient_increase(T=0.75, T_S=0.6, exception=C_S_INCREASED))
        1.25

    Reference
        rule C_s_increase: 7-16 11.4.8, exception 2; 7-22 none
    """
    factor = np.clip(above(0, "T", T) / above(0, "T_S", T_S), 1.0, MAX_INCREASE)
    used = choice("exception", exception, LONG_EXCEPTIONS) == C_S_INCREASED
    return factor if used else np.ones_like(factor)
