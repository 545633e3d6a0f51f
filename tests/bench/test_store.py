"""Storing 3,000 results in a workbook of 60 levels, beside openpyxl loading and saving the same file."""

from __future__ import annotations

from pathlib import Path
from typing import Any

import openpyxl
import pytest

from xlbridge.headless.store import store

LEVELS, COLUMNS = 60, 50
FORMULA = "=ELF_CVX($B{row},$C{row},$B$1:$B$60,$C$1:$C$60,$A$1)"


@pytest.fixture
def book(tmp_path: Path) -> Path:
    workbook = openpyxl.Workbook()
    for row in range(1, LEVELS + 1):
        for column in range(1, COLUMNS + 1):
            workbook.active.cell(row, column, FORMULA.format(row=row))
    workbook.save(tmp_path / "book.xlsx")
    return tmp_path / "book.xlsx"


def test_store(benchmark: Any, book: Path) -> None:
    benchmark.group = "3,000 formula cells"
    sheet = openpyxl.load_workbook(book).active
    values = {("Sheet", cell.coordinate): cell.row * cell.column / 7 for row in sheet for cell in row}
    target = book.with_name("stored.xlsx")
    assert benchmark(store, book, target, values, force=True) == LEVELS * COLUMNS
    assert openpyxl.load_workbook(target, data_only=True)["Sheet"]["C2"].value == 6 / 7


def test_openpyxl_round_trip(benchmark: Any, book: Path) -> None:
    benchmark.group = "3,000 formula cells"

    def load_and_save() -> None:
        openpyxl.load_workbook(book).save(book.with_name("saved.xlsx"))

    benchmark(load_and_save)
    assert openpyxl.load_workbook(book.with_name("saved.xlsx")).active["C2"].value == FORMULA.format(row=2)
