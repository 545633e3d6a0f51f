"""Two issues compared: each change with its cell, what it did to the results, and nothing else."""

from __future__ import annotations

import json
import tomllib
from collections.abc import Callable
from pathlib import Path
from typing import Any

import openpyxl
import pytest
from openpyxl import Workbook

from engine.building import from_mapping, solve, to_mapping
from tests.support.audited import audited, changed, computed_book, kinds_at
from tests.support.command import assert_refused, run
from workbook_templates.build import write_workbook
from workbook_templates.demo import building_text
from xlbridge.audit.compare.changes import Change, Issues, Of
from xlbridge.audit.compare.influence import Influences, influences
from xlbridge.audit.subject import Subject
from xlbridge.cli.own_template import own_template
from xlbridge.headless.compute import compute_into

Tables = dict[str, Any]
BASE: Tables = to_mapping(from_mapping(tomllib.loads(building_text())))


def issue(folder: Path, name: str, change: Callable[[Tables], object] = lambda tables: None) -> Path:
    """An issue of the demonstration building with some of its entries changed."""
    tables = json.loads(json.dumps(BASE))
    change(tables)
    write_workbook(tables, folder / name)
    return folder / name


def compared(old: Path, new: Path) -> tuple[list[Change], Influences | None]:
    issues = Issues.of(Subject.open(old, own_template), Subject.open(new, own_template))
    changes = [*issues.inputs(), *issues.cells()]
    return changes, influences(issues, changes)


@pytest.fixture(scope="module")
def first(tmp_path_factory: pytest.TempPathFactory) -> Path:
    return issue(tmp_path_factory.mktemp("issues"), "first.xlsx")


def test_an_issue_is_the_same_as_itself(first: Path) -> None:
    changes, found = compared(first, first)
    assert changes == []
    assert found is not None
    assert found.old == found.new
    assert set(found.interplay.values()) == {0.0}


def test_each_changed_entry_is_found_at_its_cell(tmp_path: Path, first: Path) -> None:
    def change(tables: Tables) -> None:
        tables["level"][2]["weight"] += 100.0
        tables["direction"]["Y"]["R"] = 6.5
        tables["site"]["risk_category"] = "III"

    changes, _ = compared(first, issue(tmp_path, "next.xlsx", change))
    assert {c.path: (c.old, c.new) for c in changes} == {
        "level[3].weight": (BASE["level"][2]["weight"], BASE["level"][2]["weight"] + 100.0),
        "direction.Y.R": (BASE["direction"]["Y"]["R"], 6.5),
        "site.risk_category": ("II", "III"),
    }
    book = openpyxl.load_workbook(tmp_path / "next.xlsx")
    for c in changes:
        assert c.of is Of.INPUT
        assert c.cell is not None
        assert book[c.cell.sheet][c.cell.address].value == c.new


def test_levels_put_in_taken_out_renamed_and_moved_are_said_as_that(tmp_path: Path, first: Path) -> None:
    def change(tables: Tables) -> None:
        rows = tables["level"]
        rows[4]["name"] = "Amenity"
        rows.insert(2, {**rows[2], "name": "Mezzanine", "elevation": rows[2]["elevation"] + 6.0})
        del rows[7]
        rows.append(rows.pop(0))

    changes, _ = compared(first, issue(tmp_path, "next.xlsx", change))
    words = [c.words for c in changes]
    gone = BASE["level"][6]["name"]
    assert sorted(words) == sorted(
        [
            f"Level (level[5].name): {BASE['level'][4]['name']}, now Amenity",
            "level Mezzanine was added",
            f"level {gone} was removed",
            "level Roof stands in another place of the order",
        ]
    )


def test_cells_that_are_no_entries_are_compared_where_they_are_now(tmp_path: Path, first: Path) -> None:
    def change(book: Workbook) -> None:
        sheet = book["Levels"]
        heading = next(c for c in sheet[6] if c.value == "F_x X")
        sheet.cell(14, heading.column).value += "*1.02"
        book["Criteria"]["B7"] = "Another text"
        book.create_sheet("Notes")["A1"] = 5

    copy = tmp_path / "copy.xlsx"
    copy.write_bytes(first.read_bytes())
    changes, _ = compared(first, changed(copy, change))
    assert [(c.of, str(c.cell) if c.cell else c.words) for c in changes] == [
        (Of.SHEET, "sheet Notes is new"),
        (Of.CONTENT, "Criteria!B7"),
        (Of.FORMULA, next(str(c.cell) for c in changes if c.of is Of.FORMULA)),
    ]
    assert changes[-1].new == f"{changes[-1].old}*1.02"


