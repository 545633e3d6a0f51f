"""What changed from one issue of a workbook to the next: entries, formulas, labels, names and results."""

from __future__ import annotations

from collections.abc import Iterator, Mapping, Sequence
from dataclasses import dataclass
from enum import StrEnum
from math import isclose
from typing import Any, Final

from xlbridge.audit import notation
from xlbridge.audit.align import Alignment, align
from xlbridge.audit.compare.rows import RowPair, pair
from xlbridge.audit.subject import Subject
from xlbridge.audit.template import OwnTemplate, TableRows
from xlbridge.headless.operands import NotEvaluated
from xlbridge.headless.references import Cell, parse_bounds
from xlbridge.headless.shapes import parse

#: what the cells of two computations may differ by
TOLERANCE: Final = 1e-12
#: entries that a workbook has fixed in a cell
FIXED: Final = ("edition", "units")
#: what is no entry of the calculation
NO_ENTRIES: Final = ("title", "job", "sources", "source")


class Of(StrEnum):
    """What a change is a change of."""

    INPUT = "input"
    ROW = "row"
    FORMULA = "formula"
    CONTENT = "content"
    NAME = "name"
    SHEET = "sheet"


@dataclass(frozen=True, slots=True)
class Change:
    """One change: where it is in the later issue (in the earlier one, for what is gone), old and new."""

    of: Of
    path: str
    cell: Cell | None
    old: Any
    new: Any
    words: str


@dataclass(frozen=True, slots=True)
class Result:
    """One result in both issues; ``path`` is that of the later one."""

    path: str
    old: float
    new: float


@dataclass(frozen=True)
class Issues:
    """An earlier and a later issue, with what pairs their rows and cells."""

    old: Subject
    new: Subject
    rows: Mapping[str, list[RowPair]]
    alignment: Alignment

    @classmethod
    def of(cls, old: Subject, new: Subject) -> Issues:
        """Pair the tables of entries, where both are ours, and with their help the cells."""
        mine, theirs = old.own or OwnTemplate(), new.own or OwnTemplate()
        rows = {
            name: pair(table, theirs.inputs[name])
            for name, table in mine.inputs.items()
            if _is_table(table) and _is_table(theirs.inputs.get(name))
        }
        pairs = tuple(_row_pairs(mine, theirs, rows))
        return cls(old, new, rows, align(new.book, OwnTemplate(twin=old.book, tables=pairs)))

    def inputs(self) -> Iterator[Change]:
        """Yield every entry that differs, and every row that came, went, moved or has another name."""
        if self.old.own and self.new.own:
            yield from self._entries("", self.old.own.inputs, self.new.own.inputs)

    def cells(self) -> Iterator[Change]:
        """Yield every difference of cells that is not one of entries."""
        yield from self._sheets()
        yield from self._names()
        entered = self._entered()
        for cell in _filled(self.old):
            found = self.alignment.from_twin(cell)
            if found is not None and found not in entered and (change := self._cell(cell, found)):
                yield change

    def results(self) -> Iterator[Result]:
        """Yield every number that both issues have as a result."""
        if self.old.own and self.new.own:
            old = dict(_leaves("", self.old.own.results))
            for path, value in _leaves("", self.new.own.results):
                before = old.get(self._path_before(self.new.own, path))
                if isinstance(value, float) and isinstance(before, float):
                    yield Result(path, before, value)

    def _path_before(self, own: OwnTemplate, path: str) -> str:
        """The path that a result had in the earlier issue: a row of a table may have been another one."""
        head, mark, rest = path.partition("[")
        sheet = own.places[path].sheet if path in own.places else ""
        table = next((t.name.removesuffix("_table") for t in own.tables if t.sheet == sheet), "")
        if not mark or table not in self.rows:
            return path
        row = int(rest.rstrip("]")) - 1
        before = next((r.old for r in self.rows[table] if r.new == row), None)
        return f"{head}[{before + 1}]" if before is not None else ""

    def _entries(self, home: str, old: Mapping[str, Any], new: Mapping[str, Any]) -> Iterator[Change]:
        for key in dict.fromkeys((*old, *new)):
            path = f"{home}.{key}" if home else key
            before, after = old.get(key), new.get(key)
            if key in NO_ENTRIES:
                continue
            if isinstance(before, Mapping) or isinstance(after, Mapping):
                yield from self._entries(path, before or {}, after or {})
            elif key in self.rows:
                yield from self._rows(key, before or [], after or [])
            elif not _same(before, after):
                yield self._input(path, before, after)

    def _rows(self, name: str, old: Sequence[Any], new: Sequence[Any]) -> Iterator[Change]:
        for found in self.rows[name]:
            before = old[found.old] if found.old is not None else None
            after = new[found.new] if found.new is not None else None
            shown = (after or before or {}).get("name", f"row {(found.new or found.old or 0) + 1}")
            path = f"{name}[{(found.new if found.new is not None else found.old or 0) + 1}]"
            if before is None or after is None:
                words = f"{name} {shown} was {'added' if before is None else 'removed'}"
                yield Change(Of.ROW, path, self._place(path, after is not None), before, after, words)
                continue
            if found.moved:
                words = f"{name} {shown} stands in another place of the order"
                yield Change(
                    Of.ROW, path, self._place(path, True), (found.old or 0) + 1, (found.new or 0) + 1, words
                )
            for key in dict.fromkeys((*before, *after)):
                if key not in NO_ENTRIES and not _same(before.get(key), after.get(key)):
                    yield self._input(f"{path}.{key}", before.get(key), after.get(key))

    def _input(self, path: str, old: Any, new: Any) -> Change:
        own = self.new.own or OwnTemplate()
        what = own.meanings[path].text if path in own.meanings else path
        row = path.partition("]")[0].partition("[")
        index = int(row[2]) - 1 if row[2] else None
        named = (
            own.inputs[row[0]][index].get("name", "") if index is not None and row[0] in own.inputs else ""
        )
        at = f" of {named}" if named and not path.endswith(".name") else ""
        words = f"{what}{at} ({path}): {_shown(old)}, now {_shown(new)}"
        return Change(Of.INPUT, path, self._place(path, True), old, new, words)

    def _place(self, path: str, later: bool) -> Cell | None:
        own = (self.new if later else self.old).own or OwnTemplate()
        known = own.places.get(path) or next(
            (c for p, c in own.places.items() if p.startswith(f"{path}.")), None
        )
        return known

    def _entered(self) -> set[Cell]:
        own = self.new.own or OwnTemplate()
        return {cell for path, cell in own.places.items() if path in own.entered or path in FIXED}

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

    def _cell(self, cell: Cell, found: Cell) -> Change | None:
        before, after = self.old.book.formula(cell), self.new.book.formula(found)
        if before and after:
            expected = self._moved(before.text, cell)
            if expected is None or expected == _canonical(after.text, found.sheet):
                return None
            words = f"formula {before.text}, now {after.text}"
            return Change(Of.FORMULA, "", found, before.text, after.text, words)
        old = before.text if before else _constant(self.old, cell)
        new = after.text if after else _constant(self.new, found)
        if _same(old, new):
            return None
        of = Of.FORMULA if before or after else Of.CONTENT
        return Change(of, "", found, old, new, f"{_shown(old)}, now {_shown(new)}")

    def _moved(self, text: str, cell: Cell) -> str | None:
        try:
            node = notation.moved(parse(text), cell.sheet, self.alignment.area_from_twin)
        except NotEvaluated:
            return None
        home, _ = self.alignment.area_from_twin(cell.sheet, parse_bounds("A1"))
        return notation.canonical(node, home)


