"""The words in which a workbook is declared: quantities, blocks of them, check lines, parts.

A formula is a template. ``{key}`` is the cell of a quantity in the same row (tables) or the same column
(criteria); ``{key:all}`` is its whole table column, guard rows included; ``{key:wide}`` the same with one
row more at either end; ``{key:total}`` and ``{key:base}`` are its cells in the totals row and in the base
row; ``{direction}`` is the letter of the direction. A criteria quantity met on another sheet is written by
its defined name.
"""

from __future__ import annotations

import re
from collections.abc import Callable, Mapping
from dataclasses import dataclass, field
from enum import StrEnum
from functools import cached_property
from typing import Any, Final

from engine.editions import EDITIONS
from xlbridge.catalogue import CATALOGUE, SheetFunction
from xlbridge.catalogue.entry import Argument, Span

DIRECTIONS: Final = ("X", "Y")
#: the word of a template that stands for the direction itself
DIRECTION: Final = "direction"
#: the mark of a value that nobody has entered yet
STARTER: Final = "starter value"
_CALL = re.compile(r"\b(ELF_[A-Z0-9_]+)\(")


class Role(StrEnum):
    """What a cell is for; its first letter stands beside the cell."""

    INPUT = "input"
    FIXED = "fixed"
    LINK = "link"
    CALCULATION = "calculation"
    RESULT = "result"
    VERDICT = "verdict"


@dataclass(frozen=True, slots=True)
class Start:
    """Where a starter value stands: the level counted from the base, the number of levels, the units."""

    units: str
    level: int = 0
    count: int = 0


#: an invented value, or how to invent it
Starter = Callable[[Start], Any]


@dataclass(frozen=True)
class Quantity:
    """One criteria row or one table column.

    ``unit`` is a key of engine.units; ``rule`` a key of the edition data, taken from the worksheet
    function in the formula where there is one. An input says what it allows (``span``, ``choices``, or the
    defined name of a list, ``listed_in``), what holds if it is left out (``default``, or ``linked``: the
    formula of a level entry), and what a blank workbook starts with (``starter``); ``stored`` is its key in
    BUILDING.toml. ``builtin`` is the key of a quantity whose formula this one has, in built-in functions
    alone. A criteria row whose formula gives a long text has room for ``lines`` of small print.
    """

    key: str
    text: str
    unit: str
    role: Role
    formula: str = ""
    rule: str = ""
    symbol: str = ""
    span: Span | None = None
    choices: tuple[str, ...] = ()
    listed_in: str = ""
    default: Any = None
    starter: Starter | None = None
    linked: str = ""
    stored: str = ""
    decimals: int | None = None
    total: str = ""
    base: str = ""
    width: float = 11
    lines: int = 1
    builtin: str = ""

    @property
    def calls(self) -> list[str]:
        """The worksheet functions that its formulas call."""
        return _CALL.findall(f"{self.formula} {self.base} {self.linked}")

    @cached_property
    def function(self) -> SheetFunction | None:
        """The worksheet function in the formula, if any."""
        found = _CALL.search(self.formula)
        return CATALOGUE[found[1]] if found else None

    @property
    def is_input(self) -> bool:
        """Whether the cell is an entry of the engineer's."""
        return self.role is Role.INPUT

    @property
    def may_be_blank(self) -> bool:
        """Whether an entry may be left blank: one that nothing stands in for, such as a computed period."""
        return self.starter is None and self.default is None

    @property
    def is_flag(self) -> bool:
        """Whether the entry says yes or no; BUILDING.toml keeps true or false."""
        return self.choices == YES_NO

    @property
    def shown_symbol(self) -> str:
        """The symbol as printed."""
        return self.symbol or self.key

    def stored_key(self, direction: str | None) -> str:
        """The key of a level input in BUILDING.toml."""
        return f"{self.key}_{direction}" if direction else (self.stored or self.key)


YES_NO: Final = ("yes", "no")


@dataclass(frozen=True, slots=True)
class Block:
    """Quantities under one title: a group of criteria rows, or a band of level columns.

    ``without`` is the key of a part that has the same quantities: the block stands only where that part
    does not.
    """

    title: str
    quantities: tuple[Quantity, ...]
    per_direction: bool = False
    without: str = ""


