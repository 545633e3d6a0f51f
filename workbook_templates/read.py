"""Take the inputs, and the results, back out of a workbook: by defined names and column headings.

The inputs come out as the tables of a BUILDING.toml, the results under the keys of the model route's
package, so that the two routes can be compared.
"""

from __future__ import annotations

from collections.abc import Callable, Iterator
from dataclasses import dataclass
from functools import cached_property
from typing import Any, Final

from workbook_templates.declare import DIRECTIONS, Part, Quantity, Role, Table
from workbook_templates.inputs import JOB_KEYS
from workbook_templates.layout import ROLE_ROW, STORY_TABLE, SYMBOL_ROW, Column, Grid, Layout
from workbook_templates.parts import CORE, PARTS
from xlbridge.headless.operands import NotEvaluated
from xlbridge.values import CellError, Scalar, Value

#: evaluates a formula in the workbook, and raises where it has no value
Ask = Callable[[str], Value]
Row = tuple[Scalar, ...]

FLAGS: Final = {"yes": True, "no": False}
HEADER_ROWS: Final = ROLE_ROW - SYMBOL_ROW + 1


class ReadError(ValueError):
    """The workbook does not hold what a story workbook holds; the message names the field."""


@dataclass(frozen=True)
class Reader:
    """Reads one story workbook; a lenient one passes over what cannot be read instead of refusing it."""

    ask: Ask
    lenient: bool = False

    def inputs(self) -> dict[str, Any]:
        """Return the tables of a BUILDING.toml."""
        tables = {
            "title": self._cell("job_title"),
            "parts": [part.key for part in self.layout.parts if part.key != CORE and not part.needs],
            "edition": self._cell("edition"),
            "units": self._cell("units"),
            "job": _filled({key: self._cell(f"job_{key}") for key in JOB_KEYS}),
            "site": self._entries(None),
            "direction": {d: self._entries(d) for d in DIRECTIONS},
            **{grid.table.stored: self._entered(grid) for grid in self.layout.grids if not grid.table.fixed},
            "sources": self._sources(),
        }
        return {key: table for key, table in tables.items() if table not in (None, {}, [])}

    def results(self) -> dict[str, Any]:
        """Return the results by the model route's keys; lists run over the levels as they stand."""
        return {**self._computed(None), "direction": {d: self._computed(d) for d in DIRECTIONS}}

    @cached_property
    def layout(self) -> Layout:
        """The layout of its parts; how many rows its tables have is not known from it."""
        edition = self._cell("edition")
        found = (key for key, part in PARTS.items() if edition in part.editions and self._has(part))
        return Layout(1, frozenset(found))

    @cached_property
    def _tables(self) -> dict[str, tuple[Row, ...]]:
        """The headings and rows of each table, by the name that covers them."""
        tables: dict[str, tuple[Row, ...]] = {}
        for name in {t.name for part in PARTS.values() for t in (STORY_TABLE, *part.tables)}:
            if self._defined(name):
                found = self._value(name)
                if not isinstance(found, tuple) or len(found) <= HEADER_ROWS:
                    self._refuse(f"{name}: the name does not cover a table")
                else:
                    tables[name] = found
        return tables

    def _headings(self, table: Table) -> Row:
        if table.name not in self._tables:
            raise ReadError(f"{table.name}: the workbook has no such name")
        return self._tables[table.name][0]

    def _rows(self, grid: Grid) -> list[Row]:
        table = self._tables[grid.table.name]
        return [table[n] for n in self.row_numbers(grid)]

    def row_numbers(self, grid: Grid) -> list[int]:
        """Return which rows of a named table count, from 0 at its headings: those with any input filled in.

        A link filled down an empty row does not count, nor does anything in a guard row.
        """
        inputs = [self.column_number(grid, c) for c in grid.columns if _marks_a_row(c.quantity)]
        rows = list(enumerate(self._tables[grid.table.name]))[HEADER_ROWS + 1 : -1]
        return [n for n, row in rows if any(row[i] is not None for i in inputs)]

    def _has(self, part: Part) -> bool:
        """Whether its table stands, a column of it in the story table, or its first criteria row.

        A part that only replaces an entry is there if that column is no entry any more.
        """
        layout = Layout(1, frozenset({part.key}))
        if part.tables:
            return any(table.name in self._tables for table in part.tables)
        if layout.table:
            headings = self._headings(STORY_TABLE)
            return any(c.heading in headings for c in layout.table)
        if not part.criteria:
            return self._role(part.replaces[0]) == part.replaces[0].role.value[0]
        q = next(block for block in part.criteria if not block.without).quantities[0]
        return self._defined(layout.source_name(q.key) if q.is_input else layout.name(q.key, DIRECTIONS[0]))

    def _role(self, q: Quantity) -> Scalar:
        """The letter of the role of a column in the story table; blank where there is none."""
        headings, *rows = self._tables[STORY_TABLE.name]
        heading = f"{q.shown_symbol} {DIRECTIONS[0]}"
        return rows[HEADER_ROWS - 2][headings.index(heading)] if heading in headings else None

    def _defined(self, name: str) -> bool:
        try:
            self.ask(f"={name}")
        except NotEvaluated:
            return False
        return True

    def column_number(self, grid: Grid, column: Column) -> int:
        """Return which column of a named table holds a quantity, from 0; it is found by its heading.

        Without one, the lenient reader takes the column where it was when the workbook was made.
        """
        headings = self._headings(grid.table)
        if column.heading in headings:
            return headings.index(column.heading)
        self._refuse(f"the {grid.table.title.lower()} has no column headed {column.heading}")
        return min(grid.columns.index(column), len(headings) - 1)

    def _quantities(self, direction: str | None, wanted: bool) -> Iterator[Quantity]:
        for block in self.layout.criteria:
            if block.per_direction is (direction is not None):
                yield from (q for q in block.quantities if q.is_input is wanted)

    def _entries(self, direction: str | None) -> dict[str, Any]:
        """Return the filled criteria entries of the site or of a direction."""
        values = {}
        for q in self._quantities(direction, True):
            name = self.layout.name(q.key, direction)
            value = self._cell(name)
            if value in (None, "") and not q.may_be_blank:
                self._refuse(f"{name}: the cell is blank")
            values[q.key] = FLAGS.get(str(value), value) if q.is_flag else value
        return _filled(values)

    def _entered(self, grid: Grid) -> list[dict[str, Any]]:
        """Return the entries of each row of a table."""
        keys = {
            c.quantity.stored_key(c.direction): self.column_number(grid, c)
            for c in grid.columns
            if c.quantity.is_input
        }
        words = {c.quantity.stored_key(c.direction) for c in grid.columns if c.quantity.unit == "text"}
        return [
            _filled(
                {
                    key: self._read(f"{grid.table.stored} {row[0]}: {key}", row[i], key in words)
                    for key, i in keys.items()
                }
            )
            for row in self._rows(grid)
        ]

    def _sources(self) -> dict[str, Any]:
        keys = [q.key for d in (None, "X") for q in self._quantities(d, True)]
        return _filled({key: self._cell(self.layout.source_name(key)) for key in keys})

    def _computed(self, direction: str | None) -> dict[str, Any]:
        found: dict[str, Any] = {
            q.key: self._value(self.layout.name(q.key, direction)) for q in self._quantities(direction, False)
        }
        for grid in self.layout.grids:
            rows = self._rows(grid)
            for c in grid.columns:
                if c.direction == direction and not c.quantity.is_input:
                    place = self.column_number(grid, c)
                    found[c.quantity.key] = [row[place] for row in rows]
        return found

    def _value(self, name: str) -> Value:
        try:
            return self.ask(f"={name}")
        except NotEvaluated as error:
            if self.lenient:
                return None
            raise ReadError(f"{name}: {error}") from error

    def _cell(self, name: str) -> Scalar:
        """Return the content of a named cell, ``None`` if it is blank."""
        value = self._value(name)
        if isinstance(value, tuple):
            self._refuse(f"{name}: the name covers more than one cell")
            return None
        return None if self._value(f"ISBLANK({name})") is True else self._sound(name, value)

    def _sound(self, field: str, value: Scalar) -> Scalar:
        if isinstance(value, CellError):
            self._refuse(f"{field}: the cell holds {value.code}")
            return None
        return value

    def _read(self, field: str, value: Scalar, is_text: bool) -> Scalar:
        """Return a cell of a table; a level that is named 8 is called "8", as the cell shows it."""
        sound = self._sound(field, value)
        return f"{sound:g}" if is_text and isinstance(sound, float) else sound

    def _refuse(self, message: str) -> None:
        if not self.lenient:
            raise ReadError(message)


def _marks_a_row(q: Quantity) -> bool:
    """Whether a filled cell of the column makes its row one: a link filled down an empty row does not."""
    return q.role is Role.FIXED or (q.is_input and not q.linked)


def _filled(entries: dict[str, Any]) -> dict[str, Any]:
    return {key: value for key, value in entries.items() if value is not None and value != ""}
