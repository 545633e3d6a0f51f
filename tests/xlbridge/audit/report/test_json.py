"""The audit as JSON: what its schema says, and nothing else."""

from __future__ import annotations

import json
from importlib.resources import files
from pathlib import Path
from typing import Any

import jsonschema
import pytest
from openpyxl import Workbook

from tests.support.audited import audited, changed, computed_book
from tests.support.command import run
from xlbridge.audit.kinds import Severity
from xlbridge.audit.methods import METHODS
from xlbridge.audit.report.as_json import record
from xlbridge.audit.report.page import CAUTIONS

SCHEMA = json.loads(files("xlbridge.audit.report").joinpath("schema.json").read_text("utf-8"))
CHECKER = jsonschema.Draft202012Validator(SCHEMA)


@pytest.fixture(scope="module")
def spoiled(tmp_path_factory: pytest.TempPathFactory) -> dict[str, Any]:
    """The audit of a workbook with a typed force, an error value and a formula that is not evaluated."""

    def spoil(book: Workbook) -> None:
        sheet = book["Levels"]
        top, column = next((c.row, c.column) for row in sheet.iter_rows() for c in row if c.value == "F_x X")
        sheet.cell(top + 9, column).value = 44.0
        book["Criteria"]["H60"], book["Criteria"]["H61"] = "=TODAY()", "=1/0"

    found: dict[str, Any] = record(audited(changed(computed_book(tmp_path_factory.mktemp("book")), spoil)))
    return json.loads(json.dumps(found, allow_nan=False))


def test_the_schema_is_one() -> None:
    jsonschema.Draft202012Validator.check_schema(SCHEMA)
    assert SCHEMA["$defs"]["finding"]["properties"]["severity"]["enum"] == list(Severity)


def test_every_audit_is_as_the_schema_says(spoiled: dict[str, Any], tmp_path: Path) -> None:
    assert [e.message for e in CHECKER.iter_errors(spoiled)] == []
    assert spoiled["not_checked"]
    assert any(finding["effects"] for finding in spoiled["findings"])
    assert len(spoiled["methods"]) == len(METHODS)
    assert all(method["summary"].startswith("(") for method in spoiled["methods"])
    other = Workbook()
    other.active.append([2, 0, "=A1/B1"])
    other.save(tmp_path / "other.xlsx")
    found = record(audited(changed(tmp_path / "other.xlsx", lambda book: None)))
    assert [e.message for e in CHECKER.iter_errors(found)] == []
    assert (spoiled["edition"], found["edition"]) == ("7-22", None)


def test_the_schema_refuses_what_is_missing_or_not_known(spoiled: dict[str, Any]) -> None:
    assert not CHECKER.is_valid({**spoiled, "more": 1})
    for key in spoiled:
        assert not CHECKER.is_valid({k: v for k, v in spoiled.items() if k != key})
    finding = {**spoiled["findings"][0], "places": []}
    assert not CHECKER.is_valid({**spoiled, "findings": [finding]})


def test_the_command_prints_what_it_writes(tmp_path: Path) -> None:
    path, target = computed_book(tmp_path), tmp_path / "audit.json"
    outcome = run("audit", path, "--json", f"--report={target}")
    assert (outcome.code, outcome.err) == (0, "")
    assert json.loads(outcome.out) == json.loads(target.read_text("utf-8"))
    assert tuple(json.loads(outcome.out)["cautions"]) == CAUTIONS
