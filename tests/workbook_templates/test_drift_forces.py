"""Forces for drift on the sheet: both sets of forces, every route to C_s, every check line."""

from __future__ import annotations

from itertools import product
from pathlib import Path
from typing import Any

import openpyxl
import pytest

from engine.building.records import DRIFT_BASES
from engine.editions import EDITIONS
from engine.units import SYSTEMS
from tests.support.story_books import assert_routes_agree, story_book
from workbook_templates.declare import Check
from workbook_templates.layout import FIRST_LEVEL, LEVELS, Layout
from workbook_templates.parts import drift_forces, with_required
from workbook_templates.read import Reader
from xlbridge.headless.compute import Computed, compute

COUNT = 4
LEAST = 180  # results that both routes have
BLANK = {"edition": "7-22", "units": "us", "parts": ["drift_forces"]}
LAYOUT = Layout(COUNT, with_required(BLANK["parts"]))


def book(folder: Path, given: dict[str, Any] | None = None, **direction: Any) -> Path:
    """A workbook of starter values whose direction X has further entries."""
    return story_book(folder, {**BLANK, **(given or {}), "direction": {"X": direction}}, COUNT)


def results(computed: Computed, direction: str = "X") -> dict[str, Any]:
    found: dict[str, Any] = Reader(computed.evaluator.evaluate_text).results()["direction"][direction]
    return found


def test_the_words_are_those_of_the_model_route() -> None:
    assert drift_forces.BASES == DRIFT_BASES


@pytest.mark.parametrize(("edition", "units"), list(product(EDITIONS, SYSTEMS)))
@pytest.mark.parametrize("basis", drift_forces.BASES)
@pytest.mark.parametrize("cap", ["without the cap", "with the cap"])
def test_every_choice_agrees_with_the_model_route(
    tmp_path: Path, edition: str, units: str, basis: str, cap: str
) -> None:
    given = {"edition": edition, "units": units}
    path = book(tmp_path, given, drift_basis=basis, drift_cap=cap, T_computed=4.0)
    computed = assert_routes_agree(path, LEAST)
    X, Y = results(computed), results(computed, "Y")
    assert X["T_drift"] == (4.0 if cap == "without the cap" else X["T_max"])
    assert X["V_x_used"] == X["V_x_drift" if basis == "drift forces" else "V_x"]
    assert X["F_x_used"] == X["F_x_drift" if basis == "drift forces" else "F_x"]
    assert Y["V_x_used"] == Y["V_x"]
    entries = Reader(computed.evaluator.evaluate_text).inputs()
    assert entries["parts"] == ["periods", "drift_forces"]
    assert entries["direction"]["X"]["drift_basis"] == basis


def test_theta_follows_the_choice(tmp_path: Path) -> None:
    by = {basis: results(compute(book(tmp_path, drift_basis=basis, T_computed=4.0))) for basis in DRIFT_BASES}
    strength, relieved = by.values()
    ratios = [a / b for a, b in zip(relieved["theta"], strength["theta"], strict=True)]
    shears = [a / b for a, b in zip(strength["V_x"], relieved["V_x_drift"], strict=True)]
    assert ratios == pytest.approx(shears)
    assert strength["Delta"] == relieved["Delta"]


@pytest.mark.parametrize(
    ("edition", "parts", "site", "direction", "bound"),
    [
        ("7-22", ["multi_period"], {}, {"C_s_method": "method 1"}, "spectrum S_a/(R/I_e), Eq. 12.8-2"),
        ("7-22", ["multi_period"], {}, {}, "cap S_D1/(T R/I_e), Eq. 12.8-4"),
        ("7-16", ["site_class"], {}, {}, "cap S_D1/(T R/I_e), Eq. 12.8-3"),
        (
            "7-16",
            ["site_class"],
            {"S_S": 1.5, "site_class": "D", "long_exception": "exception 2: C_s increased"},
            {},
            "upper bound increased, exception 2 of 11.4.8",
        ),
        ("7-22", ["short_building"], {"S_DS": 1.6}, {"T_computed": 0.3}, "plateau S_DS/(R/I_e), Eq. 12.8-3"),
    ],
)
def test_every_route_to_the_coefficient_agrees(
    tmp_path: Path,
    edition: str,
    parts: list[str],
    site: dict[str, Any],
    direction: dict[str, Any],
    bound: str,
) -> None:
    given = {"edition": edition, "parts": ["drift_forces", *parts], "site": site}
    entries = {"drift_basis": "drift forces", "T_computed": 4.0} | direction
    computed = assert_routes_agree(book(tmp_path, given, **entries), LEAST)
    assert results(computed)["drift_bound"] == bound


