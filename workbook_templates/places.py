"""In which cell each entry and each result of a story workbook stands, as the workbook is now."""

from __future__ import annotations

from collections.abc import Iterator
from typing import NamedTuple

from workbook_templates.declare import DIRECTIONS, Quantity
from workbook_templates.layout import Column, Grid
from workbook_templates.read import Reader
from xlbridge.headless.book import Book
from xlbridge.headless.references import Bounds, Cell, parse_bounds


class Place(NamedTuple):
    """Where an entry or a result stands, and what it is."""

    cell: Cell
    quantity: Quantity


Found = tuple[str, Place]


def entries(reader: Reader, book: Book) -> dict[str, Place]:
    """Return the place of each entry by its path in BUILDING.toml: ``site.S_DS``, ``level[2].weight``."""
    return {**dict(_criteria(reader, book, True)), **dict(_rows(reader, book, True))}


def results(reader: Reader, book: Book) -> dict[str, Place]:
    """Return the place of each result by its path in the package: ``direction.X.F_x[3]``."""
    return {**dict(_criteria(reader, book, False)), **dict(_rows(reader, book, False))}


def cell_of(book: Book, name: str) -> Cell:
    """Return the first cell of a defined name of the workbook."""
    sheet, bounds = _area(book, name)
    return Cell(sheet, bounds.top, bounds.left)


def rows(reader: Reader, grid: Grid, book: Book) -> list[int]:
    """Return the rows of a table that count, by their numbers on the sheet."""
    _, bounds = _area(book, grid.table.name)
    return [bounds.top + n for n in reader.row_numbers(grid)]


def column(reader: Reader, grid: Grid, book: Book, wanted: Column) -> Cell:
    """Return the heading of a column of a table."""
    sheet, bounds = _area(book, grid.table.name)
    return Cell(sheet, bounds.top, bounds.left + reader.column_number(grid, wanted))


def _criteria(reader: Reader, book: Book, inputs: bool) -> Iterator[Found]:
    for block in reader.layout.criteria:
        for direction in DIRECTIONS if block.per_direction else (None,):
            for q in block.quantities:
                name = reader.layout.name(q.key, direction)
                if q.is_input is inputs and _is_area(book, name):
                    home = _home(direction) or ("site." if inputs else "")
                    yield f"{home}{q.key}", Place(cell_of(book, name), q)


def _rows(reader: Reader, book: Book, inputs: bool) -> Iterator[Found]:
    for grid in reader.layout.grids:
        sheet, bounds = _area(book, grid.table.name)
        numbers = rows(reader, grid, book)
        for path, place, q in _columns(reader, grid, inputs):
            for n, row in enumerate(numbers, 1):
                yield path.format(n), Place(Cell(sheet, row, bounds.left + place), q)


def _columns(reader: Reader, grid: Grid, inputs: bool) -> Iterator[tuple[str, int, Quantity]]:
    """The path of each column, with a place for the number of the row."""
    for c in (c for c in grid.columns if c.quantity.is_input is inputs):
        key = c.quantity.stored_key(c.direction)
        path = f"{grid.table.stored}[{{}}].{key}" if inputs else f"{_home(c.direction)}{c.quantity.key}[{{}}]"
        yield path, reader.column_number(grid, c), c.quantity


def _home(direction: str | None) -> str:
    return f"direction.{direction}." if direction else ""


def _is_area(book: Book, name: str) -> bool:
    """Whether a name leads to cells: one that was deleted or stands for a value does not."""
    try:
        _area(book, name)
    except (KeyError, ValueError):
        return False
    return True


def _area(book: Book, name: str) -> tuple[str, Bounds]:
    sheet, _, area = book.names[None, name.casefold()].rpartition("!")
    return sheet.strip("'").replace("''", "'"), parse_bounds(area.replace("$", ""))
