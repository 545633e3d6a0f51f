"""The product's own headless LibreOffice with further jobs: reading and editing as a user does."""

from __future__ import annotations

import contextlib
from collections.abc import Iterator
from pathlib import Path
from typing import Any

from xlbridge.calc import office
from xlbridge.calc.office import OfficeError, installation, missing, value_of

__all__ = ["REQUIRED", "Book", "Office", "OfficeError", "installation", "missing"]

REQUIRED = "STORYLEDGER_REQUIRE_OFFICE"


class Office(office.Office):
    """A running office."""

    driver = Path(__file__).with_name("office_jobs.py")

    @contextlib.contextmanager
    def open(self, path: Path, recalculate: bool = True) -> Iterator[Book]:
        """Load a workbook (a copy of it) and recalculate everything in it."""
        with super().open(path, recalculate) as book:
            yield Book(self, book.number)


class Book(office.Book):
    """A workbook open in the office."""

    def sheets(self) -> list[str]:
        """The sheets' names in order."""
        return list(self._job("sheets"))

    def read(self, sheet: str, cells: str) -> list[list[Any]]:
        """The values of a range, row by row."""
        return [[value_of(value) for value in row] for row in self._job("read", sheet, cells)]

    def value(self, sheet: str, cell: str) -> Any:
        """The value of one cell."""
        return self.read(sheet, cell)[0][0]

    def formula(self, sheet: str, cell: str) -> str:
        """A cell's content in Calc's own notation (``=SUM(A1:A3;$B$1)``)."""
        return str(self._job("formula", sheet, cell))

    def set_formula(self, sheet: str, cell: str, formula: str) -> None:
        """Enter a formula."""
        self._job("set_formula", sheet, cell, formula)

    def set_value(self, sheet: str, cell: str, value: float | str | None) -> None:
        """Enter a number or a text; None clears the cell."""
        self._job("set_value", sheet, cell, value)

    def insert_rows(self, sheet: str, row: int, count: int = 1) -> None:
        """Insert rows before ``row`` (counted from 1)."""
        self._job("insert_rows", sheet, row, count)

    def delete_rows(self, sheet: str, row: int, count: int = 1) -> None:
        """Delete rows from ``row`` on."""
        self._job("delete_rows", sheet, row, count)

    def insert_columns(self, sheet: str, column: int, count: int = 1) -> None:
        """Insert columns before ``column`` (counted from 1)."""
        self._job("insert_columns", sheet, column, count)

    def insert_sheet(self, sheet: str, place: int) -> None:
        """Insert an empty sheet before the one at ``place`` (counted from 0)."""
        self._job("insert_sheet", sheet, place)

    def rename_sheet(self, sheet: str, name: str) -> None:
        """Give a sheet another name; formulas follow."""
        self._job("rename_sheet", sheet, name)

    def move_sheet(self, sheet: str, place: int) -> None:
        """Move a sheet before the one at ``place`` (counted from 0)."""
        self._job("move_sheet", sheet, place)

    def fill_down(self, sheet: str, cells: str) -> None:
        """Copy the first row of a range into the rows below it."""
        self._job("fill_down", sheet, cells)

    def fill_up(self, sheet: str, cells: str) -> None:
        """Copy the last row of a range into the rows above it."""
        self._job("fill_up", sheet, cells)
