"""One value per position: how a function of scalars meets arrays.

A row meets a column as a table, a single row or column repeats, and where shapes do not fit the excess is
``#N/A``.
"""

from __future__ import annotations

from collections.abc import Callable, Iterable, Sequence
from enum import Enum
from itertools import chain, repeat
from typing import Final

from xlbridge.values import CellError, Grid, Scalar


class _NoCell(Enum):
    """Marks a place beyond the end of a grid."""

    NO_CELL = 0


NO_CELL: Final = _NoCell.NO_CELL
NO_PARTNER = CellError("#N/A", "the arrays have different sizes")


def broadcast(function: Callable[..., Scalar], values: Sequence[Scalar | Grid]) -> Grid:
    """Return the grid of ``function`` applied to every position of the values that are grids."""
    grids = [value if isinstance(value, tuple) else ((value,),) for value in values]
    height = max(len(grid) for grid in grids)
    width = max(len(grid[0]) for grid in grids)
    rows = zip(*(_stretched(grid, height, width) for grid in grids), strict=True)
    if all(len(grid) in (1, height) and len(grid[0]) in (1, width) for grid in grids):
        return tuple(tuple(map(function, *row)) for row in rows)
    return tuple(
        tuple([NO_PARTNER if NO_CELL in cells else function(*cells) for cells in zip(*row, strict=True)])
        for row in rows
    )


def _stretched(grid: Grid, height: int, width: int) -> Iterable[Sequence[Scalar | _NoCell]]:
    """The rows of a grid at full size: a single row or column repeated, places beyond the rest marked."""
    rows: Iterable[Sequence[Scalar | _NoCell]] = grid
    if len(grid[0]) != width:
        rows = [(*row, *(row if len(row) == 1 else (NO_CELL,)) * (width - len(row))) for row in grid]
    if len(grid) == height:
        return rows
    return (
        repeat(next(iter(rows)), height)
        if len(grid) == 1
        else chain(rows, repeat((NO_CELL,) * width, height - len(grid)))
    )
