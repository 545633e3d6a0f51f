"""Stored values: what is written, what stays, what is refused.

The package format is checked against ECMA-376 part 1 (18.3.1 worksheets, 18.2 workbook, 22.9.2.19 ST_Xstring)
and read back with openpyxl, which shares no code with the writer of the parts.
"""

from __future__ import annotations

import errno
import hashlib
import os
import re
import zipfile
from pathlib import Path
from xml.sax.saxutils import escape

import openpyxl
import pytest
from hypothesis import given
from hypothesis import strategies as st
from lxml import etree
from openpyxl.chart import BarChart, Reference
from openpyxl.comments import Comment
from openpyxl.formatting.rule import CellIsRule
from openpyxl.styles import PatternFill
from openpyxl.workbook.defined_name import DefinedName
from openpyxl.worksheet.datavalidation import DataValidation
from openpyxl.worksheet.formula import ArrayFormula
from openpyxl.worksheet.table import Table

from tests.support.office import Office
from tests.support.packages import (
    MAIN,
    OFFICE,
    SHEET,
    STRICT,
    STRICT_OFFICE,
    WORKBOOK,
    entries_of,
    hand_made,
    parts_of,
    relationships,
    without_values,
)
from xlbridge.headless import guard
from xlbridge.headless.store import StoreError, store
from xlbridge.headless.stored_cells import decode_text, encode
from xlbridge.values import ERROR_CODES, CellError

TITLE = "Story & table"
SHEET_PART = "xl/worksheets/sheet1.xml"
WORKBOOK_PART = "xl/workbook.xml"


def digest(path: Path) -> str:
    return hashlib.sha256(path.read_bytes()).hexdigest()


def cells(part: bytes) -> dict[str, etree._Element]:
    return {c.get("r"): c for c in etree.fromstring(part).iter(f"{{{MAIN}}}c")}


def shown(part: bytes, address: str) -> tuple[str | None, str | None]:
    """Type and stored text of a cell."""
    cell = cells(part)[address]
    value = cell.find(f"{{{MAIN}}}v")
    return cell.get("t"), None if value is None else value.text


@pytest.fixture
def book(tmp_path: Path) -> Path:
    return hand_made(tmp_path / "book.xlsx")


@pytest.fixture
def out(tmp_path: Path) -> Path:
    return tmp_path / "out.xlsx"


def stored(source: Path, target: Path, values: dict[str, object]) -> bytes:
    store(source, target, {(TITLE, address): value for address, value in values.items()})
    return parts_of(target)[SHEET_PART]


def rich_book(path: Path) -> Path:
    """A workbook with everything that a writer could damage."""
    book = openpyxl.Workbook()
    sheet = book.active
    sheet.title = "Stories"
    sheet.append(["Level", "w_x", "twice"])
    for row in range(2, 7):
        sheet.append([f"L{row}", 100.0 * row, f"=B{row}*2"])
    sheet["E2"] = ArrayFormula("E2:E6", "=B2:B6*3")
    sheet["F2"] = '=IF(B2>0,"yes",NA())'
    chart = BarChart()
    chart.add_data(Reference(sheet, min_col=2, min_row=1, max_row=6), titles_from_data=True)
    sheet.add_chart(chart, "H2")
    sheet["A1"].comment = Comment("as surveyed", "checker")
    validation = DataValidation(type="decimal", operator="greaterThan", formula1="0")
    validation.add("B2:B6")
    sheet.add_data_validation(validation)
    sheet.conditional_formatting.add(
        "C2:C6", CellIsRule(operator="lessThan", formula=["0"], fill=PatternFill())
    )
    sheet.add_table(Table(displayName="Levels", ref="A1:C6"))
    book.defined_names["W"] = DefinedName("W", attr_text="Stories!$B$2:$B$6")
    other = book.create_sheet("Other")
    other["A1"] = "=SUM(Stories!B2:B6)"
    book.save(path)
    return path


@pytest.fixture
def rich(tmp_path: Path) -> Path:
    return rich_book(tmp_path / "rich.xlsx")


# ---- what is written


