"""Formulas compared by what they mean: spaces, case, prefixes of the file format and spelling fall away."""

from __future__ import annotations

import re
from collections.abc import Callable
from dataclasses import dataclass, replace
from functools import lru_cache
from typing import Final, TypeAlias

from xlbridge.headless.nodes import (
    ArrayConstant,
    Binary,
    Call,
    Constant,
    Join,
    Name,
    Node,
    Reference,
    Unary,
    render,
    walk,
)
from xlbridge.headless.references import Bounds, Cell, column_letters, column_number, quote_sheet
from xlbridge.headless.shapes import parse
from xlbridge.headless.tokens import REFERENCE

#: what an area of a sheet has become
Move: TypeAlias = Callable[[str, Bounds], tuple[str, Bounds]]

_CORNER: Final = re.compile(r"(\$?)([A-Za-z]*)(\$?)(\d*)\Z")


@dataclass(frozen=True, slots=True)
class Area:
    """A reference of a formula: its sheet always named, and whether its rows are held by a ``$``."""

    sheet: str
    bounds: Bounds
    held: tuple[bool, ...]

    @property
    def plain(self) -> tuple[str, Bounds]:
        """Where it is."""
        return self.sheet, self.bounds


def transform(node: Node, change: Callable[[Node], Node]) -> Node:
    """The node with each of its parts changed, inner ones first."""
    if isinstance(node, Binary | Join):
        node = replace(node, left=transform(node.left, change), right=transform(node.right, change))
    elif isinstance(node, Unary):
        node = replace(node, operand=transform(node.operand, change))
    elif isinstance(node, Call):
        node = replace(node, arguments=tuple(transform(part, change) for part in node.arguments))
    return change(node)


def moved(node: Node, home: str, move: Move) -> Node:
    """The formula of a cell of sheet ``home`` after its references moved; each ``$`` stays."""
    here, _ = move(home, Bounds(1, 1, 1, 1))

    def change(part: Node) -> Node:
        if not isinstance(part, Reference):
            return part
        sheet, bounds = move(part.sheet or home, part.bounds)
        prefix = "" if sheet == here else f"{quote_sheet(sheet)}!"
        text = prefix + _written(part.text.rpartition("!")[2], bounds)
        return Reference(text, None if sheet == here else sheet, bounds, part.whole_lines)

    return transform(node, change)


def moved_text(text: str, home: str, move: Move, known: dict[str, str]) -> str:
    """The same for a text, quickly; what looks like a reference in a quoted text is moved as well.

    ``known`` keeps the references that were moved before.
    """
    parts = REFERENCE.split(text)
    for number in range(1, len(parts), 2):
        if parts[number] not in known:
            known[parts[number]] = render(moved(parse(parts[number]), home, move))
        parts[number] = known[parts[number]]
    return "".join(parts)


def filled(text: str, down: int, right: int) -> str:
    """The text of a formula after it was filled so many rows down and columns to the right."""

    def change(part: Node) -> Node:
        if not isinstance(part, Reference) or part.whole_lines:
            return part
        prefix, mark, local = part.text.rpartition("!")
        corners = (_shifted(corner, down, right) for corner in local.split(":"))
        return replace(part, text=f"{prefix}{mark}{':'.join(corners)}")

    return render(transform(parse(text), change))


def canonical(node: Node, home: str) -> str:
    """The text by which two formulas of one sheet are compared."""

    def change(part: Node) -> Node:
        if isinstance(part, Reference):
            return replace(part, text=f"{(part.sheet or home).casefold()}!{part.bounds}")
        return part

    return render(_plain(transform(node, change)))


def skeleton(node: Node) -> str:
    """The same without references, names and constants: two formulas of one make differ in these only."""

    def change(part: Node) -> Node:
        if isinstance(part, Reference | Name):
            return replace(Name(None, "_"))
        return Constant(0.0) if isinstance(part, Constant | ArrayConstant) else part

    return render(_plain(transform(node, change)))


def relative(node: Node, cell: Cell) -> str:
    """The formula as seen from its cell: the copies of one formula down a column are all the same."""

    def change(part: Node) -> Node:
        if not isinstance(part, Reference):
            return part
        top, left, bottom, right = part.bounds
        first, *last = held_rows(part)
        rows = (
            f"R{row}" if held else f"R[{row - cell.row}]"
            for row, held in ((top, first), (bottom, last[-1] if last else first))
        )
        return replace(part, text=f"{part.sheet or cell.sheet}!{':'.join(rows)}C{left}:C{right}")

    return render(_plain(transform(node, change)))


def areas(node: Node, home: str) -> list[Area]:
    """The references of a formula from left to right."""
    return [
        Area((part.sheet or home).casefold(), part.bounds, held_rows(part))
        for part in walk(node)
        if isinstance(part, Reference)
    ]


def held_rows(reference: Reference) -> tuple[bool, ...]:
    """Whether the rows of a reference are held by a ``$`` when the formula is filled down."""
    corners = reference.text.rpartition("!")[2].split(":")
    flags = tuple(found[3] == "$" for corner in corners if (found := _CORNER.match(corner)) and found[4])
    return tuple(dict.fromkeys(flags)) if reference.bounds.is_cell else flags


def constants(node: Node) -> list[str]:
    """The numbers and texts of a formula from left to right."""
    return [render(part) for part in walk(node) if isinstance(part, Constant | ArrayConstant)]


def names(node: Node) -> list[str]:
    """The defined names of a formula from left to right."""
    return [part.name.casefold() for part in walk(node) if isinstance(part, Name)]


def _plain(node: Node) -> Node:
    """Without what says nothing: a plus sign in front, the case of a name."""

    def change(part: Node) -> Node:
        if isinstance(part, Unary) and part.op == "+":
            return part.operand
        return replace(part, name=part.name.casefold()) if isinstance(part, Name) else part

    return transform(node, change)


@lru_cache(maxsize=50_000)
def _written(text: str, bounds: Bounds) -> str:
    """The corners of a reference put to other bounds, each ``$`` kept."""
    first, mark, last = text.partition(":")
    start = _corner(first, bounds.top, bounds.left)
    return f"{start}:{_corner(last, bounds.bottom, bounds.right)}" if mark else start


def _shifted(corner: str, down: int, right: int) -> str:
    found = _CORNER.match(corner)
    if found is None:
        return corner
    row = int(found[4]) + (0 if found[3] else down)
    column = column_number(found[2]) + (0 if found[1] else right)
    return f"{found[1]}{column_letters(column)}{found[3]}{row}"


def _corner(text: str, row: int, column: int) -> str:
    found = _CORNER.match(text)
    if found is None:
        return text
    letters = f"{found[1]}{column_letters(column)}" if found[2] else ""
    digits = f"{found[3] or ('$' if not found[2] and found[1] else '')}{row}" if found[4] else ""
    return letters + digits
