"""The sheet Weights: its rows feed the story table, and every check line sees what it is there for."""

from __future__ import annotations

from collections.abc import Callable
from pathlib import Path
from typing import Any

import openpyxl
import pytest

from engine.building import DIRECTIONS, from_mapping, solve
from engine.building.records import WEIGHT_KINDS
from engine.errors import MissingValue
from tests.support import office as offices
from tests.support.story_books import assert_routes_agree, story_book
from workbook_templates.layout import FIRST_LEVEL, LEVELS, Layout
from workbook_templates.parts import CORE, weights
from workbook_templates.read import Reader, ReadError
from xlbridge.headless.compute import Computed, compute

COUNT = 3
LEAST = 60  # results that both routes have
SHEET = weights.PART.tables[0].sheet
BLANK = {"edition": "7-22", "units": "us", "parts": ["weights"]}
LAYOUT = Layout(COUNT, frozenset({CORE, "weights"}))


def verdicts(computed: Computed, path: Path) -> dict[str, Any]:
    """The verdict of each check line by its text, an error by its code."""
    book = openpyxl.load_workbook(path)["Checks"]
    rows = [row for row in range(11, book.max_row + 1) if book[f"B{row}"].value]
    return {str(book[f"B{row}"].value): computed.evaluator.evaluate_text(f"=Checks!I{row}") for row in rows}


def edited(folder: Path, sheet: str, address: str, value: object) -> dict[str, Any]:
    path = story_book(folder, BLANK, COUNT)
    book = openpyxl.load_workbook(path)
    book[sheet][address] = value
    book.save(path)
    return verdicts(compute(path), path)


def place(key: str, row: int = FIRST_LEVEL) -> str:
    return f"{LAYOUT.column(key, None)}{row}"


#: one edit for each check line but that of rows outside, which takes a row put in
EDITS: dict[str, tuple[str, str, object]] = {
    weights.CHECKS[0].text: (SHEET, place("row_weight", LAYOUT.grid("row_weight").total_row), 5.0),
    weights.CHECKS[1].text: (SHEET, place("weight_level"), "Attic"),
    weights.CHECKS[2].text: (LEVELS, place("w_x"), 999.0),
    weights.CHECKS[3].text: (SHEET, place("weight_amount"), 1000.0),
    weights.CHECKS[5].text: (SHEET, place("weight_level"), "Level 2"),
}


def test_every_line_holds_before_any_edit(tmp_path: Path) -> None:
    path = story_book(tmp_path, BLANK, COUNT)
    assert set(verdicts(compute(path), path).values()) == {"✓ holds"}


OUTSIDE = weights.CHECKS[4]


def test_every_line_has_an_edit() -> None:
    assert {*EDITS, OUTSIDE.text} == {check.text for check in weights.CHECKS}


@pytest.mark.parametrize(
    "check", [c for c in weights.CHECKS if c is not OUTSIDE], ids=lambda check: check.text
)
def test_the_line_sees_its_fault(tmp_path: Path, check: Any) -> None:
    sheet, address, value = EDITS[check.text]
    found = edited(tmp_path, sheet, address, value)[check.text]
    assert found == ("! look" if check.warning else "✗ does not hold")


@pytest.mark.parametrize(("edition", "units"), [("7-16", "si"), ("7-22", "us")])
def test_every_kind_agrees_with_the_model_route(tmp_path: Path, edition: str, units: str) -> None:
    tables = Reader(compute(story_book(tmp_path, BLANK, COUNT)).evaluator.evaluate_text).inputs()
    row = {"level": "Roof", "what": "a", "area": 200.0, "load": 70.0}
    tables["weight"] += [row | {"kind": kind} for kind in WEIGHT_KINDS]
    tables["weight"].append({"level": "L*", "what": "b", "kind": "equipment", "amount": 12.0})
    tables["level"][1]["name"] = tables["weight"][1]["level"] = "L*"  # no wildcard: the third stays apart
    path = story_book(tmp_path, {**tables, "edition": edition, "units": units}, name="kinds.xlsx")
    computed = assert_routes_agree(path, 80)
    found = Reader(computed.evaluator.evaluate_text)
    assert found.inputs()["weight"] == tables["weight"]
    assert found.results()["w_x"][1] == pytest.approx((1000.0 if units == "us" else 1e6) + 12.0)


def test_the_kinds_are_those_of_the_model_route() -> None:
    assert weights.KINDS == WEIGHT_KINDS


