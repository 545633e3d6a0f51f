"""The twin of a workbook of ours: built anew from its inputs, and what its cells are for."""

from __future__ import annotations

from collections.abc import Iterator, Mapping
from itertools import product
from typing import Any

from openpyxl import Workbook

from engine.editions import EDITIONS
from engine.errors import EngineError
from engine.units import SYSTEMS
from workbook_templates import layout, places
from workbook_templates.build import draw, draw_native
from workbook_templates.declare import Role
from workbook_templates.draw import cover, style
from workbook_templates.layout import CHECKS, COVER, FIRST_LEVEL, Grid
from workbook_templates.read import Reader
from xlbridge.audit.template import TableRows
from xlbridge.headless.book import Book
from xlbridge.headless.compute import FUNCTIONS, Computed
from xlbridge.headless.evaluate import Evaluator
from xlbridge.headless.references import Cell


def is_issue_copy(book: Book) -> bool:
    """Whether a workbook of ours is written in built-in functions; Calc writes ours in small letters."""
    formulas = (f for of_sheet in book.formulas.values() for f in of_sheet.values())
    return not any("ELF_" in f.text.upper() for f in formulas)


def twin(reader: Reader, book: Book, inputs: Mapping[str, Any]) -> Book:
    """Build the workbook anew, as an issue copy if it is one."""
    inputs = _as_made(book, inputs)
    drawn = draw(inputs)
    if is_issue_copy(book):
        evaluator = Evaluator(Book.of(drawn), FUNCTIONS)
        drawn = draw_native(inputs, Computed(evaluator, evaluator.evaluate_all()).values)
    _link(drawn, reader, book)
    return Book.of(drawn)


def _as_made(book: Book, inputs: Mapping[str, Any]) -> Mapping[str, Any]:
    """The inputs, with the edition and units of the cover if more of the texts belong to them.

    Both are fixed when a workbook is made; typed over, they would make all its texts look changed.
    """
    texts = {text for cells in book.constants.values() for text in cells.values() if isinstance(text, str)}
    for pair in product(EDITIONS, SYSTEMS):
        other = {**inputs, **dict(zip(("edition", "units"), pair, strict=True))}
        if other != inputs and any(text.startswith(cover.made_for(*pair)) for text in texts):
            return max(inputs, other, key=lambda given: len(texts & _texts(given)))
    return inputs


def _texts(inputs: Mapping[str, Any]) -> set[str]:
    """The texts of a workbook built anew; none where the inputs do not fit each other."""
    try:
        sheets = Book.of(draw(inputs)).constants.values()
    except EngineError:
        return set()
    return {text for cells in sheets for text in cells.values() if isinstance(text, str)}


def tables(reader: Reader, book: Book) -> Iterator[TableRows]:
    """Pair the rows of each table with those of the twin."""
    for grid in reader.layout.grids:
        yield TableRows(
            grid.table.sheet, grid.table.name, FIRST_LEVEL, tuple(places.rows(reader, grid, book))
        )


def entries(book: Book) -> Iterator[Cell]:
    """The cells of a twin that look like entries; the sample of the legend has no format of one."""
    fill = style.ROLES[Role.INPUT][1]
    for sheet in book.workbook.worksheets if book.workbook else ():
        for (row, column), cell in sheet._cells.items():
            if cell.fill == fill and cell.number_format != "General":
                yield Cell(sheet.title, row, column)


def checks(book: Book) -> Iterator[Cell]:
    """The cells of a twin that judge the workbook: the checks, and the status on top of every sheet."""
    for sheet, formulas in book.formulas.items():
        for (row, column), formula in formulas.items():
            if sheet == CHECKS or formula.text == "=workbook_status":
                yield Cell(sheet, row, column)
    for (row, column), value in book.constants[CHECKS].items():
        if isinstance(value, float):
            yield Cell(CHECKS, row, column)


def cautions(book: Book) -> Iterator[Cell]:
    """The cells of a twin's cover that say what the workbook may be used for."""
    lines = {line for text in (*cover.CAUTIONS, cover.ISSUE) for line in cover.lines(text)}
    return (Cell(COVER, *position) for position, text in book.constants[COVER].items() if text in lines)


def _link(drawn: Workbook, reader: Reader, book: Book) -> None:
    """Put the links back where the workbook has a formula and the inputs its value."""
    for grid in reader.layout.grids:
        rows = places.rows(reader, grid, book)
        for column in (column for column in grid.columns if column.quantity.linked):
            found = places.column(reader, grid, book, column)
            for number, row in enumerate(rows, FIRST_LEVEL):
                if book.formula(Cell(found.sheet, row, found.column)):
                    _write(drawn, reader, grid, column, number)


def _write(drawn: Workbook, reader: Reader, grid: Grid, column: layout.Column, row: int) -> None:
    text = reader.layout.write(column.quantity.linked, grid.table.sheet, column.direction, row)
    drawn[grid.table.sheet][f"{column.letter}{row}"] = text
