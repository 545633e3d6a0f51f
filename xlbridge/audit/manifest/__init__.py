"""(d) The rest of the workbook built anew: labels, names, formats, marks, entry rules, pages."""

from __future__ import annotations

from typing import Final

from xlbridge.audit.finding import Checked, NotChecked
from xlbridge.audit.manifest import entry_rules, formats, labels, marks, names, page
from xlbridge.audit.manifest.pairing import Pairing
from xlbridge.audit.subject import Subject

PARTS: Final = (labels.check, names.check, formats.check, marks.check, entry_rules.check, page.check)


def check(subject: Subject) -> Checked:
    """Compare everything that is no formula with the twin."""
    own = subject.own
    if own is None or own.twin is None:
        why = own.unread if own else "the workbook is not laid out as one of ours"
        return Checked("manifest", 0, not_checked=(NotChecked("expected labels and formats", why),))
    pairing = Pairing(subject, own, own.twin)
    seen = tuple(observation for part in PARTS for observation in part(pairing))
    return Checked("manifest", len(pairing.cells), seen)
