"""Cells never lie: what the adapter makes of every kind of cell in every argument of every function."""

from __future__ import annotations

from dataclasses import replace
from typing import Any

import numpy as np
import pytest

from tests.support.sheet_cases import (
    ENTRIES,
    PLACES,
    as_cells,
    column,
    example,
    full,
    ident,
    named,
    with_cell,
)
from xlbridge import adapter
from xlbridge.catalogue import CATALOGUE
from xlbridge.catalogue.entry import Argument, Kind, SheetFunction
from xlbridge.values import ERROR_CODES, OMITTED, CellError

NAN, INF = float("nan"), float("inf")
NUMBERS = [(entry, argument) for entry, argument in PLACES if argument.kind is not Kind.CHOICE]
WORDS = [(entry, argument) for entry, argument in PLACES if argument.kind is Kind.CHOICE]
LEVELS = [(entry, argument) for entry, argument in PLACES if argument.kind is Kind.LEVELS]
SEVERAL = [entry for entry in ENTRIES if sum(a.kind is Kind.LEVELS for a in entry.arguments) > 1]
WITH_LEVELS = [entry for entry in ENTRIES if any(a.kind is Kind.LEVELS for a in entry.arguments)]


def refused(found: Any, code: str, *words: str) -> None:
    assert isinstance(found, CellError), found
    assert found.code == code, found.reason
    for word in words:
        assert word in found.reason


def with_rows(entry: SheetFunction, change: Any, each: str = "") -> list[Any]:
    """The example with each level range put through ``change``; with those of one kind of list alone."""
    call = full(entry)
    ranges = [a.name for a in entry.arguments if a.kind is Kind.LEVELS and each in ("", a.each)]
    return as_cells(entry, {**call, **{name: change(call[name]) for name in ranges}})


@pytest.mark.parametrize(("entry", "argument"), PLACES, ids=ident)
def test_1_an_error_value_passes_unchanged(entry: SheetFunction, argument: Argument) -> None:
    for code in ERROR_CODES:
        given = CellError(code, f"from another cell {code}")
        assert adapter.call(entry, with_cell(entry, argument, given)) is given


@pytest.mark.parametrize("entry", ENTRIES, ids=ident)
def test_1_the_first_error_value_in_order_passes(entry: SheetFunction) -> None:
    """Whatever else is wrong: a wrong cell before it, ranges of unequal length, an argument left out."""
    first, second = CellError("#REF!", "first"), CellError("#N/A", "second")
    for place in range(len(entry.arguments) - 1):
        for bad in (None, "text", True, -1.0):
            wrong: list[Any] = [bad] * len(entry.arguments)
            wrong[place], wrong[-1] = first, second
            assert adapter.call(entry, wrong) is first
            wrong[place] = ((first,), (1.0,), (bad,)) if entry.arguments[place].kind is Kind.LEVELS else first
            assert adapter.call(entry, wrong) is first
    assert adapter.call(entry, [first]) is first


@pytest.mark.parametrize(("entry", "argument"), PLACES, ids=ident)
def test_2_a_blank_cell_is_an_error(entry: SheetFunction, argument: Argument) -> None:
    lone = argument.kind is Kind.LEVELS and entry not in SEVERAL  # a blank cell there is a blank row
    for blank in ("",) if lone else (None, ""):
        found = adapter.call(entry, with_cell(entry, argument, blank))
        refused(found, "#VALUE!", entry.name, argument.symbol, "blank")


@pytest.mark.parametrize(("entry", "argument"), PLACES, ids=ident)
def test_2_an_argument_left_out(entry: SheetFunction, argument: Argument) -> None:
    cells = as_cells(entry, full(entry))
    cells[entry.arguments.index(argument)] = OMITTED
    found = adapter.call(entry, cells)
    if argument.optional:
        assert not isinstance(found, CellError)
    else:
        refused(found, "#VALUE!", argument.symbol, "left out")


@pytest.mark.parametrize("entry", ENTRIES, ids=ident)
def test_2_too_few_and_too_many_arguments(entry: SheetFunction) -> None:
    cells = as_cells(entry, full(entry))
    refused(adapter.call(entry, []), "#VALUE!", entry.name, "left out")
    refused(adapter.call(entry, [*cells, 1.0]), "#VALUE!", entry.usage, "too many")


@pytest.mark.parametrize("entry", WITH_LEVELS, ids=ident)
def test_2_a_row_that_is_blank_in_every_level_range_is_ignored(entry: SheetFunction) -> None:
    expected = adapter.call(entry, as_cells(entry, full(entry)))
    for change in (
        lambda cells: [None, *cells],
        lambda cells: [*cells, None, None],
        lambda cells: [cells[0], None, *cells[1:]],
    ):
        assert adapter.call(entry, with_rows(entry, change)) == expected


