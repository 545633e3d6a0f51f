"""Two issues compared: each change with its cell, what it did to the results, and nothing else."""

from __future__ import annotations

import json
from pathlib import Path
from random import Random

import openpyxl
import pytest
from openpyxl import Workbook

from engine.building import from_mapping, solve
from tests.support.audited import changed
from tests.support.command import run
from tests.support.issues import BASE, Tables, issue, without_drift
from xlbridge.audit.compare.change import Change, Of
from xlbridge.audit.compare.changes import Issues
from xlbridge.audit.compare.influence import Influences, influences, steps
from xlbridge.audit.subject import Subject
from xlbridge.cli.own_template import own_template
from xlbridge.headless.compute import compute_into


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


@pytest.mark.parametrize("seed", range(8))
def test_planted_changes_of_our_workbooks_are_found_and_no_other(
    tmp_path: Path, first: Path, seed: int
) -> None:
    chance = Random(seed)
    expected: list[str] = []

    def change(tables: Tables) -> None:
        rows = tables["level"]
        kept = list(range(len(rows)))
        gone = chance.sample(kept[1:], chance.randrange(3))
        renamed, heavier = chance.sample([n for n in kept if n not in gone], 2)
        expected.extend(f"level {rows[n]['name']} was removed" for n in gone)
        expected.append(f"{rows[renamed]['name']}, now Renamed")
        expected.append(f"{rows[heavier]['weight']:g}, now {rows[heavier]['weight'] + 9:g} kip")
        rows[renamed]["name"] = "Renamed"
        rows[heavier]["weight"] += 9
        after = chance.randrange(len(rows) - 1)
        mean = (rows[after]["elevation"] + rows[after + 1]["elevation"]) / 2
        tables["level"] = [row for n, row in enumerate(rows) if n not in gone]
        added = {**rows[after], "name": "Added", "elevation": mean, "weight": 77.0, "P_x": 66.0}
        tables["level"].insert(min(after + 1, len(tables["level"])), added)
        expected.append("level Added was added")

    changes, _ = compared(first, issue(tmp_path, "next.xlsx", change))
    assert sorted(c.words.rpartition(": ")[2] for c in changes) == sorted(expected)


def test_results_are_those_of_the_same_level(tmp_path: Path, first: Path) -> None:
    def change(tables: Tables) -> None:
        del tables["level"][1]

    other = issue(tmp_path, "next.xlsx", change)
    issues = Issues.of(Subject.open(first, own_template), Subject.open(other, own_template))
    results = list(issues.results())
    found = {result.path: result for result in results if result.new is not None}
    heights = [row["elevation"] - BASE["site"]["base_elevation"] for row in BASE["level"]]
    lower = found["direction.X.C_vx[3]"]
    assert lower.old == pytest.approx(solve(from_mapping(BASE)).direction["X"].C_vx[3])
    assert lower.per_cent == pytest.approx(100 * (lower.new - lower.old) / lower.old)
    assert [found[f"h_x[{n}]"].old for n in (1, 2, 3)] == pytest.approx([heights[n] for n in (0, 2, 3)])
    assert not found["h_x[3]"].differs
    assert (found["h_x[2]"].change, found["h_x[2]"].per_cent) == (0.0, 0.0)
    gone = [r for r in results if r.new is None and r.path.startswith("h_x")]
    assert [(r.path, r.old, r.differs, r.change) for r in gone] == [("h_x[2]", heights[1], True, None)]


def test_entries_that_cannot_be_read_are_compared_as_cells(tmp_path: Path, first: Path) -> None:
    def change(book: Workbook) -> None:
        book["Criteria"]["D22"] = 7.0
        book["Levels"]["C12"] = "#N/A"

    copy = tmp_path / "copy.xlsx"
    copy.write_bytes(first.read_bytes())
    other = changed(copy, change)
    for old, new in ((first, other), (other, first)):
        changes, found = compared(old, new)
        assert found is None
        assert [(c.of, str(c.cell)) for c in changes] == [
            (Of.CONTENT, "Criteria!D22"),
            (Of.CONTENT, "Levels!C12"),
        ]
    outcome = run("compare", first, other)
    assert "not compared: the inputs of the new issue, because " in outcome.out


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


