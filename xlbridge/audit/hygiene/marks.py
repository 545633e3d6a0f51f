"""Conditional formats that do not mark a cell but hide what is in it."""

from __future__ import annotations

from collections.abc import Iterator
from typing import Any

from openpyxl.worksheet.cell_range import CellRange
from openpyxl.worksheet.worksheet import Worksheet

from xlbridge.audit.finding import Observation, Place
from xlbridge.audit.manifest.formats import UNSEEN, colours, contrast, rgb
from xlbridge.audit.manifest.number_formats import sections
from xlbridge.audit.subject import Subject


def check(subject: Subject) -> Iterator[Observation]:
    """Yield the rules whose look leaves nothing to be read where they apply."""
    workbook = subject.book.workbook
    for sheet in workbook.worksheets if workbook else ():
        filled = {*subject.book.constants[sheet.title], *subject.book.formulas[sheet.title]}
        for area in sheet.conditional_formatting:
            cells = [b for b in area.cells.ranges if any(_holds(b, cell) for cell in filled)]
            for rule in area.rules if cells else ():
                if how := _hides(sheet, cells[0], rule.dxf):
                    place = Place(sheet.title, cells[0].coord)
                    formula = ", ".join(map(str, rule.formula or ())) or str(rule.type)
                    words = f"a conditional format hides what is in the cells where {formula}: {how}"
                    yield Observation("mark_hides", place, words, found=how)


def _holds(area: CellRange, cell: tuple[int, int]) -> bool:
    return area.min_row <= cell[0] <= area.max_row and area.min_col <= cell[1] <= area.max_col


def _hides(sheet: Worksheet, area: CellRange, look: Any) -> str:
    """How a look hides a content: no contrast of text and fill, or a number format that shows nothing."""
    if look is None:
        return ""
    own_text, own_fill = colours(sheet.cell(area.min_row, area.min_col))
    text = rgb(look.font.color, own_text) if look.font is not None else own_text
    fill = rgb(look.fill.bgColor, own_fill) if look.fill is not None else own_fill
    if contrast(text, fill) < UNSEEN and (text, fill) != (own_text, own_fill):
        return f"text {text} on {fill}"
    code = look.numFmt.formatCode if look.numFmt is not None else None
    return f"number format {code}" if code and not any(part.shows for part in sections(code)) else ""