def test_values_of_every_kind_are_read_back_by_openpyxl(rich: Path, out: Path) -> None:
    values = {
        ("Stories", "C2"): 0.1 + 0.2,
        ("Stories", "C3"): True,
        ("Stories", "C4"): "text",
        ("Stories", "C5"): CellError("#N/A", "no such row"),
        ("Stories", "C6"): -3.0,
        ("Stories", "E2"): 600.0,
        ("Stories", "E6"): 1800.0,
        ("Other", "A1"): 2000.0,
    }
    assert store(rich, out, values) == len(values)
    read = openpyxl.load_workbook(out, data_only=True)
    for (sheet, address), value in values.items():
        assert read[sheet][address].value == (value.code if isinstance(value, CellError) else value), address
    assert read["Stories"]["C3"].value is True


def test_formulas_are_the_same_before_and_after(rich: Path, out: Path) -> None:
    store(rich, out, {("Stories", f"C{row}"): 1.0 for row in range(2, 7)} | {("Stories", "E4"): 1.0})

    def formulas(path: Path) -> dict[tuple[str, str], object]:
        found = {}
        for sheet in openpyxl.load_workbook(path):
            for row in sheet.iter_rows():
                for cell in row:
                    value = cell.value
                    text = (value.ref, value.text) if isinstance(value, ArrayFormula) else value
                    found |= {(sheet.title, cell.coordinate): text} if cell.data_type == "f" else {}
        return found

    assert formulas(rich) == formulas(out)
    assert len(formulas(out)) == 8


@pytest.mark.parametrize("kind", ["rich", "book"])
def test_every_untouched_part_keeps_bytes_order_compression_and_date(
    kind: str, request: pytest.FixtureRequest, out: Path
) -> None:
    source = request.getfixturevalue(kind)
    key = ("Stories", "C2") if kind == "rich" else (TITLE, "C1")
    before = parts_of(source)
    touched = {SHEET_PART, WORKBOOK_PART}
    store(source, out, {key: 7.0})
    after = parts_of(out)
    assert list(after) == list(before)
    assert entries_of(out) == entries_of(source)
    assert {name for name in before if before[name] != after[name]} == touched
    assert without_values(before[SHEET_PART]) == without_values(after[SHEET_PART])


def test_untouched_parts_are_copied_as_compressed(tmp_path: Path, out: Path) -> None:
    source = hand_made(tmp_path / "book.xlsx")
    store(source, out, {(TITLE, "C1"): 7.0})
    with zipfile.ZipFile(source) as a, zipfile.ZipFile(out) as b:
        for name in ("xl/styles.xml", "xl/media/image1.png", "xl/sharedStrings.xml"):
            assert a.getinfo(name).compress_size == b.getinfo(name).compress_size
            assert a.getinfo(name).CRC == b.getinfo(name).CRC


def test_entries_with_data_descriptors_survive(tmp_path: Path, out: Path) -> None:
    source = tmp_path / "streamed.xlsx"
    with zipfile.ZipFile(hand_made(tmp_path / "book.xlsx")) as a, open(source, "wb") as raw:

        class Unseekable:
            def write(self, data: bytes) -> int:
                return raw.write(data)

            def flush(self) -> None:
                raw.flush()

        with zipfile.ZipFile(Unseekable(), "w", zipfile.ZIP_DEFLATED) as streamed:
            for name in a.namelist():
                streamed.writestr(name, a.read(name))
    with zipfile.ZipFile(source) as archive:
        assert all(info.flag_bits & 8 for info in archive.infolist())
    assert shown(stored(source, out, {"C1": 7.0}), "C1") == (None, "7")
    assert parts_of(out)["xl/styles.xml"] == parts_of(source)["xl/styles.xml"]


def test_cells_as_a_spreadsheet_program_writes_them(book: Path, out: Path) -> None:
    part = stored(
        book, out, {"D1": "y", "A2": 1.25, "A3": 2.25, "B2": "in line", "C2": 4.0, "D2": False, "B3": "new"}
    )
    assert shown(part, "D1") == ("str", "y")
    assert shown(part, "A2") == (None, "1.25")
    assert shown(part, "A3") == (None, "2.25")
    assert shown(part, "B2") == ("str", "in line")
    assert cells(part)["B2"].find(f"{{{MAIN}}}is") is None
    assert shown(part, "C2") == (None, "4")
    assert shown(part, "D2") == ("b", "0")
    assert cells(part)["D2"].get("vm") is None
    assert shown(part, "B3") == ("str", "new")
    assert shown(part, "A1") == ("s", "0")


