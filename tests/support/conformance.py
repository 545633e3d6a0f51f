"""The conformance matrix: calls of every worksheet function, made from the catalogue.

A call is of a kind: valid, at an end of an allowed range, or bad in one way in one argument. Each front end
gives the same number or the same error for it, but for the departures listed here, which lie in the nature
of a front end and are checked to be still so.
"""

from __future__ import annotations

from collections import Counter
from collections.abc import Callable, Iterator, Mapping, Sequence
from dataclasses import dataclass
from functools import partial
from math import isclose
from typing import Any, Final

from tests.support.sheet_cases import (
    ENTRIES,
    as_cells,
    column,
    example,
    full,
    inside,
    named,
    outside,
    placed,
    with_cell,
)
from xlbridge import adapter
from xlbridge.catalogue.entry import Kind, SheetFunction
from xlbridge.values import Argument, CellError, Value

EXAMPLE, COLUMN, EDGE = "worked example", "column of values", "end of an allowed range"
OUTSIDE, BLANK, TEXT = "outside the allowed range", "blank", "text for a number"
DIGITS, TRUE, NUMBER = "text that looks like a number", "TRUE for a number", "number for a word"
UNKNOWN, ERROR, LEVELS = "unknown word", "error value", "more than 1,000 levels"
VALID: Final = (EXAMPLE, COLUMN, EDGE)
KINDS: Final = (*VALID, OUTSIDE, BLANK, TEXT, DIGITS, TRUE, NUMBER, UNKNOWN, ERROR, LEVELS)
FRONTS: Final = ("Python", "headless", "Excel's path", "Calc")
MANY: Final = 1001


@dataclass(frozen=True)
class Call:
    """One call as cells: arguments in order, ``OMITTED`` for what is left out."""

    entry: SheetFunction
    kind: str
    arguments: tuple[Argument, ...]

    @property
    def expected(self) -> Value:
        """What the adapter, the one body behind every front end, gives."""
        return adapter.call(self.entry, self.arguments)


def calls() -> Iterator[Call]:
    """Every call of the matrix."""
    for entry in ENTRIES:
        for kind, arguments in _calls(entry):
            yield Call(entry, kind, tuple(arguments))


def _calls(entry: SheetFunction) -> Iterator[tuple[str, Sequence[Any]]]:
    yield EXAMPLE, as_cells(entry, example(entry))
    numbers = [a for a in entry.arguments if a.kind is Kind.NUMBER]
    if numbers:
        call = full(entry)
        cells = as_cells(entry, call)
        cells[entry.arguments.index(numbers[0])] = column([call[numbers[0].name]] * 3)
        yield COLUMN, cells
    for argument in numbers:
        for number in inside(argument):
            yield EDGE, as_cells(entry, placed(entry, argument.name, number))
    for argument in entry.arguments:
        put = partial(with_cell, entry, argument)
        words = argument.kind is Kind.CHOICE
        yield BLANK, put(None)
        yield ERROR, put(CellError("#N/A"))
        yield ERROR, put(CellError("#DIV/0!"))
        if words:
            yield NUMBER, put(1.5)
            yield UNKNOWN, put(f"no {named(argument)[0]}")
            continue
        yield from ((TEXT, put("roof")), (DIGITS, put("12")), (TRUE, put(True)))
        for number in outside(argument):
            yield OUTSIDE, put(number)
    if any(a.kind is Kind.LEVELS for a in entry.arguments):
        yield (
            LEVELS,
            [
                column([float(n + 1) for n in range(MANY)]) if a.kind is Kind.LEVELS else cell
                for a, cell in zip(entry.arguments, as_cells(entry, example(entry)), strict=True)
            ],
        )


@dataclass(frozen=True)
class Departure:
    """Where a front end differs by its nature: the reason, and what it gives instead."""

    why: str
    gives: Callable[[Call], Value]


def _with_true_as_one(call: Call) -> Value:
    """The call as Calc hands it over."""

    def one(value: Any) -> Any:
        if isinstance(value, tuple):
            return tuple(map(one, value))
        return 1.0 if value is True else value

    return adapter.call(call.entry, [one(value) for value in call.arguments])


def _everywhere(code: str, call: Call) -> Value:
    """An error in every cell of the result."""
    expected = call.expected
    if isinstance(expected, tuple):
        return tuple(tuple(CellError(code) for _ in row) for row in expected)
    return CellError(code)


def _one_text_at_a_time(call: Call) -> Value:
    return _everywhere("#VALUE!", call) if call.entry.is_text else call.expected


DEPARTURES: Final[Mapping[tuple[str, str], Departure]] = {
    ("Calc", ERROR): Departure(
        "Calc does not call a function of an extension with an error value in a range: the cell shows "
        "Err:504, stored in an .xlsx as #VALUE!",
        partial(_everywhere, "#VALUE!"),
    ),
    ("Calc", COLUMN): Departure(
        "a function whose result is a text gives one text at a time, and over a range an error: to Calc a "
        "text in rows is equal to no other text, so that a comparison would go wrong without a sign",
        _one_text_at_a_time,
    ),
    ("Calc", TRUE): Departure(
        "Calc hands TRUE over as the number 1: its truth values are numbers with a format",
        _with_true_as_one,
    ),
}
#: what a call from Python cannot hold
NO_CELLS: Final = dict.fromkeys((BLANK, ERROR), "there are no cells in a call from Python")


def agrees(found: Value, expected: Value) -> bool:
    """The same number to 1e-12 relative, the same text, or the same error."""
    if isinstance(expected, tuple):
        return (
            isinstance(found, tuple)
            and len(found) == len(expected)
            and all(
                len(row) == len(cells) and all(map(agrees, row, cells))
                for row, cells in zip(found, expected, strict=True)
            )
        )
    if isinstance(expected, float) and isinstance(found, float):
        return isclose(found, expected, rel_tol=1e-12)
    return type(found) is type(expected) and found == expected


def table(results: Mapping[str, Sequence[tuple[Call, Value]]]) -> Iterator[str]:
    """The matrix in lines: calls of each kind that agree on each front end, and the departures."""
    results = {front: results[front] for front in FRONTS if front in results}
    yield f"{'calls that agree':<32}" + "".join(f"{front:>14}" for front in results)
    for kind in KINDS:
        cells = []
        for front, answers in results.items():
            mine = [(call, found) for call, found in answers if call.kind == kind]
            same = sum(agrees(found, call.expected) for call, found in mine)
            mark = "*" if (front, kind) in DEPARTURES else ""
            cells.append(f"{f'{same} of {len(mine)}{mark}' if mine else '-':>14}")
        yield f"{kind:<32}" + "".join(cells)
    yield from (f"* {front}, {kind}: {departure.why}" for (front, kind), departure in DEPARTURES.items())


def counts() -> Counter[str]:
    """How many calls there are of each kind."""
    return Counter(call.kind for call in calls())


def summary() -> str:
    """The matrix as the table of README.md: how many calls of each kind, and where a front end departs."""
    head = f"| kind of call | calls | {' | '.join(FRONTS)} |"
    number = counts()
    lines = [head, f"|{'---|' * (len(FRONTS) + 2)}"]
    for kind in KINDS:
        cells = " | ".join(_short(front, kind) for front in FRONTS)
        lines.append(f"| {kind} | {number[kind]:,} | {cells} |")
    return "\n".join(lines) + "\n"


def _short(front: str, kind: str) -> str:
    if front == "Python" and kind in NO_CELLS:
        return "-"
    return "differs" if (front, kind) in DEPARTURES else "same"
