"""A workbook as the evaluator sees it: constants, formulas, defined names and tables by sheet."""

from __future__ import annotations

from collections.abc import Iterable, Iterator, Mapping
from dataclasses import dataclass, field
from datetime import date, datetime, time, timedelta
from functools import cached_property
from pathlib import Path
from typing import Any, Final, TypeAlias

from openpyxl import Workbook
from openpyxl.utils.datetime import CALENDAR_MAC_1904, to_excel
from openpyxl.worksheet.formula import ArrayFormula, DataTableFormula
from openpyxl.worksheet.worksheet import Worksheet

from xlbridge.headless.opening import BookError, load, read_file
from xlbridge.headless.references import MAX_COLUMNS, MAX_ROWS, Bounds, Cell, parse_bounds
from xlbridge.headless.stored_values import Stored, read_stored_values
from xlbridge.headless.structured import Table
from xlbridge.values import CellError, Scalar

__all__ = ["Book", "BookError", "Formula"]

Position: TypeAlias = tuple[int, int]

_DATA_TABLE: Final = "the cell belongs to a what-if data table"
_TOO_LARGE: Final = "the array formula fills more than 100,000 cells"
_AS_DISPLAYED: Final = "the workbook calculates with precision as displayed"


@dataclass(frozen=True, slots=True)
class Formula:
    """A formula: where it is written, its text, the cells it fills, and why it is refused, if it is."""

    cell: Cell
    text: str
    fills: Bounds
    is_array: bool = False
    refusal: str = ""


@dataclass(frozen=True)
class Book:
    """A workbook's content; ``formulas`` has an entry for every cell that a formula fills."""

    sheets: tuple[str, ...] = ()
    constants: Mapping[str, Mapping[Position, Scalar]] = field(default_factory=dict)
    formulas: Mapping[str, Mapping[Position, Formula]] = field(default_factory=dict)
    names: Mapping[tuple[str | None, str], str] = field(default_factory=dict)
    """Text by sheet (none for the workbook's own names) and casefolded name."""
    tables: Mapping[str, Table] = field(default_factory=dict)
    """By casefolded name."""
    workbook: Workbook | None = None
    """What openpyxl read, for formats and comments; its dates are serial numbers."""
    data: bytes = b""

    @classmethod
    def open(cls, path: Path | str) -> Book:
        """Read a workbook file; :class:`BookError` says in one sentence why it cannot be read."""
        path = Path(path)
        data = read_file(path)
        workbook = load(path, data)
        try:
            book = cls.of(workbook, data)
        except ValueError as error:
            raise BookError(f"{path}: the workbook is damaged ({error})") from error
        if book.extent[0] > MAX_ROWS or book.extent[1] > MAX_COLUMNS:
            raise BookError(
                f"{path}: the workbook is damaged (it has cells outside of what a sheet can hold)"
            )
        return book

    @classmethod
    def of(cls, workbook: Workbook, data: bytes = b"") -> Book:
        """The content of an openpyxl workbook; ``data`` is the file it was read from, if any."""
        refusal = _AS_DISPLAYED if workbook.calculation.fullPrecision is False else ""
        formulas = {sheet.title: _formulas(sheet, refusal) for sheet in workbook.worksheets}
        return cls(
            sheets=tuple(formulas),
            constants={
                sheet.title: _constants(sheet, formulas[sheet.title], workbook.epoch)
                for sheet in workbook.worksheets
            },
            formulas=formulas,
            names=_names(workbook),
            tables={table.name.casefold(): table for table in _tables(workbook)},
            workbook=workbook,
            data=data,
        )

    @cached_property
    def extent(self) -> Position:
        """The last row and the last column that any sheet uses."""
        used = [
            position for cells in (*self.constants.values(), *self.formulas.values()) for position in cells
        ]
        return max((row for row, _ in used), default=1), max((column for _, column in used), default=1)

    def sheet_named(self, name: str) -> str | None:
        """The sheet of this name in any case, as the workbook writes it."""
        return self._sheets_by_name.get(name.casefold())

    @cached_property
    def _sheets_by_name(self) -> Mapping[str, str]:
        return {sheet.casefold(): sheet for sheet in self.sheets}

    def formula(self, cell: Cell) -> Formula | None:
        """The formula that fills a cell, if one does."""
        return self.formulas.get(cell.sheet, {}).get((cell.row, cell.column))

    @property
    def counts_from_1904(self) -> bool:
        """Whether the workbook's dates are days from 1904 on."""
        return self.workbook is not None and self.workbook.epoch == CALENDAR_MAC_1904

    def hides_rows(self, sheet: str, top: int, bottom: int) -> bool:
        """Whether any of the rows is hidden."""
        if self.workbook is None:
            return False
        rows = self.workbook[sheet].row_dimensions
        return any(rows[row].hidden for row in rows if top <= row <= bottom)

    def formula_cells(self) -> Iterator[Cell]:
        """Every cell that a formula fills, by sheet, row and column."""
        for sheet, formulas in self.formulas.items():
            for row, column in sorted(formulas):
                yield Cell(sheet, row, column)

    def stored(self, cell: Cell) -> Scalar:
        """The value the file stores for a formula cell; ``None`` where it stores none."""
        return self._stored.get(cell.sheet, {}).get((cell.row, cell.column))

    @cached_property
    def _stored(self) -> Mapping[str, Stored]:
        try:
            return read_stored_values(self.data) if self.data else {}
        except ValueError as error:
            raise BookError(f"the stored values of the workbook are damaged ({error})") from error