def test_the_value_follows_the_formula_as_the_schema_orders(book: Path, out: Path) -> None:
    part = stored(book, out, {"B2": "a", "B3": 1.0, "A4": 1.0})
    for address in ("B2", "B3", "A4"):
        assert [etree.QName(e).localname for e in cells(part)[address]] == ["f", "v"]


def test_namespaces_ignorable_list_extensions_and_comments_stay(book: Path, out: Path) -> None:
    part = stored(book, out, {"C1": 1.0})
    before, after = etree.fromstring(SHEET.encode()), etree.fromstring(part)
    assert after.nsmap == before.nsmap
    assert after.attrib == before.attrib
    for tag in ("extLst", "cols", "dimension", "pageMargins"):
        kept, written = (
            etree.tostring(root.find(f"{{{MAIN}}}{tag}"), method="c14n2") for root in (before, after)
        )
        assert written == kept
    assert b"<!-- kept -->" in part
    assert part.startswith(b'<?xml version="1.0" encoding="UTF-8" standalone="yes"?>\r\n<worksheet xmlns="')


def test_spilled_cells_are_created_in_order_with_the_empty_cells_format(book: Path, out: Path) -> None:
    part = stored(book, out, {"A4": 1.5, "B4": 3.0, "B6": 9.0, "A6": 4.5, "A5": 3.0, "B5": "t"})
    assert list(cells(part))[-6:] == ["A4", "B4", "A5", "B5", "A6", "B6"]
    assert cells(part)["B4"].get("s") == "1"  # the row's format
    assert cells(part)["A4"].get("cm") == "1"
    assert shown(part, "B5") == ("str", "t")
    rows = {row.get("r"): row.get("spans") for row in etree.fromstring(part).iter(f"{{{MAIN}}}row")}
    assert list(rows) == ["1", "2", "3", "4", "5", "6"]
    assert rows["3"] == "1:4"
    assert rows["4"] is None  # its hint may no longer hold


def test_rows_are_created_in_order_whatever_the_order_of_the_values(tmp_path: Path, out: Path) -> None:
    sheet = SHEET.replace('ref="A4:B6"', 'ref="A4:B8"')
    part = stored(hand_made(tmp_path / "b.xlsx", sheet=sheet), out, {f"A{row}": 1.0 for row in (6, 5, 7, 8)})
    assert list(cells(part))[-5:] == ["A4", "A5", "A6", "A7", "A8"]


def test_a_spilled_cell_takes_the_format_of_its_column(tmp_path: Path, out: Path) -> None:
    sheet = SHEET.replace('ref="A4:B6"', 'ref="A4:F5"')
    part = stored(hand_made(tmp_path / "b.xlsx", sheet=sheet), out, {"F5": 1.0, "E5": 1.0, "F4": 1.0})
    assert cells(part)["F5"].get("s") == "2"
    assert cells(part)["E5"].get("s") is None
    assert cells(part)["F4"].get("s") == "1"  # the row's comes first


def test_rows_and_cells_without_addresses_are_counted(tmp_path: Path, out: Path) -> None:
    data = "<row><c><v>1</v></c><c><f>A1</f></c></row><row><c/><c><f>B1</f></c></row>"
    sheet = f'<worksheet xmlns="{MAIN}"><sheetData>{data}</sheetData></worksheet>'
    part = stored(hand_made(tmp_path / "b.xlsx", sheet=sheet), out, {"B1": 5.0, "B2": 6.0})
    assert re.findall(rb"<f>\w+</f><v>(\d)</v>", part) == [b"5", b"6"]


def test_none_removes_a_stale_value(book: Path, out: Path) -> None:
    assert shown(stored(book, out, {"D2": None}), "D2") == (None, None)


def test_literal_sections_stay_literal(tmp_path: Path, out: Path) -> None:
    sheet = SHEET.replace("<f>B1*2</f>", "<f><![CDATA[IF(B1<2,2,3)]]></f>")
    part = stored(hand_made(tmp_path / "b.xlsx", sheet=sheet), out, {"C1": 2.0})
    assert b"<f><![CDATA[IF(B1<2,2,3)]]></f><v>2</v>" in part


def test_part_names_ignore_case_and_may_be_relative(tmp_path: Path, out: Path) -> None:
    for target in ("worksheets/Sheet1.XML", "../xl/worksheets/sheet1.xml", "/XL/worksheets/sheet1.xml"):
        source = hand_made(tmp_path / "b.xlsx", rels=relationships(("rId1", "worksheet", target)))
        store(source, out, {(TITLE, "C1"): 7.0}, force=True)
        assert shown(parts_of(out)[SHEET_PART], "C1") == (None, "7")


