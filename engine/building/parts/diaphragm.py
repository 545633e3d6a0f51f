"""Diaphragms of every level: design, transfer and collector forces, and how flexible they are."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any, Final

import numpy as np

from engine import diaphragm
from engine.building.parts.findings import answer
from engine.building.records import Building, level_values
from engine.building.results import DirectionResult, Package, texts
from engine.require import Array

RULES: Final = ("F_px", "F_px_min", "F_px_max")
TRANSFER_RULES: Final = ("F_px_transfer",)
COLLECTOR_RULES: Final = ("collector",)
FLEXIBILITY_RULES: Final = ("flexible_diaphragm",)


def tributary_weights(building: Building, package: Package) -> Array:
    """Return w_px, the weight of the level where it is not given."""
    given = level_values(building, "w_px")
    return package.w_x if given is None else given


def solve(building: Building, package: Package, name: str, result: DirectionResult) -> Mapping[str, Any]:
    """Return the forces with both limits."""
    w, h, F = package.w_x, package.h_x, result.F_x
    w_px = tributary_weights(building, package)
    S_DS, I_e = building.site.S_DS, package.I_e
    return {
        "F_px_unlimited": diaphragm.unlimited_force(w_px, h, F, w, h),
        "F_px_min": diaphragm.minimum_force(w_px, S_DS, I_e),
        "F_px_max": diaphragm.maximum_force(w_px, S_DS, I_e),
        "F_px": diaphragm.design_force(w_px, h, F, w, h, S_DS, I_e),
        "F_px_bound": texts(diaphragm.design_force_bound(w_px, h, F, w, h, S_DS, I_e)),
    }


def transfer(building: Building, package: Package, name: str, result: DirectionResult) -> Mapping[str, Any]:
    """Return the diaphragm forces with the transfer forces, where any is given or the part is asked for."""
    rows = [
        (getattr(level, f"F_transfer_{name}"), getattr(level, f"offset_{name}")) for level in building.level
    ]
    if "transfer" not in building.parts and all(row == (None, None) for row in rows):
        return {}
    given = building.direction[name]
    forces = [
        float(diaphragm.total_force(F_px, F or 0.0, given.rho, given.Omega_0, offset or "no"))
        for F_px, (F, offset) in zip(result.more["F_px"].tolist(), rows, strict=True)
    ]
    return {"F_px_transfer": np.array(forces)}


def collectors(building: Building, package: Package, name: str, result: DirectionResult) -> Mapping[str, Any]:
    """Return the collector forces and which effect governs, where the effects are given."""
    effects = [level_values(building, f"{key}_{name}") for key in ("E_story", "E_sum", "E_low")]
    if any(effect is None for effect in effects):
        return {}
    given = building.direction[name]
    case = *effects, given.Omega_0, answer(given.light_frame)
    return {
        "F_collector": diaphragm.collector_force(*case),  # type: ignore[arg-type]
        "collector_governs": texts(diaphragm.collector_bound(*case)),  # type: ignore[arg-type]
    }


def flexibility(
    building: Building, package: Package, name: str, result: DirectionResult
) -> Mapping[str, Any]:
    """Return deflection over drift, and whether that makes the diaphragm flexible."""
    deflection, drift = (level_values(building, f"{key}_{name}") for key in ("delta_MDD", "Delta_ADVE"))
    if deflection is None or drift is None:
        return {}
    return {
        "flex_ratio": diaphragm.flexibility_ratio(deflection, drift),
        "flex_status": texts(diaphragm.flexibility(deflection, drift)),
    }
