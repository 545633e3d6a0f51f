"""Levels put in, taken out and renamed in a real Calc, as a person would, then computed by both routes."""

from __future__ import annotations

from collections.abc import Callable
from pathlib import Path

import openpyxl
import pytest

from tests.support import office as offices
from tests.support.story_books import assert_routes_agree, story_book
from workbook_templates.inputs import BLANK_PARTS
from workbook_templates.layout import FIRST_LEVEL, LEVELS, Layout
from workbook_templates.parts import with_required
from workbook_templates.read import Reader
from xlbridge.headless.compute import compute

COUNT = 4
LAYOUT = Layout(COUNT, with_required(BLANK_PARTS))
LAST = LAYOUT.table[-1].letter
STORY = 4.0  # metres in the starter workbook of the SI system

Edit = Callable[[offices.Book], None]


def enter(book: offices.Book, row: int, name: str, elevation: float, displacement: float) -> None:
    entries = {"name": name, "elevation": elevation, "w_x": 3210.0, "source": "typed in", "P_x": 2222.0}
    for key, value in entries.items():
        book.set_value(LEVELS, f"{LAYOUT.column(key, None)}{row}", value)
    for direction in "XY":
        book.set_value(LEVELS, f"{LAYOUT.column('delta_xe', direction)}{row}", displacement)


def insert_at_the_top(book: offices.Book) -> None:
    book.insert_rows(LEVELS, FIRST_LEVEL)
    book.fill_up(LEVELS, f"A{FIRST_LEVEL}:{LAST}{FIRST_LEVEL + 1}")
    enter(book, FIRST_LEVEL, "Penthouse", STORY * COUNT + 3.0, 6.0 * COUNT + 5.0)


def insert_in_the_middle(book: offices.Book) -> None:
    row = FIRST_LEVEL + 2
    book.insert_rows(LEVELS, row)
    book.fill_down(LEVELS, f"A{row - 1}:{LAST}{row}")
    enter(book, row, "Mezzanine", STORY * 2.5, 6.0 * 2.4)


def insert_at_the_bottom(book: offices.Book) -> None:
    row = LAYOUT.bottom_guard
    book.insert_rows(LEVELS, row)
    book.fill_down(LEVELS, f"A{row - 1}:{LAST}{row}")
    enter(book, row, "Plaza", STORY * 0.5, 2.0)


def delete_the_first(book: offices.Book) -> None:
    book.delete_rows(LEVELS, FIRST_LEVEL)


def delete_in_the_middle(book: offices.Book) -> None:
    book.delete_rows(LEVELS, FIRST_LEVEL + 1, 2)


def delete_the_last(book: offices.Book) -> None:
    book.delete_rows(LEVELS, LAYOUT.bottom_guard - 1)


def delete_all_but_one(book: offices.Book) -> None:
    book.delete_rows(LEVELS, FIRST_LEVEL, COUNT - 1)


def rename(book: offices.Book) -> None:
    for row in range(FIRST_LEVEL, LAYOUT.bottom_guard):
        book.set_value(LEVELS, f"A{row}", f"Renamed {row}")


EDITS: dict[Edit, list[str]] = {
    insert_at_the_top: ["Penthouse", "Roof", "Level 4", "Level 3", "Level 2"],
    insert_in_the_middle: ["Roof", "Level 4", "Mezzanine", "Level 3", "Level 2"],
    insert_at_the_bottom: ["Roof", "Level 4", "Level 3", "Level 2", "Plaza"],
    delete_the_first: ["Level 4", "Level 3", "Level 2"],
    delete_in_the_middle: ["Roof", "Level 2"],
    delete_the_last: ["Roof", "Level 4", "Level 3"],
    delete_all_but_one: ["Level 2"],
    rename: ["Renamed 12", "Renamed 13", "Renamed 14", "Renamed 15"],
}


@pytest.mark.parametrize("edit", EDITS, ids=lambda edit: edit.__name__)
def test_edited_levels_are_in_every_sum(office: offices.Office, tmp_path: Path, edit: Edit) -> None:
    drawn = story_book(tmp_path, {"edition": "7-16", "units": "si"}, COUNT)
    with office.open(drawn, recalculate=False) as book:
        edit(book)
        edited = book.store(tmp_path / "edited.xlsx")
    computed = assert_routes_agree(edited, 26 * len(EDITS[edit]))
    levels = Reader(computed.evaluator.evaluate_text).inputs()["level"]
    assert [level["name"] for level in levels] == EDITS[edit]
    assert computed.evaluator.evaluate_text("=W") == pytest.approx(sum(level["weight"] for level in levels))
    assert computed.evaluator.evaluate_text("=Checks!D7") == 0.0


def test_a_level_outside_the_guard_rows_fails_a_check(office: offices.Office, tmp_path: Path) -> None:
    drawn = story_book(tmp_path, {"edition": "7-16", "units": "si"}, COUNT)
    with office.open(drawn, recalculate=False) as book:
        book.insert_rows(LEVELS, FIRST_LEVEL - 1)
        enter(book, FIRST_LEVEL - 1, "Lost", 99.0, 1.0)
        edited = book.store(tmp_path / "edited.xlsx")
    assert compute(edited).evaluator.evaluate_text("=Checks!D7") == 1.0


def test_built_in_formulas_of_the_workbook_agree_with_calc(office: offices.Office, tmp_path: Path) -> None:
    """Calc knows none of our functions: their cells get their values, all other formulas are Calc's to do."""
    drawn = story_book(tmp_path, {"edition": "7-22", "units": "us"}, 9)
    ours = compute(drawn).values
    workbook = openpyxl.load_workbook(drawn)
    for (sheet, address), value in ours.items():
        if "ELF_" in str(workbook[sheet][address].value):
            workbook[sheet][address].value = value
    workbook.save(tmp_path / "built_in.xlsx")
    theirs = office.values(tmp_path / "built_in.xlsx")
    assert len(theirs) > 150
    for key, value in theirs.items():
        expected = ours[key]
        if isinstance(expected, float):
            assert value == pytest.approx(expected, rel=1e-12, abs=1e-9), key
        else:
            assert value == expected, key
