"""Ranges for arguments that are no level ranges: a result a cell, and every cell for itself."""

from __future__ import annotations

from itertools import product
from random import Random
from typing import Any

import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from tests.support.sheet_cases import ENTRIES, PLACES, as_cells, column, full, ident, random_call
from xlbridge import adapter
from xlbridge.catalogue import CATALOGUE
from xlbridge.catalogue.entry import Argument, Kind, SheetFunction
from xlbridge.values import ERROR_CODES, OMITTED, CellError, Scalar

SINGLE = [(entry, argument) for entry, argument in PLACES if argument.kind is not Kind.LEVELS]
WITH_LEVELS = [entry for entry in ENTRIES if any(a.kind is Kind.LEVELS for a in entry.arguments)]
SHAPES = [(1, 1), (1, 4), (4, 1), (3, 2)]
#: content that no argument takes, and what comes of it
BAD: dict[str, tuple[Scalar, str]] = {
    "blank": (None, "#VALUE!"),
    "boolean": (True, "#VALUE!"),
    "not a number": (float("nan"), "#NUM!"),
    "error value": (CellError("#DIV/0!", "from elsewhere"), "#DIV/0!"),
}
CELLS = st.one_of(
    st.floats(),
    st.floats(0.01, 20.0),
    st.sampled_from((1.0, 12.0, 60.0, 650.0, 7.0)),
    st.none(),
    st.booleans(),
    st.text(max_size=3),
    st.sampled_from(sorted({word for _, a in PLACES for word in a.choices})),
    st.builds(CellError, st.sampled_from(ERROR_CODES)),
)
RANDOM = st.integers(0, 2**32).map(Random)


def block(cell: Any, rows: int, columns: int) -> Any:
    return ((cell,) * columns,) * rows


def exactly(found: Any, expected: Any) -> bool:
    """The same value; numbers to round-off, since an array may be summed in another order."""
    if isinstance(found, tuple) and isinstance(expected, tuple):
        return len(found) == len(expected) and all(
            len(a) == len(b) and all(map(exactly, a, b)) for a, b in zip(found, expected, strict=True)
        )
    if type(found) is not type(expected):
        return False
    if isinstance(found, float):
        return found == pytest.approx(expected, rel=1e-14)
    return found == expected and getattr(found, "reason", None) == getattr(expected, "reason", None)


def loop(entry: SheetFunction, cells: list[Any]) -> Any:
    """The function called once a cell of the result."""
    grids = [c for a, c in zip(entry.arguments, cells, strict=True) if is_grid(a, c)]
    rows, columns = max(map(len, grids)), max(len(g[0]) for g in grids)
    found = [
        adapter.call(entry, [at(a, c, i, j) for a, c in zip(entry.arguments, cells, strict=True)])
        for i, j in product(range(rows), range(columns))
    ]
    return tuple(tuple(found[i * columns : (i + 1) * columns]) for i in range(rows))


def is_grid(argument: Argument, cell: Any) -> bool:
    return argument.kind is not Kind.LEVELS and isinstance(cell, tuple)


def at(argument: Argument, cell: Any, i: int, j: int) -> Any:
    if not is_grid(argument, cell):
        return cell
    row = cell[i if len(cell) > 1 else 0]
    return row[j if len(row) > 1 else 0]


@pytest.mark.parametrize(("entry", "argument"), SINGLE, ids=ident)
@pytest.mark.parametrize("shape", SHAPES, ids=str)
def test_shape_in_is_shape_out(entry: SheetFunction, argument: Argument, shape: tuple[int, int]) -> None:
    call = full(entry)
    one = adapter.call(entry, as_cells(entry, call))
    found = adapter.call(entry, as_cells(entry, {**call, argument.name: block(call[argument.name], *shape)}))
    assert exactly(found, block(one, *shape))
    assert all(type(cell) in (float, str) for row in found for cell in row)


@pytest.mark.parametrize("bad", BAD)
@pytest.mark.parametrize(("entry", "argument"), SINGLE, ids=ident)
def test_good_cells_keep_their_values_and_a_bad_one_shows_its_error(
    entry: SheetFunction, argument: Argument, bad: str
) -> None:
    cell, code = BAD[bad]
    if argument.kind is Kind.CHOICE and isinstance(cell, float):
        code = "#VALUE!"
    call = full(entry)
    one = adapter.call(entry, as_cells(entry, call))
    for place in range(4):
        cells = [call[argument.name]] * 4
        cells[place] = cell
        found = adapter.call(entry, as_cells(entry, {**call, argument.name: column(cells)}))
        assert [exactly(value, one) for (value,) in found] == [n != place for n in range(4)]
        error = found[place][0]
        assert error == CellError(code)
        assert error is cell if isinstance(cell, CellError) else argument.symbol in error.reason


@pytest.mark.parametrize("entry", [e for e in ENTRIES if len(e.arguments) > 1], ids=ident)
def test_a_call_that_fails_fails_in_every_cell(entry: SheetFunction) -> None:
    """One cell with an error above cells left blank would hide that they have no value."""
    for argument in entry.arguments:
        others = [a for a in entry.arguments if a is not argument and a.kind is not Kind.LEVELS]
        if not others:
            continue
        call = full(entry)
        call[others[0].name] = column([call[others[0].name]] * 3)
        for bad in (None, CellError("#REF!", "gone"), OMITTED):
            if bad is OMITTED and argument.optional:
                continue
            found = adapter.call(entry, as_cells(entry, {**call, argument.name: bad}))
            assert len(found) == 3
            for (error,) in found:
                assert error == (bad if isinstance(bad, CellError) else CellError("#VALUE!"))
                assert error.reason


