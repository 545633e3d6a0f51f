"""A workbook with macros: xlwings' own, byte for byte, in a package that reads as one with macros."""

from __future__ import annotations

import re
import sys
import warnings
import zipfile
from pathlib import Path

import openpyxl
import pytest

from tests.support.command import assert_refused, run
from xlbridge.cli import macro_kit
from xlbridge.excel import settings
from xlbridge.excel.generate import FOLDER, MACRO_FILE
from xlbridge.excel.macro_book import standalone
from xlbridge.headless.compute import compute

PROJECT = "xl/vbaProject.bin"


@pytest.fixture(scope="module")
def book(tmp_path_factory: pytest.TempPathFactory) -> Path:
    path = tmp_path_factory.mktemp("macros") / "tower.xlsm"
    assert run("new", path, "--macro", "--levels", 3).code == 0
    return path


def test_the_macro_project_is_that_of_the_installed_xlwings(book: Path) -> None:
    with zipfile.ZipFile(book) as ours, zipfile.ZipFile(standalone()) as theirs:
        assert ours.read(PROJECT) == theirs.read(PROJECT)
        types = ours.read("[Content_Types].xml").decode()
        links = ours.read("xl/_rels/workbook.xml.rels").decode()
    assert "application/vnd.ms-excel.sheet.macroEnabled.main+xml" in types
    assert "application/vnd.ms-office.vbaProject" in types
    assert "vbaProject.bin" in links


def test_code_names_are_those_that_the_project_knows_first(book: Path) -> None:
    workbook = openpyxl.load_workbook(book, keep_vba=True)
    assert workbook.code_name == "ThisWorkbook"
    names = [sheet.sheet_properties.codeName for sheet in workbook.worksheets]
    assert names == [f"Sheet{n}" for n in range(1, len(names) + 1)]


def test_an_independent_reader_finds_the_modules_and_the_version_of_the_library(book: Path) -> None:
    with warnings.catch_warnings(action="ignore"):  # of the libraries that oletools uses
        from oletools.olevba import VBA_Parser
    modules = {name: code for _, _, name, code in VBA_Parser(str(book)).extract_macros()}
    assert {"ThisWorkbook.cls", "Sheet1.cls", "xlwings.bas", "Dictionary.cls"} <= set(modules)
    from xlbridge.excel.versions import XLWINGS

    assert f"xlwings64-{XLWINGS}.dll" in modules["xlwings.bas"]


def test_the_settings_start_in_the_first_cell(book: Path) -> None:
    sheet = openpyxl.load_workbook(book)[settings.SHEET]
    found = {key: value for key, value, _ in sheet.iter_rows(values_only=True)}
    assert found["UDF Modules"] == "xlbridge.excel.functions;xlbridge.excel.versions"
    assert next(iter(found)) == "Interpreter_Win" == sheet["A1"].value


def test_on_windows_the_running_python_is_the_one_that_excel_starts(monkeypatch: pytest.MonkeyPatch) -> None:
    assert settings.settings()[0].value == ""
    monkeypatch.setattr(sys, "platform", "win32")
    assert settings.settings()[0].value == sys.executable


def test_the_workbook_is_computed_like_any_other(book: Path) -> None:
    computed = compute(book)
    assert not computed.errors
    assert not computed.not_evaluated
    assert run("audit", book).code == 0


def test_the_module_lies_beside_the_workbook(book: Path) -> None:
    module = book.with_name(MACRO_FILE)
    assert module.read_bytes() == (FOLDER / MACRO_FILE).read_bytes()
    assert run("new", book.with_name("second.xlsm"), "--macro").code == 0
    module.write_bytes(b"somebody's module")
    outcome = run("new", book.with_name("third.xlsm"), "--macro")
    assert_refused(outcome, MACRO_FILE, "exists already")
    assert not book.with_name("third.xlsm").exists()


def test_what_does_not_go_together_is_refused(tmp_path: Path) -> None:
    assert_refused(run("new", tmp_path / "a.xlsx", "--macro"), "a.xlsx", macro_kit.ENDING)
    assert_refused(run("new", tmp_path / "a.xlsm", "--macro", "--native"), "--native", "leave")
    assert_refused(run("new", tmp_path / "a.xlsm"), ".xlsx")
    assert_refused(run("bridge-check", tmp_path / "a.ods"), ".xlsm or .xlsx")
    assert not list(tmp_path.iterdir())


def test_every_module_named_in_the_settings_is_called_by_the_macros() -> None:
    text = (FOLDER / MACRO_FILE).read_text("ascii")
    called = set(re.findall(r'CallUDF\("([\w.]+)"', text))
    assert called == set(settings.settings()[1].value.split(";"))
