"""What is worked out of the entries before the package: entries that further entries stand for."""

from __future__ import annotations

from collections.abc import Callable
from copy import copy
from dataclasses import replace
from typing import Any, Final

from engine import hazard
from engine.building import periods
from engine.building.parts import ground_motion, multi_period
from engine.building.records import Building

#: fills an entry from others, or returns the building as it is
Preparation = Callable[[Building], Building]


def mapped_motion(building: Building) -> Building:
    """Fill S_DS and S_D1 from S_MS and S_M1, those given or those of the site class."""
    S_MS, S_M1 = ground_motion.mce_parameters(building.site)
    if S_MS is None or S_M1 is None:
        return building
    S_DS = float(hazard.design_parameter_short(S_MS))
    S_D1 = float(hazard.design_parameter_one_second(S_M1))
    return filled(building, site=replace(building.site, S_DS=S_DS, S_D1=S_D1, S_MS=S_MS, S_M1=S_M1))


def spectrum_motion(building: Building) -> Building:
    """Fill S_DS and S_D1 from the rows of a spectrum."""
    if not building.multi_period:
        return building
    S_DS, S_D1 = multi_period.design_parameters(building)
    return filled(building, site=replace(building.site, S_DS=S_DS, S_D1=S_D1))


def computed_periods(building: Building) -> Building:
    """Put in the computed period of each direction that takes it from the levels."""
    found = {
        name: replace(given, T_computed=periods.computed(building, name))
        for name, given in building.direction.items()
    }
    return filled(building, direction=found)


def filled(building: Building, **values: Any) -> Building:
    """Return a copy with other values, without the checks: those speak of entries."""
    result = copy(building)
    for key, value in values.items():
        object.__setattr__(result, key, value)
    return result


PREPARATIONS: Final[tuple[Preparation, ...]] = (mapped_motion, spectrum_motion, computed_periods)


def prepared(building: Building) -> Building:
    """Return the building with the entries that others stand for, in the order of the standard's flow."""
    for step in PREPARATIONS:
        building = step(building)
    return building
