"""Notes put on cells of a workbook's package: what is there stays as it is.

A note is a text in the sheet's comments part and a shape in its drawing of the old kind (VML), which holds
place and size. Element names are those of ECMA-376 part 1, 18.7 (comments), and part 4, 19 (VML).
"""

from __future__ import annotations

import re
from collections.abc import Mapping
from typing import Final

from lxml import etree

from xlbridge.headless.archive import StoreError
from xlbridge.headless.package import Package, insert_before
from xlbridge.headless.references import address_of, parse_address
from xlbridge.headless.stored_cells import MAX_TEXT, encode_text

_COMMENTS_TYPE: Final = "application/vnd.openxmlformats-officedocument.spreadsheetml.comments+xml"
_VML_TYPE: Final = "application/vnd.openxmlformats-officedocument.vmlDrawing"
#: what the schema has after legacyDrawing in a worksheet (ECMA-376 part 1, 18.3.1.99)
_AFTER_DRAWING: Final = (
    *("legacyDrawingHF", "drawingHF", "picture", "oleObjects", "controls"),
    *("webPublishItems", "tableParts", "extLst"),
)
_SPACE: Final = "{http://www.w3.org/XML/1998/namespace}space"
_VML: Final = (
    'xmlns:v="urn:schemas-microsoft-com:vml" xmlns:o="urn:schemas-microsoft-com:office:office" '
    'xmlns:x="urn:schemas-microsoft-com:office:excel"'
)
#: shapes are numbered in blocks, which the drawing names
_BLOCK: Final = 1024
_EMPTY: Final = (
    f'<xml {_VML}><o:shapelayout v:ext="edit"><o:idmap v:ext="edit" data="{{blocks}}"/></o:shapelayout></xml>'
)
_SHAPE_TYPE: Final = (
    f'<v:shapetype {_VML} id="_x0000_t202" coordsize="21600,21600" o:spt="202" '
    'path="m,l,21600r21600,l21600,xe"><v:stroke joinstyle="miter"/>'
    '<v:path gradientshapeok="t" o:connecttype="rect"/></v:shapetype>'
)
_SHAPE: Final = (
    '<v:shape {names} id="_x0000_s{number}" type="#_x0000_t202" '
    'style="position:absolute;margin-left:60pt;margin-top:2pt;width:260pt;height:{height}pt;z-index:1;'
    'visibility:hidden" fillcolor="#ffffff" o:insetmode="auto"><v:fill color2="#ffffff"/>'
    '<v:path o:connecttype="none"/><v:textbox style="mso-direction-alt:auto"/>'
    '<x:ClientData ObjectType="Note"><x:MoveWithCells/><x:SizeWithCells/>'
    "<x:Anchor>{left}, 12, {top}, 4, {right}, 12, {bottom}, 4</x:Anchor><x:AutoFill>False</x:AutoFill>"
    "<x:Row>{row}</x:Row><x:Column>{column}</x:Column></x:ClientData></v:shape>"
)
_NUMBER: Final = re.compile(rb'"_x0000_s(\d{1,9})"')
#: letters in a line, and points of a line, of a note
_LINE, _LINE_HEIGHT = 48, 13


def put_notes(package: Package, sheet: str, notes: Mapping[str, str], author: str) -> None:
    """Put a note on each cell of a worksheet by address.

    A cell that has a note keeps it, and the text follows; one with a threaded comment is left as it is.
    """
    part = package.sheets[sheet]
    threaded = {
        address_of(*parse_address(comment.get("ref", "A1")))
        for name in package.related(part, "threadedComment")
        for comment in package.look(name)
    }
    wanted = {address: text for address, text in notes.items() if address not in threaded}
    if not wanted:
        return
    comments = _comments(package, part)
    number = str(_author(comments, author))
    tag = f"{{{etree.QName(comments).namespace}}}"
    items = comments.find(f"{tag}commentList")
    if items is None:
        raise StoreError(f"{sheet}: its notes cannot be read, so none can be added")
    existing = {item.get("ref", "").replace("$", ""): item for item in items}
    for address, text in wanted.items():
        if address in existing:
            _add_text(existing[address], tag, f"\n\n{text}")
        else:
            item = etree.SubElement(items, f"{tag}comment", {"ref": address, "authorId": number})
            etree.SubElement(item, f"{tag}text")
            _add_text(item, tag, text)
    _draw(package, part, {a: text for a, text in wanted.items() if a not in existing})


