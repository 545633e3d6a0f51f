"""What a comparison says: one change, one result in both issues."""

from __future__ import annotations

from dataclasses import dataclass
from enum import StrEnum
from math import isclose
from typing import Any, Final

from xlbridge.headless.references import Cell

#: what the cells of two computations may differ by
TOLERANCE: Final = 1e-12


class Of(StrEnum):
    """What a change is a change of."""

    INPUT = "input"
    ROW = "row"
    SHEET = "sheet"
    LINE = "line"
    FORMULA = "formula"
    CONTENT = "content"
    FORMAT = "format"
    NAME = "name"


@dataclass(frozen=True, slots=True)
class Change:
    """One change: where it is in the later issue (none for what is gone), old and new.

    Changes with the same ``cause`` are one and the same, as that of a formula down a column. ``moved`` is
    an earlier formula with its references where they are in the later issue.
    """

    of: Of
    path: str
    cell: Cell | None
    old: Any
    new: Any
    words: str
    cause: str = ""
    unit: str = ""
    moved: str = ""


@dataclass(frozen=True, slots=True)
class Result:
    """One result; ``path`` is that of the later issue, or of the earlier one where the result is gone."""

    path: str
    old: Any
    new: Any

    @property
    def differs(self) -> bool:
        """Whether it changed by more than round-off."""
        return not same(self.old, self.new)

    @property
    def change(self) -> float | None:
        """The difference of two numbers."""
        return self.new - self.old if isinstance(self.old, float) and isinstance(self.new, float) else None

    @property
    def per_cent(self) -> float | None:
        """The same in per cent of the earlier value; none where that is zero."""
        return 100 * self.change / abs(self.old) if self.change is not None and self.old else None


def same(a: Any, b: Any) -> bool:
    """Whether two contents are the same; numbers but for round-off."""
    if isinstance(a, float | int) and isinstance(b, float | int) and not isinstance(a, bool):
        return isclose(a, b, rel_tol=TOLERANCE)
    return type(a) is type(b) and bool(a == b)


def shown(value: Any) -> str:
    """Return a content in words."""
    return "nothing" if value is None else f"{value:.10g}" if isinstance(value, float) else str(value)
