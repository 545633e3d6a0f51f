"""How a cell came to its value: its formula, what the formula reads, and each call of our functions."""

from __future__ import annotations

from collections.abc import Callable, Iterator
from dataclasses import dataclass

from xlbridge.headless.evaluate import Evaluator, place_of
from xlbridge.headless.interpreter import Interpreter, Place
from xlbridge.headless.nodes import Call, Name, Node, Reference, TableReference, render, walk
from xlbridge.headless.operands import Area, NotEvaluated, Operand
from xlbridge.headless.references import Bounds, Cell, parse_address, quote_sheet
from xlbridge.headless.shapes import parse
from xlbridge.values import Argument, Omitted, Value


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
    """One formula explained; a cell without a formula has only its value, a text has no cell."""

    cell: Cell | None
    formula: str
    precedents: tuple[Precedent, ...]
    calls: tuple[TracedCall, ...]
    """Inner calls first; where the formula has no value, the calls made before that was found out."""
    value: Value
    reason: str | None = None


def trace(evaluator: Evaluator, sheet: str, address: str) -> Trace:
    """Explain the cell at ``address`` (``B3``) of a sheet; its formula is evaluated once more."""
    row, column = parse_address(address)
    cell = Cell(evaluator.book.sheet_named(sheet) or sheet, row, column)
    formula = evaluator.book.formula(cell)
    value, reason = _outcome(lambda: evaluator.value(*cell))
    if formula is None:
        return Trace(cell, "", (), (), value, reason)
    calls: list[TracedCall] = []
    _outcome(lambda: evaluator.compute(formula, _observing(evaluator, calls)))
    precedents = _precedents(evaluator, formula.text, place_of(formula))
    return Trace(cell, formula.text, precedents, tuple(calls), value, reason)


def trace_text(evaluator: Evaluator, text: str, sheet: str | None = None) -> Trace:
    """Explain a formula that stands in no cell, as :meth:`Evaluator.evaluate_text` evaluates it."""
    place = evaluator.place_on(sheet)
    value, reason = _outcome(lambda: evaluator.evaluate_text(text, sheet))
    calls: list[TracedCall] = []
    _outcome(lambda: evaluator.evaluate_text(text, sheet, _observing(evaluator, calls)))
    return Trace(None, text, _precedents(evaluator, text, place), tuple(calls), value, reason)


def _observing(evaluator: Evaluator, calls: list[TracedCall]) -> Interpreter:
    """An interpreter that notes every call; what the formula reads has been computed before."""

    def observe(node: Call, arguments: tuple[Argument, ...], result: Value) -> None:
        calls.append(TracedCall(node.name, tuple(map(render, node.arguments)), arguments, result))

    return evaluator.interpreter(observe)


def _outcome(compute: Callable[[], Value]) -> tuple[Value, str | None]:
    try:
        return compute(), None
    except NotEvaluated as reason:
        return None, str(reason)


def _precedents(evaluator: Evaluator, text: str, place: Place) -> tuple[Precedent, ...]:
    interpreter = evaluator.interpreter()
    try:
        nodes = {render(node): node for node in _reading(parse(text))}
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
    except NotEvaluated as refusal:
        return Precedent(label, "", None, str(refusal))
    value, reason = _outcome(lambda: evaluator.settle(lambda: _values(operand)))
    return Precedent(label, _address(operand), value, reason)


def _values(operand: Operand) -> Value:
    if isinstance(operand, Area):
        return operand.grid[0][0] if operand.is_cell else operand.grid
    return None if isinstance(operand, Omitted) else operand


def _address(operand: Operand) -> str:
    if not isinstance(operand, Area):
        return ""
    return f"{quote_sheet(operand.sheet)}!{Bounds(operand.top, operand.left, operand.bottom, operand.right)}"
