"""S_DS and S_D1 taken from a spectrum (21.4), from pairs of period and ordinate in any order."""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine.editions import value
from engine.errors import NotApplicable
from engine.hazard.multi_period import sorted_pairs
from engine.require import Array, Result, above, choice, exceeds, formula
from engine.units import SYSTEMS

PLATEAU_SHARE: Final = 0.90
PLATEAU_BAND: Final = (0.2, 5.0)
#: periods [s] over which T S_a is searched: from the first to the second on stiff sites, else to the third
ONE_SECOND_BAND: Final = (1.0, 2.0, 5.0)
#: where T S_a is read: at the periods given, or anywhere on the straight lines between them too
READINGS: Final = ("listed periods", "every period")
MAPPED_SHARE: Final = 0.80


@formula
def short_period_from_spectrum(T_i: ArrayLike, S_ai: ArrayLike) -> Result:
    """Design spectral acceleration at short periods from a spectrum.

    S_DS = 0.90 max S_a for T from 0.2 s to 5 s

    Parameters
        T_i: periods of the spectrum [s], at least 0, each once; shape (n,), any order, n 1 to 1,000
        S_ai: design spectral accelerations at those periods [g], above 0; shape (n,)
    Returns
        S_DS [g]
    Raises
        NotApplicable: periods that do not reach from 0.2 s to 5 s. ImpossibleValue, WrongType: as for the
        multi-period spectrum
    Notes
        S_MS is 1.5 times this. 7-16 has a floor besides: ``site_specific_minimum``.
    Example
        >>> print(short_period_from_spectrum(T_i=[0.0, 0.1, 0.3, 1.0, 5.0], S_ai=[0.4, 1.1, 0.9, 0.5, 0.1]))
        0.9

    Reference
        rule S_DS_spectrum: 7-16 21.4; 7-22 21.4
    """
    _, ordinates = _within(*PLATEAU_BAND, T_i, S_ai)
    return np.asarray(PLATEAU_SHARE * ordinates.max())


@formula
def one_second_from_spectrum(
    T_i: ArrayLike, S_ai: ArrayLike, v_s: ArrayLike, units: str, edition: str, reading: str
) -> Result:
    """Design spectral acceleration at 1 s from a spectrum.

    S_D1 = max(share max(T S_a) for T from 1 s to 2 s, or to 5 s on softer sites; S_a at 1 s)

    Parameters
        T_i: periods of the spectrum [s], at least 0, each once; shape (n,), any order, n 1 to 1,000
        S_ai: design spectral accelerations at those periods [g], above 0; shape (n,)
        v_s: average shear wave velocity of the site [ft/s or m/s], above 0; any shape. The band ends at 2 s
            above 1,450 ft/s or 442 m/s (7-22), 1,200 ft/s or 366 m/s (7-16)
        units: "us" (v_s in ft/s) or "si" (v_s in m/s)
        edition: "7-16" (share 1.0) or "7-22" (share 0.90)
        reading: one of READINGS
    Returns
        S_D1 [g], the shape of v_s
    Raises
        NotApplicable: periods that do not reach from 1 s to 5 s, another word. ImpossibleValue, WrongType:
        as for the multi-period spectrum
    Notes
        On the straight line between two periods T S_a may exceed both ends, by 4 % between 1 s and 1.5 s on
        a spectrum that falls with 1/T. Whether the maximum means the listed periods or every period is not
        known for sure. The ends of the band are read either way. S_M1 is 1.5 times this.
    Example
        >>> pairs = {"T_i": [0.2, 1.0, 2.0, 5.0], "S_ai": [1.0, 0.5, 0.3, 0.1]}
        >>> site = {"v_s": 900.0, "units": "us", "edition": "7-22", "reading": "listed periods"}
        >>> print(one_second_from_spectrum(**pairs, **site))
        0.54

    Reference
        rule S_D1_spectrum: 7-16 21.4; 7-22 21.4
    """
    stiff = exceeds(above(0, "v_s", v_s), value(edition, f"v_s_limit_{choice('units', units, SYSTEMS)}"))
    between = choice("reading", reading, READINGS) == READINGS[1]
    first, short, long = ONE_SECOND_BAND
    peaks = [_largest_product(*_within(first, last, T_i, S_ai), between) for last in (short, long)]
    at_one_second = float(_within(first, long, T_i, S_ai)[1][0])
    product: Array = np.where(stiff, *peaks)
    return np.maximum(value(edition, "S_D1_share") * product, at_one_second)


@formula
def site_specific_minimum(S: ArrayLike, S_mapped: ArrayLike) -> Result:
    """A site-specific parameter with its floor, 7-16.

    S = max(S; 0.80 S_mapped), for each of S_DS, S_D1, S_MS, S_M1

    Parameters
        S: parameter from the site-specific spectrum [g], above 0; any shape
        S_mapped: the same parameter by the mapped procedure [g], above 0
    Returns
        S [g], the broadcast shape
    Raises
        ImpossibleValue: a value at or below 0
    Example
        >>> print(site_specific_minimum(S=0.70, S_mapped=1.0))
        0.8

    Reference
        rule S_floor: 7-16 21.4; 7-22 none
    """
    return np.maximum(above(0, "S", S), MAPPED_SHARE * above(0, "S_mapped", S_mapped))


def _within(low: float, high: float, T_i: ArrayLike, S_ai: ArrayLike) -> tuple[Array, Array]:
    """Return the pairs inside a band, with a pair at each of its ends."""
    periods, ordinates = sorted_pairs(T_i, S_ai)
    if periods[0] > low or periods[-1] < high:
        reach = f"{periods[0]:g} s to {periods[-1]:g} s"
        raise NotApplicable("T_i", reach, f"must reach from {low:g} s to {high:g} s", "21.4")
    inside = periods[(periods > low) & (periods < high)]
    band = np.array([low, *inside, high])
    return band, np.interp(band, periods, ordinates)


def _largest_product(periods: Array, ordinates: Array, between: bool) -> float:
    """Return the largest T S_a at the pairs, and on the lines between them if asked.

    On the line S_a = a - b T the product peaks at T = a/(2 b), with a^2/(4 b).
    """
    largest = float((periods * ordinates).max())
    slope = -np.diff(ordinates) / np.diff(periods)
    falling = slope > 0
    b, low, high = slope[falling], periods[:-1][falling], periods[1:][falling]
    a = ordinates[:-1][falling] + b * low
    top = a / (2.0 * b)
    peaks = (a * top / 2.0)[(top > low) & (top < high)]
    return max(largest, float(peaks.max())) if between and peaks.size else largest
