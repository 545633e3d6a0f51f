"""What misleads beside formulas: each fault is found at its place, by its kind."""

from __future__ import annotations

from collections.abc import Callable
from pathlib import Path
from shutil import copy
from typing import Any

import pytest
from openpyxl import Workbook
from openpyxl.formatting.rule import FormulaRule
from openpyxl.styles import Alignment, Font, PatternFill, Protection
from openpyxl.workbook.defined_name import DefinedName

from tests.support.audited import audited, changed, computed_book
from tests.support.story_cells import COUNT, LAST, Change, both, criteria, levels, put, style
from workbook_templates.layout import BAND_ROW, FIRST_LEVEL, STORY_TABLE, SYMBOL_ROW, TEXT_ROW, UNIT_ROW
from xlbridge.audit.manifest.number_formats import hides_text, is_coarser, misleads

T_L_CLAUSE = "Criteria!G11"
F_X, UNIT, HEADING = levels("F_x", "X"), levels("w_x", row=UNIT_ROW), levels("F_x", "X", TEXT_ROW)
RATIO, STATUS = levels("drift_verdict", "X"), criteria("S_DS")


def named(word: str, text: str, sheet: str = "") -> Change:
    def change(book: Workbook) -> None:
        (book[sheet] if sheet else book).defined_names[word] = DefinedName(word, attr_text=text)

    return change


def rules_of(key: str) -> Callable[[Workbook], list[object]]:
    """The validation rules of an entry of the criteria."""
    address = criteria(key).partition("!")[2]
    return lambda book: [r for r in book["Criteria"].data_validations.dataValidation if address in r.sqref]


def loosen(key: str, **what: object) -> Change:
    def change(book: Workbook) -> None:
        (rule,) = rules_of(key)(book)
        for name, value in what.items():
            setattr(rule, name, value)

    return change


def unmark(book: Workbook) -> None:
    book["Checks"].conditional_formatting = type(book["Checks"].conditional_formatting)()


def overlay(**look: Any) -> Change:
    """Put a rule that always holds before those of the verdicts."""

    def change(book: Workbook) -> None:
        sheet, rule = book["Checks"], FormulaRule(formula=["TRUE"], **look)
        for rules in sheet.conditional_formatting:
            for known in rules.rules:
                known.priority += 1
        sheet.conditional_formatting.add("I11:I99", rule)
        rule.priority = 1

    return change


def pale(book: Workbook) -> None:
    for rules in book["Checks"].conditional_formatting:
        for rule in rules.rules:
            rule.dxf.font = Font(color="FFFFFF")


def without_rules(book: Workbook) -> None:
    book["Criteria"].data_validations.dataValidation = []


def redraw(book: Workbook) -> None:
    series = book["Figures"]._charts[0].series[0]
    series.val.numRef.f = series.val.numRef.f.replace("$H$", "$G$")


def hide_formula(book: Workbook) -> None:
    book["Levels"].protection.sheet = True
    book["Levels"][F_X[7:]].protection = Protection(hidden=True)


def narrow(book: Workbook) -> None:
    book["Levels"].column_dimensions[F_X[7:8]].width = 2.5


def low(book: Workbook) -> None:
    book["Levels"].row_dimensions[FIRST_LEVEL + 1].height = 4


def merge(book: Workbook) -> None:
    book["Levels"].merge_cells(f"{F_X[7:]}:{F_X[7:8]}{FIRST_LEVEL + 3}")


def rename_header(book: Workbook) -> None:
    book["Levels"].oddHeader.left.text = "Final"


def print_area(book: Workbook) -> None:
    book["Levels"].print_area = "A1:F40"


def no_titles(book: Workbook) -> None:
    book["Levels"].print_title_rows = "1:2"


def delete_figures(book: Workbook) -> None:
    del book["Figures"]


def find_text(book: Workbook, text: str) -> str:
    return next(
        f"Cover!{c.coordinate}" for row in book["Cover"] for c in row if str(c.value).startswith(text)
    )


