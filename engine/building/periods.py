"""Periods of one direction: the approximate one by the formula chosen, the computed one by its source."""

from __future__ import annotations

from typing import Final

import numpy as np

from engine import dynamics, period
from engine.building.records import Building, level_values
from engine.building.weights import level_weights
from engine.errors import MissingValue
from engine.require import Array

BY_HEIGHT, BY_STORIES, BY_WALLS = period.PERIOD_FORMULAS
ENTERED, RAYLEIGH, STIFFNESS = period.PERIOD_SOURCES
PERMITTED: Final = "permitted"


def approximate(building: Building, name: str, h_n: float) -> float:
    """Return T_a [s] by the formula chosen for the direction."""
    given = building.direction[name]
    if given.T_a_rule == BY_STORIES:
        return float(period.approximate_period_stories(stories(building)))
    if given.T_a_rule == BY_WALLS:
        if (C_w := wall_ratio(building, name, h_n)) is None:
            raise MissingValue(
                "wall", None, f"must have rows, and site.A_B a value, for T_a of direction {name}"
            )
        return float(period.wall_period(h_n, C_w, building.units))
    return float(period.approximate_period(h_n, given.period_system, building.units))


def stories(building: Building) -> float:
    """Return the number of stories above the base, as entered."""
    if building.site.N is None:
        raise MissingValue("site.N", None, f"must be given where T_a_rule is {BY_STORIES}")
    return float(building.site.N)


def stories_status(building: Building, name: str, h_n: float) -> str:
    """Return whether the number of stories may give the approximate period, in words."""
    frames = "yes" if building.direction[name].period_system in period.MOMENT_FRAMES else "no"
    return str(period.stories_formula_status(stories(building), h_n, frames, building.units))


def wall_ratio(building: Building, name: str, h_n: float) -> float | None:
    """Return C_w of the walls of a direction, 0 if it has none; ``None`` without walls or base area."""
    A_B, walls = building.site.A_B, [row for row in building.wall if row.direction == name]
    if A_B is None or not building.wall:
        return None
    if not walls:
        return 0.0
    areas, lengths = [row.area for row in walls], [row.length for row in walls]
    return float(period.wall_ratio(A_B, h_n, areas, lengths))


def rayleigh(building: Building, name: str) -> float | None:
    """Return the period [s] from the displacements under the forces beside them, where they are given."""
    f_x, delta_f = (level_values(building, f"{key}_{name}") for key in ("f_x", "delta_f"))
    if f_x is None or delta_f is None:
        return None
    return float(period.rayleigh_period(level_weights(building), f_x, delta_f, building.units))


def stiffness_model(building: Building, name: str) -> tuple[Array, Array, Array] | None:
    """Return weights, story stiffnesses and heights of all levels, where the stiffnesses are given."""
    if (K_x := level_values(building, f"K_x_{name}")) is None:
        return None
    base = building.site.base_elevation
    return level_weights(building), K_x, np.array([level.elevation - base for level in building.level])


def first_mode(building: Building, name: str) -> float | None:
    """Return the period [s] of the first mode of the story stiffnesses, where they are given."""
    model = stiffness_model(building, name)
    return None if model is None else float(dynamics.mode_period(1, *model, building.units))


def computed(building: Building, name: str) -> float | None:
    """Return the computed period [s] from the source of the direction, ``None`` where none is entered."""
    given = building.direction[name]
    if given.T_source == ENTERED:
        return given.T_computed
    finders = {RAYLEIGH: (rayleigh, f"f_x_{name} and delta_f_{name}"), STIFFNESS: (first_mode, f"K_x_{name}")}
    find, entries = finders[given.T_source]
    if (T := find(building, name)) is None:
        raise MissingValue(f"level: {entries}", None, f"must be given where T_source is {given.T_source}")
    return T


def doubts(building: Building, h_n: float) -> list[str]:
    """Say in words where T_a is taken from the number of stories although that is not permitted."""
    return [
        f"direction {name}: T_a = 0.1 N {status}"
        for name, given in building.direction.items()
        if given.T_a_rule == BY_STORIES and (status := stories_status(building, name, h_n)) != PERMITTED
    ]
