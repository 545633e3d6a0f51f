"""Take the inputs, and the results, back out of a workbook: by defined names and column headings.

The inputs come out as the tables of a BUILDING.toml, the results under the keys of the model route's
package, so that the two routes can be compared.
"""

from __future__ import annotations

from collections.abc import Callable, Iterator
from dataclasses import dataclass
from functools import cached_property
from typing import Any, Final

from workbook_templates.declare import DIRECTIONS, Part, Quantity
from workbook_templates.inputs import JOB_KEYS
from workbook_templates.layout import ROLE_ROW, SYMBOL_ROW, Column, Layout
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
    """Reads one story workbook."""

    ask: Ask

    def inputs(self) -> dict[str, Any]:
        """Return the tables of a BUILDING.toml."""
        tables = {
            "title": self._cell("job_title"),
            "parts": [part.key for part in self._layout.parts if part.key != CORE and not part.needs],
            "edition": self._cell("edition"),
            "units": self._cell("units"),
            "job": _filled({key: self._cell(f"job_{key}") for key in JOB_KEYS}),
            "site": self._entries(None),
            "direction": {d: self._entries(d) for d in DIRECTIONS},
            "level": [self._level(row) for row in self._rows],
            "sources": self._sources(),
        }
        return {key: table for key, table in tables.items() if table not in (None, {}, [])}

    def results(self) -> dict[str, Any]:
        """Return the results by the model route's keys; lists run over the levels as they stand."""
        return {**self._computed(None), "direction": {d: self._computed(d) for d in DIRECTIONS}}

    @cached_property
    def _table(self) -> tuple[Row, ...]:
        table = self._value("level_table")
        if not isinstance(table, tuple) or len(table) <= HEADER_ROWS:
            raise ReadError("level_table: the name does not cover a story table")
        return table

    @cached_property
    def _layout(self) -> Layout:
        present = frozenset(key for key, part in PARTS.items() if self._has(part))
        return Layout(len(self._rows), present)

    @cached_property
    def _rows(self) -> list[Row]:
        """The rows below the headings in which any input is filled in."""
        inputs = [self._place(c) for c in Layout(1, frozenset({CORE})).table if c.quantity.is_input]
        return [row for row in self._table[HEADER_ROWS:] if any(row[i] is not None for i in inputs)]

    def _has(self, part: Part) -> bool:
        """Whether the story table has a column of the part, or the criteria its first row if it has none."""
        layout = Layout(1, frozenset({part.key}))
        if layout.table:
            return any(self._heads(c) for c in layout.table)
        block = layout.criteria[0]
        return self._defined(layout.name(block.quantities[0].key, DIRECTIONS[0]))

    def _defined(self, name: str) -> bool:
        try:
            self.ask(f"={name}")
        except NotEvaluated:
            return False
        return True

    def _heads(self, column: Column) -> bool:
        return column.heading in self._table[0]

    def _place(self, column: Column) -> int:
        if not self._heads(column):
            raise ReadError(f"the story table has no column headed {column.heading}")
        return self._table[0].index(column.heading)

    def _columns(self, direction: str | None, wanted: bool) -> Iterator[tuple[Quantity, int]]:
        for column in self._layout.table:
            if column.direction == direction and column.quantity.is_input is wanted:
                yield column.quantity, self._place(column)

    def _quantities(self, direction: str | None, wanted: bool) -> Iterator[Quantity]:
        for block in self._layout.criteria:
            if block.per_direction is (direction is not None):
                yield from (q for q in block.quantities if q.is_input is wanted)

    def _entries(self, direction: str | None) -> dict[str, Any]:
        """Return the filled criteria entries of the site or of a direction."""
        values = {}
        for q in self._quantities(direction, True):
            value = self._cell(self._layout.name(q.key, direction))
            values[q.key] = FLAGS.get(str(value), value) if q.is_flag else value
        return _filled(values)

    def _level(self, row: Row) -> dict[str, Any]:
        level: dict[str, Any] = {}
        for direction in (None, *DIRECTIONS):
            for q, place in self._columns(direction, True):
                name = q.stored_key(direction)
                level[name] = _sound(f"level {row[0]}: {name}", row[place])
        return _filled(level)

    def _sources(self) -> dict[str, Any]:
        keys = [q.key for d in (None, "X") for q in self._quantities(d, True)]
        return _filled({key: self._cell(self._layout.source_name(key)) for key in keys})

    def _computed(self, direction: str | None) -> dict[str, Any]:
        found: dict[str, Any] = {
            q.key: self._value(self._layout.name(q.key, direction))
            for q in self._quantities(direction, False)
        }
        found.update({q.key: [row[i] for row in self._rows] for q, i in self._columns(direction, False)})
        return found

    def _value(self, name: str) -> Value:
        try:
            return self.ask(f"={name}")
        except NotEvaluated as error:
            raise ReadError(f"{name}: {error}") from error

    def _cell(self, name: str) -> Scalar:
        """Return the content of a named cell, ``None`` if it is blank."""
        value = self._value(name)
        if isinstance(value, tuple):
            raise ReadError(f"{name}: the name covers more than one cell")
        return None if self._value(f"ISBLANK({name})") is True else _sound(name, value)


def _sound(field: str, value: Scalar) -> Scalar:
    if isinstance(value, CellError):
        raise ReadError(f"{field}: the cell holds {value.code}")
    return value


def _filled(entries: dict[str, Any]) -> dict[str, Any]:
    return {key: value for key, value in entries.items() if value is not None and value != ""}
