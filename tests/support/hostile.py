"""Files that must not be opened, each made from one good workbook, with a word of the refusal."""

from __future__ import annotations

import io
import re
import struct
import zipfile
from collections.abc import Callable, Mapping
from dataclasses import dataclass
from pathlib import Path
from typing import Final

from openpyxl import Workbook

SHEET, BOOK, STRINGS = "xl/worksheets/sheet1.xml", "xl/workbook.xml", "xl/sharedStrings.xml"
Parts = dict[str, bytes]


def good() -> Parts:
    """The parts of a small workbook that opens."""
    book, stream = Workbook(), io.BytesIO()
    book.active.append(["Roof", 1.5, "=B1*2"])
    book.save(stream)
    with zipfile.ZipFile(stream) as archive:
        return {name: archive.read(name) for name in archive.namelist()}


def packed(parts: Mapping[str, bytes], compress: int = zipfile.ZIP_DEFLATED) -> bytes:
    stream = io.BytesIO()
    with zipfile.ZipFile(stream, "w", compress) as archive:
        for name, data in parts.items():
            archive.writestr(name, data)
    return stream.getvalue()


def changed(name: str, change: Callable[[bytes], bytes]) -> bytes:
    parts = good()
    parts[name] = change(parts[name])
    return packed(parts)


def added(name: str, data: bytes = b"<x/>") -> bytes:
    return packed({**good(), name: data})


def in_sheet(rows: bytes) -> bytes:
    return changed(SHEET, lambda part: part.replace(b"</sheetData>", rows + b"</sheetData>"))


def after_data(text: bytes) -> bytes:
    return changed(SHEET, lambda part: part.replace(b"</sheetData>", b"</sheetData>" + text))


def twice(first: str, second: str) -> bytes:
    """Two parts of one name: a reader may take either."""
    stream = io.BytesIO()
    with zipfile.ZipFile(stream, "w") as archive:
        for name, data in good().items():
            archive.writestr(name, data)
        archive.writestr("xl/long_name_a.xml", b"<x/>")
        archive.writestr("xl/long_name_b.xml", b"<y/>")
    return (
        stream.getvalue()
        .replace(b"xl/long_name_a.xml", first.encode())
        .replace(b"xl/long_name_b.xml", second.encode())
    )


def bits(offset: int, value: int) -> bytes:
    """A field of every entry of the directory and of the entries themselves set to a value."""
    data = bytearray(packed(good()))
    for mark, shift in ((b"PK\x01\x02", offset + 2), (b"PK\x03\x04", offset)):
        at = data.find(mark)
        while at >= 0:
            struct.pack_into("<H", data, at + shift, value)
            at = data.find(mark, at + 4)
    return bytes(data)


def link() -> bytes:
    stream = io.BytesIO()
    with zipfile.ZipFile(stream, "w") as archive:
        for name, data in good().items():
            archive.writestr(name, data)
        entry = zipfile.ZipInfo("xl/media/image1.png")
        entry.external_attr = 0o120777 << 16
        archive.writestr(entry, "/etc/hostname")
    return stream.getvalue()


def overlapping() -> bytes:
    """Two entries of the directory that are the same bytes of the file."""
    data = bytearray(packed(good()))
    places = [n for n in range(len(data)) if data.startswith(b"PK\x01\x02", n)]
    (first,) = struct.unpack_from("<I", data, places[0] + 42)
    struct.pack_into("<I", data, places[1] + 42, first)
    return bytes(data)


def understated() -> bytes:
    """A part that says it is smaller than it is."""
    data = bytearray(added("xl/extra.xml", b"<x>" + b" " * 5_000_000 + b"</x>"))
    at = data.rfind(b"PK\x01\x02")
    struct.pack_into("<I", data, at + 24, 10)
    return bytes(data)


def damaged() -> bytes:
    data = bytearray(packed(good(), zipfile.ZIP_STORED))
    at = data.find(b"<worksheet")
    data[at : at + 10] = b"xworksheex"
    return bytes(data)


def encoded(encoding: str) -> bytes:
    """A sheet in another encoding, which says so."""
    head = f'<?xml version="1.0" encoding="{encoding}"?>'.encode("ascii" if encoding == "utf-7" else encoding)
    return changed(SHEET, lambda part: head + part.decode().split("?>", 1)[-1].encode(encoding))


def sheet_called(name: str, change: Callable[[bytes], bytes]) -> bytes:
    """A sheet in a part whose name does not say that it is XML."""
    parts = good()
    parts[f"xl/{name}"] = change(parts.pop(SHEET))
    for part in ("xl/_rels/workbook.xml.rels", "[Content_Types].xml"):
        parts[part] = parts[part].replace(b"worksheets/sheet1.xml", name.encode())
    return packed(parts)


