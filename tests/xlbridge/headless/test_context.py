"""Functions that depend on more of the workbook than their operands are refused, not guessed."""

from __future__ import annotations

from pathlib import Path

import openpyxl
import pytest
from openpyxl.utils.datetime import CALENDAR_MAC_1904
from openpyxl.worksheet.worksheet import Worksheet

from xlbridge.headless.book import Book
from xlbridge.headless.evaluate import Evaluator, Results


def results(path: Path, workbook: openpyxl.Workbook) -> Results:
    workbook.save(path)
    return Evaluator(Book.open(path), {}).evaluate_all()


@pytest.fixture
def sheet() -> Worksheet:
    sheet = openpyxl.Workbook().active
    assert sheet is not None
    sheet["A1"], sheet["A2"], sheet["A3"] = 1, 2, "=SUM(A1:A2)"
    return sheet


def test_a_plain_subtotal_is_evaluated(tmp_path: Path, sheet: Worksheet) -> None:
    sheet["A4"] = "=SUBTOTAL(9,A1:A3)"
    assert results(tmp_path / "a.xlsx", sheet.parent).values["Sheet", "A4"] == 6.0


def test_a_subtotal_of_subtotals_is_refused(tmp_path: Path, sheet: Worksheet) -> None:
    sheet["A3"], sheet["A4"] = "=Subtotal(9,A1:A2)", "=SUBTOTAL(9,A1:A3)"
    found = results(tmp_path / "a.xlsx", sheet.parent)
    assert found.values["Sheet", "A3"] == 3.0
    assert list(found.not_evaluated.values()) == ["SUBTOTAL over cells that hold a SUBTOTAL themselves"]


def test_a_subtotal_over_hidden_rows_is_refused(tmp_path: Path, sheet: Worksheet) -> None:
    sheet["B1"] = "=SUBTOTAL(9,A1:A2)"
    sheet["B2"] = "=SUBTOTAL(9,A1:A1)"
    sheet.row_dimensions[2].hidden = True
    found = results(tmp_path / "a.xlsx", sheet.parent)
    assert [cell.address for cell in found.not_evaluated] == ["B1"]
    assert found.values["Sheet", "B2"] == 1.0


@pytest.mark.parametrize(
    "formula", ["=YEAR(A1)", "=DATE(2020,1,15)", '=TEXT(A1,"d")', "=DAY(A1)", "=MONTH(A1)"]
)
def test_the_calendar_of_1904_is_refused(tmp_path: Path, sheet: Worksheet, formula: str) -> None:
    sheet["B1"] = formula
    assert not results(tmp_path / "a.xlsx", sheet.parent).not_evaluated
    sheet.parent.epoch = CALENDAR_MAC_1904
    found = results(tmp_path / "b.xlsx", sheet.parent)
    assert "counts its days from 1904" in next(iter(found.not_evaluated.values()))
