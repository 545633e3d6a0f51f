"""The native formulas, numbers put in, against the functions: in LibreOffice Calc and headless."""

from __future__ import annotations

import math
from collections.abc import Mapping
from pathlib import Path
from typing import Any

import pytest
from openpyxl import Workbook

from tests.support.office import Office
from tests.support.sheet_cases import ENTRIES, as_cells, ident, random_calls
from xlbridge import adapter
from xlbridge.catalogue.entry import Kind, SheetFunction
from xlbridge.headless.book import Book
from xlbridge.headless.evaluate import Evaluator
from xlbridge.values import CellError, Scalar

NATIVE = tuple(entry for entry in ENTRIES if entry.native)
#: a search along the lines between periods: no one-cell formula is declared
WITHOUT = {"ELF_SD1_MULTI"} | {
    # compares with the story above or below, which has to be searched for
    *("ELF_SOFT_RATIO", "ELF_SOFT_RATIO_THREE", "ELF_WEAK_RATIO", "ELF_WEIGHT_RATIO", "ELF_GEOMETRY_RATIO"),
    "ELF_DRIFT_RATIO_ABOVE",
    # a table of 85 rows
    *("ELF_SYSTEM_R", "ELF_SYSTEM_OMEGA", "ELF_SYSTEM_CD"),
    # needs the levels in order, an eigenproblem, or a range beside itself turned
    *("ELF_STORY_STIFFNESS", "ELF_CQC", "ELF_MODE_PERIOD", "ELF_MODE_SHAPE", "ELF_MODE_PARTICIPATION"),
    *("ELF_MODE_MASS", "ELF_MODE_MASS_SUM", "ELF_MODES_NEEDED"),
    *("ELF_MODE_FORCE", "ELF_MODE_SHEAR", "ELF_MODE_DISPLACEMENT", "ELF_MODE_DRIFT"),
    *("ELF_MODAL_SHEAR", "ELF_MODAL_DRIFT"),
}
COUNT, SEED = 320, 20260115
Values = Mapping[tuple[str, str], Scalar]


def calls(entry: SheetFunction) -> list[dict[str, Any]]:
    return list(random_calls(entry, COUNT, SEED + NATIVE.index(entry)))


def written(entry: SheetFunction, call: Mapping[str, Any], ranges: Mapping[str, str]) -> str:
    """The native formula with numbers and words put in, level ranges as references."""
    texts = {name: ranges.get(name) or _literal(value) for name, value in call.items()}
    return "=" + entry.native.format_map(texts)


def _literal(value: Any) -> str:
    return f'"{value}"' if isinstance(value, str) else repr(value).upper()


@pytest.fixture(scope="module")
def book(tmp_path_factory: pytest.TempPathFactory) -> Path:
    """One workbook: a sheet for each function, a formula in column A, its level ranges beside it."""
    workbook = Workbook()
    workbook.remove(workbook.worksheets[0])
    for entry in NATIVE:
        sheet = workbook.create_sheet(entry.name)
        for row, call in enumerate(calls(entry), 1):
            ranges, left = {}, 2
            for argument in entry.arguments:
                if argument.kind is Kind.LEVELS:
                    cells = [
                        sheet.cell(row, left + n, number) for n, number in enumerate(call[argument.name])
                    ]
                    ranges[argument.name] = f"{cells[0].coordinate}:{cells[-1].coordinate}"
                    left += len(cells)
            sheet.cell(row, 1, written(entry, call, ranges))
    path = tmp_path_factory.mktemp("native") / "native.xlsx"
    workbook.save(path)
    return path


@pytest.fixture(scope="module")
def headless(book: Path) -> Values:
    return Evaluator(Book.open(book), {}).evaluate_all().values


@pytest.fixture(scope="module")
def calc(book: Path, office: Office) -> Values:
    return office.values(book)


def compare(entry: SheetFunction, values: Values) -> None:
    differing = []
    for row, call in enumerate(calls(entry), 1):
        expected = adapter.call(entry, as_cells(entry, call))
        assert isinstance(expected, float | str), expected
        found = values[entry.name, f"A{row}"]
        both = isinstance(found, float) and isinstance(expected, float)
        if not (math.isclose(found, expected, rel_tol=1e-12) if both else found == expected):
            differing.append((row, call, found, expected))
    assert differing == []


@pytest.mark.parametrize("entry", NATIVE, ids=ident)
def test_headless(entry: SheetFunction, headless: Values) -> None:
    compare(entry, headless)


@pytest.mark.parametrize("entry", NATIVE, ids=ident)
def test_calc(entry: SheetFunction, calc: Values) -> None:
    compare(entry, calc)


def test_every_function_that_gives_a_number_has_one() -> None:
    assert {entry.name for entry in ENTRIES if not entry.is_text and not entry.native} == WITHOUT


@pytest.mark.parametrize("entry", NATIVE, ids=ident)
def test_the_calls_vary_in_every_argument(entry: SheetFunction) -> None:
    made = calls(entry)
    assert len(made) == COUNT
    for argument in entry.arguments:
        seen = {repr(call[argument.name]) for call in made}
        assert len(seen) >= min(COUNT // 2, len(argument.choices) or (12 if argument.name == "N" else COUNT))


def test_a_number_just_beside_is_a_difference(headless: Values) -> None:
    entry = NATIVE[-1]
    place = (entry.name, "A7")
    number = headless[place]
    assert isinstance(number, float)
    for other in (number * (1 + 1e-11), CellError("#DIV/0!"), str(number), None):
        with pytest.raises(AssertionError):
            compare(entry, {**headless, place: other})
