"""Compute a workbook with no spreadsheet program: the evaluator, given the catalogue's functions."""

from __future__ import annotations

import gc
from collections.abc import Callable, Iterator, Mapping, Sequence
from contextlib import contextmanager
from dataclasses import dataclass
from functools import partial
from pathlib import Path
from typing import Any

from xlbridge import adapter
from xlbridge.catalogue import CATALOGUE
from xlbridge.headless.book import Book
from xlbridge.headless.evaluate import Evaluator, Results
from xlbridge.headless.store import store
from xlbridge.values import Argument, CellError, Scalar, Value

FUNCTIONS: Mapping[str, Callable[[Sequence[Argument]], Value]] = {
    name: partial(adapter.call, entry) for name, entry in CATALOGUE.items()
}
NOT_EVALUATED = "#N/A"


@dataclass(frozen=True, slots=True)
class Computed:
    """What became of a workbook's formula cells."""

    evaluator: Evaluator
    results: Results

    @property
    def values(self) -> dict[tuple[str, str], Scalar]:
        """What is stored: a cell that was not evaluated holds an error value, never an old number."""
        missing = {(c.sheet, c.address): CellError(NOT_EVALUATED) for c in self.results.not_evaluated}
        return {**self.results.values, **missing}

    @property
    def errors(self) -> list[dict[str, str]]:
        """The cells that hold an error value, with the reason."""
        return [
            {"cell": str(r.cell), "error": r.value.code, "reason": r.value.reason}
            for r in self.results.cells
            if isinstance(r.value, CellError)
        ]

    @property
    def not_evaluated(self) -> list[dict[str, str]]:
        """The cells that were not evaluated, with the reason."""
        return [{"cell": str(cell), "reason": why} for cell, why in self.results.not_evaluated.items()]

    def summary(self) -> dict[str, Any]:
        """Return the counts and the lists of what went wrong."""
        cells = len(self.results.cells)
        missing = self.not_evaluated
        return {
            "formula_cells": cells,
            "computed": cells - len(missing),
            "errors": self.errors,
            "not_evaluated": missing,
        }


def open_workbook(path: Path) -> Evaluator:
    """Return the evaluator of a workbook file."""
    return Evaluator(Book.open(path), FUNCTIONS)


def compute(path: Path) -> Computed:
    """Evaluate every formula cell of a workbook."""
    with _no_collection():
        evaluator = open_workbook(path)
        return Computed(evaluator, evaluator.evaluate_all())


@contextmanager
def _no_collection() -> Iterator[None]:
    """Keep the collector of cycles from walking through all cells again and again: none is garbage yet."""
    was_enabled = gc.isenabled()
    gc.disable()
    try:
        yield
    finally:
        if was_enabled:
            gc.enable()


def compute_into(source: Path, target: Path, force: bool = False) -> Computed:
    """Evaluate a workbook and write a copy that stores the values."""
    computed = compute(source)
    store(source, target, computed.values, force=force)
    return computed
