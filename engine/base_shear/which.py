"""Which bound gives a seismic response coefficient, in words with its equation number."""

from __future__ import annotations

from collections.abc import Sequence
from typing import Final

import numpy as np
from numpy.typing import ArrayLike, NDArray

from engine.base_shear import bounds
from engine.editions import clause
from engine.require import Words, agree, finite, worded

#: a bound in words, the rule that prints it, and where it gives the coefficient
Bound = tuple[str, str, NDArray[np.bool_]]
#: a bound in words, and the rule that prints it
Named = tuple[str, str]

PLATEAU: Final[Named] = ("plateau S_DS/(R/I_e)", "C_s_plateau")
CAP: Final[Named] = ("cap S_D1/(T R/I_e)", "C_s_cap")
CAP_LONG: Final[Named] = ("cap S_D1 T_L/(T^2 R/I_e)", "C_s_cap_long")
SPECTRUM: Final[Named] = ("spectrum S_a/(R/I_e)", "C_s_method1")
MINIMUM: Final[Named] = ("minimum 0.044 S_DS I_e", "C_s_min")
FLOOR: Final[Named] = ("minimum 0.01", "C_s_min")
NEAR_FAULT: Final[Named] = ("minimum 0.5 S_1/(R/I_e)", "C_s_min_S1")


def plateau_and_cap(
    C_s: ArrayLike,
    S_DS: ArrayLike,
    S_D1: ArrayLike,
    T: ArrayLike,
    T_L: ArrayLike,
    R: ArrayLike,
    I_e: ArrayLike,
) -> tuple[Bound, ...]:
    """Return the upper bounds of the two-period spectrum."""
    long = finite("T", T) > finite("T_L", T_L)
    capped = agree(bounds.coefficient_cap(S_D1, T, T_L, R, I_e), C_s)
    return (
        (*PLATEAU, agree(bounds.coefficient_plateau(S_DS, R, I_e), C_s)),
        (*CAP, capped & ~long),
        (*CAP_LONG, capped & long),
    )


def spectrum(C_s: ArrayLike, S_a: ArrayLike, R: ArrayLike, I_e: ArrayLike) -> Bound:
    """Return the ordinate of the multi-period spectrum."""
    return *SPECTRUM, agree(bounds.coefficient_multi(S_a, R, I_e), C_s)


def minimum(C_s: ArrayLike, S_DS: ArrayLike, I_e: ArrayLike) -> tuple[Bound, ...]:
    """Return the minimum at every site, and its own floor."""
    least = bounds.coefficient_minimum(S_DS, I_e)
    governs = agree(least, C_s)
    return (
        (*MINIMUM, governs & (least > bounds.C_S_FLOOR)),
        (*FLOOR, governs),
    )


def near_fault(C_s: ArrayLike, S_1: ArrayLike, R: ArrayLike, I_e: ArrayLike) -> Bound:
    """Return the minimum where S_1 is at least 0.6 g."""
    least = bounds.coefficient_minimum_near_fault(S_1, R, I_e)
    return *NEAR_FAULT, agree(least, C_s)


def named(edition: str, found: Sequence[Bound]) -> Words:
    """Return the first bound that governs, with its equation number in the edition."""
    texts = [f"{text}, Eq. {clause(edition, key).equation}" for text, key, _ in found]
    return worded(texts, np.select([governs for *_, governs in found], range(len(found)), -1))
