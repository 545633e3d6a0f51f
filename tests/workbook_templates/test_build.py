"""The generated workbook: every size, edition, unit system and part computes, and both routes agree."""

from __future__ import annotations

import re
import tempfile
from itertools import product
from pathlib import Path
from typing import Any

import openpyxl
import pytest
from hypothesis import Phase, given, settings
from openpyxl.worksheet.worksheet import Worksheet

from engine.editions import EDITIONS
from engine.errors import NotApplicable
from engine.units import SYSTEMS
from tests.support.buildings import buildings
from tests.support.story_books import assert_routes_agree, story_book
from workbook_templates import generate
from workbook_templates.build import build, write_workbook
from workbook_templates.declare import DIRECTIONS, STARTER, Part
from workbook_templates.layout import LEVELS, Layout
from workbook_templates.parts import CORE, PARTS, together, with_required
from workbook_templates.read import Reader, ReadError
from xlbridge.catalogue import CATALOGUE
from xlbridge.headless.builtins import BUILTINS
from xlbridge.headless.compute import compute

BLANK = {"edition": "7-22", "units": "us"}
ALL = together(BLANK["edition"])
FULL = {**BLANK, "parts": sorted(ALL)}
VOLATILE = re.compile(r"\b(NOW|TODAY|RAND|RANDBETWEEN|OFFSET|INDIRECT)\(")
CALLED = re.compile(r"\b([A-Z][A-Z0-9_.]*)\(")


@pytest.fixture(scope="module")
def blank(tmp_path_factory: pytest.TempPathFactory) -> openpyxl.Workbook:
    return openpyxl.load_workbook(story_book(tmp_path_factory.mktemp("blank"), FULL))


def formulas(sheet: Worksheet) -> list[str]:
    return [
        c.value for row in sheet.iter_rows() for c in row if isinstance(c.value, str) and c.value[:1] == "="
    ]


@pytest.mark.parametrize(("edition", "units"), list(product(EDITIONS, SYSTEMS)))
def test_starter_workbook_computes_and_agrees_with_the_model_route(
    tmp_path: Path, edition: str, units: str
) -> None:
    computed = assert_routes_agree(story_book(tmp_path, {"edition": edition, "units": units}), 100)
    status = computed.evaluator.evaluate_text("=workbook_status")
    assert isinstance(status, str)
    assert status.startswith("✗ STARTER VALUES, NOT A DESIGN: ")


@pytest.mark.parametrize("count", [1, 2, 60, 100])
def test_level_counts(tmp_path: Path, count: int) -> None:
    assert_routes_agree(story_book(tmp_path, BLANK, count), 25 * count)


@settings(max_examples=12, deadline=None, phases=(Phase.explicit, Phase.reuse, Phase.generate))
@given(buildings())
def test_random_buildings_agree_with_the_model_route(tables: dict[str, Any]) -> None:
    with tempfile.TemporaryDirectory() as folder:
        assert_routes_agree(story_book(Path(folder), tables), 20)


@pytest.mark.parametrize("part", PARTS)
def test_each_part_alone_agrees_with_the_model_route(tmp_path: Path, part: str) -> None:
    for edition, units in zip(PARTS[part].editions, SYSTEMS, strict=False):
        given = {"edition": edition, "units": units, "parts": [part]}
        assert_routes_agree(story_book(tmp_path, given), 90)


@pytest.mark.parametrize(("edition", "units"), list(product(EDITIONS, SYSTEMS)))
def test_all_parts_together_agree_with_the_model_route(tmp_path: Path, edition: str, units: str) -> None:
    given = {"edition": edition, "units": units, "parts": sorted(together(edition))}
    assert_routes_agree(story_book(tmp_path, given), 1100)


def test_parts_of_another_edition_and_parts_that_exclude_each_other_are_refused(tmp_path: Path) -> None:
    with pytest.raises(NotApplicable, match="parts = 'site_class': is a part of 7-16 only"):
        story_book(tmp_path, {**BLANK, "parts": ["site_class"]})
    for edition in EDITIONS:
        chosen = together(edition)
        for key, part in PARTS.items():
            rivals = {*part.excludes, *(k for k, other in PARTS.items() if key in other.excludes)} & chosen
            assert (key in chosen) is (edition in part.editions and not rivals)
    both = {**BLANK, "parts": ["mapped_motion", "multi_period"]}
    with pytest.raises(NotApplicable, match="parts = 'multi_period': can not stand beside mapped_motion"):
        story_book(tmp_path, both)


