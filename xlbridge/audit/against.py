"""(g) Against the last issue that was checked: everything that differs from it is to be looked at again."""

from __future__ import annotations

from typing import Final

from xlbridge.audit.compare.change import Change, Of
from xlbridge.audit.compare.changes import Issues
from xlbridge.audit.finding import Checked, NotChecked, Observation, Place
from xlbridge.audit.subject import Subject
from xlbridge.headless.nodes import render_value
from xlbridge.values import CellError

METHOD: Final = "against"
KINDS: Final = {
    Of.INPUT: "input_changed",
    Of.ROW: "row_changed",
    Of.FORMULA: "formula_changed",
    Of.FORMAT: "format_changed",
}


def check(subject: Subject) -> Checked:
    """Compare the workbook with its checked issue, where there is one."""
    checked = subject.checked
    if checked is None:
        return Checked(METHOD, 0)
    issues = Issues.of(checked, subject)
    changes = [*issues.inputs(), *issues.cells()]
    looked_at = sum(map(len, subject.book.constants.values())) + sum(map(len, subject.book.formulas.values()))
    unread = [own.unread for own in (checked.own, subject.own) if own and own.unread]
    missing = tuple(NotChecked("inputs against the checked issue", why) for why in unread)
    return Checked(METHOD, looked_at, tuple(map(_observed, changes)), missing)


def _observed(change: Change) -> Observation:
    place = Place.of(change.cell) if change.cell else Place()
    kind = KINDS.get(change.of, "content_changed")
    if change.of in (Of.ROW, Of.LINE):
        return Observation(kind, place, change.words, cause=change.cause)
    old, new = (_written(value) for value in (change.moved or change.old, change.new))
    return Observation(kind, place, change.words, old, new, cause=change.cause)


def _written(value: object) -> str:
    """A content as a formula writes it, so that it can be put back; a flag as the yes or no of its cell."""
    if value is None:
        return ""
    if isinstance(value, bool):
        return render_value("yes" if value else "no")
    if isinstance(value, CellError | list) or (isinstance(value, str) and value.startswith("=")):
        return str(value)
    return render_value(float(value) if isinstance(value, int) else value)
