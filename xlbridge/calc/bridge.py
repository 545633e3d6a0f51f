"""One call from a cell of Calc: its arguments as the adapter takes them, its result as Calc shows it.

Calc hands every required argument over as rows of cells, so that a blank cell (an empty text) is told from
0; an argument left out arrives as ``None``. Results go back as rows, errors as the numbers by which Calc
carries them. Calc itself does not call a function with an error value in a range: its cell shows an error.
"""

from __future__ import annotations

import struct
from collections.abc import Sequence
from itertools import chain
from typing import Any, Final

from xlbridge import adapter
from xlbridge.calc.log import note
from xlbridge.catalogue import CATALOGUE
from xlbridge.values import OMITTED, Argument, CellError, Grid, Scalar

#: Calc's number of each error
CODES: Final = {"#N/A": 0x7FFF, "#VALUE!": 519, "#NUM!": 503, "#DIV/0!": 532, "#REF!": 524, "#NAME?": 525}

Rows = tuple[tuple[float | str, ...], ...]


def call(name: str, arguments: Sequence[Any]) -> Rows | float | str:
    """Return the value of a worksheet function as rows of cells; a reason for a failure goes into the log.

    A function whose result is a text gives that alone, and no rows: see ``extension.interface``.
    """
    entry = CATALOGUE[name]
    found = adapter.call(entry, [_argument(value) for value in arguments])
    if entry.is_text:
        return _cell(name, _ONE_TEXT if isinstance(found, tuple) else found)
    rows = found if isinstance(found, tuple) else ((found,),)
    return tuple(tuple(_cell(name, value) for value in row) for row in rows)


_ONE_TEXT: Final = CellError("#VALUE!", "Calc takes one text at a time: fill the formula down, cell by cell")


def error_number(code: str) -> float:
    """Return the number by which Calc carries an error: a NaN with the error's number in its low half."""
    number = 0x7FF8_0000_0000_0000 | CODES[code]
    return float(struct.unpack("<d", struct.pack("<Q", number))[0])


#: ranges by content: the cells of a column take equal ranges, and the adapter reads one object once
_known: dict[Grid, Grid] = {}
_KNOWN_AT_MOST: Final = 256


def _argument(value: Any) -> Argument:
    if value is None:
        return OMITTED
    if not isinstance(value, tuple):
        return _given(value)
    if len(value) == len(value[0]) == 1:
        return _given(value[0][0])
    if len(_known) >= _KNOWN_AT_MOST:
        _known.clear()
    rows = _rows(value)
    return _known.setdefault(rows, rows)


def _rows(value: Grid) -> Grid:
    """The rows with blanks as nothing; rows of floats as they are."""
    if set(map(type, chain.from_iterable(value))) == {float}:
        return value
    return tuple(tuple(map(_given, row)) for row in value)


def _given(value: Any) -> Scalar:
    """A cell as handed over: numbers as floats, a blank as nothing."""
    if isinstance(value, str):
        return value or None
    return None if value is None else float(value)


def _cell(name: str, value: Scalar) -> float | str:
    """A result as a cell: never an integer or a flag, which Calc would misread."""
    if isinstance(value, CellError):
        note(name, value)
        return error_number(value.code)
    return value if isinstance(value, str) else error_number("#N/A") if value is None else float(value)
