"""Formulas without the add-in: calls of worksheet functions replaced by their native expressions."""

from __future__ import annotations

from dataclasses import replace
from functools import cache
from typing import Final

from xlbridge.catalogue import CATALOGUE, SheetFunction
from xlbridge.headless.grammar import read_formula
from xlbridge.headless.nodes import Binary, Call, Constant, Join, Missing, Name, Node, Unary, children, render

LONGEST: Final = 8192  # characters of a formula in Excel
DEEPEST: Final = 64  # levels of functions in functions in Excel
_PLACE: Final = "argument_"


class NoNative(ValueError):
    """The formula can not be written in built-in functions; the text says why."""


def in_builtin_functions(formula: str) -> str:
    """Return a formula with every call of a worksheet function written in built-in functions."""
    node = _rewritten(read_formula(formula))
    text = f"={render(node)}"
    if len(text) > LONGEST:
        raise NoNative(f"it would take {len(text):,} characters, more than {LONGEST:,}")
    if (depth := _depth(node)) > DEEPEST:
        raise NoNative(f"its functions would nest {depth} levels, more than {DEEPEST}")
    return text


def _rewritten(node: Node) -> Node:
    """The node with native expressions in place of the calls in it, the innermost first."""
    if isinstance(node, Unary):
        return replace(node, operand=_rewritten(node.operand))
    if isinstance(node, Binary | Join):
        return replace(node, left=_rewritten(node.left), right=_rewritten(node.right))
    if not isinstance(node, Call):
        return node
    arguments = tuple(map(_rewritten, node.arguments))
    entry = CATALOGUE.get(node.name)
    return replace(node, arguments=arguments) if entry is None else _expression(entry, arguments)


def _expression(entry: SheetFunction, arguments: tuple[Node, ...]) -> Node:
    """The native expression with the arguments in their places; one left out takes its default."""
    if not entry.native:
        raise NoNative(f"{entry.name} has no expression in built-in functions")
    given = {a.name: node for a, node in zip(entry.arguments, arguments, strict=False)}
    defaults = {name: Constant(value) for name, value in entry.defaults.items()}
    return _filled(_template(entry.name), defaults | {k: v for k, v in given.items() if v != Missing()})


@cache
def _template(name: str) -> Node:
    entry = CATALOGUE[name]
    return read_formula(entry.native.format_map({a.name: _PLACE + a.name for a in entry.arguments}))


def _filled(node: Node, arguments: dict[str, Node]) -> Node:
    """A native expression with its places filled: parentheses come with the text, where they are needed."""
    if isinstance(node, Name) and node.name.startswith(_PLACE):
        return arguments[node.name.removeprefix(_PLACE)]
    if isinstance(node, Unary):
        return replace(node, operand=_filled(node.operand, arguments))
    if isinstance(node, Binary | Join):
        left, right = _filled(node.left, arguments), _filled(node.right, arguments)
        return replace(node, left=left, right=right)
    if isinstance(node, Call):
        return replace(node, arguments=tuple(_filled(a, arguments) for a in node.arguments))
    return node


def _depth(node: Node) -> int:
    """How many functions stand in one another."""
    below = max((_depth(child) for child in children(node)), default=0)
    return below + isinstance(node, Call)
