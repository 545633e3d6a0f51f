"""Rows of two issues paired: planted insertions, removals, moves and new names are found, and no other."""

from __future__ import annotations

from random import Random
from typing import Any

import pytest

from xlbridge.audit.compare.rows import RowPair, pair

PLANTED = 300


def levels(chance: Random, count: int) -> list[dict[str, Any]]:
    return [
        {
            "name": f"Level {n}",
            "elevation": 13.0 * n + chance.random(),
            "weight": 1000.0 + chance.randrange(500),
            "P_x": 900.0 * (count - n) + chance.randrange(90),
        }
        for n in range(count, 0, -1)
    ]


@pytest.mark.parametrize("seed", range(PLANTED))
def test_planted_changes_are_found_and_no_other(seed: int) -> None:
    chance = Random(seed)
    old = levels(chance, chance.randrange(3, 40))
    kept = [(n, dict(row)) for n, row in enumerate(old) if chance.random() > 0.1] or [(0, dict(old[0]))]
    for n, row in kept:
        if chance.random() < 0.15:
            row["name"] = f"Renamed {n}"
        elif chance.random() < 0.3:
            row[chance.choice(["weight", "P_x"])] += 7.0
    new = list(kept)
    for _ in range(chance.randrange(3)):
        row = {"name": f"Put in {chance.random()}", "elevation": -chance.random(), "weight": 3.0, "P_x": 1.0}
        new.insert(chance.randrange(len(new) + 1), (-1, row))
    found = pair(old, [row for _, row in new])
    assert [(p.old, p.new) for p in found if p.new is not None] == [
        (n if n >= 0 else None, place) for place, (n, _) in enumerate(new)
    ]
    assert [p.old for p in found if p.new is None] == sorted(set(range(len(old))) - {n for n, _ in kept})
    assert not any(p.moved for p in found)


@pytest.mark.parametrize("seed", range(50))
def test_one_row_moved_is_said_of_that_row_alone(seed: int) -> None:
    chance = Random(seed)
    old = levels(chance, chance.randrange(4, 30))
    start = chance.randrange(len(old))
    end = chance.choice([n for n in range(len(old)) if abs(n - start) > 1] or [len(old) - 1])
    new = list(old)
    new.insert(end, new.pop(start))
    moved = [p for p in pair(old, new) if p.moved]
    assert moved == [RowPair(start, end, True)]


def test_a_table_turned_over_is_the_same_table() -> None:
    old = levels(Random(1), 8)
    found = pair(old, old[::-1])
    assert [(p.old, p.new) for p in found] == [(7 - n, n) for n in range(8)]


def test_two_rows_of_one_name_are_told_apart_by_the_rest() -> None:
    old = [{"name": "Roof", "weight": 1.0}, {"name": "Roof", "weight": 2.0}]
    assert [(p.old, p.new) for p in pair(old, old[::-1])] in ([(1, 0), (0, 1)], [(1, 0), (0, 1)])


def test_a_new_name_with_other_entries_is_another_row() -> None:
    old = [{"name": "Roof", "weight": 1.0, "elevation": 2.0, "P_x": 3.0}]
    new = [{"name": "Deck", "weight": 9.0, "elevation": 8.0, "P_x": 3.0}]
    assert pair(old, new) == [RowPair(None, 0), RowPair(0, None)]
    new = [{"name": "Deck", "weight": 1.0, "elevation": 2.0, "P_x": 9.0}]
    assert pair(old, new) == [RowPair(0, 0)]


def test_rows_without_names_are_paired_by_what_they_hold_and_by_order() -> None:
    old = [{"kind": "dead", "area": 10.0}, {"kind": "snow", "area": 20.0}, {"kind": "dead", "area": 30.0}]
    new = [{"kind": "dead", "area": 10.0}, {"kind": "dead", "area": 31.0}]
    assert pair(old, new) == [RowPair(0, 0), RowPair(2, 1), RowPair(1, None)]
    assert pair([], new) == [RowPair(None, 0), RowPair(None, 1)]
    assert pair(old, []) == [RowPair(0, None), RowPair(1, None), RowPair(2, None)]
