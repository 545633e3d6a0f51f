"""The page in a real browser: layout, keyboard, console, accessibility, the record, print."""

from __future__ import annotations

import os
import re
import subprocess
import time
from collections.abc import Iterator
from pathlib import Path

import pytest
from openpyxl import Workbook

from tests.conftest import demand
from tests.support import browser as browsers
from tests.support.audited import audited, changed, computed_book
from tests.support.browser import AXE, Browser, browsing
from xlbridge.audit.audit import Audit
from xlbridge.audit.record import Person, Record
from xlbridge.audit.report.page import CAUTIONS, page

WIDE, NARROW = 1280, 390
#: what the accessibility rules find, with the elements
AXE_RUN = """
const done = arguments[0];
axe.run(document, { runOnly: ["wcag2a", "wcag2aa", "wcag21aa", "wcag22aa", "best-practice"] }).then(
  (found) => done(found.violations.map((v) => [v.id, v.nodes.map((n) => n.html.slice(0, 120))])));
"""
#: the elements that reach beyond the window without standing in an area that scrolls
BEYOND = """
return [...document.querySelectorAll("body *")].filter((e) => e.checkVisibility() && !e.closest(".scroll")
  && !e.matches(".skip") && e.getBoundingClientRect().right > document.documentElement.clientWidth + 1)
  .map((e) => e.outerHTML.slice(0, 90));
"""
CONTRAST = """
const part = (v) => (v /= 255) <= 0.03928 ? v / 12.92 : ((v + 0.055) / 1.055) ** 2.4;
const light = (c) => { const [r, g, b] = c.match(/[\\d.]+/g).map(Number);
  return 0.2126 * part(r) + 0.7152 * part(g) + 0.0722 * part(b); };
const ground = (e) => { for (; e; e = e.parentElement) { const c = getComputedStyle(e).backgroundColor;
  if (!/, 0\\)$/.test(c)) return c; } return "rgb(255, 255, 255)"; };
const ratio = (e) => {
  const [a, b] = [light(getComputedStyle(e).color), light(ground(e))].sort((x, y) => y - x);
  return (a + 0.05) / (b + 0.05); };
const seen = [...document.querySelectorAll("body *")].filter((e) => !e.closest("svg") && e.checkVisibility());
const said = (e) => [...e.childNodes].some((n) => n.nodeType === 3 && n.textContent.trim());
return Math.min(...seen.filter(said).map(ratio));
"""


@pytest.fixture(scope="module")
def browser(tmp_path_factory: pytest.TempPathFactory) -> Iterator[Browser]:
    demand(browsers.missing(), browsers.REQUIRED)
    with browsing(tmp_path_factory.mktemp("browser")) as running:
        yield running


@pytest.fixture(scope="module")
def audits(tmp_path_factory: pytest.TempPathFactory) -> dict[str, Audit]:
    def spoil(book: Workbook) -> None:
        sheet = book["Levels"]
        top, column = next((c.row, c.column) for row in sheet.iter_rows() for c in row if c.value == "F_x X")
        sheet.cell(top + 8, column).value += "*1.05"
        sheet.cell(top + 9, column).value = 44.0
        book["Criteria"]["H60"] = "=TODAY()"

    book = computed_book(tmp_path_factory.mktemp("books"))
    other = Workbook()
    other.active.append([2, 3, "=A1*B1"])
    path = book.with_name("other.xlsx")
    other.save(path)
    return {
        "clean": audited(book),
        "other": audited(changed(path, lambda book: None)),
        "spoiled": audited(changed(book, spoil)),
    }


@pytest.fixture(scope="module")
def pages(audits: dict[str, Audit], tmp_path_factory: pytest.TempPathFactory) -> dict[str, Path]:
    folder, record = tmp_path_factory.mktemp("pages"), Record({"originator": Person("A. Maker")})
    for name, audit in audits.items():
        (folder / f"{name}.html").write_text(page(audit, record), "utf-8")
    return {name: folder / f"{name}.html" for name in audits}


