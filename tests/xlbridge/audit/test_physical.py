"""What a building can hardly be: each bound met from both sides, slips of units named, nothing else said."""

from __future__ import annotations

import json
import tomllib
from pathlib import Path
from typing import Any

import pytest
from openpyxl import Workbook

from engine.building import from_mapping, to_mapping
from tests.support.audited import audited, computed_book
from tests.support.command import assert_refused, run
from workbook_templates.build import write_workbook
from workbook_templates.demo import building_text
from xlbridge.audit import physical
from xlbridge.audit.acceptance import AcceptanceError, read
from xlbridge.audit.finding import Finding
from xlbridge.audit.physical import RULES, SOURCE
from xlbridge.headless.compute import compute_into

BASE: dict[str, Any] = to_mapping(from_mapping(tomllib.loads(building_text())))


def findings(folder: Path, change: Any, name: str = "book.xlsx") -> tuple[Finding, ...]:
    """The findings of the demonstration building with some entries changed."""
    tables = json.loads(json.dumps(BASE))
    change(tables)
    write_workbook(tables, folder / name)
    return tuple(f for f in audited(folder / name).findings if f.kind.method == "physical")


def set_level(key: str, factor: float, level: int = 4) -> Any:
    def change(tables: dict[str, Any]) -> None:
        tables["level"][level][key] *= factor

    return change


def set_site(key: str, value: float) -> Any:
    return lambda tables: tables["site"].update({key: value})


def set_direction(key: str, value: float) -> Any:
    return lambda tables: tables["direction"]["X"].update({key: value})


PLANTED: dict[str, tuple[Any, str, str, str]] = {
    "a weight in lb": (set_level("weight", 1000.0), "implausible_value", "seismic weight", "lb for kip"),
    "a weight of another level": (set_level("weight", 4.0), "implausible_step", "seismic weight", ""),
    "a weight ten times too small": (set_level("weight", 0.1), "implausible_step", "seismic weight", ""),
    "S_DS in per cent": (set_site("S_DS", 105.0), "implausible_value", "S_DS", ""),
    "S_DS and S_D1 exchanged": (
        lambda t: t["site"].update(S_DS=t["site"]["S_D1"], S_D1=t["site"]["S_DS"]),
        "implausible_value",
        "S_D1 over S_DS",
        "",
    ),
    "a period in another unit": (set_direction("T_computed", 180.0), "implausible_value", "period", ""),
    "C_d far above R": (set_direction("C_d", 12.0), "implausible_value", "C_d", ""),
    "a displacement of the level below": (
        set_level("delta_xe_X", 0.5), "implausible_order", "elastic displacement", ""
    ),
    "displacements in mm": (
        lambda t: [row.update(delta_xe_X=row["delta_xe_X"] * 25.4) for row in t["level"]],
        "implausible_value",
        "design story drift over story height",
        "25.4 (mm for in)",
    ),
    "gravity loads from the base up": (
        lambda t: [
            row.update(P_x=other)
            for row, other in zip(t["level"], [r["P_x"] for r in t["level"]][::-1], strict=True)
        ],
        "implausible_order",
        "gravity load",
        "",
    ),
}  # fmt: skip


@pytest.mark.parametrize("name", PLANTED)
def test_a_slip_is_seen_and_named(tmp_path: Path, name: str) -> None:
    change, kind, what, hint = PLANTED[name]
    found = findings(tmp_path, change)
    mine = [f for f in found if f.kind.key == kind and what in f.words]
    assert mine, [f.words for f in found]
    assert SOURCE in mine[0].words
    assert hint in mine[0].words
    assert all(place.address for f in mine for place in f.places)


def test_the_demonstration_has_none(tmp_path: Path) -> None:
    assert findings(tmp_path, lambda tables: None) == ()


@pytest.mark.parametrize("units", ["us", "si"])
def test_starter_values_have_none(tmp_path: Path, units: str) -> None:
    assert audited(computed_book(tmp_path, {"units": units})).findings == ()


def test_the_order_of_the_rows_is_free(tmp_path: Path) -> None:
    assert findings(tmp_path, lambda t: t["level"].reverse()) == ()


def test_a_light_roof_is_no_jump(tmp_path: Path) -> None:
    assert findings(tmp_path, set_level("weight", 0.25, level=0)) == ()
    found = findings(tmp_path, set_level("weight", 0.25, level=1), "next.xlsx")
    assert {f.kind.key for f in found} == {"implausible_step"}


@pytest.mark.parametrize("kind", RULES)
def test_every_rule_names_what_it_looks_at(tmp_path: Path, kind: str) -> None:
    for rule in RULES[kind]:
        assert rule["what"]
        ranges = [rule[key] for key in ("us", "si", "any") if key in rule]
        assert all(low < high for low, high in ranges)
        assert kind == "order" or ("any" in rule) != ("us" in rule and "si" in rule)


