"""Addresses in a workbook with levels and drift, and changes at them, for tests of the audit."""

from __future__ import annotations

import re
from collections.abc import Callable

from openpyxl import Workbook

from workbook_templates.layout import FIRST_LEVEL, Layout
from workbook_templates.parts import with_required

COUNT = 6
LAYOUT = Layout(COUNT, with_required(("drift",)))
LAST = FIRST_LEVEL + COUNT - 1

Change = Callable[[Workbook], object]


def levels(key: str, direction: str | None = None, row: int = FIRST_LEVEL + 2) -> str:
    """A cell of the story table."""
    return f"Levels!{LAYOUT.column(key, direction)}{row}"


def criteria(key: str, direction: str | None = None) -> str:
    """A value of the criteria sheet."""
    return f"Criteria!{LAYOUT.criteria_cell(key, direction)}".replace("$", "")


def put(place: str, value: object) -> Change:
    """Put a value or a formula into a cell."""
    sheet, address = place.split("!")
    return lambda book: book[sheet].__setitem__(address, value)


def style(place: str, **what: object) -> Change:
    """Set attributes of a cell."""
    sheet, address = place.split("!")
    return lambda book: [setattr(book[sheet][address], key, value) for key, value in what.items()]


def rewrite(place: str, pattern: str, text: str) -> Change:
    """Change the formula of a cell; a pattern that it does not have is a fault of the test."""
    sheet, address = place.split("!")

    def change(book: Workbook) -> None:
        old = book[sheet][address].value
        new, count = re.subn(pattern, text, old, count=1)
        assert count == 1, (place, old)
        book[sheet][address] = new

    return change


def both(*changes: Change) -> Change:
    """One change after the other."""
    return lambda book: [change(book) for change in changes]
