"""The record that declares one worksheet function, and its parts."""

from __future__ import annotations

import inspect
from collections.abc import Callable, Mapping
from dataclasses import dataclass
from enum import StrEnum
from types import MappingProxyType
from typing import Any

from engine.editions import Clause, clauses


class Kind(StrEnum):
    """How the adapter reads an argument."""

    NUMBER = "number"  # one number a call; a range gives one result a cell
    CHOICE = "choice"  # one word out of a closed list
    LEVELS = "levels"  # a range with one number a level (or a period, an item), taken as a whole


@dataclass(frozen=True, slots=True)
class Span:
    """The numbers that an argument allows; an open end is excluded, ``None`` is unbounded."""

    low: float | None = None
    high: float | None = None
    low_open: bool = False
    high_open: bool = False

    def __str__(self) -> str:
        ends = []
        if self.low is not None:
            ends.append(f"{'above' if self.low_open else 'at least'} {self.low:g}")
        if self.high is not None:
            ends.append(f"{'below' if self.high_open else 'at most'} {self.high:g}")
        return " and ".join(ends) or "any number"

    def __contains__(self, number: float) -> bool:
        above_low = self.low is None or number > self.low or (number == self.low and not self.low_open)
        below_high = self.high is None or number < self.high or (number == self.high and not self.high_open)
        return above_low and below_high


ANY = Span()
POSITIVE = Span(0, low_open=True)
NOT_NEGATIVE = Span(0)


@dataclass(frozen=True, slots=True)
class Argument:
    """One argument: ``name`` in the call, ``symbol`` in the equation, ``unit`` a key of engine.units.

    ``each`` says what one cell of a range stands for.
    """

    name: str
    unit: str
    text: str
    span: Span = ANY
    kind: Kind = Kind.NUMBER
    choices: tuple[str, ...] = ()
    optional: bool = False
    symbol: str = ""
    each: str = "level"

    def __post_init__(self) -> None:
        object.__setattr__(self, "symbol", self.symbol or self.name)


@dataclass(frozen=True, slots=True)
class Result:
    """What a function returns: always one value for each element of its arguments."""

    symbol: str
    unit: str
    text: str


@dataclass(frozen=True, slots=True)
class Term:
    """A quantity that stands in the expression but is no argument: looked up or summed by the engine.

    ``compute`` takes, by name, those arguments of the worksheet function that it names as its own.
    """

    name: str
    symbol: str
    compute: Callable[..., Any]


@dataclass(frozen=True, slots=True)
class Case:
    """One branch of an expression: it stands where ``where`` says in symbols what ``holds`` decides.

    ``holds`` takes, by name, those arguments and terms that it names as its own. The cases are asked in
    their order; the last one holds wherever the others do not.
    """

    expression: str
    where: str
    holds: Callable[..., Any]


@dataclass(frozen=True, slots=True)
class Example:
    """Arguments by name and the result as it would be printed."""

    arguments: Mapping[str, Any]
    result: str


@dataclass(frozen=True, slots=True)
class SheetFunction:
    """One worksheet function.

    ``rule`` is the key of its clause in the edition data, ``also`` are those of rules that it applies
    besides; an edition may lack them. ``expression`` and ``native`` are templates with ``{argument}``
    places: the equation in symbols, and the same in built-in functions. An equation with branches has
    ``cases`` in place of an expression.
    """

    name: str
    summary: str
    category: str
    rule: str
    arguments: tuple[Argument, ...]
    result: Result
    function: Callable[..., Any]
    example: Example
    expression: str = ""
    cases: tuple[Case, ...] = ()
    native: str = ""
    terms: tuple[Term, ...] = ()
    note: str = ""
    also: tuple[str, ...] = ()
    since: str = "0.1"

    def __post_init__(self) -> None:
        if self.cases and not self.expression:
            joined = "; ".join(f"{case.expression} where {case.where}" for case in self.cases)
            object.__setattr__(self, "expression", joined)

    @property
    def usage(self) -> str:
        """The call as documented: ``ELF_THETA_MAX(C_d, [beta])``."""
        words = (f"[{a.name}]" if a.optional else a.name for a in self.arguments)
        return f"{self.name}({', '.join(words)})"

    @property
    def clauses(self) -> Mapping[str, Clause]:
        """The clause in each edition that has the rule."""
        return clauses(self.rule, *self.also)

    @property
    def defaults(self) -> Mapping[str, Any]:
        """The values that optional arguments take when they are left out."""
        parameters = inspect.signature(self.function).parameters.values()
        return MappingProxyType({p.name: p.default for p in parameters if p.default is not p.empty})

    @property
    def is_text(self) -> bool:
        """Whether the result is a text."""
        return self.result.unit == "text"
