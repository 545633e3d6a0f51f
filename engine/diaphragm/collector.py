"""Transfer forces added to a diaphragm (12.10.1.1), and the governing force of its collectors (12.10.2.1)."""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine.require import Array, Result, Words, agree, at_least, finite, formula, within, worded, yes

COLLECTOR_BOUNDS: Final = (
    "Omega_0 times the effect of the story forces, 12.8 or 12.9",
    "Omega_0 times the effect of Eq. 12.10-1",
    "the effect of Eq. 12.10-2, without Omega_0",
    "light-frame shear walls: the diaphragm design force, without Omega_0",
)


@formula
def total_force(
    F_px: ArrayLike, F_transfer: ArrayLike, rho: ArrayLike, Omega_0: ArrayLike, offset: str
) -> Result:
    """Diaphragm force with the forces transferred through it.

    F_px + rho F_transfer; F_px + Omega_0 F_transfer at an out-of-plane offset

    Parameters
        F_px: diaphragm design force of the level [kip or kN], at least 0; any shape
        F_transfer: force transferred from the vertical elements above to those below [kip or kN], at least 0
        rho: redundancy factor [-], 1 to 1.3
        Omega_0: overstrength factor [-], at least 1
        offset: "yes" where an out-of-plane offset (horizontal Type 4) causes the transfer, or "no"
    Returns
        the force [kip or kN], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range. NotApplicable: another word
    Notes
        The inertial part F_px takes neither factor.
    Example
        >>> given = {"F_px": 80, "F_transfer": 40, "rho": 1.3, "Omega_0": 2.5}
        >>> print(total_force(**given, offset="no"), total_force(**given, offset="yes"))
        132.0 180.0

    Reference
        rule F_px_transfer: 7-16 12.10.1.1; 7-22 12.10.1.1
    """
    rho, overstrength = within(1, 1.3, "rho", rho), at_least(1, "Omega_0", Omega_0)
    factor = np.where(yes("offset", offset), overstrength, rho)
    return at_least(0, "F_px", F_px) + factor * at_least(0, "F_transfer", F_transfer)


@formula
def collector_force(
    E_story: ArrayLike, E_sum: ArrayLike, E_low: ArrayLike, Omega_0: ArrayLike, light_frame: str
) -> Result:
    """Governing force of a collector in Seismic Design Category C to F.

    max(Omega_0 E_story, Omega_0 E_sum, E_low); within light-frame shear walls E_sum from E_low to 2 E_low

    Parameters
        E_story: collector force under the story forces of 12.8 or 12.9 [kip or kN], at least 0; any shape
        E_sum: collector force under the diaphragm forces of Eq. 12.10-1 [kip or kN], at least 0
        E_low: collector force under the diaphragm forces of Eq. 12.10-2 [kip or kN], at least 0
        Omega_0: overstrength factor [-], at least 1
        light_frame: "yes" for structures, or parts, braced by light-frame shear walls alone, or "no"
    Returns
        the force [kip or kN], magnitude, the broadcast shape
    Raises
        ImpossibleValue: a value outside its range. NotApplicable: another word
    Notes
        Transfer forces are to be part of each. The upper limit 12.10-3 is twice 12.10-2, hence 2 E_low.
    Example
        >>> print(collector_force(E_story=30, E_sum=34, E_low=40, Omega_0=2, light_frame="no"))
        68.0

    Reference
        rule collector: 7-16 12.10.2.1; 7-22 12.10.2.1
    """
    forces = _forces(E_story, E_sum, E_low, Omega_0)
    if yes("light_frame", light_frame):
        low = at_least(0, "E_low", E_low)
        return np.broadcast_to(np.clip(finite("E_sum", E_sum), low, 2 * low), forces[0].shape)
    return np.maximum(np.maximum(forces[0], forces[1]), forces[2])


@formula
def collector_bound(
    E_story: ArrayLike, E_sum: ArrayLike, E_low: ArrayLike, Omega_0: ArrayLike, light_frame: str
) -> Words:
    """Which of the forces governs a collector, in words.

    the force that is the largest; of equal ones the first

    Parameters
        E_story, E_sum, E_low, Omega_0, light_frame: as for the collector force
    Returns
        one of COLLECTOR_BOUNDS, or texts of the broadcast shape
    Raises
        ImpossibleValue: a value outside its range. NotApplicable: another word
    Example
        >>> collector_bound(E_story=30, E_sum=34, E_low=40, Omega_0=2, light_frame="no")
        'Omega_0 times the effect of Eq. 12.10-1'

    Reference
        rule collector: 7-16 12.10.2.1; 7-22 12.10.2.1
    """
    forces = _forces(E_story, E_sum, E_low, Omega_0)
    largest = np.maximum(np.maximum(forces[0], forces[1]), forces[2])
    governing = np.select([agree(force, largest) for force in forces], [0, 1, 2])
    return worded(COLLECTOR_BOUNDS, np.where(yes("light_frame", light_frame), 3, governing))


def _forces(E_story: ArrayLike, E_sum: ArrayLike, E_low: ArrayLike, Omega_0: ArrayLike) -> tuple[Array, ...]:
    overstrength = at_least(1, "Omega_0", Omega_0)
    story = overstrength * at_least(0, "E_story", E_story)
    total = overstrength * at_least(0, "E_sum", E_sum)
    return tuple(np.broadcast_arrays(story, total, at_least(0, "E_low", E_low)))
