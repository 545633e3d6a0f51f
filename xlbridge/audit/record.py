"""The check record: who made the workbook and who checked it, and what they said of inputs and findings.

It is a file of its own beside the workbook, in JSON, so that it outlives the report: the page loads and
saves it, and the next audit takes it in again. One written by hand may as well be TOML.
"""

from __future__ import annotations

import json
import tomllib
from collections.abc import Mapping
from dataclasses import asdict, dataclass, field, fields
from typing import Any, Final

from xlbridge.audit.finding import Finding

ROLES: Final = ("originator", "checker", "back-checker", "approver")
MARKS: Final = ("agree", "change", "query")


class RecordError(ValueError):
    """The record does not say what a record says, or names one person twice; the message says where."""


@dataclass(frozen=True, slots=True)
class Person:
    """Who took a role, and when."""

    name: str = ""
    qualification: str = ""
    date: str = ""


@dataclass(frozen=True, slots=True)
class Answer:
    """What became of a finding or of an input: a mark (inputs), words, initials and date of closing."""

    mark: str = ""
    words: str = ""
    closed: str = ""


@dataclass(frozen=True)
class Record:
    """People by role, answers to inputs by path, answers to findings by :func:`key_of`."""

    people: Mapping[str, Person] = field(default_factory=dict)
    inputs: Mapping[str, Answer] = field(default_factory=dict)
    findings: Mapping[str, Answer] = field(default_factory=dict)

    @classmethod
    def read(cls, text: str) -> Record:
        """Return the record of a file's text: JSON, or TOML where it was written by hand."""
        try:
            tables = json.loads(text) if text.lstrip().startswith("{") else tomllib.loads(text)
        except (json.JSONDecodeError, tomllib.TOMLDecodeError) as error:
            raise RecordError(f"the record is neither JSON nor TOML: {error}") from error
        _known("the record", tables, {f.name for f in fields(cls)})
        people = {role: _one(Person, f"people.{role}", given) for role, given in _table(tables, "people")}
        _known("people", people, set(ROLES))
        _two_people(people)
        inputs = {path: _one(Answer, f"inputs.{path}", given) for path, given in _table(tables, "inputs")}
        for path, answer in inputs.items():
            if answer.mark not in ("", *MARKS):
                raise RecordError(f"inputs.{path}: {answer.mark!r} is no mark; allowed: {', '.join(MARKS)}")
        findings = {key: _one(Answer, f"findings.{key}", a) for key, a in _table(tables, "findings")}
        return cls(people, inputs, findings)

    def text(self) -> str:
        """Return the text of the file."""
        return json.dumps(asdict(self), indent=1, ensure_ascii=False)


def key_of(finding: Finding) -> str:
    """Return what a finding is known by from one audit to the next: its kind and its first place."""
    return f"{finding.kind.key} {finding.places[0]}"


def _table(tables: Mapping[str, Any], name: str) -> Any:
    found = tables.get(name, {})
    if not isinstance(found, dict):
        raise RecordError(f"{name}: not a table")
    return found.items()


def _known(where: str, given: Any, allowed: set[str]) -> None:
    if not isinstance(given, dict):
        raise RecordError(f"{where}: not a table")
    for key in given:
        if key not in allowed:
            raise RecordError(f"{where}: {key!r} is unknown; allowed: {', '.join(sorted(allowed))}")


def _one(kind: type[Any], where: str, given: Any) -> Any:
    _known(where, given, {f.name for f in fields(kind)})
    for key, text in given.items():
        if not isinstance(text, str):
            raise RecordError(f"{where}.{key}: not a text")
    return kind(**given)


def _two_people(people: Mapping[str, Person]) -> None:
    """A check by whoever made the thing is none."""
    maker, checker = (_plain(people.get(role, Person()).name) for role in ROLES[:2])
    if maker and maker == checker:
        raise RecordError(f"originator and checker are one person, {people['checker'].name}: name another")


def _plain(name: str) -> str:
    return " ".join(name.casefold().split())
