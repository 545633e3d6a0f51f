"""``new --from``, ``calc``, ``inputs`` and ``solve`` on random buildings: the cells and the model agree."""

from __future__ import annotations

import json
import tomllib
from pathlib import Path
from typing import Any

import tomli_w
from hypothesis import HealthCheck, given, settings

from engine.building import from_mapping, to_mapping
from tests.support.buildings import buildings
from tests.support.command import run, unchanged
from workbook_templates.parts import PARTS
from workbook_templates.read import Reader
from xlbridge.audit.routes import compare
from xlbridge.headless.compute import open_workbook

DEFAULTS = {q.key: q.default for part in PARTS.values() for block in part.criteria for q in block.quantities}

FEW = settings(
    max_examples=14,
    deadline=None,
    suppress_health_check=[HealthCheck.function_scoped_fixture],
    derandomize=True,
)
#: results that the cells and the model have in common: of the building, and of a direction
BUILDING_RESULTS = 5  # I_e, T_0, T_S, W, h_n
LEVEL_COLUMNS = ("C_vx", "F_x", "V_x", "M_x", "Delta", "theta")


def steps(folder: Path, tables: dict[str, Any]) -> dict[str, Path]:
    """The files of one way round: inputs, workbook, computed copy, inputs read back."""
    files = {n: folder / n for n in ("in.toml", "book.xlsx", "computed.xlsx", "out.toml")}
    files["in.toml"].write_text(tomli_w.dumps(tables), encoding="utf-8")
    made = run("new", files["book.xlsx"], "--from", files["in.toml"], "--force")
    assert (made.code, made.err) == (0, "")
    with unchanged(folder, but=("computed.xlsx", "out.toml")):
        calc = run("calc", files["book.xlsx"], "-o", files["computed.xlsx"], "--force")
        assert (calc.code, calc.err) == (0, ""), calc
        read = run("inputs", files["computed.xlsx"], "-o", files["out.toml"], "--force")
        assert (read.code, read.out, read.err) == (0, "", "")
    return files


def solved(path: Path) -> dict[str, Any]:
    outcome = run("solve", path, "--json")
    assert (outcome.code, outcome.err) == (0, "")
    record: dict[str, Any] = json.loads(outcome.out)
    return record


@FEW
@given(buildings())
def test_the_cells_give_what_the_model_gives(tmp_path: Path, tables: dict[str, Any]) -> None:
    files = steps(tmp_path, tables)
    cells = Reader(open_workbook(files["computed.xlsx"]).evaluate_text).results()
    agreement = compare(cells, solved(files["in.toml"]))
    assert agreement.differences == ()
    levels, drift = len(tables["level"]), "P_x" in tables["level"][0]
    columns = len(LEVEL_COLUMNS) if drift else 4
    assert agreement.compared >= BUILDING_RESULTS + 2 * (10 + columns * levels)
    present = [key for key in LEVEL_COLUMNS if key in cells["direction"]["X"]]
    assert len(present) == columns


@FEW
@given(buildings(most=12))
def test_the_inputs_come_back_as_they_went_in(tmp_path: Path, tables: dict[str, Any]) -> None:
    files = steps(tmp_path, tables)
    back = tomllib.loads(files["out.toml"].read_text(encoding="utf-8"))
    assert solved(files["out.toml"]) == solved(files["in.toml"])
    assert back["level"] == tables["level"]
    assert {k: v for k, v in back["site"].items() if k in tables["site"]} == tables["site"]
    for name, table in tables["direction"].items():
        given_again = back["direction"][name]
        assert {k: v for k, v in given_again.items() if k in table} == {
            k: v for k, v in table.items() if k in given_again
        }
        assert all(DEFAULTS[k] == v for k, v in given_again.items() if k not in table)
        if "P_x" in tables["level"][0]:
            assert set(table) <= set(given_again)


def test_inputs_on_the_screen_are_inputs_in_the_file(tmp_path: Path) -> None:
    book, out = tmp_path / "a.xlsx", tmp_path / "a.toml"
    run("new", book, "--levels", "3", "--edition", "7-16", "--units", "si")
    run("inputs", book, "-o", out)
    shown = run("inputs", book)
    assert shown.out == out.read_text(encoding="utf-8")
    tables = tomllib.loads(shown.out)
    assert (tables["edition"], tables["units"], len(tables["level"])) == ("7-16", "si", 3)
    assert to_mapping(from_mapping(tables))["level"] == tables["level"]
    assert tables["sources"]["S_DS"] == "starter value"


def test_starter_values_stay_marked_on_their_way_through_a_file(tmp_path: Path) -> None:
    first, tables, second = tmp_path / "a.xlsx", tmp_path / "a.toml", tmp_path / "b.xlsx"
    run("new", first)
    run("inputs", first, "-o", tables)
    assert run("new", second, "--from", tables).code == 0
    for book in (first, second):
        status = open_workbook(book).evaluate_text("=workbook_status")
        assert "STARTER VALUES" in str(status)
