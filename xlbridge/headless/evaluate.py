"""Every formula cell of a workbook: its value, or why it has none.

Cells are computed when they are needed. A formula that meets a cell not computed yet is put aside on a
stack of our own, so chains of any length work, and the cells on the stack are the path a cycle closes.
"""

from __future__ import annotations

from collections.abc import Callable, Iterator, Mapping
from dataclasses import dataclass
from typing import Final, TypeVar

from xlbridge.headless.book import Book, Formula, Position
from xlbridge.headless.interpreter import Function, Interpreter, Observer, Place
from xlbridge.headless.operands import Area, NotEvaluated
from xlbridge.headless.references import Bounds, Cell
from xlbridge.headless.shapes import parse
from xlbridge.values import CellError, Grid, Scalar, Value

_T = TypeVar("_T")

_REMEMBERED: Final = 2_000_000
"""How many cell values the remembered grids may hold; running sums over long columns would hold more."""
_NAMED: Final = 200
"""How many cells of a cycle are named; every cell of it carries the text."""
_NO_VALUE: Final = CellError("#N/A", "the array formula gives no value for this cell")


class Waiting(NotEvaluated):
    """A cell that needs another one that has no value; ``root`` is where the trouble starts."""

    def __init__(self, cell: Cell, cause: NotEvaluated) -> None:
        self.root: Cell = cause.root if isinstance(cause, Waiting) else cell
        self.root_reason: str = cause.root_reason if isinstance(cause, Waiting) else str(cause)
        way = f"{cell}" if cell == self.root else f"{cell}, which waits for {self.root}"
        super().__init__(f"waits for {way}: {self.root_reason}")


class _Pending(Exception):
    """Cells have to be computed first."""

    def __init__(self, cells: list[Cell]) -> None:
        self.cells = cells


@dataclass(frozen=True, slots=True)
class CellResult:
    """A formula cell's value, or the reason why it was not evaluated."""

    cell: Cell
    value: Scalar
    reason: str | None = None


@dataclass(frozen=True, slots=True)
class Results:
    """All formula cells of a workbook by sheet, row and column."""

    cells: tuple[CellResult, ...]

    @property
    def values(self) -> Mapping[tuple[str, str], Scalar]:
        """The values by sheet and address, of the cells that have one."""
        return {(r.cell.sheet, r.cell.address): r.value for r in self.cells if r.reason is None}

    @property
    def not_evaluated(self) -> Mapping[Cell, str]:
        """The reasons, of the cells that have no value."""
        return {result.cell: result.reason for result in self.cells if result.reason is not None}


