"""References to the columns of a table: how they are written, and the cells they mean."""

from __future__ import annotations

import re
from dataclasses import dataclass
from typing import Final

from xlbridge.headless.nodes import TableReference
from xlbridge.headless.operands import NotEvaluated
from xlbridge.headless.references import Bounds, Cell
from xlbridge.headless.tokens import unreadable

ITEMS: Final = {item.upper(): item for item in ("#All", "#Data", "#Headers", "#Totals", "#This Row")}

_PART: Final = re.compile(r"\s*\[((?:[^\[\]']|'.)*)\]\s*", re.DOTALL)


@dataclass(frozen=True, slots=True)
class Table:
    """A table of the workbook: where it is and what its columns are called."""

    name: str
    sheet: str
    bounds: Bounds
    columns: tuple[str, ...]
    header_rows: int
    totals_rows: int

    @property
    def data(self) -> tuple[int, int]:
        """The first and the last row of data."""
        return self.bounds.top + self.header_rows, self.bounds.bottom - self.totals_rows


def parse_table_reference(text: str, start: int) -> TableReference:
    """The node of ``Table[…]``; ``start`` is its place in the formula, for the refusal."""
    name, _, rest = text.partition("[")
    inner = rest[:-1].strip()
    items: list[str] = []
    columns: list[str] = []
    if inner.startswith("@"):
        items.append("#This Row")
        inner = inner[1:].strip()
    if inner.startswith("["):
        _parse_parts(inner, start, items, columns)
    elif inner:
        _add(inner, start, items, columns)
    first = columns[0] if columns else None
    return TableReference(name or None, tuple(items), first, columns[-1] if columns else None)


def _parse_parts(inner: str, start: int, items: list[str], columns: list[str]) -> None:
    """Read ``[#Data],[a]:[b]``."""
    position = 0
    while True:
        found = _PART.match(inner, position)
        if found is None:
            raise unreadable(start, "this table reference is not well formed")
        _add(found[1], start, items, columns)
        position = found.end()
        if position == len(inner):
            break
        mark = inner[position]
        if mark not in ",:" or (mark == ":" and len(columns) != 1) or (mark == "," and columns):
            raise unreadable(start, "this table reference is not well formed")
        position += 1


def _add(part: str, start: int, items: list[str], columns: list[str]) -> None:
    if not part.startswith("#"):
        columns.append(re.sub("'(.)", r"\1", part, flags=re.DOTALL))
    elif part.strip().upper() in ITEMS:
        items.append(ITEMS[part.strip().upper()])
    else:
        raise unreadable(start, f"{part} is not a part of a table")


def resolve(node: TableReference, table: Table, cell: Cell | None) -> Bounds:
    """The cells that a table reference means for a formula in ``cell``."""
    top, bottom = _rows(node, table, cell)
    left, right = table.bounds.left, table.bounds.right
    if node.first is not None:
        positions = [_column(table, node.first), _column(table, node.last or node.first)]
        left, right = min(positions), max(positions)
    return Bounds(top, left, bottom, right)


def _column(table: Table, name: str) -> int:
    wanted = name.casefold()
    for position, column in enumerate(table.columns):
        if column.casefold() == wanted:
            return table.bounds.left + position
    raise NotEvaluated(f"the table {table.name} has no column {name}")


def _rows(node: TableReference, table: Table, cell: Cell | None) -> tuple[int, int]:
    parts = [_item_rows(item, table, cell) for item in node.items or ("#Data",)]
    top, bottom = min(part[0] for part in parts), max(part[1] for part in parts)
    if bottom - top + 1 != sum(last - first + 1 for first, last in set(parts)):
        raise NotEvaluated(f"the parts {', '.join(node.items)} of the table {table.name} do not adjoin")
    return top, bottom


def _item_rows(item: str, table: Table, cell: Cell | None) -> tuple[int, int]:
    first, last = table.data
    if item == "#This Row":
        return _this_row(table, cell)
    rows = {
        "#All": (table.bounds.top, table.bounds.bottom),
        "#Data": (first, last),
        "#Headers": (table.bounds.top, first - 1),
        "#Totals": (last + 1, table.bounds.bottom),
    }[item]
    if rows[1] < rows[0]:
        raise NotEvaluated(f"the table {table.name} has no rows of the kind {item}")
    return rows


def _this_row(table: Table, cell: Cell | None) -> tuple[int, int]:
    first, last = table.data
    if cell is None or cell.sheet != table.sheet or not first <= cell.row <= last:
        raise NotEvaluated(f"the formula does not stand in a row of the table {table.name}")
    return cell.row, cell.row
