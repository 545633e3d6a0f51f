"""What the file says of its sheets' extents."""

from __future__ import annotations

import re
from pathlib import Path

import pytest

from tests.support import hostile
from tests.support.audited import audited, computed_book
from tests.support.office import Office
from xlbridge.audit import extent
from xlbridge.audit.finding import Checked
from xlbridge.audit.subject import Subject
from xlbridge.cli.own_template import own_template


def checked(tmp_path: Path, declared: bytes) -> Checked:
    """The outcome for a small sheet with content in A1:C1 that declares this extent."""
    path = tmp_path / "book.xlsx"
    path.write_bytes(
        hostile.changed(
            hostile.SHEET,
            lambda p: re.sub(rb"<dimension[^>]*>", b'<dimension ref="%s"/>' % declared, p),
        )
    )
    return extent.check(Subject.open(path, own_template))


@pytest.mark.parametrize(
    ("declared", "words"),
    [
        (b"A1", "A1, but B1 has content"),
        (b"A1:B1", "A1:B1, but C1 has content"),
        (b"everything", "'everything', which is no range"),
    ],
)
def test_a_false_extent_is_found(tmp_path: Path, declared: bytes, words: str) -> None:
    (seen,) = checked(tmp_path, declared).observations
    assert (seen.kind, seen.found) == ("false_extent", declared.decode())
    assert words in seen.words


@pytest.mark.parametrize("declared", [b"A1:C1", b"A1:Z100", b"A1:XFD1048576"])
def test_an_extent_with_blanks_is_none(tmp_path: Path, declared: bytes) -> None:
    outcome = checked(tmp_path, declared)
    assert (outcome.looked_at, outcome.observations) == (1, ())


def test_workbooks_saved_by_spreadsheet_programs_have_none(tmp_path: Path, office: Office) -> None:
    path = computed_book(tmp_path)
    with office.open(path, recalculate=False) as book:
        saved = book.store(tmp_path / "calc.xlsx")
    for each in (path, saved):
        outcome = audited(each)
        (looked,) = [c.looked_at for c in outcome.checks if c.method == "extent"]
        assert looked == len(outcome.subject.book.sheets)
        assert "false_extent" not in {f.kind.key for f in outcome.findings}
