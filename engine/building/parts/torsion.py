"""Torsion of every story: ratios of the edge drifts, accidental torsion, and inherent torsion."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any, Final

import numpy as np

from engine import irregularity, torsion, vertical
from engine.building.parts.findings import NO_TYPE, answer, design_category, entailed, signed
from engine.building.records import Building, level_values
from engine.building.results import DirectionResult, Package

RATIO_RULES: Final = ("TIR", "consequence")
STRUCTURE_RULES: Final = ("M_ta_scope",)
ACCIDENTAL_RULES: Final = ("A_x", "M_ta")
INHERENT_RULES: Final = ("M_t",)
FLEXIBLE: Final = "flexible"


def ratios(building: Building, package: Package, name: str, result: DirectionResult) -> Mapping[str, Any]:
    """Return the edge drifts, their ratios with the type, and the largest ratio that counts."""
    d_1, d_2 = (level_values(building, f"d_{edge}_{name}") for edge in (1, 2))
    if d_1 is None or d_2 is None:
        return {}
    h = package.h_x
    drift_1, drift_2 = (d - vertical.value_below(h, d, h) for d in (d_1, d_2))
    TIR = np.asarray(torsion.irregularity_ratio(drift_1, drift_2))
    flexible = building.site.diaphragms == FLEXIBLE
    TIR_max = 1.0 if flexible else float(TIR.max())
    given = (building.site.diaphragms, answer(building.direction[name].one_sided), building.edition)
    kind = str(irregularity.torsional_irregularity(TIR_max, *given))
    return {
        "Delta_1": drift_1,
        "Delta_2": drift_2,
        "TIR": TIR,
        "torsion_status": signed(irregularity.torsional_irregularity(TIR, *given)),
        "TIR_max": TIR_max,
        "torsion_type": kind,
        **entailed("torsion", _torsional(kind), building, package),
    }


def structure(building: Building, package: Package) -> Mapping[str, Any]:
    """Return the largest ratio of both directions, and where accidental torsion counts."""
    found = [result.more["TIR_max"] for result in package.direction.values() if "TIR_max" in result.more]
    SDC = design_category(building, package)
    if not found:
        return {}
    TIR = max(found)
    scope = {} if SDC is None else {"M_ta_scope": torsion.accidental_scope(TIR, SDC, building.edition)}
    return {"TIR_building": TIR, **scope}


def accidental(building: Building, package: Package, name: str, result: DirectionResult) -> Mapping[str, Any]:
    """Return the amplification and the accidental torsion of every level."""
    L, SDC = level_values(building, f"L_perp_{name}"), design_category(building, package)
    d_1, d_2 = (level_values(building, f"d_{edge}_{name}") for edge in (1, 2))
    if L is None or SDC is None or d_1 is None or d_2 is None:
        return {}
    d_max, d_avg = np.maximum(np.abs(d_1), np.abs(d_2)), np.abs(d_1 + d_2) / 2
    A_x = torsion.applied_amplification(d_max, d_avg, package.more["TIR_building"], SDC)
    return {
        "e_acc": torsion.accidental_eccentricity(L),
        "d_max": d_max,
        "d_avg": d_avg,
        "A_x_full": torsion.amplification(d_max, d_avg),
        "A_x": A_x,
        "M_ta": torsion.accidental_moment(package.h_x, result.F_x, L, A_x, package.h_x),
    }


def inherent(building: Building, package: Package, name: str, result: DirectionResult) -> Mapping[str, Any]:
    """Return the eccentricities and the inherent torsion of every story."""
    x_M, x_R = (level_values(building, f"{key}_{name}") for key in ("x_M", "x_R"))
    if x_M is None or x_R is None:
        return {}
    h = package.h_x
    return {
        "e": torsion.inherent_eccentricity(x_M, x_R),
        "M_t": torsion.inherent_moment(h, x_R, result.F_x, x_M, h),
    }


def _torsional(kind: str) -> str:
    """The row of the table of consequences that a type of torsion stands in, "none" if in none."""
    if not kind.startswith("Type"):
        return NO_TYPE
    return "extreme torsional" if "extreme" in kind or "above 1.4" in kind else "torsional"
