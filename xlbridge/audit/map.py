"""(c) The expected formula of every cell: that of its twin, the workbook built anew for the same inputs."""

from __future__ import annotations

from collections import Counter
from collections.abc import Iterator
from dataclasses import dataclass, replace
from functools import cached_property
from typing import Final

from xlbridge.audit import notation
from xlbridge.audit.align import Alignment
from xlbridge.audit.cells import agree
from xlbridge.audit.finding import Checked, NotChecked, Observation, Place
from xlbridge.audit.merged import swallowed
from xlbridge.audit.rows import missing, stray
from xlbridge.audit.subject import Subject
from xlbridge.audit.template import OwnTemplate
from xlbridge.headless.book import Book, Formula
from xlbridge.headless.nodes import Node, render, render_value
from xlbridge.headless.operands import NotEvaluated
from xlbridge.headless.references import Cell
from xlbridge.headless.shapes import parse
from xlbridge.values import Scalar

METHOD: Final = "map"
ABSENT: Final = frozenset({"formula_missing", "constant_for_formula"})


def check(subject: Subject) -> Checked:
    """Compare every formula, and every fixed number, with that of the twin."""
    own = subject.own
    if own is None or own.twin is None:
        why = own.unread if own else "the workbook is not laid out as one of ours"
        return Checked(METHOD, 0, not_checked=(NotChecked("expected formulas", why),))
    mapped = _Map(subject, subject.alignment, own, own.twin)
    seen = _by_cause([(o, pair[0]) for pair in mapped.cells if (o := mapped.observed(pair))], mapped)
    further = (
        *stray(subject.book, subject.alignment, own, own.twin),
        *missing(subject.alignment, own, own.twin),
    )
    return Checked(METHOD, len(mapped.cells), (*seen, *further))


@dataclass(frozen=True)
class _Map:
    subject: Subject
    alignment: Alignment
    own: OwnTemplate
    twin: Book

    @cached_property
    def cells(self) -> list[tuple[Cell, Cell]]:
        """The formulas, fixed numbers and entries of the twin, each with its place in the workbook.

        A cell that lies under merged ones is another finding.
        """
        numbers = (
            Cell(sheet, *position)
            for sheet, cells in self.twin.constants.items()
            for position, value in cells.items()
            if isinstance(value, float) or Cell(sheet, *position) in self.own.entries
        )
        pairs = ((cell, self.alignment.from_twin(cell)) for cell in (*self.twin.formula_cells(), *numbers))
        gone = swallowed(self.subject.book)
        return [(cell, found) for cell, found in pairs if found and found not in gone]

    @cached_property
    def filled_down(self) -> frozenset[tuple[str, int]]:
        """The rows of the twin that are copied to make another."""
        return frozenset(
            (t.sheet, row) for t in self.own.tables for row in range(t.first, t.first + len(t.rows))
        )

    def observed(self, pair: tuple[Cell, Cell]) -> Observation | None:
        """What is not as expected in one cell."""
        cell, place = pair
        expected, found = self.twin.formula(cell), self.subject.book.formula(place)
        if expected is None:
            seen = self._constant(cell, place, found)
        elif found is not None and self._as_written(cell, expected, found):
            return None
        else:
            seen = self._formula(cell, place, expected, found)
        if seen and cell in self.own.checks:
            cause = f"{place.sheet} cells of row {place.row}"
            return replace(
                seen, kind="check_disarmed", words=f"a check was changed: {seen.words}", cause=cause
            )
        return seen

    def _as_written(self, cell: Cell, expected: Formula, found: Formula) -> bool:
        """Whether the texts are the same, but for the case where nothing is quoted."""
        if not found.fills.is_cell:
            return False
        if self.alignment.is_identity:
            return found.text == expected.text
        known = self._references.setdefault(cell.sheet, {})
        text = notation.moved_text(expected.text, cell.sheet, self.alignment.area_from_twin, known)
        return found.text == text or ('"' not in text and found.text.casefold() == text.casefold())

    @cached_property
    def _references(self) -> dict[str, dict[str, str]]:
        """The references of each sheet of the twin that were moved."""
        return {}

    def _constant(self, cell: Cell, place: Cell, found: Formula | None) -> Observation | None:
        expected = self.twin.constants[cell.sheet][cell.row, cell.column]
        if cell in self.own.entries:
            words = "an entry is computed by a formula of its own"
            text = found.text if found else ""
            return (
                self._seen("entry_is_formula", place, words, "an entry", text, place.sheet) if found else None
            )
        value = self.subject.book.constants[place.sheet].get((place.row, place.column))
        if found is None and agree(value, expected):
            return None
        text = found.text if found else "" if value is None else render_value(value)
        words = f"the template has {render_value(expected)} here, the workbook {text or 'nothing'}"
        return self._seen("constant_changed", place, words, render_value(expected), text)

    def _formula(
        self, cell: Cell, place: Cell, expected: Formula, found: Formula | None
    ) -> Observation | None:
        node = notation.moved(parse(expected.text), cell.sheet, self.alignment.area_from_twin)
        text = f"={render(node)}"
        if found is None:
            return self._absent(place, text)
        try:
            other = parse(found.text)
        except NotEvaluated as reason:
            words = f"the formula cannot be read as that of the template: {reason}"
            return self._seen("formula_differs", place, words, text, found.text)
        if notation.canonical(node, place.sheet) != notation.canonical(other, place.sheet):
            kind, words = _difference(node, other, place.sheet)
        elif found.fills.size > 1:
            kind, words = "formula_differs", f"one array formula fills {found.fills}, not a formula each cell"
        elif (cell.sheet, cell.row) in self.filled_down and _held(node, place) != _held(other, place):
            kind, words = "anchor_changed", "a $ that holds a row was lost or added"
        else:
            return None
        cause = f"{place.sheet} {place.column} {notation.relative(other, found.cell)}"
        return self._seen(kind, place, words, text, found.text, cause)

    def _absent(self, place: Cell, expected: str) -> Observation:
        value = self.subject.book.constants[place.sheet].get((place.row, place.column))
        if value is None:
            return self._seen("formula_missing", place, "the cell is empty, not a formula", expected, "")
        given = self._value(expected, place.sheet)
        same = "the value that the formula gives today" if agree(value, given) else "another value"
        words = f"the constant {render_value(value)} stands for the formula, {same}"
        seen = self._seen("constant_for_formula", place, words, expected, render_value(value))
        return replace(seen, stored=value, recomputed=given)

    def _value(self, text: str, sheet: str) -> Scalar:
        try:
            value = self.subject.evaluator.evaluate_text(text, sheet)
        except NotEvaluated:
            return None
        return None if isinstance(value, tuple) else value

    def _seen(
        self, kind: str, place: Cell, words: str, expected: str, found: str, cause: str = ""
    ) -> Observation:
        stored = self.subject.book.stored(place)
        return Observation(kind, Place.of(place), words, expected, found, stored=stored, cause=cause)


