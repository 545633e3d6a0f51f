"""One body that stands between a cell and a formula: coerce, call, map errors. It holds no rule.

The contract, for every front end: an error value passes through unchanged; a blank or a text that looks
like a number is refused; a level range ignores rows that are blank in every column and refuses rows
that are blank in some; in an array, good cells keep their values and a bad cell shows its own error;
nothing that is not finite reaches a cell. Every error carries its reason in words.
"""

from __future__ import annotations

from collections.abc import Mapping, Sequence
from itertools import chain, product
from math import isfinite
from typing import Any

import numpy as np

from engine.errors import EngineError, ImpossibleValue, MissingValue, WrongType
from xlbridge.catalogue.entry import Argument as Declared
from xlbridge.catalogue.entry import Kind, SheetFunction
from xlbridge.values import OMITTED, Argument, CellError, Grid, Omitted, Scalar, Value

_NUMBER = frozenset({float, int})


def call(entry: SheetFunction, arguments: Sequence[Argument]) -> Value:
    """Return the function's value for the cells given, or a :class:`CellError` that says why not."""
    if len(arguments) > len(entry.arguments):
        return CellError("#VALUE!", f"{entry.usage}: {len(arguments)} arguments are too many")
    padded = (*arguments, *(OMITTED,) * (len(entry.arguments) - len(arguments)))
    given = list(zip(entry.arguments, padded, strict=True))
    try:
        return _result(entry, given)
    except _Through as passed:
        return passed.error
    except EngineError as error:
        return _cell_error(entry, error)


def _result(entry: SheetFunction, given: list[tuple[Declared, Argument]]) -> Value:
    for _, value in given:
        if type(value) is CellError:
            raise _Through(value)
    whole = _levels([(a, v) for a, v in given if a.kind is Kind.LEVELS])
    single = {a.name: (a, v) for a, v in given if a.kind is not Kind.LEVELS and not _left_out(a, v)}
    if any(isinstance(v, tuple) for _, v in single.values()):
        return _over_cells(entry, single, whole)
    return _one(entry, single, whole)


def _left_out(declared: Declared, value: Argument) -> bool:
    if not isinstance(value, Omitted):
        return False
    if not declared.optional:
        raise MissingValue(declared.symbol, None, "the argument is left out")
    return True


def _one(entry: SheetFunction, single: Mapping[str, Any], whole: Mapping[str, Any]) -> Scalar:
    """One call with one value for each argument that is not a level range."""
    found = entry.function(**{n: _scalar(a, v) for n, (a, v) in single.items()}, **whole)
    return found if entry.is_text else _finite(entry, float(found))


def _over_cells(entry: SheetFunction, single: Mapping[str, Any], whole: Mapping[str, Any]) -> Grid:
    """One result a cell: all at once where every cell is good, else cell by cell."""
    rows, columns = _shape(entry, [v for _, v in single.values() if isinstance(v, tuple)])
    if not entry.is_text:
        try:
            arrays = {n: _array(a, v, rows, columns) for n, (a, v) in single.items()}
            found = np.broadcast_to(entry.function(**arrays, **whole), rows * columns)
            if np.isfinite(found).all():
                return tuple(tuple(row) for row in found.reshape(rows, columns).tolist())
        except (EngineError, _Through):
            pass  # some cell is bad: the cells that are good shall keep their values
    cells = [_cell(entry, single, whole, i, j) for i, j in product(range(rows), range(columns))]
    return tuple(tuple(cells[i * columns : (i + 1) * columns]) for i in range(rows))


def _cell(
    entry: SheetFunction, single: Mapping[str, Any], whole: Mapping[str, Any], i: int, j: int
) -> Scalar:
    try:
        return _one(entry, {n: (a, _at(v, i, j)) for n, (a, v) in single.items()}, whole)
    except _Through as passed:
        return passed.error
    except EngineError as error:
        return _cell_error(entry, error)


