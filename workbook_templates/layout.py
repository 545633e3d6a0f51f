"""Where every quantity stands, and formulas written out from their templates."""

from __future__ import annotations

import re
from dataclasses import dataclass, field
from functools import cached_property
from typing import Final

from openpyxl.utils import get_column_letter

from workbook_templates.declare import DIRECTIONS, Block, Part, Quantity
from workbook_templates.parts import chosen

COVER: Final = "Cover"
CRITERIA: Final = "Criteria"
LEVELS: Final = "Levels"
CHECKS: Final = "Checks"
FIGURES: Final = "Figures"
FUNCTIONS: Final = "Functions"
SHEETS: Final = (COVER, CRITERIA, LEVELS, CHECKS, FIGURES, FUNCTIONS)

CRITERIA_TOP: Final = 5
CRITERIA_COLUMN: Final = {None: "D", "X": "D", "Y": "E"}

BAND_ROW, TEXT_ROW, SYMBOL_ROW, UNIT_ROW, CLAUSE_ROW, MARK_ROW, ROLE_ROW, TOP_GUARD = range(4, 12)
FIRST_LEVEL: Final = TOP_GUARD + 1

_PLACE = re.compile(r"\{(\w+)(?::(\w+))?\}")

Key = tuple[str, str | None]


@dataclass(frozen=True, slots=True)
class Column:
    """One column of the story table."""

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
class Layout:
    """The addresses of one workbook: how many levels, which parts."""

    level_count: int
    part_keys: frozenset[str]
    rows: dict[str, int] = field(init=False, default_factory=dict)
    table: list[Column] = field(init=False, default_factory=list)

    def __post_init__(self) -> None:
        top = CRITERIA_TOP
        for block in self.criteria:
            self.rows.update({q.key: top + n for n, q in enumerate(block.quantities, 1)})
            top += len(block.quantities) + 2
        for band, direction in self.bands:
            for q in band.quantities:
                self.table.append(Column(get_column_letter(len(self.table) + 1), band, direction, q))

    @property
    def criteria(self) -> list[Block]:
        """The criteria blocks of the parts that are in."""
        blocks = (block for part in self.parts for block in part.criteria)
        return [block for block in blocks if block.without not in self.part_keys]

    @cached_property
    def parts(self) -> tuple[Part, ...]:
        """The parts that are in, in the order of the workbook."""
        return chosen(self.part_keys)

    @property
    def bands(self) -> list[tuple[Block, str | None]]:
        """The bands of the story table with their direction, those of one direction together."""
        bands = (band for part in self.parts for band in part.bands)
        return [(b, d) for b in bands for d in (DIRECTIONS if b.per_direction else (None,))]

    @cached_property
    def letters(self) -> dict[Key, str]:
        """The letter of each level column."""
        return {(c.quantity.key, c.direction): c.letter for c in self.table}

    @property
    def bottom_guard(self) -> int:
        """The guard row below the lowest level."""
        return FIRST_LEVEL + self.level_count

    @property
    def base_row(self) -> int:
        """The row of the base."""
        return self.bottom_guard + 1

    @property
    def total_row(self) -> int:
        """The row of the totals."""
        return self.bottom_guard + 2

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

    def level_range(self, key: str, direction: str | None) -> str:
        """Return a level column from guard row to guard row, so that rows put in at either end count."""
        column = self.column(key, direction)
        return f"${column}${TOP_GUARD}:${column}${self.bottom_guard}"

    def column(self, key: str, direction: str | None) -> str:
        """Return the letter of a level column, in the given direction or common to both."""
        return self.letters.get((key, direction)) or self.letters[key, None]

    def write(self, template: str, sheet: str, direction: str | None, row: int = 0) -> str:
        """Return the formula of a template for one cell."""
        return _PLACE.sub(lambda m: self._place(m[1], m[2], sheet, direction, row), template)

    def _place(self, key: str, part: str | None, sheet: str, direction: str | None, row: int) -> str:
        if key in self.rows:
            return self._criteria_place(key, sheet, direction)
        prefix = "" if sheet == LEVELS else f"{LEVELS}!"
        column = self.column(key, direction)
        if part == "wide":
            return f"{prefix}${column}${ROLE_ROW}:${column}${self.base_row}"
        if part == "all":
            return prefix + self.level_range(key, direction)
        if part is not None:
            return f"{prefix}${column}${self.total_row if part == 'total' else self.base_row}"
        return f"{column}{row}"

    def _criteria_place(self, key: str, sheet: str, direction: str | None) -> str:
        if sheet != CRITERIA:
            return self.name(key, direction)
        if self.is_site(key):
            return self.criteria_cell(key, None)
        return f"{CRITERIA_COLUMN[direction]}{self.rows[key]}"
