"""The marked copy: the audited workbook, a note on each cell of a finding, and two sheets to answer in."""

from __future__ import annotations

import textwrap
from collections import defaultdict
from collections.abc import Iterable, Iterator, Mapping
from datetime import datetime
from typing import Any, Final

from engine.version import __version__
from xlbridge.audit.audit import Audit
from xlbridge.audit.finding import Finding, Observation, Place
from xlbridge.audit.methods import summary
from xlbridge.audit.record import ROLES, Answer, Person, Record, key_of
from xlbridge.audit.report.page import CAUTIONS, SIGNS, filled_entries, program, shown, verdict
from xlbridge.headless.added_sheets import Look, Row, Sheet, Shown, add_sheets
from xlbridge.headless.notes import put_notes, shortened
from xlbridge.headless.package import Package
from xlbridge.headless.references import Cell, parse_address
from xlbridge.values import Scalar

AUTHOR: Final = "Storyledger audit"
FINDINGS: Final = "Audit findings"
RECORD: Final = "Check record"
#: letters of one finding in a note; the sheet of findings has the rest
_NOTE: Final = 900
#: letters that fit on one line across a sheet
_LINE: Final = 140
_FINDING_COLUMNS: Final = {
    "no.": 5, "severity": 10, "kind": 19, "cell": 13, "what": 28, "expected": 23, "found": 23, "stored": 11,
    "recomputed": 12, "clause": 9, "what it does to the results": 27, "what to do": 27, "response": 19,
    "closed (initials, date)": 11,
}  # fmt: skip
_RECORD_WIDTHS: Final = (28, 46, 17, 14, 28, 10, 24)


def marked(audit: Audit, record: Record | None = None, made: datetime | None = None) -> bytes:
    """Return the marked copy of the audited workbook; formulas and values in it are those of the file."""
    said, package = record or Record(), Package(audit.subject.book.data)
    for sheet, notes in notes_of(audit).items():
        if sheet in package.sheets:
            put_notes(package, sheet, notes, AUTHOR)
    footer = f"{shortened(audit.subject.path.name, 60)}, SHA-256 {audit.subject.sha256[:12]}…"
    top = [*_titled(FINDINGS, audit), _row(_FINDING_COLUMNS, Look.HEAD)]
    rows = [*top, *(row for finding in audit.findings for row in _finding(finding, said, audit))]
    found = Sheet(FINDINGS, tuple(_FINDING_COLUMNS.values()), rows, len(top), footer)
    top = [*_titled(RECORD, audit)]
    rows = [*top, *_record(audit, said, made or datetime.now())]
    add_sheets(package, found, Sheet(RECORD, _RECORD_WIDTHS, rows, len(top), footer))
    return package.to_bytes()


def notes_of(audit: Audit) -> Mapping[str, Mapping[str, str]]:
    """Return the notes by sheet and address: what was seen at the cell, and what to do about it."""
    texts: dict[str, dict[str, list[str]]] = defaultdict(lambda: defaultdict(list))
    for finding in audit.findings:
        for observation in finding.observations:
            cell = _cell(observation.place)
            if cell:
                texts[cell.sheet][cell.address].append(_note(finding, observation))
    return {sheet: {a: "\n\n".join(t) for a, t in notes.items()} for sheet, notes in texts.items()}


def _note(finding: Finding, seen: Observation) -> str:
    kind = finding.kind
    lines = [
        f"Finding {finding.number}, {SIGNS[kind.severity]} {kind.severity}: {kind.title}",
        seen.words,
        *(f"{name}: {text}" for name, text in (("expected", seen.expected), ("found", seen.found)) if text),
        f"What to do: {kind.remedy}",
    ]
    return shortened("\n".join(lines), _NOTE)


def _cell(place: Place) -> Cell | None:
    """The cell of a place, the first of a range; none for a sheet or the workbook."""
    try:
        return Cell(place.sheet, *parse_address(place.address.partition(":")[0]))
    except ValueError:
        return None


def _titled(title: str, audit: Audit) -> Iterator[Row]:
    """The rows that every printed page repeats: title, outcome, caution."""
    yield (Shown(f"{title}: {audit.subject.path.name}", Look.TITLE),)
    counts = f"checked {audit.checked_cells} of {audit.formula_cells} formula cells"
    yield (Shown(f"{verdict(audit)}; {counts}", Look.PLAIN),)
    yield from _lines(CAUTIONS[0])


