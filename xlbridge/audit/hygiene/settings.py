"""How the workbook calculates, and what it carries besides cells."""

from __future__ import annotations

import io
import re
import zipfile
from collections.abc import Iterator
from typing import Final

from xlbridge.audit.finding import Observation, Place
from xlbridge.audit.subject import Subject

#: parts of a package that act, or that come from elsewhere
ACTIVE: Final = {
    "macros": re.compile(r"vbaProject|macrosheets", re.IGNORECASE),
    "embedded objects": re.compile(r"xl/embeddings/", re.IGNORECASE),
    "controls": re.compile(r"xl/(activeX|ctrlProps)/", re.IGNORECASE),
    "connections": re.compile(r"xl/(connections\.xml|queryTables/)", re.IGNORECASE),
}


def check(subject: Subject) -> Iterator[Observation]:
    """Yield what the settings do to the numbers, and what is in the file besides cells."""
    workbook = subject.book.workbook
    if workbook is not None:
        calculation = workbook.calculation
        if calculation.calcMode not in (None, "auto"):
            words = f"the calculation is set to {calculation.calcMode}"
            yield Observation("calculation_manual", Place(), words, "auto", str(calculation.calcMode))
        if calculation.iterate:
            words = f"iterative calculation is on, up to {calculation.iterateCount or 100} steps"
            yield Observation("iteration_on", Place(), words, "off", "on")
        if calculation.fullPrecision is False:
            yield Observation("precision_as_displayed", Place(), "precision as displayed is on", "off", "on")
    if subject.book.counts_from_1904:
        yield Observation("dates_from_1904", Place(), "the workbook counts its dates from 1904")
    yield from _active(subject.book.data)


def _active(data: bytes) -> Iterator[Observation]:
    if not data:
        return
    with zipfile.ZipFile(io.BytesIO(data)) as archive:
        names = archive.namelist()
    for what, pattern in ACTIVE.items():
        found = [name for name in names if pattern.search(name)]
        if found:
            yield Observation("active_content", Place(), f"the file carries {what}: {', '.join(found[:3])}")
