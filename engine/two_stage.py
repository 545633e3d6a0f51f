"""Two-stage procedure for a flexible upper part on a rigid lower part (12.2.3.2).

Items a and b compare two numbers, d is a factor, e asks for the procedures. Item c (the upper part keeps its
own R and rho) is carried out by entering them; f and g are shown where they may matter.
"""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine.require import Result, Words, above, at_least, choice, exceeds, formula, reasons, short_of, yes

LEAST_STIFFNESS_RATIO: Final = 10.0
LARGEST_PERIOD_RATIO: Final = 1.1
PROCEDURES: Final = ("equivalent lateral force", "modal", "another")
TRANSITION: Final = (
    "none",
    "also apply the overstrength and transfer amplifications at the transition (which edition asks for it is"
    " uncertain: confirm)",
)


@formula
def part_stiffness(V: ArrayLike, delta: ArrayLike) -> Result:
    """Stiffness of a part, as the comparison of the two parts takes it.

    K = V/delta

    Parameters
        V: base shear of the part, of the lower one with the reactions of the upper [kip or kN], above 0;
            any shape
        delta: elastic displacement at the part's own top, its base fixed, under the forces that make up V
            [in or mm], above 0
    Returns
        K [kip/in or kN/mm], the broadcast shape
    Raises
        ImpossibleValue: a value at or below 0
    Notes
        The definition is that of 7-22, from memory; 7-16 prints none.
    Example
        >>> print(part_stiffness(V=120.0, delta=0.8))
        150.0

    Reference
        rule two_stage_stiffness: 7-16 12.2.3.2, item a; 7-22 12.2.3.2, item a
    """
    return above(0, "V", V) / above(0, "delta", delta)


@formula
def stiffness_ratio(K_lower: ArrayLike, K_upper: ArrayLike) -> Result:
    """Ratio of the stiffness of the lower part to that of the upper part, which has to be at least 10.

    K_lower/K_upper

    Parameters
        K_lower: stiffness of the lower part [kip/in or kN/mm], above 0; any shape
        K_upper: stiffness of the upper part [kip/in or kN/mm], above 0
    Returns
        the ratio [-], the broadcast shape
    Raises
        ImpossibleValue: a value at or below 0
    Example
        >>> print(stiffness_ratio(K_lower=1500.0, K_upper=120.0))
        12.5

    Reference
        rule two_stage_stiffness: 7-16 12.2.3.2, item a; 7-22 12.2.3.2, item a
    """
    return above(0, "K_lower", K_lower) / above(0, "K_upper", K_upper)


@formula
def period_ratio(T_whole: ArrayLike, T_upper: ArrayLike) -> Result:
    """Ratio of the period of the whole to that of the upper part alone, which has to be at most 1.1.

    T_whole/T_upper

    Parameters
        T_whole: period of the whole structure [s], above 0; any shape
        T_upper: period of the upper part as a structure of its own on a fixed base [s], above 0
    Returns
        the ratio [-], the broadcast shape
    Raises
        ImpossibleValue: a value at or below 0
    Example
        >>> print(period_ratio(T_whole=0.63, T_upper=0.6))
        1.05

    Reference
        rule two_stage_period: 7-16 12.2.3.2, item b; 7-22 12.2.3.2, item b
    """
    return above(0, "T_whole", T_whole) / above(0, "T_upper", T_upper)


@formula
def reaction_factor(
    R_upper: ArrayLike, rho_upper: ArrayLike, R_lower: ArrayLike, rho_lower: ArrayLike
) -> Result:
    """Factor on the reactions of the upper part as they act on the lower part.

    (R_upper/rho_upper)/(R_lower/rho_lower), at least 1

    Parameters
        R_upper: response modification coefficient of the upper part [-], at least 1; any shape
        rho_upper: redundancy factor of the upper part [-], at least 1
        R_lower: response modification coefficient of the lower part [-], at least 1
        rho_lower: redundancy factor of the lower part [-], at least 1
    Returns
        the factor [-], at least 1, the broadcast shape
    Raises
        ImpossibleValue: a value below 1
    Example
        >>> print(reaction_factor(R_upper=6.5, rho_upper=1.3, R_lower=4.0, rho_lower=1.0))
        1.25

    Reference
        rule two_stage_reactions: 7-16 12.2.3.2, item d; 7-22 12.2.3.2, item d
    """
    upper = at_least(1, "R_upper", R_upper) / at_least(1, "rho_upper", rho_upper)
    lower = at_least(1, "R_lower", R_lower) / at_least(1, "rho_lower", rho_lower)
    return np.maximum(upper / lower, 1.0)


@formula
def two_stage_status(
    stiffness_ratio: ArrayLike, period_ratio: ArrayLike, upper_procedure: str, lower_procedure: str
) -> Words:
    """Whether the two-stage procedure may be used, in words: every condition that fails.

    permitted for a stiffness ratio of at least 10, a period ratio of at most 1.1 and the procedures of item e

    Parameters
        stiffness_ratio: stiffness of the lower part over that of the upper [-], above 0; any shape
        period_ratio: period of the whole over that of the upper part alone [-], above 0
        upper_procedure: one of PROCEDURES for the upper part: equivalent lateral force or modal
        lower_procedure: one of PROCEDURES for the lower part: equivalent lateral force
    Returns
        a text, or texts of the broadcast shape
    Raises
        ImpossibleValue: a ratio at or below 0. NotApplicable: another word
    Example
        >>> elf = "equivalent lateral force"
        >>> two_stage_status(stiffness_ratio=9.0, period_ratio=1.05, upper_procedure=elf, lower_procedure=elf)
        'not permitted: stiffness ratio below 10 (item a)'

    Reference
        rule two_stage: 7-16 12.2.3.2; 7-22 12.2.3.2
        rule two_stage_stiffness: 7-16 12.2.3.2, item a; 7-22 12.2.3.2, item a
        rule two_stage_period: 7-16 12.2.3.2, item b; 7-22 12.2.3.2, item b
    """
    texts = (
        f"stiffness ratio below {LEAST_STIFFNESS_RATIO:g} (item a)",
        f"period ratio above {LARGEST_PERIOD_RATIO:g} (item b)",
        "upper part by neither equivalent lateral force nor modal procedure (item e)",
        "lower part not by the equivalent lateral force procedure (item e)",
    )
    fails = (
        short_of(above(0, "stiffness_ratio", stiffness_ratio), LEAST_STIFFNESS_RATIO),
        exceeds(above(0, "period_ratio", period_ratio), LARGEST_PERIOD_RATIO),
        choice("upper_procedure", upper_procedure, PROCEDURES) not in PROCEDURES[:2],
        choice("lower_procedure", lower_procedure, PROCEDURES) != PROCEDURES[0],
    )
    return reasons(texts, fails, "permitted", lead="not permitted: ")


def transition_amplification(discontinuity: str) -> Words:
    """What a discontinuity at the transition between the parts brings, in words.

    none, or the overstrength and transfer amplifications as well

    Parameters
        discontinuity: "yes" for an out-of-plane offset (horizontal Type 4) or an in-plane discontinuity of
            the vertical elements at the transition, else "no"
    Returns
        one of TRANSITION
    Raises
        NotApplicable: another word
    Example
        >>> transition_amplification("no")
        'none'

    Reference
        rule two_stage_transition: 7-16 12.2.3.2; 7-22 12.2.3.2
    """
    return TRANSITION[yes("discontinuity", discontinuity)]