def test_strict_and_prefixed_workbooks(tmp_path: Path, out: Path) -> None:
    source = hand_made(
        tmp_path / "strict.xlsx",
        sheet=f'<s:worksheet xmlns:s="{STRICT}"><s:sheetData><s:row r="1"><s:c r="A1"><s:f>1</s:f></s:c>'
        "</s:row></s:sheetData></s:worksheet>",
        workbook=WORKBOOK.replace(MAIN, STRICT).replace(OFFICE, STRICT_OFFICE),
        rels=relationships(("rId1", "worksheet", "worksheets/sheet1.xml"), office=STRICT_OFFICE),
        root_rels=relationships(("rId1", "officeDocument", "xl/workbook.xml"), office=STRICT_OFFICE),
    )
    assert b"<s:f>1</s:f><s:v>2.5</s:v></s:c>" in stored(source, out, {"A1": 2.5})


@given(st.floats(allow_nan=False, allow_infinity=False))
def test_numbers_round_trip(number: float) -> None:
    kind, text = encode(number)
    assert kind is None
    assert float(text) == number


@pytest.mark.parametrize(
    ("value", "written"),
    [
        ("tab\tand\nline", "tab\tand\nline"),
        ("bell\x07", "bell_x0007_"),
        ("carriage\rreturn", "carriage_x000D_return"),
        ("looks like _x0041_", "looks like _x005F_x0041_"),
        ("\ud800 alone", "_xD800_ alone"),
        ("C_vx = Δ·θ 😀 <&>", "C_vx = Δ·θ 😀 <&>"),
        ("  spaces  ", "  spaces  "),
        ("", ""),
    ],
)
def test_text_is_written_so_that_it_reads_back(value: str, written: str, book: Path, out: Path) -> None:
    part = stored(book, out, {"C2": value})
    assert shown(part, "C2") == ("str", written or None)
    assert decode_text(written) == value


@given(st.text(st.characters(exclude_categories=["Cs"]) | st.sampled_from("_x0Af5\r")))
def test_any_text_round_trips(text: str) -> None:
    _, written = encode(text)
    assert decode_text(written) == text
    assert etree.fromstring(f"<v>{escape(written)}</v>").text == (written or None)


@pytest.mark.parametrize("code", ERROR_CODES)
def test_error_values_carry_their_code(code: str, book: Path, out: Path) -> None:
    assert shown(stored(book, out, {"C1": CellError(code, "why")}), "C1") == ("e", code)


# ---- the calculation properties


def calculation(path: Path) -> dict[str, str]:
    return dict(etree.fromstring(parts_of(path)[WORKBOOK_PART]).find(f"{{{MAIN}}}calcPr").attrib)


def test_the_copy_is_marked_calculated_and_keeps_its_other_settings(book: Path, out: Path) -> None:
    stored(book, out, {"C1": 1.0})
    assert calculation(out) == {"calcId": "191029", "iterate": "1", "iterateCount": "50"}


def test_calculation_properties_are_created_where_the_schema_has_them(tmp_path: Path, out: Path) -> None:
    workbook = re.sub("<calcPr[^>]*/>", "", WORKBOOK)
    stored(hand_made(tmp_path / "b.xlsx", workbook=workbook), out, {"C1": 1.0})
    order = [etree.QName(e).localname for e in etree.fromstring(parts_of(out)[WORKBOOK_PART])]
    assert order == ["workbookPr", "bookViews", "sheets", "definedNames", "calcPr", "extLst"]


def test_a_later_engine_number_is_kept_and_the_part_untouched(tmp_path: Path, out: Path) -> None:
    workbook = re.sub("<calcPr[^>]*/>", '<calcPr calcId="999999"/>', WORKBOOK)
    source = hand_made(tmp_path / "b.xlsx", workbook=workbook)
    stored(source, out, {"C1": 1.0})
    assert parts_of(out)[WORKBOOK_PART] == parts_of(source)[WORKBOOK_PART]


# ---- what is refused


