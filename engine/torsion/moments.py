"""Eccentricities and the torsion of a story: inherent, accidental, and where the accidental part counts.

Both kinds of torsion are summed over the forces at and above a level, like a story shear.
"""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine import levels
from engine.editions import clause
from engine.occupancy import DESIGN_CATEGORIES
from engine.require import Result, Words, above, at_least, choice, exceeds, finite, formula, within, worded
from engine.torsion.ratios import EXTREME_RATIO, IRREGULAR_RATIO, TORSIONAL_CATEGORIES

ACCIDENTAL_PART: Final = 0.05
LARGEST_AMPLIFICATION: Final = 3.0
SCOPES: Final = (
    "for the test of irregularity alone",
    "in forces and drifts as well",
)
UNCERTAIN: Final = " (uncertain: confirm)"


@formula
def inherent_eccentricity(x_M: ArrayLike, x_R: ArrayLike) -> Result:
    """Eccentricity between the centre of mass and the centre of rigidity.

    e = x_M - x_R

    Parameters
        x_M: place of the centre of mass [ft or m], signed; any shape
        x_R: place of the centre of rigidity on the same axis [ft or m], signed
    Returns
        e [ft or m], signed, the broadcast shape
    Raises
        ImpossibleValue: a number that is not finite
    Example
        >>> print(inherent_eccentricity(x_M=30, x_R=24))
        6.0

    Reference
        rule M_t: 7-16 12.8.4.1; 7-22 12.8.4.1
    """
    return finite("x_M", x_M) - finite("x_R", x_R)


@formula
def accidental_eccentricity(L_perp: ArrayLike) -> Result:
    """Assumed offset of the centre of mass, to either side.

    e_acc = 0.05 L_perp

    Parameters
        L_perp: plan dimension perpendicular to the force [ft or m], above 0; any shape
    Returns
        e_acc [ft or m], the shape of L_perp
    Raises
        ImpossibleValue: a value at or below 0
    Example
        >>> print(accidental_eccentricity(L_perp=90))
        4.5

    Reference
        rule M_ta: 7-16 12.8.4.2; 7-22 12.8.4.2
    """
    return ACCIDENTAL_PART * above(0, "L_perp", L_perp)


@formula
def inherent_moment(
    h_x: ArrayLike, x_R: ArrayLike, forces: ArrayLike, centers: ArrayLike, heights: ArrayLike
) -> Result:
    """Inherent torsion of the story below a level, about its centre of rigidity.

    M_t = sum(F_i (x_Mi - x_R)) over the levels at and above h_x

    Parameters
        h_x: height of the level above the base [ft or m]; any shape, broadcast with the leading axes
        x_R: place of the story's centre of rigidity [ft or m], signed; broadcast with h_x
        forces: story forces [kip or kN]; shape (..., n)
        centers: places of the centres of mass, on the axis of x_R [ft or m], signed; shape (..., n)
        heights: heights of the levels above the base [ft or m], above 0; shape (..., n), n 1 to 1,000
    Returns
        M_t [kip-ft or kN-m], signed, the broadcast shape
    Raises
        NotApplicable: h_x is not a level. WrongType: unequal lengths
    Notes
        With x_R = 0 the centers are the levels' eccentricities. Nothing of it where diaphragms are flexible.
    Example
        >>> print(inherent_moment(h_x=12, x_R=24, forces=[40, 60], centers=[30, 30], heights=[12, 24]))
        600.0

    Reference
        rule M_t: 7-16 12.8.4.1; 7-22 12.8.4.1
    """
    h = levels.checked_heights(heights)
    F = levels.per_level("forces", finite("forces", forces), h)
    arms = levels.per_level("centers", finite("centers", centers), h) - finite("x_R", x_R)[..., None]
    below = levels.is_below(levels.position(h_x, h, base=False), h)
    return levels.total(np.where(below, 0.0, F * arms))


@formula
def accidental_moment(
    h_x: ArrayLike,
    forces: ArrayLike,
    dimensions: ArrayLike,
    amplifications: ArrayLike,
    heights: ArrayLike,
) -> Result:
    """Accidental torsion of the story below a level, all offsets to one side.

    M_ta = sum(F_i 0.05 L_i A_i) over the levels at and above h_x

    Parameters
        h_x: height of the level above the base [ft or m]; any shape, broadcast with the leading axes
        forces: story forces [kip or kN]; shape (..., n)
        dimensions: plan dimensions perpendicular to the force [ft or m], above 0; shape (..., n)
        amplifications: factors A_x of the levels, 1 where none applies [-], 1 to 3; shape (..., n)
        heights: heights of the levels above the base [ft or m], above 0; shape (..., n), n 1 to 1,000
    Returns
        M_ta [kip-ft or kN-m], to be taken with either sign, the broadcast shape
    Raises
        NotApplicable: h_x is not a level. ImpossibleValue: a value outside its range
    Example
        >>> levels = {"dimensions": [80, 80], "amplifications": [1, 1.361], "heights": [12, 24]}
        >>> print(accidental_moment(h_x=12, forces=[40, 60], **levels))
        486.64

    Reference
        rule M_ta: 7-16 12.8.4.2; 7-22 12.8.4.2
    """
    h = levels.checked_heights(heights)
    F = levels.per_level("forces", finite("forces", forces), h)
    L = levels.per_level("dimensions", above(0, "dimensions", dimensions), h)
    factors = within(1, LARGEST_AMPLIFICATION, "amplifications", amplifications)
    A = levels.per_level("amplifications", factors, h)
    below = levels.is_below(levels.position(h_x, h, base=False), h)
    return levels.total(np.where(below, 0.0, ACCIDENTAL_PART * F * L * A))


@formula
def accidental_scope(TIR: ArrayLike, SDC: str, edition: str) -> Words:
    """Where accidental torsion counts, in words.

    in forces and drifts for TIR > 1.2 in Seismic Design Category C to F, for TIR > 1.4 in B; else in the
    test of irregularity alone

    Parameters
        TIR: largest torsional irregularity ratio of the structure [-], at least 1; any shape
        SDC: Seismic Design Category, "A" to "F"
        edition: "7-16", or "7-22", whose wording is uncertain, as the text then says
    Returns
        one of SCOPES, or texts of the shape of TIR
    Raises
        ImpossibleValue: TIR below 1. NotApplicable: another category or edition
    Example
        >>> accidental_scope(TIR=1.3, SDC="D", edition="7-16")
        'in forces and drifts as well'

    Reference
        rule M_ta_scope: 7-16 12.8.4.2; 7-22 12.8.4.2
    """
    category = choice("SDC", SDC, DESIGN_CATEGORIES)
    limit = IRREGULAR_RATIO if category in TORSIONAL_CATEGORIES else EXTREME_RATIO
    doubt = UNCERTAIN if clause(edition, "M_ta_scope").confidence == "U" else ""
    counts = exceeds(at_least(1, "TIR", TIR), limit) & (category != "A")
    return worded([f"{scope}{doubt}" for scope in SCOPES], counts)
