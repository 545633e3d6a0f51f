"""Names of levels are words: what a search would read as a pattern or an operator changes no count."""

from __future__ import annotations

from pathlib import Path

import openpyxl
import pytest

from tests.support.office import Office
from tests.support.story_books import story_book
from workbook_templates.layout import LEVELS
from xlbridge.headless.compute import compute

BLANK = {"edition": "7-22", "units": "us", "parts": []}
NAMES = [
    (["R*", "Roof", "Level 2"], 0),
    (["R?of", "Roof", "Level 2"], 0),
    (["<5", ">=2", "=Roof"], 0),
    (["~", "~~", "*"], 0),
    (["R*", "Roof", "R*"], 2),
    (["roof", "Roof", "Level 2"], 2),  # the same name in another case would not be told apart
    (["Level (2)", "Level [2]", "Level 2.0"], 0),
]
LINE = "Levels with a name that another level has"


def named(folder: Path, names: list[str | None]) -> tuple[Path, str]:
    """A workbook with these names, and the cell that counts those that stand twice."""
    path = story_book(folder, BLANK, len(names))
    book = openpyxl.load_workbook(path)
    for row, name in enumerate(names, 12):
        book[LEVELS][f"A{row}"].value = name
        book[LEVELS][f"A{row}"].data_type = "s" if name else "n"
    book.save(path)
    row = next(row for row in book["Checks"].iter_rows(min_row=11) if row[1].value == LINE)[0].row
    return path, f"D{row}"


@pytest.mark.parametrize(("names", "count"), NAMES, ids=[", ".join(names) for names, _ in NAMES])
def test_names_that_stand_twice(tmp_path: Path, office: Office, names: list[str | None], count: int) -> None:
    path, cell = named(tmp_path, names)
    assert compute(path).values["Checks", cell] == count
    assert office.values(path)["Checks", cell] == count


def test_a_level_without_a_name_fails_a_check(tmp_path: Path) -> None:
    path, _ = named(tmp_path, ["Roof", None, "Level 2"])
    computed = compute(path)
    rows = openpyxl.load_workbook(path)["Checks"].iter_rows(min_row=11)
    row = next(row for row in rows if row[1].value == "Levels without a name")[0].row
    assert computed.values["Checks", f"D{row}"] == 1
    assert str(computed.values["Checks", f"I{row}"]).startswith("✗")
