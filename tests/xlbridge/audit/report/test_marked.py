"""The marked copy: every finding at its cell and in its sheet, every other part as it was."""

from __future__ import annotations

from dataclasses import replace
from datetime import datetime
from io import BytesIO
from pathlib import Path
from typing import Any

import openpyxl
import pytest
from openpyxl import Workbook
from openpyxl.chart import BarChart
from openpyxl.comments import Comment

from tests.support.audited import audited, changed, computed_book
from tests.support.command import assert_refused, run
from tests.support.office import Office
from tests.support.packages import parts_of
from xlbridge.audit.audit import Audit
from xlbridge.audit.finding import Place
from xlbridge.audit.record import Answer, Person, Record, key_of
from xlbridge.audit.report.marked import FINDINGS, RECORD, marked, notes_of
from xlbridge.audit.report.page import CAUTIONS
from xlbridge.headless.book import Book

AT = datetime(2026, 1, 5, 9, 30)
OWN_NOTE = "checked by hand"


@pytest.fixture(scope="module")
def spoiled(tmp_path_factory: pytest.TempPathFactory) -> Audit:
    """A force raised by a twentieth, a force typed in; the second has a note of the engineer's."""

    def spoil(book: Workbook) -> None:
        sheet = book["Levels"]
        top, column = next((c.row, c.column) for row in sheet.iter_rows() for c in row if c.value == "F_x X")
        sheet.cell(top + 8, column).value += "*1.05"
        sheet.cell(top + 9, column).value = 44.0
        sheet.cell(top + 9, column).comment = Comment(OWN_NOTE, "an engineer")

    return audited(changed(computed_book(tmp_path_factory.mktemp("spoiled")), spoil))


@pytest.fixture(scope="module")
def copy(spoiled: Audit, tmp_path_factory: pytest.TempPathFactory) -> Path:
    path = tmp_path_factory.mktemp("copy") / "marked.xlsx"
    path.write_bytes(marked(spoiled, made=AT))
    return path


def column(path: Path, title: str, heading: str) -> list[Any]:
    """The cells under a heading of an added sheet."""
    sheet = openpyxl.load_workbook(path)[title]
    head = next(cell for row in sheet.iter_rows() for cell in row if cell.value == heading)
    cells = (sheet.cell(row, head.column).value for row in range(head.row + 1, sheet.max_row + 1))
    return list(cells)


def test_every_place_of_a_finding_has_its_note(spoiled: Audit, copy: Path) -> None:
    book = openpyxl.load_workbook(copy)
    seen = {(p.sheet, p.address) for finding in spoiled.findings for p in finding.places}
    assert len(seen) > 5
    for sheet, address in seen:
        note = book[sheet][address].comment
        for finding in spoiled.findings:
            at = [o for o in finding.observations if (o.place.sheet, o.place.address) == (sheet, address)]
            assert all(f"Finding {finding.number}," in note.text and o.words in note.text for o in at)
    typed = next(f for f in spoiled.findings if f.kind.key == "constant_for_formula").places[0]
    assert book[typed.sheet][typed.address].comment.text.startswith(f"{OWN_NOTE}\n\nFinding ")


def test_the_sheet_of_findings_has_a_row_for_each_observation(spoiled: Audit, copy: Path) -> None:
    observations = [o for finding in spoiled.findings for o in finding.observations]
    assert column(copy, FINDINGS, "cell") == [str(o.place) for o in observations]
    assert column(copy, FINDINGS, "what") == [o.words for o in observations]
    assert column(copy, FINDINGS, "expected") == [o.expected or None for o in observations]
    typed = next(f for f in spoiled.findings if f.kind.key == "constant_for_formula")
    effects = [text for text in column(copy, FINDINGS, "what it does to the results") if text]
    assert len(effects) == sum(bool(finding.effects) for finding in spoiled.findings) >= 2
    moment = next(e for e in typed.effects if e.headline == "Overturning at the base, direction X")
    assert moment.per_cent is not None
    line = f"{moment.headline}: {moment.value:.7g} kip-ft, {moment.without:.7g} without it"
    assert f"{line} ({moment.per_cent:+.2f} %)" in effects[-1].splitlines()
    sheet = openpyxl.load_workbook(copy)[FINDINGS]
    texts = [cell for row in sheet.iter_rows() for cell in row if str(cell.value).startswith("=")]
    assert {cell.data_type for cell in texts} == {"s"}
    links = [cell.hyperlink.location for row in sheet.iter_rows() for cell in row if cell.hyperlink]
    assert links == [str(o.place) for o in observations]


