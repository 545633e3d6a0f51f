"""Built-in functions whose result depends on more of the workbook than the values they are handed.

Where what they depend on is not at hand, they are refused: a number that ignores it would be wrong.
"""

from __future__ import annotations

from collections.abc import Sequence
from dataclasses import dataclass
from typing import Final

from xlbridge.headless.book import Book
from xlbridge.headless.operands import Area, NotEvaluated

_COUNT_BLANKS: Final = frozenset({"ROWS", "COLUMNS", "COUNTBLANK"})
_BLANK_CRITERIA: Final = frozenset({"COUNTIF", "COUNTIFS"})
_CALENDAR: Final = frozenset({"DATE", "DAY", "DAYS", "MONTH", "TEXT", "VALUE", "YEAR"})


@dataclass(frozen=True, slots=True)
class WholeLines(Area):
    """Whole columns or rows, cut to the part of the sheets that is used."""


def require_context(name: str, operands: Sequence[object], book: Book) -> None:
    """Raise :class:`NotEvaluated` where a call would need what the evaluator does not follow."""
    _require_no_blank_counted(name, operands)
    if name in _CALENDAR and book.counts_from_1904:
        raise NotEvaluated(f"{name} in a workbook that counts its days from 1904")
    if name == "SUBTOTAL":
        for area in (operand for operand in operands if isinstance(operand, Area)):
            _require_plain_rows(area, book)


def _require_plain_rows(area: Area, book: Book) -> None:
    """Refuse an area with further subtotals, or with rows that a filter hides: both are left out of it."""
    inside = (
        formula
        for (row, column), formula in book.formulas[area.sheet].items()
        if area.top <= row <= area.bottom and area.left <= column <= area.right
    )
    if any("SUBTOTAL(" in formula.text.upper() for formula in inside):
        raise NotEvaluated("SUBTOTAL over cells that hold a SUBTOTAL themselves")
    if book.hides_rows(area.sheet, area.top, area.bottom):
        raise NotEvaluated("SUBTOTAL over hidden rows, which a filter may leave out")


def _require_no_blank_counted(name: str, operands: Sequence[object]) -> None:
    """Refuse to count the blanks of whole columns or rows, which have been cut to the used part."""
    counts_blanks = name in _COUNT_BLANKS or (name in _BLANK_CRITERIA and any(map(_matches_blanks, operands)))
    if counts_blanks and any(isinstance(operand, WholeLines) for operand in operands):
        raise NotEvaluated(f"{name} would count the blanks of whole columns or rows; name the cells")


def _matches_blanks(criterion: object) -> bool:
    if isinstance(criterion, Area):
        return (
            not isinstance(criterion, WholeLines)
            and criterion.is_cell
            and _matches_blanks(criterion.grid[0][0])
        )
    return criterion is None or (
        isinstance(criterion, str) and (criterion in ("", "=") or criterion[:2] == "<>")
    )