@pytest.mark.parametrize("entry", WITH_LEVELS, ids=ident)
def test_levels_that_fail_leave_no_cell_blank(entry: SheetFunction) -> None:
    call = full(entry)
    single = [a.name for a in entry.arguments if a.kind is not Kind.LEVELS]
    last = [a for a in entry.arguments if a.kind is Kind.LEVELS][-1]
    if not single:
        return
    call[single[0]] = column([call[single[0]], CellError("#N/A", "its own"), call[single[0]]])
    found = adapter.call(entry, as_cells(entry, {**call, last.name: [*call[last.name][:-1], "text"]}))
    assert [cell.code for (cell,) in found] == ["#VALUE!", "#N/A", "#VALUE!"]
    assert f"{last.symbol} in row" in found[0][0].reason


def test_ranges_of_different_shapes() -> None:
    entry = CATALOGUE["ELF_CS_MIN"]
    found = adapter.call(entry, [column([1.0, 1.0]), column([1.0, 1.0, CellError("#REF!")])])
    assert [cell.code for (cell,) in found] == ["#VALUE!", "#VALUE!", "#REF!"]
    assert found[0][0].reason == (
        "ELF_CS_MIN: ELF_CS_MIN = '2 x 1 and 3 x 1': the ranges do not have the same shape"
    )
    assert len(adapter.call(entry, [block(1.0, 2, 3), block(1.0, 3, 2)])) == 3


def test_a_row_and_a_column_span_a_block() -> None:
    entry = CATALOGUE["ELF_V"]
    found = adapter.call(entry, [((0.1, 0.2, 0.3),), column([10.0, 100.0])])
    assert exactly(found, ((1.0, 2.0, 3.0), (10.0, 20.0, 30.0)))


@pytest.mark.parametrize("entry", ENTRIES, ids=ident)
@settings(max_examples=25, deadline=None)
@given(random=RANDOM)
def test_an_array_is_a_loop_of_single_calls(entry: SheetFunction, random: Random) -> None:
    """On valid calls: several of them under each other, their level ranges those of the first."""
    first = random_call(entry, random)
    calls = [first, *(random_call(entry, random) for _ in range(random.randint(1, 3)))]
    cells = as_cells(entry, first)
    levels = {a.name: first[a.name] for a in entry.arguments if a.kind is Kind.LEVELS}
    for place, argument in enumerate(entry.arguments):
        if argument.kind is not Kind.LEVELS and random.random() < 0.7:
            cells[place] = column([_of_level(argument, call, levels, n) for n, call in enumerate(calls)])
    if any(map(is_grid, entry.arguments, cells)):
        assert exactly(adapter.call(entry, cells), loop(entry, cells))


def _of_level(argument: Argument, call: dict[str, Any], levels: dict[str, list[float]], n: int) -> Any:
    """A level of the first call where the argument speaks of one."""
    if levels and argument.name in ("h_x", "w_x"):
        held = levels["heights" if argument.name == "h_x" else "weights"]
        return held[n % len(held)]
    return call[argument.name]


@pytest.mark.parametrize("entry", ENTRIES, ids=ident)
@settings(max_examples=60, deadline=None)
@given(data=st.data())
def test_any_content_in_any_shape_gives_cells(entry: SheetFunction, data: st.DataObject) -> None:
    """Never an exception, a blank, a numpy value or a number that is none; an array is a loop."""
    call = full(entry)
    cells: list[Any] = as_cells(entry, call)
    for place in data.draw(st.sets(st.integers(0, len(cells) - 1), min_size=1)):
        rows, columns = data.draw(st.sampled_from([(1, 1), (1, 3), (3, 1), (2, 2), (3, 3)]))
        drawn = data.draw(st.lists(CELLS, min_size=rows * columns, max_size=rows * columns))
        grid = tuple(tuple(drawn[i * columns : (i + 1) * columns]) for i in range(rows))
        cells[place] = data.draw(st.sampled_from([grid, drawn[0], OMITTED]))
    found = adapter.call(entry, cells)
    grid = found if isinstance(found, tuple) else ((found,),)
    assert len({len(row) for row in grid}) == 1
    for cell in (cell for row in grid for cell in row):
        assert type(cell) in (str if entry.is_text else float, CellError)
        assert type(cell) is not float or abs(cell) < float("inf")
        assert type(cell) is not CellError or cell.code in ERROR_CODES
        assert type(cell) is not CellError or cell.reason or any(_holds(c, cell) for c in cells)
    if any(map(is_grid, entry.arguments, cells)) and not _torn(entry, cells):
        assert exactly(found, loop(entry, cells))


def _holds(given_cell: Any, error: CellError) -> bool:
    rows = given_cell if isinstance(given_cell, tuple) else ((given_cell,),)
    return any(cell is error for row in rows for cell in row)


def _torn(entry: SheetFunction, cells: list[Any]) -> bool:
    """Whether two ranges do not fit together, which a loop cannot see."""
    shapes = [(len(c), len(c[0])) for a, c in zip(entry.arguments, cells, strict=True) if is_grid(a, c)]
    return any(len({size for size in sizes if size > 1}) > 1 for sizes in zip(*shapes, strict=True))
