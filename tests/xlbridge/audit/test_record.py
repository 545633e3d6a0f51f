"""The check record: what it holds comes back, what it must not hold is refused with its place."""

from __future__ import annotations

import json
from pathlib import Path

import pytest

from tests.support.audited import audited, changed, computed_book
from xlbridge.audit.record import Answer, Person, Record, RecordError, key_of

WHOLE = Record(
    {"originator": Person("A. Maker", "PE", "2026-01-05"), "checker": Person("B. Checker")},
    {"site.S_DS": Answer("agree"), "level[2].weight": Answer("query", "which drawing?")},
    {"stale_value Levels!H14": Answer(words="recalculated", closed="BC 2026-01-07")},
)


def test_a_record_comes_back_as_it_was() -> None:
    assert Record.read(WHOLE.text()) == WHOLE
    assert Record.read("{}") == Record()


def test_a_record_by_hand_may_be_toml() -> None:
    people = {"checker": Person("B. Checker", "PE")}
    assert Record.read('people.checker = {name = "B. Checker", qualification = "PE"}') == Record(people)
    assert Record.read('[people.checker]\nname = "B. Checker"\nqualification = "PE"') == Record(people)


@pytest.mark.parametrize(
    ("tables", "words"),
    [
        ("{no json}", "neither JSON nor TOML"),
        ("no toml", "neither JSON nor TOML"),
        ([], "neither JSON nor TOML"),
        ("[people.drawer]", "'drawer' is unknown"),
        ({"persons": {}}, "'persons' is unknown"),
        ({"people": {"drawer": {}}}, "'drawer' is unknown"),
        ({"people": []}, "people: not a table"),
        ({"people": {"checker": {"nom": "B"}}}, r"people.checker: 'nom' is unknown"),
        ({"people": {"checker": {"name": 3}}}, r"people.checker.name: not a text"),
        ({"inputs": {"site.S_DS": {"mark": "fine"}}}, "'fine' is no mark; allowed: agree, change, query"),
        ({"findings": {"stale_value A1": "done"}}, "not a table"),
    ],
)
def test_what_is_no_record_is_refused_with_its_place(tables: object, words: str) -> None:
    with pytest.raises(RecordError, match=words):
        Record.read(tables if isinstance(tables, str) else json.dumps(tables))


@pytest.mark.parametrize("checker", ["A. Maker", " a.  maker "])
def test_nobody_checks_what_he_made(checker: str) -> None:
    people = {"originator": {"name": "A. Maker"}, "checker": {"name": checker}}
    with pytest.raises(RecordError, match="one person"):
        Record.read(json.dumps({"people": people}))
    people["checker"]["name"] = "B. Maker"
    assert Record.read(json.dumps({"people": people})).people["checker"].name == "B. Maker"


def test_two_without_a_name_are_not_one_person() -> None:
    people = {"originator": {"date": "2026-01-05"}, "checker": {"date": "2026-01-06"}}
    assert set(Record.read(json.dumps({"people": people})).people) == {"originator", "checker"}


def test_a_finding_keeps_its_key_when_others_come(tmp_path: Path) -> None:
    path = computed_book(tmp_path)
    (only,) = audited(changed(path, lambda book: None, recalculated=False)).findings
    assert key_of(only) == f"no_stored_value {only.places[0]}"
    assert str(only.number) not in key_of(only).split()
