"""Notes and sheets put into a package: what was there stays, real programs read what was added."""

from __future__ import annotations

import re
from collections.abc import Callable
from io import BytesIO
from pathlib import Path

import openpyxl
import pytest
from lxml import etree
from openpyxl import Workbook
from openpyxl.comments import Comment

from tests.support.office import Office
from tests.support.packages import MAIN, OFFICE, hand_made, parts_of, relationships
from xlbridge.headless.added_sheets import Look, Sheet, Shown, add_sheets
from xlbridge.headless.archive import StoreError
from xlbridge.headless.notes import put_notes
from xlbridge.headless.package import Package
from xlbridge.headless.references import Cell
from xlbridge.values import CellError

AUTHOR = "a checker"
TABLE = Sheet(
    "Found",
    (8, 30, 12),
    (
        (Shown("Found", Look.TITLE),),
        (Shown("no.", Look.HEAD), Shown("what", Look.HEAD), Shown("value", Look.HEAD)),
        (Shown(1.0), Shown("=1+1", to=Cell("Two words", 2, 2)), Shown(CellError("#N/A"))),
        (Shown(2.0, Look.STRONG), Shown("a\x07b _x0041_ & <c>"), Shown(True)),
        (Shown(3.0), Shown("delta_xe_X")),
    ),
    2,
    "a footer",
)


def written(tmp_path: Path, change: Callable[[Workbook], object] = lambda book: None) -> Path:
    """A workbook with a formula, a hidden row and a note of its own."""
    path, book = tmp_path / "in.xlsx", Workbook()
    sheet = book.active
    sheet.title = "Two words"
    sheet.append([1, 2, "=A1+B1"])
    sheet["A1"].comment = Comment("mine", "an engineer")
    change(book)
    book.save(path)
    return path


def noted(path: Path, notes: dict[str, str], sheet: str = "Two words") -> Path:
    package = Package(path.read_bytes())
    put_notes(package, sheet, notes, AUTHOR)
    target = path.with_name("out.xlsx")
    target.write_bytes(package.to_bytes())
    return target


def test_a_note_stands_beside_those_that_were_there(tmp_path: Path) -> None:
    source = written(tmp_path)
    target = noted(source, {"A1": "more", "C1": "new\nline"})
    sheet = openpyxl.load_workbook(target)["Two words"]
    assert sheet["A1"].comment.text == "mine\n\nmore"
    assert (sheet["A1"].comment.author, sheet["C1"].comment.author) == ("an engineer", AUTHOR)
    assert sheet["C1"].comment.text == "new\nline"
    assert sheet["C1"].value == "=A1+B1"
    before, after = parts_of(source), parts_of(target)
    assert list(before) == list(after)
    changed = {name for name in before if before[name] != after[name]}
    assert changed == {name for name in before if "comment" in name and "rels" not in name}
    assert len(changed) == 2


def test_a_package_without_notes_gets_its_parts(tmp_path: Path) -> None:
    source = hand_made(tmp_path / "in.xlsx")
    target = noted(source, {"B3": "here", "$C$1": "there"}, "Story & table")
    before, after = parts_of(source), parts_of(target)
    assert {name for name in before if before[name] != after[name]} == {
        "[Content_Types].xml",
        "xl/worksheets/sheet1.xml",
    }
    sheet = etree.fromstring(after["xl/worksheets/sheet1.xml"])
    names = [etree.QName(child).localname for child in sheet]
    assert names[names.index("pageMargins") + 1 :] == ["legacyDrawing", "extLst"]
    drawing = etree.fromstring(after["xl/drawings/vmlDrawing1.vml"])
    shapes = drawing.findall("{urn:schemas-microsoft-com:vml}shape")
    assert len({shape.get("id") for shape in shapes}) == len(shapes) == 2
    assert drawing[0].find("{*}idmap").get("data") == "1"
    assert all(1024 < int(shape.get("id").removeprefix("_x0000_s")) < 2048 for shape in shapes)
    assert [item.text for item in drawing.iter("{urn:schemas-microsoft-com:office:excel}Row")] == ["2", "0"]


def test_a_sheet_full_of_notes_has_a_number_for_each(tmp_path: Path) -> None:
    source = hand_made(tmp_path / "in.xlsx")
    after = parts_of(noted(source, {f"A{row}": "note" for row in range(1, 1501)}, "Story & table"))
    drawing = after["xl/drawings/vmlDrawing1.vml"]
    assert b'data="1,2"' in drawing
    assert len(set(re.findall(rb'"_x0000_s(\d+)"', drawing))) == 1500


