"""The check of the bridge: right where the functions are, and never right where they are not."""

from __future__ import annotations

from pathlib import Path

import openpyxl
import pytest

from tests.support.command import run
from tests.support.office import Office
from workbook_templates import bridge
from xlbridge.calc.names import for_calc
from xlbridge.catalogue import CATALOGUE
from xlbridge.headless.book import Book
from xlbridge.headless.compute import FUNCTIONS
from xlbridge.headless.evaluate import Evaluator
from xlbridge.values import CellError, Scalar

ERRORS = 3


@pytest.fixture
def book(tmp_path: Path) -> Path:
    path = tmp_path / "check.xlsx"
    assert run("bridge-check", path).code == 0
    return path


def verdicts(values: dict[tuple[str, str], Scalar]) -> list[Scalar]:
    return [value for (_, address), value in values.items() if address[0] == "D"]


def status(values: dict[tuple[str, str], Scalar]) -> str:
    return str(values[bridge.SHEET, "A3"])


def test_no_value_is_stored_that_the_program_has_not_computed(book: Path) -> None:
    read = Book.open(book)
    assert {read.stored(cell) for cell in read.formula_cells()} == {None}


def test_every_function_is_asked_and_headless_answers_right(book: Path) -> None:
    values = Evaluator(Book.open(book), FUNCTIONS).evaluate_all().values
    asked = [formula for formula in formulas(book) if formula.startswith("=ELF_")]
    assert {formula.partition("(")[0].removeprefix("=") for formula in asked} == set(CATALOGUE)
    assert len(asked) == len(CATALOGUE) + ERRORS
    assert set(verdicts(values)) == {bridge.OK}
    assert status(values).startswith(f"✓ the bridge works: {len(asked)} of {len(asked)}")


def test_real_calc_computes_it_when_it_is_opened(office_with_addin: Office, book: Path) -> None:
    copy = book.with_name("calc.xlsx")
    copy.write_bytes(for_calc(book.read_bytes()))
    values = office_with_addin.values(copy)
    assert set(verdicts(values)) == {bridge.OK}
    assert status(values).startswith("✓")


def test_without_the_functions_every_line_says_so(office: Office, book: Path) -> None:
    values = office.values(book)
    found = verdicts(values)
    assert found.count(bridge.SILENT) == len(CATALOGUE)
    assert found.count(bridge.WRONG) == ERRORS
    assert status(values).startswith("✗ the bridge does not work")


def test_a_function_that_gives_another_value_is_named(book: Path) -> None:
    def wrong(arguments: object) -> float:
        return 1.0

    values = Evaluator(Book.open(book), {**FUNCTIONS, "ELF_CVX": wrong}).evaluate_all().values
    assert verdicts(values).count(bridge.WRONG) == 1
    assert status(values).startswith("✗")


def test_a_bridge_that_turns_errors_into_numbers_is_seen(book: Path) -> None:
    def zero(arguments: object) -> float:
        return 0.0

    values = Evaluator(Book.open(book), {**FUNCTIONS, "ELF_EXPONENT": zero}).evaluate_all().values
    assert verdicts(values).count(bridge.WRONG) == ERRORS + 1


def test_excel_is_asked_for_its_versions(tmp_path: Path) -> None:
    path = tmp_path / "check.xlsm"
    assert run("bridge-check", path).code == 0
    from engine.version import __version__
    from xlbridge.excel.versions import XLWINGS

    known = {"storyledger": __version__, "xlwings": XLWINGS}

    def version(arguments: tuple[str]) -> Scalar:
        return known.get(arguments[0], CellError("#N/A"))

    def statuses(found: dict[str, str]) -> str:
        known.update(found)
        functions = {**FUNCTIONS, "STORYLEDGER_VERSION": version}
        return status(Evaluator(Book.open(path), functions).evaluate_all().values)

    assert statuses({}).startswith("✓")
    assert statuses({"xlwings": "0.30.0"}).startswith("✗ the bridge does not work: 1 of")


def formulas(book: Path) -> list[str]:
    sheet = openpyxl.load_workbook(book)[bridge.SHEET]
    return [str(row[2].value) for row in sheet.iter_rows(min_row=bridge.HEADER + 1)]
