"""The contract of the built-in functions: arguments, errors, references, arrays, refusals.

Their values are compared with LibreOffice Calc in test_differential_calc.py.
"""

from __future__ import annotations

import math
import random
from collections.abc import Callable
from typing import NoReturn

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st
from scipy import stats

from xlbridge.headless.builtins import BUILTINS, VOLATILE, invoke
from xlbridge.headless.builtins.criteria import criterion
from xlbridge.headless.operands import Area, NotEvaluated, Operand
from xlbridge.values import OMITTED, CellError, Grid, Scalar

NA, DIV, VALUE, NUM, REF = (CellError(code) for code in ("#N/A", "#DIV/0!", "#VALUE!", "#NUM!", "#REF!"))
SHEET: Grid = (
    (1.0, "alpha", True),
    (2.0, "Beta", None),
    (3.0, "gamma", "5"),
    (5.0, NA, 0.5),
)


def area(top: int, left: int, bottom: int, right: int) -> Area:
    """A reference into SHEET; what lies outside is blank."""

    def read(asked: Area) -> Grid:
        rows = range(asked.top - 1, asked.bottom)
        columns = range(asked.left - 1, asked.right)
        inside = [[SHEET[r][c] if r < 4 and c < 3 else None for c in columns] for r in rows]
        return tuple(map(tuple, inside))

    return Area("S", top, left, bottom, right, read)


NUMBERS, WORDS, MIXED = area(1, 1, 4, 1), area(1, 2, 3, 2), area(1, 3, 4, 3)


def call(name: str, *operands: Operand | Callable[[], Operand]) -> Operand:
    return invoke(BUILTINS[name], operands)


def never() -> NoReturn:
    raise AssertionError("a branch that is not needed was evaluated")


def test_enough_functions() -> None:
    assert len(BUILTINS.keys() - VOLATILE.keys()) >= 150
    assert all(name == builtin.name == name.upper() for name, builtin in BUILTINS.items())


@pytest.mark.parametrize("name", sorted(VOLATILE))
def test_volatile_functions_are_refused_with_the_reason(name: str) -> None:
    with pytest.raises(NotEvaluated, match=VOLATILE[name]):
        call(name)
    assert BUILTINS[name].kinds(2) == "ll"


@pytest.mark.parametrize(
    ("name", "count", "words"),
    [
        ("MOD", 1, "MOD takes 2 arguments, not 1"),
        ("ROUND", 3, "ROUND takes 2 arguments, not 3"),
        ("IF", 4, "IF takes 2 to 3 arguments, not 4"),
        ("SUM", 0, "SUM takes 1 or more arguments, not 0"),
        ("PI", 1, "PI takes 0 arguments, not 1"),
    ],
)
def test_a_wrong_number_of_arguments(name: str, count: int, words: str) -> None:
    with pytest.raises(NotEvaluated, match=words):
        call(name, *[1.0] * count)


def test_kinds_of_arguments() -> None:
    assert BUILTINS["IF"].kinds(3) == "bll"
    assert BUILTINS["SUM"].kinds(3) == "ggg"
    assert BUILTINS["TEXTJOIN"].kinds(4) == "tbgg"
    assert BUILTINS["COUNTIFS"].kinds(4) == "asas"


def test_references_and_typed_in_values_count_differently() -> None:
    assert call("SUM", "3", True, None) == 4.0
    assert call("SUM", MIXED) == 0.5
    assert call("SUM", area(1, 3, 1, 3)) == 0.0
    assert call("SUM", ((1.0, "2", True),)) == 1.0
    assert call("COUNT", "3", True, OMITTED) == 3.0
    assert call("COUNT", MIXED) == 1.0
    assert call("SUM", "x") == VALUE


def test_errors_pass_the_first_one_first() -> None:
    assert call("SUM", area(1, 1, 4, 3), DIV) == NA
    assert call("ROUND", DIV, NA) == DIV
    assert call("SUM", 1.0, DIV, NA) == DIV
    assert call("COUNT", area(1, 1, 4, 3)) == 5.0
    assert call("INDEX", area(1, 1, 4, 2), 1.0, NA) == NA


def test_an_error_keeps_its_reason() -> None:
    found = call("ABS", CellError("#NUM!", "w_x = -1: must be at least 0"))
    assert isinstance(found, CellError)
    assert found.reason == "w_x = -1: must be at least 0"


