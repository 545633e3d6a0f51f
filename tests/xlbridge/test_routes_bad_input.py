"""Bad input on every route: the formula in Python, the workbook, the plain-text file, the command.

Each route refuses, names the field or the cell, and gives no number that it would not give without it.
"""

from __future__ import annotations

import copy
import json
import tomllib
from collections.abc import Callable
from dataclasses import dataclass
from pathlib import Path
from typing import Any

import pytest
from openpyxl import Workbook, load_workbook

from engine import base_shear, drift, occupancy, period, vertical
from engine.building import from_mapping, solve
from engine.errors import EngineError
from tests.support.command import assert_refused, run, unchanged
from workbook_templates.build import build
from workbook_templates.demo import building_text
from workbook_templates.inputs import Inputs
from workbook_templates.layout import CHECKS, FIRST_LEVEL, LEVELS, Layout
from xlbridge.cli.files import building_text as as_toml
from xlbridge.headless.compute import Computed, compute
from xlbridge.values import CellError

COUNT, ROW = 4, 1  # levels of the building, and the one that is changed (from the top, counted from 0)
LAYOUT = Layout(COUNT, Inputs(tomllib.loads(building_text()), COUNT).parts)
HEIGHTS, WEIGHTS = [12.0, 24.0, 36.0], [300.0, 200.0, 100.0]
C_S = {"S_DS": 1.0, "S_D1": 0.6, "S_1": 0.6, "T": 1.5, "T_L": 8.0, "R": 8.0, "I_e": 1.0, "edition": "7-22"}
BLANK = object()


@dataclass(frozen=True)
class Case:
    """One bad value: where it stands on each route, and the words of each refusal.

    ``path`` leads to it in the tables of a BUILDING.toml; ``cell`` is a defined name, or the key of a
    level's column.
    """

    value: Any
    path: tuple[Any, ...]
    cell: str
    model: tuple[str, ...]
    python: Callable[[], Any]
    argument: str
    reason: str
    formula: str
    in_cell: Any = None

    @property
    def place(self) -> str:
        """The address of the cell in the workbook."""
        if self.cell in LAYOUT.rows or self.cell[:-2] in LAYOUT.rows:
            key, direction = (self.cell, None) if self.cell in LAYOUT.rows else (self.cell[:-2], "X")
            return f"Criteria!{LAYOUT.criteria_cell(key, direction)}".replace("$", "")
        return f"{LEVELS}!{LAYOUT.column(self.cell, None)}{FIRST_LEVEL + ROW}"


def factors(**changes: Any) -> Callable[[], Any]:
    call = {"weights": WEIGHTS, "heights": HEIGHTS, "k": 1.0, **changes}
    return lambda: vertical.distribution_factors(**call)


def coefficient(**changes: Any) -> Callable[[], Any]:
    return lambda: base_shear.response_coefficient(**{**C_S, **changes})


def weight(value: Any, *words: str, python: Any = None, **more: Any) -> Case:
    shown = "" if value is BLANK else json.dumps(value)
    return Case(
        *(value, ("level", ROW, "weight"), "w_x", ('level 2 ("Level 9")', "weight", *words)),
        python=factors(weights=[python or value] * 3),
        argument="weights",
        formula=f"=ELF_CVX(300,12,{{300;{shown or chr(34) * 2};100}},{{12;24;36}},1)",
        **more,
    )


def text(value: Any, path: tuple[Any, ...], cell: str, argument: str, python: Any, formula: str) -> Case:
    words = ("must be one of",)
    return Case(value, path, cell, (path[-1], repr(value), *words), python, argument, repr(value), formula)


def number(
    value: Any, path: tuple[Any, ...], cell: str, argument: str, python: Any, formula: str, *words: str
) -> Case:
    return Case(value, path, cell, (path[-1], *words), python, argument, f"{argument} = ", formula)


