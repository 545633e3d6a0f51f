"""Storing 3,000 results in a workbook of 60 levels, beside openpyxl loading and saving the same file."""

from __future__ import annotations

from pathlib import Path
from typing import Any

import openpyxl

from xlbridge.headless.store import store

COLUMNS = 50
FORMULA = "=ELF_CVX($B{row},$C{row},$B$1:$B$60,$C$1:$C$60,$A$1)"


def test_storing_results(full: bool, figure: Any, best: Any, tmp_path: Path) -> None:
    book, stored, saved = (tmp_path / name for name in ("book.xlsx", "stored.xlsx", "saved.xlsx"))
    rows = 60 if full else 6
    workbook = openpyxl.Workbook()
    for row in range(1, rows + 1):
        for column in range(1, COLUMNS + 1):
            workbook.active.cell(row, column, FORMULA.format(row=row))
    workbook.save(book)
    values = {("Sheet", c.coordinate): c.row * c.column / 7 for line in workbook.active for c in line}

    ours, theirs = best(
        lambda: store(book, stored, values, force=True),
        lambda: openpyxl.load_workbook(book).save(saved),
    )
    assert openpyxl.load_workbook(stored, data_only=True)["Sheet"]["C2"].value == 6 / 7
    assert openpyxl.load_workbook(saved).active["C2"].value == FORMULA.format(row=2)
    figure(f"storing {len(values):,} values over openpyxl's load and save", ours / theirs, "target below 1")
