"""The effect of a finding on the headline results: computed again with the expected content put back."""

from __future__ import annotations

from collections.abc import Callable
from pathlib import Path

import openpyxl
import pytest
from openpyxl import Workbook

from tests.support.audited import audited, changed, computed_book
from tests.support.command import run
from xlbridge.audit.effects import AT_MOST
from xlbridge.audit.finding import Effect, Finding
from xlbridge.headless.compute import compute
from xlbridge.headless.store import store

SHEET = "Levels"


def level_cell(path: Path, heading: str, level: int) -> str:
    sheet = openpyxl.load_workbook(path)[SHEET]
    cell = next(c for row in sheet.iter_rows() for c in row if c.value == heading)
    first = next(r for r in range(cell.row, cell.row + 12) if sheet.cell(r, 1).value == "Roof")
    return str(sheet.cell(first + level, cell.column).coordinate)


def spoilt(path: Path, address: str, change: Callable[[str], object]) -> tuple[Finding, ...]:
    def spoil(book: Workbook) -> None:
        book[SHEET][address] = change(book[SHEET][address].value)

    return audited(changed(path, spoil)).findings


def by_name(finding: Finding) -> dict[str, Effect]:
    return {effect.headline: effect for effect in finding.effects}


def of_kind(findings: tuple[Finding, ...], kind: str) -> Finding:
    return next(f for f in findings if f.kind.key == kind)


def test_a_changed_formula_is_weighed_by_what_it_moves(tmp_path: Path) -> None:
    path = computed_book(tmp_path)
    address = level_cell(path, "F_x X", 0)
    clean = compute(path).values
    force, height = clean[SHEET, address], clean[SHEET, level_cell(path, "h_x", 0)]
    finding = of_kind(spoilt(path, address, lambda text: f"{text}*1.1"), "formula_differs")
    moved = by_name(finding)["Overturning at the base, direction X"]
    assert moved.change == pytest.approx(0.1 * force * height)  # type: ignore[operator]
    assert moved.per_cent == pytest.approx(100 * moved.change / moved.without)
    assert by_name(finding)["Base shear V, direction X"].change == 0
    assert by_name(finding)["Overturning at the base, direction Y"].change == 0


def test_a_constant_is_weighed_against_its_formula(tmp_path: Path) -> None:
    path = computed_book(tmp_path)
    finding = of_kind(spoilt(path, level_cell(path, "theta X", 5), lambda text: 0.2), "constant_for_formula")
    effect = by_name(finding)["Largest theta, direction X"]
    assert effect.value == 0.2
    assert effect.without < 0.02


def test_a_stale_headline_is_weighed_against_what_it_is(tmp_path: Path) -> None:
    path = computed_book(tmp_path)
    clean = audited(path)
    assert clean.subject.own
    cell = clean.subject.own.headlines[0].cell
    value = compute(path).values[cell.sheet, cell.address]
    assert isinstance(value, float)
    store(path, tmp_path / "stale.xlsx", {(cell.sheet, cell.address): value / 2})
    finding = of_kind(audited(tmp_path / "stale.xlsx").findings, "stale_value")
    effect = finding.effects[0]
    assert (effect.value, effect.without) == (value / 2, value)
    assert effect.per_cent == pytest.approx(-50)


def test_what_cannot_be_put_back_has_no_effects(tmp_path: Path) -> None:
    path = computed_book(tmp_path)
    findings = spoilt(path, level_cell(path, "F_x X", 0), lambda text: f"{text}*1.1")
    assert of_kind(findings, "differs_from_model").effects == ()


def test_of_very_many_findings_only_the_first_are_weighed(tmp_path: Path) -> None:
    path = computed_book(tmp_path, level_count=20)

    def spoil(book: Workbook) -> None:
        sheet = book[SHEET]
        for column in ("C_vx X", "F_x X", "V_x X"):
            for level in range(0, 20):
                cell = sheet[level_cell(path, column, level)]
                cell.value = f"{cell.value}*{1 + level / 100 + len(column) / 1000}"

    outcome = audited(changed(path, spoil))
    findings = outcome.findings
    assert len(findings) > AT_MOST
    assert sum(bool(f.effects) for f in findings) == AT_MOST
    (said,) = [item for item in outcome.not_checked if "effects" in item.what]
    assert said.because == f"only the first {AT_MOST} are weighed against the headline results"


def test_the_command_says_what_a_finding_moves(tmp_path: Path) -> None:
    path = computed_book(tmp_path)

    def spoil(book: Workbook) -> None:
        cell = book[SHEET][level_cell(path, "F_x X", 0)]
        cell.value = f"{cell.value}*1.1"

    outcome = run("audit", changed(path, spoil))
    assert outcome.code == 1
    moved = [line for line in outcome.out.splitlines() if "without it" in line]
    assert len(moved) == 2
    assert moved[0].startswith("   Overturning at the base, direction X: ")
    assert " kip-ft, without it " in moved[0]
    assert moved[0].endswith("%)")
