"""The printed tables as data files, in printed units, with their source and confidence.

Each file opens with ``# key: text`` lines (title, source, confidence, lookup), then plain CSV as printed.
A blank cell is a gap and is refused when the file is read; only remarks may be blank. The lookup policy is
stated in the file and carried out here: exact words, or linear between the rows and level beyond the ends.
"""

from __future__ import annotations

import csv
from collections.abc import Mapping
from dataclasses import dataclass
from functools import cache
from importlib.resources import files
from typing import Final

import numpy as np

from engine.errors import NotApplicable
from engine.require import Array, choice

MAY_BE_BLANK: Final = frozenset({"note"})


@dataclass(frozen=True, slots=True)
class Table:
    """A printed table: what its file says about it, and its rows as printed (text)."""

    name: str
    about: Mapping[str, str]
    rows: tuple[Mapping[str, str], ...]

    @property
    def keys(self) -> tuple[str, ...]:
        """The entries of the first column, in printed order."""
        first = next(iter(self.rows[0]))
        return tuple(dict.fromkeys(row[first] for row in self.rows))

    def column(self, name: str) -> Array:
        """Return a column as numbers."""
        return np.array([float(row[name]) for row in self.rows])

    def entry(self, argument: str, key: str, column: str) -> float:
        """Return the number in a row named by its first column; refuse a row that is not in the table."""
        word = choice(argument, key, self.keys, self.about.get("title", ""))
        if column not in self.rows[0]:
            raise NotApplicable("column", column, f"not in the table {self.name}")
        return float(self.rows[self.keys.index(word)][column])


@cache
def table(name: str) -> Table:
    """Return a table by the name of its file.

    >>> table("importance_factor").keys
    ('I', 'II', 'III', 'IV')
    """
    return parse(name, (files(__name__) / f"{name}.csv").read_text(encoding="utf-8"))


def parse(name: str, text: str) -> Table:
    """Read a table from its text; refuse gaps, rows of uneven length and a table without rows."""
    lines = text.splitlines()
    about = dict(line[1:].strip().split(": ", 1) for line in lines if line.startswith("#"))
    header, *body = csv.reader(line for line in lines if line and not line.startswith("#"))
    if not body:
        raise ValueError(f"{name}: no rows")
    for number, row in enumerate(body, start=1):
        _refuse_gap(name, number, header, row)
    return Table(name, about, tuple(dict(zip(header, row, strict=True)) for row in body))


def _refuse_gap(name: str, number: int, header: list[str], row: list[str]) -> None:
    if len(row) != len(header):
        raise ValueError(f"{name}: row {number} has {len(row)} cells, {len(header)} are due")
    for column, cell in zip(header, row, strict=True):
        if not cell.strip() and column not in MAY_BE_BLANK:
            raise ValueError(f"{name}: row {number} has no {column}")
