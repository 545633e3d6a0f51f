"""What misleads in any workbook: each kind planted in one of ours and in one of another make."""

from __future__ import annotations

from collections.abc import Callable
from pathlib import Path

import openpyxl
import pytest
from openpyxl import Workbook
from openpyxl.chart import BarChart
from openpyxl.formatting.rule import FormulaRule, Rule
from openpyxl.styles import Font, PatternFill
from openpyxl.styles.differential import DifferentialStyle
from openpyxl.styles.numbers import NumberFormat
from openpyxl.utils.datetime import CALENDAR_MAC_1904
from openpyxl.workbook.defined_name import DefinedName

from tests.support.audited import audited, changed, computed_book
from xlbridge.audit import hygiene
from xlbridge.audit.finding import Observation
from xlbridge.audit.subject import Subject
from xlbridge.cli.own_template import own_template
from xlbridge.headless.compute import compute_into

Change = Callable[[Workbook], object]


def hide(book: Workbook) -> None:
    book.worksheets[-1].sheet_state = "veryHidden"


def hide_row(book: Workbook) -> None:
    book.worksheets[1].row_dimensions[5].hidden = True
    book.worksheets[1].row_dimensions[6].height = 0.5


def hide_column(book: Workbook) -> None:
    book.worksheets[1].column_dimensions["B"].hidden = True


def freeze(book: Workbook) -> None:
    book.worksheets[1].freeze_panes = "A200"


def cover(book: Workbook) -> None:
    book.worksheets[1].add_chart(BarChart(), "A4")


def whiten(book: Workbook) -> None:
    rule = FormulaRule(formula=["D6>0"], font=Font(color="FFFFFFFF"))
    book.worksheets[1].conditional_formatting.add("D6:D9", rule)


def calculate(setting: str, value: object) -> Change:
    return lambda book: setattr(book.calculation, setting, value)


def text(book: Workbook) -> None:
    sheet = book.create_sheet("Own")
    for row, value in enumerate((12.0, "13,5 ", 14.0), 1):
        sheet.cell(row, 1, value)


def put(formula: str) -> Change:
    def change(book: Workbook) -> None:
        sheet = book.create_sheet("Own")
        sheet["A1"] = 2.0
        sheet["B1"] = formula

    return change


def name(definition: str) -> Change:
    def change(book: Workbook) -> None:
        book.defined_names["own_name"] = DefinedName("own_name", attr_text=definition)

    return change


def dates(book: Workbook) -> None:
    book.epoch = CALENDAR_MAC_1904


#: kind -> how it is planted, and a part of the place that is named
PLANTED: dict[str, tuple[Change, str]] = {
    "sheet_hidden": (hide, "Functions"),
    "line_hidden": (hide_row, "Criteria!5:6"),
    "view_blocked": (freeze, "Criteria"),
    "mark_hides": (whiten, "Criteria!D6:D9"),
    "drawing_over_cells": (cover, "Criteria!A4:"),
    "calculation_manual": (calculate("calcMode", "manual"), "workbook"),
    "iteration_on": (calculate("iterate", True), "workbook"),
    "precision_as_displayed": (calculate("fullPrecision", False), "workbook"),
    "dates_from_1904": (dates, "workbook"),
    "external_link": (put("='[other.xlsx]Sheet1'!A1"), "Own!B1"),
    "volatile_function": (put("=NOW()"), "Own!B1"),
    "number_as_text": (text, "Own!A2"),
    "error_hidden": (put("=IFERROR(A1/0,0)"), "Own!B1"),
    "name_broken": (name("#REF!"), "workbook"),
}


def seen(path: Path) -> list[Observation]:
    return list(hygiene.check(Subject.open(path, own_template)).observations)


@pytest.fixture(scope="module")
def ours(tmp_path_factory: pytest.TempPathFactory) -> Path:
    return computed_book(tmp_path_factory.mktemp("ours"))


@pytest.mark.parametrize("kind", PLANTED)
def test_it_is_found_at_its_place(tmp_path: Path, ours: Path, kind: str) -> None:
    change, place = PLANTED[kind]
    book = openpyxl.load_workbook(ours)
    change(book)
    book.save(tmp_path / "planted.xlsx")
    found = seen(tmp_path / "planted.xlsx")
    assert {o.kind for o in found} == {kind}
    assert str(found[0].place).startswith(place)


def test_a_clean_workbook_has_none(ours: Path) -> None:
    assert seen(ours) == []


@pytest.mark.parametrize(
    ("look", "hides"),
    [
        ({"font": Font(color="FFFFFFFF")}, True),
        ({"font": Font(color="FFB00020")}, False),
        ({"font": Font(color="FFFFFFFF"), "fill": PatternFill(bgColor="FF000000")}, False),
        ({"font": Font(color="FF202020"), "fill": PatternFill(bgColor="FF000000")}, True),
        ({"numFmt": NumberFormat(numFmtId=170, formatCode=";;;")}, True),
        ({"numFmt": NumberFormat(numFmtId=170, formatCode="0.0")}, False),
    ],
)
def test_a_mark_hides_only_if_nothing_can_be_read(
    tmp_path: Path, look: dict[str, object], hides: bool
) -> None:
    book = Workbook()
    book.active["A1"] = 1.0
    rule = Rule(type="expression", formula=["A1>0"], dxf=DifferentialStyle(**look))  # type: ignore[arg-type]
    book.active.conditional_formatting.add("A1:A3", rule)
    book.save(tmp_path / "own.xlsx")
    assert ([o.kind for o in seen(tmp_path / "own.xlsx")] == ["mark_hides"]) is hides


