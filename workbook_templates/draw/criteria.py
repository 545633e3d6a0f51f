"""Draw the criteria sheet: one row a quantity, one column a direction."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any

from openpyxl.worksheet.pagebreak import Break
from openpyxl.worksheet.worksheet import Worksheet

from engine.units import DISPLACEMENT_PER_LENGTH, symbol
from workbook_templates.declare import DIRECTIONS, Block, Quantity, Role
from workbook_templates.draw import sheets, style
from workbook_templates.inputs import Inputs
from workbook_templates.layout import CRITERIA, CRITERIA_COLUMN, CRITERIA_TOP, Layout

HEADERS = ("", "Quantity", "Symbol", "X, or both", "Y", "Unit", "Clause", "Source of the entry", "Note")
PAGE_HEIGHT = 690.0  # points of rows on one landscape page, fitted to its width
AS_ABOVE = "as above"  # stands for a note that the row above has
WIDTHS = (3, 46, 13, 25, 25, 7, 23, 31, 50)


def draw(sheet: Worksheet, layout: Layout, inputs: Inputs) -> None:
    """Fill the criteria sheet and give every value its defined name."""
    sheets.head(sheet, "Criteria")
    sheets.table_head(sheet, 4, HEADERS, WIDTHS)
    top = CRITERIA_TOP
    used = 0.0
    for block in layout.criteria:
        style.write(sheet.cell(top, 2), block.title, style.HEADING)
        said = ""
        for q in block.quantities:
            note = sheets.clause_note(q, inputs.edition)
            _draw_row(sheet, layout, inputs, block, q, AS_ABOVE if note and note == said else note)
            said = note
        bottom = top + len(block.quantities) + 2
        high = sum(sheet.row_dimensions[row].height or sheets.LINE for row in range(top, bottom))
        if used and used + high > PAGE_HEIGHT:
            sheet.row_breaks.append(Break(id=top - 1))
            used = 0.0
        top, used = bottom, used + high
    sheet.freeze_panes = "D5"
    sheets.page(sheet, inputs.units, "1:4")


def _draw_row(sheet: Worksheet, layout: Layout, inputs: Inputs, block: Block, q: Quantity, note: str) -> None:
    row = layout.rows[q.key]
    labels = {
        1: style.letter(q.role),
        2: q.text,
        3: q.shown_symbol,
        6: symbol(q.unit, inputs.units).replace("text", ""),
        7: sheets.clause_text(q, inputs.edition),
        9: note,
    }
    for column, text in labels.items():
        font = style.SMALL if column in (1, 9) else style.BODY
        style.write(sheet.cell(row, column), text, font, style.WRAP)
    sheet.cell(row, 6).alignment = style.CENTRE
    for direction in DIRECTIONS if block.per_direction else (None,):
        cell = sheet[f"{CRITERIA_COLUMN[direction]}{row}"]
        cell.value = _content(layout, inputs, q, direction)
        style.dress(cell, q.role, style.number_format(q, inputs.units))
        if q.lines > 1:
            cell.font = style.SMALL
        sheets.name(sheet, layout.name(q.key, direction), layout.criteria_cell(q.key, direction))
        if q.role is Role.INPUT and (rule := sheets.validation(q)) is not None:
            rule.add(cell)
            sheet.add_data_validation(rule)
    if q.role is Role.INPUT:
        source = sheet.cell(row, 8, inputs.source(q, block.per_direction))
        style.dress(source, Role.INPUT, "@")
        sheets.name(sheet, layout.source_name(q.key), f"$H${row}")
    if q.role is Role.VERDICT:
        sheets.flag_verdicts(sheet, f"D{row}:E{row}")
    sheets.fit_row(sheet, row, WIDTHS, least=max(q.lines, 2 if q.unit == "text" and q.function else 1))


def _content(layout: Layout, inputs: Inputs, q: Quantity, direction: str | None) -> Any:
    if q.role is Role.INPUT:
        return inputs.criterion(q, direction)
    if q.role is Role.FIXED:
        fixed: Mapping[str, Any] = {
            "edition": inputs.edition,
            "units": inputs.units,
            "displacement_per_length": DISPLACEMENT_PER_LENGTH[inputs.units],
        }
        return fixed[q.key]
    return layout.content(q, CRITERIA, direction)
