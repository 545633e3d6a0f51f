"""What stands in or beside a table without being a row of it, and lines of the template that are gone."""

from __future__ import annotations

from collections.abc import Iterator

from xlbridge.audit.align import Alignment, SheetPair
from xlbridge.audit.finding import Observation, Place
from xlbridge.audit.template import OwnTemplate, TableRows
from xlbridge.headless.book import Book
from xlbridge.headless.nodes import render_value
from xlbridge.headless.references import Cell

#: so many cells of a row under or over the columns of a table, numbers among them, make it look like one
LIKE_A_ROW = 3


def stray(book: Book, alignment: Alignment, own: OwnTemplate, twin: Book) -> Iterator[Observation]:
    """Values in guard rows and in rows without entries, and rows beside the table."""
    for table in own.tables:
        pair = alignment.by_twin.get(table.sheet)
        if pair is not None:
            yield from _inside(book, pair, table, twin)
            yield from _beside(book, pair, table, twin)


def missing(alignment: Alignment, own: OwnTemplate, twin: Book) -> Iterator[Observation]:
    """Rows and columns of the twin with any content that the workbook has no place for."""
    for pair in alignment.pairs:
        contents = {**twin.constants[pair.twin], **twin.formulas[pair.twin]}
        for axis, what, known in ((0, "row", pair.rows.pairs), (1, "column", pair.columns.pairs)):
            for line in sorted({position[axis] for position in contents} - set(known)):
                cells = sorted(position for position in contents if position[axis] == line)
                texts = [t for at in cells if isinstance(t := twin.constants[pair.twin].get(at), str) if t]
                checked = any(Cell(pair.twin, *position) in own.checks for position in cells)
                said = " / ".join(texts[:3]) or f"{what} {line}"
                words = f"the {what} “{said}” of the template is not there"
                kind = "check_disarmed" if checked and axis == 0 else "line_missing"
                yield Observation(kind, Place(pair.title), words, said, cause=f"{pair.title} {what} {line}")


def _inside(book: Book, pair: SheetPair, table: TableRows, twin: Book) -> Iterator[Observation]:
    """Values, not formulas: a row of formulas filled down ahead of its entries counts for nothing."""
    top, bottom = (pair.rows.pairs.get(row, 0) for row in table.guards)
    entries = {column for row, column in twin.constants[table.sheet] if row == table.first}
    formulas = {column for row, column in twin.formulas[table.sheet] if row == table.first}
    for (row, column), value in book.constants[pair.title].items():
        line = pair.columns.back.get(column)
        guard = row in (top, bottom)
        if not top <= row <= bottom or row in table.rows or line is None:
            continue
        if guard or (line in formulas and line not in entries):
            place = Place.of(Cell(pair.title, row, column))
            where = "a guard row" if guard else "a row without entries"
            words = f"{render_value(value)} stands in {where} of the table"
            yield Observation(
                "stray_entry", place, words, "", render_value(value), cause=f"{place.sheet} {row}"
            )


def _beside(book: Book, pair: SheetPair, table: TableRows, twin: Book) -> Iterator[Observation]:
    """Rows of the user next to the guard rows, the base or the totals, that look like rows of the table."""
    last = max((row for row, _ in (*twin.formulas[table.sheet], *twin.constants[table.sheet])), default=0)
    top, bottom = (pair.rows.pairs.get(row, 0) for row in (table.guards[0], last))
    between = set(range(pair.rows.pairs.get(table.guards[1], bottom), bottom)) - set(pair.rows.back)
    for row in sorted({top - 1, bottom + 1, *between} - set(pair.rows.back)):
        cells = [
            (column, value) for (r, column), value in book.constants[pair.title].items()
            if r == row and column in pair.columns.back
        ]  # fmt: skip
        numbers = sum(isinstance(value, float) for _, value in cells)
        if len(cells) >= LIKE_A_ROW and numbers >= LIKE_A_ROW - 1:
            first = Place.of(Cell(pair.title, row, min(column for column, _ in cells)))
            words = f"row {row} looks like a row of the table, but stands outside its guard rows"
            yield Observation("row_outside_table", first, words, cause=f"{pair.title} {row}")
