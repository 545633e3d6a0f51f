"""``calc --with calc`` and ``print``: what a real Calc computes and prints."""

from __future__ import annotations

import hashlib
import json
import re
import shutil
import subprocess
from pathlib import Path

import openpyxl
import pytest

from tests.support.command import assert_refused, run, unchanged
from tests.support.story_books import story_book
from tests.xlbridge.calc.test_in_calc import same
from workbook_templates.build import build_native
from xlbridge.calc import office as offices
from xlbridge.headless.book import Book
from xlbridge.headless.compute import compute

GIVEN = {"edition": "7-22", "units": "si", "parts": ["drift"]}
needs_office = pytest.mark.usefixtures("office")


@needs_office
@pytest.mark.parametrize("kind", ["with functions", "in built-in functions"])
def test_calc_stores_what_a_real_calc_computes(tmp_path: Path, kind: str) -> None:
    path = story_book(tmp_path, GIVEN)
    headless = compute(path).values
    if kind != "with functions":
        path.write_bytes(build_native(GIVEN, headless))
        headless = compute(path).values
    with unchanged(tmp_path, but=("calc.xlsx",)):
        outcome = run("calc", path, "--with", "calc", "-o", tmp_path / "calc.xlsx")
    assert outcome.code == 0, outcome.err
    assert f"{len(headless)} of {len(headless)} formula cells computed" in outcome.out
    stored = Book.open(tmp_path / "calc.xlsx")
    assert stored.formulas == Book.open(path).formulas
    values = {(c.sheet, c.address): stored.stored(c) for c in stored.formula_cells()}
    assert {k: (values[k], v) for k, v in headless.items() if not same(values[k], v)} == {}
    assert len(values) > 250


@needs_office
def test_an_error_in_calc_is_a_finding(tmp_path: Path) -> None:
    path = story_book(tmp_path, GIVEN)
    book = openpyxl.load_workbook(path)
    cell = book.defined_names["S_DS"].attr_text.rpartition("!")[2].replace("$", "")
    book["Criteria"][cell] = None
    book.save(path)
    outcome = run("calc", path, "--with", "calc", "-o", tmp_path / "calc.xlsx", "--json")
    assert outcome.code == 1
    found = json.loads(outcome.out)
    assert found["not_evaluated"] == []
    assert {"Err:519"} <= {error["reason"] for error in found["errors"]}
    assert {value["error"] for value in found["values"]["Levels"].values() if isinstance(value, dict)}


@needs_office
@pytest.mark.skipif(not shutil.which("pdftotext"), reason="pdftotext (poppler-utils) is not installed")
def test_printed_pages_are_recalculated_numbered_and_stamped(tmp_path: Path) -> None:
    path = story_book(tmp_path, GIVEN)  # stores no values: nothing to print but what is computed now
    with unchanged(tmp_path, but=("story.pdf",)):
        outcome = run("print", path)
    assert (outcome.code, outcome.out) == (0, f"{tmp_path / 'story.pdf'}: printed\n")
    text = printed_text(tmp_path / "story.pdf")
    pages = text.split("\f")[:-1]
    assert len(pages) > 5
    digest = hashlib.sha256(path.read_bytes()).hexdigest()[:12]
    for number, page in enumerate(pages, 1):
        assert f"page {number} of {len(pages)}" in page
        assert re.search(rf"story\.xlsx\s+sha256 {digest}", page)
        assert "authority having jurisdiction" in page
        assert "Untitled building" in page
        assert "Rev." in page
    assert text.count("#NAME?") == 1  # what the cover says of it
    values = compute(path).evaluator
    assert f"{values.evaluate_text('=V_X'):,.1f}" in pages[0]


@needs_office
@pytest.mark.skipif(not shutil.which("pdftotext"), reason="pdftotext (poppler-utils) is not installed")
def test_an_error_is_printed_as_the_error_it_is(tmp_path: Path) -> None:
    assert run("bridge-check", tmp_path / "check.xlsx").code == 0
    assert run("print", tmp_path / "check.xlsx").code == 0
    text = printed_text(tmp_path / "check.pdf")
    assert text.count("#NUM!") == 2  # expected and actual
    assert "#NAME?" not in text


def printed_text(path: Path) -> str:
    command = ["pdftotext", "-layout", path, "-"]
    return subprocess.run(command, capture_output=True, text=True, check=True).stdout


@pytest.mark.parametrize("call", [["calc", "--with", "calc"], ["print"]])
def test_without_an_office_both_say_so(
    tmp_path: Path, call: list[str], monkeypatch: pytest.MonkeyPatch
) -> None:
    monkeypatch.setattr(offices, "installation", lambda: None)
    path = story_book(tmp_path, GIVEN)
    with unchanged(tmp_path):
        assert_refused(run(*call, path), "is not installed", "install it", "STORYLEDGER_OFFICE")