def test_levels_without_rows_are_refused(tmp_path: Path) -> None:
    level = {"name": "Roof", "elevation": 12.0, "weight": 100.0}
    with pytest.raises(MissingValue, match="weight = blank: must have rows for the sheet Weights"):
        story_book(tmp_path, {**BLANK, "level": [level]})


def test_a_missing_heading_is_named(tmp_path: Path) -> None:
    path = story_book(tmp_path, BLANK, COUNT)
    book = openpyxl.load_workbook(path)
    book[SHEET]["A6"] = "storey"
    book.save(path)
    with pytest.raises(ReadError, match="the weight take-off has no column headed level"):
        Reader(compute(path).evaluator.evaluate_text).inputs()


def insert_at_the_top(book: offices.Book, last: str) -> None:
    book.insert_rows(SHEET, FIRST_LEVEL)
    book.fill_up(SHEET, f"A{FIRST_LEVEL}:{last}{FIRST_LEVEL + 1}")


def insert_at_the_bottom(book: offices.Book, last: str) -> None:
    row = LAYOUT.grid("row_weight").bottom_guard
    book.insert_rows(SHEET, row)
    book.fill_down(SHEET, f"A{row - 1}:{last}{row}")


@pytest.mark.parametrize("edit", [insert_at_the_top, insert_at_the_bottom])
def test_rows_put_in_count(
    office: offices.Office, tmp_path: Path, edit: Callable[[offices.Book, str], None]
) -> None:
    with office.open(story_book(tmp_path, BLANK, COUNT), recalculate=False) as book:
        edit(book, LAYOUT.grid("row_weight").columns[-1].letter)
        path = book.store(tmp_path / "edited.xlsx")
    computed = assert_routes_agree(path, LEAST)
    assert computed.evaluator.evaluate_text("=W") == pytest.approx(1000.0 * (COUNT + 1))


def test_a_row_outside_the_guard_rows_fails_its_line(office: offices.Office, tmp_path: Path) -> None:
    with office.open(story_book(tmp_path, BLANK, COUNT), recalculate=False) as book:
        book.insert_rows(SHEET, FIRST_LEVEL - 1)
        book.set_value(SHEET, f"A{FIRST_LEVEL - 1}", "Roof")
        path = book.store(tmp_path / "edited.xlsx")
    assert verdicts(compute(path), path)[OUTSIDE.text] == "✗ does not hold"


def test_the_doubt_of_the_storage_exceptions_is_marked_at_the_column(tmp_path: Path) -> None:
    sheet = openpyxl.load_workbook(story_book(tmp_path, BLANK, COUNT))[SHEET]
    assert sheet[f"{LAYOUT.column('load_counts', None)}9"].value == "from memory"
    assert not sheet[f"{LAYOUT.column('row_weight', None)}9"].value


def stored(storage: float) -> dict[str, Any]:
    """Tables of one level of 100 kip dead load, with this much storage load [psf] on 1000 ft2."""
    roof = {"level": "Roof", "source": "invented"}
    return {
        **{"title": "Store (invented)", "edition": "7-16", "units": "us"},
        "site": {"S_DS": 1.0, "S_D1": 0.5, "S_1": 0.4, "T_L": 8.0, "risk_category": "II"},
        "direction": dict.fromkeys(DIRECTIONS, FRAME),
        "level": [{"name": "Roof", "elevation": 12.0, "source": "invented"}],
        "weight": [
            roof | {"what": "floor", "kind": "dead", "amount": 100.0},
            roof | {"what": "racks", "kind": "storage", "area": 1000.0, "load": storage},
            roof | {"what": "cars", "kind": "garage storage", "area": 1000.0, "load": 500.0},
        ],
    }


FRAME = {
    **{"system": "invented", "R": 5.0, "Omega_0": 2.5, "C_d": 5.0, "drift_structure": "all other"},
    "period_system": "all other",
}


@pytest.mark.parametrize(
    ("load", "storage", "status"), [(0.0, 0.0, "-"), (20.0, 5.0, "may be left out"), (20.1, 5.025, "counts")]
)
def test_storage_that_adds_little_may_be_left_out(
    tmp_path: Path, load: float, storage: float, status: str
) -> None:
    """12.7.2 from memory: 25 % of the load, left out where it adds at most 5 %; garages do not count."""
    tables = stored(load)
    found = solve(from_mapping(tables))
    assert found.more["rows_storage"] == pytest.approx([storage])
    assert found.more["storage_status"] == (status,)
    assert pytest.approx(100.0 + storage) == found.W
    assert_routes_agree(story_book(tmp_path, tables), 50)
