"""What is worked out of the entries before the package: entries that further entries stand for."""

from __future__ import annotations

from collections.abc import Callable
from typing import Final

from engine.building.records import Building

#: fills an entry from others, or returns the building as it is
Preparation = Callable[[Building], Building]

PREPARATIONS: Final[tuple[Preparation, ...]] = ()


def prepared(building: Building) -> Building:
    """Return the building with the entries that others stand for, in the order of the standard's flow."""
    for step in PREPARATIONS:
        building = step(building)
    return building
