"""Functions of one or two numbers, and of whole numbers."""

from __future__ import annotations

import math
from collections.abc import Callable
from typing import Final

from xlbridge.headless.builtins.builtin import Builtin
from xlbridge.headless.builtins.collect import numbers
from xlbridge.headless.builtins.rounding import floor
from xlbridge.headless.coercion import Fault, nearly_equal
from xlbridge.headless.operands import Operand
from xlbridge.headless.operators import power


def _real(name: str, function: Callable[[float], float]) -> Builtin:
    """A function of the math library; outside its domain it is ``#NUM!``."""

    def evaluate(value: float) -> float:
        try:
            return function(value)
        except ValueError:
            raise Fault("#NUM!", f"{name}({value:g}) is not a real number") from None

    return Builtin(name, "n", evaluate)


def _log(value: float, base: float = 10.0) -> float:
    if value <= 0.0 or base <= 0.0:
        raise Fault("#NUM!", "LOG needs numbers above 0")
    return math.log10(value) if base == 10.0 else math.log(value) / math.log(base)


def _atan2(x: float, y: float) -> float:
    if x == y == 0.0:
        raise Fault("#DIV/0!", "ATAN2 has no direction at the origin")
    return math.atan2(y, x)


def _mod(value: float, divisor: float) -> float:
    multiple = divisor * floor(value / divisor)
    return 0.0 if nearly_equal(value, multiple) else value - multiple


def _quotient(value: float, divisor: float) -> float:
    return math.copysign(floor(abs(value / divisor)), value / divisor)


def _factorial(value: float) -> float:
    if value < 0.0:
        raise Fault("#NUM!", "FACT of a negative number")
    return float(math.factorial(min(int(value), 200)))


def _combinations(total: float, chosen: float) -> float:
    n, k = int(total), int(chosen)
    if k < 0 or n < k:
        raise Fault("#NUM!", f"COMBIN: cannot choose {chosen:g} of {total:g}")
    if min(k, n - k) > 1024:  # then there are more than 2^1024 combinations
        raise OverflowError
    return float(math.comb(n, k))


def _whole(operands: tuple[Operand, ...]) -> list[int]:
    values = [int(value) for value in numbers(operands)]
    if any(value < 0 for value in values):
        raise Fault("#NUM!", "a negative number has no common divisor or multiple here")
    return values


FUNCTIONS: Final = (
    Builtin("ABS", "n", abs),
    Builtin("SIGN", "n", lambda value: float((value > 0.0) - (value < 0.0))),
    _real("SQRT", math.sqrt),
    _real("EXP", math.exp),
    _real("LN", math.log),
    _real("LOG10", math.log10),
    Builtin("LOG", "nn", _log, 1),
    Builtin("POWER", "nn", power),
    Builtin("MOD", "nn", _mod),
    Builtin("QUOTIENT", "nn", _quotient),
    Builtin("PI", "", lambda: math.pi),
    Builtin("RADIANS", "n", math.radians),
    Builtin("DEGREES", "n", math.degrees),
    _real("SIN", math.sin),
    _real("COS", math.cos),
    _real("TAN", math.tan),
    _real("ASIN", math.asin),
    _real("ACOS", math.acos),
    _real("ATAN", math.atan),
    Builtin("ATAN2", "nn", _atan2),
    _real("SINH", math.sinh),
    _real("COSH", math.cosh),
    _real("TANH", math.tanh),
    Builtin("FACT", "n", _factorial),
    Builtin("COMBIN", "nn", _combinations),
    Builtin("GCD", "g*", lambda *operands: float(math.gcd(*_whole(operands)))),
    Builtin("LCM", "g*", lambda *operands: float(math.lcm(*_whole(operands)))),
)