X = ("direction", "X")
HEIGHT = "=ELF_HX({0},0)"
CASES = {
    "blank weight": weight(BLANK, "blank", python=float("nan"), reason="NA()"),
    "text number": weight("1520", "must be a number", reason="NA()"),
    "boolean weight": weight(True, "must be a number", reason="NA()"),
    "level at the base": Case(
        *(100.0, ("level", ROW, "elevation"), "elevation", ('level 2 ("Level 9")', "above the base at 100")),
        *(factors(heights=[0.0, 24.0, 36.0]), "heights", "h_x = 0: must be above 0", HEIGHT.format(0)),
    ),
    "level below the base": Case(
        *(90.0, ("level", ROW, "elevation"), "elevation", ('level 2 ("Level 9")', "above the base at 100")),
        *(factors(heights=[-10.0, 24.0, 36.0]), "heights", "h_x = -10: must", HEIGHT.format(-10)),
    ),
    "T of 0": number(
        *(0.0, (*X, "T_computed"), "T_computed_X", "T_computed"),
        lambda: period.design_period(T_a=1.0, C_u=1.4, T_computed=0.0),
        *("=ELF_PERIOD(1,1.4,0)", "must be above 0"),
    ),
    "R of 0": number(
        *(0.0, (*X, "R"), "R_X", "R", coefficient(R=0.0)),
        *('=ELF_CS(1,0.6,0.6,1.5,8,0,1,"7-22")', "must be at least 1"),
    ),
    "blank R": number(
        *(BLANK, (*X, "R"), "R_X", "R", coefficient(R=None)),
        *('=ELF_CS(1,0.6,0.6,1.5,8,"",1,"7-22")', "blank"),
    ),
    "S_DS as text": number(
        *("1.0", ("site", "S_DS"), "S_DS", "S_DS", coefficient(S_DS="1.0")),
        *('=ELF_CS("1.0",0.6,0.6,1.5,8,8,1,"7-22")', "must be a number"),
    ),
    "negative S_1": number(
        *(-0.1, ("site", "S_1"), "S_1", "S_1", coefficient(S_1=-0.1)),
        *('=ELF_CS(1,0.6,-0.1,1.5,8,8,1,"7-22")', "must be at least 0"),
    ),
    "unknown edition": text(
        *("7-10", ("edition",), "edition", "edition", coefficient(edition="7-10")),
        '=ELF_CS(1,0.6,0.6,1.5,8,8,1,"7-10")',
    ),
    "unknown risk category": text(
        *("V", ("site", "risk_category"), "risk_category", "risk_category"),
        *(lambda: occupancy.importance_factor("V"), '=ELF_IE("V")'),
    ),
    "unknown period system": text(
        *("wood", (*X, "period_system"), "period_system_X", "system"),
        *(lambda: period.approximate_period(60.0, "wood", "us"), '=ELF_TA(60,"wood","us")'),
    ),
    "unknown drift structure": text(
        *("wood", (*X, "drift_structure"), "drift_structure_X", "structure"),
        *(lambda: drift.allowable_drift(12.0, "wood", "II"), '=ELF_DRIFT_LIMIT(12,"wood","II")'),
    ),
    "unknown units": text(
        *("metric", ("units",), "units", "units"),
        *(lambda: period.approximate_period(60.0, "all other", "metric"), '=ELF_TA(60,"all other","metric")'),
    ),
}
#: what no cell can hold, and what a workbook meets in a formula of its own
NOT_IN_A_CELL = {
    "not a number": number(
        *(float("nan"), ("site", "S_DS"), "S_DS", "S_DS", coefficient(S_DS=float("nan"))),
        *("", "must be a finite number"),
    ),
    "infinite weight": weight(float("inf"), "must be a finite number", reason=""),
    "negative weight": weight(-5.0, "must be at least 0", reason=""),
}
EVERYWHERE = {**CASES, **NOT_IN_A_CELL}


def tables() -> dict[str, Any]:
    given = tomllib.loads(building_text())
    return {**given, "level": given["level"][:COUNT]}


def spoiled(case: Case) -> dict[str, Any]:
    given = copy.deepcopy(tables())
    *way, last = case.path
    place: Any = given
    for key in way:
        place = place[key]
    if case.value is BLANK:
        del place[last]
    else:
        place[last] = case.value
    return given


@pytest.fixture(scope="module")
def good(tmp_path_factory: pytest.TempPathFactory) -> tuple[Path, Computed]:
    path = tmp_path_factory.mktemp("good") / "story.xlsx"
    path.write_bytes(build(tables()))
    computed = compute(path)
    assert not computed.errors
    return path, computed


def spoil(source: Path, target: Path, place: str, value: Any) -> Path:
    book = load_workbook(source)
    sheet, address = place.split("!")
    book[sheet][address] = value
    book.save(target)
    return target


def new_numbers(before: Computed, after: Computed) -> set[str]:
    """Cells outside the checks that hold another number than without the bad value."""
    return {
        f"{sheet}!{address}"
        for (sheet, address), value in after.values.items()
        if sheet != CHECKS and isinstance(value, float) and before.values.get((sheet, address)) != value
    }


