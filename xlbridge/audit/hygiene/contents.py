"""Contents that are not what they look like: numbers that are texts among numbers."""

from __future__ import annotations

import re
from collections.abc import Iterator
from typing import Final

from xlbridge.audit.finding import Observation, Place
from xlbridge.audit.subject import Subject
from xlbridge.headless.book import Book, Position
from xlbridge.headless.references import Cell

_NUMBER: Final = re.compile(
    r"[\s'’\u00a0]*[-+−]?(\d[\d\s'’\u00a0]*([.,]\d+)*|[.,]\d+)([eE][-+]?\d+)?\s*%?[\s\u00a0]*"
)


def check(subject: Subject) -> Iterator[Observation]:
    """Yield every text that looks like a number and has a number right above or below it."""
    names = _names(subject)
    for sheet in subject.book.sheets:
        for (row, column), value in subject.book.constants[sheet].items():
            cell = Cell(sheet, row, column)
            if not isinstance(value, str) or cell in names or not _NUMBER.fullmatch(value):
                continue
            if any(_is_number(subject.book, sheet, (row + step, column)) for step in (-1, 1)):
                words = f"the text {value!r} stands among numbers"
                cause = f"{sheet} {column}"
                yield Observation("number_as_text", Place.of(cell), words, found=value, cause=cause)


def _names(subject: Subject) -> frozenset[Cell]:
    """The cells that hold names: a level may be called 8, among others that are."""
    places = subject.own.places if subject.own else {}
    return frozenset(cell for path, cell in places.items() if path.endswith(".name"))


def _is_number(book: Book, sheet: str, position: Position) -> bool:
    if position in book.formulas[sheet]:
        return isinstance(book.stored(Cell(sheet, *position)), float)
    return isinstance(book.constants[sheet].get(position), float)
