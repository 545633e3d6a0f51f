"""The parts of the period: every choice on the sheets and in the model route, every check line."""

from __future__ import annotations

from pathlib import Path
from typing import Any

import openpyxl
import pytest

from engine import period
from engine.building.parts.periods import NO_COMPUTED
from engine.errors import MissingValue
from tests.support import office as offices
from tests.support.story_books import assert_routes_agree, story_book
from workbook_templates.declare import Check
from workbook_templates.draw.criteria import AS_ABOVE
from workbook_templates.inputs import Inputs
from workbook_templates.layout import FIRST_LEVEL, LEVELS, Layout
from workbook_templates.parts import CORE, PARTS, period_sources, periods
from workbook_templates.read import Reader
from xlbridge.headless.compute import Computed, compute

COUNT = 4
LEAST = 90  # results that both routes have
ALL = ("periods", "walls", "rayleigh", "stiffness_period")
BLANK = {"edition": "7-22", "units": "us", "parts": list(ALL)}
LAYOUT = Layout(COUNT, frozenset({CORE, "stiffness", *ALL}))
LINES = (periods.PART, period_sources.WALLS, period_sources.RAYLEIGH)


def tables(folder: Path, edition: str = "7-22", units: str = "us") -> dict[str, Any]:
    """The entries of a workbook of starter values."""
    path = story_book(folder, {**BLANK, "edition": edition, "units": units}, COUNT, "start.xlsx")
    return Reader(compute(path).evaluator.evaluate_text).inputs()


def results(computed: Computed, direction: str = "X") -> dict[str, Any]:
    found: dict[str, Any] = Reader(computed.evaluator.evaluate_text).results()["direction"][direction]
    return found


def test_the_words_are_those_of_the_engine() -> None:
    assert periods.FORMULAS == period.PERIOD_FORMULAS
    assert periods.SOURCES == period.PERIOD_SOURCES
    assert all(f'"{system}"' in LAYOUT_FRAMES for system in period.MOMENT_FRAMES)
    assert periods.NO_COMPUTED == NO_COMPUTED


LAYOUT_FRAMES = next(q.formula for q in periods.APPROXIMATE.quantities if q.key == "frames")


@pytest.mark.parametrize(
    ("edition", "units"), [("7-16", "si"), ("7-22", "us"), ("7-16", "us"), ("7-22", "si")]
)
@pytest.mark.parametrize("rule", periods.FORMULAS)
@pytest.mark.parametrize("source", periods.SOURCES)
def test_every_choice_agrees_with_the_model_route(
    tmp_path: Path, edition: str, units: str, rule: str, source: str
) -> None:
    given = tables(tmp_path, edition, units)
    given["direction"]["X"] |= {
        "T_a_rule": rule,
        "T_source": source,
        "period_system": "concrete moment frame",
    }
    given["direction"]["Y"] |= {"T_computed": 0.9}
    computed = assert_routes_agree(story_book(tmp_path, given, name="chosen.xlsx"), LEAST)
    X, Y = results(computed), results(computed, "Y")
    key = {"C_t h_n^x": "T_a_height", "0.1 N": "T_a_stories", "shear walls": "T_a_walls"}[rule]
    assert X["T_a"] == X[key]
    unused = {"T_a_stories", "T_a_walls"} - {key}
    assert all(X[other] == "-" for other in unused)
    expected = {"entered": X["T_a"], "Rayleigh": X["T_rayleigh"], "story stiffness": X["T_stiffness"]}
    assert X["T_calculated"] == expected[source]
    assert X["T"] == min(X["T_calculated"], X["T_max"])
    assert Y["T_calculated"] == 0.9
    again = Reader(computed.evaluator.evaluate_text).inputs()
    assert again["wall"] == given["wall"]
    assert again["direction"] == given["direction"]


def test_what_governs_is_said_in_words(tmp_path: Path) -> None:
    given = tables(tmp_path)
    for T, words in ((None, NO_COMPUTED), (0.1, "the computed period"), (9.0, "upper limit C_u T_a")):
        given["direction"]["X"]["T_computed"] = T
        path = story_book(tmp_path, given, name=f"{words[:3]}.xlsx")
        assert results(compute(path))["T_governs"] == words