def test_a_workbook_of_another_make_is_not_judged(tmp_path: Path) -> None:
    Workbook().save(tmp_path / "own.xlsx")
    outcome = audited(tmp_path / "own.xlsx")
    assert "physical plausibility" in {item.what for item in outcome.not_checked}
    assert next(c for c in outcome.checks if c.method == physical.METHOD).looked_at == 0


class TestAnotherMake:
    """A workbook with its own layout: what the worksheet functions are given says what its numbers are."""

    def book(self, folder: Path, S_DS: float = 1.0, third: float = 420.0) -> tuple[Finding, ...]:
        book = Workbook()
        sheet = book.active
        sheet["F1"], sheet["F2"] = S_DS, '=ELF_CS(F1,0.5,0.4,0.6,8,8,1,"7-22")'
        for row, weight in enumerate((300.0, 400.0, third, 450.0), 1):
            sheet.cell(row, 1, 12.0 * (5 - row))
            sheet.cell(row, 2, weight)
            sheet.cell(row, 3, f"=ELF_CVX(B{row},A{row},B$1:B$4,A$1:A$4,1)")
        book.save(folder / "own.xlsx")
        compute_into(folder / "own.xlsx", folder / "computed.xlsx", force=True)
        return tuple(f for f in audited(folder / "computed.xlsx").findings if f.kind.method == "physical")

    def test_plausible_ones_give_nothing(self, tmp_path: Path) -> None:
        assert self.book(tmp_path) == ()
        outcome = audited(tmp_path / "computed.xlsx")
        looked_at = next(c for c in outcome.checks if c.method == physical.METHOD).looked_at
        assert looked_at >= 5
        assert any("nobody says" in item.because for item in outcome.not_checked)

    def test_a_weight_in_another_unit_is_one_finding(self, tmp_path: Path) -> None:
        (found,) = self.book(tmp_path, third=420_000.0)
        assert found.kind.key == "implausible_step"
        assert "B$1:B$4" in found.words
        assert "1000" in found.words

    def test_a_spectrum_in_per_cent_is_one_finding(self, tmp_path: Path) -> None:
        (found,) = self.book(tmp_path, S_DS=105.0)
        assert found.kind.key == "implausible_value"
        assert str(found.places[0]) == "Sheet!F2"


class TestAcceptance:
    ACCEPTED = (
        '[[accepted]]\nkind = "implausible_step"\nplace = "Levels!C16"\n'
        'reason = "mechanical floor, see drawing S-205"\nby = "B. Checker"\ndate = "2026-01-07"\n'
    )

    def book(self, folder: Path) -> Path:
        findings(folder, set_level("weight", 4.0))
        return folder / "book.xlsx"

    def test_an_accepted_finding_is_listed_with_its_reason_and_weighs_nothing(self, tmp_path: Path) -> None:
        path, file = self.book(tmp_path), tmp_path / "accepted.toml"
        assert run("audit", path).code == 1
        file.write_text(self.ACCEPTED)
        outcome = run("audit", path, "--accept", file)
        assert outcome.code == 0
        assert "accepted by B. Checker, 2026-01-07: mechanical floor" in outcome.out
        record = json.loads(run("audit", path, "--accept", file, "--json").out)
        assert [f["accepted"] != "" for f in record["findings"]] == [True]

    def test_an_acceptance_of_what_is_not_there_is_said(self, tmp_path: Path) -> None:
        path, file = self.book(tmp_path), tmp_path / "accepted.toml"
        file.write_text(self.ACCEPTED.replace("C16", "C99"))
        outcome = run("audit", path, "--accept", file)
        assert outcome.code == 1
        found = audited(path, acceptances=read(file.read_text())).findings
        assert {f.kind.key for f in found} == {"implausible_step", "acceptance_unused"}

    @pytest.mark.parametrize(
        ("change", "words"),
        [
            (("implausible_step", "stale_value"), "is an error, which is mended"),
            (("implausible_step", "any_thing"), "no kind of finding"),
            (("B. Checker", " "), "by is blank"),
            (("by =", "who ="), "it needs by, date"),
            (("[[accepted]]", "[accepted]"), r"tables \[\[accepted\]\]"),
            (("kind", "=kind"), "not TOML"),
        ],
    )
    def test_what_is_no_acceptance_is_refused(self, change: tuple[str, str], words: str) -> None:
        with pytest.raises(AcceptanceError, match=words):
            read(self.ACCEPTED.replace(*change))

    def test_the_command_refuses_in_one_sentence(self, tmp_path: Path) -> None:
        path = self.book(tmp_path)
        (tmp_path / "accepted.toml").write_text("x")
        assert_refused(run("audit", path, "--accept", tmp_path / "accepted.toml"), "not TOML")
