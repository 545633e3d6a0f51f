"""What a workbook needs to call Python from Excel: macros, settings, and the module that is imported once."""

from __future__ import annotations

from pathlib import Path

from openpyxl import Workbook

from workbook_templates.draw import settings as drawing
from xlbridge.cli.failure import Refusal
from xlbridge.cli.files import refuse_existing, write_new
from xlbridge.excel import generate, settings
from xlbridge.excel.macro_book import add_macros

ENDING = ".xlsm"


def fit_out(workbook: Workbook) -> None:
    """Give a drawn workbook xlwings' macros and the sheet that tells them where Python is."""
    drawing.draw(workbook.create_sheet(settings.SHEET), settings.settings())
    add_macros(workbook)


def refuse_unfit(book: Path, force: bool) -> None:
    """Refuse before anything is made what could not be written beside the workbook."""
    if book.suffix.lower() != ENDING:
        raise Refusal(f"{book}: the name of a workbook with macros ends in {ENDING}")
    if not _is_there(book):
        refuse_existing(_beside(book), force)


def write_module(book: Path, force: bool) -> Path:
    """Write the macro module beside the workbook, from where it is imported once."""
    target = _beside(book)
    if not _is_there(book):
        write_new(target, _module(), force)
    return target


def _is_there(book: Path) -> bool:
    """Whether the module lies there already, for another workbook of the folder."""
    return _beside(book).is_file() and _beside(book).read_bytes() == _module()


def _beside(book: Path) -> Path:
    return book.with_name(generate.MACRO_FILE)


def _module() -> bytes:
    return (generate.FOLDER / generate.MACRO_FILE).read_bytes()
