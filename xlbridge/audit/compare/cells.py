"""Cell by cell: what differs outside the entries, each cell of an issue beside the one it is in the other."""

from __future__ import annotations

from collections import defaultdict
from collections.abc import Iterator
from dataclasses import dataclass
from typing import Any, Final

from xlbridge.audit import notation
from xlbridge.audit.align import Alignment, Axis, SheetPair
from xlbridge.audit.compare.change import Change, Of, same, shown
from xlbridge.audit.manifest.number_formats import hides_text, is_coarser, misleads
from xlbridge.headless.book import Book, Formula, Position
from xlbridge.headless.nodes import render
from xlbridge.headless.operands import NotEvaluated
from xlbridge.headless.references import Cell, column_letters, parse_bounds
from xlbridge.headless.shapes import parse

#: a row of a sheet
Line = tuple[str, int]
SEVERAL: Final = 2
AXES: Final = ("row", "column")


@dataclass(frozen=True)
class Side:
    """One issue: its workbook, the cells of its entries, the rows said to have come or gone with a table."""

    book: Book
    entered: frozenset[Cell] = frozenset()
    said: frozenset[Line] = frozenset()

    def filled(self, sheet: str) -> set[Position]:
        """The cells of a sheet that hold anything."""
        return {*self.book.constants[sheet], *self.book.formulas[sheet]}

    def fixed_by_row(self, sheet: str) -> defaultdict[int, set[Any]]:
        """The constants of each row, entries left out."""
        found: defaultdict[int, set[Any]] = defaultdict(set)
        for (row, column), value in self.book.constants[sheet].items():
            if Cell(sheet, row, column) not in self.entered:
                found[row].add(value)
        return found

    def content(self, cell: Cell) -> Any:
        """The text of a formula, or the constant."""
        formula = self.book.formula(cell)
        return formula.text if formula else self.book.constants[cell.sheet].get((cell.row, cell.column))