def _shape(entry: SheetFunction, grids: list[Grid]) -> tuple[int, int]:
    try:
        return np.broadcast_shapes(*((len(g), len(g[0])) for g in grids))
    except ValueError:
        sizes = " and ".join(f"{len(g)} x {len(g[0])}" for g in grids)
        raise WrongType(entry.name, sizes, "the ranges do not have the same shape") from None


def _at(value: Value, i: int, j: int) -> Scalar:
    if not isinstance(value, tuple):
        return value
    row = value[i if len(value) > 1 else 0]
    return row[j if len(row) > 1 else 0]


def _array(declared: Declared, value: Value, rows: int, columns: int) -> Any:
    if not isinstance(value, tuple):
        return _scalar(declared, value)
    numbers = [[_scalar(declared, cell) for cell in row] for row in value]
    if declared.kind is Kind.CHOICE:
        raise WrongType(declared.symbol, "a range", "is taken cell by cell")
    return np.broadcast_to(np.array(numbers), (rows, columns)).ravel()


def _scalar(declared: Declared, cell: Any) -> Any:
    kind = type(cell)
    if kind is CellError:
        raise _Through(cell)
    if declared.kind is Kind.CHOICE:
        if kind is str and cell:
            return cell
        words = f"one of {', '.join(declared.choices)}"
        error = WrongType if cell is not None and cell != "" else MissingValue
        raise error(declared.symbol, cell or None, f"must be text, {words}")
    if kind in _NUMBER:
        return cell
    raise _not_a_number(declared.symbol, cell)


def _not_a_number(where: str, cell: object) -> EngineError:
    if cell is None or cell == "":
        return MissingValue(where, None, "a number is needed")
    what = "is text" if isinstance(cell, str) else "is not a number"
    return WrongType(where, cell, f"{what}; a number is needed")


def _levels(ranges: list[tuple[Declared, Argument]]) -> dict[str, Any]:
    """Return one float vector a level range, without the rows that are blank in all of them."""
    if not ranges:
        return {}
    columns = [_column(a, v) for a, v in ranges]
    if len({len(c) for c in columns}) > 1:
        sizes = ", ".join(f"{a.symbol} has {len(c)}" for (a, _), c in zip(ranges, columns, strict=True))
        raise WrongType("level ranges", sizes, "must have the same number of cells")
    blank = (None,) * len(columns)
    rows = [row for row in zip(*columns, strict=True) if row != blank]
    if not rows:
        raise MissingValue(ranges[0][0].symbol, None, "the range holds no level")
    if not set(map(type, chain.from_iterable(rows))) <= _NUMBER:
        _refuse_level([a for a, _ in ranges], columns)
    vectors = np.array(rows, dtype=float).T
    return {a.name: vector for (a, _), vector in zip(ranges, vectors, strict=True)}


def _refuse_level(ranges: list[Declared], columns: list[Sequence[Scalar]]) -> None:
    """Raise for the first cell that is no number in a row that is not all blank."""
    for n, row in enumerate(zip(*columns, strict=True), 1):
        for declared, cell in zip(ranges, row, strict=True):
            if isinstance(cell, CellError):
                raise _Through(cell)
            if type(cell) not in _NUMBER and row.count(None) < len(row):
                raise _not_a_number(f"{declared.symbol} in row {n} of its range", cell)


def _column(declared: Declared, value: Argument) -> Sequence[Scalar]:
    if isinstance(value, Omitted):
        raise MissingValue(declared.symbol, None, "the argument is left out")
    if not isinstance(value, tuple):
        return (value,)
    if len(value) == 1:
        return value[0]
    try:
        return [cell for (cell,) in value]
    except ValueError:
        size = f"{len(value)} x {len(value[0])} cells"
        raise WrongType(declared.symbol, size, "must be one column or one row") from None


def _finite(entry: SheetFunction, number: float) -> float:
    if not isfinite(number):
        raise ImpossibleValue(entry.result.symbol, number, "the result is not a finite number")
    return number


def _cell_error(entry: SheetFunction, error: EngineError) -> CellError:
    return CellError(error.cell_code, f"{entry.name}: {error}")


class _Through(Exception):
    """An error value found in an argument, on its way to the cell."""

    def __init__(self, error: CellError) -> None:
        self.error = error
