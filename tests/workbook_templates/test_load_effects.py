"""Load effects: factors of the combinations of both editions, and effects on members by hand.

Factors of the allowable-stress combinations of 7-22 as in a public calculation of a four-story wood
building; those of 7-16 as in R. Wang, Primer: ASCE 7-16 Seismic Chapters (2022); the others from memory.
"""

from __future__ import annotations

from pathlib import Path
from typing import Any

import openpyxl
import pytest

from engine.building import from_mapping, solve
from engine.errors import EngineError
from tests.support.story_books import assert_routes_agree, story_book
from workbook_templates.read import Reader

FRAME = {
    **{"system": "invented", "R": 6.0, "Omega_0": 2.5, "C_d": 5.0, "drift_structure": "all other"},
    "period_system": "all other",
}
BRACE = {"name": "Brace at A-1", "direction": "X", "D": 100.0, "L": 40.0, "S": 30.0, "Q_E": 60.0}


def house(
    edition: str = "7-16", members: tuple[dict[str, Any], ...] = (BRACE,), **site: Any
) -> dict[str, Any]:
    """Tables of a small building with rho = 1.3 in X: S_DS = 1.0."""
    given = {"S_DS": 1.0, "S_D1": 0.5, "S_1": 0.4, "T_L": 8.0, "risk_category": "II"}
    return {
        **{"title": "House (invented)", "edition": edition, "units": "us", "parts": ["load_effects"]},
        "site": given | site,
        "direction": {"X": FRAME | {"rho": 1.3}, "Y": dict(FRAME)},
        "level": [{"name": "Roof", "elevation": 12.0, "weight": 100.0, "source": "invented"}],
        "member": [dict(row) for row in members],
    }


def more(tables: dict[str, Any]) -> dict[str, Any]:
    return dict(solve(from_mapping(tables)).more)


@pytest.mark.parametrize(
    ("edition", "snow", "dead"),
    [
        ("7-16", [0.2, 0.0, 0.0, 0.75, 0.0], [1.4, 0.7, 1.14, 1.105, 0.46]),
        ("7-22", [0.15, 0.0, 0.0, 0.1, 0.0], [1.4, 0.7, 1.14, 1.105, 0.46]),
    ],
)
def test_factors(tmp_path: Path, edition: str, snow: list[float], dead: list[float]) -> None:
    """With S_DS = 1.0: 1.2 + 0.2, 0.9 - 0.2, 1.0 + 0.7 x 0.2, 1.0 + 0.525 x 0.2, 0.6 - 0.7 x 0.2."""
    tables = house(edition)
    found = more(tables)
    assert found["combination_name"] == ("2.3.6-6", "2.3.6-7", "2.4.5-8", "2.4.5-9", "2.4.5-10")
    assert found["c_S"] == pytest.approx(snow)
    assert found["c_dead"] == pytest.approx(dead)
    assert_routes_agree(story_book(tmp_path, tables), 84)


def test_effects_on_a_member(tmp_path: Path) -> None:
    """E_h = 1.3 x 60 = 78, E_v = 20, E_mh = 150; 120 + 20 + 78 + 40 + 6 and 90 - 20 - 78."""
    tables = house()
    found = more(tables)
    assert [float(found[key][0]) for key in ("E_h", "E_v", "E_mh")] == pytest.approx([78.0, 20.0, 150.0])
    assert found["U_most"] == pytest.approx([264.0])
    assert found["U_least"] == pytest.approx([-8.0])
    assert found["U_m_most"] == pytest.approx([336.0])
    assert found["U_m_least"] == pytest.approx([-80.0])
    assert_routes_agree(story_book(tmp_path, tables), 84)


@pytest.mark.parametrize(
    ("row", "expected"),
    [
        ({"Q_E": -60.0}, {"E_h": -78.0, "U_most": 264.0, "U_least": -8.0}),
        ({"direction": "Y"}, {"E_h": 60.0, "U_most": 246.0, "U_least": 10.0}),
        ({"E_cl": 110.0}, {"E_mh": 110.0, "U_m_most": 296.0}),
        ({"E_cl": 151.0}, {"E_mh": 150.0}),
        ({"D": -100.0}, {"E_v": -20.0, "U_least": -148.0}),
    ],
)
def test_signs_directions_and_capacity(
    tmp_path: Path, row: dict[str, Any], expected: dict[str, float]
) -> None:
    tables = house(members=(BRACE | row,))
    found = more(tables)
    assert {key: float(found[key][0]) for key in expected} == pytest.approx(expected)
    assert_routes_agree(story_book(tmp_path, tables), 84)


@pytest.mark.parametrize(
    ("site", "E_v"),
    [
        ({"vertical_case": "zero in Seismic Design Category B"}, 0.0),
        ({"vertical_case": "zero at the foundation-soil interface"}, 0.0),
        ({"S_av": 0.8}, 24.0),
        ({"S_av": 0.8, "vertical_case": "counted"}, 24.0),
    ],
)
def test_the_vertical_effect(tmp_path: Path, site: dict[str, Any], E_v: float) -> None:
    tables = house(**site)
    found = more(tables)
    assert found["E_v"] == pytest.approx([E_v])
    assert found["c_dead"][0] == pytest.approx(1.2 + E_v / 100)
    assert_routes_agree(story_book(tmp_path, tables), 84)


def test_entries_come_back_and_fixed_rows_do_not(tmp_path: Path) -> None:
    tables = house(members=(BRACE, BRACE | {"name": "Column B-2", "E_cl": 90.0}), S_av=0.9)
    computed = assert_routes_agree(story_book(tmp_path, tables), 84)
    back = Reader(computed.evaluator.evaluate_text).inputs()
    assert back["member"] == tables["member"]
    assert back["site"]["S_av"] == 0.9
    assert "combination" not in back


def test_a_member_inserted_by_hand_is_read(tmp_path: Path) -> None:
    path = story_book(tmp_path, house(members=(BRACE, BRACE | {"name": "Beam", "Q_E": 10.0})))
    book = openpyxl.load_workbook(path)
    sheet = book["Members"]
    headings = {cell.value: cell.column for cell in sheet[6]}
    sheet.cell(13, headings["Q_E"]).value = 20.0
    book.save(path)
    computed = assert_routes_agree(path, 84)
    found = Reader(computed.evaluator.evaluate_text).results()
    assert found["E_mh"] == [150.0, 50.0]


@pytest.mark.parametrize(
    ("row", "words"),
    [
        ({"direction": "Z"}, "direction = 'Z': must be one of X, Y"),
        ({"Q_E": None}, "Q_E"),
        ({"E_cl": -1.0}, "E_cl = -1: must be at least 0"),
    ],
)
def test_refusals_name_the_member(row: dict[str, Any], words: str) -> None:
    with pytest.raises(EngineError) as refused:
        from_mapping(house(members=(BRACE | row,)))
    assert words in str(refused.value)
    assert 'member 1 ("Brace at A-1")' in str(refused.value)


def test_a_direction_that_the_building_does_not_have() -> None:
    tables = house(members=(BRACE | {"direction": "Y"},))
    del tables["direction"]["Y"]
    with pytest.raises(
        EngineError, match=r'member 1 \("Brace at A-1"\): direction = \'Y\': must be one that is'
    ):
        from_mapping(tables)
