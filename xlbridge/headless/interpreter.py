"""What a parsed formula evaluates to at a place in a workbook.

In array mode several cells may stand where one value belongs, and the operation is done for each of them.
Outside it that would be an implicit intersection, which is refused.
"""

from __future__ import annotations

from collections.abc import Callable, Mapping, Sequence
from typing import Any, Final, NamedTuple, TypeAlias

from xlbridge.headless.book import Book
from xlbridge.headless.builtins import BUILTINS, Builtin, invoke
from xlbridge.headless.context import WholeLines, require_context
from xlbridge.headless.names import definition
from xlbridge.headless.nodes import (
    ArrayConstant,
    Binary,
    Call,
    Constant,
    Join,
    Missing,
    Name,
    Node,
    Reference,
    TableReference,
    Unary,
    render,
)
from xlbridge.headless.operands import Area, NotEvaluated, Operand
from xlbridge.headless.operators import binary, unary
from xlbridge.headless.references import Bounds, Cell
from xlbridge.headless.structured import Table, resolve
from xlbridge.values import OMITTED, Argument, Grid, Omitted, Scalar, Value

Function: TypeAlias = Callable[[Sequence[Argument]], Value]
Observer: TypeAlias = Callable[[Call, tuple[Argument, ...], Value], None]

_OWN_CELL: Final = frozenset({"ROW", "COLUMN"})
"""Functions that without an argument mean the cell they stand in."""


class Place(NamedTuple):
    """Where a formula stands: its cell (none for a formula filling several), sheet, and names followed."""

    cell: Cell | None
    sheet: str | None
    names: tuple[str, ...] = ()


