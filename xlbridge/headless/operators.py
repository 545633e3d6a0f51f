"""The operators of the formula language on scalars and grids.

Numbers that agree to fifteen digits compare equal and their difference is zero, as both Excel and Calc
have it (Excel for the last operation of a formula).
"""

from __future__ import annotations

import math
import sys
from collections.abc import Callable
from typing import Final, TypeAlias

from xlbridge.headless.broadcast import broadcast
from xlbridge.headless.coercion import Fault, fitting, nearly_equal, number, plain, text
from xlbridge.headless.operands import Operand
from xlbridge.values import CellError, Scalar, Value

_Operator: TypeAlias = Callable[[Scalar, Scalar], Scalar]
_TOO_LARGE: Final = CellError("#NUM!", "the result is too large")
#: a smaller result is 0 (Excel specifications and limits, "smallest allowed positive number").
SMALLEST: Final = sys.float_info.min
_BY_ZERO: Final = CellError("#DIV/0!", "division by zero")


def binary(op: str, left: Operand, right: Operand) -> Value:
    """Return ``left op right``; op is one of ``+ - * / ^ & = <> < <= > >=``."""
    first, second = plain(left), plain(right)
    if isinstance(first, tuple) or isinstance(second, tuple):
        return broadcast(_BINARY[op], (first, second))
    return _BINARY[op](first, second)


def unary(op: str, operand: Operand) -> Value:
    """Return ``-x``, ``+x`` or ``x%``."""
    value = plain(operand)
    return broadcast(_UNARY[op], (value,)) if isinstance(value, tuple) else _UNARY[op](value)


def compare(left: Scalar, right: Scalar) -> int:
    """Return -1, 0 or 1: numbers before text before logicals, text without regard to case."""
    if type(left) is float and type(right) is float:
        return 0 if nearly_equal(left, right) else -1 if left < right else 1
    first, second = _rank(left, right), _rank(right, left)
    return (first > second) - (first < second)


def power(base: float, exponent: float) -> float:
    """Return base ^ exponent; 0 ^ 0 and roots of negative numbers have no value."""
    if base == 0.0 and exponent <= 0.0:
        raise Fault("#NUM!", "0 ^ 0") if exponent == 0.0 else Fault(_BY_ZERO)
    if base < 0.0 and not exponent.is_integer():
        raise Fault("#NUM!", f"{base:g} ^ {exponent:g} is not a real number")
    return math.pow(base, exponent)


def _rank(value: Scalar, other: Scalar) -> tuple[int, float | str]:
    """Return a sort key: the kind first; a blank takes the kind of its partner."""
    if value is None:
        return (1, "") if isinstance(other, str) else (2, 0.0) if isinstance(other, bool) else (0, 0.0)
    if isinstance(value, bool):
        return 2, float(value)
    return (1, value.lower()) if isinstance(value, str) else (0, number(value))


def _add(left: float, right: float) -> float:
    return 0.0 if nearly_equal(left, -right) else left + right


def _subtract(left: float, right: float) -> float:
    return 0.0 if nearly_equal(left, right) else left - right


def _arithmetic(compute: Callable[[float, float], float]) -> _Operator:
    def operate(left: Scalar, right: Scalar) -> Scalar:
        if isinstance(left, CellError) or isinstance(right, CellError):
            return left if isinstance(left, CellError) else right
        try:
            result = compute(number(left), number(right))
        except Fault as fault:
            return fault.error
        except ZeroDivisionError:
            return _BY_ZERO
        except OverflowError:
            return _TOO_LARGE
        if not math.isfinite(result):
            return _TOO_LARGE
        return result if abs(result) >= SMALLEST else 0.0

    return operate


def _comparison(holds: Callable[[int], bool]) -> _Operator:
    def operate(left: Scalar, right: Scalar) -> Scalar:
        if isinstance(left, CellError):
            return left
        return right if isinstance(right, CellError) else holds(compare(left, right))

    return operate


def _concatenate(left: Scalar, right: Scalar) -> Scalar:
    try:
        return fitting(text(left) + text(right))
    except Fault as fault:
        return fault.error


def _percent(value: Scalar) -> Scalar:
    return _BINARY["/"](value, 100.0)


def _negate(value: Scalar) -> Scalar:
    return _BINARY["*"](value, -1.0)


_BINARY: Final[dict[str, _Operator]] = {
    "+": _arithmetic(_add),
    "-": _arithmetic(_subtract),
    "*": _arithmetic(lambda left, right: left * right),
    "/": _arithmetic(lambda left, right: left / right),
    "^": _arithmetic(power),
    "&": _concatenate,
    "=": _comparison(lambda order: order == 0),
    "<>": _comparison(lambda order: order != 0),
    "<": _comparison(lambda order: order < 0),
    "<=": _comparison(lambda order: order <= 0),
    ">": _comparison(lambda order: order > 0),
    ">=": _comparison(lambda order: order >= 0),
}
_UNARY: Final[dict[str, Callable[[Scalar], Scalar]]] = {"-": _negate, "+": lambda value: value, "%": _percent}
