"""Two-stage procedure: both parts in one workbook, reactions amplified, every condition on both sides.

12.2.3.2 as quoted in a public engineering forum for items c and d; items a, b and e from memory.
"""

from __future__ import annotations

from pathlib import Path
from typing import Any

import openpyxl
import pytest

from engine.building import DirectionResult, from_mapping, solve
from engine.errors import EngineError
from tests.support.story_books import assert_routes_agree, story_book
from workbook_templates.read import Reader
from xlbridge.headless.compute import compute

UPPER = {
    **{"system": "wood walls", "R": 6.5, "Omega_0": 3.0, "C_d": 4.0, "rho": 1.3},
    **{"drift_structure": "all other", "period_system": "all other"},
}
LOWER = {
    **{"R_lower": 5.0, "rho_lower": 1.0, "period_system_lower": "all other"},
    **{"delta_upper": 1.0, "delta_lower": 0.05, "T_whole": 0.50, "T_upper": 0.48},
}


def podium(**x: Any) -> dict[str, Any]:
    """Tables of two stories of wood on two of concrete: S_DS = 1.0, everything on the plateau."""
    site = {"S_DS": 1.0, "S_D1": 0.6, "S_1": 0.4, "T_L": 8.0, "risk_category": "II"}
    return {
        **{"title": "Podium building (invented)", "edition": "7-16", "units": "us"},
        "site": site | {"base_elevation": 24.0, "lower_base": 0.0},
        "direction": {"X": UPPER | LOWER | x, "Y": UPPER | LOWER},
        "level": [
            {"name": "Roof", "elevation": 44.0, "weight": 130.0, "source": "invented"},
            {"name": "Level 3", "elevation": 34.0, "weight": 195.0, "source": "invented"},
        ],
        "lower": [
            {"name": "Podium", "elevation": 24.0, "weight": 500.0, "source": "invented"},
            {"name": "Level 1", "elevation": 12.0, "weight": 400.0, "source": "invented"},
        ],
    }


def x(tables: dict[str, Any]) -> DirectionResult:
    return solve(from_mapping(tables)).direction["X"]


def test_both_parts_by_hand(tmp_path: Path) -> None:
    """Upper V = 325/6.5 = 50; lower 900/5 = 180; factor (6.5/1.3)/(5/1) = 1.0, so the reaction is 50."""
    tables = podium()
    found = x(tables)
    more = found.more
    assert pytest.approx(50.0) == found.V
    assert more["V_lower"] == pytest.approx(180.0)
    assert (more["reaction_factor"], more["V_reaction"]) == pytest.approx((1.0, 50.0))
    share = 500 * 24 / (500 * 24 + 400 * 12)
    assert more["lower_F"] == pytest.approx([180 * share, 180 * (1 - share)])
    assert more["lower_V"] == pytest.approx([180 * share + 50.0, 230.0])
    M_upper = found.M_base
    assert more["lower_M"] == pytest.approx([M_upper, M_upper + 12 * (180 * share + 50.0)])
    assert (more["stiffness_upper"], more["stiffness_lower"]) == pytest.approx((50.0, 4600.0))
    assert more["two_stage_status"] == "✓ permitted"
    computed = assert_routes_agree(story_book(tmp_path, tables), 100)
    assert not str(computed.evaluator.evaluate_text("=workbook_status")).startswith("✗")


@pytest.mark.parametrize(("rho_lower", "factor"), [(1.3, 1.3), (1.0, 1.0)])
def test_the_factor_on_reactions(tmp_path: Path, rho_lower: float, factor: float) -> None:
    """(6.5/1.3)/(5/1.3) = 1.3."""
    tables = podium(rho_lower=rho_lower)
    more = x(tables).more
    assert more["reaction_factor"] == pytest.approx(factor)
    assert more["V_reaction"] == pytest.approx(50.0 * factor)
    assert_routes_agree(story_book(tmp_path, tables), 100)


def test_the_factor_is_never_below_one() -> None:
    assert x(podium(R_lower=8.0)).more["reaction_factor"] == 1.0


@pytest.mark.parametrize(
    ("change", "words"),
    [
        ({"delta_lower": 0.46}, "✓ permitted"),  # 230/0.46 = 500, ten times 50
        ({"delta_lower": 0.47}, "✗ not permitted: stiffness ratio below 10 (item a)"),
        ({"T_whole": 0.528}, "✓ permitted"),  # 1.1 times 0.48
        ({"T_whole": 0.53}, "✗ not permitted: "),
        ({"upper_procedure": "modal"}, "✓ permitted"),
        ({"upper_procedure": "another"}, "✗ not permitted: "),
        ({"lower_procedure": "modal"}, "✗ not permitted: "),
    ],
)
def test_conditions(tmp_path: Path, change: dict[str, Any], words: str) -> None:
    tables = podium(**change)
    assert x(tables).more["two_stage_status"].startswith(words)
    computed = assert_routes_agree(story_book(tmp_path, tables), 100)
    failed = str(computed.evaluator.evaluate_text("=workbook_status")).startswith("✗")
    assert failed is words.startswith("✗")


def test_a_discontinuity_at_the_transition() -> None:
    assert x(podium()).more["transition"] == "none"
    assert (
        x(podium(transition_discontinuity=True))
        .more["transition"]
        .startswith(
            "also apply the overstrength",
        )
    )


def test_a_computed_period_of_the_lower_part_is_limited(tmp_path: Path) -> None:
    tables = podium(T_lower_computed=5.0)
    more = x(tables).more
    assert more["T_lower"] == pytest.approx(1.4 * more["T_a_lower"])
    assert_routes_agree(story_book(tmp_path, tables), 100)


def test_entries_come_back(tmp_path: Path) -> None:
    tables = podium()
    computed = assert_routes_agree(story_book(tmp_path, tables), 100)
    back = Reader(computed.evaluator.evaluate_text).inputs()
    assert back["lower"] == tables["lower"]
    assert back["site"]["lower_base"] == 0.0
    assert {key: back["direction"]["X"][key] for key in LOWER} == LOWER


@pytest.mark.parametrize(
    ("address", "value", "line"),
    [
        ("B12", 25.0, "The top of the lower part is the base of the upper part"),
        ("C13", None, "Every level of the lower part has an elevation and a weight"),
        ("B13", -1.0, "Every level of the lower part lies above its base"),
    ],
)
def test_a_check_fails(tmp_path: Path, address: str, value: float | None, line: str) -> None:
    path = story_book(tmp_path, podium())
    book = openpyxl.load_workbook(path)
    book["Lower"][address].value = value
    book.save(path)
    computed = compute(path)
    row = next(row for row in book["Checks"].iter_rows(min_row=11) if row[1].value == line)[0].row
    assert str(computed.values["Checks", f"I{row}"])[0] != "✓"


@pytest.mark.parametrize(
    ("change", "words"),
    [
        (
            lambda t: t["site"].pop("lower_base"),
            "site.lower_base = blank: must be given beside rows of lower",
        ),
        (
            lambda t: t["direction"]["Y"].pop("T_whole"),
            "direction.Y.T_whole = blank: must be given beside rows",
        ),
        (lambda t: t["lower"][1].update(elevation=0.0), 'lower 2 ("Level 1"): elevation = 0: must be above'),
        (lambda t: [row.update(weight=0.0) for row in t["lower"]], "at least one level must have a weight"),
    ],
)
def test_refusals(change: Any, words: str) -> None:
    tables = podium()
    change(tables)
    with pytest.raises(EngineError) as refused:
        from_mapping(tables)
    assert words in str(refused.value)
