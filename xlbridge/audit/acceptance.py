"""Findings that were looked at and are right: accepted with a reason, a name and a date, and still listed."""

from __future__ import annotations

import tomllib
from collections.abc import Iterable, Iterator, Sequence
from dataclasses import dataclass, fields, replace

from xlbridge.audit.finding import Finding, Observation, Place
from xlbridge.audit.kinds import KINDS, Severity


class AcceptanceError(ValueError):
    """A file of acceptances that does not say what one says; the message says where."""


@dataclass(frozen=True, slots=True)
class Acceptance:
    """One finding accepted: its kind, one of its places as the report prints it, why, by whom, and when."""

    kind: str
    place: str
    reason: str
    by: str
    date: str

    def __str__(self) -> str:
        return f"accepted by {self.by}, {self.date}: {self.reason}"


def read(text: str) -> list[Acceptance]:
    """Return the acceptances of a TOML file: tables ``[[accepted]]``."""
    try:
        tables = tomllib.loads(text)
    except tomllib.TOMLDecodeError as error:
        raise AcceptanceError(f"the acceptances are not TOML: {error}") from error
    if set(tables) - {"accepted"} or not isinstance(tables.get("accepted", []), list):
        raise AcceptanceError("the acceptances are tables [[accepted]], and nothing else")
    return [_one(n, table) for n, table in enumerate(tables.get("accepted", []), 1)]


def accepted(findings: Iterable[Finding], acceptances: Sequence[Acceptance]) -> Iterator[Finding]:
    """Yield the findings, those accepted marked so; an error of a proof cannot be accepted."""
    for finding in findings:
        places = {str(place) for place in finding.places}
        found = [a for a in acceptances if a.kind == finding.kind.key and a.place in places]
        yield replace(finding, accepted=str(found[0])) if found else finding


def unused(findings: Iterable[Finding], acceptances: Iterable[Acceptance]) -> Iterator[Observation]:
    """Yield the acceptances of what is not found any more: what they speak of has changed."""
    known = {(finding.kind.key, str(place)) for finding in findings for place in finding.places}
    for a in acceptances:
        if (a.kind, a.place) not in known:
            title = KINDS[a.kind].title.lower()
            words = f"{title} at {a.place} was accepted by {a.by}, {a.date}, and is not there"
            yield Observation("acceptance_unused", Place(), words)


def _one(number: int, table: object) -> Acceptance:
    names = {f.name for f in fields(Acceptance)}
    if not isinstance(table, dict) or set(table) != names:
        raise AcceptanceError(f"acceptance {number}: it needs {', '.join(sorted(names))}, and nothing else")
    texts = {key: str(value).strip() for key, value in table.items()}
    if missing := [key for key, text in texts.items() if not text]:
        raise AcceptanceError(f"acceptance {number}: {missing[0]} is blank")
    if texts["kind"] not in KINDS:
        raise AcceptanceError(f"acceptance {number}: {texts['kind']!r} is no kind of finding")
    if KINDS[texts["kind"]].severity is Severity.ERROR:
        raise AcceptanceError(
            f"acceptance {number}: {texts['kind']} is an error, which is mended, not accepted"
        )
    return Acceptance(**texts)
