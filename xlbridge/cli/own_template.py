"""What the templates know of a workbook, as data for the audit, which knows no template."""

from __future__ import annotations

from collections.abc import Iterator
from typing import Final

from engine.errors import EngineError
from engine.units import symbol
from workbook_templates import layout, places
from workbook_templates.draw import cover
from workbook_templates.read import Reader, ReadError
from xlbridge.audit.template import Headline, OwnTemplate
from xlbridge.cli import twin
from xlbridge.headless.book import Book
from xlbridge.headless.evaluate import Evaluator
from xlbridge.headless.references import Cell

#: the names that every workbook of ours has
MARKS: Final = ("edition", "units", layout.STORY_TABLE.name)


def own_template(evaluator: Evaluator) -> OwnTemplate | None:
    """Return what is known of a workbook of ours, or nothing where it is another's."""
    book = evaluator.book
    if not all((None, mark) in book.names for mark in MARKS):
        return None
    reader = Reader(evaluator.evaluate_text)
    try:
        inputs = reader.inputs()
        made = twin.twin(reader, book, inputs)
        return OwnTemplate(
            inputs,
            reader.results(),
            {**places.entries(reader, book), **places.results(reader, book)},
            tuple(_headlines(reader, book)),
            made,
            tuple(twin.tables(reader, book)),
            frozenset(twin.entries(made)),
            frozenset(twin.checks(made)),
            frozenset(twin.cautions(made)),
        )
    except (ReadError, EngineError) as error:
        return OwnTemplate(unread=str(error))


def _headlines(reader: Reader, book: Book) -> Iterator[Headline]:
    """The lines of results on the cover, found by their text."""
    units = str(reader.ask("=units"))
    rows = {text: row for (row, column), text in book.constants[layout.COVER].items() if column == 1}
    for line in (line for part in reader.layout.parts for line in part.headlines):
        text = cover.headline_text(line, units)
        for direction, column in cover.HEADLINE_COLUMN.items() if text in rows else ():
            name = f"{line.text}, direction {direction}"
            yield Headline(name, symbol(line.unit, units), Cell(layout.COVER, rows[text], column))