def caution_gone(book: Workbook) -> None:
    put(find_text(book, "An aid to"), None)(book)


def other_version(book: Workbook) -> None:
    cell = next(c for row in book["Cover"] for c in row if "template" in str(c.value))
    cell.value = f"{cell.value.rpartition(' ')[0]} 0.0.1"


FAULTS: dict[str, tuple[Change, str, str]] = {
    "unit": (put(UNIT, "kN"), "unit_changed", UNIT),
    "unit gone": (put(UNIT, None), "unit_changed", UNIT),
    "heading": (
        put(levels("F_x", "X", TEXT_ROW), "Wind force"),
        "label_changed",
        levels("F_x", "X", TEXT_ROW),
    ),
    "band": (put(levels("name", row=BAND_ROW), "=1"), "label_changed", levels("name", row=BAND_ROW)),
    "clause": (put("Criteria!G9", "12.8.9"), "label_changed", "Criteria!G9"),
    "legend": (put("Checks!B10", "Tested"), "label_changed", "Checks!B10"),
    "caution": (caution_gone, "caution_changed", ""),
    "printed caution": (rename_header, "caution_changed", "Levels"),
    "sheet": (delete_figures, "sheet_missing", "workbook"),
    "version": (other_version, "other_version", "Cover!B10"),
    "edition": (put(criteria("edition"), "7-16"), "made_for_changed", criteria("edition")),
    "name moved": (named("T_L", "Criteria!$D$10"), "name_moved", criteria("T_L")),
    "name gone": (lambda book: book.defined_names.pop("workbook_status"), "name_missing", "workbook"),
    "name on a sheet": (named("S_DS", "Levels!$A$1", "Levels"), "name_shadowed", "Levels"),
    "thousands": (style(F_X, number_format="#,##0.0,"), "format_misleads", F_X),
    "per cent": (style(F_X, number_format="0.0%"), "format_misleads", F_X),
    "nothing shown": (style(F_X, number_format=";;;"), "format_misleads", F_X),
    "text not shown": (style(RATIO, number_format=";;;"), "format_misleads", RATIO),
    "digits": (style(levels("C_vx", "X"), number_format="0.0"), "format_coarse", levels("C_vx", "X")),
    "name of a function": (named("ELF_FX", "Levels!$A$1"), "name_shadowed", "workbook"),
    "tiny text": (style(F_X, font=Font(size=1)), "text_unseen", F_X),
    "repeated digits": (style(F_X, alignment=Alignment(horizontal="fill")), "format_misleads", F_X),
    "formula hidden": (hide_formula, "formula_hidden", F_X),
    "white text": (style(F_X, font=Font(color="FFFFFF"), fill=PatternFill()), "text_unseen", F_X),
    "marks gone": (unmark, "mark_changed", ""),
    "marks in white": (pale, "mark_changed", ""),
    "marks stopped": (overlay(stopIfTrue=True), "mark_overlaid", "Checks!I12"),
    "marks painted over": (overlay(font=Font(color="1B1B1B")), "mark_overlaid", "Checks!I12"),
    "rules gone": (without_rules, "entry_rule_missing", ""),
    "rule widened": (loosen("S_DS", operator="greaterThan", formula1="-5"), "entry_rule_widened", STATUS),
    "rule warns": (loosen("S_DS", errorStyle="warning"), "entry_rule_widened", STATUS),
    "merged": (merge, "cells_merged", f"Levels!{F_X[7:8]}{FIRST_LEVEL + 3}"),
    "print area": (print_area, "print_area_cuts", "Levels"),
    "titles": (no_titles, "headings_not_printed", "Levels"),
    "narrow": (narrow, "column_squeezed", F_X),
    "low": (low, "column_squeezed", levels("F_x", "X", FIRST_LEVEL + 1)),
    "chart": (redraw, "figure_changed", "Figures"),
}


