"""Formulas read by their shape: a column of one formula differs from row to row in its references only.

The first formula of a shape is read by the grammar; the others are its nodes with their own references.
"""

from __future__ import annotations

from collections.abc import Callable, Iterator
from functools import lru_cache
from typing import Final, TypeAlias

from xlbridge.headless.grammar import read_formula
from xlbridge.headless.nodes import Binary, Call, Join, Node, Reference, Unary, walk
from xlbridge.headless.reference_text import read_reference
from xlbridge.headless.tokens import REFERENCE

_Builder: TypeAlias = Callable[[Iterator[Node]], Node]

_SHAPES: Final[dict[tuple[str, ...], _Builder | None]] = {}
_MOST_SHAPES: Final = 10_000
_MOST_PARTS: Final = 200


@lru_cache(maxsize=100_000)
def parse(text: str) -> Node:
    """The formula's nodes; the leading equals sign may be missing, as in a defined name.

    Raises :class:`NotEvaluated`, with the position, for what cannot be read.
    """
    parts = REFERENCE.split(text)
    shape = tuple(parts[::2])
    build = _SHAPES.get(shape)
    if build is not None:
        return build(map(read_reference, parts[1::2]))
    node = read_formula(text)
    if shape not in _SHAPES and len(_SHAPES) < _MOST_SHAPES:
        _SHAPES[shape] = _builder_of(node, parts[1::2])
    return node


def _builder_of(node: Node, references: list[str]) -> _Builder | None:
    """How to make the nodes of a formula of this shape; none where the text's parts are no references.

    They are not where a quoted text or a column of a table looks like one. Very long formulas are not
    worth it.
    """
    parts = list(walk(node))
    found = [part.text for part in parts if isinstance(part, Reference)]
    return _builder(node) if len(parts) <= _MOST_PARTS and found == references else None


def _builder(node: Node) -> _Builder:
    if isinstance(node, Reference):
        return next
    if not any(isinstance(part, Reference) for part in walk(node)):
        return lambda references: node
    if isinstance(node, Unary):
        op, operand = node.op, _builder(node.operand)
        return lambda references: Unary(op, operand(references))
    if isinstance(node, Call):
        name, arguments = node.name, [_builder(argument) for argument in node.arguments]
        return lambda references: Call(name, tuple([build(references) for build in arguments]))
    assert isinstance(node, Binary | Join)
    kind, joint, left, right = type(node), node.op, _builder(node.left), _builder(node.right)
    return lambda references: kind(joint, left(references), right(references))