@dataclass(frozen=True)
class Cells:
    """Both issues and what pairs their cells."""

    old: Side
    new: Side
    alignment: Alignment

    def changes(self) -> Iterator[Change]:
        """Yield every difference: sheets, names, rows and columns, then cell by cell."""
        yield from self._sheets()
        yield from self._names()
        for pair in self.alignment.pairs:
            yield from self._lines(pair)
            for cell, found in self._pairs(pair):
                yield from self._cell(cell, found)
                yield from self._format(cell, found)

    def _sheets(self) -> Iterator[Change]:
        for title in self.old.book.sheets:
            if title not in self.alignment.by_twin:
                yield Change(Of.SHEET, title, None, title, None, f"sheet {title} is gone")
            elif (now := self.alignment.by_twin[title].title) != title:
                yield Change(Of.SHEET, title, None, title, now, f"sheet {title} is now {now}")
        for title in self.new.book.sheets:
            if title not in self.alignment.by_title:
                yield Change(Of.SHEET, title, None, None, title, f"sheet {title} is new")

    def _names(self) -> Iterator[Change]:
        old, new = self.old.book.names, self.new.book.names
        for key in dict.fromkeys((*old, *new)):
            scope, name = key
            before, after = old.get(key), new.get(key)
            expected = self._area_now(before) if before is not None else None
            if _area(after) != expected and before != after:
                where = f" of sheet {scope}" if scope else ""
                words = f"name {name}{where}: {before or 'none'}, now {after or 'none'}"
                yield Change(Of.NAME, name, None, before, after, words)

    def _area_now(self, text: str) -> Any:
        """The area of an earlier name where it should be now; the text itself where it is no area."""
        known = _area(text)
        return self.alignment.area_from_twin(*known) if isinstance(known, tuple) else known

    def _lines(self, pair: SheetPair) -> Iterator[Change]:
        """Rows and columns that came or went, with what stands first in them."""
        for axis, shared in enumerate(self._shared(pair)):
            yield from self._unpaired(self.old, pair.twin, axis, set(shared), False)
            yield from self._unpaired(self.new, pair.title, axis, set(shared.values()), True)

    def _unpaired(self, side: Side, sheet: str, axis: int, known: set[int], is_new: bool) -> Iterator[Change]:
        first: dict[int, Position] = {}
        for position in sorted(side.filled(sheet), key=lambda p: (p[axis], p)):
            first.setdefault(position[axis], position)
        for line, position in first.items():
            if line in known or (axis == 0 and (sheet, line) in side.said):
                continue
            cell = Cell(sheet, *position)
            content = shown(side.content(cell))
            where = column_letters(line) if axis else str(line)
            words = f"{AXES[axis]} {where} of {sheet} is {'new' if is_new else 'gone'}: {content}"
            old, new = (None, content) if is_new else (content, None)
            yield Change(Of.LINE, f"{sheet} {where}", cell if is_new else None, old, new, words)

    def _shared(self, pair: SheetPair) -> tuple[dict[int, int], dict[int, int]]:
        """The rows and the columns that hold anything in both issues; one that was emptied is gone."""
        old, new = self.old.filled(pair.twin), self.new.filled(pair.title)
        rows, columns = (
            _both(axis, {p[n] for p in old}, {p[n] for p in new})
            for n, axis in enumerate((pair.rows, pair.columns))
        )
        mine, there = self.old.fixed_by_row(pair.twin), self.new.fixed_by_row(pair.title)
        return {r: n for r, n in rows.items() if not _replaced(mine[r], there[n])}, columns

    def _pairs(self, pair: SheetPair) -> Iterator[tuple[Cell, Cell]]:
        """The cells of a sheet that are filled in either issue and stand in lines that both have."""
        rows, columns = self._shared(pair)
        back = [{found: line for line, found in axis.items()} for axis in (rows, columns)]
        old, new = self.old.filled(pair.twin), self.new.filled(pair.title)
        there = {(r, c) for r, c in new if r in back[0] and c in back[1]}
        mine = {(rows[r], columns[c]) for r, c in old if r in rows and c in columns}
        for row, column in sorted(mine | there):
            yield Cell(pair.twin, back[0][row], back[1][column]), Cell(pair.title, row, column)

    def _cell(self, cell: Cell, found: Cell) -> Iterator[Change]:
        """A content that is another one; entries are compared elsewhere."""
        if cell in self.old.entered or found in self.new.entered:
            return
        before, after = self.old.book.formula(cell), self.new.book.formula(found)
        moved = self._moved(before) if before else ""
        if after and moved and _canonical(moved, found.sheet) == _canonical(after.text, found.sheet):
            return
        old, new = self.old.content(cell), self.new.content(found)
        if not (before and after) and same(old, new):
            return
        of = Of.FORMULA if before or after else Of.CONTENT
        words = f"{'formula ' if before and after else ''}{shown(old)}, now {shown(new)}"
        parts = [self._seen(formula) for formula in (before, after) if formula]
        cause = f"{found.sheet} {found.column} {' > '.join(parts)}" if before or after else ""
        yield Change(of, "", found, old, new, words, cause, moved=moved)

    def _seen(self, formula: Formula) -> str:
        try:
            return notation.relative(parse(formula.text), formula.cell)
        except NotEvaluated:
            return formula.text

    def _moved(self, formula: Formula) -> str:
        """An earlier formula with its references where they should be now."""
        try:
            node = notation.moved(parse(formula.text), formula.cell.sheet, self.alignment.area_from_twin)
        except NotEvaluated:
            return formula.text
        return f"={render(node)}"

    def _format(self, cell: Cell, found: Cell) -> Iterator[Change]:
        """A number format that says another thing than the earlier one, or less."""
        before, after = _number_format(self.old.book, cell), _number_format(self.new.book, found)
        if before == after or None in (before, after):
            return
        value = self.new.content(found)
        if isinstance(value, str) and not self.new.book.formula(found):
            how = "it hides a text" if hides_text(after) else ""
        else:
            how = misleads(after, before) or ("it shows fewer digits" if is_coarser(after, before) else "")
        if how:
            words = f"number format {before}, now {after}: {how}"
            yield Change(Of.FORMAT, "", found, before, after, words, f"{found.sheet} {found.column} {after}")


def _replaced(old: set[Any], new: set[Any]) -> bool:
    """Whether two rows in the same place are not the same row: of several constants they share none."""
    return min(len(old), len(new)) >= SEVERAL and not old & new


def _both(axis: Axis, old: set[int], new: set[int]) -> dict[int, int]:
    return {line: found for line, found in axis.pairs.items() if line in old and found in new}


def _canonical(text: str, sheet: str) -> str:
    try:
        return notation.canonical(parse(text), sheet)
    except NotEvaluated:
        return text


def _number_format(book: Book, cell: Cell) -> Any:
    content = book.workbook[cell.sheet]._cells.get((cell.row, cell.column)) if book.workbook else None
    return content.number_format if content is not None else None


def _area(text: str | None) -> Any:
    sheet, mark, area = (text or "").removeprefix("=").rpartition("!")
    try:
        return (sheet.strip("'").replace("''", "'"), parse_bounds(area.replace("$", ""))) if mark else text
    except ValueError:
        return text
