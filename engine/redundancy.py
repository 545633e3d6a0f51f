"""Redundancy factor (12.3.4): its value, the reason in words, and where it is 1.0 whatever it is."""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike, NDArray

from engine.editions import text, value
from engine.occupancy import DESIGN_CATEGORIES
from engine.require import Result, Words, above, at_least, choice, exceeds, formula, within, worded, yes
from engine.torsion.ratios import EXTREME_RATIO

#: what frees a direction from 1.3 in Seismic Design Category D to F
CONFIGURATIONS: Final = (
    "none",
    "a: loss of one element",
    "b: regular plan with two bays a side",
)
#: the uses in which rho is 1.0, after the one in which it counts
USES: Final = (
    "strength",
    "transfer forces",
    "drift and P-delta",
    "inertial diaphragm forces",
    "overstrength",
    "nonstructural components",
    "nonbuilding structures",
    "walls out of plane",
    "damped structures",
)
RHO_COUNTS: Final = USES[:2]
#: part of the base shear above which a story counts for the two conditions
STORY_PART: Final = 0.35
_RHO: Final = 1.3
_REASONS: Final = (
    "1.0: Seismic Design Category {SDC}, 12.3.4.1",
    "1.3: torsional irregularity ratio above 1.4 in {directions}, 12.3.4.2",
    "1.3: neither condition of 12.3.4.2 is met",
    "1.0: condition {condition} of 12.3.4.2 is met",
)


@formula
def redundancy_factor(
    SDC: str, configuration: str, TIR_X: ArrayLike, TIR_Y: ArrayLike, edition: str
) -> Result:
    """Redundancy factor of one direction.

    1.0 in Seismic Design Category A to C; else 1.3, save where condition a or b is met and no extreme
    torsion rules it out

    Parameters
        SDC: Seismic Design Category, "A" to "F"
        configuration: the condition that the direction meets, one of CONFIGURATIONS
        TIR_X: largest torsional irregularity ratio for forces along X [-], at least 1; any shape
        TIR_Y: largest torsional irregularity ratio for forces along Y [-], at least 1
        edition: "7-16": a ratio above 1.4 in either direction makes it 1.3 in category D;
            "7-22": ratios above 1.4 in both directions make it 1.3 in D to F
    Returns
        rho [-], 1.0 or 1.3, the broadcast shape
    Raises
        ImpossibleValue: a ratio below 1. NotApplicable: another word
    Notes
        Condition a: the loss of one element (Table 12.3-3) costs a story with more than 35 % of the base
        shear at most 33 % of its strength and makes no extreme torsion. Condition b: regular plans with
        two bays of perimeter framing on each side at those stories. With flexible diaphragms TIR is 1.
    Example
        >>> given = {"SDC": "D", "configuration": "a: loss of one element", "TIR_X": 1.45, "TIR_Y": 1.1}
        >>> print(redundancy_factor(**given, edition="7-16"), redundancy_factor(**given, edition="7-22"))
        1.3 1.0

    Reference
        rule rho_value: 7-16 12.3.4.2; 7-22 12.3.4.2
    """
    case = _case(SDC, configuration, TIR_X, TIR_Y, edition)
    return np.where((case == 1) | (case == 2), _RHO, 1.0)


@formula
def redundancy_reason(
    SDC: str, configuration: str, TIR_X: ArrayLike, TIR_Y: ArrayLike, edition: str
) -> Words:
    """Why the redundancy factor is what it is, in words.

    the rule that sets rho

    Parameters
        SDC, configuration, TIR_X, TIR_Y, edition: as for the redundancy factor
    Returns
        the value and its reason, or texts of the broadcast shape
    Raises
        ImpossibleValue: a ratio below 1. NotApplicable: another word
    Example
        >>> given = {"SDC": "E", "configuration": "none", "TIR_X": 1.1, "TIR_Y": 1.1, "edition": "7-22"}
        >>> redundancy_reason(**given)
        '1.3: neither condition of 12.3.4.2 is met'

    Reference
        rule rho_value: 7-16 12.3.4.2; 7-22 12.3.4.2
    """
    case = _case(SDC, configuration, TIR_X, TIR_Y, edition)
    directions = "one direction" if value(edition, "rho_extreme_directions") == 1 else "both directions"
    words = {"SDC": SDC, "directions": directions, "condition": configuration[0]}
    return worded([reason.format_map(words) for reason in _REASONS], case)