@pytest.mark.parametrize("name", EVERYWHERE)
def test_python(name: str) -> None:
    with pytest.raises(EngineError) as caught:
        EVERYWHERE[name].python()
    assert caught.value.argument == EVERYWHERE[name].argument


@pytest.mark.parametrize("name", EVERYWHERE)
def test_plain_text(name: str) -> None:
    with pytest.raises(EngineError) as caught:
        solve(from_mapping(spoiled(EVERYWHERE[name])))
    for word in EVERYWHERE[name].model:
        assert word in str(caught.value)


@pytest.mark.parametrize("name", EVERYWHERE)
def test_solve_command(name: str, tmp_path: Path) -> None:
    path = tmp_path / "building.toml"
    path.write_text(as_toml(spoiled(EVERYWHERE[name])), encoding="utf-8")
    with unchanged(tmp_path):
        assert_refused(run("solve", path), "building.toml", *EVERYWHERE[name].model)
        assert_refused(run("new", tmp_path / "book.xlsx", "--from", path), *EVERYWHERE[name].model)


@pytest.mark.parametrize("name", CASES)
def test_workbook(name: str, good: tuple[Path, Computed], tmp_path: Path) -> None:
    case, (path, before) = CASES[name], good
    value = None if case.value is BLANK else case.value
    after = compute(spoil(path, tmp_path / "bad.xlsx", case.place, value))
    assert new_numbers(before, after) == set()
    assert len(after.errors) >= 15
    assert any(case.reason in error["reason"] for error in after.errors)
    assert not after.not_evaluated
    assert str(after.evaluator.evaluate_text("=workbook_status")).startswith("✗")


@pytest.mark.parametrize(
    ("key", "value", "base"),
    [("w_x", -5.0, 100.0), ("elevation", "200", 100.0), ("elevation", None, -50.0), ("elevation", True, 0.0)],
    ids=["negative weight", "elevation as text", "blank elevation, base below 0", "boolean elevation"],
)
def test_workbook_with_a_level_that_its_own_formulas_read(
    key: str, value: Any, base: float, tmp_path: Path
) -> None:
    """Not the base shear, nor any force, from a smaller total or a level put at 0."""
    given = tables()
    given["site"]["base_elevation"] = base
    (tmp_path / "good.xlsx").write_bytes(build(given))
    before = compute(tmp_path / "good.xlsx")
    place = f"{LEVELS}!{LAYOUT.column(key, None)}{FIRST_LEVEL + ROW}"
    after = compute(spoil(tmp_path / "good.xlsx", tmp_path / "bad.xlsx", place, value))
    assert new_numbers(before, after) == set()


def test_workbook_with_an_unknown_word_for_yes_or_no(good: tuple[Path, Computed], tmp_path: Path) -> None:
    case = Case("", (), "moment_frames_only_X", (), lambda: None, "", "", "")
    after = compute(spoil(good[0], tmp_path / "bad.xlsx", case.place, "perhaps"))
    assert new_numbers(good[1], after) == set()


@pytest.mark.parametrize("name", CASES)
def test_calc_command(name: str, good: tuple[Path, Computed], tmp_path: Path) -> None:
    case = CASES[name]
    value = None if case.value is BLANK else case.value
    bad = spoil(good[0], tmp_path / "bad.xlsx", case.place, value)
    with unchanged(tmp_path, but=("out.xlsx",)):
        outcome = run("calc", bad, "-o", tmp_path / "out.xlsx")
    assert outcome.code == 1
    assert case.reason in outcome.out
    assert "with an error value" in outcome.out
    stored = load_workbook(tmp_path / "out.xlsx", data_only=True)
    assert any(str(cell.value).startswith("#") for row in stored[LEVELS].iter_rows() for cell in row)


@pytest.mark.parametrize("name", [*CASES, "negative weight"])
def test_eval_command(name: str) -> None:
    outcome = run("eval", EVERYWHERE[name].formula)
    assert outcome.code == 1
    assert outcome.out.startswith("#")
    assert "because ELF_" in outcome.out