def _used(sheet: Worksheet) -> Iterable[tuple[Position, Any]]:
    """The cells that exist, without the blank ones that asking for a range would create."""
    cells: dict[Position, Any] = sheet._cells
    return cells.items()


def _formulas(sheet: Worksheet, refusal: str) -> dict[Position, Formula]:
    found: dict[Position, Formula] = {}
    for position, content in _used(sheet):
        if content.data_type == "f":
            formula = _formula(Cell(sheet.title, *position), content.value, refusal)
            fills = formula.fills
            if fills.is_cell:
                found[position] = formula
                continue
            for row in range(fills.top, fills.bottom + 1):
                for column in range(fills.left, fills.right + 1):
                    found[row, column] = formula
    return found


def _formula(cell: Cell, value: object, refusal: str) -> Formula:
    alone = Bounds(cell.row, cell.column, cell.row, cell.column)
    if not isinstance(value, ArrayFormula | DataTableFormula):
        return Formula(cell, str(value), alone, False, refusal)
    fills = parse_bounds(value.ref)
    if fills.size > 100_000:
        return Formula(cell, "", alone, True, _TOO_LARGE)
    if isinstance(value, DataTableFormula):
        return Formula(cell, "", fills, True, _DATA_TABLE)
    return Formula(cell, value.text or "", fills, True, refusal)


def _constants(
    sheet: Worksheet, formulas: Mapping[Position, Formula], epoch: datetime
) -> dict[Position, Scalar]:
    return {
        position: _scalar(content.value, content.data_type, epoch)
        for position, content in _used(sheet)
        if content.value is not None and position not in formulas
    }


def _scalar(value: object, data_type: str, epoch: datetime) -> Scalar:
    if isinstance(value, bool):
        return value
    if isinstance(value, int | float):
        return float(value)
    if isinstance(value, datetime | date | time | timedelta):
        return float(to_excel(value, epoch))  # type: ignore[no-untyped-call]
    return CellError(str(value)) if data_type == "e" else str(value)


def _names(workbook: Workbook) -> dict[tuple[str | None, str], str]:
    names: dict[tuple[str | None, str], str] = {
        (None, name.casefold()): defined.attr_text or "" for name, defined in workbook.defined_names.items()
    }
    for sheet in workbook.worksheets:
        for name, defined in sheet.defined_names.items():
            names[sheet.title, name.casefold()] = defined.attr_text or ""
    return names


def _tables(workbook: Workbook) -> Iterator[Table]:
    for sheet in workbook.worksheets:
        for table in sheet.tables.values():
            yield Table(
                name=table.displayName,
                sheet=sheet.title,
                bounds=parse_bounds(table.ref),
                columns=tuple(column.name.replace("_x000a_", "\n") for column in table.tableColumns),
                header_rows=1 if table.headerRowCount is None else table.headerRowCount,
                totals_rows=table.totalsRowCount or 0,
            )
