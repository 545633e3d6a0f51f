"""What is known of a workbook of our own: handed to the audit as data, by whoever knows the templates."""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import dataclass, field
from typing import Any

from xlbridge.headless.book import Book
from xlbridge.headless.references import Cell


@dataclass(frozen=True, slots=True)
class Headline:
    """One headline result and the cell that shows it."""

    name: str
    unit: str
    cell: Cell


@dataclass(frozen=True, slots=True)
class TableRows:
    """The rows of a table that count: on ``sheet`` of the twin they follow each other from ``first`` on."""

    sheet: str
    name: str
    first: int
    rows: tuple[int, ...]
    """The same rows in the workbook under audit."""

    @property
    def guards(self) -> tuple[int, int]:
        """The guard rows of the twin, above and below: ranges run from one to the other."""
        return self.first - 1, self.first + len(self.rows)


@dataclass(frozen=True, slots=True)
class Meaning:
    """What an entry or a result is: words, symbol, unit, and where it comes from if that is said."""

    text: str
    symbol: str
    unit: str
    source: str = ""


@dataclass(frozen=True)
class OwnTemplate:
    """A workbook of ours read back.

    ``inputs`` are the tables of its BUILDING.toml, ``results`` the results of its cells by symbol;
    ``places`` says in which cell a result or an entry stands, by its path (``direction.X.F_x[3]``, lists
    from 1), ``meanings`` what it is, ``entered`` which paths are entries; ``twin`` is the workbook built
    anew for the same inputs: the expected formulas, labels, formats and names. ``tables`` pairs the rows of
    tables; ``entries`` are the cells of the twin that the user fills in, ``checks`` those that judge the
    workbook, ``cautions`` those that say what it may be used for. ``unread`` says why the inputs cannot be
    read, where that is so: nothing else is known then.
    """

    inputs: Mapping[str, Any] = field(default_factory=dict)
    results: Mapping[str, Any] = field(default_factory=dict)
    places: Mapping[str, Cell] = field(default_factory=dict)
    meanings: Mapping[str, Meaning] = field(default_factory=dict)
    entered: frozenset[str] = frozenset()
    headlines: tuple[Headline, ...] = ()
    twin: Book | None = None
    tables: tuple[TableRows, ...] = ()
    entries: frozenset[Cell] = frozenset()
    checks: frozenset[Cell] = frozenset()
    cautions: frozenset[Cell] = frozenset()
    unread: str = ""
