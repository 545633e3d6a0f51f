"""One body that stands between a cell and a formula: coerce, call, map errors. It holds no rule.

The contract, for every front end: an error value passes through unchanged; a blank or a text that looks
like a number is refused; a level range ignores rows that are blank in every column and refuses rows
that are blank in some; in an array, good cells keep their values and a bad cell shows its own error;
nothing that is not finite reaches a cell. Every error carries its reason in words.
"""

from __future__ import annotations

from collections.abc import Callable, Iterable, Mapping, Sequence
from itertools import chain
from math import isfinite
from typing import Any, TypeAlias

import numpy as np

from engine.errors import EngineError, ImpossibleValue, MissingValue, WrongType, listed
from xlbridge.catalogue.entry import Argument as Declared
from xlbridge.catalogue.entry import Kind, SheetFunction
from xlbridge.values import OMITTED, Argument, CellError, Grid, Omitted, Scalar, Value

_NUMBER = frozenset({float, int})

_Given: TypeAlias = tuple[Declared, Argument]


def call(entry: SheetFunction, arguments: Sequence[Argument]) -> Value:
    """Return the function's value for the cells given, or a :class:`CellError` that says why not.

    Ranges for arguments that are no level ranges give one cell each, whatever fails: a cell left blank
    would count as 0 wherever another formula takes it up.
    """
    if len(arguments) > len(entry.arguments):
        return CellError("#VALUE!", f"{entry.usage}: {len(arguments)} arguments are too many")
    padded = (*arguments, *(OMITTED,) * (len(entry.arguments) - len(arguments)))
    given = list(zip(entry.arguments, padded, strict=True))
    try:
        return _result(entry, given)
    except EngineError as error:
        return _failed(entry, given, error)


def _result(entry: SheetFunction, given: Sequence[_Given]) -> Value:
    single = {a.name: (a, v) for a, v in given if a.kind is not Kind.LEVELS and not _left_out(a, v)}
    whole = _known_levels(entry, [(a, v) for a, v in given if a.kind is Kind.LEVELS])
    if any(isinstance(v, tuple) for _, v in single.values()):
        return _over_cells(entry, single, whole)
    return _one(entry, single, whole)


def _left_out(declared: Declared, value: Argument) -> bool:
    if not isinstance(value, Omitted):
        return False
    if not declared.optional:
        raise MissingValue(declared.symbol, None, "the argument is left out")
    return True


def _one(entry: SheetFunction, single: Mapping[str, _Given], whole: Mapping[str, Any]) -> Scalar:
    """One call with one value for each argument that is not a level range."""
    found = _compute(entry, {n: _scalar(a, v) for n, (a, v) in single.items()}, whole)
    return found if entry.is_text else _finite(entry, float(found))


def _compute(entry: SheetFunction, single: Mapping[str, Any], whole: Mapping[str, Any]) -> Any:
    """Call the formula; numbers that float arithmetic cannot hold are refused, never carried on."""
    try:
        with np.errstate(over="raise", divide="raise", invalid="raise"):
            return entry.function(**single, **whole)
    except (FloatingPointError, OverflowError):
        raise ImpossibleValue(
            entry.result.symbol,
            "out of reach",
            "the numbers given are too large or too small",
        ) from None


def _over_cells(entry: SheetFunction, single: Mapping[str, _Given], whole: Mapping[str, Any]) -> Grid:
    """One result a cell: all at once where every cell is good, else cell by cell."""
    rows, columns = _shape(entry, _grids(single.values()))
    if not entry.is_text:
        try:
            arrays = {n: _array(a, v, rows, columns) for n, (a, v) in single.items()}
            found = np.broadcast_to(_compute(entry, arrays, whole), rows * columns)
            if np.isfinite(found).all():
                return tuple(tuple(row) for row in found.reshape(rows, columns).tolist())
        except EngineError:
            pass  # some cell is bad: the cells that are good shall keep their values
    return _mapped(rows, columns, lambda i, j: _cell(entry, _at_cell(single, i, j), whole))


def _cell(entry: SheetFunction, single: Mapping[str, _Given], whole: Mapping[str, Any]) -> Scalar:
    try:
        return _one(entry, single, whole)
    except EngineError as error:
        return _cell_error(entry, single.values(), error)


def _failed(entry: SheetFunction, given: Sequence[_Given], error: EngineError) -> Value:
    """The error of a call that fails as a whole, in every cell of the result."""
    grids = _grids(given)
    if not grids:
        return _cell_error(entry, given, error)
    named = {a.name: (a, v) for a, v in given}
    rows, columns = max(len(g) for g in grids), max(len(g[0]) for g in grids)
    return _mapped(rows, columns, lambda i, j: _cell_error(entry, _at_cell(named, i, j).values(), error))


def _cell_error(entry: SheetFunction, given: Iterable[_Given], error: EngineError) -> CellError:
    """The first error value among the arguments as it came, or else the refusal."""
    for _, value in given:
        for cell in chain.from_iterable(value) if isinstance(value, tuple) else (value,):
            if isinstance(cell, CellError):
                return cell
    return CellError(error.cell_code, f"{entry.name}: {error}")


