"""Computed period of a building from its own forces and displacements: Rayleigh's quotient."""

from __future__ import annotations

from math import pi

import numpy as np
from numpy.typing import ArrayLike

from engine import levels
from engine.errors import ImpossibleValue
from engine.require import Array, Result, at_least, choice, formula
from engine.units import GRAVITY, SYSTEMS


@formula
def rayleigh_period(weights: ArrayLike, forces: ArrayLike, displacements: ArrayLike, units: str) -> Result:
    """Fundamental period from the displacements under lateral forces.

    T = 2 pi sqrt(sum(w_i delta_i^2)/(g sum(F_i delta_i)))

    Parameters
        weights: weights of the levels [kip or kN], at least 0, one above 0; shape (..., n), n 1 to 1,000
        forces: lateral forces on the levels [kip or kN], at least 0; shape (..., n)
        displacements: elastic displacements under these forces [in or mm], at least 0; shape (..., n)
        units: "us" (displacements in in) or "si" (in mm)
    Returns
        T [s], the shape of the leading axes
    Raises
        ImpossibleValue: a value below 0; displacements or forces that do no work.
        NotApplicable: unknown units
    Notes
        A computed period for 12.8.2, to be capped by C_u T_a for strength. Under any forces it is at most
        the true first period of the same elastic model; under the inertia forces of the first mode it is
        that period.
        A displacement against the forces is refused: the shape would not be that of the first mode.
    Example
        >>> print(rayleigh_period(weights=[100.0], forces=[10.0], displacements=[0.5], units="us"))
        0.7150

    Reference
        rule T_rayleigh: 7-16 12.8.2; 7-22 12.8.2
    """
    w = levels.checked_count("weights", at_least(0, "weights", weights))
    F, delta = _beside("forces", forces, w), _beside("displacements", displacements, w)
    work, kinetic = levels.total(F * delta), levels.total(w * delta**2)
    if not ((work > 0) & (kinetic > 0)).all():
        raise ImpossibleValue(
            "displacements", "without work", "must move a force and a weight at one level at least"
        )
    return 2.0 * pi * np.sqrt(kinetic / (GRAVITY[choice("units", units, SYSTEMS)] * work))


def _beside(name: str, values: ArrayLike, weights: Array) -> Array:
    return levels.per_level(name, at_least(0, name, values), weights)
