"""``storyledger entries``: every field that a BUILDING.toml can hold, once, as its part declares it."""

from __future__ import annotations

import json
from dataclasses import fields

import pytest

from engine.building.records import may_be_left_out
from tests.support.command import run
from xlbridge.cli.entries_command import RECORDS


def listed() -> dict[str, dict[str, str]]:
    found = json.loads(run("entries", "--json").out)
    keys = {f"{entry['table']}.{key}": entry for entry in found for key in entry["key"].split(", ")}
    assert len(keys) == sum(len(entry["key"].split(", ")) for entry in found)
    return keys


def test_every_field_of_the_records_is_listed() -> None:
    assert set(listed()) == {f"{table}.{f.name}" for table, kind in RECORDS.items() for f in fields(kind)}


@pytest.mark.parametrize("table", RECORDS)
def test_what_is_needed_is_said_to_be(table: str) -> None:
    found = listed()
    needed = {f.name for f in fields(RECORDS[table]) if not may_be_left_out(f)}
    assert {
        f.name for f in fields(RECORDS[table]) if found[f"{table}.{f.name}"]["left_out"] == "needed"
    } == needed


def test_defaults_and_limits_are_said() -> None:
    found = listed()
    assert found["direction.rho"]["left_out"] == "left out: 1"
    assert found["direction.rho"]["allowed"] == "a number, at least 1 and at most 1.3"
    assert found["direction.k_rule"]["left_out"] == 'left out: "interpolate"'
    assert found["level.K_x_Y"]["part"] == "stiffness"


def test_one_part() -> None:
    lines = run("entries", "drift").out.splitlines()
    assert [line.split()[0].rstrip(",") for line in lines] == ["level.P_x", "level.delta_xe_X"]


def test_an_unknown_part_is_refused_with_the_known_ones() -> None:
    done = run("entries", "roof")
    assert done.code == 3
    assert "roof: no such part; the parts are " in done.err


@pytest.mark.parametrize("part", ["short_building", "periods"])
def test_an_entry_that_parts_share_is_listed_with_each(part: str) -> None:
    lines = run("entries", part).out.splitlines()
    assert "site.N" in [line.split()[0] for line in lines]
