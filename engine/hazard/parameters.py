"""Spectral parameters (11.4): S_MS and S_M1 of 7-16, S_DS and S_D1, and ordinates between both spectra.

In 7-22 S_MS and S_M1 are entries: they are read for the site class from the database of the standard.
"""

from __future__ import annotations

from numpy.typing import ArrayLike

from engine.hazard.words import LONG_EXCEPTIONS, S_M1_RAISED
from engine.require import Result, above, at_least, choice, formula


@formula
def mce_parameter_short(S_S: ArrayLike, F_a: ArrayLike) -> Result:
    """MCE_R spectral acceleration at short periods for the site class, 7-16.

    S_MS = F_a S_S

    Parameters
        S_S: mapped MCE_R acceleration at short periods [g], at least 0; any shape
        F_a: site coefficient at short periods [-], above 0
    Returns
        S_MS [g], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Example
        >>> print(mce_parameter_short(S_S=1.75, F_a=0.9))
        1.575

    Reference
        rule S_MS: 7-16 11.4.4, Eq. 11.4-1; 7-22 none
    """
    return above(0, "F_a", F_a) * at_least(0, "S_S", S_S)


@formula
def mce_parameter_one_second(S_1: ArrayLike, F_v: ArrayLike, exception: str) -> Result:
    """MCE_R spectral acceleration at 1 s for the site class, 7-16.

    S_M1 = F_v S_1; 1.5 times that by exception 2 of Supplement 3

    Parameters
        S_1: mapped MCE_R acceleration at 1 s [g], at least 0; any shape
        F_v: site coefficient at long periods [-], above 0
        exception: one of LONG_EXCEPTIONS, the one used for the trigger at long periods (11.4.8)
    Returns
        S_M1 [g], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range. NotApplicable: another exception
    Notes
        Whatever follows from S_M1 follows from the raised one: S_D1, T_S, C_u, the design category.
    Example
        >>> print(mce_parameter_one_second(S_1=0.45, F_v=1.35, exception="none"))
        0.6075

    Reference
        rule S_M1: 7-16 11.4.4, Eq. 11.4-2; 7-22 none
    """
    raised = choice("exception", exception, LONG_EXCEPTIONS) == S_M1_RAISED
    return above(0, "F_v", F_v) * at_least(0, "S_1", S_1) * (1.5 if raised else 1.0)


@formula
def design_parameter_short(S_MS: ArrayLike) -> Result:
    """Design spectral acceleration at short periods.

    S_DS = 2/3 S_MS

    Parameters
        S_MS: MCE_R spectral acceleration at short periods for the site class [g], above 0; any shape
    Returns
        S_DS [g], the shape of S_MS
    Raises
        ImpossibleValue: a value at or below 0
    Example
        >>> print(design_parameter_short(S_MS=1.575))
        1.05

    Reference
        rule S_DS: 7-16 11.4.5, Eq. 11.4-3; 7-22 11.4.4, Eq. 11.4-1
    """
    return above(0, "S_MS", S_MS) * 2.0 / 3.0


@formula
def design_parameter_one_second(S_M1: ArrayLike) -> Result:
    """Design spectral acceleration at 1 s.

    S_D1 = 2/3 S_M1

    Parameters
        S_M1: MCE_R spectral acceleration at 1 s for the site class [g], above 0; any shape
    Returns
        S_D1 [g], the shape of S_M1
    Raises
        ImpossibleValue: a value at or below 0
    Example
        >>> print(design_parameter_one_second(S_M1=1.56))
        1.04

    Reference
        rule S_D1: 7-16 11.4.5, Eq. 11.4-4; 7-22 11.4.4, Eq. 11.4-2
    """
    return above(0, "S_M1", S_M1) * 2.0 / 3.0


@formula
def mce_ordinate(S_a: ArrayLike) -> Result:
    """Ordinate of the MCE_R spectrum, or a parameter of it, from that of the design spectrum.

    S_aM = 1.5 S_a

    Parameters
        S_a: design spectral acceleration [g], at least 0; any shape
    Returns
        S_aM [g], the shape of S_a
    Raises
        ImpossibleValue: a value below 0
    Example
        >>> print(mce_ordinate(S_a=1.05))
        1.575

    Reference
        rule S_aM: 7-16 11.4.7; 7-22 11.4.6
    """
    return 1.5 * at_least(0, "S_a", S_a)


@formula
def design_ordinate(S_aM: ArrayLike) -> Result:
    """Ordinate of the design spectrum from that of the MCE_R spectrum.

    S_a = 2/3 S_aM

    Parameters
        S_aM: MCE_R spectral acceleration [g], at least 0; any shape
    Returns
        S_a [g], the shape of S_aM
    Raises
        ImpossibleValue: a value below 0
    Example
        >>> print(design_ordinate(S_aM=1.575))
        1.05

    Reference
        rule S_a_design: 7-16 21.3; 7-22 11.4.5.1
    """
    return at_least(0, "S_aM", S_aM) * 2.0 / 3.0