def _lines(text: str) -> Iterator[Row]:
    return ((Shown(line, Look.PLAIN),) for line in textwrap.wrap(text, _LINE))


def _row(values: Iterable[Scalar], look: Look = Look.BODY) -> Row:
    return tuple(Shown(value, look) for value in values)


def _finding(finding: Finding, record: Record, audit: Audit) -> Iterator[Row]:
    """One row an observation; the answer stands in the first. What is gone cannot be led to."""
    kind, answer = finding.kind, record.findings.get(key_of(finding), Answer())
    for n, seen in enumerate(finding.observations):
        said = answer if n == 0 else Answer()
        to = _cell(seen.place) if seen.place.sheet in audit.subject.book.sheets else None
        yield (
            Shown(float(finding.number)),
            Shown(f"{SIGNS[kind.severity]} {kind.severity}", Look.STRONG),
            Shown(kind.title),
            Shown(str(seen.place), Look.LINK if to else Look.BODY, to),
            *_row((seen.words, seen.expected, seen.found, seen.stored, seen.recomputed, seen.clause)),
            *_row((_effects(finding), kind.remedy) if n == 0 else ("", "")),
            *_row((said.words, said.closed)),
        )


def _effects(finding: Finding) -> str:
    """The headline results that the finding moves, one a line."""
    moved = [effect for effect in finding.effects if effect.change]
    if finding.effects and not moved:
        return "no headline result moves"
    return "\n".join(
        f"{e.headline}: {shown(e.value)} {e.unit}, {shown(e.without)} without it"
        + ("" if e.per_cent is None else f" ({e.per_cent:+.2f} %)")
        for e in moved
    )


def _record(audit: Audit, record: Record, made: datetime) -> Iterator[Row]:
    """What a check record has to say."""
    yield from _facts(audit, made)
    yield from _table("People", ("role", "name", "qualification", "date"), _people(record))
    seen = (
        (c.method, summary(c.method), float(c.looked_at), float(len(c.observations))) for c in audit.checks
    )
    yield from _table("Methods", ("method", "what it does", "things looked at", "not as expected"), seen)
    missing = ((item.what, item.because, str(item.place)) for item in audit.not_checked)
    yield from _table("Not checked", ("what", "because", "where"), missing)
    columns = ("cell", "entry", "value", "unit", "source", "mark", "words")
    yield from _table("Inputs", columns, _inputs(audit, record))
    yield ()
    yield (Shown("Limits", Look.TITLE),)
    for text in CAUTIONS[1:]:
        yield from _lines(text)


def _facts(audit: Audit, made: datetime) -> Iterator[Row]:
    inputs: Mapping[str, Any] = audit.subject.own.inputs if audit.subject.own else {}
    job: Mapping[str, Any] = inputs.get("job", {})
    edition = inputs.get("edition")
    facts = {
        "Project": inputs.get("title", ""),
        "Job number": job.get("number", ""),
        "Revision": job.get("revision", ""),
        "File": audit.subject.path.name,
        "SHA-256 of the file": audit.subject.sha256,
        "Written by": program(audit),
        "Standard": f"ASCE/SEI {edition}" if edition else "not said",
        "Audited with": f"Storyledger {__version__}, {made:%Y-%m-%d %H:%M}",
        "Kind of check": "every formula cell recomputed; every result from the inputs alone, if readable",
    }
    yield ()
    for name, text in facts.items():
        yield (Shown(name, Look.HEAD), Shown(str(text)))


def _people(record: Record) -> Iterator[tuple[Scalar, ...]]:
    for role in ROLES:
        person = record.people.get(role, Person())
        yield role, person.name, person.qualification, person.date


def _inputs(audit: Audit, record: Record) -> Iterator[tuple[Scalar, ...]]:
    for entry in filled_entries(audit):
        meaning, answer = entry["meaning"], record.inputs.get(entry["path"], Answer())
        named = f"{meaning.text} ({entry['path']})"
        yield entry["cell"], named, entry["value"], meaning.unit, meaning.source, answer.mark, answer.words


def _table(title: str, columns: tuple[str, ...], rows: Iterable[tuple[Scalar, ...]]) -> Iterator[Row]:
    yield ()
    yield (Shown(title, Look.TITLE),)
    found = list(rows)
    if not found:
        yield (Shown("None.", Look.PLAIN),)
        return
    yield _row(columns, Look.HEAD)
    yield from map(_row, found)
