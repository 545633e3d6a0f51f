"""Irregularities over the stories and in plan, with their types and what they entail."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any, Final

from engine import irregularity as rules
from engine.building.parts.findings import (
    NO_TYPE,
    answer,
    design_category,
    entailed,
    excepted,
    signed,
    worst,
)
from engine.building.records import Building, level_values
from engine.building.results import DirectionResult, Package

STORY_RULES: Final = ("soft_story", "weak_story", "geometric", "judged_irregularity", "consequence")
BUILDING_RULES: Final = (
    *("weight_irregularity", "reentrant", "diaphragm_discontinuity", "judged_irregularity", "consequence"),
)
SOFT: Final = ("extreme soft story", "soft story")
WEAK: Final = ("extreme weak story", "weak story")
REENTRANT, DIAPHRAGM, GEOMETRIC, WEIGHT = (
    *("re-entrant corner", "diaphragm discontinuity", "geometric", "weight"),
)
OUT_OF_PLANE, NONPARALLEL, IN_PLANE = rules.JUDGED


def stories(building: Building, package: Package, name: str, result: DirectionResult) -> Mapping[str, Any]:
    """Return ratios, types and consequences of one direction, each where its entries are given."""
    found = {
        **_soft(building, package, name),
        **_weak(building, package, name),
        **_geometric(building, package, name),
    }
    exists = building.direction[name].in_plane_discontinuity
    return found | _judged("in_plane", IN_PLANE, exists, building, package)


def whole(building: Building, package: Package) -> Mapping[str, Any]:
    """Return the types that hold for the building, and what they entail."""
    site = building.site
    return {
        **_weight(building, package),
        **_reentrant(building, package),
        **_diaphragm(building, package),
        **_judged("out_of_plane", OUT_OF_PLANE, site.out_of_plane_offset, building, package),
        **_judged("nonparallel", NONPARALLEL, site.nonparallel_system, building, package),
    }


def _soft(building: Building, package: Package, name: str) -> dict[str, Any]:
    K, h, SDC = level_values(building, f"K_x_{name}"), package.h_x, design_category(building, package)
    if K is None or SDC is None:
        return {}
    free = (excepted(building, package), SDC, building.edition)
    verdicts = rules.soft_story(h, K, h, *free)
    kind = worst(verdicts, *SOFT)
    return {
        "soft_ratio": rules.stiffness_ratio(h, K, h),
        "soft_ratio_three": rules.stiffness_ratio_of_three(h, K, h),
        "soft_status": signed(verdicts),
        "soft_type": kind,
        **entailed("soft", kind, building, package),
    }


def _weak(building: Building, package: Package, name: str) -> dict[str, Any]:
    strengths, h = level_values(building, f"strength_{name}"), package.h_x
    if strengths is None:
        return {}
    verdicts = rules.weak_story(h, strengths, h, building.edition)
    kind = worst(verdicts, *WEAK)
    return {
        "weak_ratio": rules.strength_ratio(h, strengths, h),
        "weak_status": signed(verdicts),
        "weak_type": kind,
        **entailed("weak", kind, building, package),
    }


def _geometric(building: Building, package: Package, name: str) -> dict[str, Any]:
    L, h = level_values(building, f"L_sys_{name}"), package.h_x
    if L is None:
        return {}
    verdicts = rules.geometric_irregularity(h, L, h, building.edition)
    kind = worst(verdicts, GEOMETRIC)
    return {
        "geometric_ratio": rules.dimension_ratio(h, L, h),
        "geometric_status": signed(verdicts),
        "geometric_type": kind,
        **entailed("geometric", kind, building, package),
    }


def _weight(building: Building, package: Package) -> dict[str, Any]:
    SDC, w, h = design_category(building, package), package.w_x, package.h_x
    if SDC is None:
        return {}
    free = (excepted(building, package), SDC, building.edition)
    verdicts = rules.weight_irregularity(h, w, h, *free)
    kind = worst(verdicts, WEIGHT)
    return {
        "weight_ratio": rules.weight_ratio(h, w, h),
        "weight_status": signed(verdicts),
        "weight_type": kind,
        **entailed("weight", kind, building, package),
    }


def _reentrant(building: Building, package: Package) -> dict[str, Any]:
    ratio = building.site.reentrant_ratio
    if ratio is None:
        return {}
    verdict = str(rules.reentrant_irregularity(ratio, building.edition))
    return _plan("reentrant", REENTRANT, verdict, building, package)


def _diaphragm(building: Building, package: Package) -> dict[str, Any]:
    opening, change = building.site.diaphragm_opening, building.site.diaphragm_change
    if opening is None or change is None:
        return {}
    verdict = str(rules.diaphragm_irregularity(opening, change, building.edition))
    return _plan("discontinuity", DIAPHRAGM, verdict, building, package)


def _judged(key: str, kind: str, exists: bool | None, building: Building, package: Package) -> dict[str, Any]:
    if exists is None:
        return {}
    verdict = str(rules.judged_irregularity(kind, answer(exists), building.edition))
    return _plan(key, kind, verdict, building, package)


def _plan(key: str, kind: str, verdict: str, building: Building, package: Package) -> dict[str, Any]:
    found = kind if verdict.startswith("Type") else NO_TYPE
    return {f"{key}_status": signed(verdict)[0], **entailed(key, found, building, package)}
