"""A workbook with xlwings' own macros: what connects Excel to Python, from the installed package."""

from __future__ import annotations

from importlib.util import find_spec
from pathlib import Path
from typing import Final
from zipfile import ZipFile

from openpyxl import Workbook

#: xlwings' workbook that carries its macros in itself, so that its add-in is not needed
STANDALONE: Final = "quickstart_standalone.xlsm"


def add_macros(workbook: Workbook) -> None:
    """Give a workbook, before it is saved, the macro project of the installed xlwings, unchanged.

    A macro project knows the workbook and its sheets by code names; those of sheets that it does not know
    are Excel's to add.
    """
    workbook.vba_archive = ZipFile(standalone())
    workbook.code_name = "ThisWorkbook"
    for number, sheet in enumerate(workbook.worksheets, 1):
        sheet.sheet_properties.codeName = f"Sheet{number}"


def standalone() -> Path:
    """Return the file that the installed xlwings carries; it is found without importing xlwings."""
    package = find_spec("xlwings")
    if package is None or package.origin is None:
        raise FileNotFoundError("xlwings is not installed: `pip install xlwings` brings it")
    return Path(package.origin).with_name(STANDALONE)