@dataclass(frozen=True, slots=True)
class Table:
    """A sheet with rows of its own between two guard rows: ``stored`` names them in BUILDING.toml.

    ``base`` says what the row of the base holds, where the table has one; ``text`` is its line in the
    contents. A table without rows of its own starts with ``start`` rows; where that is 0, one a level, and
    a building with levels must bring its rows. ``at_most_levels`` starts it with no more rows than levels.
    ``fixed`` are the words of its first column by edition, one a row, where the rows are no entries;
    ``list_name`` is a defined name for them, as a list to choose from. Rows have room for ``row_lines``.
    """

    sheet: str
    title: str
    text: str
    stored: str
    bands: tuple[Block, ...] = ()
    base: Mapping[str, str | int] = field(default_factory=dict)
    start: int = 0
    at_most_levels: bool = False
    fixed: Mapping[str, tuple[str, ...]] = field(default_factory=dict)
    list_name: str = ""
    row_lines: int = 1

    def rows_at_start(self, level_count: int, edition: str = "") -> int:
        """Return how many rows a table without rows of its own starts with."""
        if edition in self.fixed:
            return len(self.fixed[edition])
        if not self.start:
            return level_count
        return min(self.start, level_count) if self.at_most_levels else self.start

    @property
    def name(self) -> str:
        """The defined name of the headings and rows."""
        return f"{self.stored}_table"


@dataclass(frozen=True, slots=True)
class Check:
    """One check line: ``left`` against ``right``. A warning asks for a look, it is not a failure."""

    text: str
    left: str
    right: str
    test: str = "equal"  # or "at most"
    tolerance: float = 0.0
    unit: str = "none"
    per_direction: bool = False
    warning: bool = False
    decimals: int | None = None


@dataclass(frozen=True, slots=True)
class Headline:
    """One line of results on the cover, in both directions."""

    text: str
    unit: str
    formula: str


@dataclass(frozen=True, slots=True)
class Figure:
    """A chart of a level column over the height; ``bars`` draws it level by level, ``limit`` adds a line.

    With ``beside`` it is one chart a direction, in which these columns stand beside it.
    """

    key: str
    title: str
    bars: bool = False
    limit: float | None = None
    beside: tuple[str, ...] = ()


@dataclass(frozen=True, slots=True)
class Curve:
    """A chart of columns of a table over another column of it; ``point`` marks a place of each direction."""

    title: str
    over: str
    keys: tuple[str, ...]
    point: tuple[str, str]


@dataclass(frozen=True, slots=True)
class Part:
    """A part of the workbook; a job that does not need it leaves it out.

    ``needs`` are the level entries of BUILDING.toml without which the part cannot be filled in;
    ``requires`` the keys of the parts that come along, because formulas of this one refer to them.
    ``bands`` widen the story table, ``tables`` are further sheets; ``replaces`` are quantities that take the
    place of those of other parts with the same key; ``takes`` says which places a formula takes instead of
    others, by the key of its quantity; ``editions`` are those that have the procedure.
    ``brought_by`` are entries that ask for the part, by key or, of criteria, as ``key = value``;
    ``excludes`` the keys of parts that give the same quantities another way.
    """

    key: str
    title: str
    criteria: tuple[Block, ...] = ()
    bands: tuple[Block, ...] = ()
    tables: tuple[Table, ...] = ()
    replaces: tuple[Quantity, ...] = ()
    takes: Mapping[str, Mapping[str, str]] = field(default_factory=dict)
    checks: tuple[Check, ...] = ()
    headlines: tuple[Headline, ...] = ()
    figures: tuple[Figure, ...] = ()
    curves: tuple[Curve, ...] = ()
    needs: tuple[str, ...] = ()
    requires: tuple[str, ...] = ()
    editions: tuple[str, ...] = EDITIONS
    brought_by: tuple[str, ...] = ()
    excludes: tuple[str, ...] = ()

    @property
    def calls(self) -> list[str]:
        """The worksheet functions that its formulas call."""
        bands = (band for table in self.tables for band in table.bands)
        quantities = (q for block in (*self.criteria, *self.bands, *bands) for q in block.quantities)
        return [name for q in (*quantities, *self.replaces) for name in q.calls]


def entry(key: str, feeds: str, text: str = "", **more: Any) -> Quantity:
    """Declare an input that allows what the argument it feeds allows (``FUNCTION.argument``)."""
    function, name = feeds.split(".")
    a: Argument = next(a for a in CATALOGUE[function].arguments if a.name == name)
    span = None if a.choices else a.span
    return Quantity(key, text or a.text, a.unit, Role.INPUT, span=span, choices=a.choices, **more)


def level_name(start: Start) -> str:
    """Return the name of a level in a blank workbook; what stands on the base is Level 1."""
    return "Roof" if start.level == start.count else f"Level {start.level + 1}"


def always(value: Any) -> Starter:
    """Return the starter that is the same everywhere."""
    return lambda start: value


def by_units(us: float, si: float, per_level: bool = False) -> Starter:
    """Return the starter of a unit system; ``per_level`` multiplies it by the level's number."""
    return lambda start: (us if start.units == "us" else si) * (start.level if per_level else 1)