def test_only_the_needed_branch_is_evaluated() -> None:
    assert call("IF", True, lambda: 1.0, never) == 1.0
    assert call("IF", False, never, lambda: 2.0) == 2.0
    assert call("IF", False, never) is False
    assert call("IFERROR", 1.0, never) == 1.0
    assert call("IFS", lambda: True, lambda: 1.0, never, never) == 1.0
    assert call("SWITCH", "b", lambda: "A", never, lambda: "B", lambda: 2.0, never) == 2.0
    assert call("CHOOSE", 2.0, never, lambda: 2.0, never) == 2.0
    assert call("XLOOKUP", 2.0, NUMBERS, NUMBERS, never) == area(2, 1, 2, 1)


def test_references_stay_references() -> None:
    assert call("IF", True, lambda: NUMBERS) is NUMBERS
    assert call("INDEX", area(1, 1, 4, 3), 2.0, 3.0) == area(2, 3, 2, 3)
    assert call("INDEX", area(1, 1, 4, 3), 0.0, 2.0) == area(1, 2, 4, 2)
    assert call("INDEX", NUMBERS, 5.0) == REF
    assert call("VLOOKUP", 3.0, area(1, 1, 4, 2), 2.0, False) == area(3, 2, 3, 2)
    assert call("XLOOKUP", 3.0, NUMBERS, area(1, 1, 4, 3)) == area(3, 1, 3, 3)


def test_grids_in_scalar_places_broadcast() -> None:
    assert call("ABS", ((-1.0, "x"),)) == ((1.0, VALUE),)
    assert call("ROUND", ((1.26,), (2.26,)), ((0.0, 1.0),)) == ((1.0, 1.3), (2.0, 2.3))
    assert call("IF", ((True, False),), lambda: 1.0, lambda: ((5.0,), (6.0,))) == ((1.0, 5.0), (1.0, 6.0))
    assert call("IFERROR", ((1.0, DIV),), lambda: "none") == ((1.0, "none"),)
    assert call("MATCH", ((2.0,), (9.0,)), NUMBERS, 0.0) == ((2.0,), (NA,))
    assert call("ISNUMBER", ((1.0, NA, "1"),)) == ((True, False, False),)


def test_an_array_of_arrays_is_refused() -> None:
    with pytest.raises(NotEvaluated, match="array for each value"):
        call("INDEX", area(1, 1, 4, 3), ((1.0,), (2.0,)), 0.0)


def test_a_reference_is_needed() -> None:
    with pytest.raises(NotEvaluated, match="reference is needed"):
        call("COUNTIF", ((1.0, 2.0),), 1.0)
    assert call("COUNTIF", DIV, 1.0) == DIV


@pytest.mark.parametrize(
    ("name", "operands", "words"),
    [
        ("SUBTOTAL", (109.0, NUMBERS), "hidden rows"),
        ("MATCH", (2.0, ((3.0, 1.0, 2.0),)), "ascending"),
        ("MATCH", (2.0, ((1.0, 3.0),), -1.0), "descending"),
        ("VLOOKUP", (2.0, ((3.0, 1.0), (1.0, 2.0)), 2.0), "ascending"),
        ("MATCH", (None, NUMBERS), "blank"),
        ("MATCH", (None, ((1.0, 0.0),), 0.0), "blank"),
        ("XMATCH", (2.0, NUMBERS, 0.0, 2.0), "halving"),
        ("XMATCH", (2.0, NUMBERS, 1.0, -1.0), "from the last"),
        ("INDEX", (NUMBERS, 1.0, 1.0, 2.0), "union"),
        ("ADDRESS", (1.0, 1.0, 1.0, False), "R1C1"),
        ("LARGE", (NUMBERS, 1.5), "rounds"),
        ("COUNTIF", (NUMBERS, NA), "error value as criterion"),
        ("SWITCH", (1.0, lambda: ((1.0, 2.0),), lambda: 1.0), "array as a case"),
        ("TEXT", (1.0, "0;-0"), "number format"),
        ("TEXT", (1.0, "[Red]0"), "number format"),
        ("TEXT", (1.0, "h:mm"), "number format"),
        ("TEXT", (1.0, "yyy"), "number format"),
        ("TEXT", (1.0, "# ?/?"), "number format"),
        ("TEXT", (1.0, "##0.0E+0"), "number format"),
        ("TEXT", ("1/2", "0.0"), "settings"),
        ("ROW", (), "outside a cell"),
        ("COLUMN", (), "outside a cell"),
    ],
)
def test_refusals(name: str, operands: tuple[Operand, ...], words: str) -> None:
    with pytest.raises(NotEvaluated, match=words):
        call(name, *operands)


