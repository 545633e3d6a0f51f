"""The inputs that a workbook starts from: a building's own, starter values for what it does not say.

The keys are those of BUILDING.toml. A starter value is marked in its source cell, counted by a check line,
and keeps the workbook's status at "starter values": it can not be mistaken for a design.
"""

from __future__ import annotations

from collections.abc import Mapping, Sequence
from dataclasses import dataclass
from typing import Any, Final

from engine.errors import MissingValue
from engine.units import US
from workbook_templates.declare import DIRECTIONS, Part

STARTER: Final = "starter value"
LEVEL_KEYS: Final = {"w_x": "weight"}
DEFAULTS: Final = {
    "base_elevation": 0.0,
    "k_rule": "interpolate",
    "rho": 1.0,
    "beta": 1.0,
    "moment_frames_only": False,
    "T_computed": None,
}
JOB_KEYS: Final = ("number", "engineer", "checker", "revision", "date")
DRIFT_KEYS: Final = ("P_x", *(f"delta_xe_{d}" for d in DIRECTIONS))
UNTITLED: Final = "Untitled building"

Table = Mapping[str, Any]


@dataclass(frozen=True)
class Inputs:
    """The inputs of one workbook, from the tables of a BUILDING.toml (``starter`` fills the gaps)."""

    given: Table
    starter: Table

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
        """The levels, in the order given."""
        levels: Sequence[Table] = self.given.get("level") or self.starter["level"]
        return levels

    @property
    def parts(self) -> frozenset[Part]:
        """The parts that the inputs call for: drift needs displacements and vertical loads."""
        given = [key for key in DRIFT_KEYS if any(level.get(key) is not None for level in self.levels)]
        if given and len(given) < len(DRIFT_KEYS):
            missing = ", ".join(key for key in DRIFT_KEYS if key not in given)
            raise MissingValue(missing, None, f"is needed at every level beside {', '.join(given)}")
        return frozenset(Part) if given else frozenset({Part.FORCES})

    def criterion(self, key: str, direction: str | None) -> Any:
        """Return the value of a criteria row."""
        value = self._table(self.given, direction).get(key, DEFAULTS.get(key, self))
        if value is self:
            value = self._table(self.starter, direction)[key]
        return {True: "yes", False: "no"}[value] if isinstance(value, bool) else value

    def source(self, key: str, per_direction: bool) -> str:
        """Return the source of a criteria row: as given, or the mark of a starter value."""
        tables = [self._table(self.given, d) for d in (DIRECTIONS if per_direction else (None,))]
        text = str(self.given.get("sources", {}).get(key, ""))
        if not all(key in table or key in DEFAULTS for table in tables):
            return STARTER
        return text or ("" if all(key in table for table in tables) else "default")

    def level(self, number: int, key: str, direction: str | None) -> Any:
        """Return an input of a level, counted from the first one given."""
        level = self.levels[number]
        if key == "source" and "level" not in self.given:
            return STARTER
        return level.get(f"{key}_{direction}" if direction else LEVEL_KEYS.get(key, key))

    def job(self, key: str) -> str:
        """Return a text of the cover."""
        if key == "title":
            return str(self.given.get("title") or UNTITLED)
        return str(self.given.get("job", {}).get(key, ""))

    @staticmethod
    def _table(tables: Table, direction: str | None) -> Table:
        found: Table = (
            tables.get("site", {}) if direction is None else tables.get("direction", {}).get(direction, {})
        )
        return found


def starter(level_count: int, units: str) -> Table:
    """Return invented values that make a workbook compute before the engineer has filled it in."""
    us = units == US
    story, weight, sway = (13.0, 1000.0, 0.25) if us else (4.0, 4500.0, 6.0)
    direction = {
        "system": "to be chosen",
        "R": 3.0,
        "Omega_0": 3.0,
        "C_d": 3.0,
        "period_system": "all other",
        "drift_structure": "all other",
    }
    return {
        "site": {"S_DS": 1.0, "S_D1": 0.5, "S_1": 0.4, "T_L": 8.0, "risk_category": "II"},
        "direction": dict.fromkeys(DIRECTIONS, direction),
        "level": [
            {
                "name": "Roof" if n == level_count else f"Level {n + 1}",
                "elevation": story * n,
                "weight": weight,
                "P_x": weight * (level_count - n + 1),
                **{f"delta_xe_{d}": sway * n for d in DIRECTIONS},
            }
            for n in range(level_count, 0, -1)
        ],
    }