def _comments(package: Package, part: str) -> etree._Element:
    found = next(package.related(part, "comments"), None)
    if found is None:
        found = package.fresh("xl/comments{}.xml")
        package.relate(part, "comments", found)
        package.declare(found, _COMMENTS_TYPE)
    main = etree.QName(package.look(part)).namespace
    return package.edit(found, f'<comments xmlns="{main}"><authors/><commentList/></comments>')


def _author(comments: etree._Element, author: str) -> int:
    """The place of an author in the list; added where it is new."""
    tag = f"{{{etree.QName(comments).namespace}}}"
    authors = comments.find(f"{tag}authors")
    if authors is None:
        authors = etree.Element(f"{tag}authors")
        comments.insert(0, authors)
    names = [item.text for item in authors]
    if author not in names:
        etree.SubElement(authors, f"{tag}author").text = author
        names.append(author)
    return names.index(author)


def _add_text(item: etree._Element, tag: str, text: str) -> None:
    """Add a run to a note; a text without runs becomes its first one."""
    body = item.find(f"{tag}text")
    if body is None:
        body = etree.SubElement(item, f"{tag}text")
    plain = body.find(f"{tag}t")
    if plain is not None:
        run = etree.Element(f"{tag}r")
        body.replace(plain, run)
        run.append(plain)
    runs = body.findall(f"{tag}r")
    run = etree.Element(f"{tag}r")
    body.insert(body.index(runs[-1]) + 1 if runs else 0, run)
    added = etree.SubElement(run, f"{tag}t", {_SPACE: "preserve"})
    held = sum(len(t.text or "") for t in body.iter(f"{tag}t"))
    added.text = encode_text(shortened(text, MAX_TEXT - held))


def shortened(text: str, length: int) -> str:
    """A text cut to a length, with an ellipsis for what is missing.

    >>> shortened("one two", 5), shortened("one", 5)
    ('one …', 'one')
    """
    return text if len(text) <= length else text[: max(length - 1, 0)] + "…"[: max(length, 0)]


def _draw(package: Package, part: str, notes: Mapping[str, str]) -> None:
    """Add a shape for each new note at the end of the drawing; it is not always XML, so it is not parsed."""
    name = _drawing(package, part, len(notes))
    old = package.read(name)
    end = old.rfind(b"</xml>")
    if end < 0:
        raise StoreError(f"part {name} is no drawing that notes can be added to")
    number = max((int(found) for found in _NUMBER.findall(old)), default=_BLOCK)
    shapes = [] if b'"_x0000_t202"' in old else [_SHAPE_TYPE]
    for address, text in notes.items():
        number += 1
        shapes.append(_shape(number, address, text))
    package.write(name, old[:end] + "".join(shapes).encode() + old[end:])


def _drawing(package: Package, part: str, count: int) -> str:
    """The sheet's drawing of the old kind; made where there is none, with numbers for so many shapes."""
    sheet = package.look(part)
    main, ident = etree.QName(sheet).namespace, f"{{{package.office}}}id"
    legacy = sheet.find(f"{{{main}}}legacyDrawing")
    name = package.relation(part, legacy.get(ident, "")) if legacy is not None else None
    if name is None:
        name = package.fresh("xl/drawings/vmlDrawing{}.vml")
        blocks = ",".join(str(n) for n in range(1, 2 + count // _BLOCK))
        package.write(name, _EMPTY.format(blocks=blocks).encode())
        package.declare(name, _VML_TYPE)
        sheet = package.edit(part)
        identifier = package.relate(part, "vmlDrawing", name)
        element = etree.Element(f"{{{main}}}legacyDrawing", {ident: identifier}, {"r": package.office})
        insert_before(sheet, element, _AFTER_DRAWING)
    return name


def _shape(number: int, address: str, text: str) -> str:
    row, column = parse_address(address)
    lines = sum(1 + len(line) // _LINE for line in text.splitlines())
    top = max(row - 2, 0)
    return _SHAPE.format(
        names=_VML,
        number=number,
        height=lines * _LINE_HEIGHT + 8,
        left=column,
        right=column + 4,
        top=top,
        bottom=top + max(3, lines),
        row=row - 1,
        column=column - 1,
    )
