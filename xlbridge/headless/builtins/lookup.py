"""Functions that find cells and hand them on; what they take from a reference is again a reference."""

from __future__ import annotations

from dataclasses import replace
from typing import Final

from openpyxl.utils import get_column_letter

from xlbridge.headless.builtins.builtin import Builtin, Lazy
from xlbridge.headless.builtins.collect import grid_of
from xlbridge.headless.builtins.search import at_least, at_most, exact, nearest, not_found
from xlbridge.headless.coercion import Fault
from xlbridge.headless.operands import Area, NotEvaluated, Operand
from xlbridge.values import Grid, Omitted, Scalar


def shape(operand: Operand) -> tuple[int, int]:
    """Return rows and columns of anything."""
    if isinstance(operand, Area):
        return operand.shape
    return (len(operand), len(operand[0])) if isinstance(operand, tuple) else (1, 1)


def _part(operand: Operand, row: int, column: int) -> Operand:
    """Return a cell, a whole row (column 0), a whole column (row 0) or everything."""
    height, width = shape(operand)
    if row > height or column > width:
        raise Fault("#REF!", f"row {row}, column {column} lies outside {height} rows, {width} columns")
    rows = (row, row) if row else (1, height)
    columns = (column, column) if column else (1, width)
    if isinstance(operand, Area):
        top, left = operand.top - 1, operand.left - 1
        return replace(
            operand, top=top + rows[0], bottom=top + rows[1], left=left + columns[0], right=left + columns[1]
        )
    part = tuple(line[columns[0] - 1 : columns[1]] for line in grid_of(operand)[rows[0] - 1 : rows[1]])
    return part[0][0] if rows[0] == rows[1] and columns[0] == columns[1] else part


def _index(operand: Operand, row: float, column: float | None = None, area: float = 1.0) -> Operand:
    if area != 1.0:
        raise NotEvaluated("INDEX of a union of areas")
    if row < 0.0 or (column or 0.0) < 0.0:
        raise Fault("#VALUE!", "INDEX counts rows and columns from 1")
    if column is None and shape(operand)[0] == 1:
        return _part(operand, 0 if row == 0.0 else 1, int(row))
    if column is None and row and shape(operand)[1] > 1:
        raise Fault("#REF!", "INDEX of a table needs a row and a column")
    return _part(operand, int(row), int(column or 0.0))


def line(operand: Operand) -> list[Scalar]:
    """Return the cells of a single row or column."""
    grid = grid_of(operand)
    if len(grid) > 1 and len(grid[0]) > 1:
        raise Fault("#N/A", "a search needs a single row or column")
    return [cell for row in grid for cell in row]


def _match(value: Scalar, cells: Operand, kind: float = 1.0) -> float:
    find = exact if kind == 0.0 else at_most if kind > 0.0 else at_least
    return float(find(value, line(cells)))


def _column_of(table: Operand, column: float, width: int) -> int:
    if column < 1.0:
        raise Fault("#VALUE!", "the column or row number starts at 1")
    if int(column) > width:
        raise Fault("#REF!", f"the table has no column or row {int(column)}")
    return int(column)


def _vlookup(value: Scalar, table: Operand, column: float, near: bool = True) -> Operand:
    wanted = _column_of(table, column, shape(table)[1])
    row = (at_most if near else exact)(value, line(_part(table, 0, 1)))
    return _part(table, row, wanted)


def _hlookup(value: Scalar, table: Operand, row: float, near: bool = True) -> Operand:
    wanted = _column_of(table, row, shape(table)[0])
    column = (at_most if near else exact)(value, line(_part(table, 1, 0)))
    return _part(table, wanted, column)


def _lookup(value: Scalar, cells: Operand, results: Operand | None = None) -> Operand:
    height, width = shape(cells)
    if results is None:
        results = _part(cells, height, 0) if width > height else _part(cells, 0, width)
        cells = _part(cells, 1, 0) if width > height else _part(cells, 0, 1)
    place = at_most(value, line(cells))
    return _part(results, 1, place) if shape(results)[0] == 1 else _part(results, place, 1)


