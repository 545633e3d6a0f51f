"""Parts of the package beside the core: each adds results by their symbols, where its inputs are given."""

from __future__ import annotations

from collections.abc import Callable, Mapping
from dataclasses import replace
from typing import Any, Final

from engine.building.parts import diaphragm
from engine.building.records import Building
from engine.building.results import DirectionResult, Package

#: takes building, package, direction, its results so far; returns more of them, none without inputs
DirectionPart = Callable[[Building, Package, str, DirectionResult], Mapping[str, Any]]
#: the same for results that both directions share, after those of the directions
BuildingPart = Callable[[Building, Package], Mapping[str, Any]]

DIRECTION_PARTS: Final[tuple[tuple[DirectionPart, tuple[str, ...]], ...]] = (
    (diaphragm.solve, diaphragm.RULES),
)
BUILDING_PARTS: Final[tuple[tuple[BuildingPart, tuple[str, ...]], ...]] = ()


def with_parts(building: Building, package: Package) -> Package:
    """Return the package with the results of every part whose inputs the building has."""
    for solve, rules in DIRECTION_PARTS:
        found = {name: solve(building, package, name, result) for name, result in package.direction.items()}
        if any(found.values()):
            results = {
                name: replace(result, more={**result.more, **found[name]})
                for name, result in package.direction.items()
            }
            package = replace(package, direction=results, rules=(*package.rules, *rules))
    for solve_all, rules in BUILDING_PARTS:
        if more := solve_all(building, package):
            package = replace(package, more={**package.more, **more}, rules=(*package.rules, *rules))
    return package
