"""Combinations of systems: one above another (12.2.3.1), several in one direction (12.2.3.3)."""

from __future__ import annotations

import numpy as np
from numpy.typing import ArrayLike

from engine import levels
from engine.errors import WrongType
from engine.require import Array, Result, agree, at_least, formula


@formula
def lower_part_coefficient(
    upper: ArrayLike, lower: ArrayLike, R_upper: ArrayLike, R_lower: ArrayLike
) -> Result:
    """Coefficient (R, Omega_0 or C_d) with which the lower part of a vertical combination is designed.

    that of the lower system where its R is below that of the upper one; else that of the upper system

    Parameters
        upper: the coefficient of the upper system [-], at least 1; any shape
        lower: the same coefficient of the lower system [-], at least 1
        R_upper: response modification coefficient of the upper system [-], at least 1
        R_lower: response modification coefficient of the lower system [-], at least 1
    Returns
        the coefficient [-], the broadcast shape
    Raises
        ImpossibleValue: a value below 1
    Notes
        The upper part keeps its own coefficients in both cases. That Omega_0 and C_d go with R is from
        memory, and so are the exceptions: a rooftop structure of at most two stories and 10 % of the
        weight, another supported system of at most 10 % of the weight, detached light-frame dwellings.
    Example
        >>> print(lower_part_coefficient(upper=4.0, lower=5.0, R_upper=6.5, R_lower=5.0))
        5.0

    Reference
        rule combination_vertical: 7-16 12.2.3.1; 7-22 12.2.3.1
    """
    own = at_least(1, "R_lower", R_lower) < at_least(1, "R_upper", R_upper)
    return np.where(own, at_least(1, "lower", lower), at_least(1, "upper", upper))


@formula
def transferred_force_factor(R_upper: ArrayLike, R_lower: ArrayLike) -> Result:
    """Factor on the forces that the upper part of a vertical combination hands down to the lower part.

    R_upper/R_lower where the lower system has the lower R; else 1

    Parameters
        R_upper: response modification coefficient of the upper system [-], at least 1; any shape
        R_lower: response modification coefficient of the lower system [-], at least 1
    Returns
        the factor [-], at least 1, the broadcast shape
    Raises
        ImpossibleValue: a value below 1
    Notes
        The two-stage procedure has a factor of its own, with the redundancy factors in it.
    Example
        >>> print(transferred_force_factor(R_upper=6.5, R_lower=5.0))
        1.3

    Reference
        rule combination_vertical: 7-16 12.2.3.1; 7-22 12.2.3.1
    """
    return np.maximum(at_least(1, "R_upper", R_upper) / at_least(1, "R_lower", R_lower), 1.0)


@formula
def least_R(R_systems: ArrayLike) -> Result:
    """Response modification coefficient of several systems that act in one direction.

    R = the least of the systems

    Parameters
        R_systems: response modification coefficients of the systems [-], at least 1; a list of 1 to 1,000
    Returns
        R [-], one value
    Raises
        ImpossibleValue: a value below 1
    Notes
        Dual systems and shear wall-frame interactive systems have rows of their own in the table.
    Example
        >>> print(least_R(R_systems=[6.5, 5.0]))
        5.0

    Reference
        rule combination_horizontal: 7-16 12.2.3.3; 7-22 12.2.3.3
    """
    return np.float64(_systems("R_systems", R_systems).min())


@formula
def coefficient_of_least_R(coefficients: ArrayLike, R_systems: ArrayLike) -> Result:
    """Omega_0 or C_d of several systems that act in one direction.

    the coefficient of the system with the least R; of systems with equal R the larger one

    Parameters
        coefficients: Omega_0 or C_d of the systems [-], at least 1; a list as long as R_systems
        R_systems: response modification coefficients of the systems [-], at least 1; a list of 1 to 1,000
    Returns
        the coefficient [-], one value
    Raises
        ImpossibleValue: a value below 1. WrongType: lists of unequal length
    Notes
        The larger coefficient for a tie is a choice on the safe side, not printed.
    Example
        >>> print(coefficient_of_least_R(coefficients=[4.0, 3.5], R_systems=[6.5, 5.0]))
        3.5

    Reference
        rule combination_horizontal: 7-16 12.2.3.3; 7-22 12.2.3.3
    """
    R = _systems("R_systems", R_systems)
    coefficients = _systems("coefficients", coefficients)
    if coefficients.size != R.size:
        raise WrongType(
            "coefficients", f"{coefficients.size} values", f"must be one for each of {R.size} systems"
        )
    return np.float64(coefficients[agree(R, R.min())].max())


def _systems(name: str, values: ArrayLike) -> Array:
    return levels.counted(name, at_least(1, name, values), "systems")
