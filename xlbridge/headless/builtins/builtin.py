"""A built-in function and how it is called: count checked, arguments converted, errors passed on.

Each letter of ``params`` says what an argument position takes: ``n`` number, ``t`` text, ``b`` logical,
``s`` any scalar, ``g`` anything, handed over whole, ``a`` a reference only, ``l`` a callable without
arguments, called when its operand is needed. A ``*`` after the last letter lets it repeat.
"""

from __future__ import annotations

import math
from collections.abc import Callable, Sequence
from dataclasses import dataclass
from functools import cache
from typing import Final, TypeAlias

from xlbridge.headless.broadcast import broadcast
from xlbridge.headless.coercion import Fault, logical, number, plain, text
from xlbridge.headless.operands import Area, NotEvaluated, Operand
from xlbridge.values import CellError, Grid, Omitted, Scalar

Lazy: TypeAlias = Callable[[], Operand]


@dataclass(frozen=True, slots=True, eq=False)
class Builtin:
    """A built-in function of the formula language.

    ``required`` is the least number of arguments (default: all of ``params``), ``array`` puts the arguments
    in array mode, ``catches`` lets error values in scalar positions reach the function.
    """

    name: str
    params: str
    function: Callable[..., Operand]
    required: int | None = None
    array: bool = False
    catches: bool = False

    def kinds(self, count: int) -> str:
        """Return one letter for each of ``count`` arguments; refuse a count the function does not take."""
        return _kinds(self, count)


def invoke(builtin: Builtin, operands: Sequence[Operand | Lazy]) -> Operand:
    """Return the function's result; grids in scalar positions give a grid, value by value."""
    kinds = _kinds(builtin, len(operands))
    try:
        arguments = [_ARRIVES[kind](operand) for kind, operand in zip(kinds, operands, strict=True)]
        if tuple in map(type, arguments) and _has_grid_for_scalar(kinds, arguments):
            return _spread(builtin, kinds, arguments)
        return _apply(builtin, kinds, arguments)
    except Fault as fault:
        return fault.error


def _has_grid_for_scalar(kinds: str, arguments: Sequence[Operand | Lazy]) -> bool:
    pairs = zip(kinds, arguments, strict=True)
    return any(kind in "ntbs" and type(argument) is tuple for kind, argument in pairs)


def _apply(builtin: Builtin, kinds: str, arguments: Sequence[Operand | Lazy]) -> Operand:
    converted = [
        argument if kind in "gal" else _read(builtin, kind, argument)
        for kind, argument in zip(kinds, arguments, strict=True)
    ]
    try:
        result = builtin.function(*converted)
    except ZeroDivisionError:
        raise Fault("#DIV/0!", f"{builtin.name}: division by zero") from None
    except OverflowError:
        raise Fault("#NUM!", f"{builtin.name}: the result is too large") from None
    if type(result) is not float:
        return result
    if not math.isfinite(result):
        raise Fault("#NUM!", f"{builtin.name}: the result is too large")
    return result + 0.0  # a spreadsheet has no negative zero


def _spread(builtin: Builtin, kinds: str, arguments: Sequence[Operand | Lazy]) -> Grid:
    """Call the function once per position of the grids in scalar and lazy places."""
    spread = [place for place, kind in enumerate(kinds) if kind in "ntbsl"]

    def one(*values: Scalar) -> Scalar:
        chosen: list[Operand | Lazy] = list(arguments)
        for place, value in zip(spread, values, strict=True):
            chosen[place] = _thunk(value) if kinds[place] == "l" else value
        return _single(builtin, kinds, chosen)

    return broadcast(one, [_forced(arguments[place]) for place in spread])


def _single(builtin: Builtin, kinds: str, arguments: Sequence[Operand | Lazy]) -> Scalar:
    try:
        result = plain(_apply(builtin, kinds, arguments))
    except Fault as fault:
        return fault.error
    if isinstance(result, tuple):
        raise NotEvaluated(f"{builtin.name} would give an array for each value of an array")
    return result


@cache
def _kinds(builtin: Builtin, count: int) -> str:
    letters = builtin.params.removesuffix("*")
    least = len(letters) if builtin.required is None else builtin.required
    repeats = builtin.params.endswith("*")
    if count < least or (count > len(letters) and not repeats):
        most = "or more" if repeats else f"to {len(letters)}" if least < len(letters) else ""
        raise NotEvaluated(f"{builtin.name} takes {f'{least} {most}'.strip()} arguments, not {count}")
    return letters[:count] + letters[-1:] * (count - len(letters))


def _read(builtin: Builtin, kind: str, value: Operand | Lazy) -> Operand:
    if builtin.catches and isinstance(value, CellError):
        return value
    return _READS[kind](value)  # type: ignore[arg-type]


def _reference(operand: Operand | Lazy) -> Operand:
    if isinstance(operand, Area):
        return operand
    if isinstance(operand, CellError):
        raise Fault(operand)
    if isinstance(operand, Omitted):
        return operand
    raise NotEvaluated("a reference is needed where the formula has a value")


def _any_scalar(value: Scalar) -> Scalar:
    if isinstance(value, CellError):
        raise Fault(value)
    return value


def _whole(operand: Operand | Lazy) -> Operand | Lazy:
    return None if isinstance(operand, Omitted) else operand


def _lazily(operand: Operand | Lazy) -> Operand | Lazy:
    return operand if callable(operand) else _thunk(operand)


def _thunk(value: Operand) -> Lazy:
    return lambda: value


def _forced(argument: Operand | Lazy) -> Scalar | Grid:
    return plain(argument() if callable(argument) else argument)


_READS: Final[dict[str, Callable[[Scalar], Scalar]]] = {
    "n": number,
    "t": text,
    "b": logical,
    "s": _any_scalar,
}
_ARRIVES: Final[dict[str, Callable[..., Operand | Lazy]]] = {
    **dict.fromkeys("ntbs", plain),
    "g": _whole,
    "a": _reference,
    "l": _lazily,
}
