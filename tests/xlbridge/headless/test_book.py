"""Workbooks opened from files: values, formulas, names, tables, stored values, and files that are none."""

from __future__ import annotations

import zipfile
from datetime import datetime
from pathlib import Path

import pytest
from openpyxl import Workbook
from openpyxl.utils.datetime import CALENDAR_MAC_1904
from openpyxl.workbook.defined_name import DefinedName
from openpyxl.worksheet.formula import ArrayFormula, DataTableFormula
from openpyxl.worksheet.table import Table as SheetTable

from xlbridge.headless.book import Book, BookError
from xlbridge.headless.references import Bounds, Cell
from xlbridge.values import CellError

SHEET = (
    '<worksheet xmlns="http://schemas.openxmlformats.org/spreadsheetml/2006/main"><sheetData>{}</sheetData>'
    "</worksheet>"
)


@pytest.fixture
def saved(tmp_path: Path) -> Path:
    workbook = Workbook()
    sheet = workbook.active
    sheet.title = "Levels"
    sheet.append(["Level", "w_x", True, 3, 2.5])
    sheet["A2"] = "#N/A"
    sheet["B2"] = datetime(2024, 3, 1, 12)
    sheet["C2"] = "=B1"
    sheet["D2"] = ArrayFormula("D2:D4", "=E2:E4*2")
    sheet["F2"] = DataTableFormula("F2:F3", r1="A1")
    sheet["G2"].number_format = "yyyy-mm-dd"
    sheet["G2"] = 1e8
    workbook.create_chartsheet("Figure")
    other = workbook.create_sheet("Other")
    other.append(["a", "b"])
    other.append([1, 2])
    other.add_table(SheetTable(displayName="Tab", ref="A1:B2"))
    workbook.defined_names["S_DS"] = DefinedName("S_DS", attr_text="Levels!$E$1")
    other.defined_names["s_ds"] = DefinedName("s_ds", attr_text="Other!$A$2")
    path = tmp_path / "book.xlsx"
    workbook.save(path)
    # openpyxl numbers the sheets of names without the chart sheet; spreadsheet programs count it.
    return _rewritten(path, "xl/workbook.xml", 'localSheetId="1"', 'localSheetId="2"')


def _rewritten(path: Path, part: str, old: str, new: str) -> Path:
    """A copy of a workbook with one text of one part replaced."""
    target = path.with_name(f"{path.stem}_rewritten.xlsx")
    with zipfile.ZipFile(path) as source, zipfile.ZipFile(target, "w") as copy:
        for name in source.namelist():
            data = source.read(name).decode() if name == part else source.read(name)
            if isinstance(data, str):
                assert old in data
                data = data.replace(old, new)
            copy.writestr(name, data)
    return target


def test_values_are_floats_texts_logicals_and_errors(saved: Path) -> None:
    book = Book.open(saved)
    assert book.sheets == ("Levels", "Other")
    assert book.constants["Levels"] == {
        (1, 1): "Level", (1, 2): "w_x", (1, 3): True, (1, 4): 3.0, (1, 5): 2.5,
        (2, 1): CellError("#N/A"), (2, 2): 45352.5, (2, 7): 1e8,
    }  # fmt: skip
    assert {type(value) for value in book.constants["Levels"].values()} == {str, bool, float, CellError}


def test_formulas_fill_their_cells_in_order(saved: Path) -> None:
    book = Book.open(saved)
    assert [cell.address for cell in book.formula_cells()] == ["C2", "D2", "F2", "D3", "F3", "D4"]
    plain, array = book.formula(Cell("Levels", 2, 3)), book.formula(Cell("Levels", 4, 4))
    assert plain is not None
    assert array is not None
    assert (plain.text, plain.is_array) == ("=B1", False)
    assert (array.text, array.is_array, array.cell.address) == ("=E2:E4*2", True, "D2")
    assert array.fills == Bounds(2, 4, 4, 4)
    data_table = book.formula(Cell("Levels", 3, 6))
    assert data_table is not None
    assert "data table" in data_table.refusal


def test_names_by_scope_and_tables(saved: Path) -> None:
    book = Book.open(saved)
    assert book.names == {(None, "s_ds"): "Levels!$E$1", ("Other", "s_ds"): "Other!$A$2"}
    assert book.tables["tab"].columns == ("a", "b")
    assert book.tables["tab"].data == (2, 2)
    assert book.sheet_named("OTHER") == "Other"
    assert book.sheet_named("Figure") is None
    assert book.extent == (4, 7)


def test_the_date_system_of_1904_keeps_its_serial_numbers(tmp_path: Path) -> None:
    workbook = Workbook()
    workbook.epoch = CALENDAR_MAC_1904
    workbook.active["A1"] = datetime(2024, 3, 1)
    in_memory = Book.of(workbook)
    workbook.save(tmp_path / "mac.xlsx")
    # Two workbooks, one date: the serial numbers of the two systems differ by 1,462 days
    # (Microsoft support article "Differences between the 1900 and the 1904 date system").
    assert in_memory.constants["Sheet"][1, 1] == 45352.0 - 1462.0
    assert Book.open(tmp_path / "mac.xlsx").constants["Sheet"][1, 1] == 45352.0 - 1462.0


