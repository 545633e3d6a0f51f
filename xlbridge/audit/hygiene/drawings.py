"""Charts, pictures and shapes that lie over filled cells, by the cells that the file fixes them to."""

from __future__ import annotations

import io
import posixpath
import zipfile
from collections.abc import Iterator
from typing import Final

from lxml import etree

from xlbridge.audit.finding import Observation, Place
from xlbridge.audit.subject import Subject
from xlbridge.headless.archive import parse_part, read_part
from xlbridge.headless.parts import office_document, resolved, sheet_parts
from xlbridge.headless.references import Bounds, address_of

#: a standard row of 15 points and a standard column of 64 pixels, in the unit of drawings
_PER_ROW, _PER_COLUMN = 15 * 12_700, 64 * 9_525
_DRAWING: Final = "/drawing"


def check(subject: Subject) -> Iterator[Observation]:
    """Yield every drawing under which filled cells lie."""
    if not subject.book.data:
        return
    with zipfile.ZipFile(io.BytesIO(subject.book.data)) as archive:
        for sheet, part in _drawings(archive):
            if sheet in subject.book.formulas:
                filled = {*subject.book.constants[sheet], *subject.book.formulas[sheet]}
                yield from _over(sheet, filled, parse_part(part, read_part(archive, part)).getroot())


def _drawings(archive: zipfile.ZipFile) -> Iterator[tuple[str, str]]:
    """The parts with the drawings of each sheet."""
    if not any(name.startswith("xl/drawings/") for name in archive.namelist()):
        return
    book = office_document(archive)
    for sheet, part in sheet_parts(
        archive, book, parse_part(book, read_part(archive, book)).getroot()
    ).items():
        folder, name = posixpath.split(part)
        rels = posixpath.join(folder, "_rels", f"{name}.rels")
        if rels in archive.NameToInfo:
            for item in parse_part(rels, read_part(archive, rels)).getroot():
                if item.get("Type", "").endswith(_DRAWING):
                    yield sheet, resolved(archive, folder, item.get("Target", ""))


def _over(sheet: str, filled: set[tuple[int, int]], root: etree._Element) -> Iterator[Observation]:
    for anchor in root:
        area = _area(anchor)
        covered = sorted(cell for cell in filled if area and area.contains(*cell))
        if area and covered:
            words = f"a drawing lies over {len(covered)} filled cells, {address_of(*covered[0])} the first"
            yield Observation("drawing_over_cells", Place(sheet, str(area)), words)


def _area(anchor: etree._Element) -> Bounds | None:
    """The cells that lie wholly under a drawing: from its first cell to before its last, or by its size."""
    start = _corner(anchor, "from")
    if start is None:
        return None
    end = _corner(anchor, "to")
    size = anchor.find("{*}ext")
    if end is None and size is not None:
        rows, columns = int(size.get("cy", 0)) // _PER_ROW, int(size.get("cx", 0)) // _PER_COLUMN
        end = start[0] + rows, start[1] + columns
    return (
        Bounds(start[0] + 1, start[1] + 1, max(end[0], start[0] + 1), max(end[1], start[1] + 1))
        if end
        else None
    )


def _corner(anchor: etree._Element, which: str) -> tuple[int, int] | None:
    """Row and column, from 0, of a corner."""
    found = anchor.find(f"{{*}}{which}")
    if found is None:
        return None
    return int(found.findtext("{*}row", "0")), int(found.findtext("{*}col", "0"))
