"""Stored values of one worksheet part: each formula cell's ``<v>`` and ``t``, and nothing else.

Element names are those of ECMA-376 part 1, 18.3.1 (worksheets); both namespaces, transitional and strict,
are read from the part itself.
"""

from __future__ import annotations

import math
import re
from collections.abc import Iterator, Mapping
from typing import Final

from lxml import etree
from openpyxl.utils.cell import range_boundaries

from xlbridge.headless.archive import StoreError, drop_attributes, parse_part, serialise
from xlbridge.headless.references import address_of, parse_address
from xlbridge.values import ERROR_CODES, CellError, Scalar

MAX_TEXT: Final = 32_767
_TAGS: Final = ("c", "row", "f", "v", "is", "cols", "sheetData")
_TRUE: Final = ("1", "true")
_EXACT_WHOLE: Final = 1e15
#: Calc takes one to four digits for a number where the standard has four
_LITERAL_ESCAPE: Final = re.compile(r"_(?=x[0-9A-Fa-f]{1,4}_)")
_ESCAPE: Final = re.compile("_x([0-9A-Fa-f]{4})_")
_ILLEGAL: Final = re.compile("[\x00-\x08\x0b\x0c\x0d\x0e-\x1f\ud800-\udfff\ufffe\uffff]")


def write_values(part: str, data: bytes, values: Mapping[str, Scalar]) -> bytes:
    """Return the worksheet part with ``values`` (by address such as ``B2``) stored in its formula cells.

    A value may go to a cell with a formula, or to any cell inside the range of an array formula; such a
    cell is created where the file has none. ``None`` removes the stored value.
    """
    tree = parse_part(part, data)
    sheet = _Sheet(tree.getroot())
    for address, value in values.items():
        try:
            sheet.set(address, value)
        except StoreError as error:
            raise StoreError(f"{address}: {error}") from None
    return serialise(tree)


def encode(value: Scalar) -> tuple[str | None, str]:
    """Return the type attribute and the text of ``<v>`` that a spreadsheet program writes for a value."""
    if isinstance(value, bool):
        return "b", "1" if value else "0"
    if isinstance(value, float | int):
        return None, _number(float(value))
    if isinstance(value, str):
        return "str", encode_text(value)
    if isinstance(value, CellError) and value.code in ERROR_CODES:
        return "e", value.code
    raise StoreError(f"{value!r} is no value that a cell can store")


def _number(value: float) -> str:
    if not math.isfinite(value):
        raise StoreError(f"{value!r} is not a finite number")
    whole = value.is_integer() and abs(value) < _EXACT_WHOLE
    return str(int(value)) if whole else float.__repr__(value)


def encode_text(value: str) -> str:
    """Escape what XML cannot hold as ``_xHHHH_`` (ST_Xstring, ECMA-376 part 1, 22.9.2.19)."""
    if len(value) > MAX_TEXT:
        raise StoreError(f"text of {len(value):,} characters; a cell holds at most {MAX_TEXT:,}")
    escaped = _LITERAL_ESCAPE.sub("_x005F_", value)
    return _ILLEGAL.sub(lambda match: f"_x{ord(match[0]):04X}_", escaped)


def decode_text(stored: str) -> str:
    """Return the text that a stored text stands for: ``_xHHHH_`` is the character of that number.

    >>> decode_text("line_x000D_, literally _x005F_x000D_")
    'line\\r, literally _x000D_'
    """
    return _ESCAPE.sub(lambda match: chr(int(match[1], 16)), stored)


