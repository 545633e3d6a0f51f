"""Sheets of plain tables added to a workbook's package, for reading and printing; no formulas.

Texts are inline and marked as such, so that one that begins with ``=`` stays a text. Element names are
those of ECMA-376 part 1, 18.3 (worksheets) and 18.8 (styles).
"""

from __future__ import annotations

from collections.abc import Mapping, Sequence
from dataclasses import dataclass
from enum import StrEnum
from itertools import chain, count
from typing import Final, TypeAlias

from lxml import etree

from xlbridge.headless.notes import shortened
from xlbridge.headless.package import Package, child
from xlbridge.headless.references import Cell, address_of, quote_sheet
from xlbridge.headless.stored_cells import MAX_TEXT, encode, encode_text
from xlbridge.values import Scalar

#: what the schema has after the names of a workbook, and the order of the groups of its styles
_AFTER_NAMES: Final = (
    *("calcPr", "oleSize", "customWorkbookViews", "pivotCaches", "smartTagPr", "smartTagTypes"),
    *("webPublishing", "fileRecoveryPr", "webPublishObjects", "extLst"),
)
_STYLE_GROUPS: Final = (
    *("numFmts", "fonts", "fills", "borders", "cellStyleXfs", "cellXfs", "cellStyles", "dxfs"),
    *("tableStyles", "colors", "extLst"),
)
_SHEET_TYPE: Final = "application/vnd.openxmlformats-officedocument.spreadsheetml.worksheet+xml"
_STYLES_TYPE: Final = "application/vnd.openxmlformats-officedocument.spreadsheetml.styles+xml"


class Look(StrEnum):
    """How a cell of an added sheet looks."""

    TITLE = "title"
    PLAIN = "plain"
    """A text in one line."""
    HEAD = "head"
    BODY = "body"
    """A cell of a table: framed, broken into lines."""
    STRONG = "strong"
    """The same, for what must not be overlooked."""
    LINK = "link"
    """The same, for what leads to another cell."""


_BODY_SIZE: Final = 10
#: marks of the font, its size, whether filled, whether framed and broken into lines
_LOOKS: Final[Mapping[Look, tuple[str, int, bool, bool]]] = {
    Look.TITLE: ("<b/>", 14, False, False),
    Look.PLAIN: ("", _BODY_SIZE, False, False),
    Look.HEAD: ("<b/>", _BODY_SIZE, True, True),
    Look.BODY: ("", _BODY_SIZE, False, True),
    Look.STRONG: ("<b/>", _BODY_SIZE, False, True),
    Look.LINK: ("<u/>", _BODY_SIZE, False, True),
}
#: points of a line, the tallest row there is, and the part of a width that a line of words fills
_LINE_HEIGHT, _TALLEST, _FIT = 13.5, 405.0, 1.1
_FILL: Final = "FFE4E1EC"
_SIDE: Final = '<{0} style="thin"><color rgb="FF7A7A7A"/></{0}>'


@dataclass(frozen=True, slots=True)
class Shown:
    """A value with its look, and the cell that a click on it leads to."""

    value: Scalar
    look: Look = Look.BODY
    to: Cell | None = None


Row: TypeAlias = Sequence[Shown]


@dataclass(frozen=True)
class Sheet:
    """An added sheet: column widths, rows, and how many rows on top are repeated on each printed page."""

    title: str
    widths: Sequence[float]
    rows: Sequence[Row]
    repeated: int
    footer: str


def add_sheets(package: Package, *sheets: Sheet) -> list[str]:
    """Add sheets after the others; return their titles, numbered where the workbook has one of it."""
    main = str(etree.QName(package.look(package.workbook_part)).namespace)
    styles = _styles(package, main)
    return [_add_sheet(package, sheet, main, styles) for sheet in sheets]


def _add_sheet(package: Package, sheet: Sheet, main: str, styles: Mapping[Look, int]) -> str:
    part = package.fresh("xl/worksheets/sheet{}.xml")
    package.write(part, _written(sheet, main, styles))
    package.declare(part, _SHEET_TYPE)
    return _enlist(package, sheet, package.relate(package.workbook_part, "worksheet", part))


def _enlist(package: Package, sheet: Sheet, identifier: str) -> str:
    """Name the sheet in the workbook, with the rows that it repeats in print."""
    workbook = package.edit(package.workbook_part)
    tag = f"{{{etree.QName(workbook).namespace}}}"
    sheets, names = child(workbook, "sheets"), child(workbook, "definedNames", _AFTER_NAMES)
    taken = {old.get("name", "").casefold() for old in sheets}
    titles = chain((sheet.title,), (f"{sheet.title} {n}" for n in count(2)))
    title = next(name for name in titles if name.casefold() not in taken)
    number = max(int(old.get("sheetId", 0)) for old in sheets) + 1
    given = {"name": title, "sheetId": str(number), f"{{{package.office}}}id": identifier}
    place = {"name": "_xlnm.Print_Titles", "localSheetId": str(len(sheets))}
    etree.SubElement(names, f"{tag}definedName", place).text = f"{quote_sheet(title)}!$1:${sheet.repeated}"
    etree.SubElement(sheets, f"{tag}sheet", given)
    return title


