"""Draw the list of worksheet functions: made from the catalogue, row by row."""

from __future__ import annotations

from openpyxl.worksheet.worksheet import Worksheet

from workbook_templates.draw import sheets, style
from workbook_templates.inputs import Inputs
from xlbridge.catalogue import CATALOGUE, SheetFunction
from xlbridge.catalogue.validate import describe
from xlbridge.work import equation

HEADERS = ("Function", "What it gives", "Clause", "Equation", "Arguments", "Confidence and notes")
WIDTHS = (34, 34, 24, 44, 62, 44)


def draw(sheet: Worksheet, inputs: Inputs) -> None:
    """Fill the list."""
    sheets.head(sheet, "Worksheet functions")
    sheets.table_head(sheet, 4, HEADERS, WIDTHS)
    for row, entry in enumerate(CATALOGUE.values(), 5):
        for column, text in enumerate(_texts(entry, inputs.edition), 1):
            style.write(sheet.cell(row, column), text, style.BOLD if column == 1 else style.BODY, style.TOP)
        sheets.fit_row(sheet, row, WIDTHS)
    sheet.freeze_panes = "B5"
    sheets.page(sheet, inputs.units, "1:4")


def _texts(entry: SheetFunction, edition: str) -> tuple[str, ...]:
    rule = entry.clauses.get(edition)
    arguments = "\n".join(f"{a.name}: {describe(a)}" for a in entry.arguments)
    notes = "\n".join(text for text in (rule.note if rule else "", entry.note) if text)
    where = str(rule) if rule else f"not in {edition}"
    return entry.usage, entry.summary, where, equation(entry), arguments, notes
