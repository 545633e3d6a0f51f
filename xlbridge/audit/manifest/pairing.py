"""A workbook beside its twin: cells and sheets as pairs."""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import dataclass
from functools import cached_property
from typing import NamedTuple

from openpyxl.cell.cell import Cell as Filled
from openpyxl.cell.cell import MergedCell
from openpyxl.worksheet.worksheet import Worksheet

from xlbridge.audit.align import Alignment, SheetPair
from xlbridge.audit.finding import Place
from xlbridge.audit.merged import swallowed
from xlbridge.audit.subject import Subject
from xlbridge.audit.template import OwnTemplate
from xlbridge.headless.book import Book
from xlbridge.headless.references import Bounds, Cell
from xlbridge.values import Scalar

Content = Filled | MergedCell


class CellPair(NamedTuple):
    """A filled cell of the twin, where it is in the workbook, and what is there, if anything."""

    cell: Cell
    place: Cell
    twin: Content
    found: Content | None

    @property
    def is_filled(self) -> bool:
        """Whether the workbook has any content there."""
        return self.found is not None and self.found.value is not None


class SheetSides(NamedTuple):
    """A sheet of the twin and the one of the workbook."""

    pair: SheetPair
    twin: Worksheet
    found: Worksheet


@dataclass(frozen=True)
class Pairing:
    """The audited workbook, its twin, and which cell is which."""

    subject: Subject
    own: OwnTemplate
    twin: Book

    @property
    def book(self) -> Book:
        """The workbook under audit."""
        return self.subject.book

    @property
    def alignment(self) -> Alignment:
        """Which cell is which."""
        return self.subject.alignment

    @cached_property
    def sheets(self) -> list[SheetSides]:
        """The sheets that both have."""
        mine, there = self.twin.workbook, self.book.workbook
        if mine is None or there is None:
            return []
        return [SheetSides(p, mine[p.twin], there[p.title]) for p in self.alignment.pairs]

    @cached_property
    def cells(self) -> list[CellPair]:
        """The filled cells of the twin that the workbook has a place for, not under merged ones."""
        return list(self._cells())

    def _cells(self) -> Iterator[CellPair]:
        gone = swallowed(self.book)
        for pair, mine, there in self.sheets:
            rows, columns, found = pair.rows.pairs, pair.columns.pairs, there._cells
            for (row, column), content in mine._cells.items():
                down, across = rows.get(row), columns.get(column)
                if content.value is not None and down and across:
                    place = Cell(pair.title, down, across)
                    if place in gone:
                        continue
                    yield CellPair(Cell(pair.twin, row, column), place, content, found.get((down, across)))

    def value(self, place: Cell) -> Scalar:
        """What a cell shows: its constant, or the value of its formula."""
        constant = self.book.constants[place.sheet].get((place.row, place.column))
        return constant if constant is not None else self._results.get((place.sheet, place.address))

    @cached_property
    def _results(self) -> dict[tuple[str, str], Scalar]:
        return dict(self.subject.results.values)

    def place(self, sheet: str, bounds: Bounds) -> Place:
        """The place of an area of the twin in the workbook."""
        title, area = self.alignment.area_from_twin(sheet, bounds)
        return Place(title, str(area))