def _place(value: Scalar, cells: Operand, match: float, search: float) -> int:
    if search not in (1.0, -1.0):
        raise NotEvaluated("XLOOKUP and XMATCH by halving the range (search modes 2 and -2)")
    if match in (-1.0, 1.0):
        if search < 0.0:
            raise NotEvaluated("a nearest match searched from the last cell")
        return nearest(value, line(cells), below=match < 0.0)
    if match not in (0.0, 2.0):
        raise Fault("#VALUE!", f"there is no match mode {match:g}")
    return exact(value, line(cells), wildcards=match == 2.0, backwards=search < 0.0)


def _xmatch(value: Scalar, cells: Operand, match: float = 0.0, search: float = 1.0) -> float:
    return float(_place(value, cells, match, search))


def _xlookup(
    value: Scalar,
    cells: Operand,
    results: Operand,
    otherwise: Lazy | None = None,
    match: float = 0.0,
    search: float = 1.0,
) -> Operand:
    across = shape(cells)[0] == 1 and shape(cells)[1] > 1
    if shape(cells)[across] != shape(results)[across]:
        raise Fault("#VALUE!", "XLOOKUP: the two ranges have different sizes")
    try:
        place = _place(value, cells, match, search)
    except Fault as fault:
        fallback = otherwise() if otherwise and fault.error == not_found(value).error else None
        if fallback is None or isinstance(fallback, Omitted):
            raise
        return fallback
    return _part(results, 0, place) if across else _part(results, place, 0)


def _rows(area: Area | None = None) -> Operand:
    if area is None:
        raise NotEvaluated("ROW() outside a cell")
    rows: Grid = tuple((float(row),) for row in range(area.top, area.bottom + 1))
    return rows if len(rows) > 1 else rows[0][0]


def _columns(area: Area | None = None) -> Operand:
    if area is None:
        raise NotEvaluated("COLUMN() outside a cell")
    columns = tuple(float(column) for column in range(area.left, area.right + 1))
    return (columns,) if len(columns) > 1 else columns[0]


def _address(
    row: float, column: float, kind: Scalar = None, a1: Scalar = None, sheet: str | None = None
) -> str:
    if a1 not in (None, True) and not (isinstance(a1, float) and a1):
        raise NotEvaluated("ADDRESS in R1C1 notation")
    if not (1.0 <= row < 1048577.0 and 1.0 <= column < 16385.0) or kind not in (None, 1.0, 2.0, 3.0, 4.0):
        raise Fault("#VALUE!", "ADDRESS: no such cell")
    fixed_column, fixed_row = {2.0: ("", "$"), 3.0: ("$", ""), 4.0: ("", "")}.get(kind, ("$", "$"))  # type: ignore[arg-type]
    cell = f"{fixed_column}{get_column_letter(int(column))}{fixed_row}{int(row)}"
    if not sheet:
        return cell
    name = sheet if sheet.replace("_", "").isalnum() and not sheet[0].isdigit() else _quoted(sheet)
    return f"{name}!{cell}"


def _quoted(sheet: str) -> str:
    return "'" + sheet.replace("'", "''") + "'"


FUNCTIONS: Final = (
    Builtin("INDEX", "gnnn", _index, 2),
    Builtin("MATCH", "sgn", _match, 2),
    Builtin("VLOOKUP", "sgnb", _vlookup, 3),
    Builtin("HLOOKUP", "sgnb", _hlookup, 3),
    Builtin("LOOKUP", "sgg", _lookup, 2, array=True),
    Builtin("XMATCH", "sgnn", _xmatch, 2),
    Builtin("XLOOKUP", "sgglnn", _xlookup, 3),
    Builtin("ROW", "a", _rows, 0),
    Builtin("COLUMN", "a", _columns, 0),
    Builtin("ROWS", "g", lambda operand: float(shape(operand)[0])),
    Builtin("COLUMNS", "g", lambda operand: float(shape(operand)[1])),
    Builtin("ADDRESS", "nnsst", _address, 2),
)
