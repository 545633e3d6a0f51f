"""Write stored values into a workbook without touching anything else in the file."""

from __future__ import annotations

import zipfile
from collections import defaultdict
from collections.abc import Mapping
from pathlib import Path
from typing import Final

from lxml import etree

from xlbridge.headless.archive import (
    StoreError,
    check_target,
    drop_attributes,
    open_archive,
    parse_part,
    read_part,
    rewrite,
    serialise,
)
from xlbridge.headless.parts import office_document, sheet_parts
from xlbridge.headless.stored_cells import write_values
from xlbridge.values import Scalar

__all__ = ["StoreError", "store"]

#: The calculation engine of today's spreadsheet programs: a lower number means "recalculate on opening".
CALCULATION_ID: Final = 191029
#: The children of a workbook part that stand before ``calcPr`` (ECMA-376 part 1, 18.2.27).
_BEFORE_CALC_PR: Final = ("definedNames", "externalReferences", "functionGroups", "sheets")


def store(
    source: Path, target: Path, values: Mapping[tuple[str, str], Scalar], *, force: bool = False
) -> int:
    """Copy a workbook with ``values`` stored in its formula cells; return how many were stored.

    Parameters: ``source`` and ``target``, two different ``.xlsx`` or ``.xlsm`` files; ``values`` by sheet
    title and address (``("Stories", "F7")``), ``None`` to remove a stored value; ``force`` to replace an
    existing target.

    The source never changes. In the copy, formulas, formats, charts and all other parts are what they were;
    a cell inside an array formula's range is created where the file has none. The copy is marked as
    calculated, so that a spreadsheet program without the worksheet functions shows the stored numbers.

    Raises: StoreError with one sentence naming the file, and the cell if one is at fault.
    """
    check_target(source, target, force=force)
    by_sheet: dict[str, dict[str, Scalar]] = defaultdict(dict)
    for (sheet, address), value in values.items():
        by_sheet[sheet][address] = value
    with open_archive(source) as archive:
        try:
            changed = _changed_parts(archive, by_sheet)
        except StoreError as error:
            raise StoreError(f"{source}: {error}") from None
    rewrite(source, target, changed, force=force)
    return len(values)


def _changed_parts(
    archive: zipfile.ZipFile, by_sheet: Mapping[str, Mapping[str, Scalar]]
) -> dict[str, bytes]:
    workbook_part = office_document(archive)
    workbook = parse_part(workbook_part, read_part(archive, workbook_part))
    parts = sheet_parts(archive, workbook_part, workbook.getroot())
    changed = {}
    for title, values in by_sheet.items():
        if title not in parts:
            raise StoreError(f"there is no worksheet called {title!r}")
        try:
            changed[parts[title]] = write_values(parts[title], read_part(archive, parts[title]), values)
        except StoreError as error:
            raise StoreError(f"{title}!{error}") from None
    if _mark_calculated(workbook.getroot()):
        changed[workbook_part] = serialise(workbook)
    return changed


def _mark_calculated(root: etree._Element) -> bool:
    """Set the workbook's calculation properties so that opening it keeps the stored values."""
    namespace = f"{{{etree.QName(root).namespace}}}"
    properties = root.find(f"{namespace}calcPr")
    if properties is None:
        before = next(e for tag in _BEFORE_CALC_PR if (e := root.find(f"{namespace}{tag}")) is not None)
        properties = etree.Element(f"{namespace}calcPr")
        root.insert(root.index(before) + 1, properties)
    old = properties.items()
    drop_attributes(properties, "fullCalcOnLoad", "calcCompleted")
    if int(properties.get("calcId", "0")) < CALCULATION_ID:
        properties.set("calcId", str(CALCULATION_ID))
    return properties.items() != old
