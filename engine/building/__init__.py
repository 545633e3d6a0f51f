"""The model route: inputs of one building in, the whole equivalent lateral force package out."""

from __future__ import annotations

from engine.building.reading import from_mapping, to_mapping
from engine.building.records import DIRECTIONS, Building, Direction, Level, Site
from engine.building.results import DirectionResult, Package
from engine.building.solve import solve

__all__ = [
    "DIRECTIONS",
    "Building",
    "Direction",
    "DirectionResult",
    "Level",
    "Package",
    "Site",
    "from_mapping",
    "solve",
    "to_mapping",
]
