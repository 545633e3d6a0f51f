"""Separation of every level in one direction, and displacements at the maximum considered earthquake."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any, Final

import numpy as np

from engine import separation
from engine.building.records import SEPARATION_ENTRIES, Building, level_values
from engine.building.results import DirectionResult, Package
from engine.require import Array

RULES: Final = ("delta_M", "delta_MT", "delta_MCE")
NO_GAP: Final = "-"


def solve(building: Building, package: Package, name: str, result: DirectionResult) -> Mapping[str, Any]:
    """Return the displacements, the least distances and the verdicts, where the part is asked for."""
    delta_max = _largest(building, name, result)
    if delta_max is None or not _asked(building):
        return {}
    given, I_e = building.direction[name], package.I_e
    delta_di = level_values(building, f"delta_di_{name}")
    delta_di = np.zeros_like(delta_max) if delta_di is None else delta_di
    delta_M = np.asarray(
        separation.largest_displacement(delta_max, delta_di, given.C_d, I_e, building.edition)
    )
    delta_MT = _least_distances(building, name, delta_M)
    return {
        "delta_M": delta_M,
        "delta_MT": delta_MT,
        "gap_status": tuple(map(_verdict, _entries(building, "gap", name), delta_MT)),
        "delta_MCE": separation.mce_displacement(delta_max, delta_di, given.R, I_e),
    }


def _asked(building: Building) -> bool:
    entered = (getattr(level, key) for level in building.level for key in SEPARATION_ENTRIES)
    return "separation" in building.parts or any(value is not None for value in entered)


def _largest(building: Building, name: str, result: DirectionResult) -> Array | None:
    """The largest displacements as entered; those of the centre of mass where none are."""
    given = level_values(building, f"delta_max_{name}")
    if given is not None:
        return given
    elastic = level_values(building, f"delta_xe_{name}") if result.delta_xe is None else result.delta_xe
    return None if elastic is None else np.abs(elastic)


def _entries(building: Building, key: str, name: str) -> list[float | None]:
    return [getattr(level, f"{key}_{name}") for level in building.level]


def _least_distances(building: Building, name: str, delta_M: Array) -> Array:
    """From another structure by both displacements, from a property line by the building's own."""
    others = _entries(building, "delta_M2", name)
    pairs = zip(delta_M, others, strict=True)
    return np.array(
        [own if two is None else float(separation.required_separation(own, two)) for own, two in pairs]
    )


def _verdict(gap: float | None, least: float) -> str:
    if gap is None:
        return NO_GAP
    words = str(separation.separation_verdict(gap, least))
    return f"✗ {words}" if words.startswith("too") else f"✓ {words}"