@pytest.mark.parametrize("T_computed", [0.3, 0.9])
def test_the_capped_S_DS_serves_for_drift_too(tmp_path: Path, T_computed: float) -> None:
    """12.8.1.3 by hand: S_DS 1.6 counts as max(1.0, 0.7 x 1.6) = 1.12, over R/I_e = 3.

    The condition T of at most 0.5 s is one on the period for strength: a longer one for drift alone keeps it.
    """
    answers = {"S_DS": 1.6, "S_D1": 1.2, "N": 3, "regular": True, "redundant": True, "soft_site": False}
    given = {**BLANK, "site": answers, "parts": ["drift_forces", "short_building"]}
    given["direction"] = {"X": {"T_computed": T_computed, "drift_basis": "drift forces"}}
    X = results(assert_routes_agree(story_book(tmp_path, given, 3), 150))
    assert X["T"] <= 0.5
    assert X["T_drift"] == T_computed
    assert X["C_s_drift"] == pytest.approx(1.12 / 3)


@pytest.mark.parametrize("basis", DRIFT_BASES)
def test_story_stiffness_from_the_period_to_theta(tmp_path: Path, basis: str) -> None:
    """Of K_x alone: T, both sets of forces, displacements; theta = P_x/(K_x h_sx) by mechanics."""
    parts = ["drift_forces", "stiffness_period", "stiffness_route"]
    entries = {"T_source": "story stiffness", "drift_basis": basis}
    path = story_book(tmp_path, {**BLANK, "parts": parts, "direction": {"X": entries}}, COUNT)
    computed = assert_routes_agree(path, LEAST)
    X, levels = results(computed), Reader(computed.evaluator.evaluate_text).inputs()["level"]
    assert X["T_drift"] == X["T_stiffness"] > X["T"] == X["T_max"]
    assert X["V_drift"] < X["V"]
    expected = [level["P_x"] / (level["K_x_X"] * 13 * 12) for level in levels]
    assert X["theta"] == pytest.approx(expected, rel=1e-12)


def verdict(path: Path, text: str) -> str:
    evaluator, sheet = compute(path).evaluator, openpyxl.load_workbook(path)["Checks"]
    rows = [row for row in range(11, sheet.max_row + 1) if sheet[f"B{row}"].value == text]
    found = [str(evaluator.evaluate_text(f"=Checks!I{row}")) for row in rows]
    return next((words for words in found if words != "✓ holds"), "✓ holds")


EDITS = {
    drift_forces.PART.checks[0].text: (LEVELS, f"{LAYOUT.column('F_x_drift', 'X')}{FIRST_LEVEL}"),
    drift_forces.PART.checks[1].text: (LEVELS, f"{LAYOUT.column('V_x_drift', 'X')}{LAYOUT.levels.base_row}"),
    drift_forces.PART.checks[2].text: ("Criteria", LAYOUT.criteria_cell("V_drift", "X").replace("$", "")),
}


@pytest.mark.parametrize("check", drift_forces.PART.checks, ids=lambda check: check.text)
def test_the_line_sees_its_fault(tmp_path: Path, check: Check) -> None:
    path = book(tmp_path, T_computed=4.0)
    assert verdict(path, check.text) == "✓ holds"
    workbook = openpyxl.load_workbook(path)
    sheet, address = EDITS[check.text]
    workbook[sheet][address] = 99_999.0
    workbook.save(path)
    assert verdict(path, check.text) == "✗ does not hold"


@pytest.mark.parametrize("count", [1, 12, 100])
def test_level_counts(tmp_path: Path, count: int) -> None:
    given = {**BLANK, "direction": {"Y": {"drift_basis": "drift forces"}}}
    assert_routes_agree(story_book(tmp_path, given, count), 35 * count)


def test_an_entry_brings_the_part_and_what_it_requires(tmp_path: Path) -> None:
    given = {"edition": "7-22", "units": "us", "direction": {"X": {"drift_basis": "drift forces"}}}
    found = Reader(compute(story_book(tmp_path, given, COUNT)).evaluator.evaluate_text).inputs()
    assert set(found["parts"]) == {"periods", "drift_forces"}
