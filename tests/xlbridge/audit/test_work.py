"""The work shown of every cell: the equation with its numbers, and the value by each route."""

from __future__ import annotations

from pathlib import Path
from typing import Any

import pytest
from openpyxl import Workbook

from tests.support.audited import computed_book
from xlbridge.audit.paths import find
from xlbridge.audit.subject import Subject
from xlbridge.audit.work import works
from xlbridge.cli.own_template import own_template
from xlbridge.headless.compute import compute_into

LEVELS = 6
RESULTS: dict[str, Any] = {
    "W": 2600.0,
    "levels": ["Roof", "Level 2"],
    "direction": {"X": {"F_x": [26.0, 48.0], "V": 74.0}},
}


def test_every_formula_cell_is_shown_with_its_number_by_both_routes(tmp_path: Path) -> None:
    subject = Subject.open(computed_book(tmp_path, level_count=LEVELS), own_template)
    shown = {work.path or str(work.cell): work for work in works(subject)}
    assert [work.cell for work in works(subject)] == list(subject.book.formula_cells())
    force = shown["direction.X.F_x[2]"]
    assert force.value == force.stored == pytest.approx(force.model, rel=1e-12)
    (step,) = force.steps
    assert step.symbols == "F_x = C_vx·V"
    assert step.numbers.startswith("F_x = 0.") and step.numbers.endswith(f"= {force.value:.6g}")  # noqa: PT018
    assert step.clause == "ASCE/SEI 7-22 12.8.3, Eq. 12.8-12"
    ratio = shown["direction.X.drift_over_limit[1]"]
    assert ratio.steps == ()
    assert ratio.formula.startswith("=")
    assert ratio.reads.count(" = ") == 2


def test_of_a_column_one_cell_is_typical(tmp_path: Path) -> None:
    subject = Subject.open(computed_book(tmp_path, level_count=LEVELS), own_template)
    column = [work for work in works(subject) if ".X.F_x[" in work.path]
    assert [work.typical for work in column] == [True] + [False] * (LEVELS - 1)


def test_a_failed_call_shows_its_reason_in_place_of_numbers(tmp_path: Path) -> None:
    book = Workbook()
    book.active["A1"] = "=ELF_EXPONENT(0)"
    book.save(tmp_path / "own.xlsx")
    compute_into(tmp_path / "own.xlsx", tmp_path / "computed.xlsx")
    (work,) = works(Subject.open(tmp_path / "computed.xlsx", own_template))
    assert "must be above 0" in work.steps[0].numbers or "#NUM!" in work.steps[0].numbers
    assert (work.path, work.model) == ("", None)
    assert work.steps[0].clause.count("ASCE/SEI") == 2  # the edition is not known


@pytest.mark.parametrize(
    ("path", "found"),
    [
        ("W", 2600.0),
        ("levels[2]", "Level 2"),
        ("direction.X.F_x[2]", 48.0),
        ("direction.X.F_x[3]", None),
        ("direction.X.F_x", None),
        ("direction.Y.V", None),
        ("direction.X.V[1]", None),
        ("", None),
    ],
)
def test_a_result_is_found_by_its_path(path: str, found: object) -> None:
    assert find(RESULTS, path) == found
