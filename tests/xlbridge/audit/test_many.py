"""Many workbooks: each has its outcome, whatever the others do; nothing is lost by an interrupt."""

from __future__ import annotations

import csv
import io
import json
import os
import re
import signal
import subprocess
import sys
import time
from pathlib import Path

import pytest
from lxml import html

from tests.support import hostile
from tests.support.audited import computed_book
from tests.support.command import ROOT, assert_refused, run
from xlbridge.audit import many
from xlbridge.audit.many import Outcome
from xlbridge.audit.report import summary
from xlbridge.audit.template import OwnTemplate
from xlbridge.cli.own_template import own_template
from xlbridge.headless.evaluate import Evaluator

CLEAN = 5
#: the command; a process that is started in the background may have been told to ignore interrupts
HEEDS_INTERRUPTS = (
    "import signal; signal.signal(signal.SIGINT, signal.default_int_handler); "
    "from xlbridge.cli import main; main()"
)


@pytest.fixture(scope="module")
def folder(tmp_path_factory: pytest.TempPathFactory) -> Path:
    """Clean workbooks, one of them in a folder below, one with stale values, and one that is hostile."""
    place = tmp_path_factory.mktemp("jobs")
    data = computed_book(tmp_path_factory.mktemp("made")).read_bytes()
    (place / "old").mkdir()
    for n in range(CLEAN):
        (place / ("old" if n == 0 else "") / f"tower-{n}.xlsx").write_bytes(data)
    hostile.write(place, "a merge over the whole sheet")
    (place / "~$tower-1.xlsx").write_bytes(b"a lock file")
    (place / "notes.txt").write_text("no workbook")
    return place


def dies(evaluator: Evaluator) -> OwnTemplate | None:
    """What a file does that ends the process that reads it."""
    if "dies" in os.environ.get("WHICH", "") or evaluator.book.constants["Cover"].get((4, 2)) == "dies":
        os._exit(9)
    return own_template(evaluator)


def hungry(evaluator: Evaluator) -> OwnTemplate | None:
    """What a file does that takes more memory than there may be."""
    bytearray(many.MEMORY)
    return own_template(evaluator)


class TestOutcomes:
    def test_every_file_of_a_folder_has_one(self, folder: Path) -> None:
        outcome = run("audit", folder, "--jobs", 2)
        assert outcome.code == 3
        lines = outcome.out.splitlines()
        assert lines[-1] == f"{CLEAN} of {CLEAN + 1} clean"
        assert sum(line.startswith("✓ clean") for line in lines) == CLEAN
        (refused,) = [line for line in lines if line.startswith("✗ not audited")]
        assert "merges" in refused
        assert "~$" not in outcome.out
        assert outcome.err == ""

    def test_several_files_keep_their_order(self, folder: Path) -> None:
        given = [folder / f"tower-{n}.xlsx" for n in (3, 1, 2)]
        outcome = run("audit", *given, "--json")
        assert outcome.code == 0
        files = json.loads(outcome.out)["files"]
        assert [Path(f["path"]).name for f in files] == [path.name for path in given]
        assert {f["verdict"] for f in files} == {"✓ clean"}
        assert files[0]["checked"] == files[0]["formula_cells"] > 300

    def test_one_gives_what_the_audit_of_one_gives(self, folder: Path) -> None:
        path = folder / "tower-1.xlsx"
        single = json.loads(run("audit", path, "--json").out)
        found = many.one(path, own_template)
        assert (found.checked, found.sha256) == (single["checked_cells"], single["sha256"])

    def test_a_process_that_dies_costs_its_file_alone(self, folder: Path, tmp_path: Path) -> None:
        import openpyxl

        deadly = tmp_path / "deadly.xlsx"
        book = openpyxl.load_workbook(folder / "tower-1.xlsx")
        book["Cover"]["B4"] = "dies"
        book.save(deadly)
        paths = [folder / "tower-1.xlsx", deadly, folder / "tower-2.xlsx", folder / "tower-3.xlsx"]
        found = {o.path: o for o in many.many(paths, dies, 2)}
        assert found[str(deadly)].failure.startswith("the process that audited it ended")
        assert [found[str(p)].verdict for p in paths if p != deadly] == ["✓ clean"] * 3

    @pytest.mark.skipif(sys.platform == "win32", reason="memory is not bounded there")
    def test_one_that_takes_too_much_memory_is_stopped(self, folder: Path) -> None:
        (found,) = many.many([folder / "tower-1.xlsx"], hungry, 1)
        assert found.failure == "the audit needs more memory than 2 GB"

    def test_one_that_takes_too_long_is_stopped(self, folder: Path, monkeypatch: pytest.MonkeyPatch) -> None:
        monkeypatch.setattr(many, "SECONDS", 0.0)
        (found,) = many.many([folder / "tower-1.xlsx"], own_template, 1)
        assert "longer than 0 s" in found.failure


