"""Where the workbook and its worksheets stand in a package: as its own relationships say, not by habit."""

from __future__ import annotations

import posixpath
import zipfile
from typing import Final

from lxml import etree

from xlbridge.headless.archive import StoreError, parse_part, read_part

_OFFICE_RELATIONSHIPS: Final = (
    "http://schemas.openxmlformats.org/officeDocument/2006/relationships",
    "http://purl.oclc.org/ooxml/officeDocument/relationships",
)


def office_document(archive: zipfile.ZipFile) -> str:
    """The workbook part, as the package's own relationships name it."""
    for relationship in parse_part("_rels/.rels", read_part(archive, "_rels/.rels")).getroot():
        if relationship.get("Type") in tuple(f"{base}/officeDocument" for base in _OFFICE_RELATIONSHIPS):
            part = resolved(archive, "", relationship.get("Target", ""))
            if part.lower().endswith(".bin"):
                raise StoreError("a binary workbook (.xlsb); save it as .xlsx or .xlsm first")
            return part
    raise StoreError("the package names no workbook")


def sheet_parts(archive: zipfile.ZipFile, workbook_part: str, root: etree._Element) -> dict[str, str]:
    """Sheet titles with the names of their parts."""
    folder, name = posixpath.split(workbook_part)
    rels = posixpath.join(folder, "_rels", f"{name}.rels")
    targets = {item.get("Id"): item for item in parse_part(rels, read_part(archive, rels)).getroot()}
    parts = {}
    for sheet in root.iterfind(f"{{{etree.QName(root).namespace}}}sheets/*"):
        identifier = next((i for base in _OFFICE_RELATIONSHIPS if (i := sheet.get(f"{{{base}}}id"))), None)
        if identifier in targets and targets[identifier].get("Type", "").endswith("/worksheet"):
            parts[sheet.get("name", "")] = resolved(archive, folder, targets[identifier].get("Target", ""))
    return parts


def resolved(archive: zipfile.ZipFile, folder: str, target: str) -> str:
    """A relationship's target, relative or absolute, as the archive spells it (names ignore case)."""
    wanted = posixpath.normpath(posixpath.join(folder, target)).lstrip("/")
    spelled = {name.lower(): name for name in archive.namelist()}
    return spelled.get(wanted.lower(), wanted)