def _held(node: Node, place: Cell) -> list[tuple[bool, ...]]:
    return [area.held for area in notation.areas(node, place.sheet)]


def _difference(expected: Node, found: Node, home: str) -> tuple[str, str]:
    """The kind of a difference, and its words."""
    if notation.skeleton(expected) != notation.skeleton(found):
        return "formula_differs", "the formula is built in another way"
    if len(notation.areas(expected, home)) != len(notation.areas(found, home)):
        return "other_reference", "the formula has a name for a reference, or the other way round"
    pairs = zip(notation.areas(expected, home), notation.areas(found, home), strict=True)
    for mine, other in ((a, b) for a, b in pairs if a.plain != b.plain):
        return _moved_area(mine, other)
    if notation.names(expected) != notation.names(found):
        return "other_reference", "the formula reads another name"
    known, there = notation.constants(expected), notation.constants(found)
    if known == there:
        return "formula_differs", "the formula takes its arguments in another order"
    changed = next((a, b) for a, b in zip(known, there, strict=False) if a != b)
    return "constant_changed", f"the formula has {changed[1]} for {changed[0]}"


def _moved_area(expected: notation.Area, found: notation.Area) -> tuple[str, str]:
    e, f = expected.bounds, found.bounds
    words = f"the formula reads {f}, not {e}"
    if expected.sheet != found.sheet or (e.is_cell and f.is_cell):
        return "other_reference", words
    inner = e.top <= f.top and e.left <= f.left and f.bottom <= e.bottom and f.right <= e.right
    outer = f.top <= e.top and f.left <= e.left and e.bottom <= f.bottom and e.right <= f.right
    return "range_shorter" if inner else "range_longer" if outer else "other_reference", words


def _by_cause(seen: list[tuple[Observation, Cell]], mapped: _Map) -> Iterator[Observation]:
    """One cause for cells emptied or pasted over along a row or down a column, or a row never filled."""
    absent = [(o, cell) for o, cell in seen if o.kind in ABSENT]
    rows = Counter((o.kind, cell.sheet, cell.row) for o, cell in absent)
    columns = Counter((o.kind, cell.sheet, cell.column) for o, cell in absent)
    formulas = Counter((c.sheet, c.row) for c, _ in mapped.cells if absent and mapped.twin.formula(c))
    for o, cell in seen:
        in_row, in_column = rows[o.kind, cell.sheet, cell.row], columns[o.kind, cell.sheet, cell.column]
        if o.kind not in ABSENT or max(in_row, in_column) == 1:
            yield o
        elif o.kind == "formula_missing" and in_row == formulas[cell.sheet, cell.row] and in_row > 1:
            words = "the row has none of its formulas"
            yield replace(o, kind="row_not_filled", words=words, cause=f"{cell.sheet} row {cell.row}")
        elif in_row > in_column:
            yield replace(o, cause=f"{cell.sheet} row {cell.row}")
        else:
            yield replace(o, cause=f"{cell.sheet} column {cell.column}")
