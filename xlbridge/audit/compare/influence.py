"""Which changed entry moved which result by how much: each change made alone, and solved again."""

from __future__ import annotations

import re
from collections.abc import Callable, Iterator, Mapping, Sequence
from copy import deepcopy
from dataclasses import dataclass
from typing import Any, Final

from engine.building import from_mapping, solve
from engine.errors import EngineError
from xlbridge.audit.compare.change import Change, Of
from xlbridge.audit.compare.changes import Issues

#: results of a direction that say where a building stands, and how a list of them becomes one number
HEADLINES: Final = {"V": None, "M_base": None, "T": None, "drift_over_limit": max, "theta": max}
#: steps up to which each entry of a table is one; beyond, a column of it is
AT_MOST: Final = 100
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
    """Solve the earlier issue with each step in turn; None where the two issues cannot be compared."""
    if not (issues.comparable and issues.old.own and issues.new.own):
        return None
    before, after = dict(issues.old.own.inputs), dict(issues.new.own.inputs)
    try:
        old, new = _headlines(before), _headlines(after)
    except EngineError:
        return None
    made = [(step, _made(issues, before, old, step)) for step in steps(changes)]
    return Influences(old, new, tuple(_together(issues, before, old, made)))


def steps(changes: Sequence[Change]) -> list[tuple[Change, ...]]:
    """What is changed at once: an entry, a row that came or went, or a column of entries that did.

    The order of rows and their names move nothing. Of very many entries the columns are steps.
    """
    counted = [change for change in changes if _counts(change)]
    found = _grouped(counted, lambda change: change.cause or change.path)
    return found if len(found) <= AT_MOST else _grouped(counted, _column)


def _counts(change: Change) -> bool:
    moved = isinstance(change.old, int) and isinstance(change.new, int)
    return (change.of is Of.ROW and not moved) or (
        change.of is Of.INPUT and not change.path.endswith(".name")
    )


def _grouped(changes: Sequence[Change], key: Callable[[Change], object]) -> list[tuple[Change, ...]]:
    groups: dict[object, list[Change]] = {}
    for change in changes:
        groups.setdefault((change.of, key(change), change.old is None, change.new is None), []).append(change)
    return [tuple(group) for group in groups.values()]


def _column(change: Change) -> str:
    row = _ROW.fullmatch(change.path)
    return f"{row[1]} {row[3]}" if row and row[3] else change.cause or change.path


def _made(issues: Issues, before: dict[str, Any], old: Numbers, step: Sequence[Change]) -> Influence:
    more = f", and {len(step) - 1} more like it" if len(step) > 1 else ""
    try:
        found = _headlines(_with(before, issues, step))
    except (EngineError, KeyError, IndexError) as error:
        return Influence(f"{step[0].words}{more}", {}, f"cannot be solved alone: {error}")
    moved = {key: found[key] - old[key] for key in old if key in found}
    return Influence(f"{step[0].words}{more}", moved)


def _together(
    issues: Issues, before: dict[str, Any], old: Numbers, made: Sequence[tuple[tuple[Change, ...], Influence]]
) -> Iterator[Influence]:
    """The steps that stand alone; those that do not are one, if all of them together can be solved."""
    yield from (one for _, one in made if not one.reason)
    rest = [(step, one) for step, one in made if one.reason]
    joint = _made(issues, before, old, [change for step, _ in rest for change in step]) if rest else None
    if joint and len(rest) > 1 and not joint.reason:
        yield Influence(f"what stands only together: {'; '.join(one.words for _, one in rest)}", joint.moved)
    else:
        yield from (one for _, one in rest)


def _with(before: dict[str, Any], issues: Issues, step: Sequence[Change]) -> dict[str, Any]:
    """The inputs of the earlier issue with one step made; rows go last, so that numbers hold until then."""
    inputs = deepcopy(before)
    gone: dict[str, set[int]] = {}
    for change in step:
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
            gone.setdefault(row[1], set()).add(int(row[2]) - 1)
        else:
            inputs.setdefault(row[1], []).append(dict(change.new))
    for name, numbers in gone.items():
        _put(inputs, name, [row for n, row in enumerate(inputs[name]) if n not in numbers] or None)
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
