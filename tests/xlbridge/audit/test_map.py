"""The expected formula of every cell: each way in which one can be spoilt is found at its cell."""

from __future__ import annotations

import re
from pathlib import Path
from shutil import copy

import pytest
from openpyxl import Workbook
from openpyxl.worksheet.formula import ArrayFormula

from tests.support.audited import audited, changed, computed_book, kinds_at
from tests.support.story_cells import COUNT, LAST, LAYOUT, Change, both, criteria, levels, put, rewrite
from workbook_templates.layout import FIRST_LEVEL, Layout
from workbook_templates.parts import with_required

F_X, C_VX, BELOW = levels("F_x", "X"), levels("C_vx", "X"), levels("F_x", "X", FIRST_LEVEL + 3)
TOTAL, H_BASE = levels("F_x", "X", LAYOUT.levels.total_row), levels("h_x", row=LAYOUT.levels.base_row)
H_X, GUARD, C_S, T = levels("h_x"), levels("w_x", row=LAST + 1), criteria("C_s", "X"), criteria("T", "X")
END = rf":(\$[A-Z]+\$){LAST + 1}"
ARRAY = ArrayFormula(f"{F_X[7:]}:{BELOW[7:]}", "=1*2")
FAULTS: dict[str, tuple[Change, str, set[str]]] = {
    "constant, another value": (put(F_X, 12.0), "constant_for_formula", {F_X}),
    "text for a formula": (put(C_S, "see letter"), "constant_for_formula", {C_S}),
    "formula cleared": (put(F_X, None), "formula_missing", {F_X}),
    "factor added": (rewrite(F_X, r"$", "*0.9"), "formula_differs", {F_X}),
    "array over two cells": (both(put(F_X, ARRAY), put(BELOW, None)), "formula_differs", {F_X, BELOW}),
    "row slip": (rewrite(H_X, rf"{FIRST_LEVEL + 2}", f"{FIRST_LEVEL + 3}"), "other_reference", {H_X}),
    "other direction": (rewrite(C_S, "D", "E"), "other_reference", {C_S}),
    "range misses rows": (rewrite(TOTAL, END, rf":\g<1>{LAST - 1}"), "range_shorter", {TOTAL}),
    "range takes the base in": (rewrite(TOTAL, END, rf":\g<1>{LAST + 2}"), "range_longer", {TOTAL}),
    "dollar lost": (rewrite(C_VX, r"\$(?=\d)", ""), "anchor_changed", {C_VX}),
    "guard row filled": (put(GUARD, 500.0), "stray_entry", {GUARD}),
    "fixed number": (put(H_BASE, 4.0), "constant_changed", {H_BASE}),
    "check held by hand": (put("Checks!I12", "✓ holds"), "check_disarmed", {"Checks!I12"}),
    "tolerance widened": (put("Checks!G12", 0.1), "check_disarmed", {"Checks!G12"}),
    "verdict turned": (rewrite("Checks!I12", "✗ does not hold", "✓ holds"), "check_disarmed", {"Checks!I12"}),
    "side of a check": (put("Checks!E12", "=D12"), "check_disarmed", {"Checks!E12"}),
    "failures not counted": (put("Checks!D7", 0), "check_disarmed", {"Checks!D7"}),
    "status typed in": (put("Levels!B2", "✓ all checks hold"), "check_disarmed", {"Levels!B2"}),
    "term added": (rewrite(T, r"$", "+0"), "formula_differs", {T}),
}


@pytest.fixture(scope="module")
def computed(tmp_path_factory: pytest.TempPathFactory) -> Path:
    return computed_book(tmp_path_factory.mktemp("map"), level_count=COUNT)


@pytest.fixture
def story(computed: Path, tmp_path: Path) -> Path:
    return Path(copy(computed, tmp_path / "story.xlsx"))


@pytest.mark.parametrize("fault", FAULTS)
def test_a_spoilt_formula_is_found_at_its_cell(story: Path, fault: str) -> None:
    change, kind, places = FAULTS[fault]
    outcome = audited(changed(story, change))
    found = [f for f in outcome.findings if f.kind.method == "map"]
    assert [(f.kind.key, {str(p) for p in f.places}) for f in found] == [(kind, places)]


def test_the_expected_formula_is_shown_beside_the_one_found(story: Path) -> None:
    outcome = audited(changed(story, rewrite(F_X, r"$", "*0.9")))
    seen = next(f for f in outcome.findings if f.kind.key == "formula_differs").observations[0]
    assert seen.found == f"{seen.expected}*0.9"


