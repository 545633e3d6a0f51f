"""The macro module against what xlwings' own import writes for the same Python module."""

from __future__ import annotations

import re
import types
from pathlib import Path
from typing import Any

import pytest
import xlwings as xw

from tests.support.windows_stubs import ComError
from xlbridge.catalogue import CATALOGUE
from xlbridge.excel import macros
from xlbridge.excel.generate import FOLDER, MACRO_FILE
from xlbridge.excel.module import category, description

SIGNATURE = re.compile(r"^(?:Public )?Function (ELF_\w+\(.*\))\r?$", re.MULTILINE)
EXCEL_CALL = re.compile(
    r'XLPy\.CallUDF\("[\w.]+", "ELF_\w+", Array\(.*\), ThisWorkbook, Application\.Caller\)'
)


class Components:
    """The macro project of a workbook that keeps what is imported."""

    text = ""

    def __call__(self, name: str) -> None:
        raise ComError(-1)

    def Remove(self, component: None) -> None:
        raise AssertionError("there is nothing to remove")

    def Import(self, name: str) -> None:
        self.text = Path(name).read_text()


class Workbook:
    """A workbook that records the import."""

    Name = "Book.xlsm"
    Worksheets = Sheets = sheets = ()

    def __init__(self) -> None:
        self.components = Components()
        self.options: list[dict[str, Any]] = []
        self.VBProject = types.SimpleNamespace(VBComponents=self.components)
        self.Application = types.SimpleNamespace(Version="16.0", MacroOptions=self.record)

    def record(self, macro: str, **options: Any) -> None:
        self.options.append({"name": macro, **options})


@pytest.fixture(scope="module")
def imported() -> Workbook:
    workbook = Workbook()
    xw.import_udfs(macros.PYTHON_MODULE, workbook)
    return workbook


@pytest.fixture(scope="module")
def module() -> str:
    return (FOLDER / MACRO_FILE).read_bytes().decode("ascii")


def test_the_import_writes_every_function_once(imported: Workbook) -> None:
    names = [found.partition("(")[0] for found in SIGNATURE.findall(imported.components.text)]
    assert sorted(names) == sorted(CATALOGUE)


def test_signatures_and_calls_are_those_of_the_import(imported: Workbook, module: str) -> None:
    theirs, ours = imported.components.text, module
    assert sorted(SIGNATURE.findall(ours)) == sorted(SIGNATURE.findall(theirs))
    by_value = [re.sub(r"Contents\((\w+)\)", r"\1", found) for found in EXCEL_CALL.findall(ours)]
    assert sorted(by_value) == sorted(EXCEL_CALL.findall(theirs))
    assert len(EXCEL_CALL.findall(ours)) == len(CATALOGUE)


def test_the_import_passes_on_the_help_texts_uncut(imported: Workbook) -> None:
    shown = {options["name"].rpartition("!")[2]: options for options in imported.options}
    assert set(shown) == set(CATALOGUE)
    for name, entry in CATALOGUE.items():
        assert shown[name]["Description"] == description(entry)
        assert shown[name]["Category"] == category(entry)
        assert len(shown[name]["ArgumentDescriptions"]) == len(entry.arguments)


def test_the_check_of_versions_is_the_imports_too() -> None:
    workbook = Workbook()
    xw.import_udfs(macros.VERSION_MODULE, workbook)
    ours = (FOLDER / MACRO_FILE).read_bytes().decode("ascii")
    (call,) = set(re.findall(r'CallUDF\("[\w.]+", "STORYLEDGER_VERSION"', workbook.components.text))
    assert call in ours
    assert "Function STORYLEDGER_VERSION(part)" in workbook.components.text
    assert "Function STORYLEDGER_VERSION(part)" in ours