class Evaluator:
    """Computes the formulas of a workbook, or single formulas with no workbook at all."""

    def __init__(self, book: Book | None, functions: Mapping[str, Function]) -> None:
        self.book = book or Book()
        self.functions = functions
        self._values: dict[str, dict[Position, Scalar]] = {
            sheet: dict(cells) for sheet, cells in self.book.constants.items()
        }
        self._failures: dict[Cell, NotEvaluated] = {}
        self._grids: dict[tuple[str, int, int, int, int], Grid] = {}
        self._remembered = 0
        self._interpreter = self.interpreter()

    def interpreter(self, observer: Observer | None = None) -> Interpreter:
        """An interpreter on this workbook; ``observer`` sees every call of a custom function."""
        return Interpreter(self.book, self.functions, self.read, self.read_cell, observer)

    def value(self, sheet: str, row: int, column: int) -> Scalar:
        """The value of a cell; raises :class:`NotEvaluated` where it has none."""
        title = self.book.sheet_named(sheet)
        if title is None:
            raise NotEvaluated(f"the workbook has no sheet {sheet}")
        formula = self.book.formulas[title].get((row, column))
        if formula is not None:
            self._run(formula.cell)
            if formula.cell in self._failures:
                raise self._failures[formula.cell].with_traceback(None)
        return self._values[title].get((row, column))

    def evaluate_all(self) -> Results:
        """Compute every formula cell."""
        return Results(tuple(self._result(cell) for cell in self.book.formula_cells()))

    def evaluate_text(
        self, text: str, sheet: str | None = None, interpreter: Interpreter | None = None
    ) -> Value:
        """The value of a formula that stands in no cell; references without a sheet mean ``sheet``.

        It is evaluated as an array formula, so it may give a grid.
        """
        place = self.place_on(sheet)
        node = parse(text)
        return self.settle(lambda: (interpreter or self._interpreter).result(node, place, True))

    def place_on(self, sheet: str | None) -> Place:
        """The place of a formula that stands in no cell, on a sheet or on none."""
        title = None if sheet is None else self.book.sheet_named(sheet)
        if sheet is not None and title is None:
            raise NotEvaluated(f"the workbook has no sheet {sheet}")
        return Place(None, title)

    def settle(self, compute: Callable[[], _T]) -> _T:
        """Do a computation that reads cells, once the cells it reads are computed."""
        while True:
            try:
                return compute()
            except _Pending as pending:
                for cell in pending.cells:
                    self._run(cell)

    def compute(self, formula: Formula, interpreter: Interpreter | None = None) -> Value:
        """Evaluate a formula at its place, by this workbook's interpreter or one with an observer."""
        if formula.refusal:
            raise NotEvaluated(formula.refusal)
        return (interpreter or self._interpreter).result(
            parse(formula.text), place_of(formula), formula.is_array
        )

    def read(self, area: Area) -> Grid:
        """The values of an area; what it needs first is asked for, what has no value is passed on."""
        key = (area.sheet, area.top, area.left, area.bottom, area.right)
        grid = self._grids.get(key)
        if grid is None:
            grid = self._collect(area)
            self._remembered += len(grid) * len(grid[0])
            if self._remembered > _REMEMBERED:
                self._grids.clear()
                self._remembered = 0
            self._grids[key] = grid
        return grid

    def read_cell(self, sheet: str, row: int, column: int) -> Scalar:
        """The value of one cell, as :meth:`read` gives it."""
        value = self._values[sheet].get((row, column))
        if value is None:
            need = self._need(sheet, row, column)
            if need is not None:
                raise _Pending([need])
        return value

    def _collect(self, area: Area) -> Grid:
        get = self._values[area.sheet].get
        columns = range(area.left, area.right + 1)
        grid = tuple(
            [tuple([get((row, column)) for column in columns]) for row in range(area.top, area.bottom + 1)]
        )
        needs = [
            self._need(area.sheet, row, column)
            for row, values in enumerate(grid, area.top)
            if None in values
            for column, value in enumerate(values, area.left)
            if value is None
        ]
        pending = [need for need in needs if need is not None]
        if pending:
            raise _Pending(pending)
        return grid

    def _need(self, sheet: str, row: int, column: int) -> Cell | None:
        """The formula to compute before a blank cell can be read; one with a value is never blank."""
        formula = self.book.formulas[sheet].get((row, column))
        if formula is None:
            return None
        if formula.cell in self._failures:
            raise Waiting(Cell(sheet, row, column), self._failures[formula.cell])
        return formula.cell

    def _result(self, cell: Cell) -> CellResult:
        try:
            return CellResult(cell, self.value(*cell))
        except NotEvaluated as reason:
            return CellResult(cell, None, str(reason))

    def _run(self, start: Cell) -> None:
        """Compute a cell and, before it, whatever it needs."""
        path: dict[Cell, Iterator[Cell]] = {}
        self._attempt(start, path)
        while path:
            cell, needs = next(reversed(path.items()))
            need = next((need for need in needs if not self._is_done(need)), None)
            if need is None:
                del path[cell]
                self._attempt(cell, path)
            elif need in path:
                self._fail_cycle(path, need)
            else:
                self._attempt(need, path)

    def _attempt(self, cell: Cell, path: dict[Cell, Iterator[Cell]]) -> None:
        """Compute a cell, or put it on the path with the cells it needs first."""
        if self._is_done(cell):
            return
        formula = self.book.formulas[cell.sheet][cell.row, cell.column]
        try:
            self._store(formula, self.compute(formula))
        except _Pending as pending:
            path[cell] = iter(pending.cells)
        except NotEvaluated as reason:
            self._failures[cell] = reason.with_traceback(None)  # frames would be kept alive

    def _fail_cycle(self, path: dict[Cell, Iterator[Cell]], first: Cell) -> None:
        """Take the cells of a cycle off the path, each with the cycle from its own point of view."""
        cells = list(path)
        cycle = cells[cells.index(first) :]
        for place, cell in enumerate(cycle):
            self._failures[cell] = NotEvaluated(f"circular reference: {_named(cycle, place)}")
            del path[cell]

    def _is_done(self, cell: Cell) -> bool:
        return (cell.row, cell.column) in self._values[cell.sheet] or cell in self._failures

    def _store(self, formula: Formula, value: Value) -> None:
        values = self._values[formula.cell.sheet]
        if formula.fills.is_cell and not isinstance(value, tuple):
            values[formula.cell[1:]] = value
            return
        for (row, column), item in _spread(formula.fills, value):
            values[row, column] = item


def place_of(formula: Formula) -> Place:
    """The place of a formula; one that fills several cells stands in none of them."""
    return Place(formula.cell if formula.fills.is_cell else None, formula.cell.sheet)


def _named(cycle: list[Cell], place: int) -> str:
    """The cells of a cycle from one of them round to itself; the middle of a very long one is counted."""
    length, half = len(cycle), _NAMED // 2
    steps = range(place, place + length + 1)
    shown = [*steps] if length <= _NAMED else [*steps[:half], *steps[-half:]]
    names = [str(cycle[step % length]) for step in shown]
    if length > _NAMED:
        names.insert(half, f"({length + 1 - _NAMED:,} more cells)")
    return " -> ".join(names)


def _spread(fills: Bounds, value: Value) -> Iterator[tuple[Position, Scalar]]:
    """The value of each cell an array formula fills: one row or column repeats, the excess is #N/A."""
    grid = value if isinstance(value, tuple) else ((value,),)
    height, width = len(grid), len(grid[0])
    for row in range(fills.bottom - fills.top + 1):
        for column in range(fills.right - fills.left + 1):
            y, x = 0 if height == 1 else row, 0 if width == 1 else column
            item = grid[y][x] if y < height and x < width else _NO_VALUE
            yield (fills.top + row, fills.left + column), 0.0 if item is None else item
