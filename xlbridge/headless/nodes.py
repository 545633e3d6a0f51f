"""The parts of a parsed formula, and their text.

``render`` writes a node back with the fewest parentheses that keep its meaning; names, references and
table references come out as they were written.
"""

from __future__ import annotations

from collections.abc import Callable, Iterator
from dataclasses import dataclass
from typing import Final, TypeAlias

from xlbridge.headless.references import Bounds, quote_sheet
from xlbridge.values import CellError, Grid


@dataclass(frozen=True, slots=True)
class Constant:
    """A number, a text, TRUE, FALSE or an error value written in the formula."""

    value: float | str | bool | CellError


@dataclass(frozen=True, slots=True)
class ArrayConstant:
    """``{1,2;3,4}``."""

    rows: Grid


@dataclass(frozen=True, slots=True)
class Reference:
    """A cell, a range of cells, or whole columns or rows; ``text`` is how the formula writes it."""

    text: str
    sheet: str | None
    bounds: Bounds
    whole_lines: bool = False


@dataclass(frozen=True, slots=True)
class Name:
    """A defined name, on its own or behind the name of a sheet."""

    sheet: str | None
    name: str


@dataclass(frozen=True, slots=True)
class TableReference:
    """``Table[[#Data],[first]:[last]]``; no table name means the table the formula stands in."""

    table: str | None
    items: tuple[str, ...]
    first: str | None
    last: str | None


@dataclass(frozen=True, slots=True)
class Unary:
    """``-x``, ``+x`` or ``x%``."""

    op: str
    operand: Node


@dataclass(frozen=True, slots=True)
class Binary:
    """Two operands and one of ``^ * / + - & = <> < <= > >=``."""

    op: str
    left: Node
    right: Node


@dataclass(frozen=True, slots=True)
class Join:
    """Two references and a reference operator: ``:`` range, space intersection, comma union."""

    op: str
    left: Node
    right: Node


@dataclass(frozen=True, slots=True)
class Missing:
    """An argument left empty, as the second one of ``F(1,,2)``."""


@dataclass(frozen=True, slots=True)
class Call:
    """A function with its arguments; the name is upper case, without the file format's prefixes."""

    name: str
    arguments: tuple[Node, ...]


Node: TypeAlias = (
    Constant | ArrayConstant | Reference | Name | TableReference | Unary | Binary | Join | Missing | Call
)

BINDING: Final = {
    "=": 10, "<>": 10, "<": 10, "<=": 10, ">": 10, ">=": 10,
    "&": 20, "+": 30, "-": 30, "*": 40, "/": 40, "^": 50,
}  # fmt: skip
"""How tightly the operators between two values bind; equal ones group from the left, ``^`` too."""
PERCENT: Final = 60
PREFIX: Final = 70
JOINING: Final = {",": 0, " ": 80, ":": 90}
ATOM: Final = 100

TABLE_ESCAPED: Final = "[]#'@"
"""The characters of a column name that a table reference marks with an apostrophe."""


def walk(node: Node) -> Iterator[Node]:
    """The node and everything in it, from left to right, however deep it is nested."""
    waiting = [node]
    while waiting:
        node = waiting.pop()
        yield node
        waiting.extend(reversed(children(node)))


def children(node: Node) -> tuple[Node, ...]:
    """The nodes directly inside a node."""
    if isinstance(node, Binary | Join):
        return (node.left, node.right)
    if isinstance(node, Unary):
        return (node.operand,)
    return node.arguments if isinstance(node, Call) else ()


def render(node: Node) -> str:
    """The text of a formula's part, without the leading equals sign."""
    return _WRITERS[type(node)](node)


def render_value(value: object) -> str:
    """A constant as a formula writes it."""
    if isinstance(value, bool):
        return "TRUE" if value else "FALSE"
    if isinstance(value, float):
        return str(int(value)) if value.is_integer() and abs(value) < 1e15 else repr(value).upper()
    if isinstance(value, str):
        return '"' + value.replace('"', '""') + '"'
    return str(value)


def _binding(node: Node) -> int:
    if isinstance(node, Binary):
        return BINDING[node.op]
    if isinstance(node, Unary):
        return PERCENT if node.op == "%" else PREFIX
    return JOINING[node.op] if isinstance(node, Join) and node.op != "," else ATOM


def _inside(node: Node, least: int) -> str:
    text = render(node)
    return text if _binding(node) >= least else f"({text})"


def _array(node: ArrayConstant) -> str:
    return "{" + ";".join(",".join(map(render_value, row)) for row in node.rows) + "}"


def _name(node: Name) -> str:
    return node.name if node.sheet is None else f"{quote_sheet(node.sheet)}!{node.name}"


def _table(node: TableReference) -> str:
    parts = [f"[{item}]" for item in node.items]
    if node.first is not None:
        columns = [node.first] if node.last == node.first or node.last is None else [node.first, node.last]
        parts.append(":".join(f"[{_escape(column)}]" for column in columns))
    return f"{node.table or ''}[{','.join(parts)}]"


def _escape(column: str) -> str:
    return "".join("'" + letter if letter in TABLE_ESCAPED else letter for letter in column)


def _unary(node: Unary) -> str:
    if node.op == "%":
        return _inside(node.operand, PERCENT) + "%"
    return node.op + _inside(node.operand, PREFIX)


def _binary(node: Binary) -> str:
    """Written along the left edge, which a long sum makes thousands deep."""
    rights: list[str] = []
    left: Node = node
    least = 0
    while isinstance(left, Binary) and BINDING[left.op] >= least:
        least = BINDING[left.op]
        rights.append(left.op + _inside(left.right, least + 1))
        left = left.left
    return _inside(left, least) + "".join(reversed(rights))


def _join(node: Join) -> str:
    if node.op == ",":
        return f"({_union(node)})"
    least = JOINING[node.op]
    return _inside(node.left, least) + node.op + _inside(node.right, least + 1)


def _union(node: Node) -> str:
    if isinstance(node, Join) and node.op == ",":
        return f"{_union(node.left)},{render(node.right)}"
    return render(node)


def _call(node: Call) -> str:
    return f"{node.name}({','.join(map(render, node.arguments))})"


_WRITERS: Final[dict[type, Callable[..., str]]] = {
    Constant: lambda node: render_value(node.value),
    ArrayConstant: _array,
    Reference: lambda node: node.text,
    Name: _name,
    TableReference: _table,
    Unary: _unary,
    Binary: _binary,
    Join: _join,
    Missing: lambda node: "",
    Call: _call,
}
