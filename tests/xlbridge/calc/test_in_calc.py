"""Our functions in a real Calc: the templates, errors, blanks, and what a failing import looks like."""

from __future__ import annotations

from math import isclose
from pathlib import Path

import pytest
from openpyxl import Workbook
from openpyxl.workbook.defined_name import DefinedName

from engine.editions import EDITIONS
from engine.units import SYSTEMS
from tests.support.office import Office
from tests.support.story_books import story_book
from workbook_templates.bridge import call_text
from workbook_templates.parts import together
from xlbridge.calc.names import for_calc, for_excel
from xlbridge.catalogue import CATALOGUE
from xlbridge.headless.book import Book
from xlbridge.headless.compute import compute
from xlbridge.values import CellError, Scalar

PARTS = {"none": lambda edition: [], "drift": lambda edition: ["drift"], "all": lambda e: list(together(e))}


def for_calc_copy(path: Path) -> Path:
    """A copy with the functions named for Calc."""
    copy = path.with_name("calc.xlsx")
    copy.write_bytes(for_calc(path.read_bytes()))
    return copy


def same(calc: Scalar, headless: Scalar) -> bool:
    """The same value; a formula that gives an empty text or a blank is an empty text in Calc."""
    if isinstance(calc, float) and isinstance(headless, float):
        return isclose(calc, headless, rel_tol=1e-12, abs_tol=1e-12)
    return calc == headless


@pytest.mark.parametrize("units", SYSTEMS)
@pytest.mark.parametrize("edition", EDITIONS)
@pytest.mark.parametrize("parts", PARTS)
def test_every_cell_of_every_template_is_the_same(
    office_with_addin: Office, tmp_path: Path, parts: str, edition: str, units: str
) -> None:
    path = story_book(tmp_path, {"edition": edition, "units": units, "parts": PARTS[parts](edition)})
    headless = compute(path).values
    calc = office_with_addin.values(for_calc_copy(path))
    assert set(calc) == set(headless)
    assert {key: (calc[key], value) for key, value in headless.items() if not same(calc[key], value)} == {}
    assert len(calc) > (2000 if parts == "all" else 150)


def test_a_text_of_a_function_is_equal_to_that_text(office_with_addin: Office, tmp_path: Path) -> None:
    """Calc compares texts by their place in a pool: one that is not in it is equal to none."""
    book = Workbook()
    sheet = book.active
    texts = [entry for entry in CATALOGUE.values() if entry.is_text]
    for row, entry in enumerate(texts, 1):
        sheet.cell(row, 1, call_text(entry))
        sheet.cell(row, 2, entry.function(**entry.example.arguments))
        sheet.cell(row, 3, f'=A{row}&""')
        for column, formula in enumerate(("=A{0}=B{0}", "=COUNTIF(A{0},C{0})=1", "=A{0}=A{1}"), 4):
            sheet.cell(row, column, formula.format(row, row % len(texts) + 1))
    book.save(tmp_path / "texts.xlsx")
    headless = compute(tmp_path / "texts.xlsx").values
    calc = office_with_addin.values(for_calc_copy(tmp_path / "texts.xlsx"))
    assert len(texts) >= 40
    assert all(headless["Sheet", f"D{row}"] is True for row in range(1, len(texts) + 1))
    assert calc == headless


def test_what_calc_stores_opens_in_excel_with_the_worksheet_names(
    office_with_addin: Office, tmp_path: Path
) -> None:
    path = story_book(tmp_path, {"edition": "7-16", "units": "us", "parts": ["drift"]})
    with office_with_addin.open(for_calc_copy(path)) as book:
        stored = book.store(tmp_path / "stored.xlsx")
    back = tmp_path / "back.xlsx"
    back.write_bytes(for_excel(stored.read_bytes()))
    before, after = Book.open(path), Book.open(back)
    spelled = {"1E-12": "0.000000000001", "1E-09": "0.000000001", "1E-9": "0.000000001", "1E-6": "0.000001"}
    for sheet, formulas in before.formulas.items():
        for place, formula in formulas.items():
            text = formula.text
            for short, long in spelled.items():
                text = text.replace(short, long)
            assert after.formulas[sheet][place].text == text
    assert all(isinstance(v, CellError) is False for v in compute(back).values.values())


CALLS = {
    "ELF_EXPONENT(1)": 1.25,
    "ELF_EXPONENT(0)": CellError("#NUM!"),
    'ELF_EXPONENT("1")': CellError("#VALUE!"),
    "ELF_EXPONENT(1/0)": CellError("#DIV/0!"),
    "ELF_EXPONENT(E1)": CellError("#VALUE!"),
    "ELF_EXPONENT(1,E1)": CellError("#VALUE!"),
    'ELF_EXPONENT(1,"two")': 2.0,
    "ELF_DRIFT(E1,0.1,5.5,1)": CellError("#VALUE!"),
    "ELF_DRIFT(nothing,0.1,5.5,1)": CellError("#VALUE!"),
    "ELF_DRIFT(nil,0.1,5.5,1)": CellError("#VALUE!"),
    "ELF_DRIFT(F1,0,5.5,1)": 2.75,
    "ELF_DRIFT(half,0,5.5,1)": 2.75,
    'ELF_SYSTEM_R("no such system","7-22")': CellError("#N/A"),
    "IFERROR(ELF_EXPONENT(0),7)": 7.0,
}


@pytest.fixture(scope="module")
def answers(office_with_addin: Office, tmp_path_factory: pytest.TempPathFactory) -> dict[str, Scalar]:
    book = Workbook()
    sheet = book.active
    sheet["F1"] = 0.5
    for name, cell in {"nothing": "$E$1", "nil": "$E$2", "half": "$F$1"}.items():
        book.defined_names[name] = DefinedName(name, attr_text=f"Sheet!{cell}")
    for row, formula in enumerate(CALLS, 1):
        sheet.cell(row, 1, f"={formula}")
    path = tmp_path_factory.mktemp("calls") / "calls.xlsx"
    book.save(path)
    found = office_with_addin.values(for_calc_copy(path))
    return {formula: found["Sheet", f"A{row}"] for row, formula in enumerate(CALLS, 1)}


@pytest.mark.parametrize("formula", CALLS)
def test_errors_are_real_and_a_blank_is_never_zero(answers: dict[str, Scalar], formula: str) -> None:
    assert answers[formula] == CALLS[formula]


@pytest.mark.usefixtures("office_with_addin")  # which skips where there is no office
def test_a_failing_import_shows_its_reason_in_the_cell_and_in_the_log(addins: Path, tmp_path: Path) -> None:
    broken = tmp_path / "broken" / "xlbridge"
    broken.mkdir(parents=True)
    (broken / "__init__.py").write_text("raise ImportError('numpy is missing, say')")
    book, path, log = Workbook(), tmp_path / "book.xlsx", tmp_path / "calc.log"
    book.active["A1"] = "=ELF_EXPONENT(1)"
    book.save(path)
    environment = {"STORYLEDGER_PATH": str(tmp_path / "broken"), "STORYLEDGER_CALC_LOG": str(log)}
    with Office(addins, **environment) as office:
        value = office.values(for_calc_copy(path))["Sheet", "A1"]
    assert str(value).startswith("#NAME? Storyledger is not loaded: ImportError: numpy is missing, say")
    assert "numpy is missing, say" in log.read_text()
