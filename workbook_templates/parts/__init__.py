"""The parts of the workbook as data, one module each, in the order in which they stand in it."""

from __future__ import annotations

from collections.abc import Iterable
from types import MappingProxyType
from typing import Final

from workbook_templates.declare import Part
from workbook_templates.parts import (
    anchorage,
    category,
    cross_check,
    diaphragm,
    diaphragm_forces,
    diaphragm_procedures,
    drift,
    drift_forces,
    drift_ratios,
    edge_drift,
    ground_motion,
    irregularity,
    load_effects,
    modal,
    multi_period,
    period_sources,
    periods,
    redundancy,
    separation,
    short_building,
    spectrum,
    stiffness_route,
    story,
    system_combinations,
    systems,
    torsion,
    two_stage,
    weights,
)

#: the part that every workbook has
CORE: Final = story.PART.key
PARTS: Final = MappingProxyType(
    {
        part.key: part
        for part in (
            ground_motion.COEFFICIENTS,
            ground_motion.MAPPED,
            multi_period.PART,
            multi_period.SITE_SPECIFIC,
            story.PART,
            short_building.PART,
            category.PART,
            systems.PART,
            system_combinations.PART,
            weights.PART,
            periods.PART,
            period_sources.WALLS,
            period_sources.RAYLEIGH,
            period_sources.STIFFNESS,
            drift_forces.PART,
            drift.PART,
            torsion.PART,
            torsion.INHERENT,
            edge_drift.PART,
            irregularity.STIFFNESS_PART,
            stiffness_route.PART,
            drift_ratios.PART,
            irregularity.PART,
            redundancy.PART,
            diaphragm.PART,
            diaphragm_forces.TRANSFER,
            diaphragm_forces.COLLECTORS,
            diaphragm_forces.FLEXIBILITY,
            diaphragm_procedures.ALTERNATIVE,
            diaphragm_procedures.ONE_STORY,
            anchorage.PART,
            separation.PART,
            two_stage.PART,
            load_effects.PART,
            spectrum.PART,
            modal.PART,
            cross_check.PART,
            cross_check.DRIFT,
        )
    }
)


def chosen(keys: frozenset[str]) -> tuple[Part, ...]:
    """Return the parts of these keys in the order of the workbook."""
    return tuple(part for key, part in PARTS.items() if key in keys)


def with_required(keys: Iterable[str]) -> frozenset[str]:
    """Return these keys with those of the core and of all parts that they require."""
    found, open_keys = {CORE}, set(keys)
    while open_keys:
        found |= open_keys
        open_keys = {key for part in open_keys for key in PARTS[part].requires} - found
    return frozenset(found)


def together(edition: str) -> frozenset[str]:
    """Return the parts that stand together in an edition: of those that exclude each other the first."""
    found: list[str] = []
    for key, part in PARTS.items():
        excluded = any(key in PARTS[other].excludes or other in part.excludes for other in found)
        if edition in part.editions and not excluded:
            found.append(key)
    return frozenset(found)
