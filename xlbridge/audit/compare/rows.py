"""Which row of a table of entries is which of an earlier issue: by name, then by what else they share."""

from __future__ import annotations

from bisect import bisect_left
from collections.abc import Iterable, Mapping, Sequence
from dataclasses import dataclass
from difflib import SequenceMatcher
from typing import Any, Final

Row = Mapping[str, Any]
#: the share of its entries that a row keeps under another name
ALIKE: Final = 0.5
NAME: Final = "name"
#: what says nothing of which row it is
SILENT: Final = frozenset({NAME, "source"})


@dataclass(frozen=True, slots=True)
class RowPair:
    """A row of the earlier issue and the same in the later one, by number from 0; None where it is not."""

    old: int | None
    new: int | None
    moved: bool = False


def pair(old: Sequence[Row], new: Sequence[Row]) -> list[RowPair]:
    """Pair the rows of two issues, in the order of the later one, those that are gone at the end.

    Rows that have a name are known by it; a row whose name is gone is the one that keeps most of its other
    entries, at least half of them. Rows without names are paired in their order by what they hold.
    """
    named = all(NAME in row for row in (*old, *new))
    found = _by_name(old, new) if named else {}
    found.update(_in_order(old, new, found))
    found.update(_alike(old, new, found, named))
    moved = _out_of_order(found)
    pairs = [RowPair(found.get(n), n, n in moved) for n in range(len(new))]
    gone = set(range(len(old))) - set(found.values())
    return [*pairs, *(RowPair(n, None) for n in sorted(gone))]


def _by_name(old: Sequence[Row], new: Sequence[Row]) -> dict[int, int]:
    """Rows of one name; a name that occurs twice says nothing."""
    names = [row[NAME] for row in old]
    known = {name: n for n, name in enumerate(names) if names.count(name) == 1}
    there = [row[NAME] for row in new]
    return {n: known[name] for n, name in enumerate(there) if name in known and there.count(name) == 1}


def _in_order(old: Sequence[Row], new: Sequence[Row], found: Mapping[int, int]) -> dict[int, int]:
    """Rows that are the same in every entry, but perhaps the name, in their order."""
    left, right = _rest(len(old), found.values()), _rest(len(new), found)
    matcher = SequenceMatcher(
        None, [_content(old[n]) for n in left], [_content(new[n]) for n in right], False
    )
    return {
        right[block.b + k]: left[block.a + k]
        for block in matcher.get_matching_blocks()
        for k in range(block.size)
    }


def _alike(old: Sequence[Row], new: Sequence[Row], found: Mapping[int, int], named: bool) -> dict[int, int]:
    """Of what is left, the pairs that share most, each row once."""
    left, right = _rest(len(old), found.values()), _rest(len(new), found)
    scores = sorted(((_share(old[a], new[b]), -abs(a - b), a, b) for a in left for b in right), reverse=True)
    least = ALIKE if named else 0.0
    pairs: dict[int, int] = {}
    for share, _, a, b in scores:
        if share >= least and (share or not named) and b not in pairs and a not in pairs.values():
            pairs[b] = a
    return pairs


def _rest(count: int, taken: Iterable[int]) -> list[int]:
    known = set(taken)
    return [n for n in range(count) if n not in known]


def _content(row: Row) -> tuple[tuple[str, Any], ...]:
    return tuple(sorted((key, value) for key, value in row.items() if key not in SILENT))


def _share(a: Row, b: Row) -> float:
    """The share of the entries beside the name that two rows have in common."""
    keys = (set(a) | set(b)) - SILENT
    return sum(a.get(key) == b.get(key) for key in keys) / len(keys) if keys else 0.0


def _out_of_order(found: Mapping[int, int]) -> set[int]:
    """The rows that do not follow the longest run of rows whose order stayed."""
    ordered = sorted(found)
    ends: list[int] = []
    length: dict[int, int] = {}
    for n in ordered:
        place = bisect_left(ends, found[n])
        ends[place : place + 1] = [found[n]]
        length[n] = place
    stay: set[int] = set()
    want, bound = len(ends) - 1, len(found) + max(found.values(), default=0) + 1
    for n in reversed(ordered):
        if length[n] == want and found[n] < bound:
            stay.add(n)
            want, bound = want - 1, found[n]
    return set(ordered) - stay
