"""The audit as one HTML page that needs no network: to read, filter, fill in and print."""

from __future__ import annotations

import json
from collections.abc import Iterator, Mapping
from datetime import datetime
from importlib.resources import files
from typing import Any, Final

from jinja2 import Environment, FunctionLoader, StrictUndefined
from markupsafe import Markup

from engine.version import __version__
from xlbridge.audit import cells, routes
from xlbridge.audit.audit import Audit
from xlbridge.audit.finding import Finding
from xlbridge.audit.kinds import KINDS, Severity
from xlbridge.audit.methods import summary
from xlbridge.audit.record import MARKS, ROLES, Record, key_of
from xlbridge.audit.report.figures import figures, sheet_maps
from xlbridge.audit.template import OwnTemplate
from xlbridge.audit.work import from_inputs, works
from xlbridge.values import CellError

CAUTIONS: Final = (
    "Results are an aid to a licensed engineer's judgement. Confirm every value against the standard adopted "
    "by the authority having jurisdiction, its supplements and local amendments. Local codes and that "
    "authority govern.",
    "What no audit of a workbook can see: an entry that is wrong but plausible, a model that is not the "
    "building, a rule that does not apply. Compare the entries with their sources.",
    "Rules marked “from memory” could not be read in a public source; rules marked “uncertain” carry a doubt "
    "that their note puts in words.",
)
SIGNS: Final = {Severity.ERROR: "✗", Severity.WARNING: "!", Severity.NOTE: "i"}
STATES: Final = {"verified": "✓", "finding": "✗", "not checked": "–"}


def page(audit: Audit, record: Record | None = None, made: datetime | None = None) -> str:
    """Return the page of one audit; ``record`` is what was said in an earlier one."""
    environment = Environment(
        autoescape=True, trim_blocks=True, lstrip_blocks=True, undefined=StrictUndefined,
        loader=FunctionLoader(_resource),
    )  # fmt: skip
    environment.filters["shown"] = shown
    return environment.get_template("page.html").render(_content(audit, record or Record(), made))


def shown(value: Any) -> str:
    """Return a value as a reader takes it: numbers to seven digits, an error by its code."""
    if isinstance(value, bool):
        return str(value).upper()
    if isinstance(value, float):
        return f"{value:.7g}"
    return value.code if isinstance(value, CellError) else "" if value is None else str(value)


def verdict(audit: Audit) -> str:
    """Return the outcome in words, with its sign."""
    missing = _counted(len(audit.not_checked), "thing")
    found = [_counted(audit.count(severity), severity) for severity in (Severity.ERROR, Severity.WARNING)]
    if audit.count(Severity.ERROR) or audit.count(Severity.WARNING):
        rest = f"; {missing} could not be checked" if audit.not_checked else ""
        return f"✗ {' and '.join(found)} to be answered{rest}"
    notes = audit.count(Severity.NOTE)
    nothing = f"nothing to be answered, {_counted(notes, Severity.NOTE)}" if notes else "nothing found"
    if audit.not_checked:
        return f"– {nothing}, but {missing} could not be checked"
    return f"✓ {nothing}: every formula cell verified"


def _counted(number: int, thing: str) -> str:
    return f"{number} {thing}{'' if number == 1 else 's'}"


def _resource(name: str) -> str:
    return files(__package__).joinpath(name).read_text(encoding="utf-8")


def _content(audit: Audit, record: Record, made: datetime | None) -> dict[str, Any]:
    own = audit.subject.own
    inputs: Mapping[str, Any] = own.inputs if own else {}
    return {
        "css": Markup(_resource("page.css")),
        "script": Markup(_resource("page.js")),
        "audit": audit,
        "version": __version__,
        "made": (made or datetime.now()).strftime("%Y-%m-%d %H:%M"),
        "program": program(audit),
        "job": {"title": inputs.get("title", ""), "number": "", "revision": "", **inputs.get("job", {})},
        "edition": inputs.get("edition", ""),
        "verdict": verdict(audit),
        "headlines": list(_headlines(audit)),
        "findings": [_finding(finding) for finding in audit.findings],
        "severities": {s.value: sum(f.kind.severity is s for f in audit.findings) for s in Severity},
        "signs": {severity.value: sign for severity, sign in SIGNS.items()},
        "states": STATES,
        "figures": [(f.caption, Markup(f.svg), f.words) for f in figures(audit)],
        "maps": [(m.sheet, m.counts, Markup(m.svg)) for m in sheet_maps(audit)],
        "works": list(works(audit.subject)),
        "state_of": audit.states,
        "inputs": list(filled_entries(audit)),
        "roles": ROLES,
        "marks": MARKS,
        "record": Markup(_in_script(record)),
        "file": audit.subject.path.name,
        "sha256": audit.subject.sha256,
        "cautions": CAUTIONS,
        "kinds": KINDS,
        "summary": summary,
        "tolerances": (cells.TOLERANCE, routes.TOLERANCE),
    }


def _in_script(record: Record) -> str:
    """The record as it may stand in a script element: no text of it can end the element."""
    return json.dumps(json.loads(record.text())).replace("<", "\\u003c")


def program(audit: Audit) -> str:
    """Return the program that wrote the file, as far as the file says."""
    workbook = audit.subject.book.workbook
    found = workbook.properties.creator if workbook else None
    return str(found or "not said")


def _headlines(audit: Audit) -> Iterator[tuple[str, str, Any, Any]]:
    values = audit.subject.results.values
    for line in audit.subject.own.headlines if audit.subject.own else ():
        value = values.get((line.cell.sheet, line.cell.address))
        yield line.name, line.unit, value, from_inputs(audit.subject, line.cell)


def _finding(finding: Finding) -> dict[str, Any]:
    return {
        "number": finding.number,
        "key": key_of(finding),
        "kind": finding.kind,
        "words": finding.words,
        "accepted": finding.accepted,
        "places": [str(place) for place in finding.places],
        "sheets": sorted({place.sheet for place in finding.places if place.sheet}),
        "observations": finding.observations,
        "effects": finding.effects,
    }


def filled_entries(audit: Audit) -> Iterator[dict[str, Any]]:
    """Every entry that is filled in, with what it is and where it comes from."""
    own = audit.subject.own or OwnTemplate()
    for path in sorted(own.entered, key=lambda path: _place(own.places[path])):
        cell = own.places[path]
        value = audit.subject.book.constants.get(cell.sheet, {}).get((cell.row, cell.column))
        if value is not None and not path.endswith(".source"):
            yield {"path": path, "cell": str(cell), "value": value, "meaning": own.meanings[path]}


def _place(cell: Any) -> tuple[str, int, int]:
    return cell.sheet, cell.row, cell.column