@pytest.mark.parametrize("width", [WIDE, NARROW])
@pytest.mark.parametrize("name", ["clean", "other", "spoiled"])
def test_it_fits_the_window_and_the_console_is_silent(
    browser: Browser, pages: dict[str, Path], name: str, width: int
) -> None:
    browser.open(pages[name], width)
    browser.run("document.querySelectorAll('details').forEach((d) => { d.open = true; })")
    assert browser.run("return innerWidth") == width
    assert browser.run("return document.documentElement.scrollWidth <= document.documentElement.clientWidth")
    assert browser.run(BEYOND) == []
    assert browser.messages() == []


@pytest.mark.parametrize("width", [WIDE, NARROW])
@pytest.mark.parametrize("name", ["clean", "other", "spoiled"])
def test_the_accessibility_rules_find_nothing(
    browser: Browser, pages: dict[str, Path], name: str, width: int
) -> None:
    demand(browsers.missing_rules(), browsers.REQUIRED)
    browser.open(pages[name], width)
    browser.run(Path(os.environ[AXE]).read_text("utf-8"))
    some = ".finding details, .cell:nth-of-type(-n+40)"
    browser.run("document.querySelectorAll(arguments[0]).forEach((d) => { d.open = true; })", some)
    assert browser.wait_for(AXE_RUN) == []


def test_the_accessibility_rules_see_a_fault(browser: Browser, pages: dict[str, Path]) -> None:
    demand(browsers.missing_rules(), browsers.REQUIRED)
    browser.open(pages["clean"])
    browser.run(Path(os.environ[AXE]).read_text("utf-8"))
    browser.run("document.documentElement.removeAttribute('lang')")
    assert [rule for rule, _ in browser.wait_for(AXE_RUN)] == ["html-has-lang"]


def test_texts_stand_out_from_their_ground(browser: Browser, pages: dict[str, Path]) -> None:
    for name in ("clean", "spoiled"):
        browser.open(pages[name])
        assert browser.run(CONTRAST) >= 7.0


def test_the_keyboard_reaches_and_opens_everything(browser: Browser, pages: dict[str, Path]) -> None:
    browser.open(pages["spoiled"])
    browser.press("Tab")
    assert browser.focused() == "a #main"
    browser.press("Enter")
    assert browser.run("return location.hash") == "#main"
    seen = []
    for _ in range(40):
        browser.press("Tab")
        seen.append(browser.focused())
    assert seen[0] == "input find-text"
    assert {"select find-severity", "select find-kind", "select find-sheet"} <= set(seen)
    place = next(n for n, what in enumerate(seen) if what.startswith("summary"))
    browser.open(pages["spoiled"])
    browser.press("Tab", "Enter", *["Tab"] * (place + 1))
    assert browser.focused() == seen[place]
    is_open = "return document.activeElement.parentElement.open"
    assert browser.run(is_open) is False
    browser.press("Enter")
    assert browser.run(is_open) is True
    assert browser.run("return getComputedStyle(document.activeElement).outlineStyle") == "solid"


def test_filters_leave_what_matches_and_say_how_many(
    browser: Browser, pages: dict[str, Path], audits: dict[str, Audit]
) -> None:
    audit = audits["spoiled"]
    browser.open(pages["spoiled"])
    kind = "constant_for_formula"
    count = sum(f.kind.key == kind for f in audit.findings)
    choose = "const e = document.querySelector(arguments[0]); e.value = arguments[1];"
    choose += "e.dispatchEvent(new Event('input', { bubbles: true }));"
    shown = "return [...document.querySelectorAll(arguments[0])].filter((e) => e.checkVisibility()).length"
    browser.run(choose, "#find-kind", kind)
    assert browser.run(shown, ".finding") == count > 0
    said = "return document.querySelector(arguments[0]).textContent"
    assert browser.run(said, "#findings-said") == f"{count} of {len(audit.findings)} shown"
    browser.run(choose, "#find-kind", "")
    browser.type(".finding [data-part='words']", "put back")
    for answer, left in (("answered", 1), ("open", len(audit.findings) - 1), ("closed", 0)):
        browser.run(choose, "#find-answer", answer)
        assert browser.run(shown, ".finding") == left
    browser.run(choose, "#find-answer", "")
    browser.type("#find-text", "no finding says this")
    assert browser.run(shown, ".finding") == 0
    states = [state.value for state in audit.states.values()]
    browser.run(choose, "#cell-state", "finding")
    assert browser.run(shown, "details.cell") == states.count("finding") > 0
    browser.run(choose, "#cell-state", "not checked")
    assert browser.run(shown, "details.cell") == states.count("not checked") == 1
    assert browser.run("return document.querySelector('#cells-said').getAttribute('aria-live')") == "polite"


