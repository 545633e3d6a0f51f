"""Drifts and stability of one direction against their limits."""

from __future__ import annotations

from typing import Any

import numpy as np

from engine import drift, dynamics, stability, vertical
from engine.building.records import STIFFNESS_ROUTE, Building, Direction, level_values
from engine.building.results import Package
from engine.require import Array
from engine.units import DISPLACEMENT_PER_LENGTH


def limits(building: Building, package: Package, given: Direction) -> dict[str, Any]:
    """Return the allowable drifts, and the limit of the stability coefficient."""
    rho = given.rho if given.moment_frames_only else 1.0
    beta = float(stability.demand_ratio(given.beta, given.Omega_0, building.edition))
    allowable = drift.allowable_drift(package.h_sx, given.drift_structure, building.site.risk_category, rho)
    return {
        "Delta_a": allowable * DISPLACEMENT_PER_LENGTH[building.units],
        "beta_used": beta,
        "theta_max": float(stability.stability_limit(given.C_d, beta)),
    }


def drifts(building: Building, package: Package, name: str, F_x: Array) -> dict[str, Any]:
    """Return the design story drifts, where displacements are given or story stiffness gives them."""
    given, h = building.direction[name], package.h_x
    computed = _from_stiffness(building, h, name, F_x)
    elastic = level_values(building, f"delta_xe_{name}") if computed is None else computed
    if elastic is None:
        return {}
    lower = vertical.value_below(h, elastic, h)
    Delta = drift.design_story_drift(elastic, lower, given.C_d, package.I_e)
    return {
        **({} if computed is None else {"delta_xe": computed}),
        "delta_x": drift.amplified_deflection(elastic, given.C_d, package.I_e),
        "Delta": Delta,
        "drift_ratio": Delta / (package.h_sx * DISPLACEMENT_PER_LENGTH[building.units]),
    }


def _from_stiffness(building: Building, h: Array, name: str, F_x: Array) -> Array | None:
    """Return the elastic displacements of the shear building, where its part is asked for."""
    K_x = level_values(building, f"K_x_{name}")
    if STIFFNESS_ROUTE not in building.parts or K_x is None:
        return None
    return np.asarray(dynamics.elastic_displacement(h, F_x, K_x, h))
