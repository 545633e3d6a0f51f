"""Draw the list of the worksheet functions that the workbook calls: made from the catalogue."""

from __future__ import annotations

from collections.abc import Iterator

from openpyxl.worksheet.worksheet import Worksheet

from workbook_templates.draw import sheets, style
from workbook_templates.inputs import Inputs
from workbook_templates.layout import Layout
from xlbridge.catalogue import CATALOGUE, SheetFunction
from xlbridge.catalogue.validate import describe
from xlbridge.work import equation

HEADERS = ("Function", "What it gives", "Clause", "Equation", "Arguments", "Confidence and notes")
WIDTHS = (34, 34, 24, 44, 62, 44)


def draw(sheet: Worksheet, layout: Layout, inputs: Inputs) -> None:
    """Fill the list; the command ``storyledger functions`` shows all there are."""
    sheets.head(sheet, "Worksheet functions")
    sheets.table_head(sheet, 4, HEADERS, WIDTHS)
    for row, entry in enumerate(_called(layout), 5):
        for column, text in enumerate(_texts(entry, inputs.edition), 1):
            style.write(sheet.cell(row, column), text, style.BOLD if column == 1 else style.BODY, style.TOP)
        sheets.fit_row(sheet, row, WIDTHS)
    sheet.freeze_panes = "B5"
    sheets.page(sheet, inputs.units, "1:4")


def _called(layout: Layout) -> Iterator[SheetFunction]:
    """The functions in the formulas of the parts, in the order of the catalogue."""
    blocks = (*layout.criteria, *(band for grid in layout.grids for band in grid.table.bands))
    names = {name for block in blocks for q in block.quantities for name in q.calls}
    return (entry for name, entry in CATALOGUE.items() if name in names)


def _texts(entry: SheetFunction, edition: str) -> tuple[str, ...]:
    rule = entry.clauses.get(edition)
    arguments = "\n".join(f"{a.name}: {describe(a)}" for a in entry.arguments)
    notes = "\n".join(text for text in (rule.note if rule else "", entry.note) if text)
    where = str(rule) if rule else f"not in {edition}"
    return entry.usage, entry.summary, where, equation(entry), arguments, notes
