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


@dataclass(frozen=True)
class OwnTemplate:
    """A workbook of ours read back.

    ``inputs`` are the tables of its BUILDING.toml, ``results`` the results of its cells by symbol;
    ``places`` says in which cell a result or an entry stands, by its path (``direction.X.F_x[3]``, lists
    from 1); ``twin`` is the workbook built anew for the same inputs: the expected formulas, labels, formats
    and names. ``unread`` says why the inputs cannot be read, where that is so: nothing else is known then.
    """

    inputs: Mapping[str, Any] = field(default_factory=dict)
    results: Mapping[str, Any] = field(default_factory=dict)
    places: Mapping[str, Cell] = field(default_factory=dict)
    headlines: tuple[Headline, ...] = ()
    twin: Book | None = None
    unread: str = ""