@pytest.mark.parametrize("entry", WITH_LEVELS, ids=ident)
def test_2_ranges_with_no_level_at_all(entry: SheetFunction) -> None:
    words = f"holds no {next(a.each for a in entry.arguments if a.kind is Kind.LEVELS)}"
    refused(adapter.call(entry, with_rows(entry, lambda cells: [None] * 5)), "#VALUE!", words)
    single = [None if isinstance(cell, tuple) else cell for cell in as_cells(entry, full(entry))]
    refused(adapter.call(entry, single), "#VALUE!", words)


@pytest.mark.parametrize(("entry", "argument"), [p for p in LEVELS if p[0] in SEVERAL], ids=ident)
def test_2_a_half_blank_row_names_the_level(entry: SheetFunction, argument: Argument) -> None:
    call = full(entry)
    for row in range(len(call[argument.name])):
        half = list(call[argument.name])
        half[row] = None
        found = adapter.call(entry, as_cells(entry, {**call, argument.name: half}))
        refused(found, "#VALUE!", f"{argument.symbol} in row {row + 1} of its range", "blank")


@pytest.mark.parametrize(("entry", "argument"), NUMBERS, ids=ident)
@pytest.mark.parametrize("cell", ["12", " 12", "1e3", "roof", True, False], ids=repr)
def test_3_text_and_booleans_are_no_numbers(entry: SheetFunction, argument: Argument, cell: Any) -> None:
    found = adapter.call(entry, with_cell(entry, argument, cell))
    refused(found, "#VALUE!", argument.symbol, repr(cell), "a number is needed")
    if argument.kind is Kind.LEVELS:
        assert f"in row {len(full(entry)[argument.name])} of its range" in found.reason


@pytest.mark.parametrize(("entry", "argument"), WORDS, ids=ident)
@pytest.mark.parametrize("cell", [1.0, 0.0, True, False], ids=repr)
def test_3_numbers_and_booleans_are_no_words(entry: SheetFunction, argument: Argument, cell: Any) -> None:
    shown = f"{cell:g}" if type(cell) is float else repr(cell)
    found = adapter.call(entry, with_cell(entry, argument, cell))
    refused(found, "#VALUE!", f"{argument.symbol} = {shown}: must be text", *named(argument))


@pytest.mark.parametrize(("entry", "argument"), WORDS, ids=ident)
def test_5_a_word_that_is_not_in_the_list(entry: SheetFunction, argument: Argument) -> None:
    found = adapter.call(entry, with_cell(entry, argument, "nowhere"))
    refused(found, "#N/A", "'nowhere'", *named(argument))


@pytest.mark.parametrize(("entry", "argument"), NUMBERS, ids=ident)
@pytest.mark.parametrize("cell", [NAN, INF, -INF], ids=repr)
def test_6_a_number_that_is_not_finite(entry: SheetFunction, argument: Argument, cell: float) -> None:
    found = adapter.call(entry, with_cell(entry, argument, cell))
    refused(found, "#NUM!", argument.name, f"{cell:g}", "finite")


@pytest.mark.parametrize("number", [NAN, INF, -INF], ids=repr)
def test_6_a_result_that_is_not_finite(number: float) -> None:
    """Planted: no formula of the catalogue gives one."""
    planted = replace(CATALOGUE["ELF_FX"], function=lambda V, C_vx: np.where(np.asarray(V) > 5, number, V))
    refused(adapter.call(planted, [6.0, 0.5]), "#NUM!", "F_x", f"{number:g}", "finite")
    found = adapter.call(planted, [column([4.0, 6.0]), 0.5])
    assert found[0] == (4.0,)
    refused(found[1][0], "#NUM!", "F_x", "finite")


TOO_LARGE = [
    ("ELF_V", [1e200, 1e200]),
    ("ELF_TS", [1e-300, 1e300]),
    ("ELF_THETA", [1e300, 1e300, 1.0, 1.0, 1.0, 1.0]),
    ("ELF_THETA", [1.0, 1.0, 1.0, 1e300, 1e300, 1.0]),
    ("ELF_AX", [1e200, 1e-200]),
    ("ELF_MX", [0.0, ((1e200,),), ((1e200,),)]),
    ("ELF_CVX", [1e10, 1e200, ((1e10,),), ((1e200,),), 2.0]),
    ("ELF_VX", [1.0, column([1e308, 1e308]), column([1.0, 2.0])]),
    ("ELF_MODE_PERIOD", [1.0, ((1e308,),), ((1e-308,),), ((1.0,),), "us"]),
]


