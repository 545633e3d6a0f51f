"""Draw the sheet of settings that the bridge to Python reads: key and value, from the first cell on."""

from __future__ import annotations

from collections.abc import Iterable

from openpyxl.worksheet.worksheet import Worksheet

from engine.units import US
from workbook_templates.declare import Role
from workbook_templates.draw import sheets, style

WIDTHS = (22, 56, 70)


def draw(sheet: Worksheet, settings: Iterable[tuple[str, str, str]]) -> None:
    """Fill the sheet; each setting is a key, a value and what it is for."""
    for row, (key, value, text) in enumerate(settings, 1):
        style.write(sheet.cell(row, 1), key, style.BOLD, style.LEFT)
        sheet.cell(row, 2, value or None)
        style.dress(sheet.cell(row, 2), Role.INPUT, "@")
        style.write(sheet.cell(row, 3), text, style.BODY, style.WRAP)
        for column, width in zip("ABC", WIDTHS, strict=True):
            sheet.column_dimensions[column].width = width
        sheets.fit_row(sheet, row, WIDTHS)
    sheets.page(sheet, US, "1:1")
