"""The trace of a cell: formula, what it reads, calls of custom functions, result or reason."""

from __future__ import annotations

import pytest
from openpyxl import Workbook
from openpyxl.workbook.defined_name import DefinedName
from openpyxl.worksheet.formula import ArrayFormula

from xlbridge.headless.book import Book
from xlbridge.headless.evaluate import Evaluator
from xlbridge.headless.trace import Precedent, TracedCall, trace, trace_text
from xlbridge.values import OMITTED, Argument, Value


def _sum(arguments: tuple[Argument, ...]) -> Value:
    return float(sum(value for value in arguments if isinstance(value, float)))


@pytest.fixture
def run() -> Evaluator:
    workbook = Workbook()
    sheet = workbook.active
    sheet.title = "Story table"
    for row in range(1, 4):
        sheet.cell(row, 1, row)
    workbook.defined_names["k"] = DefinedName("k", attr_text="'Story table'!$A$2")
    workbook.defined_names["half"] = DefinedName("half", attr_text="1/2")
    sheet["B1"] = "=ELF_SUM(ELF_SUM($A$1,k),,A3*2)+half+SUM(A1:A3)+$A$1"
    sheet["B2"] = "=IF(A1=1,B1,B3)"
    sheet["B3"] = "=ELF_SUM(A1)+NOSUCH(A2)"
    sheet["B4"] = "=A1+"
    sheet["B5"] = "=B3+lost"
    sheet["C1"] = ArrayFormula("C1:C2", "=A1:A2*2")
    return Evaluator(Book.of(workbook), {"ELF_SUM": _sum})


def test_the_trace_shows_what_a_formula_reads_and_calls(run: Evaluator) -> None:
    found = trace(run, "story TABLE", "$B$1")
    assert str(found.cell) == "'Story table'!B1"
    assert found.formula == "=ELF_SUM(ELF_SUM($A$1,k),,A3*2)+half+SUM(A1:A3)+$A$1"
    assert found.precedents == (
        Precedent("$A$1", "'Story table'!A1", 1.0),
        Precedent("k", "'Story table'!A2", 2.0),
        Precedent("A3", "'Story table'!A3", 3.0),
        Precedent("half", "", 0.5),
        Precedent("A1:A3", "'Story table'!A1:A3", ((1.0,), (2.0,), (3.0,))),
    )
    assert found.calls == (
        TracedCall("ELF_SUM", ("$A$1", "k"), (1.0, 2.0), 3.0),
        TracedCall("ELF_SUM", ("ELF_SUM($A$1,k)", "", "A3*2"), (3.0, OMITTED, 6.0), 9.0),
    )
    assert (found.value, found.reason) == (16.5, None)


def test_a_precedent_without_a_value_says_why(run: Evaluator) -> None:
    found = trace(run, "Story table", "B2")
    assert (found.value, found.reason) == (16.5, None)
    third = found.precedents[2]
    assert (third.label, third.address, third.value) == ("B3", "'Story table'!B3", None)
    assert third.reason is not None
    assert "NOSUCH" in third.reason
    lost = trace(run, "Story table", "B5").precedents[1]
    assert (lost.label, lost.address) == ("lost", "")
    assert lost.reason is not None
    assert "not defined" in lost.reason


def test_a_cell_that_was_not_evaluated_shows_the_calls_made_before(run: Evaluator) -> None:
    found = trace(run, "Story table", "B3")
    assert found.calls == (TracedCall("ELF_SUM", ("A1",), (1.0,), 1.0),)
    assert found.value is None
    assert found.reason is not None
    assert "NOSUCH" in found.reason


def test_an_unreadable_formula_has_only_its_text_and_the_reason(run: Evaluator) -> None:
    found = trace(run, "Story table", "B4")
    assert (found.formula, found.precedents, found.calls, found.value) == ("=A1+", (), (), None)
    assert found.reason is not None
    assert "character 5" in found.reason


def test_a_cell_in_an_array_formula_shows_the_formula_and_its_own_value(run: Evaluator) -> None:
    found = trace(run, "Story table", "C2")
    assert (found.formula, found.value) == ("=A1:A2*2", 4.0)
    assert found.precedents == (Precedent("A1:A2", "'Story table'!A1:A2", ((1.0,), (2.0,))),)


def test_a_constant_has_only_its_value(run: Evaluator) -> None:
    found = trace(run, "Story table", "A2")
    assert (found.formula, found.precedents, found.calls, found.value) == ("", (), (), 2.0)
    assert trace(run, "Nowhere", "A2").reason == "the workbook has no sheet Nowhere"


def test_a_formula_in_no_cell_is_explained_too(run: Evaluator) -> None:
    found = trace_text(run, "=ELF_SUM(A1,B1)*{1,2}", "Story table")
    assert found.precedents == (
        Precedent("A1", "'Story table'!A1", 1.0),
        Precedent("B1", "'Story table'!B1", 16.5),
    )
    assert found.calls == (TracedCall("ELF_SUM", ("A1", "B1"), (1.0, 16.5), 17.5),)
    assert (found.cell, found.value) == (None, ((17.5, 35.0),))
    refused = trace_text(run, "=ELF_SUM(1)+NOSUCH()")
    assert refused.calls == (TracedCall("ELF_SUM", ("1",), (1.0,), 1.0),)
    assert refused.reason is not None
    assert trace_text(Evaluator(None, {}), "=1+").reason is not None


def test_each_call_is_noted_once_where_a_cell_was_not_computed_before() -> None:
    workbook = Workbook()
    sheet = workbook.active
    sheet["A1"], sheet["A2"], sheet["A3"] = 1, "=A1+1", 4
    run = Evaluator(Book.of(workbook), {"ELF_SUM": _sum})
    found = trace_text(run, "=ELF_SUM(1)+SUM(A1:INDEX(A3,1))", "Sheet")
    assert [call.result for call in found.calls] == [1.0]
    assert found.value == 8.0