def test_an_entry_of_the_choice_brings_the_part(tmp_path: Path) -> None:
    given = tables(tmp_path)
    for direction in given["direction"].values():
        direction.pop("T_a_rule")
        direction.pop("T_source")
    job = {key: given[key] for key in ("edition", "units", "site", "direction")}
    job["level"] = [{key: level[key] for key in ("name", "elevation", "weight")} for level in given["level"]]
    plain = compute(story_book(tmp_path, job, name="plain.xlsx"))
    assert "T_governs" not in results(plain)
    job["direction"]["Y"]["T_a_rule"] = "0.1 N"
    chosen = assert_routes_agree(story_book(tmp_path, job, name="chosen.xlsx"), 60)
    assert results(chosen, "Y")["T_a"] == pytest.approx(0.1 * COUNT)


def test_periods_alone_bring_no_sheet_and_no_column() -> None:
    layout = Layout(COUNT, frozenset({CORE, "periods"}))
    assert layout.sheets == Layout(COUNT, frozenset({CORE})).sheets
    assert len(layout.table) == len(Layout(COUNT, frozenset({CORE})).table)


@pytest.mark.parametrize(
    ("entry", "part", "period"),
    [
        ({"T_a_rule": "shear walls"}, "walls", "T_a_walls"),
        ({"T_source": "Rayleigh"}, "rayleigh", "T_rayleigh"),
        ({"T_source": "story stiffness"}, "stiffness_period", "T_stiffness"),
    ],
)
def test_a_choice_brings_the_part_that_it_needs(
    tmp_path: Path, entry: dict[str, str], part: str, period: str
) -> None:
    given = {"edition": "7-22", "units": "us", "parts": ["periods"]}
    without = results(compute(story_book(tmp_path, given, COUNT, "without.xlsx")))
    assert without[period] == "-"
    chosen = given | {"direction": {"Y": entry}}
    assert part in Inputs(chosen, COUNT).parts
    computed = assert_routes_agree(story_book(tmp_path, chosen, COUNT), 80)
    assert isinstance(results(computed, "Y")[period], float)


def test_a_choice_made_in_a_workbook_without_its_part_shows_no_period(tmp_path: Path) -> None:
    path = story_book(tmp_path, {"edition": "7-22", "units": "us", "parts": ["periods"]}, COUNT)
    book = openpyxl.load_workbook(path)
    sheet, _, address = book.defined_names["T_source_X"].attr_text.partition("!")
    book[sheet][address.replace("$", "")] = "Rayleigh"
    book.save(path)
    assert str(compute(path).evaluator.evaluate_text("=T_X")).startswith("#")


def test_walls_without_rows_are_refused(tmp_path: Path) -> None:
    level = {"name": "Roof", "elevation": 12.0, "weight": 100.0}
    with pytest.raises(MissingValue, match="wall = blank: must have rows for the sheet Walls"):
        story_book(tmp_path, {**BLANK, "parts": ["walls"], "level": [level]})


def test_half_of_the_sway_is_refused(tmp_path: Path) -> None:
    level = {"name": "Roof", "elevation": 12.0, "weight": 100.0, "f_x_X": 10.0, "f_x_Y": 10.0}
    with pytest.raises(MissingValue, match="delta_f_X, delta_f_Y = blank: is needed at every level beside"):
        story_book(tmp_path, {"edition": "7-22", "units": "us", "level": [level]})


def verdicts(path: Path) -> dict[str, Any]:
    """The worst verdict of each check line by its text."""
    evaluator = compute(path).evaluator
    book = openpyxl.load_workbook(path)["Checks"]
    found: dict[str, Any] = {}
    for row in range(11, book.max_row + 1):
        if text := book[f"B{row}"].value:
            verdict = str(evaluator.evaluate_text(f"=Checks!I{row}"))
            found[text] = verdict if verdict != "✓ holds" else found.get(text, verdict)
    return found


def cell(key: str, row: int = FIRST_LEVEL, direction: str | None = "X") -> str:
    return f"{LAYOUT.column(key, direction)}{row}"