@pytest.fixture(scope="module")
def computed(tmp_path_factory: pytest.TempPathFactory) -> Path:
    return computed_book(tmp_path_factory.mktemp("manifest"), level_count=COUNT)


@pytest.fixture
def story(computed: Path, tmp_path: Path) -> Path:
    return Path(copy(computed, tmp_path / "story.xlsx"))


@pytest.mark.parametrize("fault", FAULTS)
def test_what_misleads_is_found_at_its_place(story: Path, fault: str) -> None:
    change, kind, place = FAULTS[fault]
    outcome = audited(changed(story, change))
    found = [f for f in outcome.findings if f.kind.method == "manifest"]
    assert [f.kind.key for f in found] == [kind]
    assert not place or place in {str(p) for f in found for p in f.places}


@pytest.mark.parametrize(
    ("change", "kinds"),
    [
        (lambda book: book.defined_names.pop("source_S_DS"), {"name_missing"}),
        (named("S_DS", "0.9"), {"name_moved", "differs_from_model"}),
        (named(STORY_TABLE.name, f"Levels!$A$6:$AL${LAST}"), {"name_moved", "differs_from_model"}),
        (put(levels("F_x", "X", SYMBOL_ROW), "F"), {"label_changed"}),
        (put(criteria("S_DS"), None), set()),
        (put(levels("w_x"), "5210 kN"), set()),
        (put(F_X, f"={levels('V_x', 'X')[7:]}"), {"formula_differs", "differs_from_model"}),
    ],
)
def test_what_cannot_be_read_is_named_and_the_rest_compared(
    story: Path, change: Change, kinds: set[str]
) -> None:
    """Inputs that cannot be read do not leave the workbook unchecked; nothing else is held against it."""
    outcome = audited(changed(story, both(change, put(T_L_CLAUSE, "12.8.9"))))
    found = {f.kind.key for f in outcome.findings} - {"error_value", "no_stored_value", "stale_value"}
    assert found - {"inputs_unreadable"} == kinds | {"label_changed"}


def test_one_fault_down_a_column_is_one_finding(story: Path) -> None:
    rows = range(FIRST_LEVEL, FIRST_LEVEL + COUNT)
    change = both(*(style(levels("F_x", "X", row), number_format="0,") for row in rows))
    (finding,) = audited(changed(story, change)).findings
    assert (finding.kind.key, len(finding.places)) == ("format_misleads", COUNT)


def test_a_merge_is_not_a_missing_formula_as_well(story: Path) -> None:
    assert {f.kind.key for f in audited(changed(story, merge)).findings if f.kind.method == "map"} == set()


@pytest.mark.parametrize(
    ("shown", "expected", "how"),
    [
        ("0.000", "#,##0.0", ""),
        ("0.0;[Red]-0.0", "#,##0.0", ""),
        ('0.0;-0.0;"–"', "#,##0.0", ""),
        ("General", "0.00", ""),
        ("0.0,", "0.0", "10^-3"),
        ("0.0,,", "0.0", "10^-6"),
        ("0.0%", "0.0", "10^2"),
        ("0.0;0.0", "0.0", "minus"),
        ("0.0;;", "0.0", "hides the value"),
        ("#.#", "0.0", "zero"),
        ("0.0;-0.0;", "0.0", "zero"),
        ('0.0" kN"', "0.0", "adds"),
        ('"12"', "0.0", "adds"),
        ("yyyy-mm-dd", "0.0", "date"),
        ("[h]:mm", "0.0", "date"),
    ],
)
def test_what_a_number_format_does(shown: str, expected: str, how: str) -> None:
    assert how in misleads(shown, expected)
    assert bool(how) == bool(misleads(shown, expected))


def test_formats_that_show_fewer_digits_or_no_text() -> None:
    assert is_coarser("0", "0.0")
    assert is_coarser("0.000", "0.0E+00")
    assert not is_coarser("0.00", "0.0")
    assert not is_coarser("General", "0.0")
    assert hides_text(";;;")
    assert not hides_text("0.0;;;@")
