"""A workbook's package with parts changed and added: every part that nobody touched keeps its bytes."""

from __future__ import annotations

import io
import posixpath
from collections.abc import Iterator
from typing import Final

from lxml import etree

from xlbridge.headless.archive import copy_archive, open_archive, parse_part, read_part, serialise
from xlbridge.headless.parts import office_document, resolved, sheet_parts

RELATIONSHIPS: Final = "http://schemas.openxmlformats.org/package/2006/relationships"
CONTENT_TYPES: Final = "http://schemas.openxmlformats.org/package/2006/content-types"
_TYPES_PART: Final = "[Content_Types].xml"


class Package:
    """The parts of a workbook file, read from its bytes."""

    def __init__(self, data: bytes) -> None:
        self._archive = open_archive(io.BytesIO(data))
        self._trees: dict[str, etree._ElementTree] = {}
        self._added: dict[str, bytes] = {}
        self.workbook_part = office_document(self._archive)

    def __contains__(self, name: str) -> bool:
        return name in self._archive.NameToInfo or name in self._trees or name in self._added

    def read(self, name: str) -> bytes:
        """The bytes of a part as they would be written now."""
        if name in self._trees:
            return serialise(self._trees[name])
        return self._added[name] if name in self._added else read_part(self._archive, name)

    def look(self, name: str) -> etree._Element:
        """The root of a part, to be read only."""
        if name in self._trees:
            return self._trees[name].getroot()
        return parse_part(name, self.read(name)).getroot()

    def edit(self, name: str, new: str = "") -> etree._Element:
        """The root of a part that is going to be changed; ``new`` is its text where there is none."""
        if name not in self._trees:
            data = self.read(name) if name in self else new.encode()
            self._trees[name] = parse_part(name, data)
        return self._trees[name].getroot()

    def write(self, name: str, data: bytes) -> None:
        """Put a part's bytes."""
        self._added[name] = data

    def fresh(self, pattern: str) -> str:
        """The first name of a pattern (``xl/comments{}.xml``) that no part has, whatever its case."""
        taken = {name.casefold() for name in (*self._archive.namelist(), *self._trees, *self._added)}
        number = next(n for n in range(1, len(taken) + 2) if pattern.format(n).casefold() not in taken)
        return pattern.format(number)

    @property
    def sheets(self) -> dict[str, str]:
        """The titles of the worksheets with their parts."""
        return sheet_parts(self._archive, self.workbook_part, self.look(self.workbook_part))

    @property
    def office(self) -> str:
        """How the types of relationships begin in this workbook: the transitional or the strict way."""
        rels = self.look(rels_of(self.workbook_part))
        types = (item.get("Type", "") for item in rels)
        return next(text.rpartition("/")[0] for text in types if text.endswith("/worksheet"))

    def related(self, part: str, kind: str) -> Iterator[str]:
        """The parts that a part is related to by a kind, the last word of the type."""
        if rels_of(part) in self:
            for item in self.look(rels_of(part)):
                if item.get("Type", "").endswith(f"/{kind}") and item.get("TargetMode") != "External":
                    yield resolved(self._archive, posixpath.dirname(part), item.get("Target", ""))

    def relation(self, part: str, identifier: str) -> str | None:
        """The part that a relationship of a part leads to."""
        rels = self.look(rels_of(part)) if rels_of(part) in self else ()
        targets = (item.get("Target", "") for item in rels if item.get("Id") == identifier)
        return next((resolved(self._archive, posixpath.dirname(part), target) for target in targets), None)

    def relate(self, part: str, kind: str, target: str) -> str:
        """Relate a part to another; return the identifier."""
        rels = self.edit(rels_of(part), f'<Relationships xmlns="{RELATIONSHIPS}"/>')
        taken = {item.get("Id") for item in rels}
        identifier = next(name for n in range(1, len(taken) + 2) if (name := f"rId{n}") not in taken)
        given = {"Id": identifier, "Type": f"{self.office}/{kind}", "Target": f"/{target}"}
        etree.SubElement(rels, f"{{{RELATIONSHIPS}}}Relationship", given)
        return identifier

    def declare(self, part: str, content_type: str) -> None:
        """Say what a new part holds."""
        given = {"PartName": f"/{part}", "ContentType": content_type}
        etree.SubElement(self.edit(_TYPES_PART), f"{{{CONTENT_TYPES}}}Override", given)

    def to_bytes(self) -> bytes:
        """The file."""
        stream = io.BytesIO()
        changed = {**self._added, **{name: serialise(tree) for name, tree in self._trees.items()}}
        copy_archive(self._archive, stream, changed)
        return stream.getvalue()


def rels_of(part: str) -> str:
    """The name of a part's relationships."""
    folder, name = posixpath.split(part)
    return posixpath.join(folder, "_rels", f"{name}.rels")


def insert_before(parent: etree._Element, child: etree._Element, later: tuple[str, ...]) -> None:
    """Insert a child before the first of those that the schema has after it, else at the end."""
    names = [etree.QName(old).localname if isinstance(old.tag, str) else "" for old in parent]
    parent.insert(next((n for n, name in enumerate(names) if name in later), len(parent)), child)


def child(parent: etree._Element, name: str, later: tuple[str, ...] = ()) -> etree._Element:
    """The child of a name; made, before those that the schema has after it, where there is none."""
    tag = f"{{{etree.QName(parent).namespace}}}{name}"
    found = parent.find(tag)
    if found is None:
        found = etree.Element(tag)
        insert_before(parent, found, later)
    return found
