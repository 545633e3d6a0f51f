"""The issue copy: built-in functions give, cell by cell, what the worksheet functions give."""

from __future__ import annotations

import re
from itertools import product
from math import isclose
from pathlib import Path
from typing import Any

import openpyxl
import pytest

from engine.editions import EDITIONS
from engine.units import SYSTEMS
from tests.support.office import Office
from tests.support.story_books import story_book
from workbook_templates import native
from workbook_templates.build import build_native, write_native
from workbook_templates.draw import checks
from workbook_templates.parts import together
from xlbridge.headless.builtins import BUILTINS
from xlbridge.headless.compute import Computed, compute
from xlbridge.values import CellError, Scalar

BLANK: dict[str, Any] = {"edition": "7-22", "units": "us", "parts": ["drift"]}
CALLED = re.compile(r"\b([A-Z][A-Z0-9_.]*)\(")


def pair(folder: Path, given: dict[str, Any]) -> tuple[Computed, Path]:
    """The workbook with functions, computed, and its issue copy."""
    functions = compute(story_book(folder, given, name="functions.xlsx"))
    issue = folder / "issue.xlsx"
    issue.write_bytes(build_native(given, functions.values))
    return functions, issue


def same(a: Scalar, b: Scalar) -> bool:
    if isinstance(a, float) and isinstance(b, float):
        return isclose(a, b, rel_tol=1e-12, abs_tol=1e-12)
    return a == b and not isinstance(a, CellError)


@pytest.mark.parametrize(("edition", "units"), list(product(EDITIONS, SYSTEMS)))
def test_every_cell_gives_what_the_functions_give(
    tmp_path: Path, office: Office, edition: str, units: str
) -> None:
    given = {"edition": edition, "units": units, "parts": sorted(together(edition))}
    functions, path = pair(tmp_path, given)
    headless, calc = compute(path), office.values(path)
    assert not headless.not_evaluated
    compared = [place for place in headless.values if place in functions.values]
    assert len(compared) >= 1400
    expected = functions.values
    assert [p for p in compared if not same(headless.values[p], expected[p])] == []
    assert [p for p in compared if not same(calc[p], expected[p])] == []


def test_it_calls_built_in_functions_only_and_fixes_the_rest_visibly(tmp_path: Path) -> None:
    given = {**BLANK, "parts": sorted(together("7-22"))}
    functions, path = pair(tmp_path, given)
    book = openpyxl.load_workbook(path)
    cells = [c for sheet in book for row in sheet.iter_rows() for c in row if c.data_type == "f"]
    words = [re.sub(r'"[^"]*"', "", str(c.value)) for c in cells]
    assert {name for text in words for name in CALLED.findall(text)} <= set(BUILTINS)
    listed = list(book[native.SHEET].iter_rows(min_row=native.TOP + 1, values_only=True))
    assert len(listed) >= 100
    for sheet, address, value, formula, why in listed:
        cell = book[str(sheet)][str(address)]
        assert cell.value == value
        stored = float(value) if isinstance(value, int | float) else str(value)
        assert same(stored, functions.values[str(sheet), str(address)])
        assert cell.comment is not None
        assert str(formula) in cell.comment.text
        assert "ELF_" in str(formula)
        assert why
    count = compute(path).values[book["Checks"].title, f"D{checks.STATUS + 1}"]
    assert count == len(listed)


def test_a_plain_job_fixes_no_number_but_words(tmp_path: Path) -> None:
    _, path = pair(tmp_path, BLANK)
    listed = openpyxl.load_workbook(path)[native.SHEET].iter_rows(min_row=native.TOP + 1, values_only=True)
    assert [row for row in listed if not isinstance(row[2], str)] == []


def test_it_follows_a_changed_entry(tmp_path: Path) -> None:
    given = {**BLANK, "site": {"S_DS": 0.9}}
    functions, _ = pair(tmp_path, given)
    _, path = pair(tmp_path, BLANK)
    book = openpyxl.load_workbook(path)
    place = book.defined_names["S_DS"].attr_text.replace("$", "").split("!")
    book[place[0]][place[1]] = 0.9
    book.save(path)
    answer = compute(path).evaluator.evaluate_text("=C_s_X*V_X")
    assert answer == pytest.approx(functions.evaluator.evaluate_text("=C_s_X*V_X"), rel=1e-12)


def test_a_difference_stops_the_writing(tmp_path: Path, monkeypatch: pytest.MonkeyPatch) -> None:
    monkeypatch.setattr(native, "in_builtin_functions", lambda formula: "=-1")
    with pytest.raises(ValueError, match="built-in functions give another value in Cover!"):
        write_native(BLANK, tmp_path / "issue.xlsx")
    assert not (tmp_path / "issue.xlsx").exists()
