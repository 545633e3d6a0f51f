"""(e) Consistency down the columns that no template knows: a copy that is none, a number, an early end.

A column says nothing of the formula that all its cells share; consistent is not correct. A run reaches from
its first copy to its last: sums from level to level begin and end in a way of their own.
"""

from __future__ import annotations

from collections import Counter
from collections.abc import Iterator
from dataclasses import dataclass
from functools import cached_property
from typing import Final

from xlbridge.audit import notation
from xlbridge.audit.finding import Checked, Observation, Place
from xlbridge.audit.subject import Subject
from xlbridge.headless.book import Book, Position
from xlbridge.headless.nodes import Call, Node, Reference, render_value, walk
from xlbridge.headless.operands import NotEvaluated
from xlbridge.headless.references import Bounds, Cell
from xlbridge.headless.shapes import parse

METHOD: Final = "columns"
#: cells that a run of copies has at least, and the share of them that must be copies
LEAST, SHARE = 4, 0.6


def check(subject: Subject) -> Checked:
    """Look down every column of cells that are not those of a template."""
    sheets = [_Sheet(subject, title) for title in subject.book.sheets]
    seen = tuple(o for sheet in sheets for o in sheet.observed())
    return Checked(METHOD, sum(len(sheet.shapes) for sheet in sheets), seen)


@dataclass(frozen=True)
class _Sheet:
    subject: Subject
    title: str

    @property
    def book(self) -> Book:
        return self.subject.book

    @cached_property
    def shapes(self) -> dict[Position, str]:
        """Each formula of the sheet that no template has, as seen from its cell."""
        formulas = self.book.formulas[self.title]
        return {
            position: notation.relative(node, formula.cell)
            for position, formula in formulas.items()
            if formula.fills.is_cell and self._is_foreign(position) and (node := _parsed(formula.text))
        }

    @cached_property
    def runs(self) -> list[_Run]:
        """The columns of neighbouring cells of which most are copies of one formula."""
        return [run for column in {c for _, c in self.shapes} for run in self._runs(column)]

    def observed(self) -> Iterator[Observation]:
        """Yield what breaks the runs of the sheet, and sums that leave a number out."""
        for run in self.runs:
            yield from self._odd(run)
            yield from self._cut_short(run)
        for position in self.shapes:
            yield from self._sum(position)

    def _is_foreign(self, position: Position) -> bool:
        return self.subject.own is None or self.subject.alignment.to_twin(Cell(self.title, *position)) is None

    def _runs(self, column: int) -> Iterator[_Run]:
        """Neighbouring formulas and numbers that begin and end with a formula."""
        rows = sorted(r for r, c in self.shapes if c == column)
        start = previous = rows[0]
        for row in (*rows[1:], rows[-1] + 3):
            if row - previous > 2 or (row - previous == 2 and not self._is_number((row - 1, column))):
                if run := self._run(column, start, previous):
                    yield run
                start = row
            previous = row

    def _run(self, column: int, first: int, last: int) -> _Run | None:
        shapes = Counter(s for r in range(first, last + 1) if (s := self.shapes.get((r, column))))
        ((shape, count),) = shapes.most_common(1)
        copies = [r for r in range(first, last + 1) if self.shapes.get((r, column)) == shape]
        length = copies[-1] - copies[0] + 1
        enough = count >= LEAST - 1 and length >= LEAST and count >= SHARE * length
        return _Run(column, copies[0], copies[-1], shape) if enough else None

    def _odd(self, run: _Run) -> Iterator[Observation]:
        for row in range(run.first + 1, run.last):
            position = row, run.column
            found = self.shapes.get(position)
            if found == run.shape or (self.subject.own and not self._is_foreign(position)):
                continue
            expected = self._copy(run, row)
            place, cause = (
                Place.of(Cell(self.title, row, run.column)),
                f"{self.title} {run.column} {run.first}",
            )
            if found is None:
                value = render_value(self.book.constants[self.title].get(position))
                words = f"the number {value} among copies of {expected}"
                yield Observation("odd_constant", place, words, expected, value, cause=f"{cause} {row}")
            else:
                text = self.book.formulas[self.title][position].text
                words = f"{text} among copies of {expected}"
                yield Observation("odd_formula", place, words, expected, text, cause=f"{cause} {found}")

    def _copy(self, run: _Run, row: int) -> str:
        """The formula of the run as it would stand in a row of it."""
        home = next(
            r for r in range(run.first, run.last + 1) if self.shapes.get((r, run.column)) == run.shape
        )
        text = self.book.formulas[self.title][home, run.column].text
        return f"={notation.filled(text, row - home, 0)}"

    def _cut_short(self, run: _Run) -> Iterator[Observation]:
        """A run of copies to its end that others of the same first row outlast, and a blank cell below it."""
        begins = (run.first - 1, run.first, run.first + 1)
        ends = [other.last for other in self.runs if other.first in begins and other.last > run.last]
        below = run.last + 1, run.column
        if (
            len(ends) > 1
            and below not in self.book.formulas[self.title]
            and below not in self.book.constants[self.title]
        ):
            place = Place(self.title, str(Bounds(run.last + 1, run.column, max(ends), run.column)))
            words = f"the formulas end in row {run.last}, those of other columns in row {max(ends)}"
            yield Observation("run_cut_short", place, words, self._copy(run, run.last + 1))

    def _sum(self, position: Position) -> Iterator[Observation]:
        row, column = position
        text = self.book.formulas[self.title][position].text
        for area in _summed(parse(text)):
            if (
                area.left != area.right
                or area.left != column
                or area.top == area.bottom
                or area.top <= row <= area.bottom
            ):
                continue
            near = [n for n in (area.top - 1, area.bottom + 1) if n != row and self._is_number((n, column))]
            for n in near:
                words = f"{text} leaves out {Cell(self.title, n, column).address}, next to its range"
                yield Observation("sum_omits", Place.of(Cell(self.title, row, column)), words, found=text)

    def _is_number(self, position: Position) -> bool:
        value = self.book.constants[self.title].get(position)
        if position in self.book.formulas[self.title]:
            value = self.book.stored(Cell(self.title, *position))
        return isinstance(value, float)


@dataclass(frozen=True, slots=True)
class _Run:
    """A column of neighbouring cells, most of which are copies of one formula."""

    column: int
    first: int
    last: int
    shape: str


def _parsed(text: str) -> Node | None:
    try:
        return parse(text)
    except NotEvaluated:
        return None


def _summed(node: Node) -> Iterator[Bounds]:
    """The areas of one sheet that a formula sums."""
    for part in walk(node):
        if isinstance(part, Call) and part.name == "SUM":
            yield from (a.bounds for a in part.arguments if isinstance(a, Reference) and a.sheet is None)
