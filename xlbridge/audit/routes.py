"""The model route against the cells: every result that both have, compared one by one."""

from __future__ import annotations

from collections.abc import Iterator, Mapping
from dataclasses import dataclass
from math import isclose
from typing import Any, Final

#: both routes work in double precision on the same formulas; what is left is the order of a sum
TOLERANCE: Final = 1e-12


@dataclass(frozen=True, slots=True)
class Difference:
    """One result on which the two routes do not agree; lists count from 1."""

    path: str
    cell: Any
    model: Any


@dataclass(frozen=True, slots=True)
class Agreement:
    """How many results were compared, and those that differ."""

    compared: int
    differences: tuple[Difference, ...]


def compare(cells: Mapping[str, Any], model: Mapping[str, Any]) -> Agreement:
    """Compare the results read from a workbook with those of the model route, key by key.

    A key that only one of them has is not compared; a list of another length differs as a whole.
    """
    pairs = list(_pairs(cells, model, ""))
    return Agreement(len(pairs), tuple(Difference(*pair) for pair in pairs if not _same(*pair[1:])))


def _pairs(cell: Any, model: Any, path: str) -> Iterator[tuple[str, Any, Any]]:
    if isinstance(cell, Mapping) and isinstance(model, Mapping):
        for key in (key for key in cell if key in model):
            yield from _pairs(cell[key], model[key], f"{path}.{key}" if path else key)
    elif isinstance(cell, list) and isinstance(model, list) and len(cell) == len(model):
        for place, (c, m) in enumerate(zip(cell, model, strict=True), 1):
            yield from _pairs(c, m, f"{path}[{place}]")
    else:
        yield path, cell, model


def _same(cell: Any, model: Any) -> bool:
    if isinstance(cell, float) and isinstance(model, float):
        return isclose(cell, model, rel_tol=TOLERANCE)
    return type(cell) is type(model) and bool(cell == model)
