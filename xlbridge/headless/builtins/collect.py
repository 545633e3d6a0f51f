"""What a range contributes to a total: the numbers in it, and the first error if there is one."""

from __future__ import annotations

from collections.abc import Iterable, Iterator
from typing import NoReturn

from xlbridge.headless.coercion import Fault, number
from xlbridge.headless.operands import Area, Operand
from xlbridge.values import CellError, Grid, Scalar


def grid_of(operand: Operand) -> Grid:
    """Return an operand as a grid; a scalar is a grid of one cell."""
    if isinstance(operand, Area):
        return operand.grid
    return operand if isinstance(operand, tuple) else ((operand,),)  # type: ignore[return-value]


def cells(operand: Operand) -> Iterator[Scalar]:
    """Iterate over the values of an operand, row by row."""
    return (cell for row in grid_of(operand) for cell in row)


def numbers(operands: Iterable[Operand]) -> list[float]:
    """Return the numbers that count: all through ranges and arrays; typed-in values are converted."""
    found: list[float] = []
    for operand in operands:
        if isinstance(operand, Area | tuple):
            found += grid_numbers(operand.grid if isinstance(operand, Area) else operand)
        else:
            found.append(number(operand))  # type: ignore[arg-type]
    return found


def grid_numbers(grid: Grid) -> list[float]:
    """Return the numbers of a grid; text, logicals and blanks do not count, an error is a fault."""
    found = [cell for row in grid for cell in row if type(cell) is float]
    if len(found) < len(grid) * len(grid[0]):
        refuse_errors(grid)
    return found


def every_value(operands: Iterable[Operand]) -> list[float]:
    """Return the numbers as the functions ending in A take them: text in a range is 0, logicals count."""
    found: list[float] = []
    for operand in operands:
        if isinstance(operand, Area | tuple):
            filled = [cell for cell in cells(operand) if cell is not None]
            found += [0.0 if isinstance(cell, str) else number(cell) for cell in filled]
        else:
            found.append(number(operand))  # type: ignore[arg-type]
    return found


def refuse_errors(grid: Grid) -> None:
    """Raise the first error value of a grid as a fault."""
    for row in grid:
        for cell in row:
            if isinstance(cell, CellError):
                raise Fault(cell)


def nothing(name: str) -> NoReturn:
    """Refuse to make a statistic of no numbers."""
    raise Fault("#DIV/0!", f"{name}: there are no numbers")