def test_numbers_in_other_units_are_not_compared(tmp_path: Path, first: Path) -> None:
    def change(tables: Tables) -> None:
        tables["units"] = "si"

    other = issue(tmp_path, "next.xlsx", change)
    changes, found = compared(first, other)
    assert "units" in {c.path for c in changes}
    assert found is None
    outcome = run("compare", first, other)
    assert (outcome.code, outcome.err) == (1, "")
    assert "results not compared: " in outcome.out


def test_a_column_of_entries_that_came_is_one_step(tmp_path: Path, first: Path) -> None:
    changes, found = compared(issue(tmp_path, "early.xlsx", without_drift), first)
    assert found is not None
    came = [c for c in changes if c.of is Of.INPUT]
    assert len(came) == 3 * len(BASE["level"])
    assert [c.old for c in came] == [None] * len(came)
    assert [one.words.partition(" of ")[0] for one in found.single] == [
        "Vertical load at and above",
        "Elastic displacement",
        "Elastic displacement",
    ]
    assert all(one.words.endswith(", and 8 more like it") for one in found.single)


def test_changes_that_stand_only_together_are_one_step(tmp_path: Path, first: Path) -> None:
    def change(tables: Tables) -> None:
        del tables["site"]["S_DS"], tables["site"]["S_D1"]
        tables["site"] |= {"S_MS": 1.8, "S_M1": 1.0}

    _, found = compared(first, issue(tmp_path, "late.xlsx", change))
    assert found is not None
    parts, one = found.single
    assert parts.words.startswith("parts ")
    assert one.words.startswith("what stands only together: ")
    assert all(f"(site.{key})" in one.words for key in ("S_DS", "S_D1", "S_MS", "S_M1"))
    assert one.moved["V X"] == pytest.approx(found.new["V X"] - found.old["V X"])
    assert one.moved["V X"] != 0


def test_what_is_gone_has_its_words_and_no_cell(tmp_path: Path, first: Path) -> None:
    changes, _ = compared(first, issue(tmp_path, "late.xlsx", without_drift))
    gone = [c for c in changes if c.of is Of.INPUT]
    assert {c.cell for c in gone} == {None}
    assert gone[0].words == "Vertical load at and above of Roof (level[1].P_x): 1390, now nothing"
    assert gone[0].unit == "kip"
    lines = [c.words for c in changes if c.of is Of.LINE and c.path.startswith("Levels ")]
    assert "column T of Levels is gone: Design story drift" in lines
    assert not [c for c in changes if c.of is Of.FORMULA and c.new is None]


def test_of_very_many_entries_a_column_is_a_step() -> None:
    some = [Change(Of.INPUT, f"level[{n}].weight", None, 1.0, 2.0, "") for n in range(1, 61)]
    more = [Change(Of.INPUT, f"level[{n}].P_x", None, 1.0, 2.0, "") for n in range(1, 61)]
    assert len(steps(some)) == 60
    assert [len(step) for step in steps([*some, *more])] == [60, 60]


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
        (Of.LINE, "Sheet!A2", None, "Mezzanine"),
        (Of.CONTENT, "Sheet!B4", 30.0, 31.0),
        (Of.FORMULA, "Sheet!C4", "=B3*2", "=B4*3"),
    ]


def test_cells_filled_and_emptied_and_formats_that_mislead(tmp_path: Path, first: Path) -> None:
    def change(book: Workbook) -> None:
        sheet = book["Levels"]
        sheet["C12"].number_format = '0.0,"k"'
        sheet["I5"] = "Shear"
        sheet["I13"] = None
        book["Notes" if "Notes" in book else "Checks"]["A60"] = "a line below"

    copy = tmp_path / "copy.xlsx"
    copy.write_bytes(first.read_bytes())
    changes, _ = compared(first, changed(copy, change))
    heading = openpyxl.load_workbook(first)["Levels"]["I13"].value
    assert {(c.of, str(c.cell), str(c.old), str(c.new)) for c in changes if c.of is not Of.LINE} == {
        (Of.FORMAT, "Levels!C12", "#,##0.0", '0.0,"k"'),
        (Of.CONTENT, "Levels!I5", "Story shear", "Shear"),
        (Of.FORMULA, "Levels!I13", heading, "None"),
    }
    assert [c.words for c in changes if c.of is Of.LINE] == ["row 60 of Checks is new: a line below"]
