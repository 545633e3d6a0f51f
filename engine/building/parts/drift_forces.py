"""Forces for drift alone, where they are asked for or the displacements go by them."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any, Final

from engine.building.drift_forces import drift_forces, of_displacements
from engine.building.records import DRIFT_BASES, Building
from engine.building.results import DirectionResult, Package

RULES: Final = ("drift_forces", "drift_period")


def solve(building: Building, package: Package, name: str, result: DirectionResult) -> Mapping[str, Any]:
    """Return the forces for drift, and those under which the displacements are computed."""
    usual = all(given.drift_basis == DRIFT_BASES[0] for given in building.direction.values())
    if usual and "drift_forces" not in building.parts:
        return {}
    known = {key: getattr(result, key) for key in ("T_a", "C_u", "T", "F_x", "V_x")}
    F_x, V_x = of_displacements(building, package, name, known)
    return {**drift_forces(building, package, name, known), "F_x_used": F_x, "V_x_used": V_x}
