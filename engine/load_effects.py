"""Seismic load effects (12.4) and the combinations that take them up (2.3.6, 2.4.5)."""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine.editions import EDITIONS
from engine.require import Result, above, at_least, choice, finite, formula, within
from engine.tables import table

COMBINATIONS: Final = table("load_combinations").keys
TERMS: Final = ("D", "E_v", "E_h", "L", "S")
#: how E_v is taken: in full, or not at all by one of the two cases of the clause
VERTICAL_CASES: Final = (
    "counted",
    "zero in Seismic Design Category B",
    "zero at the foundation-soil interface",
)


@formula
def horizontal_effect(rho: ArrayLike, Q_E: ArrayLike) -> Result:
    """Horizontal seismic load effect.

    E_h = rho Q_E

    Parameters
        rho: redundancy factor [-], 1 to 1.3; any shape
        Q_E: effect of the horizontal seismic forces [kip or kN, or any unit of an effect], signed
    Returns
        E_h [the unit of Q_E], signed, the broadcast shape
    Raises
        ImpossibleValue: rho outside its range
    Example
        >>> print(horizontal_effect(rho=1.3, Q_E=50))
        65.0

    Reference
        rule E_h: 7-16 12.4.2.1, Eq. 12.4-3; 7-22 12.4.2.1, Eq. 12.4-3
    """
    return within(1, 1.3, "rho", rho) * finite("Q_E", Q_E)


@formula
def vertical_effect(S_DS: ArrayLike, D: ArrayLike, taken: str) -> Result:
    """Vertical seismic load effect.

    E_v = 0.2 S_DS D; 0 in the two cases of the clause

    Parameters
        S_DS: design spectral acceleration at short periods, or its value capped by 12.8.1.3 [g], above 0
        D: effect of dead load [kip or kN, or any unit of an effect], signed
        taken: one of VERTICAL_CASES
    Returns
        E_v [the unit of D], signed, the broadcast shape
    Raises
        ImpossibleValue: S_DS at or below 0. NotApplicable: another word
    Notes
        The case of the foundation-soil interface is for the combination with 0.9 D or 0.6 D alone.
    Example
        >>> print(vertical_effect(S_DS=1.0, D=120, taken="counted"))
        24.0

    Reference
        rule E_v: 7-16 12.4.2.2, Eq. 12.4-4a; 7-22 12.4.2.2, Eq. 12.4-4a
    """
    effect = 0.2 * above(0, "S_DS", S_DS) * finite("D", D)
    return effect if choice("taken", taken, VERTICAL_CASES) == VERTICAL_CASES[0] else np.zeros_like(effect)


@formula
def vertical_effect_spectrum(S_av: ArrayLike, D: ArrayLike) -> Result:
    """Vertical seismic load effect from the vertical response spectrum.

    E_v = 0.3 S_av D

    Parameters
        S_av: design vertical response spectral acceleration by 11.9 [g], above 0; any shape
        D: effect of dead load [kip or kN, or any unit of an effect], signed
    Returns
        E_v [the unit of D], signed, the broadcast shape
    Raises
        ImpossibleValue: S_av at or below 0
    Example
        >>> print(vertical_effect_spectrum(S_av=0.8, D=120))
        28.8

    Reference
        rule E_v_spectrum: 7-16 12.4.2.2, Eq. 12.4-4b; 7-22 12.4.2.2, Eq. 12.4-4b
    """
    return 0.3 * above(0, "S_av", S_av) * finite("D", D)


@formula
def overstrength_effect(Omega_0: ArrayLike, Q_E: ArrayLike) -> Result:
    """Horizontal seismic load effect with overstrength.

    E_mh = Omega_0 Q_E

    Parameters
        Omega_0: overstrength factor [-], at least 1; any shape
        Q_E: effect of the horizontal seismic forces [kip or kN, or any unit of an effect], signed
    Returns
        E_mh [the unit of Q_E], signed, the broadcast shape
    Raises
        ImpossibleValue: Omega_0 below 1
    Example
        >>> print(overstrength_effect(Omega_0=2.5, Q_E=50))
        125.0

    Reference
        rule E_mh: 7-16 12.4.3.1, Eq. 12.4-7; 7-22 12.4.3.1, Eq. 12.4-7
    """
    return at_least(1, "Omega_0", Omega_0) * finite("Q_E", Q_E)


