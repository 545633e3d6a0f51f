"""Finding a value in a row or column: exact, with wildcards, or the nearest one.

Numbers are compared exactly. A nearest match is defined on sorted cells only: where they are not sorted, what
a spreadsheet finds depends on its way of halving the range, so the search is refused.
"""

from __future__ import annotations

from collections.abc import Sequence
from itertools import pairwise

from xlbridge.headless.builtins.criteria import has_wildcards, wildcard
from xlbridge.headless.coercion import Fault
from xlbridge.headless.operands import NotEvaluated
from xlbridge.values import Scalar


def exact(value: Scalar, cells: Sequence[Scalar], wildcards: bool = True, backwards: bool = False) -> int:
    """Return the place (from 1) of the first cell equal to the value, or of the last one."""
    if isinstance(value, str) and wildcards and has_wildcards(value):
        pattern = wildcard(value)
        found = [isinstance(cell, str) and pattern.fullmatch(cell) is not None for cell in cells]
    else:
        wanted, kind = _key(value), type(0.0 if value is None else value)
        found = [type(cell) is kind and _key(cell) == wanted for cell in cells]
    if value is None and True in found:
        raise NotEvaluated("whether a blank finds 0 depends on the program")
    if True not in found:
        raise not_found(value)
    return len(found) - found[::-1].index(True) if backwards else found.index(True) + 1


def at_most(value: Scalar, cells: Sequence[Scalar]) -> int:
    """Return the place of the last cell not above the value; the cells must ascend."""
    keys = _sorted_keys(value, cells, descending=False)
    return _last(value, [place for place, key in keys if key <= _key(value)])  # type: ignore[operator]


def at_least(value: Scalar, cells: Sequence[Scalar]) -> int:
    """Return the place of the last cell not below the value; the cells must descend."""
    keys = _sorted_keys(value, cells, descending=True)
    return _last(value, [place for place, key in keys if key >= _key(value)])  # type: ignore[operator]


def nearest(value: Scalar, cells: Sequence[Scalar], below: bool) -> int:
    """Return the place of an equal cell, else of the next smaller or larger one, in any order of cells."""
    _refuse_blank(value)
    wanted = _key(value)
    keys = [(_key(cell), place) for place, cell in enumerate(cells, 1) if _alike(cell, value)]
    if below:
        fitting = [(key, -place) for key, place in keys if key <= wanted]  # type: ignore[operator]
        best = max(fitting, default=None)
    else:
        fitting = [(key, place) for key, place in keys if key >= wanted]  # type: ignore[operator]
        best = min(fitting, default=None)
    if best is None:
        raise not_found(value)
    return abs(best[1])


def not_found(value: Scalar) -> Fault:
    """Return the fault of a search without a match."""
    return Fault("#N/A", f"{value!r} is not found")


def _refuse_blank(value: Scalar) -> None:
    if value is None:
        raise NotEvaluated("a nearest match for a blank cell")


def _alike(cell: Scalar, value: Scalar) -> bool:
    return type(cell) is (float if value is None else type(value))


def _key(value: Scalar) -> float | str:
    return value.lower() if isinstance(value, str) else float(value or 0.0)  # type: ignore[arg-type]


def _sorted_keys(value: Scalar, cells: Sequence[Scalar], descending: bool) -> list[tuple[int, float | str]]:
    _refuse_blank(value)
    keys = [(place, _key(cell)) for place, cell in enumerate(cells, 1) if _alike(cell, value)]
    if any(_out_of_order(left, right, descending) for (_, left), (_, right) in pairwise(keys)):
        raise NotEvaluated(f"a nearest match needs {'descending' if descending else 'ascending'} cells")
    return keys


def _out_of_order(left: float | str, right: float | str, descending: bool) -> bool:
    return left < right if descending else left > right  # type: ignore[operator]


def _last(value: Scalar, places: list[int]) -> int:
    if not places:
        raise not_found(value)
    return places[-1]
