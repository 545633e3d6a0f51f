"""Whatever is wrong with a workbook, every form of report is made of its audit."""

from __future__ import annotations

import json
from collections.abc import Callable
from importlib.resources import files
from io import BytesIO
from pathlib import Path

import jsonschema
import openpyxl
import pytest
from openpyxl import Workbook

from tests.support.audited import audited, changed, computed_book
from xlbridge.audit.report.as_json import record
from xlbridge.audit.report.marked import FINDINGS, marked
from xlbridge.audit.report.page import page

SCHEMA = json.loads(files("xlbridge.audit.report").joinpath("schema.json").read_text("utf-8"))


def _weight(book: Workbook) -> None:
    sheet = book["Levels"]
    head = next(cell for row in sheet.iter_rows() for cell in row if cell.value == "w_x")
    sheet.cell(head.row + 8, head.column).value = -1


def _name(book: Workbook) -> None:
    del book.defined_names["V_X"]


def _sheet(book: Workbook) -> None:
    del book["Criteria"]


def _entry(book: Workbook) -> None:
    book["Criteria"]["D8"] = "=abc("


def _figures(book: Workbook) -> None:
    del book["Figures"]


@pytest.fixture(scope="module", params=[("7-16", "us"), ("7-22", "si")], ids=" ".join)
def book(request: pytest.FixtureRequest, tmp_path_factory: pytest.TempPathFactory) -> Path:
    edition, units = request.param
    return computed_book(tmp_path_factory.mktemp("book"), {"edition": edition, "units": units})


@pytest.mark.parametrize("spoil", [_weight, _name, _sheet, _entry, _figures])
def test_every_form_is_made(book: Path, spoil: Callable[[Workbook], None]) -> None:
    outcome = audited(changed(book, spoil))
    assert outcome.findings
    text = page(outcome)
    assert text.count('class="finding ') == len(outcome.findings)
    found = json.loads(json.dumps(record(outcome), allow_nan=False))
    assert list(jsonschema.Draft202012Validator(SCHEMA).iter_errors(found)) == []
    rows = list(openpyxl.load_workbook(BytesIO(marked(outcome)))[FINDINGS].values)
    numbers = {row[0] for row in rows if isinstance(row[0], int)}
    assert numbers == set(range(1, len(outcome.findings) + 1))
