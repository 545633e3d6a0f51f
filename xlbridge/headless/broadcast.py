"""One value per position: how a function of scalars meets arrays.

A row meets a column as a table, a single row or column repeats, and where shapes do not fit the excess is
``#N/A``.
"""

from __future__ import annotations

from collections.abc import Callable, Sequence

from xlbridge.values import CellError, Grid, Scalar

NO_PARTNER = CellError("#N/A", "the arrays have different sizes")


def broadcast(function: Callable[..., Scalar], values: Sequence[Scalar | Grid]) -> Grid:
    """Return the grid of ``function`` applied to every position of the values that are grids."""
    grids = [value if isinstance(value, tuple) else ((value,),) for value in values]
    height = max(len(grid) for grid in grids)
    width = max(len(grid[0]) for grid in grids)
    return tuple(tuple(_at(function, grids, row, column) for column in range(width)) for row in range(height))


def _at(function: Callable[..., Scalar], grids: Sequence[Grid], row: int, column: int) -> Scalar:
    rows = [grid[0] if len(grid) == 1 else grid[row] if row < len(grid) else None for grid in grids]
    if any(cells is None or 1 < len(cells) <= column for cells in rows):
        return NO_PARTNER
    return function(*(cells[0] if len(cells) == 1 else cells[column] for cells in rows if cells is not None))
