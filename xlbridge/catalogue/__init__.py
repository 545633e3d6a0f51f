"""The catalogue: every worksheet function, declared once and checked at import.

``CATALOGUE`` maps each worksheet name to its :class:`~xlbridge.catalogue.entry.SheetFunction`, in the
order of the standard's flow. Everything that knows the functions (worksheet modules, evaluator, function
list, template) is made from it.
"""

from __future__ import annotations

from collections.abc import Iterable, Mapping
from types import MappingProxyType

from xlbridge.catalogue import (
    base_shear,
    base_shear_routes,
    computed_period,
    diaphragm,
    diaphragm_alternative,
    diaphragm_parts,
    drift,
    dynamics,
    ground_motion,
    irregularity,
    load_effects,
    modal_response,
    multi_period,
    occupancy,
    period,
    redundancy,
    separation,
    site,
    stability,
    systems,
    torsion,
    two_stage,
    vertical,
    weight,
)
from xlbridge.catalogue.entry import SheetFunction
from xlbridge.catalogue.validate import DeclarationError, validate

_CONCEPTS = (
    weight,
    site,
    ground_motion,
    systems,
    multi_period,
    occupancy,
    period,
    computed_period,
    base_shear,
    base_shear_routes,
    vertical,
    torsion,
    irregularity,
    redundancy,
    load_effects,
    drift,
    stability,
    diaphragm,
    diaphragm_parts,
    diaphragm_alternative,
    separation,
    two_stage,
    dynamics,
    modal_response,
)


def gather(entries: Iterable[SheetFunction]) -> Mapping[str, SheetFunction]:
    """Return the entries by name; refuse a wrong entry and a name that is declared twice."""
    found: dict[str, SheetFunction] = {}
    for entry in entries:
        if entry.name in found:
            raise DeclarationError(f"{entry.name}: declared twice")
        found[entry.name] = validate(entry)
    return MappingProxyType(found)


CATALOGUE = gather(entry for concept in _CONCEPTS for entry in concept.FUNCTIONS)

__all__ = ["CATALOGUE", "DeclarationError", "SheetFunction", "gather", "validate"]
