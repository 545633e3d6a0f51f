"""A workbook file read once with openpyxl, or one sentence on why it cannot be."""

from __future__ import annotations

import io
import warnings
import zipfile
from pathlib import Path
from typing import Any, Final

from openpyxl import Workbook
from openpyxl.reader.excel import ExcelReader

from xlbridge.headless import guard

_COMPOUND_FILE: Final = bytes.fromhex("d0cf11e0a1b11ae1")
_ENCRYPTED: Final = "EncryptedPackage".encode("utf-16-le")
_PACKAGE: Final = b"PK\x03\x04"
_NEEDED: Final = {"[Content_Types].xml", "_rels/.rels"}
_SAVE_AS: Final = "open it in the spreadsheet program and save it as .xlsx"


class BookError(ValueError):
    """A file that cannot be opened as a workbook; the message is one sentence with the remedy."""


class _Reader(ExcelReader):
    """Reads every number as it is stored: dates stay the serial numbers that formulas calculate with."""

    def read_worksheets(self) -> None:
        vars(self.wb).update(_date_formats=set(), _timedelta_formats=set())
        super().read_worksheets()

    def read_chartsheet(self, sheet: Any, rel: object) -> None:
        """Keep only the place of a sheet without cells: sheet-level names are numbered by it."""
        vars(self.wb.create_chartsheet(sheet.name)).update(defined_names={})


def read_file(path: Path) -> bytes:
    """The file's bytes, once it is certain that they are a package of the .xlsx kind."""
    try:
        data = _bytes(path)
    except FileNotFoundError:
        raise BookError(f"{path}: there is no such file") from None
    except IsADirectoryError:
        raise BookError(f"{path}: this is a folder; name the workbook in it") from None
    except OSError as error:
        raise BookError(f"{path}: cannot be read ({error.strerror or error})") from None
    if refused := guard.oversize(data) or _foreign(data) or guard.problem(data):
        raise BookError(f"{path}: {refused}")
    return data


def _bytes(path: Path) -> bytes:
    """The content, read no further than its limit: a pipe or a device may never end."""
    if path.exists() and not (path.is_file() or path.is_dir()):
        raise BookError(f"{path}: this is no file; name a workbook")
    with path.open("rb") as file:
        return file.read(guard.MAX_FILE + 1)


def load(path: Path, data: bytes) -> Workbook:
    """The workbook in ``data``, with its formulas; ``path`` is for the messages."""
    try:
        with warnings.catch_warnings():
            warnings.simplefilter("ignore")
            reader = _Reader(io.BytesIO(data), keep_links=False)
            reader.read()
    except Exception as error:  # openpyxl lets whatever a damaged part provokes escape
        raise BookError(
            f"{path}: the workbook is damaged or not a valid .xlsx ({_first_line(error)}); {_SAVE_AS} again"
        ) from error
    workbook: Workbook = reader.wb
    if not workbook.worksheets:
        raise BookError(f"{path}: the workbook has no sheet with cells; {_SAVE_AS} again")
    return workbook


def _foreign(data: bytes) -> str:
    """What the file is instead of a workbook, or nothing."""
    if data.startswith(_COMPOUND_FILE):
        if _ENCRYPTED in data:
            return "the workbook is encrypted; remove its password and save it as .xlsx"
        return f"this is the old .xls format; {_SAVE_AS}"
    if not data:
        return "the file is empty"
    if not data.startswith(_PACKAGE) or not zipfile.is_zipfile(io.BytesIO(data)):
        return f"this is not a workbook; give an .xlsx or .xlsm file, or {_SAVE_AS}"
    return _foreign_package(data)


def _foreign_package(data: bytes) -> str:
    with zipfile.ZipFile(io.BytesIO(data)) as archive:
        names = set(archive.namelist())
    if "xl/workbook.bin" in names:
        return f"this is the binary .xlsb format; {_SAVE_AS}"
    if "content.xml" in names:
        return f"this is an OpenDocument file; {_SAVE_AS}"
    return "" if names >= _NEEDED else "this archive is not a workbook; give an .xlsx or .xlsm file"


def _first_line(error: Exception) -> str:
    cause = error.__cause__ or error
    text = str(cause).strip().splitlines()
    return text[0] if text else type(cause).__name__
