"""Defined names: each of the twin leads to the same place, and none of a sheet hides one."""

from __future__ import annotations

from collections.abc import Iterator

from xlbridge.audit import notation
from xlbridge.audit.finding import Observation, Place
from xlbridge.audit.manifest.pairing import Pairing
from xlbridge.catalogue import CATALOGUE
from xlbridge.headless.nodes import Node, Reference, render
from xlbridge.headless.operands import NotEvaluated
from xlbridge.headless.shapes import parse


def check(pairing: Pairing) -> Iterator[Observation]:
    """Compare the names of the workbook, and look for the same names on its sheets."""
    for (_, name), text in pairing.twin.names.items():
        node = notation.moved(parse(text), "", pairing.alignment.area_from_twin)
        expected, found = render(node), pairing.book.names.get((None, name))
        written = _written(pairing, name)
        if found is None:
            words = f"the workbook has no name {written}"
            yield Observation("name_missing", Place(), words, expected)
        elif not _same(node, found):
            words = f"the name {written} leads to {found}, not to {expected}"
            yield Observation("name_moved", _place(node), words, expected, found)
    yield from _of_functions(pairing)
    for (sheet, name), text in pairing.book.names.items():
        if sheet is not None and (None, name) in pairing.twin.names:
            words = f"on sheet {sheet} the name {_written(pairing, name)} leads to {text}"
            yield Observation(
                "name_shadowed", Place(sheet), words, pairing.book.names.get((None, name), ""), text
            )


def _of_functions(pairing: Pairing) -> Iterator[Observation]:
    """A name that is written as one of our functions may be called in its stead."""
    for (sheet, name), text in pairing.book.names.items():
        if name.upper() in CATALOGUE:
            words = f"the name {name.upper()}, written as a function of ours, leads to {text}"
            yield Observation("name_shadowed", Place(sheet or ""), words, "", text)


def _same(expected: Node, found: str) -> bool:
    try:
        return notation.canonical(parse(found), "") == notation.canonical(expected, "")
    except NotEvaluated:
        return False


def _place(node: Node) -> Place:
    if isinstance(node, Reference) and node.sheet:
        return Place(node.sheet, str(node.bounds))
    return Place()


def _written(pairing: Pairing, name: str) -> str:
    """The name as the twin writes it."""
    names = pairing.twin.workbook.defined_names if pairing.twin.workbook else {}
    return next((known for known in names if known.casefold() == name), name)