@pytest.mark.parametrize(
    ("key", "value", "words"),
    [
        ((TITLE, "B1"), 1.0, "Story & table!B1: the cell has no formula"),
        ((TITLE, "Z9"), 1.0, "Z9: the cell has no formula"),
        ((TITLE, "C7"), 1.0, "C7: the cell has no formula"),
        ((TITLE, "nowhere"), 1.0, "not a cell address"),
        (("Storeys", "A1"), 1.0, "no worksheet called 'Storeys'"),
        ((TITLE, "C1"), float("nan"), "not a finite number"),
        ((TITLE, "C1"), float("inf"), "not a finite number"),
        ((TITLE, "C1"), "x" * 32_768, "at most 32,767"),
        ((TITLE, "C1"), CellError("#SPILL!"), "no value that a cell can store"),
        ((TITLE, "C1"), [1.0], "no value that a cell can store"),
    ],
)
def test_a_value_that_cannot_be_stored_leaves_no_file(
    key: tuple[str, str], value: object, words: str, book: Path, out: Path
) -> None:
    with pytest.raises(StoreError, match=re.escape(words)):
        store(book, out, {key: value})
    assert [path.name for path in out.parent.iterdir()] == ["book.xlsx"]


def test_the_longest_text_is_stored(book: Path, out: Path) -> None:
    assert shown(stored(book, out, {"C1": "x" * 32_767}), "C1") == ("str", "x" * 32_767)


@pytest.mark.parametrize(
    ("replaced", "words"),
    [
        ({"sheet": f'<!DOCTYPE w [<!ENTITY e "x">]><w xmlns="{MAIN}">&e;</w>'}, "document type"),
        ({"sheet": f'<!DOCTYPE w SYSTEM "file:///etc/passwd"><w xmlns="{MAIN}"/>'}, "document type"),
        ({"sheet": "<worksheet>"}, "not well-formed"),
        ({"sheet": f'<chartsheet xmlns="{MAIN}"/>'}, "not a worksheet"),
        ({"rels": relationships(("rId1", "chartsheet", "worksheets/sheet1.xml"))}, "no worksheet called"),
        (
            {"rels": relationships(("rId1", "worksheet", "worksheets/sheet9.xml"))},
            "no part xl/worksheets/sheet9",
        ),
        ({"root_rels": relationships(("rId1", "officeDocument", "xl/workbook.bin"))}, ".xlsb"),
        ({"root_rels": relationships()}, "names no workbook"),
    ],
)
def test_a_hostile_or_broken_package_is_one_sentence(
    replaced: dict[str, str], words: str, tmp_path: Path, out: Path
) -> None:
    source = hand_made(tmp_path / "b.xlsx", **replaced)
    with pytest.raises(StoreError, match=re.escape(words)) as caught:
        store(source, out, {(TITLE, "C1"): 1.0})
    assert str(source) in str(caught.value)
    assert not out.exists()


def test_a_part_that_swells_is_refused(book: Path, out: Path, monkeypatch: pytest.MonkeyPatch) -> None:
    monkeypatch.setattr(guard, "MAX_PART", 1000)
    with pytest.raises(StoreError, match=r"sheet1\.xml is larger than"):
        store(book, out, {(TITLE, "C1"): 1.0})


def test_entities_that_multiply_are_refused(tmp_path: Path, out: Path) -> None:
    lines = ['<!ENTITY a0 "aaaaaaaaaa">'] + [f'<!ENTITY a{n} "{f"&a{n - 1};" * 10}">' for n in range(1, 10)]
    source = hand_made(tmp_path / "b.xlsx", sheet=f"<!DOCTYPE w [{''.join(lines)}]><w a='&a9;'>&a9;</w>")
    with pytest.raises(StoreError):
        store(source, out, {(TITLE, "C1"): 1.0})


def test_no_zip_and_missing_files_are_one_sentence(tmp_path: Path, out: Path) -> None:
    old = tmp_path / "old.xls"
    old.write_bytes(b"\xd0\xcf\x11\xe0" + bytes(600))
    with pytest.raises(StoreError, match=r"saved as \.xlsx first"):
        store(old, out, {})
    with pytest.raises(StoreError, match="cannot be read"):
        store(tmp_path / "none.xlsx", out, {})


