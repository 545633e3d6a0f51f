"""Weight take-off: what counts of every row, and the sums of the levels."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any, Final

import numpy as np

from engine.building.records import Building
from engine.building.results import Package
from engine.building.weights import load_that_counts, row_weight

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
    }
