"""(x) Whether the cells of each sheet lie in the range that the file says the sheet uses."""

from __future__ import annotations

from collections.abc import Iterator
from typing import Final

from xlbridge.audit.finding import Checked, Observation, Place
from xlbridge.audit.subject import Subject
from xlbridge.headless.book import Book
from xlbridge.headless.references import address_of, parse_bounds
from xlbridge.headless.stored_values import read_extents

KIND: Final = "false_extent"


def check(subject: Subject) -> Checked:
    """Compare what the file declares of each sheet with the cells it holds."""
    book = subject.book
    declared = read_extents(book.data) if book.data else {}
    seen = (Observation(KIND, Place(s), w, found=t) for s, t in declared.items() for w in _false(book, s, t))
    return Checked("extent", len(declared), tuple(seen))


def _false(book: Book, sheet: str, declared: str) -> Iterator[str]:
    """Yield what is false in it; one that is too large is none, as Calc declares all rows of some sheets."""
    try:
        bounds = parse_bounds(declared)
    except ValueError:
        yield f"the file says that the sheet uses {declared!r}, which is no range"
        return
    written = {(f.cell.row, f.cell.column) for f in book.formulas.get(sheet, {}).values()}
    used = sorted(written | set(book.constants.get(sheet, {})))
    outside = [position for position in used if not bounds.contains(*position)]
    if outside:
        yield f"the file says that the sheet uses {declared}, but {address_of(*outside[0])} has content"