def test_shared_formulas_are_translated_and_rich_text_is_plain(saved: Path) -> None:
    cells = (
        '<row r="1"><c r="A1"><f t="shared" ref="A1:A2" si="0">B1*$C$1</f><v>6</v></c>'
        '<c r="B1" t="inlineStr"><is><r><t>two </t></r><r><t>parts</t></r></is></c></row>'
        '<row r="2"><c r="A2"><f t="shared" si="0"/><v>1.5</v></c></row>'
    )
    path = saved.with_name("raw.xlsx")
    with zipfile.ZipFile(saved) as source, zipfile.ZipFile(path, "w") as copy:
        for name in source.namelist():
            copy.writestr(name, SHEET.format(cells) if name.endswith("sheet1.xml") else source.read(name))
    book = Book.open(path)
    second = book.formula(Cell("Levels", 2, 1))
    assert second is not None
    assert second.text == "=B2*$C$1"
    assert book.constants["Levels"] == {(1, 2): "two parts"}
    assert book.stored(Cell("Levels", 1, 1)) == 6.0
    assert book.stored(Cell("Levels", 2, 1)) == 1.5


def test_stored_values_of_every_kind(saved: Path) -> None:
    cells = (
        '<row r="1"><c r="A1"><f>1</f><v>1E-3</v></c><c r="B1" t="str"><f>1</f><v>text</v></c>'
        '<c r="C1" t="b"><f>1</f><v>1</v></c><c r="D1" t="e"><f>1</f><v>#DIV/0!</v></c>'
        '<c r="E1"><f>1</f></c><c r="F1"><f>1</f><v></v></c></row>'
    )
    path = saved.with_name("raw.xlsx")
    with zipfile.ZipFile(saved) as source, zipfile.ZipFile(path, "w") as copy:
        for name in source.namelist():
            copy.writestr(name, SHEET.format(cells) if name.endswith("sheet1.xml") else source.read(name))
    book = Book.open(path)
    stored = [book.stored(cell) for cell in book.formula_cells()]
    assert stored == [0.001, "text", True, CellError("#DIV/0!"), None, None]
    assert Book.of(Workbook()).stored(Cell("Sheet", 1, 1)) is None


def test_precision_as_displayed_refuses_every_formula(saved: Path) -> None:
    book = Book.open(_rewritten(saved, "xl/workbook.xml", "<calcPr ", '<calcPr fullPrecision="0" '))
    formula = book.formula(Cell("Levels", 2, 3))
    assert formula is not None
    assert "precision as displayed" in formula.refusal


def test_an_array_formula_over_a_whole_sheet_is_refused_not_filled(saved: Path) -> None:
    book = Book.open(_rewritten(saved, "xl/worksheets/sheet1.xml", "D2:D4", "A1:XFD1048576"))
    formula = book.formula(Cell("Levels", 2, 4))
    assert formula is not None
    assert "more than 100,000 cells" in formula.refusal


@pytest.mark.parametrize(
    ("content", "reason"),
    [
        (b"", "file is empty"),
        (b"Level,w_x\n1,2\n", "not a workbook"),
        (bytes.fromhex("d0cf11e0a1b11ae1") + b"\0" * 600, "old .xls format"),
        (
            bytes.fromhex("d0cf11e0a1b11ae1") + b"\0" * 99 + "EncryptedPackage".encode("utf-16-le"),
            "encrypted",
        ),
        ({"xl/workbook.bin": b""}, "binary .xlsb format"),
        ({"content.xml": b"<a/>"}, "OpenDocument"),
        ({"readme.txt": b"hello"}, "this archive is not a workbook"),
        ({"[Content_Types].xml": b"<Types/>", "_rels/.rels": b"<Relationships/>"}, "damaged"),
        ({"[Content_Types].xml": b"<Types", "_rels/.rels": b"<Relationships/>"}, "damaged"),
    ],
)
def test_a_file_that_is_no_workbook_is_refused_in_words(
    tmp_path: Path, content: bytes | dict[str, bytes], reason: str
) -> None:
    path = tmp_path / "file.xlsx"
    if isinstance(content, bytes):
        path.write_bytes(content)
    else:
        with zipfile.ZipFile(path, "w") as archive:
            for name, data in content.items():
                archive.writestr(name, data)
    with pytest.raises(BookError, match=reason) as refusal:
        Book.open(path)
    assert str(refusal.value).startswith(f"{path}: ")
    assert "\n" not in str(refusal.value)


def test_a_missing_file_and_a_folder_are_refused(tmp_path: Path) -> None:
    with pytest.raises(BookError, match="no such file"):
        Book.open(tmp_path / "none.xlsx")
    with pytest.raises(BookError, match="folder"):
        Book.open(tmp_path)


def test_a_name_of_a_chart_sheet_is_nobodys(saved: Path) -> None:
    book = Book.open(_rewritten(saved, "xl/workbook.xml", 'localSheetId="2"', 'localSheetId="1"'))
    assert book.names == {(None, "s_ds"): "Levels!$E$1"}
