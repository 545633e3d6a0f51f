"""What each worksheet function is checked against outside the project: generated from the check values."""

from __future__ import annotations

import csv
from collections.abc import Mapping
from dataclasses import dataclass
from functools import cache
from pathlib import Path
from types import MappingProxyType

FILE = Path(__file__).with_name("checked.csv")


@dataclass(frozen=True, slots=True)
class OutsideCheck:
    """Values of one source: ``kind`` is published, derived, common practice or from memory."""

    source: str
    kind: str
    values: int

    def __str__(self) -> str:
        return f"{self.source} ({self.kind}, {self.values} value{'s' * (self.values > 1)})"


@cache
def outside_checks() -> Mapping[str, tuple[OutsideCheck, ...]]:
    """Return the checks of each worksheet function that has any."""
    found: dict[str, tuple[OutsideCheck, ...]] = {}
    with FILE.open(encoding="utf-8", newline="") as file:
        for row in csv.DictReader(file):
            check = OutsideCheck(row["source"], row["kind"], int(row["values"]))
            found[row["function"]] = (*found.get(row["function"], ()), check)
    return MappingProxyType(found)
