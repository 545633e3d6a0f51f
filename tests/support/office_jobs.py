"""The jobs of the tests' own office: those of the product, and edits as a user makes them.

Run as ``office_jobs.py SOFFICE_BIN [ADDINS_FOLDER]`` by a Python that has ``uno``.
"""

import os
import sys

import uno  # noqa: F401 - the import hook of the names below

sys.dont_write_bytecode = True
sys.path.insert(0, os.path.join(os.path.dirname(__file__), "..", "..", "xlbridge", "calc"))

from com.sun.star.sheet.FillDateMode import FILL_DATE_DAY
from com.sun.star.sheet.FillDirection import TO_BOTTOM, TO_TOP
from com.sun.star.sheet.FillMode import SIMPLE
from office_driver import Jobs, main, values

EXCEL_ADDRESSES = 3  # com.sun.star.sheet.AddressConvention.XL_OOX


class EditingJobs(Jobs):
    """Reading and editing cell by cell."""

    def sheets(self, book):
        return list(self.books[book].Sheets.ElementNames)

    def read(self, book, sheet, cells):
        """Values of a range, row by row."""
        return values(self._range(book, sheet, cells))

    def formula(self, book, sheet, cell):
        return self._range(book, sheet, cell).getCellByPosition(0, 0).Formula

    def set_formula(self, book, sheet, cell, formula):
        """Enter a formula written as in an .xlsx file."""
        target = self._range(book, sheet, cell).getCellByPosition(0, 0)
        parser = self.books[book].createInstance("com.sun.star.sheet.FormulaParser")
        parser.FormulaConvention, parser.CompileEnglish = EXCEL_ADDRESSES, True
        target.setTokens(parser.parseFormula(formula.removeprefix("="), target.CellAddress))

    def set_value(self, book, sheet, cell, value):
        """Enter a number or a text; None clears the cell."""
        target = self._range(book, sheet, cell).getCellByPosition(0, 0)
        if isinstance(value, (int, float)):
            target.Value = float(value)
        else:
            target.String = value or ""

    def insert_rows(self, book, sheet, row, count=1):
        self._sheet(book, sheet).Rows.insertByIndex(row - 1, count)

    def delete_rows(self, book, sheet, row, count=1):
        self._sheet(book, sheet).Rows.removeByIndex(row - 1, count)

    def insert_columns(self, book, sheet, column, count=1):
        self._sheet(book, sheet).Columns.insertByIndex(column - 1, count)

    def insert_sheet(self, book, sheet, place):
        self.books[book].Sheets.insertNewByName(sheet, place)

    def rename_sheet(self, book, sheet, name):
        self._sheet(book, sheet).Name = name

    def move_sheet(self, book, sheet, place):
        self.books[book].Sheets.moveByName(sheet, place)

    def fill_down(self, book, sheet, cells):
        """Copy the first row of a range into the rows below it."""
        self._range(book, sheet, cells).fillSeries(TO_BOTTOM, SIMPLE, FILL_DATE_DAY, 1.0, 1e300)

    def fill_up(self, book, sheet, cells):
        """Copy the last row of a range into the rows above it."""
        self._range(book, sheet, cells).fillSeries(TO_TOP, SIMPLE, FILL_DATE_DAY, 1.0, 1e300)

    def _sheet(self, book, sheet):
        return self.books[book].Sheets.getByName(sheet)

    def _range(self, book, sheet, cells):
        return self._sheet(book, sheet).getCellRangeByName(cells)


if __name__ == "__main__":
    main(EditingJobs)
