"""The cross-check: the same rules in built-in functions beside those that call ours, and differences."""

from __future__ import annotations

from pathlib import Path
from typing import Any

import openpyxl
import pytest

from engine.editions import EDITIONS
from engine.units import SYSTEMS
from tests.support.story_books import story_book
from workbook_templates.build import write_native
from workbook_templates.parts import PARTS, cross_check, together
from xlbridge.headless.compute import Computed, compute

ROWS = 6
LINES = [check.text for key in cross_check.KEYS for check in PARTS[key].checks]


def given(edition: str = "7-22", units: str = "us", parts: list[str] | None = None) -> dict[str, Any]:
    return {"edition": edition, "units": units, "parts": parts or list(cross_check.KEYS)}


def verdicts(path: Path, computed: Computed) -> list[Any]:
    """The verdicts of the lines of the cross-check."""
    rows = openpyxl.load_workbook(path)["Checks"].iter_rows(min_row=11)
    lines = [row[8].coordinate for row in rows if row[1].value in LINES]
    return [computed.values["Checks", address] for address in lines]


def built_in(path: Path) -> dict[str, list[str]]:
    """The formulas of the columns and rows of the cross-check, by the symbol that stands beside them."""
    book = openpyxl.load_workbook(path)
    levels, criteria = book["Levels"], book["Criteria"]
    columns = {
        str(cell.value): [levels.cell(row, cell.column).value for row in range(12, 12 + ROWS)]
        for cell in levels[6]
        if ", built-in" in str(cell.value)
    }
    rows = {
        str(row[2].value): [row[3].value, row[4].value]
        for row in criteria.iter_rows()
        if ", built-in" in str(row[2].value)
    }
    return columns | rows


@pytest.mark.parametrize("edition", EDITIONS)
@pytest.mark.parametrize("units", SYSTEMS)
@pytest.mark.parametrize("every", [False, True], ids=["alone", "all parts"])
def test_functions_and_built_in_formulas_agree(tmp_path: Path, edition: str, units: str, every: bool) -> None:
    parts = list(together(edition)) if every else None
    path = story_book(tmp_path, given(edition, units, parts))
    computed = compute(path)
    assert set(verdicts(path, computed)) == {"✓ holds"}
    assert len(verdicts(path, computed)) == 2 * len(LINES)
    formulas = built_in(path)
    assert len(formulas) == 5 + 2 * 4 + 2 * 3
    assert all(f.startswith("=") and "ELF_" not in f for column in formulas.values() for f in column)


@pytest.mark.parametrize(
    ("sheet", "symbol", "lines"),
    [("Levels", "F_x X", 1), ("Levels", "theta Y", 1), ("Criteria", "C_s", 1), ("Levels", "M_x Y", 1)],
)
def test_a_function_that_gives_another_value_is_seen(
    tmp_path: Path, sheet: str, symbol: str, lines: int
) -> None:
    path = story_book(tmp_path, given())
    book = openpyxl.load_workbook(path)
    heading = next(c for row in book[sheet].iter_rows() for c in row if c.value == symbol)
    at = (heading.row + 8, heading.column) if sheet == "Levels" else (heading.row, heading.column + 1)
    book[sheet].cell(*at).value += "*1.000001"
    book.save(path)
    assert verdicts(path, compute(path)).count("✗ does not hold") == lines


def test_a_replaced_formula_is_cross_checked_as_it_stands(tmp_path: Path) -> None:
    """Edge drifts take the place of the story drift in theta: its twin follows."""
    path = story_book(tmp_path, given("7-16", parts=["edge_drift", *cross_check.KEYS]))
    book = openpyxl.load_workbook(path)
    heading = next(c for c in book["Levels"][6] if c.value == "theta, built-in X")
    checked = next(c for c in book["Levels"][6] if c.value == "Delta, checked X")
    assert f"{checked.column_letter}13" in book["Levels"].cell(13, heading.column).value


def test_an_issue_copy_has_nothing_to_check_against(tmp_path: Path) -> None:
    write_native(given(), tmp_path / "issue.xlsx")
    assert built_in(tmp_path / "issue.xlsx") == {}
