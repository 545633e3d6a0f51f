"""Addresses, and the cells that references to tables mean."""

from __future__ import annotations

import pytest
from hypothesis import given
from hypothesis import strategies as st
from openpyxl.utils import get_column_letter

from xlbridge.headless.grammar import read_formula
from xlbridge.headless.nodes import TableReference
from xlbridge.headless.operands import NotEvaluated
from xlbridge.headless.references import (
    Bounds,
    Cell,
    column_letters,
    column_number,
    parse_address,
    parse_bounds,
    quote_sheet,
)
from xlbridge.headless.structured import Table, resolve

TABLE = Table("Story", "Levels", Bounds(3, 2, 9, 4), ("Level", "w_x", "h_x"), header_rows=1, totals_rows=1)
BARE = Table("Bare", "Levels", Bounds(3, 2, 9, 4), ("a", "b", "c"), header_rows=0, totals_rows=0)


@given(st.integers(1, 16_384))
def test_column_letters_agree_with_openpyxl(number: int) -> None:
    assert column_letters(number) == get_column_letter(number)
    assert column_number(column_letters(number)) == number


@pytest.mark.parametrize("text", ["", "A", "1", "A0", "XFE1", "A1048577", "A1:B2", "Sheet1!A1", "A1x"])
def test_what_is_no_address_is_refused(text: str) -> None:
    with pytest.raises(ValueError, match="not a cell address"):
        parse_address(text)


def test_bounds_and_cells_are_written_as_spreadsheets_write_them() -> None:
    assert parse_address("$xfd$7") == (7, 16_384)
    assert str(parse_bounds("C5:$B$2")) == "B2:C5"
    assert str(parse_bounds("C5")) == "C5"
    assert str(Cell("Sheet1", 3, 28)) == "Sheet1!AB3"
    assert str(Cell("Bob's", 1, 1)) == "'Bob''s'!A1"
    assert [quote_sheet(name) for name in ("2024", "A1", "Story_1", "a b")] == [
        "'2024'", "'A1'", "Story_1", "'a b'",
    ]  # fmt: skip


@pytest.mark.parametrize(
    ("text", "cells"),
    [
        ("Story[w_x]", "C4:C8"),
        ("Story[]", "B4:D8"),
        ("Story[#All]", "B3:D9"),
        ("Story[#Headers]", "B3:D3"),
        ("Story[[#Totals],[H_X]]", "D9"),
        ("Story[[#Headers],[#Data],[w_x]]", "C3:C8"),
        ("Story[[#Data],[#Totals],[h_x]:[w_x]]", "C4:D9"),
        ("Story[@w_x]", "C6"),
        ("Story[@]", "B6:D6"),
    ],
)
def test_table_reference_means_cells(text: str, cells: str) -> None:
    node = read_formula(f"={text}")
    assert isinstance(node, TableReference)
    assert str(resolve(node, TABLE, Cell("Levels", 6, 9))) == cells


@pytest.mark.parametrize(
    ("text", "table", "cell", "reason"),
    [
        ("T[V_x]", TABLE, None, "no column V_x"),
        ("T[#Headers]", BARE, None, "no rows of the kind #Headers"),
        ("T[#Totals]", BARE, None, "no rows of the kind #Totals"),
        ("T[[#Headers],[#Totals]]", TABLE, None, "do not adjoin"),
        ("T[@w_x]", TABLE, None, "does not stand in a row"),
        ("T[@w_x]", TABLE, Cell("Other", 6, 9), "does not stand in a row"),
        ("T[@w_x]", TABLE, Cell("Levels", 3, 9), "does not stand in a row"),
        ("T[@w_x]", TABLE, Cell("Levels", 9, 9), "does not stand in a row"),
    ],
)
def test_table_reference_that_means_no_cells_is_refused(
    text: str, table: Table, cell: Cell | None, reason: str
) -> None:
    node = read_formula(f"={text}")
    assert isinstance(node, TableReference)
    with pytest.raises(NotEvaluated, match=reason):
        resolve(node, table, cell)
