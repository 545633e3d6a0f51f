"""The values a workbook file stores beside its formulas, from one pass over the sheets' XML."""

from __future__ import annotations

import io
import posixpath
import re
import zipfile
from collections.abc import Iterator
from typing import Final, TypeAlias

from lxml import etree

from xlbridge.headless.references import parse_address
from xlbridge.values import CellError, Scalar

Stored: TypeAlias = dict[tuple[int, int], Scalar]

_RELATION: Final = "{*}Relationship"
_EXTENT: Final = re.compile(rb"""<(?:\w+:)?dimension\s(?:[^<>]*?\s)?ref\s*=\s*["']([^"'<>]*)""")
#: the extent stands before the rows
_HEAD: Final = 2**16
_BOOK: Final = "xl/workbook.xml"


def read_stored_values(data: bytes) -> dict[str, Stored]:
    """For each sheet by name, the stored values of all its cells but those with shared text.

    Shared text is never the value of a formula.
    """
    with zipfile.ZipFile(io.BytesIO(data)) as archive:
        return {sheet: _values(archive, part) for sheet, part in _sheet_parts(archive)}


def read_extents(data: bytes) -> dict[str, str]:
    """For each sheet by name, the range that the file says it uses, where it says so; nothing checks it."""
    with zipfile.ZipFile(io.BytesIO(data)) as archive:
        heads = {sheet: archive.open(part).read(_HEAD) for sheet, part in _sheet_parts(archive)}
    found = {sheet: _EXTENT.search(head) for sheet, head in heads.items()}
    return {sheet: match[1].decode("utf-8", "replace") for sheet, match in found.items() if match}


def _sheet_parts(archive: zipfile.ZipFile) -> Iterator[tuple[str, str]]:
    book = _book_part(archive)
    folder, name = posixpath.split(book)
    targets = _relations(archive, posixpath.join(folder, "_rels", f"{name}.rels"))
    for sheet in etree.fromstring(archive.read(book), _parser()).iterfind(".//{*}sheets/{*}sheet"):
        key = next((value for key, value in sheet.attrib.items() if str(key).endswith("}id")), "")
        target, kind = targets.get(str(key), ("", ""))
        part = target[1:] if target.startswith("/") else posixpath.normpath(posixpath.join(folder, target))
        if kind.endswith("/worksheet"):
            yield str(sheet.get("name")), part


def _book_part(archive: zipfile.ZipFile) -> str:
    for target, kind in _relations(archive, "_rels/.rels").values():
        if kind.endswith("/officeDocument"):
            return target.lstrip("/")
    return _BOOK


def _relations(archive: zipfile.ZipFile, part: str) -> dict[str, tuple[str, str]]:
    """Target and kind of each relation of a part, by its id."""
    root = etree.fromstring(archive.read(part), _parser())
    return {str(r.get("Id")): (str(r.get("Target")), str(r.get("Type"))) for r in root.iterfind(_RELATION)}


def _values(archive: zipfile.ZipFile, part: str) -> Stored:
    values: Stored = {}
    with archive.open(part) as source:
        rows = etree.iterparse(source, tag="{*}row", resolve_entities=False, no_network=True)
        for _, row in rows:
            for cell in row.iterchildren("{*}c"):
                address, kind = cell.get("r"), cell.get("t", "n")
                text = cell.findtext("{*}v")
                if address and text and kind != "s":
                    values[parse_address(str(address))] = _value(str(kind), text)
            row.clear()
    return values


def _value(kind: str, text: str) -> Scalar:
    if kind == "n":
        return float(text)
    if kind == "b":
        return text.strip() == "1"
    return CellError(text) if kind == "e" else text


def _parser() -> etree.XMLParser:
    return etree.XMLParser(resolve_entities=False, no_network=True)