class TestResume:
    def test_what_is_in_the_journal_is_not_audited_again(self, folder: Path, tmp_path: Path) -> None:
        journal = tmp_path / "journal.jsonl"
        assert run("audit", folder, "--resume", journal).code == 3
        lines = journal.read_text("utf-8").splitlines()
        assert len(lines) == CLEAN
        told = json.dumps({**json.loads(lines[-1]), "checked": 77_777})
        journal.write_text("\n".join([*lines, told, "[]", "\0", '{"path": "cut o']))
        outcome = run("audit", folder, "--resume", journal)
        assert outcome.out.count("checked 77777") == CLEAN
        assert len(journal.read_text("utf-8").splitlines()) == CLEAN + 4

    def test_the_journal_of_another_version_counts_for_nothing(self, folder: Path, tmp_path: Path) -> None:
        journal = tmp_path / "journal.jsonl"
        given = [folder / "tower-1.xlsx", folder / "tower-2.xlsx"]
        run("audit", *given, "--jobs", 1, "--resume", journal)
        lines = [json.loads(line) for line in journal.read_text("utf-8").splitlines()]
        old = "\n".join(json.dumps({**line, "storyledger": "0.0.1"}) for line in lines)
        journal.write_text(old + '\n{"path": "cut o')
        assert run("audit", *given, "--jobs", 1, "--resume", journal).code == 0
        text = journal.read_text("utf-8")
        assert text.startswith(old + "\n")  # what was there stays
        assert [json.loads(line) for line in text.splitlines()[3:]] == lines  # each on a line of its own

    def test_only_a_journal_is_written_to(self, folder: Path, tmp_path: Path) -> None:
        book = folder / "tower-1.xlsx"
        before = book.read_bytes()
        assert_refused(run("audit", folder, "--resume", book), "tower-1.xlsx", ".jsonl")
        assert book.read_bytes() == before
        assert_refused(run("audit", folder, "--resume", tmp_path / "no" / "a.jsonl"), "does not exist")

    @pytest.mark.skipif(sys.platform == "win32", reason="no such signal there")
    def test_an_interrupt_loses_nothing(self, folder: Path, tmp_path: Path) -> None:
        journal = tmp_path / "journal.jsonl"
        paths = [tmp_path / f"tower-{n}.xlsx" for n in range(12)]
        data = (folder / "tower-1.xlsx").read_bytes()
        for path in paths:
            path.write_bytes(data)
        call = [sys.executable, "-c", HEEDS_INTERRUPTS, "audit", *map(str, paths), "--jobs", "1"]
        process = subprocess.Popen(
            [*call, "--resume", str(journal)],
            cwd=ROOT,
            env={**os.environ, "PYTHONPATH": str(ROOT)},
            stdout=subprocess.PIPE,
            stderr=subprocess.PIPE,
            encoding="utf-8",
        )
        deadline = time.monotonic() + 60
        while not (journal.exists() and journal.read_text("utf-8").count("\n") >= 2):
            assert time.monotonic() < deadline
            time.sleep(0.02)
        process.send_signal(signal.SIGINT)
        out, err = process.communicate(timeout=60)
        assert process.returncode == 3
        assert "interrupted" in err
        assert "--resume" in err
        assert out == ""
        assert all(json.loads(line)["checked"] for line in journal.read_text("utf-8").splitlines())
        files = json.loads(run("audit", *paths, "--resume", journal, "--json").out)["files"]
        assert [f["path"] for f in files] == [str(path) for path in paths]