@pytest.mark.parametrize(
    ("value", "pattern", "expected"),
    [
        (1234.567, "#,##0.0", "1,234.6"),
        (0.5, "#,##0.0", "0.5"),
        (-1234.5, '"V = "#,##0.00" kip"', "-V = 1,234.50 kip"),
        (0.1256, "0.0%", "12.6%"),
        (12345.678, "0.00E+00", "1.23E+04"),
        (0.0, "0.0E+00", "0.0E+00"),
        (9.995, "0.00", "10.00"),
        (1.5, "0.0##", "1.5"),
        (1e22, "0", "1" + 22 * "0"),
        (44000.0, "dddd, d mmmm yyyy", "Thursday, 18 June 2020"),
        (44000.0, "dd/mm/yy", "18/06/20"),
        (-1.0, "yyyy", VALUE),
        (None, "0.0", "0.0"),
        (NA, "0.0", NA),
    ],
)
def test_text_formats(value: Scalar, pattern: str, expected: Scalar) -> None:
    assert call("TEXT", value, pattern) == expected


@pytest.mark.parametrize(
    ("wanted", "met", "not_met"),
    [
        (">2", [3.0], [2.0, "3", None, True]),
        ("<=2", [2.0, -5.0], [3.0, "1", None]),
        ("<>2", [3.0, "a", None, NA, True], [2.0, "2"]),
        (2.0, [2.0, "2"], [True, None, "2a"]),
        ("b*", ["beta", "B"], ["ab", 1.0, None]),
        ("?eta", ["Beta"], ["eta", "xbeta"]),
        ("a~*c", ["A*C"], ["abc"]),
        ("<>b*", ["alpha", 1.0, None], ["beta"]),
        ("", [None, ""], ["a", 0.0]),
        ("=", [None], ["", 0.0]),
        ("<>", ["", 0.0, "a"], [None]),
        ("TRUE", [True], ["TRUE", 1.0, False]),
        (True, [True], [1.0, "TRUE"]),
        ("#N/A", [NA], [DIV, "#N/A"]),
        (">b", ["beta", "c"], ["alpha", 9.0, None]),
        (None, [0.0, "0"], [None, ""]),
        ("20%", [0.2, "20%"], [20.0]),
        ("a.c", ["a.c"], ["abc"]),
    ],
)
def test_criteria(wanted: Scalar, met: list[Scalar], not_met: list[Scalar]) -> None:
    test = criterion(wanted)
    assert [test(cell) for cell in [*met, *not_met]] == [True] * len(met) + [False] * len(not_met)


def test_conditional_targets() -> None:
    assert call("SUMIF", NUMBERS, ">1", area(1, 3, 1, 3)) == 0.5
    assert call("SUMIFS", NUMBERS, area(1, 2, 3, 2), "beta") == VALUE
    assert call("SUMIFS", NUMBERS, NUMBERS, ">1", NUMBERS, "<5") == 5.0
    assert call("SUMIFS", area(1, 2, 4, 2), NUMBERS, "5") == NA
    assert call("COUNTIFS", NUMBERS, ">1", NUMBERS) == VALUE
    assert call("AVERAGEIF", NUMBERS, ">9") == DIV


def test_equal_keys_in_nearest_matches() -> None:
    assert call("MATCH", 2.0, ((1.0, 2.0, 2.0, 3.0),)) == 3.0
    assert call("MATCH", 2.0, ((1.0, 2.0, 2.0, 3.0),), 0.0) == 2.0
    assert call("MATCH", 2.5, ((3.0, 2.0, 1.0),), -1.0) == 1.0
    assert call("LOOKUP", 2.0, ((DIV, 1.0, DIV, 1.0),), ((1.0, 2.0, 3.0, 4.0),)) == 4.0


def test_lookups_compare_numbers_exactly() -> None:
    assert call("MATCH", 0.3, ((0.1 + 0.2, 1.0),), 0.0) == NA


def test_sums_do_not_depend_on_order() -> None:
    values = [0.1 * n for n in range(60)] + [1e9, -1e9]
    grids = [(tuple(values),), (tuple(reversed(values)),)]
    assert call("SUM", grids[0]) == call("SUM", grids[1]) == math.fsum(values)


@pytest.mark.parametrize(
    ("name", "operands"),
    [("ROUND", (-0.4, 0.0)), ("QUOTIENT", (-1.0, 2.0)), ("CEILING", (-0.5, 1.0)), ("SUM", (-0.0,))],
)
def test_there_is_no_negative_zero(name: str, operands: tuple[float, ...]) -> None:
    assert math.copysign(1.0, call(name, *operands)) == 1.0  # type: ignore[arg-type]


def test_overflow_is_an_error() -> None:
    assert call("PRODUCT", 1e200, 1e200) == NUM
    assert call("SUM", 1.7e308, 1.7e308) == NUM
    assert call("EXP", 1000.0) == NUM
    assert call("POWER", 10.0, 400.0) == NUM
    assert call("REPT", "ab", 20000.0) == VALUE


