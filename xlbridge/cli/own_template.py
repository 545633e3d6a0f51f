"""What the templates know of a workbook, as data for the audit, which knows no template."""

from __future__ import annotations

import re
from collections.abc import Iterator, Mapping
from dataclasses import replace
from typing import Any, Final

from engine.errors import EngineError
from engine.units import symbol
from workbook_templates import layout, places
from workbook_templates.declare import Quantity
from workbook_templates.draw import cover
from workbook_templates.read import Ask, Reader
from xlbridge.audit.align import area_of
from xlbridge.audit.template import Headline, Meaning, OwnTemplate
from xlbridge.cli import twin
from xlbridge.headless.book import Book
from xlbridge.headless.evaluate import Evaluator
from xlbridge.headless.operands import NotEvaluated
from xlbridge.headless.references import Cell
from xlbridge.values import CellError, Scalar, Value

#: the path of an entry in a row of a table
_ROW: Final = re.compile(r"(\w+)\[(\d+)\]\.")
#: names that every workbook of ours has; one that lost some of them is ours still
MARKS: Final = ("edition", "units", layout.STORY_TABLE.name, "job_title", "workbook_status", "base_elevation")
ENOUGH: Final = 4


def own_template(evaluator: Evaluator) -> OwnTemplate | None:
    """Return what is known of a workbook of ours, or nothing where it is another's."""
    book = evaluator.book
    if sum((None, mark) in book.names for mark in MARKS) < ENOUGH:
        return None
    try:
        return _known(Reader(_asking(evaluator)), book)
    except (EngineError, ValueError) as error:
        return _unread(Reader(_asking(evaluator), lenient=True), book, str(error))


def _asking(evaluator: Evaluator) -> Ask:
    """Answers that give a named area cell by cell: one without a value does not take the others along."""

    def held(sheet: str, row: int, column: int) -> Scalar:
        try:
            return evaluator.value(sheet, row, column)
        except NotEvaluated as reason:
            return CellError("#N/A", str(reason))

    def ask(text: str) -> Value:
        try:
            return evaluator.evaluate_text(text)
        except NotEvaluated:
            area = area_of(evaluator.book.names.get((None, text.removeprefix("=").casefold()), ""))
            if area is None:
                raise
        sheet, b = area
        columns = range(b.left, b.right + 1)
        grid = tuple(tuple(held(sheet, row, c) for c in columns) for row in range(b.top, b.bottom + 1))
        return grid[0][0] if b.is_cell else grid

    return ask


def _known(reader: Reader, book: Book) -> OwnTemplate:
    inputs, results = reader.inputs(), reader.results()
    entered = places.entries(reader, book)
    known = {**entered, **places.results(reader, book)}
    return replace(
        _beside_twin(reader, book, inputs),
        inputs=inputs,
        results=results,
        places={path: place.cell for path, place in known.items()},
        meanings={path: _meaning(inputs, path, place.quantity) for path, place in known.items()},
        entered=frozenset(entered),
    )


def _unread(reader: Reader, book: Book, why: str) -> OwnTemplate:
    """What is known of a workbook whose inputs cannot be read: its twin, as far as it can be told."""
    try:
        return replace(_beside_twin(reader, book, reader.inputs()), unread=why)
    except (EngineError, ValueError, KeyError, TypeError):
        return OwnTemplate(unread=why)  # too little is left of it


def _beside_twin(reader: Reader, book: Book, inputs: Mapping[str, Any]) -> OwnTemplate:
    made = twin.twin(reader, book, inputs)
    return OwnTemplate(
        headlines=tuple(_headlines(reader, book)),
        twin=made,
        tables=tuple(twin.tables(reader, book)),
        entries=frozenset(twin.entries(made)),
        checks=frozenset(twin.checks(made)),
        cautions=frozenset(twin.cautions(made)),
    )


def _meaning(inputs: Mapping[str, Any], path: str, q: Quantity) -> Meaning:
    """What a quantity is; a row of a table says once where its entries come from."""
    unit = symbol(q.unit, inputs["units"]).replace("text", "")
    row = _ROW.match(path)
    source = inputs[row[1]][int(row[2]) - 1].get("source") if row else inputs.get("sources", {}).get(q.key)
    return Meaning(q.text, q.shown_symbol, unit, str(source or ""))


def _headlines(reader: Reader, book: Book) -> Iterator[Headline]:
    """The lines of results on the cover, found by their text."""
    units = str(reader.ask("=units"))
    rows = {text: row for (row, column), text in book.constants[layout.COVER].items() if column == 1}
    for line in (line for part in reader.layout.parts for line in part.headlines):
        text = cover.headline_text(line, units)
        for direction, column in cover.HEADLINE_COLUMN.items() if text in rows else ():
            name = f"{line.text}, direction {direction}"
            yield Headline(name, symbol(line.unit, units), Cell(layout.COVER, rows[text], column))