class TestSummaries:
    OUTCOMES = (
        Outcome("a.xlsx", "ab", 10, 10),
        Outcome("=HYPERLINK(1).xlsx", "cd", 9, 10, 1, 2, 3, 1),
        Outcome("<b>.xlsx", failure="-the file is damaged"),
    )

    def test_csv_has_nothing_that_is_taken_for_a_formula(self) -> None:
        rows = list(csv.reader(io.StringIO(summary.as_csv(self.OUTCOMES))))
        assert rows[0] == list(summary.COLUMNS.values())
        assert [row[0] for row in rows[1:]] == ["a.xlsx", "'=HYPERLINK(1).xlsx", "<b>.xlsx"]
        assert rows[3][8] == "'-the file is damaged"

    @pytest.mark.parametrize("begins", ["=", "+", "-", "@", "\t", "\r", "\n", "\0", "＝", " =", "\t@"])
    @pytest.mark.parametrize("before", ["", "a;", "a\n"])
    def test_no_field_begins_as_a_formula(self, begins: str, before: str) -> None:
        (_, row) = csv.reader(io.StringIO(summary.as_csv([Outcome(f"{before}{begins}1+1")]), newline=""))
        assert not row[0].startswith(("\t", "\r", "\n", "\0", " "))
        pieces = re.split(r"[;\t\r\n]", row[0])
        assert not [piece for piece in pieces if piece.strip(" \0").startswith(tuple("=+-@＝"))]
        assert row[0].replace("'", "") == f"{before}{begins}1+1"

    @pytest.mark.parametrize("name", ["a-b;c=d, e.xlsx", "Turm Süd @2.xlsx", "1e5"])
    def test_other_fields_stay_as_they_are(self, name: str) -> None:
        (_, row) = csv.reader(io.StringIO(summary.as_csv([Outcome(name, checked=-5)])))
        assert (row[0], row[2]) == (name, "-5")

    def test_the_page_lists_every_file_and_acts_on_none(self) -> None:
        tree = html.document_fromstring(summary.as_html(self.OUTCOMES))
        assert len(tree.xpath("//tbody/tr")) == 3
        assert not tree.xpath("//script | //*[@src]")
        words = tree.text_content()
        assert all(o.path in words for o in self.OUTCOMES)
        assert "✓ clean: 1" in words
        assert "authority having jurisdiction" in words

    @pytest.mark.parametrize("ending", ["html", "json", "csv"])
    def test_it_is_written_beside(self, folder: Path, tmp_path: Path, ending: str) -> None:
        target = tmp_path / f"all.{ending}"
        given = [folder / "tower-1.xlsx", folder / "tower-2.xlsx"]
        assert run("audit", *given, "--summary", target).code == 0
        assert "tower-2.xlsx" in target.read_text("utf-8")
        assert_refused(run("audit", *given, "--summary", target), target.name, "--force")


@pytest.mark.skipif(sys.platform != "linux", reason="such names are not allowed there")
def test_names_of_files_act_on_nothing(folder: Path, tmp_path: Path) -> None:
    data = (folder / "tower-1.xlsx").read_bytes()
    for name in (b"\xff.xlsx", b"a\x1b[2J\n\xe2\x9c\x93 clean b.xlsx"):
        (tmp_path / os.fsdecode(name)).write_bytes(data)
    for form in ("html", "json", "csv"):
        call = ("audit", tmp_path, "--jobs", 1, "--resume", tmp_path / "j.jsonl")
        outcome = run(*call, "--summary", tmp_path / f"all.{form}", "--force")
        assert outcome.code == 0
        assert len(outcome.out.splitlines()) == 3
        assert "\\udcff.xlsx" in outcome.out
        assert "\x1b" not in outcome.out
    names = [Path(f["path"]).name for f in json.loads((tmp_path / "all.json").read_text("utf-8"))["files"]]
    assert names == [os.fsdecode(b"a\x1b[2J\n\xe2\x9c\x93 clean b.xlsx"), os.fsdecode(b"\xff.xlsx")]
    assert len((tmp_path / "j.jsonl").read_bytes().splitlines()) == 2


class TestRefusals:
    def test_options_of_one_and_of_many_are_not_mixed(self, folder: Path, tmp_path: Path) -> None:
        assert_refused(run("audit", folder, "--report", tmp_path / "a.html"), "one workbook")
        assert_refused(run("audit", folder / "tower-1.xlsx", "--jobs", 2), "many workbooks")
        assert_refused(run("audit", folder, "--summary", tmp_path / "a.pdf"), "a.pdf", ".csv")
        (tmp_path / "empty").mkdir()
        assert_refused(run("audit", tmp_path / "empty"), "no workbook in the folder")