@formula
def redundancy_in_use(use: str, rho: ArrayLike) -> Result:
    """Redundancy factor that counts in a use.

    rho for strength and for transfer forces; 1.0 in every other use

    Parameters
        use: one of USES
        rho: redundancy factor of the direction [-], 1 to 1.3; any shape
    Returns
        rho or 1.0 [-], the shape of rho
    Raises
        ImpossibleValue: rho outside its range. NotApplicable: another use
    Notes
        Nonbuilding structures are those unlike buildings. That transfer forces take rho is from memory.
    Example
        >>> print(redundancy_in_use(use="drift and P-delta", rho=1.3))
        1.0

    Reference
        rule rho_one: 7-16 12.3.4.1; 7-22 12.3.4.1
    """
    rho = within(1, 1.3, "rho", rho)
    return rho if choice("use", use, USES) in RHO_COUNTS else np.ones_like(rho)


@formula
def wall_bays(L_w: ArrayLike, h_sx: ArrayLike, light_frame: str) -> Result:
    """Number of bays that a shear wall counts for in condition b.

    L_w/h_sx, twice that for light-frame walls

    Parameters
        L_w: length of the shear wall [ft or m], above 0; any shape
        h_sx: story height [ft or m], above 0
        light_frame: "yes" or "no"
    Returns
        bays [-], the broadcast shape
    Raises
        ImpossibleValue: a value at or below 0. NotApplicable: another word
    Example
        >>> print(wall_bays(L_w=24, h_sx=10, light_frame="no"))
        2.4

    Reference
        rule rho_bays: 7-16 12.3.4.2; 7-22 12.3.4.2
    """
    factor = 2.0 if yes("light_frame", light_frame) else 1.0
    return factor * above(0, "L_w", L_w) / above(0, "h_sx", h_sx)


@formula
def counts_for_redundancy(V_x: ArrayLike, V: ArrayLike) -> Words:
    """Whether both conditions have to be looked at in a story: "yes" or "no".

    V_x > 0.35 V

    Parameters
        V_x: story shear [kip or kN], at least 0; any shape
        V: base shear [kip or kN], above 0
    Returns
        "yes" or "no", or texts of the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Example
        >>> counts_for_redundancy(V_x=100, V=280)
        'yes'

    Reference
        rule rho_value: 7-16 12.3.4.2; 7-22 12.3.4.2
    """
    return worded(("no", "yes"), exceeds(at_least(0, "V_x", V_x) / above(0, "V", V), STORY_PART))


def _case(SDC: str, configuration: str, TIR_X: ArrayLike, TIR_Y: ArrayLike, edition: str) -> NDArray[np.intp]:
    """The place of the reason that holds, in the order in which they rule each other out."""
    category = choice("SDC", SDC, DESIGN_CATEGORIES)
    extreme = [
        exceeds(at_least(1, name, ratio), EXTREME_RATIO).astype(np.intp)
        for name, ratio in (("TIR_X", TIR_X), ("TIR_Y", TIR_Y))
    ]
    enough = extreme[0] + extreme[1] >= value(edition, "rho_extreme_directions")
    binding = enough & (category in text(edition, "rho_extreme_categories"))
    met = choice("configuration", configuration, CONFIGURATIONS) != CONFIGURATIONS[0]
    case = np.where(binding, 1, 3 if met else 2)
    return np.where(category in "ABC", 0, case)
