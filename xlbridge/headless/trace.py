"""How a cell came to its value: its formula, what the formula reads, and each call of our functions."""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import dataclass

from xlbridge.headless.book import Formula
from xlbridge.headless.evaluate import Evaluator
from xlbridge.headless.interpreter import Interpreter, Place
from xlbridge.headless.nodes import Call, Name, Node, Reference, TableReference, render, walk
from xlbridge.headless.operands import Area, NotEvaluated, Operand
from xlbridge.headless.references import Bounds, Cell, parse_address, quote_sheet
from xlbridge.headless.shapes import parse
from xlbridge.values import Argument, Omitted, Scalar, Value


@dataclass(frozen=True, slots=True)
class Precedent:
    """Something a formula reads: as it is written there, where it is, and its value or the reason.

    ``address`` is empty for a name that stands for a value and not for cells.
    """

    label: str
    address: str
    value: Value
    reason: str | None = None


@dataclass(frozen=True, slots=True)
class TracedCall:
    """A call of a custom function: its arguments as written and as evaluated, and what it returned."""

    name: str
    labels: tuple[str, ...]
    arguments: tuple[Argument, ...]
    result: Value


@dataclass(frozen=True, slots=True)
class Trace:
    """One cell explained; a cell without a formula has only its value."""

    cell: Cell
    formula: str
    precedents: tuple[Precedent, ...]
    calls: tuple[TracedCall, ...]
    value: Scalar
    reason: str | None = None


def trace(evaluator: Evaluator, sheet: str, address: str) -> Trace:
    """Explain the cell at ``address`` (``B3``) of a sheet; its formula is evaluated once more."""
    row, column = parse_address(address)
    cell = Cell(evaluator.book.sheet_named(sheet) or sheet, row, column)
    formula = evaluator.book.formula(cell)
    value, reason = _value(evaluator, cell)
    if formula is None:
        return Trace(cell, "", (), (), value, reason)
    calls = traced_calls(evaluator, formula)
    return Trace(cell, formula.text, _precedents(evaluator, formula), calls, value, reason)


def traced_calls(evaluator: Evaluator, formula: Formula) -> tuple[TracedCall, ...]:
    """The calls of custom functions that a formula makes, inner ones first.

    Where the formula cannot be evaluated, the calls made before that was found out.
    """
    calls: list[TracedCall] = []

    def observe(node: Call, arguments: tuple[Argument, ...], result: Value) -> None:
        calls.append(TracedCall(node.name, tuple(map(render, node.arguments)), arguments, result))

    interpreter = evaluator.interpreter(observe)

    def again() -> None:
        calls.clear()
        evaluator.compute(formula, interpreter)

    try:
        evaluator.settle(again)
    except NotEvaluated:
        return tuple(calls)
    return tuple(calls)


def _value(evaluator: Evaluator, cell: Cell) -> tuple[Scalar, str | None]:
    try:
        return evaluator.value(*cell), None
    except NotEvaluated as reason:
        return None, str(reason)


def _precedents(evaluator: Evaluator, formula: Formula) -> tuple[Precedent, ...]:
    place = Place(formula.cell if formula.fills.is_cell else None, formula.cell.sheet)
    interpreter = evaluator.interpreter()
    try:
        nodes = {render(node): node for node in _reading(parse(formula.text))}
    except NotEvaluated:
        return ()
    return tuple(_precedent(evaluator, interpreter, label, node, place) for label, node in nodes.items())


def _reading(node: Node) -> Iterator[Node]:
    return (part for part in walk(node) if isinstance(part, Reference | Name | TableReference))


def _precedent(
    evaluator: Evaluator, interpreter: Interpreter, label: str, node: Node, place: Place
) -> Precedent:
    try:
        operand = evaluator.settle(lambda: interpreter.evaluate(node, place, True))
    except NotEvaluated as reason:
        return Precedent(label, "", None, str(reason))
    try:
        return Precedent(label, _address(operand), evaluator.settle(lambda: _values(operand)))
    except NotEvaluated as reason:
        return Precedent(label, _address(operand), None, str(reason))


def _values(operand: Operand) -> Value:
    if isinstance(operand, Area):
        return operand.grid[0][0] if operand.is_cell else operand.grid
    return None if isinstance(operand, Omitted) else operand


def _address(operand: Operand) -> str:
    if not isinstance(operand, Area):
        return ""
    return f"{quote_sheet(operand.sheet)}!{Bounds(operand.top, operand.left, operand.bottom, operand.right)}"
