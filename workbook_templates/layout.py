"""Where every quantity stands, and formulas written out from their templates."""

from __future__ import annotations

import re
from collections.abc import Iterable
from dataclasses import dataclass, field, replace
from functools import cached_property
from typing import Final

from openpyxl.utils import get_column_letter

from workbook_templates.declare import DIRECTION, DIRECTIONS, Block, Part, Quantity, Table
from workbook_templates.parts import chosen
from xlbridge.native import in_builtin_functions

COVER: Final = "Cover"
CRITERIA: Final = "Criteria"
CHECKS: Final = "Checks"
FIGURES: Final = "Figures"
FUNCTIONS: Final = "Functions"
#: the table that every workbook has; the bands of the parts are its columns
STORY_TABLE: Final = Table(
    "Levels",
    "Story table",
    "the story table: weights, forces, drift and stability, one row a level",
    "level",
    base={"name": "Base", "elevation": "=base_elevation", "h_x": 0},
)
LEVELS: Final = STORY_TABLE.sheet

CRITERIA_TOP: Final = 5
CRITERIA_COLUMN: Final = {None: "D", "X": "D", "Y": "E"}

BAND_ROW, TEXT_ROW, SYMBOL_ROW, UNIT_ROW, CLAUSE_ROW, MARK_ROW, ROLE_ROW, TOP_GUARD = range(4, 12)
FIRST_LEVEL: Final = TOP_GUARD + 1

_PLACE = re.compile(r"\{(\w+)(?::(\w+))?\}")

Key = tuple[str, str | None]


@dataclass(frozen=True, slots=True)
class Column:
    """One column of a table."""

    letter: str
    band: Block
    direction: str | None
    quantity: Quantity

    @property
    def heading(self) -> str:
        """The symbol that heads the column; it is unique in the table."""
        q = self.quantity
        return f"{q.shown_symbol} {self.direction}" if self.direction else q.shown_symbol


@dataclass(frozen=True)
class Grid:
    """A table as it stands on its sheet: its columns, and how many rows there are."""

    table: Table
    count: int

    @cached_property
    def columns(self) -> list[Column]:
        """The columns, those of one direction of a band together."""
        places = (
            (band, direction, q)
            for band in self.table.bands
            for direction in (DIRECTIONS if band.per_direction else (None,))
            for q in band.quantities
        )
        return [Column(get_column_letter(n), *place) for n, place in enumerate(places, 1)]

    @cached_property
    def letters(self) -> dict[Key, str]:
        """The letter of each column."""
        return {(c.quantity.key, c.direction): c.letter for c in self.columns}

    @property
    def bottom_guard(self) -> int:
        """The guard row below the lowest row."""
        return FIRST_LEVEL + self.count

    @property
    def base_row(self) -> int:
        """The row of the base; that of the totals in a table without one."""
        return self.bottom_guard + 1

    @property
    def total_row(self) -> int:
        """The row of the totals."""
        return self.base_row + bool(self.table.base)

    def letter(self, key: str, direction: str | None) -> str:
        """Return the letter of a column, in the given direction or common to both."""
        return self.letters.get((key, direction)) or self.letters[key, None]

    def address(self, key: str, part: str | None, direction: str | None, row: int) -> str:
        """Return the address on the sheet of a place in a template."""
        column = self.letter(key, direction)
        if part == "wide":
            return f"${column}${ROLE_ROW}:${column}${self.base_row}"
        if part == "all":
            return f"${column}${TOP_GUARD}:${column}${self.bottom_guard}"
        if part is not None:
            return f"${column}${self.total_row if part == 'total' else self.base_row}"
        return f"{column}{row}"


