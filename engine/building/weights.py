"""The weight of every level from the rows of the take-off."""

from __future__ import annotations

from typing import Final

import numpy as np

from engine import weight
from engine.building.records import Building, WeightRow
from engine.require import Array

#: how the take-off calls the ways in which a storage load is taken up
STORAGE: Final = {"storage": weight.STORAGE_USES[0], "garage storage": weight.STORAGE_USES[2]}


def load_that_counts(row: WeightRow, edition: str, units: str) -> float:
    """Return the unit load of a row that counts as seismic weight; 0 where the row enters a weight."""
    if row.load is None:
        return 0.0
    if row.kind == "partition":
        return float(weight.partition_unit_load(row.load, units))
    if row.kind in STORAGE:
        return float(weight.storage_unit_load(row.load, STORAGE[row.kind]))
    if row.kind == "snow":
        return float(weight.snow_unit_load(row.load, edition, units))
    return float(row.load)


def row_weight(row: WeightRow, edition: str, units: str) -> float:
    """Return the weight of a row."""
    if row.amount is not None:
        return float(row.amount)
    assert row.area is not None
    return float(weight.area_weight(row.area, load_that_counts(row, edition, units), units))


def level_weights(building: Building) -> Array:
    """Return the weight of every level: the sum of its rows, or as given where there is no take-off."""
    if not building.weight:
        return np.array([level.weight for level in building.level], dtype=np.float64)
    sums = {level.name.casefold(): 0.0 for level in building.level}
    for row in building.weight:
        sums[row.level.casefold()] += row_weight(row, building.edition, building.units)
    return np.array([sums[level.name.casefold()] for level in building.level])
