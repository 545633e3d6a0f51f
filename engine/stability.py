"""P-delta effects (12.8.7): stability coefficient, its limit, the amplifier, and the verdict.

Drift and story height in one unit. Both editions give the same coefficient where Delta = C_d Delta_se/I_e.
"""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine.editions import value
from engine.errors import ImpossibleValue
from engine.require import Array, Result, Words, above, at_least, at_most, exceeds, formula, worded

THRESHOLD: Final = 0.10
LARGEST_LIMIT: Final = 0.25
VERDICTS: Final = (
    "P-delta need not be considered",
    "amplify by 1/(1 - theta)",
    "unstable: redesign",
    "limits collide: theta is at most 0.10, so P-delta need not be considered, but it is above theta_max",
)


@formula
def stability_coefficient(
    P_x: ArrayLike, Delta: ArrayLike, I_e: ArrayLike, V_x: ArrayLike, h_sx: ArrayLike, C_d: ArrayLike
) -> Result:
    """Stability coefficient of a story.

    theta = P_x Delta I_e/(V_x h_sx C_d)

    Parameters
        P_x: vertical design load at and above level x, load factors not above 1 [kip or kN], at least 0
        Delta: design story drift [in or mm], at least 0
        I_e: importance factor [-], at least 1
        V_x: seismic story shear [kip or kN], above 0
        h_sx: height of the story below level x [in or mm, the unit of Delta], above 0
        C_d: deflection amplification factor [-], at least 1
    Returns
        theta [-], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Notes
        7-22 prints P_x/(h_sx K_x) with the story stiffness K_x = V_x/Delta_se: the same number.
    Example
        >>> print(stability_coefficient(P_x=257772, Delta=6.659, I_e=1, V_x=4579, h_sx=3200, C_d=5.5))
        0.0213

    Reference
        rule theta: 7-16 12.8.7, Eq. 12.8-16; 7-22 12.8.7, Eq. 12.8-18
    """
    demand = at_least(0, "P_x", P_x) * at_least(0, "Delta", Delta) * at_least(1, "I_e", I_e)
    return demand / (above(0, "V_x", V_x) * above(0, "h_sx", h_sx) * at_least(1, "C_d", C_d))


@formula
def stability_limit(C_d: ArrayLike, beta: ArrayLike = 1.0) -> Result:
    """Upper limit of the stability coefficient.

    theta_max = 0.5/(beta C_d), at most 0.25

    Parameters
        C_d: deflection amplification factor [-], at least 1; any shape
        beta: shear demand over shear capacity of the story [-], above 0 and at most 1
    Returns
        theta_max [-], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Notes
        beta above 1 is refused: the story would lack strength, which no stability limit can mend.
        Leave beta at 1 where it is not worked out; 7-22 sets a floor, see :func:`demand_ratio`.
    Example
        >>> print(stability_limit(C_d=5.5))
        0.091

    Reference
        rule theta_max: 7-16 12.8.7, Eq. 12.8-17; 7-22 12.8.7, Eq. 12.8-19
    """
    return np.minimum(0.5 / (_ratio(beta) * at_least(1, "C_d", C_d)), LARGEST_LIMIT)


@formula
def demand_ratio(beta: ArrayLike, Omega_0: ArrayLike, edition: str) -> Result:
    """Ratio of shear demand to capacity that the stability limit may use.

    beta, in 7-22 not below 1.25/Omega_0 (and never above 1)

    Parameters
        beta: shear demand over shear capacity of the story [-], above 0 and at most 1; any shape
        Omega_0: overstrength factor [-], at least 1
        edition: "7-16" (no floor) or "7-22"
    Returns
        beta [-], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range. NotApplicable: unknown edition
    Notes
        The floor rests on one secondary source.
    Example
        >>> print(demand_ratio(beta=0.3, Omega_0=2.5, edition="7-22"))
        0.5

    Reference
        rule beta: 7-16 12.8.7; 7-22 12.8.7
    """
    floor = value(edition, "beta_floor_factor") / at_least(1, "Omega_0", Omega_0)
    return np.maximum(_ratio(beta), np.minimum(floor, 1.0))


@formula
def second_order_factor(theta: ArrayLike) -> Result:
    """Factor on displacements and member forces for P-delta effects.

    1/(1 - theta) where theta is above 0.10, else 1

    Parameters
        theta: stability coefficient [-], at least 0 and below 1; any shape
    Returns
        the factor [-], the shape of theta
    Raises
        ImpossibleValue: theta below 0, or at least 1, where the story is unstable
    Example
        >>> print(second_order_factor(theta=0.10), second_order_factor(theta=0.20))
        1.0 1.25

    Reference
        rule theta_amplifier: 7-16 12.8.7; 7-22 12.8.7
    """
    theta = at_least(0, "theta", theta)
    if (theta >= 1).any():
        raise ImpossibleValue("theta", float(theta.max()), "must be below 1: the story is unstable")
    return np.where(exceeds(theta, THRESHOLD), 1.0 / (1.0 - theta), 1.0)


@formula
def stability_verdict(theta: ArrayLike, theta_max: ArrayLike) -> Words:
    """What the stability coefficient asks for, in words, with the case where the two limits collide.

    compares theta with 0.10 and with theta_max

    Parameters
        theta: stability coefficient [-], at least 0; any shape
        theta_max: its upper limit [-], above 0; broadcast with theta
    Returns
        one of VERDICTS, or texts of the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Notes
        With beta = 1 and C_d above 5 theta_max is below 0.10. A coefficient between the two then passes
        one check and fails the other: both are reported, the engineer decides.
    Example
        >>> stability_verdict(theta=0.12, theta_max=0.15)
        'amplify by 1/(1 - theta)'

    Reference
        rule theta_max: 7-16 12.8.7, Eq. 12.8-17; 7-22 12.8.7, Eq. 12.8-19
        rule theta_amplifier: 7-16 12.8.7; 7-22 12.8.7
    """
    theta, theta_max = at_least(0, "theta", theta), above(0, "theta_max", theta_max)
    small, over = ~exceeds(theta, THRESHOLD), exceeds(theta, theta_max)
    return worded(VERDICTS, np.select([small & over, over, ~small], [3, 2, 1], 0))


def _ratio(beta: ArrayLike) -> Array:
    return at_most(1, "beta", above(0, "beta", beta))
