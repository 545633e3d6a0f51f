"""A rigid diaphragm shared out to its walls: centre of rigidity, polar rigidity, direct and torsional shear.

Walls are lists, in any order; rigidities are relative, in any unit that all walls share.
"""

from __future__ import annotations

import numpy as np
from numpy.typing import ArrayLike

from engine import levels
from engine.errors import WrongType
from engine.require import Array, Result, above, at_least, finite, formula


@formula
def center_of_rigidity(rigidities: ArrayLike, positions: ArrayLike) -> Result:
    """Centre of rigidity of the walls of one direction.

    x_R = sum(R_i x_i)/sum(R_i)

    Parameters
        rigidities: relative rigidities of the walls that resist the direction [-], above 0; 1 to 1,000
        positions: their places on the axis across the direction [ft or m], signed; as many
    Returns
        x_R [ft or m], one number
    Raises
        ImpossibleValue: a rigidity at or below 0. WrongType: lists of unequal length
    Example
        >>> print(center_of_rigidity(rigidities=[6, 4], positions=[0, 60]))
        24.0

    Reference
        rule wall_shares: 7-16 12.8.4; 7-22 12.8.4
    """
    R = _rigidities(rigidities)
    return np.asarray((R * _like("positions", finite("positions", positions), R)).sum() / R.sum())


@formula
def polar_rigidity(rigidities: ArrayLike, distances: ArrayLike) -> Result:
    """Polar rigidity of the walls of both directions about the centre of rigidity.

    J = sum(R_i d_i^2)

    Parameters
        rigidities: relative rigidities of all walls [-], above 0; 1 to 1,000
        distances: distances of the walls' lines from the centre of rigidity [ft or m], signed; as many
    Returns
        J [rigidity x ft2 or m2], one number
    Raises
        ImpossibleValue: a rigidity at or below 0. WrongType: lists of unequal length
    Example
        >>> print(polar_rigidity(rigidities=[6, 4, 4, 4], distances=[-24, 36, 20, -20]))
        11840.0

    Reference
        rule wall_shares: 7-16 12.8.4; 7-22 12.8.4
    """
    R = _rigidities(rigidities)
    return np.asarray((R * _like("distances", finite("distances", distances), R) ** 2).sum())


@formula
def direct_shear(V: ArrayLike, R_i: ArrayLike, rigidities: ArrayLike) -> Result:
    """Share of a wall in the story shear, without torsion.

    V_i = V R_i/sum(R_i)

    Parameters
        V: story shear of the direction [kip or kN], at least 0; any shape
        R_i: relative rigidity of the wall [-], above 0; broadcast with V
        rigidities: relative rigidities of all walls of the direction [-], above 0; 1 to 1,000
    Returns
        V_i [kip or kN], the broadcast shape
    Raises
        ImpossibleValue: a rigidity at or below 0, or V below 0
    Example
        >>> print(direct_shear(V=100, R_i=4.5, rigidities=[4.5, 5.5]))
        45.0

    Reference
        rule wall_shares: 7-16 12.8.4; 7-22 12.8.4
    """
    total = levels.total(_rigidities(rigidities))
    return at_least(0, "V", V) * above(0, "R_i", R_i) / total


@formula
def torsional_shear(M_t: ArrayLike, R_i: ArrayLike, d_i: ArrayLike, J: ArrayLike) -> Result:
    """Shear of a wall from torsion about the centre of rigidity.

    V_i = M_t R_i d_i/J

    Parameters
        M_t: torsion of the story [kip-ft or kN-m], signed; any shape
        R_i: relative rigidity of the wall [-], above 0
        d_i: distance of the wall's line from the centre of rigidity [ft or m], signed
        J: polar rigidity of all walls [-], above 0, in the unit of R_i times the unit of d_i squared
    Returns
        V_i [kip or kN], signed, the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Notes
        Relief by a torsion that may also act the other way does not count: take the worse of both signs.
    Example
        >>> print(torsional_shear(M_t=900, R_i=4.5, d_i=49.5, J=27248))
        7.36

    Reference
        rule wall_shares: 7-16 12.8.4; 7-22 12.8.4
    """
    share = above(0, "R_i", R_i) * finite("d_i", d_i) / above(0, "J", J)
    return finite("M_t", M_t) * share


def _rigidities(values: ArrayLike) -> Array:
    return levels.counted("rigidities", above(0, "rigidities", values), "walls")


def _like(name: str, values: Array, rigidities: Array) -> Array:
    if np.shape(values) != rigidities.shape:
        raise WrongType(name, f"{np.size(values)} values", f"must be one for each of {rigidities.size} walls")
    return values
