"""The work of each formula cell: its equation, the numbers put in, the clause, the value by each route."""

from __future__ import annotations

from collections.abc import Iterator, Mapping
from dataclasses import dataclass
from typing import Any, Final

from openpyxl.formula.translate import Translator

from xlbridge import work
from xlbridge.audit.paths import find
from xlbridge.audit.subject import Subject, Unsolved
from xlbridge.catalogue import CATALOGUE
from xlbridge.headless.references import Cell
from xlbridge.headless.trace import Trace, TracedCall, trace
from xlbridge.values import CellError, Scalar

#: a place far from every edge: formulas written there are equal where they are copies of each other
FAR: Final = "AZZ500000"


@dataclass(frozen=True, slots=True)
class Step:
    """One call of a worksheet function: in symbols, with the numbers, and where the standard has it."""

    symbols: str
    numbers: str
    clause: str


@dataclass(frozen=True, slots=True)
class Work:
    """How a cell came to its value; ``path`` names it where the template knows it."""

    cell: Cell
    path: str
    formula: str
    reads: str
    steps: tuple[Step, ...]
    value: Scalar
    stored: Scalar
    model: Any
    typical: bool
    """The first of its copies: with it and the exceptions, a print shows every formula once."""


def works(subject: Subject) -> Iterator[Work]:
    """Show the work of every formula cell, in the order of the workbook."""
    edition = subject.own.inputs.get("edition") if subject.own else None
    paths = {cell: path for path, cell in subject.own.places.items()} if subject.own else {}
    model = _model(subject)
    seen: set[tuple[str, str]] = set()
    for cell in subject.book.formula_cells():
        shape = (cell.sheet, _shape(subject, cell))
        path = paths.get(cell, "")
        yield _work(subject, cell, path, edition, find(model, path), shape not in seen)
        seen.add(shape)


def from_inputs(subject: Subject, cell: Cell) -> Any:
    """Return what the inputs alone give for the result that a cell shows; nothing where it shows none."""
    if subject.own is None:
        return None
    shown = trace(subject.evaluator, cell.sheet, cell.address).precedents
    places = {str(place): path for path, place in subject.own.places.items()}
    paths = [places.get(precedent.address, "") for precedent in shown]
    return find(_model(subject), paths[0]) if len(paths) == 1 else None


def _model(subject: Subject) -> Mapping[str, Any]:
    try:
        return subject.model
    except Unsolved:
        return {}


def _shape(subject: Subject, cell: Cell) -> str:
    formula = subject.book.formula(cell)
    text = formula.text if formula else ""
    return str(Translator(f"={text.removeprefix('=')}", cell.address).translate_formula(FAR))


def _work(subject: Subject, cell: Cell, path: str, edition: str | None, model: Any, typical: bool) -> Work:
    found = trace(subject.evaluator, cell.sheet, cell.address)
    return Work(
        cell,
        path,
        found.formula,
        _reads(found),
        tuple(_step(call, edition) for call in found.calls),
        found.value
        if not isinstance(found.value, tuple)
        else subject.results.values.get((cell.sheet, cell.address)),
        subject.book.stored(cell),
        model,
        typical,
    )


def _reads(found: Trace) -> str:
    return ", ".join(f"{p.label} = {work.shown(p.value)}" for p in found.precedents)


def _step(call: TracedCall, edition: str | None) -> Step:
    entry = CATALOGUE[call.name]
    rule = entry.clauses.get(edition) if edition else None
    clauses = [rule] if rule else entry.clauses.values()
    failed = isinstance(call.result, CellError)
    numbers = str(call.result) if failed else work.numbers_line(entry, call.arguments, call.result)
    places = "; ".join(f"{c.standard} {c}{f' ({c.note})' if c.note else ''}" for c in clauses)
    return Step(work.equation(entry), numbers, places)
