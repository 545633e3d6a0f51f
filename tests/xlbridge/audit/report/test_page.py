"""The page: everything of the audit is in it, nothing in it acts, and it needs nothing from outside."""

from __future__ import annotations

import json
import re
from dataclasses import replace
from datetime import datetime
from pathlib import Path
from typing import Any

import pytest
from lxml import html
from openpyxl import Workbook

from tests.support.audited import audited, changed, computed_book
from tests.support.command import assert_refused, run
from xlbridge.audit.audit import Audit
from xlbridge.audit.finding import Finding, NotChecked, Observation, Place
from xlbridge.audit.kinds import KINDS, Severity
from xlbridge.audit.record import Answer, Person, Record
from xlbridge.audit.report.figures import figures, sheet_maps
from xlbridge.audit.report.page import CAUTIONS, page, shown, verdict
from xlbridge.values import CellError

AT = datetime(2026, 1, 5, 9, 30)
HOSTILE = "</script><script>alert(1)</script><img src=x onerror=alert(1)>"


@pytest.fixture(scope="module")
def clean(tmp_path_factory: pytest.TempPathFactory) -> Audit:
    return audited(computed_book(tmp_path_factory.mktemp("clean")))


@pytest.fixture(scope="module")
def faulty(tmp_path_factory: pytest.TempPathFactory) -> Audit:
    def spoil(book: Workbook) -> None:
        sheet = book["Levels"]
        top, column = next((c.row, c.column) for row in sheet.iter_rows() for c in row if c.value == "F_x X")
        sheet.cell(top + 8, column).value += "*1.05"
        book["Cover"]["B4"] = HOSTILE

    return audited(changed(computed_book(tmp_path_factory.mktemp("faulty")), spoil))


def read(text: str) -> Any:
    return html.document_fromstring(text)


def test_a_clean_workbook_reads_as_clean(clean: Audit) -> None:
    text = page(clean, made=AT)
    tree = read(text)
    assert tree.xpath("//p[starts-with(@class, 'verdict')]")[0].text_content() == verdict(clean)
    assert verdict(clean).startswith("✓")
    assert f"checked {clean.checked_cells} of {clean.formula_cells} formula cells" in text
    assert not tree.find_class("finding")
    assert clean.subject.sha256 in text
    assert "2026-01-05 09:30" in text


def test_results_stand_beside_what_the_inputs_give(clean: Audit) -> None:
    model = clean.subject.model["direction"]["X"]
    rows = read(page(clean)).xpath("//section[@aria-labelledby='results']//tbody/tr")
    found = {row[0].text_content(): [cell.text_content() for cell in row[1:]] for row in rows}
    assert found["Base shear V, direction X"] == ["kip", shown(model["V"]), shown(model["V"])]
    assert found["Period T, direction X"] == ["s", shown(model["T"]), shown(model["T"])]
    assert found["Largest theta, direction X"] == ["-", shown(max(model["theta"])), "–"]


def test_every_finding_and_every_cell_stands_in_it(faulty: Audit) -> None:
    tree = read(page(faulty))
    assert len(tree.find_class("finding")) == len(faulty.findings) >= 2
    for finding, shown_one in zip(faulty.findings, tree.find_class("finding"), strict=True):
        text = shown_one.text_content()
        assert all(str(o.place) in text and o.words in text for o in finding.observations)
        assert finding.kind.remedy in text
    cells = tree.xpath("//details[starts-with(@class, 'cell')]")
    assert len(cells) == faulty.formula_cells
    assert {cell.get("data-state") for cell in cells} == {"verified", "finding"}
    printed = [cell for cell in cells if "copy" not in cell.get("class").split()]
    assert 40 < len(printed) < len(cells) / 2
    assert all("copy" not in c.get("class") for c in cells if c.get("data-state") == "finding")


def test_the_verdict_counts_what_is_found_and_what_is_not_checked(faulty: Audit) -> None:
    kinds = {f.kind.severity: f for f in faulty.findings}
    one = replace(faulty, findings=(kinds[Severity.ERROR],), checks=faulty.checks[:1])
    assert verdict(one) == "✗ 1 error and 0 warnings to be answered"
    missing = replace(faulty.checks[0], not_checked=(NotChecked("formula", "a reason"),))
    note = Observation("entry_is_formula", Place("Levels", "A1"), "words")
    known = replace(one, findings=(Finding(1, KINDS[note.kind], (note,)),))
    assert verdict(known) == "✓ nothing to be answered, 1 note: every formula cell verified"
    some = replace(faulty, findings=(kinds[Severity.ERROR],) * 2, checks=(missing,))
    assert verdict(some) == "✗ 2 errors and 0 warnings to be answered; 1 thing could not be checked"


def test_the_cautions_and_the_limits_are_on_it(clean: Audit) -> None:
    words = " ".join(read(page(clean)).text_content().split())
    assert all(caution in words for caution in CAUTIONS)
    assert "agree within 1e-09 of their value, results by both routes within 1e-12" in words
    assert "authority having jurisdiction" in words


def test_texts_of_the_workbook_and_of_the_record_cannot_act(faulty: Audit) -> None:
    record = Record(findings={"stale_value A1": Answer(words=HOSTILE)})
    text = page(faulty, record)
    tree = read(text)
    assert len(tree.xpath("//script")) == 2
    assert not tree.xpath("//img")
    assert HOSTILE in tree.xpath("//header")[0].text_content()
    data = json.loads(tree.get_element_by_id("record-data").text)
    assert data["findings"]["stale_value A1"]["words"] == HOSTILE


