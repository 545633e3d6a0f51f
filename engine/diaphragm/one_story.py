"""The method for one-story buildings with flexible diaphragms and rigid walls (12.10.4 of 7-22).

The whole method is recalled and uncertain: what it fixes by number is an entry of the engineer's.
"""

from __future__ import annotations

import numpy as np
from numpy.typing import ArrayLike

from engine.require import Result, above, at_least, formula


@formula
def one_story_coefficient(
    S_DS: ArrayLike, S_D1: ArrayLike, I_e: ArrayLike, R_diaph: ArrayLike, T_diaph: ArrayLike
) -> Result:
    """Seismic response coefficient of a flexible diaphragm.

    C_s-diaph = S_DS/(R_diaph/I_e), at most S_D1/(T_diaph R_diaph/I_e)

    Parameters
        S_DS: design spectral acceleration at short periods [g], above 0; any shape
        S_D1: design spectral acceleration at 1 s [g], above 0
        I_e: importance factor [-], at least 1
        R_diaph: response modification coefficient of the diaphragm [-], at least 1; an entry
        T_diaph: period of the diaphragm [s], above 0; an entry
    Returns
        C_s-diaph [-], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Notes
        R_diaph is recalled as 4.5 for wood and for bare steel deck with special detailing, 1.5 for other
        bare deck; T_diaph as 0.002 L_f for wood, 0.001 L_f for steel deck, with the span L_f in ft.
        Amplified shear near the ends of long spans is left out.
    Example
        >>> print(one_story_coefficient(S_DS=1.0, S_D1=0.6, I_e=1.0, R_diaph=4.5, T_diaph=0.8))
        0.16667

    Reference
        rule C_s_diaph: 7-16 none; 7-22 12.10.4
    """
    reduction = at_least(1, "R_diaph", R_diaph) / at_least(1, "I_e", I_e)
    cap = above(0, "S_D1", S_D1) / above(0, "T_diaph", T_diaph)
    return np.minimum(above(0, "S_DS", S_DS), cap) / reduction