def test_a_filled_column_is_missed_and_an_empty_one_is_not(tmp_path: Path, ours: Path) -> None:
    book = openpyxl.load_workbook(ours)
    hide_column(book)
    book.worksheets[1].column_dimensions["Z"].hidden = True
    book.save(tmp_path / "planted.xlsx")
    assert [str(o.place) for o in seen(tmp_path / "planted.xlsx")] == ["Criteria!B:B"]


@pytest.mark.parametrize(
    ("formula", "hides"),
    [
        ("=IFERROR(A1,0)", True),
        ('=IFERROR(A1,"")', True),
        ("=IFERROR(A1,NA())", False),
        ("=IFERROR(A1,A1*2)", False),
        ('=IFERROR(A1,"not computed")', False),
        ("=IFNA(A1,0)", True),
        ("=IF(ISERROR(A1),0,A1)", True),
        ("=IF(ISERROR(A1),NA(),A1)", False),
        ("=IF(A1>0,0,A1)", False),
        ('=IF(A1="ISERROR(",0,A1)', False),
    ],
)
def test_a_formula_hides_a_failure_only_if_a_constant_stands_for_it(
    tmp_path: Path, formula: str, hides: bool
) -> None:
    book = Workbook()
    put(formula)(book)
    book.save(tmp_path / "own.xlsx")
    assert ("error_hidden" in {o.kind for o in seen(tmp_path / "own.xlsx")}) is hides


@pytest.mark.parametrize(
    ("formula", "kinds"),
    [
        ("=OFFSET(A1,0,0)", {"volatile_function"}),
        ('=INDIRECT("A1")', {"volatile_function"}),
        ('="NOW()"', set()),
        ("=SUM(A1,A1)", set()),
        ("='C:\\jobs\\[a.xlsx]Sheet1'!A1", {"external_link"}),
        ("=[1]Sheet1!$A$1", {"external_link"}),
        ('="[a]b!"', set()),
    ],
)
def test_what_a_formula_reads(tmp_path: Path, formula: str, kinds: set[str]) -> None:
    book = Workbook()
    put(formula)(book)
    book.save(tmp_path / "own.xlsx")
    assert {o.kind for o in seen(tmp_path / "own.xlsx")} == kinds


@pytest.mark.parametrize("value", ["12", " 12.5 ", "1 200", "1,200.5", "-3", "5 %", "1e3", "12\u00a0000"])
def test_texts_that_look_like_numbers(tmp_path: Path, value: str) -> None:
    book = Workbook()
    book.active["A1"], book.active["A2"], book.active["A3"] = 1.0, value, 3.0
    book.save(tmp_path / "own.xlsx")
    assert [o.place.address for o in seen(tmp_path / "own.xlsx")] == ["A2"]


@pytest.mark.parametrize("value", ["Roof", "Level 8", "II", "7-22", "12 ft", "", "1.2.x"])
def test_texts_that_do_not(tmp_path: Path, value: str) -> None:
    book = Workbook()
    book.active["A1"], book.active["A2"], book.active["A3"] = 1.0, value, 3.0
    book.save(tmp_path / "own.xlsx")
    assert seen(tmp_path / "own.xlsx") == []


def test_levels_may_be_called_by_numbers(tmp_path: Path, ours: Path) -> None:
    def rename(book: Workbook) -> None:
        sheet = book["Levels"]
        for row in range(12, 18):
            sheet.cell(row, 1, f"{18 - row}" if row % 2 else 18 - row)

    assert audited(changed(ours, rename)).findings == ()


def test_macros_are_a_note(tmp_path: Path) -> None:
    from tests.support.command import run

    assert run("new", tmp_path / "tower.xlsm", "--macro").code == 0
    (found,) = seen(tmp_path / "tower.xlsm")
    assert found.kind == "active_content"
    assert "macros" in found.words


def test_a_workbook_of_another_make_is_looked_at_too(tmp_path: Path) -> None:
    book = Workbook()
    for row in (("Level", "w"), ("Roof", 400.0), ("L2", "450"), ("L1", 500.0)):
        book.active.append(row)
    book.active["B5"] = "=SUM(B2:B4)"
    book.active.row_dimensions[3].hidden = True
    book.save(tmp_path / "own.xlsx")
    compute_into(tmp_path / "own.xlsx", tmp_path / "computed.xlsx")
    assert {f.kind.key for f in audited(tmp_path / "computed.xlsx").findings} == {
        "line_hidden",
        "number_as_text",
    }
