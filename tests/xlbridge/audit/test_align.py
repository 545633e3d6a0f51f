"""Which cell is which of the twin: whatever was put in between, and whatever was spoilt."""

from __future__ import annotations

from pathlib import Path

import pytest
from openpyxl import Workbook

from tests.support import office as offices
from tests.support.audited import changed, computed_book
from tests.support.legal_edits import OFFICE_EDITS, OfficeEdit
from tests.support.story_cells import COUNT, LAYOUT, Change, both, levels, put
from workbook_templates.layout import FIRST_LEVEL, STORY_TABLE, SYMBOL_ROW, TEXT_ROW
from xlbridge.audit.align import Alignment, area_of, first_cell
from xlbridge.audit.subject import Subject
from xlbridge.cli.own_template import own_template
from xlbridge.headless.compute import compute_into
from xlbridge.headless.references import MAX_ROWS, Bounds, Cell


@pytest.fixture(scope="module")
def story(tmp_path_factory: pytest.TempPathFactory) -> Path:
    return computed_book(tmp_path_factory.mktemp("align"), level_count=COUNT)


def opened(path: Path) -> Subject:
    return Subject.open(path, own_template)


def test_a_workbook_as_it_was_made_stands_where_its_twin_does(story: Path) -> None:
    subject = opened(story)
    assert subject.alignment.is_identity
    for cell in subject.book.formula_cells():
        assert subject.alignment.to_twin(cell) == cell == subject.alignment.from_twin(cell)


@pytest.mark.parametrize("edit", OFFICE_EDITS, ids=lambda edit: edit.__name__)
def test_each_cell_is_found_again_after_an_edit_in_calc(
    office: offices.Office, story: Path, tmp_path: Path, edit: OfficeEdit
) -> None:
    """What the twin has in a cell, the workbook has in the one that it is paired with."""
    with office.open(story, recalculate=False) as book:
        edit(book, COUNT)
        stored = book.store(tmp_path / "stored.xlsx")
    compute_into(stored, tmp_path / "edited.xlsx")
    subject = opened(tmp_path / "edited.xlsx")
    own, alignment = subject.own, subject.alignment
    assert own
    assert own.twin
    seen = 0
    for sheet, constants in own.twin.constants.items():
        for position, value in ((p, v) for p, v in constants.items() if v != ""):
            place = alignment.from_twin(Cell(sheet, *position))
            assert place
            assert subject.book.constants[place.sheet].get(place[1:]) == value, (sheet, position)
            assert alignment.to_twin(place) == Cell(sheet, *position)
            seen += 1
    assert seen > 500
    name = STORY_TABLE.name.casefold()
    mine, there = area_of(own.twin.names[None, name]), area_of(subject.book.names[None, name])
    assert mine
    assert alignment.area_from_twin(*mine) == there  # from its headings to the guard row below
    assert all(alignment.from_twin(cell) for cell in own.twin.formula_cells())


SYMBOL_X, SYMBOL_Y = levels("F_x", "X", SYMBOL_ROW), levels("F_x", "Y", SYMBOL_ROW)


@pytest.mark.parametrize(
    "change",
    [
        put(levels("h_x", row=TEXT_ROW), None),
        both(put(SYMBOL_X, "F_x Y"), put(SYMBOL_Y, "F_x X")),
        both(put("Criteria!B9", "S_DS"), put("Criteria!C9", None)),
        both(*(put(f"Checks!B{row}", "the same text") for row in range(12, 16))),
        both(*(put(levels("name", row=row), "Roof") for row in range(FIRST_LEVEL, FIRST_LEVEL + 3))),
        lambda book: book.defined_names.pop("T_L"),
    ],
)
def test_what_was_spoilt_does_not_move_cells(story: Path, tmp_path: Path, change: Change) -> None:
    copy = tmp_path / "story.xlsx"
    copy.write_bytes(story.read_bytes())
    assert opened(changed(copy, change)).alignment.is_identity


def test_rows_that_nothing_names_are_told_by_what_they_hold(story: Path, tmp_path: Path) -> None:
    """Levels without any text, and between them a row of formulas without entries, which is none."""

    def change(book: Workbook) -> None:
        for row in range(FIRST_LEVEL, FIRST_LEVEL + COUNT):
            book["Levels"].cell(row, 1).value = float(row)
            book["Levels"][levels("source", row=row)[7:]] = None
        for cell in (c for c in book["Levels"][FIRST_LEVEL + 2] if c.data_type != "f"):
            cell.value = None

    copy = tmp_path / "story.xlsx"
    copy.write_bytes(story.read_bytes())
    alignment = opened(changed(copy, change)).alignment
    rows = [alignment.from_twin(Cell("Levels", FIRST_LEVEL + n, 2)) for n in range(COUNT - 1)]
    assert [cell and cell.row - FIRST_LEVEL for cell in rows] == [0, 1, 3, 4, 5]


def test_ranges_follow_their_corners(story: Path) -> None:
    alignment = opened(story).alignment
    assert alignment.area_from_twin("Levels", Bounds(1, 1, MAX_ROWS, 3)) == (
        "Levels",
        Bounds(1, 1, MAX_ROWS, 3),
    )
    assert alignment.area_from_twin("Own", Bounds(1, 1, 2, 3)) == ("Own", Bounds(1, 1, 2, 3))
    beyond = Bounds(1, 1, LAYOUT.levels.total_row + 50, 2)
    assert alignment.area_from_twin("Levels", beyond) == ("Levels", beyond)


def test_what_is_in_no_pair_has_no_place() -> None:
    assert Alignment(()).to_twin(Cell("Levels", 1, 1)) is None
    assert Alignment(()).from_twin(Cell("Levels", 1, 1)) is None


@pytest.mark.parametrize(
    ("text", "cell"),
    [
        ("Criteria!$D$8", Cell("Criteria", 8, 4)),
        ("='It''s'!$A$6:$C$9", Cell("It's", 6, 1)),
        ("Criteria!#REF!", None),
        ("1.5", None),
    ],
)
def test_the_first_cell_of_a_name(text: str, cell: Cell | None) -> None:
    assert first_cell(text) == cell