def _grids(given: Iterable[_Given]) -> list[Grid]:
    """The ranges that give one result a cell."""
    return [v for a, v in given if a.kind is not Kind.LEVELS and isinstance(v, tuple)]


def _shape(entry: SheetFunction, grids: list[Grid]) -> tuple[int, int]:
    try:
        rows, columns = np.broadcast_shapes(*((len(g), len(g[0])) for g in grids))
    except ValueError:
        sizes = " and ".join(f"{len(g)} x {len(g[0])}" for g in grids)
        raise WrongType(entry.name, sizes, "the ranges do not have the same shape") from None
    return rows, columns


def _mapped(rows: int, columns: int, compute: Callable[[int, int], Scalar]) -> Grid:
    return tuple(tuple(compute(i, j) for j in range(columns)) for i in range(rows))


def _at_cell(given: Mapping[str, _Given], i: int, j: int) -> dict[str, _Given]:
    """The arguments of one cell of the result: level ranges whole, a single row or column repeated."""
    return {n: (a, v if a.kind is Kind.LEVELS else _at(v, i, j)) for n, (a, v) in given.items()}


def _at(value: Argument, i: int, j: int) -> Argument:
    if not isinstance(value, tuple):
        return value
    row = value[min(i, len(value) - 1)]
    return row[min(j, len(row) - 1)]


def _array(declared: Declared, value: Argument, rows: int, columns: int) -> Any:
    if not isinstance(value, tuple):
        return _scalar(declared, value)
    numbers = [[_scalar(declared, cell) for cell in row] for row in value]
    if declared.kind is Kind.CHOICE:
        raise WrongType(declared.symbol, "a range", "is taken cell by cell")
    return np.broadcast_to(np.array(numbers), (rows, columns)).ravel()


def _scalar(declared: Declared, cell: Any) -> Any:
    kind = type(cell)
    if declared.kind is Kind.CHOICE:
        if kind is str and cell:
            return cell
        words = f"must be text, one of {listed(declared.choices)}"
        if cell is None or cell == "":
            raise MissingValue(declared.symbol, None, words)
        raise WrongType(declared.symbol, cell, words)
    if kind in _NUMBER:
        return cell
    raise _not_a_number(declared.symbol, cell)


def _not_a_number(where: str, cell: object) -> EngineError:
    if cell is None or cell == "":
        return MissingValue(where, None, "a number is needed")
    what = "is text" if isinstance(cell, str) else "is not a number"
    return WrongType(where, cell, f"{what}; a number is needed")


#: ranges by identity, each kept alive beside its vectors: the cells of a column all take the same ranges
_known: dict[tuple[object, ...], tuple[list[_Given], dict[str, Any]]] = {}
_KNOWN_AT_MOST = 512


def _known_levels(entry: SheetFunction, ranges: list[_Given]) -> dict[str, Any]:
    """Return the vectors of level ranges; ranges that are the same objects as before are not read again."""
    if not all(isinstance(value, tuple) for _, value in ranges):
        return _levels(ranges)
    key: tuple[object, ...] = (entry.name, *(id(value) for _, value in ranges))
    if key not in _known:
        if len(_known) >= _KNOWN_AT_MOST:
            _known.clear()
        _known[key] = (ranges, _levels(ranges))
    return _known[key][1]


def _levels(ranges: list[_Given]) -> dict[str, Any]:
    """Return one float vector a level range; levels, modes and periods are lists of their own."""
    lists = dict.fromkeys(a.each for a, _ in ranges)
    return {k: v for each in lists for k, v in _one_list([r for r in ranges if r[0].each == each]).items()}


def _one_list(ranges: list[_Given]) -> dict[str, Any]:
    """Return the vectors of ranges with one cell for each of the same things.

    Rows that are blank in all of them are left out.
    """
    columns = [_column(a, v) for a, v in ranges]
    if len({len(c) for c in columns}) > 1:
        sizes = ", ".join(f"{a.symbol} has {len(c)}" for (a, _), c in zip(ranges, columns, strict=True))
        raise WrongType("level ranges", sizes, "must have the same number of cells")
    blank = (None,) * len(columns)
    rows = [row for row in zip(*columns, strict=True) if row != blank]
    if not rows:
        raise MissingValue(ranges[0][0].symbol, None, f"the range holds no {ranges[0][0].each}")
    if not set(map(type, chain.from_iterable(rows))) <= _NUMBER:
        _refuse_level([a for a, _ in ranges], columns)
    vectors = np.array(rows, dtype=float).T
    vectors.flags.writeable = False
    return {a.name: vector for (a, _), vector in zip(ranges, vectors, strict=True)}


def _refuse_level(ranges: list[Declared], columns: list[Sequence[Scalar]]) -> None:
    """Raise for the first cell that is no number in a row that is not all blank."""
    for n, row in enumerate(zip(*columns, strict=True), 1):
        for declared, cell in zip(ranges, row, strict=True):
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
