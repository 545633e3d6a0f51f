"""Workbook packages for tests: written by hand as a spreadsheet program writes them, and taken apart."""

from __future__ import annotations

import zipfile
from pathlib import Path

from lxml import etree

MAIN = "http://schemas.openxmlformats.org/spreadsheetml/2006/main"
STRICT = "http://purl.oclc.org/ooxml/spreadsheetml/main"
OFFICE = "http://schemas.openxmlformats.org/officeDocument/2006/relationships"
STRICT_OFFICE = "http://purl.oclc.org/ooxml/officeDocument/relationships"
PACKAGE_RELS = "http://schemas.openxmlformats.org/package/2006/relationships"
_HEAD = '<?xml version="1.0" encoding="UTF-8" standalone="yes"?>\r\n'

SHEET = f"""{_HEAD}<worksheet xmlns="{MAIN}" xmlns:r="{OFFICE}" \
xmlns:mc="http://schemas.openxmlformats.org/markup-compatibility/2006" mc:Ignorable="x14ac xr" \
xmlns:x14ac="http://schemas.microsoft.com/office/spreadsheetml/2009/9/ac" \
xmlns:xr="http://schemas.microsoft.com/office/spreadsheetml/2014/revision" \
xr:uid="{{00000000-0001-0000-0000-000000000000}}"><dimension ref="A1:D5"/>\
<cols><col min="6" max="6" width="12" style="2"/></cols><sheetData>\
<row r="1" spans="1:4" x14ac:dyDescent="0.25"><c r="A1" t="s"><v>0</v></c><c r="B1"><v>1.5</v></c>\
<c r="C1" s="1"><f>B1*2</f><v>3</v></c><c r="D1" t="s"><f>A1&amp;"x"</f><v>1</v></c></row>\
<row r="2" spans="1:4" x14ac:dyDescent="0.25">\
<c r="A2"><f t="shared" ref="A2:A3" si="0">B1+1</f><v>2.5</v></c>\
<c r="B2" t="inlineStr"><f>"a"</f><is><t xml:space="preserve"> a</t></is></c>\
<c r="C2" t="str"><f>"old"</f><v>old</v></c><c r="D2" t="e" vm="1"><f>1/0</f><v>#DIV/0!</v></c></row>\
<row r="3" spans="1:4" x14ac:dyDescent="0.25"><c r="A3"><f t="shared" si="0"/><v>1</v></c>\
<c r="B3"><f>C1</f></c></row>\
<row r="4" spans="1:4" s="1" customFormat="1" x14ac:dyDescent="0.25">\
<c r="A4" cm="1"><f t="array" ref="A4:B6">B1:C1*{{1;2;3}}</f><v>1</v></c></row>\
</sheetData><pageMargins left="0.7" right="0.7" top="0.75" bottom="0.75" header="0.3" footer="0.3"/>\
<extLst><ext uri="{{78C0D931-6437-407d-A8EE-F0AAD7539E65}}" \
xmlns:x14="http://schemas.microsoft.com/office/spreadsheetml/2009/9/main"><x14:conditionalFormattings>\
<!-- kept --></x14:conditionalFormattings></ext></extLst></worksheet>"""

WORKBOOK = f"""{_HEAD}<workbook xmlns="{MAIN}" xmlns:r="{OFFICE}"><workbookPr defaultThemeVersion="166925"/>\
<bookViews><workbookView/></bookViews>\
<sheets><sheet name="Story &amp; table" sheetId="1" r:id="rId1"/></sheets>\
<definedNames><definedName name="k">'Story &amp; table'!$B$1</definedName></definedNames>\
<calcPr calcId="162913" iterate="1" iterateCount="50" fullCalcOnLoad="1" calcCompleted="0"/>\
<extLst/></workbook>"""


def relationships(*rows: tuple[str, str, str], office: str = OFFICE) -> str:
    """A relationship part: identifier, last word of the type, target."""
    items = "".join(f'<Relationship Id="{i}" Type="{office}/{kind}" Target="{to}"/>' for i, kind, to in rows)
    return f'{_HEAD}<Relationships xmlns="{PACKAGE_RELS}">{items}</Relationships>'