@pytest.mark.parametrize(
    "code",
    ["NA()", "1/0", "SQRT(-1)", '"x"+1', "INDEX(A1:A2,9)"],
    ids=["N/A", "DIV/0", "NUM", "VALUE", "REF"],
)
@pytest.mark.parametrize("cell", ["w_x", "elevation", "P_x", "S_DS", "R_X"])
def test_an_error_value_in_a_workbook(
    cell: str, code: str, good: tuple[Path, Computed], tmp_path: Path
) -> None:
    case = Case("", (), cell, (), lambda: None, "", "", "")
    after = compute(spoil(good[0], tmp_path / "bad.xlsx", case.place, f"={code}"))
    assert new_numbers(good[1], after) == set()
    sheet, address = case.place.split("!")
    error = after.values[sheet, address]
    assert isinstance(error, CellError)
    assert sum(value == error for value in after.values.values()) >= 8


def test_a_table_without_levels(good: tuple[Path, Computed], tmp_path: Path) -> None:
    given = {**tables(), "level": []}
    with pytest.raises(EngineError, match="0 levels': must be 1 to 1000 levels"):
        from_mapping(given)
    book = load_workbook(good[0])
    for row in book[LEVELS].iter_rows(min_row=FIRST_LEVEL, max_row=FIRST_LEVEL + COUNT - 1):
        for cell in row:
            if not str(cell.value).startswith("="):
                cell.value = None
    book.save(tmp_path / "bad.xlsx")
    after = compute(tmp_path / "bad.xlsx")
    for name in ("V_X", "V_Y"):
        assert isinstance(after.evaluator.evaluate_text(f"={name}"), CellError)
    assert str(after.evaluator.evaluate_text("=workbook_status")).startswith("✗")


def test_more_than_a_thousand_levels(tmp_path: Path) -> None:
    level = tables()["level"][0]
    given = {**tables(), "level": [{**level, "elevation": 101.0 + n} for n in range(1001)]}
    with pytest.raises(EngineError, match="1001 levels': must be 1 to 1000 levels"):
        from_mapping(given)
    (tmp_path / "building.toml").write_text(as_toml(given), encoding="utf-8")
    assert_refused(run("solve", tmp_path / "building.toml"), "1001 levels", "1 to 1000")
    workbook = Workbook()
    sheet = workbook.active
    for row in range(1, 1002):
        sheet.cell(row, 1, float(row))
        sheet.cell(row, 2, 10.0)
    sheet["D1"], sheet["D2"] = "=ELF_VX(0,B1:B1001,A1:A1001)", "=ELF_VX(0,B1:B1000,A1:A1000)"
    workbook.save(tmp_path / "long.xlsx")
    values = compute(tmp_path / "long.xlsx").values
    assert values["Sheet", "D1"] == CellError("#NUM!")
    assert "1001 levels" in values["Sheet", "D1"].reason
    assert values["Sheet", "D2"] == 10_000.0


@pytest.mark.parametrize(
    ("cell", "formula", "reason"),
    [
        ("D1", "=ELF_NOPE(1)", "ELF_NOPE"),
        ("D1", "=Missing!A1", "Missing"),
        ("D1", "=D1+1", "circular"),
    ],
)
def test_what_cannot_be_evaluated(cell: str, formula: str, reason: str, tmp_path: Path) -> None:
    """An unknown function, a missing sheet, a cycle: named, stored as an error, and so is what needs it."""
    workbook = Workbook()
    workbook.active[cell], workbook.active["E1"], workbook.active["F1"] = formula, f"=2*{cell}", "=1+1"
    workbook.save(tmp_path / "book.xlsx")
    with unchanged(tmp_path, but=("out.xlsx",)):
        outcome = run("calc", tmp_path / "book.xlsx", "-o", tmp_path / "out.xlsx")
    assert outcome.code == 2
    assert f"Sheet!{cell}  not evaluated, because" in outcome.out
    assert reason in outcome.out
    stored = load_workbook(tmp_path / "out.xlsx", data_only=True).active
    assert [stored[address].value for address in (cell, "E1", "F1")] == ["#N/A", "#N/A", 2]


def test_a_story_workbook_without_its_story_table(good: tuple[Path, Computed], tmp_path: Path) -> None:
    book = load_workbook(good[0])
    del book[LEVELS]
    book.save(tmp_path / "bad.xlsx")
    after = compute(tmp_path / "bad.xlsx")
    assert len(after.not_evaluated) > 50
    assert any(LEVELS in entry["reason"] for entry in after.not_evaluated)
    assert new_numbers(good[1], after) == set()
    assert run("calc", tmp_path / "bad.xlsx", "-o", tmp_path / "out.xlsx").code == 2
    assert_refused(run("inputs", tmp_path / "bad.xlsx"), "bad.xlsx")
