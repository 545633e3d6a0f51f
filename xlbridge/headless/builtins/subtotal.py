"""SUBTOTAL by its function codes."""

from __future__ import annotations

from collections.abc import Callable
from typing import Final

from xlbridge.headless.builtins import aggregate, statistics
from xlbridge.headless.builtins.builtin import Builtin
from xlbridge.headless.coercion import Fault
from xlbridge.headless.operands import NotEvaluated, Operand

_CODES: Final[dict[int, Callable[..., Operand]]] = {
    1: aggregate.average,
    2: aggregate.count,
    3: aggregate.count_filled,
    4: aggregate.maximum,
    5: aggregate.minimum,
    6: aggregate.product,
    7: statistics.sample_deviation,
    8: statistics.population_deviation,
    9: aggregate.total,
    10: statistics.sample_variance,
    11: statistics.population_variance,
}


def _subtotal(code: float, *areas: Operand) -> Operand:
    kind = int(code)
    if 101 <= kind <= 111:
        raise NotEvaluated("SUBTOTAL codes from 101 depend on hidden rows")
    if kind not in _CODES:
        raise Fault("#VALUE!", f"SUBTOTAL has no code {code:g}")
    return _CODES[kind](*areas)


FUNCTIONS: Final = (Builtin("SUBTOTAL", "na*", _subtotal),)
