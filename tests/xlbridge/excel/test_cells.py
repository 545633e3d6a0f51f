"""Values between Excel and the adapter, without xlwings."""

from __future__ import annotations

from datetime import UTC, datetime
from decimal import Decimal

import pytest

from xlbridge.excel.cells import ERROR_BASE, ERROR_NUMBERS, call


def test_one_value_is_one_cell() -> None:
    assert call("ELF_EXPONENT", 1.5) == [[1.5]]


def test_a_column_stays_a_column_and_a_row_a_row() -> None:
    assert call("ELF_EXPONENT", ((0.5,), (1.5,), (2.5,))) == [[1.0], [1.5], [2.0]]
    assert call("ELF_EXPONENT", ((0.5, 1.5, 2.5),)) == [[1.0, 1.5, 2.0]]
    assert call("ELF_EXPONENT", (0.5, 1.5, 2.5)) == [[1.0, 1.5, 2.0]]


def test_lists_are_taken_like_tuples() -> None:
    assert call("ELF_EXPONENT", [[0.5], [1.5]]) == [[1.0], [1.5]]


@pytest.mark.parametrize(("number", "code"), ERROR_NUMBERS.items())
def test_error_values_pass_through(number: int, code: str) -> None:
    ((found,),) = call("ELF_EXPONENT", ERROR_BASE + number)
    assert isinstance(found, str)
    assert found.startswith(f"{code} ")


def test_the_text_of_a_failure_says_why() -> None:
    ((found,),) = call("ELF_EXPONENT", -1.0)
    assert isinstance(found, str)
    assert found.startswith("#NUM! ELF_EXPONENT: T = -1")


def test_dates_and_currencies_are_the_numbers_in_their_cells() -> None:
    """1900-01-01 is serial number 2 counted from 1899-12-30 (Excel's day 60 never was)."""
    assert call("ELF_EXPONENT", datetime(1900, 1, 1, 12, tzinfo=UTC)) == call("ELF_EXPONENT", 2.5)
    assert call("ELF_EXPONENT", Decimal("1.5")) == [[1.5]]


def test_too_many_arguments_are_an_error() -> None:
    ((found,),) = call("ELF_EXPONENT", 1.0, "interpolate", 3.0)
    assert isinstance(found, str)
    assert found.startswith("#VALUE! ")