def test_a_constant_of_the_same_value_is_found_too(story: Path) -> None:
    value = float(audited(story).subject.evaluator.value("Levels", *_position(F_X)))  # type: ignore[arg-type]
    outcome = audited(changed(story, put(F_X, value)))
    assert kinds_at(outcome) == {F_X: {"constant_for_formula"}}
    assert "gives today" in outcome.findings[0].words


def test_one_change_down_a_column_is_one_finding(story: Path) -> None:
    rows = range(FIRST_LEVEL, LAST + 1)
    change = both(*(rewrite(levels("F_x", "X", row), r"$", "*0.9") for row in rows))
    found = [f for f in audited(changed(story, change)).findings if f.kind.method == "map"]
    assert [(f.kind.key, len(f.places)) for f in found] == [("formula_differs", COUNT)]


def test_a_column_pasted_as_values_is_one_finding(story: Path) -> None:
    change = both(*(put(levels("F_x", "X", row), 1.0 * row) for row in range(FIRST_LEVEL, LAST + 1)))
    found = [f for f in audited(changed(story, change)).findings if f.kind.method == "map"]
    assert [(f.kind.key, len(f.places)) for f in found] == [("constant_for_formula", COUNT)]


def test_a_row_without_formulas_is_one_finding(story: Path) -> None:
    def clear(book: Workbook) -> None:
        for cell in book["Levels"][FIRST_LEVEL + 2]:
            if cell.data_type == "f":
                cell.value = None

    found = [f for f in audited(changed(story, clear)).findings if f.kind.method == "map"]
    assert [f.kind.key for f in found] == ["row_not_filled"]
    assert len(found[0].places) > 10


def test_a_level_typed_below_the_table_is_not_picked_up(story: Path) -> None:
    row = LAYOUT.levels.total_row + 1

    def add(book: Workbook) -> None:
        for key, value in (("name", "Annex"), ("elevation", 99.0), ("w_x", 500.0)):
            book["Levels"][f"{LAYOUT.column(key, None)}{row}"] = value

    assert kinds_at(audited(changed(story, add))) == {f"Levels!A{row}": {"row_outside_table"}}


def test_an_entry_that_the_template_links_is_checked_as_a_formula(tmp_path: Path) -> None:
    path = computed_book(tmp_path, {"parts": ["diaphragm"]}, 3)
    layout = Layout(3, with_required(("diaphragm",)))
    place = f"Levels!{layout.column('w_px', None)}{FIRST_LEVEL}"
    assert audited(path).findings == ()
    found = kinds_at(audited(changed(path, rewrite(place, r"$", "*0.5"))))
    assert found[place] == {"formula_differs"}


def test_an_entry_linked_to_an_own_sheet_is_a_note(story: Path) -> None:
    place = levels("w_x")

    def link(book: Workbook) -> None:
        value = book["Levels"][place[7:]].value
        book.create_sheet("Take-off")["B3"] = value
        book["Levels"][place[7:]] = "='Take-off'!B3"

    outcome = audited(changed(story, link))
    assert kinds_at(outcome) == {place: {"entry_is_formula"}}
    assert outcome.findings[0].kind.severity == "note"


@pytest.mark.parametrize(
    ("sheet", "row", "kind"),
    [("Checks", 14, "check_disarmed"), ("Functions", 9, "line_missing")],
)
def test_a_row_deleted_is_one_finding(story: Path, sheet: str, row: int, kind: str) -> None:
    outcome = audited(changed(story, lambda book: book[sheet].delete_rows(row)))
    found = [f for f in outcome.findings if f.kind.key == kind and "is not there" in f.words]
    assert [[str(p) for p in f.places] for f in found] == [[sheet]]


@pytest.mark.parametrize(
    ("pattern", "text"),
    [
        (r"^=", "=+ "),
        (r"\(B", "( $b"),
        (r"(\$[A-Z]+\$\d+):", r"levels!\1:"),
    ],
)
def test_another_spelling_of_the_same_formula_is_none(story: Path, pattern: str, text: str) -> None:
    outcome = audited(changed(story, rewrite(TOTAL if ":" in pattern else levels("h_x"), pattern, text)))
    assert outcome.findings == ()


def _position(place: str) -> tuple[int, int]:
    found = re.fullmatch(r"Levels!([A-Z]+)(\d+)", place)
    assert found
    column = next(n for n, c in enumerate(LAYOUT.table, 1) if c.letter == found[1])
    return int(found[2]), column
