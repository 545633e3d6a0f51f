"""Rows of any sheet known by what they hold: the runs of equal ones that two issues have in common."""

from __future__ import annotations

from collections import defaultdict
from collections.abc import Collection, Iterator
from difflib import SequenceMatcher

from xlbridge.audit.align import SheetPair
from xlbridge.audit.template import TableRows
from xlbridge.headless.book import Book, Position
from xlbridge.headless.tokens import REFERENCE

#: what a row holds from left to right, formulas without their references
Signature = tuple[str, ...]


def equal_rows(old: Book, new: Book, pairs: Collection[SheetPair]) -> Iterator[TableRows]:
    """Pair the rows of each sheet that hold the same, in their order, by the longest runs of them."""
    for pair in pairs:
        left, right = _signatures(old, pair.twin), _signatures(new, pair.title)
        matcher = SequenceMatcher(None, list(left.values()), list(right.values()), autojunk=False)
        mine, there = list(left), list(right)
        for block in matcher.get_matching_blocks():
            for k in range(block.size):
                yield TableRows(pair.twin, "", mine[block.a + k], (there[block.b + k],))


def _signatures(book: Book, sheet: str) -> dict[int, Signature]:
    """The signature of each filled row, from the top."""
    contents: dict[Position, str] = {place: str(value) for place, value in book.constants[sheet].items()}
    contents |= {place: REFERENCE.sub("", f.text) for place, f in book.formulas[sheet].items()}
    found: dict[int, list[str]] = defaultdict(list)
    for (row, _), content in sorted(contents.items()):
        found[row].append(content)
    return {row: tuple(contents) for row, contents in found.items()}
