"""A reference as a formula writes it, ``'My sheet'!$A1:B2``, and the node it stands for."""

from __future__ import annotations

import re
from functools import lru_cache
from typing import Final

from xlbridge.headless.nodes import Name, Reference
from xlbridge.headless.operands import NotEvaluated
from xlbridge.headless.references import MAX_COLUMNS, MAX_ROWS, Bounds, column_number

_CORNER: Final = re.compile(r"\$?([A-Za-z]*)\$?([0-9]*)\Z")


@lru_cache(maxsize=100_000)
def read_reference(text: str) -> Reference | Name:
    """The node of a reference; beyond the last column a text such as ``XYZ1`` is a name."""
    sheet, local = split_sheet(text)
    first, mark, last = local.partition(":")
    left, top = _corner(first)
    right, bottom = _corner(last) if mark else (left, top)
    if left > MAX_COLUMNS and not mark:
        return Name(sheet, local)
    if max(left, right) > MAX_COLUMNS or max(top, bottom) > MAX_ROWS:
        raise NotEvaluated(f"{text} lies outside the sheet")
    bounds = Bounds(
        min(top, bottom) or 1,
        min(left, right) or 1,
        max(top, bottom) or MAX_ROWS,
        max(left, right) or MAX_COLUMNS,
    )
    return Reference(text, sheet, bounds, whole_lines=not (left and top))


def split_sheet(text: str) -> tuple[str | None, str]:
    """The sheet that a reference or a name is written behind, if any, and what follows it."""
    prefix, mark, rest = text.rpartition("!")
    if not mark:
        return None, text
    sheet = prefix[1:-1].replace("''", "'") if prefix.startswith("'") else prefix
    if "[" in sheet:
        raise NotEvaluated(f"{text} refers to another workbook")
    if ":" in sheet:
        raise NotEvaluated(f"{text} refers to several sheets at once")
    return sheet, rest


def _corner(text: str) -> tuple[int, int]:
    """Column and row of a corner; 0 stands for the one that whole columns or rows leave out."""
    found = _CORNER.match(text)
    letters, digits = found.groups() if found else ("", "")
    if digits and not int(digits):
        raise NotEvaluated(f"{text} lies outside the sheet")
    return column_number(letters), int(digits or 0)
