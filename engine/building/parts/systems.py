"""Systems of Table 12.2-1: the suggestion beside the entries, height limits, and combinations of systems."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any, Final

from engine import systems
from engine.building.parts.findings import answer, design_category
from engine.building.records import Building
from engine.building.results import DirectionResult, Package
from engine.errors import MissingValue

RULES: Final = ("system", "Omega_0_reduced", "height_limit", "height_increase")
COMBINATION_RULES: Final = ("combination_horizontal", "combination_vertical")
NOT_IN_TABLE: Final = "-"
SUGGESTIONS: Final = (
    *("table_R", "table_Omega", "table_C_d", "system_status", "system_source", "Omega_permitted"),
    "height_status",
)
SYMBOLS: Final = ("R", "Omega_0", "C_d")


def solve(building: Building, package: Package, name: str, result: DirectionResult) -> Mapping[str, Any]:
    """Return what the table says of the system, where the part is asked for or a row is named."""
    named = [given.table_system for given in building.direction.values()]
    SDC = design_category(building, package)
    if not ("systems" in building.parts or any(named)):
        return {}
    if SDC is None:
        raise MissingValue("site.SDC", None, "must be given beside table_system, or the part category")
    given = building.direction[name]
    if given.table_system is None:
        return dict.fromkeys(SUGGESTIONS, NOT_IN_TABLE)
    row = given.table_system, building.edition
    Omega_0 = float(systems.overstrength(*row))
    entered = given.R, given.Omega_0, given.C_d
    status = str(systems.coefficients_status(given.table_system, *entered, building.edition))
    limit = given.table_system, SDC, answer(given.height_increase), building.edition, building.units
    height = str(systems.height_status(package.h_n, *limit))
    return {
        "table_R": float(systems.response_modification(*row)),
        "table_Omega": Omega_0,
        "table_C_d": float(systems.deflection_amplification(*row)),
        "system_status": f"! {status}" if status.startswith("differs") else f"✓ {status}",
        "system_source": str(systems.confidence(*row)),
        "Omega_permitted": float(systems.reduced_overstrength(Omega_0, given.omega_reduction)),
        "height_status": f"✗ {height}" if height.startswith("above") else f"✓ {height}",
    }


def listed(building: Building, package: Package) -> Mapping[str, Any]:
    """Return the table of the edition, row by row, where the part is asked for."""
    if "systems" not in building.parts:
        return {}
    edition = building.edition
    names = tuple(word for word in systems.KNOWN if word in systems.SYSTEMS[edition])
    return {
        "system_name": names,
        "row_R": [float(systems.response_modification(word, edition)) for word in names],
        "row_Omega": [float(systems.overstrength(word, edition)) for word in names],
        "row_C_d": [float(systems.deflection_amplification(word, edition)) for word in names],
        "row_source": [str(systems.confidence(word, edition)) for word in names],
    }


def combinations(
    building: Building, package: Package, name: str, result: DirectionResult
) -> Mapping[str, Any]:
    """Return the coefficients of systems that act together, and those of one above another."""
    entered = (
        getattr(given, f"{part}_{symbol}") != 1
        for given in building.direction.values()
        for part in ("above", "below")
        for symbol in SYMBOLS
    )
    if not (building.system or "combinations" in building.parts or any(entered)):
        return {}
    return {**_together(building, name), **_one_above_another(building, name)}


def _together(building: Building, name: str) -> dict[str, Any]:
    rows = [[getattr(row, f"system_{symbol}_{name}") for symbol in SYMBOLS] for row in building.system]
    acting = [row for row in rows if row[0] is not None]
    keys = ("R_least", "Omega_0_of_least", "C_d_of_least")
    if not acting:
        return dict.fromkeys(keys, NOT_IN_TABLE)
    R, Omega_0, C_d = zip(*acting, strict=True)
    of_least = (float(systems.coefficient_of_least_R(values, R)) for values in (Omega_0, C_d))
    return dict(zip(keys, (float(systems.least_R(R)), *of_least), strict=True))


def _one_above_another(building: Building, name: str) -> dict[str, Any]:
    given = building.direction[name]
    pair = given.above_R, given.below_R
    lower = {
        f"lower_part_{symbol}": float(
            systems.lower_part_coefficient(
                getattr(given, f"above_{symbol}"), getattr(given, f"below_{symbol}"), *pair
            )
        )
        for symbol in SYMBOLS
    }
    return {**lower, "transfer_factor": float(systems.transferred_force_factor(*pair))}