def hand_made(path: Path, **replaced: str) -> Path:
    """Write a small package; ``replaced`` exchanges the parts called sheet, workbook, rels, root_rels."""
    parts = {
        "root_rels": ("_rels/.rels", relationships(("rId1", "officeDocument", "xl/workbook.xml"))),
        "workbook": ("xl/workbook.xml", WORKBOOK),
        "rels": (
            "xl/_rels/workbook.xml.rels",
            relationships(
                ("rId1", "worksheet", "/xl/worksheets/sheet1.xml"),
                ("rId2", "styles", "styles.xml"),
                ("rId3", "sharedStrings", "sharedStrings.xml"),
            ),
        ),
        "sheet": ("xl/worksheets/sheet1.xml", SHEET),
        "strings": (
            "xl/sharedStrings.xml",
            f'{_HEAD}<sst xmlns="{MAIN}" count="2"><si><t>Level</t></si><si><t>x</t></si></sst>',
        ),
        "styles": ("xl/styles.xml", _STYLES),
        "types": ("[Content_Types].xml", _TYPES),
    }
    with zipfile.ZipFile(path, "w", zipfile.ZIP_DEFLATED) as archive:
        for key, (name, text) in parts.items():
            info = zipfile.ZipInfo(name, date_time=(2001, 2, 3, 4, 5, 6))
            info.compress_type = zipfile.ZIP_STORED if key == "strings" else zipfile.ZIP_DEFLATED
            archive.writestr(info, replaced.get(key, text))
        archive.writestr("xl/media/image1.png", bytes(range(256)))
    return path


def parts_of(path: Path) -> dict[str, bytes]:
    """Every part's bytes, in the order of the package."""
    with zipfile.ZipFile(path) as archive:
        assert archive.testzip() is None
        return {info.filename: archive.read(info) for info in archive.infolist()}


def entries_of(path: Path) -> list[tuple[object, ...]]:
    """What a package's directory says of each part but its sizes and place."""
    with zipfile.ZipFile(path) as archive:
        return [
            (i.filename, i.date_time, i.compress_type, i.external_attr, i.create_system, i.comment)
            for i in archive.infolist()
        ]


def without_values(part: bytes) -> bytes:
    """A worksheet part in canonical form without its cells' types and stored values."""
    root = etree.fromstring(part)
    namespace = f"{{{etree.QName(root).namespace}}}"
    for cell in root.iter(f"{namespace}c"):
        if cell.find(f"{namespace}f") is None:
            continue
        for attribute in {"t", "vm"} & set(cell.attrib):
            del cell.attrib[attribute]
        for tag in ("v", "is"):
            for old in cell.findall(f"{namespace}{tag}"):
                cell.remove(old)
    return etree.tostring(root, method="c14n2")


_STYLES = (
    f'{_HEAD}<styleSheet xmlns="{MAIN}"><fonts count="1"><font><sz val="11"/></font></fonts>'
    '<fills count="2"><fill><patternFill patternType="none"/></fill>'
    '<fill><patternFill patternType="gray125"/></fill></fills>'
    '<borders count="1"><border/></borders><cellStyleXfs count="1"><xf/></cellStyleXfs>'
    '<cellXfs count="3"><xf/><xf numFmtId="2" applyNumberFormat="1"/><xf numFmtId="4" applyNumberFormat="1"/>'
    "</cellXfs></styleSheet>"
)
_TYPES = (
    f'{_HEAD}<Types xmlns="http://schemas.openxmlformats.org/package/2006/content-types">'
    '<Default Extension="rels" ContentType="application/vnd.openxmlformats-package.relationships+xml"/>'
    '<Default Extension="xml" ContentType="application/xml"/>'
    '<Default Extension="png" ContentType="image/png"/>'
    + "".join(
        f'<Override PartName="/xl/{name}.xml" '
        f'ContentType="application/vnd.openxmlformats-officedocument.spreadsheetml.{kind}+xml"/>'
        for name, kind in (
            ("workbook", "sheet.main"),
            ("worksheets/sheet1", "worksheet"),
            ("sharedStrings", "sharedStrings"),
            ("styles", "styles"),
        )
    )
    + "</Types>"
)
