"""The engine against published examples and hand-worked values, at the printed digits."""

from __future__ import annotations

from inspect import signature

import pytest

from tests.support.check_values import KINDS, rows, shortfalls
from tests.support.formulas import public_functions

ROWS = rows()
MISPRINTS = [(name, row) for name, row in ROWS if "misprint" in row]


@pytest.mark.parametrize("row", [row for _, row in ROWS], ids=[name for name, _ in ROWS])
def test_row(row):
    assert row["kind"] in KINDS
    assert row["source"]
    assert shortfalls(row, row["expected"]) == []


@pytest.mark.parametrize("row", [row for _, row in MISPRINTS], ids=[name for name, _ in MISPRINTS])
def test_misprint_is_one(row):
    assert row["reason"]
    assert shortfalls(row, row["misprint"])


def test_a_tolerance_of_its_own_has_a_reason():
    assert [name for name, row in ROWS if "tolerance" in row and not row.get("reason")] == []


def test_ids_are_unique():
    names = [name for name, _ in ROWS]
    assert sorted(set(names)) == sorted(names)


def test_every_number_formula_has_a_check_value():
    checked = {row["function"].removeprefix("engine.") for _, row in ROWS}
    numbers = {name for name, rule in public_functions() if signature(rule).return_annotation != "Words"}
    assert numbers - checked == set()