def test_a_damaged_part_is_one_sentence(book: Path, out: Path) -> None:
    with zipfile.ZipFile(book) as archive:
        offset = archive.getinfo(SHEET_PART).header_offset
    data = bytearray(book.read_bytes())
    data[offset + 60] ^= 0xFF
    book.write_bytes(data)
    with pytest.raises(StoreError, match=r"cannot be unpacked|not well-formed"):
        store(book, out, {(TITLE, "C1"): 1.0})


@pytest.mark.filterwarnings("ignore:Duplicate name")
def test_two_parts_of_one_name_are_refused(book: Path, out: Path) -> None:
    with zipfile.ZipFile(book, "a") as archive:
        archive.writestr("XL/workbook.xml", "second")
    with pytest.raises(StoreError, match="same name"):
        store(book, out, {(TITLE, "C1"): 1.0})


# ---- the file system


def test_the_source_never_changes_even_with_force(book: Path, tmp_path: Path) -> None:
    before = digest(book)
    link = tmp_path / "link.xlsx"
    link.symlink_to(book)
    for target in (book, link):
        with pytest.raises(StoreError, match="the input itself"):
            store(book, target, {(TITLE, "C1"): 1.0}, force=True)
    store(book, tmp_path / "out.xlsx", {(TITLE, "C1"): 1.0})
    assert digest(book) == before


def test_an_existing_target_needs_force(book: Path, out: Path) -> None:
    out.write_bytes(b"precious")
    with pytest.raises(StoreError, match="--force"):
        store(book, out, {(TITLE, "C1"): 1.0})
    assert out.read_bytes() == b"precious"
    store(book, out, {(TITLE, "C1"): 1.0}, force=True)
    assert shown(parts_of(out)[SHEET_PART], "C1") == (None, "1")


def test_a_read_only_target_is_not_replaced(book: Path, out: Path) -> None:
    out.write_bytes(b"precious")
    out.chmod(0o444)
    with pytest.raises(StoreError, match="read-only"):
        store(book, out, {(TITLE, "C1"): 1.0}, force=True)
    assert out.read_bytes() == b"precious"


@pytest.mark.parametrize(
    ("call", "number", "words"),
    [
        ("replace", errno.EACCES, "open in another program"),
        ("fsync", errno.ENOSPC, "the disk is full"),
        ("fsync", errno.EIO, "cannot be written"),
    ],
)
def test_a_failed_write_is_one_sentence_and_leaves_nothing(
    call: str, number: int, words: str, book: Path, out: Path, monkeypatch: pytest.MonkeyPatch
) -> None:
    def fail(*_: object) -> None:
        raise OSError(number, os.strerror(number))

    monkeypatch.setattr(os, call, fail)
    with pytest.raises(StoreError, match=words) as caught:
        store(book, out, {(TITLE, "C1"): 1.0})
    assert str(out) in str(caught.value)
    assert [path.name for path in out.parent.iterdir()] == ["book.xlsx"]


def test_a_folder_that_is_missing_or_in_the_way(book: Path, tmp_path: Path) -> None:
    with pytest.raises(StoreError, match="does not exist"):
        store(book, tmp_path / "none" / "out.xlsx", {})
    (tmp_path / "folder").mkdir()
    with pytest.raises(StoreError, match="not a file"):
        store(book, tmp_path / "folder", {}, force=True)


def test_storing_twice_gives_identical_bytes(book: Path, tmp_path: Path) -> None:
    for name in ("a.xlsx", "b.xlsx"):
        store(book, tmp_path / name, {(TITLE, "C1"): 1.0, (TITLE, "B5"): 2.0})
    assert (tmp_path / "a.xlsx").read_bytes() == (tmp_path / "b.xlsx").read_bytes()


# ---- a spreadsheet program without the worksheet functions


def test_a_program_without_the_functions_shows_the_stored_values(
    office: Office, tmp_path: Path, out: Path
) -> None:
    """LibreOffice Calc knows no ELF_FX: opened, the stored number stands; recalculated, it is an error."""
    book = openpyxl.Workbook()
    book.active.title = "S"
    book.active["A1"], book.active["A2"] = "=ELF_FX(286,0.28)", "=A1*2"
    book.save(tmp_path / "plain.xlsx")
    store(tmp_path / "plain.xlsx", out, {("S", "A1"): 80.08, ("S", "A2"): 160.16})
    with office.open(out, recalculate=False) as opened:
        assert opened.read("S", "A1:A2") == [[80.08], [160.16]]
        opened.recalculate()
        assert isinstance(opened.value("S", "A2"), CellError)