def test_the_record_is_saved_and_loaded_and_one_person_refused(
    browser: Browser, pages: dict[str, Path], tmp_path: Path
) -> None:
    browser.open(pages["spoiled"])
    checker = '[data-key="checker"][data-part="name"]'
    said = "return document.querySelector('#record-said').textContent"
    browser.type(checker, " a.  maker")
    browser.run("document.querySelector('#record-save').click()")
    assert "one person" in browser.run(said)
    assert not list(browser.downloads.glob("*.json"))
    browser.run("document.querySelector(arguments[0]).value = ''", checker)
    browser.type(checker, "B. Checker")
    browser.run("document.querySelector('[data-key=\"site.S_DS\"]').value = 'query'")
    browser.run("document.querySelector('#record-save').click()")
    saved = Record.read(awaited(browser.downloads, "*.record.json").read_text("utf-8"))
    assert saved.people == {"originator": Person("A. Maker"), "checker": Person("B. Checker")}
    assert saved.inputs["site.S_DS"].mark == "query"
    (tmp_path / "r.json").write_text(Record({"approver": Person("C. Approver")}).text())
    browser.type("#record-load", str(tmp_path / "r.json"))
    browser.wait_for("setTimeout(arguments[0], 300)")
    assert browser.run("return document.querySelector('[data-key=\"approver\"]').value") == "C. Approver"
    assert browser.run("return document.querySelector(arguments[0]).value", checker) == ""
    (tmp_path / "bad.json").write_text("{")
    browser.type("#record-load", str(tmp_path / "bad.json"))
    browser.wait_for("setTimeout(arguments[0], 300)")
    assert browser.run(said).startswith("✗ Not a check record")


def awaited(folder: Path, pattern: str) -> Path:
    """A file that the browser is writing."""
    for _ in range(100):
        if found := next(folder.glob(pattern), None):
            return found
        time.sleep(0.1)
    raise AssertionError(f"no {pattern} in {folder}")


def test_in_print_it_has_one_typical_cell_every_exception_and_page_numbers(
    browser: Browser, pages: dict[str, Path], audits: dict[str, Audit], tmp_path: Path
) -> None:
    browser.open(pages["spoiled"])
    (tmp_path / "page.pdf").write_bytes(browser.pdf())
    run = ["pdftotext", "-layout", str(tmp_path / "page.pdf"), "-"]
    leaves = subprocess.run(run, capture_output=True, text=True, check=True).stdout.split("\f")[:-1]
    assert 5 < len(leaves) < 40
    for number, leaf in enumerate(leaves, 1):
        assert f"page {number} of {len(leaves)}" in leaf
        assert "licensed engineer's judgement" in leaf
    words = " ".join(" ".join(leaves).split())
    assert CAUTIONS[0].split(".")[0] in words
    audit = audits["spoiled"]
    assert all(f"{f.number}. {f.kind.title}" in words for f in audit.findings)
    assert words.count("Back-checked and closed") == len(audit.findings)
    forces = [level for level in range(1, 7) if re.search(rf"direction\.Y\.F_x\[{level}\] =", words)]
    assert forces == [1]
    spoiled = [f"direction.X.F_x[{level}] =" in words for level in range(1, 7)]
    assert spoiled.count(True) >= 2
    assert "Search" not in words
