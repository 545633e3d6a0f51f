"""Verdicts on the horizontal irregularities that are ratios (Table 12.3-1)."""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine.editions import clause, value
from engine.irregularity.types import MARKS, NONE, has_type, named
from engine.require import Result, Words, above, at_least, choice, exceeds, formula, within, worded, yes
from engine.torsion.ratios import EXTREME_RATIO, IRREGULAR_RATIO

DIAPHRAGMS: Final = ("rigid or semirigid", "flexible")
OPENING_LIMIT: Final = 0.5
STIFFNESS_CHANGE_LIMIT: Final = 0.5


@formula
def torsional_irregularity(TIR: ArrayLike, diaphragm: str, one_sided: str, edition: str) -> Words:
    """Verdict on torsion from the torsional irregularity ratio.

    torsional above 1.2, extreme above 1.4; in 7-22 one type, also by strength on one side

    Parameters
        TIR: torsional irregularity ratio of the story [-], at least 1; any shape
        diaphragm: one of DIAPHRAGMS; the types are for rigid or semirigid ones alone
        one_sided: "yes" where more than 75 % of a story's lateral strength stands at or on one side of the
            centre of mass; it counts in 7-22 alone
        edition: "7-16" or "7-22"
    Returns
        the type in words, or "no irregularity"; texts of the shape of TIR
    Raises
        ImpossibleValue: TIR below 1. NotApplicable: another word
    Example
        >>> given = {"diaphragm": "rigid or semirigid", "one_sided": "no"}
        >>> torsional_irregularity(TIR=1.45, **given, edition="7-16")
        'Type 1b, extreme torsional'
        >>> torsional_irregularity(TIR=1.45, **given, edition="7-22")
        'Type 1, torsional, ratio above 1.4'

    Reference
        rule TIR: 7-16 12.3.2.1, Table 12.3-1; 7-22 12.3.2.1, Table 12.3-1
    """
    TIR, torsional = at_least(1, "TIR", TIR), named("torsional", edition)
    flexible = choice("diaphragm", diaphragm, DIAPHRAGMS) == "flexible"
    own_type = has_type("extreme torsional", edition)
    extreme = named("extreme torsional", edition) if own_type else f"{torsional}, ratio above 1.4"
    by_strength = yes("one_sided", one_sided) and not own_type
    state = np.where(
        exceeds(TIR, EXTREME_RATIO), 2, np.where(exceeds(TIR, IRREGULAR_RATIO) | by_strength, 1, 0)
    )
    texts = (NONE, torsional, extreme, "not for flexible diaphragms")
    return worded(texts, np.where(flexible, 3, state))


@formula
def reentrant_ratio(p_x: ArrayLike, p_y: ArrayLike, L_x: ArrayLike, L_y: ArrayLike) -> Result:
    """Smaller one of both projections beyond a re-entrant corner, in parts of the plan dimension.

    min(p_x/L_x, p_y/L_y)

    Parameters
        p_x: projection beyond the corner along x [ft or m], at least 0; any shape
        p_y: projection beyond the corner along y [ft or m], at least 0
        L_x: plan dimension along x [ft or m], above 0
        L_y: plan dimension along y [ft or m], above 0
    Returns
        the ratio [-], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Notes
        Both projections have to be above the limit, so the smaller one decides.
    Example
        >>> print(reentrant_ratio(p_x=30, p_y=16, L_x=120, L_y=80))
        0.2

    Reference
        rule reentrant: 7-16 12.3.2.1, Table 12.3-1; 7-22 12.3.2.1, Table 12.3-1
    """
    along_x = at_least(0, "p_x", p_x) / above(0, "L_x", L_x)
    along_y = at_least(0, "p_y", p_y) / above(0, "L_y", L_y)
    return np.minimum(along_x, along_y)


@formula
def reentrant_irregularity(ratio: ArrayLike, edition: str) -> Words:
    """Verdict on a re-entrant corner.

    irregular above 0.15 in 7-16, above 0.20 in 7-22

    Parameters
        ratio: smaller one of both projections in parts of the plan dimension [-], at least 0; any shape
        edition: "7-16", or "7-22", whose limit is uncertain, as the text then says
    Returns
        the type in words, or "no irregularity", with the limit; texts of the shape of ratio
    Raises
        ImpossibleValue: a ratio below 0. NotApplicable: unknown edition
    Example
        >>> reentrant_irregularity(ratio=0.18, edition="7-16")
        'Type 2, re-entrant corner: limit 15 %'
        >>> reentrant_irregularity(ratio=0.18, edition="7-22")
        'no irregularity: limit 20 % (uncertain)'

    Reference
        rule reentrant: 7-16 12.3.2.1, Table 12.3-1; 7-22 12.3.2.1, Table 12.3-1
    """
    limit = value(edition, "reentrant_limit")
    told = f": limit {limit * 100:g} %{MARKS[clause(edition, 'reentrant').confidence]}"
    irregular = exceeds(at_least(0, "ratio", ratio), limit)
    return worded((f"{NONE}{told}", f"{named('re-entrant corner', edition)}{told}"), irregular)


@formula
def diaphragm_irregularity(opening: ArrayLike, change: ArrayLike, edition: str) -> Words:
    """Verdict on a diaphragm from its openings and its stiffness.

    irregular with an opening above 0.5 of the gross area, or a change of stiffness above 0.5

    Parameters
        opening: open area over the gross enclosed area of the diaphragm [-], 0 to 1; any shape
        change: change of the diaphragm's stiffness from one story to the next, in parts [-], at least 0
        edition: "7-16" or "7-22"
    Returns
        the type in words, or "no irregularity"; texts of the broadcast shape
    Raises
        ImpossibleValue: a value outside its range. NotApplicable: unknown edition
    Example
        >>> diaphragm_irregularity(opening=0.55, change=0.1, edition="7-22")
        'Type 3, diaphragm discontinuity'

    Reference
        rule diaphragm_discontinuity: 7-16 12.3.2.1, Table 12.3-1; 7-22 12.3.2.1, Table 12.3-1
    """
    open_wide = exceeds(within(0, 1, "opening", opening), OPENING_LIMIT)
    changed = exceeds(at_least(0, "change", change), STIFFNESS_CHANGE_LIMIT)
    return worded((NONE, named("diaphragm discontinuity", edition)), open_wide | changed)
