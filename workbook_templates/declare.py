"""The words in which a workbook is declared: quantities, blocks of them, check lines.

A formula is a template. ``{key}`` is the cell of a quantity in the same row (levels) or the same column
(criteria); ``{key:all}`` is its whole level column, guard rows included; ``{key:wide}`` the
same with one row more at either end; ``{key:total}`` and ``{key:base}`` are its cells in the totals row
and in the base row. A criteria quantity met on another
sheet is written by its defined name.
"""

from __future__ import annotations

import re
from collections.abc import Iterable
from dataclasses import dataclass
from enum import StrEnum
from functools import cached_property
from typing import Final

from xlbridge.catalogue import CATALOGUE, SheetFunction
from xlbridge.catalogue.entry import Span

DIRECTIONS: Final = ("X", "Y")
_CALL = re.compile(r"\b(ELF_[A-Z0-9_]+)\(")


class Role(StrEnum):
    """What a cell is for; its first letter stands beside the cell."""

    INPUT = "input"
    FIXED = "fixed"
    LINK = "link"
    CALCULATION = "calculation"
    RESULT = "result"
    VERDICT = "verdict"


class Part(StrEnum):
    """A part of the workbook; a job that does not need it leaves it out."""

    FORCES = "forces"
    DRIFT = "drift"


@dataclass(frozen=True)
class Quantity:
    """One criteria row or one level column.

    ``unit`` is a key of engine.units; ``rule`` a key of the edition data, taken from the worksheet
    function in the formula where there is one. ``span`` and ``choices`` say what an input allows.
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
    optional: bool = False
    part: Part = Part.FORCES
    decimals: int | None = None
    total: str = ""
    base: str = ""
    width: float = 11

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
    def shown_symbol(self) -> str:
        """The symbol as printed."""
        return self.symbol or self.key

    @property
    def clause_rule(self) -> str:
        """The key of the rule in the edition data, or an empty text."""
        return self.rule or (self.function.rule if self.function else "")


@dataclass(frozen=True, slots=True)
class Block:
    """Quantities under one title: a group of criteria rows, or a band of level columns."""

    title: str
    quantities: tuple[Quantity, ...]
    per_direction: bool = False

    def only(self, parts: Iterable[Part]) -> Block:
        """Return the block without the quantities of parts that are left out."""
        kept = set(parts)
        return Block(self.title, tuple(q for q in self.quantities if q.part in kept), self.per_direction)


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
    part: Part = Part.FORCES
    decimals: int | None = None