@pytest.mark.parametrize(("name", "cells"), TOO_LARGE, ids=ident)
def test_6_a_result_out_of_reach_of_arithmetic(name: str, cells: list[Any]) -> None:
    """An intermediate overflow is refused too: divided by it, a demand of any size would be 0."""
    entry = CATALOGUE[name]
    refused(adapter.call(entry, cells), "#NUM!", name, entry.result.symbol, "too large or too small")
    pairs = zip(entry.arguments, cells, strict=True)
    wide = [column([cell, cell]) if a.kind is Kind.NUMBER else cell for a, cell in pairs]
    for (cell,) in adapter.call(entry, wide):
        refused(cell, "#NUM!", "too large or too small")


@pytest.mark.parametrize("entry", WITH_LEVELS, ids=ident)
def test_9_more_than_a_thousand_levels(entry: SheetFunction) -> None:
    each = [a.each for a in entry.arguments if a.kind is Kind.LEVELS][-1]

    def rows(count: int) -> list[Any]:
        return with_rows(
            entry,
            lambda cells: cells + [cells[-1] * (1 + 1e-5 * n) for n in range(1, count - len(cells) + 1)],
            each,
        )

    refused(adapter.call(entry, rows(1001)), "#NUM!", f"1001 {each}s", f"1 to 1000 {each}s")
    assert not isinstance(adapter.call(entry, rows(1000)), CellError)


@pytest.mark.parametrize(("entry", "argument"), LEVELS, ids=ident)
def test_a_block_is_no_level_range(entry: SheetFunction, argument: Argument) -> None:
    cells = as_cells(entry, full(entry))
    cells[entry.arguments.index(argument)] = ((1.0, 2.0), (3.0, 4.0))
    refused(adapter.call(entry, cells), "#VALUE!", argument.symbol, "2 x 2 cells", "one column or one row")


@pytest.mark.parametrize(("entry", "argument"), [p for p in LEVELS if p[0] in SEVERAL], ids=ident)
def test_level_ranges_of_unequal_length(entry: SheetFunction, argument: Argument) -> None:
    call = full(entry)
    shorter = {**call, argument.name: call[argument.name][:-1]}
    count = len(shorter[argument.name])
    refused(
        adapter.call(entry, as_cells(entry, shorter)), "#VALUE!", f"{argument.symbol} has {count}", "same"
    )


@pytest.mark.parametrize("entry", WITH_LEVELS, ids=ident)
def test_levels_in_a_row_are_levels_in_a_column(entry: SheetFunction) -> None:
    cells = as_cells(entry, full(entry))
    lying = [(tuple(c for (c,) in cell),) if isinstance(cell, tuple) else cell for cell in cells]
    assert adapter.call(entry, lying) == adapter.call(entry, cells)


@pytest.mark.parametrize("entry", WITH_LEVELS, ids=ident)
def test_the_order_of_the_levels_is_free(entry: SheetFunction) -> None:
    found = adapter.call(entry, with_rows(entry, lambda cells: cells[::-1]))
    expected = adapter.call(entry, as_cells(entry, full(entry)))
    assert found == (expected if entry.is_text else pytest.approx(expected, rel=1e-14))


@pytest.mark.parametrize("entry", ENTRIES, ids=ident)
def test_a_result_is_a_float_or_a_text(entry: SheetFunction) -> None:
    """Never a numpy number: front ends write what they get."""
    assert type(adapter.call(entry, as_cells(entry, example(entry)))) is (str if entry.is_text else float)


def test_whole_numbers_are_numbers() -> None:
    """A macro or a test may hand over an int; a cell never does."""
    assert adapter.call(CATALOGUE["ELF_V"], [1, 2600]) == 2600.0
    assert adapter.call(CATALOGUE["ELF_VX"], [1, ((1,), (2,)), ((1,), (2,))]) == 3.0


def test_ranges_met_again_are_not_read_again_and_changed_ones_are(monkeypatch: pytest.MonkeyPatch) -> None:
    """Known by identity, each kept alive: a new range can not take the place of an old one."""
    read = []
    levels = adapter._levels
    monkeypatch.setattr(adapter, "_levels", lambda ranges: read.append(ranges) or levels(ranges))
    entry = CATALOGUE["ELF_VX"]
    heights = ((24.0,), (12.0,))
    forces = ((30.0,), (10.0,))
    assert [adapter.call(entry, [12.0, forces, heights]) for _ in range(3)] == [40.0] * 3
    assert len(read) == 1
    assert adapter.call(entry, [12.0, ((30.0,), (11.0,)), heights]) == 41.0
    assert adapter.call(entry, [12.0, heights, heights]) == 36.0
    assert len(read) == 3
