"""(d) What misleads in any workbook, whoever made it: no template is needed to see it."""

from __future__ import annotations

from typing import Final

from xlbridge.audit.finding import Checked
from xlbridge.audit.hygiene import contents, drawings, formulas, marks, seen, settings
from xlbridge.audit.subject import Subject

METHOD: Final = "hygiene"
RULES: Final = (settings.check, seen.check, marks.check, drawings.check, formulas.check, contents.check)


def check(subject: Subject) -> Checked:
    """Look at the settings, at what can be seen, at the formulas and at the contents of the cells."""
    found = tuple(observation for rule in RULES for observation in rule(subject))
    book = subject.book
    looked_at = sum(map(len, book.formulas.values())) + sum(map(len, book.constants.values()))
    return Checked(METHOD, looked_at + len(book.names) + len(book.sheets), found)
