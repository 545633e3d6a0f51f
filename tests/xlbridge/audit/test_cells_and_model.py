"""The two proofs: every formula cell on its own, and every result from the inputs alone."""

from __future__ import annotations

from pathlib import Path

import openpyxl
import pytest
from openpyxl import Workbook

from engine.editions import EDITIONS
from engine.units import SYSTEMS
from tests.support.audited import audited, changed, computed_book, kinds_at
from workbook_templates.layout import STORY_TABLE
from workbook_templates.parts import together
from xlbridge.audit.audit import State
from xlbridge.audit.cells import TOLERANCE, agree
from xlbridge.headless.references import Cell
from xlbridge.headless.store import store
from xlbridge.values import CellError


@pytest.mark.parametrize("edition", EDITIONS)
@pytest.mark.parametrize("units", SYSTEMS)
def test_a_clean_workbook_is_verified_cell_by_cell(tmp_path: Path, edition: str, units: str) -> None:
    given = {"edition": edition, "units": units, "parts": list(together(edition))}
    outcome = audited(computed_book(tmp_path, given))
    assert outcome.findings == ()
    assert outcome.not_checked == ()
    assert outcome.checked_cells == outcome.formula_cells > 2000
    looked_at = {check.method: check.looked_at for check in outcome.checks}
    assert looked_at["cells"] == outcome.formula_cells
    assert looked_at["model"] > 1000


def test_a_stored_value_that_the_formula_does_not_give_is_found_at_its_cell(tmp_path: Path) -> None:
    path, stale = computed_book(tmp_path), tmp_path / "stale.xlsx"
    cell = column_cell(path, "F_x X")
    store(path, stale, {(cell.sheet, cell.address): 123.0})
    outcome = audited(stale)
    assert kinds_at(outcome) == {str(cell): {"stale_value"}}
    assert outcome.states[cell] is State.FINDING
    assert "123" in outcome.findings[0].words
    assert outcome.findings[0].observations[0].stored == 123.0


def test_a_formula_without_a_stored_value_is_never_verified(tmp_path: Path) -> None:
    outcome = audited(changed(computed_book(tmp_path), lambda book: None, recalculated=False))
    assert outcome.checked_cells == 0
    assert outcome.formula_cells > 100
    assert {finding.kind.key for finding in outcome.findings} == {"no_stored_value"}
    assert set(outcome.states.values()) == {State.NOT_CHECKED}


def test_a_result_altered_in_its_cell_differs_from_the_model(tmp_path: Path) -> None:
    path = computed_book(tmp_path)
    cell = column_cell(path, "F_x X")

    def add(book: Workbook) -> None:
        book[cell.sheet][cell.address].value += "*1.01"

    found = kinds_at(audited(changed(path, add)))
    assert "differs_from_model" in found[str(cell)]


def test_an_entry_that_cannot_be_solved_is_named(tmp_path: Path) -> None:
    path = computed_book(tmp_path)
    cell = column_cell(path, "w_x")

    def negate(book: Workbook) -> None:
        book[cell.sheet][cell.address] = -1

    outcome = audited(changed(path, negate))
    unreadable = next(f for f in outcome.findings if f.kind.key == "inputs_unreadable")
    assert "weight" in unreadable.words
    assert any(item.what == "model route" for item in outcome.not_checked)
    failing = next(f for f in outcome.findings if f.kind.key == "error_value")
    assert any(place.sheet == "Levels" for place in failing.places)


def test_a_workbook_that_lost_the_name_of_its_table_is_ours_still(tmp_path: Path) -> None:
    def lose(book: Workbook) -> None:
        del book.defined_names[STORY_TABLE.name]

    outcome = audited(changed(computed_book(tmp_path), lose))
    assert [f.words for f in outcome.findings if f.kind.key == "inputs_unreadable"] == [
        f"{STORY_TABLE.name}: the workbook has no such name"
    ]


def test_a_workbook_of_another_make_gets_its_cells_checked_and_says_what_is_not(tmp_path: Path) -> None:
    path = tmp_path / "other.xlsx"
    book = Workbook()
    book.active.append([2, 3, "=A1*B1", "=TODAY()"])
    book.save(path)
    outcome = audited(changed(path, lambda book: None))
    assert (outcome.checked_cells, outcome.formula_cells) == (1, 2)
    expected = {"model route", "expected formulas", "expected labels and formats", "formula"}
    assert {item.what for item in outcome.not_checked} == {*expected, "physical plausibility"}


def test_values_agree_by_type_and_within_the_tolerance() -> None:
    assert agree(1.0, 1.0 + TOLERANCE / 2)
    assert not agree(1.0, 1.0 + 3 * TOLERANCE)
    assert agree(0.0, None)
    assert agree("kip", "kip")
    assert agree(CellError("#N/A"), CellError("#N/A"))
    for stored, value in ((1.0, True), (True, 1.0), ("1", 1.0), (1.0, "1"), (1.0, CellError("#NUM!"))):
        assert not agree(stored, value), (stored, value)


def column_cell(path: Path, heading: str, level: int = 2) -> Cell:
    """The cell of a level of the story table under a heading."""
    sheet = openpyxl.load_workbook(path)["Levels"]
    top, column = next((c.row, c.column) for row in sheet.iter_rows() for c in row if c.value == heading)
    first = next(r for r in range(top + 1, sheet.max_row) if sheet.cell(r, 1).value == "Roof")
    return Cell("Levels", first + level, column)