def test_a_second_round_adds_to_the_first(tmp_path: Path) -> None:
    once = noted(written(tmp_path), {"C1": "one"})
    again = once.with_name("again.xlsx")
    package = Package(once.read_bytes())
    put_notes(package, "Two words", {"C1": "two", "D4": "three"}, AUTHOR)
    again.write_bytes(package.to_bytes())
    sheet = openpyxl.load_workbook(again)["Two words"]
    assert (sheet["C1"].comment.text, sheet["D4"].comment.text) == ("one\n\ntwo", "three")
    drawing = next(data for name, data in parts_of(again).items() if name.endswith(".vml"))
    ids = re.findall(rb'"_x0000_s(\d+)"', drawing)
    assert len(ids) == len(set(ids)) == 3


def test_a_threaded_comment_is_left_as_it_is(tmp_path: Path) -> None:
    source = written(tmp_path)
    package = Package(source.read_bytes())
    part = package.sheets["Two words"]
    package.write("xl/threaded1.xml", b'<t><threadedComment ref="A1"/></t>')
    package.relate(part, "threadedComment", "xl/threaded1.xml")
    put_notes(package, "Two words", {"A1": "more", "B1": "new"}, AUTHOR)
    sheet = openpyxl.load_workbook(BytesIO(package.to_bytes()))["Two words"]
    assert (sheet["A1"].comment.text, sheet["B1"].comment.text) == ("mine", "new")


def test_a_drawing_that_is_not_xml_gets_its_shapes_too(tmp_path: Path) -> None:
    source = written(tmp_path)
    package = Package(source.read_bytes())
    part = next(package.related(package.sheets["Two words"], "vmlDrawing"), None) or next(
        name for name in parts_of(source) if name.endswith(".vml")
    )
    package.write(part, package.read(part).replace(b"</xml>", b"<br></xml>"))
    put_notes(package, "Two words", {"B1": "new"}, AUTHOR)
    assert package.read(part).count(b"ObjectType") == 2
    package.write(part, b"<nothing/>")
    with pytest.raises(StoreError, match="no drawing"):
        put_notes(package, "Two words", {"D1": "new"}, AUTHOR)


def test_a_text_too_long_for_a_note_ends_in_an_ellipsis(tmp_path: Path) -> None:
    text = openpyxl.load_workbook(noted(written(tmp_path), {"A1": "x" * 40_000}))["Two words"][
        "A1"
    ].comment.text
    assert len(text) == 32_767
    assert text.endswith("x…")


def test_an_added_sheet_holds_texts_as_texts(tmp_path: Path) -> None:
    source = written(tmp_path)
    package = Package(source.read_bytes())
    assert add_sheets(package, TABLE, TABLE) == ["Found", "Found 2"]
    book = openpyxl.load_workbook(BytesIO(package.to_bytes()))
    assert book.sheetnames == ["Two words", "Found", "Found 2"]
    cell = book["Found"]["B3"]
    assert (cell.value, cell.data_type, cell.quotePrefix) == ("=1+1", "s", True)
    assert cell.hyperlink.location == "'Two words'!B2"
    assert [book["Found"][address].value for address in ("A3", "C3", "C4")] == [1, "#N/A", True]
    assert "_x0007_" in book["Found"]["B4"].value
    assert book["Found"].print_title_rows == "$1:$2"
    assert book["Two words"]["C1"].value == "=A1+B1"
    assert book["Found"]["B2"].font.bold
    assert book["Two words"]["A1"].font.name == "Calibri"


def test_a_package_without_styles_gets_some(tmp_path: Path) -> None:
    rels = relationships(
        ("rId1", "worksheet", "/xl/worksheets/sheet1.xml"), ("rId3", "sharedStrings", "sharedStrings.xml")
    )
    package = Package(hand_made(tmp_path / "in.xlsx", rels=rels).read_bytes())
    add_sheets(package, TABLE)
    assert package.look("xl/styles1.xml").find(f"{{{MAIN}}}cellXfs").get("count") == "7"
    assert package.look("xl/_rels/workbook.xml.rels")[-1].get("Type") == f"{OFFICE}/worksheet"


def test_calc_reads_the_same_values_and_the_notes(tmp_path: Path, office: Office) -> None:
    package = Package(noted(written(tmp_path), {"A1": "more", "C1": "new"}).read_bytes())
    add_sheets(package, TABLE)
    target = tmp_path / "both.xlsx"
    target.write_bytes(package.to_bytes())
    with office.open(target) as book:
        assert book.sheets() == ["Two words", "Found"]
        assert book.value("Two words", "C1") == 3.0
        assert book.value("Found", "B3") == "=1+1"
        assert book.formula("Found", "B3") in ("=1+1", "'=1+1")
        assert book.value("Found", "A4") == 2.0
        assert book.value("Found", "B5") == "delta_xe_X"
