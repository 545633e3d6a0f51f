"""What cannot be seen: hidden sheets, rows and columns, and what frozen panes leave no room for."""

from __future__ import annotations

from collections.abc import Iterator
from itertools import groupby
from typing import Any, Final

from openpyxl.worksheet.worksheet import Worksheet

from xlbridge.audit.finding import Observation, Place
from xlbridge.audit.subject import Subject
from xlbridge.headless.book import Book
from xlbridge.headless.references import column_letters, column_number, parse_address

#: more frozen rows or columns than this leave no room on an ordinary screen (common practice)
FROZEN_ROWS, FROZEN_COLUMNS = 40, 20
#: points, and characters: a line of less is as good as hidden
NO_HEIGHT, NO_WIDTH = 1.0, 0.3
HIDDEN: Final = {"hidden": "hidden", "veryHidden": "hidden so that the program does not even list it"}


def check(subject: Subject) -> Iterator[Observation]:
    """Yield what a reader of the sheets does not see."""
    workbook = subject.book.workbook
    for sheet in workbook.worksheets if workbook else ():
        if sheet.sheet_state in HIDDEN:
            words = f"sheet {sheet.title} is {HIDDEN[sheet.sheet_state]}"
            yield Observation("sheet_hidden", Place(sheet.title), words, "visible", sheet.sheet_state)
        yield from _lines(subject.book, sheet)
        yield from _panes(sheet)


def _lines(book: Book, sheet: Worksheet) -> Iterator[Observation]:
    filled = {*book.constants[sheet.title], *book.formulas[sheet.title]}
    rows, columns = {row for row, _ in filled}, {column for _, column in filled}
    hidden_rows = [n for n, line in sheet.row_dimensions.items() if n in rows and _gone(line, NO_HEIGHT)]
    for first, last in _runs(hidden_rows):
        place = Place(sheet.title, f"{first}:{last}")
        which = f"row {first}" if first == last else f"rows {first} to {last}"
        yield Observation("line_hidden", place, f"hidden in {sheet.title}: {which}")
    hidden_columns = [
        n
        for line in sheet.column_dimensions.values()
        if _gone(line, NO_WIDTH)
        for n in range(line.min or column_number(line.index), (line.max or column_number(line.index)) + 1)
        if n in columns
    ]
    for first, last in _runs(hidden_columns):
        area = f"{column_letters(first)}:{column_letters(last)}"
        letters = [column_letters(n) for n in (first, last)]
        which = f"column {letters[0]}" if first == last else f"columns {letters[0]} to {letters[1]}"
        words = f"hidden in {sheet.title}: {which}"
        yield Observation("line_hidden", Place(sheet.title, area), words)


def _gone(line: Any, least: float) -> bool:
    """Whether a row or a column is hidden, or has no room for anything."""
    size = getattr(line, "height", None) if hasattr(line, "ht") else line.width if line.customWidth else None
    return bool(line.hidden) or (size is not None and size < least)


def _runs(numbers: list[int]) -> Iterator[tuple[int, int]]:
    for _, run in groupby(enumerate(sorted(set(numbers))), key=lambda pair: pair[1] - pair[0]):
        members = [number for _, number in run]
        yield members[0], members[-1]


def _panes(sheet: Worksheet) -> Iterator[Observation]:
    if sheet.freeze_panes:
        row, column = parse_address(str(sheet.freeze_panes))
        if row - 1 > FROZEN_ROWS or column - 1 > FROZEN_COLUMNS:
            words = f"{row - 1} rows and {column - 1} columns of {sheet.title} are frozen"
            yield Observation("view_blocked", Place(sheet.title), words)
