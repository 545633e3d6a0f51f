"""Entries and results by their paths in nested tables: ``direction.X.F_x[3]``, lists from 1."""

from __future__ import annotations

import re
from collections.abc import Iterator, Mapping
from typing import Any, Final

_STEP: Final = re.compile(r"(\w+)(?:\[(\d+)\])?")


def find(results: Mapping[str, Any], path: str) -> Any:
    """Return a result by its path, ``direction.X.F_x[3]``; nothing where there is none.

    >>> find({"direction": {"X": {"F_x": [1.0, 2.0]}}}, "direction.X.F_x[2]")
    2.0
    """
    found: Any = results
    for key, place in _STEP.findall(path):
        if not isinstance(found, Mapping) or key not in found:
            return None
        found = found[key]
        if place:
            found = found[int(place) - 1] if isinstance(found, list) and len(found) >= int(place) else None
    return None if isinstance(found, Mapping | list) else found


def leaves(value: Any, path: str = "") -> Iterator[tuple[str, Any]]:
    """Yield every single value of nested tables with its path.

    >>> list(leaves({"W": 3.0, "direction": {"X": {"F_x": [1.0, 2.0]}}}))
    [('W', 3.0), ('direction.X.F_x[1]', 1.0), ('direction.X.F_x[2]', 2.0)]
    """
    if isinstance(value, Mapping):
        for key, inner in value.items():
            yield from leaves(inner, f"{path}.{key}" if path else key)
    elif isinstance(value, list):
        for number, inner in enumerate(value, 1):
            yield from leaves(inner, f"{path}[{number}]")
    else:
        yield path, value