@dataclass(frozen=True)
class Layout:
    """The addresses of one workbook: how many levels, which parts, how many rows the further tables have."""

    level_count: int
    part_keys: frozenset[str]
    row_counts: dict[str, int] = field(default_factory=dict)
    rows: dict[str, int] = field(init=False, default_factory=dict)

    def __post_init__(self) -> None:
        top = CRITERIA_TOP
        for block in self.criteria:
            self.rows.update({q.key: top + n for n, q in enumerate(block.quantities, 1)})
            top += len(block.quantities) + 2

    @cached_property
    def parts(self) -> tuple[Part, ...]:
        """The parts that are in, in the order of the workbook."""
        return chosen(self.part_keys)

    @cached_property
    def criteria(self) -> list[Block]:
        """The criteria blocks of the parts that are in, one that several parts share once."""
        blocks = dict.fromkeys(block for part in self.parts for block in part.criteria)
        return self._standing(block for block in blocks if block.without not in self.part_keys)

    @cached_property
    def grids(self) -> list[Grid]:
        """The tables: the story table first, then those that parts bring."""
        story = replace(STORY_TABLE, bands=tuple(band for part in self.parts for band in part.bands))
        tables = (story, *(table for part in self.parts for table in part.tables))
        return [
            Grid(
                replace(t, bands=tuple(self._standing(t.bands))),
                self.row_counts.get(t.stored, t.rows_at_start(self.level_count)),
            )
            for t in tables
        ]

    @property
    def levels(self) -> Grid:
        """The story table."""
        return self.grids[0]

    @property
    def table(self) -> list[Column]:
        """The columns of the story table."""
        return self.levels.columns

    @property
    def bottom_guard(self) -> int:
        """The guard row below the lowest level."""
        return self.levels.bottom_guard

    @property
    def sheets(self) -> tuple[str, ...]:
        """The sheets in their order."""
        return (COVER, CRITERIA, *(grid.table.sheet for grid in self.grids), CHECKS, FIGURES, FUNCTIONS)

    def grid(self, key: str) -> Grid:
        """Return the table that has a quantity among its columns; no two tables share one."""
        return next(g for g in self.grids if any(c.quantity.key == key for c in g.columns))

    def column(self, key: str, direction: str | None) -> str:
        """Return the letter of a column of any table, in the given direction or common to both."""
        return self.grid(key).letter(key, direction)

    def level_range(self, key: str, direction: str | None) -> str:
        """Return a column from guard row to guard row, so that rows put in at either end count."""
        return self.grid(key).address(key, "all", direction, 0)

    def is_site(self, key: str) -> bool:
        """Whether a criteria quantity holds for the whole building."""
        return any(q.key == key for b in self.criteria if not b.per_direction for q in b.quantities)

    def criteria_cell(self, key: str, direction: str | None) -> str:
        """Return the absolute address of a criteria value on its sheet."""
        return f"${CRITERIA_COLUMN[direction]}${self.rows[key]}"

    def name(self, key: str, direction: str | None) -> str:
        """Return the defined name of a criteria value: ``S_DS``, ``R_X``."""
        return key if self.is_site(key) else f"{key}_{direction}"

    @staticmethod
    def source_name(key: str) -> str:
        """Return the defined name of the source cell of a criteria entry."""
        return f"source_{key}"

    def write(self, template: str, sheet: str, direction: str | None, row: int = 0) -> str:
        """Return the formula of a template for one cell."""
        return _PLACE.sub(lambda m: self._place(m[1], m[2], sheet, direction, row), template)

    def content(self, q: Quantity, sheet: str, direction: str | None, row: int = 0) -> str:
        """Return the formula of a quantity for one cell."""
        formula = self.write(q.formula or q.linked, sheet, direction, row)
        return in_builtin_functions(formula) if q.builtin else formula

    def _standing(self, blocks: Iterable[Block]) -> list[Block]:
        """Leave out blocks that another part stands for; put in the quantities that parts replace."""
        instead = {q.key: q for part in self.parts for q in part.replaces}
        return [
            replace(block, quantities=tuple(self._rewired(instead.get(q.key, q)) for q in block.quantities))
            for block in blocks
            if block.without not in self.part_keys
        ]

    def _rewired(self, q: Quantity) -> Quantity:
        """Return a quantity whose formula takes the places that parts put instead of others."""
        if q.builtin:
            return replace(q, formula=self._formula(q.builtin, q.formula))
        places = {old: new for part in self.parts for old, new in part.takes.get(q.key, {}).items()}
        if not places:
            return q
        return replace(
            q, formula=_PLACE.sub(lambda m: m[0].replace(m[1], places.get(m[1], m[1]), 1), q.formula)
        )

    def _formula(self, key: str, otherwise: str) -> str:
        """Return the formula that a quantity has in this workbook, if it stands in it."""
        blocks = (block for part in self.parts for block in (*part.criteria, *part.bands))
        own = {q.key: q for block in blocks if block.without not in self.part_keys for q in block.quantities}
        instead = {q.key: q for part in self.parts for q in part.replaces}
        found = instead.get(key) or own.get(key)
        return self._rewired(found).formula if found else otherwise

    def _place(self, key: str, part: str | None, sheet: str, direction: str | None, row: int) -> str:
        if key == DIRECTION:
            return str(direction)
        if key in self.rows:
            return self._criteria_place(key, sheet, direction)
        grid = self.grid(key)
        prefix = "" if sheet == grid.table.sheet else f"{grid.table.sheet}!"
        return prefix + grid.address(key, part, direction, row)

    def _criteria_place(self, key: str, sheet: str, direction: str | None) -> str:
        if sheet != CRITERIA:
            return self.name(key, direction)
        if self.is_site(key):
            return self.criteria_cell(key, None)
        return f"{CRITERIA_COLUMN[direction]}{self.rows[key]}"
