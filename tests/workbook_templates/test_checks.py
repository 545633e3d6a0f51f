"""Every check line of the plain parts is seen to fail: one edit of a sound workbook for each."""

from __future__ import annotations

from pathlib import Path

import openpyxl
import pytest
from openpyxl.workbook import Workbook

from tests.support.story_books import story_book
from workbook_templates.layout import FIRST_LEVEL, LEVELS, ROLE_ROW, Layout
from workbook_templates.parts import PARTS
from xlbridge.headless.compute import compute

COUNT = 4
PLAIN = ("story", "drift", "diaphragm")
LAYOUT = Layout(COUNT, frozenset(PLAIN))
ROW, BASE_ROW = FIRST_LEVEL + 1, LAYOUT.grids[0].base_row

#: how the text of a check begins -> a cell (defined name, or level column and row) and its new content
EDITS: dict[str, tuple[str | tuple[str, int], object]] = {
    "Every level has an elevation": (("elevation", ROW), None),
    "Every level has a seismic weight": (("w_x", ROW), None),
    "Every level lies above the base": (("elevation", ROW), -5.0),
    "Levels without a name": (("name", ROW), None),
    "Levels with a name that another level has": (("name", ROW), "Roof"),
    "Levels at the elevation of another level": (("elevation", ROW), 52.0),
    "Rows outside the guard rows of the story table": (("name", ROLE_ROW), None),
    "S_D1 is not above S_DS": ("S_D1", 2.0),
    "Sum of C_vx is 1": (("C_vx", ROW), 0.9),
    "Sum of F_x is V": (("F_x", ROW), 1.0),
    "Story shear at the base is V": (("V_x", BASE_ROW), 1.0),
    "Overturning moment at the base": (("M_x", BASE_ROW), 1.0),
    "Period used is not above C_u T_a": ("T_X", 99.0),
    "Every story has displacements": (("delta_xe", ROW), None),
    "Largest drift over its limit": (("delta_xe", FIRST_LEVEL), 50.0),
    "Largest theta is not above theta_max": (("theta", ROW), 0.9),
    "theta_max is at least 0.10": ("theta_max_X", 0.05),
    "Levels whose w_px is above their weight": (("w_px", ROW), 1e6),
}
CHECKS = [check for key in PLAIN for check in PARTS[key].checks]


@pytest.fixture(scope="module")
def sound(tmp_path_factory: pytest.TempPathFactory) -> Path:
    given = {"edition": "7-22", "units": "us", "parts": list(PLAIN)}
    return story_book(tmp_path_factory.mktemp("checks"), given, COUNT)


def verdicts(path: Path) -> tuple[dict[tuple[str, str], object], float]:
    """Return the verdict of each line by text and direction, and how many the status counts as failing."""
    values = compute(path).values
    sheet = openpyxl.load_workbook(path)["Checks"]
    lines = {
        (str(row[1].value), str(row[2].value)): values["Checks", row[8].coordinate]
        for row in sheet.iter_rows(min_row=11)
        if row[1].value
    }
    failing = values["Checks", "D7"]
    assert isinstance(failing, float)
    return lines, failing


def edit(workbook: Workbook, place: str | tuple[str, int], content: object) -> None:
    if isinstance(place, str):
        sheet, _, address = workbook.defined_names[place].attr_text.partition("!")
        workbook[sheet][address.replace("$", "")].value = content  # type: ignore[union-attr]
    else:
        key, row = place
        workbook[LEVELS][f"{LAYOUT.column(key, 'X')}{row}"].value = content  # type: ignore[union-attr]


def test_every_line_of_a_sound_workbook_holds(sound: Path) -> None:
    lines, failing = verdicts(sound)
    assert set(lines.values()) == {"✓ holds"}
    assert failing == 0.0
    assert len(lines) == sum(2 if check.per_direction else 1 for check in CHECKS)


def test_every_check_has_its_edit() -> None:
    found = [[start for start in EDITS if check.text.startswith(start)] for check in CHECKS]
    assert [len(starts) for starts in found] == [1] * len(CHECKS)
    assert len(EDITS) == len({starts[0] for starts in found})


@pytest.mark.parametrize("start", EDITS)
def test_a_line_fails_when_its_rule_is_broken(sound: Path, tmp_path: Path, start: str) -> None:
    check = next(check for check in CHECKS if check.text.startswith(start))
    workbook = openpyxl.load_workbook(sound)
    edit(workbook, *EDITS[start])
    workbook.save(tmp_path / "edited.xlsx")
    lines, failing = verdicts(tmp_path / "edited.xlsx")
    broken = lines[check.text, "X" if check.per_direction else "both"]
    assert broken == ("! look" if check.warning else "✗ does not hold")
    assert failing == sum(verdict not in ("✓ holds", "! look") for verdict in lines.values())


@pytest.mark.parametrize(("ratio", "words"), [(1.0, "✓ within limit"), (1.0 + 1e-9, "✗ above limit")])
def test_the_drift_verdict_on_both_sides_of_its_limit(
    sound: Path, tmp_path: Path, ratio: float, words: str
) -> None:
    workbook = openpyxl.load_workbook(sound)
    edit(workbook, ("drift_over_limit", ROW), ratio)
    workbook.save(tmp_path / "edited.xlsx")
    verdict = LAYOUT.column("drift_verdict", "X")
    assert compute(tmp_path / "edited.xlsx").values[LEVELS, f"{verdict}{ROW}"] == words
