"""The issue copy: the workbook in built-in functions, to be computed on a machine without the add-in.

A cell whose formula can not be written so holds the value computed for it. It looks like what is fixed,
a note says what it held, and a sheet of its own lists it; the checks sheet counts these cells.
"""

from __future__ import annotations

from collections.abc import Iterator, Mapping
from math import isclose
from typing import Final, NamedTuple

from openpyxl import Workbook
from openpyxl.comments import Comment
from openpyxl.worksheet.worksheet import Worksheet

from workbook_templates import layout as places
from workbook_templates.declare import Role
from workbook_templates.draw import checks, sheets, style
from xlbridge.headless.compute import Computed
from xlbridge.native import NoNative, in_builtin_functions
from xlbridge.values import CellError, Scalar

SHEET: Final = "Fixed values"
CALLS: Final = "ELF_"
HEADERS: Final = ("Sheet", "Cell", "Fixed value", "Formula with the add-in", "Why it is fixed")
WIDTHS: Final = (18, 8, 30, 90, 52)
TOP: Final = 4
COUNT_TEXT: Final = f"Cells with a fixed value: they do not follow a changed entry (sheet {SHEET})"
AGREES: Final = 1e-12

Values = Mapping[tuple[str, str], Scalar]


class Fixed(NamedTuple):
    """A cell that holds its value."""

    sheet: str
    address: str
    value: Scalar
    formula: str
    why: str


def rewrite(workbook: Workbook, values: Values, units: str) -> None:
    """Write every formula of a drawn workbook in built-in functions, or fix its value and say so."""
    found = [fixed for sheet in workbook.worksheets for fixed in _rewrite_sheet(sheet, values)]
    _draw_list(workbook.create_sheet(SHEET), found, units)
    _draw_count(workbook[places.CHECKS])


def _rewrite_sheet(sheet: Worksheet, values: Values) -> Iterator[Fixed]:
    for cell in (cell for row in sheet.iter_rows() for cell in row if cell.data_type == "f"):
        formula = str(cell.value)
        if CALLS not in formula:
            continue
        try:
            cell.value = in_builtin_functions(formula)
        except NoNative as reason:
            value = values[sheet.title, cell.coordinate]
            if isinstance(value, CellError):
                raise ValueError(f"{sheet.title}!{cell.coordinate}: {value.code} can not be issued") from None
            cell.value = value
            style.dress(cell, Role.FIXED, cell.number_format)
            cell.comment = Comment(
                f"Fixed value, does not follow a changed entry. It was {formula}", "Storyledger"
            )
            yield Fixed(sheet.title, cell.coordinate, value, formula.removeprefix("="), str(reason))


def _draw_list(sheet: Worksheet, found: list[Fixed], units: str) -> None:
    sheets.head(sheet, SHEET)
    sheets.table_head(sheet, TOP, HEADERS, WIDTHS)
    for row, fixed in enumerate(found, TOP + 1):
        for column, content in enumerate(fixed, 1):
            style.write(sheet.cell(row, column), content, style.BODY, style.TEXT)
        sheets.fit_row(sheet, row, WIDTHS)
    sheet.freeze_panes = f"A{TOP + 1}"
    sheets.page(sheet, units, f"1:{TOP}")


def _draw_count(sheet: Worksheet) -> None:
    """Count the cells on the checks sheet, in the line between its summary and its table."""
    row = checks.STATUS + 1
    style.write(sheet.cell(row, 2), COUNT_TEXT, style.BOLD)
    sheet.cell(row, 4, f"=COUNTA('{SHEET}'!B{TOP + 1}:B1000000)")
    style.dress(sheet.cell(row, 4), Role.RESULT, "General")
    sheet.cell(row, 4).alignment = style.LEFT


def differing(functions: Computed, native: Computed) -> list[str]:
    """Return the cells where the issue copy does not give what the functions gave."""
    return [
        f"{sheet}!{address}"
        for (sheet, address), found in native.values.items()
        if (sheet, address) in functions.values and not _same(found, functions.values[sheet, address])
    ]


def _same(a: Scalar, b: Scalar) -> bool:
    if isinstance(a, float) and isinstance(b, float):
        return isclose(a, b, rel_tol=AGREES, abs_tol=AGREES)
    return a == b
