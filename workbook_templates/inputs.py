"""The inputs that a workbook starts from: a building's own, starter values for what it does not say.

The keys are those of BUILDING.toml. A starter value is marked in its source cell, counted by a check line,
and keeps the workbook's status at "starter values": it can not be mistaken for a design.
"""

from __future__ import annotations

from collections.abc import Collection, Mapping, Sequence
from dataclasses import dataclass
from functools import cached_property
from typing import Any, Final

from engine.errors import MissingValue, NotApplicable
from workbook_templates.declare import DIRECTIONS, STARTER, Part, Quantity, Start, Table
from workbook_templates.parts import PARTS, with_required

DEFAULT: Final = "default"
UNTITLED: Final = "Untitled building"
JOB_KEYS: Final = ("number", "engineer", "checker", "revision", "date")
BLANK_PARTS: Final = ("drift",)

Entries = Mapping[str, Any]


@dataclass(frozen=True)
class Inputs:
    """The inputs of one workbook: the tables of a BUILDING.toml, gaps filled by starter values."""

    given: Entries
    level_count: int

    @property
    def edition(self) -> str:
        """The edition's key."""
        return str(self.given["edition"])

    @property
    def units(self) -> str:
        """The unit system's key."""
        return str(self.given["units"])

    def rows(self, table: Table) -> Sequence[Entries]:
        """The rows of a table, in the order given; empty ones where none is given."""
        rows: Sequence[Entries] = self.given.get(table.stored, ())
        return rows or [{}] * table.rows_at_start(self.levels, self.edition)

    @property
    def levels(self) -> int:
        """The number of levels."""
        return len(self.given.get("level", ())) or self.level_count

    @property
    def row_counts(self) -> dict[str, int]:
        """The number of rows of each table that the parts bring."""
        tables = (table for key in self.parts for table in PARTS[key].tables)
        return {table.stored: len(self.rows(table)) for table in tables}

    @cached_property
    def parts(self) -> frozenset[str]:
        """The parts that are asked for, those whose entries are given, and what they require."""
        asked = self.given.get("parts", () if "level" in self.given else BLANK_PARTS)
        for key in asked:
            if key not in PARTS:
                raise NotApplicable("parts", key, f"must be one of {', '.join(PARTS)}")
        found = {key for key, part in PARTS.items() if part.needs and self._has(self._needs(part, asked))}
        found |= {key for key, part in PARTS.items() if any(t.stored in self.given for t in part.tables)}
        found |= {key for key, part in PARTS.items() if self._entered & {*part.brought_by}}
        fitting = {key for key in found if self.edition in PARTS[key].editions}
        keys = with_required({*asked, *fitting})
        self._refuse_misfits(keys)
        if "level" in self.given:
            self._refuse_unfilled(keys)
        return keys

    @property
    def _entered(self) -> set[str]:
        """The entries of criteria and levels that are given; those of the criteria with their value too."""
        tables = [self._table(direction) for direction in (None, *DIRECTIONS)]
        pairs = {pair for table in tables for pair in table.items()}
        levels = {
            key for level in self.given.get("level", ()) for key, value in level.items() if value is not None
        }
        return levels | {word for key, value in pairs for word in (key, f"{key} = {value}")}

    def _needs(self, part: Part, keys: Collection[str]) -> tuple[str, ...]:
        """The level entries without which a part can not be filled in, save those that others replace."""
        replaced = [q for key in keys for q in PARTS[key].replaces]
        given = {q.stored_key(d) for q in replaced for d in (None, *DIRECTIONS)}
        return tuple(key for key in part.needs if key not in given)

    def _refuse_unfilled(self, keys: frozenset[str]) -> None:
        for key in keys:
            needs = self._needs(PARTS[key], keys)
            if needs and not self._has(needs):
                raise MissingValue(needs[0], None, f"is needed at every level for the part {key}")

    def _refuse_misfits(self, keys: frozenset[str]) -> None:
        for key in keys:
            if self.edition not in PARTS[key].editions:
                raise NotApplicable("parts", key, f"is a part of {' and '.join(PARTS[key].editions)} only")
            for other in PARTS[key].excludes:
                if other in keys:
                    raise NotApplicable("parts", key, f"can not stand beside {other}: both give the same")

    def _has(self, needs: tuple[str, ...]) -> bool:
        given = [
            key for key in needs if any(level.get(key) is not None for level in self.given.get("level", ()))
        ]
        if given and len(given) < len(needs):
            missing = ", ".join(key for key in needs if key not in given)
            raise MissingValue(missing, None, f"is needed at every level beside {', '.join(given)}")
        return len(given) == len(needs)

    def criterion(self, q: Quantity, direction: str | None) -> Any:
        """Return the value of a criteria entry."""
        value = self._table(direction).get(q.key)
        if value is None:
            value = q.starter(Start(self.units, 0, self.levels)) if q.starter else q.default
        return {True: "yes", False: "no"}[value] if q.is_flag else value

    def source(self, q: Quantity, per_direction: bool) -> str:
        """Return the source of a criteria entry: as given, or the mark of a starter value."""
        tables = [self._table(d) for d in (DIRECTIONS if per_direction else (None,))]
        given = all(q.key in table for table in tables)
        if q.starter and not given:
            return STARTER
        return str(self.given.get("sources", {}).get(q.key, "" if given else DEFAULT))

    def row(self, table: Table, number: int, q: Quantity, direction: str | None) -> Any:
        """Return an entry of a row of a table, counted from the first."""
        if table.stored in self.given or ("level" in self.given and not table.start):
            found = self._rows_needed(table)[number].get(q.stored_key(direction))
            return q.default if found is None else found
        count = len(self.rows(table))
        return q.starter(Start(self.units, count - number, count)) if q.starter else q.default

    def _rows_needed(self, table: Table) -> Sequence[Entries]:
        if not self.given.get(table.stored):
            raise MissingValue(table.stored, None, f"must have rows for the sheet {table.sheet}")
        return self.rows(table)

    def job(self, key: str) -> str:
        """Return a text of the cover."""
        if key == "title":
            return str(self.given.get("title") or UNTITLED)
        return str(self.given.get("job", {}).get(key, ""))

    def _table(self, direction: str | None) -> Entries:
        site, directions = self.given.get("site", {}), self.given.get("direction", {})
        found: Entries = site if direction is None else directions.get(direction, {})
        return found
