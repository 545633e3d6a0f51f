"""Parts of the package beside the core: each adds results by their symbols, where its inputs are given."""

from __future__ import annotations

from collections.abc import Callable, Mapping
from dataclasses import replace
from typing import Any, Final

from engine.building.parts import (
    category,
    diaphragm,
    diaphragm_procedures,
    drift_forces,
    drift_ratios,
    ground_motion,
    irregularity,
    load_effects,
    modal,
    multi_period,
    periods,
    redundancy,
    second_order,
    separation,
    short_building,
    spectrum,
    systems,
    torsion,
    two_stage,
    weights,
)
from engine.building.records import Building
from engine.building.results import DirectionResult, Package

#: takes building, package, direction, its results so far; returns more of them, none without inputs
DirectionPart = Callable[[Building, Package, str, DirectionResult], Mapping[str, Any]]
#: the same for results that both directions share
BuildingPart = Callable[[Building, Package], Mapping[str, Any]]
Step = Callable[[Building, Package], Package]


def with_parts(building: Building, package: Package) -> Package:
    """Return the package with the results of every part whose inputs the building has."""
    for step in STEPS:
        package = step(building, package)
    return package


def _each_direction(solve: DirectionPart, rules: tuple[str, ...]) -> Step:
    """Make the step of a part that works on one direction at a time."""

    def step(building: Building, package: Package) -> Package:
        found = {name: solve(building, package, name, result) for name, result in package.direction.items()}
        if not any(found.values()):
            return package
        results = {
            name: replace(result, more={**result.more, **found[name]})
            for name, result in package.direction.items()
        }
        return replace(package, direction=results, rules=_joined(package.rules, rules))

    return step


def _completing_each_direction(solve: DirectionPart) -> Step:
    """Make the step that fills in fields of the core which wait for results of parts."""

    def step(building: Building, package: Package) -> Package:
        results = {
            name: replace(result, **solve(building, package, name, result))
            for name, result in package.direction.items()
        }
        return replace(package, direction=results)

    return step


def _whole_building(solve: BuildingPart, rules: tuple[str, ...]) -> Step:
    """Make the step of a part whose results hold for the building."""

    def step(building: Building, package: Package) -> Package:
        if not (found := solve(building, package)):
            return package
        return replace(package, more={**package.more, **found}, rules=_joined(package.rules, rules))

    return step


def _joined(rules: tuple[str, ...], more: tuple[str, ...]) -> tuple[str, ...]:
    return tuple(dict.fromkeys((*rules, *more)))


#: in the order of the standard's flow: a step finds the results of those before it in the package
STEPS: Final[tuple[Step, ...]] = (
    _whole_building(weights.solve, weights.RULES),
    _whole_building(periods.walls, periods.WALL_RULES),
    _each_direction(periods.approximate, periods.APPROXIMATE_RULES),
    _each_direction(periods.rayleigh, periods.RAYLEIGH_RULES),
    _each_direction(periods.first_mode, periods.MODE_RULES),
    _each_direction(periods.governing, periods.GOVERNING_RULES),
    _whole_building(ground_motion.solve, ground_motion.RULES),
    _each_direction(ground_motion.increase, ground_motion.INCREASE_RULES),
    _whole_building(multi_period.solve, multi_period.RULES),
    _each_direction(multi_period.solve_direction, multi_period.METHOD_RULES),
    _each_direction(short_building.solve, short_building.RULES),
    _each_direction(drift_forces.solve, drift_forces.RULES),
    _each_direction(category.conditions, category.RULES),
    _whole_building(category.solve, category.RULES),
    _each_direction(systems.solve, systems.RULES),
    _whole_building(systems.listed, systems.RULES),
    _each_direction(systems.combinations, systems.COMBINATION_RULES),
    _whole_building(spectrum.solve, spectrum.RULES),
    _each_direction(spectrum.solve_direction, spectrum.RULES),
    _each_direction(torsion.ratios, torsion.RATIO_RULES),
    _whole_building(torsion.structure, torsion.STRUCTURE_RULES),
    _whole_building(second_order.due, second_order.EDGE_RULES),
    _each_direction(second_order.edges, second_order.EDGE_RULES),
    _completing_each_direction(second_order.solve),
    _each_direction(separation.solve, separation.RULES),
    _each_direction(torsion.accidental, torsion.ACCIDENTAL_RULES),
    _each_direction(torsion.inherent, torsion.INHERENT_RULES),
    _each_direction(drift_ratios.solve, drift_ratios.RULES),
    _whole_building(drift_ratios.whole, drift_ratios.RULES),
    _each_direction(irregularity.stories, irregularity.STORY_RULES),
    _whole_building(irregularity.whole, irregularity.BUILDING_RULES),
    _each_direction(redundancy.solve, redundancy.RULES),
    _each_direction(diaphragm.solve, diaphragm.RULES),
    _each_direction(diaphragm.transfer, diaphragm.TRANSFER_RULES),
    _each_direction(diaphragm.collectors, diaphragm.COLLECTOR_RULES),
    _each_direction(diaphragm.flexibility, diaphragm.FLEXIBILITY_RULES),
    _each_direction(diaphragm_procedures.alternative, diaphragm_procedures.ALTERNATIVE_RULES),
    _each_direction(diaphragm_procedures.one_story, diaphragm_procedures.ONE_STORY_RULES),
    _whole_building(diaphragm_procedures.walls, diaphragm_procedures.WALL_RULES),
    _whole_building(two_stage.whole, two_stage.RULES),
    _each_direction(two_stage.solve, two_stage.RULES),
    _whole_building(load_effects.solve, load_effects.RULES),
    _whole_building(modal.whole, modal.RULES),
    _each_direction(modal.solve, (*modal.RULES, *modal.SCALING_RULES)),
)
