"""That an operator did what it says: what it changed, told by reading both files with openpyxl."""

from __future__ import annotations

import io
import zipfile
from functools import lru_cache
from math import isclose
from pathlib import Path
from typing import Any

import openpyxl

from tests.support.faults.planting import Planted
from xlbridge.headless.compute import compute
from xlbridge.values import Scalar

Cells = dict[str, Any]


def assert_as_said(planted: Planted, unspoilt: Path) -> None:
    """What an operator touched has changed, the first of alternatives at least, and nothing else.

    ``unspoilt`` is the same workbook saved in the same way without the fault.
    """
    named = {group[0] for group in planted.places if "!" in group[0]}
    may = {place for group in planted.places for place in group}
    if planted.fault.group == "structure":
        assert _parts(planted.path) != _parts(unspoilt), "the file is what it was"
    elif planted.fault.group == "stale":
        values, stored = compute(planted.path).values, _read(planted.path, True)
        assert named == {f"{s}!{a}" for (s, a), v in values.items() if not _same(stored.get(f"{s}!{a}"), v)}
    else:
        assert named <= _changed(_cells(unspoilt), _read(planted.path, False)) <= may


def _same(stored: object, value: Scalar) -> bool:
    """Whether a stored value is the one that the formula gives, but for round-off."""
    if isinstance(stored, int | float) and isinstance(value, float):
        return isclose(stored, value, rel_tol=1e-9, abs_tol=1e-9)
    return (stored or None) == (value or None)


def _changed(before: Cells, after: Cells) -> set[str]:
    """The cells that differ, of those that held something and those that are new beside them."""
    sheets = {place.partition("!")[0] for place in before}
    places = {p for p in (*before, *after) if p in before or p.partition("!")[0] in sheets}
    beside = {place for place in places if place not in before and place.endswith("ZZ900")}
    return {place for place in places - beside if before.get(place) != after.get(place)}


@lru_cache
def _cells(path: Path) -> Cells:
    return _read(path, False)


def _read(path: Path, values: bool) -> Cells:
    book = openpyxl.load_workbook(path, data_only=values)
    return {
        f"{sheet.title}!{cell.coordinate}": cell.value if values else _content(cell)
        for sheet in book.worksheets
        for row in sheet
        for cell in row
        if cell.value is not None
    }


def _content(cell: Any) -> tuple[bool, Any]:
    """What a cell holds: a formula, or a text that looks like one."""
    return cell.data_type == "f", getattr(cell.value, "text", cell.value)


def _parts(path: Path) -> dict[str, bytes]:
    with zipfile.ZipFile(io.BytesIO(path.read_bytes())) as archive:
        return {name: archive.read(name) for name in archive.namelist() if not name.startswith("docProps")}
