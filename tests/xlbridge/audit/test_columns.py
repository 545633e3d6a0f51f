"""Consistency down columns that no template knows: what breaks a run is found, what only ends it is not."""

from __future__ import annotations

from collections.abc import Callable
from pathlib import Path

import pytest
from openpyxl import Workbook
from openpyxl.worksheet.worksheet import Worksheet

from tests.support.audited import audited, changed, computed_book
from xlbridge.audit import columns
from xlbridge.audit.finding import Observation
from xlbridge.audit.subject import Subject
from xlbridge.cli.own_template import own_template
from xlbridge.headless.compute import compute_into

ROWS = range(2, 10)
Change = Callable[[Worksheet], object]


def table(folder: Path, change: Change = lambda sheet: None) -> list[Observation]:
    """A story table of another make, with forces, shears and a total: changed, and looked at."""
    book = Workbook()
    sheet = book.active
    sheet.append(["level", "w", "h", "wh", "F", "V", "M"])
    for row in ROWS:
        sheet.cell(row, 1, f"L{row}")
        sheet.cell(row, 2, 100.0 + row)
        sheet.cell(row, 3, 12.0 * (10 - row))
        sheet.cell(row, 4, f"=B{row}*C{row}")
        sheet.cell(row, 5, f"=1000*D{row}/D$10")
        sheet.cell(row, 6, "=E2" if row == 2 else f"=F{row - 1}+E{row}")
        sheet.cell(row, 7, 0.0 if row == 2 else f"=G{row - 1}+F{row - 1}*12")
    sheet["D10"], sheet["E10"] = "=SUM(D2:D9)", "=SUM(E2:E9)"
    change(sheet)
    book.save(folder / "own.xlsx")
    compute_into(folder / "own.xlsx", folder / "computed.xlsx", force=True)
    return list(columns.check(Subject.open(folder / "computed.xlsx", own_template)).observations)


def put(address: str, content: object) -> Change:
    return lambda sheet: setattr(sheet[address], "value", content)


def insert_above_the_range(sheet: Worksheet) -> None:
    sheet["D10"] = "=SUM(D3:D9)"


def cut(sheet: Worksheet) -> None:
    sheet["E9"], sheet["E8"] = None, None


PLANTED: dict[str, tuple[Change, str, str]] = {
    "a row slip": (put("D5", "=B5*C6"), "odd_formula", "D5"),
    "a factor": (put("E6", "=1000*D6/D$10*1.1"), "odd_formula", "E6"),
    "a lost dollar": (put("E4", "=1000*D4/D10"), "odd_formula", "E4"),
    "a number": (put("E5", 250.0), "odd_constant", "E5"),
    "an end too soon": (cut, "run_cut_short", "E8:E9"),
    "a sum that begins too low": (insert_above_the_range, "sum_omits", "D10"),
    "a sum that ends too high": (put("E10", "=SUM(E2:E8)"), "sum_omits", "E10"),
}


@pytest.mark.parametrize("name", PLANTED)
def test_what_breaks_a_run_is_found(tmp_path: Path, name: str) -> None:
    change, kind, address = PLANTED[name]
    found = table(tmp_path, change)
    assert (kind, address) in [(o.kind, o.place.address) for o in found]
    assert {o.kind for o in found} == {kind}


def test_the_expected_formula_is_that_of_its_row(tmp_path: Path) -> None:
    (found,) = table(tmp_path, put("D5", "=B5*C6"))
    assert (found.expected, found.found) == ("=B5*C5", "=B5*C6")


def test_a_clean_table_has_nothing(tmp_path: Path) -> None:
    assert table(tmp_path) == []


@pytest.mark.parametrize(
    "change",
    [
        put("F2", "=E2*1"),
        put("D9", "=B9*C9*0.5"),
        put("B5", 7.0),
        put("H3", "=A3"),
        put("D10", "=SUM(D2:D9)/2"),
    ],
)
def test_ends_and_single_cells_are_no_run(tmp_path: Path, change: Change) -> None:
    assert table(tmp_path, change) == []


def test_our_own_tables_are_left_to_the_template(tmp_path: Path) -> None:
    def own_columns(book: Workbook) -> None:
        sheet = book.create_sheet("Own")
        for row in range(1, 8):
            sheet.cell(row, 1, float(row))
            sheet.cell(row, 2, f"=A{row}*2" if row != 4 else "=A4*3")

    found = audited(changed(computed_book(tmp_path), own_columns)).findings
    assert [(f.kind.key, str(f.places[0])) for f in found] == [("odd_formula", "Own!B4")]
