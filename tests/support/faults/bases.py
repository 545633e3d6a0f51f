"""The workbooks that faults are planted in: invented buildings of both editions and both unit systems."""

from __future__ import annotations

from dataclasses import dataclass
from pathlib import Path
from random import Random
from typing import Any, Final

from engine.units import US
from tests.support.audited import opened
from workbook_templates.build import write_native, write_workbook
from xlbridge.audit.audit import audit
from xlbridge.audit.subject import Subject


@dataclass(frozen=True)
class Base:
    """What one workbook is: its edition, units, number of levels, parts, and whether it is an issue copy."""

    edition: str
    units: str
    levels: int
    parts: tuple[str, ...] = ("drift",)
    native: bool = False

    @property
    def name(self) -> str:
        """A short name, for files and tables."""
        make = "issue copy" if self.native else "functions"
        return f"{self.edition} {self.units} {self.levels} levels, {'+'.join(self.parts) or 'core'}, {make}"

    def made(self, folder: Path) -> Subject:
        """The workbook, written and opened; it is clean, or no fault could be told in it."""
        path = folder / f"{self.name}.xlsx"
        write = write_native if self.native else write_workbook
        write(building(self.edition, self.units, self.levels, self.parts), path)
        subject = opened(path)
        assert audit(subject).findings == (), self.name
        return subject


CROSS: Final = ("drift", "cross_check", "drift_cross_check")
CODE: Final = ("drift", "category", "redundancy", "diaphragm", "load_effects")
MORE: Final = ("drift", "periods", "separation")

#: two of these meet each operator by default
SMALL: Final = (
    Base("7-22", "us", 3, ()),
    Base("7-16", "si", 3, ()),
    Base("7-22", "us", 3),
    Base("7-16", "us", 4, MORE),
    Base("7-22", "si", 2, native=True),
    Base("7-16", "us", 2, (), native=True),
)

#: all of these meet them where figures are wanted
MANY: Final = (
    *SMALL,
    Base("7-16", "si", 4, CROSS),
    Base("7-16", "us", 1),
    Base("7-22", "si", 2, CODE),
    Base("7-16", "si", 8, CODE),
    Base("7-22", "us", 12, CROSS),
    Base("7-16", "us", 9, native=True),
    Base("7-22", "si", 18),
    Base("7-16", "si", 27),
    Base("7-22", "us", 40),
)


def building(edition: str, units: str, count: int, parts: tuple[str, ...]) -> dict[str, Any]:
    """The tables of a regular invented building: no two of its numbers are the same by chance."""
    draw = Random(f"{edition} {units} {count}")
    story, weight, sway = (13.0, 900.0, 0.06) if units == US else (4.0, 4000.0, 1.5)
    levels: list[dict[str, Any]] = []
    elevation, moved = 0.0, [0.0, 0.0]
    for n in range(count):
        elevation = round(elevation + story * draw.uniform(0.95, 1.1), 2)
        moved = [round(d + sway * draw.uniform(0.8, 1.2), 4) for d in moved]
        levels.insert(
            0,
            {
                "name": f"Level {n + 2}",
                "elevation": elevation,
                "weight": round(weight * draw.uniform(0.9, 1.1), 1),
                "source": "take-off sheet 3",
                **({"delta_xe_X": moved[0], "delta_xe_Y": moved[1]} if "drift" in parts else {}),
            },
        )
    carried = 0.0
    for level in levels if "drift" in parts else ():
        carried = round(carried + level["weight"] * 1.07, 1)
        level["P_x"] = carried
    direction = {"system": "an invented system", "period_system": "all other", "drift_structure": "all other"}
    return {
        "title": "Invented building",
        "edition": edition,
        "units": units,
        "parts": list(parts),
        "site": {"S_DS": 0.92, "S_D1": 0.47, "S_1": 0.38, "T_L": 8.0, "risk_category": "III"},
        "direction": {
            "X": {**direction, "R": 6.0, "Omega_0": 2.5, "C_d": 5.0},
            "Y": {
                **direction,
                "R": 5.0,
                "Omega_0": 3.0,
                "C_d": 4.5,
                "period_system": "concrete moment frame",
            },
        },
        "level": levels,
    }
