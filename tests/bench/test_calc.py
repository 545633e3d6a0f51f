"""Recalculating a whole workbook, beside the ``formulas`` package and beside openpyxl's bare load of it.

``formulas`` (a general spreadsheet interpreter, used by the tests only) gets the same worksheet functions,
so that the same cells are computed twice: its values are an outside check of ours.
"""

from __future__ import annotations

import logging
import re
import warnings
from collections.abc import Callable, Iterator, Sequence
from math import isclose
from pathlib import Path
from time import process_time
from typing import Any

import formulas
import numpy as np
import openpyxl
import pytest
import schedula
from formulas.functions import Error, wrap_func

from engine.building import from_mapping, solve
from engine.editions import EDITIONS
from workbook_templates.build import build
from workbook_templates.parts import together
from workbook_templates.read import Reader
from xlbridge.headless.compute import FUNCTIONS, compute, compute_into
from xlbridge.values import ERROR_CODES, Argument, CellError, Scalar, Value

#: the package rounds a difference of nearly equal numbers to zero, as some spreadsheet programs do
ROUNDED_TO_ZERO = 1e-9


@pytest.fixture(autouse=True)
def quiet() -> Iterator[None]:
    logger = logging.getLogger("schedula")
    level = logger.level
    logger.setLevel(logging.CRITICAL)
    with warnings.catch_warnings():
        warnings.simplefilter("ignore")
        yield
    logger.setLevel(level)


def cell(value: Any) -> Scalar:
    """A cell of the package's as ours."""
    if value is schedula.EMPTY or value is None:
        return None
    if isinstance(value, bool | np.bool_):
        return bool(value)
    if isinstance(value, int | float | np.number):
        return float(value)
    return CellError(str(value)) if str(value) in ERROR_CODES else str(value)


def argument(value: Any) -> Argument:
    if not isinstance(value, np.ndarray) or value.size == 1:
        return cell(value.item() if isinstance(value, np.ndarray) else value)
    return tuple(tuple(map(cell, row)) for row in np.atleast_2d(value).tolist())


def returned(value: Value) -> Any:
    if isinstance(value, tuple):
        return np.array([[returned(found) for found in row] for row in value], object)
    return Error.errors[value.code] if isinstance(value, CellError) else value


def wrapped(function: Callable[[Sequence[Argument]], Value]) -> Any:
    return wrap_func(lambda *given: returned(function([argument(value) for value in given])))


def theirs(path: Path) -> dict[tuple[str, str], Scalar]:
    """Every cell as the package computes it, by upper-case sheet name and address."""
    formulas.get_functions().update({name: wrapped(function) for name, function in FUNCTIONS.items()})
    solution = formulas.ExcelModel().loads(str(path)).finish().calculate()
    place = re.compile(rf"'\[{re.escape(path.name)}\](.+)'!([A-Z]+\d+)", re.IGNORECASE)
    found = ((place.fullmatch(str(key)), value) for key, value in solution.items())
    return {(m[1].upper(), m[2]): cell(value.value[0, 0]) for m, value in found if m}


def alike(left: Scalar, right: Scalar) -> bool:
    if isinstance(left, float) and isinstance(right, float):
        return isclose(left, right, rel_tol=1e-12, abs_tol=ROUNDED_TO_ZERO)
    return type(left) is type(right) and left == right


def test_recalculating_a_workbook(full: bool, figure: Any, best: Any, tmp_path: Path) -> None:
    levels = 60 if full else 4
    book, out = tmp_path / "book.xlsx", tmp_path / "out.xlsx"
    book.write_bytes(build({"edition": "7-22", "units": "us"}, levels))
    ours = compute(book)
    assert ours.not_evaluated == ours.errors == []
    others = theirs(book)
    different = {
        place: (value, others.get((place[0].upper(), place[1])))
        for place, value in ours.results.values.items()
        if not alike(value, others.get((place[0].upper(), place[1])))
    }
    assert not different
    assert len(ours.results.values) > 25 * levels

    calc, load = best(lambda: compute_into(book, out, True), lambda: openpyxl.load_workbook(book))
    (package,) = best(lambda: theirs(book), rounds=3)
    figure(f"formulas package over calc, {levels} levels", package / calc, "target at least 10 times")
    figure(f"calc over openpyxl's bare load, {levels} levels", calc / load, "target at most 4 times")
    figure(f"  calc, {levels} levels, {len(ours.results.values)} formula cells [s]", calc, "no target")


@pytest.mark.parametrize("edition", EDITIONS)
def test_all_parts_together(full: bool, figure: Any, best: Any, tmp_path: Path, edition: str) -> None:
    levels = 60 if full else 4
    book, out = tmp_path / "book.xlsx", tmp_path / "out.xlsx"
    given = {"edition": edition, "units": "us", "parts": sorted(together(edition))}
    book.write_bytes(build(given, levels))
    ours = compute(book)
    assert ours.not_evaluated == ours.errors == []
    building = from_mapping(Reader(ours.evaluator.evaluate_text).inputs())
    assert solve(building).direction["X"].theta is not None

    calc, load = best(lambda: compute_into(book, out, True), lambda: openpyxl.load_workbook(book))
    name = f"{levels} levels, all parts, {edition}"
    figure(f"calc over openpyxl's bare load, {name}", calc / load, "target at most 6 times")
    figure(f"  calc, {name}, {len(ours.results.values)} formula cells [s]", calc, "no target")
    start = process_time()
    for _ in range(5):
        solve(building)
    figure(f"solve, {name} [ms of CPU]", (process_time() - start) / 5 * 1e3, "target below 50")
