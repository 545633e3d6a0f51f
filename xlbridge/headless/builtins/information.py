"""Functions that tell what a value is."""

from __future__ import annotations

from collections.abc import Callable
from typing import Final

from xlbridge.headless.builtins.builtin import Builtin
from xlbridge.headless.coercion import Fault, number, plain
from xlbridge.headless.operands import Operand
from xlbridge.values import ERROR_CODES, CellError, Scalar


def _tells(name: str, test: Callable[[Scalar], bool]) -> Builtin:
    """A test that also sees error values."""
    return Builtin(name, "s", test, catches=True)


def _is_na(value: Scalar) -> bool:
    return value == CellError("#N/A")


def _error_type(value: Scalar) -> float:
    if not isinstance(value, CellError) or value.code not in ERROR_CODES:
        raise Fault("#N/A", "ERROR.TYPE of a value that is no error")
    return ERROR_CODES.index(value.code) + 1.0


def _type(operand: Operand) -> float:
    value = plain(operand)
    if isinstance(value, tuple):
        return 64.0
    kinds: dict[type, float] = {str: 2.0, bool: 4.0, CellError: 16.0}
    return kinds.get(type(value), 1.0)


def _is_odd(value: Scalar) -> bool:
    if isinstance(value, bool):
        raise Fault("#VALUE!", "a logical value is neither even nor odd")
    return int(number(value)) % 2 == 1


def _na() -> CellError:
    raise Fault("#N/A", "NA()")


FUNCTIONS: Final = (
    _tells("ISBLANK", lambda value: value is None),
    _tells("ISERROR", lambda value: isinstance(value, CellError)),
    _tells("ISERR", lambda value: isinstance(value, CellError) and not _is_na(value)),
    _tells("ISNA", _is_na),
    _tells("ISNUMBER", lambda value: type(value) is float),
    _tells("ISTEXT", lambda value: isinstance(value, str)),
    _tells("ISNONTEXT", lambda value: not isinstance(value, str)),
    _tells("ISLOGICAL", lambda value: isinstance(value, bool)),
    Builtin("ISEVEN", "s", lambda value: not _is_odd(value)),
    Builtin("ISODD", "s", _is_odd),
    Builtin("NA", "", _na),
    Builtin("ERROR.TYPE", "s", _error_type, catches=True),
    Builtin("TYPE", "g", _type),
)
