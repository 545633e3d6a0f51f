"""The test for a flexible diaphragm by calculation (12.3.1.3)."""

from __future__ import annotations

from typing import Final

from numpy.typing import ArrayLike

from engine.require import Result, Words, above, at_least, exceeds, formula, worded

FLEXIBLE_RATIO: Final = 2.0
FLEXIBILITIES: Final = ("not flexible by calculation", "flexible")


@formula
def flexibility_ratio(delta_MDD: ArrayLike, Delta_ADVE: ArrayLike) -> Result:
    """Deflection of a diaphragm over the drift of the vertical elements beside it.

    delta_MDD/Delta_ADVE

    Parameters
        delta_MDD: largest in-plane deflection of the diaphragm itself [in or mm], at least 0; any shape
        Delta_ADVE: mean drift of the adjoining vertical elements [in or mm], above 0
    Returns
        the ratio [-], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Notes
        Both under the same load, tributary to the diaphragm.
    Example
        >>> print(flexibility_ratio(delta_MDD=0.9, Delta_ADVE=0.4))
        2.25

    Reference
        rule flexible_diaphragm: 7-16 12.3.1.3, Eq. 12.3-1; 7-22 12.3.1.3, Eq. 12.3-1
    """
    return at_least(0, "delta_MDD", delta_MDD) / above(0, "Delta_ADVE", Delta_ADVE)


@formula
def flexibility(delta_MDD: ArrayLike, Delta_ADVE: ArrayLike) -> Words:
    """Whether a diaphragm is flexible by calculation, in words.

    flexible where delta_MDD/Delta_ADVE is above 2

    Parameters
        delta_MDD, Delta_ADVE: as for the ratio
    Returns
        one of FLEXIBILITIES, or texts of the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Notes
        Diaphragms that the clause idealises without calculation are the engineer's judgement.
    Example
        >>> flexibility(delta_MDD=0.9, Delta_ADVE=0.4)
        'flexible'

    Reference
        rule flexible_diaphragm: 7-16 12.3.1.3, Eq. 12.3-1; 7-22 12.3.1.3, Eq. 12.3-1
    """
    return worded(FLEXIBILITIES, exceeds(flexibility_ratio(delta_MDD, Delta_ADVE), FLEXIBLE_RATIO))
