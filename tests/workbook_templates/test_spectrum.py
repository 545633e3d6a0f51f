"""The sheet Spectrum: its ordinates by both routes, its chart, its check line, and periods of one's own."""

from __future__ import annotations

from pathlib import Path

import openpyxl
import pytest

from engine.building import from_mapping, solve, to_mapping
from engine.errors import ImpossibleValue
from tests.support.story_books import assert_routes_agree, story_book
from workbook_templates.layout import FIRST_LEVEL, Layout
from workbook_templates.parts import CORE, spectrum
from workbook_templates.read import Reader
from xlbridge.headless.compute import compute

BLANK = {"edition": "7-22", "units": "us", "parts": ["spectrum"]}
LAYOUT = Layout(6, frozenset({CORE, "spectrum"}))


def test_ordinates_by_hand(tmp_path: Path) -> None:
    """S_DS = 1.0, S_D1 = 0.5, T_L = 8: 0.4 at 0, plateau from 0.1 s to 0.5 s, S_D1/T, 0.5·8/10² at 10 s."""
    computed = assert_routes_agree(story_book(tmp_path, BLANK), 100)
    found = Reader(computed.evaluator.evaluate_text).results()
    ordinates = dict(zip(spectrum.PERIODS, found["S_a"], strict=True))
    assert [ordinates[T] for T in (0.0, 0.05, 0.1, 0.5, 1.0, 8.0, 10.0)] == pytest.approx(
        [0.4, 0.7, 1.0, 1.0, 0.5, 0.0625, 0.04]
    )
    assert found["S_aM"] == pytest.approx([1.5 * value for value in found["S_a"]])


def test_periods_of_ones_own_go_round(tmp_path: Path) -> None:
    tables = Reader(compute(story_book(tmp_path, BLANK)).evaluator.evaluate_text).inputs()
    tables["spectrum"] = [{"T": 0.3}, {"T": 2.0}]
    again = assert_routes_agree(story_book(tmp_path, tables, name="own.xlsx"), 70)
    assert Reader(again.evaluator.evaluate_text).inputs()["spectrum"] == tables["spectrum"]
    assert to_mapping(from_mapping(tables))["spectrum"] == tables["spectrum"]
    assert solve(from_mapping(tables)).more["S_a"] == pytest.approx([1.0, 0.25])


def test_a_building_with_levels_gets_periods_to_start_with(tmp_path: Path) -> None:
    level = {"name": "Roof", "elevation": 12.0, "weight": 100.0}
    computed = assert_routes_agree(story_book(tmp_path, {**BLANK, "level": [level]}), 60)
    rows = Reader(computed.evaluator.evaluate_text).inputs()["spectrum"]
    assert [row["T"] for row in rows] == list(spectrum.PERIODS)


def test_a_period_below_0_is_refused(tmp_path: Path) -> None:
    tables = Reader(compute(story_book(tmp_path, BLANK)).evaluator.evaluate_text).inputs()
    with pytest.raises(ImpossibleValue, match="spectrum 1: T = -1: must be at least 0"):
        from_mapping({**tables, "spectrum": [{"T": -1.0}]})


def test_an_overwritten_ordinate_fails_its_line(tmp_path: Path) -> None:
    path = story_book(tmp_path, BLANK)
    book = openpyxl.load_workbook(path)
    book["Spectrum"][f"{LAYOUT.column('S_a', None)}{FIRST_LEVEL + 3}"] = 1.2
    book.save(path)
    (line,) = (c.row for c in book["Checks"]["B"] if c.value == spectrum.CHECKS[0].text)
    assert compute(path).evaluator.evaluate_text(f"=Checks!I{line}") == "✗ does not hold"


def test_the_chart_refers_to_the_table_and_to_both_periods(tmp_path: Path) -> None:
    chart = openpyxl.load_workbook(story_book(tmp_path, BLANK))["Figures"]._charts[-1]
    places = [(series.xVal.numRef.f, series.yVal.numRef.f) for series in chart.series]
    assert [x.split("!")[0].strip("'") for x, _ in places] == ["Spectrum", "Spectrum", "Criteria", "Criteria"]
    assert places[0][1] == f"'Spectrum'!{LAYOUT.level_range('S_a', None)}"
    assert places[3] == tuple(f"'Criteria'!{LAYOUT.criteria_cell(key, 'Y')}" for key in ("T", "S_a_T"))
