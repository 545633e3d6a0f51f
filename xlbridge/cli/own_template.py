"""What the templates know of a workbook, as data for the audit, which knows no template."""

from __future__ import annotations

from collections.abc import Iterator, Mapping
from typing import Any, Final

from engine.errors import EngineError
from engine.units import symbol
from workbook_templates import layout, places
from workbook_templates.build import draw, draw_native
from workbook_templates.draw import cover
from workbook_templates.read import Reader, ReadError
from xlbridge.audit.template import Headline, OwnTemplate
from xlbridge.headless.book import Book
from xlbridge.headless.compute import FUNCTIONS, Computed
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
        return OwnTemplate(
            inputs,
            reader.results(),
            {**places.entries(reader, book), **places.results(reader, book)},
            tuple(_headlines(reader, book)),
            _twin(inputs, is_issue_copy(book)),
        )
    except (ReadError, EngineError) as error:
        return OwnTemplate(unread=str(error))


def is_issue_copy(book: Book) -> bool:
    """Whether a workbook of ours is written in built-in functions."""
    return not any("ELF_" in f.text for formulas in book.formulas.values() for f in formulas.values())


def _twin(inputs: Mapping[str, Any], issue: bool) -> Book:
    drawn = Book.of(draw(inputs))
    if not issue:
        return drawn
    evaluator = Evaluator(drawn, FUNCTIONS)
    return Book.of(draw_native(inputs, Computed(evaluator, evaluator.evaluate_all()).values))


def _headlines(reader: Reader, book: Book) -> Iterator[Headline]:
    """The lines of results on the cover, found by their text."""
    units = str(reader.ask("=units"))
    rows = {text: row for (row, column), text in book.constants[layout.COVER].items() if column == 1}
    for line in (line for part in reader.layout.parts for line in part.headlines):
        text = cover.headline_text(line, units)
        for direction, column in cover.HEADLINE_COLUMN.items() if text in rows else ():
            name = f"{line.text}, direction {direction}"
            yield Headline(name, symbol(line.unit, units), Cell(layout.COVER, rows[text], column))
