"""Approximate period of structures with masonry or concrete shear walls (12.8.2.1).

The coefficient C_q is printed as 0.0019 ft (0.00058 m). The metric figure does not convert: C_w has no unit,
so C_q is in s/ft, and 0.00058 would give a period 10.8 times too short. 0.0019 s/ft is used in both systems.
"""

from __future__ import annotations

from types import MappingProxyType
from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine import levels
from engine.errors import NotApplicable, WrongType
from engine.require import Result, above, choice, exceeds, formula
from engine.units import FOOT, SI, SYSTEMS, US

#: seconds for a length unit
C_Q: Final = MappingProxyType({US: 0.0019, SI: 0.0019 / FOOT})
HIGHEST: Final = MappingProxyType({US: 120.0, SI: 36.6})


@formula
def wall_ratio(A_B: ArrayLike, h_n: ArrayLike, wall_areas: ArrayLike, wall_lengths: ArrayLike) -> Result:
    """Effective ratio of shear wall area to base area, in per cent.

    C_w = (100/A_B) sum(A_i/(1 + 0.83 (h_n/D_i)^2))

    Parameters
        A_B: area of the base of the structure [ft2 or m2], above 0; any shape
        h_n: structural height above the base [ft or m], above 0
        wall_areas: web areas A_i of the shear walls in the direction [ft2 or m2], above 0; a list
        wall_lengths: lengths D_i of the same walls [ft or m], above 0; a list as long
    Returns
        C_w [-], the broadcast shape of A_B and h_n
    Raises
        ImpossibleValue: a value at or below 0. WrongType: lists of unequal length
    Example
        >>> print(wall_ratio(A_B=4800.0, h_n=30.0, wall_areas=[20.0, 20.0], wall_lengths=[20.0, 30.0]))
        0.373

    Reference
        rule C_w: 7-16 12.8.2.1, Eq. 12.8-10; 7-22 12.8.2.1, Eq. 12.8-11
    """
    areas = levels.counted("wall_areas", above(0, "wall_areas", wall_areas), "walls")
    lengths = levels.counted("wall_lengths", above(0, "wall_lengths", wall_lengths), "walls")
    if areas.size != lengths.size:
        raise WrongType(
            "wall_lengths", f"{lengths.size} values", f"must be one for each of {areas.size} walls"
        )
    slenderness = above(0, "h_n", h_n)[..., None] / lengths
    return 100.0 / above(0, "A_B", A_B) * levels.total(areas / (1.0 + 0.83 * slenderness**2))


@formula
def wall_period(h_n: ArrayLike, C_w: ArrayLike, units: str) -> Result:
    """Approximate fundamental period of a structure with masonry or concrete shear walls.

    T_a = C_q h_n/sqrt(C_w), C_q = 0.0019 s/ft

    Parameters
        h_n: structural height above the base [ft or m], above 0 and at most 120 ft (36.6 m); any shape
        C_w: effective ratio of shear wall area to base area in per cent [-], above 0
        units: "us" (h_n in ft) or "si" (h_n in m)
    Returns
        T_a [s], the broadcast shape
    Raises
        ImpossibleValue: a value at or below 0. NotApplicable: a greater height, or unknown units
    Notes
        Printed as 0.00058 for metres, which does not convert: 0.0019 s/ft is 0.00623 s/m. From memory.
    Example
        >>> print(wall_period(h_n=30.0, C_w=0.373, units="us"))
        0.0933

    Reference
        rule T_a_walls: 7-16 12.8.2.1, Eq. 12.8-9; 7-22 12.8.2.1, Eq. 12.8-10
    """
    h_n, highest = above(0, "h_n", h_n), HIGHEST[choice("units", units, SYSTEMS)]
    if exceeds(h_n, highest).any():
        raise NotApplicable(
            "h_n", float(h_n.max()), f"must be at most {highest:g} for this formula", "12.8.2.1"
        )
    return C_Q[units] * h_n / np.sqrt(above(0, "C_w", C_w))
