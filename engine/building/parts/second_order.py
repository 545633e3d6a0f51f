"""Drift along the edges where it is due, and stability of every story under the drift that counts."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any, Final

import numpy as np

from engine import drift, stability
from engine.building.parts.findings import design_category
from engine.building.records import Building, level_label, level_values
from engine.building.results import DirectionResult, Package, texts
from engine.errors import ImpossibleValue
from engine.require import Array
from engine.units import DISPLACEMENT_PER_LENGTH

EDGE_RULES: Final = ("edge_drift",)


def edges(building: Building, package: Package, name: str, result: DirectionResult) -> Mapping[str, Any]:
    """Return the drifts of the edges and the one that counts, where the part is asked for."""
    SDC, TIR = design_category(building, package), package.more.get("TIR_building")
    if "edge_drift" not in building.parts or SDC is None or TIR is None or result.Delta is None:
        return {}
    C_d, more = building.direction[name].C_d, result.more
    one, two = (drift.amplified_deflection(more[f"Delta_{n}"], C_d, package.I_e) for n in (1, 2))
    due = str(drift.edges_due(TIR, SDC))
    return {
        "Delta_edge_1": one,
        "Delta_edge_2": two,
        "Delta_checked": np.asarray(drift.drift_to_check(result.Delta, one, two, due)),
    }


def due(building: Building, package: Package) -> Mapping[str, Any]:
    """Return whether the drift is taken along the edges."""
    SDC, TIR = design_category(building, package), package.more.get("TIR_building")
    if "edge_drift" not in building.parts or SDC is None or TIR is None:
        return {}
    return {"edges_due": str(drift.edges_due(TIR, SDC))}


def solve(building: Building, package: Package, name: str, result: DirectionResult) -> Mapping[str, Any]:
    """Return the stability coefficients and the drifts that they amplify, where vertical loads are given.

    The story shears are those of the forces under which the displacements are computed.
    """
    if result.Delta is None:
        return {}
    Delta: Array = result.more.get("Delta_checked", result.Delta)
    P_x = level_values(building, "P_x")
    if P_x is None:
        return {"drift_over_limit": Delta / result.Delta_a}
    V_x: Array = result.more.get("V_x_used", result.V_x)
    _refuse_where(building, "V_x", V_x, V_x <= 0, "must be above 0 for a stability coefficient")
    h_sx = package.h_sx * DISPLACEMENT_PER_LENGTH[building.units]
    C_d = building.direction[name].C_d
    theta = np.asarray(stability.stability_coefficient(P_x, Delta, package.I_e, V_x, h_sx, C_d))
    _refuse_where(building, "theta", theta, theta >= 1, "must be below 1: the story is unstable")
    factor = stability.second_order_factor(theta)
    return {
        "theta": theta,
        "theta_factor": factor,
        "theta_verdict": texts(stability.stability_verdict(theta, result.theta_max)),
        "Delta_amplified": Delta * factor,
        "drift_over_limit": Delta * factor / result.Delta_a,
    }


def _refuse_where(building: Building, symbol: str, values: Array, bad: Any, allowed: str) -> None:
    for place in np.flatnonzero(bad):
        label = level_label(int(place) + 1, building.level[place].name)
        raise ImpossibleValue(f"{label}: {symbol}", float(values[place]), allowed)
