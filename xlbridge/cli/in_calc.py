"""A workbook recalculated in LibreOffice Calc; its values are stored by us, never by Calc's own save."""

from __future__ import annotations

from pathlib import Path

from xlbridge.calc import office, recalculate
from xlbridge.cli.failure import Refusal
from xlbridge.headless.book import Book
from xlbridge.headless.compute import Computed
from xlbridge.headless.evaluate import CellResult, Evaluator, Results
from xlbridge.headless.store import store

NO_VALUE = "LibreOffice Calc gave no value for the cell"


def in_calc(source: Path, target: Path, force: bool = False) -> Computed:
    """Recalculate every formula cell in Calc and write a copy that stores the values."""
    evaluator = Evaluator(Book.open(source), {})
    try:
        values = recalculate.values(source)
    except office.OfficeError as error:
        raise refusal(error) from error
    found = []
    for cell in evaluator.book.formula_cells():
        known = (cell.sheet, cell.address) in values
        value = values.get((cell.sheet, cell.address))
        found.append(CellResult(cell, value, None if known else NO_VALUE))
    computed = Computed(evaluator, Results(tuple(found)))
    store(source, target, computed.values, force=force)
    return computed


def refusal(error: office.OfficeError) -> Refusal:
    """Return what a user should read where the office cannot be asked."""
    remedy = f"install it, or name its program folder in the variable {office.PROGRAM}"
    return Refusal(f"{error}; {remedy}" if office.missing() else str(error))
