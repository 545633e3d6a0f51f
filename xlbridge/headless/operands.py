"""What a formula's parts evaluate to: cell values, grids, and references that still know their address."""

from __future__ import annotations

from collections.abc import Callable
from dataclasses import dataclass, field
from typing import TypeAlias

from xlbridge.values import Grid, Omitted, Scalar


class NotEvaluated(Exception):
    """A formula, or a cell it needs, is outside the stated subset of the formula language.

    The message says why in words. It is never turned into a value: every cell that depends on it is
    itself *not evaluated, because …*.
    """


@dataclass(frozen=True, slots=True)
class Area:
    """A rectangular reference on one sheet; rows and columns count from 1, both ends included.

    ``read`` returns the values of its cells (evaluating them first where they hold formulas).
    """

    sheet: str
    top: int
    left: int
    bottom: int
    right: int
    read: Callable[[Area], Grid] = field(compare=False, repr=False)

    @property
    def grid(self) -> Grid:
        """The values of the cells, row by row."""
        return self.read(self)

    @property
    def is_cell(self) -> bool:
        """Whether this is one single cell."""
        return self.top == self.bottom and self.left == self.right

    @property
    def shape(self) -> tuple[int, int]:
        """Rows and columns."""
        return self.bottom - self.top + 1, self.right - self.left + 1


Operand: TypeAlias = Scalar | Grid | Area | Omitted
