"""What a cell can hold, as every front end hands it to the adapter and gets it back.

A cell is a float, a text, a boolean, ``None`` (blank) or a :class:`CellError`. A range is a grid: a tuple
of equally long rows. ``OMITTED`` stands for an argument that was left out, which is not a blank cell.
"""

from __future__ import annotations

from dataclasses import dataclass, field
from typing import Final, TypeAlias

ERROR_CODES: Final = ("#NULL!", "#DIV/0!", "#VALUE!", "#REF!", "#NAME?", "#NUM!", "#N/A")


@dataclass(frozen=True, slots=True)
class CellError:
    """A spreadsheet error value; two errors are equal when their codes are, whatever the reason."""

    code: str
    reason: str = field(default="", compare=False)

    def __str__(self) -> str:
        return self.code


class Omitted:
    """The type of :data:`OMITTED`."""

    def __repr__(self) -> str:
        return "OMITTED"


OMITTED: Final = Omitted()

Scalar: TypeAlias = float | str | bool | CellError | None
Grid: TypeAlias = tuple[tuple[Scalar, ...], ...]
Value: TypeAlias = Scalar | Grid
Argument: TypeAlias = Value | Omitted