def edit_of(check: Check) -> tuple[str, str, object]:
    """One edit that the line must see."""
    walls, sway = period_sources.WALLS.checks, period_sources.RAYLEIGH.checks
    below = LAYOUT.grid("wall_name").base_row
    edits = {
        periods.PART.checks[0].text: ("Criteria", LAYOUT.criteria_cell("T_a_rule", "X"), "0.1 N"),
        periods.PART.checks[1].text: ("Criteria", LAYOUT.criteria_cell("T_computed", "Y"), 0.6),
        walls[0].text: ("Walls", cell("wall_direction", direction=None), "N"),
        walls[1].text: ("Walls", cell("wall_area", direction=None), None),
        walls[2].text: ("Walls", cell("wall_name", below, None), "Wall 9"),
        sway[0].text: (LEVELS, cell("f_x"), None),
        sway[1].text: (LEVELS, cell("delta_f"), None),
    }
    sheet, address, value = edits[check.text]
    return sheet, address.replace("$", ""), value


def test_every_line_holds_before_any_edit(tmp_path: Path) -> None:
    assert set(verdicts(story_book(tmp_path, BLANK, COUNT)).values()) == {"✓ holds"}


@pytest.mark.parametrize("check", [c for part in LINES for c in part.checks], ids=lambda check: check.text)
def test_the_line_sees_its_fault(tmp_path: Path, check: Check) -> None:
    given = BLANK | {"direction": {"Y": {"T_source": "Rayleigh"}}}
    path = story_book(tmp_path, given, COUNT)
    assert verdicts(path)[check.text] == "✓ holds"
    book = openpyxl.load_workbook(path)
    sheet, address, value = edit_of(check)
    book[sheet][address] = value
    book.save(path)
    found = verdicts(path)[check.text]
    assert found == "! look" if check.warning else found not in ("✓ holds", "! look")


@pytest.mark.parametrize("row", ["top", "bottom"])
def test_walls_put_in_count(office: offices.Office, tmp_path: Path, row: str) -> None:
    grid = LAYOUT.grid("wall_name")
    place = FIRST_LEVEL if row == "top" else grid.bottom_guard
    last = grid.columns[-1].letter
    given = BLANK | {"direction": {d: {"T_a_rule": "shear walls"} for d in ("X", "Y")}}
    path = story_book(tmp_path, given, COUNT)
    before = results(compute(path))["C_w"] + results(compute(path), "Y")["C_w"]
    with office.open(path, recalculate=False) as book:
        book.insert_rows("Walls", place)
        if row == "top":
            book.fill_up("Walls", f"A{place}:{last}{place + 1}")
        else:
            book.fill_down("Walls", f"A{place - 1}:{last}{place}")
        edited = book.store(tmp_path / "edited.xlsx")
    computed = assert_routes_agree(edited, LEAST)
    after = results(computed)["C_w"] + results(computed, "Y")["C_w"]
    assert after == pytest.approx(before * (COUNT + 1) / COUNT)


def test_levels_in_any_order_and_two_at_one_height(tmp_path: Path) -> None:
    given = tables(tmp_path)
    first, second, *rest = given["level"]
    given["level"] = [second, *rest[::-1], first, {**first, "name": "Penthouse"}]
    for source in periods.SOURCES[1:]:
        given["direction"] = {d: entries | {"T_source": source} for d, entries in given["direction"].items()}
        assert_routes_agree(story_book(tmp_path, given, name=f"{source}.xlsx"), LEAST)


def note_of(sheet: Any, row: int) -> str:
    """The note of a row, which may stand at a row above it."""
    while sheet[f"I{row}"].value == AS_ABOVE:
        row -= 1
    return str(sheet[f"I{row}"].value)


def test_doubts_are_marked_at_their_rows(tmp_path: Path) -> None:
    sheet = openpyxl.load_workbook(story_book(tmp_path, BLANK, COUNT))["Criteria"]
    notes = {key: note_of(sheet, LAYOUT.rows[key]) for key in ("T_a_stories", "T_a_walls", "C_w")}
    assert all("from memory" in note for note in notes.values())
    assert "0.00623" in notes["T_a_walls"]


@pytest.mark.parametrize("count", [1, 12, 100])
def test_level_counts(tmp_path: Path, count: int) -> None:
    assert_routes_agree(story_book(tmp_path, BLANK, count), 9 * count + 45)


def test_the_parts_stand_in_the_order_of_the_flow() -> None:
    keys = list(PARTS)
    assert keys.index("weights") < keys.index("periods") < keys.index("drift")
