"""One building as a frozen record: what its fields say together is checked here."""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import asdict, dataclass, field
from typing import Final

import numpy as np

from engine.building.records.direction import DIRECTIONS, Direction
from engine.building.records.fields import check_fields, checked, is_list_of_texts, is_text, word
from engine.building.records.level import LEVEL_OPTIONS, Level, level_label
from engine.building.records.lower import check_lower
from engine.building.records.motion import check_method, check_motion
from engine.building.records.rows import (
    ROW_TABLES,
    AnchorRow,
    LowerRow,
    MemberRow,
    ModeRow,
    MotionRow,
    SpectrumRow,
    SystemRow,
    WallRow,
    WeightRow,
    row_label,
)
from engine.building.records.site import Site
from engine.editions import EDITIONS
from engine.errors import ImpossibleValue, MissingValue, NotApplicable
from engine.levels import MAX_LEVELS
from engine.require import Array, choice
from engine.units import SYSTEMS

#: the part of the workbook in which story stiffness gives the elastic displacements
STIFFNESS_ROUTE: Final = "stiffness_route"
#: the part in which the Seismic Design Category is worked out
CATEGORY: Final = "category"


@dataclass(frozen=True, slots=True, kw_only=True)
class Building:
    """Everything the equivalent lateral force procedure needs to know of one building.

    ``parts`` names parts of the workbook that are wanted although no entry of a level asks for them.
    """

    title: str = checked(is_text)
    edition: str = word(EDITIONS)
    units: str = word(SYSTEMS)
    site: Site
    direction: Mapping[str, Direction]
    level: tuple[Level, ...]
    weight: tuple[WeightRow, ...] = ()
    spectrum: tuple[SpectrumRow, ...] = ()
    multi_period: tuple[MotionRow, ...] = ()
    wall: tuple[WallRow, ...] = ()
    mode: tuple[ModeRow, ...] = ()
    member: tuple[MemberRow, ...] = ()
    anchor: tuple[AnchorRow, ...] = ()
    lower: tuple[LowerRow, ...] = ()
    system: tuple[SystemRow, ...] = ()
    job: Mapping[str, object] = field(default_factory=dict)
    sources: Mapping[str, str] = field(default_factory=dict)
    parts: tuple[str, ...] = checked(is_list_of_texts, ())

    def __post_init__(self) -> None:
        """Check every field of every record, then what fields say together."""
        check_fields("", self)
        check_fields("site.", self.site)
        check_motion(self.site, self.edition, bool(self.multi_period))
        if not self.direction:
            raise MissingValue("direction", None, "must have a table X or Y or both")
        for name, direction in self.direction.items():
            choice("direction", name, DIRECTIONS)
            check_fields(f"direction.{name}.", direction)
            check_method(name, direction.C_s_method, self.edition, bool(self.multi_period))
        _check_levels(self.level, self.site.base_elevation)
        for table in ROW_TABLES:
            for place, row in enumerate(getattr(self, table), start=1):
                check_fields(f"{row_label(table, place, asdict(row))}: ", row)
        for place, row in enumerate(self.system, start=1):
            _check_system(row_label("system", place, asdict(row)), row)
        check_lower(self.lower, self.site.lower_base, self.direction)
        for place, row in enumerate(self.member, start=1):
            if row.direction not in self.direction:
                label = row_label("member", place, asdict(row))
                raise NotApplicable(f"{label}: direction", row.direction, "must be one that is given")
        if self.site.SDC is not None and category_asked(self):
            words = f"must be left out where the part {CATEGORY} works it out"
            raise NotApplicable("site.SDC", self.site.SDC, words)
        if STIFFNESS_ROUTE in self.parts:
            _check_route(self.level)
        if self.weight:
            _check_take_off(self.weight, self.level)
        else:
            _check_weights(self.level)


def category_asked(building: Building) -> bool:
    """Tell whether the Seismic Design Category is worked out: the part is asked for, or its entries given."""
    site = building.site
    entries = site.short_table_alone, site.rigid_diaphragms
    return CATEGORY in building.parts or entries != (None, None)


def level_values(building: Building, key: str) -> Array | None:
    """Return an entry of all levels as an array, ``None`` where it is not given."""
    if getattr(building.level[0], key) is None:
        return None
    return np.array([getattr(level, key) for level in building.level], dtype=np.float64)


def _check_system(label: str, row: SystemRow) -> None:
    for name in DIRECTIONS:
        keys = [f"system_{symbol}_{name}" for symbol in ("R", "Omega_0", "C_d")]
        missing = [key for key in keys if getattr(row, key) is None]
        if 0 < len(missing) < len(keys):
            raise MissingValue(
                f"{label}: {missing[0]}",
                None,
                "must be given with the others of its direction",
            )


def _check_levels(levels: tuple[Level, ...], base: float) -> None:
    if not 1 <= len(levels) <= MAX_LEVELS:
        raise ImpossibleValue("level", f"{len(levels)} levels", f"must be 1 to {MAX_LEVELS} levels")
    for place, level in enumerate(levels, start=1):
        label = level_label(place, level.name)
        check_fields(f"{label}: ", level)
        if level.elevation <= base:
            raise ImpossibleValue(
                f"{label}: elevation", level.elevation, f"must be above the base at {base:g}"
            )
        for optional in LEVEL_OPTIONS:
            if (getattr(level, optional) is None) != (getattr(levels[0], optional) is None):
                raise _half_filled(levels, optional)


def _check_route(levels: tuple[Level, ...]) -> None:
    for key in (f"delta_xe_{name}" for name in DIRECTIONS):
        if (value := getattr(levels[0], key)) is not None:
            label = f"{level_label(1, levels[0].name)}: {key}"
            raise NotApplicable(
                label, value, f"must be left out where the part {STIFFNESS_ROUTE} computes it"
            )


def _check_weights(levels: tuple[Level, ...]) -> None:
    for place, level in enumerate(levels, start=1):
        if level.weight is None:
            raise MissingValue(f"{level_label(place, level.name)}: weight", None, "must be given")
    if not any(level.weight for level in levels):
        raise ImpossibleValue("level", "all weights 0", "at least one level must have a weight above 0")


def _check_take_off(rows: tuple[WeightRow, ...], levels: tuple[Level, ...]) -> None:
    for place, level in enumerate(levels, start=1):
        if level.weight is not None:
            label = f"{level_label(place, level.name)}: weight"
            raise NotApplicable(label, level.weight, "must be left out where rows of weights are given")
    names = [level.name.casefold() for level in levels]
    for place, row in enumerate(rows, start=1):
        label = row_label("weight", place, asdict(row))
        if names.count(row.level.casefold()) != 1:
            raise NotApplicable(f"{label}: level", row.level, "must be the name of one level")
        _check_amount(label, row)


def _check_amount(label: str, row: WeightRow) -> None:
    given = [entry is not None for entry in (row.area, row.load, row.amount)]
    if given not in ([True, True, False], [False, False, True]):
        raise MissingValue(f"{label}: area", row.area, "must be given with load, or amount alone")


def _half_filled(levels: tuple[Level, ...], optional: str) -> MissingValue:
    place = next(i for i, level in enumerate(levels, start=1) if getattr(level, optional) is None)
    name = f"{level_label(place, levels[place - 1].name)}: {optional}"
    return MissingValue(name, None, "must be given at all levels or at none")
