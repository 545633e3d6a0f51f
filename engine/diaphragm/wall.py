"""Structural walls out of plane and their anchorage (12.11)."""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine.require import Result, above, at_least, choice, formula, within
from engine.units import FOOT, SYSTEMS, US

WALL_DIAPHRAGMS: Final = ("rigid", "flexible")
LARGEST_ANCHORAGE_FACTOR: Final = 2.0


@formula
def wall_force(S_DS: ArrayLike, I_e: ArrayLike, W_w: ArrayLike) -> Result:
    """Force on a structural wall out of its plane.

    F_p = 0.4 S_DS I_e W_w, at least 0.10 W_w

    Parameters
        S_DS: design spectral acceleration at short periods [g], above 0; any shape
        I_e: importance factor [-], at least 1
        W_w: weight of the wall [kip or kN], at least 0
    Returns
        F_p [kip or kN], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Example
        >>> print(wall_force(S_DS=1.0, I_e=1.0, W_w=50))
        20.0

    Reference
        rule F_p_wall: 7-16 12.11.1; 7-22 12.11.1
    """
    part = 0.4 * above(0, "S_DS", S_DS) * at_least(1, "I_e", I_e)
    return np.maximum(part, 0.1) * at_least(0, "W_w", W_w)


@formula
def anchorage_factor(L_f: ArrayLike, diaphragm: str, units: str) -> Result:
    """Amplification of the anchorage force by a flexible diaphragm.

    k_a = 1 + L_f/(100 ft), at most 2; 1 for a rigid diaphragm

    Parameters
        L_f: span of the flexible diaphragm between the elements that support it [ft or m], at least 0
        diaphragm: "rigid" or "flexible"
        units: "us" (ft) or "si" (m)
    Returns
        k_a [-], 1 to 2, the shape of L_f
    Raises
        ImpossibleValue: a span below 0. NotApplicable: another word
    Example
        >>> print(anchorage_factor(L_f=60, diaphragm="flexible", units="us"))
        1.6

    Reference
        rule k_a: 7-16 12.11.2.1, Eq. 12.11-2; 7-22 12.11.2.1, Eq. 12.11-2
    """
    reach = 100.0 if choice("units", units, SYSTEMS) == US else 100.0 * FOOT
    factor = np.minimum(1 + at_least(0, "L_f", L_f) / reach, LARGEST_ANCHORAGE_FACTOR)
    flexible = choice("diaphragm", diaphragm, WALL_DIAPHRAGMS) == "flexible"
    return factor if flexible else np.ones_like(factor)


@formula
def anchorage_force(S_DS: ArrayLike, k_a: ArrayLike, I_e: ArrayLike, W_p: ArrayLike) -> Result:
    """Anchorage force of a structural wall.

    F_p = 0.4 S_DS k_a I_e W_p, at least 0.2 k_a I_e W_p

    Parameters
        S_DS: design spectral acceleration at short periods [g], above 0; any shape
        k_a: amplification by a flexible diaphragm [-], 1 to 2
        I_e: importance factor [-], at least 1
        W_p: weight of the wall tributary to the anchor [kip or kN], at least 0
    Returns
        F_p [kip or kN], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Example
        >>> print(anchorage_force(S_DS=1.0, k_a=1.6, I_e=1.0, W_p=2.5))
        1.6

    Reference
        rule F_p_anchor: 7-16 12.11.2.1, Eq. 12.11-1; 7-22 12.11.2.1, Eq. 12.11-1
    """
    part = np.maximum(0.4 * above(0, "S_DS", S_DS), 0.2)
    k_a = within(1, LARGEST_ANCHORAGE_FACTOR, "k_a", k_a)
    return part * k_a * at_least(1, "I_e", I_e) * at_least(0, "W_p", W_p)