def test_parts_come_back_out_of_the_workbook(tmp_path: Path) -> None:
    computed = compute(story_book(tmp_path, FULL))
    tables = Reader(computed.evaluator.evaluate_text).inputs()
    assert set(tables["parts"]) == {key for key, part in PARTS.items() if key in ALL and not part.needs} - {
        CORE
    }
    again = assert_routes_agree(story_book(tmp_path, tables, name="again.xlsx"), 1100)
    linked = sum(bool(column.quantity.linked) for column in Layout(6, ALL).table)
    assert len(again.results.cells) == len(computed.results.cells) - 6 * linked  # links come back as numbers


def test_every_required_part_exists_and_comes_along() -> None:
    assert {key for part in PARTS.values() for key in part.requires} <= set(PARTS)
    for key, part in PARTS.items():
        assert with_required([key]) >= {CORE, key, *part.requires}


def test_a_part_brings_those_that_its_required_parts_require(monkeypatch: pytest.MonkeyPatch) -> None:
    chain = {"a": Part("a", "A", requires=("b",)), "b": Part("b", "B", requires=("c", "a"))}
    chain |= {"c": Part("c", "C"), "d": Part("d", "D"), CORE: PARTS[CORE]}
    monkeypatch.setattr("workbook_templates.parts.PARTS", chain)
    assert with_required(["a"]) == {CORE, "a", "b", "c"}
    assert with_required([]) == {CORE}


def test_an_unknown_part_is_refused(tmp_path: Path) -> None:
    with pytest.raises(NotApplicable, match=r"parts = 'roofs': must be one of .*story, .*weights, .*drift"):
        story_book(tmp_path, {**BLANK, "parts": ["roofs"]})


def test_a_part_without_inputs_is_left_out(tmp_path: Path) -> None:
    tables = {**BLANK, "level": [{"name": "Roof", "elevation": 12.0, "weight": 100.0}]}
    path = story_book(tmp_path, tables)
    assert_routes_agree(path, 20)
    headings = [cell.value for cell in openpyxl.load_workbook(path)[LEVELS][6]]
    assert "F_x X" in headings
    assert not any("delta" in str(heading) for heading in headings)


def test_two_builds_give_the_same_bytes() -> None:
    assert build(BLANK) == build(BLANK)


def test_blank_workbooks_are_those_that_are_kept(tmp_path: Path) -> None:
    for made in generate.generate(tmp_path):
        assert made.read_bytes() == (generate.FOLDER / made.name).read_bytes(), (
            f"{made.name} differs: run python -m workbook_templates.generate"
        )


def test_written_workbook_carries_its_values(tmp_path: Path) -> None:
    computed = write_workbook(BLANK, tmp_path / "story.xlsx")
    stored = openpyxl.load_workbook(tmp_path / "story.xlsx", data_only=True)
    for (sheet, address), value in computed.values.items():
        assert stored[sheet][address].value == value


def test_nothing_is_hidden_merged_external_or_volatile(blank: openpyxl.Workbook) -> None:
    assert blank.sheetnames == list(Layout(6, ALL).sheets)
    for sheet in blank.worksheets:
        assert sheet.sheet_state == "visible"
        assert not sheet.merged_cells.ranges
        assert not any(d.hidden for d in (*sheet.row_dimensions.values(), *sheet.column_dimensions.values()))
        for formula in formulas(sheet):
            assert "[" not in formula
            assert not VOLATILE.search(formula)
            assert "IFERROR" not in formula
            assert set(CALLED.findall(formula)) <= {*CATALOGUE, *BUILTINS}


def test_every_defined_name_is_one_sound_reference(blank: openpyxl.Workbook) -> None:
    assert len(blank.defined_names) > 60
    for name in blank.defined_names.values():
        sheet, _, address = name.attr_text.rpartition("!")
        assert sheet in blank.sheetnames
        assert blank[sheet][address.replace("$", "")] is not None


def test_column_headings_are_unique_in_a_table_and_keys_in_the_workbook() -> None:
    layout = Layout(3, ALL)
    for grid in layout.grids:
        headings = [column.heading for column in grid.columns]
        assert len(set(headings)) == len(headings)
    keys = [key for grid in layout.grids for key in {column.quantity.key for column in grid.columns}]
    assert len({*keys, *layout.rows}) == len(keys) + len(layout.rows)
    names = [layout.name(key, d) for key in layout.rows for d in DIRECTIONS]
    assert len({name.casefold() for name in names}) == len(set(names))  # names know no case