def test_it_asks_for_nothing_from_outside(clean: Audit) -> None:
    text = page(clean)
    assert "default-src 'none'" in text
    assert not re.search(r"https?://", text)
    assert not read(text).xpath("//link | //*[@src] | //iframe")


def test_the_record_has_a_field_for_each_role_input_and_finding(faulty: Audit) -> None:
    record = Record({"checker": Person("B. Checker")})
    tree = read(page(faulty, record))
    fields = tree.xpath("//*[@data-table]")
    keys = {(f.get("data-table"), f.get("data-key"), f.get("data-part")) for f in fields}
    assert len(keys) == len(fields)
    assert ("people", "back-checker", "qualification") in keys
    assert ("inputs", "site.S_DS", "mark") in keys
    assert sum(table == "findings" for table, *_ in keys) == 2 * len(faulty.findings)
    assert all(f.get("aria-label") or f.xpath("ancestor::label") for f in fields)


def test_a_workbook_of_another_make_says_what_it_cannot_show(tmp_path: Path) -> None:
    book = Workbook()
    book.active.append([2, 3, "=A1*B1", "=TODAY()"])
    book.save(tmp_path / "other.xlsx")
    outcome = audited(changed(tmp_path / "other.xlsx", lambda book: None))
    words = read(page(outcome)).text_content()
    assert "cannot be told from its results" in words
    assert "checked 1 of 2 formula cells" in words
    assert not list(figures(outcome))


class TestFigures:
    def test_there_is_one_for_forces_shears_and_drifts(self, clean: Audit) -> None:
        found = {figure.caption: figure for figure in figures(clean)}
        assert list(found) == [
            "Story forces F_x [kip]",
            "Story shears V_x [kip]",
            "Design story drift over its limit",
        ]
        for figure in found.values():
            svg = html.fragment_fromstring(figure.svg)
            assert len(svg.xpath(".//polyline")) == 2
            assert len(svg.xpath(".//circle")) == 2 * 6
            assert svg.xpath("string(.//title)") == figure.caption
        assert "limit" in found["Design story drift over its limit"].svg

    def test_values_are_drawn_to_scale(self, clean: Audit) -> None:
        assert clean.subject.own
        forces = clean.subject.own.results["direction"]["X"]["F_x"]
        svg = html.fragment_fromstring(next(figures(clean)).svg)
        line = svg.xpath(".//polyline")[0].get("points").split()
        x = sorted(float(point.split(",")[0]) - 78 for point in line)
        assert [a / x[-1] for a in x] == pytest.approx([f / max(forces) for f in sorted(forces)], abs=1e-3)

    def test_the_map_shows_each_cell_once(self, faulty: Audit) -> None:
        maps = list(sheet_maps(faulty))
        assert sum(sum(m.counts.values()) for m in maps) == faulty.formula_cells
        levels = next(m for m in maps if m.sheet == "Levels")
        assert levels.svg.count("h6v6h-6z") == sum(levels.counts.values())
        assert levels.svg.count("l4 4m0-4l-4 4") == levels.counts["finding"] > 0

    def test_formulas_far_apart_make_no_large_map(self, tmp_path: Path) -> None:
        book = Workbook()
        for address in ("A1", "B2", "XFD1048576"):
            book.active[address] = "=TODAY()"
        book.save(tmp_path / "far.xlsx")
        (found,) = sheet_maps(audited(tmp_path / "far.xlsx"))
        width, height = map(float, re.findall(r'(?:width|height)="([^"]+)"', found.svg))
        assert width == height < 60
        assert found.svg.count("m0 2h4") == found.counts["not checked"] == 3


class TestCommand:
    def test_reports_are_written_beside(self, tmp_path: Path) -> None:
        path = computed_book(tmp_path)
        targets = [tmp_path / "audit.html", tmp_path / "audit.json"]
        outcome = run("audit", path, *(f"--report={target}" for target in targets))
        assert (outcome.code, outcome.err) == (0, "")
        assert targets[0].read_text("utf-8").startswith("<!doctype html>")
        assert json.loads(targets[1].read_text("utf-8")) == json.loads(run("audit", path, "--json").out)
        assert_refused(run("audit", path, f"--report={targets[0]}"), "audit.html", "--force")

    def test_what_cannot_be_written_or_read_is_refused(self, tmp_path: Path) -> None:
        path = computed_book(tmp_path)
        assert_refused(run("audit", path, f"--report={tmp_path / 'a.pdf'}"), "a.pdf", ".html")
        people = {role: {"name": "A. Maker"} for role in ("originator", "checker")}
        (tmp_path / "record.json").write_text(json.dumps({"people": people}))
        record = f"--record={tmp_path / 'record.json'}"
        assert_refused(run("audit", path, record, f"--report={tmp_path / 'a.html'}"), "one person")
        assert not (tmp_path / "a.html").exists()

    def test_the_record_of_an_earlier_page_is_taken_in(self, tmp_path: Path) -> None:
        path, target = computed_book(tmp_path), tmp_path / "a.html"
        (tmp_path / "r.json").write_text(Record({"checker": Person("B. Checker")}).text())
        assert run("audit", path, f"--record={tmp_path / 'r.json'}", f"--report={target}").code == 0
        data = read(target.read_text("utf-8")).get_element_by_id("record-data").text
        assert Record.read(data).people["checker"].name == "B. Checker"


@pytest.mark.parametrize(
    ("value", "text"),
    [
        (1234.56789, "1234.568"),
        (True, "TRUE"),
        (None, ""),
        ("kip", "kip"),
        (CellError("#NUM!", "why"), "#NUM!"),
    ],
)
def test_values_as_a_reader_takes_them(value: object, text: str) -> None:
    assert shown(value) == text
