"""The guard: every hostile file is refused with one sentence, whatever command it is given to."""

from __future__ import annotations

import os
from pathlib import Path

import pytest
from openpyxl import Workbook

from tests.support import hostile
from tests.support.command import assert_refused, run
from workbook_templates.build import build
from workbook_templates.parts import together
from xlbridge.headless import guard
from xlbridge.headless.book import Book
from xlbridge.headless.compute import FUNCTIONS
from xlbridge.headless.evaluate import Evaluator


@pytest.mark.parametrize("name", hostile.HOSTILE)
def test_a_hostile_file_is_refused_and_the_reason_said(tmp_path: Path, name: str) -> None:
    outcome = run("audit", hostile.write(tmp_path, name))
    assert_refused(outcome, hostile.HOSTILE[name].words)
    assert len(outcome.err) < 400


@pytest.mark.parametrize("command", ["calc", "inputs", "print", "names"])
def test_no_command_opens_one(tmp_path: Path, command: str) -> None:
    path = hostile.write(tmp_path, "a merge over the whole sheet")
    more = ["--for", "calc"] if command == "names" else []
    assert_refused(run(command, path, *more), "merges")
    assert list(tmp_path.iterdir()) == [path]


def test_the_workbook_they_are_made_of_is_none() -> None:
    assert guard.problem(hostile.packed(hostile.good())) == ""


def test_a_workbook_of_1000_levels_passes() -> None:
    parts = list(together("7-22"))
    assert guard.problem(build({"edition": "7-22", "units": "us", "parts": parts}, 40)) == ""
    assert guard.problem(build({"edition": "7-22", "units": "us", "parts": ["drift"]}, 1000)) == ""


@pytest.mark.parametrize(
    ("name", "value", "words"),
    [
        ("MAX_ENTRIES", 8, "parts, more than"),
        ("MAX_TOTAL", 10_000, "package unpacks"),
        ("MAX_PART", 2000, "part xl/"),
        ("MAX_FORMULA", 3, "formula longer"),
    ],
)
def test_a_limit_is_the_limit(monkeypatch: pytest.MonkeyPatch, name: str, value: int, words: str) -> None:
    data = hostile.in_sheet(b'<row r="2"><c r="A2"><f>' + b"1+" * 4090 + b"12345678</f></c></row>")
    assert guard.problem(data) == ""
    monkeypatch.setattr(guard, name, value)
    if name == "MAX_FORMULA":
        data = hostile.in_sheet(b'<row r="2"><c r="A2"><f>' + b"1+" * 4100 + b"1</f></c></row>")
    assert words in guard.problem(data)


@pytest.mark.skipif(not hasattr(os, "geteuid") or os.geteuid() == 0, reason="root may read everything")
def test_a_file_that_may_not_be_read(tmp_path: Path) -> None:
    path = hostile.write(tmp_path, "a text")
    path.chmod(0)
    assert_refused(run("audit", path), "cannot be read")


def test_a_file_is_read_no_further_than_its_limit(tmp_path: Path, monkeypatch: pytest.MonkeyPatch) -> None:
    path = tmp_path / "large.xlsx"
    with path.open("wb") as file:
        file.truncate(20 * 2**30)  # takes no room on the disk
    assert_refused(run("audit", path), "file is larger than 64 MB")
    monkeypatch.setattr(guard, "MAX_FILE", len(hostile.packed(hostile.good())) - 1)
    path.write_bytes(hostile.packed(hostile.good()))
    assert_refused(run("calc", path), "file is larger")


@pytest.mark.skipif(not hasattr(os, "mkfifo"), reason="no pipes with names there")
def test_a_pipe_is_not_waited_for(tmp_path: Path) -> None:
    os.mkfifo(tmp_path / "pipe.xlsx")
    for command in ("audit", "calc", "inputs"):
        assert_refused(run(command, tmp_path / "pipe.xlsx"), "no file")


def test_what_is_no_file(tmp_path: Path) -> None:
    assert_refused(run("calc", tmp_path), "folder")
    assert_refused(run("audit", tmp_path / "none.xlsx"), "no such file")


def test_a_text_that_doubles_from_cell_to_cell_ends_in_an_error() -> None:
    book = Workbook()
    book.active["A1"] = "x"
    for row in range(2, 200):
        book.active[f"A{row}"] = f"=A{row - 1}&A{row - 1}"
    values = Evaluator(Book.of(book), FUNCTIONS).evaluate_all().values
    title = book.active.title
    assert len(str(values[title, "A15"])) == 2**14
    assert {str(values[title, f"A{row}"]) for row in range(17, 200)} == {"#VALUE!"}


def test_a_far_cell_is_no_danger(tmp_path: Path) -> None:
    """The evaluator keeps the cells that exist: one at the end of the sheet costs nothing."""
    path = tmp_path / "far.xlsx"
    path.write_bytes(hostile.in_sheet(b'<row r="1048576"><c r="XFD1048576"><f>SUM(A:A)</f></c></row>'))
    assert run("calc", path).code in (0, 2)
