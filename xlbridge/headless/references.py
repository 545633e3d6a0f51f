"""Cell addresses: column letters, sheet names as a formula writes them, one cell's full address."""

from __future__ import annotations

import re
from functools import cache
from typing import Final, NamedTuple

MAX_ROWS: Final = 1_048_576
MAX_COLUMNS: Final = 16_384

_PLAIN_SHEET: Final = re.compile(r"[^\W\d][\w.]*\Z")
_LIKE_A_CELL: Final = re.compile(r"[A-Za-z]{1,3}\d+\Z")
_ADDRESS: Final = re.compile(r"\$?([A-Za-z]{1,3})\$?(\d{1,7})\Z")


@cache
def column_number(letters: str) -> int:
    """The number of a column from its letters.

    >>> column_number("A"), column_number("xfd")
    (1, 16384)
    """
    number = 0
    for letter in letters.upper():
        number = number * 26 + ord(letter) - 64
    return number


@cache
def column_letters(number: int) -> str:
    """The letters of a column from its number.

    >>> column_letters(28)
    'AB'
    """
    letters = ""
    while number:
        number, rest = divmod(number - 1, 26)
        letters = chr(65 + rest) + letters
    return letters


def parse_address(address: str) -> tuple[int, int]:
    """Row and column of an address such as ``B3`` or ``$B$3``; ``ValueError`` for anything else."""
    found = _ADDRESS.match(address.strip())
    row, column = (int(found[2]), column_number(found[1])) if found else (0, 0)
    if not (1 <= row <= MAX_ROWS and 1 <= column <= MAX_COLUMNS):
        raise ValueError(f"{address!r} is not a cell address such as B3")
    return row, column


def address_of(row: int, column: int) -> str:
    """The address of a cell on its sheet, ``B3``."""
    return f"{column_letters(column)}{row}"


def quote_sheet(sheet: str) -> str:
    """A sheet name as a formula writes it: in apostrophes where it needs them."""
    if _PLAIN_SHEET.match(sheet) and not _LIKE_A_CELL.match(sheet):
        return sheet
    return "'" + sheet.replace("'", "''") + "'"


class Cell(NamedTuple):
    """One cell of a workbook; its text is the full address, ``Sheet1!B3``."""

    sheet: str
    row: int
    column: int

    @property
    def address(self) -> str:
        """The address on its sheet, ``B3``."""
        return address_of(self.row, self.column)

    def __str__(self) -> str:
        return f"{quote_sheet(self.sheet)}!{self.address}"


class Bounds(NamedTuple):
    """A rectangle of cells on some sheet; rows and columns count from 1, both ends included."""

    top: int
    left: int
    bottom: int
    right: int

    @property
    def is_cell(self) -> bool:
        """Whether this is one single cell."""
        return self.top == self.bottom and self.left == self.right

    @property
    def size(self) -> int:
        """The number of cells."""
        return (self.bottom - self.top + 1) * (self.right - self.left + 1)

    def contains(self, row: int, column: int) -> bool:
        """Whether a cell lies in the rectangle."""
        return self.top <= row <= self.bottom and self.left <= column <= self.right

    def __str__(self) -> str:
        first = address_of(self.top, self.left)
        return first if self.is_cell else f"{first}:{address_of(self.bottom, self.right)}"


def parse_bounds(text: str) -> Bounds:
    """The rectangle of a text such as ``A1:B3`` or ``A1``."""
    first, _, last = text.partition(":")
    top, left = parse_address(first)
    bottom, right = parse_address(last or first)
    return Bounds(min(top, bottom), min(left, right), max(top, bottom), max(left, right))
