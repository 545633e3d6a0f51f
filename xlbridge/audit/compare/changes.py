"""What changed from one issue of a workbook to the next: entries, formulas, labels, names and results."""

from __future__ import annotations

import re
from collections.abc import Iterator, Mapping, Sequence
from dataclasses import dataclass, replace
from functools import cached_property
from typing import Any, Final

from xlbridge.audit.align import Alignment, align
from xlbridge.audit.compare.cells import Cells, Line, Side
from xlbridge.audit.compare.change import Change, Of, Result, same, shown
from xlbridge.audit.compare.rows import RowPair, pair
from xlbridge.audit.compare.signature import equal_rows
from xlbridge.audit.paths import leaves
from xlbridge.audit.subject import Subject
from xlbridge.audit.template import OwnTemplate, TableRows
from xlbridge.headless.book import Book
from xlbridge.headless.references import Cell

#: entries that a workbook has fixed in a cell
FIXED: Final = ("edition", "units")
#: what is no entry of the calculation
NO_ENTRIES: Final = ("title", "job", "sources", "source")
_ROW: Final = re.compile(r"(\w+)\[(\d+)\]")


@dataclass(frozen=True, slots=True)
class Link:
    """An entry that is a formula, in the earlier issue and in the later one."""

    old: Cell
    new: Cell


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
            name: pair(_rows_of(mine, name), _rows_of(theirs, name))
            for name in dict.fromkeys((*mine.inputs, *theirs.inputs))
            if _is_table(mine.inputs.get(name)) or _is_table(theirs.inputs.get(name))
        }
        tables = tuple(_row_pairs(mine, theirs, rows))
        return cls(old, new, rows, aligned(old.book, new.book, tables))

    def inputs(self) -> Iterator[Change]:
        """Yield every entry that differs, and every row that came, went, moved or has another name."""
        if self.readable and self.old.own and self.new.own:
            yield from self._entries("", self.old.own.inputs, self.new.own.inputs)

    def cells(self) -> Iterator[Change]:
        """Yield every difference of cells that is not one of entries."""
        return Cells(self._side(self.old, "old"), self._side(self.new, "new"), self.alignment).changes()

    def _side(self, subject: Subject, issue: str) -> Side:
        """One issue, with the entries and the rows of tables that :meth:`inputs` speaks of."""
        own = (subject.own if self.readable else None) or OwnTemplate()
        links = {getattr(link, issue) for link in self._links}
        entered = {
            cell
            for path, cell in own.places.items()
            if (path in own.entered and cell not in links) or path in FIXED
        }
        return Side(subject.book, frozenset(entered), frozenset(self._said(own, issue)))

    @cached_property
    def _links(self) -> frozenset[Link]:
        """The entries that are formulas in both issues: what they read changed, or the formula did."""
        mine, theirs = (side.own or OwnTemplate() for side in (self.old, self.new))
        found = ((mine.places.get(self._entry_before(path)), theirs.places[path]) for path in theirs.entered)
        return frozenset(
            Link(old, new)
            for old, new in found
            if old and self.old.book.formula(old) and self.new.book.formula(new)
        )

    def _entry_before(self, path: str) -> str:
        """The path that an entry had in the earlier issue."""
        row = _ROW.match(path)
        if row is None or row[1] not in self.rows:
            return path
        before = next((r.old for r in self.rows[row[1]] if r.new == int(row[2]) - 1), None)
        return "" if before is None else f"{row[1]}[{before + 1}]{path[row.end() :]}"

    def _said(self, own: OwnTemplate, issue: str) -> Iterator[Line]:
        for table in own.tables:
            for found in self.rows.get(_of(table), ()):
                number = getattr(found, issue)
                if number is not None and None in (found.old, found.new):
                    yield _sheet(own, table), table.rows[number]

    @property
    def readable(self) -> bool:
        """Whether the entries of both can be read; if not, they are cells like all others."""
        return all(side.own is not None and not side.own.unread for side in (self.old, self.new))

    @property
    def comparable(self) -> bool:
        """Whether both are ours, read, and in the same units, so that their numbers can be compared."""
        sides = [side.own.inputs for side in (self.old, self.new) if side.own]
        return self.readable and sides[0]["units"] == sides[1]["units"]

    def results(self) -> Iterator[Result]:
        """Yield every result of either issue, each with what it was and what it is now."""
        if not (self.comparable and self.old.own and self.new.own):
            return
        old = {path: value for path, value in leaves(self.old.own.results) if value is not None}
        for path, value in leaves(self.new.own.results):
            before = old.pop(self._path_before(self.new.own, path), None)
            if (before, value) != (None, None):
                yield Result(path, before, value)
        yield from (Result(path, value, None) for path, value in old.items())

    def _path_before(self, own: OwnTemplate, path: str) -> str:
        """The path that a result had in the earlier issue: a row of a table may have been another one."""
        head, mark, rest = path.partition("[")
        sheet = own.places[path].sheet if path in own.places else ""
        table = next((_of(t) for t in own.tables if t.sheet == sheet), "")
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
            elif not same(before, after) and self._place(path) not in {link.new for link in self._links}:
                yield self._input(path, before, after)

    def _rows(self, name: str, old: Sequence[Any], new: Sequence[Any]) -> Iterator[Change]:
        whole = f"all of {name}" if not old or not new else ""
        for found in self.rows[name]:
            if found.new is None:
                assert found.old is not None
                path, row = f"{name}[{found.old + 1}]", old[found.old]
                words = f"{name} {_called(row, found.old)} was removed"
                yield Change(Of.ROW, path, None, row, None, words, whole)
                continue
            path, row = f"{name}[{found.new + 1}]", new[found.new]
            place, called = self._place(path), f"{name} {_called(row, found.new)}"
            if found.old is None:
                yield Change(Of.ROW, path, place, None, row, f"{called} was added", whole)
                continue
            if found.moved:
                words = f"{called} stands in another place of the order"
                yield Change(Of.ROW, path, place, found.old + 1, found.new + 1, words)
            before = old[found.old]
            for key in (key for key in dict.fromkeys((*before, *row)) if key not in NO_ENTRIES):
                linked = self._place(f"{path}.{key}") in {link.new for link in self._links}
                if not linked and not same(before.get(key), row.get(key)):
                    change = self._input(f"{path}.{key}", before.get(key), row.get(key), found)
                    came_or_went = None in (change.old, change.new)
                    yield replace(change, cause=f"{name} {key}" if came_or_went else "")

    def _input(self, path: str, old: Any, new: Any, row: RowPair | None = None) -> Change:
        """An entry that differs; what is gone is called as the earlier issue has it."""
        mine, theirs = (side.own or OwnTemplate() for side in (self.old, self.new))
        before = path.replace(f"[{(row.new or 0) + 1}]", f"[{(row.old or 0) + 1}]", 1) if row else path
        meaning = theirs.meanings.get(path) or mine.meanings.get(before)
        head, mark, _ = path.partition("[")
        named = theirs.inputs[head][row.new].get("name", "") if mark and row and row.new is not None else ""
        at = f" of {named}" if named and not path.endswith(".name") else ""
        unit = meaning.unit.strip("- ") if meaning else ""
        now = f"{shown(new)} {unit if new is not None else ''}".rstrip()
        words = f"{meaning.text if meaning else path}{at} ({path}): {shown(old)}, now {now}"
        return Change(Of.INPUT, path, self._place(path), old, new, words, unit=unit)

    def _place(self, path: str) -> Cell | None:
        """The cell of an entry in the later issue, or the first of a row."""
        known = (self.new.own or OwnTemplate()).places
        return known.get(path) or next((c for p, c in known.items() if p.startswith(f"{path}.")), None)