def _canonical(text: str, sheet: str) -> str:
    try:
        return notation.canonical(parse(text), sheet)
    except NotEvaluated:
        return text


def _filled(subject: Subject) -> Iterator[Cell]:
    for sheet in subject.book.sheets:
        for position in sorted({*subject.book.constants[sheet], *subject.book.formulas[sheet]}):
            yield Cell(sheet, *position)


def _constant(subject: Subject, cell: Cell) -> Any:
    return subject.book.constants[cell.sheet].get((cell.row, cell.column))


def _area(text: str | None) -> Any:
    sheet, mark, area = (text or "").removeprefix("=").rpartition("!")
    try:
        return (sheet.strip("'").replace("''", "'"), parse_bounds(area.replace("$", ""))) if mark else text
    except ValueError:
        return text


def _is_table(value: Any) -> bool:
    return isinstance(value, list) and bool(value) and all(isinstance(row, Mapping) for row in value)


def _row_pairs(
    mine: OwnTemplate, theirs: OwnTemplate, rows: Mapping[str, list[RowPair]]
) -> Iterator[TableRows]:
    """Each pair of rows as one row of a table, so that the cells are paired by it."""
    there = {table.name: table.rows for table in theirs.tables}
    for table in mine.tables:
        for found in rows.get(table.name.removesuffix("_table"), ()):
            if found.old is not None and found.new is not None:
                row = there[table.name][found.new]
                yield TableRows(table.sheet, table.name, table.rows[found.old], (row,))


def _same(a: Any, b: Any) -> bool:
    if isinstance(a, float | int) and isinstance(b, float | int) and not isinstance(a, bool):
        return isclose(a, b, rel_tol=TOLERANCE)
    return type(a) is type(b) and bool(a == b)


def _shown(value: Any) -> str:
    return "nothing" if value is None else f"{value:.10g}" if isinstance(value, float) else str(value)


def _leaves(path: str, value: Any) -> Iterator[tuple[str, Any]]:
    if isinstance(value, Mapping):
        for key, inner in value.items():
            yield from _leaves(f"{path}.{key}" if path else key, inner)
    elif isinstance(value, list):
        for n, inner in enumerate(value, 1):
            yield from _leaves(f"{path}[{n}]", inner)
    else:
        yield path, value