def test_formulas_values_and_other_parts_are_those_of_the_file(spoiled: Audit, copy: Path) -> None:
    before, after = Book.open(spoiled.subject.path), Book.open(copy)
    for sheet in before.sheets:
        assert after.formulas[sheet] == before.formulas[sheet]
        assert after.constants[sheet] == before.constants[sheet]
    for cell in before.formula_cells():
        assert after.stored(cell) == before.stored(cell)
    assert after.sheets == (*before.sheets, FINDINGS, RECORD)
    assert after.names.items() >= before.names.items()
    old, new = parts_of(spoiled.subject.path), parts_of(copy)
    touched = {name for name in old if old[name] != new[name]}
    marked_sheets = {"Levels"}
    assert set(notes_of(spoiled)) == marked_sheets
    allowed = ("[Content_Types].xml", "xl/workbook.xml", "xl/_rels/workbook.xml.rels", "xl/styles.xml")
    assert all(name in allowed or "omment" in name for name in touched), touched


def test_the_check_record_holds_what_was_said(spoiled: Audit, tmp_path: Path) -> None:
    finding = spoiled.findings[1]
    record = Record(
        {"checker": Person("B. Checker", "PE", "2026-01-05")},
        {"site.S_DS": Answer("query", "which report?")},
        {key_of(finding): Answer("", "=put back", "BC 2026-01-06")},
    )
    path = tmp_path / "marked.xlsx"
    path.write_bytes(marked(spoiled, record, AT))
    rows = list(openpyxl.load_workbook(path)[RECORD].values)
    words = {str(cell) for row in rows for cell in row if cell is not None}
    assert {spoiled.subject.sha256, "ASCE/SEI 7-22", "2026-01-05", "query", "which report?"} <= words
    assert ("checker", "B. Checker", "PE", "2026-01-05") in [row[:4] for row in rows]
    assert [a for a in column(path, FINDINGS, "response") if a] == ["=put back"]
    assert [a for a in column(path, FINDINGS, "closed (initials, date)") if a] == ["BC 2026-01-06"]
    for title in (FINDINGS, RECORD):
        lines = [row[0] for row in openpyxl.load_workbook(path)[title].values if row[0]]
        assert CAUTIONS[0] in " ".join(map(str, lines))


def test_a_copy_of_a_copy_is_marked_again(copy: Path, tmp_path: Path) -> None:
    again = openpyxl.load_workbook(BytesIO(marked(audited(copy))))
    assert again.sheetnames[-4:] == [FINDINGS, RECORD, f"{FINDINGS} 2", f"{RECORD} 2"]


def test_a_workbook_of_another_make_is_marked_too(tmp_path: Path) -> None:
    book, path = Workbook(), tmp_path / "other.xlsx"
    book.active.append([2, 0, "=A1/B1", "=TODAY()"])
    book.create_chartsheet("Picture").add_chart(BarChart())
    book.save(path)
    copy = openpyxl.load_workbook(BytesIO(marked(audited(changed(path, lambda book: None)))))
    assert "#DIV/0!" in copy["Sheet"]["C1"].comment.text
    assert copy.sheetnames == ["Sheet", "Picture", FINDINGS, RECORD]


def test_a_finding_on_a_sheet_that_is_gone_leads_nowhere(spoiled: Audit) -> None:
    seen = replace(spoiled.findings[0].observations[0], place=Place("Gone", "B2"))
    audit = replace(spoiled, findings=(replace(spoiled.findings[0], observations=(seen,)),))
    book = openpyxl.load_workbook(BytesIO(marked(audit)))
    cells = [cell for row in book[FINDINGS].iter_rows() for cell in row]
    assert "Gone!B2" in [cell.value for cell in cells]
    assert not any(cell.hyperlink for cell in cells)


def test_two_copies_are_the_same_bytes(spoiled: Audit) -> None:
    assert marked(spoiled, made=AT) == marked(spoiled, made=AT)


def test_calc_opens_it_with_the_same_values(spoiled: Audit, copy: Path, office: Office) -> None:
    with office.open(copy, recalculate=False) as book:
        assert book.sheets()[-2:] == [FINDINGS, RECORD]
        for (sheet, address), value in spoiled.subject.results.values.items():
            if isinstance(value, float):
                assert book.value(sheet, address) == pytest.approx(value, rel=1e-12), (sheet, address)
        assert str(book.value(FINDINGS, "A1")).startswith("Audit findings")


class TestCommand:
    def test_the_copy_is_written_beside(self, tmp_path: Path) -> None:
        path, target = computed_book(tmp_path), tmp_path / "marked.xlsx"
        before = path.read_bytes()
        assert run("audit", path, f"--report={target}").code == 0
        assert path.read_bytes() == before
        assert RECORD in openpyxl.load_workbook(target).sheetnames
        assert_refused(run("audit", path, f"--report={target}"), "marked.xlsx", "--force")
        assert_refused(run("audit", path, f"--report={path}", "--force"), "never changed")

    def test_a_workbook_with_macros_keeps_its_ending(self, tmp_path: Path) -> None:
        path = computed_book(tmp_path).rename(tmp_path / "story.xlsm")
        assert_refused(run("audit", path, f"--report={tmp_path / 'a.xlsx'}"), "a.xlsx", ".xlsm")