class Interpreter:
    """Evaluates nodes; ``read`` and ``read_cell`` give cell values, ``observer`` sees custom calls."""

    def __init__(
        self,
        book: Book,
        functions: Mapping[str, Function],
        read: Callable[[Area], Grid],
        read_cell: Callable[[str, int, int], Scalar],
        observer: Observer | None = None,
    ) -> None:
        self._book = book
        self._functions = {name.upper(): function for name, function in functions.items()}
        self._read = read
        self._read_cell = read_cell
        self._observer = observer
        self._definitions: dict[tuple[str, str | None, str | None], Node] = {}
        self._rules: dict[type, Callable[[Any, Place, bool], Operand]] = {
            Constant: lambda node, place, array: node.value,
            ArrayConstant: lambda node, place, array: node.rows,
            Missing: lambda node, place, array: OMITTED,
            Reference: self._reference,
            Name: self._name,
            TableReference: self._table,
            Unary: self._unary,
            Binary: self._binary,
            Join: self._join,
            Call: self._call,
        }

    def result(self, node: Node, place: Place, array: bool) -> Value:
        """The value of a whole formula; a blank cell counts as 0, and an array needs array mode."""
        try:
            value = _argument(self._one(node, place, array))
        except RecursionError:
            raise NotEvaluated("the formula is nested too deeply") from None
        return 0.0 if value is None or isinstance(value, Omitted) else value

    def evaluate(self, node: Node, place: Place, array: bool) -> Operand:
        """The operand a node stands for; :class:`NotEvaluated` where that is outside the subset."""
        return self._rules[type(node)](node, place, array)

    def _one(self, node: Node, place: Place, array: bool) -> Operand:
        """The operand where one value belongs; several values only in array mode."""
        if type(node) is Reference:
            top, left, bottom, right = node.bounds
            if top == bottom and left == right:
                return self._read_cell(self._sheet(node, place), top, left)
        operand = self.evaluate(node, place, array)
        if isinstance(operand, Area):
            return operand if operand.is_cell else self._several(operand, array)
        if isinstance(operand, tuple):
            if len(operand) == len(operand[0]) == 1:
                return operand[0][0]
            if not array:
                raise NotEvaluated(
                    "an array stands where one value belongs (implicit intersection is refused)"
                )
        return operand

    def _several(self, area: Area, array: bool) -> Grid:
        if not array:
            bounds = Bounds(area.top, area.left, area.bottom, area.right)
            raise NotEvaluated(
                f"the range {bounds} stands where one value belongs (implicit intersection is refused)"
            )
        if isinstance(area, WholeLines):
            raise NotEvaluated("an array calculation over whole columns or rows is refused; name the cells")
        return area.grid

    def _reference(self, node: Reference, place: Place, array: bool) -> Operand:
        sheet = self._sheet(node, place)
        bounds = node.bounds
        if not node.whole_lines:
            return Area(sheet, *bounds, self._read)
        rows, columns = self._book.extent
        bottom, right = (
            max(bounds.top, min(bounds.bottom, rows)),
            max(bounds.left, min(bounds.right, columns)),
        )
        return WholeLines(sheet, bounds.top, bounds.left, bottom, right, self._read)

    def _sheet(self, node: Reference | Name, place: Place) -> str:
        if node.sheet is None:
            if place.sheet is None:
                raise NotEvaluated(f"{render(node)} needs a workbook, and a sheet to stand on")
            return place.sheet
        sheet = self._book.sheet_named(node.sheet)
        if sheet is None:
            raise NotEvaluated(f"{render(node)} refers to a sheet that the workbook does not have")
        return sheet

    def _name(self, node: Name, place: Place, array: bool) -> Operand:
        key = node.name.casefold()
        if key in place.names:
            raise NotEvaluated(f"the name {node.name} is defined by itself")
        sheet = self._sheet(node, place) if node.sheet is not None else place.sheet
        inner = Place(place.cell, place.sheet, (*place.names, key))
        defined = (key, sheet, node.sheet)
        if defined not in self._definitions:
            self._definitions[defined] = definition(self._book, node, sheet)
        return self.evaluate(self._definitions[defined], inner, True)

    def _table(self, node: TableReference, place: Place, array: bool) -> Operand:
        table = self._table_at(place) if node.table is None else self._book.tables.get(node.table.casefold())
        if table is None:
            raise NotEvaluated(f"{render(node)} refers to a table that the workbook does not have")
        return Area(table.sheet, *resolve(node, table, place.cell), self._read)

    def _table_at(self, place: Place) -> Table | None:
        cell = place.cell
        for table in self._book.tables.values():
            if cell and cell.sheet == table.sheet and table.bounds.contains(cell.row, cell.column):
                return table
        return None

    def _unary(self, node: Unary, place: Place, array: bool) -> Operand:
        return unary(node.op, self._one(node.operand, place, array))

    def _binary(self, node: Binary, place: Place, array: bool) -> Operand:
        """Walks down the left edge: a long sum is thousands of nodes deep there."""
        edge = [node]
        while isinstance(edge[-1].left, Binary):
            edge.append(edge[-1].left)
        left = self._one(edge[-1].left, place, array)
        for part in reversed(edge):
            right = self._one(part.right, place, array)
            left = binary(part.op, left, right)
        return left

    def _join(self, node: Join, place: Place, array: bool) -> Operand:
        if node.op != ":":
            kind = "an intersection" if node.op == " " else "a union"
            raise NotEvaluated(f"{render(node)} is {kind} of references, which is not evaluated")
        first = self.evaluate(node.left, place, array)
        last = self.evaluate(node.right, place, array)
        if not isinstance(first, Area) or not isinstance(last, Area):
            raise NotEvaluated(f"{render(node)} does not join two references")
        if first.sheet != last.sheet and _names_a_sheet(node.right):
            raise NotEvaluated(f"{render(node)} joins cells of two sheets")
        return Area(
            first.sheet,
            min(first.top, last.top),
            min(first.left, last.left),
            max(first.bottom, last.bottom),
            max(first.right, last.right),
            self._read,
        )

    def _call(self, node: Call, place: Place, array: bool) -> Operand:
        custom = self._functions.get(node.name)
        if custom is not None:
            return self._custom(node, custom, place, array)
        builtin = BUILTINS.get(node.name)
        if builtin is None:
            raise NotEvaluated(f"the function {node.name} is not among those that are evaluated")
        return self._builtin(node, builtin, place, array or builtin.array)

    def _custom(self, node: Call, function: Function, place: Place, array: bool) -> Value:
        arguments = tuple([self._given(part, place, array) for part in node.arguments])
        result = function(arguments)
        if self._observer is not None:
            self._observer(node, arguments, result)
        return result

    def _given(self, node: Node, place: Place, array: bool) -> Argument:
        """What a custom function gets for an argument; the short way for a single cell."""
        if type(node) is Reference:
            top, left, bottom, right = node.bounds
            if top == bottom and left == right:
                return self._read_cell(self._sheet(node, place), top, left)
        return _argument(self.evaluate(node, place, array))

    def _builtin(self, node: Call, builtin: Builtin, place: Place, array: bool) -> Operand:
        kinds = builtin.kinds(len(node.arguments))
        operands = [
            self._operand(kind, part, place, array) for kind, part in zip(kinds, node.arguments, strict=True)
        ]
        if not operands and node.name in _OWN_CELL:
            operands = [self._own_cell(node, place)]
        require_context(node.name, operands, self._book)
        result = invoke(builtin, operands)
        return None if isinstance(result, Omitted) else result

    def _operand(self, kind: str, node: Node, place: Place, array: bool) -> Operand | Callable[[], Operand]:
        if kind == "l":
            return lambda: self.evaluate(node, place, array)
        return self.evaluate(node, place, array) if kind in "ga" else self._one(node, place, array)

    def _own_cell(self, node: Call, place: Place) -> Area:
        if place.cell is None:
            raise NotEvaluated(f"{node.name}() does not stand in one cell")
        cell = place.cell
        return Area(cell.sheet, cell.row, cell.column, cell.row, cell.column, self._read)


def _argument(operand: Operand) -> Argument:
    """An operand as a custom function gets it: one cell as its value, several as a grid."""
    if isinstance(operand, Area):
        return operand.grid[0][0] if operand.is_cell else operand.grid
    return operand


def _names_a_sheet(node: Node) -> bool:
    return not isinstance(node, Reference) or node.sheet is not None
