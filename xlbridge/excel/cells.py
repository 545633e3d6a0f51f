"""What Excel hands over, as cell values, and results as Excel takes them.

The functions read and write xlwings' ``raw`` values: with its default conversion an error value and the
text ``#N/A`` look alike, a text of no characters looks blank, and the newer error values look like numbers.
"""

from __future__ import annotations

from collections.abc import Callable, Mapping
from datetime import datetime
from decimal import Decimal
from itertools import chain
from types import MappingProxyType
from typing import Any, Final, TypeAlias

from xlbridge import adapter
from xlbridge.catalogue import CATALOGUE
from xlbridge.values import OMITTED, Argument, CellError, Grid, Omitted, Scalar, Value

__all__ = ["ERROR_NUMBERS", "OMITTED", "call"]

#: Excel's error values by the number that ``CVErr`` takes in a macro.
ERROR_NUMBERS: Final[Mapping[int, str]] = MappingProxyType(
    {
        2000: "#NULL!",
        2007: "#DIV/0!",
        2015: "#VALUE!",
        2023: "#REF!",
        2029: "#NAME?",
        2036: "#NUM!",
        2042: "#N/A",
        2043: "#GETTING_DATA",
        2045: "#SPILL!",
        2046: "#CONNECT!",
        2047: "#BLOCKED!",
        2048: "#UNKNOWN!",
        2049: "#FIELD!",
        2050: "#CALC!",
    }
)
#: An error value arrives as an integer: this, which is 0x800A0000, plus its number.
ERROR_BASE: Final = -2146828288
_DAY_ZERO: Final = datetime(1899, 12, 30)  # of the serial numbers that cells hold
_SECONDS_PER_DAY: Final = 86_400.0
_PLAIN: Final = frozenset({float, str, bool, type(None)})

Written: TypeAlias = list[list[float | str | bool]]


def call(name: str, *arguments: Any) -> Written:
    """Call a worksheet function with arguments as they come from Excel; return rows of cells.

    A failed call is a text such as ``#NUM! T = -1: must be above 0``, never blank, so that it can not pass
    for a number; the macro module turns it into Excel's own error value.
    """
    return _written(adapter.call(CATALOGUE[name], [_read(argument) for argument in arguments]))


def _read(value: Any) -> Argument:
    """One argument: a cell, the rows of a range, or a one-row array."""
    if not isinstance(value, tuple | list):
        cell: Scalar | Omitted = _cell(value)
        return cell
    rows = value if value and isinstance(value[0], tuple | list) else (value,)
    if set(map(type, chain.from_iterable(rows))) <= _PLAIN:
        return tuple(map(tuple, rows))
    return tuple(tuple(map(_cell, row)) for row in rows)


def _cell(value: Any) -> Any:
    """One cell; a kind that no cell can have is an error value."""
    if type(value) in _PLAIN or value is OMITTED:
        return value
    for kind, convert in _CONVERT.items():
        if isinstance(value, kind):
            return convert(value)
    return CellError("#VALUE!", f"{type(value).__name__} is no cell value")


def _integer(value: int) -> Scalar:
    """A whole number from a macro, or an error value: cells hand over every number as a float."""
    number = value - ERROR_BASE
    if not 0 <= number <= 0xFFFF:
        return float(value)
    return CellError(ERROR_NUMBERS.get(number, "#VALUE!"), f"error value number {number}")


def _serial(value: datetime) -> float:
    """The number in a cell that is formatted as a date."""
    return (value.replace(tzinfo=None) - _DAY_ZERO).total_seconds() / _SECONDS_PER_DAY


_CONVERT: Final[Mapping[type, Callable[[Any], Scalar]]] = MappingProxyType(
    {int: _integer, Decimal: float, datetime: _serial}
)


def _written(value: Value) -> Written:
    """Rows of plain Python values: Excel takes no others."""
    grid: Grid = value if isinstance(value, tuple) else ((value,),)
    return [[_shown(cell) for cell in row] for row in grid]


def _shown(cell: Scalar) -> float | str | bool:
    if type(cell) is float:
        return cell
    if isinstance(cell, CellError):
        return f"{cell.code} {cell.reason}".rstrip()
    if isinstance(cell, bool | str):
        return cell
    return float(cell) if cell is not None else "#VALUE! the function returned no value"
