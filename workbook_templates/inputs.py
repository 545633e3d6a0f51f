"""The inputs that a workbook starts from: a building's own, starter values for what it does not say.

The keys are those of BUILDING.toml. A starter value is marked in its source cell, counted by a check line,
and keeps the workbook's status at "starter values": it can not be mistaken for a design.
"""

from __future__ import annotations

from collections.abc import Mapping, Sequence
from dataclasses import dataclass
from typing import Any, Final

from engine.errors import MissingValue, NotApplicable
from workbook_templates.declare import DIRECTIONS, Quantity, Start
from workbook_templates.parts import PARTS, with_required

STARTER: Final = "starter value"
DEFAULT: Final = "default"
UNTITLED: Final = "Untitled building"
JOB_KEYS: Final = ("number", "engineer", "checker", "revision", "date")
BLANK_PARTS: Final = ("drift",)

Table = Mapping[str, Any]


@dataclass(frozen=True)
class Inputs:
    """The inputs of one workbook: the tables of a BUILDING.toml, gaps filled by starter values."""

    given: Table
    level_count: int

    @property
    def edition(self) -> str:
        """The edition's key."""
        return str(self.given["edition"])

    @property
    def units(self) -> str:
        """The unit system's key."""
        return str(self.given["units"])

    @property
    def levels(self) -> Sequence[Table]:
        """The levels, in the order given; empty tables where none is given."""
        levels: Sequence[Table] = self.given.get("level") or [{}] * self.level_count
        return levels

    @property
    def parts(self) -> frozenset[str]:
        """The parts that are asked for, those whose level entries are given, and what they require."""
        asked = self.given.get("parts", () if "level" in self.given else BLANK_PARTS)
        for key in asked:
            if key not in PARTS:
                raise NotApplicable("parts", key, f"must be one of {', '.join(PARTS)}")
        found = {key for key, part in PARTS.items() if part.needs and self._has(part.needs)}
        return with_required({*asked, *found})

    def _has(self, needs: tuple[str, ...]) -> bool:
        given = [key for key in needs if any(level.get(key) is not None for level in self.levels)]
        if given and len(given) < len(needs):
            missing = ", ".join(key for key in needs if key not in given)
            raise MissingValue(missing, None, f"is needed at every level beside {', '.join(given)}")
        return len(given) == len(needs)

    def criterion(self, q: Quantity, direction: str | None) -> Any:
        """Return the value of a criteria entry."""
        value = self._table(direction).get(q.key)
        if value is None:
            value = q.starter(Start(self.units)) if q.starter else q.default
        return {True: "yes", False: "no"}[value] if q.is_flag else value

    def source(self, q: Quantity, per_direction: bool) -> str:
        """Return the source of a criteria entry: as given, or the mark of a starter value."""
        tables = [self._table(d) for d in (DIRECTIONS if per_direction else (None,))]
        given = all(q.key in table for table in tables)
        if q.starter and not given:
            return STARTER
        return str(self.given.get("sources", {}).get(q.key, "" if given else DEFAULT))

    def level(self, number: int, q: Quantity, direction: str | None) -> Any:
        """Return an entry of a level, counted from the first row."""
        if "level" in self.given:
            return self.levels[number].get(q.stored_key(direction))
        if q.key == "source":
            return STARTER
        return (
            q.starter(Start(self.units, self.level_count - number, self.level_count))
            if q.starter
            else q.default
        )

    def job(self, key: str) -> str:
        """Return a text of the cover."""
        if key == "title":
            return str(self.given.get("title") or UNTITLED)
        return str(self.given.get("job", {}).get(key, ""))

    def _table(self, direction: str | None) -> Table:
        site, directions = self.given.get("site", {}), self.given.get("direction", {})
        found: Table = site if direction is None else directions.get(direction, {})
        return found