def aligned(old: Book, new: Book, tables: tuple[TableRows, ...] = ()) -> Alignment:
    """Pair the cells of two issues; rows outside the tables by what they hold as well."""
    first = align(new, OwnTemplate(twin=old, tables=tables))
    known = {table.sheet for table in tables}
    others = [pair for pair in first.pairs if pair.twin not in known]
    return align(new, OwnTemplate(twin=old, tables=(*tables, *equal_rows(old, new, others))))


def _called(row: Mapping[str, Any], number: int) -> str:
    return str(row.get("name", f"row {number + 1}"))


def _rows_of(own: OwnTemplate, name: str) -> Sequence[Mapping[str, Any]]:
    rows = own.inputs.get(name)
    return rows if isinstance(rows, list) else []


def _sheet(own: OwnTemplate, table: TableRows) -> str:
    """The sheet of a table as the workbook calls it."""
    start = f"{_of(table)}["
    return next((c.sheet for path, c in own.places.items() if path.startswith(start)), table.sheet)


def _of(table: TableRows) -> str:
    """The entry that a table is of."""
    return table.name.removesuffix("_table")


def _is_table(value: Any) -> bool:
    return isinstance(value, list) and bool(value) and all(isinstance(row, Mapping) for row in value)


def _row_pairs(
    mine: OwnTemplate, theirs: OwnTemplate, rows: Mapping[str, list[RowPair]]
) -> Iterator[TableRows]:
    """Each pair of rows as one row of a table, so that the cells are paired by it."""
    there = {table.name: table.rows for table in theirs.tables}
    for table in mine.tables:
        for found in rows.get(_of(table), ()):
            if found.old is not None and found.new is not None and table.name in there:
                row = there[table.name][found.new]
                yield TableRows(_sheet(mine, table), table.name, table.rows[found.old], (row,))
