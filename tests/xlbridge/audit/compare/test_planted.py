"""Planted pairs of issues: lines and sheets put in, taken out, renamed; cells changed; no wrong cell."""

from __future__ import annotations

from random import Random

import pytest
from openpyxl import Workbook
from openpyxl.worksheet.worksheet import Worksheet

from xlbridge.audit.compare.cells import Cells, Side
from xlbridge.audit.compare.change import Of
from xlbridge.audit.compare.changes import aligned
from xlbridge.headless.book import Book
from xlbridge.headless.references import Cell, column_letters

SHEETS = 200
HEADINGS = ("Name", "Area", "Load", "Weight", "Height", "Moment", "Note")
#: the columns of numbers; those after them are computed from them
NUMBERS = (2, 3, 5)
Place = tuple[int, int]


class Table:
    """A table whose lines know what they are, so that its formulas follow wherever they stand."""

    def __init__(self, chance: Random) -> None:
        self.rows = [f"Room {n}" for n in range(chance.randrange(4, 25))]
        self.columns = list(HEADINGS)
        self.top = chance.randrange(1, 5)
        self.numbers = {
            (row, column): round(chance.uniform(1, 900), 1)
            for row in self.rows
            for column in ("Area", "Load", "Height")
        }
        self.factors: dict[tuple[str, str], float] = {}
        self.title = "Loads"

    def place(self, row: str, column: str) -> Place:
        return self.top + 1 + self.rows.index(row), 1 + self.columns.index(column)

    def content(self, row: str, column: str) -> str | float | None:
        def at(name: str) -> str:
            line, number = self.place(row, name)
            return f"{column_letters(number)}{line}"

        factor = f"*{self.factors[row, column]}" if (row, column) in self.factors else ""
        if column == "Name":
            return row
        if column == "Weight":
            return f"={at('Area')}*{at('Load')}{factor}"
        if column == "Moment":
            return f"={at('Weight')}*{at('Height')}{factor}"
        return self.numbers.get((row, column))

    def book(self) -> Book:
        workbook = Workbook()
        sheet = workbook.active
        assert isinstance(sheet, Worksheet)
        sheet.title = self.title
        for column in self.columns:
            sheet.cell(self.top, 1 + self.columns.index(column), column)
            for row in self.rows:
                sheet.cell(*self.place(row, column), self.content(row, column))
        line = self.top + len(self.rows) + 1
        weight = column_letters(1 + self.columns.index("Weight"))
        sheet.cell(line, 1, "Total")
        sheet[f"{weight}{line}"] = f"=SUM({weight}{self.top + 1}:{weight}{line - 1})"
        return Book.of(workbook)


def found(old: Book, new: Book) -> tuple[set[tuple[Of, Cell]], set[str]]:
    """The changed cells, and the lines and sheets that came, went or have another name, in words."""
    changes = list(Cells(Side(old), Side(new), aligned(old, new)).changes())
    cells = {(c.of, c.cell) for c in changes if c.cell and c.of is not Of.LINE}
    return cells, {c.words.partition(":")[0] for c in changes if c.of in (Of.LINE, Of.SHEET)}


@pytest.mark.parametrize("seed", range(SHEETS))
def test_every_planted_change_is_found_at_its_cell_and_no_other(seed: int) -> None:
    chance = Random(seed)
    table = Table(chance)
    old = table.book()
    lines: set[str] = set()

    inner = range(1, len(table.rows) - 1)
    for row in chance.sample([table.rows[n] for n in inner], chance.randrange(2)):
        lines.add(f"row {table.place(row, 'Name')[0]} of Loads is gone")
        table.rows.remove(row)
    if chance.random() < 0.3:
        table.top += 1  # an empty row above everything
    if chance.random() < 0.4:
        table.columns.insert(chance.randrange(1, len(table.columns)), "Remark")
    if chance.random() < 0.3:
        table.title = "Take-off"
        lines.add("sheet Loads is now Take-off")
    added = [f"Added {n}" for n in range(chance.randrange(3))]
    kept = list(table.rows)
    for row in added:
        table.rows.insert(chance.randrange(1, len(table.rows)), row)
        table.numbers |= {(row, c): 7.0 for c in ("Area", "Load", "Height")}

    cells: set[tuple[Of, Cell]] = set()
    for row in chance.sample(kept, min(3, len(kept))):
        column = chance.choice(["Area", "Load", "Height", "Weight", "Moment", "Note"])
        if column in ("Weight", "Moment"):
            table.factors[row, column] = 1.5
        else:
            table.numbers[row, column] = 1234.5
        of = Of.FORMULA if column in ("Weight", "Moment") else Of.CONTENT
        cells.add((of, Cell(table.title, *table.place(row, column))))
    lines |= {f"row {table.place(row, 'Name')[0]} of {table.title} is new" for row in added}
    if "Remark" in table.columns:
        letters = column_letters(1 + table.columns.index("Remark"))
        lines.add(f"column {letters} of {table.title} is new")

    assert found(old, table.book()) == (cells, lines)


def test_a_table_without_a_text_is_paired_by_its_numbers() -> None:
    first, second = Workbook(), Workbook()
    for book, rows in ((first, [1, 2, 3, 5, 6]), (second, [1, 2, 3, 4, 5, 6])):
        for n, value in enumerate(rows, 1):
            book.active.cell(n, 1, value * 1.1)  # type: ignore[union-attr]
            book.active.cell(n, 2, value * 2.1)  # type: ignore[union-attr]
    assert found(Book.of(first), Book.of(second)) == (set(), {"row 4 of Sheet is new"})