SCALARS: list[Scalar] = [
    *(None, True, False, NA, DIV, "", "abc", "3", "TRUE", "a*", ">1", "E5", "2020-01-15"),
    *(0.0, 1.0, -1.0, 2.5, 3.0, -0.5, 1e-300, 1e300, -1e300, 44000.0, 2.0**53, 700.0),
]
GRIDS: list[Grid] = [
    ((1.0, 2.0, 3.0),),
    ((1.0,), ("a",)),
    ((1.0, 2.0), (3.0, 4.0)),
    ((NA, True), (None, "x")),
]
AREAS = [NUMBERS, WORDS, MIXED, area(1, 1, 4, 3), area(2, 1, 2, 1), area(7, 7, 8, 8)]


def drawn(kind: str, source: random.Random) -> Operand | Callable[[], Operand]:
    scalar = source.choice(SCALARS)
    if kind == "l":
        return lambda: scalar
    return source.choice(AREAS if kind == "a" else [*SCALARS, *SCALARS, OMITTED, *GRIDS, *AREAS])


def is_value(result: object) -> bool:
    if isinstance(result, Area):
        return True
    cells = [cell for row in result for cell in row] if isinstance(result, tuple) else [result]
    return all(
        cell is None
        or isinstance(cell, str | bool | CellError)
        or (type(cell) is float and math.isfinite(cell))
        for cell in cells
    )


@pytest.mark.parametrize("name", sorted(BUILTINS.keys() - VOLATILE.keys()))
def test_any_arguments_give_a_value_or_a_refusal(name: str) -> None:
    builtin, source = BUILTINS[name], random.Random(name)
    letters = builtin.params.removesuffix("*")
    least = len(letters) if builtin.required is None else builtin.required
    for _ in range(300):
        count = source.randint(least, min(len(letters), 5) + 2 * builtin.params.endswith("*"))
        operands = [drawn(kind, source) for kind in builtin.kinds(count)]
        try:
            result = call(name, *operands)
        except NotEvaluated:
            continue
        assert is_value(result), (operands, result)


samples = st.lists(st.floats(0.01, 1e4), min_size=3, max_size=12, unique=True)


@settings(max_examples=40)
@given(samples, st.floats(0.0, 1.0))
def test_statistics_agree_with_numpy_and_scipy(values: list[float], share: float) -> None:
    grid = (tuple(values),)
    expected = {
        "MEDIAN": np.median(values),
        "STDEV.S": np.std(values, ddof=1),
        "STDEV.P": np.std(values),
        "VAR.S": np.var(values, ddof=1),
        "VAR.P": np.var(values),
        "GEOMEAN": stats.gmean(values),
        "HARMEAN": stats.hmean(values),
        "AVERAGE": np.mean(values),
    }
    for name, value in expected.items():
        assert call(name, grid) == pytest.approx(float(value), rel=1e-9), name
    assert call("PERCENTILE", grid, share) == pytest.approx(float(np.quantile(values, share)), rel=1e-9)


@settings(max_examples=40)
@given(samples, st.randoms(use_true_random=False))
def test_regression_agrees_with_scipy(xs: list[float], random: object) -> None:
    ys = [x**0.5 + random.random() for x in xs]  # type: ignore[attr-defined]
    line = stats.linregress(xs, ys)
    x, y = (tuple(xs),), (tuple(ys),)
    assert call("SLOPE", y, x) == pytest.approx(line.slope, rel=1e-6, abs=1e-12)
    assert call("INTERCEPT", y, x) == pytest.approx(line.intercept, rel=1e-6, abs=1e-9)
    assert call("CORREL", y, x) == pytest.approx(line.rvalue, rel=1e-6, abs=1e-9)
    assert call("FORECAST", 7.0, y, x) == pytest.approx(line.intercept + 7.0 * line.slope, rel=1e-6, abs=1e-9)


@settings(max_examples=25)
@given(st.lists(st.lists(st.integers(-9, 9), min_size=3, max_size=3), min_size=3, max_size=3))
def test_a_matrix_times_its_inverse_is_the_identity(rows: list[list[int]]) -> None:
    grid = tuple(tuple(float(cell) for cell in row) for row in rows)
    determinant = call("MDETERM", grid)
    assert determinant == pytest.approx(float(np.linalg.det(np.array(rows))), abs=1e-9)
    if isinstance(determinant, float) and abs(determinant) > 0.5:
        product = call("MMULT", grid, call("MINVERSE", grid))
        assert np.allclose(np.array(product), np.eye(3), atol=1e-9)