class _Sheet:
    """The cells of one parsed worksheet by address, and the ranges of its array formulas."""

    def __init__(self, root: etree._Element) -> None:
        namespace = etree.QName(root).namespace
        self._tag = {name: f"{{{namespace}}}{name}" for name in _TAGS}
        data = root.find(self._tag["sheetData"])
        if data is None:
            raise StoreError("the part is not a worksheet: it has no sheetData")
        self._root, self._data = root, data
        self._rows: dict[int, etree._Element] = {}
        self._cells: dict[str, etree._Element] = {}
        for number, row in self._numbered_rows():
            self._rows[number] = row
            self._cells.update(self._addressed(number, row))
        self._arrays = [
            _bounds(formula.get("ref", ""))
            for formula in data.iter(self._tag["f"])
            if formula.get("t") == "array"
        ]

    def _numbered_rows(self) -> Iterator[tuple[int, etree._Element]]:
        """Rows with their numbers; a row without one follows the row before it."""
        number = 0
        for row in self._data.iterchildren(self._tag["row"]):
            number = int(row.get("r") or number + 1)
            yield number, row

    def _addressed(self, number: int, row: etree._Element) -> Iterator[tuple[str, etree._Element]]:
        """Cells of a row with their addresses; a cell without one follows the cell before it."""
        column, address = 0, ""
        for cell in row.iterchildren(self._tag["c"]):
            given = cell.get("r")
            if not given:
                column = parse_address(address)[1] + 1 if address else 1
            address = given or address_of(number, column)
            yield address, cell

    def set(self, address: str, value: Scalar) -> None:
        """Store one value."""
        kind, text = (None, "") if value is None else encode(value)
        cell = self._cells.get(address)
        children = {} if cell is None else {child.tag: child for child in cell}
        if self._tag["f"] not in children and not self._in_array(address):
            raise StoreError("the cell has no formula; only results are stored, never inputs")
        if cell is None:
            cell = self._create(address)
        drop_attributes(cell, "t", "vm")  # vm is the metadata of the old value
        if kind:
            cell.set("t", kind)
        stored = children.get(self._tag["v"])
        for old in (children.get(self._tag["is"]), stored if value is None else None):
            if old is not None:
                cell.remove(old)
        if value is not None:
            (self._new_value(cell) if stored is None else stored).text = text

    def _new_value(self, cell: etree._Element) -> etree._Element:
        """Create the value where the schema has it: after the formula, before everything else."""
        stored = etree.Element(self._tag["v"])
        cell.insert(1 if len(cell) and cell[0].tag == self._tag["f"] else 0, stored)
        return stored

    def _in_array(self, address: str) -> bool:
        try:
            row, column = parse_address(address)
        except ValueError:
            raise StoreError("not a cell address") from None
        return any(
            top <= row <= bottom and left <= column <= right for left, top, right, bottom in self._arrays
        )

    def _create(self, address: str) -> etree._Element:
        """Insert the cell in column order, formatted as the empty cell was: by its row or its column."""
        number, column = parse_address(address)
        row = self._row(number)
        style = row.get("s") if row.get("customFormat") in _TRUE else self._column_style(column)
        cell = etree.Element(self._tag["c"], {"r": address, **({"s": style} if style else {})})
        before = [old for at, old in self._addressed(number, row) if parse_address(at)[1] < column]
        row.insert(row.index(before[-1]) + 1 if before else 0, cell)
        drop_attributes(row, "spans")
        self._cells[address] = cell
        return cell

    def _row(self, number: int) -> etree._Element:
        if number not in self._rows:
            row = etree.Element(self._tag["row"], {"r": str(number)})
            above = max((at for at in self._rows if at < number), default=None)
            self._data.insert(0 if above is None else self._data.index(self._rows[above]) + 1, row)
            self._rows[number] = row
        return self._rows[number]

    def _column_style(self, column: int) -> str | None:
        for definition in self._root.iterfind(f"{self._tag['cols']}/*"):
            if int(definition.get("min", 0)) <= column <= int(definition.get("max", 0)):
                return definition.get("style")
        return None


def _bounds(reference: str) -> tuple[int, int, int, int]:
    left, top, right, bottom = range_boundaries(reference)
    if None in (left, top, right, bottom):
        raise StoreError(f"array formula with the range {reference}, which is not one of cells")
    return int(left or 0), int(top or 0), int(right or 0), int(bottom or 0)
