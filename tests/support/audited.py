"""Workbooks under audit: computed, changed through the library that writes them, opened again."""

from __future__ import annotations

from collections.abc import Callable, Sequence
from pathlib import Path
from typing import Any

import openpyxl
from openpyxl import Workbook

from tests.support.story_books import story_book
from xlbridge.audit.acceptance import Acceptance
from xlbridge.audit.audit import Audit, audit
from xlbridge.audit.subject import Subject
from xlbridge.cli.own_template import own_template
from xlbridge.headless.compute import compute_into


def computed_book(folder: Path, given: dict[str, Any] | None = None, level_count: int = 6) -> Path:
    """A story workbook with its values stored; drift and stability are in unless other parts are given."""
    entries = {"edition": "7-22", "units": "us", "parts": ["drift"], **(given or {})}
    drawn, path = story_book(folder, entries, level_count, "drawn.xlsx"), folder / "story.xlsx"
    compute_into(drawn, path, force=True)
    return path


def changed(path: Path, change: Callable[[Workbook], object], recalculated: bool = True) -> Path:
    """Save a changed copy; its values are computed anew, or there are none."""
    workbook = openpyxl.load_workbook(path)
    change(workbook)
    saved, target = path.with_name("saved.xlsx"), path.with_name("changed.xlsx")
    workbook.save(saved)
    if recalculated:
        compute_into(saved, target, force=True)
        return target
    return saved


def opened(path: Path, against: Path | None = None) -> Subject:
    """A workbook as the command opens it for its audit; ``against`` is its checked issue."""
    return Subject.open(path, own_template, against)


def audited(path: Path, against: Path | None = None, acceptances: Sequence[Acceptance] = ()) -> Audit:
    """The audit of a workbook, as the command makes it."""
    return audit(opened(path, against), acceptances)


def kinds_at(outcome: Audit) -> dict[str, set[str]]:
    """The kinds of the findings by the places they name."""
    found: dict[str, set[str]] = {}
    for finding in outcome.findings:
        for place in finding.places:
            found.setdefault(str(place), set()).add(finding.kind.key)
    return found
