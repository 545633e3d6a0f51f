"""Totals, counts, averages and extremes of ranges.

Sums are rounded once, at the end (``math.fsum``): they do not depend on the order of the rows. Calc
compensates its sums as well; plain addition, as Excel has it, may differ in the last bits.
"""

from __future__ import annotations

import math
from collections.abc import Callable
from typing import Final

from xlbridge.headless.builtins.builtin import Builtin
from xlbridge.headless.builtins.collect import cells, every_value, grid_of, nothing, numbers
from xlbridge.headless.coercion import Fault, number, parse_number
from xlbridge.headless.operands import Area, Operand
from xlbridge.values import CellError, Scalar


def total(*operands: Operand) -> float:
    """SUM."""
    return math.fsum(numbers(operands))


def average(*operands: Operand) -> float:
    """AVERAGE."""
    return mean("AVERAGE", numbers(operands))


def mean(name: str, values: list[float]) -> float:
    """Return the mean of values; without any the named function has none."""
    return math.fsum(values) / len(values) if values else nothing(name)


def product(*operands: Operand) -> float:
    """PRODUCT; of no numbers it is 0."""
    values = numbers(operands)
    return math.prod(values) if values else 0.0


def count(*operands: Operand) -> float:
    """COUNT: numbers in ranges, and typed-in values that stand for a number."""
    return float(sum(_counted(operand) for operand in operands))


def _counted(operand: Operand) -> int:
    if isinstance(operand, Area | tuple):
        return [type(cell) is float for cell in cells(operand)].count(True)
    if isinstance(operand, str):
        return int(parse_number(operand) is not None)
    return int(operand is None or isinstance(operand, float | bool))


def count_filled(*operands: Operand) -> float:
    """COUNTA: everything but blanks, also errors and empty text."""
    return float(sum(_filled(operand) for operand in operands))


def _filled(operand: Operand) -> int:
    return sum(cell is not None for cell in cells(operand)) if isinstance(operand, Area | tuple) else 1


def _count_blank(area: Operand) -> float:
    return float(sum(cell is None or cell == "" for cell in cells(area)))


def _extreme(pick: Callable[[list[float]], float], values: list[float]) -> float:
    return pick(values) if values else 0.0


def _sumproduct(*operands: Operand) -> float:
    grids = [grid_of(operand) for operand in operands]
    shapes = {(len(grid), len(grid[0])) for grid in grids}
    if len(shapes) > 1:
        raise Fault("#VALUE!", "SUMPRODUCT: the arrays have different sizes")
    columns = [
        [cell if type(cell) is float else _factor(cell) for row in grid for cell in row] for grid in grids
    ]
    return math.fsum(map(math.prod, zip(*columns, strict=True)))


def _factor(cell: Scalar) -> float:
    """What is no number counts as 0; an error is a fault."""
    return number(cell) if isinstance(cell, CellError) else 0.0


def minimum(*operands: Operand) -> float:
    """MIN; of no numbers it is 0."""
    return _extreme(min, numbers(operands))


def maximum(*operands: Operand) -> float:
    """MAX; of no numbers it is 0."""
    return _extreme(max, numbers(operands))


FUNCTIONS: Final = (
    Builtin("SUM", "g*", total),
    Builtin("AVERAGE", "g*", average),
    Builtin("PRODUCT", "g*", product),
    Builtin("SUMSQ", "g*", lambda *operands: math.fsum(x * x for x in numbers(operands))),
    Builtin("COUNT", "g*", count),
    Builtin("COUNTA", "g*", count_filled),
    Builtin("COUNTBLANK", "a", _count_blank),
    Builtin("MIN", "g*", minimum),
    Builtin("MAX", "g*", maximum),
    Builtin("MINA", "g*", lambda *operands: _extreme(min, every_value(operands))),
    Builtin("MAXA", "g*", lambda *operands: _extreme(max, every_value(operands))),
    Builtin("AVERAGEA", "g*", lambda *operands: mean("AVERAGEA", every_value(operands))),
    Builtin("SUMPRODUCT", "g*", _sumproduct, array=True),
)
