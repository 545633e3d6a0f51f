"""An audit against the checked issue, and the command that compares two."""

from __future__ import annotations

import json
from pathlib import Path

import openpyxl
import pytest
from openpyxl import Workbook

from engine.building import from_mapping, solve
from tests.support.audited import audited, changed, computed_book, kinds_at
from tests.support.command import assert_refused, run
from tests.support.issues import BASE, Tables, issue, without_drift


@pytest.fixture(scope="module")
def first(tmp_path_factory: pytest.TempPathFactory) -> Path:
    return issue(tmp_path_factory.mktemp("issues"), "first.xlsx")


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

    def test_a_formula_changed_down_a_column_is_one_finding_with_its_effect(
        self, tmp_path: Path, first: Path
    ) -> None:
        def change(book: Workbook) -> None:
            sheet = book["Levels"]
            for row in range(12, 21):
                sheet[f"H{row}"].value += "*1.1"
            sheet["H12"].number_format = "0"

        copy = tmp_path / "copy.xlsx"
        copy.write_bytes(first.read_bytes())
        found = audited(changed(copy, change), against=first).findings
        (column,) = [f for f in found if f.kind.key == "formula_changed"]
        assert [p.address for p in column.places] == [f"H{row}" for row in range(12, 21)]
        effect = next(e for e in column.effects if e.headline == "Overturning at the base, direction X")
        assert effect.without == pytest.approx(solve(from_mapping(BASE)).direction["X"].M_base)
        assert effect.per_cent == pytest.approx(10.0)
        assert {f.kind.key for f in found if f.kind.method == "against"} == {
            "formula_changed",
            "format_changed",
        }

    def test_the_expected_formula_stands_where_the_cell_is_now(self, tmp_path: Path, first: Path) -> None:
        def remove(tables: Tables) -> None:
            del tables["level"][1]

        def change(book: Workbook) -> None:
            book["Levels"]["H15"].value += "*1.1"

        clean = issue(tmp_path, "next.xlsx", remove)
        formula = openpyxl.load_workbook(clean)["Levels"]["H15"].value
        found = audited(changed(clean, change), against=first).findings
        (finding,) = [f for f in found if f.kind.key == "formula_changed"]
        (seen,) = finding.observations
        assert (str(seen.place), seen.expected, seen.found) == ("Levels!H15", formula, f"{formula}*1.1")

    def test_entries_that_came_or_went_are_findings(self, tmp_path: Path, first: Path) -> None:
        early = issue(tmp_path, "early.xlsx", without_drift)
        for now, before in ((early, first), (first, early)):
            outcome = audited(now, against=before)
            inputs = [f for f in outcome.findings if f.kind.key == "input_changed"]
            assert [len(f.observations) for f in inputs] == [len(BASE["level"])] * 3
            gone = now is early
            assert all(bool(f.effects) != gone for f in inputs)
            assert not any(e.change for f in inputs for e in f.effects if "Base shear" in e.headline)

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
        assert "licensed engineer" in " ".join(record["cautions"])
        assert record["influence"]["alone"][0]["moved"]["W"] == pytest.approx(100.0)

    def test_two_equal_issues_are_clean(self, first: Path) -> None:
        outcome = run("compare", first, first)
        assert outcome.code == 0
        assert "nothing changed" in outcome.out

    def test_a_missing_issue_is_refused(self, first: Path) -> None:
        assert_refused(run("compare", first, first.with_name("none.xlsx")), "none.xlsx", "no such file")
        assert_refused(run("audit", first, "--against", first.with_name("none.xlsx")), "none.xlsx")