def _written(sheet: Sheet, main: str, styles: Mapping[Look, int]) -> bytes:
    """The worksheet part."""
    root = etree.fromstring(f'<worksheet xmlns="{main}"/>')
    _add(_add(root, "sheetPr"), "pageSetUpPr", fitToPage="1")
    view = _add(_add(root, "sheetViews"), "sheetView", showGridLines="0", workbookViewId="0")
    below = address_of(sheet.repeated + 1, 1)
    _add(view, "pane", ySplit=str(sheet.repeated), topLeftCell=below, activePane="bottomLeft", state="frozen")
    columns = _add(root, "cols")
    for n, width in enumerate(sheet.widths, 1):
        _add(columns, "col", min=str(n), max=str(n), width=str(width), customWidth="1")
    data = _add(root, "sheetData")
    for n, row in enumerate(sheet.rows, 1):
        element = _add(data, "row", r=str(n), ht=str(_height(row, sheet.widths)), customHeight="1")
        for column, shown in enumerate(row, 1):
            _put(_add(element, "c", r=address_of(n, column), s=str(styles[shown.look])), shown.value)
    _link(root, sheet)
    _add(root, "pageMargins", left="0.4", right="0.4", top="0.5", bottom="0.7", header="0.3", footer="0.3")
    _add(root, "pageSetup", orientation="landscape", fitToWidth="1", fitToHeight="0")
    footer = sheet.footer.replace("&", "&&")
    _add(_add(root, "headerFooter"), "oddFooter").text = f"&L&8{footer}&R&8&A, page &P of &N"
    return etree.tostring(root, encoding="UTF-8", xml_declaration=True, standalone=True)


def _height(row: Row, widths: Sequence[float]) -> float:
    """The points that a row takes: not every program fits rows to their texts when it opens a file."""
    lines = [1]
    for shown, width in zip(row, widths, strict=False):
        size, framed = _LOOKS[shown.look][1], _LOOKS[shown.look][3]
        if framed and isinstance(shown.value, str):
            lines.append(sum(1 + int(len(line) / (width * _FIT)) for line in shown.value.split("\n")))
        lines.append(2 if size > _BODY_SIZE else 1)
    return min(max(lines) * _LINE_HEIGHT, _TALLEST)


def _add(parent: etree._Element, name: str, **given: str) -> etree._Element:
    return etree.SubElement(parent, f"{{{etree.QName(parent).namespace}}}{name}", given)


def _link(root: etree._Element, sheet: Sheet) -> None:
    """Links to cells of the workbook."""
    cells = ((n, m, c.to) for n, row in enumerate(sheet.rows, 1) for m, c in enumerate(row, 1) if c.to)
    for n, m, to in cells:
        place = f"{quote_sheet(to.sheet)}!{to.address}"
        _add(child(root, "hyperlinks"), "hyperlink", ref=address_of(n, m), location=place)


def _put(cell: etree._Element, value: Scalar) -> None:
    if value in (None, ""):
        return
    if isinstance(value, str):
        cell.set("t", "inlineStr")
        text = _add(_add(cell, "is"), "t")
        text.set("{http://www.w3.org/XML/1998/namespace}space", "preserve")
        text.text = encode_text(shortened(value, MAX_TEXT))
    else:
        kind, written = encode(value)
        if kind:
            cell.set("t", kind)
        _add(cell, "v").text = written


def _styles(package: Package, main: str) -> dict[Look, int]:
    """Add our formats behind those of the workbook; return the number of each."""
    part = next(package.related(package.workbook_part, "styles"), None)
    if part is None:
        part = package.fresh("xl/styles{}.xml")
        package.relate(package.workbook_part, "styles", part)
        package.declare(part, _STYLES_TYPE)
    root = package.edit(part, _empty_styles(main))
    sides = "".join(_SIDE.format(side) for side in ("left", "right", "top", "bottom"))
    fill = f'<fill><patternFill patternType="solid"><fgColor rgb="{_FILL}"/></patternFill></fill>'
    frame, filled = _append(root, "borders", f"<border>{sides}</border>"), _append(root, "fills", fill)
    numbers = {}
    for look, (marks, size, is_filled, framed) in _LOOKS.items():
        text = f'<font>{marks}<sz val="{size}"/><name val="Calibri"/></font>'
        numbers[look] = _append(
            root,
            "cellXfs",
            f'<xf numFmtId="0" fontId="{_append(root, "fonts", text)}" fillId="{filled if is_filled else 0}" '
            f'borderId="{frame if framed else 0}" xfId="0" quotePrefix="1" applyFont="1" applyFill="1" '
            f'applyBorder="1" applyAlignment="1"><alignment horizontal="left" vertical="top" '
            f'wrapText="{int(framed)}"/></xf>',
        )
    return numbers


def _append(root: etree._Element, group: str, text: str) -> int:
    """Append a font, fill, border or format; return its number."""
    parent = child(root, group, _STYLE_GROUPS[_STYLE_GROUPS.index(group) + 1 :])
    wrapped = etree.fromstring(f'<w xmlns="{etree.QName(root).namespace}">{text}</w>')
    items = parent.findall("*")
    parent.append(wrapped[0])
    parent.set("count", str(len(items) + 1))
    return len(items)


def _empty_styles(main: str) -> str:
    return (
        f'<styleSheet xmlns="{main}"><fonts><font/></fonts>'
        '<fills><fill><patternFill patternType="none"/></fill>'
        '<fill><patternFill patternType="gray125"/></fill></fills><borders><border/></borders>'
        "<cellStyleXfs><xf/></cellStyleXfs><cellXfs><xf/></cellXfs></styleSheet>"
    )
