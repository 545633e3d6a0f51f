"""Matrix algebra and sums over pairs."""

from __future__ import annotations

import math
from collections.abc import Callable
from typing import Any, Final

import numpy as np
from numpy.typing import NDArray

from xlbridge.headless.builtins.builtin import Builtin
from xlbridge.headless.builtins.collect import grid_of, refuse_errors
from xlbridge.headless.builtins.statistics import pairs
from xlbridge.headless.coercion import Fault
from xlbridge.headless.operands import Operand
from xlbridge.values import Grid


def _matrix(operand: Operand) -> NDArray[np.float64]:
    grid = grid_of(operand)
    refuse_errors(grid)
    if not all(type(cell) is float for row in grid for cell in row):
        raise Fault("#VALUE!", "every cell of a matrix must be a number")
    return np.array(grid, dtype=np.float64)


def _square(operand: Operand) -> NDArray[np.float64]:
    matrix = _matrix(operand)
    if matrix.shape[0] != matrix.shape[1]:
        raise Fault("#VALUE!", f"the matrix has {matrix.shape[0]} rows and {matrix.shape[1]} columns")
    return matrix


def _grid(matrix: NDArray[Any]) -> Grid:
    if not np.isfinite(matrix).all():
        raise Fault("#NUM!", "the result is too large")
    return tuple(tuple(row) for row in matrix.tolist())


def _product(left: Operand, right: Operand) -> Grid:
    first, second = _matrix(left), _matrix(right)
    if first.shape[1] != second.shape[0]:
        raise Fault("#VALUE!", f"MMULT: {first.shape[1]} columns meet {second.shape[0]} rows")
    with np.errstate(all="ignore"):
        return _grid(first @ second)


def _inverse(operand: Operand) -> Grid:
    try:
        return _grid(np.linalg.inv(_square(operand)))
    except np.linalg.LinAlgError:
        raise Fault("#NUM!", "MINVERSE: the matrix is singular") from None


def _pairwise(name: str, term: Callable[[float, float], float]) -> Builtin:
    def add(xs: Operand, ys: Operand) -> float:
        return math.fsum(map(term, *pairs(xs, ys)))

    return Builtin(name, "gg", add, array=True)


FUNCTIONS: Final = (
    Builtin("MMULT", "gg", _product, array=True),
    Builtin("MINVERSE", "g", _inverse, array=True),
    Builtin("MDETERM", "g", lambda operand: float(np.linalg.det(_square(operand))), array=True),
    Builtin("TRANSPOSE", "g", lambda operand: tuple(zip(*grid_of(operand), strict=True)), array=True),
    _pairwise("SUMXMY2", lambda x, y: (x - y) ** 2),
    _pairwise("SUMX2MY2", lambda x, y: x * x - y * y),
    _pairwise("SUMX2PY2", lambda x, y: x * x + y * y),
)
