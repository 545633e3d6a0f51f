"""The audit as JSON; ``schema.json`` says what stands in it."""

from __future__ import annotations

from typing import Any

from engine.version import __version__
from xlbridge.audit.audit import Audit
from xlbridge.audit.finding import Checked, Effect, Finding, NotChecked, Observation
from xlbridge.audit.methods import summary
from xlbridge.audit.record import key_of
from xlbridge.audit.report.page import CAUTIONS, program
from xlbridge.values import CellError, Scalar


def record(audit: Audit) -> dict[str, Any]:
    """Return the audit as what JSON can say."""
    return {
        "storyledger": __version__,
        "file": audit.subject.path.name,
        "sha256": audit.subject.sha256,
        "written_by": program(audit),
        "edition": audit.subject.own.inputs.get("edition") if audit.subject.own else None,
        "formula_cells": audit.formula_cells,
        "checked_cells": audit.checked_cells,
        "methods": [_method(check) for check in audit.checks],
        "findings": [_finding(finding) for finding in audit.findings],
        "not_checked": [_not_checked(item) for item in audit.not_checked],
        "cautions": list(CAUTIONS),
    }


def _method(check: Checked) -> dict[str, Any]:
    seen, missing = len(check.observations), len(check.not_checked)
    return {
        "method": check.method,
        "summary": summary(check.method),
        "looked_at": check.looked_at,
        "observations": seen,
        "not_checked": missing,
    }


def _finding(finding: Finding) -> dict[str, Any]:
    kind = finding.kind
    return {
        "number": finding.number,
        "key": key_of(finding),
        "kind": kind.key,
        "method": kind.method,
        "severity": kind.severity,
        "title": kind.title,
        "words": finding.words,
        "accepted": finding.accepted,
        "meaning": kind.meaning,
        "remedy": kind.remedy,
        "places": [_observation(o) for o in finding.observations],
        "effects": [_effect(effect) for effect in finding.effects],
    }


def _observation(o: Observation) -> dict[str, Any]:
    words = {"words": o.words, "expected": o.expected, "found": o.found, "clause": o.clause}
    values = {"stored": plain(o.stored), "recomputed": plain(o.recomputed)}
    return {"sheet": o.place.sheet, "address": o.place.address, **words, **values}


def _effect(effect: Effect) -> dict[str, Any]:
    return {
        "headline": effect.headline,
        "unit": effect.unit,
        "value": effect.value,
        "without": effect.without,
        "change": effect.change,
        "per_cent": effect.per_cent,
    }


def _not_checked(item: NotChecked) -> dict[str, Any]:
    return {
        "what": item.what,
        "sheet": item.place.sheet,
        "address": item.place.address,
        "because": item.because,
    }


def plain(value: Scalar) -> Any:
    """Return a cell value as JSON can hold it: an error by its code."""
    return value.code if isinstance(value, CellError) else value
