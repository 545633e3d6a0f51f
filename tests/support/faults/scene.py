"""A workbook in which a fault is planted: where things stand in it, and what an operator did to it."""

from __future__ import annotations

from collections.abc import Callable, Iterable, Sequence
from dataclasses import dataclass, field
from functools import cached_property
from random import Random
from typing import Any, TypeVar

from openpyxl import Workbook
from openpyxl.cell import Cell as DrawnCell
from openpyxl.worksheet.worksheet import Worksheet

from xlbridge.audit.subject import Subject
from xlbridge.audit.template import OwnTemplate, TableRows
from xlbridge.headless.references import Cell
from xlbridge.values import Scalar

T = TypeVar("T")

#: the sheets on which a table does not stand
CRITERIA, CHECKS, LEVELS, COVER = "Criteria", "Checks", "Levels", "Cover"


class NoPlace(Exception):
    """The workbook has no place for this fault."""


@dataclass
class Scene:
    """The workbook as it was (``before``) and the copy that is spoilt (``book``)."""

    before: Subject
    book: Workbook
    random: Random
    touched: list[tuple[str, ...]] = field(default_factory=list)
    """The places of the fault: cells, rows, columns, sheets, or ``workbook``; alternatives together."""
    causes: int = 1
    """How many mistakes the fault consists of."""
    stored: dict[Cell, Scalar | None] = field(default_factory=dict)
    """Values that the file stores in place of those of the formulas; None stores nothing."""
    recalculated: bool = True
    """Otherwise the file keeps the values that it had before."""
    package: list[Callable[[bytes], bytes]] = field(default_factory=list)
    """What is done to the file after it was saved."""

    @property
    def own(self) -> OwnTemplate:
        assert self.before.own is not None
        return self.before.own

    @property
    def table(self) -> TableRows:
        """The story table."""
        return self.own.tables[0]

    @property
    def levels(self) -> Worksheet:
        return self.book[LEVELS]

    def pick(self, choices: Iterable[T]) -> T:
        """One of the choices, drawn; an operator without a choice has no place here."""
        found = list(choices)
        if not found:
            raise NoPlace
        return self.random.choice(found)

    def need(self, condition: object) -> None:
        """Go on only where the workbook allows the fault."""
        if not condition:
            raise NoPlace

    # where things stand

    @cached_property
    def formulas(self) -> list[Cell]:
        """Every formula cell that is no check."""
        return [cell for cell in self.before.book.formula_cells() if cell not in self.own.checks]

    @cached_property
    def rows(self) -> list[Cell]:
        """The formulas in the rows of tables."""
        rows = {(table.sheet, row) for table in self.own.tables for row in table.rows}
        return [cell for cell in self.formulas if (cell.sheet, cell.row) in rows]

    @cached_property
    def level_rows(self) -> list[Cell]:
        """The formulas in the rows of the story table."""
        return [cell for cell in self.rows if cell.sheet == LEVELS]

    @cached_property
    def criteria(self) -> list[Cell]:
        """The formulas of the criteria sheet."""
        return [cell for cell in self.formulas if cell.sheet == CRITERIA and cell.row > 4]

    @cached_property
    def totals(self) -> list[Cell]:
        """The formulas of the totals of the story table."""
        last = self.levels.max_row
        return [cell for cell in self.formulas if cell.sheet == LEVELS and cell.row == last]

    @cached_property
    def verdicts(self) -> list[Cell]:
        """The verdicts of the check lines."""
        lines = [c for c in self.before.book.formula_cells() if c.sheet == CHECKS and c.column == 9]
        return [cell for cell in lines if cell.row > 10]

    def numeric(self, cells: Iterable[Cell]) -> list[Cell]:
        """Those that show a number that is not zero."""
        return [c for c in cells if isinstance(self.value(c), float) and self.value(c)]

    def column(self, cell: Cell) -> list[Cell]:
        """The cells of a table's column, in the rows that count."""
        table = next(table for table in self.own.tables if table.sheet == cell.sheet)
        return [Cell(cell.sheet, row, cell.column) for row in table.rows]

    def level_entries(self, key: str) -> list[Cell]:
        """The entries of one kind, from the highest level down."""
        found = [(path, cell) for path, cell in self.own.places.items() if path.startswith("level[")]
        cells = [cell for path, cell in found if path.endswith(f"].{key}")]
        self.need(cells)
        return cells

    def entry(self, path: str) -> Cell:
        """The cell of a criteria entry."""
        self.need(path in self.own.places)
        return self.own.places[path]

    # what they hold, and what becomes of them

    def at(self, cell: Cell) -> DrawnCell:
        found = self.book[cell.sheet].cell(cell.row, cell.column)
        assert isinstance(found, DrawnCell)
        return found

    def value(self, cell: Cell) -> Any:
        """The value before."""
        return self.before.evaluator.value(cell.sheet, cell.row, cell.column)

    def text(self, cell: Cell) -> str:
        """The formula, with its sign of equality."""
        found = self.before.book.formula(cell)
        return found.text if found else ""

    def write(self, cell: Cell, content: object) -> None:
        """Change what a cell holds."""
        self.at(cell).value = content  # type: ignore[assignment]
        self.touch(str(cell))

    def touch(self, *places: str) -> None:
        """Note where the fault is: each of these places is to be named."""
        self.touched.extend((place,) for place in places)

    def touch_one_of(self, *places: str) -> None:
        """Note where the fault is: one of these places is to be named, the others may be."""
        self.touched.append(places)

    def rewrite(self, cells: Sequence[Cell], change: Callable[[str], str | None]) -> Cell:
        """Change the formula of one of the cells, drawn from those on which the change has a hold."""
        order = self.random.sample(cells, len(cells))
        for cell in order:
            text = change(self.text(cell))
            if text and text != self.text(cell):
                self.write(cell, text)
                return cell
        raise NoPlace
