"""Rounding to digits and to multiples.

Numbers are taken at fifteen significant digits, so that 2.675 rounds as the number a reader sees.
"""

from __future__ import annotations

import math
from decimal import ROUND_DOWN, ROUND_HALF_UP, ROUND_UP, Decimal
from typing import Final

from xlbridge.headless.builtins.builtin import Builtin
from xlbridge.headless.coercion import Fault, nearly_equal


def decimal(value: float) -> Decimal:
    """Return a number at its fifteen significant digits."""
    return Decimal(f"{value:.14E}")


def rounded(value: float, digits: float, mode: str = ROUND_HALF_UP) -> float:
    """Return a number rounded to decimal places, left of the point where ``digits`` is negative."""
    shown, places = decimal(value), int(max(-400.0, min(400.0, digits)))
    if value == 0.0 or shown.adjusted() + places >= 14:
        return value
    return float(shown.quantize(Decimal(1).scaleb(-places), rounding=mode))


def floor(value: float) -> float:
    """Return the integer at or below a number; one that agrees to fifteen digits is taken as reached."""
    nearest = float(round(value))
    return nearest if nearly_equal(value, nearest) else float(math.floor(value))


def ceiling(value: float) -> float:
    """Return the integer at or above a number."""
    return -floor(-value)


def _away(value: float) -> float:
    return math.copysign(ceiling(abs(value)), value)


def _mround(value: float, multiple: float) -> float:
    if value * multiple < 0.0:
        raise Fault("#NUM!", "MROUND: number and multiple have different signs")
    return multiple * math.floor(value / multiple + 0.5) if multiple else 0.0


def _same_sign(name: str, value: float, step: float) -> None:
    if value > 0.0 > step:
        raise Fault("#NUM!", f"{name}: a positive number has no negative multiple")


def _ceiling(value: float, step: float) -> float:
    _same_sign("CEILING", value, step)
    return step * ceiling(value / step) if step else 0.0


def _floor(value: float, step: float) -> float:
    _same_sign("FLOOR", value, step)
    return step * floor(value / step) if value else 0.0


def _ceiling_math(value: float, step: float = 1.0, mode: float = 0.0) -> float:
    size = abs(step)
    if not size:
        return 0.0
    return size * (_away(value / size) if value < 0.0 and mode else ceiling(value / size))


def _floor_math(value: float, step: float = 1.0, mode: float = 0.0) -> float:
    size = abs(step)
    if not size:
        return 0.0
    return size * (ceiling(value / size) if value < 0.0 and mode else floor(value / size))


def _odd(value: float) -> float:
    return (
        math.copysign(2.0 * ceiling((abs(value) - 1.0) / 2.0) + 1.0, value)
        if abs(value) > 1.0
        else (-1.0 if value < 0.0 else 1.0)
    )


FUNCTIONS: Final = (
    Builtin("ROUND", "nn", rounded),
    Builtin("ROUNDUP", "nn", lambda value, digits: rounded(value, digits, ROUND_UP)),
    Builtin("ROUNDDOWN", "nn", lambda value, digits: rounded(value, digits, ROUND_DOWN)),
    Builtin("TRUNC", "nn", lambda value, digits=0.0: rounded(value, digits, ROUND_DOWN), 1),
    Builtin("INT", "n", floor),
    Builtin("MROUND", "nn", _mround),
    Builtin("CEILING", "nn", _ceiling),
    Builtin("FLOOR", "nn", _floor),
    Builtin("CEILING.MATH", "nnn", _ceiling_math, 1),
    Builtin("FLOOR.MATH", "nnn", _floor_math, 1),
    Builtin("EVEN", "n", lambda value: 2.0 * _away(value / 2.0)),
    Builtin("ODD", "n", _odd),
)
