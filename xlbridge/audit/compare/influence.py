"""Which changed entry moved which result by how much: each change made alone, and solved again."""

from __future__ import annotations

import re
from collections.abc import Iterator, Mapping, Sequence
from copy import deepcopy
from dataclasses import dataclass
from typing import Any, Final

from engine.building import from_mapping, solve
from engine.errors import EngineError
from xlbridge.audit.compare.changes import Change, Issues, Of

#: results of a direction that say where a building stands, and how a list of them becomes one number
HEADLINES: Final = {"V": None, "M_base": None, "T": None, "drift_over_limit": max, "theta": max}
_ROW: Final = re.compile(r"(\w+)\[(\d+)\](?:\.(.+))?")

Numbers = Mapping[str, float]


@dataclass(frozen=True, slots=True)
class Influence:
    """What one change does to the headline results, alone in the earlier issue; or why nothing is known."""

    words: str
    moved: Numbers
    reason: str = ""


@dataclass(frozen=True)
class Influences:
    """The headline results of both issues, each change by itself, and what is left to their interplay."""

    old: Numbers
    new: Numbers
    single: tuple[Influence, ...]

    @property
    def interplay(self) -> dict[str, float]:
        """What the changes do together beyond the sum of what each does alone."""
        return {
            key: self.new[key] - self.old[key] - sum(one.moved.get(key, 0.0) for one in self.single)
            for key in self.old
            if key in self.new
        }


def influences(issues: Issues, changes: Sequence[Change]) -> Influences | None:
    """Solve the earlier issue with each changed entry in turn; None where one of the two is not solvable."""
    if not (issues.old.own and issues.new.own):
        return None
    before, after = dict(issues.old.own.inputs), dict(issues.new.own.inputs)
    try:
        old, new = _headlines(before), _headlines(after)
    except EngineError:
        return None
    single = tuple(_single(issues, before, old, change) for change in changes if _counts(change))
    return Influences(old, new, single)


def _counts(change: Change) -> bool:
    """An entry, or a row that came or went; the order of rows and their names move nothing."""
    moved = isinstance(change.old, int) and isinstance(change.new, int)
    return (change.of is Of.ROW and not moved) or (
        change.of is Of.INPUT and not change.path.endswith(".name")
    )


def _single(issues: Issues, before: dict[str, Any], old: Numbers, change: Change) -> Influence:
    if change.path == "units":
        return Influence(change.words, {}, "numbers in other units cannot be compared")
    try:
        found = _headlines(_with(before, issues, change))
    except (EngineError, KeyError, IndexError) as error:
        return Influence(change.words, {}, f"cannot be solved alone: {error}")
    return Influence(change.words, {key: found[key] - old[key] for key in old if key in found})


def _with(before: dict[str, Any], issues: Issues, change: Change) -> dict[str, Any]:
    """The inputs of the earlier issue with one change made."""
    inputs = deepcopy(before)
    row = _ROW.fullmatch(change.path)
    if row is None:
        *way, last = change.path.split(".")
        table = inputs
        for key in way:
            table = table.setdefault(key, {})
        _put(table, last, change.new)
    elif row[3]:
        paired = next(r for r in issues.rows[row[1]] if r.new == int(row[2]) - 1)
        assert paired.old is not None
        _put(inputs[row[1]][paired.old], row[3], change.new)
    elif change.new is None:
        inputs[row[1]].pop(int(row[2]) - 1)
    else:
        inputs.setdefault(row[1], []).append(dict(change.new))
    return inputs


def _put(table: dict[str, Any], key: str, value: Any) -> None:
    if value is None:
        table.pop(key, None)
    else:
        table[key] = value


def _headlines(inputs: Mapping[str, Any]) -> dict[str, float]:
    return dict(_numbers(solve(from_mapping(inputs)).to_json()))


def _numbers(package: Mapping[str, Any]) -> Iterator[tuple[str, float]]:
    yield "W", package["W"]
    for direction, found in package["direction"].items():
        for key, gather in HEADLINES.items():
            value = found.get(key)
            if isinstance(value, list) and gather and value:
                yield f"largest {key} {direction}", float(gather(value))
            elif isinstance(value, float):
                yield f"{key} {direction}", value
