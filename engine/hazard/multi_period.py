"""Multi-period design spectrum (11.4.5.1 of 7-22) from pairs of period and ordinate, in any order."""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine import levels
from engine.errors import ImpossibleValue, NotApplicable, WrongType
from engine.require import Array, Result, above, agree, at_least, choice, formula

#: the last tabulated period, from which the tail is drawn [s]
TAIL_FROM: Final = 10.0
#: how the tail goes on where T_L is below 10 s: with the printed step, or without one
TAILS: Final = ("as printed", "continuous at 10 s")


@formula
def multi_period_acceleration(
    T: ArrayLike, T_i: ArrayLike, S_ai: ArrayLike, T_L: ArrayLike, tail: str
) -> Result:
    """Ordinate of the multi-period design spectrum.

    S_a = linear between the pairs; S_a(10 s) 10/T beyond 10 s, S_a(10 s) 10 T_L/T^2 beyond T_L

    Parameters
        T: period [s], at least 0; any shape
        T_i: periods of the spectrum [s], at least 0, each once; shape (n,), any order, n 1 to 1,000
        S_ai: design spectral accelerations at those periods [g], above 0; shape (n,)
        T_L: long-period transition period [s], above 0
        tail: one of TAILS, for T_L below 10 s
    Returns
        S_a [g], the broadcast shape of T and T_L
    Raises
        NotApplicable: T outside the periods, save beyond 10 s where 10 s is the last of them; another tail.
        ImpossibleValue: a value outside its range, or a period twice. WrongType: lists of unequal length
    Notes
        Read as printed, the tail drops at 10 s by T_L/10 where T_L is below 10 s. "continuous at 10 s"
        falls with 1/T^2 from 10 s on instead: the higher of the two. Both are one where T_L is at least 10 s.
    Example
        >>> pairs = {"T_i": [0.0, 0.2, 1.0, 5.0, 10.0], "S_ai": [0.4, 1.0, 0.5, 0.1, 0.04]}
        >>> print(multi_period_acceleration(T=0.6, **pairs, T_L=12.0, tail="as printed"))
        0.75

    Reference
        rule S_a_multi: 7-16 none; 7-22 11.4.5.1
    """
    T, T_L = at_least(0, "T", T), above(0, "T_L", T_L)
    periods, ordinates = sorted_pairs(T_i, S_ai)
    refuse_outside(T, periods)
    bend = T_L if choice("tail", tail, TAILS) == TAILS[0] else np.maximum(T_L, TAIL_FROM)
    later = np.maximum(T, TAIL_FROM)
    beyond = ordinates[-1] * TAIL_FROM / later * np.minimum(bend / later, 1.0)
    return np.where(periods[-1] >= T, np.interp(T, periods, ordinates), beyond)


@formula
def method_1_acceleration(T: ArrayLike, T_i: ArrayLike, S_ai: ArrayLike, T_L: ArrayLike, tail: str) -> Result:
    """Ordinate of the multi-period design spectrum for C_s by Method 1: no drop to the left of the peak.

    S_a = the peak for T below its period; the ordinate at T elsewhere

    Parameters
        T: period [s], at least 0; any shape
        T_i: periods of the spectrum [s], at least 0, each once; shape (n,), any order, n 1 to 1,000
        S_ai: design spectral accelerations at those periods [g], above 0; shape (n,)
        T_L: long-period transition period [s], above 0
        tail: one of TAILS, for T_L below 10 s
    Returns
        S_a [g], the broadcast shape of T and T_L
    Raises
        NotApplicable, ImpossibleValue, WrongType: as for the multi-period spectrum
    Notes
        Of equal peaks the one at the longest period counts. The peak may lie below 0.2 s and then exceeds
        S_DS, which is 0.9 of a maximum from 0.2 s on.
    Example
        >>> pairs = {"T_i": [0.0, 0.2, 1.0, 5.0, 10.0], "S_ai": [0.4, 1.0, 0.5, 0.1, 0.04]}
        >>> print(method_1_acceleration(T=0.1, **pairs, T_L=12.0, tail="as printed"))
        1.0

    Reference
        rule C_s_method1: 7-16 none; 7-22 12.8.1.1, Eq. 12.8-2
    """
    S_a = multi_period_acceleration(T, T_i, S_ai, T_L, tail)
    periods, ordinates = sorted_pairs(T_i, S_ai)
    peak = ordinates.max()
    return np.where(at_least(0, "T", T) < periods[agree(ordinates, peak)][-1], peak, S_a)


def sorted_pairs(T_i: ArrayLike, S_ai: ArrayLike) -> tuple[Array, Array]:
    """Return periods and ordinates by rising period; refuse a period twice and lists that do not fit."""
    periods = levels.counted("T_i", at_least(0, "T_i", T_i), "periods")
    ordinates = levels.counted("S_ai", above(0, "S_ai", S_ai), "periods")
    if periods.shape != ordinates.shape:
        raise WrongType("S_ai", f"{ordinates.size} values", f"must be one for each of {periods.size} periods")
    order = np.argsort(periods)
    periods, ordinates = periods[order], ordinates[order]
    twice = periods[1:] == periods[:-1]
    if twice.any():
        raise ImpossibleValue("T_i", float(periods[1:][twice][0]), "must hold each period once")
    return periods, ordinates


def refuse_outside(T: Array, periods: Array) -> None:
    """Refuse a period that the pairs do not reach; only from 10 s on is a tail printed."""
    last = np.inf if agree(periods[-1], TAIL_FROM) else periods[-1]
    outside = (periods[0] > T) | (last < T)
    if outside.any():
        allowed = f"must be within the periods given, {periods[0]:g} s to {periods[-1]:g} s"
        raise NotApplicable("T", levels.first(T, outside), f"{allowed} (a tail is printed from 10 s on only)")
