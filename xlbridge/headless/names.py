"""Defined names: which definition a name means at a place, and whether it can be followed."""

from __future__ import annotations

from xlbridge.headless.book import Book
from xlbridge.headless.nodes import Name, Node, Reference, walk
from xlbridge.headless.operands import NotEvaluated
from xlbridge.headless.shapes import parse


def definition(book: Book, name: Name, sheet: str | None) -> Node:
    """What a name stands for in a formula on ``sheet``.

    A name of the sheet shadows the workbook's. Definitions that mean another cell at every place they are
    used from (relative references, references without a sheet) are refused.
    """
    text = book.names.get((sheet, name.name.casefold()))
    if text is None:
        text = book.names.get((None, name.name.casefold()))
    if text is None:
        raise NotEvaluated(f"the name {name.name} is not defined in the workbook")
    node = parse(text)
    for part in walk(node):
        if isinstance(part, Reference):
            _require_fixed(name.name, part)
    return node


def _require_fixed(name: str, reference: Reference) -> None:
    if reference.sheet is None:
        raise NotEvaluated(f"the name {name} refers to {reference.text} without naming a sheet")
    corners = reference.text.rpartition("!")[2].split(":")
    dollars = 1 if reference.whole_lines else 2
    if any(corner.count("$") < dollars for corner in corners):
        raise NotEvaluated(
            f"the name {name} refers to {reference.text}, which moves with the cell that uses it"
        )