def without(name: str) -> bytes:
    return packed({part: data for part, data in good().items() if part != name})


def merged(reference: bytes) -> bytes:
    return after_data(b"<mergeCells><mergeCell %s/></mergeCells>" % reference)


@dataclass(frozen=True)
class Hostile:
    """One file: how it is made, and words of what is said of it."""

    make: Callable[[], bytes]
    words: str


ENTITY = b'<!DOCTYPE x [<!ENTITY a "%s">]>' % (b"lol" * 100)
HEAD = b'<?xml version="1.0" encoding="UTF-8"?>'


def numbered(count: int, text: bytes) -> bytes:
    """A text that often, each with its own number: it packs no better than honest content."""
    return b"".join(text % (7919 * n % 999_983) for n in range(count))


NAMES = numbered(30_000, b'<definedName name="a">%d</definedName>')
FORMATS = numbered(200_000, b'<xf numFmtId="%d"/>')
MERGE: Final = b'<mergeCells><mergeCell ref="A1:XFD1048576"/></mergeCells>'
HOSTILE: Final[Mapping[str, Hostile]] = {
    "no byte at all": Hostile(lambda: b"", "empty"),
    "a text": Hostile(lambda: b"level,weight\nRoof,400\n", "not a workbook"),
    "cut off": Hostile(lambda: packed(good())[:1500], "not a workbook"),
    "an old .xls": Hostile(lambda: bytes.fromhex("d0cf11e0a1b11ae1") + bytes(2000), "old .xls"),
    "encrypted": Hostile(
        lambda: bytes.fromhex("d0cf11e0a1b11ae1") + "EncryptedPackage".encode("utf-16-le"), "encrypted"
    ),
    "a binary .xlsb": Hostile(lambda: added("xl/workbook.bin"), ".xlsb"),
    "OpenDocument": Hostile(lambda: packed({"content.xml": b"<x/>", "mimetype": b"ods"}), "OpenDocument"),
    "another archive": Hostile(lambda: packed({"readme.txt": b"hello"}), "not a workbook"),
    "entities in a sheet": Hostile(lambda: changed(SHEET, lambda p: ENTITY + p), "document type"),
    "entities in the workbook": Hostile(lambda: changed(BOOK, lambda p: ENTITY + p), "document type"),
    "entities in relations": Hostile(
        lambda: changed("xl/_rels/workbook.xml.rels", lambda p: ENTITY + p), "document type"
    ),
    "an external entity": Hostile(
        lambda: changed(SHEET, lambda p: b'<!DOCTYPE x SYSTEM "file:///etc/passwd">' + p), "document type"
    ),
    "a part in UTF-16": Hostile(lambda: changed(SHEET, lambda p: p.decode().encode("utf-16")), "UTF-16"),
    "a part in UTF-32": Hostile(lambda: encoded("utf-32-be"), "UTF-16 or is no XML"),
    "a part in UTF-7": Hostile(lambda: encoded("utf-7"), "written in utf-7"),
    "a part in EBCDIC": Hostile(lambda: encoded("cp037"), "is no XML"),
    "entities in a sheet of another ending": Hostile(
        lambda: sheet_called("sheet.dat", lambda p: ENTITY + p), "document type"
    ),
    "one name twice": Hostile(lambda: twice("xl/long_name_c.xml", "xl/long_name_c.xml"), "same name"),
    "one name in two cases": Hostile(lambda: twice("xl/long_name_C.xml", "xl/long_name_c.xml"), "same name"),
    "an absolute name": Hostile(lambda: added("/etc/cron.d/x"), "outside"),
    "a name that climbs": Hostile(lambda: added("../../x.xml"), "outside"),
    "a name that climbs backwards": Hostile(lambda: added("xl\\..\\..\\x.xml"), "outside"),
    "a name with a drive": Hostile(lambda: added("C:x.xml"), "outside"),
    "a link to a file": Hostile(link, "link"),
    "parts that overlap": Hostile(overlapping, "package"),
    "encrypted parts": Hostile(lambda: bits(6, 1), "encrypted"),
    "packed in an unknown way": Hostile(lambda: bits(8, 12), "packed in a way"),
    "3,000 parts": Hostile(
        lambda: packed({**good(), **{f"xl/media/{n}.png": b"" for n in range(3000)}}), "parts, more than"
    ),
    "100 MB of spaces": Hostile(
        lambda: changed(SHEET, lambda p: p.replace(b"<sheetData>", b" " * 100_000_000 + b"<sheetData>")),
        "times its size",
    ),
    "300 MB of media": Hostile(
        lambda: packed({**good(), **{f"xl/media/{n}.bin": bytes(100_000_000) for n in range(3)}}),
        "unpacks to more than",
    ),
    "a part of 130 MB": Hostile(lambda: added("xl/media/a.bin", bytes(135_000_000)), "larger than"),
    "a size that lies": Hostile(understated, "package"),
    "damaged": Hostile(damaged, "damaged"),
    "a million cells without addresses": Hostile(
        lambda: in_sheet(numbered(1_000_050, b"<c><v>%d</v></c>")), "cells and rows"
    ),
    "a million empty rows": Hostile(
        lambda: in_sheet(b"".join(b'<row r="%d"/>' % n for n in range(2, 1_000_050))), "cells and rows"
    ),
    "a merge over the whole sheet": Hostile(lambda: merged(b'ref="A1:XFD1048576"'), "merges"),
    "a merge over 1,000 by 1,000": Hostile(lambda: merged(b'ref="A1:ALL1000"'), "merges"),
    "a merge in apostrophes": Hostile(lambda: merged(b"ref = 'A1:XFD1048576'"), "merges"),
    "a merge in small letters": Hostile(lambda: merged(b'ref="$a$1:$xfd$1048576"'), "merges"),
    "a merge in character references": Hostile(lambda: merged(b'ref="&#65;1:XFD1048576"'), "no range"),
    "a merge in a sheet of another ending": Hostile(
        lambda: sheet_called("s.dat", lambda p: p.replace(b"</sheetData>", b"</sheetData>" + MERGE)), "merges"
    ),
    "a cell beyond the last row": Hostile(
        lambda: in_sheet(b'<row r="99999999999"><c r="A99999999999"><v>1</v></c></row>'), "damaged"
    ),
    "a cell beyond the last column": Hostile(
        lambda: in_sheet(b'<row r="2"><c r="XFE2"><v>1</v></c></row>'), "damaged"
    ),
    "300,000 tags that never end": Hostile(lambda: in_sheet(b"<t " * 300_000), "damaged"),
    "a text of 50,000 characters": Hostile(
        lambda: in_sheet(
            b'<row r="2"><c r="A2" t="inlineStr"><is><t>' + b"x" * 50_000 + b"</t></is></c></row>"
        ),
        "text longer",
    ),
    "a formula of 9,000 characters": Hostile(
        lambda: in_sheet(b'<row r="2"><c r="A2"><f>' + b"1+" * 4500 + b"1</f></c></row>"), "formula longer"
    ),
    "30,000 names": Hostile(
        lambda: changed(BOOK, lambda p: p.replace(b"<definedNames", NAMES + b"<definedNames")),
        "defined names",
    ),
    "200,000 formats": Hostile(
        lambda: changed("xl/styles.xml", lambda p: p.replace(b"</cellXfs>", FORMATS + b"</cellXfs>")),
        "cell formats",
    ),
    "a target outside the package": Hostile(
        lambda: changed(
            "xl/_rels/workbook.xml.rels",
            lambda p: p.replace(b"/xl/worksheets/sheet1.xml", b"../../../etc/passwd"),
        ),
        "outside the package",
    ),
    "a sheet that is not there": Hostile(lambda: without(SHEET), "has no part"),
    "a sheet that nothing relates to": Hostile(
        lambda: changed(BOOK, lambda p: p.replace(b"rId1", b"rId77")), "damaged"
    ),
    "no sheet at all": Hostile(
        lambda: changed(BOOK, lambda p: re.sub(rb"<sheets>.*</sheets>", b"<sheets/>", p)), "no sheet"
    ),
    "no relations": Hostile(lambda: without("_rels/.rels"), "not a workbook"),
    "no list of content": Hostile(lambda: without("[Content_Types].xml"), "not a workbook"),
    "the content of another program": Hostile(
        lambda: changed("[Content_Types].xml", lambda p: p.replace(b"sheet.main+xml", b"document.main+xml")),
        "no valid workbook",
    ),
    "a picture with a workbook behind it": Hostile(lambda: b"\x89PNG" + packed(good()), "not a workbook"),
}


def write(folder: Path, name: str) -> Path:
    """Write one of them and return its path."""
    path = folder / f"{name.replace(' ', '_').replace(',', '')}.xlsx"
    path.write_bytes(HOSTILE[name].make())
    return path
