"""From one kind of cell value to another."""

from __future__ import annotations

import math

import pytest
from hypothesis import given
from hypothesis import strategies as st

from xlbridge.headless.coercion import (
    Fault,
    general,
    logical,
    nearly_equal,
    number,
    parse_number,
    plain,
    text,
)
from xlbridge.headless.day_numbers import calendar_date, day_number
from xlbridge.headless.operands import Area, NotEvaluated
from xlbridge.values import OMITTED, CellError, Scalar

NA = CellError("#N/A")


@pytest.mark.parametrize(
    ("value", "expected"),
    [(None, 0.0), (2.5, 2.5), (True, 1.0), (False, 0.0), ("3", 3.0), (" -1.5E2 ", -150.0), ("12%", 0.12)],
)
def test_number(value: Scalar, expected: float) -> None:
    assert number(value) == expected
    assert type(number(value)) is float


@pytest.mark.parametrize(
    ("value", "expected"), [(None, ""), (2.5, "2.5"), (True, "TRUE"), (False, "FALSE"), ("a", "a")]
)
def test_text(value: Scalar, expected: str) -> None:
    assert text(value) == expected


@pytest.mark.parametrize(
    ("value", "expected"), [(None, False), (0.0, False), (-2.0, True), ("true", True), ("FALSE", False)]
)
def test_logical(value: Scalar, expected: bool) -> None:
    assert logical(value) is expected


@pytest.mark.parametrize("convert", [number, text, logical])
def test_errors_pass_with_their_reason(convert: object) -> None:
    error = CellError("#REF!", "gone")
    with pytest.raises(Fault) as caught:
        convert(error)  # type: ignore[operator]
    assert caught.value.error is error


@pytest.mark.parametrize(
    ("convert", "value"), [(number, "abc"), (number, ""), (logical, "yes"), (logical, "")]
)
def test_other_text_is_a_value_error(convert: object, value: str) -> None:
    with pytest.raises(Fault, match="#VALUE!"):
        convert(value)  # type: ignore[operator]


@pytest.mark.parametrize(
    "words", ["1/2/2020", "3:30", "1-2", "$5", "1,23", "(5)", "2 Jan 2020", "3 pm", "1 1/2"]
)
def test_text_that_depends_on_settings_is_refused(words: str) -> None:
    with pytest.raises(NotEvaluated, match="depends on settings"):
        parse_number(words)


@pytest.mark.parametrize(
    "words",
    [
        "2nd",
        "Level 3",
        "B1",
        "",
        " ",
        "-",
        "10F",
        "nan",
        "inf",
        "1_000",
        "3rd floor",
        "E5",
        ".E5",
        "1E400",
        "1\u00a0",
    ],
)
def test_text_that_is_no_number_anywhere(words: str) -> None:
    assert parse_number(words) is None


@given(st.text("0123456789.,+-Ee% /:$apm", max_size=8))
def test_any_text_is_a_number_or_none_or_refused(words: str) -> None:
    try:
        found = parse_number(words)
    except NotEvaluated:
        return
    assert found is None or math.isfinite(found)


def test_iso_dates_are_day_numbers() -> None:
    assert parse_number("2020-01-15") == 43845.0  # LibreOffice Calc gives the same, see edge_formulas.txt
    assert parse_number("2021-02-30") == day_number(2021, 3, 2)


@pytest.mark.parametrize(
    ("value", "expected"),
    [
        (0.0, "0"),
        (-0.0, "0"),
        (-12.0, "-12"),
        (1 / 3, "0.333333333333333"),
        (0.1 + 0.2, "0.3"),
        (1e15, "1000000000000000"),
        (1e19, "10000000000000000000"),
        (1e20, "1E+20"),
        (1.5e-10, "1.5E-10"),
        (1e-9, "0.000000001"),
        (-1.25e100, "-1.25E+100"),
    ],
)
def test_general_format(value: float, expected: str) -> None:
    assert general(value) == expected


@given(st.floats(-1e308, 1e308, allow_subnormal=False))
def test_general_format_keeps_fifteen_digits(value: float) -> None:
    assert math.isclose(float(general(value)), value, rel_tol=1e-14)


def test_fifteen_digits() -> None:
    assert nearly_equal(0.1 + 0.2, 0.3)
    assert not nearly_equal(1.0, 1.0 + 1e-14)
    assert not nearly_equal(0.0, 1e-300)
    assert not nearly_equal(1e-20, -1e-20)


def test_plain_reads_references() -> None:
    cell = Area("S", 2, 3, 2, 3, lambda area: ((float(area.top),),))
    column = Area("S", 1, 1, 2, 1, lambda area: ((1.0,), (NA,)))
    assert plain(cell) == 2.0
    assert plain(column) == ((1.0,), (NA,))
    assert plain(OMITTED) is None


@given(st.integers(0, 2958465))
def test_day_numbers_and_back(day: int) -> None:
    found = calendar_date(float(day))
    assert found is not None
    assert day_number(*found) == day


@pytest.mark.parametrize(
    ("day", "expected"),
    [(1, (1900, 1, 1)), (59, (1900, 2, 28)), (60, (1900, 2, 29)), (61, (1900, 3, 1)), (44000, (2020, 6, 18))],
)
def test_calendar(day: int, expected: tuple[int, int, int]) -> None:
    assert calendar_date(day + 0.9) == expected


def test_outside_the_calendar() -> None:
    assert calendar_date(-1.0) is None
    assert calendar_date(2958466.0) is None
    assert day_number(1899, 12, 31) is None
    assert day_number(9999, 12, 32) is None
    assert day_number(10000, 1, 1) is None