def test_every_number_or_choice_input_has_an_entry_rule(blank: openpyxl.Workbook) -> None:
    layout = Layout(6, ALL)
    ruled = {
        (s.title, str(a))
        for s in blank.worksheets
        for v in s.data_validations.dataValidation
        for a in v.sqref
    }
    for block in layout.criteria:
        for q in block.quantities:
            for direction in DIRECTIONS if block.per_direction else (None,):
                if q.is_input and (q.span or q.choices):
                    assert ("Criteria", layout.criteria_cell(q.key, direction).replace("$", "")) in ruled
    for grid in layout.grids:
        for column in grid.columns:
            q = column.quantity
            if q.is_input and (q.span or q.choices):
                area = layout.level_range(q.key, column.direction).replace("$", "")
                assert (grid.table.sheet, area) in ruled


def test_inline_lists_fit_the_limit_and_hold_no_comma_in_a_word(blank: openpyxl.Workbook) -> None:
    lists = [v for s in blank.worksheets for v in s.data_validations.dataValidation if v.type == "list"]
    assert len(lists) >= 6
    for rule in lists:
        words = rule.formula1.strip('"').split(",")
        assert len(rule.formula1) <= 257
        assert all(word == word.strip() and word for word in words)


def test_pages_repeat_their_headers_and_carry_the_caution(blank: openpyxl.Workbook) -> None:
    for sheet in blank.worksheets:
        assert sheet.print_title_rows
        assert "licensed engineer" in sheet.oddHeader.left.text
        assert "authority having jurisdiction" in sheet.oddHeader.left.text.replace("\n", " ")
        assert sheet.oddFooter.right.text == "&D   page &P of &N"


def test_the_functions_called_are_listed_with_their_equations(blank: openpyxl.Workbook) -> None:
    called = {name for s in blank.worksheets for f in formulas(s) for name in CALLED.findall(f)} & set(
        CATALOGUE
    )
    rows = list(blank["Functions"].iter_rows(min_row=5, max_col=4, values_only=True))
    assert {str(row[0]).partition("(")[0] for row in rows} == called
    assert all("=" in str(row[3]) for row in rows)


def test_starter_values_are_marked_and_counted(blank: openpyxl.Workbook) -> None:
    marks = [c.value for s in blank.worksheets for row in s.iter_rows() for c in row if c.value == STARTER]
    layout = Layout(6, ALL)
    entries = [q for block in layout.criteria for q in block.quantities if q.is_input and q.starter]
    sources = [
        grid.count
        for grid in layout.grids
        for column in grid.columns
        if column.quantity.starter and column.quantity.stored_key(None) == "source"
    ]
    assert len(entries) > 20
    assert len(sources) >= 3
    assert len(marks) == len(entries) + sum(sources)


def test_doubtful_clauses_are_marked_where_the_user_meets_them(blank: openpyxl.Workbook) -> None:
    marks = {cell.value for cell in blank[LEVELS][9]}
    assert {"from memory", "uncertain"} <= marks
    notes = [row[8].value for row in blank["Criteria"].iter_rows(min_row=5) if row[8].value]
    assert any("from memory" in note for note in notes)
    assert any("uncertain" in note for note in notes)


@pytest.mark.parametrize(
    "name", ["rho_X", "moment_frames_only_Y", "base_elevation", "beta_X", "k_rule_Y", "R_X", "S_DS"]
)
def test_a_blank_entry_is_no_default(tmp_path: Path, name: str) -> None:
    """The cells refuse it, and so does the way back: the model route must not fill it in on its own."""
    path = story_book(tmp_path, BLANK)
    workbook = openpyxl.load_workbook(path)
    sheet, _, address = workbook.defined_names[name].attr_text.partition("!")
    workbook[sheet][address.replace("$", "")].value = None
    workbook.save(path)
    computed = compute(path)
    assert computed.errors or name == "rho_X"  # no cell reads rho where moment frames do not act alone
    with pytest.raises(ReadError, match=f"{name}: the cell is blank"):
        Reader(computed.evaluator.evaluate_text).inputs()


def test_a_blank_computed_period_is_no_entry(tmp_path: Path) -> None:
    computed = compute(story_book(tmp_path, BLANK))
    assert "T_computed" not in Reader(computed.evaluator.evaluate_text).inputs()["direction"]["X"]


def test_a_level_named_by_a_number_comes_back_as_text(tmp_path: Path) -> None:
    path = story_book(tmp_path, BLANK)
    workbook = openpyxl.load_workbook(path)
    workbook[LEVELS]["A12"].value = 8
    workbook.save(path)
    computed = assert_routes_agree(path, 80)
    assert Reader(computed.evaluator.evaluate_text).inputs()["level"][0]["name"] == "8"
