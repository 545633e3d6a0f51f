"""Draw a table: rows between two guard rows, then the base if there is one, and the totals.

Every range in a formula runs from guard row to guard row. A row put in anywhere between them, the top and
the bottom included, is inside every range; blank guard rows count for nothing.
"""

from __future__ import annotations

from copy import copy
from itertools import groupby

from openpyxl.utils import column_index_from_string
from openpyxl.worksheet.pagebreak import Break
from openpyxl.worksheet.worksheet import Worksheet

from engine.units import symbol
from workbook_templates import layout as places
from workbook_templates.declare import Role
from workbook_templates.draw import sheets, style
from workbook_templates.inputs import Inputs
from workbook_templates.layout import FIRST_LEVEL, TOP_GUARD, Column, Grid, Layout
from xlbridge.catalogue.entry import NOT_NEGATIVE

TOTALS = {"sum": "SUM", "max": "MAX"}
PAGE_WIDTH = 180  # units of column width on one landscape page at SCALE
SCALE = 68  # per cent


def draw(sheet: Worksheet, layout: Layout, grid: Grid, inputs: Inputs) -> None:
    """Fill the sheet of a table."""
    breaks = _break_pages(sheet, grid)
    sheets.head(sheet, grid.table.title, ("B", *breaks))
    for column in grid.columns:
        _draw_header(sheet, inputs, column)
        _draw_cells(sheet, layout, grid, inputs, column)
        _draw_foot(sheet, layout, grid, inputs, column)
        _watch(sheet, grid, column)
    clauses = max(sheets.clause_text(c.quantity, inputs.edition).count(", ") + 1 for c in grid.columns)
    for row, height in ((places.TEXT_ROW, 36), (places.CLAUSE_ROW, 12 * clauses), (places.SYMBOL_ROW, 26)):
        sheet.row_dimensions[row].height = height
    if grid.table.row_lines > 1:
        for row in range(FIRST_LEVEL, grid.bottom_guard):
            sheet.row_dimensions[row].height = sheets.LINE * grid.table.row_lines
    for row in (TOP_GUARD, grid.bottom_guard):
        sheet.row_dimensions[row].height = 5
    area = f"$A${places.SYMBOL_ROW}:${grid.columns[-1].letter}${grid.bottom_guard}"
    sheets.name(sheet, grid.table.name, area)
    if grid.table.list_name:
        first, last = FIRST_LEVEL, grid.bottom_guard - 1
        sheets.name(sheet, grid.table.list_name, f"$A${first}:$A${last}")
    sheet.freeze_panes = f"B{TOP_GUARD}"
    sheets.page(sheet, inputs.units, f"1:{places.ROLE_ROW}")
    sheet.sheet_properties.pageSetUpPr.fitToPage = False
    sheet.page_setup.scale = SCALE
    sheet.print_title_cols = "A:A"


def _draw_header(sheet: Worksheet, inputs: Inputs, column: Column) -> None:
    q, first = column.quantity, column.quantity is column.band.quantities[0]
    lines = {
        places.BAND_ROW: f"{column.band.title} {column.direction or ''}".strip() if first else None,
        places.TEXT_ROW: q.text,
        places.SYMBOL_ROW: column.heading,
        places.UNIT_ROW: symbol(q.unit, inputs.units).replace("text", ""),
        places.CLAUSE_ROW: sheets.clause_text(q, inputs.edition).replace(", ", "\n"),
        places.MARK_ROW: sheets.clause_mark(q, inputs.edition),
        places.ROLE_ROW: style.letter(q.role),
    }
    for row, text in lines.items():
        cell = sheet[f"{column.letter}{row}"]
        font = style.BOLD if row in (places.BAND_ROW, places.SYMBOL_ROW) else style.SMALL
        style.write(cell, text, font, style.LEFT if row == places.BAND_ROW else style.CENTRE)
        cell.fill = style.BAND_FILL
    sheet.column_dimensions[column.letter].width = q.width


def _draw_cells(sheet: Worksheet, layout: Layout, grid: Grid, inputs: Inputs, column: Column) -> None:
    q, direction = column.quantity, column.direction
    number_format = style.number_format(q, inputs.units)
    for row in range(FIRST_LEVEL, grid.bottom_guard):
        cell = sheet[f"{column.letter}{row}"]
        entered = inputs.row(grid.table, row - FIRST_LEVEL, q, direction) if q.is_input else None
        if q.role is Role.FIXED:
            entered = grid.table.fixed[inputs.edition][row - FIRST_LEVEL]
        cell.value = layout.content(q, sheet.title, direction, row) if entered is None else entered
        if row == FIRST_LEVEL:
            style.dress(cell, q.role, number_format)
        else:
            cell._style = copy(sheet[f"{column.letter}{FIRST_LEVEL}"]._style)  # far faster than dressing
    for row in (TOP_GUARD, grid.bottom_guard):
        sheet[f"{column.letter}{row}"].fill = style.GUARD_FILL


def _draw_foot(sheet: Worksheet, layout: Layout, grid: Grid, inputs: Inputs, column: Column) -> None:
    total = _total(layout, grid, column)
    for row, value in ((grid.base_row, _base(layout, grid, column)), (grid.total_row, total)):
        if value is not None:
            cell = sheet[f"{column.letter}{row}"]
            cell.value = value
            style.dress(cell, Role.RESULT, style.number_format(column.quantity, inputs.units))


def _base(layout: Layout, grid: Grid, column: Column) -> str | int | None:
    q = column.quantity
    if q.base:
        return layout.write(q.base, grid.table.sheet, column.direction, grid.base_row)
    return grid.table.base.get(q.key)


def _total(layout: Layout, grid: Grid, column: Column) -> str | None:
    """A total counts first: no cell that failed can drop out of it in silence, no negative entry enter."""
    q = column.quantity
    names = grid.columns[0].quantity.key
    if q.key == names:
        return "Total or largest" if any(c.quantity.total for c in grid.columns) else None
    if not q.total:
        return None
    cells = f"{{{q.key}:all}}"
    sound = f"COUNT({cells})=COUNTA({{{names}:all}})"
    if q.span == NOT_NEGATIVE:
        sound = f'AND({sound},COUNTIF({cells},"<0")=0)'
    template = f"=IF({sound},{TOTALS[q.total]}({cells}),NA())"
    return layout.write(template, grid.table.sheet, column.direction)


def _watch(sheet: Worksheet, grid: Grid, column: Column) -> None:
    """Put the entry rule on an input column, the verdict colours on a verdict column."""
    area = f"{column.letter}{TOP_GUARD}:{column.letter}{grid.bottom_guard}"
    if column.quantity.role is Role.INPUT and (rule := sheets.validation(column.quantity)) is not None:
        rule.allow_blank = True
        rule.add(area)
        sheet.add_data_validation(rule)
    if column.quantity.role is Role.VERDICT:
        sheets.flag_verdicts(sheet, area)


def _break_pages(sheet: Worksheet, grid: Grid) -> list[str]:
    """Break the pages between bands; return the first column of each page after the first."""
    names = used = grid.columns[0].quantity.width
    starts = []
    for _, columns in groupby(grid.columns[1:], key=lambda c: (c.band, c.direction)):
        band = list(columns)
        wide = sum(c.quantity.width for c in band)
        if used + wide > PAGE_WIDTH:
            starts.append(band[0].letter)
            sheet.col_breaks.append(Break(id=column_index_from_string(band[0].letter) - 1))
            used = names
        used += wide
    return starts
