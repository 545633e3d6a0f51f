"""Weight take-off: what counts of every row, and the sums of the levels."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any, Final

import numpy as np

from engine import weight
from engine.building.records import Building
from engine.building.results import Package
from engine.building.weights import load_that_counts, row_weight
from engine.require import exceeds

NO_STORAGE: Final = "-"
#: what a level's storage may add to the rest of its weight and still be left out
LEFT_OUT: Final = 0.05
RULES: Final = ("W", "W_partitions", "W_storage", "W_snow")


def solve(building: Building, package: Package) -> Mapping[str, Any]:
    """Return the load that counts and the weight of each row as listed, and the sum of each level."""
    if not building.weight:
        return {}
    case = building.edition, building.units
    return {
        "load_counts": np.array([load_that_counts(row, *case) for row in building.weight]),
        "row_weight": np.array([row_weight(row, *case) for row in building.weight]),
        "rows_weight": package.w_x,
        **_storage(building, package),
    }


def _storage(building: Building, package: Package) -> dict[str, Any]:
    """The storage of each level, and whether it adds so little that it may be left out."""
    case = building.edition, building.units
    sums = dict.fromkeys((name.casefold() for name in package.levels), 0.0)
    for row in building.weight:
        if row.kind == "storage":
            sums[row.level.casefold()] += row_weight(row, *case)
    found = [sums[name.casefold()] for name in package.levels]
    return {
        "rows_storage": np.array(found),
        "storage_status": tuple(map(_storage_status, found, package.w_x.tolist())),
    }


def _storage_status(storage: float, whole: float) -> str:
    if storage == 0:
        return NO_STORAGE
    small = storage < whole and not exceeds(weight.storage_ratio(storage, whole - storage), LEFT_OUT)
    return "may be left out" if small else "counts"