def test_each_change_alone_and_what_they_do_together(tmp_path: Path, first: Path) -> None:
    def change(tables: Tables) -> None:
        tables["level"][0]["weight"] *= 1.5
        tables["direction"]["X"]["R"] = 7.0

    changes, found = compared(first, issue(tmp_path, "next.xlsx", change))
    assert found is not None
    heavier = json.loads(json.dumps(BASE))
    heavier["level"][0]["weight"] *= 1.5
    alone = solve(from_mapping(heavier)).direction["X"].V - solve(from_mapping(BASE)).direction["X"].V
    weight = next(one for one in found.single if "weight" in one.words)
    assert weight.moved["V X"] == pytest.approx(alone)
    assert weight.moved["T X"] == 0
    for key in found.old:
        parts = sum(one.moved[key] for one in found.single)
        assert found.old[key] + parts + found.interplay[key] == pytest.approx(found.new[key])
    assert found.interplay["V X"] > 0
    assert len(changes) == len(found.single) == 2


def test_a_change_that_cannot_stand_alone_says_why(tmp_path: Path, first: Path) -> None:
    def change(tables: Tables) -> None:
        tables["units"] = "si"

    _, found = compared(first, issue(tmp_path, "next.xlsx", change))
    assert found is not None
    (units,) = [one for one in found.single if "(units)" in one.words]
    assert (units.moved, units.reason) == ({}, "numbers in other units cannot be compared")


def test_workbooks_of_another_make_are_compared_cell_by_cell(tmp_path: Path) -> None:
    book = Workbook()
    sheet = book.active
    for row, name in enumerate(("Roof", "Third", "Second"), 1):
        for column, value in enumerate((name, 10.0 * row, f"=B{row}*2"), 1):
            sheet.cell(row, column, value)
    book.save(tmp_path / "a.xlsx")
    sheet.insert_rows(2)
    for column, value in enumerate(("Mezzanine", 15.0, "=B2*2"), 1):
        sheet.cell(2, column, value)
    sheet["C3"], sheet["C4"], sheet["B4"] = "=B3*2", "=B4*3", 31.0
    book.save(tmp_path / "b.xlsx")
    for name in "ab":
        compute_into(tmp_path / f"{name}.xlsx", tmp_path / f"{name}2.xlsx")
    changes, found = compared(tmp_path / "a2.xlsx", tmp_path / "b2.xlsx")
    assert found is None
    assert [(c.of, str(c.cell), c.old, c.new) for c in changes] == [
        (Of.CONTENT, "Sheet!B4", 30.0, 31.0),
        (Of.FORMULA, "Sheet!C4", "=B3*2", "=B4*3"),
    ]


class TestAgainst:
    def test_a_plausible_wrong_entry_is_found_with_its_effect(self, tmp_path: Path, first: Path) -> None:
        def change(tables: Tables) -> None:
            tables["direction"]["X"]["R"] = 6.0

        wrong = issue(tmp_path, "next.xlsx", change)
        assert audited(wrong).findings == ()
        (finding,) = audited(wrong, against=first).findings
        assert finding.kind.key == "input_changed"
        effect = next(e for e in finding.effects if e.headline == "Base shear V, direction X")
        assert effect.without == pytest.approx(solve(from_mapping(BASE)).direction["X"].V)
        assert effect.change > 0

    def test_rows_and_contents_that_differ_are_findings_too(self, tmp_path: Path, first: Path) -> None:
        def change(tables: Tables) -> None:
            del tables["level"][3]

        found = kinds_at(audited(issue(tmp_path, "next.xlsx", change), against=first))
        assert "row_changed" in {kind for kinds in found.values() for kind in kinds}
        path = computed_book(tmp_path)
        other = changed(
            path, lambda book: book["Notes"].append([1]) if "Notes" in book else book.create_sheet("N")
        )
        kinds = {f.kind.key for f in audited(other, against=path).findings}
        assert kinds == {"content_changed"}

    def test_the_same_issue_gives_nothing(self, first: Path) -> None:
        outcome = audited(first, against=first)
        assert outcome.findings == outcome.not_checked == ()


class TestCommand:
    def test_says_what_changed_and_what_it_did(self, tmp_path: Path, first: Path) -> None:
        def change(tables: Tables) -> None:
            tables["level"][0]["weight"] += 100.0

        other = issue(tmp_path, "next.xlsx", change)
        outcome = run("compare", first, other)
        assert (outcome.code, outcome.err) == (1, "")
        assert "changed inputs: 1\n" in outcome.out
        assert "Seismic weight of Roof (level[1].weight)" in outcome.out
        record = json.loads(run("compare", first, other, "--json").out)
        assert [c["path"] for c in record["changes"]] == ["level[1].weight"]
        assert record["influence"]["alone"][0]["moved"]["W"] == pytest.approx(100.0)

    def test_two_equal_issues_are_clean(self, first: Path) -> None:
        outcome = run("compare", first, first)
        assert outcome.code == 0
        assert "nothing changed" in outcome.out

    def test_a_missing_issue_is_refused(self, first: Path) -> None:
        assert_refused(run("compare", first, first.with_name("none.xlsx")), "none.xlsx", "no such file")
        assert_refused(run("audit", first, "--against", first.with_name("none.xlsx")), "none.xlsx")
