"""Totals and counts of the cells that meet criteria."""

from __future__ import annotations

import math
from collections.abc import Callable, Sequence
from dataclasses import replace
from typing import Final

from xlbridge.headless.builtins.aggregate import mean
from xlbridge.headless.builtins.builtin import Builtin
from xlbridge.headless.builtins.collect import cells, grid_numbers
from xlbridge.headless.builtins.criteria import criterion
from xlbridge.headless.coercion import Fault
from xlbridge.headless.operands import Area, Operand
from xlbridge.values import Omitted, Scalar

_PAIRS: Final = "as" * 127


def _mask(conditions: Sequence[Operand]) -> list[bool]:
    """Return, cell by cell, whether all (area, criterion) pairs are met."""
    areas, wanted = conditions[::2], conditions[1::2]
    if len(areas) != len(wanted):
        raise Fault("#VALUE!", "a range has no criterion")
    _same_shape(areas)
    tests = [criterion(value) for value in wanted]  # type: ignore[arg-type]
    columns = [map(test, cells(area)) for test, area in zip(tests, areas, strict=True)]
    return [all(met) for met in zip(*columns, strict=True)]


def _same_shape(areas: Sequence[Operand]) -> None:
    if len({area.shape for area in areas if isinstance(area, Area)}) > 1:
        raise Fault("#VALUE!", "the ranges have different sizes")


def _kept(target: Operand, conditions: Sequence[Operand]) -> list[float]:
    """Return the numbers of the target at the cells that meet the conditions; an error there is a fault."""
    _same_shape([target, *conditions[::2]])
    pairs = zip(cells(target), _mask(conditions), strict=True)
    kept: list[Scalar] = [cell for cell, met in pairs if met]
    return grid_numbers((tuple(kept),))


def _target(area: Area, target: Operand) -> Operand:
    """Return SUMIF's target: as large as the tested range, from the target's first cell on."""
    if not isinstance(target, Area):
        return area
    height, width = area.shape
    return replace(target, bottom=target.top + height - 1, right=target.left + width - 1)


def _one(finish: Callable[[list[float]], float]) -> Callable[..., float]:
    def evaluate(area: Area, wanted: Scalar, target: Area | Omitted | None = None) -> float:
        return finish(_kept(_target(area, target), (area, wanted)))

    return evaluate


def _many(finish: Callable[[list[float]], float]) -> Callable[..., float]:
    return lambda target, *conditions: finish(_kept(target, conditions))


def _mean(values: list[float]) -> float:
    return mean("AVERAGEIF", values)


def _countif(*conditions: Operand) -> float:
    return float(sum(_mask(conditions)))


FUNCTIONS: Final = (
    Builtin("COUNTIF", "as", _countif, catches=True),
    Builtin("COUNTIFS", _PAIRS, _countif, 2, catches=True),
    Builtin("SUMIF", "asa", _one(math.fsum), 2, catches=True),
    Builtin("SUMIFS", "a" + _PAIRS, _many(math.fsum), 3, catches=True),
    Builtin("AVERAGEIF", "asa", _one(_mean), 2, catches=True),
    Builtin("AVERAGEIFS", "a" + _PAIRS, _many(_mean), 3, catches=True),
    Builtin("MINIFS", "a" + _PAIRS, _many(lambda values: min(values, default=0.0)), 3, catches=True),
    Builtin("MAXIFS", "a" + _PAIRS, _many(lambda values: max(values, default=0.0)), 3, catches=True),
)
