"""Separation of structures, and displacements at the maximum considered earthquake (12.12.3, 12.12.4)."""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine.editions import value
from engine.require import Result, Words, at_least, exceeds, finite, formula, worded

GAPS: Final = ("wide enough", "too narrow")


@formula
def largest_displacement(
    delta_max: ArrayLike, delta_di: ArrayLike, C_d: ArrayLike, I_e: ArrayLike, edition: str
) -> Result:
    """Displacement of a structure that a separation has to take in.

    delta_M = C_d delta_max/I_e; in 7-22 plus the deflection delta_di of the diaphragm

    Parameters
        delta_max: largest elastic displacement at the critical place, torsional amplification included
            where it applies [in or mm], at least 0; any shape
        delta_di: diaphragm deflection at the design earthquake [in or mm], at least 0; for 7-22 alone
        C_d: deflection amplification factor [-], at least 1
        I_e: importance factor [-], at least 1
        edition: "7-16", or "7-22", whose rule is uncertain
    Returns
        delta_M [in or mm], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range. NotApplicable: unknown edition
    Notes
        To a property line that is no public way the structure is set back by at least delta_M.
    Example
        >>> one = {"delta_max": 0.8, "delta_di": 0.3, "C_d": 5.0, "I_e": 1.0}
        >>> print(*(largest_displacement(**one, edition=e) for e in ("7-16", "7-22")))
        4.0 4.3

    Reference
        rule delta_M: 7-16 12.12.3, Eq. 12.12-1; 7-22 12.12.3, Eq. 12.12-1
    """
    story = at_least(1, "C_d", C_d) * at_least(0, "delta_max", delta_max) / at_least(1, "I_e", I_e)
    return story + value(edition, "separation_diaphragm_term") * at_least(0, "delta_di", delta_di)


@formula
def required_separation(delta_M1: ArrayLike, delta_M2: ArrayLike) -> Result:
    """Least gap between two structures on one property.

    delta_MT = sqrt(delta_M1^2 + delta_M2^2)

    Parameters
        delta_M1: displacement of one structure at the place [in or mm], at least 0; any shape
        delta_M2: displacement of the other at the same height [in or mm], at least 0
    Returns
        delta_MT [in or mm], the broadcast shape
    Raises
        ImpossibleValue: a value below 0
    Example
        >>> print(required_separation(delta_M1=3.0, delta_M2=4.0))
        5.0

    Reference
        rule delta_MT: 7-16 12.12.3, Eq. 12.12-2; 7-22 12.12.3, Eq. 12.12-2
    """
    return np.hypot(at_least(0, "delta_M1", delta_M1), at_least(0, "delta_M2", delta_M2))


@formula
def separation_verdict(gap: ArrayLike, delta_MT: ArrayLike) -> Words:
    """Whether a gap is wide enough, in words.

    gap >= delta_MT; to a property line, gap >= delta_M

    Parameters
        gap: clear distance to the other structure or to the property line [in or mm], at least 0; any shape
        delta_MT: least distance [in or mm], at least 0
    Returns
        one of GAPS, or texts of the broadcast shape
    Raises
        ImpossibleValue: a value below 0
    Example
        >>> separation_verdict(gap=5.0, delta_MT=5.0)
        'wide enough'

    Reference
        rule delta_MT: 7-16 12.12.3, Eq. 12.12-2; 7-22 12.12.3, Eq. 12.12-2
    """
    needed, found = at_least(0, "delta_MT", delta_MT), at_least(0, "gap", gap)
    return worded(GAPS, exceeds(needed, found))


@formula
def mce_displacement(delta_e: ArrayLike, delta_di: ArrayLike, R: ArrayLike, I_e: ArrayLike) -> Result:
    """Displacement at the maximum considered earthquake, for members that span between structures.

    delta_MCE = 1.5 (R |delta_e|/I_e + delta_di)

    Parameters
        delta_e: elastic displacement under the strength-level forces, rotation of the diaphragm and A_x
            included [in or mm], signed; any shape
        delta_di: diaphragm deflection at the design earthquake [in or mm], at least 0
        R: response modification coefficient [-], at least 1
        I_e: importance factor [-], at least 1
    Returns
        delta_MCE [in or mm], a magnitude, the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Notes
        The displacements of the two structures are added as magnitudes.
    Example
        >>> print(mce_displacement(delta_e=0.5, delta_di=0.4, R=8.0, I_e=1.0))
        6.6

    Reference
        rule delta_MCE: 7-16 12.12.4; 7-22 12.8.6, Eq. 12.8-17
    """
    inelastic = at_least(1, "R", R) * np.abs(finite("delta_e", delta_e)) / at_least(1, "I_e", I_e)
    return 1.5 * (inelastic + at_least(0, "delta_di", delta_di))