@formula
def limited_overstrength_effect(Omega_0: ArrayLike, Q_E: ArrayLike, E_cl: ArrayLike) -> Result:
    """Horizontal seismic load effect with overstrength, not above what the structure can deliver.

    E_mh = Omega_0 Q_E, its magnitude at most E_cl

    Parameters
        Omega_0: overstrength factor [-], at least 1; any shape
        Q_E: effect of the horizontal seismic forces [kip or kN, or any unit of an effect], signed
        E_cl: capacity-limited effect, as a magnitude [kip or kN, the unit of Q_E], at least 0
    Returns
        E_mh [the unit of Q_E], signed like Q_E, the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Example
        >>> print(limited_overstrength_effect(Omega_0=2.5, Q_E=-50, E_cl=110))
        -110.0

    Reference
        rule E_cl: 7-16 12.4.3.2; 7-22 12.4.3.2
    """
    limit = at_least(0, "E_cl", E_cl)
    return np.clip(overstrength_effect(Omega_0, Q_E), -limit, limit)


def combination_factor(combination: str, term: str, edition: str) -> np.float64:
    """Factor on one term in one load combination.

    the factor of the table

    Parameters
        combination: one of COMBINATIONS: 2.3.6 strength, 2.4.5 allowable stress
        term: one of TERMS; with overstrength the factor of E_h is that of E_mh
        edition: "7-16" or "7-22"
    Returns
        the factor [-], 0 where the term is not in the combination
    Raises
        NotApplicable: another word
    Notes
        The factor of E_v is negative where it acts against the dead load.
    Example
        >>> print(combination_factor(combination="2.4.5-9", term="S", edition="7-22"))
        0.1

    Reference
        rule combination: 7-16 2.3.6 and 2.4.5; 7-22 2.3.6 and 2.4.5
    """
    word = choice("combination", combination, COMBINATIONS)
    column = choice("term", term, TERMS)
    standard = choice("edition", edition, EDITIONS)
    rows = table("load_combinations").rows
    (row,) = (row for row in rows if (row["combination"], row["edition"]) == (word, standard))
    return np.float64(row[column])


@formula
def combined_effect(
    combination: str,
    D: ArrayLike,
    E_v: ArrayLike,
    E_h: ArrayLike,
    L: ArrayLike,
    S: ArrayLike,
    edition: str,
) -> Result:
    """Sum of one load combination.

    the sum of factor times effect over all terms

    Parameters
        combination: one of COMBINATIONS
        D: effect of dead load [kip or kN, or any unit of an effect], signed; any shape
        E_v: vertical seismic effect [kip or kN, the unit of D], signed
        E_h: horizontal seismic effect, or E_mh in its place [kip or kN, the unit of D], signed
        L: effect of live load [kip or kN, the unit of D], signed
        S: effect of snow load [kip or kN, the unit of D], signed
        edition: "7-16" or "7-22"
    Returns
        the sum [the unit of D], the broadcast shape
    Raises
        ImpossibleValue: a number that is not finite. NotApplicable: another word
    Notes
        E_h acts both ways: work it out with either sign.
    Example
        >>> effects = {"D": 100, "E_v": 20, "E_h": 60, "L": 40, "S": 30}
        >>> print(combined_effect(combination="2.3.6-6", **effects, edition="7-16"))
        246.0

    Reference
        rule combination: 7-16 2.3.6 and 2.4.5; 7-22 2.3.6 and 2.4.5
    """
    effects = dict(zip(TERMS, (D, E_v, E_h, L, S), strict=True))
    parts = [combination_factor(combination, t, edition) * finite(t, v) for t, v in effects.items()]
    return parts[0] + parts[1] + parts[2] + parts[3] + parts[4]


@formula
def dead_load_factor(combination: str, S_DS: ArrayLike, edition: str) -> Result:
    """Factor on dead load with the vertical seismic effect taken in.

    factor of D + factor of E_v times 0.2 S_DS

    Parameters
        combination: one of COMBINATIONS
        S_DS: design spectral acceleration at short periods, or its value capped by 12.8.1.3 [g], above 0
        edition: "7-16" or "7-22"
    Returns
        the factor [-], the shape of S_DS
    Raises
        ImpossibleValue: S_DS at or below 0. NotApplicable: another word
    Example
        >>> print(dead_load_factor(combination="2.3.6-7", S_DS=1.0, edition="7-22"))
        0.7

    Reference
        rule combination: 7-16 2.3.6 and 2.4.5; 7-22 2.3.6 and 2.4.5
    """
    alone, vertical = (combination_factor(combination, term, edition) for term in ("D", "E_v"))
    return alone + vertical * 0.2 * above(0, "S_DS", S_DS)
