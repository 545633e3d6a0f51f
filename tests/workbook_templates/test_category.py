"""Seismic Design Category worked out from both tables, and Table 11.6-1 alone with each of its conditions.

Limits of FEMA P-2082-1 (2020 NEHRP Provisions), section 11.6.
"""

from __future__ import annotations

from pathlib import Path
from typing import Any

import pytest

from engine.building import Package, from_mapping, solve
from engine.errors import NotApplicable
from tests.support.story_books import assert_routes_agree, story_book
from workbook_templates.read import Reader

FRAME = {
    **{"system": "invented", "R": 5.0, "Omega_0": 2.5, "C_d": 5.0, "drift_structure": "all other"},
    "period_system": "all other",
}


def low(height: float = 20.0, x: dict[str, Any] | None = None, **site: Any) -> dict[str, Any]:
    """Tables of a low building: S_DS is in the range of C, S_D1 in that of D, T_S = 0.625 s."""
    given = {"S_DS": 0.4, "S_D1": 0.25, "S_1": 0.2, "T_L": 8.0, "risk_category": "II"}
    return {
        **{"title": "Low building (invented)", "edition": "7-16", "units": "us", "parts": ["category"]},
        "site": given | site,
        "direction": {"X": FRAME | (x or {}), "Y": dict(FRAME)},
        "level": [{"name": "Roof", "elevation": height, "weight": 400.0, "source": "invented"}],
    }


def more(tables: dict[str, Any]) -> dict[str, Any]:
    package: Package = solve(from_mapping(tables))
    return dict(package.more)


@pytest.mark.parametrize(
    ("site", "SDC", "reason"),
    [
        ({}, "D", "Table 11.6-2 (S_D1); Table 11.6-1 (S_DS) gives C"),
        ({"S_D1": 0.132}, "C", "Table 11.6-1 (S_DS); Table 11.6-2 (S_D1) gives B"),
        ({"S_1": 0.75, "S_DS": 1.0, "S_D1": 0.6}, "E", None),
        ({"S_1": 0.75, "S_DS": 1.0, "S_D1": 0.6, "risk_category": "IV"}, "F", None),
        ({"risk_category": "IV", "S_DS": 0.2, "S_D1": 0.06}, "C", None),
    ],
)
def test_the_worse_table_governs(tmp_path: Path, site: dict[str, Any], SDC: str, reason: str | None) -> None:
    tables = low(**site)
    found = more(tables)
    assert found["SDC"] == SDC
    assert reason in (None, found["SDC_reason"])
    computed = assert_routes_agree(story_book(tmp_path, tables), 50)
    assert computed.evaluator.evaluate_text("=SDC") == SDC


ALONE = {"short_table_alone": True, "rigid_diaphragms": True}


@pytest.mark.parametrize(
    ("change", "SDC"),
    [
        ({}, "C"),
        ({"short_table_alone": False}, "D"),
        ({"rigid_diaphragms": False}, "D"),
        ({"S_1": 0.75, "S_DS": 0.4, "S_D1": 0.25}, "E"),
        ({"height": 62.0}, "C"),  # T_a = 0.442 s, 0.8 T_S = 0.5 s
        ({"height": 74.0}, "D"),  # T_a = 0.505 s
        ({"height": 62.0, "x": {"T_computed": 0.60}}, "C"),  # below T_S = 0.625 s
        ({"height": 62.0, "x": {"T_computed": 0.63}}, "D"),
    ],
)
def test_table_11_6_1_alone_and_each_of_its_conditions(
    tmp_path: Path, change: dict[str, Any], SDC: str
) -> None:
    tables = low(**(ALONE | change))
    assert more(tables)["SDC"] == SDC
    assert_routes_agree(story_book(tmp_path, tables), 50)


def test_the_plateau_must_give_C_s() -> None:
    flat = low(**ALONE, S_DS=0.34, S_D1=0.25)
    assert solve(from_mapping(flat)).direction["X"].more["on_plateau"] == "yes"
    near = low(**ALONE, S_1=0.7)
    package = solve(from_mapping(near))
    assert package.direction["X"].governing_bound.startswith("plateau")
    tall = low(height=120.0, **ALONE)
    assert solve(from_mapping(tall)).direction["X"].more["on_plateau"] == "no"


def test_the_period_for_drift_counts_where_drift_has_its_own(tmp_path: Path) -> None:
    """Without the cap the period for drift is above T_S, the one for strength below it."""
    tables = low(height=56.0, x={"T_computed": 0.70}, **ALONE)
    tables["parts"] = ["category", "drift_forces"]
    for level in tables["level"]:
        level |= {"P_x": 500.0, "delta_xe_X": 0.1, "delta_xe_Y": 0.1}
    package = solve(from_mapping(tables))
    x = package.direction["X"]
    assert x.T < package.T_S < x.more["T_drift"]
    assert x.more["T_drift_short"] == "no"
    assert_routes_agree(story_book(tmp_path, tables), 80)


def test_relief_that_is_wanted_and_not_permitted_asks_for_a_look(tmp_path: Path) -> None:
    computed = assert_routes_agree(story_book(tmp_path, low(**(ALONE | {"rigid_diaphragms": False}))), 50)
    assert "to be looked at" in str(computed.evaluator.evaluate_text("=workbook_status"))
    fine = assert_routes_agree(story_book(tmp_path, low(**ALONE), name="fine.xlsx"), 50)
    assert "to be looked at" not in str(fine.evaluator.evaluate_text("=workbook_status"))


def test_entries_come_back_and_bring_the_part(tmp_path: Path) -> None:
    tables = low(**ALONE)
    del tables["parts"]
    computed = assert_routes_agree(story_book(tmp_path, tables), 50)
    back = Reader(computed.evaluator.evaluate_text).inputs()
    assert "category" in back["parts"]
    assert {key: back["site"][key] for key in ALONE} == ALONE


def test_other_parts_take_the_category_that_is_worked_out(tmp_path: Path) -> None:
    tables = low()
    tables["parts"] = ["category", "redundancy"]
    package = solve(from_mapping(tables))
    assert package.more["SDC"] == "D"
    assert "SDC" not in tables["site"]
    assert_routes_agree(story_book(tmp_path, tables), 50)


def test_a_category_entered_as_well_is_refused() -> None:
    with pytest.raises(NotApplicable, match=r"site\.SDC = 'D': must be left out where the part"):
        from_mapping(low(SDC="D"))
