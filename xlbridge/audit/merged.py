"""Cells that lie under others: a merge keeps the content of its first cell only."""

from __future__ import annotations

from collections.abc import Mapping

from xlbridge.headless.book import Book
from xlbridge.headless.references import Cell

#: cells of a merged area that are looked at, more would only cost memory
MOST = 20_000


def swallowed(book: Book) -> Mapping[Cell, str]:
    """The cells that show nothing because they are merged with others, with their area."""
    found: dict[Cell, str] = {}
    for sheet in book.workbook.worksheets if book.workbook else ():
        for area in sheet.merged_cells.ranges:
            if area.size["rows"] * area.size["columns"] <= MOST:
                positions = ((row, column) for row, column in area.cells)
                found |= {
                    Cell(sheet.title, row, column): str(area)
                    for row, column in positions
                    if (row, column) != (area.min_row, area.min_col)
                }
    return found
