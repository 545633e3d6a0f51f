"""Operators on scalars, blanks, errors and grids."""

from __future__ import annotations

import math

import pytest
from hypothesis import given
from hypothesis import strategies as st

from xlbridge.headless.operands import Area
from xlbridge.headless.operators import binary, compare, unary
from xlbridge.values import CellError, Scalar, Value

NA, DIV, VALUE, NUM = (CellError(code) for code in ("#N/A", "#DIV/0!", "#VALUE!", "#NUM!"))
COLUMN = ((1.0,), (2.0,), (3.0,))
ROW = ((10.0, 20.0),)
numbers = st.floats(-1e9, 1e9, allow_subnormal=False)


@pytest.mark.parametrize(
    ("left", "op", "right", "expected"),
    [
        ("3", "+", 1.0, 4.0),
        ("abc", "+", 1.0, VALUE),
        (None, "+", None, 0.0),
        (True, "*", 3.0, 3.0),
        (1.0, "/", 0.0, DIV),
        (0.0, "/", 0.0, DIV),
        (1.0, "/", None, DIV),
        (0.0, "^", 0.0, NUM),
        (0.0, "^", -1.0, DIV),
        (-8.0, "^", 1.0 / 3.0, NUM),
        (-8.0, "^", 2.0, 64.0),
        (1e308, "*", 10.0, NUM),
        (1e308, "+", 1e308, NUM),
        (10.0, "^", 400.0, NUM),
        (1e-308, "/", 1e10, 0.0),
        (0.3, "-", 0.1 + 0.2, 0.0),
        (0.3, "+", -(0.1 + 0.2), 0.0),
        (NA, "+", DIV, NA),
        (DIV, "+", NA, DIV),
        ("abc", "+", NA, NA),
        (NA, "&", "x", NA),
        ("x", "&", DIV, DIV),
        (None, "&", 1.5, "1.5"),
        (True, "&", "", "TRUE"),
        (NA, "=", NA, NA),
    ],
)
def test_scalars(left: Scalar, op: str, right: Scalar, expected: Scalar) -> None:
    assert binary(op, left, right) == expected


@pytest.mark.parametrize(
    ("left", "right", "expected"),
    [
        (1.0, 2.0, -1),
        (0.1 + 0.2, 0.3, 0),
        ("a", "A", 0),
        ("b", "A", 1),
        (1e300, "", -1),
        ("zzz", False, -1),
        (1e300, False, -1),
        (True, 1.0, 1),
        (None, 0.0, 0),
        (None, "", 0),
        (None, False, 0),
        (None, None, 0),
        (None, -1.0, 1),
        (None, "a", -1),
        (None, True, -1),
    ],
)
def test_order_of_kinds(left: Scalar, right: Scalar, expected: int) -> None:
    assert compare(left, right) == expected
    assert compare(right, left) == -expected


@given(numbers, numbers)
def test_comparisons_agree_with_each_other(left: float, right: float) -> None:
    holds = {op: binary(op, left, right) for op in ("=", "<>", "<", "<=", ">", ">=")}
    assert holds["<>"] is (not holds["="])
    assert holds["<="] is (holds["<"] or holds["="])
    assert holds[">="] is (holds[">"] or holds["="])
    assert [holds["<"], holds["="], holds[">"]].count(True) == 1


def test_unary() -> None:
    assert unary("-", "4") == -4.0
    assert unary("-", None) == 0.0
    assert math.copysign(1.0, unary("-", 0.0)) == 1.0  # type: ignore[arg-type]
    assert unary("+", "4") == "4"
    assert unary("%", 50.0) == 0.5
    assert unary("%", NA) == NA
    assert unary("-", "x") == VALUE
    assert unary("-", COLUMN) == ((-1.0,), (-2.0,), (-3.0,))


@pytest.mark.parametrize(
    ("left", "right", "expected"),
    [
        (COLUMN, 1.0, ((2.0,), (3.0,), (4.0,))),
        (1.0, COLUMN, ((2.0,), (3.0,), (4.0,))),
        (COLUMN, ROW, ((11.0, 21.0), (12.0, 22.0), (13.0, 23.0))),
        (COLUMN, COLUMN[:2], ((2.0,), (4.0,), (NA,))),
        (((1.0, 2.0), (3.0, 4.0)), ((1.0, 2.0, 3.0),), ((2.0, 4.0, NA), (4.0, 6.0, NA))),
        (((1.0, NA),), ROW, ((11.0, NA),)),
    ],
)
def test_broadcasting(left: Value, right: Value, expected: Value) -> None:
    assert binary("+", left, right) == expected


def test_references() -> None:
    cell = Area("S", 1, 1, 1, 1, lambda area: ((5.0,),))
    column = Area("S", 1, 1, 3, 1, lambda area: COLUMN)
    assert binary("*", cell, 2.0) == 10.0
    assert binary("*", column, cell) == ((5.0,), (10.0,), (15.0,))
    assert unary("-", cell) == -5.0
