"""Periods: each approximate one whose entries are given, the computed ones, and which of all governs."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any, Final

import numpy as np

from engine import dynamics, period
from engine.building import periods
from engine.building.records import Building
from engine.building.results import DirectionResult, Package

WALL_RULES: Final = ("C_w", "T_a_walls")
APPROXIMATE_RULES: Final = ("T_a", "T_a_stories")
RAYLEIGH_RULES: Final = ("T_rayleigh",)
MODE_RULES: Final = ("modes",)
GOVERNING_RULES: Final = ("T_max",)
NO_COMPUTED: Final = "approximate period T_a: none is computed"


def walls(building: Building, package: Package) -> Mapping[str, Any]:
    """Return the share of C_w of each wall as listed, where walls and the area of the base are given."""
    A_B, h_n = building.site.A_B, package.h_n
    if A_B is None or not building.wall:
        return {}
    shares = [float(period.wall_ratio(A_B, h_n, [row.area], [row.length])) for row in building.wall]
    return {"C_w_wall": np.array(shares)}


def approximate(
    building: Building, package: Package, name: str, result: DirectionResult
) -> Mapping[str, Any]:
    """Return the approximate period by the height, what the other formulas need, and the one chosen."""
    if not _asked(building):
        return {}
    given, h_n = building.direction[name], package.h_n
    C_w = periods.wall_ratio(building, name, h_n)
    chosen = {periods.BY_STORIES: "T_a_stories", periods.BY_WALLS: "T_a_walls"}.get(given.T_a_rule)
    return {
        "T_a_height": float(period.approximate_period(h_n, given.period_system, building.units)),
        "stories_status": _status(building, name, h_n),
        **({} if C_w is None else {"C_w": C_w}),
        **({chosen: result.T_a} if chosen else {}),
    }


def rayleigh(building: Building, package: Package, name: str, result: DirectionResult) -> Mapping[str, Any]:
    """Return the period by Rayleigh's quotient, where forces and displacements are given."""
    T = periods.rayleigh(building, name)
    return {} if T is None else {"T_rayleigh": T}


def first_mode(building: Building, package: Package, name: str, result: DirectionResult) -> Mapping[str, Any]:
    """Return the period of the first mode and the part of the weight that moves in it, where asked for."""
    model = periods.stiffness_model(building, name)
    chosen = building.direction[name].T_source == periods.STIFFNESS
    if model is None or not (chosen or "stiffness_period" in building.parts):
        return {}
    return {
        "T_stiffness": float(dynamics.mode_period(1, *model, building.units)),
        "first_mode_share": float(dynamics.mode_weight_share(1, *model)),
    }


def governing(building: Building, package: Package, name: str, result: DirectionResult) -> Mapping[str, Any]:
    """Return the computed period that is used, and in words which one governs."""
    if not _asked(building):
        return {}
    if (T := building.direction[name].T_computed) is None:
        return {"T_calculated": result.T_a, "T_governs": NO_COMPUTED}
    return {"T_calculated": T, "T_governs": str(period.period_bound(result.T_a, result.C_u, T))}


def _asked(building: Building) -> bool:
    usual = periods.BY_HEIGHT, periods.ENTERED
    choices = ((given.T_a_rule, given.T_source) for given in building.direction.values())
    return "periods" in building.parts or any(choice != usual for choice in choices)


def _status(building: Building, name: str, h_n: float) -> str:
    if building.direction[name].T_a_rule != periods.BY_STORIES:
        return "✓ not used"
    status = periods.stories_status(building, name, h_n)
    return f"✓ {status}" if status == periods.PERMITTED else f"✗ {status}"
